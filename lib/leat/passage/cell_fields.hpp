#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/readings.hpp>

namespace leat::passage {

/// The solution on the finest grid in SI.
Fields make_fields(const Derived& derived, const DuctFlow& flow, const Readings& readings);

} // namespace leat::passage
