#include <leat/cascade/error_band.hpp>

#include <algorithm>
#include <cmath>

namespace leat::cascade {

namespace {

// Measured by benchmarks/band_coverage; DEVELOPERS.md lists what else was tried.
constexpr double safety = 1.35;
constexpr double near_weight = 2.5;  // of the departure between the three finest grids
constexpr double far_weight = 1;     // of that one grid coarser
constexpr double least_order = 0.3;  // nothing slower is believed: the band would be without bound
constexpr double formal_order = 2.0; // of every scheme but upwind, which shows by its apparent order

// A number without a limit: increments that do not shrink.
constexpr double least_ratio = 0.9;
constexpr double greatest_ratio = 1.1;
constexpr double clear_of_iteration = 10; // increments are judged when they exceed the iteration errors this much

/// The change of a number from one grid to the next finer one.
struct Increment {
    double change = 0;
    double iteration_error = 0;

    double most() const { return std::abs(change) + iteration_error; }
    double least() const { return std::max(std::abs(change) - iteration_error, 0.0); }
};

Increment between(const GridValue& coarse, const GridValue& fine)
{
    return {fine.value - coarse.value, coarse.iteration_error + fine.iteration_error};
}

bool same_size(const Increment& fine, const Increment& coarse)
{
    const double ratio = fine.change / coarse.change;
    return ratio >= least_ratio && ratio <= greatest_ratio;
}

bool clear(const Increment& increment)
{
    return std::abs(increment.change) > clear_of_iteration * increment.iteration_error;
}

/// What a departure from fourfold shrinking leaves of the finer increment's error.
double departure(const Increment& fine, const Increment& coarse)
{
    const double allowance = coarse.iteration_error + 4 * fine.iteration_error;
    return (std::abs(coarse.change - 4 * fine.change) + allowance) / 12;
}

/// Where the finest value is headed if increments go on shrinking at their apparent order.
double richardson(const Increment& fine, const Increment& coarse)
{
    const bool one_sign = fine.change * coarse.change > 0;
    const double order =
        one_sign ? std::clamp(std::log2(coarse.least() / fine.most()), least_order, formal_order) : formal_order;
    return safety * fine.most() / (std::exp2(order) - 1);
}

/// What increments that change sign, or shrink faster than second order allows, may hide. (Slower shrinking is in the
/// apparent order.)
double hidden(const Increment& fine, const Increment& coarse)
{
    const bool slower = fine.change * coarse.change > 0 && coarse.most() < 4 * fine.most();
    return slower ? 0 : near_weight * departure(fine, coarse);
}

} // namespace

ErrorBand error_band(const std::vector<GridValue>& values)
{
    ErrorBand band;
    const std::size_t count = values.size();
    if (count < 3) {
        band.reason = "no error band: known on " + std::to_string(count) + " grids, three are needed";
        return band;
    }
    const auto finite = [](const GridValue& v) { return std::isfinite(v.value) && std::isfinite(v.iteration_error); };
    if (!std::all_of(values.begin(), values.end(), finite)) {
        band.reason = "no error band: not finite on every grid";
        return band;
    }
    const Increment first = between(values[count - 2], values[count - 1]);
    const Increment second = between(values[count - 3], values[count - 2]);
    double departed = hidden(first, second);
    if (count > 3) {
        const Increment third = between(values[count - 4], values[count - 3]);
        if (same_size(first, second) && same_size(second, third) && clear(first) && clear(second) && clear(third)) {
            band.has_limit = false;
            band.reason = "does not converge under refinement";
            return band;
        }
        departed = std::max(departed, far_weight * departure(second, third) / 4);
    }
    band.half_width = richardson(first, second) + departed + values[count - 1].iteration_error;
    return band;
}

} // namespace leat::cascade
