#include <leat/record/file_access.hpp>

#include <system_error>
#include <utility>

namespace leat::record {

long long value_of(const FileSystem::Reply& reply, FileError::Action action, const std::string& path,
                   const std::string& what)
{
    if (reply.error != 0) {
        throw FileError(action, path, "cannot " + what + ": " + std::generic_category().message(reply.error));
    }
    return reply.value;
}

OpenFile::OpenFile(FileSystem& file_system, long long descriptor, std::string path)
    : file_system_(file_system), descriptor_(static_cast<int>(descriptor)), path_(std::move(path))
{
}

OpenFile::~OpenFile()
{
    if (descriptor_ >= 0) {
        file_system_.close(descriptor_);
    }
}

void OpenFile::write_all(std::span<const std::byte> bytes)
{
    while (!bytes.empty()) {
        FileSystem::Reply reply =
            uninterrupted([&] { return file_system_.write(descriptor_, bytes.data(), bytes.size()); });
        if (reply.error == 0 && reply.value == 0) {
            reply.error = EIO; // no progress and no reason: asking again could go on for ever
        }
        const long long written = value_of(reply, FileError::Action::write, path_, "write");
        bytes = bytes.subspan(static_cast<std::size_t>(written));
    }
}

void OpenFile::read_all(std::span<std::byte> to)
{
    while (!to.empty()) {
        const FileSystem::Reply reply =
            uninterrupted([&] { return file_system_.read(descriptor_, to.data(), to.size()); });
        const long long got = value_of(reply, FileError::Action::read, path_, "read");
        if (got == 0) {
            throw FileError(FileError::Action::read, path_, "ends before its stated length");
        }
        to = to.subspan(static_cast<std::size_t>(got));
    }
}

std::size_t OpenFile::size()
{
    const FileSystem::Reply reply = uninterrupted([&] { return file_system_.size(descriptor_); });
    return static_cast<std::size_t>(value_of(reply, FileError::Action::read, path_, "read"));
}

void OpenFile::sync()
{
    value_of(uninterrupted([&] { return file_system_.sync(descriptor_); }), FileError::Action::write, path_,
             "bring it to the disk");
}

void OpenFile::close()
{
    // Not tried again when interrupted: the descriptor is gone all the same, and may be somebody else's by then.
    const FileSystem::Reply reply = file_system_.close(std::exchange(descriptor_, -1));
    if (reply.error != EINTR) {
        value_of(reply, FileError::Action::write, path_, "close");
    }
}

void sync_folder(FileSystem& file_system, const std::string& folder)
{
    const long long descriptor = value_of(uninterrupted([&] { return file_system.open_folder(folder); }),
                                          FileError::Action::write, folder, "open the folder");
    const OpenFile open(file_system, descriptor, folder);
    const FileSystem::Reply reply = uninterrupted([&] { return file_system.sync(static_cast<int>(descriptor)); });
    if (reply.error != EINVAL && reply.error != ENOTSUP) {
        value_of(reply, FileError::Action::write, folder, "bring the folder to the disk");
    }
}

} // namespace leat::record
