#include "catch.hpp"
#include "reference/csv.hpp"

#include <leat/passage/developed.hpp>

#include <cmath>

using namespace leat;
using leat::passage::developed_flow;
using leat::passage::DevelopedFlow;
using leat::passage::section_of;

namespace {

Annulus annulus(double ratio)
{
    return {.inner_diameter = 8e-3 * ratio, .outer_diameter = 8e-3, .length = 1};
}

double value(const std::vector<reference::Row>& rows, const char* geometry, const char* quantity)
{
    return reference::select(rows, {{"geometry", geometry}, {"quantity", quantity}}).front().number("value");
}

/// Composite Gauss-Legendre integral of u/u_m over the area fraction: an independent way to the flow.
double flow_by_quadrature(const DevelopedFlow& developed, double from, double to)
{
    const auto& section = developed.section;
    const int pieces = 4000;
    double sum = 0;
    for (int i = 0; i < pieces; ++i) {
        const double a = from + (to - from) * i / pieces;
        const double b = from + (to - from) * (i + 1) / pieces;
        for (const double node : {-1 / std::sqrt(3.0), 1 / std::sqrt(3.0)}) {
            const double x = (a + b) / 2 + node * (b - a) / 2;
            const double weight = section.radial ? 2 * x / (section.first + section.last) : 1;
            sum += developed.velocity_ratio(x) * weight * (b - a) / 2 / section.width();
        }
    }
    return sum;
}

} // namespace

// Shah & London 1978, closed forms: fd_friction.csv
TEST_CASE("Developed flow in tube and channel", "[developed]")
{
    const auto rows = reference::read("fd_friction.csv");
    const DevelopedFlow tube = developed_flow(Tube{8e-3, 1});
    CHECK(tube.friction_reynolds == value(rows, "circular tube", "fRe_fanning_Dh"));
    CHECK(tube.peak_velocity_ratio == 2);
    CHECK(tube.peak_position == 0);
    const DevelopedFlow channel = developed_flow(Channel{2e-3, 1});
    CHECK(channel.friction_reynolds == value(rows, "parallel plates", "fRe_fanning_Dh"));
    CHECK(channel.peak_velocity_ratio == value(rows, "parallel plates", "umax_over_um"));
    CHECK(channel.peak_position == 1e-3);
}

// Shah & London 1978: fd_friction.csv, every concentric row, r* from 0.001 to 0.95
TEST_CASE("Developed flow in annuli", "[developed]")
{
    const auto rows = reference::select(reference::read("fd_friction.csv"), {{"geometry", "concentric annulus"}});
    int compared = 0;
    for (const reference::Row& row : rows) {
        const DevelopedFlow developed = developed_flow(annulus(row.stated("condition", "r*")));
        const std::string& quantity = row["quantity"];
        double computed = 0;
        if (quantity == "fRe_fanning_Dh") {
            computed = developed.friction_reynolds;
        } else if (quantity == "umax_over_um") {
            computed = developed.peak_velocity_ratio;
        } else if (quantity == "radius_of_max_velocity_over_ro") {
            computed = developed.peak_position / 4e-3;
        } else if (quantity == "wall_shear_ratio_inner_over_outer") {
            computed = developed.wall_shear_ratio_inner / developed.wall_shear_ratio_outer;
        } else {
            continue; // factors of momentum and energy are no part of DevelopedFlow
        }
        INFO(row.where());
        CHECK(computed == Approx(row.number("value")).epsilon(1e-10));
        ++compared;
    }
    CHECK(compared >= 40);
}

// Bird, Stewart & Lightfoot 1960: exact_solutions.csv
TEST_CASE("Developed velocity profiles", "[developed]")
{
    for (const reference::Row& row :
         reference::select(reference::read("exact_solutions.csv"), {{"quantity", "u/um Poiseuille"}})) {
        INFO(row.where());
        const double wanted = row.number("value");
        double computed = 0;
        if (row["geometry"] == "circular tube") {
            computed = developed_flow(Tube{8e-3, 1}).velocity_ratio(4e-3 * row.stated("condition", "r/R"));
        } else if (row["geometry"] == "parallel plates") {
            // Y from the middle, in half gaps; the lower half
            computed = developed_flow(Channel{2e-3, 1}).velocity_ratio(1e-3 * (1 - row.stated("condition", "Y")));
        } else {
            const Annulus shape = annulus(row.stated("condition", "r*"));
            const auto section = section_of(shape);
            computed = developed_flow(shape).velocity_ratio(
                section.first + section.width() * row.stated("condition", "(r-ri)/(ro-ri)"));
        }
        CHECK(computed == Approx(wanted).epsilon(1e-9));
    }
}

