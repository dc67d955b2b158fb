#include "catch.hpp"
#include "passage_cases.hpp"

#include <limits>
#include <set>

using namespace leat;
using leat::test::oil_in;
using leat::test::oil_line;

namespace {

std::multiset<std::string> fields(const std::vector<Fault>& faults)
{
    std::multiset<std::string> names;
    for (const Fault& fault : faults) {
        UNSCOPED_INFO(fault.text());
        names.insert(fault.field);
    }
    return names;
}

using Names = std::multiset<std::string>;
constexpr double not_a_number = std::numeric_limits<double>::quiet_NaN();
constexpr double infinity = std::numeric_limits<double>::infinity();

} // namespace

TEST_CASE("A valid passage has no fault, in every shape and with every statement of the flow", "[faults]")
{
    CHECK(faults_of(oil_line()).empty());
    CHECK(faults_of(oil_in(Channel{2e-3, 0.1})).empty());
    CHECK(faults_of(oil_in(Annulus{4e-3, 8e-3, 0.1})).empty());
    for (const auto statement : {&Inlet::flow_rate, &Inlet::mass_flow_rate, &Inlet::reynolds_number}) {
        Passage passage = oil_line();
        passage.inlet.mean_velocity.reset();
        passage.inlet.*statement = 0.01;
        CHECK(faults_of(passage).empty());
    }
    Passage kinematic = oil_line();
    kinematic.fluid.viscosity.reset();
    kinematic.fluid.kinematic_viscosity = 3e-5;
    CHECK(faults_of(kinematic).empty());
}

TEST_CASE("Every fault of a passage is found in one pass", "[faults]")
{
    Passage passage;
    passage.shape = Tube{.diameter = -8e-3, .length = 0};
    passage.fluid = {.density = not_a_number, .viscosity = 0.0, .kinematic_viscosity = infinity};
    passage.inlet.mean_velocity = -1;
    passage.inlet.flow_rate = 0;
    passage.inlet.profile = InletProfile::table;
    CHECK(fields(faults_of(passage)) == Names{"shape.diameter", "shape.length", "fluid.density", "fluid.viscosity",
                                              "fluid.kinematic_viscosity",              // its value
                                              "fluid.kinematic_viscosity",              // one too many
                                              "inlet.mean_velocity", "inlet.flow_rate", // their values
                                              "inlet.flow_rate",                        // one too many
                                              "inlet.table"});                          // missing
    CHECK_THROWS_AS(derive(passage), InvalidInput);
}

TEST_CASE("Statements of flow and viscosity must be exactly one", "[faults]")
{
    Passage none = oil_line();
    none.inlet.mean_velocity.reset();
    none.fluid.viscosity.reset();
    CHECK(fields(faults_of(none)) == Names{"fluid.viscosity", "inlet.mean_velocity"});

    Passage two = oil_line();
    two.inlet.reynolds_number = 100;
    const auto faults = faults_of(two);
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].text() == "inlet.reynolds_number: mean_velocity and reynolds_number are given; give exactly one of "
                              "mean_velocity, flow_rate, mass_flow_rate, reynolds_number");
}

TEST_CASE("Faults of the other shapes are named after their members", "[faults]")
{
    CHECK(fields(faults_of(oil_in(Channel{0, infinity}))) == Names{"shape.gap", "shape.length"});
    CHECK(fields(faults_of(oil_in(Annulus{0, -1, 1}))) == Names{"shape.inner_diameter", "shape.outer_diameter"});
    CHECK(fields(faults_of(oil_in(Annulus{8e-3, 8e-3, 1}))) == Names{"shape.outer_diameter"});
    CHECK(fields(faults_of(oil_in(Annulus{9e-3, 8e-3, 1}))) == Names{"shape.outer_diameter"});
}

