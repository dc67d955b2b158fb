#pragma once

#include <array>
#include <optional>

namespace leat::cascade {

/// What three grids say about one number by the procedure of Celik, Ghia, Roache & Freitas 2008 (J. Fluids Eng. 130,
/// 078001, equations 3 to 7), 1 being the finest grid.
struct GridConvergence {
    double order = 0;              ///< apparent order p, > 0
    double extrapolated = 0;       ///< value_1 + (value_1 - value_2)/(r21^p - 1)
    double approximate_error = 0;  ///< |value_1 - value_2|
    double extrapolated_error = 0; ///< |extrapolated - value_1|
    double index = 0; ///< grid convergence index, absolute: 1.25 approximate_error/(r21^p - 1) (Roache 1994)
};

/// Apparent order from the increments value_2 - value_1 and value_3 - value_2 and the ratios of the cell sizes
/// (both > 1), by fixed-point iteration. Empty when an increment is 0 or not finite, or no positive order explains
/// them.
std::optional<double> apparent_order(double increment_21, double increment_32, double ratio_21, double ratio_32);

/// values: finest first; ratios of cell sizes {r21, r32}, both > 1. Empty where apparent_order is.
std::optional<GridConvergence> grid_convergence(const std::array<double, 3>& values,
                                                const std::array<double, 2>& ratios);

/// Two-grid index of Roache 1994 with an assumed order: safety |value_1 - value_2|/(ratio^order - 1).
double grid_convergence_index(double value_1, double value_2, double ratio, double order, double safety);

} // namespace leat::cascade
