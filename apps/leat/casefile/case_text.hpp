#pragma once

#include "casefile/file_faults.hpp"

#include <string>
#include <string_view>
#include <vector>

namespace leat::driver {

/// One line `key = value` of a case.
struct Entry {
    std::string section;
    std::string key;
    std::string value; ///< without comment and blanks at its ends; empty only with a fault noted
    int line = 0;      ///< from 1
};

/// A case, split but not yet understood.
struct CaseText {
    struct Section {
        std::string name;
        int line = 0;
    };
    std::vector<Section> sections;
    std::vector<Entry> entries;
};

/// Splits a text of sections `[name]`, entries `key = value` and comments `# ...`. Lines that are none of these, and
/// entries before the first section, are noted as faults.
CaseText split_case_text(std::string_view text, FileFaults& faults);

} // namespace leat::driver
