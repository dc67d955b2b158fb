#pragma once

#include <leat/passage/answer.hpp>

#include <span>
#include <string_view>

namespace leat::passage {

/// One number that comes from a solution (and not from the statement alone).
struct ComputedNumber {
    std::string_view name; ///< as the member of Numbers
    Number* number;        ///< null where it is absent; points into the Numbers that were given
};

/// Every computed number in the order of the contract, absent ones too: lists of equal passages agree place by place.
std::vector<ComputedNumber> computed_numbers(Numbers& numbers);

/// The names that computed_numbers() gives.
std::span<const std::string_view> computed_names() noexcept;

} // namespace leat::passage
