#include <leat/passage/solved_grid.hpp>

#include <leat/monitor/imbalance.hpp>
#include <leat/passage/computed_numbers.hpp>

#include <algorithm>
#include <cmath>

namespace leat::passage {

namespace {

constexpr double safety = 2;
constexpr int probe_of_single_grid = 20; // iterations; one alone moves too little to be told from the sweep's direction
constexpr double slowest_cycle = 0.9;    // rates are believed up to here: at the level of round-off there is none
constexpr double slowest_probe = 0.99;
constexpr double least_share = 0.1; // of the imbalance, relative: a number may stand still by chance
constexpr double round_off = 1e-12; // of the value; the line solves leave about so much

double worst_imbalance(DuctFlow& flow)
{
    coupling::FlowEquations<2>& equations = flow.equations();
    return monitor::imbalances<2>(equations, flow.cascade->residual(0),
                                  monitor::duct_scales<2>(equations, flow.state()))
        .worst();
}

/// Iterates on; the factor by which the imbalance fell.
double go_on(DuctFlow& flow)
{
    const double before = worst_imbalance(flow);
    if (flow.multigrid) {
        flow.cascade->cycle(0);
    } else {
        for (int k = 0; k < probe_of_single_grid; ++k) {
            flow.cascade->iterate(0, k % 2 == 1);
        }
    }
    const double rate = worst_imbalance(flow) / before;
    const double slowest = flow.multigrid ? slowest_cycle : slowest_probe;
    return rate < slowest ? rate : slowest; // also where it is not a number
}

std::vector<double> estimate_iteration_errors(const Passage& passage, const Derived& derived, DuctFlow& flow,
                                              Numbers& numbers)
{
    const coupling::FlowState<2> solution = flow.state();
    const double rate = go_on(flow);
    Numbers moved = make_numbers(passage, derived, read_duct(passage, derived, flow));
    flow.cascade->state(0) = solution;
    const double standing = least_share * flow.run.imbalances.worst();
    std::vector<double> errors;
    const std::vector<ComputedNumber> later = computed_numbers(moved);
    for (const ComputedNumber& now : computed_numbers(numbers)) {
        const Number* then = later[errors.size()].number;
        if (now.number == nullptr) {
            errors.push_back(0);
            continue;
        }
        const double size = std::abs(now.number->value);
        // A number that one more iteration takes away is as uncertain as it is large.
        const double movement = then != nullptr ? std::abs(then->value - now.number->value) : size;
        errors.push_back(safety * std::max(movement, standing * size) / (1 - rate) + round_off * size);
    }
    return errors;
}

} // namespace

SolvedGrid solve_grid(const Passage& passage, const Derived& derived, const DuctGrid& grid, const Options& options,
                      const Observer& observer, const std::stop_token& stop)
{
    SolvedGrid solved;
    solved.flow = solve_duct_flow(passage, derived, grid, options, observer, stop);
    solved.readings = read_duct(passage, derived, solved.flow);
    solved.numbers = make_numbers(passage, derived, solved.readings);
    if (solved.flow.run.outcome == Outcome::converged) {
        solved.iteration_errors = estimate_iteration_errors(passage, derived, solved.flow, solved.numbers);
    }
    return solved;
}

} // namespace leat::passage
