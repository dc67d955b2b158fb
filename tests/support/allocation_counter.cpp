#include "support/allocation_counter.hpp"

#include <atomic>
#include <cstddef>
#include <cstdlib>
#include <malloc.h>
#include <new>

// The linker sends malloc and its kin here (--wrap) and gives the allocator's own functions these names.
extern "C" {
void* __real_malloc(std::size_t size);
void* __real_calloc(std::size_t count, std::size_t size);
void* __real_realloc(void* block, std::size_t size);
void __real_free(void* block);
void* __real_aligned_alloc(std::size_t alignment, std::size_t size);
int __real_posix_memalign(void** block, std::size_t alignment, std::size_t size);
}

namespace leat::test {

namespace {

// Constant-initialised and never destroyed: allocations happen before main and after it.
constinit std::atomic<long long> count{0};
constinit std::atomic<long long> live{0};
constinit std::atomic<long long> peak{0};

void note_live(long long bytes) noexcept
{
    const long long now = live.fetch_add(bytes, std::memory_order_relaxed) + bytes;
    long long seen = peak.load(std::memory_order_relaxed);
    while (now > seen && !peak.compare_exchange_weak(seen, now, std::memory_order_relaxed)) {
    }
}

void* counted(void* block) noexcept
{
    if (block != nullptr) {
        count.fetch_add(1, std::memory_order_relaxed);
        note_live(static_cast<long long>(malloc_usable_size(block)));
    }
    return block;
}

void released(void* block) noexcept
{
    if (block != nullptr) {
        live.fetch_sub(static_cast<long long>(malloc_usable_size(block)), std::memory_order_relaxed);
    }
}

// Operator new calls the allocator by its common name, so that it is counted in one place.
void* try_allocate(std::size_t size) noexcept
{
    return std::malloc(size == 0 ? 1 : size);
}

void* try_allocate_aligned(std::size_t size, std::align_val_t alignment) noexcept
{
    void* block = nullptr;
    const int error = posix_memalign(&block, static_cast<std::size_t>(alignment), size == 0 ? 1 : size);
    return error == 0 ? block : nullptr;
}

void* or_throw(void* block)
{
    if (block == nullptr) {
        throw std::bad_alloc();
    }
    return block;
}

void* allocate(std::size_t size)
{
    return or_throw(try_allocate(size));
}

void* allocate_aligned(std::size_t size, std::align_val_t alignment)
{
    return or_throw(try_allocate_aligned(size, alignment));
}

} // namespace

Allocations allocations() noexcept
{
    return {count.load(), live.load(), peak.load()};
}

void reset_peak() noexcept
{
    peak.store(live.load());
}

} // namespace leat::test

extern "C" {

void* __wrap_malloc(std::size_t size)
{
    return leat::test::counted(__real_malloc(size));
}

void* __wrap_calloc(std::size_t count, std::size_t size)
{
    return leat::test::counted(__real_calloc(count, size));
}

void* __wrap_realloc(void* block, std::size_t size)
{
    const auto before = block == nullptr ? 0 : static_cast<long long>(malloc_usable_size(block));
    void* moved = __real_realloc(block, size);
    if (moved != nullptr || size == 0) {
        leat::test::live.fetch_sub(before, std::memory_order_relaxed);
    }
    return leat::test::counted(moved);
}

void __wrap_free(void* block)
{
    leat::test::released(block);
    __real_free(block);
}

void* __wrap_aligned_alloc(std::size_t alignment, std::size_t size)
{
    return leat::test::counted(__real_aligned_alloc(alignment, size));
}

int __wrap_posix_memalign(void** block, std::size_t alignment, std::size_t size)
{
    const int error = __real_posix_memalign(block, alignment, size);
    if (error == 0) {
        leat::test::counted(*block);
    }
    return error;
}

} // extern "C"

// Every form is replaced: a sanitizer brings its own of those that are left out, and they would not be counted.

void* operator new(std::size_t size)
{
    return leat::test::allocate(size);
}
void* operator new[](std::size_t size)
{
    return leat::test::allocate(size);
}
void* operator new(std::size_t size, std::align_val_t a)
{
    return leat::test::allocate_aligned(size, a);
}
void* operator new[](std::size_t size, std::align_val_t a)
{
    return leat::test::allocate_aligned(size, a);
}

void* operator new(std::size_t size, const std::nothrow_t&) noexcept
{
    return leat::test::try_allocate(size);
}
void* operator new[](std::size_t size, const std::nothrow_t&) noexcept
{
    return leat::test::try_allocate(size);
}
void* operator new(std::size_t size, std::align_val_t a, const std::nothrow_t&) noexcept
{
    return leat::test::try_allocate_aligned(size, a);
}
void* operator new[](std::size_t size, std::align_val_t a, const std::nothrow_t&) noexcept
{
    return leat::test::try_allocate_aligned(size, a);
}

void operator delete(void* block) noexcept
{
    std::free(block);
}
void operator delete(void* block, std::size_t) noexcept
{
    std::free(block);
}
void operator delete(void* block, std::align_val_t) noexcept
{
    std::free(block);
}
void operator delete(void* block, std::size_t, std::align_val_t) noexcept
{
    std::free(block);
}
void operator delete(void* block, const std::nothrow_t&) noexcept
{
    std::free(block);
}
void operator delete(void* block, std::align_val_t, const std::nothrow_t&) noexcept
{
    std::free(block);
}
void operator delete[](void* block) noexcept
{
    std::free(block);
}
void operator delete[](void* block, std::size_t) noexcept
{
    std::free(block);
}
void operator delete[](void* block, std::align_val_t) noexcept
{
    std::free(block);
}
void operator delete[](void* block, std::size_t, std::align_val_t) noexcept
{
    std::free(block);
}
void operator delete[](void* block, const std::nothrow_t&) noexcept
{
    std::free(block);
}
void operator delete[](void* block, std::align_val_t, const std::nothrow_t&) noexcept
{
    std::free(block);
}
