#include "catch.hpp"
#include "duct.hpp"

#include <leat/passage/duct_flow.hpp>

#include <algorithm>
#include <cmath>

using namespace leat;
using namespace leat::published;

// Budgets over the whole grid, summed here from face velocities and pressures alone: what goes in, what comes out, and
// the force on the walls. They hold because neighbouring volumes share their fluxes; no volume is looked at by itself.

namespace {

/// Scaled duct flow (density 1, viscosity 1/Re) with what the sums need.
struct Section {
    const passage::DuctGrid& grid;
    const coupling::FlowEquations<2>& equations;
    double viscosity;
    bool wall_first; ///< at the lower position across; else an axis or the middle
    bool wall_last;

    int along() const { return equations.layout().cells[0]; }
    int across() const { return equations.layout().cells[1]; }
    double area(int j) const
    {
        const double mean_radius = grid.cylindrical ? 0.5 * (grid.across[j] + grid.across[j + 1]) : 1;
        return mean_radius * (grid.across[j + 1] - grid.across[j]);
    }
    double wall_friction(const coupling::FlowState<2>& state, int i) const // force per length at the axial face i
    {
        const auto& y = grid.across;
        const int last = across() - 1;
        const double first_radius = grid.cylindrical ? y[0] : 1;
        const double last_radius = grid.cylindrical ? y[last + 1] : 1;
        const double first_shear = velocity(state, i, 0) / (0.5 * (y[1] - y[0]));
        const double last_shear = velocity(state, i, last) / (0.5 * (y[last + 1] - y[last]));
        return viscosity * ((wall_first ? first_radius * first_shear : 0) + (wall_last ? last_radius * last_shear : 0));
    }
    double velocity(const coupling::FlowState<2>& state, int i, int j) const
    {
        return state.velocity[0][equations.layout().index({i, j})];
    }
};

/// Largest difference between the flow through any section and that through the inlet, by the latter.
double mass_defect(const Section& s, const coupling::FlowState<2>& state)
{
    double inlet = 0;
    double worst = 0;
    for (int i = 0; i <= s.along(); ++i) {
        double flow = 0;
        for (int j = 0; j < s.across(); ++j) {
            flow += s.area(j) * s.velocity(state, i, j);
        }
        inlet = i == 0 ? flow : inlet;
        worst = std::max(worst, std::abs(flow - inlet));
    }
    return worst / inlet;
}

/// The volumes of the axial velocity reach from the middle of the first cells to the end of the grid, where the
/// traction is zero. Defect of in = out + wall force, by what goes in.
double momentum_defect(const Section& s, const coupling::FlowState<2>& state)
{
    const std::vector<double>& x = s.grid.along;
    const int n = s.along();
    double in = 0;
    double out = 0;
    for (int j = 0; j < s.across(); ++j) {
        const double before = s.velocity(state, 0, j);
        const double behind = s.velocity(state, 1, j);
        const double middle = 0.5 * (before + behind);
        const double pressure = state.pressure[s.equations.layout().index({0, j})];
        in += s.area(j) * (middle * middle + pressure - s.viscosity * (behind - before) / (x[1] - x[0]));
        out += s.area(j) * s.velocity(state, n, j) * s.velocity(state, n, j);
    }
    double wall = 0;
    for (int i = 1; i <= n; ++i) {
        const double to = i < n ? 0.5 * (x[i] + x[i + 1]) : x[n];
        wall += s.wall_friction(state, i) * (to - 0.5 * (x[i - 1] + x[i]));
    }
    return std::abs(in - out - wall) / in;
}

void scale_section(field::Values& values, const Section& s, int i, double factor)
{
    for (int j = 0; j < s.across(); ++j) {
        values[s.equations.layout().index({i, j})] *= factor;
    }
}

void check_budgets(const Duct& duct, double bound)
{
    Options options;
    options.tolerance = 0.01 * bound;
    options.cells = {{160, 40}};
    const Passage passage = passage_of(duct);
    const Derived derived = derive(passage);
    const passage::DuctGrid grid = passage::make_grid(passage, derived, *options.cells);
    const passage::DuctFlow flow = passage::solve_duct_flow(passage, derived, grid, options, {}, {});
    INFO(duct.geometry << ", Re " << duct.reynolds_number << ": " << flow.run.message);
    REQUIRE(flow.run.outcome == Outcome::converged);
    const Section section = {flow.grid, flow.equations(), 1 / duct.reynolds_number, duct.geometry != "circular tube",
                             duct.geometry != "parallel plates"};
    CHECK(mass_defect(section, flow.state()) <= bound);
    CHECK(momentum_defect(section, flow.state()) <= bound);

    // A section whose flow, or inlet cells whose pressure, is wrong by a little must show.
    const double little = 1 + 1e3 * bound;
    coupling::FlowState<2> spoilt = flow.state();
    scale_section(spoilt.velocity[0], section, section.along() / 2, little);
    CHECK(mass_defect(section, spoilt) > bound);
    spoilt = flow.state();
    scale_section(spoilt.pressure, section, 0, little);
    CHECK(momentum_defect(section, spoilt) > bound);
    spoilt = flow.state();
    scale_section(spoilt.velocity[0], section, section.along(), little);
    CHECK(momentum_defect(section, spoilt) > bound);
}

void check_all(const Duct& base)
{
    for (const double re : {1.0, 100.0, 2000.0, 1e5}) {
        for (const Outlet outlet : {Outlet::continues, Outlet::cut}) {
            Duct duct = base;
            duct.reynolds_number = re;
            duct.length = std::max(2.0, 0.02 * re);
            duct.outlet = outlet;
            check_budgets(duct, re > 2000 ? 1e-8 : 1e-10);
        }
    }
}

} // namespace

TEST_CASE("Mass and momentum budgets of a tube close", "[published]")
{
    check_all({.geometry = "circular tube"});
}

TEST_CASE("Mass and momentum budgets of a channel close", "[published]")
{
    check_all({.geometry = "parallel plates"});
}

TEST_CASE("Mass and momentum budgets of an annulus close", "[published]")
{
    check_all({.geometry = "concentric annulus", .radius_ratio = 0.25});
}
