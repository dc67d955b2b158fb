#include <leat/passage/wanted_bands.hpp>

#include <leat/passage/computed_numbers.hpp>
#include <leat/passage/developed.hpp>
#include <leat/passage/rounded_text.hpp>

#include <algorithm>
#include <cmath>

namespace leat::passage {

namespace {

constexpr double least_share = 0.01; // of the developed pressure drop: a drop may pass through 0
constexpr std::string_view always_wanted = "pressure_drop";

double developed_pressure_drop(const Passage& passage, const Derived& derived)
{
    const double dynamic = 0.5 * derived.density * derived.mean_velocity * derived.mean_velocity;
    return dynamic * 4 * developed_flow(passage.shape).friction_reynolds / derived.reynolds_number * derived.length /
           derived.hydraulic_diameter;
}

} // namespace

std::vector<MissedBand> missed_bands(const Passage& passage, const Derived& derived, const Accuracy& accuracy,
                                     Numbers& numbers)
{
    std::vector<MissedBand> missed;
    for (const ComputedNumber& row : computed_numbers(numbers)) {
        const bool drop = row.name == always_wanted;
        const bool wanted =
            drop || std::find(accuracy.band_on.begin(), accuracy.band_on.end(), row.name) != accuracy.band_on.end();
        if (!wanted || row.number == nullptr) {
            continue;
        }
        const double least = drop ? least_share * developed_pressure_drop(passage, derived) : 0;
        const double scale = std::max(std::abs(row.number->value), least);
        const std::string asked = rounded_text(100 * accuracy.band) + " % is wanted";
        if (!row.number->band) {
            missed.push_back({row.number, "there is no band on " + std::string(row.name) + " where " + asked});
        } else if (!(*row.number->band <= accuracy.band * scale)) {
            const std::string given =
                scale > 0 ? rounded_text(100 * *row.number->band / scale) + " %" : "infinitely wide";
            missed.push_back({row.number, "the band on " + std::string(row.name) + " is " + given + " where " + asked});
        }
    }
    return missed;
}

} // namespace leat::passage
