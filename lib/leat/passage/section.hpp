#pragma once

#include <leat/passage/passage.hpp>

namespace leat::passage {

/// The coordinate across a section: radius for a tube and an annulus, distance from the lower wall for a channel.
struct Section {
    double first = 0;    ///< m: axis, lower wall or inner wall
    double last = 0;     ///< m: wall, upper wall or outer wall
    bool radial = false; ///< area grows like r dr; else like dy

    double width() const noexcept { return last - first; }
    /// Share of the section's area between two positions; negative when `to` < `from`.
    double area_fraction(double from, double to) const noexcept;
};

/// The section of a valid shape (see faults_of).
Section section_of(const Shape& shape);

/// Length (m) of a shape.
double length_of(const Shape& shape);

} // namespace leat::passage
