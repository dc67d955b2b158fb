#pragma once

#include <string_view>

namespace leat::test {

/// Whether `part` occurs in `text`. Catch2's own matcher for this has another name in each of its versions.
inline bool contains(std::string_view text, std::string_view part)
{
    return text.find(part) != std::string_view::npos;
}

} // namespace leat::test
