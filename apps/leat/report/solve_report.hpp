#pragma once

#include <leat/passage/answer.hpp>

#include <string>
#include <vector>

namespace leat::driver {

/// What `leat solve` tells about.
struct SolveReport {
    std::string name; ///< of the case
    Answer answer;
    double seconds = 0;             ///< wall time of the solve
    std::vector<std::string> files; ///< that were written
};

/// For people: cautions, numbers with units, imbalances, time. `decorated`: with colour.
std::string solve_text(const SolveReport& report, bool decorated);

/// For programs: one JSON document, every number in it finite. README, "The document of --json", lists its keys.
std::string solve_document(const SolveReport& report);

} // namespace leat::driver
