#pragma once

#include <span>
#include <string_view>

namespace leat::driver {

/// The sections of a case.
std::span<const std::string_view> known_sections();
/// The keys of a section; empty when there is no such section.
std::span<const std::string_view> known_keys(std::string_view section);
/// The shapes, as written behind `shape =`.
std::span<const std::string_view> known_shapes();
/// The keys that say how large a shape is, its length included; empty when there is no such shape.
std::span<const std::string_view> size_keys(std::string_view shape);
/// The keys that state the flow; a case has exactly one.
std::span<const std::string_view> flow_keys();

} // namespace leat::driver
