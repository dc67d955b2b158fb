#pragma once

#include <span>
#include <string_view>

namespace leat::driver {

/// What a quantity of a case is.
enum class Dimension {
    ratio,
    length,
    velocity,
    density,
    dynamic_viscosity,
    kinematic_viscosity,
    volume_flow,
    volume_flow_per_width,
    mass_flow,
    mass_flow_per_width
};

/// How a dimension is spoken of.
struct DimensionName {
    std::string_view name;    ///< "a length"
    std::string_view si_unit; ///< "m"
    std::string_view example; ///< a usual unit: "mm"
};

const DimensionName& name_of(Dimension dimension);

/// The dimensions that a message can name, those of `Dimension` first.
std::span<const DimensionName> known_dimensions();

} // namespace leat::driver
