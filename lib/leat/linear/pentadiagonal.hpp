#pragma once

namespace leat::linear {

/// A pentadiagonal system solved without pivoting, from both ends towards the middle, so that two chains of dependent
/// operations run at the same time (a twisted factorisation, van der Vorst 1987). Row j, 0 <= j < rows, reads
///   below_2 x(j-2) + below_1 x(j-1) + here x(j) + above_1 x(j+1) + above_2 x(j+2) = right-hand side;
/// coefficients that reach beyond the rows are ignored. The caller owns all arrays, so factors can be kept.
struct PentadiagonalFactors {
    double* pivot;   ///< [rows] reciprocal pivots
    double* outward; ///< [rows] factor of the neighbour on the side that the elimination came from, times the pivot
    double* inward;  ///< [rows] factor of the neighbour towards the middle
};

/// The outer two bands; they are needed again by every solve.
struct OuterBands {
    const double* below_2;
    const double* above_2;
};

/// rows >= 1. The pivots must not vanish; a system that is not diagonally dominant is the caller's judgement.
void factorise(int rows, const OuterBands& outer, const double* below_1, const double* here, const double* above_1,
               const PentadiagonalFactors& factors) noexcept;

/// x holds the right-hand side, then the solution.
void solve(int rows, const OuterBands& outer, const PentadiagonalFactors& factors, double* x) noexcept;

} // namespace leat::linear
