#include <leat/cascade/grid_convergence.hpp>

#include <cmath>

namespace leat::cascade {

namespace {

constexpr double safety_of_three_grids = 1.25;
constexpr int most_iterations = 200;
constexpr double settled = 1e-12; // change of the order between two iterations

} // namespace

std::optional<double> apparent_order(double increment_21, double increment_32, double ratio_21, double ratio_32)
{
    const double quotient = increment_32 / increment_21;
    if (!std::isfinite(quotient) || quotient == 0) {
        return std::nullopt;
    }
    const double sign = quotient < 0 ? -1 : 1;
    double order = std::abs(std::log(std::abs(quotient))) / std::log(ratio_21);
    for (int k = 0; k < most_iterations; ++k) {
        // zero for equal ratios of either sign: (r21^p - s)/(r32^p - s) = 1
        const double q = ratio_21 == ratio_32
                             ? 0
                             : std::log((std::pow(ratio_21, order) - sign) / (std::pow(ratio_32, order) - sign));
        const double next = std::abs(std::log(std::abs(quotient)) + q) / std::log(ratio_21);
        const double change = std::abs(next - order);
        order = next;
        if (!std::isfinite(order)) {
            return std::nullopt;
        }
        if (change < settled) {
            break;
        }
    }
    return order > 0 ? std::optional(order) : std::nullopt;
}

double grid_convergence_index(double value_1, double value_2, double ratio, double order, double safety)
{
    return safety * std::abs(value_1 - value_2) / (std::pow(ratio, order) - 1);
}

std::optional<GridConvergence> grid_convergence(const std::array<double, 3>& values,
                                                const std::array<double, 2>& ratios)
{
    const std::optional<double> order =
        apparent_order(values[1] - values[0], values[2] - values[1], ratios[0], ratios[1]);
    if (!order) {
        return std::nullopt;
    }
    GridConvergence result;
    result.order = *order;
    result.approximate_error = std::abs(values[0] - values[1]);
    result.extrapolated = values[0] + (values[0] - values[1]) / (std::pow(ratios[0], *order) - 1);
    result.extrapolated_error = std::abs(result.extrapolated - values[0]);
    result.index = grid_convergence_index(values[0], values[1], ratios[0], *order, safety_of_three_grids);
    return result;
}

} // namespace leat::cascade
