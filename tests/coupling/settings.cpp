#include "catch.hpp"
#include "coupling/flow_case.hpp"

#include <leat/base/error.hpp>
#include <leat/coupling/coupling.hpp>

using namespace leat;
using namespace leat::test;

TEST_CASE("Couplings are known by their names", "[settings]")
{
    for (const Coupling coupling : {Coupling::simple, Coupling::simplec, Coupling::lines}) {
        CHECK(coupling_named(name(coupling)) == coupling);
        const Relaxation relaxation = coupling::default_relaxation(coupling);
        CHECK((relaxation.velocity > 0 && relaxation.velocity <= 1));
        CHECK((relaxation.pressure > 0 && relaxation.pressure <= 1));
    }
    CHECK(name(Coupling::simple) == "simple");
    CHECK(name(Coupling::simplec) == "simplec");
    CHECK(name(Coupling::lines) == "lines");
    CHECK(!coupling_named("Simple"));
    CHECK(!coupling_named(""));
}

TEST_CASE("Every setting of a coupling out of its range is named", "[settings]")
{
    const FlowCase flow = lid_driven_cavity(4, 10);
    coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    const auto faults = [&](Coupling coupling, const coupling::Settings& settings) -> std::vector<std::string> {
        std::vector<std::string> fields;
        try {
            coupling::make_coupling(coupling, equations, settings);
        } catch (const InvalidInput& invalid) {
            for (const Fault& fault : invalid.faults()) {
                fields.push_back(fault.field);
            }
        }
        return fields;
    };
    using Fields = std::vector<std::string>;
    CHECK(faults(Coupling::simple, {}).empty());
    CHECK(faults(Coupling::lines, {}).empty());
    CHECK(faults(Coupling::lines, {{0, 1.5}, 2, 0.05, 30}) == Fields{"relaxation.velocity", "relaxation.pressure"});
    CHECK(faults(Coupling::simplec, {{std::nan(""), 1}, 0, 1, 0}) ==
          Fields{"relaxation.velocity", "momentum_sweeps", "pressure_tolerance", "pressure_iterations"});
    CHECK(faults(Coupling::simple, {{1, 1}, 1, std::nan(""), 1}) == Fields{"pressure_tolerance"});
}

TEST_CASE("Coupled lines want a grid of at least 2 x 2 cells", "[settings]")
{
    const FlowCase flow = lid_driven_cavity(1, 10);
    coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    CHECK_THROWS_AS(coupling::make_coupling(Coupling::lines, equations, {}), InvalidInput);
    CHECK_NOTHROW(coupling::make_coupling(Coupling::simple, equations, {}));
}

TEST_CASE("Flow equations refuse what they cannot hold", "[settings]")
{
    FlowCase flow = lid_driven_cavity(4, 10);
    flow.problem.density = 0;
    flow.problem.viscosity = std::nan("");
    flow.problem.sides[1][0] = coupling::FlowSide::open;
    try {
        coupling::FlowEquations<2> equations(flow.grid, flow.problem);
        FAIL("accepted");
    } catch (const InvalidInput& invalid) {
        REQUIRE(invalid.faults().size() == 3);
        CHECK(invalid.faults()[0].field == "density");
        CHECK(invalid.faults()[1].field == "viscosity");
        CHECK(invalid.faults()[2].field == "sides[1][0]");
    }
}
