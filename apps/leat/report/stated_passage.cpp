#include "report/stated_passage.hpp"

namespace leat::driver {

std::string shape_name(const Shape& shape)
{
    return std::holds_alternative<Tube>(shape)      ? "tube"
           : std::holds_alternative<Channel>(shape) ? "channel"
                                                    : "annulus";
}

std::string profile_name(InletProfile profile)
{
    switch (profile) {
    case InletProfile::flat:
        return "flat";
    case InletProfile::developed:
        return "developed";
    case InletProfile::table:
        break;
    }
    return "table";
}

std::string outlet_name(Outlet outlet)
{
    return outlet == Outlet::cut ? "cut" : "continues";
}

std::vector<StatedValue> sizes_of(const Shape& shape)
{
    if (const Tube* tube = std::get_if<Tube>(&shape)) {
        return {{"diameter", tube->diameter, "m"}, {"length", tube->length, "m"}};
    }
    if (const Channel* channel = std::get_if<Channel>(&shape)) {
        return {{"gap", channel->gap, "m"}, {"length", channel->length, "m"}};
    }
    const Annulus& annulus = std::get<Annulus>(shape);
    return {{"inner_diameter", annulus.inner_diameter, "m"},
            {"outer_diameter", annulus.outer_diameter, "m"},
            {"length", annulus.length, "m"}};
}

std::vector<StatedValue> derived_values(const Derived& derived, const Shape& shape)
{
    const bool per_width = std::holds_alternative<Channel>(shape);
    return {{"hydraulic_diameter", derived.hydraulic_diameter, "m"},
            {"area", derived.area, per_width ? "m" : "m^2"},
            {"density", derived.density, "kg/m^3"},
            {"viscosity", derived.viscosity, "Pa s"},
            {"mean_velocity", derived.mean_velocity, "m/s"},
            {"mass_flow_rate", derived.mass_flow_rate, per_width ? "kg/(s m)" : "kg/s"},
            {"reynolds_number", derived.reynolds_number, "1"}};
}

} // namespace leat::driver
