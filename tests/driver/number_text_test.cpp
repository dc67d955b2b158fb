#include "catch.hpp"

#include "report/number_text.hpp"
#include "report/table_text.hpp"

using namespace leat::driver;

namespace {

leat::Number number(double value, std::optional<double> band)
{
    leat::Number result;
    result.value = value;
    result.band = band;
    return result;
}

} // namespace

TEST_CASE("numbers have their significant digits and no more")
{
    CHECK(significant(8435.2345, 5) == "8435.2");
    CHECK(significant(123456.7, 5) == "123460");
    CHECK(significant(-0.0123456, 3) == "-0.0123");
    CHECK(significant(9.9996, 4) == "10.00");
    CHECK(significant(0.0001234, 3) == "1.23e-04");
    CHECK(significant(12345678.0, 3) == "1.23e+07");
    CHECK(significant(0.0, 5) == "0");
    CHECK(shortest(0.008, 5) == "0.008");
    CHECK(shortest(4e-4, 5) == "4e-04");
    CHECK(shortest(850.0, 5) == "850");
    CHECK(shortest(100.0, 2) == "100");
    CHECK(magnitude(3.14e-12) == "3.1e-12");
}

TEST_CASE("a band cuts the digits that it makes meaningless")
{
    CHECK(with_band(number(8435.2345, 1.26)) == "8435.2 \u00b1 1.3");
    CHECK(with_band(number(8435.2345, 130.0)) == "8440 \u00b1 130");
    CHECK(with_band(number(8435.2345, 0.00996)) == "8435.235 \u00b1 0.010");
    CHECK(with_band(number(0.5, 20.0)) == "0.5 \u00b1 20");
    CHECK(with_band(number(8435.2345, std::nullopt)) == "8435.2");
}

TEST_CASE("times are for people")
{
    CHECK(duration_text(0.2149) == "0.21 s");
    CHECK(duration_text(35.2) == "35 s");
    CHECK(duration_text(725.4) == "12 min 5 s");
}

TEST_CASE("columns are aligned by characters, and lines are wrapped")
{
    CHECK(aligned({{"a", "1", "\u00b5m"}, {"long", "22", "m"}, {"b"}}, 1, true) ==
          " a      1  \u00b5m\n long  22  m\n b\n");
    std::string words(60, 'a');
    words += ' ';
    words.append(60, 'b');
    const std::string text = wrapped("- ", words);
    CHECK(text == "- " + std::string(60, 'a') + "\n  " + std::string(60, 'b') + "\n");
}
