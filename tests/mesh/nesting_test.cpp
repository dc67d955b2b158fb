#include "catch.hpp"

#include "gradings.hpp"

#include <leat/base/error.hpp>
#include <leat/mesh/control_volumes.hpp>

#include <limits>
#include <vector>

using namespace leat;
using namespace leat::mesh;

TEST_CASE("Every coarse cell is exactly the union of fine cells, for all gradings", "[mesh]")
{
    for (const NamedGrading& g : gradings()) {
        INFO(g.name);
        for (const double start : {0.0, 0.37}) {
            for (const int cells : {1, 5, 10, 12, 33, 80}) {
                const std::vector<double> coarse = sample(g.map, cells, start, 1.9);
                for (const int times : {2, 4, 8, 16}) {
                    const std::vector<double> fine = sample(g.map, times * cells, start, 1.9);
                    for (int k = 0; k <= cells; ++k) {
                        REQUIRE(fine[std::size_t(times) * std::size_t(k)] == coarse[std::size_t(k)]); // to the last bit
                    }
                }
            }
        }
    }
}

TEST_CASE("The nesting check notices a map that is not sampled from one function", "[mesh]")
{
    // Geometric growth by a fixed factor from cell to cell does not nest.
    const auto growing = [](int cells) {
        std::vector<double> faces = {0};
        double width = 1;
        for (int k = 0; k < cells; ++k, width *= 1.2) {
            faces.push_back(faces.back() + width);
        }
        for (double& face : faces) {
            face /= faces.back();
        }
        return faces;
    };
    CHECK(growing(16)[8] != growing(8)[4]);
}

namespace {

template <int D>
std::array<int, D> doubled(std::array<int, D> k, const std::array<bool, D>& halve)
{
    for (int d = 0; d < D; ++d) {
        k[d] *= halve[d] ? 2 : 1;
    }
    return k;
}

/// Volumes and areas of a coarsened grid against the sums over the finer cells that it joins.
template <int D>
void check_sums(const Grid<D>& grid, const std::array<bool, D>& halve)
{
    const Grid<D> coarsened = grid.coarsened(halve);
    const ControlVolumes<D> fine(grid, ControlVolumes<D>::unshifted);
    const ControlVolumes<D> coarse(coarsened, ControlVolumes<D>::unshifted);
    std::array<int, D> k{};
    const auto sum = [&](int normal, const auto& of) { // over the finer cells, or faces across `normal`
        double total = 0;
        const std::array<int, D> first = doubled<D>(k, halve);
        for (int part = 0; part < (1 << D); ++part) {
            std::array<int, D> at = first;
            bool counts = true;
            for (int d = 0; d < D; ++d) {
                const bool second = (part >> d) % 2 == 1;
                counts = counts && !(second && (!halve[d] || d == normal));
                at[d] += second ? 1 : 0;
            }
            total += counts ? of(at) : 0;
        }
        return total;
    };
    const int last = D == 3 ? coarse.nodes(2) : 1;
    for (k[0] = 0; k[0] < coarse.nodes(0); ++k[0]) {
        for (k[1] = 0; k[1] < coarse.nodes(1); ++k[1]) {
            for (int j = 0; j < last; ++j) {
                if constexpr (D == 3) {
                    k[2] = j;
                }
                REQUIRE(sum(-1, [&](const auto& at) { return fine.volume(at); }) == Approx(coarse.volume(k)));
                for (int d = 0; d < D; ++d) {
                    REQUIRE(sum(d, [&](const auto& at) { return fine.area(d, at); }) ==
                            Approx(coarse.area(d, k)).margin(1e-15));
                }
            }
        }
    }
}

} // namespace

TEST_CASE("The metrics of a coarsened grid are sums over the cells that it joins", "[mesh]")
{
    for (const Coordinates coordinates : {Coordinates::cartesian, Coordinates::cylindrical}) {
        const auto x = sample(towards_start(1.5), 12, 0, 3);
        const auto y = sample(towards_both(1.2), 8, 0, 1);
        const auto z = sample(towards_end(0.7), 6, -0.2, 1.1);
        const Grid<2> plane(coordinates, {x, y});
        check_sums<2>(plane, {true, true});
        check_sums<2>(plane, {true, false});
        check_sums<2>(plane, {false, true});
        const Grid<3> space(coordinates, {x, y, z});
        check_sums<3>(space, {true, true, true});
        check_sums<3>(space, {false, true, false});
        check_sums<3>(space, {true, false, true});
    }
}

TEST_CASE("A coarsened grid keeps every second face to the last bit, and odd counts are refused", "[mesh]")
{
    const Grid<2> grid(Coordinates::cartesian,
                       {sample(towards_start(2), 20, 0, 7), sample(towards_both(2), 15, 0.1, 0.9)});
    CHECK(grid.can_coarsen(0));
    CHECK_FALSE(grid.can_coarsen(1));
    const Grid<2> coarse = grid.coarsened({true, false});
    CHECK(coarse.faces(0) == sample(towards_start(2), 10, 0, 7));
    CHECK(coarse.faces(1) == grid.faces(1));
    CHECK(coarse.centres(0)[3] == 0.5 * (coarse.faces(0)[3] + coarse.faces(0)[4]));
    CHECK_THROWS_AS(grid.coarsened({false, true}), InvalidInput);
}

TEST_CASE("A grid refuses faces that make no cells, all faults in one pass", "[mesh]")
{
    const auto faults = [](Coordinates coordinates, std::vector<double> x, std::vector<double> y) {
        try {
            const Grid<2> grid(coordinates, {std::move(x), std::move(y)});
        } catch (const InvalidInput& error) {
            return error.faults().size();
        }
        return std::size_t{0};
    };
    const double infinity = std::numeric_limits<double>::infinity();
    CHECK(faults(Coordinates::cartesian, {0, 1}, {-1, 1}) == 0);
    CHECK(faults(Coordinates::cylindrical, {-1, 1}, {0, 1}) == 0);
    CHECK(faults(Coordinates::cylindrical, {0, 1}, {-1, 1}) == 1);
    CHECK(faults(Coordinates::cartesian, {0}, {1, 1}) == 2);
    CHECK(faults(Coordinates::cartesian, {}, {0, infinity}) == 2);
    CHECK(faults(Coordinates::cartesian, {0, 2, 1}, {std::numeric_limits<double>::quiet_NaN(), 1}) == 2);
}
