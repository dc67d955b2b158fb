#pragma once

#include "convergence.hpp"

#include <string>
#include <vector>

namespace leat::benchmark {

/// The best that SIMPLEC does on one grid with a nested start.
struct SingleGridRun {
    coupling::Settings settings;
    double seconds = std::numeric_limits<double>::infinity(); ///< to (a)
    int iterations = 0;
    int tried = 0;
};

/// Seconds of SIMPLEC to (a) on one grid, given up after `most`; looks every few iterations, off the clock.
inline void try_simplec(const DuctCase& duct, const Targets& targets, const coupling::Settings& settings, double most,
                        SingleGridRun& best)
{
    constexpr int look_every = 20;
    ++best.tried;
    cascade::CascadeSettings nested;
    nested.coupling = Coupling::simplec;
    nested.coupling_settings = settings;
    const double start = thread_seconds();
    auto cascade = make_cascade(duct, nested);
    cascade::RunSettings run;
    run.multigrid = false;
    run.rules.tolerance = 0;
    run.rules.iterations = 0;
    cascade::nested_solve(*cascade, run);
    double judging = 0;
    for (int iteration = 0; thread_seconds() - start - judging < most; ++iteration) {
        if (iteration % look_every == 0) {
            const double before = thread_seconds();
            const double share = targets.share(cascade);
            judging += thread_seconds() - before;
            if (share <= share_of_discretisation) {
                best.settings = settings;
                best.seconds = thread_seconds() - start - judging;
                best.iterations = iteration;
                return;
            }
            if (!std::isfinite(share)) {
                return;
            }
        }
        cascade->iterate(0, iteration % 2 == 1);
    }
}

/// Scans both relaxation factors, then sweeps and inner tolerance.
inline SingleGridRun best_simplec(const DuctCase& duct, const Targets& targets, double most)
{
    SingleGridRun best;
    const auto attempt = [&](const coupling::Settings& settings) {
        try_simplec(duct, targets, settings, std::min(most, best.seconds), best);
    };
    for (const double velocity : {0.97, 0.98, 0.99, 0.95, 0.9, 0.8}) {
        for (const double pressure : {1.0, 0.9, 0.8}) {
            coupling::Settings settings;
            settings.relaxation = {velocity, pressure};
            attempt(settings);
        }
    }
    for (const int sweeps : {1, 2, 4}) {
        for (const double inner : {0.5, 0.2, 0.1, 0.02}) {
            coupling::Settings settings = best.settings;
            settings.momentum_sweeps = sweeps;
            settings.pressure_tolerance = inner;
            attempt(settings);
        }
    }
    return best;
}

} // namespace leat::benchmark
