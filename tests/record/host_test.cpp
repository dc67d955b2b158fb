#include "catch.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/record/hdf5_mutex.hpp>
#include <leat/record/hdf5_session.hpp>
#include <leat/record/image.hpp>
#include <leat/record/read.hpp>
#include <leat/record/result.hpp>

#include <hdf5.h>

#include <array>
#include <atomic>
#include <chrono>
#include <mutex>
#include <thread>
#include <vector>

using namespace leat;
using namespace leat::record;
using test::sample_answer;
using test::ScratchFolder;

namespace {

herr_t count_error(hid_t, void* count)
{
    ++*static_cast<int*>(count);
    return 0;
}

herr_t count_error_old(void* count)
{
    ++*static_cast<int*>(count);
    return 0;
}

// A host's own failing call, which its handler must hear of.
void fail_once()
{
    H5Dclose(-1);
}

} // namespace

TEST_CASE("the host's HDF5 error handler hears its own errors, before and after, and none of ours")
{
    const ScratchFolder scratch;
    H5E_auto2_t earlier = nullptr;
    void* earlier_data = nullptr;
    H5Eget_auto2(H5E_DEFAULT, &earlier, &earlier_data);
    const int kind = GENERATE(1, 2);
    int count = 0;
    if (kind == 1) {
        H5Eset_auto1(count_error_old, &count);
    } else {
        H5Eset_auto2(H5E_DEFAULT, count_error, &count);
    }
    fail_once();
    CHECK(count == 1);

    const ResultFiles files = write_result(scratch.path(), "line", "", sample_answer(), false);
    read_result(files.hdf5);
    {
        // A failure inside: an error of ours, silent, and the handler back all the same.
        const Hdf5Session session;
        CHECK_THROWS_AS(Hdf5Handle(H5Dopen2(-1, "none", H5P_DEFAULT), H5Dclose, "find it"), Hdf5Failure);
    }
    CHECK(count == 1);
    fail_once();
    CHECK(count == 2);
    H5Eset_auto2(H5E_DEFAULT, earlier, earlier_data);
}

TEST_CASE("no HDF5 object stays open")
{
    const ScratchFolder scratch;
    read_result(write_result(scratch.path(), "line", "", sample_answer(), false).hdf5);
    CHECK(H5Fget_obj_count(static_cast<hid_t>(H5F_OBJ_ALL), H5F_OBJ_ALL) == 0);
}

TEST_CASE("several threads write and read at once")
{
    const ScratchFolder scratch;
    constexpr int rounds = 10;
    std::array<int, 3> good{};
    {
        std::vector<std::jthread> threads;
        for (int t = 0; t < 3; ++t) {
            threads.emplace_back([&, t] {
                const Answer answer = sample_answer(5 + t, 3);
                for (int round = 0; round < rounds; ++round) {
                    const ResultFiles files = write_result(scratch.path(), "of" + std::to_string(t), "", answer, true);
                    if (read_result(files.hdf5).restart.pressure == answer.fields->pressure) {
                        ++good[static_cast<std::size_t>(t)];
                    }
                }
            });
        }
    }
    CHECK(good == std::array{rounds, rounds, rounds});
    CHECK(test::tree(scratch.path()).size() == 6);
}

TEST_CASE("HDF5 is used only under its mutex")
{
    std::unique_lock held(hdf5_mutex());
    std::atomic<bool> done = false;
    std::jthread writer([&] {
        result_image("", sample_answer(1, 1));
        done = true;
    });
    std::this_thread::sleep_for(std::chrono::milliseconds(50));
    CHECK_FALSE(done);
    held.unlock();
    writer.join();
    CHECK(done);
}
