#include "catch.hpp"
#include "coupling/exact_error.hpp"
#include "coupling/line_interpolation.hpp"
#include "reference/csv.hpp"

#include <charconv>

// Couette-Poiseuille flow (White, Viscous Fluid Flow; Bird, Stewart & Lightfoot): u/U = Y + P Y (1 - Y) between a wall
// at rest (Y = 0) and one that slides with U (Y = 1), P = -h^2/(2 mu U) dp/dx.

using namespace leat;
using namespace leat::test;

namespace {

constexpr double length = 2;

double profile(double gradient, double y)
{
    return y + gradient * y * (1 - y);
}

struct Solved {
    FlowCase flow;
    Solution solution;
    std::array<double, 3> errors;
};

Solved solve_on(int cells, double gradient, bool stretched)
{
    using coupling::FlowSide;
    const double viscosity = 0.05;
    const Faces y = mesh::sample(stretched ? mesh::towards_both(1.5) : mesh::uniform(), cells, 0, 1);
    Solved solved{{mesh::Grid<2>(mesh::Coordinates::cartesian, {mesh::sample(mesh::uniform(), cells, 0, length), y}),
                   {},
                   coupling::FlowState<2>(field::Layout<2>({cells, cells}))},
                  {},
                  {}};
    FlowCase& flow = solved.flow;
    flow.problem.viscosity = viscosity;
    flow.problem.sides = {{{FlowSide::fixed, FlowSide::open}, {FlowSide::fixed, FlowSide::fixed}}};
    flow.problem.schemes = {Scheme::linear_upwind, Scheme::central};
    // Inside, the first guess is nothing; at the inlet each face gets its mean of the exact profile.
    set_velocity(flow.grid, flow.state, 0, [](double x, double at) { return at == 1 && x > 0 ? 1 : 0; });
    const auto integral = [&](double at) { return at * at / 2 + gradient * at * at * (0.5 - at / 3); };
    for (int j = 0; j < cells; ++j) {
        flow.state.velocity[0][field::Layout<2>({cells, cells}).index({0, j})] =
            (integral(y[j + 1]) - integral(y[j])) / (y[j + 1] - y[j]);
    }
    cascade::CascadeSettings settings;
    settings.coupling_settings.relaxation = {0.7, 0.7};
    cascade::RunSettings run;
    run.scales = monitor::Scales{1, 1};
    run.rules = strict_rules(1e-11);
    solved.solution = solve(flow, settings, run);
    INFO("P = " << gradient << ", " << cells << " cells: " << solved.solution.run.message);
    REQUIRE(solved.solution.run.outcome == Outcome::converged);
    const double slope = 2 * viscosity * gradient;
    solved.errors =
        mean_errors(flow, solved.solution.state,
                    {{[&](double, double at) { return profile(gradient, at); }, [](double, double) { return 0; }},
                     [&](double x, double) { return slope * (length - x); }});
    return solved;
}

/// The number behind "dp/dx=" of "P=-(h^2/(2 mu U))dp/dx=-3; ...": it is P itself.
double stated_gradient(const std::string& condition)
{
    const std::string key = "dp/dx=";
    double gradient = 0;
    const char* end = condition.data() + condition.size();
    const auto found = condition.find(key);
    REQUIRE(found != std::string::npos);
    REQUIRE(std::from_chars(condition.data() + found + key.size(), end, gradient).ec == std::errc());
    return gradient;
}

} // namespace

TEST_CASE("Couette-Poiseuille flow: order 2 in velocity and pressure, with and without backflow", "[couette]")
{
    for (const bool stretched : {false, true}) {
        for (const double gradient : {-3.0, -1.0, 0.0, 2.0}) {
            std::array<double, 3> coarse = solve_on(16, gradient, stretched).errors;
            for (const int cells : {32, 64}) {
                const std::array<double, 3> fine = solve_on(cells, gradient, stretched).errors;
                for (int k = 0; k < 3; ++k) {
                    INFO("P = " << gradient << ", stretched " << stretched << ", unknown " << k << ", errors "
                                << coarse[k] << " " << fine[k]);
                    CHECK((fine[k] < 1e-10 || std::abs(observed_order(coarse[k], fine[k]) - 2) < 0.25));
                }
                coarse = fine;
            }
        }
    }
}

TEST_CASE("Couette-Poiseuille flow: the rows of the reference", "[couette]")
{
    const auto rows = reference::select(reference::read("exact_solutions.csv"),
                                        {{"geometry", "plane channel"}, {"quantity", "u/U Couette-Poiseuille"}});
    double solved_for = 1e9;
    Solved solved = solve_on(16, 0, false);
    for (const auto& row : rows) {
        const double gradient = stated_gradient(row["condition"]);
        if (gradient != solved_for) {
            solved = solve_on(32, gradient, false);
            solved_for = gradient;
        }
        const double y = row.stated("condition", "y/h");
        const mesh::ControlVolumes<2> volumes(solved.flow.grid, 0);
        std::vector<double> places, values;
        for (int j = 0; j < 32; ++j) {
            places.push_back(volumes.node[1][j]);
            values.push_back(solved.solution.state.velocity[0][field::Layout<2>({32, 32}).index({16, j})]);
        }
        INFO(row.where());
        CHECK(profile(gradient, y) == Approx(row.number("value")).epsilon(1e-12));
        CHECK(std::abs(interpolate(places, values, y) - row.number("value")) < 2e-3);
    }
}
