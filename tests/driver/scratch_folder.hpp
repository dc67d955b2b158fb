#pragma once

#include <filesystem>
#include <fstream>
#include <string>

/// A folder of its own for one test, removed with what it holds.
class ScratchFolder {
public:
    ScratchFolder()
    {
        std::string pattern = (std::filesystem::temp_directory_path() / "leat-driver-XXXXXX").string();
        path_ = ::mkdtemp(pattern.data());
    }
    ~ScratchFolder() { std::filesystem::remove_all(path_); }
    ScratchFolder(const ScratchFolder&) = delete;
    ScratchFolder& operator=(const ScratchFolder&) = delete;

    std::string path(const std::string& name) const { return (path_ / name).string(); }
    /// Writes a file and gives its path.
    std::string file(const std::string& name, const std::string& bytes) const
    {
        std::ofstream(path_ / name, std::ios::binary) << bytes;
        return path(name);
    }

private:
    std::filesystem::path path_;
};
