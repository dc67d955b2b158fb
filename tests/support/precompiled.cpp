#include "catch.hpp" // a target to own the precompiled header needs a source
