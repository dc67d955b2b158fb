#include <leat/passage/monotone_cubic.hpp>

#include <algorithm>
#include <array>
#include <cmath>
#include <utility>

namespace leat::passage {

namespace {

/// Slope at a point with widths and secants to both sides, from the parabola through the three points.
double parabola_slope(double left, double left_secant, double right, double right_secant)
{
    return (right * left_secant + left * right_secant) / (left + right);
}

} // namespace

MonotoneCubic::MonotoneCubic(std::vector<double> position, std::vector<double> value)
    : position_(std::move(position)), value_(std::move(value)), slope_(position_.size())
{
    const std::size_t pieces = position_.size() - 1;
    std::vector<double> width(pieces);
    std::vector<double> secant(pieces);
    for (std::size_t i = 0; i < pieces; ++i) {
        width[i] = position_[i + 1] - position_[i];
        secant[i] = (value_[i + 1] - value_[i]) / width[i];
    }
    if (pieces == 1) {
        slope_ = {secant[0], secant[0]};
        return;
    }
    for (std::size_t i = 1; i < pieces; ++i) {
        slope_[i] =
            secant[i - 1] * secant[i] <= 0 ? 0 : parabola_slope(width[i - 1], secant[i - 1], width[i], secant[i]);
    }
    // A parabola's slopes at the ends of a piece have the secant as their mean.
    slope_.front() = 2 * secant.front() - parabola_slope(width[0], secant[0], width[1], secant[1]);
    slope_.back() = 2 * secant.back() -
                    parabola_slope(width[pieces - 2], secant[pieces - 2], width[pieces - 1], secant[pieces - 1]);
    const auto keep_sign = [](double slope, double with) { return slope * with > 0 ? slope : 0.0; };
    slope_.front() = keep_sign(slope_.front(), secant.front());
    slope_.back() = keep_sign(slope_.back(), secant.back());
    // Each slope takes the stricter limit of its two pieces, so that the order of the points does not matter.
    std::vector<double> limit(pieces + 1, 1.0);
    for (std::size_t i = 0; i < pieces; ++i) {
        const double radius = std::hypot(slope_[i], slope_[i + 1]);
        const double largest = 3 * std::abs(secant[i]);
        if (radius > largest) {
            limit[i] = std::min(limit[i], largest / radius);
            limit[i + 1] = std::min(limit[i + 1], largest / radius);
        }
    }
    for (std::size_t i = 0; i <= pieces; ++i) {
        slope_[i] *= limit[i];
    }
}

double MonotoneCubic::on_piece(std::size_t piece, double position) const noexcept
{
    const double width = position_[piece + 1] - position_[piece];
    const double t = (position - position_[piece]) / width;
    const double s = 1 - t;
    return s * s * (1 + 2 * t) * value_[piece] + t * t * (1 + 2 * s) * value_[piece + 1] +
           t * s * width * (s * slope_[piece] - t * slope_[piece + 1]);
}

double MonotoneCubic::operator()(double position) const noexcept
{
    const double inside = std::clamp(position, position_.front(), position_.back());
    const auto next = std::upper_bound(position_.begin() + 1, position_.end() - 1, inside);
    return on_piece(static_cast<std::size_t>(next - position_.begin()) - 1, inside);
}

double MonotoneCubic::integral(double from, double to, bool radial) const noexcept
{
    if (to < from) {
        return -integral(to, from, radial);
    }
    const double start = std::clamp(from, position_.front(), position_.back());
    const double end = std::clamp(to, position_.front(), position_.back());
    // Three Gauss-Legendre points integrate up to degree 5 exactly; a cubic times the radius has degree 4.
    constexpr std::array<double, 3> node{-0.774596669241483377, 0, 0.774596669241483377};
    constexpr std::array<double, 3> weight{5.0 / 18, 8.0 / 18, 5.0 / 18};
    double sum = 0;
    for (std::size_t piece = 0; piece + 1 < position_.size(); ++piece) {
        const double a = std::max(start, position_[piece]);
        const double b = std::min(end, position_[piece + 1]);
        if (a >= b) {
            continue;
        }
        for (std::size_t k = 0; k < node.size(); ++k) {
            const double x = (a + b) / 2 + node[k] * (b - a) / 2;
            sum += weight[k] * (b - a) * on_piece(piece, x) * (radial ? x : 1);
        }
    }
    return sum;
}

} // namespace leat::passage
