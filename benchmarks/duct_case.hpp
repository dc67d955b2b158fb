#pragma once

#include <leat/leat.hpp>
#include <leat/passage/development_length.hpp>
#include <leat/passage/duct_flow.hpp>
#include <leat/passage/readings.hpp>

#include <algorithm>
#include <array>
#include <cmath>
#include <memory>
#include <string>
#include <vector>

namespace leat::benchmark {

/// A developing flow on one grid: flat inlet, one and a half development lengths, cut at the end.
struct DuctCase {
    std::string name;
    Passage passage;
    Derived derived;
    passage::DuctGrid grid;

    mesh::Grid<2> cells() const { return grid.grid(); }
    coupling::FlowProblem<2> problem() const { return passage::duct_problem(passage, derived, {}); }
    coupling::FlowState<2> guess() const { return passage::first_guess(passage, derived, grid); }
    double count() const { return static_cast<double>(cells().cells(0)) * cells().cells(1); }
};

inline Shape tube()
{
    return Tube{.diameter = 1, .length = 1};
}
inline Shape channel()
{
    return Channel{.gap = 0.5, .length = 1};
}
inline Shape annulus(double radius_ratio)
{
    const double outer = 1 / (1 - radius_ratio);
    return Annulus{.inner_diameter = radius_ratio * outer, .outer_diameter = outer, .length = 1};
}

inline std::string shape_name(const Shape& shape)
{
    if (const auto* ring = std::get_if<Annulus>(&shape)) {
        char text[32];
        std::snprintf(text, sizeof text, "annulus %.2f", ring->inner_diameter / ring->outer_diameter);
        return text;
    }
    return std::holds_alternative<Tube>(shape) ? "tube" : "channel";
}

/// The case of a shape of hydraulic diameter 1 (its length is replaced), with the default gradings.
inline DuctCase duct_case(const Shape& shape, double reynolds, std::array<int, 2> cells)
{
    DuctCase result;
    result.name = shape_name(shape);
    result.passage.shape = shape;
    std::visit([&](auto& s) { s.length = 1.5 * passage::development_length_estimate(shape, reynolds); },
               result.passage.shape);
    result.passage.fluid = {.density = 1, .viscosity = 1 / reynolds};
    result.passage.inlet.mean_velocity = 1;
    result.passage.outlet = Outlet::cut;
    result.derived = derive(result.passage);
    result.grid = passage::make_grid(result.passage, result.derived, cells);
    return result;
}

/// The same on the grid whose cells are unions of two by two.
inline DuctCase coarser(const DuctCase& fine)
{
    DuctCase result = fine;
    const auto leave_out = [](const std::vector<double>& faces) {
        std::vector<double> kept;
        for (std::size_t k = 0; k < faces.size(); k += 2) {
            kept.push_back(faces[k]);
        }
        return kept;
    };
    result.grid.along = leave_out(fine.grid.along);
    result.grid.across = leave_out(fine.grid.across);
    result.grid.end = fine.grid.end / 2;
    return result;
}

inline std::string cells_text(const DuctCase& duct)
{
    return std::to_string(duct.cells().cells(0)) + "x" + std::to_string(duct.cells().cells(1));
}

/// The core pressure drop (in density u_m^2) and the core velocity (in u_m) at every axial face.
struct CoreNumbers {
    double pressure_drop = 0;
    std::vector<double> velocity;
};

/// Reads the state of level 0.
inline CoreNumbers read_core(const DuctCase& duct, std::unique_ptr<cascade::Cascade<2>>& cascade)
{
    passage::DuctFlow flow;
    flow.grid = duct.grid;
    flow.reynolds_number = duct.derived.reynolds_number;
    flow.cascade = std::move(cascade);
    const passage::Readings readings = passage::read_duct(duct.passage, duct.derived, flow);
    cascade = std::move(flow.cascade);
    return {readings.core_pressure_inlet - readings.mean_pressure_end, readings.core_velocity};
}

/// Pressure drop, and greatest distance of the velocities; `finer` may stand on a grid twice as fine.
struct Distance {
    double pressure_drop = 0;
    double velocity = 0;
};

inline Distance distance(const CoreNumbers& a, const CoreNumbers& finer)
{
    const std::size_t step = (finer.velocity.size() - 1) / (a.velocity.size() - 1);
    Distance result{std::abs(a.pressure_drop - finer.pressure_drop), 0};
    for (std::size_t k = 0; k < a.velocity.size(); ++k) {
        result.velocity = std::max(result.velocity, std::abs(a.velocity[k] - finer.velocity[step * k]));
    }
    return result;
}

} // namespace leat::benchmark
