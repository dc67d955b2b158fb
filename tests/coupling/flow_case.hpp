#pragma once

#include <leat/coupling/flow_equations.hpp>
#include <leat/mesh/grading.hpp>

#include <cmath>
#include <functional>
#include <vector>

namespace leat::test {

using Faces = std::vector<double>;
using Function = std::function<double(double, double)>; ///< of x and y (or r)

/// A flow with its grid, boundary values and first guess.
struct FlowCase {
    mesh::Grid<2> grid;
    coupling::FlowProblem<2> problem;
    coupling::FlowState<2> state;
};

/// Puts values at every place of velocity component c, ghosts on the sides included.
inline void set_velocity(const mesh::Grid<2>& grid, coupling::FlowState<2>& state, int c, const Function& value)
{
    const mesh::ControlVolumes<2> volumes(grid, c);
    const field::Layout<2> layout(grid.cells());
    for (int i = c == 0 ? 0 : -1; i <= grid.cells(0); ++i) {
        for (int j = c == 1 ? 0 : -1; j <= grid.cells(1); ++j) {
            state.velocity[c][layout.index({i, j})] = value(volumes.node[0][i], volumes.node[1][j]);
        }
    }
}

/// Puts mean velocities on the faces, from a stream function: mass is then balanced to round-off.
/// Cartesian: u = d psi/dy, v = -d psi/dx; cylindrical: r u = d psi/dr, r v = -d psi/dx.
inline void set_stream(const mesh::Grid<2>& grid, coupling::FlowState<2>& state, const Function& psi)
{
    const mesh::ControlVolumes<2> cells(grid, mesh::ControlVolumes<2>::unshifted);
    const field::Layout<2> layout(grid.cells());
    const Faces& x = grid.faces(0);
    const Faces& y = grid.faces(1);
    for (int i = 0; i <= grid.cells(0); ++i) {
        for (int j = 0; j <= grid.cells(1); ++j) {
            const std::ptrdiff_t at = layout.index({i, j});
            if (j < grid.cells(1)) {
                state.velocity[0][at] = (psi(x[i], y[j + 1]) - psi(x[i], y[j])) / cells.area(0, {i, j});
            }
            if (i < grid.cells(0)) {
                const double area = cells.area(1, {i, j});
                state.velocity[1][at] = area > 0 ? -(psi(x[i + 1], y[j]) - psi(x[i], y[j])) / area : 0;
            }
        }
    }
}

/// A flat inlet of unit velocity into a tube of unit diameter (cylindrical) or a channel of gap 1/2 (Cartesian, lower
/// half), so that the hydraulic diameter is 1 in both and 1/viscosity is the Reynolds number.
inline FlowCase developing_duct(mesh::Coordinates coordinates, std::array<int, 2> cells, double reynolds, double length)
{
    using coupling::FlowSide;
    const bool tube = coordinates == mesh::Coordinates::cylindrical;
    const Faces x = mesh::sample(mesh::towards_start(3), cells[0], 0, length);
    const Faces y = tube ? mesh::sample(mesh::towards_end(1.2), cells[1], 0, 0.5)
                         : mesh::sample(mesh::towards_start(1.2), cells[1], 0, 0.25);
    FlowCase flow{mesh::Grid<2>(coordinates, {x, y}), {}, coupling::FlowState<2>(field::Layout<2>(cells))};
    flow.problem.viscosity = 1 / reynolds;
    flow.problem.sides = {{{FlowSide::fixed, FlowSide::open}, {FlowSide::symmetry, FlowSide::fixed}}};
    if (!tube) {
        flow.problem.sides[1] = {FlowSide::fixed, FlowSide::symmetry};
    }
    flow.problem.schemes = {Scheme::linear_upwind, Scheme::central};
    set_velocity(flow.grid, flow.state, 0, [&](double, double at) {
        return flow.problem.sides[1][at == 0 ? 0 : 1] == FlowSide::fixed && (at == y.front() || at == y.back()) ? 0 : 1;
    });
    const field::Layout<2> layout(cells);
    for (int i = 0; i < cells[0]; ++i) {
        for (int j = 0; j < cells[1]; ++j) {
            flow.state.pressure[layout.index({i, j})] =
                (tube ? 32 : 48) / reynolds * (length - 0.5 * (x[i] + x[i + 1]));
        }
    }
    return flow;
}

/// Length of developing_duct that holds one and a half development lengths (Durst et al. 2005, rounded).
inline double long_enough(mesh::Coordinates coordinates, double reynolds)
{
    return coordinates == mesh::Coordinates::cylindrical ? 1.5 * (0.6 + 0.056 * reynolds)
                                                         : 1.5 * (0.315 + 0.011 * reynolds);
}

/// A square cavity of unit side whose upper wall slides with unit velocity towards rising x.
inline FlowCase lid_driven_cavity(int cells, double reynolds, const mesh::Grading& grading = mesh::uniform())
{
    const Faces faces = mesh::sample(grading, cells, 0, 1);
    FlowCase flow{mesh::Grid<2>(mesh::Coordinates::cartesian, {faces, faces}),
                  {},
                  coupling::FlowState<2>(field::Layout<2>({cells, cells}))};
    flow.problem.viscosity = 1 / reynolds;
    flow.problem.schemes = {Scheme::central, Scheme::central};
    set_velocity(flow.grid, flow.state, 0, [](double x, double y) { return y == 1 && x > 0 && x < 1 ? 1 : 0; });
    return flow;
}

} // namespace leat::test