TEST_CASE("A Reynolds number beyond reach is a fault of the statement that leads to it", "[faults]")
{
    Passage passage = oil_line();
    passage.inlet.mean_velocity = 1e9;
    const auto faults = faults_of(passage);
    REQUIRE(fields(faults) == Names{"inlet.mean_velocity"});
    CHECK(faults[0].valid.find("Reynolds number") != std::string::npos);
    CHECK(faults[0].valid.find("density 865 kg/m^3") != std::string::npos);

    passage.inlet.mean_velocity = 1e-9;
    CHECK(fields(faults_of(passage)) == Names{"inlet.mean_velocity"});
    passage.inlet.mean_velocity.reset();
    passage.inlet.reynolds_number = 1.0001e7;
    CHECK(fields(faults_of(passage)) == Names{"inlet.reynolds_number"});
    passage.inlet.reynolds_number = 1e7;
    CHECK(faults_of(passage).empty());
    passage.inlet.reynolds_number = 1e-6;
    CHECK(faults_of(passage).empty());

    // What overflows or vanishes on the way is a fault too, never a passage with an infinite or zero member.
    CHECK(fields(faults_of(oil_in(Tube{1e-200, 1}))) == Names{"shape"});
    CHECK(fields(faults_of(oil_in(Tube{1e200, 1}))) == Names{"shape"});
    passage.fluid.viscosity = 1e300;
    passage.inlet.reynolds_number = 1e7;
    CHECK(fields(faults_of(passage)) == Names{"inlet.reynolds_number"});
}

TEST_CASE("A table belongs to its profile", "[faults]")
{
    Passage passage = oil_line();
    passage.inlet.table = VelocityTable{{0, 4e-3}, {1, 0}};
    CHECK(fields(faults_of(passage)) == Names{"inlet.table"});
    passage.inlet.profile = InletProfile::table;
    CHECK(faults_of(passage).empty());
    passage.inlet.table.reset();
    CHECK(fields(faults_of(passage)) == Names{"inlet.table"});
}

TEST_CASE("A table must be sound and cover its section", "[faults]")
{
    Passage passage = oil_line();
    passage.inlet.profile = InletProfile::table;
    const auto count = [&passage](const Shape& shape, VelocityTable table) {
        passage.shape = shape;
        passage.inlet.table = std::move(table);
        const auto names = fields(faults_of(passage));
        CHECK(names.count("inlet.table") == names.size());
        return names.size();
    };
    const Tube tube{8e-3, 1};
    CHECK(count(tube, {{0, 2e-3, 4e-3}, {2, 1.5, 0}}) == 0);
    CHECK(count(tube, {{2e-9, 2e-3, 4e-3 * (1 + 5e-7)}, {2, 1.5, 0}}) == 0);
    CHECK(count(tube, {{0, 2e-3, 4e-3 * (1 + 2e-6)}, {2, 1.5, 0}}) == 1);
    CHECK(count(tube, {{1e-4, 2e-3, 4e-3}, {2, 1.5, 0}}) == 1);
    CHECK(count(tube, {{0, 4e-3 * (1 + 1e-7), 4e-3 * (1 + 2e-7)}, {2, 1.5, 0}}) == 1);
    CHECK(count(tube, {{0, 2e-3, 2e-3, 4e-3}, {2, 1.5, 1.5, 0}}) == 1);
    CHECK(count(tube, {{0, 2e-3, 4e-3}, {2, 1.5}}) == 1);
    CHECK(count(tube, {{0}, {1}}) == 1);
    CHECK(count(tube, {{0, not_a_number, 4e-3}, {2, 1, 0}}) == 1);
    CHECK(count(tube, {{0, 2e-3, 4e-3}, {2, infinity, 0}}) == 1);
    CHECK(count(tube, {{0, 2e-3, 4e-3}, {0, 0, 0}}) == 1);
    CHECK(count(tube, {{0, 2e-3, 4e-3}, {-2, -1, 0}}) == 1);

    const Channel channel{2e-3, 1};
    CHECK(count(channel, {{0, 1e-3}, {0, 1}}) == 0);
    CHECK(count(channel, {{0, 1e-3, 2e-3}, {0, 1, 0}}) == 0);
    CHECK(count(channel, {{0, 0.5e-3, 1.5e-3, 2e-3}, {0, 1, 1 + 5e-7, 0}}) == 0);
    CHECK(count(channel, {{0, 0.5e-3, 1.5e-3, 2e-3}, {0, 1, 1 + 5e-6, 0}}) == 1);
    CHECK(count(channel, {{0, 0.7e-3}, {0, 1}}) == 1);

    const Annulus annulus{4e-3, 8e-3, 1};
    CHECK(count(annulus, {{2e-3, 3e-3, 4e-3}, {0, 1, 0}}) == 0);
    CHECK(count(annulus, {{0, 3e-3, 4e-3}, {0, 1, 0}}) == 1);
}
