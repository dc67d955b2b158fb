#pragma once

#include <leat/leat.hpp>

#include <cstdint>
#include <vector>

namespace leat::published {

/// Every number of an answer, bit by bit, but for the time that it took.
std::vector<std::uint64_t> bits_of(const Answer& answer);

} // namespace leat::published
