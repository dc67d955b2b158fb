#include "catch.hpp"

#include <leat/cascade/error_band.hpp>

#include <cmath>
#include <functional>

using namespace leat::cascade;

namespace {

/// Values on grids of cell size 1, 1/2, 1/4, ...: coarsest first.
std::vector<GridValue> values_of(const std::function<double(double)>& value, int grids, double iteration_error = 0)
{
    std::vector<GridValue> values;
    for (int k = 0; k < grids; ++k) {
        values.push_back({value(std::exp2(-k)), iteration_error});
    }
    return values;
}

} // namespace

TEST_CASE("A number of order one and one of order two are told apart", "[band]")
{
    // Both have the same last increment, so the one of order one is three times as far from its limit.
    const auto second = values_of([](double h) { return 5 + h * h; }, 4);
    const double last = second[2].value - second[3].value;
    const auto first = values_of([&](double h) { return 5 + 8 * last * h; }, 4);
    REQUIRE(first[2].value - first[3].value == Approx(last).epsilon(1e-12));
    const double band_of_second = error_band(second).half_width.value();
    const double band_of_first = error_band(first).half_width.value();
    CHECK(band_of_second >= second[3].value - 5);
    CHECK(band_of_second <= 1.5 * (second[3].value - 5));
    CHECK(band_of_first >= first[3].value - 5);
    CHECK(band_of_first <= 2 * (first[3].value - 5));
    CHECK(band_of_first > 2.5 * band_of_second);
}

TEST_CASE("What does not converge under refinement is refused, after four grids and not before", "[band]")
{
    const auto grows = [](double h) { return 7 - 0.2 * std::log2(h); };
    const ErrorBand three = error_band(values_of(grows, 3));
    CHECK(three.has_limit);
    CHECK(three.half_width.value() > 0.2);
    const ErrorBand four = error_band(values_of(grows, 4));
    CHECK_FALSE(four.has_limit);
    CHECK_FALSE(four.half_width);
    CHECK(four.reason == "does not converge under refinement");
}

TEST_CASE("What converges slowly, changes sign or is drowned by iteration errors is not refused", "[band]")
{
    const auto slow = [](double h) { return 1 + std::pow(h, 0.35); }; // ratios 0.78
    CHECK(error_band(values_of(slow, 4)).half_width.value() > slow(0.125) - slow(0));
    const auto turns = std::vector<GridValue>{{1.0, 0}, {1.3, 0}, {1.0, 0}, {1.3, 0}};
    CHECK(error_band(turns).half_width.value() > 0.3);
    const auto grows = [](double h) { return 7 - 0.2 * std::log2(h); };
    CHECK(error_band(values_of(grows, 4, 0.02)).half_width.value() > 0.2);
}

TEST_CASE("The iteration error widens the band", "[band]")
{
    const auto second = [](double h) { return 5 + h * h; };
    const double tight = error_band(values_of(second, 4)).half_width.value();
    const double loose = error_band(values_of(second, 4, 0.01)).half_width.value();
    CHECK(loose >= tight + 0.01);
    CHECK(loose <= tight + 0.1);
    const auto constant = std::vector<GridValue>{{3, 0.01}, {3, 0.01}, {3, 0.01}};
    CHECK(error_band(constant).half_width.value() >= 0.01);
    CHECK(error_band({{3, 0}, {3, 0}, {3, 0}}).half_width.value() == 0);
}

TEST_CASE("Too few grids, or values that are not finite, give a reason and no band", "[band]")
{
    const ErrorBand two = error_band({{1, 0}, {2, 0}});
    CHECK_FALSE(two.half_width);
    CHECK(two.reason.find("2 grids") != std::string::npos);
    const ErrorBand odd = error_band({{1, 0}, {NAN, 0}, {2, 0}});
    CHECK_FALSE(odd.half_width);
    CHECK(odd.reason.find("finite") != std::string::npos);
}

TEST_CASE("An error that shrinks faster than second order is not believed to go on so", "[band]")
{
    // 0.1 h^2 and h^4 of opposite sign: the coarse increments hide what the fine grids still have to go.
    const auto hidden = [](double h) { return 2 + 0.1 * h * h - 0.6 * std::pow(h, 4); };
    for (const int grids : {3, 4, 5, 6}) {
        INFO(grids << " grids");
        const auto values = values_of(hidden, grids);
        CHECK(error_band(values).half_width.value() >= std::abs(values.back().value - 2));
    }
}
