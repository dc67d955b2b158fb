#pragma once

#include <mutex>

namespace leat::record {

/// Held by this library whenever it uses HDF5, whose usual builds are not thread-safe. A host with HDF5 calls of its
/// own in other threads holds it around them.
std::mutex& hdf5_mutex() noexcept;

} // namespace leat::record
