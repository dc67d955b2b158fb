#pragma once

#include <leat/record/file_system.hpp>

#include <string>
#include <vector>

namespace leat::record {

/// Throws FileError(create) unless `name` with an extension can be a file name that an XDMF reference can hold: not
/// empty, no leading or trailing blank, no '/', ':' or control character. Nor may `directory` hold a NUL.
void require_file_name(const std::string& directory, const std::string& name);

/// Throws FileError: refuse_overwrite when `path` exists and `overwrite` is false, create when it is a folder.
/// Otherwise says whether it exists.
bool require_free(FileSystem& file_system, const std::string& path, bool overwrite);

/// `directory` and its parents that do not exist, outermost first. Throws FileError(create) when something in the way
/// is no folder.
std::vector<std::string> missing_folders(FileSystem& file_system, const std::string& directory);

/// The folder that holds `path`; "." for a bare name.
std::string parent_of(const std::string& path);

/// A new empty file in a folder, hidden, of a name that is nobody else's.
struct TemporaryFile {
    std::string path;
    long long descriptor;
};
/// Throws FileError(create).
TemporaryFile create_temporary(FileSystem& file_system, const std::string& folder);

/// A name for create_temporary() and for second names of files; no two calls in one process give the same.
std::string temporary_name(const std::string& folder);

} // namespace leat::record
