#pragma once

#include <leat/record/hdf5_session.hpp>

#include <span>
#include <string>
#include <string_view>
#include <vector>

namespace leat::record {

/// Lengths of an array, slowest first; empty: a single value.
using Extents = std::vector<hsize_t>;

/// What the layout of a result file is made of. All throw Hdf5Failure. Numbers are stored as little-endian IEEE 754
/// doubles and 32-bit integers, texts as UTF-8 of fixed length, nothing with a time stamp, groups with their members
/// in the order of writing.
Hdf5Handle create_group(const Hdf5Handle& parent, const std::string& name);
Hdf5Handle write_array(const Hdf5Handle& parent, const std::string& name, const Extents& extents,
                       std::span<const double> values);
Hdf5Handle write_array(const Hdf5Handle& parent, const std::string& name, const Extents& extents,
                       std::span<const int> values);
void write_attribute(const Hdf5Handle& owner, const std::string& name, std::string_view text);
void write_attribute(const Hdf5Handle& owner, const std::string& name, double number);
void write_attribute(const Hdf5Handle& owner, const std::string& name, int number);

/// The attributes `units` and `long_name`.
void describe(const Hdf5Handle& array, std::string_view units, std::string_view long_name);

} // namespace leat::record
