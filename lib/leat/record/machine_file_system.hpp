#pragma once

#include <leat/record/file_system.hpp>

namespace leat::record {

/// The file operations of this machine. Has no state.
class MachineFileSystem final : public FileSystem {
public:
    Reply kind(const std::string& path) override;
    Reply create_new(const std::string& path) override;
    Reply open_to_read(const std::string& path) override;
    Reply open_folder(const std::string& path) override;
    Reply size(int descriptor) override;
    Reply read(int descriptor, std::byte* to, std::size_t size) override;
    Reply write(int descriptor, const std::byte* from, std::size_t size) override;
    Reply sync(int descriptor) override;
    Reply close(int descriptor) override;
    Reply rename(const std::string& from, const std::string& to) override;
    Reply rename_to_new(const std::string& from, const std::string& to) override;
    Reply link(const std::string& from, const std::string& to) override;
    Reply remove(const std::string& path) override;
    Reply make_folder(const std::string& path) override;
    Reply remove_folder(const std::string& path) override;
};

} // namespace leat::record
