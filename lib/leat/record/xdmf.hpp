#pragma once

#include <array>
#include <string>

namespace leat::record {

/// The XDMF description of the fields in `hdf5_file`, a bare file name, on cells[0] x cells[1] cells (along, across).
std::string xdmf_text(const std::string& hdf5_file, std::array<int, 2> cells);

} // namespace leat::record
