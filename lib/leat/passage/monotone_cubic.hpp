#pragma once

#include <cstddef>
#include <vector>

namespace leat::passage {

/// A curve through points by piecewise cubics that are monotone between them (Fritsch & Carlson 1980, SIAM J. Numer.
/// Anal. 17, 238-246; their region of radius 3). Start slopes come from the parabola through three neighbours, so that
/// a parabola without an extremum between points is met exactly.
class MonotoneCubic {
public:
    /// `position` strictly increasing, at least 2; `value` as many; all finite.
    MonotoneCubic(std::vector<double> position, std::vector<double> value);

    /// The curve; beyond the ends it keeps the end value.
    double operator()(double position) const noexcept;

    /// Exact integral of curve(x) dx between two positions, or of curve(x) x dx when `radial`; each position is taken
    /// inside the ends. Negated when `to` < `from`.
    double integral(double from, double to, bool radial) const noexcept;

private:
    double on_piece(std::size_t piece, double position) const noexcept;

    std::vector<double> position_;
    std::vector<double> value_;
    std::vector<double> slope_;
};

} // namespace leat::passage
