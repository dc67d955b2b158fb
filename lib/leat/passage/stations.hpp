#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/readings.hpp>

namespace leat::passage {

/// Values along the passage at the wanted stations (Options::stations, or the default list), in SI.
Stations make_stations(const Passage& passage, const Derived& derived, const Options& options,
                       const Readings& readings);

} // namespace leat::passage
