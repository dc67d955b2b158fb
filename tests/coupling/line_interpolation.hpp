#pragma once

#include <algorithm>
#include <cstddef>
#include <vector>

namespace leat::test {

/// Cubic (Lagrange) interpolation through the four places around `at`; places increase, at least four.
inline double interpolate(const std::vector<double>& places, const std::vector<double>& values, double at)
{
    const auto above = std::upper_bound(places.begin(), places.end(), at) - places.begin();
    const auto last = static_cast<std::ptrdiff_t>(places.size()) - 4;
    const std::ptrdiff_t first = std::clamp<std::ptrdiff_t>(above - 2, 0, last);
    double sum = 0;
    for (std::ptrdiff_t k = first; k < first + 4; ++k) {
        double weight = 1;
        for (std::ptrdiff_t m = first; m < first + 4; ++m) {
            weight *= m == k ? 1 : (at - places[m]) / (places[k] - places[m]);
        }
        sum += weight * values[k];
    }
    return sum;
}

} // namespace leat::test
