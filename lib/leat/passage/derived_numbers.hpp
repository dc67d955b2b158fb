#pragma once

#include <leat/passage/passage.hpp>

namespace leat::passage {

/// The arithmetic behind derive(), without any check: for a passage whose every member is right by itself
/// (positive dimensions, one viscosity, one statement of the flow). Results may overflow.
Derived derived_numbers(const Passage& passage);

} // namespace leat::passage
