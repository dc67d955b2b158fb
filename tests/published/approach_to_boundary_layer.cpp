#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <algorithm>
#include <cmath>

using namespace leat;
using namespace leat::published;

// A flat inlet without cross velocity leaves a non-uniform inlet pressure, so that numbers that contain the core
// pressure of the inlet plane approach their boundary-layer limits only like Re^(-1/2).
// Source: tests/reference/approach_to_bl.csv and the formulas of tests/reference/README.md, fitted to independent
// solutions of the full equations; the limits of K are those that Shah & London 1978 recommend, to 0.5 %.

namespace {

constexpr double bound = 5e-3;

struct Approach {
    double limit = 0;
    double root = 0;    ///< x Re^(-1/2)
    double inverse = 0; ///< x 1/Re

    double at(double reynolds_number) const
    {
        return limit + root / std::sqrt(reynolds_number) + inverse / reynolds_number;
    }
};

struct Kind {
    std::string_view geometry;
    Approach incremental_pressure; // K at x+ = 0.2
    Approach development_length;   // /(D_h Re)
};
constexpr Kind tube = {"circular tube", {1.2473, -2.53, -8.1}, {0.05534, 0.0241, 0.037}};
constexpr Kind channel = {"parallel plates", {0.6694, -1.76, -6.2}, {0.01080, 0.01205, 0.008}};
constexpr std::array<double, 5> reynolds_numbers = {500, 1e3, 2e3, 1e4, 1e5};

void compare_numbers(const Kind& kind)
{
    for (const double re : reynolds_numbers) {
        const Answer answer = solved({kind.geometry, re, 0.2 * re}, {640, 160});
        const double pressure = answer.numbers.incremental_pressure_number.value;
        const double length = answer.numbers.development_length.value().value / (hydraulic_diameter * re);
        INFO(kind.geometry << ", Re " << re << ": K " << pressure << " (" << kind.incremental_pressure.at(re)
                           << "), development length " << length << " (" << kind.development_length.at(re) << ")");
        CHECK(std::abs(pressure - kind.incremental_pressure.at(re)) <= bound * kind.incremental_pressure.at(re));
        CHECK(std::abs(length - kind.development_length.at(re)) <= bound * kind.development_length.at(re));
    }
}

void compare_apparent_friction(const Kind& kind)
{
    const auto rows = reference::select(reference::read("approach_to_bl.csv"),
                                        {{"geometry", kind.geometry}, {"quantity", "p_core drop"}});
    for (const double re : {1e3, 1e4, 1e5}) {
        std::vector<double> stations;
        for (const reference::Row& row : rows) {
            stations.push_back(row.number("x_plus") * re);
        }
        std::sort(stations.begin(), stations.end());
        const Duct duct = {kind.geometry, re, 0.21 * re};
        const Answer answer = solved(duct, {640, 160}, stations);
        int count = 0;
        for (const reference::Row& row : rows) {
            const double x_plus = row.number("x_plus");
            if (x_plus < 0.001) {
                continue;
            }
            const Approach drop = {row.number("boundary_layer_limit"), row.number("coef_Re_-1/2"),
                                   row.number("coef_Re_-1")};
            const double friction = drop.at(re) / (4 * x_plus);
            const double computed = *answer.stations.apparent_friction_reynolds[station_at(answer, x_plus * re)];
            INFO(row.where() << ", Re " << re << ", x+ " << x_plus << ": " << computed << ", fit " << friction);
            CHECK(std::abs(computed - friction) <= bound * std::max(friction, developed_friction_reynolds(duct)));
            ++count;
        }
        CHECK(count >= 8);
    }
}

} // namespace

TEST_CASE("K and development length of a tube against Re within 0.5 %, grid 640 x 160", "[published]")
{
    compare_numbers(tube);
}

TEST_CASE("K and development length of a channel against Re within 0.5 %, grid 640 x 160", "[published]")
{
    compare_numbers(channel);
}

TEST_CASE("Apparent friction of a tube approaches its limit within 0.5 %, grid 640 x 160", "[published]")
{
    compare_apparent_friction(tube);
}

TEST_CASE("Apparent friction of a channel approaches its limit within 0.5 %, grid 640 x 160", "[published]")
{
    compare_apparent_friction(channel);
}
