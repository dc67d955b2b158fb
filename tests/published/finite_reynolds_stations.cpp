#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <algorithm>
#include <cmath>
#include <string>

using namespace leat;
using namespace leat::published;

// Developing flow behind a flat inlet in a duct that goes on, along the duct.
// Source: tests/reference/finite_re_stations.csv, independent solutions of the full equations, errors below 2e-4.
// The values compared are those of one grid, named with the test; nothing is extrapolated.

namespace {

constexpr double nearest = 0.001; // x+ of the first station compared
constexpr double far = 0.01;      // from this x+ on the bound is tighter
constexpr double bound_near = 3e-3;
constexpr double bound_far = 1e-3;
constexpr double anchor = 0.2; // x+ that section-mean pressures are relative to

struct Comparison {
    double computed = 0;
    double least_scale = 0; ///< errors are relative to max(|reference|, this)
};

Comparison compared(const Duct& duct, const Answer& answer, const std::string& quantity, double x_plus)
{
    const double re = duct.reynolds_number;
    const std::size_t k = station_at(answer, x_plus * re);
    const double gradient = 4 * developed_friction_reynolds(duct); // of pressure/(rho u_m^2/2) by x+
    const Stations& stations = answer.stations;
    if (quantity == "axis velocity/um") {
        return {stations.core_velocity_ratio[k].value(), 0};
    }
    if (quantity == "(core p at x=0 minus axis p)/(rho um^2/2)") {
        const double drop = *stations.core_pressure[station_at(answer, 0)] - *stations.core_pressure[k];
        return {drop / dynamic_pressure, gradient * x_plus};
    }
    if (quantity == "(section-mean p(x) minus section-mean p(x+=0.2))/(rho um^2/2)") {
        const double drop =
            stations.mean_pressure[k].value() - stations.mean_pressure[station_at(answer, anchor * re)].value();
        return {drop / dynamic_pressure, gradient * std::abs(anchor - x_plus)};
    }
    REQUIRE(quantity == "local f Re (Fanning)");
    return {stations.local_friction_reynolds[k].value(), 0};
}

void compare(std::string_view geometry, const std::string& reynolds_number, std::array<int, 2> cells)
{
    const auto rows = reference::select(reference::read("finite_re_stations.csv"),
                                        {{"geometry", geometry}, {"reynolds_dh", reynolds_number}});
    const double re = std::stod(reynolds_number);
    std::vector<double> stations = {0, anchor * re};
    for (const reference::Row& row : rows) {
        stations.push_back(row.number("x_plus") * re);
    }
    std::sort(stations.begin(), stations.end());
    stations.erase(
        std::unique(stations.begin(), stations.end(), [](double a, double b) { return std::abs(a - b) <= 1e-9 * b; }),
        stations.end());
    const Duct duct = {geometry, re, 1.05 * anchor * re};
    const Answer answer = solved(duct, cells, stations);
    int count = 0;
    for (const reference::Row& row : rows) {
        const double x_plus = row.number("x_plus");
        if (x_plus < nearest) {
            continue;
        }
        const double reference = row.number("value");
        const Comparison with = compared(duct, answer, row["quantity"], x_plus);
        const double bound = x_plus < far ? bound_near : bound_far;
        INFO(row.where() << ": " << row["quantity"] << " at x+ = " << x_plus << ": " << with.computed);
        CHECK(std::abs(with.computed - reference) <= bound * std::max(std::abs(reference), with.least_scale));
        ++count;
    }
    CHECK(count > 60);
}

} // namespace

TEST_CASE("Developing flow along a tube at Re 100, grid 320 x 80", "[published]")
{
    compare("circular tube", "100", {320, 80});
}

TEST_CASE("Developing flow along a tube at Re 1000, grid 320 x 80", "[published]")
{
    compare("circular tube", "1000", {320, 80});
}

TEST_CASE("Developing flow along a tube at Re 1e4, grid 640 x 160", "[published]")
{
    compare("circular tube", "10000", {640, 160});
}

TEST_CASE("Developing flow along a channel at Re 100, grid 320 x 80", "[published]")
{
    compare("parallel plates", "100", {320, 80});
}

TEST_CASE("Developing flow along a channel at Re 1000, grid 320 x 80", "[published]")
{
    compare("parallel plates", "1000", {320, 80});
}

TEST_CASE("Developing flow along a channel at Re 1e4, grid 640 x 160", "[published]")
{
    compare("parallel plates", "10000", {640, 160});
}
