#pragma once

#include "flow_case.hpp"

#include <leat/cascade/nested_solve.hpp>

#include <algorithm>
#include <cmath>

namespace leat::test {

/// Rules that ask for round-off: far below every error that a test looks at.
inline monitor::Rules strict_rules(double tolerance = 1e-12)
{
    monitor::Rules rules;
    rules.tolerance = tolerance;
    rules.patience = 500;
    rules.progress = 0.95;
    return rules;
}

/// How a test gets the solution of the discrete balances, and what it got.
struct Solution {
    cascade::Run<2> run;
    coupling::FlowState<2> state;
};

/// Solves a case in a cascade. source: of the balances, may be null. scales: of the imbalances; unset: duct.
inline Solution solve(const FlowCase& flow, const cascade::CascadeSettings& settings = {},
                      cascade::RunSettings run = {}, const coupling::FlowState<2>* source = nullptr)
{
    cascade::Cascade<2> cascade(flow.grid, flow.problem, flow.state, settings);
    cascade.set_source(source);
    Solution solution;
    solution.run = cascade::nested_solve(cascade, run);
    solution.state = cascade.state(0);
    return solution;
}

/// The cell values of a pressure field less their volume mean.
inline field::Values without_mean(const mesh::Grid<2>& grid, field::Values pressure)
{
    const mesh::ControlVolumes<2> cells(grid, mesh::ControlVolumes<2>::unshifted);
    const field::Layout<2> layout(grid.cells());
    double sum = 0;
    double volume = 0;
    for (int i = 0; i < grid.cells(0); ++i) {
        for (int j = 0; j < grid.cells(1); ++j) {
            sum += cells.volume({i, j}) * pressure[layout.index({i, j})];
            volume += cells.volume({i, j});
        }
    }
    for (double& p : pressure) {
        p -= sum / volume;
    }
    return pressure;
}

/// Largest differences of two states over all solved unknowns: velocities, pressure.
inline std::array<double, 2> largest_difference(const FlowCase& flow, const coupling::FlowState<2>& a,
                                                const coupling::FlowState<2>& b)
{
    const coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    const bool closed = flow.problem.closed();
    const field::Values pa = closed ? without_mean(flow.grid, a.pressure) : a.pressure;
    const field::Values pb = closed ? without_mean(flow.grid, b.pressure) : b.pressure;
    std::array<double, 2> largest{};
    for (int i = 0; i <= flow.grid.cells(0); ++i) {
        for (int j = 0; j <= flow.grid.cells(1); ++j) {
            const std::ptrdiff_t at = equations.layout().index({i, j});
            for (int c = 0; c < 2; ++c) {
                largest[0] = std::max(largest[0], std::abs(a.velocity[c][at] - b.velocity[c][at]));
            }
            if (i < flow.grid.cells(0) && j < flow.grid.cells(1)) {
                largest[1] = std::max(largest[1], std::abs(pa[at] - pb[at]));
            }
        }
    }
    return largest;
}

} // namespace leat::test
