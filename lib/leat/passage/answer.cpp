#include <leat/passage/answer.hpp>

#include <algorithm>

namespace leat {

namespace {

/// A number that every answer has.
NamedNumber present(std::string_view name, std::string_view unit, std::string_view meaning, const Number& number)
{
    return {name, unit, meaning, number, {}};
}

/// A number that some answers lack; `usual` is the reason when the answer gives none itself.
NamedNumber where_defined(std::string_view name, std::string_view unit, std::string_view meaning,
                          const std::optional<Number>& number, const Numbers& numbers, std::string_view usual)
{
    if (number) {
        return present(name, unit, meaning, *number);
    }
    const auto line = std::find_if(numbers.absent.begin(), numbers.absent.end(),
                                   [name](const Numbers::Absent& absent) { return absent.name == name; });
    return {name, unit, meaning, std::nullopt, line != numbers.absent.end() ? line->reason : std::string(usual)};
}

Stations::Column defined_everywhere(const std::vector<double>& values)
{
    return {values.begin(), values.end()};
}

} // namespace

std::vector<NamedNumber> Answer::named_numbers() const
{
    const Numbers& n = numbers;
    return {
        present("reynolds_number", "1", "density x mean velocity x hydraulic diameter / viscosity", n.reynolds_number),
        present("hydraulic_diameter", "m", "4 area / wetted perimeter", n.hydraulic_diameter),
        present("mean_velocity", "m/s", "volume flow / area", n.mean_velocity),
        present("mass_flow_rate", channel ? "kg/(s m)" : "kg/s", "mass flow", n.mass_flow_rate),
        present("pressure_drop", "Pa", "core of the inlet plane to section mean at the end", n.pressure_drop),
        where_defined("pressure_drop_from_rest", "Pa", "from a still reservoir through a loss-free bell mouth",
                      n.pressure_drop_from_rest, n, "only for a flat inlet"),
        present("pumping_power", channel ? "W/m" : "W", "pressure drop x volume flow", n.pumping_power),
        present("apparent_friction_factor", "1", "Fanning, from the pressure drop", n.apparent_friction_factor),
        present("apparent_friction_reynolds", "1", "apparent friction factor x Reynolds number",
                n.apparent_friction_reynolds),
        present("incremental_pressure_number", "1", "excess over developed flow, in units of rho u_m^2/2",
                n.incremental_pressure_number),
        where_defined("development_length", "m", "last x where the core velocity is 1 % off its developed value",
                      n.development_length, n, "the passage ends before the flow is developed"),
        present("core_velocity_ratio", "1", "core velocity / mean velocity at the end", n.core_velocity_ratio),
        present("peak_velocity_ratio", "1", "largest velocity / mean velocity at the end", n.peak_velocity_ratio),
        where_defined("wall_shear_outlet", "Pa", "perimeter mean at the end", n.wall_shear_outlet, n,
                      "not given at a cut end"),
        where_defined("wall_shear_outlet_inner", "Pa", "inner wall at the end", n.wall_shear_outlet_inner, n,
                      "only for an annulus, and not at a cut end"),
        where_defined("wall_shear_outlet_outer", "Pa", "outer wall at the end", n.wall_shear_outlet_outer, n,
                      "only for an annulus, and not at a cut end"),
        where_defined("friction_reynolds_outlet", "1", "local Fanning friction factor x Reynolds number at the end",
                      n.friction_reynolds_outlet, n, "not given at a cut end"),
        where_defined("wall_shear_mean", "Pa", "over all wetted walls", n.wall_shear_mean, n,
                      "only for a developed inlet: it has no limit behind a jump at the wall"),
    };
}

std::vector<NamedColumn> Answer::named_columns() const
{
    const Stations& s = stations;
    std::vector<NamedColumn> columns{
        {"x", "m", "distance from the inlet", defined_everywhere(s.x)},
        {"x_plus", "1", "x/(D_h Re)", defined_everywhere(s.x_plus)},
        {"core_pressure", "Pa", "core, relative to the mean at the end", s.core_pressure},
        {"mean_pressure", "Pa", "section mean, relative to the mean at the end", s.mean_pressure},
        {"apparent_friction_reynolds", "1", "from the core pressure drop up to x", s.apparent_friction_reynolds},
        {"local_friction_reynolds", "1", "from the wall shear at x", s.local_friction_reynolds},
        {"wall_shear", "Pa", "perimeter mean", s.wall_shear},
        {"wall_shear_inner", "Pa", "inner wall", s.wall_shear_inner},
        {"wall_shear_outer", "Pa", "outer wall", s.wall_shear_outer},
        {"wall_shear_lower", "Pa", "lower wall", s.wall_shear_lower},
        {"wall_shear_upper", "Pa", "upper wall", s.wall_shear_upper},
        {"core_velocity_ratio", "1", "core velocity / mean velocity", s.core_velocity_ratio},
        {"peak_velocity_ratio", "1", "largest velocity / mean velocity", s.peak_velocity_ratio},
    };
    // The walls that a shape does not have.
    std::erase_if(columns, [](const NamedColumn& column) {
        return column.values.empty() && column.name.starts_with("wall_shear_");
    });
    return columns;
}

} // namespace leat
