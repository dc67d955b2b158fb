#include "catch.hpp"
#include "passage_cases.hpp"

#include <leat/passage/inlet_profile.hpp>

#include <cmath>

using namespace leat;
using leat::passage::InletDistribution;
using leat::passage::make_inlet;
using leat::passage::MonotoneCubic;
using leat::test::oil_in;

namespace {

Passage with_table(const Shape& shape, VelocityTable table)
{
    Passage passage = oil_in(shape);
    passage.inlet.profile = InletProfile::table;
    passage.inlet.table = std::move(table);
    REQUIRE(faults_of(passage).empty());
    return passage;
}

Passage developed(const Shape& shape)
{
    Passage passage = oil_in(shape);
    passage.inlet.profile = InletProfile::developed;
    return passage;
}

/// A table that samples the developed profile of a shape from one position to another.
VelocityTable sampled(const Shape& shape, double from, double to, int points)
{
    const auto flow = leat::passage::developed_flow(shape);
    VelocityTable table;
    for (int i = 0; i < points; ++i) {
        table.position.push_back(from + (to - from) * i / (points - 1));
        table.velocity.push_back(7 * flow.velocity_ratio(table.position.back())); // any unit
    }
    return table;
}

void check_same(const InletDistribution& one, const InletDistribution& other, double first, double last, double margin)
{
    CHECK(one.flow_fraction(first, last) == Approx(1).epsilon(1e-12));
    CHECK(other.flow_fraction(first, last) == Approx(1).epsilon(1e-12));
    for (int i = 0; i < 13; ++i) {
        const double a = first + (last - first) * i / 13;
        const double b = first + (last - first) * (i + 1) / 13;
        CHECK(one.flow_fraction(a, b) == Approx(other.flow_fraction(a, b)).margin(margin));
        CHECK(one.velocity_ratio(a) == Approx(other.velocity_ratio(a)).margin(20 * margin));
    }
}

} // namespace

TEST_CASE("A flat inlet spreads the flow like the area", "[inlet]")
{
    const InletDistribution tube = make_inlet(oil_in(Tube{8e-3, 1}));
    CHECK(tube.flow_fraction(0, 4e-3) == Approx(1).epsilon(1e-14));
    CHECK(tube.flow_fraction(0, 2e-3) == Approx(0.25).epsilon(1e-14));
    const InletDistribution channel = make_inlet(oil_in(Channel{2e-3, 1}));
    CHECK(channel.flow_fraction(0, 1e-3) == Approx(1).epsilon(1e-14));
    CHECK(channel.flow_fraction(0.2e-3, 0.5e-3) == Approx(0.3).epsilon(1e-14));
    const InletDistribution annulus = make_inlet(oil_in(Annulus{4e-3, 8e-3, 1}));
    CHECK(annulus.flow_fraction(2e-3, 4e-3) == Approx(1).epsilon(1e-14));
    CHECK(annulus.flow_fraction(2e-3, 3e-3) == Approx(5.0 / 12).epsilon(1e-14));
    CHECK(annulus.velocity_ratio(2e-3) == 1);
}

TEST_CASE("A developed inlet carries the exact fractions of the solved part", "[inlet]")
{
    const InletDistribution tube = make_inlet(developed(Tube{8e-3, 1}));
    CHECK(tube.flow_fraction(0, 2e-3) == Approx(0.4375).epsilon(1e-14)); // 2 s^2 - s^4 at s = 1/2
    const InletDistribution channel = make_inlet(developed(Channel{2e-3, 1}));
    CHECK(channel.flow_fraction(0, 1e-3) == Approx(1).epsilon(1e-14));
    CHECK(channel.flow_fraction(0, 0.5e-3) == Approx(0.3125).epsilon(1e-14)); // 2(3 s^2 - 2 s^3) at s = 1/4
    CHECK(channel.velocity_ratio(1e-3) == 1.5);
}

