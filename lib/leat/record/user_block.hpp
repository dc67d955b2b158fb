#pragma once

#include <cstddef>
#include <span>
#include <string>

namespace leat::record {

/// Version of the layout of a result file; part of the contract with its readers.
inline constexpr int format_version = 1;

/// Bytes in front of the HDF5 part of a result file; readers of HDF5 step over them.
inline constexpr std::size_t user_block_size = 512;

/// Fills the first 512 bytes of a whole file: the lines "leat-result VERSION", "length BYTES" (of the whole file) and
/// "sha256 DIGITS" (of what follows the block), then zeros. The file must be at least that long.
void seal(std::span<std::byte> file);

/// What the block alone tells is wrong with a file of so many bytes, for a message "PATH: ..."; empty: nothing.
std::string fault_of_block(std::span<const std::byte> block, std::size_t file_size);

/// What is wrong with the bytes of a whole file; empty: they are those that were sealed.
std::string fault_of_file(std::span<const std::byte> file);

} // namespace leat::record
