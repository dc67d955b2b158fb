// The main function of every test program, where Catch2 (version 2) brings none of its own.
#define CATCH_CONFIG_MAIN
#include <catch2/catch.hpp>
