#pragma once

#include <span>
#include <string>
#include <string_view>

namespace leat::driver {

/// Least number of inserted, deleted, replaced or swapped neighbouring letters that turn one word into the other
/// (restricted distance of Damerau 1964).
std::size_t edit_distance(std::string_view from, std::string_view to);

/// The word of `known` that `word` was probably meant to be; empty when none is near (a third of its letters, at
/// most 3).
std::string_view nearest(std::string_view word, std::span<const std::string_view> known);

/// "a, b or c".
std::string any_of(std::span<const std::string_view> words);

} // namespace leat::driver
