#include "catch.hpp"

#include "observed_order.hpp"

#include <leat/mesh/grading.hpp>

#include <array>
#include <cmath>
#include <numbers>

using namespace leat;
using balance::Side;
using mesh::Coordinates;

// Manufactured solutions on volumes shifted by half a cell, whose outermost nodes lie on the sides.

namespace {

using Kind = Side::Kind;

Factor level_at(double end, double frequency)
{
    return {.amplitude = 0.5, .frequency = frequency, .phase = 0.5 * std::numbers::pi - frequency * end};
}

template <int D>
mesh::Grid<D> stretched(Coordinates coordinates, double innermost, int cells)
{
    std::array<std::vector<double>, D> faces;
    faces[0] = mesh::sample(mesh::towards_start(1), cells, 0, 1);
    faces[1] = mesh::sample(mesh::towards_both(0.9), cells, innermost, innermost + 1);
    if constexpr (D == 3) {
        faces[2] = mesh::sample(mesh::towards_end(0.8), cells, 0, 1);
    }
    return {coordinates, faces};
}

/// A slanted wavy stream; the solution is level where it leaves.
template <int D>
Manufactured<D> stream(Coordinates coordinates)
{
    Manufactured<D> p;
    p.coordinates = coordinates;
    const Factor one = ramp(1, 0);
    if constexpr (D == 2) {
        p.potential[2].terms = {{one, ramp(0, 1, 0.2)}, {ramp(0, -0.6), one}, {wave(0.1, 2, 0.4), wave(1, 2.2, 0.3)}};
        p.solution.terms = {{level_at(1, 2.1), level_at(1.5, 1.9)}};
    } else {
        p.potential[0].terms = {{wave(0.06, 1.5, 0.8), wave(1, 2, 0.1), wave(1, 1.8)}};
        p.potential[1].terms = {{ramp(0, 0.5), one, one}};
        p.potential[2].terms = {{one, ramp(0, 1, 0.2), one}, {ramp(0, -0.6), one, one}};
        p.solution.terms = {{level_at(1, 1.6), level_at(1.5, 1.5), level_at(1, 1.4)}};
    }
    return p;
}

template <int D>
typename balance::Transport<D>::Setup setup(int shift, Scheme scheme, double diffusivity, Kind last)
{
    typename balance::Transport<D>::Setup s;
    s.diffusivity = diffusivity;
    s.schemes.fill(scheme);
    for (int d = 0; d < D; ++d) {
        s.sides[d][1].kind = Kind::flux;
    }
    s.sides[shift][0].kind = Kind::on_node;
    s.sides[shift][1].kind = last;
    return s;
}

} // namespace

TEST_CASE("On volumes shifted along either direction of a plane every scheme has its order", "[balance]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        for (int shift = 0; shift < 2; ++shift) {
            for (const Scheme scheme : {Scheme::upwind, Scheme::central, Scheme::linear_upwind, Scheme::quick}) {
                const bool first = scheme == Scheme::upwind;
                const Orders found =
                    observe<2>(stream<2>(coordinates), shift, setup<2>(shift, scheme, first ? 1e-4 : 1e-3, Kind::open),
                               3, [&](int n) { return stretched<2>(coordinates, 0.5, 20 * n); });
                INFO(name(scheme) << ", shift " << shift << ": " << found.text());
                CHECK(found.last() > (first ? 0.85 : 1.85));
                CHECK((scheme == Scheme::quick || found.last() < (first ? 1.15 : 2.15)));
            }
        }
    }
}

TEST_CASE("On shifted volumes with values given on both outermost nodes the order is second", "[balance]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        for (int shift = 0; shift < 2; ++shift) {
            for (const Scheme scheme : {Scheme::central, Scheme::minmod}) {
                const Orders found =
                    observe<2>(stream<2>(coordinates), shift, setup<2>(shift, scheme, 0.1, Kind::on_node), 3,
                               [&](int n) { return stretched<2>(coordinates, 0.5, 20 * n); });
                INFO(name(scheme) << ", shift " << shift << ": " << found.text());
                CHECK(std::abs(found.last() - 2) < 0.15);
            }
        }
    }
}

TEST_CASE("On volumes shifted along each direction of space the order is second", "[balance]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        for (int shift = 0; shift < 3; ++shift) {
            const Orders found =
                observe<3>(stream<3>(coordinates), shift, setup<3>(shift, Scheme::central, 5e-3, Kind::open), 3,
                           [&](int n) { return stretched<3>(coordinates, 0.5, 7 * n); });
            INFO("shift " << shift << ": " << found.text());
            CHECK(std::abs(found.last() - 2) < 0.15);
        }
    }
}

TEST_CASE("A radial component with its hoop term is of second order up to the axis", "[balance]")
{
    Manufactured<2> p;
    p.coordinates = Coordinates::cylindrical;
    p.potential[2].terms = {{ramp(1, 0.3), ramp(0, 0, 0.5)}, {wave(0.1, 2, 0.3), ramp(0, 0, 1)}};
    p.solution.terms = {{level_at(1, 2.1), ramp(0, 1, -0.4)}};
    auto s = setup<2>(1, Scheme::central, 0.05, Kind::on_node);
    s.hoop = true;
    const auto grid = [](int n) { return stretched<2>(Coordinates::cylindrical, 0, 20 * n); };
    const Orders found = observe<2>(p, 1, s, 3, grid);
    INFO(found.text());
    CHECK(std::abs(found.last() - 2) < 0.15);
}

TEST_CASE("Cells reach the axis of a tube at second order", "[balance]")
{
    Manufactured<2> p;
    p.coordinates = Coordinates::cylindrical;
    p.potential[2].terms = {{ramp(1, -0.3), ramp(0, 0, 0.5)}, {wave(0.1, 2, 0.3), ramp(0, 0, 1)}};
    p.solution.terms = {{level_at(1, 2.1), ramp(1, 0, -0.6)}};
    balance::Transport<2>::Setup s;
    s.diffusivity = 2e-3;
    s.schemes = {Scheme::linear_upwind, Scheme::central};
    s.sides[0][1].kind = Kind::flux;
    s.sides[1][0].kind = Kind::flux;
    const auto grid = [](int n) { return stretched<2>(Coordinates::cylindrical, 0, 20 * n); };
    const Orders found = observe<2>(p, -1, s, 3, grid);
    INFO(found.text());
    CHECK(std::abs(found.last() - 2) < 0.15);
}
