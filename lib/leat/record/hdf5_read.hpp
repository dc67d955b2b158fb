#pragma once

#include <leat/record/hdf5_write.hpp>

#include <string>
#include <vector>

namespace leat::record {

/// The counterparts of hdf5_write.hpp. All throw Hdf5Failure, also when something has another type or shape.
Hdf5Handle open_group(const Hdf5Handle& parent, const std::string& name);
Hdf5Handle open_array(const Hdf5Handle& parent, const std::string& name);
std::vector<std::string> names_in(const Hdf5Handle& group); ///< in the order of writing
Extents extents_of(const Hdf5Handle& array, const std::string& name);
std::vector<double> read_array(const Hdf5Handle& array, const std::string& name, const Extents& extents);
std::string read_text(const Hdf5Handle& owner, const std::string& name);
double read_number(const Hdf5Handle& owner, const std::string& name);
int read_integer(const Hdf5Handle& owner, const std::string& name);

} // namespace leat::record
