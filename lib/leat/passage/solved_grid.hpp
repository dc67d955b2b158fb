#pragma once

#include <leat/passage/duct_flow.hpp>
#include <leat/passage/engineering_numbers.hpp>

namespace leat::passage {

/// A passage solved on one grid, and what was read off it.
struct SolvedGrid {
    DuctFlow flow;
    Readings readings;
    Numbers numbers;
    /// How far each number may be from the converged solution of this grid, in the order of computed_numbers();
    /// for an absent number 0. Empty unless the outcome is `converged`.
    std::vector<double> iteration_errors;
};

/// Solves on one grid. When that converges, goes on a little to see how much each number still moves and how fast the
/// imbalances fall: what is left is the movement/(1 - rate), with a factor for safety, and no less relative to the
/// value than a tenth of the imbalance. Then returns to the solution.
SolvedGrid solve_grid(const Passage& passage, const Derived& derived, const DuctGrid& grid, const Options& options,
                      const Observer& observer, const std::stop_token& stop);

} // namespace leat::passage
