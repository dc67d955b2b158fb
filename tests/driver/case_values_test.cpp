#include "catch.hpp"

#include "sample_case.hpp"

using namespace leat;
using leat::driver::CaseFile;
using leat::driver::read_case_file;

namespace {

const std::string channel_case = "[passage]\nshape = channel\ngap = 0.4 mm\nlength = 60 mm\noutlet = cut\n"
                                 "stations = 1 mm, 20 mm,60 mm\n"
                                 "[fluid]\ndensity = 1.2 kg/m^3\nkinematic_viscosity = 15 mm^2/s\n"
                                 "[inlet]\nprofile = developed\nflow_rate = 96 L/min/m\n[accuracy]\nband = 0.1 "
                                 "%\nband_on = development_length , core_velocity_ratio\n"
                                 "[numerics]\nscheme_along = quick\nscheme_across = van_leer\ncoupling = simplec\n"
                                 "cells = 320x48\nrelaxation = 0.8 0.25\niterations = 77\ntolerance = 1e-8\n";

const std::string annulus_case = "[passage]\nshape = annulus\ninner_diameter = 20 mm\nouter_diameter = 20.6 mm\n"
                                 "length = 12 mm\n[fluid]\ndensity = 850 kg/m^3\nviscosity = 12 cP\n"
                                 "[inlet]\nreynolds_number = 44\n";

CaseFile read(const std::string& text)
{
    const ScratchFolder folder;
    return read_case_file(folder.file("my.first.case", text));
}

} // namespace

TEST_CASE("a tube is read as stated")
{
    const CaseFile of = read(tube_case);
    CHECK(of.name == "my.first");
    CHECK(of.text == tube_case);
    const Tube& tube = std::get<Tube>(of.passage.shape);
    CHECK(tube.diameter == Approx(8e-3).epsilon(1e-15));
    CHECK(tube.length == 1.5);
    CHECK(of.passage.fluid.density == 865);
    CHECK(of.passage.fluid.viscosity.value() == Approx(28e-3).epsilon(1e-15));
    CHECK_FALSE(of.passage.fluid.kinematic_viscosity.has_value());
    CHECK(of.passage.inlet.mean_velocity.value() == 0.45);
    CHECK(of.passage.inlet.profile == InletProfile::flat);
    CHECK(of.passage.outlet == Outlet::continues);
    CHECK(of.accuracy.band == Accuracy{}.band);
    CHECK(of.accuracy.band_on.empty());
    CHECK(of.options.cell_budget == Options{}.cell_budget);
    CHECK(of.options.iterations == Options{}.iterations);
    CHECK(of.options.tolerance == Options{}.tolerance);
}

TEST_CASE("every key of a case reaches its member")
{
    const CaseFile of = read(channel_case);
    const Channel& channel = std::get<Channel>(of.passage.shape);
    CHECK(channel.gap == Approx(0.4e-3).epsilon(1e-15));
    CHECK(channel.length == Approx(60e-3).epsilon(1e-15));
    CHECK(of.passage.outlet == Outlet::cut);
    CHECK(of.passage.fluid.kinematic_viscosity.value() == Approx(15e-6).epsilon(1e-14));
    CHECK(of.passage.inlet.profile == InletProfile::developed);
    CHECK(of.passage.inlet.flow_rate.value() == Approx(1.6e-3).epsilon(1e-14));
    CHECK(of.accuracy.band == Approx(1e-3).epsilon(1e-14));
    CHECK(of.accuracy.band_on == std::vector<std::string>{"development_length", "core_velocity_ratio"});
    CHECK(of.options.scheme_along == Scheme::quick);
    CHECK(of.options.scheme_across == Scheme::van_leer);
    CHECK(of.options.coupling == Coupling::simplec);
    CHECK(of.options.cells == std::array<int, 2>{320, 48});
    CHECK(of.options.relaxation.value().velocity == 0.8);
    CHECK(of.options.relaxation.value().pressure == 0.25);
    CHECK(of.options.iterations == 77);
    CHECK(of.options.tolerance == 1e-8);
    REQUIRE(of.options.stations.size() == 3);
    CHECK(of.options.stations[1] == Approx(0.02).epsilon(1e-15));

    const CaseFile other = read(annulus_case);
    const Annulus& annulus = std::get<Annulus>(other.passage.shape);
    CHECK(annulus.inner_diameter == Approx(20e-3).epsilon(1e-15));
    CHECK(annulus.outer_diameter == Approx(20.6e-3).epsilon(1e-15));
    CHECK(other.passage.inlet.reynolds_number.value() == 44);

    const CaseFile mass = read(with(tube_case, "mean_velocity = 0.45 m/s", "mass_flow_rate = 36 kg/h"));
    CHECK(mass.passage.inlet.mass_flow_rate.value() == Approx(0.01).epsilon(1e-14));
}

