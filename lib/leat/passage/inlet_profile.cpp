#include <leat/passage/inlet_profile.hpp>

namespace leat::passage {

InletDistribution::InletDistribution(const Passage& passage) : section_(section_of(passage.shape))
{
    switch (passage.inlet.profile) {
    case InletProfile::flat:
        break;
    case InletProfile::developed:
        profile_ = developed_flow(passage.shape);
        break;
    case InletProfile::table:
        profile_ = TabulatedProfile(passage.inlet.table.value(), passage.shape);
        break;
    }
}

double InletDistribution::flow_fraction(double from, double to) const noexcept
{
    const double parts = section_.radial ? 1 : 2; // half of a channel is solved
    if (const auto* developed = std::get_if<DevelopedFlow>(&profile_)) {
        return parts * developed->flow_fraction(from, to);
    }
    if (const auto* table = std::get_if<TabulatedProfile>(&profile_)) {
        return parts * table->flow_fraction(from, to);
    }
    return parts * section_.area_fraction(from, to);
}

double InletDistribution::velocity_ratio(double position) const noexcept
{
    if (const auto* developed = std::get_if<DevelopedFlow>(&profile_)) {
        return developed->velocity_ratio(position);
    }
    if (const auto* table = std::get_if<TabulatedProfile>(&profile_)) {
        return table->velocity_ratio(position);
    }
    return 1;
}

InletDistribution make_inlet(const Passage& passage)
{
    return InletDistribution(passage);
}

} // namespace leat::passage
