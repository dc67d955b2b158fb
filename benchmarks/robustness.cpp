// Solves many unlike passages with the default settings: leat_benchmark_robustness [SEED [PASSAGES]]. The passages are
// a Latin hypercube over shape, Reynolds number 1e-3 .. 1e5, length 0.1 .. 10,000 gaps, radius ratio 0.001 .. 0.99,
// inlet, outlet and grid. Every one must converge, and a tight solve must agree on the pressure drop within 1e-6 of
// max(|pressure drop|, that of developed flow, dynamic pressure). Exit code 1 when one does not.

#include "latin_hypercube.hpp"
#include "thread_clock.hpp"

#include <leat/leat.hpp>
#include <leat/passage/developed.hpp>
#include <leat/passage/duct_flow.hpp>
#include <leat/passage/readings.hpp>

#include <array>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <map>
#include <string>

using namespace leat;
using namespace leat::benchmark;

namespace {

constexpr double agreement = 1e-6;
constexpr double tight_tolerance = 1e-12;
constexpr double stalled_gain = 0.1; // a tight solve may stall on round-off, but not before this share of 1e-9

struct Sample {
    Passage passage;
    Options options;
    double length_over_gap = 0;
    double radius_ratio = 0;
};

double logarithmic(double low, double high, double share)
{
    return low * std::pow(high / low, share);
}

template <class Choices>
auto choice(const Choices& choices, double share)
{
    return choices[static_cast<std::size_t>(share * static_cast<double>(choices.size()))];
}

/// A profile that is neither flat nor developed, with a kink and unequal walls where the shape allows them.
VelocityTable measured_profile(const Shape& shape)
{
    if (const auto* tube = std::get_if<Tube>(&shape)) {
        const double r = tube->diameter / 2;
        return {.position = {0, 0.3 * r, 0.5 * r, 0.8 * r, 0.95 * r, r}, .velocity = {1.2, 1.3, 1.4, 1.1, 0.5, 0}};
    }
    if (const auto* channel = std::get_if<Channel>(&shape)) {
        const double h = channel->gap;
        return {.position = {0, 0.05 * h, 0.2 * h, 0.35 * h, 0.5 * h}, .velocity = {0, 0.6, 1.3, 1.2, 1.1}};
    }
    const auto& ring = std::get<Annulus>(shape);
    const double inner = ring.inner_diameter / 2;
    const double gap = ring.outer_diameter / 2 - inner;
    return {.position = {inner, inner + 0.1 * gap, inner + 0.4 * gap, inner + 0.9 * gap, inner + gap},
            .velocity = {0, 0.9, 1.5, 0.4, 0}};
}

Sample make_sample(const std::vector<double>& point)
{
    constexpr std::array<InletProfile, 3> inlets = {InletProfile::flat, InletProfile::developed, InletProfile::table};
    constexpr std::array<Outlet, 2> outlets = {Outlet::continues, Outlet::cut};
    constexpr std::array<std::array<int, 2>, 9> grids = {
        {{32, 8}, {64, 8}, {64, 16}, {128, 16}, {96, 24}, {160, 40}, {128, 64}, {256, 32}, {256, 64}}};
    constexpr double gap = 0.01; // m
    Sample sample;
    sample.length_over_gap = logarithmic(0.1, 1e4, point[1]);
    sample.radius_ratio = point[3] < 0.5 ? logarithmic(0.001, 0.1, 2 * point[3]) : 0.1 + 0.89 * (2 * point[3] - 1);
    const double length = sample.length_over_gap * gap;
    const int shape = static_cast<int>(4 * point[2]); // annuli, which have one parameter more, twice as often
    if (shape == 0) {
        sample.passage.shape = Tube{.diameter = gap, .length = length};
    } else if (shape == 1) {
        sample.passage.shape = Channel{.gap = gap, .length = length};
    } else {
        const double outer = 2 * gap / (1 - sample.radius_ratio);
        sample.passage.shape =
            Annulus{.inner_diameter = sample.radius_ratio * outer, .outer_diameter = outer, .length = length};
    }
    sample.passage.fluid = {.density = 1000, .viscosity = 1e-3};
    sample.passage.inlet.reynolds_number = logarithmic(1e-3, 1e5, point[0]);
    sample.passage.inlet.profile = choice(inlets, point[4]);
    if (sample.passage.inlet.profile == InletProfile::table) {
        sample.passage.inlet.table = measured_profile(sample.passage.shape);
    }
    sample.passage.outlet = choice(outlets, point[5]);
    sample.options.cells = choice(grids, point[6]);
    return sample;
}

std::string text(const Sample& sample)
{
    constexpr std::array<const char*, 3> shapes = {"tube", "channel", "annulus"};
    constexpr std::array<const char*, 3> inlets = {"flat", "developed", "table"};
    char line[200];
    std::snprintf(line, sizeof line, "%s, radius ratio %.4g, Re %.4g, L/gap %.4g, %s inlet, %s outlet, %d x %d",
                  shapes[sample.passage.shape.index()], sample.passage.shape.index() == 2 ? sample.radius_ratio : 0.0,
                  *sample.passage.inlet.reynolds_number, sample.length_over_gap,
                  inlets[static_cast<std::size_t>(sample.passage.inlet.profile)],
                  sample.passage.outlet == Outlet::cut ? "cut" : "continued", (*sample.options.cells)[0],
                  (*sample.options.cells)[1]);
    return line;
}

/// What one solve came to.
struct Solve {
    Outcome outcome = Outcome::stalled;
    double imbalance = 0;
    std::string message, fallback;
    double pressure_drop = 0; ///< core, in density u_m^2
    int cycles = 0;           ///< on the finest grid
    double seconds = 0;
    double work_units = 0;
};

Solve solve_with(const Sample& sample, double tolerance)
{
    const Derived derived = derive(sample.passage);
    Options options = sample.options;
    options.tolerance = tolerance;
    Solve result;
    const double start = thread_seconds();
    const passage::DuctFlow flow = passage::solve_duct_flow(
        sample.passage, derived, passage::make_grid(sample.passage, derived, *options.cells), options, {}, {});
    result.seconds = thread_seconds() - start;
    result.work_units = result.seconds / least_seconds(5, 0, [&] { flow.cascade->residual(0); });
    const passage::Readings readings = passage::read_duct(sample.passage, derived, flow);
    result.outcome = flow.run.outcome;
    result.imbalance = flow.run.imbalances.worst();
    result.message = flow.run.message;
    result.fallback = flow.fallback;
    result.pressure_drop = readings.core_pressure_inlet - readings.mean_pressure_end;
    result.cycles = flow.run.grids.back().iterations;
    return result;
}

/// What the pressure drop is measured by, in density u_m^2.
double pressure_scale(const Sample& sample, double pressure_drop)
{
    const Derived derived = derive(sample.passage);
    const double developed = 2 * passage::developed_flow(sample.passage.shape).friction_reynolds /
                             derived.reynolds_number * derived.length / derived.hydraulic_diameter;
    return std::max({std::abs(pressure_drop), developed, 0.5});
}

} // namespace

