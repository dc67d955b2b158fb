#pragma once

#include "casefile/entries.hpp"

#include <leat/passage/options.hpp>

namespace leat::driver {

/// The section [accuracy].
Accuracy read_accuracy(const Entries& entries);

/// The section [numerics], and the stations of [passage].
Options read_options(const Entries& entries);

} // namespace leat::driver
