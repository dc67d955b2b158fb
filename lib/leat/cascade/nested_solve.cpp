#include <leat/cascade/nested_solve.hpp>

#include <chrono>
#include <cmath>

namespace leat::cascade {

namespace {

constexpr double worse_start = 10; // a coarse grid whose imbalance grew by this is no start for a finer one
constexpr double slow_cycle = 0.3; // a cycle that leaves more than this of the imbalance has its linearisation renewed
constexpr double worth_keeping = 0.1; // a state is copied when its imbalance is below this times the kept one's

/// Runs one grid and keeps its books.
template <int D>
class GridRunner {
public:
    GridRunner(Cascade<D>& cascade, const RunSettings& settings, int level, Run<D>& run)
        : cascade_(cascade), settings_(settings), level_(level), index_(cascade.levels() - 1 - level), run_(run),
          start_(std::chrono::steady_clock::now())
    {
    }

    /// Imbalances of the present state, noted in the history and told to the observer.
    Imbalances look(int iteration)
    {
        auto& equations = cascade_.equations(level_);
        const monitor::Scales scales =
            settings_.scales ? *settings_.scales : monitor::duct_scales<D>(equations, cascade_.state(level_));
        const Imbalances now = monitor::imbalances<D>(equations, cascade_.residual(level_), scales);
        run_.history.push_back({index_, iteration, now});
        if (settings_.observer) {
            settings_.observer({index_, cascade_.levels(), iteration, now.mass, now.momentum});
        }
        return now;
    }

    bool stopped() const { return settings_.stop.stop_requested(); }

    void close(int iterations)
    {
        GridRun<D> report;
        report.cells = cascade_.equations(level_).grid().cells();
        report.iterations = iterations;
        report.seconds = std::chrono::duration<double>(std::chrono::steady_clock::now() - start_).count();
        run_.grids.push_back(report);
    }

private:
    Cascade<D>& cascade_;
    const RunSettings& settings_;
    int level_;
    int index_;
    Run<D>& run_;
    std::chrono::steady_clock::time_point start_;
};

/// Makes a coarse grid good enough to start from. False when asked to stop, or when what came out is worse than what
/// went in, or not finite.
template <int D>
bool prepare_coarse(Cascade<D>& cascade, const RunSettings& settings, int level, Run<D>& run)
{
    GridRunner<D> runner(cascade, settings, level, run);
    int done = 0;
    const double first = runner.look(0).worst();
    double worst = first;
    if (settings.multigrid && level + 1 < cascade.levels()) {
        cascade.hold_linearisation(level);
        cascade.cycle(level);
        worst = runner.look(++done).worst();
    } else {
        while (!runner.stopped() && done < settings.start_pairs) {
            cascade.iterate(level, false);
            cascade.iterate(level, true);
            worst = runner.look(++done).worst();
            if (worst <= settings.start_tolerance || !std::isfinite(worst)) {
                break;
            }
        }
    }
    runner.close(done);
    return !runner.stopped() && std::isfinite(worst) && worst <= worse_start * first;
}

template <int D>
void run_finest(Cascade<D>& cascade, const RunSettings& settings, Run<D>& run)
{
    GridRunner<D> runner(cascade, settings, 0, run);
    monitor::Judge judge(settings.rules);
    coupling::FlowState<D> kept;
    double kept_imbalance = 0;
    double previous = 0;
    for (int iteration = 0;; ++iteration) {
        run.imbalances = runner.look(iteration);
        const double worst = run.imbalances.worst();
        const std::optional<Outcome> verdict = judge.judge(run.imbalances);
        if (verdict) {
            run.outcome = *verdict;
            run.message = judge.message();
        } else if (runner.stopped()) {
            run.outcome = Outcome::cancelled;
            run.message = "cancelled on request after " + std::to_string(iteration) + " iterations on the finest grid";
        }
        if (verdict || runner.stopped()) {
            if (run.outcome != Outcome::converged && !kept.pressure.empty() &&
                (!std::isfinite(worst) || kept_imbalance < worst)) {
                cascade.state(0) = kept;
                run.imbalances = runner.look(iteration);
            }
            runner.close(iteration);
            return;
        }
        if (kept.pressure.empty() || worst < worth_keeping * kept_imbalance) {
            kept = cascade.state(0);
            kept_imbalance = worst;
        }
        if (settings.multigrid) {
            if (iteration == 0 || worst > slow_cycle * previous) {
                cascade.hold_linearisation(0);
            }
            previous = worst;
            cascade.cycle(0);
        } else {
            cascade.iterate(0, iteration % 2 == 1);
        }
    }
}

} // namespace

template <int D>
Run<D> nested_solve(Cascade<D>& cascade, const RunSettings& settings)
{
    Run<D> run;
    run.history.reserve(64);
    for (int level = cascade.levels() - 1; level > 0; --level) {
        if (!prepare_coarse(cascade, settings, level, run)) {
            break; // the finest grid starts from the caller's guess, and at once reports a stop that was asked for
        }
        cascade.start_from_coarser(level - 1);
    }
    run_finest(cascade, settings, run);
    return run;
}

template Run<2> nested_solve(Cascade<2>&, const RunSettings&);

} // namespace leat::cascade
