#pragma once

#include <leat/passage/developed_annulus.hpp>
#include <leat/passage/passage.hpp>
#include <leat/passage/section.hpp>

#include <optional>

namespace leat::passage {

/// Exact fully developed laminar flow in a shape (Shah & London 1978, chapters V, VI and XII).
/// Positions are those of Section: radius, or distance from the lower wall of a channel (the whole gap).
struct DevelopedFlow {
    double friction_reynolds = 0;      ///< Fanning f x Re on the hydraulic diameter
    double peak_velocity_ratio = 0;    ///< u_max/u_m
    double peak_position = 0;          ///< m
    double wall_shear_ratio_inner = 1; ///< annulus: shear of the inner wall / perimeter mean; else 1
    double wall_shear_ratio_outer = 1; ///< annulus: shear of the outer wall / perimeter mean; else 1

    /// u/u_m at a position (m); 0 on and beyond a wall.
    double velocity_ratio(double position) const noexcept;
    /// Exact share of the volume flow of the whole section between two positions (m), each taken inside the section;
    /// negative when `to` < `from`.
    double flow_fraction(double from, double to) const noexcept;

    Section section;                       ///< where the positions lie
    std::optional<AnnulusProfile> annulus; ///< only for an annulus
};

/// For a valid shape (see faults_of).
DevelopedFlow developed_flow(const Shape& shape);

} // namespace leat::passage
