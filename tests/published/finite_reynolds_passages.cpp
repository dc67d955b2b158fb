#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <algorithm>
#include <cmath>
#include <map>
#include <string>

using namespace leat;
using namespace leat::published;

// Whole passages of 1.5 and 0.2 development lengths behind a flat inlet.
// Source: tests/reference/finite_re.csv, independent solutions of the full equations: `value_continued` for a duct that
// goes on beyond the end, `value` for one cut there.

namespace {

constexpr double bound = 2e-3;
constexpr double bound_outlet_dominated = 2e-2; // rows that live from the exact form of the cut
constexpr std::array<int, 2> cells = {320, 80};

struct Comparison {
    double computed = 0;
    double least_scale = 0; ///< errors are relative to max(|reference|, this)
};

Comparison compared(const Duct& duct, const Answer& answer, const std::string& quantity)
{
    const Numbers& numbers = answer.numbers;
    if (quantity == "core pressure drop/(rho um^2/2)") {
        return {numbers.pressure_drop.value / dynamic_pressure,
                4 * developed_friction_reynolds(duct) * duct.length / duct.reynolds_number};
    }
    if (quantity == "peak velocity at outlet/um") {
        return {numbers.peak_velocity_ratio.value, 0};
    }
    if (quantity == "axis velocity at outlet/um") {
        return {numbers.core_velocity_ratio.value, 0};
    }
    if (quantity == "development length/Dh") {
        return {numbers.development_length.value().value / hydraulic_diameter, 0};
    }
    if (quantity == "local f Re at x = 0.8 L") {
        const std::size_t k = station_at(answer, 0.8 * duct.length);
        return {answer.stations.local_friction_reynolds[k].value(), 0};
    }
    REQUIRE(quantity == "local f Re at outlet");
    return {numbers.friction_reynolds_outlet.value().value, 0};
}

void compare(std::string_view geometry, Outlet outlet)
{
    const bool cut = outlet == Outlet::cut;
    const auto rows = reference::select(reference::read("finite_re.csv"), {{"geometry", geometry}});
    std::map<std::string, Answer> answers;
    int count = 0;
    for (const reference::Row& row : rows) {
        const std::string column = cut ? "value" : "value_continued";
        if (row[column].empty()) {
            continue; // not known for a duct that goes on
        }
        const Duct duct = {geometry, row.number("reynolds_dh"), row.number("length_over_dh"),
                           0,        InletProfile::flat,        outlet};
        const std::string key = row["reynolds_dh"] + "/" + row["length_over_dh"];
        if (!answers.contains(key)) {
            answers[key] = solved(duct, cells, {0.8 * duct.length});
        }
        const Answer& answer = answers[key];
        if (cut && row["quantity"] == "local f Re at outlet") {
            CHECK_FALSE(answer.numbers.friction_reynolds_outlet.has_value()); // converges too slowly to be given
            continue;
        }
        const double reference = row.number(column);
        const Comparison with = compared(duct, answer, row["quantity"]);
        const bool dominated = row["note"].find("OUTLET-DOMINATED") != std::string::npos;
        INFO(row.where() << ": " << row["quantity"] << ", Re " << duct.reynolds_number << ": " << with.computed
                         << ", stated " << reference);
        CHECK(std::abs(with.computed - reference) <=
              (dominated ? bound_outlet_dominated : bound) * std::max(std::abs(reference), with.least_scale));
        ++count;
    }
    CHECK(count >= 12);
}

} // namespace

TEST_CASE("Whole tubes that go on: numbers within 0.2 %, grid 320 x 80", "[published]")
{
    compare("circular tube", Outlet::continues);
}

TEST_CASE("Whole channels that go on: numbers within 0.2 %, grid 320 x 80", "[published]")
{
    compare("parallel plates", Outlet::continues);
}

TEST_CASE("Whole tubes cut at the end: numbers within 0.2 %, grid 320 x 80", "[published]")
{
    compare("circular tube", Outlet::cut);
}

TEST_CASE("Whole channels cut at the end: numbers within 0.2 %, grid 320 x 80", "[published]")
{
    compare("parallel plates", Outlet::cut);
}
