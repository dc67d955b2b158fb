// Iterations and time to convergence of SIMPLE, SIMPLEC and coupled lines on one grid of 160 x 40 cells of a tube, each
// with the best settings that a scan over its relaxation factors and inner tolerance finds, and of lines with the
// multigrid cascade. Every run starts from nested coarser grids; its time includes them.

#include "coupling/flow_case.hpp"

#include <leat/cascade/nested_solve.hpp>

#include <algorithm>
#include <chrono>
#include <cstdio>
#include <limits>
#include <string>
#include <vector>

using namespace leat;

namespace {

constexpr double tolerance = 1e-8;
constexpr double scan_seconds = 20; ///< for one coupling at one Reynolds number

double now()
{
    return std::chrono::duration<double>(std::chrono::steady_clock::now().time_since_epoch()).count();
}

struct Trial {
    cascade::CascadeSettings settings;
    bool multigrid = false;
    int iterations = 0;
    double seconds = std::numeric_limits<double>::infinity(); ///< stays so when the run does not converge in time
};

/// Runs a trial to convergence, for `most` seconds at the longest. (The grids and states are made beforehand.)
void run(const test::FlowCase& flow, Trial& trial, double most)
{
    cascade::Cascade<2> cascade(flow.grid, flow.problem, flow.state, trial.settings);
    std::stop_source stop;
    cascade::RunSettings settings;
    settings.multigrid = trial.multigrid;
    settings.rules.tolerance = tolerance;
    settings.rules.patience = 200;
    settings.stop = stop.get_token();
    const double start = now();
    settings.observer = [&](const Progress&) {
        if (now() - start > most) {
            stop.request_stop();
        }
    };
    const cascade::Run<2> result = cascade::nested_solve(cascade, settings);
    const double seconds = now() - start;
    if (result.outcome == Outcome::converged && seconds < trial.seconds) {
        trial.iterations = result.grids.back().iterations;
        trial.seconds = seconds;
    }
}

/// The fastest trial of a coupling: first over the relaxation factors, then over the inner tolerance. A trial is given
/// up as soon as it takes longer than the best one so far.
Trial best_of(const test::FlowCase& flow, Coupling coupling, int& tried)
{
    const std::vector<double> velocities = coupling == Coupling::lines
                                               ? std::vector<double>{0.9, 0.95, 0.8, 0.7, 0.98, 1}
                                               : std::vector<double>{0.9, 0.95, 0.8, 0.97, 0.7, 0.985, 0.6, 0.5};
    const std::vector<double> pressures = coupling == Coupling::simple
                                              ? std::vector<double>{0.2, 0.3, 0.1, 0.4, 0.5, 0.7, 1}
                                              : std::vector<double>{1, 0.9, 0.8, 0.7};
    Trial best;
    best.settings.coupling = coupling;
    const double end = now() + scan_seconds;
    const auto attempt = [&](const coupling::Settings& settings) {
        const double left = end - now();
        if (left <= 0) {
            return;
        }
        Trial trial;
        trial.settings.coupling = coupling;
        trial.settings.coupling_settings = settings;
        run(flow, trial, std::min(best.seconds, left));
        ++tried;
        if (trial.seconds < best.seconds) {
            best = trial;
        }
    };
    for (const double velocity : velocities) {
        for (const double pressure : pressures) {
            coupling::Settings settings;
            settings.relaxation = {velocity, pressure};
            attempt(settings);
        }
    }
    if (coupling != Coupling::lines) {
        for (const int sweeps : {1, 2, 4}) {
            for (const double inner : {0.5, 0.2, 0.1, 0.02}) {
                coupling::Settings settings = best.settings.coupling_settings;
                settings.momentum_sweeps = sweeps;
                settings.pressure_tolerance = inner;
                attempt(settings);
            }
        }
    }
    return best;
}

void print(const char* text, const Trial& trial, int tried, double unit)
{
    const coupling::Settings& settings = trial.settings.coupling_settings;
    std::printf("%-16s %8.3f %8.3f %7.2f %6d %10d %11.2f %9.1f %7d\n", text, settings.relaxation.velocity,
                settings.relaxation.pressure, settings.pressure_tolerance, settings.momentum_sweeps, trial.iterations,
                trial.seconds * 1e3, trial.seconds / unit, tried);
}

} // namespace

int main()
{
    const auto tube = mesh::Coordinates::cylindrical;
    for (const double reynolds : {100.0, 500.0}) {
        const test::FlowCase flow = test::developing_duct(tube, {160, 40}, reynolds, test::long_enough(tube, reynolds));
        Trial cascade;
        cascade.multigrid = true;
        for (int repeat = 0; repeat < 5; ++repeat) {
            run(flow, cascade, scan_seconds);
        }
        std::printf("tube, 160 x 40 cells, Re %g, every imbalance <= %g\n", reynolds, tolerance);
        std::printf("%-16s %8s %8s %7s %6s %10s %11s %9s %7s\n", "coupling", "velocity", "pressure", "inner", "sweeps",
                    "iterations", "time ms", "ratio", "tried");
        print("lines, cascade", cascade, 1, cascade.seconds);
        for (const Coupling coupling : {Coupling::lines, Coupling::simplec, Coupling::simple}) {
            int tried = 0;
            Trial best = best_of(flow, coupling, tried);
            for (int repeat = 0; repeat < 2; ++repeat) {
                run(flow, best, scan_seconds);
            }
            print(std::string(name(coupling)).c_str(), best, tried, cascade.seconds);
        }
        std::printf("\n");
    }
    return 0;
}
