#pragma once

#include "discrete_solution.hpp"

#include <array>
#include <cmath>

namespace leat::test {

/// An exact flow: velocity components and pressure at a point.
struct ExactFlow {
    std::array<Function, 2> velocity;
    Function pressure;
};

/// Mean absolute errors (weighted by volume) of both velocity components and the pressure. In a closed domain the
/// pressure is compared less its mean.
inline std::array<double, 3> mean_errors(const FlowCase& flow, const coupling::FlowState<2>& state,
                                         const ExactFlow& exact)
{
    const coupling::FlowEquations<2> equations(flow.grid, flow.problem);
    const field::Layout<2>& layout = equations.layout();
    std::array<double, 3> errors{};
    for (int c = 0; c < 2; ++c) {
        const mesh::ControlVolumes<2>& volumes = equations.momentum(c).volumes();
        const field::Box<2>& solved = equations.momentum(c).solved();
        double total = 0;
        for (int i = solved.begin[0]; i < solved.end[0]; ++i) {
            for (int j = solved.begin[1]; j < solved.end[1]; ++j) {
                const double wanted = exact.velocity[c](volumes.node[0][i], volumes.node[1][j]);
                total += volumes.volume({i, j});
                errors[c] += volumes.volume({i, j}) * std::abs(state.velocity[c][layout.index({i, j})] - wanted);
            }
        }
        errors[c] /= total;
    }
    field::Values wanted = state.pressure;
    const mesh::ControlVolumes<2>& cells = equations.cells();
    const auto each_cell = [&](const auto& visit) {
        for (int i = 0; i < flow.grid.cells(0); ++i) {
            for (int j = 0; j < flow.grid.cells(1); ++j) {
                visit(layout.index({i, j}), std::array<int, 2>{i, j});
            }
        }
    };
    each_cell([&](std::ptrdiff_t at, const std::array<int, 2>& k) {
        wanted[at] = exact.pressure(cells.node[0][k[0]], cells.node[1][k[1]]);
    });
    field::Values found = state.pressure;
    if (flow.problem.closed()) {
        wanted = without_mean(flow.grid, wanted);
        found = without_mean(flow.grid, found);
    }
    double total = 0;
    each_cell([&](std::ptrdiff_t at, const std::array<int, 2>& k) {
        total += cells.volume(k);
        errors[2] += cells.volume(k) * std::abs(found[at] - wanted[at]);
    });
    errors[2] /= total;
    return errors;
}

/// The order between two grids of which the second is twice as fine.
inline double observed_order(double coarse, double fine)
{
    return std::log2(coarse / fine);
}

} // namespace leat::test
