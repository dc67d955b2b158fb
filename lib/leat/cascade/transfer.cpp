#include <leat/cascade/transfer.hpp>

#include <algorithm>

namespace leat::cascade {

namespace {

using mesh::ControlVolumes;

/// Mean over the fine nodes that make up each coarse node, weighted by `measure` (one-dimensional factors).
AxisGather averages(int fine_cells, bool halved, bool nodal, const mesh::AxisTable& measure)
{
    AxisGather gather(-1);
    const int cells = halved ? fine_cells / 2 : fine_cells;
    gather.push(-1, {1, 0, 0}); // ghost places hold boundary values
    for (int k = 0; k < cells + (nodal ? 1 : 0); ++k) {
        if (!halved) {
            gather.push(k, {1, 0, 0});
        } else if (nodal) {
            gather.push(2 * k, {1, 0, 0});
        } else {
            const double first = measure[2 * k];
            const double second = measure[2 * k + 1];
            gather.push(2 * k, {first / (first + second), second / (first + second), 0});
        }
    }
    gather.push(nodal ? fine_cells + 1 : fine_cells, {1, 0, 0});
    return gather;
}

AxisGather sums(int fine_cells, bool halved, bool nodal, int begin, int end)
{
    AxisGather gather(begin);
    for (int k = begin; k < end; ++k) {
        if (!halved) {
            gather.push(k, {1, 0, 0});
        } else if (!nodal) {
            gather.push(2 * k, {1, 1, 0});
        } else {
            gather.push(2 * k - 1, {0.5, 1, 2 * k < fine_cells ? 0.5 : 0});
        }
    }
    return gather;
}

/// Linear interpolation to fine nodes begin .. end - 1 from coarse nodes. known[e]: the coarse ghost place at that end
/// holds the boundary value; else the value beside the end serves up to it.
AxisGather interpolation(const mesh::AxisTable& fine, const mesh::AxisTable& coarse, int coarse_nodes, bool halved,
                         bool nodal, std::array<bool, 2> known, int begin, int end)
{
    AxisGather gather(begin);
    for (int k = begin; k < end; ++k) {
        if (!halved) {
            gather.push(k, {1, 0, 0});
            continue;
        }
        int below = nodal ? k / 2 : (k + 1) / 2 - 1;
        if (nodal && k % 2 == 0) {
            gather.push(below, {1, 0, 0});
            continue;
        }
        if (below < 0 && !known[0]) {
            gather.push(0, {1, 0, 0});
        } else if (below + 1 >= coarse_nodes && !known[1]) {
            gather.push(below, {1, 0, 0});
        } else {
            const double upper = (fine[k] - coarse[below]) / (coarse[below + 1] - coarse[below]);
            gather.push(below, {1 - upper, upper, 0});
        }
    }
    return gather;
}

} // namespace

template <int D>
Transfer<D>::Transfer(const coupling::FlowEquations<D>& fine, const coupling::FlowEquations<D>& coarse)
    : fine_(fine.layout()), coarse_(coarse.layout()),
      line_(static_cast<std::size_t>(std::max(fine.grid().cells(D - 1), coarse.grid().cells(D - 1))) + 6)
{
    for (int c = 0; c <= D; ++c) {
        const bool velocity = c < D;
        const ControlVolumes<D>& fine_volumes = velocity ? fine.momentum(c).volumes() : fine.cells();
        const ControlVolumes<D>& coarse_volumes = velocity ? coarse.momentum(c).volumes() : coarse.cells();
        const field::Box<D> fine_box = velocity ? fine.momentum(c).solved() : fine.cell_box();
        const field::Box<D> coarse_box = velocity ? coarse.momentum(c).solved() : coarse.cell_box();
        for (int d = 0; d < D; ++d) {
            const int n = fine.grid().cells(d);
            const bool halved = coarse.grid().cells(d) < n;
            const bool nodal = d == c;
            const mesh::AxisTable& measure = velocity ? fine.cells().area_factor[c][d] : fine.cells().volume_factor[d];
            states_[c][d] = averages(n, halved, nodal, measure);
            residuals_[c][d] = sums(n, halved, nodal, coarse_box.begin[d], coarse_box.end[d]);
            std::array<bool, 2> known{};
            for (int end = 0; end < 2; ++end) {
                known[end] = velocity && fine.problem().sides[d][end] == coupling::FlowSide::fixed;
            }
            corrections_[c][d] = interpolation(fine_volumes.node[d], coarse_volumes.node[d], coarse_volumes.nodes(d),
                                               halved, nodal, known, fine_box.begin[d], fine_box.end[d]);
        }
    }
}

template <int D>
void Transfer<D>::restrict_state(const coupling::FlowState<D>& fine, coupling::FlowState<D>& coarse)
{
    for (int c = 0; c < D; ++c) {
        gather<D>(states_[c], fine_, fine.velocity[c], coarse_, coarse.velocity[c], false, line_);
    }
    gather<D>(states_[D], fine_, fine.pressure, coarse_, coarse.pressure, false, line_);
}

template <int D>
void Transfer<D>::restrict_residual(const coupling::FlowState<D>& fine, coupling::FlowState<D>& coarse)
{
    for (int c = 0; c < D; ++c) {
        gather<D>(residuals_[c], fine_, fine.velocity[c], coarse_, coarse.velocity[c], false, line_);
    }
    gather<D>(residuals_[D], fine_, fine.pressure, coarse_, coarse.pressure, false, line_);
}

template <int D>
void Transfer<D>::prolong(const coupling::FlowState<D>& coarse, coupling::FlowState<D>& fine, bool add)
{
    for (int c = 0; c < D; ++c) {
        gather<D>(corrections_[c], coarse_, coarse.velocity[c], fine_, fine.velocity[c], add, line_);
    }
    gather<D>(corrections_[D], coarse_, coarse.pressure, fine_, fine.pressure, add, line_);
}

template class Transfer<2>;
template class Transfer<3>;

} // namespace leat::cascade
