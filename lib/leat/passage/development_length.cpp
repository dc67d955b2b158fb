#include <leat/passage/development_length.hpp>

#include <cmath>

namespace leat::passage {

namespace {

double blend(double creeping, double boundary_layer)
{
    return std::pow(std::pow(creeping, 1.6) + std::pow(boundary_layer, 1.6), 1 / 1.6);
}

/// The formula is on the gap, whose Reynolds number is half of that on the hydraulic diameter.
double over_gap(double reynolds_number)
{
    return blend(0.631, 0.0442 * reynolds_number / 2);
}

double estimate(const Tube& tube, double reynolds_number)
{
    return tube.diameter * blend(0.619, 0.0567 * reynolds_number);
}

double estimate(const Channel& channel, double reynolds_number)
{
    return channel.gap * over_gap(reynolds_number);
}

double estimate(const Annulus& annulus, double reynolds_number)
{
    return (annulus.outer_diameter - annulus.inner_diameter) / 2 * over_gap(reynolds_number);
}

} // namespace

double development_length_estimate(const Shape& shape, double reynolds_number)
{
    return std::visit([reynolds_number](const auto& kind) { return estimate(kind, reynolds_number); }, shape);
}

} // namespace leat::passage
