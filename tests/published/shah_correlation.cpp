#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <cmath>
#include <map>
#include <string>

using namespace leat;
using namespace leat::published;

// Apparent friction from the core pressure against the correlation of Shah 1978 (J. Fluids Eng. 100, 177-179), whose
// stated scatter is 2.4 %. Source of its values: tests/reference/hydrodynamic_entrance.csv.

namespace {

void compare(std::string_view geometry)
{
    const auto rows = reference::select(reference::read("hydrodynamic_entrance.csv"),
                                        {{"geometry", geometry}, {"quantity", "f_app*Re correlation (Fanning)"}});
    constexpr double re = 1e5;
    std::map<double, double> stated; // by x+
    for (const reference::Row& row : rows) {
        const double x_plus = row.stated("condition", "x+");
        if (x_plus >= 0.005 && x_plus <= 0.1) {
            stated[x_plus] = row.number("value");
        }
    }
    REQUIRE(stated.size() >= 3);
    std::vector<double> stations;
    for (const auto& [x_plus, friction] : stated) {
        stations.push_back(x_plus * re);
    }
    const Answer answer = solved({geometry, re, 0.105 * re}, {640, 160}, stations);
    for (const auto& [x_plus, friction] : stated) {
        const double computed = *answer.stations.apparent_friction_reynolds[station_at(answer, x_plus * re)];
        INFO("x+ = " << x_plus << ": " << computed << ", correlation " << friction);
        CHECK(std::abs(computed - friction) <= 0.024 * friction);
    }
}

} // namespace

TEST_CASE("Apparent friction of a tube at Re 1e5 within 2.4 % of Shah 1978, grid 640 x 160", "[published]")
{
    compare("circular tube");
}

TEST_CASE("Apparent friction of a channel at Re 1e5 within 2.4 % of Shah 1978, grid 640 x 160", "[published]")
{
    compare("parallel plates");
}
