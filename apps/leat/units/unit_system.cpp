#include "units/unit_system.hpp"

#include "terminal/quoted.hpp"

#include <udunits2.h>

#include <array>
#include <cctype>
#include <cmath>

namespace leat::driver {

namespace {

struct Free {
    void operator()(ut_unit* unit) const { ut_free(unit); }
    void operator()(ut_system* system) const { ut_free_system(system); }
    void operator()(cv_converter* converter) const { cv_free(converter); }
};
using Unit = std::unique_ptr<ut_unit, Free>;
using System = std::unique_ptr<ut_system, Free>;
using Converter = std::unique_ptr<cv_converter, Free>;

constexpr std::size_t longest_unit = 60;
constexpr double us_gallon_per_minute = 3.785411784e-3 / 60; // m^3/s, exact by definition of the gallon

bool is_letter(char c)
{
    const auto byte = static_cast<unsigned char>(c);
    return std::isalpha(byte) != 0 || byte >= 0x80 || c == '_' || c == '%';
}

bool is_digit(char c)
{
    return c >= '0' && c <= '9';
}

// The parser would read "mm 3" as 3 mm and "m since 2000" as a shifted scale. Numbers are allowed only as exponents
// (m2, m^2, m-3, s**-1), within a name (inH2O) and as the numerator of 1/min.
bool has_stray_number(std::string_view unit)
{
    for (std::size_t i = 0; i < unit.size(); ++i) {
        if (!is_digit(unit[i]) || (i > 0 && is_digit(unit[i - 1]))) {
            continue;
        }
        if (i == 0) {
            const std::size_t next = unit.find_first_not_of(' ', 1);
            if (unit[0] != '1' || (next != std::string_view::npos && unit[next] != '/')) {
                return true;
            }
            continue;
        }
        std::size_t before = i - 1;
        if ((unit[before] == '-' || unit[before] == '+') && before > 0) {
            --before;
        }
        const bool power = unit[before] == '^' || (unit[before] == '*' && before > 0 && unit[before - 1] == '*');
        if (!power && !is_letter(unit[before]) && unit[before] != ')') {
            return true;
        }
    }
    return false;
}

bool has_word(std::string_view unit, std::string_view word)
{
    for (std::size_t at = unit.find(word); at != std::string_view::npos; at = unit.find(word, at + 1)) {
        const std::size_t end = at + word.size();
        if ((at == 0 || !is_letter(unit[at - 1])) && (end == unit.size() || !is_letter(unit[end]))) {
            return true;
        }
    }
    return false;
}

Unit parse(ut_system* system, std::string_view text)
{
    return Unit(ut_parse(system, std::string(text).c_str(), UT_UTF8));
}

bool same_dimension(const ut_unit* a, const ut_unit* b)
{
    // ut_are_convertible also accepts the reciprocal; the ratio tells the two apart.
    const Unit ratio(ut_divide(a, b));
    const Unit one(ut_get_dimensionless_unit_one(ut_get_system(a)));
    return ratio && one && ut_are_convertible(ratio.get(), one.get()) != 0;
}

std::string in_base_units(const ut_unit* unit)
{
    std::array<char, 128> buffer{};
    const int length = ut_format(unit, buffer.data(), buffer.size() - 1, UT_ASCII | UT_DEFINITION);
    std::string text(buffer.data(), length > 0 ? std::min<std::size_t>(length, buffer.size() - 1) : 0);
    const std::size_t space = text.find(' ');
    return !text.empty() && is_digit(text[0]) && space != std::string::npos ? text.substr(space + 1) : text;
}

std::string needed(Dimension dimension)
{
    const DimensionName& name = name_of(dimension);
    return std::string(name.name) + " is needed, such as " + std::string(name.example);
}

} // namespace

struct UnitSystem::Data {
    System system;
};

UnitSystem::UnitSystem() : data_(std::make_unique<Data>())
{
    ut_set_error_message_handler(ut_ignore);
    data_->system.reset(ut_read_xml(nullptr));
    ut_system* system = data_->system.get();
    if (system == nullptr) {
        throw UnitSystemError("cannot load the data base of units of UDUNITS-2 (Debian: libudunits2-data)");
    }
    const Unit poise = parse(system, "poise");
    const Unit flow = parse(system, "m^3/s");
    const Unit gpm(flow ? ut_scale(us_gallon_per_minute, flow.get()) : nullptr);
    if (!poise || !gpm || ut_map_symbol_to_unit("P", UT_ASCII, poise.get()) != UT_SUCCESS ||
        ut_map_symbol_to_unit("gpm", UT_ASCII, gpm.get()) != UT_SUCCESS) {
        throw UnitSystemError("the data base of units of UDUNITS-2 does not accept P and gpm");
    }
}

UnitSystem::~UnitSystem() = default;

Conversion UnitSystem::to_si(double value, std::string_view unit, Dimension dimension) const
{
    const std::string shown = quoted(unit);
    if (unit.size() > longest_unit) {
        return {{}, shown + " is too long for a unit; " + needed(dimension)};
    }
    if (has_stray_number(unit)) {
        return {{}, shown + " is no unit: a unit holds no numbers but exponents; " + needed(dimension)};
    }
    if (has_word(unit, "gal") || has_word(unit, "Gal")) {
        return {{},
                shown + " is an acceleration (1 Gal = 1 cm/s^2), no volume; write gpm for US gallons per minute, "
                        "or US_liquid_gallon or Canadian_liquid_gallon"};
    }
    ut_system* system = data_->system.get();
    const Unit from = parse(system, unit);
    if (!from) {
        return {{}, shown + " is not a known unit; " + needed(dimension)};
    }
    const Unit to = parse(system, name_of(dimension).si_unit);
    if (!same_dimension(from.get(), to.get())) {
        std::string what = "has the dimension of " + in_base_units(from.get());
        for (const DimensionName& known : known_dimensions()) {
            const Unit candidate = parse(system, known.si_unit);
            if (candidate && same_dimension(from.get(), candidate.get())) {
                what = "is " + std::string(known.name) + " (" + in_base_units(from.get()) + ")";
                break;
            }
        }
        return {{}, shown + " " + what + "; " + needed(dimension)};
    }
    const Converter converter(ut_get_converter(from.get(), to.get()));
    const double factor = converter ? cv_convert_double(converter.get(), 1.0) : 0.0;
    if (!converter || cv_convert_double(converter.get(), 0.0) != 0.0 || !std::isfinite(factor) ||
        std::abs(cv_convert_double(converter.get(), 2.0) - 2 * factor) > 1e-12 * std::abs(factor)) {
        return {{},
                shown + " is not proportional to " + std::string(name_of(dimension).si_unit) + "; " +
                    needed(dimension)};
    }
    return {cv_convert_double(converter.get(), value), {}};
}

} // namespace leat::driver
