#include <leat/cascade/gather.hpp>

namespace leat::cascade {

namespace {

/// The source rows that feed one target row, with their weights: at most three per direction but the last.
template <int D>
struct SourceRows {
    static constexpr int most = D == 2 ? 3 : 9;
    int count = 0;
    std::array<std::ptrdiff_t, most> offset{};
    std::array<double, most> weight{};
};

template <int D>
void find_rows(const std::array<AxisGather, D>& axes, const field::Layout<D>& from, const std::array<int, D>& k, int d,
               std::ptrdiff_t offset, double weight, SourceRows<D>& rows)
{
    if (d == D - 1) {
        rows.offset[rows.count] = offset + from.stride[d]; // place 0 of the row
        rows.weight[rows.count++] = weight;
        return;
    }
    const int entry = k[d] - axes[d].begin;
    for (int m = 0; m < 3; ++m) {
        const double w = axes[d].weight[entry][m];
        if (w != 0) {
            find_rows<D>(axes, from, k, d + 1, offset + (axes[d].first[entry] + m + 1) * from.stride[d], weight * w,
                         rows);
        }
    }
}

/// out[j] = (add to out[j]) the weighted sum of the rows, begin <= j < end.
template <int D>
void combine(const SourceRows<D>& rows, const double* source, int begin, int end, bool add, double* __restrict out)
{
    for (int r = 0; r < rows.count; ++r) {
        const double w = rows.weight[r];
        const double* __restrict row = source + rows.offset[r];
        if (add || r > 0) {
            for (int j = begin; j < end; ++j) {
                out[j] += w * row[j];
            }
        } else {
            for (int j = begin; j < end; ++j) {
                out[j] = w * row[j];
            }
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
    const int source_end = from.cells[D - 1] + 2;
    double* __restrict combined = line.data() + 1; // [j] is place j of the source line
    field::for_each_row<D>(box, [&](const std::array<int, D>& k) {
        SourceRows<D> rows;
        find_rows<D>(axes, from, k, 0, 0, 1.0, rows);
        double* __restrict out = target.data() + to.index(k);
        if (last.copies) {
            combine<D>(rows, source.data(), last.begin, last.end, add, out - last.begin);
            return;
        }
        combine<D>(rows, source.data(), -1, source_end, false, combined);
        for (int j = 0; j < n; ++j) {
            const double* s = combined + last.first[j];
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
