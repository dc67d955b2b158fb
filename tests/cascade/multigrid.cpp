#include "catch.hpp"
#include "coupling/discrete_solution.hpp"

using namespace leat;
using namespace leat::test;

TEST_CASE("The cascade reaches the answer of the single grid", "[multigrid]")
{
    for (const auto coordinates : {mesh::Coordinates::cylindrical, mesh::Coordinates::cartesian}) {
        const FlowCase flow = developing_duct(coordinates, {64, 16}, 200, long_enough(coordinates, 200));
        cascade::RunSettings run;
        run.rules = strict_rules(1e-12);
        const Solution cascade = solve(flow, {}, run);
        run.multigrid = false;
        const Solution single = solve(flow, {}, run);
        INFO(cascade.run.message << "; " << single.run.message);
        REQUIRE(cascade.run.outcome == Outcome::converged);
        REQUIRE(single.run.outcome == Outcome::converged);
        CHECK(cascade.run.grids.size() > 2);
        const auto [velocity, pressure] = largest_difference(flow, cascade.state, single.state);
        CHECK(velocity < 1e-9);
        CHECK(pressure < 1e-9);
        CHECK(cascade.run.grids.back().iterations < single.run.grids.back().iterations);
    }
}

TEST_CASE("A cycle reduces the imbalance to less than a fifth: tube and channel, Re 10 to 2000, 160 x 40",
          "[multigrid]")
{
    for (const auto coordinates : {mesh::Coordinates::cylindrical, mesh::Coordinates::cartesian}) {
        for (const double reynolds : {10.0, 100.0, 500.0, 2000.0}) {
            const FlowCase flow = developing_duct(coordinates, {160, 40}, reynolds, long_enough(coordinates, reynolds));
            cascade::RunSettings run;
            run.rules.tolerance = 1e-10;
            const Solution solution = solve(flow, {}, run);
            REQUIRE(solution.run.outcome == Outcome::converged);
            const int cycles = solution.run.grids.back().iterations;
            const double first = solution.run.history[solution.run.history.size() - 1 - cycles].imbalances.worst();
            const double factor = std::pow(solution.run.imbalances.worst() / first, 1.0 / cycles);
            INFO((coordinates == mesh::Coordinates::cylindrical ? "tube" : "channel")
                 << ", Re " << reynolds << ": " << cycles << " cycles, factor " << factor);
            CHECK(factor < 0.2);
        }
    }
}

TEST_CASE("The cascade halves the axis alone where cells are short, and stops at its least sizes", "[multigrid]")
{
    const FlowCase flow = developing_duct(mesh::Coordinates::cylindrical, {160, 40}, 10, 2);
    cascade::Cascade<2> cascade(flow.grid, flow.problem, flow.state, {});
    REQUIRE(cascade.levels() >= 3);
    for (int level = 1; level < cascade.levels(); ++level) {
        const std::array<int, 2> finer = cascade.equations(level - 1).grid().cells();
        const std::array<int, 2> cells = cascade.equations(level).grid().cells();
        INFO("level " << level << ": " << cells[0] << " x " << cells[1]);
        CHECK((cells[0] == finer[0] || 2 * cells[0] == finer[0]));
        CHECK((cells[1] == finer[1] || 2 * cells[1] == finer[1]));
        CHECK(cells != finer);
        CHECK(cells[0] >= 8);
        CHECK(cells[1] >= 4);
    }
    CHECK(cascade.equations(1).grid().cells() == std::array{80, 40});
    cascade::CascadeSettings coarse;
    coarse.least_along = 160;
    coarse.least_across = 40;
    CHECK(cascade::Cascade<2>(flow.grid, flow.problem, flow.state, coarse).levels() == 1);
}

TEST_CASE("A source on the finest grid is what its balances are driven to", "[multigrid]")
{
    const FlowCase flow = developing_duct(mesh::Coordinates::cartesian, {32, 16}, 50, 2);
    coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    coupling::FlowState<2> source(equations.layout());
    for (double& force : source.velocity[0]) {
        force = 1e-3;
    }
    cascade::RunSettings run;
    run.rules = strict_rules(1e-12);
    const Solution solution = solve(flow, {}, run, &source);
    REQUIRE(solution.run.outcome == Outcome::converged);
    coupling::FlowState<2> residual(equations.layout());
    equations.residual(solution.state, nullptr, residual);
    for (int i = 1; i <= 32; ++i) {
        CHECK(std::abs(residual.velocity[0][equations.layout().index({i, 5})] - 1e-3) < 1e-11);
    }
}
