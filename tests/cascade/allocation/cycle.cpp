#include "catch.hpp"
#include "coupling/flow_case.hpp"
#include "support/allocation_counter.hpp"

#include <leat/cascade/cascade.hpp>

using namespace leat;
using namespace leat::test;

TEST_CASE("No allocation inside a cycle or an iteration of the cascade", "[allocation]")
{
    for (const Coupling coupling : {Coupling::lines, Coupling::simplec}) {
        const FlowCase flow = developing_duct(mesh::Coordinates::cylindrical, {64, 16}, 100, 9);
        cascade::CascadeSettings settings;
        settings.coupling = coupling;
        cascade::Cascade<2> cascade(flow.grid, flow.problem, flow.state, settings);
        REQUIRE(cascade.levels() > 2);
        const long long before = allocations().count;
        cascade.cycle(cascade.levels() - 2);
        cascade.start_from_coarser(0);
        cascade.iterate(0, true);
        cascade.cycle(0);
        cascade.residual(0);
        const long long made = allocations().count - before;
        INFO(name(coupling));
        CHECK(made == 0);
    }
}
