#pragma once

#include <leat/record/file_system.hpp>

#include <cstddef>
#include <span>
#include <string>
#include <vector>

namespace leat::record {

/// A file that is to appear in a folder.
struct NewFile {
    std::string name;
    std::span<const std::byte> bytes;
};

/// Makes files appear in `directory`, in their order, each complete and on the disk before it has its name.
/// Makes the folder when it is missing. When anything fails, all is as it was before, earlier files of these names
/// included, and FileError is thrown as write_result() says; two exceptions have their own message: the new files
/// stand but a second name of an earlier file could not be removed, and an earlier file could not get its name back.
/// Where files cannot have two names, a failure after the first name change leaves the files before it new.
void publish(FileSystem& file_system, const std::string& directory, const std::vector<NewFile>& files, bool overwrite);

} // namespace leat::record
