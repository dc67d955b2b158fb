#include "catch.hpp"
#include "duct.hpp"
#include "reference/csv.hpp"

#include <cmath>

using namespace leat;
using namespace leat::published;

// Fully developed flow enters, so that friction must be that of Poiseuille flow all along.
// Source of the constants: exact series of tests/reference/fd_friction.csv (Shah & London 1978, chapters V, VI, XII).

namespace {

constexpr double bound = 1e-3;
constexpr double reynolds_number = 100;
constexpr double length = 20;

double tabulated_friction(const Duct& duct, std::string_view condition)
{
    return reference::select(reference::read("fd_friction.csv"),
                             {{"geometry", duct.geometry}, {"quantity", "fRe_fanning_Dh"}, {"condition", condition}})
        .front()
        .number("value");
}

void check_default_grid(const Duct& duct, double friction)
{
    const Answer answer = solve(passage_of(duct));
    REQUIRE(answer.outcome == Outcome::converged);
    CHECK(std::abs(answer.numbers.friction_reynolds_outlet->value - friction) <= bound * friction);
    CHECK(std::abs(answer.numbers.apparent_friction_reynolds.value - friction) <= bound * friction);
}

void check_order(const Duct& duct, double friction)
{
    std::array<double, 3> local{};
    std::array<double, 3> apparent{};
    const std::array<std::array<int, 2>, 3> grids = {{{64, 16}, {128, 32}, {256, 64}}};
    for (std::size_t k = 0; k < grids.size(); ++k) {
        const Answer answer = solved(duct, grids[k]);
        local[k] = std::abs(answer.numbers.friction_reynolds_outlet->value - friction);
        apparent[k] = std::abs(answer.numbers.apparent_friction_reynolds.value - friction);
    }
    for (std::size_t k = 0; k < 2; ++k) {
        CHECK(std::log2(local[k] / local[k + 1]) == Approx(2).margin(0.2));
        CHECK(std::log2(apparent[k] / apparent[k + 1]) == Approx(2).margin(0.2));
    }
}

Duct developed_duct(std::string_view geometry, double radius_ratio = 0)
{
    return {geometry, reynolds_number, length, radius_ratio, InletProfile::developed, Outlet::continues};
}

void check_annulus(double radius_ratio, std::string_view condition)
{
    const Duct duct = developed_duct("concentric annulus", radius_ratio);
    const double friction = tabulated_friction(duct, condition);
    check_default_grid(duct, friction);
    check_order(duct, friction);
}

} // namespace

TEST_CASE("Poiseuille flow in a tube: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    const Duct duct = developed_duct("circular tube");
    check_default_grid(duct, 16);
    check_order(duct, 16);
}

TEST_CASE("Poiseuille flow in a channel: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    const Duct duct = developed_duct("parallel plates");
    check_default_grid(duct, 24);
    check_order(duct, 24);
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.001: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.001, "r*=0.001");
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.02: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.02, "r*=0.02");
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.15: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.15, "r*=0.15");
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.4: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.4, "r*=0.4");
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.7: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.7, "r*=0.7");
}

TEST_CASE("Poiseuille flow in an annulus of ratio 0.95: f Re within 0.1 % on the default grid, order 2", "[published]")
{
    check_annulus(0.95, "r*=0.95");
}
