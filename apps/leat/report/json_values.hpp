#pragma once

#include <leat/passage/answer.hpp>
#include <leat/passage/passage.hpp>

#include <nlohmann/json.hpp>

#include <optional>
#include <string>

namespace leat::driver {

using Json = nlohmann::ordered_json;

/// The number, or null when there is none or it is not finite: JSON has neither NaN nor infinity.
Json finite_or_null(std::optional<double> value);

/// {"pressure_drop", "unit", "source", "remark"} of the handbook.
Json json_of(const HandbookEstimate& handbook);

/// The text of a document: indented, ending with a line break; bytes that are not UTF-8 (from file names) replaced.
std::string document_text(const Json& document);

} // namespace leat::driver
