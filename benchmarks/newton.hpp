#pragma once

#include "convergence.hpp"

#include <Eigen/Sparse>
#include <Eigen/SparseLU>

#include <random>
#include <utility>
#include <vector>

namespace leat::benchmark {

/// Newton's method on the balances of one grid of a cascade, with their exact Jacobian: the balances are quadratic in
/// the unknowns as long as no velocity changes sign, so that central differences have no truncation error. Unknowns
/// that no balance shares are disturbed together.
class Newton {
public:
    using Matrix = Eigen::SparseMatrix<double>;
    using State = coupling::FlowState<2>;

    /// Balances are numbered so that the diagonal holds no zero, which orderings for symmetric patterns need: the axial
    /// balance of a face stands in the row of the pressure upstream of it, the balance of mass in that of the face.
    explicit Newton(coupling::FlowEquations<2>& equations) : equations_(equations), layout_(equations.layout())
    {
        column_.assign(3, std::vector<int>(field::zeros(layout_).size(), -1));
        for (int i = 0; i <= layout_.cells[0];
             ++i) { // station by station, so that the natural ordering has a narrow band
            for (int j = 0; j < layout_.cells[1]; ++j) {
                for (int f = 0; f < 3; ++f) {
                    const field::Box<2> box = solved(f);
                    if (i >= box.begin[0] && i < box.end[0] && j >= box.begin[1] && j < box.end[1]) {
                        column_[f][layout_.index({i, j})] = unknowns_++;
                    }
                }
            }
        }
        row_ = column_;
        for_each(2, [&](std::ptrdiff_t at, int, int) {
            row_[2][at] = column_[0][at + layout_.stride[0]];
            row_[0][at + layout_.stride[0]] = column_[2][at];
        });
        up_ = down_ = State(layout_);
    }

    int unknowns() const { return unknowns_; }

    /// Residuals as one vector.
    Eigen::VectorXd residual(const State& state)
    {
        equations_.residual(state, nullptr, up_);
        Eigen::VectorXd result(unknowns_);
        for (int f = 0; f < 3; ++f) {
            for_each(f, [&](std::ptrdiff_t at, int, int) { result[row_[f][at]] = values(up_, f)[at]; });
        }
        return result;
    }

    void subtract(const Eigen::VectorXd& step, State& state) const
    {
        for (int f = 0; f < 3; ++f) {
            for_each(f, [&](std::ptrdiff_t at, int, int) { values(state, f)[at] -= step[column_[f][at]]; });
        }
    }

    /// Entries where a derivative of a balance can differ from zero, from a disturbed flow.
    Matrix pattern(const State& state)
    {
        State rough = state;
        std::mt19937 random(1);
        std::uniform_real_distribution<double> roughness(0.01, 0.1);
        for (int f = 0; f < 3; ++f) {
            for_each(f, [&](std::ptrdiff_t at, int, int) { values(rough, f)[at] += roughness(random); });
        }
        std::vector<Eigen::Triplet<double>> entries;
        differentiate(rough, [&](int row, int column, double value) {
            if (value != 0) {
                entries.emplace_back(row, column, 1.0);
            }
        });
        Matrix result(unknowns_, unknowns_);
        result.setFromTriplets(entries.begin(), entries.end());
        result.makeCompressed();
        return result;
    }

    /// The Jacobian at a state, into the entries of the pattern.
    void jacobian(const State& state, Matrix& matrix)
    {
        std::fill(matrix.valuePtr(), matrix.valuePtr() + matrix.nonZeros(), 0.0);
        differentiate(state, [&](int row, int column, double value) {
            if (value != 0) {
                const int* first = matrix.innerIndexPtr() + matrix.outerIndexPtr()[column];
                const int* last = matrix.innerIndexPtr() + matrix.outerIndexPtr()[column + 1];
                const int* found = std::lower_bound(first, last, row);
                if (found == last || *found != row) {
                    throw std::runtime_error("a derivative outside the pattern");
                }
                matrix.valuePtr()[found - matrix.innerIndexPtr()] = value;
            }
        });
    }

private:
    static constexpr std::array<int, 2> reach = {2, 1}; ///< of a balance, along and across
    static constexpr double disturbance = 1e-4;

    field::Values& values(State& state, int f) const { return f < 2 ? state.velocity[f] : state.pressure; }

    field::Box<2> solved(int f) const { return f < 2 ? equations_.momentum(f).solved() : equations_.cell_box(); }

