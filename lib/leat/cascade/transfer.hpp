#pragma once

#include <leat/cascade/gather.hpp>
#include <leat/coupling/flow_equations.hpp>

#include <array>

namespace leat::cascade {

/// Carries flow states, residuals and corrections between two nested grids.
template <int D>
class Transfer {
public:
    /// coarse: the fine grid with `halved` directions coarsened by two. Both must outlive this object.
    Transfer(const coupling::FlowEquations<D>& fine, const coupling::FlowEquations<D>& coarse);

    /// Face velocities that carry the same mass flow, volume means of pressure; boundary values too.
    void restrict_state(const coupling::FlowState<D>& fine, coupling::FlowState<D>& coarse);
    /// Sums of residuals: whole cells; 1/2, 1, 1/2 over the volumes that overlap a shifted volume.
    void restrict_residual(const coupling::FlowState<D>& fine, coupling::FlowState<D>& coarse);
    /// fine = linear interpolation of coarse (add: += ), on the solved unknowns.
    void prolong(const coupling::FlowState<D>& coarse, coupling::FlowState<D>& fine, bool add);

private:
    using Axes = std::array<AxisGather, D>;
    field::Layout<D> fine_, coarse_;
    std::array<Axes, D + 1> states_, residuals_, corrections_; ///< components, then pressure
    field::Values line_;
};

extern template class Transfer<2>;
extern template class Transfer<3>;

} // namespace leat::cascade
