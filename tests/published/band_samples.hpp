#pragma once

#include <leat/leat.hpp>
#include <leat/passage/computed_numbers.hpp>
#include <leat/passage/developed.hpp>
#include <leat/passage/refinement.hpp>

#include <algorithm>
#include <array>
#include <cmath>
#include <random>
#include <stdexcept>
#include <string>
#include <vector>

namespace leat::test {

/// One number of one passage on nested grids, and its limit from elsewhere.
struct BandSample {
    std::string number;
    std::string shape;
    double reynolds_number = 0;
    std::array<int, 2> cells{};
    std::vector<cascade::GridValue> values; ///< coarsest first
    double truth = 0;
    double truth_doubt = 0; ///< how far the truth may be off: a miss must exceed it
    double scale = 1;       ///< errors in per cent are relative to this
    bool developing = true; ///< flat inlet

    double value() const { return values.back().value; }
    double error() const { return std::abs(value() - truth); }
    bool covered_by(double half_width) const { return error() <= half_width + truth_doubt; }
    /// Developing, and the three finest grids are not asymptotic: their increments change sign, or shrink by an
    /// apparent order that differs from 2 by more than 0.3.
    bool hard() const
    {
        const std::size_t n = values.size();
        const double quotient =
            (values[n - 2].value - values[n - 3].value) / (values[n - 1].value - values[n - 2].value);
        return developing && !(quotient > 0 && std::abs(std::log2(quotient) - 2) <= 0.3);
    }
};

inline std::string shape_name(const Shape& shape)
{
    return std::holds_alternative<Tube>(shape)      ? "tube"
           : std::holds_alternative<Channel>(shape) ? "channel"
                                                    : "annulus";
}

/// Random passages: every shape, radius ratio 0.003 to 0.95, Re 1 to 2000 (logarithmic), 0.016 to 3 development
/// lengths, nineteen in twenty with a flat inlet, three in four continued.
class PassageLottery {
public:
    explicit PassageLottery(unsigned seed) : engine_(seed) {}

    Passage next()
    {
        const double diameter = 0.01; // hydraulic
        const double re = std::pow(2000.0, draw());
        const double kind = draw();
        const double ratio = draw() < 0.3 ? std::pow(10.0, -2.5 + 1.5 * draw()) : 0.05 + 0.9 * draw();
        const double development = kind < 1. / 3 ? 0.6 + 0.055 * re : 0.32 + 0.0112 * re;
        const double length = diameter * std::max(0.2, development * std::pow(10.0, -1.8 + 2.3 * draw()));
        Passage passage;
        if (kind < 1. / 3) {
            passage.shape = Tube{.diameter = diameter, .length = length};
        } else if (kind < 2. / 3) {
            passage.shape = Channel{.gap = diameter / 2, .length = length};
        } else {
            const double outer = diameter / (1 - ratio);
            passage.shape = Annulus{.inner_diameter = ratio * outer, .outer_diameter = outer, .length = length};
        }
        passage.fluid.density = 1000;
        passage.fluid.viscosity = 1e-3;
        passage.inlet.reynolds_number = re;
        passage.inlet.profile = draw() < 0.05 ? InletProfile::developed : InletProfile::flat;
        passage.outlet = draw() < 0.25 ? Outlet::cut : Outlet::continues;
        return passage;
    }

private:
    double draw() { return static_cast<double>(engine_() >> 11) * 0x1p-53; } // the same on every system

