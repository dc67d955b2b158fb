#pragma once

#include <leat/base/error.hpp>
#include <leat/record/file_system.hpp>

#include <cerrno>
#include <cstddef>
#include <span>
#include <string>

namespace leat::record {

/// One file operation, done again while a signal interrupts it.
template <class Operation>
FileSystem::Reply uninterrupted(Operation&& operation);

/// The value of a reply; throws FileError "PATH: cannot `what`: REASON OF THE SYSTEM" when it is an error.
long long value_of(const FileSystem::Reply& reply, FileError::Action action, const std::string& path,
                   const std::string& what);

/// An open file or folder; closed at the end, at the latest.
class OpenFile {
public:
    OpenFile(FileSystem& file_system, long long descriptor, std::string path);
    OpenFile(const OpenFile&) = delete;
    OpenFile& operator=(const OpenFile&) = delete;
    ~OpenFile();

    /// All bytes, in as many pieces as the system likes. Throws FileError(write).
    void write_all(std::span<const std::byte> bytes);
    /// Exactly as many bytes as `to` has. Throws FileError(read), also when the file ends before.
    void read_all(std::span<std::byte> to);
    /// Bytes of the file. Throws FileError(read) for anything but a regular file.
    std::size_t size();
    /// Onto the disk. Throws FileError(write).
    void sync();
    /// Throws FileError(write), for some systems report a full disk only here.
    void close();

private:
    FileSystem& file_system_;
    int descriptor_;
    std::string path_;
};

/// Brings the names in a folder onto the disk. Throws FileError(write).
/// A file system that knows no such thing is taken as it is.
void sync_folder(FileSystem& file_system, const std::string& folder);

template <class Operation>
FileSystem::Reply uninterrupted(Operation&& operation)
{
    for (;;) {
        const FileSystem::Reply reply = operation();
        if (reply.error != EINTR) {
            return reply;
        }
    }
}

} // namespace leat::record
