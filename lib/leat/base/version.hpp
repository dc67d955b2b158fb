#pragma once

#include <string_view>

namespace leat {

/// The version of this library, as `major.minor.patch` (semantic versioning).
std::string_view version() noexcept;

} // namespace leat
