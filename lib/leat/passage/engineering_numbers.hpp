#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/readings.hpp>

namespace leat::passage {

/// The numbers of a solved passage in SI; absent ones with their reason.
Numbers make_numbers(const Passage& passage, const Derived& derived, const Readings& readings);

} // namespace leat::passage
