#include <leat/passage/developed.hpp>

#include <algorithm>

namespace leat::passage {

namespace {

DevelopedFlow flow(const Tube&)
{
    DevelopedFlow tube;
    tube.friction_reynolds = 16;
    tube.peak_velocity_ratio = 2;
    return tube;
}

DevelopedFlow flow(const Channel& channel)
{
    DevelopedFlow plane;
    plane.friction_reynolds = 24;
    plane.peak_velocity_ratio = 1.5;
    plane.peak_position = channel.gap / 2;
    return plane;
}

DevelopedFlow flow(const Annulus& annulus)
{
    const AnnulusProfile profile(annulus.inner_diameter, annulus.outer_diameter);
    DevelopedFlow ring;
    ring.friction_reynolds = profile.friction_reynolds();
    ring.peak_velocity_ratio = profile.peak_velocity_ratio();
    ring.peak_position = profile.peak_radius();
    ring.wall_shear_ratio_inner = profile.wall_shear_ratio_inner();
    ring.wall_shear_ratio_outer = profile.wall_shear_ratio_outer();
    ring.annulus = profile;
    return ring;
}

} // namespace

double DevelopedFlow::velocity_ratio(double position) const noexcept
{
    if (annulus) {
        return annulus->velocity_ratio(position);
    }
    const double inside = std::clamp(position, section.first, section.last);
    const double to_wall = (section.last - inside) / section.last;
    const double from_start = inside / section.last;
    return section.radial ? 2 * to_wall * (1 + from_start) : 6 * to_wall * from_start;
}

double DevelopedFlow::flow_fraction(double from, double to) const noexcept
{
    if (annulus) {
        return annulus->flow_fraction(from, to);
    }
    const double end = section.last;
    double a = std::clamp(from, 0.0, end) / end;
    double b = std::clamp(to, 0.0, end) / end;
    if (section.radial) {
        // (b^2 - a^2)(2 - a^2 - b^2), kept exact next to the wall
        return (b - a) * (b + a) * ((1 - a) * (1 + a) + (1 - b) * (1 + b));
    }
    const double share = b - a;
    if (a + b > 1) { // the mirror image has no cancellation next to the upper wall
        a = (end - std::clamp(from, 0.0, end)) / end;
        b = (end - std::clamp(to, 0.0, end)) / end;
    }
    return share * (3 * (a + b) - 2 * (a * a + a * b + b * b));
}

DevelopedFlow developed_flow(const Shape& shape)
{
    DevelopedFlow developed = std::visit([](const auto& kind) { return flow(kind); }, shape);
    developed.section = section_of(shape);
    return developed;
}

} // namespace leat::passage
