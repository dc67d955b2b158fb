#include "catch.hpp"

#include "observed_order.hpp"

#include <leat/base/error.hpp>
#include <leat/mesh/grading.hpp>

#include <array>
#include <cmath>
#include <numbers>
#include <utility>
#include <vector>

using namespace leat;
using balance::Side;
using mesh::Coordinates;

// Convection and diffusion of a scalar in three dimensions with every kind of side: value, given flux, no flux,
// exchange. The flow enters at x = 0, winds through the passage without touching its walls, and leaves at x = 1.

namespace {

using Kind = Side::Kind;
constexpr double pi = std::numbers::pi;

Manufactured<3> passage(Coordinates coordinates, double diffusivity)
{
    Manufactured<3> p;
    p.coordinates = coordinates;
    p.diffusivity = diffusivity;
    const Factor across = wave(1, pi, -0.5 * pi); // vanishes at 0.5 and 1.5
    const Factor around = wave(1, pi);            // vanishes at 0 and 1
    p.potential[0].terms = {{ramp(0.3, -0.2), across, around}};
    p.potential[1].terms = {{wave(0.2, 3, 0.5), ramp(0.5, 0.4), around}};
    p.potential[2].terms = {{ramp(1, 0), ramp(0, 1, 0.1), ramp(1, 0)}, {wave(0.15, 2), across, ramp(1, 0.5)}};
    p.solution.terms = {
        {Factor{.amplitude = 0.5, .frequency = 4, .phase = 0.5 * pi - 4}, wave(1, 2.5, 0.4), wave(1, 2, 0.9)},
        {ramp(1, -0.8, 0.4), ramp(0.3, 0.8), ramp(0.2, -0.7, 0.9)}}; // both level at x = 1
    return p;
}

mesh::Grid<3> stretched(Coordinates coordinates, int n)
{
    return {coordinates,
            {mesh::sample(mesh::towards_start(1), 10 * n, 0, 1), mesh::sample(mesh::towards_both(0.9), 7 * n, 0.5, 1.5),
             mesh::sample(mesh::towards_end(0.8), 7 * n, 0, 1)}};
}

} // namespace

TEST_CASE("In three dimensions every kind of side on every wall keeps the second order", "[balance]")
{
    const Side value{Kind::value, 0};
    const Side flux{Kind::flux, 0};
    const Side exchange{Kind::exchange, 0.08};
    using Walls = std::array<Side, 4>; // lower and upper, across the second and the third direction
    const std::vector<std::pair<Coordinates, Walls>> cases = {
        {Coordinates::cartesian, {value, exchange, flux, value}},
        {Coordinates::cartesian, {exchange, flux, value, exchange}},
        {Coordinates::cartesian, {flux, value, exchange, flux}},
        {Coordinates::cylindrical, {value, exchange, flux, value}},
        {Coordinates::cylindrical, {exchange, flux, value, flux}},
    };
    for (const auto& [coordinates, wall] : cases) {
        balance::Transport<3>::Setup s;
        s.diffusivity = 0.02;
        s.schemes = {Scheme::quick, Scheme::central, Scheme::central};
        s.sides = {std::array{value, flux}, {wall[0], wall[1]}, {wall[2], wall[3]}};
        const auto grid = [&, &kind = coordinates](int n) { return stretched(kind, n); };
        const Orders found = observe<3>(passage(coordinates, s.diffusivity), -1, s, 3, grid);
        INFO(found.text());
        CHECK(std::abs(found.last() - 2) < 0.15);
    }
}

TEST_CASE("Exchange through a side of constant angle is refused", "[balance]")
{
    balance::Transport<3>::Setup s;
    s.diffusivity = 0.02;
    s.sides[2][1] = {Kind::exchange, 0.08};
    CHECK_NOTHROW(balance::Transport<3>(stretched(Coordinates::cartesian, 1), -1, s));
    CHECK_THROWS_AS(balance::Transport<3>(stretched(Coordinates::cylindrical, 1), -1, s), InvalidInput);
    s.sides[2][1] = {};
    s.sides[1][1] = {Kind::exchange, 0.08};
    CHECK_NOTHROW(balance::Transport<3>(stretched(Coordinates::cylindrical, 1), -1, s));
}

TEST_CASE("An exchange coefficient without limit is a given value, and one of zero is no flux", "[balance]")
{
    const auto solved = [](const Side& wall) {
        balance::Transport<3>::Setup s;
        s.diffusivity = 0.02;
        s.schemes.fill(Scheme::central);
        s.sides[0][1].kind = Kind::flux;
        s.sides[1][1] = wall;
        Manufactured<3> p = passage(Coordinates::cartesian, s.diffusivity);
        p.solution.terms = {{ramp(1, 0), ramp(2.25, -3, 1), ramp(1, 0)}}; // level at the wall in question
        ManufacturedRun<3> run(p, stretched(Coordinates::cartesian, 1), -1, s);
        CHECK(run.solve().reduction <= 1e-11);
        return run.value()[run.transport().layout().index({5, 6, 4})];
    };
    CHECK(solved({Kind::exchange, 1e12}) == Approx(solved({Kind::value, 0})).epsilon(1e-8));
    CHECK(solved({Kind::exchange, 1e-12}) == Approx(solved({Kind::flux, 0})).epsilon(1e-8));
    CHECK(std::abs(solved({Kind::value, 0}) - solved({Kind::flux, 0})) > 1e-6);
}
