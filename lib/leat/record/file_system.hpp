#pragma once

#include <cstddef>
#include <string>

namespace leat::record {

/// The file operations that the record room needs, as an interface so that every one of them can be made to fail.
/// Each is one POSIX call; none retries.
class FileSystem {
public:
    /// What came back: `error` is an errno value, 0 for success; `value` is meant only then.
    struct Reply {
        long long value = 0;
        int error = 0;
    };
    /// What a path names; `kind()` gives it as its value. A link counts as what it leads to, a broken one as a file.
    enum Kind : long long { absent, file, folder };

    FileSystem() = default;
    FileSystem(const FileSystem&) = delete;
    FileSystem& operator=(const FileSystem&) = delete;
    virtual ~FileSystem() = default;

    virtual Reply kind(const std::string& path) = 0;
    virtual Reply create_new(const std::string& path) = 0;   ///< descriptor for writing; EEXIST if the name is taken
    virtual Reply open_to_read(const std::string& path) = 0; ///< descriptor of a regular file
    virtual Reply open_folder(const std::string& path) = 0;  ///< descriptor for sync()
    virtual Reply size(int descriptor) = 0;                  ///< bytes of a regular file
    virtual Reply read(int descriptor, std::byte* to, std::size_t size) = 0;          ///< bytes read, may be fewer
    virtual Reply write(int descriptor, const std::byte* from, std::size_t size) = 0; ///< bytes written, may be fewer
    virtual Reply sync(int descriptor) = 0;
    virtual Reply close(int descriptor) = 0;
    virtual Reply rename(const std::string& from, const std::string& to) = 0;        ///< replaces what is at `to`
    virtual Reply rename_to_new(const std::string& from, const std::string& to) = 0; ///< EEXIST if `to` is taken;
                                                                                     ///< ENOSYS where not offered
    virtual Reply link(const std::string& from, const std::string& to) = 0; ///< second name of a file; EEXIST if taken
    virtual Reply remove(const std::string& path) = 0;                      ///< one file name
    virtual Reply make_folder(const std::string& path) = 0;
    virtual Reply remove_folder(const std::string& path) = 0; ///< an empty one
};

} // namespace leat::record
