#include "catch.hpp"
#include "coupling/exact_error.hpp"
#include "reference/csv.hpp"

#include <numbers>

// Kovasznay (1948): laminar flow behind a two-dimensional grid, an exact solution of the Navier-Stokes equations.

using namespace leat;
using namespace leat::test;

namespace {

constexpr double two_pi = 2 * std::numbers::pi;

/// The exact flow at a Reynolds number on unit velocity and spacing.
struct Kovasznay {
    double reynolds;
    double decay = reynolds / 2 - std::sqrt(reynolds * reynolds / 4 + two_pi * two_pi);

    double u(double x, double y) const { return 1 - std::exp(decay * x) * std::cos(two_pi * y); }
    double v(double x, double y) const { return decay / two_pi * std::exp(decay * x) * std::sin(two_pi * y); }
    double p(double x) const { return (1 - std::exp(2 * decay * x)) / 2; }
    double psi(double x, double y) const { return y - std::exp(decay * x) * std::sin(two_pi * y) / two_pi; }
    ExactFlow flow() const
    {
        return {{[*this](double x, double y) { return u(x, y); }, [*this](double x, double y) { return v(x, y); }},
                [*this](double x, double) { return p(x); }};
    }
};

/// Mean errors with every velocity on every side given. The sides cut through the wake off its symmetry lines.
std::array<double, 3> errors_on(int cells, bool stretched, Scheme along)
{
    const Kovasznay exact{40};
    const mesh::Grading grading = stretched ? mesh::towards_start(1.2) : mesh::uniform();
    FlowCase flow{mesh::Grid<2>(mesh::Coordinates::cartesian,
                                {mesh::sample(grading, cells, -0.5, 1), mesh::sample(grading, cells, -0.4, 0.7)}),
                  {},
                  coupling::FlowState<2>(field::Layout<2>({cells, cells}))};
    flow.problem.viscosity = 1 / exact.reynolds;
    flow.problem.schemes = {along, Scheme::central};
    for (int c = 0; c < 2; ++c) {
        set_velocity(flow.grid, flow.state, c, exact.flow().velocity[c]);
    }
    set_stream(flow.grid, flow.state, [&](double x, double y) { return exact.psi(x, y); });
    cascade::CascadeSettings settings;
    settings.coupling_settings.relaxation = {0.7, 0.7};
    cascade::RunSettings run;
    run.scales = monitor::Scales{1, 1};
    run.rules = strict_rules(1e-10);
    const Solution solution = solve(flow, settings, run);
    INFO(cells << " cells: " << solution.run.message);
    REQUIRE(solution.run.outcome == Outcome::converged);
    return mean_errors(flow, solution.state, exact.flow());
}

} // namespace

TEST_CASE("The Kovasznay flow of the tests is that of the reference rows", "[kovasznay]")
{
    const auto rows = reference::select(reference::read("exact_solutions.csv"), {{"geometry", "plane periodic wake"}});
    for (const auto& row : rows) {
        INFO(row.where());
        const Kovasznay exact{row.stated("condition", "Re")};
        const std::string& quantity = row["quantity"];
        if (quantity == "Kovasznay lambda") {
            CHECK(exact.decay == Approx(row.number("value")).epsilon(1e-8));
            continue;
        }
        const double x = row.stated("condition", "x");
        const double y = row.stated("condition", "y");
        const double value = quantity == "Kovasznay u"   ? exact.u(x, y)
                             : quantity == "Kovasznay v" ? exact.v(x, y)
                                                         : exact.p(x);
        CHECK(std::abs(value - row.number("value")) < 1e-10);
    }
}

TEST_CASE("Kovasznay flow: order 2 in velocity and pressure", "[kovasznay]")
{
    for (const bool stretched : {false, true}) {
        std::array<double, 3> coarse = errors_on(16, stretched, Scheme::linear_upwind);
        for (const int cells : {32, 64, 128}) {
            const std::array<double, 3> fine = errors_on(cells, stretched, Scheme::linear_upwind);
            INFO((stretched ? "stretched, " : "uniform, ")
                 << cells << " cells, errors " << fine[0] << " " << fine[1] << " " << fine[2]);
            for (int k = 0; k < 3; ++k) {
                INFO("unknown " << k << ", order " << observed_order(coarse[k], fine[k]));
                if (cells > 32) {
                    CHECK(observed_order(coarse[k], fine[k]) > 1.85);
                    CHECK(observed_order(coarse[k], fine[k]) < 2.6);
                }
            }
            coarse = fine;
        }
        CHECK(coarse[0] < 1e-3);
        CHECK(coarse[1] < 1e-3);
        CHECK(coarse[2] < 1e-3);
    }
}

TEST_CASE("Kovasznay flow: a first-order scheme is told apart", "[kovasznay]")
{
    const std::array<double, 3> coarse = errors_on(32, false, Scheme::upwind);
    const std::array<double, 3> fine = errors_on(64, false, Scheme::upwind);
    CHECK(observed_order(coarse[0], fine[0]) < 1.5);
    CHECK(observed_order(coarse[2], fine[2]) < 1.5);
}
