#pragma once

#include <optional>
#include <stdexcept>
#include <string>
#include <string_view>

namespace leat::driver {

/// A file cannot be opened or read. what() holds the reason only, not the name.
class Unreadable : public std::runtime_error {
public:
    using std::runtime_error::runtime_error;
};

/// Most bytes that are read of one text file.
inline constexpr std::size_t largest_text_file = 64U << 20U;
/// Most bytes of one line.
inline constexpr std::size_t longest_line = 4096;

/// The bytes of a file, without a leading byte order mark. Throws Unreadable (also for a folder, and for more than
/// largest_text_file bytes).
std::string read_bytes(const std::string& path);

/// What keeps `bytes` from being a text of sane lines.
struct NotText {
    int line = 0;
    std::string reason;
};

/// The first NUL or other control byte, byte sequence that is not UTF-8, or line that is longer than longest_line.
std::optional<NotText> find_not_text(std::string_view bytes);

/// `text` without blanks at both ends.
std::string_view trimmed(std::string_view text);

} // namespace leat::driver
