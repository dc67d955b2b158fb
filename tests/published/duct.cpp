#include "duct.hpp"

#include <leat/passage/developed.hpp>

#include <cmath>
#include <stdexcept>
#include <string>

namespace leat::published {

namespace {

Shape shape_of(const Duct& duct)
{
    const double length = duct.length * hydraulic_diameter;
    if (duct.geometry == "circular tube") {
        return Tube{.diameter = hydraulic_diameter, .length = length};
    }
    if (duct.geometry == "parallel plates") {
        return Channel{.gap = hydraulic_diameter / 2, .length = length};
    }
    if (duct.geometry == "concentric annulus") {
        const double outer = hydraulic_diameter / (1 - duct.radius_ratio);
        return Annulus{.inner_diameter = outer * duct.radius_ratio, .outer_diameter = outer, .length = length};
    }
    throw std::invalid_argument("no geometry '" + std::string(duct.geometry) + "'");
}

} // namespace

Passage passage_of(const Duct& duct)
{
    Passage passage;
    passage.shape = shape_of(duct);
    passage.fluid.density = density;
    passage.fluid.viscosity = density * mean_velocity * hydraulic_diameter / duct.reynolds_number;
    passage.inlet.profile = duct.inlet;
    passage.inlet.mean_velocity = mean_velocity;
    passage.outlet = duct.outlet;
    return passage;
}

double developed_friction_reynolds(const Duct& duct)
{
    return passage::developed_flow(shape_of(duct)).friction_reynolds;
}

Answer solved(const Duct& duct, std::array<int, 2> cells, const std::vector<double>& stations)
{
    Options options;
    options.cells = cells;
    for (const double x : stations) {
        options.stations.push_back(x * hydraulic_diameter);
    }
    Answer answer = solve(passage_of(duct), {}, options);
    if (!answer.usable) {
        throw std::runtime_error(answer.message);
    }
    return answer;
}

std::size_t station_at(const Answer& answer, double x)
{
    for (std::size_t k = 0; k < answer.stations.x.size(); ++k) {
        if (std::abs(answer.stations.x[k] / hydraulic_diameter - x) <= 1e-9 * x) {
            return k;
        }
    }
    throw std::out_of_range("no station at " + std::to_string(x) + " hydraulic diameters");
}

double observed_order(const std::array<double, 3>& values)
{
    return std::log2((values[0] - values[1]) / (values[1] - values[2]));
}

} // namespace leat::published
