#include <leat/linear/symmetric_solver.hpp>

#include <algorithm>
#include <cmath>

namespace leat::linear {

namespace {

/// The direction along which the nodes of a box are joined in pairs: the last one across the lines that has several
/// nodes; -1 when there is none. One direction after the other, beginning where a duct's cells are thinnest, because
/// joining across weak coupling beside strong coupling makes errors that no coarser level can see.
template <int D>
int joined_direction(const field::Box<D>& box)
{
    int d = D - 2;
    while (d >= 0 && box.end[d] - box.begin[d] == 1) {
        --d;
    }
    return d;
}

/// The node of the coarser level that node k is joined into.
template <int D>
std::array<int, D> joined(const std::array<int, D>& k, const field::Box<D>& fine)
{
    std::array<int, D> coarse;
    for (int d = 0; d < D - 1; ++d) {
        coarse[d] = k[d] - fine.begin[d];
    }
    const int along = joined_direction<D>(fine);
    coarse[along] /= 2;
    coarse[D - 1] = 0;
    return coarse;
}

template <int D>
int length_of(const field::Box<D>& box)
{
    return box.end[D - 1] - box.begin[D - 1];
}

constexpr double smallest_shift = 1e-12; // keeps the last pivot of a singular coarsest system away from zero

} // namespace

template <int D>
SymmetricSolver<D>::SymmetricSolver(const field::Layout<D>& layout, const field::Box<D>& box)
    : layout_(layout), box_(box)
{
    levels_.emplace_back();
    levels_[0].residual = field::zeros(layout);
    direction_ = image_ = preconditioned_ = field::zeros(layout);
    line_.resize(static_cast<std::size_t>(length_of<D>(box)) + 1);
    field::Box<D> current = box;
    for (int along = joined_direction<D>(box); along >= 0; along = joined_direction<D>(current)) {
        field::Box<D> next;
        std::array<int, D> cells{};
        for (int d = 0; d < D; ++d) {
            const int nodes = current.end[d] - current.begin[d];
            cells[d] = d == along ? (nodes + 1) / 2 : nodes;
            next.end[d] = cells[d];
        }
        Level level;
        const field::Layout<D> where(cells);
        level.system = StencilSystem<D>(where, next);
        level.right = level.value = level.residual = field::zeros(where);
        levels_.push_back(std::move(level));
        current = next;
    }
}

template <int D>
void SymmetricSolver<D>::prepare(const StencilSystem<D>& finest, bool singular)
{
    finest_ = &finest;
    singular_ = singular;
    const int n = length_of<D>(box_);
    for (std::size_t level = 1; level < levels_.size(); ++level) {
        const StencilSystem<D>& fine = system(level - 1);
        StencilSystem<D>& coarse = levels_[level].system;
        const int along = joined_direction<D>(fine.box);
        std::fill(coarse.centre.begin(), coarse.centre.end(), 0.0);
        for (int d = 0; d < D; ++d) {
            std::fill(coarse.lower[d].begin(), coarse.lower[d].end(), 0.0);
            std::fill(coarse.upper[d].begin(), coarse.upper[d].end(), 0.0);
        }
        field::for_each_row<D>(fine.box, [&](const std::array<int, D>& k) {
            const std::ptrdiff_t from = fine.layout.index(k);
            const std::ptrdiff_t to = coarse.layout.index(joined<D>(k, fine.box));
            for (int j = 0; j < n; ++j) {
                coarse.centre[to + j] += fine.centre[from + j];
                coarse.lower[D - 1][to + j] += fine.lower[D - 1][from + j];
                coarse.upper[D - 1][to + j] += fine.upper[D - 1][from + j];
            }
            for (int d = 0; d < D - 1; ++d) {
                if (d != along) {
                    for (int j = 0; j < n; ++j) {
                        coarse.lower[d][to + j] += fine.lower[d][from + j];
                        coarse.upper[d][to + j] += fine.upper[d][from + j];
                    }
                    continue;
                }
                // A neighbour that is joined into the same node moves its coefficient to the diagonal. The other one
                // is at twice the distance afterwards: half of its coefficient stays, half goes to the diagonal.
                const bool second = (k[d] - fine.box.begin[d]) % 2 == 1;
                const field::Values& inner = second ? fine.lower[d] : fine.upper[d];
                const field::Values& outer = second ? fine.upper[d] : fine.lower[d];
                field::Values& towards = second ? coarse.upper[d] : coarse.lower[d];
                for (int j = 0; j < n; ++j) {
                    coarse.centre[to + j] += inner[from + j] + 0.5 * outer[from + j];
                    towards[to + j] += 0.5 * outer[from + j];
                }
            }
        });
    }
    if (singular_ && levels_.size() > 1) {
        for (double& centre : levels_.back().system.centre) {
            centre *= 1 + smallest_shift;
        }
    }
}

template <int D>
void SymmetricSolver<D>::restrict_to(std::size_t coarse, const field::Values& fine)
{
    const StencilSystem<D>& from = system(coarse - 1);
    Level& to = levels_[coarse];
    const int n = length_of<D>(from.box);
    std::fill(to.right.begin(), to.right.end(), 0.0);
    field::for_each_row<D>(from.box, [&](const std::array<int, D>& k) {
        const double* __restrict r = fine.data() + from.layout.index(k);
        double* __restrict sum = to.right.data() + to.system.layout.index(joined<D>(k, from.box));
        for (int j = 0; j < n; ++j) {
            sum[j] += r[j];
        }
    });
}

template <int D>
void SymmetricSolver<D>::prolong_from(std::size_t coarse, field::Values& fine)
{
    const StencilSystem<D>& onto = system(coarse - 1);
    const Level& from = levels_[coarse];
    const int n = length_of<D>(onto.box);
    field::for_each_row<D>(onto.box, [&](const std::array<int, D>& k) {
        double* __restrict v = fine.data() + onto.layout.index(k);
        const double* __restrict c = from.value.data() + from.system.layout.index(joined<D>(k, onto.box));
        for (int j = 0; j < n; ++j) {
            v[j] += c[j];
        }
    });
}

/// A symmetric V cycle from a zero start: a sweep up the rows, the coarser level, a sweep down the rows.
template <int D>
void SymmetricSolver<D>::cycle(std::size_t level, const field::Values& right, field::Values& value)
{
    const StencilSystem<D>& here = system(level);
    std::fill(value.begin(), value.end(), 0.0);
    line_sweep(here, right, false, value, line_);
    if (level + 1 < levels_.size()) {
        residual(here, value, right, levels_[level].residual);
        restrict_to(level + 1, levels_[level].residual);
        cycle(level + 1, levels_[level + 1].right, levels_[level + 1].value);
        prolong_from(level + 1, value);
    }
    line_sweep(here, right, true, value, line_);
}

template <int D>
double SymmetricSolver<D>::dot(const field::Values& a, const field::Values& b) const
{
    const int n = length_of<D>(box_);
    double sum = 0;
    field::for_each_row<D>(box_, [&](const std::array<int, D>& k) {
        const std::ptrdiff_t at = layout_.index(k);
        for (int j = 0; j < n; ++j) {
            sum += a[at + j] * b[at + j];
        }
    });
    return sum;
}

template <int D>
void SymmetricSolver<D>::remove_mean(field::Values& a) const
{
    const int n = length_of<D>(box_);
    double sum = 0;
    double count = 0;
    field::for_each_row<D>(box_, [&](const std::array<int, D>& k) {
        for (int j = 0; j < n; ++j) {
            sum += a[layout_.index(k) + j];
        }
        count += n;
    });
    const double mean = sum / count;
    field::for_each_row<D>(box_, [&](const std::array<int, D>& k) {
        for (int j = 0; j < n; ++j) {
            a[layout_.index(k) + j] -= mean;
        }
    });
}

template <int D>
typename SymmetricSolver<D>::Result SymmetricSolver<D>::solve(const field::Values& b, field::Values& x,
                                                              double tolerance, int most)
{
    field::Values& r = levels_[0].residual;
    residual(*finest_, x, b, image_); // image_ holds the residual; r is scratch of the cycle
    const double start = std::sqrt(dot(image_, image_));
    Result result;
    if (!(start > 0)) {
        return result;
    }
    field::Values& z = preconditioned_;
    field::Values& rest = image_;
    double previous = 0;
    std::fill(direction_.begin(), direction_.end(), 0.0);
    while (result.iterations < most) {
        cycle(0, rest, z);
        if (singular_) {
            remove_mean(z);
        }
        const double product = dot(rest, z);
        const double beta = result.iterations == 0 ? 0 : product / previous;
        previous = product;
        for (std::size_t k = 0; k < z.size(); ++k) {
            direction_[k] = z[k] + beta * direction_[k];
        }
        // r = -A direction
        std::fill(z.begin(), z.end(), 0.0);
        residual(*finest_, direction_, z, r);
        const double curvature = -dot(direction_, r);
        ++result.iterations;
        if (!(curvature > 0)) {
            break; // round-off is all that is left
        }
        const double step = product / curvature;
        for (std::size_t k = 0; k < x.size(); ++k) {
            x[k] += step * direction_[k];
            rest[k] += step * r[k];
        }
        result.reduction = std::sqrt(dot(rest, rest)) / start;
        if (result.reduction <= tolerance) {
            break;
        }
    }
    if (singular_) {
        remove_mean(x);
    }
    return result;
}

template <int D>
std::size_t SymmetricSolver<D>::bytes() const noexcept
{
    std::size_t values = line_.size() + direction_.size() + image_.size() + preconditioned_.size();
    for (const Level& level : levels_) {
        values +=
            level.right.size() + level.value.size() + level.residual.size() + (2 * D + 1) * level.system.centre.size();
    }
    return values * sizeof(double);
}

template class SymmetricSolver<2>;
template class SymmetricSolver<3>;

} // namespace leat::linear
