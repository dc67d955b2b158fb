#include "catch.hpp"
#include "passage_cases.hpp"
#include "reference/csv.hpp"

#include <leat/passage/handbook.hpp>
#include <leat/passage/shah_correlation.hpp>

using namespace leat;
using leat::passage::handbook_estimate;
using leat::passage::shah_constants;
using leat::test::oil_in;

namespace {

Shape shape_named(const std::string& geometry)
{
    if (geometry == "circular tube") {
        return Tube{8e-3, 1};
    }
    if (geometry == "parallel plates") {
        return Channel{2e-3, 1};
    }
    const double ratio = std::stod(geometry.substr(geometry.find('=') + 1));
    return Annulus{8e-3 * ratio, 8e-3, 1};
}

} // namespace

// Shah 1978, J. Fluids Eng. 100, 177-179: hydrodynamic_entrance.csv, constants and values of the correlation
TEST_CASE("The correlation of Shah 1978 at its tabulated shapes", "[handbook]")
{
    const auto rows = reference::read("hydrodynamic_entrance.csv");
    for (const auto& row : reference::select(rows, {{"quantity", "Shah 1978 constants"}})) {
        INFO(row.where());
        const auto constants = shah_constants(shape_named(row["geometry"]));
        REQUIRE(constants);
        CHECK(constants->excess == row.stated("condition", "K_inf"));
        CHECK(constants->blend == Approx(row.stated("condition", "C")).epsilon(1e-12));
        CHECK(constants->friction_reynolds == Approx(row.stated("condition", "fRe")).epsilon(5e-5));
        CHECK(constants->remark.empty());
    }
    // The rows carry six digits; f Re enters theirs with five.
    for (const auto& row : reference::select(rows, {{"quantity", "f_app*Re correlation (Fanning)"}})) {
        INFO(row.where());
        const auto constants = shah_constants(shape_named(row["geometry"]));
        REQUIRE(constants);
        CHECK(constants->apparent_friction_reynolds(row.stated("condition", "x+")) ==
              Approx(row.number("value")).epsilon(5e-5));
    }
}

// Boundary-layer solutions of hydrodynamic_entrance.csv; the correlation states a scatter of 2.4 %
TEST_CASE("The correlation of Shah 1978 is within its scatter of computed developing flow", "[handbook]")
{
    const auto rows = reference::read("hydrodynamic_entrance.csv");
    for (const char* geometry : {"circular tube", "parallel plates"}) {
        for (const auto& row : reference::select(rows, {{"quantity", "f_app*Re (Fanning)"}, {"geometry", geometry}})) {
            INFO(row.where());
            const double x_plus = row.stated("condition", "x+");
            if (x_plus >= 0.005 && x_plus <= 0.1) {
                CHECK(shah_constants(shape_named(geometry))->apparent_friction_reynolds(x_plus) ==
                      Approx(row.number("value")).epsilon(0.024));
            }
        }
    }
}

TEST_CASE("Annulus constants are interpolated between tabulated ones, and none lie outside", "[handbook]")
{
    const auto between = shah_constants(Annulus{3e-3, 1e-2, 1});
    REQUIRE(between);
    CHECK(between->excess == Approx((0.784 + 0.688) / 2));
    CHECK(between->blend == Approx((4.3e-5 + 3.2e-5) / 2));
    CHECK(between->friction_reynolds == Approx(23.4611846418).epsilon(1e-10)); // Shah & London 1978, r* = 0.3
    CHECK(between->remark == "K and C interpolated between r* = 0.1 and 0.5");
    CHECK_FALSE(shah_constants(Annulus{0.49e-3, 1e-2, 1}));
    CHECK_FALSE(shah_constants(Annulus{7.51e-3, 1e-2, 1}));

    const Passage outside = oil_in(Annulus{7.6e-3, 1e-2, 1});
    const HandbookEstimate none = handbook_estimate(outside, derive(outside));
    CHECK_FALSE(none.pressure_drop);
    CHECK(none.remark.find("0.05 to 0.75") != std::string::npos);
}

TEST_CASE("Pressure drops of the handbook", "[handbook]")
{
    Passage passage = test::oil_line();
    const Derived derived = derive(passage);
    const double x_plus = 0.5 / (8e-3 * derived.reynolds_number);
    const HandbookEstimate flat = handbook_estimate(passage, derived);
    REQUIRE(flat.pressure_drop);
    // Far down, 4 f_app Re x+ = 64 x+ + K within what the blend leaves: here C/x+^2 = 7e-4
    CHECK(*flat.pressure_drop == Approx((64 * x_plus + 1.25) * 865 * 0.45 * 0.45 / 2).epsilon(1e-3));
    CHECK(flat.source.find("Shah 1978") != std::string::npos);
    CHECK(flat.remark.find("below 1000") != std::string::npos);

    passage.inlet.mean_velocity = 4.5;
    CHECK(handbook_estimate(passage, derive(passage)).remark.empty());

    passage.inlet.mean_velocity = 0.45;
    passage.inlet.profile = InletProfile::developed;
    const HandbookEstimate developed = handbook_estimate(passage, derived);
    // Hagen-Poiseuille: 32 mu L u_m/D^2
    CHECK(developed.pressure_drop.value() == Approx(32 * 28e-3 * 0.5 * 0.45 / 64e-6).epsilon(1e-13));
    CHECK(developed.source.find("developed-flow formula") != std::string::npos);

    passage.inlet.profile = InletProfile::table;
    passage.inlet.table = VelocityTable{{0, 4e-3}, {1, 0}};
    const HandbookEstimate none = handbook_estimate(passage, derived);
    CHECK_FALSE(none.pressure_drop);
    CHECK_FALSE(none.remark.empty());
}
