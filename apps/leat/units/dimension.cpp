#include "units/dimension.hpp"

#include <array>
#include <cstddef>

namespace leat::driver {

namespace {

// In the order of Dimension; then those that a case does not ask for but may hold by mistake.
constexpr std::array<DimensionName, 21> names{{
    {"a ratio", "1", "%"},
    {"a length", "m", "mm"},
    {"a velocity", "m/s", "m/s"},
    {"a density", "kg/m^3", "kg/m^3"},
    {"a dynamic viscosity", "Pa.s", "mPa.s"},
    {"a kinematic viscosity", "m^2/s", "cSt"},
    {"a volume flow", "m^3/s", "L/min"},
    {"a volume flow per width", "m^2/s", "L/min/m"},
    {"a mass flow", "kg/s", "kg/h"},
    {"a mass flow per width", "kg/(s.m)", "kg/(h.m)"},
    {"a pressure", "Pa", "bar"},
    {"an area", "m^2", "mm^2"},
    {"a volume", "m^3", "L"},
    {"a time", "s", "s"},
    {"a mass", "kg", "kg"},
    {"a temperature", "K", "K"},
    {"a force", "N", "N"},
    {"an acceleration", "m/s^2", "m/s^2"},
    {"a frequency", "1/s", "Hz"},
    {"a power", "W", "W"},
    {"an energy", "J", "J"},
}};

} // namespace

const DimensionName& name_of(Dimension dimension)
{
    return names[static_cast<std::size_t>(dimension)];
}

std::span<const DimensionName> known_dimensions()
{
    return names;
}

} // namespace leat::driver
