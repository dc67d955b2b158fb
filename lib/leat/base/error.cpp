#include <leat/base/error.hpp>

#include <array>
#include <charconv>
#include <cmath>

namespace leat {

namespace {

std::string all_texts(const std::vector<Fault>& faults)
{
    std::string text;
    for (const Fault& fault : faults) {
        if (!text.empty()) {
            text += '\n';
        }
        text += fault.text();
    }
    return text;
}

} // namespace

std::string Fault::text() const
{
    return value.empty() ? field + ": " + valid : field + " = " + value + ": " + valid;
}

InvalidInput::InvalidInput(std::vector<Fault> faults) : Error(all_texts(faults)), faults_(std::move(faults)) {}

void Faults::add(std::string field, std::string value, std::string valid)
{
    list_.push_back({std::move(field), std::move(value), std::move(valid)});
}

void Faults::require_positive(const std::string& field, double number, const std::string& unit)
{
    if (!(std::isfinite(number) && number > 0)) {
        add(field, to_text(number), "must be finite and > 0" + (unit.empty() ? unit : " " + unit));
    }
}

void Faults::throw_if_any() const
{
    if (!list_.empty()) {
        throw InvalidInput(list_);
    }
}

std::string to_text(double number)
{
    std::array<char, 32> buffer{};
    const auto [end, error] = std::to_chars(buffer.data(), buffer.data() + buffer.size(), number);
    return std::string(buffer.data(), end);
}

std::string to_short_text(double number)
{
    std::array<char, 32> buffer{};
    const auto [end, error] =
        std::to_chars(buffer.data(), buffer.data() + buffer.size(), number, std::chars_format::general, 3);
    return std::string(buffer.data(), end);
}

} // namespace leat
