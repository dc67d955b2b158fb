#pragma once

#include <algorithm>
#include <cstddef>
#include <cstdint>
#include <numeric>
#include <random>
#include <vector>

namespace leat::benchmark {

/// A Latin hypercube in [0, 1): each of `count` equal slices of each dimension holds exactly one point (McKay, Beckman
/// & Conover 1979). The same seed gives the same points on every machine.
inline std::vector<std::vector<double>> latin_hypercube(int count, int dimensions, std::uint64_t seed)
{
    std::mt19937_64 random(seed);
    const auto unit = [&] { return static_cast<double>(random() >> 11) * 0x1p-53; };
    std::vector<std::vector<double>> points(static_cast<std::size_t>(count),
                                            std::vector<double>(static_cast<std::size_t>(dimensions)));
    std::vector<int> slice(points.size());
    for (std::size_t d = 0; d < static_cast<std::size_t>(dimensions); ++d) {
        std::iota(slice.begin(), slice.end(), 0);
        for (std::size_t k = slice.size(); k > 1; --k) {
            std::swap(slice[k - 1], slice[static_cast<std::size_t>(unit() * static_cast<double>(k))]);
        }
        for (std::size_t k = 0; k < slice.size(); ++k) {
            points[k][d] = (slice[k] + unit()) / count;
        }
    }
    return points;
}

} // namespace leat::benchmark
