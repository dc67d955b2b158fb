#pragma once

#include <leat/cascade/error_band.hpp>
#include <leat/passage/solved_grid.hpp>

#include <vector>

namespace leat::passage {

/// A passage solved on nested grids, each halved in both directions from the next.
struct Refinement {
    std::vector<SolvedGrid> grids; ///< coarsest first; the last one gives the answer and alone keeps its state
    Numbers numbers;               ///< of the last grid, with bands when that one converged
    bool usable = false;           ///< the last grid converged
    /// That of the last grid; but out_of_budget when it converged and a wanted band is wider, with no finer grid left.
    Outcome outcome = Outcome::stalled;
    std::string message;
};

/// Solves from the coarsest of `grids` (nested_grids()) on, each by itself, until the wanted bands are met (Accuracy)
/// or there is no finer grid; with Options::cells on all of them. A grid that does not converge adds nothing to the
/// bands; unless it is one of the first two, or Options::cells is set, it ends the search.
Refinement solve_nested(const Passage& passage, const Derived& derived, const std::vector<DuctGrid>& grids,
                        const Accuracy& accuracy, const Options& options, const Observer& observer,
                        const std::stop_token& stop);

/// What a number on nested grids is known to, coarsest first (cascade::error_band). `place`: in computed_numbers().
std::vector<cascade::GridValue> values_on_grids(std::vector<SolvedGrid>& grids, std::size_t place);

} // namespace leat::passage
