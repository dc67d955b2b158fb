#include <leat/base/error.hpp>
#include <leat/record/file_access.hpp>
#include <leat/record/place.hpp>

#include <algorithm>
#include <atomic>

#include <unistd.h>

namespace leat::record {

namespace {

using Action = FileError::Action;

FileSystem::Kind kind_of(FileSystem& file_system, const std::string& path)
{
    const FileSystem::Reply reply = uninterrupted([&] { return file_system.kind(path); });
    return static_cast<FileSystem::Kind>(value_of(reply, Action::create, path, "create"));
}

} // namespace

void require_file_name(const std::string& directory, const std::string& name)
{
    if (directory.find('\0') != std::string::npos) {
        throw FileError(Action::create, directory, "cannot be the name of a folder");
    }
    const auto misfit = [](char letter) {
        const auto code = static_cast<unsigned char>(letter);
        return letter == '/' || letter == ':' || code < 0x20 || code == 0x7f;
    };
    if (name.empty() || name.front() == ' ' || name.back() == ' ' || std::any_of(name.begin(), name.end(), misfit)) {
        throw FileError(Action::create, directory,
                        "a result cannot be named '" + name +
                            "': it needs a name without '/', ':', control characters, and blanks at its ends");
    }
}

bool require_free(FileSystem& file_system, const std::string& path, bool overwrite)
{
    const FileSystem::Kind kind = kind_of(file_system, path);
    if (kind == FileSystem::folder) {
        throw FileError(Action::create, path, "cannot create: a folder of this name exists");
    }
    if (kind == FileSystem::file && !overwrite) {
        throw FileError(Action::refuse_overwrite, path, "exists and is not overwritten");
    }
    return kind == FileSystem::file;
}

std::string parent_of(const std::string& path)
{
    const std::size_t last = path.find_last_not_of('/');
    const std::size_t slash = last == std::string::npos ? last : path.find_last_of('/', last);
    if (slash == std::string::npos) {
        return last == std::string::npos && !path.empty() ? "/" : ".";
    }
    const std::size_t end = path.find_last_not_of('/', slash);
    return end == std::string::npos ? "/" : path.substr(0, end + 1);
}

std::vector<std::string> missing_folders(FileSystem& file_system, const std::string& directory)
{
    std::vector<std::string> missing;
    for (std::string path = directory;; path = parent_of(path)) {
        const FileSystem::Kind kind = kind_of(file_system, path);
        if (kind == FileSystem::file) {
            throw FileError(Action::create, path, "cannot create anything in it: it is not a folder");
        }
        if (kind == FileSystem::folder) {
            break;
        }
        missing.push_back(path);
        if (path == parent_of(path)) {
            throw FileError(Action::create, path, "does not exist");
        }
    }
    std::reverse(missing.begin(), missing.end());
    return missing;
}

std::string temporary_name(const std::string& folder)
{
    static std::atomic<unsigned long long> count{0};
    return folder + "/.leat-" + std::to_string(::getpid()) + "-" + std::to_string(count++) + ".tmp";
}

TemporaryFile create_temporary(FileSystem& file_system, const std::string& folder)
{
    // A name can be taken by what a killed process of the same number left.
    constexpr int most_tries = 1000;
    for (int tries = 1;; ++tries) {
        const std::string path = temporary_name(folder);
        const FileSystem::Reply reply = uninterrupted([&] { return file_system.create_new(path); });
        if (reply.error != EEXIST || tries == most_tries) {
            return {path, value_of(reply, Action::create, folder, "create a file in the folder")};
        }
    }
}

} // namespace leat::record
