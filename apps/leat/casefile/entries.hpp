#pragma once

#include "casefile/case_text.hpp"
#include "units/unit_system.hpp"

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace leat::driver {

/// The known entries of a case, each once, and their values by kind. Everything wrong is noted in the faults with its
/// line; a value that cannot be had is then empty.
class Entries {
public:
    /// Notes unknown and repeated sections and keys.
    Entries(const CaseText& text, const UnitSystem& units, FileFaults& faults);

    const Entry* find(std::string_view section, std::string_view key) const;
    /// 0 when the section is missing.
    int line_of_section(std::string_view section) const;

    /// One of `words`.
    std::optional<std::string_view> word(std::string_view section, std::string_view key,
                                         std::span<const std::string_view> words) const;
    /// A number with its unit, in SI.
    std::optional<double> quantity(std::string_view section, std::string_view key, Dimension dimension) const;
    /// A dimensionless number that is written without unit.
    std::optional<double> number(std::string_view section, std::string_view key) const;
    /// A whole number that fits an int.
    std::optional<int> whole_number(std::string_view section, std::string_view key) const;

    /// "[section] key = value", for messages.
    static std::string shown(const Entry& entry);
    const UnitSystem& units() const { return units_; }
    FileFaults& faults() const { return faults_; }

private:
    void check_section(const CaseText::Section& section);
    void take(const Entry& entry);

    const UnitSystem& units_;
    FileFaults& faults_;
    std::vector<CaseText::Section> sections_;
    std::vector<Entry> entries_;
};

} // namespace leat::driver
