#pragma once

#include <cstddef>
#include <vector>

namespace leat::field {

/// Value at x of the polynomial through the `points` known values nearest to x (Lagrange); `position` increases
/// strictly. points = 4 is one order above a second-order scheme. Fewer known values: all of them are used.
/// Outside the range of positions it extrapolates.
double interpolate(const std::vector<double>& position, const std::vector<double>& value, double x, int points = 4);

/// The greatest value of the parabola through the largest of the values and its two neighbours (no neighbour on one
/// side: the value itself).
double peak(const std::vector<double>& position, const std::vector<double>& value);

/// The last place before `end` where `value` crosses from outside to inside of target +- tolerance and stays inside,
/// by the interpolant of interpolate(). 0 positions back: returns position.front() when always inside; returns `end`
/// or more when still outside there.
double last_crossing(const std::vector<double>& position, const std::vector<double>& value, double target,
                     double tolerance, double end);

} // namespace leat::field
