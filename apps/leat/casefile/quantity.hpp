#pragma once

#include "units/unit_system.hpp"

#include <optional>
#include <string>
#include <string_view>

namespace leat::driver {

/// A number at the beginning of a text.
struct ReadNumber {
    std::optional<double> value; ///< finite
    std::string_view rest;       ///< what follows it, without blanks at its ends
    std::string fault;           ///< empty when there is a value
};

/// Reads a finite decimal number; the same in every locale.
ReadNumber read_number(std::string_view text);

/// Reads `8 mm` as SI of that dimension. A missing unit is a fault that names a right one.
Conversion read_quantity(std::string_view text, Dimension dimension, const UnitSystem& units);

} // namespace leat::driver
