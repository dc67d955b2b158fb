#include "terminal/quoted.hpp"

namespace leat::driver {

std::string shortened(std::string_view text)
{
    constexpr std::size_t longest = 60;
    bool cut = text.size() > longest;
    if (cut) {
        std::size_t end = longest;
        while (end > 0 && (static_cast<unsigned char>(text[end]) & 0xC0U) == 0x80U) {
            --end; // not in the middle of a character
        }
        text = text.substr(0, end);
    }
    std::string shown(text);
    for (char& c : shown) {
        const auto byte = static_cast<unsigned char>(c);
        if (byte < 0x20 || byte == 0x7F) {
            c = '?';
        }
    }
    return cut ? shown + "..." : shown;
}

std::string quoted(std::string_view text)
{
    return "'" + shortened(text) + "'";
}

} // namespace leat::driver
