#pragma once

#include <leat/passage/passage.hpp>

#include <string>
#include <vector>

namespace leat::passage {

/// Thresholds of the cautions, chosen here from practice.
inline constexpr double short_passage = 3;            ///< hydraulic diameters
inline constexpr double creeping_reynolds_number = 1; ///< below it a flat inlet is not what a duct receives
inline constexpr double developed_passage = 20;       ///< development lengths

/// What to be careful about, known before solving a valid passage; one sentence each, with the number, the threshold
/// and the source: Re above laminar_limit(); length < 3 D_h; Re < 1 with a flat inlet; flat inlet and length > 20
/// development lengths (development_length_estimate()), where the developed-flow formula serves.
std::vector<std::string> cautions_before(const Passage& passage, const Derived& derived);

/// "laminar: Re 111.2 is not above 2300 (tube, Schlichting 1979)", or
/// "beyond the laminar limit: Re 5000 is above 2300 (tube, Schlichting 1979)".
std::string regime_text(const Passage& passage, const Derived& derived);

} // namespace leat::passage
