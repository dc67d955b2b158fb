#include <leat/mesh/duct.hpp>

#include <leat/base/error.hpp>

#include <algorithm>
#include <cmath>

namespace leat::mesh {

namespace {

constexpr int least_coarse_cells = 5;     // of the passage on the coarsest grid
constexpr int least_unit = 4;             // tails of any grid whose `cells` allow it can be halved twice
constexpr double gentle_growth = 6;       // of ln(cell size) per `cells` cells of the tail
constexpr int longest_tail = 2;           // in units of the passage's cells
constexpr double logarithmic_share = 0.6; // of ln(outer/inner) taken up by the inner wall's extra clustering

/// The length of a tail whose cells start at `step` and grow by exp(growth) per unit.
double tail_reach(double step, double growth, double units)
{
    return growth * units < 1e-9 ? step * units : step * std::expm1(growth * units) / growth;
}

double growth_for(double step, double units, double reach)
{
    if (tail_reach(step, 0, units) >= reach) {
        return 0;
    }
    double low = 0;
    double high = 1;
    while (tail_reach(step, high, units) < reach) {
        high *= 2;
    }
    for (int k = 0; k < 60; ++k) {
        const double middle = 0.5 * (low + high);
        (tail_reach(step, middle, units) < reach ? low : high) = middle;
    }
    return high;
}

} // namespace

DuctFaces along_duct(const AlongDuct& wish)
{
    Faults faults;
    faults.require_positive("length", wish.length, "m");
    faults.require_positive("first_cell", wish.first_cell, "m");
    if (wish.cells < 1) {
        faults.add("cells", std::to_string(wish.cells), "must be at least 1");
    }
    if (!(wish.tail_length >= 0)) {
        faults.add("tail_length", to_text(wish.tail_length), "must be >= 0 m");
    }
    faults.throw_if_any();

    const double ratio = wish.first_cell * wish.cells / wish.length;
    const double strength = ratio < 1 ? strength_for_first_cell(ratio) : 0;
    DuctFaces result;
    result.faces = sample(towards_start(strength), wish.cells, 0, wish.length);
    result.end = wish.cells;
    if (wish.tail_length == 0) {
        return result;
    }
    int unit = 1;
    while (wish.cells % (2 * unit) == 0 && (wish.cells / (2 * unit) >= least_coarse_cells || unit < least_unit)) {
        unit *= 2;
    }
    // derivative of the map at the end: length of one cell there, times the number of cells
    const double step = wish.length * (strength > 1e-6 ? strength / std::tanh(strength) : 1);
    int tail = unit;
    while (tail < longest_tail * wish.cells &&
           growth_for(step, static_cast<double>(tail) / wish.cells, wish.tail_length) > gentle_growth) {
        tail += unit;
    }
    const double growth = growth_for(step, static_cast<double>(tail) / wish.cells, wish.tail_length);
    for (int k = 1; k <= tail; ++k) {
        result.faces.push_back(wish.length + tail_reach(step, growth, static_cast<double>(k) / wish.cells));
    }
    return result;
}

Grading centre_to_wall(double strength)
{
    return towards_end(strength);
}

Grading wall_to_centre(double strength)
{
    return towards_start(strength);
}

Grading wall_to_wall(double strength, double radius_ratio)
{
    const Grading both = towards_both(strength);
    const double pull = logarithmic_share * std::log(1 / radius_ratio);
    if (pull < 1e-3) {
        return both;
    }
    return [both, pull](double s) { return std::expm1(pull * both(s)) / std::expm1(pull); };
}

} // namespace leat::mesh
