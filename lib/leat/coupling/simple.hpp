#pragma once

#include <leat/coupling/coupling.hpp>
#include <leat/linear/symmetric_solver.hpp>

#include <array>

namespace leat::coupling {

/// SIMPLE (Patankar & Spalding 1972) and SIMPLEC (Van Doormaal & Raithby 1984) in correction form: the momentum
/// balances are improved by line sweeps of their under-relaxed upwind form driven by the full residual, then a
/// pressure correction restores mass. The two differ in the velocity that a pressure correction brings.
template <int D>
class SimpleCoupling final : public FlowCoupling<D> {
public:
    /// consistent: SIMPLEC.
    SimpleCoupling(FlowEquations<D>& equations, const Settings& settings, bool consistent);
    void iterate(FlowState<D>& state, const FlowState<D>* source, bool backwards) override;
    std::size_t bytes() const noexcept override;

private:
    void predict(int c, FlowState<D>& state, const FlowState<D>* source, bool backwards);
    void assemble_pressure();
    void correct(FlowState<D>& state);

    FlowEquations<D>& equations_;
    Settings settings_;
    bool consistent_;
    linear::StencilSystem<D> system_;       ///< of momentum, then of the pressure correction
    std::array<field::Values, D> response_; ///< velocity per difference of pressure
    field::Values residual_, correction_, line_;
    linear::SymmetricSolver<D> pressure_solver_;
};

extern template class SimpleCoupling<2>;
extern template class SimpleCoupling<3>;

} // namespace leat::coupling
