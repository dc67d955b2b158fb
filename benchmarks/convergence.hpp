#pragma once

#include "duct_case.hpp"
#include "thread_clock.hpp"

#include <leat/monitor/imbalance.hpp>

#include <optional>
#include <stdexcept>

namespace leat::benchmark {

constexpr double share_of_discretisation = 0.1; ///< (a): iteration error over discretisation error
constexpr double residual_reduction = 1e-8; ///< (b): worst imbalance over that of the first guess on the finest grid

inline std::unique_ptr<cascade::Cascade<2>> make_cascade(const DuctCase& duct,
                                                         const cascade::CascadeSettings& settings = {})
{
    return std::make_unique<cascade::Cascade<2>>(duct.cells(), duct.problem(), duct.guess(), settings);
}

/// The solution of one grid to round-off.
inline CoreNumbers converged_core(const DuctCase& duct)
{
    auto cascade = make_cascade(duct);
    cascade::RunSettings run;
    run.rules.tolerance = 1e-15;
    run.rules.patience = 4;
    const cascade::Run<2> result = cascade::nested_solve(*cascade, run);
    if (!(result.imbalances.worst() < 1e-9)) {
        throw std::runtime_error(duct.name + " " + cells_text(duct) + ": no reference: " + result.message);
    }
    return read_core(duct, cascade);
}

/// When the iteration on a grid is good enough in the senses (a) and (b).
class Targets {
public:
    /// finer: the converged numbers on a grid twice as fine; the error of order two is 4/3 of the difference.
    Targets(const DuctCase& duct, CoreNumbers exact, const CoreNumbers& finer) : Targets(duct)
    {
        exact_ = std::move(exact);
        const Distance difference = distance(exact_, finer);
        discretisation_ = {difference.pressure_drop * 4 / 3, difference.velocity * 4 / 3};
        judges_numbers_ = true;
    }

    /// Only (b).
    explicit Targets(const DuctCase& duct) : duct_(duct)
    {
        auto cascade = make_cascade(duct);
        scales_ = monitor::duct_scales<2>(cascade->equations(0), cascade->state(0));
        first_ = imbalance(*cascade);
    }

    bool judges_numbers() const { return judges_numbers_; } ///< (a) is known
    const Distance& discretisation() const { return discretisation_; }
    /// Largest iteration error over discretisation error; (a) is reached at share_of_discretisation.
    double share(std::unique_ptr<cascade::Cascade<2>>& cascade) const
    {
        const Distance error = distance(read_core(duct_, cascade), exact_);
        const double worst =
            std::max(error.pressure_drop / discretisation_.pressure_drop, error.velocity / discretisation_.velocity);
        return std::isfinite(worst) ? worst : std::numeric_limits<double>::infinity();
    }
    /// Worst imbalance over that of the first guess; (b) is reached at residual_reduction.
    double reduction(cascade::Cascade<2>& cascade) const { return imbalance(cascade) / first_; }

private:
    double imbalance(cascade::Cascade<2>& cascade) const
    {
        return monitor::imbalances<2>(cascade.equations(0), cascade.residual(0), scales_).worst();
    }

    DuctCase duct_;
    CoreNumbers exact_;
    Distance discretisation_;
    bool judges_numbers_ = false;
    monitor::Scales scales_;
    double first_ = 0;
};

/// What a solve costs until (a) and until (b): everything from the making of the nested grids on.
struct Cost {
    int cycles_a = -1, cycles_b = -1; ///< on the finest grid
    double seconds_a = std::numeric_limits<double>::infinity();
    double seconds_b = std::numeric_limits<double>::infinity();
};

/// Runs 0, 1, 2 .. cycles on the finest grid after the nested start until (a) and (b) are reached, then times those two
/// solves, the least of `repeats`.
inline Cost cost(const DuctCase& duct, const Targets& targets, int repeats,
                 const cascade::CascadeSettings& settings = {}, int most_cycles = 40)
{
    const coupling::FlowState<2> guess = duct.guess();
    const mesh::Grid<2> grid = duct.cells();
    const coupling::FlowProblem<2> problem = duct.problem();
    const auto solve = [&](int cycles) {
        auto cascade = std::make_unique<cascade::Cascade<2>>(grid, problem, guess, settings);
        cascade::RunSettings run;
        run.rules.tolerance = 0;
        run.rules.iterations = cycles;
        cascade::nested_solve(*cascade, run);
        return cascade;
    };
    Cost result;
    const auto wanted = [&] { return result.cycles_b < 0 || (targets.judges_numbers() && result.cycles_a < 0); };
    for (int cycles = 0; cycles <= most_cycles && wanted(); ++cycles) {
        auto cascade = solve(cycles);
        if (targets.judges_numbers() && result.cycles_a < 0 && targets.share(cascade) <= share_of_discretisation) {
            result.cycles_a = cycles;
        }
        if (result.cycles_b < 0 && targets.reduction(*cascade) <= residual_reduction) {
            result.cycles_b = cycles;
        }
    }
    if (result.cycles_a >= 0) {
        result.seconds_a = least_seconds(repeats, 0, [&] { solve(result.cycles_a); });
    }
    if (result.cycles_b >= 0) {
        result.seconds_b = least_seconds(repeats, 0, [&] { solve(result.cycles_b); });
    }
    return result;
}

} // namespace leat::benchmark
