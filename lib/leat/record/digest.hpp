#pragma once

#include <cstddef>
#include <span>
#include <string>

namespace leat::record {

/// The SHA-256 digest of the bytes (FIPS 180-4), as 64 lower-case hexadecimal digits.
std::string sha256(std::span<const std::byte> bytes);

} // namespace leat::record
