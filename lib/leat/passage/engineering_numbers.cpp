#include <leat/passage/engineering_numbers.hpp>

#include <leat/field/interpolation.hpp>
#include <leat/passage/developed.hpp>

namespace leat::passage {

namespace {

constexpr double development_tolerance = 0.01; // of the developed core velocity

Number exact(double value)
{
    return {value, 0.0, true, {}};
}
Number computed(double value)
{
    return {value, std::nullopt, true, {}};
}

/// Mean of the friction over the passage by the trapezoidal rule over the axial faces.
double mean_friction(const Readings& readings, double developed_at_inlet, double length)
{
    double sum = 0;
    double before = 0;
    double value_before = developed_at_inlet;
    for (std::size_t k = 0; k < readings.shear_face.size() && before < length; ++k) {
        sum += 0.5 * (readings.shear_mean[k] + value_before) * (readings.shear_face[k] - before);
        before = readings.shear_face[k];
        value_before = readings.shear_mean[k];
    }
    return sum / length;
}

/// Wall shear and friction at the end, and the mean of a developed inlet.
void add_wall_numbers(const Passage& passage, const Derived& derived, const Readings& readings, Numbers& numbers)
{
    const double dynamic = 0.5 * derived.density * derived.mean_velocity * derived.mean_velocity;
    const double end = derived.length / derived.hydraulic_diameter;
    const double to_shear = dynamic / derived.reynolds_number;
    const bool annulus = std::holds_alternative<Annulus>(passage.shape);
    if (passage.outlet == Outlet::cut) {
        const std::string reason = "at a cut end the wall shear converges too slowly (like the cell size to the power "
                                   "0.35) to be given";
        numbers.absent.push_back({"wall_shear_outlet", reason});
        numbers.absent.push_back({"friction_reynolds_outlet", reason});
        if (annulus) {
            numbers.absent.push_back({"wall_shear_outlet_inner", reason});
            numbers.absent.push_back({"wall_shear_outlet_outer", reason});
        }
    } else {
        const auto at_end = [&](const std::vector<double>& friction) {
            return field::interpolate(readings.shear_face, friction, end);
        };
        numbers.friction_reynolds_outlet = computed(at_end(readings.shear_mean));
        numbers.wall_shear_outlet = computed(to_shear * at_end(readings.shear_mean));
        if (annulus) {
            numbers.wall_shear_outlet_inner = computed(to_shear * at_end(readings.shear_first));
            numbers.wall_shear_outlet_outer = computed(to_shear * at_end(readings.shear_last));
        }
    }
    if (!annulus) {
        for (const char* name : {"wall_shear_outlet_inner", "wall_shear_outlet_outer"}) {
            numbers.absent.push_back({name, "only an annulus has an inner and an outer wall"});
        }
    }
    if (passage.inlet.profile == InletProfile::flat) {
        numbers.absent.push_back(
            {"wall_shear_mean", "has no limit where the inlet profile meets the wall with a jump: the shear grows like "
                                "1/distance from the corner; given for a developed inlet only"});
    } else if (passage.inlet.profile == InletProfile::table) {
        numbers.absent.push_back({"wall_shear_mean", "given for a developed inlet only: the shear beside the inlet "
                                                     "depends on how the table meets the wall"});
    } else if (passage.outlet == Outlet::cut) {
        numbers.absent.push_back({"wall_shear_mean", "the wall shear at the cut end converges too slowly to be given"});
    } else {
        const double at_inlet = developed_flow(passage.shape).friction_reynolds;
        numbers.wall_shear_mean = computed(to_shear * mean_friction(readings, at_inlet, end));
    }
}

void add_development_length(const Passage& passage, const Derived& derived, const Readings& readings, Numbers& numbers)
{
    const DevelopedFlow developed = developed_flow(passage.shape);
    const double end = derived.length / derived.hydraulic_diameter;
    const double target = developed.peak_velocity_ratio;
    const double crossing =
        field::last_crossing(readings.face, readings.core_velocity, target, development_tolerance * target, end);
    if (crossing < end) {
        numbers.development_length = computed(crossing * derived.hydraulic_diameter);
    } else {
        numbers.absent.push_back({"development_length", "the passage ends before the core velocity is within 1 % of "
                                                        "its developed value"});
    }
}

} // namespace

Numbers make_numbers(const Passage& passage, const Derived& derived, const Readings& readings)
{
    Numbers numbers;
    const double dynamic = 0.5 * derived.density * derived.mean_velocity * derived.mean_velocity;
    const double re = derived.reynolds_number;
    const double end = derived.length / derived.hydraulic_diameter;
    // in units of the dynamic pressure
    const double drop = 2 * (readings.core_pressure_inlet - readings.mean_pressure_end);
    const double developed_drop = 4 * developed_flow(passage.shape).friction_reynolds * end / re;

    numbers.reynolds_number = exact(re);
    numbers.hydraulic_diameter = exact(derived.hydraulic_diameter);
    numbers.mean_velocity = exact(derived.mean_velocity);
    numbers.mass_flow_rate = exact(derived.mass_flow_rate);
    numbers.pressure_drop = computed(drop * dynamic);
    if (passage.inlet.profile == InletProfile::flat) {
        numbers.pressure_drop_from_rest = computed((drop + 1) * dynamic);
    } else {
        numbers.absent.push_back({"pressure_drop_from_rest", "belongs to a flat inlet only"});
    }
    numbers.pumping_power = computed(drop * dynamic * derived.mass_flow_rate / derived.density);
    numbers.apparent_friction_factor = computed(drop / (4 * end));
    numbers.apparent_friction_reynolds = computed(drop * re / (4 * end));
    numbers.incremental_pressure_number = computed(drop - developed_drop);
    add_development_length(passage, derived, readings, numbers);
    numbers.core_velocity_ratio = computed(field::interpolate(readings.face, readings.core_velocity, end));
    numbers.peak_velocity_ratio = computed(field::interpolate(readings.face, readings.peak_velocity, end));
    add_wall_numbers(passage, derived, readings, numbers);
    return numbers;
}

} // namespace leat::passage
