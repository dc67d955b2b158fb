#include <leat/linear/stencil_system.hpp>

namespace leat::linear {

namespace {

/// Rows of a box in falling order.
template <int D, class Visit>
void for_each_row_backwards(const field::Box<D>& box, Visit&& visit)
{
    field::for_each_row<D>(box, [&](const std::array<int, D>& k) {
        std::array<int, D> mirrored = k;
        for (int d = 0; d < D - 1; ++d) {
            mirrored[d] = box.begin[d] + box.end[d] - 1 - k[d];
        }
        visit(mirrored);
    });
}

} // namespace

template <int D>
void residual(const StencilSystem<D>& a, const field::Values& x, const field::Values& b, field::Values& out)
{
    const int n = a.box.end[D - 1] - a.box.begin[D - 1];
    field::for_each_row<D>(a.box, [&](const std::array<int, D>& k) {
        const std::ptrdiff_t at = a.layout.index(k);
        double* __restrict r = out.data() + at;
        const double* __restrict v = x.data() + at;
        const double* __restrict rhs = b.data() + at;
        const double* __restrict centre = a.centre.data() + at;
        for (int j = 0; j < n; ++j) {
            r[j] = rhs[j] - centre[j] * v[j];
        }
        for (int d = 0; d < D; ++d) {
            const std::ptrdiff_t s = a.layout.stride[d];
            const double* __restrict lower = a.lower[d].data() + at;
            const double* __restrict upper = a.upper[d].data() + at;
            for (int j = 0; j < n; ++j) {
                r[j] -= lower[j] * v[j - s] + upper[j] * v[j + s];
            }
        }
    });
}

template <int D>
void line_sweep(const StencilSystem<D>& a, const field::Values& b, bool backwards, field::Values& x,
                field::Values& scratch)
{
    const int n = a.box.end[D - 1] - a.box.begin[D - 1];
    double* __restrict c = scratch.data();
    const auto line = [&](const std::array<int, D>& k) {
        const std::ptrdiff_t at = a.layout.index(k);
        double* v = x.data() + at;
        for (int j = 0; j < n; ++j) {
            v[j] = b[at + j];
        }
        for (int d = 0; d < D - 1; ++d) {
            const std::ptrdiff_t s = a.layout.stride[d];
            const double* lower = a.lower[d].data() + at;
            const double* upper = a.upper[d].data() + at;
            for (int j = 0; j < n; ++j) {
                v[j] -= lower[j] * v[j - s] + upper[j] * v[j + s];
            }
        }
        const double* lower = a.lower[D - 1].data() + at;
        const double* upper = a.upper[D - 1].data() + at;
        const double* centre = a.centre.data() + at;
        double inverse = 1 / centre[0];
        c[0] = upper[0] * inverse;
        v[0] *= inverse;
        for (int j = 1; j < n; ++j) {
            inverse = 1 / (centre[j] - lower[j] * c[j - 1]);
            c[j] = upper[j] * inverse;
            v[j] = (v[j] - lower[j] * v[j - 1]) * inverse;
        }
        for (int j = n - 2; j >= 0; --j) {
            v[j] -= c[j] * v[j + 1];
        }
    };
    if (backwards) {
        for_each_row_backwards<D>(a.box, line);
    } else {
        field::for_each_row<D>(a.box, line);
    }
}

template void residual(const StencilSystem<2>&, const field::Values&, const field::Values&, field::Values&);
template void residual(const StencilSystem<3>&, const field::Values&, const field::Values&, field::Values&);
template void line_sweep(const StencilSystem<2>&, const field::Values&, bool, field::Values&, field::Values&);
template void line_sweep(const StencilSystem<3>&, const field::Values&, bool, field::Values&, field::Values&);

} // namespace leat::linear
