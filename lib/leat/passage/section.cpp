#include <leat/passage/section.hpp>

namespace leat::passage {

namespace {

Section section(const Tube& tube)
{
    return {.first = 0, .last = tube.diameter / 2, .radial = true};
}
Section section(const Channel& channel)
{
    return {.first = 0, .last = channel.gap, .radial = false};
}
Section section(const Annulus& annulus)
{
    return {.first = annulus.inner_diameter / 2, .last = annulus.outer_diameter / 2, .radial = true};
}

} // namespace

double Section::area_fraction(double from, double to) const noexcept
{
    // Ratios first: squares of very small radii would underflow.
    const double share = (to - from) / width();
    return radial ? share * ((to + from) / (last + first)) : share;
}

Section section_of(const Shape& shape)
{
    return std::visit([](const auto& kind) { return section(kind); }, shape);
}

double length_of(const Shape& shape)
{
    return std::visit([](const auto& kind) { return kind.length; }, shape);
}

} // namespace leat::passage
