#pragma once

#include <string>
#include <vector>

namespace leat::driver {

/// Rows of text as aligned columns, two blanks apart, each row indented by `indent`; no blanks at line ends. The second
/// column is right-aligned when `right_aligned_second`.
std::string aligned(const std::vector<std::vector<std::string>>& rows, int indent, bool right_aligned_second);

/// `text` in lines of at most 100 characters, the first led by `lead`, the others indented as far.
std::string wrapped(const std::string& lead, const std::string& text);

} // namespace leat::driver
