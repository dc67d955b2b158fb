#pragma once

#include "casefile/case_file.hpp"

#include <leat/passage/solve.hpp>

#include <string>

namespace leat::driver {

/// For people: the passage in SI, Reynolds number and regime, handbook estimate, planned grids, memory.
std::string check_text(const CaseFile& of, const Plan& plan, bool decorated);

/// The same for programs: one JSON document.
std::string check_document(const CaseFile& of, const Plan& plan);

} // namespace leat::driver
