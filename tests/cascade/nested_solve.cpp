#include "catch.hpp"
#include "coupling/discrete_solution.hpp"

#include <algorithm>
#include <stdexcept>

using namespace leat;
using namespace leat::test;

namespace {

FlowCase tube(double reynolds = 100)
{
    return developing_duct(mesh::Coordinates::cylindrical, {64, 16}, reynolds, 9);
}

bool finite(const coupling::FlowState<2>& state)
{
    const auto all = [](const field::Values& values) {
        return std::all_of(values.begin(), values.end(), [](double value) { return std::isfinite(value); });
    };
    return all(state.velocity[0]) && all(state.velocity[1]) && all(state.pressure);
}

} // namespace

TEST_CASE("The history starts at iteration 0 on every grid and ends with the imbalances reported", "[nested]")
{
    for (const bool multigrid : {false, true}) {
        cascade::RunSettings run;
        run.multigrid = multigrid;
        run.rules = strict_rules(1e-9);
        int told = 0;
        run.observer = [&](const Progress& progress) {
            CHECK(progress.grid_count > 1);
            CHECK((progress.grid >= 0 && progress.grid < progress.grid_count));
            ++told;
        };
        const Solution solution = solve(tube(), {}, run);
        REQUIRE(solution.run.outcome == Outcome::converged);
        const auto& history = solution.run.history;
        CHECK(told == static_cast<int>(history.size()));
        int grid = -1;
        int iteration = 0;
        for (const HistoryRow& row : history) {
            if (row.grid != grid) {
                CHECK(row.grid == grid + 1);
                CHECK(row.iteration == 0);
                grid = row.grid;
            } else {
                CHECK(row.iteration == iteration + 1);
            }
            iteration = row.iteration;
        }
        CHECK(grid + 1 == static_cast<int>(solution.run.grids.size()));
        CHECK(solution.run.grids.back().cells == std::array{64, 16});
        CHECK(solution.run.grids.back().iterations == iteration);
        CHECK(history.back().imbalances.worst() == solution.run.imbalances.worst());
        CHECK(solution.run.imbalances.worst() <= 1e-9);
    }
}

TEST_CASE("A run that was cancelled before it began does nothing", "[nested]")
{
    std::stop_source stop;
    stop.request_stop();
    cascade::RunSettings run;
    run.stop = stop.get_token();
    const FlowCase flow = tube();
    const Solution solution = solve(flow, {}, run);
    CHECK(solution.run.outcome == Outcome::cancelled);
    CHECK(solution.run.message.find("cancelled") != std::string::npos);
    CHECK(solution.run.grids.back().iterations == 0);
    CHECK(solution.state.pressure == flow.state.pressure);
    CHECK(solution.state.velocity[0] == flow.state.velocity[0]);
}

TEST_CASE("An observer can cancel on any grid", "[nested]")
{
    for (const int grid : {0, 1, 3}) {
        for (const bool multigrid : {false, true}) {
            std::stop_source stop;
            cascade::RunSettings run;
            run.multigrid = multigrid;
            run.rules = strict_rules();
            run.stop = stop.get_token();
            int after = 0;
            run.observer = [&](const Progress& progress) {
                after += stop.stop_requested() ? 1 : 0;
                if (progress.grid == std::min(grid, progress.grid_count - 1) && progress.iteration == 1) {
                    stop.request_stop();
                }
            };
            const Solution solution = solve(tube(), {}, run);
            INFO("grid " << grid << ", cascade " << multigrid << ", " << after << " looks later");
            CHECK(solution.run.outcome == Outcome::cancelled);
            CHECK(after <= 2);
            CHECK(finite(solution.state));
        }
    }
}

TEST_CASE("What an observer throws passes through, and the cascade can go on", "[nested]")
{
    struct Enough : std::runtime_error {
        using std::runtime_error::runtime_error;
    };
    const FlowCase flow = tube();
    cascade::Cascade<2> cascade(flow.grid, flow.problem, flow.state, {});
    cascade::RunSettings run;
    run.rules = strict_rules(1e-9);
    run.observer = [](const Progress& progress) {
        if (progress.grid == 2) {
            throw Enough("enough");
        }
    };
    CHECK_THROWS_AS(cascade::nested_solve(cascade, run), Enough);
    run.observer = {};
    CHECK(cascade::nested_solve(cascade, run).outcome == Outcome::converged);
}

TEST_CASE("A set-up that cannot converge ends within bounds, in a finite state", "[nested]")
{
    for (const bool closed : {false, true}) {
        for (const Coupling coupling : {Coupling::simple, Coupling::simplec, Coupling::lines}) {
            for (const bool multigrid : {false, true}) {
                FlowCase flow = closed ? lid_driven_cavity(32, 1e6) : tube(1e8);
                cascade::CascadeSettings settings;
                settings.coupling = coupling;
                settings.coupling_settings.relaxation = {1, 1};
                cascade::RunSettings run;
                run.multigrid = multigrid;
                run.rules.iterations = 300;
                if (closed) {
                    run.scales = monitor::Scales{1, 1};
                }
                const Solution solution = solve(flow, settings, run);
                INFO(name(coupling) << ", closed " << closed << ", cascade " << multigrid << ": "
                                    << solution.run.message);
                CHECK(solution.run.grids.back().iterations <= 300);
                CHECK(finite(solution.state));
                CHECK(std::isfinite(solution.run.imbalances.worst()));
                CHECK(!solution.run.message.empty());
                // the best state is kept, to within the factor of ten that spares copies
                const auto& history = solution.run.history;
                const auto first = std::find_if(history.begin(), history.end(), [&](const HistoryRow& row) {
                    return row.grid == history.back().grid && row.iteration == 0;
                });
                CHECK(solution.run.imbalances.worst() <= 10 * first->imbalances.worst());
                if (closed && coupling == Coupling::lines) {
                    CHECK(solution.run.outcome == Outcome::diverged);
                }
            }
        }
    }
}

TEST_CASE("Three iterations are not enough, and that is said", "[nested]")
{
    cascade::RunSettings run;
    run.multigrid = false;
    run.rules.iterations = 3;
    const Solution solution = solve(tube(), {}, run);
    CHECK(solution.run.outcome == Outcome::out_of_budget);
    CHECK(solution.run.grids.back().iterations == 3);
}

TEST_CASE("A start that goes astray on a coarse grid is given up for the caller's guess", "[nested]")
{
    // Re 1000 with hardly any damping: the coarse grids grow to 1e60 and beyond while still finite.
    cascade::CascadeSettings settings;
    settings.coupling_settings.relaxation = {0.9, 0.9};
    cascade::RunSettings run;
    run.scales = monitor::Scales{1, 1};
    const Solution solution = solve(lid_driven_cavity(64, 1000), settings, run);
    CHECK(solution.run.imbalances.worst() < 10);
}
