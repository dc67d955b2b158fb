#include "catch.hpp"
#include "reference/csv.hpp"

#include <leat/cascade/grid_convergence.hpp>

#include <cmath>
#include <map>
#include <sstream>

using namespace leat;
using namespace leat::cascade;

namespace {

/// "...; phi=6.063,5.972,5.863"
std::array<double, 3> values_in(const std::string& condition)
{
    std::array<double, 3> values{};
    std::istringstream list(condition.substr(condition.find("phi=") + 4));
    for (double& value : values) {
        list >> value;
        list.ignore(1);
    }
    return values;
}

/// Exact ratios from the counts of cells where they are stated (r = (N1/N2)^(1/2)), else the stated ones.
std::array<double, 2> ratios_in(const std::string& condition)
{
    if (condition.starts_with("example 1")) {
        return {std::sqrt(18000.0 / 8000), std::sqrt(8000.0 / 4500)};
    }
    return {2, 2.143};
}

} // namespace

TEST_CASE("Worked examples of the grid convergence index (Celik et al. 2008)", "[band]")
{
    int compared = 0;
    for (const reference::Row& row :
         reference::select(reference::read("practice_and_gci.csv"), {{"geometry", "GCI worked example"}})) {
        const std::string& condition = row["condition"];
        const std::array<double, 3> values = values_in(condition);
        const std::optional<GridConvergence> found = grid_convergence(values, ratios_in(condition));
        REQUIRE(found);
        const std::map<std::string, double> quantities = {
            {"apparent order p", found->order},
            {"e_a21", found->approximate_error / std::abs(values[0])},
            {"phi_ext21", found->extrapolated},
            {"e_ext21", found->extrapolated_error / std::abs(found->extrapolated)},
            {"GCI_fine21", found->index / std::abs(values[0])}};
        INFO(condition << ", " << row["quantity"]);
        CHECK(quantities.at(row["quantity"]) == Approx(row.number("value")).epsilon(2e-5));
        ++compared;
    }
    CHECK(compared == 10);
}

TEST_CASE("Two-grid index with assumed order (Roache 1994)", "[band]")
{
    for (const reference::Row& row :
         reference::select(reference::read("practice_and_gci.csv"), {{"geometry", "GCI definition"}})) {
        const double absolute = grid_convergence_index(1.00, 1.01, 2, 2, 3);
        CHECK(absolute == Approx(row.number("value")).epsilon(row.number("tolerance")));
    }
}

TEST_CASE("Increments that no order explains give none", "[band]")
{
    CHECK_FALSE(apparent_order(0, 1, 2, 2));
    CHECK_FALSE(apparent_order(1, 0, 2, 2));
    CHECK_FALSE(apparent_order(1, 1, 2, 2));
    CHECK_FALSE(apparent_order(NAN, 1, 2, 2));
    CHECK(apparent_order(1, 4, 2, 2).value() == Approx(2).epsilon(1e-12));
    CHECK(apparent_order(1, 2, 2, 2).value() == Approx(1).epsilon(1e-12));
}
