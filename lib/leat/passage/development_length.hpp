#pragma once

#include <leat/passage/passage.hpp>

namespace leat::passage {

/// Length (m) after which the core velocity of a flat inlet is within 1 % of its developed value, by Durst, Ray, Unsal
/// & Bayoumi 2005 (J. Fluids Eng. 127, 1154-1160): L/D = [0.619^1.6 + (0.0567 Re_D)^1.6]^(1/1.6) for a tube,
/// L/h = [0.631^1.6 + (0.0442 Re_h)^1.6]^(1/1.6) for a channel of gap h; an annulus is taken as a channel of the same
/// gap. Within about 5 % of the exact length of the first two. `reynolds_number` is on the hydraulic diameter.
double development_length_estimate(const Shape& shape, double reynolds_number);

} // namespace leat::passage