TEST_CASE("A table of a parabola is the developed inlet, and its scale does not matter", "[inlet]")
{
    const Tube tube{8e-3, 1};
    check_same(make_inlet(with_table(tube, sampled(tube, 0, 4e-3, 5))), make_inlet(developed(tube)), 0, 4e-3, 1e-13);
    const Channel channel{2e-3, 1};
    const InletDistribution whole = make_inlet(with_table(channel, sampled(channel, 0, 2e-3, 9)));
    const InletDistribution half = make_inlet(with_table(channel, sampled(channel, 0, 1e-3, 5)));
    check_same(whole, make_inlet(developed(channel)), 0, 1e-3, 1e-13);
    check_same(half, whole, 0, 1e-3, 1e-13);
}

TEST_CASE("A finer table of an annulus profile comes nearer to it", "[inlet]")
{
    const Annulus annulus{4e-3, 8e-3, 1};
    const InletDistribution exact = make_inlet(developed(annulus));
    const auto error = [&](int points) {
        const InletDistribution table = make_inlet(with_table(annulus, sampled(annulus, 2e-3, 4e-3, points)));
        CHECK(table.flow_fraction(2e-3, 4e-3) == Approx(1).epsilon(1e-12));
        return std::abs(table.flow_fraction(2e-3, 2.37e-3) - exact.flow_fraction(2e-3, 2.37e-3));
    };
    CHECK(error(81) < error(11) / 20);
    CHECK(error(81) < 1e-5);
}

TEST_CASE("A table of two equal velocities is the flat inlet", "[inlet]")
{
    const Annulus annulus{4e-3, 8e-3, 1};
    check_same(make_inlet(with_table(annulus, {{2e-3, 4e-3}, {3, 3}})), make_inlet(oil_in(annulus)), 2e-3, 4e-3, 1e-14);
}

// Fritsch & Carlson 1980: between two points the curve stays between their values. Data of their example, RPN 14.
TEST_CASE("The cubic is monotone between points and independent of their order", "[inlet]")
{
    const std::vector<double> x{7.99, 8.09, 8.19, 8.7, 9.2, 10, 12, 15, 20};
    const std::vector<double> f{0, 2.76429e-5, 4.37498e-2, 0.169183, 0.469428, 0.943740, 0.998636, 0.999919, 0.999994};
    const MonotoneCubic curve(x, f);
    std::vector<double> mirrored_x;
    std::vector<double> mirrored_f;
    for (std::size_t i = x.size(); i-- > 0;) {
        mirrored_x.push_back(-x[i]);
        mirrored_f.push_back(f[i]);
    }
    const MonotoneCubic mirrored(mirrored_x, mirrored_f);
    double last = 0;
    for (int i = 0; i <= 5000; ++i) {
        const double at = 7.99 + (20 - 7.99) * i / 5000;
        CHECK(curve(at) >= last - 1e-15);
        CHECK(mirrored(-at) == Approx(curve(at)).margin(1e-14));
        last = curve(at);
    }
    for (std::size_t i = 0; i < x.size(); ++i) {
        CHECK(curve(x[i]) == Approx(f[i]).margin(1e-15));
    }
}

TEST_CASE("The cubic does not overshoot a largest value that is a point", "[inlet]")
{
    const MonotoneCubic curve({0, 1, 2.2, 3}, {0, 1, 0.9, 0});
    for (int i = 0; i <= 300; ++i) {
        CHECK(curve(i / 100.0) <= 1);
        CHECK(curve(i / 100.0) >= 0);
    }
}

TEST_CASE("Integrals of the cubic are exact", "[inlet]")
{
    const MonotoneCubic line({1, 2, 4}, {3, 5, 9}); // 1 + 2 x
    CHECK(line.integral(1.5, 3.5, false) == Approx(2 + 10).epsilon(1e-14));
    CHECK(line.integral(1.5, 3.5, true) == Approx(5 + 2 * (42.875 - 3.375) / 3).epsilon(1e-14));
    CHECK(line.integral(3.5, 1.5, true) == -line.integral(1.5, 3.5, true));
    const MonotoneCubic parabola({0, 1, 3, 4}, {0, 1, 9, 16});
    CHECK(parabola.integral(0, 4, false) == Approx(64.0 / 3).epsilon(1e-14));
    CHECK(parabola.integral(0, 4, true) == Approx(64).epsilon(1e-14));
}
