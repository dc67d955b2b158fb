#include <leat/passage/refinement.hpp>

#include <leat/passage/computed_numbers.hpp>
#include <leat/passage/wanted_bands.hpp>

#include <algorithm>

namespace leat::passage {

namespace {

constexpr std::size_t may_fail = 2; // grids so coarse that the scheme may have no solution there

/// The observer of one grid: which of the nested grids it is, of how many that seem to be needed.
Observer on_grid(const Observer& observer, std::size_t grid, std::size_t count)
{
    if (!observer) {
        return {};
    }
    return [&observer, grid, count](Progress progress) {
        progress.grid = static_cast<int>(grid);
        progress.grid_count = static_cast<int>(count);
        observer(progress);
    };
}

/// Gives each computed number of the last grid its band, or the reason for having none.
void set_bands(std::vector<SolvedGrid>& grids, Numbers& numbers)
{
    const std::vector<ComputedNumber> list = computed_numbers(numbers);
    for (std::size_t place = 0; place < list.size(); ++place) {
        Number* number = list[place].number;
        if (number == nullptr) {
            continue;
        }
        const cascade::ErrorBand band = cascade::error_band(values_on_grids(grids, place));
        number->band = band.half_width;
        number->usable = band.has_limit;
        number->reason = band.reason;
    }
}

/// Says what became of the wanted bands.
void judge_bands(const Passage& passage, const Derived& derived, const Accuracy& accuracy, const Options& options,
                 Refinement& result)
{
    const std::vector<MissedBand> missed = missed_bands(passage, derived, accuracy, result.numbers);
    if (missed.empty()) {
        return;
    }
    const std::string why =
        options.cells ? "the cells were given"
                      : "no finer grid has room in the budget of " + std::to_string(options.cell_budget) + " cells";
    for (const MissedBand& miss : missed) {
        miss.number->reason += (miss.number->reason.empty() ? "" : "; ") + miss.reason + ": " + why;
    }
    if (!options.cells) {
        result.outcome = Outcome::out_of_budget;
        result.message = "out of budget: " + missed.front().reason + ", and " + why;
    }
}

} // namespace

std::vector<cascade::GridValue> values_on_grids(std::vector<SolvedGrid>& grids, std::size_t place)
{
    std::vector<cascade::GridValue> values;
    for (SolvedGrid& grid : grids) {
        const Number* number = computed_numbers(grid.numbers)[place].number;
        if (number == nullptr || grid.iteration_errors.empty()) {
            values.clear(); // only an unbroken run of grids up to the finest counts
        } else {
            values.push_back({number->value, grid.iteration_errors[place]});
        }
    }
    return values;
}

Refinement solve_nested(const Passage& passage, const Derived& derived, const std::vector<DuctGrid>& grids,
                        const Accuracy& accuracy, const Options& options, const Observer& observer,
                        const std::stop_token& stop)
{
    Refinement result;
    const std::size_t expected = grid_for_band(grids, accuracy, options) + 1;
    for (std::size_t k = 0; k < grids.size(); ++k) {
        if (!result.grids.empty()) {
            result.grids.back().flow.cascade.reset(); // only the last grid's state is needed
        }
        result.grids.push_back(
            solve_grid(passage, derived, grids[k], options, on_grid(observer, k, std::max(k + 1, expected)), stop));
        const SolvedGrid& last = result.grids.back();
        result.numbers = last.numbers;
        result.outcome = last.flow.run.outcome;
        result.usable = result.outcome == Outcome::converged;
        result.message = last.flow.run.message;
        if (result.outcome == Outcome::cancelled) {
            return result;
        }
        if (result.outcome != Outcome::converged) {
            if (!options.cells && k >= may_fail) {
                return result;
            }
            continue;
        }
        set_bands(result.grids, result.numbers);
        if (!options.cells && k >= may_fail && missed_bands(passage, derived, accuracy, result.numbers).empty()) {
            return result;
        }
    }
    if (result.outcome == Outcome::converged) {
        judge_bands(passage, derived, accuracy, options, result);
    }
    return result;
}

} // namespace leat::passage
