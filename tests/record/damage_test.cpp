#include "catch.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/record/read.hpp>
#include <leat/record/result.hpp>
#include <leat/record/user_block.hpp>

#include <hdf5.h>

#include <random>
#include <vector>

#include <sys/stat.h>
#include <sys/wait.h>
#include <unistd.h>

using namespace leat;
using namespace leat::record;
using test::content;
using test::put;
using test::sample_answer;
using test::ScratchFolder;

namespace {

// Why a file is refused; empty when it is accepted.
std::string refusal(const std::string& path)
{
    try {
        read_result(path);
        return {};
    } catch (const FileError& failure) {
        CHECK(failure.action() == FileError::Action::read);
        CHECK(failure.path() == path);
        return std::string(failure.what()).substr(path.size() + 2);
    }
}

// In a process of its own, for HDF5 may lose memory over a damaged file, or crash.
bool hdf5_alone_accepts(const std::string& path)
{
    const pid_t child = ::fork();
    if (child == 0) {
        H5Eset_auto2(H5E_DEFAULT, nullptr, nullptr);
        std::vector<double> values(24);
        const hid_t file = H5Fopen(path.c_str(), H5F_ACC_RDONLY, H5P_DEFAULT);
        const hid_t array = file < 0 ? file : H5Dopen2(file, "/cells/pressure", H5P_DEFAULT);
        const bool good =
            array >= 0 && H5Dread(array, H5T_NATIVE_DOUBLE, H5S_ALL, H5S_ALL, H5P_DEFAULT, values.data()) >= 0;
        ::_exit(good ? 0 : 1);
    }
    int status = -1;
    return child > 0 && ::waitpid(child, &status, 0) == child && WIFEXITED(status) && WEXITSTATUS(status) == 0;
}

} // namespace

TEST_CASE("a file with a changed byte is refused, wherever it is")
{
    const ScratchFolder scratch;
    const std::string whole = content(write_result(scratch.path(), "line", "case", sample_answer(), false).hdf5);
    const std::string path = scratch / "mutant.h5";
    put(path, whole);
    REQUIRE(refusal(path).empty());

    std::mt19937 random(20240607);
    int accepted = 0;
    int accepted_without_digest = 0;
    constexpr int mutants = 300;
    for (int k = 0; k < mutants; ++k) {
        std::string mutant = whole;
        // A third of them in the user block, which is small beside the rest.
        const std::size_t at = random() % (k % 3 == 0 ? user_block_size : mutant.size());
        mutant[at] = static_cast<char>(mutant[at] ^ static_cast<char>(1u << (random() % 8)));
        put(path, mutant);
        accepted += refusal(path).empty() ? 1 : 0;
        accepted_without_digest += hdf5_alone_accepts(path) ? 1 : 0;
    }
    CHECK(accepted == 0);
    // The same mutants are no straw men: HDF5 alone takes many of them.
    CHECK(accepted_without_digest > mutants / 4);
}

TEST_CASE("a file that is cut short or longer is refused with its lengths")
{
    const ScratchFolder scratch;
    const std::string whole = content(write_result(scratch.path(), "line", "case", sample_answer(), false).hdf5);
    const std::string path = scratch / "cut.h5";
    for (const std::size_t size :
         {std::size_t{0}, std::size_t{5}, std::size_t{12}, std::size_t{13}, std::size_t{30}, std::size_t{511},
          std::size_t{512}, std::size_t{513}, whole.size() / 2, whole.size() - 1}) {
        CAPTURE(size);
        put(path, whole.substr(0, size));
        CHECK_FALSE(refusal(path).empty());
    }
    CHECK(refusal(path) == "is damaged: it has " + std::to_string(whole.size() - 1) + " bytes, not the " +
                               std::to_string(whole.size()) + " that were written");
    put(path, whole + '\0');
    CHECK_FALSE(refusal(path).empty());
}

TEST_CASE("what is no result file is refused by a clear message")
{
    const ScratchFolder scratch;
    CHECK(refusal(scratch / "none.h5") == "cannot read: No such file or directory");
    CHECK(refusal(scratch.path()) == "cannot read: Is a directory");
    put(scratch / "text.h5", std::string(2000, 'x'));
    CHECK(refusal(scratch / "text.h5") == "is not a result file of leat");
    REQUIRE(::mkfifo((scratch / "pipe").c_str(), 0600) == 0);
    CHECK(refusal(scratch / "pipe") == "cannot read: Invalid argument");

    const std::string path = write_result(scratch.path(), "line", "", sample_answer(), false).hdf5;
    std::string later = content(path);
    REQUIRE(later.substr(0, 14) == "leat-result 1\n");
    later[12] = '2';
    put(path, later);
    CHECK(refusal(path) == "has format version 2, but only version 1 can be read");
}

TEST_CASE("a sealed file without the contents of a result is refused")
{
    const ScratchFolder scratch;
    std::vector<std::byte> bytes(2000, std::byte{7});
    seal(bytes);
    const std::string path = scratch / "forged.h5";
    put(path, std::string(reinterpret_cast<const char*>(bytes.data()), bytes.size()));
    CHECK(refusal(path) == "HDF5 cannot interpret it");
}
