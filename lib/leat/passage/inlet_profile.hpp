#pragma once

#include <leat/passage/developed.hpp>
#include <leat/passage/passage.hpp>
#include <leat/passage/section.hpp>
#include <leat/passage/tabulated_profile.hpp>

#include <variant>

namespace leat::passage {

/// How the inlet flow is spread over the part of the section that is solved: radius of a tube (0 .. diameter/2) or an
/// annulus, distance from the lower wall of a channel up to its middle (0 .. gap/2).
class InletDistribution {
public:
    /// For a valid passage (see faults_of).
    explicit InletDistribution(const Passage& passage);

    /// Exact share of the flow of the solved part between two positions (m) of it: 1 over the whole part.
    double flow_fraction(double from, double to) const noexcept;
    /// u/u_m at a position (m). A flat profile is 1 up to and on the walls.
    double velocity_ratio(double position) const noexcept;

private:
    struct Flat {};
    Section section_;
    std::variant<Flat, DevelopedFlow, TabulatedProfile> profile_;
};

/// The inlet of a valid passage (see faults_of).
InletDistribution make_inlet(const Passage& passage);

} // namespace leat::passage
