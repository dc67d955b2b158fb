#include "casefile/quantity.hpp"

#include "casefile/text_file.hpp"
#include "terminal/quoted.hpp"

#include <charconv>
#include <cmath>

namespace leat::driver {

ReadNumber read_number(std::string_view text)
{
    text = trimmed(text);
    const bool plus = text.size() > 1 && text[0] == '+' && text[1] != '-';
    const char* begin = text.data() + (plus ? 1 : 0);
    const char* end = text.data() + text.size();
    double value = 0;
    const auto [stop, error] = std::from_chars(begin, end, value);
    if (error == std::errc::invalid_argument) {
        return {{}, {}, "does not begin with a number"};
    }
    const std::string_view digits(text.data(), static_cast<std::size_t>(stop - text.data()));
    if (error == std::errc::result_out_of_range) {
        return {{}, {}, shortened(digits) + " is beyond the range of numbers (1e-307 to 1e308)"};
    }
    if (!std::isfinite(value)) {
        return {{}, {}, shortened(digits) + " is not a finite number"};
    }
    const std::string_view rest = text.substr(digits.size());
    if (rest.size() > 1 && rest[0] == ',' && rest[1] >= '0' && rest[1] <= '9') {
        return {{}, {}, "has a decimal comma where a point is needed"};
    }
    return {value, trimmed(rest), {}};
}

Conversion read_quantity(std::string_view text, Dimension dimension, const UnitSystem& units)
{
    const DimensionName& name = name_of(dimension);
    const ReadNumber number = read_number(text);
    if (!number.value) {
        return {{},
                number.fault + "; " + std::string(name.name) + " is needed, such as 8 " + std::string(name.example)};
    }
    if (number.rest.empty()) {
        const std::string digits = shortened(trimmed(text));
        return {{},
                "has no unit; " + std::string(name.name) + " is needed, such as " + digits + " " +
                    std::string(name.example)};
    }
    Conversion result = units.to_si(*number.value, number.rest, dimension);
    if (result.value && !std::isfinite(*result.value)) {
        return {{}, "is beyond the range of numbers in " + std::string(name.si_unit)};
    }
    return result;
}

} // namespace leat::driver
