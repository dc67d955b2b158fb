#include <leat/field/interpolation.hpp>

#include <algorithm>
#include <cmath>

namespace leat::field {

double interpolate(const std::vector<double>& position, const std::vector<double>& value, double x, int points)
{
    const int n = static_cast<int>(position.size());
    const int count = std::min(points, n);
    const int above = static_cast<int>(std::lower_bound(position.begin(), position.end(), x) - position.begin());
    const int first = std::clamp(above - count / 2, 0, n - count);
    double sum = 0;
    for (int a = first; a < first + count; ++a) {
        double weight = 1;
        for (int b = first; b < first + count; ++b) {
            if (b != a) {
                weight *= (x - position[b]) / (position[a] - position[b]);
            }
        }
        sum += weight * value[a];
    }
    return sum;
}

double peak(const std::vector<double>& position, const std::vector<double>& value)
{
    const auto top = std::max_element(value.begin(), value.end()) - value.begin();
    if (top == 0 || top + 1 == static_cast<std::ptrdiff_t>(value.size())) {
        return value[top];
    }
    const double left = position[top - 1] - position[top];
    const double right = position[top + 1] - position[top];
    const double below = (value[top - 1] - value[top]) / left;
    const double above = (value[top + 1] - value[top]) / right;
    const double curvature = (above - below) / (right - left);
    const double slope = below - curvature * left;
    return curvature < 0 ? value[top] - slope * slope / (4 * curvature) : value[top];
}

double last_crossing(const std::vector<double>& position, const std::vector<double>& value, double target,
                     double tolerance, double end)
{
    const int n = static_cast<int>(position.size());
    int outside = -1;
    for (int k = 0; k < n; ++k) {
        // the first place at or beyond the end decides whether the crossing lies before it
        if (std::abs(value[k] - target) > tolerance) {
            outside = k;
        }
        if (position[k] >= end) {
            break;
        }
    }
    if (outside < 0) {
        return position.front();
    }
    if (position[outside] >= end || outside + 1 == n) {
        return std::max(end, position[outside]);
    }
    double low = position[outside];
    double high = position[outside + 1];
    for (int k = 0; k < 60; ++k) {
        const double middle = 0.5 * (low + high);
        const bool still = std::abs(interpolate(position, value, middle) - target) > tolerance;
        (still ? low : high) = middle;
    }
    return 0.5 * (low + high);
}

} // namespace leat::field
