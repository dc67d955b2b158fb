#pragma once

#include <leat/linear/stencil_system.hpp>

#include <vector>

namespace leat::linear {

/// Solves symmetric positive (semi-)definite stencil systems: conjugate gradients (Hestenes & Stiefel 1952)
/// preconditioned by one multigrid cycle. Lines along the last direction are solved directly, and rows of nodes are
/// joined in pairs along the other directions (Galerkin sums), so strong coupling along the lines, which thin cells
/// across a duct bring, does not slow it down. Allocates only when it is made.
template <int D>
class SymmetricSolver {
public:
    /// For systems on this layout and box.
    SymmetricSolver(const field::Layout<D>& layout, const field::Box<D>& box);

    /// Takes the coefficients in; `system` must outlive the solves. singular: constants are in the null space.
    void prepare(const StencilSystem<D>& system, bool singular);

    struct Result {
        int iterations = 0;
        double reduction = 1; ///< Euclidean norm of the residual at the end over that at the start
    };
    /// Improves x until |b - A x| <= tolerance |b - A x_0| or `most` iterations are spent. When singular, b should
    /// sum to zero, and x comes back with mean zero.
    Result solve(const field::Values& b, field::Values& x, double tolerance, int most);

    std::size_t bytes() const noexcept;

private:
    struct Level {
        StencilSystem<D> system; ///< empty on the finest level, whose system is the caller's
        field::Values right, value, residual;
    };
    const StencilSystem<D>& system(std::size_t level) const noexcept
    {
        return level == 0 ? *finest_ : levels_[level].system;
    }
    void cycle(std::size_t level, const field::Values& right, field::Values& value);
    void restrict_to(std::size_t coarse, const field::Values& fine);
    void prolong_from(std::size_t coarse, field::Values& fine);
    double dot(const field::Values& a, const field::Values& b) const;
    void remove_mean(field::Values& a) const;

    const StencilSystem<D>* finest_ = nullptr;
    field::Layout<D> layout_;
    field::Box<D> box_;
    bool singular_ = false;
    std::vector<Level> levels_;
    field::Values line_, direction_, image_, preconditioned_;
};

extern template class SymmetricSolver<2>;
extern template class SymmetricSolver<3>;

} // namespace leat::linear
