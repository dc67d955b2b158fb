#pragma once

#include <leat/balance/balance.hpp>
#include <leat/coupling/flow_state.hpp>
#include <leat/mesh/grid.hpp>

#include <array>
#include <optional>

namespace leat::coupling {

/// What holds for the flow on one side of a grid.
enum class FlowSide {
    fixed,    ///< every velocity component is given there: a wall at rest, a sliding wall, an inlet
    symmetry, ///< no flow through it, no shear on it: a plane of symmetry, or the axis of a tube
    open      ///< zero traction: no viscous flux through the end and p = 0 on it. Only the end of direction 0.
};

/// A steady, incompressible, laminar flow of constant density and viscosity in a grid.
template <int D>
struct FlowProblem {
    double density = 1;   ///< kg/m^3, > 0
    double viscosity = 1; ///< Pa s, > 0
    std::array<std::array<FlowSide, 2>, D> sides{};
    std::array<Scheme, D> schemes{}; ///< of convection, by direction

    /// True where no side is open: the pressure is then known up to a constant.
    bool closed() const noexcept { return sides[0][1] != FlowSide::open; }
};

/// The discrete balances of mass and momentum on one grid. Holds row buffers: one object serves one thread.
template <int D>
class FlowEquations {
public:
    /// Throws InvalidInput when a property is not > 0 or another side than the end of direction 0 is open.
    FlowEquations(const mesh::Grid<D>& grid, const FlowProblem<D>& problem);
    FlowEquations(const FlowEquations&) = delete;
    FlowEquations& operator=(const FlowEquations&) = delete;

    const mesh::Grid<D>& grid() const noexcept { return grid_; }
    const FlowProblem<D>& problem() const noexcept { return problem_; }
    const field::Layout<D>& layout() const noexcept { return layout_; }
    const mesh::ControlVolumes<D>& cells() const noexcept { return cells_; }
    field::Box<D> cell_box() const noexcept;
    const balance::Transport<D>& momentum(int c) const noexcept { return momentum_[c]; }
    balance::Balance<D>& balance(int c) noexcept { return balance_[c]; }

    /// All residuals: net outflow of momentum + pressure force - source, net outflow of mass - source.
    /// `source` may be null.
    void residual(const FlowState<D>& state, const FlowState<D>* source, FlowState<D>& out);
    /// Only the balance of mass.
    void mass_residual(const FlowState<D>& state, const FlowState<D>* source, field::Values& out) const;
    /// One row of the balance of mass, out[j] for cell j.
    void mass_residual_row(const FlowState<D>& state, const FlowState<D>* source, const std::array<int, D>& row,
                           double* out) const;
    /// Only component c of the balance of momentum.
    void momentum_residual(int c, const FlowState<D>& state, const FlowState<D>* source, field::Values& out);
    /// One row of component c of the balance of momentum, out[j] for node j.
    void momentum_residual_row(int c, const FlowState<D>& state, const FlowState<D>* source,
                               const std::array<int, D>& row, double* out);

    /// Copies nothing but the boundary values (faces and ghosts that are not solved for) from one state to another.
    void copy_boundary(const FlowState<D>& from, FlowState<D>& to) const;

private:
    mesh::Grid<D> grid_;
    FlowProblem<D> problem_;
    field::Layout<D> layout_;
    mesh::ControlVolumes<D> cells_;
    std::vector<balance::Transport<D>> momentum_;
    std::vector<balance::Balance<D>> balance_;
};

extern template class FlowEquations<2>;
extern template class FlowEquations<3>;

} // namespace leat::coupling
