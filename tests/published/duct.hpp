#pragma once

#include <leat/leat.hpp>

#include <array>
#include <string_view>
#include <vector>

namespace leat::published {

/// A passage by its dimensionless numbers, with the geometries named as in the tables of tests/reference.
struct Duct {
    std::string_view geometry;  ///< "circular tube", "parallel plates" or "concentric annulus"
    double reynolds_number = 0; ///< on the hydraulic diameter
    double length = 0;          ///< in hydraulic diameters
    double radius_ratio = 0;    ///< annulus: inner/outer
    InletProfile inlet = InletProfile::flat;
    Outlet outlet = Outlet::continues;
};

// The real passage behind it: numbers away from 1, so that a missing factor shows.
inline constexpr double hydraulic_diameter = 8e-3;                                        // m
inline constexpr double density = 865;                                                    // kg/m^3
inline constexpr double mean_velocity = 0.45;                                             // m/s
inline constexpr double dynamic_pressure = 0.5 * density * mean_velocity * mean_velocity; // Pa

/// Throws std::invalid_argument for a geometry that is not named above.
Passage passage_of(const Duct& duct);

/// Developed Fanning f x Re of the geometry, exact.
double developed_friction_reynolds(const Duct& duct);

/// Solves on cells along x across, with stations in hydraulic diameters. Throws std::runtime_error unless converged.
Answer solved(const Duct& duct, std::array<int, 2> cells, const std::vector<double>& stations = {});

/// The station at x (hydraulic diameters). Throws std::out_of_range when there is none.
std::size_t station_at(const Answer& answer, double x);

/// Observed order of three values on grids refined by two, coarsest first: log2 of the ratio of their differences.
double observed_order(const std::array<double, 3>& values);

} // namespace leat::published
