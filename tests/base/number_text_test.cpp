#include "catch.hpp"

#include <leat/base/error.hpp>
#include <leat/base/version.hpp>

#include <bit>
#include <charconv>
#include <cmath>
#include <cstdint>
#include <cstdio>
#include <limits>
#include <locale>
#include <random>
#include <sstream>
#include <string>

using namespace leat;

namespace {

double read_back(const std::string& text)
{
    double number = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), number);
    CHECK(error == std::errc{});
    CHECK(end == text.data() + text.size());
    return number;
}

/// Writes 1234567.5 as 1.234.567,5.
class CommaPunctuation : public std::numpunct<char> {
    char do_decimal_point() const override { return ','; }
    char do_thousands_sep() const override { return '.'; }
    std::string do_grouping() const override { return "\3"; }
};

} // namespace

TEST_CASE("A number's text is the shortest that reads back to the same number", "[text]")
{
    CHECK(to_text(0.1) == "0.1");
    CHECK(to_text(-0.45) == "-0.45");
    CHECK(to_text(8e-3) == "0.008");
    CHECK(to_text(865) == "865");
    CHECK(to_text(1e300) == "1e+300");
    std::mt19937_64 random(7);
    int tried = 0;
    for (int k = 0; k < 20000; ++k) {
        const double number = std::bit_cast<double>(static_cast<std::uint64_t>(random()));
        if (std::isfinite(number)) {
            REQUIRE(read_back(to_text(number)) == number);
            ++tried;
        }
    }
    CHECK(tried > 19000);
    CHECK(read_back(to_text(std::numeric_limits<double>::denorm_min())) == std::numeric_limits<double>::denorm_min());
}

TEST_CASE("A short text has three significant digits", "[text]")
{
    CHECK(to_short_text(2300) == "2.3e+03");
    CHECK(to_short_text(0.0123456) == "0.0123");
    CHECK(to_short_text(99.95) == "100");
    CHECK(to_short_text(64) == "64");
    CHECK(to_short_text(-1.0 / 3) == "-0.333");
}

TEST_CASE("Numbers are written the same under any locale", "[text]")
{
    const std::locale before = std::locale::global(std::locale(std::locale::classic(), new CommaPunctuation));
    const std::string text = to_text(1234567.5);
    const std::string short_text = to_short_text(0.125);
    std::ostringstream stream; // takes the global locale: shows that it was in force
    stream << 1234567.5;
    std::locale::global(before);
    CHECK(stream.str().find(',') != std::string::npos);
    CHECK(text == "1234567.5");
    CHECK(short_text == "0.125");
}

TEST_CASE("The version is three numbers", "[version]")
{
    const std::string text(version());
    int parts[3] = {-1, -1, -1};
    int length = 0;
    REQUIRE(std::sscanf(text.c_str(), "%d.%d.%d%n", &parts[0], &parts[1], &parts[2], &length) == 3);
    CHECK(static_cast<std::size_t>(length) == text.size());
    CHECK(parts[0] >= 0);
}
