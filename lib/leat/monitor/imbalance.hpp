#pragma once

#include <leat/coupling/flow_equations.hpp>
#include <leat/monitor/outcome.hpp>

namespace leat::monitor {

/// What residual sums are divided by.
struct Scales {
    double mass = 1;     ///< kg/s (per radian or per metre of depth, as the grid)
    double momentum = 1; ///< N (likewise)
};

/// Scales of a duct flow: the mass flow through the start of direction 0; its momentum flux plus
/// |mean pressure beside the start - that beside the end| x area.
template <int D>
Scales duct_scales(const coupling::FlowEquations<D>& equations, const coupling::FlowState<D>& state);

/// Sums of |residual| over all solved control volumes, divided by the scales.
template <int D>
Imbalances imbalances(const coupling::FlowEquations<D>& equations, const coupling::FlowState<D>& residual,
                      const Scales& scales);

extern template Scales duct_scales(const coupling::FlowEquations<2>&, const coupling::FlowState<2>&);
extern template Scales duct_scales(const coupling::FlowEquations<3>&, const coupling::FlowState<3>&);
extern template Imbalances imbalances(const coupling::FlowEquations<2>&, const coupling::FlowState<2>&, const Scales&);
extern template Imbalances imbalances(const coupling::FlowEquations<3>&, const coupling::FlowState<3>&, const Scales&);

} // namespace leat::monitor
