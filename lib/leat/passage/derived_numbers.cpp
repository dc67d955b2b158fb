#include <leat/passage/derived_numbers.hpp>
#include <leat/passage/section.hpp>

#include <numbers>

namespace leat::passage {

namespace {

void measure(const Tube& tube, Derived& derived)
{
    derived.hydraulic_diameter = tube.diameter;
    derived.area = std::numbers::pi / 4 * tube.diameter * tube.diameter;
    derived.wetted_perimeter = std::numbers::pi * tube.diameter;
}

void measure(const Channel& channel, Derived& derived)
{
    derived.hydraulic_diameter = 2 * channel.gap;
    derived.area = channel.gap;
    derived.wetted_perimeter = 2;
}

void measure(const Annulus& annulus, Derived& derived)
{
    const double difference = annulus.outer_diameter - annulus.inner_diameter;
    const double sum = annulus.outer_diameter + annulus.inner_diameter;
    derived.hydraulic_diameter = difference;
    derived.area = std::numbers::pi / 4 * difference * sum;
    derived.wetted_perimeter = std::numbers::pi * sum;
}

} // namespace

Derived derived_numbers(const Passage& passage)
{
    Derived derived;
    derived.length = length_of(passage.shape);
    std::visit([&derived](const auto& kind) { measure(kind, derived); }, passage.shape);

    const Fluid& fluid = passage.fluid;
    derived.density = fluid.density;
    derived.viscosity = fluid.viscosity ? *fluid.viscosity : fluid.kinematic_viscosity.value_or(0) * fluid.density;

    const Inlet& inlet = passage.inlet;
    if (inlet.mean_velocity) {
        derived.mean_velocity = *inlet.mean_velocity;
    } else if (inlet.flow_rate) {
        derived.mean_velocity = *inlet.flow_rate / derived.area;
    } else if (inlet.mass_flow_rate) {
        derived.mean_velocity = *inlet.mass_flow_rate / (derived.density * derived.area);
    } else if (inlet.reynolds_number) {
        derived.mean_velocity =
            *inlet.reynolds_number * derived.viscosity / (derived.density * derived.hydraulic_diameter);
    }
    derived.mass_flow_rate =
        inlet.mass_flow_rate ? *inlet.mass_flow_rate : derived.density * derived.mean_velocity * derived.area;
    derived.reynolds_number = inlet.reynolds_number ? *inlet.reynolds_number
                                                    : derived.density * derived.mean_velocity *
                                                          derived.hydraulic_diameter / derived.viscosity;
    return derived;
}

} // namespace leat::passage
