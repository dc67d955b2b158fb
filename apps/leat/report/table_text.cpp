#include "report/table_text.hpp"

#include <algorithm>
#include <cstddef>
#include <string_view>

namespace leat::driver {

namespace {

// Characters, not bytes: continuation bytes of UTF-8 do not count.
std::size_t width(std::string_view text)
{
    return static_cast<std::size_t>(std::count_if(
        text.begin(), text.end(), [](char c) { return (static_cast<unsigned char>(c) & 0xC0U) != 0x80U; }));
}

} // namespace

std::string aligned(const std::vector<std::vector<std::string>>& rows, int indent, bool right_aligned_second)
{
    std::vector<std::size_t> widths;
    for (const auto& row : rows) {
        widths.resize(std::max(widths.size(), row.size()));
        for (std::size_t i = 0; i < row.size(); ++i) {
            widths[i] = std::max(widths[i], width(row[i]));
        }
    }
    std::string text;
    for (const auto& row : rows) {
        std::string line(static_cast<std::size_t>(indent), ' ');
        for (std::size_t i = 0; i < row.size(); ++i) {
            const std::string blanks(widths[i] - width(row[i]), ' ');
            line += i == 1 && right_aligned_second ? blanks + row[i] : row[i] + blanks;
            line += "  ";
        }
        line.erase(line.find_last_not_of(' ') + 1);
        text += line + '\n';
    }
    return text;
}

std::string wrapped(const std::string& lead, const std::string& text)
{
    constexpr std::size_t line_width = 100;
    std::string result;
    std::string line = lead;
    bool empty = true;
    for (std::size_t start = 0; start < text.size();) {
        const std::size_t end = std::min(text.find(' ', start), text.size());
        const std::string word = text.substr(start, end - start);
        if (!empty && width(line) + 1 + width(word) > line_width) {
            result += line + '\n';
            line = std::string(width(lead), ' ');
            empty = true;
        }
        line += empty ? word : " " + word;
        empty = false;
        start = end + 1;
    }
    return result + line + '\n';
}

} // namespace leat::driver
