#include "catch.hpp"
#include "coupling/discrete_solution.hpp"

// Budgets drawn up from the solution alone, without the residuals of the library: what goes in comes out, and the
// forces on the fluid balance its gain of momentum.

using namespace leat;
using namespace leat::test;

namespace {

struct Budget {
    double mass = 0;     ///< (inflow - outflow)/inflow
    double momentum = 0; ///< (net outflow - force)/(inflow of momentum + pressure force at the inlet)
};

/// Of a duct with an open end. Momentum: over the union of the solved volumes of the axial velocity, from the middle of
/// the first cells to the end.
Budget budget(const FlowCase& flow, const coupling::FlowState<2>& state)
{
    const mesh::Grid<2>& grid = flow.grid;
    const mesh::ControlVolumes<2> cells(grid, mesh::ControlVolumes<2>::unshifted);
    const mesh::ControlVolumes<2> axial(grid, 0);
    const field::Layout<2> layout(grid.cells());
    const int last = grid.cells(0);
    const int n = grid.cells(1);
    const double density = flow.problem.density;
    const double viscosity = flow.problem.viscosity;
    const auto u = [&](int i, int j) { return state.velocity[0][layout.index({i, j})]; };
    const auto v = [&](int i, int j) { return state.velocity[1][layout.index({i, j})]; };
    double inflow = 0;
    double outflow = 0;
    double entering = 0;
    double gain = 0;
    double pressure = 0;
    double force = 0;
    for (int j = 0; j < n; ++j) {
        const double area = cells.area(0, {0, j});
        inflow += density * area * u(0, j);
        outflow += density * area * u(last, j);
        entering += density * area * u(0, j) * u(0, j);
        const double middle = 0.5 * (u(0, j) + u(1, j));
        gain += density * area * (u(last, j) * u(last, j) - middle * middle);
        pressure += area * state.pressure[layout.index({0, j})]; // p = 0 and no viscous flux at the end
        force -= viscosity * area * (u(1, j) - u(0, j)) / (axial.node[0][1] - axial.node[0][0]);
    }
    force += pressure;
    for (int side = 0; side < 2; ++side) {
        if (flow.problem.sides[1][side] != coupling::FlowSide::fixed) {
            continue;
        }
        const int face = side == 0 ? 0 : n;
        const int inside = side == 0 ? 0 : n - 1;
        const int beyond = side == 0 ? -1 : n;
        for (int i = 1; i <= last; ++i) {
            const double area = axial.area(1, {i, face});
            const double distance = std::abs(axial.node[1][beyond] - axial.node[1][inside]);
            force -= viscosity * area * (u(i, inside) - u(i, beyond)) / distance;
            gain += (side == 0 ? -1 : 1) * density * area * v(std::min(i, last - 1), face) * u(i, beyond);
        }
    }
    return {(inflow - outflow) / inflow, (gain - force) / (entering + std::abs(pressure))};
}

Solution solved(const FlowCase& flow)
{
    cascade::RunSettings run;
    run.rules = strict_rules(1e-13);
    run.rules.patience = 12; // round-off may be reached before the tolerance
    return solve(flow, {}, run);
}

} // namespace

TEST_CASE("Mass and momentum budgets of tube and channel close to 1e-10 up to Re 2000, to 1e-8 at 1e5", "[budget]")
{
    for (const auto coordinates : {mesh::Coordinates::cylindrical, mesh::Coordinates::cartesian}) {
        for (const double reynolds : {1.0, 10.0, 100.0, 2000.0, 1e5}) {
            const FlowCase flow = developing_duct(coordinates, {80, 20}, reynolds, long_enough(coordinates, reynolds));
            const Solution solution = solved(flow);
            const Budget closed = budget(flow, solution.state);
            INFO("Re " << reynolds << ", mass " << closed.mass << ", momentum " << closed.momentum << "; "
                       << solution.run.message);
            const double bound = reynolds > 2000 ? 1e-8 : 1e-10;
            CHECK(std::abs(closed.mass) < bound);
            CHECK(std::abs(closed.momentum) < bound);
        }
    }
}

TEST_CASE("Budgets show a velocity or pressure that is off by 1e-7", "[budget]")
{
    const FlowCase flow = developing_duct(mesh::Coordinates::cylindrical, {80, 20}, 100, 9);
    Solution solution = solved(flow);
    const field::Layout<2> layout(flow.grid.cells());
    coupling::FlowState<2> spoilt = solution.state;
    spoilt.velocity[0][layout.index({80, 10})] += 1e-7;
    CHECK(std::abs(budget(flow, spoilt).mass) > 1e-10);
    spoilt = solution.state;
    spoilt.pressure[layout.index({0, 10})] += 1e-7;
    CHECK(std::abs(budget(flow, spoilt).momentum) > 1e-10);
}

TEST_CASE("A duct that is fed backwards has scales above zero all the same", "[budget]")
{
    FlowCase flow = developing_duct(mesh::Coordinates::cartesian, {16, 8}, 50, 2);
    for (double& velocity : flow.state.velocity[0]) {
        velocity = -velocity;
    }
    coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    CHECK(monitor::duct_scales<2>(equations, flow.state).mass == Approx(0.25));
}

TEST_CASE("Imbalances are sums of sizes over the solved volumes, divided by the scales", "[budget]")
{
    const FlowCase flow = developing_duct(mesh::Coordinates::cartesian, {16, 8}, 50, 2);
    coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    const field::Layout<2> layout(flow.grid.cells());
    coupling::FlowState<2> residual(layout);
    residual.pressure[layout.index({3, 3})] = -2;
    residual.pressure[layout.index({4, 3})] = 1;
    residual.pressure[layout.index({-1, 3})] = 100; // a ghost place
    residual.velocity[0][layout.index({2, 2})] = 4;
    residual.velocity[0][layout.index({0, 2})] = 100; // the inlet face is given
    residual.velocity[1][layout.index({2, 0})] = 100; // so is the wall
    residual.velocity[1][layout.index({2, 1})] = -6;
    const Imbalances found = monitor::imbalances<2>(equations, residual, {3, 5});
    CHECK(found.mass == Approx(1));
    CHECK(found.momentum == Approx(2));
    // a flat inlet of unit velocity and density over a height of 1/4; the guess falls linearly to 0 beyond the end
    const monitor::Scales scales = monitor::duct_scales<2>(equations, flow.state);
    CHECK(scales.mass == Approx(0.25));
    const double drop = flow.state.pressure[layout.index({0, 0})] - flow.state.pressure[layout.index({15, 0})];
    CHECK(scales.momentum == Approx(0.25 + 0.25 * drop));
}
