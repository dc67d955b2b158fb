#pragma once

#include "casefile/file_faults.hpp"
#include "units/unit_system.hpp"

#include <leat/passage/passage.hpp>

#include <optional>
#include <string>
#include <string_view>

namespace leat::driver {

/// Reads an inlet profile: `#` comments, a header line such as `radius [mm], velocity [m/s]`, then one pair of
/// numbers per line, positions increasing. Faults are noted on `file` with their line. Empty when any was noted.
std::optional<VelocityTable> read_velocity_table(std::string_view text, const std::string& file,
                                                 const UnitSystem& units, FileFaults& faults);

} // namespace leat::driver
