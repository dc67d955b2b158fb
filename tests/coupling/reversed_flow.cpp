#include "catch.hpp"
#include "coupling/discrete_solution.hpp"

#include <algorithm>
#include <optional>

// Flow against the main direction, inside and through the open end, with sliding walls: every coupling converges to the
// same answer.

using namespace leat;
using namespace leat::test;

namespace {

struct Reversal {
    double inside = 0; ///< least axial velocity before the end
    double end = 0;    ///< and on the open end
};

/// A duct of length x gap with fixed sides across, an open end, and an inlet profile over y in [first, last].
FlowCase duct(mesh::Coordinates coordinates, double length, std::array<double, 2> gap, double viscosity,
              const Function& axial_velocity)
{
    using coupling::FlowSide;
    const std::array<int, 2> cells = {48, 16};
    FlowCase flow{mesh::Grid<2>(coordinates, {mesh::sample(mesh::towards_start(1), cells[0], 0, length),
                                              mesh::sample(mesh::uniform(), cells[1], gap[0], gap[1])}),
                  {},
                  coupling::FlowState<2>(field::Layout<2>(cells))};
    flow.problem.viscosity = viscosity;
    flow.problem.sides = {{{FlowSide::fixed, FlowSide::open}, {FlowSide::fixed, FlowSide::fixed}}};
    flow.problem.schemes = {Scheme::linear_upwind, Scheme::central};
    set_velocity(flow.grid, flow.state, 0, axial_velocity);
    return flow;
}

Reversal same_in_all(const FlowCase& flow)
{
    std::optional<coupling::FlowState<2>> first;
    for (const Coupling coupling : {Coupling::lines, Coupling::simple, Coupling::simplec}) {
        for (const bool multigrid : {false, true}) {
            cascade::CascadeSettings settings;
            settings.coupling = coupling;
            settings.coupling_settings.relaxation = coupling == Coupling::lines ? Relaxation{0.5, multigrid ? 0.5 : 1}
                                                    : coupling == Coupling::simple ? Relaxation{0.7, 0.3}
                                                                                   : Relaxation{0.8, 1};
            cascade::RunSettings run;
            run.multigrid = multigrid;
            run.rules = strict_rules(1e-12);
            const Solution solution = solve(flow, settings, run);
            INFO(name(coupling) << (multigrid ? ", cascade: " : ": ") << solution.run.message);
            CHECK(solution.run.outcome == Outcome::converged);
            if (!first) {
                first = solution.state;
            }
            CHECK(largest_difference(flow, *first, solution.state)[0] < 1e-8);
            CHECK(largest_difference(flow, *first, solution.state)[1] < 1e-8);
        }
    }
    Reversal reversal;
    const std::array<int, 2> cells = flow.grid.cells();
    for (int i = 1; i <= cells[0]; ++i) {
        for (int j = 0; j < cells[1]; ++j) {
            double& least = i == cells[0] ? reversal.end : reversal.inside;
            least = std::min(least, first->velocity[0][field::Layout<2>(cells).index({i, j})]);
        }
    }
    return reversal;
}

} // namespace

TEST_CASE("Backflow along a wall that slides against the flow, in through the open end", "[reversed]")
{
    const Reversal plane = same_in_all(duct(mesh::Coordinates::cartesian, 3, {0, 1}, 0.02, [](double x, double y) {
        return x == 0 ? 6 * y * (1 - y) : (y == 1 ? -1.0 : 0.0);
    }));
    CHECK(plane.inside < -0.3);
    CHECK(plane.end < -0.3);
    const Reversal annulus =
        same_in_all(duct(mesh::Coordinates::cylindrical, 3, {0.5, 1.5}, 0.02, [](double x, double r) {
            return x == 0 ? 6 * (r - 0.5) * (1.5 - r) : (r == 0.5 ? -1.0 : 0.0);
        }));
    CHECK(annulus.inside < -0.3);
    CHECK(annulus.end < -0.3);
}

TEST_CASE("A jet along one wall leaves an eddy beside it", "[reversed]")
{
    const auto jet = [](double x, double y) { return x == 0 && y > 0.5 ? 24 * (y - 0.5) * (1 - y) : 0.0; };
    const Reversal whole = same_in_all(duct(mesh::Coordinates::cartesian, 8, {0, 1}, 0.02, jet));
    CHECK(whole.inside < -0.05);
    CHECK(whole.end >= 0);
    const Reversal cut = same_in_all(duct(mesh::Coordinates::cartesian, 0.6, {0, 1}, 0.02, jet));
    CHECK(cut.inside < -0.05);
    CHECK(cut.end < -0.01);
}
