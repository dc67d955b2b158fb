#include <leat/passage/developed_annulus.hpp>

#include <algorithm>
#include <cmath>
#include <limits>

namespace leat::passage {

namespace {

constexpr double series_end = 0.5; // below it the closed forms lose digits, above it the series are slow

/// ln(1 - y) + y + y^2/2 = -sum y^k/k from k = 3: what is left of the logarithm when a thin gap cancels the rest.
double logarithm_remainder(double y)
{
    if (y > series_end) {
        return std::log1p(-y) + y + y * y / 2;
    }
    double sum = 0;
    double power = y * y * y;
    for (int k = 3; power > k * sum * std::numeric_limits<double>::epsilon() / 4; ++k) {
        sum += power / k;
        power *= y;
    }
    return -sum;
}

/// Integral of (1 - t) logarithm_remainder(t) from 0 to y.
double logarithm_remainder_flow(double y)
{
    if (y > series_end) {
        const double r = std::max(1 - y, std::numeric_limits<double>::min()); // r^2 ln r is 0 on the axis
        return (r * r - 1) / 4 - r * r / 2 * std::log(r) + y * y / 2 - y * y * y / 6 - y * y * y * y / 8;
    }
    // Series: -y^4/12 + sum y^(k+1)/((k+1) k (k-1)) from k = 4.
    double sum = -y * y * y * y / 12;
    double power = y * y * y * y * y;
    for (int k = 4; power > -sum * std::numeric_limits<double>::epsilon() / 4; ++k) {
        sum += power / (static_cast<double>(k + 1) * k * (k - 1));
        power *= y;
    }
    return sum;
}

} // namespace

AnnulusProfile::AnnulusProfile(double inner_diameter, double outer_diameter)
    : outer_radius_(outer_diameter / 2), ratio_(inner_diameter / outer_diameter),
      gap_((outer_diameter - inner_diameter) / outer_diameter)
{
    // ln 1/kappa from the ratio for a thin core, from the gap for a thin gap: each is exact there.
    const bool thin_gap = gap_ <= series_end;
    const double logarithm = thin_gap ? -std::log1p(-gap_) : -std::log(ratio_);
    const double remainder = thin_gap ? logarithm_remainder(gap_) : gap_ + gap_ * gap_ / 2 - logarithm;
    peak_square_ = gap_ * (2 - gap_) / (2 * logarithm);
    peak_defect_ = (gap_ * gap_ - remainder) / logarithm;
    mean_ = (gap_ * gap_ * gap_ * gap_ / 2 - remainder * (2 - 2 * gap_ + gap_ * gap_)) / logarithm;
}

double AnnulusProfile::friction_reynolds() const noexcept
{
    return 16 * gap_ * gap_ / mean_;
}

double AnnulusProfile::peak_velocity_ratio() const noexcept
{
    return 2 * shape_function(peak_defect_ / (1 + std::sqrt(peak_square_))) / mean_;
}

double AnnulusProfile::peak_radius() const noexcept
{
    return outer_radius_ * std::sqrt(peak_square_);
}

double AnnulusProfile::wall_shear_ratio_inner() const noexcept
{
    return (gap_ * (2 - gap_) - peak_defect_) / (ratio_ * gap_);
}

double AnnulusProfile::wall_shear_ratio_outer() const noexcept
{
    return peak_defect_ / gap_;
}

double AnnulusProfile::velocity_ratio(double radius) const noexcept
{
    const double y = depth(radius);
    return y <= 0 || y >= gap_ ? 0 : 2 * shape_function(y) / mean_;
}

double AnnulusProfile::flow_fraction(double from, double to) const noexcept
{
    return flow_outside(depth(from)) - flow_outside(depth(to));
}

double AnnulusProfile::depth(double radius) const noexcept
{
    return std::clamp((outer_radius_ - radius) / outer_radius_, 0.0, gap_);
}

double AnnulusProfile::shape_function(double y) const noexcept
{
    return y * (2 * peak_defect_ - y * (1 + peak_square_)) + 2 * peak_square_ * logarithm_remainder(y);
}

double AnnulusProfile::flow_outside(double y) const noexcept
{
    const double polynomial =
        y * y * (peak_defect_ - y * (2 * peak_defect_ + 1 + peak_square_) / 3 + y * y * (1 + peak_square_) / 4);
    return 4 / (mean_ * gap_ * (2 - gap_)) * (polynomial + 2 * peak_square_ * logarithm_remainder_flow(y));
}

} // namespace leat::passage
