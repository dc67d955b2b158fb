#pragma once

#include <leat/base/observer.hpp>
#include <leat/cascade/cascade.hpp>
#include <leat/monitor/imbalance.hpp>
#include <leat/monitor/judge.hpp>

#include <array>
#include <optional>
#include <stop_token>
#include <string>
#include <vector>

namespace leat::cascade {

/// How a cascade is run to convergence on its finest grid.
struct RunSettings {
    bool multigrid = true; ///< an iteration on the finest grid is a V cycle; false: one of the coupling alone
    monitor::Rules rules;  ///< for the finest grid
    int start_pairs =
        30; ///< most down-up pairs of sweeps on each coarse grid of a single-grid run, and on the coarsest
    double start_tolerance = 1e-4;         ///< imbalance at which a coarse grid is good enough to start from
    std::optional<monitor::Scales> scales; ///< empty: those of a duct flow, taken from the state
    Observer observer;                     ///< told after every iteration; its exceptions pass through
    std::stop_token stop;                  ///< polled after every iteration
};

/// One grid of a run.
template <int D>
struct GridRun {
    std::array<int, D> cells{};
    int iterations = 0;
    double seconds = 0;
};

/// What a run came to. The state is in the cascade, level 0.
template <int D>
struct Run {
    Outcome outcome = Outcome::stalled;
    std::string message;
    Imbalances imbalances;
    std::vector<GridRun<D>> grids; ///< coarsest first
    std::vector<HistoryRow> history;
};

/// Nested start from the coarsest grid (given up for the caller's guess when it does not stay finite), then iterations
/// on the finest until a rule fires. When the outcome is not `converged`, the best state seen (to within a factor of
/// ten of its imbalance) is left in the cascade.
template <int D>
Run<D> nested_solve(Cascade<D>& cascade, const RunSettings& settings);

extern template Run<2> nested_solve(Cascade<2>&, const RunSettings&);

} // namespace leat::cascade
