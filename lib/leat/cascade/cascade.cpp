#include <leat/cascade/cascade.hpp>

#include <algorithm>
#include <utility>

namespace leat::cascade {

namespace {

constexpr int coarsest_pairs = 2; // down-up sweeps that stand for a solve on the coarsest grid

template <int D>
std::pair<double, double> smallest_and_largest_cell(const mesh::Grid<D>& grid, int d)
{
    const std::vector<double>& faces = grid.faces(d);
    double smallest = faces[1] - faces[0];
    double largest = smallest;
    for (std::size_t k = 1; k < faces.size(); ++k) {
        smallest = std::min(smallest, faces[k] - faces[k - 1]);
        largest = std::max(largest, faces[k] - faces[k - 1]);
    }
    return {smallest, largest};
}

/// Which directions the next coarser grid halves; all false: this is the coarsest.
template <int D>
std::array<bool, D> halve(const mesh::Grid<D>& grid, const CascadeSettings& settings)
{
    double largest_across = 0;
    for (int d = 1; d < D; ++d) {
        largest_across = std::max(largest_across, smallest_and_largest_cell(grid, d).second);
    }
    const bool long_cells = smallest_and_largest_cell(grid, 0).first >= settings.coarsen_across_from * largest_across;
    std::array<bool, D> wanted{};
    wanted[0] = grid.can_coarsen(0) && grid.cells(0) / 2 >= settings.least_along;
    for (int d = 1; d < D; ++d) {
        wanted[d] = (long_cells || !wanted[0]) && grid.can_coarsen(d) && grid.cells(d) / 2 >= settings.least_across;
    }
    return wanted;
}

/// difference = a - b, which may be the same object as either.
template <int D>
void subtract(const coupling::FlowState<D>& a, const coupling::FlowState<D>& b, coupling::FlowState<D>& difference)
{
    const auto one = [](const field::Values& x, const field::Values& y, field::Values& out) {
        const std::size_t n = x.size();
        for (std::size_t k = 0; k < n; ++k) {
            out[k] = x[k] - y[k];
        }
    };
    for (int c = 0; c < D; ++c) {
        one(a.velocity[c], b.velocity[c], difference.velocity[c]);
    }
    one(a.pressure, b.pressure, difference.pressure);
}

} // namespace

template <int D>
Cascade<D>::Cascade(const mesh::Grid<D>& finest, const coupling::FlowProblem<D>& problem,
                    coupling::FlowState<D> boundary, const CascadeSettings& settings)
{
    mesh::Grid<D> grid = finest;
    while (true) {
        Level level;
        level.equations = std::make_unique<coupling::FlowEquations<D>>(grid, problem);
        const std::array<bool, D> halved = halve(grid, settings);
        const bool coarsest = std::none_of(halved.begin(), halved.end(), [](bool h) { return h; });
        coupling::Settings coupling_settings = settings.coupling_settings;
        coupling_settings.may_hold = settings.may_hold && !coarsest;
        level.coupling = coupling::make_coupling<D>(settings.coupling, *level.equations, coupling_settings);
        level.residual = coupling::FlowState<D>(level.equations->layout());
        if (levels_.empty()) {
            level.state = std::move(boundary);
        } else {
            level.state = level.source = level.residual;
            level.from_finer = std::make_unique<Transfer<D>>(*levels_.back().equations, *level.equations);
            level.from_finer->restrict_state(levels_.back().state, level.state);
        }
        levels_.push_back(std::move(level));
        if (coarsest) {
            break;
        }
        grid = grid.coarsened(halved);
    }
}

template <int D>
void Cascade<D>::cycle(int level)
{
    descend(static_cast<std::size_t>(level), level == 0 ? source_ : nullptr);
}

template <int D>
void Cascade<D>::descend(std::size_t l, const coupling::FlowState<D>* source)
{
    Level& here = levels_[l];
    if (l + 1 == levels_.size()) {
        for (int pair = 0; pair < coarsest_pairs; ++pair) {
            here.coupling->iterate(here.state, source, false);
            here.coupling->iterate(here.state, source, true);
        }
        return;
    }
    here.coupling->iterate(here.state, source, false);
    here.coupling->iterate(here.state, source, false);
    here.coupling->iterate(here.state, source, true);
    here.equations->residual(here.state, source, here.residual);
    Level& coarse = levels_[l + 1];
    coarse.from_finer->restrict_state(here.state, coarse.state);
    // source = balances of the restricted state - restricted residual
    coarse.from_finer->restrict_residual(here.residual, coarse.residual);
    coarse.equations->residual(coarse.state, nullptr, coarse.source);
    subtract(coarse.source, coarse.residual, coarse.source);
    descend(l + 1, &coarse.source);
    // The fine state has not moved: restricting it again costs less than keeping a copy.
    coarse.from_finer->restrict_state(here.state, coarse.residual);
    subtract(coarse.state, coarse.residual, coarse.residual);
    coarse.from_finer->prolong(coarse.residual, here.state, true);
}

template <int D>
void Cascade<D>::hold_linearisation(int level) noexcept
{
    for (std::size_t l = static_cast<std::size_t>(level); l + 1 < levels_.size(); ++l) {
        levels_[l].coupling->hold_linearisation();
    }
}

template <int D>
void Cascade<D>::iterate(int level, bool backwards)
{
    levels_[level].coupling->iterate(levels_[level].state, level == 0 ? source_ : nullptr, backwards);
}

template <int D>
void Cascade<D>::start_from_coarser(int level)
{
    levels_[level + 1].from_finer->prolong(levels_[level + 1].state, levels_[level].state, false);
}

template <int D>
const coupling::FlowState<D>& Cascade<D>::residual(int level)
{
    Level& here = levels_[level];
    here.equations->residual(here.state, level == 0 ? source_ : nullptr, here.residual);
    return here.residual;
}

template <int D>
std::size_t Cascade<D>::bytes() const noexcept
{
    std::size_t total = 0;
    for (const Level& level : levels_) {
        const std::size_t states = level.from_finer == nullptr ? 2 : 3;
        total += states * (D + 1) * level.state.pressure.size() * sizeof(double) + level.coupling->bytes();
    }
    return total;
}

template class Cascade<2>;

} // namespace leat::cascade
