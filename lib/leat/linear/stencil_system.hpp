#pragma once

#include <leat/field/layout.hpp>

#include <array>

namespace leat::linear {

/// Equations over a box of nodes, each coupling a node with its two neighbours along every direction:
///   centre x(P) + sum_d [lower[d] x(P - e_d) + upper[d] x(P + e_d)] = right-hand side.
/// Coefficients towards nodes outside the box must be zero.
template <int D>
struct StencilSystem {
    field::Layout<D> layout;
    field::Box<D> box;
    field::Values centre;
    std::array<field::Values, D> lower;
    std::array<field::Values, D> upper;

    StencilSystem() = default;
    StencilSystem(const field::Layout<D>& where, const field::Box<D>& nodes) : layout(where), box(nodes)
    {
        centre = field::zeros(where);
        for (int d = 0; d < D; ++d) {
            lower[d] = field::zeros(where);
            upper[d] = field::zeros(where);
        }
    }
};

/// out = right_hand_side - A x on the box.
template <int D>
void residual(const StencilSystem<D>& system, const field::Values& x, const field::Values& right_hand_side,
              field::Values& out);

/// One Gauss-Seidel sweep over the lines along the last direction, each solved directly (Thomas algorithm), visited in
/// rising order, or falling when `backwards`. `scratch` has room for one line.
template <int D>
void line_sweep(const StencilSystem<D>& system, const field::Values& right_hand_side, bool backwards, field::Values& x,
                field::Values& scratch);

extern template void residual(const StencilSystem<2>&, const field::Values&, const field::Values&, field::Values&);
extern template void residual(const StencilSystem<3>&, const field::Values&, const field::Values&, field::Values&);
extern template void line_sweep(const StencilSystem<2>&, const field::Values&, bool, field::Values&, field::Values&);
extern template void line_sweep(const StencilSystem<3>&, const field::Values&, bool, field::Values&, field::Values&);

} // namespace leat::linear
