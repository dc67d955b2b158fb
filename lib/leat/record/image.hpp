#pragma once

#include <leat/passage/answer.hpp>

#include <cstddef>
#include <string_view>
#include <vector>

namespace leat::record {

/// The bytes of the .h5 file of an answer, sealed, made in memory only. Equal input gives equal bytes.
/// Throws InvalidInput (see require_recordable()) or Hdf5Failure.
std::vector<std::byte> result_image(std::string_view case_text, const Answer& answer);

} // namespace leat::record
