#pragma once

#include <leat/passage/passage.hpp>

namespace leat::test {

/// Oil in a tube: valid, laminar (Re 111), neither short nor long.
inline Passage oil_line()
{
    Passage passage;
    passage.shape = Tube{.diameter = 8e-3, .length = 0.5};
    passage.fluid = {.density = 865, .viscosity = 28e-3, .kinematic_viscosity = std::nullopt};
    passage.inlet.mean_velocity = 0.45;
    return passage;
}

/// The same fluid and velocity in another shape.
inline Passage oil_in(const Shape& shape)
{
    Passage passage = oil_line();
    passage.shape = shape;
    return passage;
}

} // namespace leat::test
