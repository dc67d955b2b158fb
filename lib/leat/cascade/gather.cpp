#include <leat/cascade/gather.hpp>

#include <algorithm>

namespace leat::cascade {

namespace {

/// line += weight * the source rows that feed target row k, over all directions d .. D - 2.
template <int D>
void collect(const std::array<AxisGather, D>& axes, const field::Layout<D>& from, const field::Values& source,
             const std::array<int, D>& k, int d, std::ptrdiff_t offset, double weight, double* __restrict line)
{
    if (d == D - 1) {
        const int n = from.cells[D - 1] + 3;
        const double* __restrict row = source.data() + offset;
        for (int j = 0; j < n; ++j) {
            line[j] += weight * row[j];
        }
        return;
    }
    const int entry = k[d] - axes[d].begin;
    for (int m = 0; m < 3; ++m) {
        const double w = axes[d].weight[entry][m];
        if (w != 0) {
            collect<D>(axes, from, source, k, d + 1, offset + (axes[d].first[entry] + m + 1) * from.stride[d],
                       weight * w, line);
        }
    }
}

} // namespace

template <int D>
void gather(const std::array<AxisGather, D>& axes, const field::Layout<D>& from, const field::Values& source,
            const field::Layout<D>& to, field::Values& target, bool add, field::Values& line)
{
    field::Box<D> box;
    for (int d = 0; d < D; ++d) {
        box.begin[d] = axes[d].begin;
        box.end[d] = axes[d].end;
    }
    const AxisGather& last = axes[D - 1];
    const int n = last.end - last.begin;
    const double* __restrict padded = line.data() + 1; // [j] is place j of the source line
    field::for_each_row<D>(box, [&](const std::array<int, D>& k) {
        std::fill(line.begin(), line.end(), 0.0);
        collect<D>(axes, from, source, k, 0, 0, 1.0, line.data());
        double* __restrict out = target.data() + to.index(k);
        for (int j = 0; j < n; ++j) {
            const double* s = padded + last.first[j];
            const std::array<double, 3>& w = last.weight[j];
            const double value = w[0] * s[0] + w[1] * s[1] + w[2] * s[2];
            out[j] = add ? out[j] + value : value;
        }
    });
}

template void gather<2>(const std::array<AxisGather, 2>&, const field::Layout<2>&, const field::Values&,
                        const field::Layout<2>&, field::Values&, bool, field::Values&);
template void gather<3>(const std::array<AxisGather, 3>&, const field::Layout<3>&, const field::Values&,
                        const field::Layout<3>&, field::Values&, bool, field::Values&);

} // namespace leat::cascade
