#pragma once

#include <leat/cascade/transfer.hpp>
#include <leat/coupling/coupling.hpp>

#include <memory>
#include <vector>

namespace leat::cascade {

/// How the nested grids are made and used.
struct CascadeSettings {
    leat::Coupling coupling = leat::Coupling::lines;
    coupling::Settings coupling_settings;
    bool may_hold = true;              ///< provide the memory for hold_linearisation()
    double coarsen_across_from = 0.35; ///< along the axis only until smallest dx/largest dy reaches this
    int least_along = 8;               ///< no direction is coarsened below these
    int least_across = 4;
};

/// Nested grids, finest first, with a flow state and a coupling on each. Coarser grids give the start, and corrections
/// by the full approximation scheme (Brandt 1977): each grid solves the fine balances plus what the fine grid knows
/// better. Any coupling serves as smoother and never knows which grid it is on.
template <int D>
class Cascade {
public:
    /// boundary: the boundary values on the finest grid (FlowState); its solved unknowns are the first guess.
    Cascade(const mesh::Grid<D>& finest, const coupling::FlowProblem<D>& problem, coupling::FlowState<D> boundary,
            const CascadeSettings& settings);

    int levels() const noexcept { return static_cast<int>(levels_.size()); }
    coupling::FlowEquations<D>& equations(int level) noexcept { return *levels_[level].equations; }
    coupling::FlowState<D>& state(int level) noexcept { return levels_[level].state; }
    coupling::FlowCoupling<D>& coupling(int level) noexcept { return *levels_[level].coupling; }

    /// The sources that the finest grid's balances are driven to; null: zero.
    void set_source(const coupling::FlowState<D>* source) noexcept { source_ = source; }
    /// Solves the balances of `level` for `cycles` V cycles (sweeps down, down, up, then the coarser grids).
    void cycle(int level);
    /// From the next cycle on, the linearisations on `level` and coarser grids, the coarsest left out, are those of
    /// their next visit. A further call renews them.
    void hold_linearisation(int level) noexcept;
    /// One outer iteration of the coupling on `level` alone.
    void iterate(int level, bool backwards);
    /// First guess on `level` from the state of the next coarser one.
    void start_from_coarser(int level);
    /// Residuals on `level`, kept in the level's own storage.
    const coupling::FlowState<D>& residual(int level);

    std::size_t bytes() const noexcept;

private:
    struct Level {
        std::unique_ptr<coupling::FlowEquations<D>> equations;
        std::unique_ptr<coupling::FlowCoupling<D>> coupling;
        std::unique_ptr<Transfer<D>> from_finer;
        coupling::FlowState<D> state, residual, source;
    };
    void descend(std::size_t level, const coupling::FlowState<D>* source);

    std::vector<Level> levels_;
    const coupling::FlowState<D>* source_ = nullptr;
};

extern template class Cascade<2>;

} // namespace leat::cascade