    std::mt19937_64 engine_;
};

/// A place in computed_numbers() whose number tells something of its own (others are multiples of the pressure drop or
/// of the wall shear).
inline bool independent(std::string_view name)
{
    return name == "pressure_drop" || name == "development_length" || name == "core_velocity_ratio" ||
           name == "peak_velocity_ratio" || name == "friction_reynolds_outlet" || name == "wall_shear_outlet_inner" ||
           name == "wall_shear_outlet_outer" || name == "wall_shear_mean";
}

inline passage::Refinement refined(const Passage& passage, std::array<int, 2> cells, double tolerance = 1e-10)
{
    Options options;
    options.cells = cells;
    options.tolerance = tolerance;
    const Derived derived = derive(passage);
    passage::Refinement result =
        passage::solve_nested(passage, derived, passage::nested_grids(passage, derived, options), {}, options, {}, {});
    if (!result.usable) {
        throw std::runtime_error(result.message);
    }
    return result;
}

/// Exact values of a passage with developed inlet; not a number where there is none.
inline double exact_value(const Passage& passage, std::string_view name)
{
    const Derived derived = derive(passage);
    const passage::DevelopedFlow flow = passage::developed_flow(passage.shape);
    const double dynamic = 0.5 * derived.density * derived.mean_velocity * derived.mean_velocity;
    const double shear = dynamic * flow.friction_reynolds / derived.reynolds_number;
    return name == "pressure_drop"              ? 4 * shear * derived.length / derived.hydraulic_diameter
           : name == "core_velocity_ratio"      ? flow.peak_velocity_ratio
           : name == "peak_velocity_ratio"      ? flow.peak_velocity_ratio
           : name == "friction_reynolds_outlet" ? flow.friction_reynolds
           : name == "wall_shear_outlet_inner"  ? shear * flow.wall_shear_ratio_inner
           : name == "wall_shear_outlet_outer"  ? shear * flow.wall_shear_ratio_outer
           : name == "wall_shear_mean"          ? shear
                                                : std::nan("");
}

/// Adds the numbers of one passage on `cells` and their coarsenings (across: per half of the section, so twice as many
/// in an annulus). The truth is exact for a developed inlet; otherwise that of grids 8, 4 and 2 times finer than
/// `cells`, of a grading of their own, extrapolated at their apparent order within 1 .. 2 and doubted by 5 % of the
/// extrapolation.
inline void add_samples(const Passage& passage, std::array<int, 2> cells, std::vector<BandSample>& samples)
{
    if (std::holds_alternative<Annulus>(passage.shape)) {
        cells[1] *= 2;
    }
    passage::Refinement coarse = refined(passage, cells);
    const bool developing = passage.inlet.profile != InletProfile::developed;
    passage::Refinement fine = developing ? refined(passage, {8 * cells[0], 8 * cells[1]}) : passage::Refinement{};
    const double least_scale = 0.01 * exact_value(passage, "pressure_drop");
    const auto numbers = passage::computed_numbers(coarse.numbers);
    double core = 0;
    for (std::size_t place = 0; place < numbers.size(); ++place) {
        BandSample sample;
        sample.number = numbers[place].name;
        sample.values = passage::values_on_grids(coarse.grids, place);
        if (!independent(sample.number) || sample.values.size() < 3) {
            continue;
        }
        if (sample.number == "core_velocity_ratio") {
            core = sample.value();
        }
        if (sample.number == "peak_velocity_ratio" && sample.value() == core) {
            continue; // the same once more
        }
        if (developing) {
            const std::vector<cascade::GridValue> values = passage::values_on_grids(fine.grids, place);
            if (values.size() < 3) {
                continue;
            }
            const double last = values.end()[-1].value - values.end()[-2].value;
            const double before = values.end()[-2].value - values.end()[-3].value;
            const double order = before / last > 0 ? std::clamp(std::log2(before / last), 1.0, 2.0) : 2.0;
            const double correction = last / (std::exp2(order) - 1);
            sample.truth = values.back().value + correction;
            sample.truth_doubt = 0.05 * std::abs(correction);
        } else {
            sample.truth = exact_value(passage, sample.number);
            if (!std::isfinite(sample.truth)) {
                continue;
            }
        }
        sample.shape = shape_name(passage.shape);
        sample.reynolds_number = derive(passage).reynolds_number;
        sample.cells = cells;
        sample.scale = std::max(std::abs(sample.truth), sample.number == "pressure_drop" ? least_scale : 0);
        sample.truth_doubt += 1e-9 * sample.scale;
        sample.developing = developing;
        samples.push_back(std::move(sample));
    }
}

} // namespace leat::test
