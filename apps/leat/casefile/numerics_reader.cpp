#include "casefile/numerics_reader.hpp"

#include "casefile/quantity.hpp"
#include "casefile/text_file.hpp"
#include "terminal/quoted.hpp"

#include <algorithm>
#include <array>
#include <charconv>

namespace leat::driver {

namespace {

using Word = std::string_view;
constexpr Word section = "numerics";

// In the order of the enumerations that they name.
constexpr std::array<Word, 7> scheme_names{"upwind", "central",  "power_law", "linear_upwind",
                                           "quick",  "van_leer", "minmod"};
constexpr std::array<Word, 3> coupling_names{"simple", "simplec", "lines"};

template <typename Enumeration, std::size_t count>
std::optional<Enumeration> choice(const Entries& entries, Word key, const std::array<Word, count>& names)
{
    const auto word = entries.word(section, key, names);
    return word ? std::optional(static_cast<Enumeration>(std::ranges::find(names, *word) - names.begin()))
                : std::nullopt;
}

std::optional<int> whole(Word text)
{
    int value = 0;
    const auto [stop, error] = std::from_chars(text.data(), text.data() + text.size(), value);
    return error == std::errc{} && stop == text.data() + text.size() ? std::optional(value) : std::nullopt;
}

std::optional<std::array<int, 2>> read_cells(const Entries& entries)
{
    const Entry* entry = entries.find(section, "cells");
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const Word value = entry->value;
    const std::size_t times = std::min(value.find('x'), value.size());
    const auto along = whole(trimmed(value.substr(0, times)));
    const auto across = whole(trimmed(value.substr(std::min(times + 1, value.size()))));
    if (!along || !across) {
        entries.faults().add(entry->line,
                             Entries::shown(*entry) + ": cells along and across are needed, such as 160 x 40");
        return std::nullopt;
    }
    return std::array<int, 2>{*along, *across};
}

std::optional<Relaxation> read_relaxation(const Entries& entries)
{
    const Entry* entry = entries.find(section, "relaxation");
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const ReadNumber velocity = read_number(entry->value);
    const ReadNumber pressure = read_number(velocity.rest);
    if (!velocity.value || !pressure.value || !pressure.rest.empty()) {
        entries.faults().add(entry->line, Entries::shown(*entry) +
                                              ": two factors, for velocity and pressure, are needed, such as 0.9 0.3");
        return std::nullopt;
    }
    return Relaxation{.velocity = *velocity.value, .pressure = *pressure.value};
}

/// The items of a list, without the blanks around them; none for an entry that is missing.
std::vector<Word> items_of(const Entry* entry)
{
    std::vector<Word> items;
    Word rest = entry == nullptr ? Word{} : Word(entry->value);
    while (!rest.empty()) {
        const std::size_t comma = std::min(rest.find(','), rest.size());
        items.push_back(trimmed(rest.substr(0, comma)));
        rest.remove_prefix(std::min(comma + 1, rest.size()));
    }
    return items;
}

std::vector<double> read_stations(const Entries& entries)
{
    const Entry* entry = entries.find("passage", "stations");
    std::vector<double> stations;
    for (const Word item : items_of(entry)) {
        const Conversion read = read_quantity(item, Dimension::length, entries.units());
        if (read.value) {
            stations.push_back(*read.value);
        } else {
            entries.faults().add(entry->line, "[passage] stations, " + quoted(item) + ": " + read.fault);
        }
    }
    return stations;
}

} // namespace

Accuracy read_accuracy(const Entries& entries)
{
    Accuracy accuracy;
    accuracy.band = entries.quantity("accuracy", "band", Dimension::ratio).value_or(accuracy.band);
    for (const Word name : items_of(entries.find("accuracy", "band_on"))) {
        accuracy.band_on.emplace_back(name);
    }
    return accuracy;
}

Options read_options(const Entries& entries)
{
    Options options;
    options.scheme_along = choice<Scheme>(entries, "scheme_along", scheme_names).value_or(options.scheme_along);
    options.scheme_across = choice<Scheme>(entries, "scheme_across", scheme_names).value_or(options.scheme_across);
    options.coupling = choice<Coupling>(entries, "coupling", coupling_names);
    options.cells = read_cells(entries);
    options.cell_budget = entries.whole_number(section, "cell_budget").value_or(options.cell_budget);
    options.relaxation = read_relaxation(entries);
    options.iterations = entries.whole_number(section, "iterations").value_or(options.iterations);
    options.tolerance = entries.number(section, "tolerance").value_or(options.tolerance);
    options.stations = read_stations(entries);
    return options;
}

} // namespace leat::driver
