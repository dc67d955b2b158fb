#pragma once

#include "casefile/entries.hpp"

#include <leat/passage/passage.hpp>

namespace leat::driver {

/// The sections [passage], [fluid] and [inlet]. What is missing or contradictory is noted in the entries' faults; the
/// members concerned then keep their defaults.
Passage read_passage(const Entries& entries);

} // namespace leat::driver