    template <class Visit>
    void for_each(int f, Visit&& visit) const
    {
        const field::Box<2> box = solved(f);
        for (int i = box.begin[0]; i < box.end[0]; ++i) {
            for (int j = box.begin[1]; j < box.end[1]; ++j) {
                visit(layout_.index({i, j}), i, j);
            }
        }
    }

    /// entry(row, column, derivative) over all balances within reach of each unknown.
    template <class Entry>
    void differentiate(const State& state, Entry&& entry)
    {
        const int period_along = 2 * reach[0] + 1;
        const int period_across = 2 * reach[1] + 1;
        State disturbed = state;
        for (int f = 0; f < 3; ++f) {
            for (int colour = 0; colour < period_along * period_across; ++colour) {
                const auto chosen = [&](int i, int j) {
                    return (i % period_along) * period_across + j % period_across == colour;
                };
                const auto disturb = [&](double by) {
                    for_each(f, [&](std::ptrdiff_t at, int i, int j) {
                        if (chosen(i, j)) {
                            values(disturbed, f)[at] = values(const_cast<State&>(state), f)[at] + by;
                        }
                    });
                };
                disturb(disturbance);
                equations_.residual(disturbed, nullptr, up_);
                disturb(-disturbance);
                equations_.residual(disturbed, nullptr, down_);
                disturb(0);
                for_each(f, [&](std::ptrdiff_t at, int i, int j) {
                    if (chosen(i, j)) {
                        collect(column_[f][at], i, j, entry);
                    }
                });
            }
        }
    }

    template <class Entry>
    void collect(int column, int i, int j, Entry& entry)
    {
        for (int f = 0; f < 3; ++f) {
            const field::Box<2> box = solved(f);
            for (int a = std::max(i - reach[0], box.begin[0]); a <= std::min(i + reach[0], box.end[0] - 1); ++a) {
                for (int b = std::max(j - reach[1], box.begin[1]); b <= std::min(j + reach[1], box.end[1] - 1); ++b) {
                    const std::ptrdiff_t at = layout_.index({a, b});
                    entry(row_[f][at], column, (values(up_, f)[at] - values(down_, f)[at]) / (2 * disturbance));
                }
            }
        }
    }

    coupling::FlowEquations<2>& equations_;
    field::Layout<2> layout_;
    int unknowns_ = 0;
    std::vector<std::vector<int>> column_; ///< of an unknown, by field and place
    std::vector<std::vector<int>> row_;    ///< of its balance; see the constructor
    State up_, down_;
};

/// One Newton solve of a case with a nested start: seconds to (b), steps on the finest grid.
struct NewtonRun {
    double seconds = std::numeric_limits<double>::infinity();
    int steps = 0;
    double seconds_per_step = 0;
};

/// Each grid of the cascade in turn, coarsest first: `coarse_steps` steps on the coarser ones, then steps until (b) on
/// the finest. The pattern is analysed once per grid.
template <class Ordering>
NewtonRun solve_by_newton(const DuctCase& duct, const Targets& targets, int coarse_steps)
{
    constexpr int most_steps = 12;
    NewtonRun result;
    auto cascade = make_cascade(duct);
    const double start = thread_seconds();
    double judging = 0; // not part of the method
    for (int level = cascade->levels() - 1; level >= 0; --level) {
        if (level + 1 < cascade->levels()) {
            cascade->start_from_coarser(level);
        } else {
            for (int pair = 0; pair < 30; ++pair) { // a first guess that Newton's method can start from
                cascade->iterate(level, false);
                cascade->iterate(level, true);
            }
        }
        const double level_start = thread_seconds();
        Newton newton(cascade->equations(level));
        Newton::Matrix matrix = newton.pattern(cascade->state(level));
        Eigen::SparseLU<Newton::Matrix, Ordering> solver;
        solver.analyzePattern(matrix);
        const int steps = level == 0 ? most_steps : coarse_steps;
        for (int k = 0; k < steps; ++k) {
            newton.jacobian(cascade->state(level), matrix);
            solver.factorize(matrix);
            if (solver.info() != Eigen::Success) {
                return result;
            }
            newton.subtract(solver.solve(newton.residual(cascade->state(level))), cascade->state(level));
            if (level == 0) {
                ++result.steps;
                const double before = thread_seconds();
                const double reduction = targets.reduction(*cascade);
                judging += thread_seconds() - before;
                if (!std::isfinite(reduction)) {
                    return result;
                }
                if (reduction <= residual_reduction) {
                    result.seconds = thread_seconds() - start - judging;
                    result.seconds_per_step = (thread_seconds() - level_start - judging) / result.steps;
                    return result;
                }
            }
        }
    }
    return result;
}

} // namespace leat::benchmark
