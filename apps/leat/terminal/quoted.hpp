#pragma once

#include <string>
#include <string_view>

namespace leat::driver {

/// `text` between single quotes, fit for one line of a message: control bytes become '?', and what exceeds 60 bytes
/// is cut (between characters) and marked by "...".
std::string quoted(std::string_view text);

/// The same without the quotes.
std::string shortened(std::string_view text);

} // namespace leat::driver
