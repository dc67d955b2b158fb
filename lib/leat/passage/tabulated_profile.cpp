#include <leat/passage/tabulated_profile.hpp>

#include <algorithm>
#include <cmath>

namespace leat::passage {

namespace {

double largest_velocity(const VelocityTable& table)
{
    double peak = 0;
    for (const double velocity : table.velocity) {
        peak = std::max(peak, std::abs(velocity));
    }
    return peak;
}

bool near(double position, double target, const Section& section)
{
    return std::abs(position - target) <= 1e-6 * section.width();
}

/// The points with their ends put exactly on the walls, velocities over the largest, mirrored where the class says so.
MonotoneCubic curve_of(const VelocityTable& table, const Section& section)
{
    std::vector<double> position = table.position;
    std::vector<double> value = table.velocity;
    const double peak = largest_velocity(table);
    for (double& velocity : value) {
        velocity /= peak;
    }
    position.front() = section.first;
    const bool half_channel = !section.radial && !near(position.back(), section.last, section);
    position.back() = half_channel ? section.last / 2 : section.last;
    const auto points = static_cast<std::ptrdiff_t>(position.size());
    if (half_channel) {
        for (std::ptrdiff_t i = points - 2; i >= 0; --i) {
            position.push_back(section.last - position[static_cast<std::size_t>(i)]);
            value.push_back(value[static_cast<std::size_t>(i)]);
        }
    } else if (section.radial && section.first == 0) {
        const std::vector<double> radius = position;
        const std::vector<double> velocity = value;
        for (std::size_t i = 1; i < radius.size(); ++i) {
            position.insert(position.begin(), -radius[i]);
            value.insert(value.begin(), velocity[i]);
        }
    }
    return {std::move(position), std::move(value)};
}

bool note_point_faults(const VelocityTable& table, Faults& faults)
{
    const std::size_t points = table.position.size();
    if (points != table.velocity.size() || points < 2) {
        faults.add("inlet.table",
                   std::to_string(points) + " positions, " + std::to_string(table.velocity.size()) + " velocities",
                   "must have as many velocities as positions, at least 2");
        return false;
    }
    const auto finite = [](double number) { return std::isfinite(number); };
    const bool all_finite = std::all_of(table.position.begin(), table.position.end(), finite) &&
                            std::all_of(table.velocity.begin(), table.velocity.end(), finite);
    if (!all_finite) {
        faults.add("inlet.table", "", "every position and velocity must be finite");
        return false;
    }
    for (std::size_t i = 1; i < points; ++i) {
        if (!(table.position[i] > table.position[i - 1])) {
            faults.add("inlet.table", to_text(table.position[i - 1]) + " m then " + to_text(table.position[i]) + " m",
                       "positions must be strictly increasing");
            return false;
        }
    }
    return true;
}

bool note_coverage_faults(const VelocityTable& table, const Section& section, Faults& faults)
{
    const double start = table.position.front();
    const double end = table.position.back();
    const bool to_middle = !section.radial && near(end, section.last / 2, section);
    bool covered = near(start, section.first, section) && (near(end, section.last, section) || to_middle);
    // The ends are put on the walls, so that the points between must lie inside by themselves.
    covered = covered && (table.position.size() == 2 ||
                          (table.position[1] > section.first &&
                           *(table.position.end() - 2) < (to_middle ? section.last / 2 : section.last)));
    if (!covered) {
        faults.add("inlet.table", to_text(start) + " m to " + to_text(end) + " m",
                   "positions must run from " + to_text(section.first) + " m to " + to_text(section.last) + " m" +
                       (section.radial ? "" : " or to the middle, " + to_text(section.last / 2) + " m"));
    }
    return covered;
}

} // namespace

void note_table_faults(const VelocityTable& table, const Shape& shape, Faults& faults)
{
    const Section section = section_of(shape);
    if (!note_point_faults(table, faults) || !note_coverage_faults(table, section, faults)) {
        return;
    }
    if (largest_velocity(table) == 0) {
        faults.add("inlet.table", "0", "mean velocity must be > 0");
        return;
    }
    if (!section.radial) {
        const MonotoneCubic curve = curve_of(table, section);
        double worst = 0;
        for (const double position : table.position) {
            worst = std::max(worst, std::abs(curve(position) - curve(section.last - position)));
        }
        if (worst > 1e-6) {
            faults.add("inlet.table", to_text(worst) + " of the largest velocity off symmetry",
                       "must be symmetric about the middle of the channel within 1e-6 of the largest velocity");
        }
    }
    const double mean = TabulatedProfile(table, shape).mean_over_peak();
    if (!(mean > 1e-6)) {
        faults.add("inlet.table", to_text(mean) + " of the largest velocity on average",
                   "mean velocity must be > 0 and above 1e-6 of the largest velocity");
    }
}

TabulatedProfile::TabulatedProfile(const VelocityTable& table, const Shape& shape)
    : section_(section_of(shape)), curve_(curve_of(table, section_))
{
    mean_ = flow(section_.first, section_.last);
}

double TabulatedProfile::velocity_ratio(double position) const noexcept
{
    const double velocity =
        section_.radial ? curve_(position) : (curve_(position) + curve_(section_.last - position)) / 2;
    return velocity / mean_;
}

double TabulatedProfile::flow_fraction(double from, double to) const noexcept
{
    return flow(from, to) / mean_;
}

double TabulatedProfile::flow(double from, double to) const noexcept
{
    if (section_.radial) {
        const double mean_radius = (section_.first + section_.last) / 2;
        const double start = std::clamp(from, section_.first, section_.last);
        const double end = std::clamp(to, section_.first, section_.last);
        return curve_.integral(start, end, true) / (section_.width() * mean_radius);
    }
    // Half from the curve, half from its mirror image: what symmetry is missing within the tolerance is removed.
    const double mirrored = curve_.integral(section_.last - to, section_.last - from, false);
    return (curve_.integral(from, to, false) + mirrored) / (2 * section_.width());
}

} // namespace leat::passage
