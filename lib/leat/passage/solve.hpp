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
Answer solve(const Passage& passage, const Accuracy& accuracy = {}, const Options& options = {},
             const Observer& observer = {}, std::stop_token stop = {});

/// What solve() would do, without doing it.
struct Plan {
    Derived derived;
    std::vector<std::array<int, 2>> grids; ///< coarsest first: cells along (tail included) and across
    double first_cell_along = 0;           ///< m, on the finest grid, at the inlet
    double first_cell_across = 0;          ///< m, on the finest grid, at the wall
    double tail_length = 0;                ///< m solved beyond the end; 0 when cut
    double memory_bytes = 0;               ///< about
    HandbookEstimate handbook;
    std::string regime{};                ///< "laminar: Re 111 is below 2300 (...)"
    std::vector<std::string> cautions; ///< those that are known before solving
};

/// Throws InvalidInput as solve() does.
Plan plan(const Passage& passage, const Accuracy& accuracy = {}, const Options& options = {});

} // namespace leat