TEST_CASE("A thin gap is a channel, and the wall shears balance the pressure", "[developed]")
{
    const DevelopedFlow channel = developed_flow(Channel{2e-3, 1});
    for (const double gap : {1e-2, 1e-4, 1e-6, 1e-8}) {
        const DevelopedFlow thin = developed_flow(annulus(1 - gap));
        INFO("gap " << gap);
        // f Re = 24 (1 - gap^2/60 ...): the leading difference of the exact solution
        CHECK(thin.friction_reynolds == Approx(24).epsilon(gap * gap / 50 + 1e-13));
        CHECK(thin.peak_velocity_ratio == Approx(1.5).epsilon(gap * gap + 1e-9));
        for (const double share : {0.1, 0.5, 0.9}) {
            const double radius = thin.section.first + share * thin.section.width();
            // the positions themselves carry 1e-16/gap of rounding
            CHECK(thin.velocity_ratio(radius) ==
                  Approx(channel.velocity_ratio(2e-3 * share)).margin(gap + 1e-14 / gap));
        }
    }
    for (const double ratio : {1e-3, 0.05, 0.499, 0.501, 0.9, 1 - 1e-6}) {
        const DevelopedFlow ring = developed_flow(annulus(ratio));
        CHECK((ratio * ring.wall_shear_ratio_inner + ring.wall_shear_ratio_outer) / (1 + ratio) ==
              Approx(1).epsilon(1e-13));
    }
}

TEST_CASE("Flow fractions add up and agree with quadrature of the profile", "[developed]")
{
    for (const Shape& shape : {Shape(Tube{8e-3, 1}), Shape(Channel{2e-3, 1}), Shape(annulus(1e-3)), Shape(annulus(0.3)),
                               Shape(annulus(0.5)), Shape(annulus(0.8)), Shape(annulus(0.999))}) {
        const DevelopedFlow developed = developed_flow(shape);
        const auto section = developed.section;
        CHECK(developed.flow_fraction(section.first, section.last) == Approx(1).epsilon(1e-12));
        CHECK(developed.flow_fraction(section.first - 1, section.last + 1) == Approx(1).epsilon(1e-12));
        CHECK(developed.velocity_ratio(section.last) == 0);
        const double a = section.first + 0.37 * section.width();
        const double b = section.first + 0.81 * section.width();
        CHECK(developed.flow_fraction(a, b) == Approx(flow_by_quadrature(developed, a, b)).epsilon(1e-9));
        CHECK(developed.flow_fraction(a, section.last) ==
              Approx(flow_by_quadrature(developed, a, section.last)).epsilon(1e-9));
        CHECK(developed.flow_fraction(b, a) == -developed.flow_fraction(a, b));
    }
}

TEST_CASE("A very thin cell at the wall keeps its flow", "[developed]")
{
    // u = s t/mu next to a wall: fraction = slope x thickness^2/2
    const double thin = 1 - (1 - 1e-9); // rounded so that the positions are exact
    const double digits = 2e-9;         // the next term of the profile is smaller by thin
    const DevelopedFlow tube = developed_flow(Tube{2, 1});
    CHECK(tube.flow_fraction(1 - thin, 1) == Approx(4 * thin * thin).epsilon(digits));
    const DevelopedFlow channel = developed_flow(Channel{1, 1});
    CHECK(channel.flow_fraction(0, thin) == Approx(3 * thin * thin).epsilon(digits));
    CHECK(channel.flow_fraction(1 - thin, 1) == Approx(3 * thin * thin).epsilon(digits));
}
