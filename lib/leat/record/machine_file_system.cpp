#include <leat/record/machine_file_system.hpp>

#include <algorithm>
#include <cerrno>
#include <cstdio>

#include <fcntl.h>
#include <sys/stat.h>
#include <unistd.h>

namespace leat::record {

namespace {

// Some systems refuse, others shorten, transfers of 2 GiB and more.
constexpr std::size_t largest_transfer = std::size_t{1} << 30;

FileSystem::Reply reply(long long value)
{
    return value < 0 ? FileSystem::Reply{0, errno} : FileSystem::Reply{value, 0};
}

} // namespace

FileSystem::Reply MachineFileSystem::kind(const std::string& path)
{
    struct stat status {};
    if (::lstat(path.c_str(), &status) != 0) {
        return errno == ENOENT ? Reply{absent, 0} : Reply{0, errno};
    }
    if (S_ISLNK(status.st_mode) && ::stat(path.c_str(), &status) != 0) {
        return {file, 0};
    }
    return {S_ISDIR(status.st_mode) ? folder : file, 0};
}

FileSystem::Reply MachineFileSystem::create_new(const std::string& path)
{
    return reply(::open(path.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_CLOEXEC, 0666));
}

FileSystem::Reply MachineFileSystem::open_to_read(const std::string& path)
{
    // Without O_NONBLOCK the opening of a pipe waits for ever.
    return reply(::open(path.c_str(), O_RDONLY | O_NONBLOCK | O_CLOEXEC));
}

FileSystem::Reply MachineFileSystem::open_folder(const std::string& path)
{
    return reply(::open(path.c_str(), O_RDONLY | O_DIRECTORY | O_CLOEXEC));
}

FileSystem::Reply MachineFileSystem::size(int descriptor)
{
    struct stat status {};
    if (::fstat(descriptor, &status) != 0) {
        return {0, errno};
    }
    if (S_ISDIR(status.st_mode)) {
        return {0, EISDIR};
    }
    return S_ISREG(status.st_mode) ? Reply{status.st_size, 0} : Reply{0, EINVAL};
}

FileSystem::Reply MachineFileSystem::read(int descriptor, std::byte* to, std::size_t size)
{
    return reply(::read(descriptor, to, std::min(size, largest_transfer)));
}

FileSystem::Reply MachineFileSystem::write(int descriptor, const std::byte* from, std::size_t size)
{
    return reply(::write(descriptor, from, std::min(size, largest_transfer)));
}

FileSystem::Reply MachineFileSystem::sync(int descriptor)
{
    return reply(::fsync(descriptor));
}

FileSystem::Reply MachineFileSystem::close(int descriptor)
{
    return reply(::close(descriptor));
}

FileSystem::Reply MachineFileSystem::rename(const std::string& from, const std::string& to)
{
    return reply(std::rename(from.c_str(), to.c_str()));
}

FileSystem::Reply MachineFileSystem::rename_to_new(const std::string& from, const std::string& to)
{
#ifdef RENAME_NOREPLACE
    return reply(::renameat2(AT_FDCWD, from.c_str(), AT_FDCWD, to.c_str(), RENAME_NOREPLACE));
#else
    static_cast<void>(from);
    static_cast<void>(to);
    return {0, ENOSYS};
#endif
}

FileSystem::Reply MachineFileSystem::link(const std::string& from, const std::string& to)
{
    return reply(::linkat(AT_FDCWD, from.c_str(), AT_FDCWD, to.c_str(), 0));
}

FileSystem::Reply MachineFileSystem::remove(const std::string& path)
{
    return reply(::unlink(path.c_str()));
}

FileSystem::Reply MachineFileSystem::make_folder(const std::string& path)
{
    return reply(::mkdir(path.c_str(), 0777));
}

FileSystem::Reply MachineFileSystem::remove_folder(const std::string& path)
{
    return reply(::rmdir(path.c_str()));
}

} // namespace leat::record
