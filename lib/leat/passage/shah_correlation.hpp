#pragma once

#include <leat/passage/passage.hpp>

#include <optional>
#include <string>

namespace leat::passage {

/// Constants of the correlation of Shah 1978 (J. Fluids Eng. 100, 177-179) for the apparent friction of a duct with a
/// flat inlet, from the inlet to x.
struct ShahConstants {
    double excess = 0;            ///< K_inf, excess pressure number far down
    double friction_reynolds = 0; ///< developed Fanning f x Re
    double blend = 0;             ///< C
    std::string remark;           ///< which constants were interpolated between which; else empty

    /// f_app Re at x+ = x/(D_h Re) > 0: 3.44/sqrt(x+) + [K/(4 x+) + f Re - 3.44/sqrt(x+)]/[1 + C/x+^2].
    double apparent_friction_reynolds(double x_plus) const;
};

/// Ratios of diameters over which the annulus constants are tabulated.
inline constexpr double shah_least_ratio = 0.05;
inline constexpr double shah_largest_ratio = 0.75;

/// Tube and channel: as tabulated. Annulus: K and C as tabulated at 0.05, 0.1, 0.5, 0.75, linear in between (said in
/// `remark`), f Re exact; none outside that range.
std::optional<ShahConstants> shah_constants(const Shape& shape);

} // namespace leat::passage
