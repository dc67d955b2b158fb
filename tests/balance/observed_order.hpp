#pragma once

#include "catch.hpp"

#include "manufactured_run.hpp"

#include <cmath>
#include <string>

/// Errors on nested grids, the iteration checked on each, and the order that the last two show.
struct Orders {
    std::vector<Measured> grids;
    double last() const { return std::log2(grids[grids.size() - 2].error / grids.back().error); }
    std::string text() const
    {
        std::string all;
        for (const Measured& grid : grids) {
            all += Catch::Detail::stringify(grid.error) + " (" + std::to_string(grid.iterations) + ") ";
        }
        return all + "order " + Catch::Detail::stringify(last()) + ", cell Peclet " +
               Catch::Detail::stringify(grids.back().smallest_peclet) + " to " +
               Catch::Detail::stringify(grids.front().largest_peclet);
    }
};

/// grid(n): the grid of n times as many cells as the coarsest has. tolerance: by which the residual must fall.
template <int D, class MakeGrid>
Orders observe(const Manufactured<D>& problem, int shift, const typename ManufacturedRun<D>::Setup& setup, int grids,
               const MakeGrid& grid, double tolerance = 1e-11)
{
    Orders orders;
    for (int n = 1; n < 1 << grids; n *= 2) {
        ManufacturedRun<D> run(problem, grid(n), shift, setup);
        const Measured measured = run.solve(tolerance);
        CHECK(measured.reduction <= tolerance);
        CHECK(measured.iteration_error < 1e-3 * measured.error);
        CHECK(measured.imbalance < 1e-13);
        orders.grids.push_back(measured);
    }
    return orders;
}
