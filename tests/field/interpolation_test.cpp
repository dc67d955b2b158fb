#include "catch.hpp"

#include <leat/field/interpolation.hpp>

#include <cmath>
#include <functional>
#include <vector>

using namespace leat::field;

namespace {

/// Unequal places on [0, 2].
std::vector<double> places(int n)
{
    std::vector<double> x;
    for (int k = 0; k <= n; ++k) {
        const double s = static_cast<double>(k) / n;
        x.push_back(2 * s + 0.1 * std::sin(3 * s) * s * (1 - s));
    }
    return x;
}

std::vector<double> sampled(const std::vector<double>& x, const std::function<double(double)>& f)
{
    std::vector<double> value;
    for (const double at : x) {
        value.push_back(f(at));
    }
    return value;
}

} // namespace

TEST_CASE("Interpolation through n points is exact for polynomials of degree n - 1 and no higher", "[field]")
{
    const std::vector<double> x = places(12);
    for (int points = 1; points <= 6; ++points) {
        for (int degree = 0; degree <= points; ++degree) {
            const auto power = [&](double at) { return std::pow(at, degree); };
            double worst = 0;
            for (const double at : {-0.1, 0.0, 0.03, 0.77, 1.0, x[5], 1.93, 2.0, 2.1}) { // beyond both ends too
                worst = std::max(worst, std::abs(interpolate(x, sampled(x, power), at, points) - power(at)));
            }
            CAPTURE(points, degree);
            if (degree < points) {
                CHECK(worst < 1e-11);
            } else {
                CHECK(worst > 1e-9);
            }
        }
    }
}

TEST_CASE("Four points interpolate at fourth order", "[field]")
{
    const auto wave = [](double at) { return std::sin(3 * at); };
    const auto error = [&](int n) {
        const std::vector<double> x = places(n);
        const std::vector<double> value = sampled(x, wave);
        double worst = 0;
        for (int k = 0; k <= 1000; ++k) {
            const double at = 0.002 * k;
            worst = std::max(worst, std::abs(interpolate(x, value, at) - wave(at)));
        }
        return worst;
    };
    const double order = std::log2(error(40) / error(80));
    CHECK(order > 3.8);
    CHECK(order < 4.2);
}

TEST_CASE("Known values are hit, and few known values are all used", "[field]")
{
    const std::vector<double> x = {0, 0.5, 0.7};
    const std::vector<double> value = {1, 4, -2};
    for (std::size_t k = 0; k < x.size(); ++k) {
        CHECK(interpolate(x, value, x[k]) == Approx(value[k]));
    }
    // the parabola through all three: degree 2 is exact
    CHECK(interpolate(x, sampled(x, [](double at) { return at * at; }), 0.6) == Approx(0.36));
    CHECK(interpolate({0.3}, {7}, 2) == 7);
}

TEST_CASE("The points nearest to x are taken", "[field]")
{
    std::vector<double> value(10, 0.0);
    std::vector<double> x;
    for (int k = 0; k < 10; ++k) {
        x.push_back(k);
    }
    value[2] = 1;
    CHECK(interpolate(x, value, 3.5) != 0); // 2 .. 5
    CHECK(interpolate(x, value, 4.5) == 0); // 3 .. 6
    CHECK(interpolate(x, value, 8.5) == 0); // the last four
}

TEST_CASE("The peak is that of the parabola through the largest value and its neighbours", "[field]")
{
    const std::vector<double> x = {0, 0.3, 0.45, 0.8, 1};
    const auto hill = [](double top) { return [top](double at) { return 3 - 2 * (at - top) * (at - top); }; };
    CHECK(peak(x, sampled(x, hill(0.5))) == Approx(3));          // between two places
    CHECK(peak(x, sampled(x, hill(0.45))) == Approx(3));         // on one
    CHECK(peak(x, sampled(x, hill(-1))) == Approx(hill(-1)(0))); // at the ends: the value itself
    CHECK(peak(x, sampled(x, hill(2))) == Approx(hill(2)(1)));
    CHECK(peak(x, {5, 5, 5, 5, 5}) == 5);
    CHECK(peak(x, {1, 5, 5, 1, 0}) > 5); // a flat top: the parabola rises above both
    CHECK(peak({0, 1}, {1, 2}) == 2);
}

TEST_CASE("The last crossing is found wherever it lies", "[field]")
{
    const std::vector<double> x = places(40);
    const auto decay = sampled(x, [](double at) { return 1 - std::exp(-4 * at); });
    const double exact = std::log(100.0) / 4; // exp(-4 x) = 0.01

    CHECK(last_crossing(x, decay, 1, 0.01, 2) == Approx(exact).epsilon(1e-4));
    SECTION("from above as well as from below")
    {
        const auto fall = sampled(x, [](double at) { return 1 + std::exp(-4 * at); });
        CHECK(last_crossing(x, fall, 1, 0.01, 2) == Approx(exact).epsilon(1e-4));
    }
    SECTION("always inside: the first place")
    {
        CHECK(last_crossing(x, decay, 1, 1.5, 2) == x.front());
    }
    SECTION("still outside at the end: the end or more")
    {
        CHECK(last_crossing(x, decay, 1, 1e-5, 2) >= 2);
        CHECK(last_crossing(x, decay, 1, 0.01, 0.8) >= 0.8); // before the crossing, places beyond the end known
    }
    SECTION("what lies beyond the end does not count")
    {
        auto upset = decay;
        upset.back() = 5;
        CHECK(last_crossing(x, upset, 1, 0.01, 1.5) == Approx(exact).epsilon(1e-4));
    }
    SECTION("only the last of several crossings counts")
    {
        // inside from 0.2 on, outside again around 1.2, inside for good after that
        const std::vector<double> dense = places(160);
        const auto twice = sampled(
            dense, [](double at) { return 1 - std::exp(-40 * at) + 0.5 * std::exp(-200 * (at - 1.2) * (at - 1.2)); });
        const double last = 1.2 + std::sqrt(std::log(0.5 / 0.01) / 200);
        CHECK(last_crossing(dense, twice, 1, 0.01, 2) == Approx(last).epsilon(1e-4));
    }
    SECTION("outside at the very last place that is known")
    {
        const std::vector<double> few = {0, 0.5, 1};
        CHECK(last_crossing(few, {0, 0.5, 0.9}, 1, 0.01, 3) >= 3);
    }
}