int main(int count, char** arguments)
{
    const std::uint64_t seed = count > 1 ? std::strtoull(arguments[1], nullptr, 10) : 1;
    const int passages = count > 2 ? std::atoi(arguments[2]) : 500;
    std::printf("%d passages, seed %llu\n", passages, static_cast<unsigned long long>(seed));
    int converged = 0;
    int agreed = 0;
    std::map<std::string, int> fallbacks;
    double worst_difference = 0;
    Solve slowest, longest;
    std::string slowest_text, longest_text;
    std::vector<int> cycles;
    for (const std::vector<double>& point : latin_hypercube(passages, 7, seed)) {
        const Sample sample = make_sample(point);
        const Solve usual = solve_with(sample, Options{}.tolerance);
        if (!usual.fallback.empty()) {
            ++fallbacks[usual.fallback];
            std::printf("needed %s: %s\n", usual.fallback.c_str(), text(sample).c_str());
        }
        if (usual.outcome != Outcome::converged) {
            std::printf("FAILED: %s: %s\n", text(sample).c_str(), usual.message.c_str());
            continue;
        }
        ++converged;
        cycles.push_back(usual.cycles);
        if (usual.work_units > slowest.work_units) {
            slowest = usual;
            slowest_text = text(sample);
        }
        if (usual.cycles > longest.cycles) {
            longest = usual;
            longest_text = text(sample);
        }
        const Solve tight = solve_with(sample, tight_tolerance);
        const double difference =
            std::abs(usual.pressure_drop - tight.pressure_drop) / pressure_scale(sample, tight.pressure_drop);
        worst_difference = std::max(worst_difference, difference);
        if (difference <= agreement &&
            (tight.outcome == Outcome::converged || tight.imbalance <= stalled_gain * Options{}.tolerance)) {
            ++agreed;
        } else {
            std::printf("DISAGREES by %.2g: %s; tight solve: %s\n", difference, text(sample).c_str(),
                        tight.message.c_str());
        }
    }
    std::sort(cycles.begin(), cycles.end());
    std::printf("\n%d of %d converged; %d agree with a tight solve within %.0e (worst %.2g)\n", converged, passages,
                agreed, agreement, worst_difference);
    for (const auto& [name, times] : fallbacks) {
        std::printf("%d needed %s\n", times, name.c_str());
    }
    if (!cycles.empty()) {
        std::printf("cycles on the finest grid: median %d, 99 of 100 within %d\n", cycles[cycles.size() / 2],
                    cycles[static_cast<std::size_t>(0.99 * static_cast<double>(cycles.size() - 1))]);
        std::printf("most cycles: %d (%.0f WU): %s\n", longest.cycles, longest.work_units, longest_text.c_str());
        std::printf("most work: %.0f WU (%d cycles, %.1f ms): %s\n", slowest.work_units, slowest.cycles,
                    slowest.seconds * 1e3, slowest_text.c_str());
    }
    return converged == passages && agreed == passages ? 0 : 1;
}
