#include <leat/passage/solve.hpp>

#include <leat/passage/cautions.hpp>
#include <leat/passage/cell_fields.hpp>
#include <leat/passage/duct_flow.hpp>
#include <leat/passage/engineering_numbers.hpp>
#include <leat/passage/handbook.hpp>
#include <leat/passage/readings.hpp>
#include <leat/passage/stations.hpp>

namespace leat {

namespace {

/// All faults of the three arguments together.
Derived checked(const Passage& passage, const Accuracy& accuracy, const Options& options)
{
    std::vector<Fault> faults = faults_of(passage);
    double length = 0;
    std::visit([&length](const auto& shape) { length = shape.length; }, passage.shape);
    for (Fault& fault : faults_of(accuracy, options, length > 0 ? length : 0)) {
        faults.push_back(std::move(fault));
    }
    if (!faults.empty()) {
        throw InvalidInput(std::move(faults));
    }
    return derive(passage);
}

void mark_unusable(Answer& answer)
{
    const std::string reason = "the solve ended " + std::string(name(answer.outcome));
    Numbers& n = answer.numbers;
    for (Number* number :
         {&n.pressure_drop, &n.pumping_power, &n.apparent_friction_factor, &n.apparent_friction_reynolds,
          &n.incremental_pressure_number, &n.core_velocity_ratio, &n.peak_velocity_ratio}) {
        number->usable = false;
        number->reason = reason;
    }
    for (std::optional<Number>* number :
         {&n.pressure_drop_from_rest, &n.development_length, &n.wall_shear_outlet, &n.wall_shear_outlet_inner,
          &n.wall_shear_outlet_outer, &n.friction_reynolds_outlet, &n.wall_shear_mean}) {
        if (*number) {
            (*number)->usable = false;
            (*number)->reason = reason;
        }
    }
}

void add_cautions(const passage::DuctFlow& flow, const passage::Readings& readings, Answer& answer)
{
    if (readings.reverse_flow_end) {
        answer.cautions.push_back("part of the flow runs back through the end of the passage: what lies beyond it "
                                  "enters the numbers");
    }
    if (!flow.fallback.empty()) {
        answer.cautions.push_back("the solve needed " + flow.fallback + " to go through");
    }
}

} // namespace

Answer solve(const Passage& passage, const Accuracy& accuracy, const Options& options, const Observer& observer,
             std::stop_token stop)
{
    const Derived derived = checked(passage, accuracy, options);
    const passage::DuctFlow flow = passage::solve_duct_flow(
        passage, derived, passage::choose_grid(passage, derived, accuracy, options), options, observer, stop);
    const passage::Readings readings = passage::read_duct(passage, derived, flow);

    Answer answer;
    answer.outcome = flow.run.outcome;
    answer.usable = answer.outcome == Outcome::converged;
    answer.message = flow.run.message;
    answer.imbalances = flow.run.imbalances;
    answer.history = flow.run.history;
    for (const cascade::GridRun<2>& grid : flow.run.grids) {
        answer.grids.push_back({grid.cells, grid.iterations, grid.seconds});
    }
    answer.numbers = passage::make_numbers(passage, derived, readings);
    answer.stations = passage::make_stations(passage, derived, options, readings);
    answer.cautions = passage::cautions_before(passage, derived);
    add_cautions(flow, readings, answer);
    answer.handbook = passage::handbook_estimate(passage, derived);
    answer.channel = std::holds_alternative<Channel>(passage.shape);
    if (!answer.usable) {
        mark_unusable(answer);
    }
    if (options.keep_fields) {
        answer.fields = passage::make_fields(derived, flow, readings);
    }
    return answer;
}

Plan plan(const Passage& passage, const Accuracy& accuracy, const Options& options)
{
    Plan result;
    result.derived = checked(passage, accuracy, options);
    const passage::DuctGrid grid = passage::choose_grid(passage, result.derived, accuracy, options);
    cascade::CascadeSettings settings;
    settings.coupling = options.coupling.value_or(Coupling::lines);
    settings.coupling_settings.relaxation = coupling::default_relaxation(settings.coupling);
    cascade::Cascade<2> nested(grid.grid(), passage::duct_problem(passage, result.derived, options),
                               passage::first_guess(passage, result.derived, grid), settings);
    for (int level = nested.levels() - 1; level >= 0; --level) {
        result.grids.push_back(nested.equations(level).grid().cells());
    }
    const double diameter = result.derived.hydraulic_diameter;
    const std::size_t across = grid.across.size() - 1;
    result.first_cell_along = grid.along[1] * diameter;
    result.first_cell_across =
        std::min(grid.across[1] - grid.across[0], grid.across[across] - grid.across[across - 1]) * diameter;
    result.tail_length = (grid.along.back() - grid.along[grid.end]) * diameter;
    result.memory_bytes = static_cast<double>(nested.bytes());
    result.handbook = passage::handbook_estimate(passage, result.derived);
    result.regime = passage::regime_text(passage, result.derived);
    result.cautions = passage::cautions_before(passage, result.derived);
    return result;
}

} // namespace leat
