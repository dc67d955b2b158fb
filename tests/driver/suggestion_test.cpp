#include "catch.hpp"

#include "terminal/quoted.hpp"
#include "terminal/suggestion.hpp"

#include <array>

using namespace leat::driver;

TEST_CASE("edit distance counts inserted, deleted, replaced and swapped letters")
{
    CHECK(edit_distance("", "abc") == 3);
    CHECK(edit_distance("abc", "abc") == 0);
    CHECK(edit_distance("velocty", "velocity") == 1);
    CHECK(edit_distance("velcoity", "velocity") == 1);
    CHECK(edit_distance("kitten", "sitting") == 3);
}

TEST_CASE("only a near word is suggested, and the nearest of several")
{
    constexpr std::array<std::string_view, 4> known{"gap", "diameter", "inner_diameter", "outer_diameter"};
    CHECK(nearest("diametr", known) == "diameter");
    CHECK(nearest("iner_diameter", known) == "inner_diameter");
    CHECK(nearest("gop", known) == "gap");
    CHECK(nearest("cut", known).empty());
    CHECK(nearest(std::string(100'000, 'd'), known).empty());
}

TEST_CASE("quoted text is short, whole characters, and without control bytes")
{
    CHECK(quoted("a\x1b[2Jb") == "'a?[2Jb'");
    const std::string long_text = std::string(59, 'a') + "\u00b5\u00b5\u00b5";
    CHECK(quoted(long_text) == "'" + std::string(59, 'a') + "...'");
}
