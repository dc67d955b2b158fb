#include "catch.hpp"
#include "coupling/discrete_solution.hpp"

#include <optional>
#include <vector>

// The discrete solution belongs to the balances, not to the way in which it was found (a requirement of Patankar 1980,
// section 4.2, on under-relaxation): every coupling, with any relaxation, reaches the same one.

using namespace leat;
using namespace leat::test;

namespace {

struct Way {
    Coupling coupling;
    Relaxation relaxation;
    bool multigrid;
};

void require_same(const FlowCase& flow, const std::vector<Way>& ways, std::optional<monitor::Scales> scales)
{
    std::optional<coupling::FlowState<2>> first;
    for (const Way& way : ways) {
        cascade::CascadeSettings settings;
        settings.coupling = way.coupling;
        settings.coupling_settings.relaxation = way.relaxation;
        cascade::RunSettings run;
        run.multigrid = way.multigrid;
        run.scales = scales;
        run.rules = strict_rules(1e-12);
        const Solution solution = solve(flow, settings, run);
        INFO(name(way.coupling) << " " << way.relaxation.velocity << " " << way.relaxation.pressure << ": "
                                << solution.run.message);
        CHECK(solution.run.outcome == Outcome::converged);
        if (!first) {
            first = solution.state;
            continue;
        }
        const auto [velocity, pressure] = largest_difference(flow, *first, solution.state);
        INFO("differences " << velocity << " " << pressure);
        CHECK(velocity < 1e-8);
        CHECK(pressure < 1e-8);
    }
}

} // namespace

TEST_CASE("SIMPLE, SIMPLEC and lines reach one solution in a tube, whatever the relaxation", "[couplings]")
{
    const auto tube = mesh::Coordinates::cylindrical;
    require_same(developing_duct(tube, {64, 16}, 100, long_enough(tube, 100)),
                 {{Coupling::lines, {0.9, 0.9}, true},
                  {Coupling::lines, {0.9, 0.9}, false},
                  {Coupling::lines, {0.6, 0.7}, false},
                  {Coupling::simple, {0.8, 0.2}, false},
                  {Coupling::simple, {0.6, 0.3}, false},
                  {Coupling::simplec, {0.95, 1}, false},
                  {Coupling::simplec, {0.8, 0.9}, false}},
                 std::nullopt);
}

TEST_CASE("SIMPLE, SIMPLEC and lines reach one solution in a closed cavity, whatever the relaxation", "[couplings]")
{
    require_same(lid_driven_cavity(16, 100),
                 {{Coupling::simplec, {0.9, 1}, false},
                  {Coupling::simplec, {0.8, 1}, true},
                  {Coupling::simple, {0.8, 0.2}, false},
                  {Coupling::simple, {0.7, 0.3}, false},
                  {Coupling::lines, {0.9, 0.9}, true},
                  {Coupling::lines, {0.7, 0.7}, false},
                  {Coupling::lines, {0.5, 0.5}, false}},
                 monitor::Scales{1, 1});
}

TEST_CASE("Solutions of two problems are told apart", "[couplings]")
{
    cascade::RunSettings run;
    run.scales = monitor::Scales{1, 1};
    const FlowCase flow = lid_driven_cavity(16, 100);
    const Solution one = solve(flow, {}, run);
    const Solution other = solve(lid_driven_cavity(16, 100.001), {}, run);
    CHECK(largest_difference(flow, one.state, other.state)[0] > 1e-8);
}
