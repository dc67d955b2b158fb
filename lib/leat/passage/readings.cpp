#include <leat/passage/readings.hpp>

#include <leat/field/interpolation.hpp>
#include <leat/passage/developed.hpp>

#include <algorithm>

namespace leat::passage {

namespace {

/// Reads one row of values across the duct at the core position.
class CoreReader {
public:
    CoreReader(const Passage& passage, const Derived& derived, const DuctGrid& grid)
    {
        const int n = static_cast<int>(grid.across.size()) - 1;
        for (int j = 0; j < n; ++j) {
            centres_.push_back(0.5 * (grid.across[j] + grid.across[j + 1]));
        }
        if (std::holds_alternative<Annulus>(passage.shape)) {
            core_ = developed_flow(passage.shape).peak_position / derived.hydraulic_diameter;
            return;
        }
        // Even in the distance from the axis or the middle: a polynomial in its square.
        const bool tube = std::holds_alternative<Tube>(passage.shape);
        const double middle = tube ? 0 : grid.across.back();
        for (int m = 0; m < std::min(3, n); ++m) {
            nearest_.push_back(tube ? m : n - 1 - m);
            const double distance = centres_[nearest_.back()] - middle;
            squares_.push_back(distance * distance);
        }
    }

    /// The value at the core; values[j] belongs to the cell j.
    double operator()(const double* values) const
    {
        if (nearest_.empty()) {
            const std::vector<double> row(values, values + centres_.size());
            return field::interpolate(centres_, row, core_);
        }
        std::vector<double> near;
        for (const int j : nearest_) {
            near.push_back(values[j]);
        }
        return field::interpolate(squares_, near, 0, 3);
    }

    const std::vector<double>& centres() const noexcept { return centres_; }

private:
    std::vector<double> centres_;
    double core_ = 0;
    std::vector<int> nearest_;
    std::vector<double> squares_;
};

void read_velocity(const Passage& passage, const DuctFlow& flow, const CoreReader& core, Readings& readings)
{
    const field::Layout<2>& layout = flow.equations().layout();
    const int n = layout.cells[1];
    const std::vector<double>& y = flow.grid.across;
    const bool first_is_wall = !std::holds_alternative<Tube>(passage.shape);
    const bool last_is_wall = !std::holds_alternative<Channel>(passage.shape);
    for (int i = 0; i <= layout.cells[0]; ++i) {
        const double* u = flow.state().velocity[0].data() + layout.index({i, 0});
        readings.face.push_back(flow.grid.along[i]);
        readings.core_velocity.push_back(core(u));
        const std::vector<double> row(u, u + n);
        readings.peak_velocity.push_back(std::max(field::peak(core.centres(), row), readings.core_velocity.back()));
        if (i == 0) {
            continue;
        }
        // f Re = 2 (du/dn) D_h/u_m
        const double first = first_is_wall ? 2 * u[0] / (core.centres()[0] - y[0]) : 0;
        const double last = last_is_wall ? 2 * u[n - 1] / (y[n] - core.centres()[n - 1]) : 0;
        readings.shear_face.push_back(flow.grid.along[i]);
        readings.shear_first.push_back(first);
        readings.shear_last.push_back(last);
        const double mean = !first_is_wall  ? last
                            : !last_is_wall ? first
                                            : (first * y[0] + last * y[n]) / (y[0] + y[n]);
        readings.shear_mean.push_back(mean);
        if (i == flow.grid.end) {
            readings.reverse_flow_end = *std::min_element(u, u + n) < 0;
        }
    }
}

void read_pressure(const Passage& passage, const DuctFlow& flow, const CoreReader& core, Readings& readings)
{
    const coupling::FlowEquations<2>& equations = flow.equations();
    const field::Layout<2>& layout = equations.layout();
    for (int i = 0; i < layout.cells[0]; ++i) {
        const double* p = flow.state().pressure.data() + layout.index({i, 0});
        double sum = 0;
        double area = 0;
        for (int j = 0; j < layout.cells[1]; ++j) {
            const double ring = equations.cells().area_factor[0][1][j];
            sum += ring * p[j];
            area += ring;
        }
        readings.pressure_at.push_back(0.5 * (flow.grid.along[i] + flow.grid.along[i + 1]));
        readings.core_pressure.push_back(core(p));
        readings.mean_pressure.push_back(sum / area);
    }
    readings.mean_at = readings.pressure_at;
    if (passage.outlet == Outlet::cut) {
        readings.mean_at.push_back(flow.grid.along.back());
        readings.mean_pressure.push_back(0);
    }
    readings.core_pressure_inlet = field::interpolate(readings.pressure_at, readings.core_pressure, 0);
    readings.mean_pressure_first = readings.mean_pressure.front();
    readings.mean_pressure_end =
        field::interpolate(readings.mean_at, readings.mean_pressure, flow.grid.along[flow.grid.end]);
}

} // namespace

Readings read_duct(const Passage& passage, const Derived& derived, const DuctFlow& flow)
{
    Readings readings;
    const CoreReader core(passage, derived, flow.grid);
    read_velocity(passage, flow, core, readings);
    read_pressure(passage, flow, core, readings);
    return readings;
}

} // namespace leat::passage
