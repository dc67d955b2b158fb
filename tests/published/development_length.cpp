#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <cmath>
#include <string>

using namespace leat;
using namespace leat::published;

// Where the core velocity has come within 1 % of its developed value behind a flat inlet.
// Source: tests/reference/hydrodynamic_entrance.csv: independent solutions of the full equations, and the formula of
// Durst, Ray, Unsal & Bayoumi 2005 (J. Fluids Eng. 127, 1154-1160), which its authors and those solutions place within
// 5 % of each other. The rows of the channel are on its gap: half the Re and twice the length on D_h.

namespace {

constexpr std::array<int, 2> cells = {320, 80};

struct Kind {
    std::string_view geometry;
    std::string_view quantity;
    double gap_over_diameter; // length of the rows over the hydraulic diameter
};
constexpr Kind tube = {"circular tube", "development length L/D", 1};
constexpr Kind channel = {"parallel plates", "development length L/h (h gap, Re=um h/nu)", 0.5};

void compare(const Kind& kind, bool formula, double bound)
{
    const auto rows = reference::select(reference::read("hydrodynamic_entrance.csv"),
                                        {{"geometry", kind.geometry}, {"quantity", kind.quantity}});
    int count = 0;
    for (const reference::Row& row : rows) {
        if ((row["source"].find("Durst") == 0) != formula) {
            continue;
        }
        const double stated = row.number("value") * kind.gap_over_diameter;
        const Duct duct = {kind.geometry, row.stated("condition", "Re") / kind.gap_over_diameter, 2 * stated};
        const Answer answer = solved(duct, cells);
        const double computed = answer.numbers.development_length.value().value / hydraulic_diameter;
        INFO(row.where() << ": " << computed << " D_h, stated " << stated << ", Re " << duct.reynolds_number);
        CHECK(std::abs(computed - stated) <= bound * stated);
        ++count;
    }
    CHECK(count >= 5);
}

} // namespace

TEST_CASE("Development length of a tube from Re 0.01 on within 0.5 %, grid 320 x 80", "[published]")
{
    compare(tube, false, 5e-3);
}

TEST_CASE("Development length of a channel from Re 0.01 on within 0.5 %, grid 320 x 80", "[published]")
{
    compare(channel, false, 5e-3);
}

TEST_CASE("Development length of a tube within 5 % of Durst et al. 2005, grid 320 x 80", "[published]")
{
    compare(tube, true, 5e-2);
}

TEST_CASE("Development length of a channel within 5 % of Durst et al. 2005, grid 320 x 80", "[published]")
{
    compare(channel, true, 5e-2);
}
