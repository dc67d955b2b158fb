#include "catch.hpp"
#include "faults/faulty_file_system.hpp"
#include "record/contains.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/record/publish.hpp>
#include <leat/record/read.hpp>
#include <leat/record/result.hpp>

#include <cerrno>
#include <filesystem>
#include <functional>
#include <map>
#include <span>
#include <string>
#include <vector>

using namespace leat;
using test::contains;
using test::FaultyFileSystem;
using test::sample_answer;
using test::ScratchFolder;

namespace {

using Tree = std::map<std::string, std::string>;
using Write = std::function<void(FaultyFileSystem&, const std::string& folder, bool overwrite)>;

void write_line(FaultyFileSystem& files, const std::string& folder, const Answer& answer, bool overwrite)
{
    record::write_result(files, folder, "line", "case", answer, overwrite);
}

// All file operations of write_line(), without the work of making the contents, for they run thousands of times.
void publish_line(FaultyFileSystem& files, const std::string& folder, bool overwrite)
{
    const std::string image(30'000, 'i');
    const std::string description(800, 'd');
    record::publish(files, folder,
                    {{"line.h5", std::as_bytes(std::span<const char>(image))},
                     {"line.xdmf", std::as_bytes(std::span<const char>(description))}},
                    overwrite);
}

// A file system that lacks some operations, and what was there before.
struct Setting {
    std::string name;
    std::set<std::string> never;
    int error_of_never;
    bool earlier_result; // to be overwritten
    bool pair_is_safe;   // a failure between the two name changes can be undone
};

std::vector<Setting> settings()
{
    return {
        {"nothing there", {}, 0, false, true},
        {"earlier result", {}, 0, true, true},
        {"no exclusive rename", {"rename_to_new"}, ENOSYS, false, true},
        {"no exclusive rename on this disk", {"rename_to_new"}, EINVAL, false, true},
        {"no exclusive rename, no second names", {"rename_to_new", "link"}, EPERM, false, true},
        {"earlier result, no second names", {"link"}, EPERM, true, false},
    };
}

const std::string folder_name = "out/deep";

void prepare(const Setting& setting, const ScratchFolder& scratch)
{
    test::put(scratch / "neighbour", "somebody else's");
    if (setting.earlier_result) {
        std::filesystem::create_directories(scratch / folder_name);
        test::put(scratch / folder_name + "/line.h5", "earlier numbers");
        test::put(scratch / folder_name + "/line.xdmf", "earlier description");
    }
}

// What is wrong with the state after one failed or successful write; empty: nothing.
std::string broken_rule(const Setting& setting, const Tree& before, const Tree& complete, const Tree& after, bool threw,
                        const std::string& message)
{
    const bool stands = contains(message, "the new files are complete");
    if (!threw || stands) {
        Tree named = after;
        std::erase_if(named, [&](const auto& entry) { return stands && contains(entry.first, "/.leat-"); });
        return named == complete ? "" : "reported as complete, but is not";
    }
    if (setting.pair_is_safe) {
        return after == before ? "" : "failed, but not all is as it was";
    }
    if (after.size() != before.size()) {
        return "failed, and left something behind";
    }
    for (const auto& [name, text] : after) {
        if (before.at(name) != text && complete.at(name) != text) {
            return "failed, and a file is neither the earlier nor the new one";
        }
    }
    return "";
}

struct Tally {
    int runs = 0;
    int failures = 0;
    std::set<std::string> operations;
    std::vector<std::string> broken;
};

// Lets each call fail once, by each kind of error, in each setting.
Tally fail_every_call(const Write& write_once, bool full_disk_from_there)
{
    Tally tally;
    for (const Setting& setting : settings()) {
        Tree before;
        Tree complete;
        int calls = 0;
        const auto run = [&](int failing_call, int error) {
            const ScratchFolder scratch;
            prepare(setting, scratch);
            before = test::tree(scratch.path());
            FaultyFileSystem files;
            files.failing_call = failing_call;
            files.error = error;
            files.and_all_allocating_after = full_disk_from_there;
            files.never = setting.never;
            files.error_of_never = setting.error_of_never;
            files.largest_transfer = 10'000;
            std::string message;
            bool threw = false;
            try {
                write_once(files, scratch / folder_name, setting.earlier_result);
            } catch (const FileError& failure) {
                threw = true;
                message = failure.what();
            }
            const Tree after = test::tree(scratch.path());
            if (failing_call < 0) {
                calls = files.calls();
                complete = after;
                return;
            }
            ++tally.runs;
            tally.failures += threw ? 1 : 0;
            if (!files.failed_operation().empty()) {
                tally.operations.insert(files.failed_operation());
            }
            const std::string rule = broken_rule(setting, before, complete, after, threw, message);
            if (!rule.empty()) {
                tally.broken.push_back(setting.name + ", call " + std::to_string(failing_call) + " (" +
                                       files.failed_operation() + "), error " + std::to_string(error) + ": " + rule);
            }
        };
        run(-1, 0);
        for (int call = 0; call < calls; ++call) {
            for (const int error : {ENOSPC, EIO}) {
                run(call, error);
            }
        }
    }
    return tally;
}

// What must not pass: the plain way to write a file.
void write_in_place(FaultyFileSystem& files, const std::string& folder, bool)
{
    std::filesystem::create_directories(folder);
    for (const std::string name : {"line.h5", "line.xdmf"}) {
        std::filesystem::remove(folder + "/" + name);
        const auto created = files.create_new(folder + "/" + name);
        const std::vector<std::byte> bytes(6000);
        std::size_t done = 0;
        int error = created.error;
        while (error == 0 && done < bytes.size()) {
            const auto reply = files.write(static_cast<int>(created.value), bytes.data() + done, bytes.size() - done);
            error = reply.error;
            done += static_cast<std::size_t>(reply.value);
        }
        if (created.error == 0) {
            files.close(static_cast<int>(created.value));
        }
        if (error != 0) {
            throw FileError(FileError::Action::write, folder + "/" + name, "cannot write");
        }
    }
}

} // namespace

TEST_CASE("each single operation fails: the earlier files are intact or the new ones complete, no litter")
{
    const bool full_disk_from_there = GENERATE(false, true);
    const Tally tally = fail_every_call(publish_line, full_disk_from_there);
    CHECK(tally.broken == std::vector<std::string>{});
    CHECK(tally.runs > 200);
    CHECK(tally.failures > tally.runs / 2);
    CHECK(tally.operations == std::set<std::string>{"kind", "create_new", "open_folder", "write", "sync", "close",
                                                    "rename", "rename_to_new", "link", "remove", "make_folder"});
}

TEST_CASE("a writer in place breaks that rule, and is caught")
{
    CHECK(fail_every_call(write_in_place, false).broken.size() > 10);
}

TEST_CASE("interrupted calls and short writes do no harm")
{
    for (const Setting& setting : settings()) {
        CAPTURE(setting.name);
        const ScratchFolder scratch;
        prepare(setting, scratch);
        FaultyFileSystem files;
        files.interrupts_each = true;
        files.largest_transfer = 7;
        files.never = setting.never;
        files.error_of_never = setting.error_of_never;
        write_line(files, scratch / folder_name, sample_answer(), setting.earlier_result);
        CHECK(record::read_result(files, scratch / folder_name + "/line.h5").case_text == "case");
        CHECK(test::tree(scratch.path()).size() == 5);
    }
}

TEST_CASE("bytes are on the disk before they have a name, the description last")
{
    const ScratchFolder scratch;
    FaultyFileSystem files;
    std::vector<std::string> done;
    files.before = [&](const std::string& operation, const std::string& path) {
        const bool named = operation == "rename_to_new";
        done.push_back(named ? "name " + std::filesystem::path(path).filename().string() : operation);
    };
    write_line(files, scratch.path(), sample_answer(), false);
    std::erase(done, "kind");
    CHECK(done == std::vector<std::string>{"create_new", "write", "sync", "close",         //
                                           "create_new", "write", "sync", "close",         //
                                           "name line.h5", "open_folder", "sync", "close", //
                                           "name line.xdmf", "open_folder", "sync", "close"});
}

TEST_CASE("a folder that cannot be brought to the disk by itself is taken as it is")
{
    const ScratchFolder scratch;
    FaultyFileSystem files;
    bool folder = false;
    int refused = 0;
    files.before = [&](const std::string& operation, const std::string&) {
        // What some network and user-space file systems answer for a folder.
        if (operation == "open_folder") {
            folder = true;
        } else if (operation == "sync" && folder) {
            files.never = {"sync"};
            files.error_of_never = EINVAL;
            ++refused;
        } else {
            folder = false;
            files.never.clear();
        }
    };
    CHECK_NOTHROW(write_line(files, scratch.path(), sample_answer(), false));
    CHECK(refused == 2);
    CHECK(test::tree(scratch.path()).size() == 2);
}

TEST_CASE("a rival that takes the name at the last moment keeps it")
{
    for (const Setting& setting : settings()) {
        if (setting.earlier_result) {
            continue;
        }
        for (const std::string name : {"line.h5", "line.xdmf"}) {
            CAPTURE(setting.name, name);
            const ScratchFolder scratch;
            FaultyFileSystem files;
            files.never = setting.never;
            files.error_of_never = setting.error_of_never;
            const std::string path = scratch / name;
            files.before = [&](const std::string& operation, const std::string& target) {
                if (operation == "rename_to_new" && target == path) {
                    test::put(path, "the rival's");
                }
            };
            try {
                write_line(files, scratch.path(), sample_answer(), false);
                FAIL("not refused");
            } catch (const FileError& failure) {
                CHECK(failure.action() == FileError::Action::refuse_overwrite);
                CHECK(failure.path() == path);
            }
            CHECK(test::tree(scratch.path()) == Tree{{name, "the rival's"}});
        }
    }
}

TEST_CASE("a file that cannot get its name back is named in the message")
{
    const ScratchFolder scratch;
    record::write_result(scratch.path(), "line", "earlier", sample_answer(3, 3), false);
    const std::string earlier = test::content(scratch / "line.h5");
    FaultyFileSystem files;
    int renames = 0;
    files.error_of_never = EIO;
    files.before = [&](const std::string& operation, const std::string&) {
        // The second rename fails, and so does the third, which would undo the first.
        if (operation == "rename" && ++renames == 2) {
            files.never = {"rename"};
        }
    };
    std::string message;
    try {
        write_line(files, scratch.path(), sample_answer(), true);
    } catch (const FileError& failure) {
        message = failure.what();
    }
    const std::string words = "; the previous file is now ";
    REQUIRE(contains(message, words));
    CHECK(test::content(message.substr(message.find(words) + words.size())) == earlier);
}

TEST_CASE("each single operation of reading fails by a clear message")
{
    const ScratchFolder scratch;
    const std::string path = record::write_result(scratch.path(), "line", "", sample_answer(), false).hdf5;
    FaultyFileSystem counting;
    record::read_result(counting, path);
    REQUIRE(counting.calls() >= 5);
    int refused = 0;
    for (int call = 0; call < counting.calls(); ++call) {
        FaultyFileSystem files;
        files.failing_call = call;
        files.error = EIO;
        try {
            record::read_result(files, path);
            CHECK(files.failed_operation() == "close"); // all was read and verified by then
        } catch (const FileError& failure) {
            ++refused;
            CHECK(failure.action() == FileError::Action::read);
            CHECK(contains(failure.what(), "line.h5: cannot read: "));
        }
    }
    CHECK(refused == counting.calls() - 1);
}
