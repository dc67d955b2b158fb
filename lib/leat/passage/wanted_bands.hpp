#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>

#include <string>
#include <vector>

namespace leat::passage {

/// A number whose band is wider than wanted, or that has none.
struct MissedBand {
    Number* number;
    std::string reason; ///< "the band on pressure_drop is 0.31 % where 0.2 % is wanted"
};

/// The numbers on which a band is wanted (the pressure drop and Accuracy::band_on) and is not met; absent ones ask for
/// nothing. Relative to max(|value|, 1 % of the developed-flow pressure drop over the same length) for the pressure
/// drop, to |value| for every other.
std::vector<MissedBand> missed_bands(const Passage& passage, const Derived& derived, const Accuracy& accuracy,
                                     Numbers& numbers);

} // namespace leat::passage
