#pragma once

#include <leat/cascade/nested_solve.hpp>
#include <leat/passage/grid_choice.hpp>
#include <leat/passage/inlet_profile.hpp>

#include <memory>
#include <string>

namespace leat::passage {

/// A passage's flow in units of D_h, u_m and density: density 1, mean velocity 1, viscosity 1/Re, pressure in
/// density u_m^2. Only these numbers enter, so that passages with equal Re and proportions give equal bits.
struct DuctFlow {
    DuctGrid grid;
    double reynolds_number = 0;
    std::unique_ptr<cascade::Cascade<2>> cascade; ///< level 0 holds the solution
    cascade::Run<2> run;
    bool multigrid = true; ///< an iteration of the run was a V cycle
    std::string fallback;  ///< what had to be changed to converge; empty: nothing

    const coupling::FlowState<2>& state() const { return cascade->state(0); }
    coupling::FlowEquations<2>& equations() const { return cascade->equations(0); }
};

/// Sets up and solves a valid passage on one grid (Options::cells has no say here).
DuctFlow solve_duct_flow(const Passage& passage, const Derived& derived, const DuctGrid& grid, const Options& options,
                         const Observer& observer, const std::stop_token& stop);

/// The scheme, sides and properties of the scaled flow.
coupling::FlowProblem<2> duct_problem(const Passage& passage, const Derived& derived, const Options& options);

/// The boundary values of the scaled flow, and as a first guess the inlet profile turning into the developed one.
coupling::FlowState<2> first_guess(const Passage& passage, const Derived& derived, const DuctGrid& grid);

} // namespace leat::passage
