#include "casefile/passage_reader.hpp"

#include "casefile/text_file.hpp"
#include "casefile/velocity_table.hpp"
#include "casefile/vocabulary.hpp"
#include "terminal/quoted.hpp"
#include "terminal/suggestion.hpp"

#include <algorithm>
#include <array>
#include <filesystem>

namespace leat::driver {

namespace {

using Word = std::string_view;
constexpr Word passage_section = "passage";
constexpr Word fluid_section = "fluid";
constexpr Word inlet_section = "inlet";

bool has_section(const Entries& entries, Word section)
{
    if (entries.line_of_section(section) != 0) {
        return true;
    }
    entries.faults().add(0, "section [" + std::string(section) + "] is missing");
    return false;
}

void miss(const Entries& entries, Word section, const std::string& what)
{
    entries.faults().add(entries.line_of_section(section), "[" + std::string(section) + "] " + what);
}

void require(const Entries& entries, Word section, Word key, Word example, const std::string& why = {})
{
    if (entries.find(section, key) == nullptr) {
        miss(entries, section,
             "has no '" + std::string(key) + "'" + why + "; write " + std::string(key) + " = " + std::string(example));
    }
}

Shape read_shape(const Entries& entries)
{
    const auto shape = entries.word(passage_section, "shape", known_shapes());
    require(entries, passage_section, "shape", "tube, channel or annulus");
    const auto sizes = shape ? size_keys(*shape) : std::span<const Word>{};
    if (shape) {
        for (const Word key : sizes) {
            require(entries, passage_section, key, key == "length" ? "1.5 m" : "8 mm",
                    ", which shape = " + std::string(*shape) + " needs");
        }
    }
    const auto size = [&](Word key) {
        const bool used = !shape || std::ranges::find(sizes, key) != sizes.end();
        const Entry* entry = entries.find(passage_section, key);
        if (!used && entry != nullptr) {
            entries.faults().add(entry->line, "'" + std::string(key) + "' is not used by shape = " +
                                                  std::string(*shape) + "; its sizes are " + any_of(sizes));
            return 0.0;
        }
        return entries.quantity(passage_section, key, Dimension::length).value_or(0.0);
    };
    const double diameter = size("diameter");
    const double gap = size("gap");
    const double inner = size("inner_diameter");
    const double outer = size("outer_diameter");
    const double length = size("length");
    if (shape == "channel") {
        return Channel{.gap = gap, .length = length};
    }
    if (shape == "annulus") {
        return Annulus{.inner_diameter = inner, .outer_diameter = outer, .length = length};
    }
    return Tube{.diameter = diameter, .length = length};
}

Outlet read_outlet(const Entries& entries)
{
    constexpr std::array<Word, 2> words{"continues", "cut"};
    return entries.word(passage_section, "outlet", words) == "cut" ? Outlet::cut : Outlet::continues;
}

// The key that states it. Notes those that state it again, and when there is none.
Word exactly_one(const Entries& entries, Word section, std::span<const Word> keys, const std::string& what,
                 const std::string& example)
{
    std::vector<const Entry*> given;
    for (const Word key : keys) {
        if (const Entry* entry = entries.find(section, key)) {
            given.push_back(entry);
        }
    }
    if (given.empty()) {
        miss(entries, section, "states no " + what + "; give " + any_of(keys) + ", such as " + example);
        return {};
    }
    std::ranges::sort(given, {}, &Entry::line);
    for (std::size_t i = 1; i < given.size(); ++i) {
        entries.faults().add(given[i]->line, "'" + given[i]->key + "' states the " + what + " again after '" +
                                                 given[0]->key + "' in line " + std::to_string(given[0]->line) +
                                                 "; keep exactly one");
    }
    return given[0]->key;
}

// Every statement is checked, but only the first is used.
std::optional<double> if_first(Word key, Word first, std::optional<double> value)
{
    return key == first ? value : std::nullopt;
}

Fluid read_fluid(const Entries& entries)
{
    Fluid fluid;
    if (has_section(entries, fluid_section)) {
        constexpr std::array<Word, 2> viscosities{"viscosity", "kinematic_viscosity"};
        require(entries, fluid_section, "density", "865 kg/m^3");
        const Word first = exactly_one(entries, fluid_section, viscosities, "viscosity", "viscosity = 28 mPa.s");
        fluid.density = entries.quantity(fluid_section, "density", Dimension::density).value_or(0.0);
        const auto take = [&](Word key, Dimension dimension) {
            return if_first(key, first, entries.quantity(fluid_section, key, dimension));
        };
        fluid.viscosity = take("viscosity", Dimension::dynamic_viscosity);
        fluid.kinematic_viscosity = take("kinematic_viscosity", Dimension::kinematic_viscosity);
    }
    return fluid;
}

std::optional<VelocityTable> read_table(const Entries& entries)
{
    const Entry* entry = entries.find(inlet_section, "table");
    if (entry == nullptr || entry->value.empty()) {
        return std::nullopt;
    }
    const std::filesystem::path folder = std::filesystem::path(entries.faults().file()).parent_path();
    const std::string file = (folder / entry->value).string();
    try {
        auto table = read_velocity_table(read_bytes(file), file, entries.units(), entries.faults());
        if (!table) {
            entries.faults().taint(entry->line);
        }
        return table;
    } catch (const Unreadable& error) {
        entries.faults().add_unreadable(entry->line, Entries::shown(*entry) + ": cannot be read: " + error.what());
        return std::nullopt;
    }
}

void read_profile(const Entries& entries, Inlet& inlet)
{
    constexpr std::array<Word, 3> words{"flat", "developed", "table"};
    const auto profile = entries.word(inlet_section, "profile", words);
    if (profile == "developed") {
        inlet.profile = InletProfile::developed;
    }
    if (profile == "table") {
        inlet.profile = InletProfile::table;
        require(entries, inlet_section, "table", "FILE", ", which profile = table needs");
    }
    const Entry* table = entries.find(inlet_section, "table");
    const bool no_profile = entries.find(inlet_section, "profile") == nullptr;
    if (table != nullptr && (no_profile || (profile && profile != "table"))) {
        entries.faults().add(table->line, "'table' is used only with profile = table");
    }
    inlet.table = read_table(entries);
}

Inlet read_inlet(const Entries& entries)
{
    Inlet inlet;
    if (has_section(entries, inlet_section)) {
        const Entry* shape = entries.find(passage_section, "shape");
        const Word shape_word = shape == nullptr ? Word{} : Word(shape->value);
        const bool per_width = shape_word == "channel";
        read_profile(entries, inlet);
        const Word first = exactly_one(entries, inlet_section, flow_keys(), "flow", "mean_velocity = 0.45 m/s");
        const auto take = [&](Word key, Dimension dimension) {
            return if_first(key, first, entries.quantity(inlet_section, key, dimension));
        };
        inlet.mean_velocity = take("mean_velocity", Dimension::velocity);
        if (!size_keys(shape_word).empty()) { // else it is not known whether they are per metre of width
            inlet.flow_rate = take("flow_rate", per_width ? Dimension::volume_flow_per_width : Dimension::volume_flow);
            inlet.mass_flow_rate =
                take("mass_flow_rate", per_width ? Dimension::mass_flow_per_width : Dimension::mass_flow);
        }
        inlet.reynolds_number = if_first("reynolds_number", first, entries.number(inlet_section, "reynolds_number"));
    }
    return inlet;
}

} // namespace

Passage read_passage(const Entries& entries)
{
    Passage passage;
    if (has_section(entries, passage_section)) {
        passage.shape = read_shape(entries);
        passage.outlet = read_outlet(entries);
    }
    passage.fluid = read_fluid(entries);
    passage.inlet = read_inlet(entries);
    return passage;
}

} // namespace leat::driver
