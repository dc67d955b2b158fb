#pragma once

#include <leat/field/layout.hpp>

#include <array>

namespace leat::coupling {

/// Velocity and pressure on one grid. Component d stands at the faces that it crosses (the face below cell k at index
/// k), pressure at cell centres. Boundary values stand in place: the normal component on the boundary face itself,
/// the tangential ones in the ghost places. Also used for residuals and sources of the same balances; there
/// `pressure` is the balance of mass.
template <int D>
struct FlowState {
    std::array<field::Values, D> velocity;
    field::Values pressure;

    FlowState() = default;
    explicit FlowState(const field::Layout<D>& layout) : pressure(field::zeros(layout)) { velocity.fill(pressure); }

    std::array<const double*, D> pointers() const noexcept
    {
        std::array<const double*, D> all;
        for (int d = 0; d < D; ++d) {
            all[d] = velocity[d].data();
        }
        return all;
    }
};

} // namespace leat::coupling
