#include "catch.hpp"

#include "observed_order.hpp"

#include <leat/mesh/grading.hpp>

#include <array>
#include <cmath>
#include <numbers>

using namespace leat;
using balance::Side;
using mesh::Coordinates;

// Three-dimensional convection and diffusion with a manufactured solution (Roache 2002): every scheme, stretched
// Cartesian and cylindrical (x, r, angle) cells, a non-uniform flow without divergence, three nested grids.

namespace {

Manufactured<3> problem(Coordinates coordinates, const std::array<Factor, 3>& solution, double diffusivity)
{
    Manufactured<3> p;
    p.coordinates = coordinates;
    p.diffusivity = diffusivity;
    // all components of the flow stay away from zero: a slanted stream with waves on it
    const Factor one = ramp(1, 0);
    p.potential[0].terms = {{wave(0.06, 1.5, 0.8), wave(1, 2, 0.1), wave(1, 1.8)}};
    p.potential[1].terms = {{ramp(0, 0.5), one, one}, {wave(0.05, 1.7), wave(1, 1.9, 0.7), wave(1, 2.1, 0.2)}};
    p.potential[2].terms = {{one, ramp(0, 1, 0.2), one},
                            {ramp(0, -0.6), one, one},
                            {wave(0.06, 2, 0.4), wave(1, 2.2, 0.3), wave(1, 1, 0.5)}};
    p.solution.terms = {solution};
    return p;
}

mesh::Grid<3> stretched(Coordinates coordinates, int n)
{
    return {coordinates,
            {mesh::sample(mesh::towards_start(1), 10 * n, 0, 1), mesh::sample(mesh::towards_both(0.9), 8 * n, 0.5, 1.5),
             mesh::sample(mesh::towards_end(0.8), 8 * n, 0, 1)}};
}

/// Value where the flow enters; where it leaves a value too, or the flux.
balance::Transport<3>::Setup setup(Scheme scheme, double diffusivity, Side::Kind outlet)
{
    balance::Transport<3>::Setup s;
    s.diffusivity = diffusivity;
    s.schemes = {scheme, scheme, scheme};
    for (auto& ends : s.sides) {
        ends[1].kind = outlet;
    }
    return s;
}

/// A sine about one, level at s = end and rising before it (over more than one unit of s for a frequency below pi).
Factor level_at(double end, double frequency)
{
    return {.amplitude = 0.5, .frequency = frequency, .phase = 0.5 * std::numbers::pi - frequency * end};
}

const std::array<Factor, 3> rising_to_level = {level_at(1, 1.6), level_at(1.5, 1.5), level_at(1, 1.4)};
const std::array<Factor, 3> rising = {Factor{.amplitude = 1, .frequency = 1.1, .phase = 0.2},
                                      Factor{.amplitude = 0.8, .frequency = 0.9, .phase = -0.3},
                                      Factor{.amplitude = 0.9, .frequency = 1, .phase = 0.1}};
const std::array<Factor, 3> waving = {level_at(1, 4.5), level_at(1.5, 4), level_at(1, 4.2)};

Orders orders(Coordinates coordinates, const std::array<Factor, 3>& solution, double diffusivity, Scheme scheme,
              Side::Kind outlet, double tolerance = 1e-11)
{
    return observe<3>(
        problem(coordinates, solution, diffusivity), -1, setup(scheme, diffusivity, outlet), 3,
        [&](int n) { return stretched(coordinates, n); }, tolerance);
}

constexpr Coordinates all_coordinates[] = {Coordinates::cartesian, Coordinates::cylindrical};

} // namespace

TEST_CASE("Upwind is of first order in three dimensions where convection rules", "[balance]")
{
    for (const Coordinates coordinates : all_coordinates) {
        const Orders found = orders(coordinates, rising_to_level, 2e-4, Scheme::upwind, Side::Kind::flux);
        INFO(found.text());
        CHECK(found.grids.back().smallest_peclet > 10);
        CHECK(std::abs(found.last() - 1) < 0.15);
    }
}

TEST_CASE("The power law is of first order at high cell Peclet number and of second at low, in three dimensions",
          "[balance]")
{
    for (const Coordinates coordinates : all_coordinates) {
        const Orders high = orders(coordinates, rising_to_level, 1e-6, Scheme::power_law, Side::Kind::flux);
        INFO(high.text());
        CHECK(high.grids.back().smallest_peclet > 10);
        CHECK(std::abs(high.last() - 1) < 0.15);
        const Orders low = orders(coordinates, rising_to_level, 0.6, Scheme::power_law, Side::Kind::flux);
        INFO(low.text());
        CHECK(low.grids.front().largest_peclet < 0.5);
        CHECK(std::abs(low.last() - 2) < 0.15);
    }
}

TEST_CASE("Central, linear upwind and quick are of second order in three dimensions", "[balance]")
{
    for (const Coordinates coordinates : all_coordinates) {
        for (const Scheme scheme : {Scheme::central, Scheme::linear_upwind, Scheme::quick}) {
            const Orders found = orders(coordinates, rising_to_level, 2e-3, scheme, Side::Kind::flux);
            INFO(name(scheme) << ": " << found.text());
            CHECK(found.grids.back().smallest_peclet > 1);
            CHECK(found.last() > 1.85);
            CHECK((scheme == Scheme::quick || found.last() < 2.15));
        }
    }
}

TEST_CASE("Limited schemes are of second order in three dimensions where the solution is monotone", "[balance]")
{
    for (const Coordinates coordinates : all_coordinates) {
        for (const Scheme scheme : {Scheme::van_leer, Scheme::minmod}) {
            const Orders found = orders(coordinates, rising, 0.05, scheme, Side::Kind::value, 1e-9);
            INFO(name(scheme) << ": " << found.text());
            CHECK(std::abs(found.last() - 2) < 0.15);
        }
    }
}

TEST_CASE("The order of limited schemes in three dimensions where the solution has extrema is reported", "[balance]")
{
    for (const Coordinates coordinates : all_coordinates) {
        for (const Scheme scheme : {Scheme::van_leer, Scheme::minmod}) {
            const Orders found = orders(coordinates, waving, 2e-3, scheme, Side::Kind::flux, 1e-8);
            WARN(name(scheme) << " with extrema: " << found.text());
            CHECK(found.last() > 1.5);
        }
    }
}
