#include "report/number_text.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>

namespace leat::driver {

namespace {

std::string written(double value, std::chars_format format, int precision)
{
    std::array<char, 400> buffer{};
    const auto [end, error] = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value, format, precision);
    return std::string(buffer.data(), end);
}

// The decimal exponent of the value once it is rounded to that many digits: 9.9996 to 3 digits has 1.
int exponent_of(double value, int digits)
{
    const std::string text = written(std::abs(value), std::chars_format::scientific, digits - 1);
    const std::size_t e = text.find('e') + 1;
    int exponent = 0;
    const char* begin = text.data() + e + (text[e] == '+' ? 1 : 0);
    std::from_chars(begin, text.data() + text.size(), exponent);
    return exponent;
}

} // namespace

std::string significant(double value, int digits)
{
    if (value == 0) {
        return "0";
    }
    const int exponent = exponent_of(value, digits);
    if (exponent < -3 || exponent > 6) {
        return written(value, std::chars_format::scientific, digits - 1);
    }
    const int decimals = digits - 1 - exponent;
    if (decimals >= 0) {
        return written(value, std::chars_format::fixed, decimals);
    }
    const double step = std::pow(10.0, -decimals);
    return written(std::round(value / step) * step, std::chars_format::fixed, 0);
}

std::string shortest(double value, int digits)
{
    std::string text = significant(value, digits);
    const std::size_t end = std::min(text.find('e'), text.size());
    if (text.find('.') < end) {
        std::size_t last = text.find_last_not_of('0', end - 1);
        last -= text[last] == '.' ? 1 : 0;
        text.erase(last + 1, end - last - 1);
    }
    return text;
}

std::string magnitude(double value)
{
    return value == 0 ? "0" : written(value, std::chars_format::scientific, 1);
}

std::string with_band(const Number& number)
{
    if (!number.band || *number.band <= 0) {
        return significant(number.value, 5);
    }
    // One digit of the band, two where it begins with 1 or 2; rounded up, so that what is printed holds too.
    const double band = *number.band;
    const int exponent = static_cast<int>(std::floor(std::log10(band)));
    const int last = band < 3 * std::pow(10.0, exponent) ? exponent - 1 : exponent;
    const double step = std::pow(10.0, last);
    const double rounded = std::ceil(band / step * (1 - 1e-12)) * step;
    const int first = number.value == 0 ? last : exponent_of(number.value, 17);
    const int digits = std::clamp(first - last + 1, 1, 17);
    return significant(number.value, digits) + " \u00b1 " + significant(rounded, exponent_of(rounded, 17) - last + 1);
}

std::string duration_text(double seconds)
{
    if (seconds < 60) {
        return significant(seconds, 2) + " s";
    }
    const long whole = std::lround(seconds);
    return std::to_string(whole / 60) + " min " + std::to_string(whole % 60) + " s";
}

} // namespace leat::driver
