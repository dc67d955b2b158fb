#include "catch.hpp"
#include "coupling/flow_case.hpp"

#include <leat/cascade/transfer.hpp>

#include <random>

using namespace leat;
using namespace leat::test;

namespace {

/// A pair of nested grids with every place of the fine state filled at random.
struct Pair {
    explicit Pair(mesh::Coordinates coordinates, std::array<bool, 2> halve)
        : flow(developing_duct(coordinates, {16, 8}, 100, 3)), fine(flow.grid, flow.problem),
          coarse(flow.grid.coarsened(halve), flow.problem), transfer(fine, coarse), coarse_state(coarse.layout())
    {
        std::mt19937_64 random(7);
        std::uniform_real_distribution<double> uniform(-1, 1);
        for (auto* values : {&flow.state.velocity[0], &flow.state.velocity[1], &flow.state.pressure}) {
            for (double& value : *values) {
                value = uniform(random);
            }
        }
    }

    FlowCase flow;
    coupling::FlowEquations<2> fine, coarse;
    cascade::Transfer<2> transfer;
    coupling::FlowState<2> coarse_state;
};

template <class Check>
void for_every_pair(const Check& check)
{
    for (const auto coordinates : {mesh::Coordinates::cartesian, mesh::Coordinates::cylindrical}) {
        for (const std::array<bool, 2> halve :
             {std::array{true, true}, std::array{true, false}, std::array{false, true}}) {
            INFO("cylindrical " << (coordinates == mesh::Coordinates::cylindrical) << ", halved " << halve[0]
                                << halve[1]);
            Pair pair(coordinates, halve);
            check(pair, halve);
        }
    }
}

double sum(const field::Layout<2>& layout, const field::Box<2>& box, const field::Values& values)
{
    double total = 0;
    for (int i = box.begin[0]; i < box.end[0]; ++i) {
        for (int j = box.begin[1]; j < box.end[1]; ++j) {
            total += values[layout.index({i, j})];
        }
    }
    return total;
}

} // namespace

TEST_CASE("Restricted velocities carry the same mass flow through every coarse face, boundary faces included",
          "[transfer]")
{
    for_every_pair([](Pair& pair, const std::array<bool, 2>& halve) {
        pair.transfer.restrict_state(pair.flow.state, pair.coarse_state);
        const std::array<int, 2> cells = pair.coarse.grid().cells();
        for (int d = 0; d < 2; ++d) {
            const int e = 1 - d;
            for (int face = 0; face <= cells[d]; ++face) {
                for (int k = 0; k < cells[e]; ++k) {
                    std::array<int, 2> coarse{};
                    coarse[d] = face;
                    coarse[e] = k;
                    double flow = 0;
                    for (int part = 0; part < (halve[e] ? 2 : 1); ++part) {
                        std::array<int, 2> fine{};
                        fine[d] = halve[d] ? 2 * face : face;
                        fine[e] = halve[e] ? 2 * k + part : k;
                        flow += pair.fine.cells().area(d, fine) *
                                pair.flow.state.velocity[d][pair.fine.layout().index(fine)];
                    }
                    const double found = pair.coarse.cells().area(d, coarse) *
                                         pair.coarse_state.velocity[d][pair.coarse.layout().index(coarse)];
                    CHECK(std::abs(found - flow) < 1e-14);
                }
            }
        }
    });
}

TEST_CASE("Restricted residuals keep their sums", "[transfer]")
{
    for_every_pair([](Pair& pair, const std::array<bool, 2>&) {
        // What the outermost shifted volumes share with given boundary nodes is lost to those; so leave them empty.
        coupling::FlowState<2> residual = pair.flow.state;
        for (int c = 0; c < 2; ++c) {
            const field::Box<2>& solved = pair.fine.momentum(c).solved();
            for (int i = -1; i <= pair.flow.grid.cells(0) + 1; ++i) {
                for (int j = -1; j <= pair.flow.grid.cells(1) + 1; ++j) {
                    const std::array<int, 2> k = {i, j};
                    const bool inner = k[c] > solved.begin[c] && (k[c] < solved.end[c] - 1 || c == 0);
                    if (!inner || k[1 - c] < 0 || k[1 - c] >= pair.flow.grid.cells(1 - c) || k[c] >= solved.end[c]) {
                        residual.velocity[c][pair.fine.layout().index(k)] = 0;
                    }
                }
            }
        }
        pair.transfer.restrict_residual(residual, pair.coarse_state);
        for (int c = 0; c < 2; ++c) {
            const double before = sum(pair.fine.layout(), pair.fine.momentum(c).solved(), residual.velocity[c]);
            const double after =
                sum(pair.coarse.layout(), pair.coarse.momentum(c).solved(), pair.coarse_state.velocity[c]);
            INFO("component " << c);
            CHECK(after == Approx(before).margin(1e-13));
        }
        CHECK(sum(pair.coarse.layout(), pair.coarse.cell_box(), pair.coarse_state.pressure) ==
              Approx(sum(pair.fine.layout(), pair.fine.cell_box(), residual.pressure)).margin(1e-13));
    });
}

TEST_CASE("Prolongation reproduces linear fields between given sides, and adds when told to", "[transfer]")
{
    for_every_pair([](Pair& pair, const std::array<bool, 2>& halve) {
        const Function linear = [](double x, double y) { return 2 + 3 * x - 5 * y; };
        coupling::FlowState<2> fine(pair.fine.layout());
        for (int c = 0; c < 2; ++c) {
            set_velocity(pair.coarse.grid(), pair.coarse_state, c, linear);
        }
        const mesh::ControlVolumes<2>& coarse_cells = pair.coarse.cells();
        for (int i = 0; i < pair.coarse.grid().cells(0); ++i) {
            for (int j = 0; j < pair.coarse.grid().cells(1); ++j) {
                pair.coarse_state.pressure[pair.coarse.layout().index({i, j})] =
                    linear(coarse_cells.node[0][i], coarse_cells.node[1][j]);
            }
        }
        const bool twice = halve[0] && halve[1];
        pair.transfer.prolong(pair.coarse_state, fine, false);
        if (twice) {
            pair.transfer.prolong(pair.coarse_state, fine, true);
        }
        int compared = 0;
        for (int c = 0; c <= 2; ++c) {
            const mesh::ControlVolumes<2>& volumes = c < 2 ? pair.fine.momentum(c).volumes() : pair.fine.cells();
            const field::Box<2> box = c < 2 ? pair.fine.momentum(c).solved() : pair.fine.cell_box();
            const field::Values& values = c < 2 ? fine.velocity[c] : fine.pressure;
            // beside sides whose value is not known the value is carried over, not extrapolated
            for (int i = box.begin[0] + 1; i < box.end[0] - 1; ++i) {
                for (int j = box.begin[1] + 1; j < box.end[1] - 1; ++j) {
                    // a direction that is not halved keeps its places
                    const double x = volumes.node[0][i];
                    const double y = volumes.node[1][j];
                    const double wanted = (twice ? 2 : 1) * linear(x, y);
                    CHECK(std::abs(values[pair.fine.layout().index({i, j})] - wanted) < 1e-12);
                    ++compared;
                }
            }
        }
        CHECK(compared > 200);
    });
}
