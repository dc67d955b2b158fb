#pragma once

namespace leat::test
{

/// What this program has allocated by operator new, or by a C allocation function called from code that is linked
/// into it statically. Blocks that shared libraries take for themselves by malloc are not seen.
/// Bytes are those that the allocator really sets aside: a few more per block than were asked for.
struct Allocations {
    long long count = 0;      ///< allocations since the program began
    long long live_bytes = 0; ///< allocated and not freed
    long long peak_bytes = 0; ///< largest live_bytes since the program began or reset_peak() was called
};

/// May be called from any thread; itself allocates nothing.
Allocations allocations() noexcept;

/// Makes the peak start again from what is live now.
void reset_peak() noexcept;

} // namespace leat::test
