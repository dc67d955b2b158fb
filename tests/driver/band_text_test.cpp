#include "catch.hpp"
#include "report/number_text.hpp"

using namespace leat;
using namespace leat::driver;

TEST_CASE("the printed band has one digit, or two behind a 1 or 2, and is rounded up")
{
    const auto text = [](double value, double band) { return with_band({.value = value, .band = band, .reason = {}}); };
    CHECK(text(412.684, 0.55) == "412.7 \u00b1 0.6");
    CHECK(text(412.684, 0.21) == "412.68 \u00b1 0.21");
    CHECK(text(412.684, 0.201) == "412.68 \u00b1 0.21");
    CHECK(text(412.684, 0.98) == "412.7 \u00b1 1.0");
    CHECK(text(0.0503, 4e-5) == "0.05030 \u00b1 4e-05");
    CHECK(text(412.684, 0.0) == "412.68");
}
