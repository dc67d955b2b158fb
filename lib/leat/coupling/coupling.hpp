#pragma once

#include <leat/coupling/flow_equations.hpp>

#include <memory>
#include <optional>
#include <string_view>

namespace leat {

/// How velocity and pressure are brought together.
enum class Coupling {
    simple,  ///< Patankar & Spalding (1972)
    simplec, ///< Van Doormaal & Raithby (1984)
    lines    ///< coupled cross-stream lines, after Galpin, Van Doormaal & Raithby (1985)
};

/// "simple", "simplec", "lines".
std::string_view name(Coupling coupling) noexcept;
/// The coupling of that name; empty when there is none.
std::optional<Coupling> coupling_named(std::string_view text) noexcept;

/// Factors of under-relaxation, each in (0, 1].
struct Relaxation {
    double velocity = 0.9; ///< SIMPLE, SIMPLEC: implicit factor of the momentum balances; lines: damping of the update
    double pressure = 0.9; ///< part of the pressure correction that is applied
};

namespace coupling {

/// Settings of any coupling.
struct Settings {
    Relaxation relaxation;
    int momentum_sweeps = 2;          ///< SIMPLE, SIMPLEC: line sweeps per momentum balance, >= 1
    double pressure_tolerance = 0.05; ///< SIMPLE, SIMPLEC: reduction of the pressure-correction residual, (0, 1)
    int pressure_iterations = 30;     ///< SIMPLE, SIMPLEC: most inner iterations, >= 1
    bool may_hold = false;            ///< lines: provide the memory for hold_linearisation(), 48 bytes per cell
};

/// The relaxation that serves best without knowing more (measured by benchmarks/couplings).
Relaxation default_relaxation(leat::Coupling coupling) noexcept;

/// One way to improve a velocity and pressure field. Does not judge, does not stop, does not know what its grid is
/// part of. Allocates only when it is made.
template <int D>
class FlowCoupling {
public:
    virtual ~FlowCoupling() = default;
    /// One outer iteration under Picard linearisation towards balances equal to `source` (null: zero).
    /// Sweeps go with the flow, or against it when `backwards`.
    virtual void iterate(FlowState<D>& state, const FlowState<D>* source, bool backwards) = 0;
    /// From the next iteration on the linearisation of each part of the grid may be kept from its next visit; a further
    /// call has it made anew. The solution is not touched by this, only the way to it. Needs Settings::may_hold.
    virtual void hold_linearisation() noexcept {}
    /// Bytes held.
    virtual std::size_t bytes() const noexcept = 0;
};

/// Makes a coupling for `equations`, which must outlive it. D = 2.
/// Throws InvalidInput when a setting is out of range, or for `lines` when the grid has fewer than 2 x 2 cells.
template <int D>
std::unique_ptr<FlowCoupling<D>> make_coupling(leat::Coupling coupling, FlowEquations<D>& equations,
                                               const Settings& settings);

extern template std::unique_ptr<FlowCoupling<2>> make_coupling(leat::Coupling, FlowEquations<2>&, const Settings&);

} // namespace coupling
} // namespace leat
