#pragma once

#include <leat/passage/answer.hpp>

#include <string_view>

namespace leat::record {

/// Throws InvalidInput, with every fault, unless the answer can be stored: `fields` set with at least one cell and
/// arrays of the lengths that the cells ask for; station columns and x equally long; all values finite; no NUL in the
/// text.
void require_recordable(std::string_view case_text, const Answer& answer);

} // namespace leat::record
