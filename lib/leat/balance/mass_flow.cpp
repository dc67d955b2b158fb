#include <leat/balance/mass_flow.hpp>

namespace leat::balance {

template <int D>
void MassFlow<D>::cell_faces(const Velocity& velocity, int d, const std::array<int, D>& row, int begin, int end,
                             double* __restrict out) const
{
    const double factor = row_factor(d, row);
    std::array<int, D> first = row;
    first[D - 1] = 0;
    const double* __restrict u = velocity[d] + layout_.index(first);
    const double* __restrict area = cells_->area_factor[d][D - 1].data();
    for (int j = begin; j < end; ++j) {
        out[j] = factor * area[j] * u[j];
    }
}

template <int D>
double MassFlow<D>::row_factor(int d, const std::array<int, D>& row) const noexcept
{
    double factor = density_;
    for (int e = 0; e < D - 1; ++e) {
        factor *= cells_->area_factor[d][e][row[e]];
    }
    return factor;
}

template <int D>
void MassFlow<D>::row(const Velocity& velocity, int d, const std::array<int, D>& row, int begin, int end,
                      double* __restrict out) const
{
    constexpr int last = D - 1;
    if (shift_ == mesh::ControlVolumes<D>::unshifted) {
        cell_faces(velocity, d, row, begin, end, out);
        return;
    }
    const int n = cells_->cells(shift_);
    if (shift_ != last) {
        std::array<int, D> below = row;
        --below[shift_];
        // The outermost faces of shifted volumes in their own direction are faces of the grid.
        if (d == shift_ && row[shift_] == 0) {
            cell_faces(velocity, d, row, begin, end, out);
        } else if (d == shift_ && row[shift_] == n + 1) {
            cell_faces(velocity, d, below, begin, end, out);
        } else {
            std::array<int, D> first = row;
            first[last] = 0;
            const double here = 0.5 * row_factor(d, row);
            const double before = 0.5 * row_factor(d, below);
            const double* __restrict u = velocity[d] + layout_.index(first);
            const double* __restrict u_before = u - layout_.stride[shift_];
            const double* __restrict area = cells_->area_factor[d][last].data();
            for (int j = begin; j < end; ++j) {
                out[j] = area[j] * (before * u_before[j] + here * u[j]);
            }
        }
        return;
    }
    const double factor = 0.5 * row_factor(d, row);
    std::array<int, D> first = row;
    first[last] = 0;
    const double* __restrict u = velocity[d] + layout_.index(first);
    const double* __restrict area = cells_->area_factor[d][last].data();
    for (int j = begin; j < end; ++j) {
        out[j] = factor * (area[j - 1] * u[j - 1] + area[j] * u[j]);
    }
    if (d == shift_) {
        if (begin == 0) {
            out[0] = 2 * factor * area[0] * u[0];
        }
        if (end == n + 2) {
            out[n + 1] = 2 * factor * area[n] * u[n];
        }
    }
}

template class MassFlow<2>;
template class MassFlow<3>;

} // namespace leat::balance
