#include "catch.hpp"
#include "record/contains.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/record/result.hpp>

#include <csignal>

#include <sys/resource.h>
#include <unistd.h>

#if defined(__linux__)
#include <sys/mount.h>
#endif

using namespace leat;
using test::sample_answer;
using test::ScratchFolder;

namespace {

// A result too large for the place, over a small one.
void check_large_over_small(const std::string& folder, const std::string& reason)
{
    record::write_result(folder, "line", "earlier", sample_answer(3, 3), false);
    const auto before = test::tree(folder);
    for (int round = 0; round < 3; ++round) {
        try {
            record::write_result(folder, "line", "case", sample_answer(200, 100), true);
            FAIL("not refused");
        } catch (const FileError& failure) {
            CHECK(failure.action() == FileError::Action::write);
            CHECK(failure.path() == folder + "/line.h5");
            CHECK(test::contains(failure.what(), reason));
        }
        CHECK(test::tree(folder) == before);
    }
}

} // namespace

#if defined(__linux__)
TEST_CASE("a full disk: a clear error, the earlier files intact")
{
    const ScratchFolder scratch;
    if (::mount("leat-test", scratch.path().c_str(), "tmpfs", 0, "size=256k") != 0) {
        WARN("skipped: no small disk can be mounted here (needs root)");
        return;
    }
    check_large_over_small(scratch.path(), "No space left on device");
    CHECK(::umount(scratch.path().c_str()) == 0);
}

TEST_CASE("a read-only disk: refused before anything is computed")
{
    const ScratchFolder scratch;
    if (::mount("leat-test", scratch.path().c_str(), "tmpfs", MS_RDONLY, "size=64k") != 0) {
        WARN("skipped: no read-only disk can be mounted here (needs root)");
        return;
    }
    for (const std::string& folder : {scratch.path(), scratch / "new"}) {
        try {
            record::check_writable(folder, "line", false);
            FAIL("not refused");
        } catch (const FileError& failure) {
            CHECK(failure.action() == FileError::Action::create);
            CHECK(test::contains(failure.what(), "Read-only file system"));
        }
    }
    CHECK(::umount(scratch.path().c_str()) == 0);
}
#endif

TEST_CASE("the largest size of a file is reached: a clear error, the earlier files intact")
{
    const ScratchFolder scratch;
    rlimit earlier{};
    REQUIRE(::getrlimit(RLIMIT_FSIZE, &earlier) == 0);
    const auto earlier_action = std::signal(SIGXFSZ, SIG_IGN);
    rlimit small = earlier;
    small.rlim_cur = 100'000;
    REQUIRE(::setrlimit(RLIMIT_FSIZE, &small) == 0);
    check_large_over_small(scratch.path(), "File too large");
    REQUIRE(::setrlimit(RLIMIT_FSIZE, &earlier) == 0);
    std::signal(SIGXFSZ, earlier_action);
}

TEST_CASE("a folder without permission is refused")
{
    if (::geteuid() == 0) {
        WARN("skipped: nothing is forbidden to root");
        return;
    }
    const ScratchFolder scratch;
    std::filesystem::create_directory(scratch / "closed");
    std::filesystem::permissions(scratch / "closed", std::filesystem::perms::owner_read);
    for (const std::string& folder : {scratch / "closed", scratch / "closed/new"}) {
        try {
            record::check_writable(folder, "line", false);
            FAIL("not refused");
        } catch (const FileError& failure) {
            CHECK(failure.action() == FileError::Action::create);
            CHECK(test::contains(failure.what(), "Permission denied"));
        }
    }
    std::filesystem::permissions(scratch / "closed", std::filesystem::perms::owner_all);
}
