#pragma once

#include <string>

namespace leat::passage {

/// A number for a sentence: four significant digits, without trailing zeros, independent of the locale.
std::string rounded_text(double number);

} // namespace leat::passage
