#include <leat/passage/duct_flow.hpp>

#include <leat/passage/developed.hpp>
#include <leat/passage/development_length.hpp>

#include <array>
#include <cmath>

namespace leat::passage {

namespace {

/// What is tried in turn when the caller chose neither coupling nor relaxation: what converges fastest, then what
/// backflow through the end needs, then a smoother that is slow but hard to upset.
struct Attempt {
    leat::Coupling coupling;
    Relaxation relaxation;
    const char* description;
};
constexpr std::array<Attempt, 3> attempts = {{{leat::Coupling::lines, {0.9, 0.9}, ""},
                                              {leat::Coupling::lines, {0.5, 0.5}, "stronger damping (0.5)"},
                                              {leat::Coupling::simplec, {0.8, 1.0}, "SIMPLEC as smoother"}}};

monitor::Rules rules_for(const Options& options, bool multigrid)
{
    monitor::Rules rules;
    rules.tolerance = options.tolerance;
    rules.iterations = options.iterations;
    // A V cycle gains a digit; a single-grid iteration on a fine grid may gain a thousandth of its value.
    rules.patience = multigrid ? 15 : 1500;
    return rules;
}

bool worth_another_try(Outcome outcome)
{
    return outcome == Outcome::diverged || outcome == Outcome::stalled;
}

/// Whether a later attempt leaves the better state: one that does not converge either may have come less far.
bool better(const cascade::Run<2>& later, const cascade::Run<2>& kept)
{
    const double before = kept.imbalances.worst();
    return later.outcome == Outcome::cancelled || later.imbalances.worst() < before || !std::isfinite(before);
}

} // namespace

coupling::FlowProblem<2> duct_problem(const Passage& passage, const Derived& derived, const Options& options)
{
    using coupling::FlowSide;
    coupling::FlowProblem<2> problem;
    problem.density = 1;
    problem.viscosity = 1 / derived.reynolds_number;
    problem.schemes = {options.scheme_along, options.scheme_across};
    problem.sides[0] = {FlowSide::fixed, FlowSide::open};
    if (std::holds_alternative<Tube>(passage.shape)) {
        problem.sides[1] = {FlowSide::symmetry, FlowSide::fixed};
    } else if (std::holds_alternative<Channel>(passage.shape)) {
        problem.sides[1] = {FlowSide::fixed, FlowSide::symmetry};
    } else {
        problem.sides[1] = {FlowSide::fixed, FlowSide::fixed};
    }
    return problem;
}

coupling::FlowState<2> first_guess(const Passage& passage, const Derived& derived, const DuctGrid& grid)
{
    const mesh::Grid<2> cells = grid.grid();
    const field::Layout<2> layout(cells.cells());
    coupling::FlowState<2> state(layout);
    const InletDistribution inlet = make_inlet(passage);
    const DevelopedFlow developed = developed_flow(passage.shape);
    const double diameter = derived.hydraulic_diameter;
    const double development = development_length_estimate(passage.shape, derived.reynolds_number) / diameter;
    const int across = cells.cells(1);
    const int along = cells.cells(0);
    const double start = diameter * grid.across.front();
    const double end = diameter * grid.across.back();
    const double whole_developed = developed.flow_fraction(start, end);
    const double whole_area = developed.section.area_fraction(start, end);
    // Developed pressure gradient in density u_m^2 per D_h: 2 f = 2 (f Re)/Re.
    const double gradient = 2 * developed.friction_reynolds / derived.reynolds_number;
    for (int j = 0; j < across; ++j) {
        const double from = diameter * grid.across[j];
        const double to = diameter * grid.across[j + 1];
        const double share = developed.section.area_fraction(from, to) / whole_area;
        const double inlet_velocity = inlet.flow_fraction(from, to) / share;
        const double developed_velocity = developed.flow_fraction(from, to) / whole_developed / share;
        for (int i = 0; i <= along; ++i) {
            const double blend = std::exp(-3 * grid.along[i] / development);
            state.velocity[0][layout.index({i, j})] = blend * inlet_velocity + (1 - blend) * developed_velocity;
            if (i < along) {
                state.pressure[layout.index({i, j})] =
                    gradient * (grid.along.back() - 0.5 * (grid.along[i] + grid.along[i + 1]));
            }
        }
    }
    return state;
}

DuctFlow solve_duct_flow(const Passage& passage, const Derived& derived, const DuctGrid& duct, const Options& options,
                         const Observer& observer, const std::stop_token& stop)
{
    DuctFlow flow;
    flow.grid = duct;
    flow.reynolds_number = derived.reynolds_number;
    const mesh::Grid<2> grid = flow.grid.grid();
    const coupling::FlowProblem<2> problem = duct_problem(passage, derived, options);

    cascade::CascadeSettings settings;
    settings.coupling = options.coupling.value_or(leat::Coupling::lines);
    settings.coupling_settings.relaxation =
        options.relaxation.value_or(coupling::default_relaxation(settings.coupling));
    cascade::RunSettings run;
    run.multigrid = settings.coupling == leat::Coupling::lines;
    flow.multigrid = run.multigrid;
    run.rules = rules_for(options, run.multigrid);
    run.observer = observer;
    run.stop = stop;
    const bool may_choose = !options.relaxation && !options.coupling;
    for (const Attempt& attempt : attempts) {
        if (may_choose) {
            settings.coupling = attempt.coupling;
            settings.coupling_settings.relaxation = attempt.relaxation;
        }
        auto nested =
            std::make_unique<cascade::Cascade<2>>(grid, problem, first_guess(passage, derived, flow.grid), settings);
        cascade::Run<2> done = cascade::nested_solve(*nested, run);
        if (flow.cascade == nullptr || better(done, flow.run)) {
            flow.cascade = std::move(nested);
            flow.run = std::move(done);
            flow.fallback = may_choose ? attempt.description : "";
        }
        if (!may_choose || !worth_another_try(flow.run.outcome)) {
            break;
        }
    }
    return flow;
}

} // namespace leat::passage
