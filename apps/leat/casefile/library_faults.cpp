#include "casefile/library_faults.hpp"

#include "casefile/vocabulary.hpp"

#include <algorithm>

namespace leat::driver {

namespace {

struct Place {
    std::string section;
    std::string key;
};

// "options.cells[0]" -> [numerics] cells; the key is the last part of the member's path that the section knows.
Place place_of(const std::string& field)
{
    std::vector<std::string> parts;
    std::size_t start = 0;
    while (start <= field.size()) {
        const std::size_t end = std::min(field.find_first_of(".[", start), field.size());
        parts.push_back(field.substr(start, end - start));
        start = end + 1;
    }
    std::string section = parts.front();
    if (section == "shape" || section == "outlet" || section == "passage") {
        section = "passage";
    } else if (section == "options") {
        section = field.find("stations") != std::string::npos ? "passage" : "numerics";
    }
    const auto known = known_keys(section);
    std::ranges::reverse(parts);
    const auto key =
        std::ranges::find_if(parts, [&](const auto& part) { return std::ranges::find(known, part) != known.end(); });
    return {section, key == parts.end() ? std::string() : *key};
}

} // namespace

void add_library_faults(const std::vector<Fault>& library, const Entries& entries)
{
    FileFaults& faults = entries.faults();
    const bool clean = faults.empty();
    // Decided before any is noted: one key may have several of them.
    std::vector<const Entry*> rows;
    for (const Fault& fault : library) {
        const Place place = place_of(fault.field);
        const Entry* entry = entries.find(place.section, place.key);
        rows.push_back(entry != nullptr && !faults.has(entry->line) ? entry : nullptr);
    }
    for (std::size_t i = 0; i < library.size(); ++i) {
        if (rows[i] != nullptr) {
            faults.add(rows[i]->line, Entries::shown(*rows[i]) + ": " + library[i].valid);
        } else if (clean) {
            faults.add(entries.line_of_section(place_of(library[i].field).section), library[i].text());
        }
    }
}

} // namespace leat::driver
