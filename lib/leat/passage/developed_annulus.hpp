#pragma once

namespace leat::passage {

/// Exact fully developed laminar flow in a concentric annulus (Lamb; Bird, Stewart & Lightfoot 1960, section 2.4;
/// Shah & London 1978, chapter XII), written so that nothing cancels: good to about 1e-13 from inner/outer = 1e-3
/// up to gaps of any thinness.
///
/// With r in units of the outer radius, kappa = inner/outer and m^2 = (1 - kappa^2)/(2 ln 1/kappa):
/// u/u_m = 2 g/M, g = 1 - r^2 + 2 m^2 ln r, M = 1 + kappa^2 - 2 m^2.
class AnnulusProfile {
public:
    /// Both diameters in m, 0 < inner < outer.
    AnnulusProfile(double inner_diameter, double outer_diameter);

    double friction_reynolds() const noexcept;           ///< Fanning f x Re on the hydraulic diameter
    double peak_velocity_ratio() const noexcept;         ///< u_max/u_m
    double peak_radius() const noexcept;                 ///< m
    double wall_shear_ratio_inner() const noexcept;      ///< wall shear there / perimeter mean
    double wall_shear_ratio_outer() const noexcept;      ///< wall shear there / perimeter mean
    double velocity_ratio(double radius) const noexcept; ///< u/u_m; 0 beyond a wall
    /// Exact share of the volume flow between two radii (m).
    double flow_fraction(double from, double to) const noexcept;

private:
    double depth(double radius) const noexcept;         // distance from the outer wall / outer radius, kept inside
    double shape_function(double depth) const noexcept; // g
    double flow_outside(double depth) const noexcept;   // share of the flow between the outer wall and depth

    double outer_radius_;
    double ratio_;       // kappa
    double gap_;         // 1 - kappa
    double peak_square_; // m^2
    double peak_defect_; // 1 - m^2
    double mean_;        // M
};

} // namespace leat::passage
