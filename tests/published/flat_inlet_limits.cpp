#include "catch.hpp"
#include "duct.hpp"

#include <cmath>
#include <numbers>

using namespace leat;
using namespace leat::published;

// A flat inlet meets the wall with a jump. The core pressure of the inlet plane has a limit under refinement, the
// section mean has none: in the Stokes flow of that corner the pressure is [4 pi/(pi^2 - 4)] mu U/r, so that each
// halving of the cells in both directions adds that times ln 2 over the wetted perimeter.

namespace {

const double growth_by_reynolds =
    32 * std::numbers::pi / (std::numbers::pi * std::numbers::pi - 4) * std::numbers::ln2; // 11.872

constexpr double length = 2;
// Cells along and across, refined by two in both directions; near-square at the corner. An annulus has two walls and
// two corners to share its cells between.
using Grids = std::array<std::array<int, 2>, 3>;
constexpr Grids one_wall = {{{64, 32}, {128, 64}, {256, 128}}};
constexpr Grids two_walls = {{{64, 128}, {128, 256}, {256, 512}}};

/// Area mean of the pressure over the first column of cells above the mean at the end, by rho u_m^2/2.
double mean_inlet_pressure(const Fields& fields, bool cylindrical)
{
    double sum = 0;
    double area = 0;
    for (int j = 0; j < fields.cells[1]; ++j) {
        const double from = fields.points_y[j];
        const double to = fields.points_y[j + 1];
        const double ring = (to - from) * (cylindrical ? from + to : 1);
        sum += ring * fields.pressure[static_cast<std::size_t>(j) * fields.cells[0]];
        area += ring;
    }
    return sum / area / dynamic_pressure;
}

struct Pressures {
    std::array<double, 3> core{};
    std::array<double, 3> mean{};
};

Pressures refined(const Duct& duct, const Grids& grids)
{
    Pressures pressures;
    for (std::size_t k = 0; k < grids.size(); ++k) {
        Options options;
        options.cells = grids[k];
        options.keep_fields = true;
        options.tolerance = 1e-11;
        const Answer answer = solve(passage_of(duct), {}, options);
        REQUIRE(answer.outcome == Outcome::converged);
        pressures.core[k] = answer.numbers.pressure_drop.value / dynamic_pressure;
        pressures.mean[k] = mean_inlet_pressure(answer.fields.value(), duct.geometry != "parallel plates");
    }
    return pressures;
}

void check_limits(std::string_view geometry, const Grids& grids, double radius_ratio = 0)
{
    for (const double re : {1.0, 10.0}) {
        const Pressures pressures = refined({geometry, re, length, radius_ratio}, grids);
        INFO(geometry << ", Re " << re << ": core " << pressures.core[0] << ' ' << pressures.core[1] << ' '
                      << pressures.core[2] << ", mean " << pressures.mean[0] << ' ' << pressures.mean[1] << ' '
                      << pressures.mean[2]);
        CHECK(observed_order(pressures.core) == Approx(2).margin(0.2));
        for (std::size_t k = 0; k < 2; ++k) {
            CHECK((pressures.mean[k + 1] - pressures.mean[k]) * re / growth_by_reynolds == Approx(1).margin(0.02));
        }
    }
}

} // namespace

TEST_CASE("Flat inlet of a tube: core pressure converges at order 2, the mean grows by 11.872/Re", "[published]")
{
    CHECK(growth_by_reynolds == Approx(11.872).margin(5e-4));
    check_limits("circular tube", one_wall);
}

TEST_CASE("Flat inlet of a channel: core pressure converges at order 2, the mean grows by 11.872/Re", "[published]")
{
    check_limits("parallel plates", one_wall);
}

TEST_CASE("Flat inlet of an annulus: core pressure converges at order 2, the mean grows by 11.872/Re", "[published]")
{
    check_limits("concentric annulus", two_walls, 0.5);
}
