#pragma once

#include "casefile/entries.hpp"

#include <leat/base/error.hpp>

#include <vector>

namespace leat::driver {

/// Notes what the library finds wrong with a passage or its options on the line of the key that stated it. A fault of
/// a member whose key is missing or already at fault is left out: it only follows from that one.
void add_library_faults(const std::vector<Fault>& library, const Entries& entries);

} // namespace leat::driver
