#pragma once

#include <leat/base/error.hpp>
#include <leat/passage/answer.hpp>

#include <string>

namespace leat::record {

class FileSystem;

/// Where a result was written.
struct ResultFiles {
    std::string hdf5; ///< the numbers and fields
    std::string xdmf; ///< how a viewer finds the fields in it
};

/// Writes an answer as DIRECTORY/NAME.h5 with NAME.xdmf beside it. README, "The result file", lists the contents.
///
/// Makes the folder when it is missing ("" is the current one). Both files appear complete or not at all: they are
/// written under other names, brought to the disk and then renamed, the .xdmf last. After any failure earlier files of
/// these names are as they were, and nothing else is left behind. Equal input gives equal bytes.
///
/// `answer.fields` must be set, and all numbers and fields finite, `case_text` without NUL: InvalidInput otherwise,
/// with every fault. Without `overwrite` an existing file is never touched, not even one that appears meanwhile. A link
/// in the place of a file is replaced, not followed. Throws FileError: refuse_overwrite when a file exists and
/// `overwrite` is false; create when NAME is no file name or the place does not accept new files; write when the disk
/// is full or fails. May be called from several threads at once; a host that itself uses an HDF5 library without thread
/// safety guards its calls by hdf5_mutex() (record/hdf5_mutex.hpp).
ResultFiles write_result(const std::string& directory, const std::string& name, const std::string& case_text,
                         const Answer& answer, bool overwrite);

/// The same through other file operations than this machine's.
ResultFiles write_result(FileSystem& file_system, const std::string& directory, const std::string& name,
                         const std::string& case_text, const Answer& answer, bool overwrite);

/// Throws the FileError (create or refuse_overwrite) that write_result() would meet at its start. Leaves nothing
/// behind: a folder that is missing is not made, its nearest existing parent is tried with an empty file, at once
/// removed.
void check_writable(const std::string& directory, const std::string& name, bool overwrite);

/// The same through other file operations than this machine's.
void check_writable(FileSystem& file_system, const std::string& directory, const std::string& name, bool overwrite);

} // namespace leat::record
