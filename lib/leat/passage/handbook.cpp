#include <leat/passage/developed.hpp>
#include <leat/passage/handbook.hpp>
#include <leat/passage/rounded_text.hpp>
#include <leat/passage/shah_correlation.hpp>

namespace leat::passage {

namespace {

double pressure_drop(double friction_reynolds, const Derived& derived)
{
    const double dynamic = derived.density * derived.mean_velocity * derived.mean_velocity / 2;
    return 4 * friction_reynolds / derived.reynolds_number * derived.length / derived.hydraulic_diameter * dynamic;
}

HandbookEstimate flat_estimate(const Passage& passage, const Derived& derived)
{
    HandbookEstimate estimate;
    const std::optional<ShahConstants> constants = shah_constants(passage.shape);
    if (!constants) {
        estimate.source.clear();
        estimate.remark = "the constants of Shah 1978 cover annuli from r* = " + rounded_text(shah_least_ratio) +
                          " to " + rounded_text(shah_largest_ratio);
        return estimate;
    }
    const double x_plus = derived.length / (derived.hydraulic_diameter * derived.reynolds_number);
    estimate.pressure_drop = pressure_drop(constants->apparent_friction_reynolds(x_plus), derived);
    estimate.source = "correlation of Shah 1978 for developing flow";
    estimate.remark = constants->remark;
    // Against the full equations the excess pressure at Re = 1000 is already 7 to 9 % below boundary-layer theory.
    if (derived.reynolds_number < 1000) {
        estimate.remark += estimate.remark.empty() ? "" : "; ";
        estimate.remark += "made for boundary layers at high Re, of limited use at Re " +
                           rounded_text(derived.reynolds_number) + " (below 1000)";
    }
    return estimate;
}

HandbookEstimate developed_estimate(const Passage& passage, const Derived& derived)
{
    const double friction = developed_flow(passage.shape).friction_reynolds;
    HandbookEstimate estimate;
    estimate.pressure_drop = pressure_drop(friction, derived);
    estimate.source =
        "developed-flow formula, 4 f L/D_h rho u_m^2/2 with f Re = " + rounded_text(friction) + " (Shah & London 1978)";
    return estimate;
}

} // namespace

HandbookEstimate handbook_estimate(const Passage& passage, const Derived& derived)
{
    switch (passage.inlet.profile) {
    case InletProfile::flat:
        return flat_estimate(passage, derived);
    case InletProfile::developed:
        return developed_estimate(passage, derived);
    case InletProfile::table:
        break;
    }
    return {.pressure_drop = std::nullopt, .source = {}, .remark = "no handbook formula for a tabulated inlet"};
}

} // namespace leat::passage
