#include "catch.hpp"

#include <leat/mesh/control_volumes.hpp>
#include <leat/mesh/grading.hpp>

#include <array>
#include <cmath>

using namespace leat::mesh;

namespace {

Grid<3> block(Coordinates coordinates, double innermost)
{
    return {coordinates,
            {sample(towards_start(1.3), 7, -0.5, 2.5), sample(towards_both(1.1), 6, innermost, 1.4),
             sample(towards_end(0.8), 5, 0.2, 1.3)}};
}

Grid<2> plane(Coordinates coordinates, double innermost)
{
    const Grid<3> solid = block(coordinates, innermost);
    return {coordinates, {solid.faces(0), solid.faces(1)}};
}

/// Calls visit(k) for every volume.
template <int D, class Visit>
void for_each(const ControlVolumes<D>& volumes, Visit visit)
{
    std::array<int, D> k{};
    for (k[0] = 0; k[0] < volumes.nodes(0); ++k[0]) {
        for (k[1] = 0; k[1] < volumes.nodes(1); ++k[1]) {
            if constexpr (D == 3) {
                for (k[2] = 0; k[2] < volumes.nodes(2); ++k[2]) {
                    visit(k);
                }
            } else {
                visit(k);
            }
        }
    }
}

/// Length, area and depth of what a grid covers: measures that its volumes must add up to.
template <int D>
void check_totals(const Grid<D>& grid, int shift)
{
    const bool round = grid.coordinates() == Coordinates::cylindrical;
    const double length = grid.faces(0).back() - grid.faces(0).front();
    const double inner = grid.faces(1).front();
    const double outer = grid.faces(1).back();
    const double depth = D == 3 ? grid.faces(D - 1).back() - grid.faces(D - 1).front() : 1;
    const double section = (round ? (outer * outer - inner * inner) / 2 : outer - inner) * depth;
    const ControlVolumes<D> volumes(grid, shift);
    double volume = 0;
    std::array<double, 3> lowest{}; // area of the lowest faces in every direction
    std::array<double, 3> highest{};
    for_each<D>(volumes, [&](std::array<int, D> k) {
        REQUIRE(volumes.volume(k) > 0);
        volume += volumes.volume(k);
        for (int d = 0; d < D; ++d) {
            if (k[d] == 0) {
                lowest[d] += volumes.area(d, k);
                std::array<int, D> above = k;
                above[d] = volumes.nodes(d);
                highest[d] += volumes.area(d, above);
            }
        }
    });
    INFO("shift " << shift << ", inner radius " << inner);
    CHECK(volume == Approx(section * length));
    CHECK(lowest[0] == Approx(section));
    CHECK(highest[0] == Approx(section));
    CHECK(lowest[1] == Approx((round ? inner : 1) * length * depth).margin(1e-15));
    CHECK(highest[1] == Approx((round ? outer : 1) * length * depth));
    if constexpr (D == 3) {
        CHECK(lowest[2] == Approx(length * (outer - inner)));
        CHECK(highest[2] == Approx(length * (outer - inner)));
    }
}

/// The vector areas of a volume add up to nothing: along x directly; across, by the divergence of the unit vector
/// along the radius, 1/r, whose integral over a volume is the area of its face of constant angle per unit of angle.
template <int D>
void check_closed(const Grid<D>& grid, int shift)
{
    const bool round = grid.coordinates() == Coordinates::cylindrical;
    const ControlVolumes<D> volumes(grid, shift);
    for_each<D>(volumes, [&](std::array<int, D> k) {
        for (int d = 0; d < D; ++d) {
            std::array<int, D> above = k;
            ++above[d];
            double difference = volumes.area(d, above) - volumes.area(d, k);
            double size = volumes.area(d, above);
            if (round && d == 1) {
                const double width = volumes.face[1][k[1] + 1] - volumes.face[1][k[1]];
                const double length = volumes.face[0][k[0] + 1] - volumes.face[0][k[0]];
                const double angle = D == 3 ? volumes.face[D - 1][k[D - 1] + 1] - volumes.face[D - 1][k[D - 1]] : 1;
                difference -= width * length * angle;
                if (D == 3) {
                    REQUIRE(volumes.area(D - 1, k) == Approx(width * length));
                }
            }
            REQUIRE(std::abs(difference) <= 1e-14 * size);
        }
    });
}

} // namespace

TEST_CASE("Cells and shifted volumes fill the grid, and their outer faces its sides", "[mesh]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        for (const double innermost : {0.0, 0.3}) {
            for (int shift = -1; shift < 3; ++shift) {
                check_totals(block(coordinates, innermost), shift);
                if (shift < 2) {
                    check_totals(plane(coordinates, innermost), shift);
                }
            }
        }
    }
}

TEST_CASE("Every volume is closed", "[mesh]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        for (int shift = -1; shift < 3; ++shift) {
            check_closed(block(coordinates, 0), shift);
            if (shift < 2) {
                check_closed(plane(coordinates, 0.3), shift);
            }
        }
    }
}

TEST_CASE("Nodes lie in the middle of cells, or on the faces where shifted, ghosts on the sides", "[mesh]")
{
    const Grid<2> grid = plane(Coordinates::cylindrical, 0.3);
    const ControlVolumes<2> shifted(grid, 1);
    CHECK(shifted.shift() == 1);
    CHECK(shifted.nodes(0) == 7);
    CHECK(shifted.nodes(1) == 7);
    CHECK(shifted.cells(1) == 6);
    for (int k = 0; k <= 6; ++k) {
        CHECK(shifted.node[1][k] == grid.faces(1)[k]);
        if (k > 0) {
            CHECK(shifted.face[1][k] == grid.centres(1)[k - 1]);
        }
    }
    CHECK(shifted.face[1][0] == grid.faces(1).front());
    CHECK(shifted.face[1][7] == grid.faces(1).back());
    for (int k = 0; k < 7; ++k) {
        CHECK(shifted.node[0][k] == grid.centres(0)[k]);
    }
    CHECK(shifted.node[0][-1] == grid.faces(0).front());
    CHECK(shifted.node[0][7] == grid.faces(0).back());
}

TEST_CASE("Conductances are areas over distances, and nothing where node and face coincide", "[mesh]")
{
    const Grid<3> grid = block(Coordinates::cylindrical, 0.3);
    const ControlVolumes<3> volumes(grid, 0);
    const auto conductance = [&](int d, std::array<int, 3> k) {
        double product = 1;
        for (int e = 0; e < 3; ++e) {
            product *= volumes.conductance_factor[d][e][k[e]];
        }
        return product;
    };
    for_each<3>(volumes, [&](std::array<int, 3> k) {
        for (int d = 0; d < 3; ++d) {
            double distance = volumes.node[d][k[d]] - volumes.node[d][k[d] - 1];
            if (d == 0 && k[0] == 0) {
                REQUIRE(conductance(0, k) == 0);
                continue;
            }
            distance *= d == 2 ? volumes.node[1][k[1]] : 1; // along the arc
            REQUIRE(conductance(d, k) == Approx(volumes.area(d, k) / distance));
        }
    });
    CHECK(conductance(0, {volumes.nodes(0), 2, 2}) == 0);
}
