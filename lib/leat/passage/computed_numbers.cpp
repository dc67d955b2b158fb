#include <leat/passage/computed_numbers.hpp>

#include <array>

namespace leat::passage {

namespace {

constexpr std::array<std::string_view, 14> names = {"pressure_drop",
                                                    "pressure_drop_from_rest",
                                                    "pumping_power",
                                                    "apparent_friction_factor",
                                                    "apparent_friction_reynolds",
                                                    "incremental_pressure_number",
                                                    "development_length",
                                                    "core_velocity_ratio",
                                                    "peak_velocity_ratio",
                                                    "wall_shear_outlet",
                                                    "wall_shear_outlet_inner",
                                                    "wall_shear_outlet_outer",
                                                    "friction_reynolds_outlet",
                                                    "wall_shear_mean"};

Number* where(std::optional<Number>& number)
{
    return number ? &*number : nullptr;
}

} // namespace

std::vector<ComputedNumber> computed_numbers(Numbers& n)
{
    const std::array<Number*, names.size()> members = {&n.pressure_drop,
                                                       where(n.pressure_drop_from_rest),
                                                       &n.pumping_power,
                                                       &n.apparent_friction_factor,
                                                       &n.apparent_friction_reynolds,
                                                       &n.incremental_pressure_number,
                                                       where(n.development_length),
                                                       &n.core_velocity_ratio,
                                                       &n.peak_velocity_ratio,
                                                       where(n.wall_shear_outlet),
                                                       where(n.wall_shear_outlet_inner),
                                                       where(n.wall_shear_outlet_outer),
                                                       where(n.friction_reynolds_outlet),
                                                       where(n.wall_shear_mean)};
    std::vector<ComputedNumber> list;
    for (std::size_t k = 0; k < names.size(); ++k) {
        list.push_back({names[k], members[k]});
    }
    return list;
}

std::span<const std::string_view> computed_names() noexcept
{
    return names;
}

} // namespace leat::passage
