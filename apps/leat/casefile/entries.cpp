#include "casefile/entries.hpp"

#include "casefile/quantity.hpp"
#include "casefile/vocabulary.hpp"
#include "terminal/quoted.hpp"
#include "terminal/suggestion.hpp"

#include <algorithm>
#include <charconv>

namespace leat::driver {

namespace {

std::string did_you_mean(std::string_view word, std::span<const std::string_view> known)
{
    const std::string_view near = nearest(word, known);
    return near.empty() ? "known are " + any_of(known) : "did you mean '" + std::string(near) + "'?";
}

std::string other_section_of(std::string_view key)
{
    for (const std::string_view section : known_sections()) {
        if (std::ranges::find(known_keys(section), key) != known_keys(section).end()) {
            return std::string(section);
        }
    }
    return {};
}

} // namespace

Entries::Entries(const CaseText& text, const UnitSystem& units, FileFaults& faults) : units_(units), faults_(faults)
{
    for (const CaseText::Section& section : text.sections) {
        check_section(section);
    }
    for (const Entry& entry : text.entries) {
        if (!known_keys(entry.section).empty()) {
            take(entry);
        }
    }
}

void Entries::check_section(const CaseText::Section& section)
{
    if (known_keys(section.name).empty()) {
        faults_.add(section.line, "unknown section [" + shortened(section.name) + "]; " +
                                      did_you_mean(section.name, known_sections()));
    } else if (const int first = line_of_section(section.name); first != 0) {
        faults_.add(section.line, "section [" + section.name + "] was already opened in line " + std::to_string(first) +
                                      "; keep one");
    } else {
        sections_.push_back(section);
    }
}

void Entries::take(const Entry& entry)
{
    const auto known = known_keys(entry.section);
    if (std::ranges::find(known, entry.key) == known.end()) {
        const std::string other = other_section_of(entry.key);
        faults_.add(entry.line, "unknown key " + quoted(entry.key) + " in [" + entry.section + "]; " +
                                    (other.empty() ? did_you_mean(entry.key, known) : "it belongs in [" + other + "]"));
    } else if (const Entry* first = find(entry.section, entry.key)) {
        faults_.add(entry.line, "'" + entry.key + "' was already given in line " + std::to_string(first->line) +
                                    "; keep one of the two");
    } else {
        entries_.push_back(entry);
    }
}

const Entry* Entries::find(std::string_view section, std::string_view key) const
{
    const auto found = std::find_if(entries_.begin(), entries_.end(),
                                    [&](const Entry& entry) { return entry.section == section && entry.key == key; });
    return found == entries_.end() ? nullptr : &*found;
}

int Entries::line_of_section(std::string_view section) const
{
    const auto found = std::find_if(sections_.begin(), sections_.end(),
                                    [&](const CaseText::Section& row) { return row.name == section; });
    return found == sections_.end() ? 0 : found->line;
}

std::optional<std::string_view> Entries::word(std::string_view section, std::string_view key,
                                              std::span<const std::string_view> words) const
{
    const Entry* entry = find(section, key);
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const auto found = std::ranges::find(words, entry->value);
    if (found == words.end()) {
        const std::string_view near = nearest(entry->value, words);
        faults_.add(entry->line,
                    shown(*entry) + " is not known; " +
                        (near.empty() ? "write " + any_of(words) : "did you mean '" + std::string(near) + "'?"));
        return std::nullopt;
    }
    return *found;
}

std::optional<double> Entries::quantity(std::string_view section, std::string_view key, Dimension dimension) const
{
    const Entry* entry = find(section, key);
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const Conversion result = read_quantity(entry->value, dimension, units_);
    if (!result.value) {
        faults_.add(entry->line, shown(*entry) + ": " + result.fault);
    }
    return result.value;
}

std::optional<double> Entries::number(std::string_view section, std::string_view key) const
{
    const Entry* entry = find(section, key);
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const ReadNumber read = read_number(entry->value);
    if (!read.value) {
        faults_.add(entry->line, shown(*entry) + ": " + read.fault);
    } else if (!read.rest.empty()) {
        faults_.add(entry->line, shown(*entry) + ": a plain number is needed, without unit");
        return std::nullopt;
    }
    return read.value;
}

std::optional<int> Entries::whole_number(std::string_view section, std::string_view key) const
{
    const Entry* entry = find(section, key);
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    int value = 0;
    const char* end = entry->value.data() + entry->value.size();
    const auto [stop, error] = std::from_chars(entry->value.data(), end, value);
    if (error != std::errc{} || stop != end) {
        faults_.add(entry->line, shown(*entry) + ": a whole number is needed, such as 500");
        return std::nullopt;
    }
    return value;
}

std::string Entries::shown(const Entry& entry)
{
    return "[" + entry.section + "] " + entry.key + " = " + shortened(entry.value);
}

} // namespace leat::driver
