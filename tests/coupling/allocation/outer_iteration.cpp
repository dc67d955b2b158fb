#include "catch.hpp"
#include "coupling/flow_case.hpp"
#include "support/allocation_counter.hpp"

#include <leat/coupling/coupling.hpp>

// What the counter sees and misses is tested beside it; here it must stay still.

using namespace leat;
using namespace leat::test;

TEST_CASE("No allocation inside an outer iteration of any coupling", "[allocation]")
{
    for (const bool closed : {false, true}) {
        const FlowCase flow =
            closed ? lid_driven_cavity(24, 100) : developing_duct(mesh::Coordinates::cylindrical, {48, 16}, 100, 5);
        coupling::FlowEquations<2> equations(flow.grid, flow.problem);
        for (const Coupling which : {Coupling::simple, Coupling::simplec, Coupling::lines}) {
            const auto coupling = coupling::make_coupling(which, equations, {});
            coupling::FlowState<2> state = flow.state;
            const coupling::FlowState<2> source(equations.layout());
            INFO(name(which) << ", closed " << closed);
            for (const bool backwards : {false, true}) {
                const long long before = allocations().count;
                coupling->iterate(state, nullptr, backwards);
                coupling->iterate(state, &source, backwards);
                const long long made = allocations().count - before;
                CHECK(made == 0);
            }
        }
    }
}
