#pragma once

#include <leat/passage/answer.hpp>

#include <string>

namespace leat::driver {

/// A finite number rounded to `digits` significant digits; without exponent from 0.001 up to below ten millions.
std::string significant(double value, int digits);

/// The same without zeros at the end of the decimals: for stated values.
std::string shortest(double value, int digits);

/// Two digits with exponent, for imbalances: "3.1e-12"; "0" for zero.
std::string magnitude(double value);

/// Only digits that mean something: down to the last one of the band, which has one digit, or two where it begins with
/// 1 or 2, and is rounded up; without band 5 significant digits. "8435.2", "8435.2 ± 1.3" or "412.7 ± 0.6".
std::string with_band(const Number& number);

/// A time for people: "0.21 s", "35 s", "12 min 5 s".
std::string duration_text(double seconds);

} // namespace leat::driver
