#include <leat/passage/rounded_text.hpp>

#include <array>
#include <charconv>

namespace leat::passage {

std::string rounded_text(double number)
{
    std::array<char, 32> buffer{};
    const auto [end, error] =
        std::to_chars(buffer.data(), buffer.data() + buffer.size(), number, std::chars_format::general, 4);
    return std::string(buffer.data(), end);
}

} // namespace leat::passage
