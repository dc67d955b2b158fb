#pragma once

#include <optional>
#include <string>
#include <vector>

namespace leat::cascade {

/// One number on one grid.
struct GridValue {
    double value = 0;
    double iteration_error = 0; ///< how far the value may be from the converged solution of its own grid, >= 0
};

/// How far the value of the finest grid may be from the limit.
struct ErrorBand {
    std::optional<double> half_width{}; ///< in the number's unit; empty: `reason` says why
    bool has_limit = true;              ///< false: the number does not converge under refinement
    std::string reason{};
};

/// Half-width of an interval around the value of the finest grid that is meant to hold the limit under refinement.
/// `values`: one number on fully refined grids (each halved in every direction from the next), coarsest first; three
/// are needed, the last four are used. With the increments i1 (finest less next), i2, i3 it is the sum of
/// - safety x |i1|/(2^p - 1), p the apparent order of i1 and i2 within 0.3 .. 2 (Richardson; Roache 1994),
/// - the greater of two departures from second order, weighted: |i2 - 4 i1|/12 where i1 and i2 differ in sign or shrink
///   faster than second order allows, which cannot last; and |i3 - 4 i2|/48,
/// - the iteration error of the finest grid; those of the others enlarge the increments.
/// The weights were chosen by measured coverage (benchmarks/band_coverage). "Does not converge under refinement" is
/// said only of four values whose increments have one sign and ratios between 0.9 and 1.1, well above the iteration
/// errors. Values that are not finite give no band.
ErrorBand error_band(const std::vector<GridValue>& values);

} // namespace leat::cascade