TEST_CASE("every scheme and coupling is known by its name")
{
    const std::vector<std::pair<std::string, Scheme>> schemes{
        {"upwind", Scheme::upwind}, {"central", Scheme::central},   {"power_law", Scheme::power_law},
        {"minmod", Scheme::minmod}, {"van_leer", Scheme::van_leer}, {"linear_upwind", Scheme::linear_upwind},
        {"quick", Scheme::quick}};
    for (const auto& [name, scheme] : schemes) {
        CHECK(read(tube_case + "[numerics]\nscheme_along = " + name + "\n").options.scheme_along == scheme);
        CHECK(read(tube_case + "[numerics]\nscheme_across = " + name + "\n").options.scheme_across == scheme);
    }
    const std::vector<std::pair<std::string, Coupling>> couplings{
        {"simple", Coupling::simple}, {"simplec", Coupling::simplec}, {"lines", Coupling::lines}};
    for (const auto& [name, coupling] : couplings) {
        CHECK(read(tube_case + "[numerics]\ncoupling = " + name + "\n").options.coupling == coupling);
    }
}

TEST_CASE("values that the library refuses are told on the line of their key")
{
    CHECK(faults_of_text(with(tube_case, "8 mm", "0 mm")) ==
          Messages{"a.case:4: [passage] diameter = 0 mm: must be finite and > 0 m"});
    CHECK(faults_of_text(with(tube_case, "1.5 m", "-1.5 m")) ==
          Messages{"a.case:5: [passage] length = -1.5 m: must be finite and > 0 m"});
    CHECK(faults_of_text(with(tube_case, "0.45 m/s", "-0.45 m/s")) ==
          Messages{"a.case:11: [inlet] mean_velocity = -0.45 m/s: must be finite and > 0 m/s"});
    CHECK(faults_of_text(with(tube_case, "8 mm", "nan mm")) ==
          Messages{"a.case:4: [passage] diameter = nan mm: nan is not a finite number; a length is needed, such as 8 "
                   "mm"});
    CHECK(faults_of_text(with(tube_case, "8 mm", "1e400 mm")) ==
          Messages{"a.case:4: [passage] diameter = 1e400 mm: 1e400 is beyond the range of numbers (1e-307 to 1e308); a "
                   "length is needed, such as 8 mm"});
    CHECK(faults_of_text(with(annulus_case, "20.6 mm", "20 mm")) ==
          Messages{"a.case:4: [passage] outer_diameter = 20 mm: must be > inner_diameter, which is 0.02 m"});
    CHECK(faults_of_text(with(annulus_case, "= 44", "= nan")) ==
          Messages{"a.case:10: [inlet] reynolds_number = nan: nan is not a finite number"});
    CHECK(faults_of_text(with(annulus_case, "= 44", "= 44 m")) ==
          Messages{"a.case:10: [inlet] reynolds_number = 44 m: a plain number is needed, without unit"});
}

TEST_CASE("numerics that make no sense")
{
    const std::string more = tube_case + "[numerics]\n";
    CHECK(faults_of_text(more + "cells = 160\n") ==
          Messages{"a.case:13: [numerics] cells = 160: cells along and across are needed, such as 160 x 40"});
    CHECK(faults_of_text(more + "cells = 161 x 40\n").size() == 1);
    CHECK(faults_of_text(more + "relaxation = 0.9\n") ==
          Messages{"a.case:13: [numerics] relaxation = 0.9: two factors, for velocity and pressure, are needed, such "
                   "as 0.9 0.3"});
    CHECK(faults_of_text(more + "iterations = 2.5\n") ==
          Messages{"a.case:13: [numerics] iterations = 2.5: a whole number is needed, such as 500"});
    CHECK(faults_of_text(more + "iterations = 99999999999\n").size() == 1);
    CHECK(faults_of_text(more + "iterations = 0\n") == Messages{"a.case:13: [numerics] iterations = 0: must be >= 1"});
    CHECK(faults_of_text(tube_case + "[accuracy]\nband = 0.2\n") ==
          Messages{"a.case:13: [accuracy] band = 0.2: has no unit; a ratio is needed, such as 0.2 %"});
    CHECK(faults_of_text(with(tube_case, "length", "stations = 1 m, 2\nlength")) ==
          Messages{"a.case:5: [passage] stations, '2': has no unit; a length is needed, such as 2 mm"});
    CHECK(faults_of_text(with(tube_case, "length", "stations = 1 m, 2 m\nlength")).size() == 1);
}

TEST_CASE("all faults of a case come in one pass, in the order of their lines")
{
    CHECK(faults_of_text("[passage]\nshape = tube\ndiametre = 8 mm\nlength = 0 m\n[fluid]\ndensity = 865\n"
                         "viscosity = 28 bar\nviscosity = 2 cP\n[inlet]\nmean_velocity = 1 m/s\nflow_rate = -1 L/min\n"
                         "[numerics]\ntolerance = 1\n") ==
          Messages{"a.case:1: [passage] has no 'diameter', which shape = tube needs; write diameter = 8 mm",
                   "a.case:3: unknown key 'diametre' in [passage]; did you mean 'diameter'?",
                   "a.case:4: [passage] length = 0 m: must be finite and > 0 m",
                   "a.case:6: [fluid] density = 865: has no unit; a density is needed, such as 865 kg/m^3",
                   "a.case:7: [fluid] viscosity = 28 bar: 'bar' is a pressure (m-1.kg.s-2); a dynamic viscosity is "
                   "needed, such as mPa.s",
                   "a.case:8: 'viscosity' was already given in line 7; keep one of the two",
                   "a.case:11: 'flow_rate' states the flow again after 'mean_velocity' in line 10; keep exactly one",
                   "a.case:13: [numerics] tolerance = 1: must be within 1e-14 .. 0.01"});
}
