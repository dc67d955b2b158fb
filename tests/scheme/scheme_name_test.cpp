#include "catch.hpp"

#include <leat/scheme/scheme.hpp>

#include <set>
#include <string>

using namespace leat;

TEST_CASE("Scheme names are distinct and read back", "[scheme]")
{
    std::set<std::string> seen;
    int place = 0;
    for (const Scheme scheme : all_schemes()) {
        CHECK(static_cast<int>(scheme) == place++);
        const std::string text(name(scheme));
        seen.insert(text);
        REQUIRE(scheme_named(text).has_value());
        CHECK(*scheme_named(text) == scheme);
    }
    CHECK(seen ==
          std::set<std::string>{"upwind", "central", "power_law", "linear_upwind", "quick", "van_leer", "minmod"});
}

TEST_CASE("No other name is taken for a scheme", "[scheme]")
{
    for (const char* text : {"", "Upwind", "up", "upwind ", "quick2", "van leer"}) {
        INFO(text);
        CHECK_FALSE(scheme_named(text).has_value());
    }
}
