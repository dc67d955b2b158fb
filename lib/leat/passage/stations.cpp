#include <leat/passage/stations.hpp>

#include <leat/field/interpolation.hpp>

#include <array>

namespace leat::passage {

namespace {

/// Default stations, in lengths of the passage: fixed places that no grid moves, dense near the inlet.
constexpr std::array<double, 24> default_places = {0,    0.001, 0.002, 0.003, 0.005, 0.007, 0.01, 0.015,
                                                   0.02, 0.03,  0.04,  0.05,  0.07,  0.1,   0.15, 0.2,
                                                   0.3,  0.4,   0.5,   0.6,   0.7,   0.8,   0.9,  1};

std::vector<double> places(const Derived& derived, const Options& options)
{
    if (!options.stations.empty()) {
        return options.stations;
    }
    std::vector<double> x;
    for (const double place : default_places) {
        x.push_back(place * derived.length);
    }
    return x;
}

} // namespace

Stations make_stations(const Passage& passage, const Derived& derived, const Options& options, const Readings& readings)
{
    Stations stations;
    stations.x = places(derived, options);
    const double diameter = derived.hydraulic_diameter;
    const double re = derived.reynolds_number;
    const double dynamic = 0.5 * derived.density * derived.mean_velocity * derived.mean_velocity;
    const bool flat = passage.inlet.profile == InletProfile::flat;
    const bool developed = passage.inlet.profile == InletProfile::developed;
    const bool channel = std::holds_alternative<Channel>(passage.shape);
    const bool annulus = std::holds_alternative<Annulus>(passage.shape);
    for (const double x_si : stations.x) {
        const double x = x_si / diameter;
        const double core_pressure =
            x == 0 ? readings.core_pressure_inlet : field::interpolate(readings.pressure_at, readings.core_pressure, x);
        stations.x_plus.push_back(x / re);
        stations.core_pressure.push_back(2 * dynamic * (core_pressure - readings.mean_pressure_end));
        stations.apparent_friction_reynolds.push_back(
            x > 0 ? std::optional(2 * (readings.core_pressure_inlet - core_pressure) * re / (4 * x)) : std::nullopt);
        stations.core_velocity_ratio.push_back(field::interpolate(readings.face, readings.core_velocity, x));
        stations.peak_velocity_ratio.push_back(field::interpolate(readings.face, readings.peak_velocity, x));

        // A flat inlet meets the wall with a jump: nearer to it than the first unknown there is nothing to read.
        const bool has_mean = !flat || x >= readings.mean_at.front();
        stations.mean_pressure.push_back(
            has_mean ? std::optional(2 * dynamic *
                                     (field::interpolate(readings.mean_at, readings.mean_pressure, x) -
                                      readings.mean_pressure_end))
                     : std::nullopt);
        const bool at_cut = passage.outlet == Outlet::cut && x_si >= derived.length;
        const bool has_shear = !at_cut && (developed || x >= readings.shear_face.front());
        const auto read = [&](const std::vector<double>& friction, double scale) -> std::optional<double> {
            return has_shear ? std::optional(scale * field::interpolate(readings.shear_face, friction, x))
                             : std::nullopt;
        };
        stations.local_friction_reynolds.push_back(read(readings.shear_mean, 1));
        stations.wall_shear.push_back(read(readings.shear_mean, dynamic / re));
        if (annulus) {
            stations.wall_shear_inner.push_back(read(readings.shear_first, dynamic / re));
            stations.wall_shear_outer.push_back(read(readings.shear_last, dynamic / re));
        }
        if (channel) { // solved over its lower half
            stations.wall_shear_lower.push_back(read(readings.shear_first, dynamic / re));
            stations.wall_shear_upper.push_back(read(readings.shear_first, dynamic / re));
        }
    }
    return stations;
}

} // namespace leat::passage
