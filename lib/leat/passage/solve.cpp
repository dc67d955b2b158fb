#include <leat/passage/solve.hpp>

#include <leat/passage/cautions.hpp>
#include <leat/passage/cell_fields.hpp>
#include <leat/passage/computed_numbers.hpp>
#include <leat/passage/handbook.hpp>
#include <leat/passage/refinement.hpp>
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
    for (const passage::ComputedNumber& row : passage::computed_numbers(answer.numbers)) {
        if (row.number != nullptr) {
            row.number->usable = false;
            row.number->reason = reason;
        }
    }
}

/// The grids worked on, and the history of each.
void add_grids(const passage::Refinement& refined, Answer& answer)
{
    for (const passage::SolvedGrid& grid : refined.grids) {
        const cascade::Run<2>& run = grid.flow.run;
        GridReport report = {run.grids.back().cells, run.grids.back().iterations, 0};
        for (const cascade::GridRun<2>& part : run.grids) { // the start from coarser grids counts too
            report.seconds += part.seconds;
        }
        for (HistoryRow row : run.history) {
            if (row.grid == run.history.back().grid) {
                row.grid = static_cast<int>(answer.grids.size());
                answer.history.push_back(row);
            }
        }
        answer.grids.push_back(report);
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
    const passage::Refinement refined = passage::solve_nested(
        passage, derived, passage::nested_grids(passage, derived, options), accuracy, options, observer, stop);
    const passage::SolvedGrid& finest = refined.grids.back();

    Answer answer;
    answer.outcome = refined.outcome;
    answer.usable = refined.usable;
    answer.message = refined.message;
    answer.imbalances = finest.flow.run.imbalances;
    add_grids(refined, answer);
    answer.numbers = refined.numbers;
    answer.stations = passage::make_stations(passage, derived, options, finest.readings);
    answer.cautions = passage::cautions_before(passage, derived);
    add_cautions(finest.flow, finest.readings, answer);
    answer.handbook = passage::handbook_estimate(passage, derived);
    answer.channel = std::holds_alternative<Channel>(passage.shape);
    if (!answer.usable) {
        mark_unusable(answer);
    }
    if (options.keep_fields) {
        answer.fields = passage::make_fields(derived, finest.flow, finest.readings);
    }
    return answer;
}

Plan plan(const Passage& passage, const Accuracy& accuracy, const Options& options)
{
    Plan result;
    result.derived = checked(passage, accuracy, options);
    const std::vector<passage::DuctGrid> grids = passage::nested_grids(passage, result.derived, options);
    const std::size_t finest = passage::grid_for_band(grids, accuracy, options);
    for (std::size_t k = 0; k <= finest; ++k) {
        result.grids.push_back(grids[k].grid().cells());
    }
    const passage::DuctGrid& grid = grids[finest];
    cascade::CascadeSettings settings;
    settings.coupling = options.coupling.value_or(Coupling::lines);
    settings.coupling_settings.relaxation = coupling::default_relaxation(settings.coupling);
    const cascade::Cascade<2> nested(grid.grid(), passage::duct_problem(passage, result.derived, options),
                                     passage::first_guess(passage, result.derived, grid), settings);
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
