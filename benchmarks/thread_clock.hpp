#pragma once

#include <algorithm>
#include <ctime>
#include <limits>

namespace leat::benchmark {

/// Seconds that the calling thread has computed. Other work on the machine does not count.
inline double thread_seconds()
{
    timespec time{};
    clock_gettime(CLOCK_THREAD_CPUTIME_ID, &time);
    return static_cast<double>(time.tv_sec) + 1e-9 * static_cast<double>(time.tv_nsec);
}

/// The least time of one call of `work`: at least `times` calls, and more until `seconds` are spent.
template <class Work>
double least_seconds(int times, double seconds, Work&& work)
{
    double least = std::numeric_limits<double>::infinity();
    const double begin = thread_seconds();
    for (int k = 0; k < times || thread_seconds() - begin < seconds; ++k) {
        const double start = thread_seconds();
        work();
        least = std::min(least, thread_seconds() - start);
    }
    return least;
}

} // namespace leat::benchmark
