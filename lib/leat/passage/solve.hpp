#pragma once

#include <leat/base/observer.hpp>
#include <leat/passage/answer.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>

#include <array>
#include <stop_token>
#include <string>
#include <vector>

namespace leat {

/// Solves the steady, incompressible, laminar Navier-Stokes equations in the passage.
/// Throws InvalidInput, listing every fault of all three arguments, before any work starts.
/// Never prints; keeps no global state; may be called from several threads at once.
/// Not converging is no exception: Answer::outcome says so.
/// Works on nested grids, each halved in both directions from the next, until the wanted bands are met (Accuracy) or
/// the next grid would exceed Options::cell_budget; the answer is that of the finest.
Answer solve(const Passage& passage, const Accuracy& accuracy = {}, const Options& options = {},
             const Observer& observer = {}, std::stop_token stop = {});

/// What solve() would do, without doing it.
struct Plan {
    Derived derived;
    /// Coarsest first: cells along (tail included) and across, each halved in both directions from the next. Without
    /// Options::cells the last is an estimate of where the wanted band will be met.
    std::vector<std::array<int, 2>> grids;
    double first_cell_along = 0;  ///< m, on the finest grid, at the inlet
    double first_cell_across = 0; ///< m, on the finest grid, at the wall
    double tail_length = 0;       ///< m solved beyond the end; 0 when cut
    double memory_bytes = 0;      ///< about
    HandbookEstimate handbook;
    std::string regime{};              ///< "laminar: Re 111 is below 2300 (...)"
    std::vector<std::string> cautions; ///< those that are known before solving
};

/// Throws InvalidInput as solve() does.
Plan plan(const Passage& passage, const Accuracy& accuracy = {}, const Options& options = {});

} // namespace leat
