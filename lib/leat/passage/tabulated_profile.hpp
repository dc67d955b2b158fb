#pragma once

#include <leat/base/error.hpp>
#include <leat/passage/monotone_cubic.hpp>
#include <leat/passage/passage.hpp>
#include <leat/passage/section.hpp>

namespace leat::passage {

/// Notes in `faults`, under "inlet.table", what is wrong with a table for a valid shape: sizes, values that are not
/// finite, order, positions that do not cover the section (ends within 1e-6 of its width), a channel's profile that is
/// not symmetric (within 1e-6 of the largest |velocity|), a mean that is not above 1e-6 of the largest |velocity|.
void note_table_faults(const VelocityTable& table, const Shape& shape, Faults& faults);

/// A table's profile over the whole section, scaled to mean 1. The points are mirrored at the axis of a tube and, when
/// they end there, in the middle of a channel, so that the curve is smooth across.
class TabulatedProfile {
public:
    /// For a table without faults.
    TabulatedProfile(const VelocityTable& table, const Shape& shape);

    /// u/u_m at a position (m) of the section.
    double velocity_ratio(double position) const noexcept;
    /// Share of the volume flow of the whole section between two positions (m).
    double flow_fraction(double from, double to) const noexcept;
    /// Mean of the table's curve over the section's area, / largest |velocity|.
    double mean_over_peak() const noexcept { return mean_; }

private:
    double flow(double from, double to) const noexcept;

    Section section_;
    MonotoneCubic curve_; // velocity / largest |velocity|
    double mean_ = 1;
};

} // namespace leat::passage
