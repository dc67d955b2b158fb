#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <cmath>
#include <set>
#include <string>

using namespace leat;
using namespace leat::published;

// Boundary-layer values along annuli, which the full equations reach within 1 % at Re 1e5 from x+ = 0.01 on.
// Source: tests/reference/hydrodynamic_entrance.csv, compared there with Shah & London 1978.

namespace {

constexpr double bound = 1e-2;
constexpr double from = 0.01; // x+
constexpr double reynolds_number = 1e5;

void compare(double radius_ratio)
{
    std::vector<reference::Row> rows;
    std::set<double> stations;
    for (const reference::Row& row :
         reference::select(reference::read("hydrodynamic_entrance.csv"), {{"geometry", "concentric annulus"}})) {
        if (row["condition"].find("x+=") == std::string::npos || row.stated("condition", "r*") != radius_ratio ||
            row.stated("condition", "x+") < from) {
            continue;
        }
        rows.push_back(row);
        stations.insert(row.stated("condition", "x+") * reynolds_number);
    }
    REQUIRE(rows.size() >= 6);
    const Duct duct = {"concentric annulus", reynolds_number, 0.105 * reynolds_number, radius_ratio};
    const Answer answer = solved(duct, {640, 160}, {stations.begin(), stations.end()});
    for (const reference::Row& row : rows) {
        const std::size_t k = station_at(answer, row.stated("condition", "x+") * reynolds_number);
        const bool friction = row["quantity"] == "f_app*Re (Fanning)";
        if (!friction) {
            REQUIRE(row["quantity"] == "u_max/um developing");
        }
        const double computed =
            friction ? *answer.stations.apparent_friction_reynolds[k] : *answer.stations.peak_velocity_ratio[k];
        INFO(row.where() << ": " << row["quantity"] << " at " << row["condition"] << ": " << computed << ", table "
                         << row.number("value"));
        CHECK(std::abs(computed - row.number("value")) <= bound * row.number("value"));
    }
}

} // namespace

TEST_CASE("Entrance of an annulus of ratio 0.05 at Re 1e5 within 1 %, grid 640 x 160", "[published]")
{
    compare(0.05);
}

TEST_CASE("Entrance of an annulus of ratio 0.25 at Re 1e5 within 1 %, grid 640 x 160", "[published]")
{
    compare(0.25);
}

TEST_CASE("Entrance of an annulus of ratio 0.5 at Re 1e5 within 1 %, grid 640 x 160", "[published]")
{
    compare(0.5);
}
