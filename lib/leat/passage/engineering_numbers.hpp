#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/readings.hpp>

namespace leat::passage {

/// The numbers of a passage solved on one grid, in SI; absent ones with their reason. What follows from the statement
/// alone has the band 0, the rest has none yet.
Numbers make_numbers(const Passage& passage, const Derived& derived, const Readings& readings);

} // namespace leat::passage
