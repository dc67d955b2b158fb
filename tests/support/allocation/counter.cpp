#include "catch.hpp"
#include "support/allocation_counter.hpp"

#include <cstdlib>
#include <new>
#include <string>
#include <vector>

// The counter itself must be seen to count; otherwise "no allocation" proves nothing.

namespace {

struct alignas(64) Line {
    double values[8];
};

/// Allocations made by `work`.
template <class Work>
long long made_by(Work&& work)
{
    const long long before = leat::test::allocations().count;
    work();
    return leat::test::allocations().count - before;
}

} // namespace

TEST_CASE("the counter sees every way to allocate")
{
    // Addresses are kept in a volatile so that no pair of new and delete is optimised away.
    void* volatile kept = nullptr;
    CHECK(made_by([&] {
              kept = ::operator new(8);
              ::operator delete(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = ::operator new[](8);
              ::operator delete[](kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = ::operator new(8, std::nothrow);
              ::operator delete(kept, std::nothrow);
          }) == 1);
    CHECK(made_by([&] {
              kept = new (std::nothrow) Line;
              delete static_cast<Line*>(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = new Line;
              delete static_cast<Line*>(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = new Line[3];
              delete[] static_cast<Line*>(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = std::malloc(8);
              std::free(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = std::calloc(4, 8);
              std::free(kept);
          }) == 1);
    CHECK(made_by([&] {
              kept = std::aligned_alloc(64, 64);
              std::free(kept);
          }) == 1);
    CHECK(made_by([&] {
              std::string text(100, 'x');
              kept = text.data();
          }) == 1);
}

TEST_CASE("the counter sees no allocation where there is none")
{
    std::vector<double> values(100);
    CHECK(made_by([&] {
              for (double& value : values) {
                  value += 1;
              }
          }) == 0);
}

TEST_CASE("live and peak bytes follow a block")
{
    constexpr long long size = 1 << 20;
    // All is read before anything is checked: a check allocates too.
    leat::test::reset_peak();
    const leat::test::Allocations before = leat::test::allocations();
    void* volatile block = ::operator new(size);
    const leat::test::Allocations during = leat::test::allocations();
    ::operator delete(block);
    const leat::test::Allocations after = leat::test::allocations();
    leat::test::reset_peak();
    const leat::test::Allocations reset = leat::test::allocations();

    CHECK(during.live_bytes - before.live_bytes >= size);
    CHECK(during.live_bytes - before.live_bytes < size + 16384);
    CHECK(after.live_bytes == before.live_bytes);
    CHECK(after.peak_bytes == during.live_bytes);
    CHECK(reset.peak_bytes == before.live_bytes);
}
