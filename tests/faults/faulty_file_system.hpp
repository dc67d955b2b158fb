#pragma once

#include <leat/record/machine_file_system.hpp>

#include <functional>
#include <set>
#include <string>

namespace leat::test {

/// This machine's files, of which chosen calls fail. Calls are counted from 0 over all operations.
class FaultyFileSystem final : public record::FileSystem {
public:
    int failing_call = -1;                   ///< the one that fails; -1: none
    int error = 0;                           ///< what it fails with
    bool and_all_allocating_after = false;   ///< every later call that needs space fails too, as on a full disk
    std::size_t largest_transfer = SIZE_MAX; ///< bytes that one read or write moves
    bool interrupts_each = false;            ///< every call is interrupted once before it works
    std::set<std::string> never;             ///< operations that the file system does not know
    int error_of_never = 0;                  ///< what they fail with
    std::function<void(const std::string& operation, const std::string& path)> before; ///< what others do meanwhile

    int calls() const { return calls_; }
    std::string failed_operation() const { return failed_; } ///< the one that `failing_call` hit

    Reply kind(const std::string& path) override
    {
        return call("kind", path, false, [&] { return machine_.kind(path); });
    }
    Reply create_new(const std::string& path) override
    {
        return call("create_new", path, true, [&] { return machine_.create_new(path); });
    }
    Reply open_to_read(const std::string& path) override
    {
        return call("open_to_read", path, false, [&] { return machine_.open_to_read(path); });
    }
    Reply open_folder(const std::string& path) override
    {
        return call("open_folder", path, false, [&] { return machine_.open_folder(path); });
    }
    Reply size(int descriptor) override
    {
        return call("size", "", false, [&] { return machine_.size(descriptor); });
    }
    Reply read(int descriptor, std::byte* to, std::size_t bytes) override
    {
        return call("read", "", false,
                    [&] { return machine_.read(descriptor, to, std::min(bytes, largest_transfer)); });
    }
    Reply write(int descriptor, const std::byte* from, std::size_t bytes) override
    {
        return call("write", "", true,
                    [&] { return machine_.write(descriptor, from, std::min(bytes, largest_transfer)); });
    }
    Reply sync(int) override
    {
        // Without the wait for the disk, which would make thousands of runs slow and is not what they look at.
        return call("sync", "", true, [] { return Reply{}; });
    }
    Reply close(int descriptor) override
    {
        // A failing close closes all the same.
        const Reply done = machine_.close(descriptor);
        return call("close", "", false, [&] { return done; });
    }
    Reply rename(const std::string& from, const std::string& to) override
    {
        return call("rename", to, false, [&] { return machine_.rename(from, to); });
    }
    Reply rename_to_new(const std::string& from, const std::string& to) override
    {
        return call("rename_to_new", to, false, [&] { return machine_.rename_to_new(from, to); });
    }
    Reply link(const std::string& from, const std::string& to) override
    {
        return call("link", to, true, [&] { return machine_.link(from, to); });
    }
    Reply remove(const std::string& path) override
    {
        return call("remove", path, false, [&] { return machine_.remove(path); });
    }
    Reply make_folder(const std::string& path) override
    {
        return call("make_folder", path, true, [&] { return machine_.make_folder(path); });
    }
    Reply remove_folder(const std::string& path) override
    {
        return call("remove_folder", path, false, [&] { return machine_.remove_folder(path); });
    }

private:
    Reply call(const std::string& operation, const std::string& path, bool allocates,
               const std::function<Reply()>& work)
    {
        if (before) {
            before(operation, path);
        }
        const int number = calls_++;
        if (interrupts_each && (interrupted_ = !interrupted_)) {
            return {0, EINTR};
        }
        if (never.contains(operation)) {
            return {0, error_of_never};
        }
        if (number == failing_call) {
            failed_ = operation;
            return {0, error};
        }
        if (failing_call >= 0 && number > failing_call && and_all_allocating_after && allocates) {
            return {0, error};
        }
        return work();
    }

    record::MachineFileSystem machine_;
    int calls_ = 0;
    bool interrupted_ = false;
    std::string failed_;
};

} // namespace leat::test
