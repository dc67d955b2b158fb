#include "catch.hpp"
#include "coupling/exact_error.hpp"

// A manufactured solution of the steady Navier-Stokes equations in cylindrical coordinates (method: Roache 2002,
// J. Fluids Eng. 124, 4-10), with flow through the wall, an axis and an open end of zero traction:
//   u = U(r) B(x), v = -V(r) B'(x), U = 1 - r^4, V = r/2 - r^5/6, B = 1 + b (L - x)^3, p = (L - x)(2 + r^2).
// B' and B'' vanish at x = L, so that du/dx = dv/dx = p = 0 there.

using namespace leat;
using namespace leat::test;

namespace {

constexpr double length = 1.5;
constexpr double strength = 0.3;
constexpr double viscosity = 0.02;
constexpr double density = 1.3;

double U(double r)
{
    return 1 - r * r * r * r;
}
double V(double r)
{
    return r / 2 - r * r * r * r * r / 6;
}
double B(double x)
{
    return 1 + strength * std::pow(length - x, 3);
}
double B1(double x)
{
    return -3 * strength * std::pow(length - x, 2);
}
double B2(double x)
{
    return 6 * strength * (length - x);
}
constexpr double B3 = -6 * strength;
double u(double x, double r)
{
    return U(r) * B(x);
}
double v(double x, double r)
{
    return -V(r) * B1(x);
}
double p(double x, double r)
{
    return (length - x) * (2 + r * r);
}
double psi(double x, double r)
{
    return (r * r / 2 - std::pow(r, 6) / 6) * B(x);
}

/// Force per volume that the exact flow needs along x: U' = -4 r^3, U'' + U'/r = -16 r^2.
double axial_force(double x, double r)
{
    const double convection = u(x, r) * U(r) * B1(x) + v(x, r) * -4 * r * r * r * B(x);
    const double diffusion = U(r) * B2(x) - 16 * r * r * B(x);
    return density * convection - (2 + r * r) - viscosity * diffusion;
}

/// And along r: V' = 1/2 - 5 r^4/6, V'' + V'/r - V/r^2 = -4 r^3.
double radial_force(double x, double r)
{
    const double convection = u(x, r) * -V(r) * B2(x) + v(x, r) * -(0.5 - 5 * r * r * r * r / 6) * B1(x);
    const double diffusion = -V(r) * B3 + 4 * r * r * r * B1(x);
    return density * convection + (length - x) * 2 * r - viscosity * diffusion;
}

/// Integral over a volume by two Gauss points along each direction.
double integral(const mesh::ControlVolumes<2>& volumes, int i, int j, const Function& force)
{
    double sum = 0;
    const double offset = std::sqrt(1.0 / 3);
    for (const double a : {-offset, offset}) {
        for (const double b : {-offset, offset}) {
            const double dx = volumes.face[0][i + 1] - volumes.face[0][i];
            const double dr = volumes.face[1][j + 1] - volumes.face[1][j];
            const double x = volumes.face[0][i] + 0.5 * (1 + a) * dx;
            const double r = volumes.face[1][j] + 0.5 * (1 + b) * dr;
            sum += 0.25 * dx * dr * r * force(x, r);
        }
    }
    return sum;
}

std::array<double, 3> errors_on(int cells, bool stretched, bool open, const std::array<Scheme, 2>& schemes)
{
    using coupling::FlowSide;
    const Faces x = mesh::sample(stretched ? mesh::towards_start(1) : mesh::uniform(), 2 * cells, 0, length);
    const Faces r = mesh::sample(stretched ? mesh::towards_end(1) : mesh::uniform(), cells, 0, 1);
    FlowCase flow{mesh::Grid<2>(mesh::Coordinates::cylindrical, {x, r}),
                  {},
                  coupling::FlowState<2>(field::Layout<2>({2 * cells, cells}))};
    flow.problem.density = density;
    flow.problem.viscosity = viscosity;
    flow.problem.sides = {
        {{FlowSide::fixed, open ? FlowSide::open : FlowSide::fixed}, {FlowSide::symmetry, FlowSide::fixed}}};
    flow.problem.schemes = schemes;
    set_velocity(flow.grid, flow.state, 0, u);
    set_velocity(flow.grid, flow.state, 1, v);
    set_stream(flow.grid, flow.state, psi);
    coupling::FlowState<2> source((field::Layout<2>({2 * cells, cells})));
    for (int c = 0; c < 2; ++c) {
        const mesh::ControlVolumes<2> volumes(flow.grid, c);
        for (int i = 0; i < volumes.nodes(0); ++i) {
            for (int j = 0; j < volumes.nodes(1); ++j) {
                source.velocity[c][field::Layout<2>({2 * cells, cells}).index({i, j})] =
                    integral(volumes, i, j, c == 0 ? axial_force : radial_force);
            }
        }
    }
    cascade::CascadeSettings settings;
    settings.coupling_settings.relaxation = {0.7, 0.7};
    cascade::RunSettings run;
    run.scales = monitor::Scales{1, 1};
    run.rules = strict_rules(1e-10);
    const Solution solution = solve(flow, settings, run, &source);
    INFO(cells << " cells, open " << open << ": " << solution.run.message);
    REQUIRE(solution.run.outcome == Outcome::converged);
    return mean_errors(flow, solution.state, {{u, v}, p});
}

} // namespace

TEST_CASE("Manufactured Navier-Stokes solution in a cylindrical grid: order 2 in u, v and p", "[manufactured]")
{
    for (const bool stretched : {false, true}) {
        for (const bool open : {false, true}) {
            const std::array<Scheme, 2> schemes = {Scheme::linear_upwind, Scheme::central};
            std::array<double, 3> coarse = errors_on(16, stretched, open, schemes);
            for (const int cells : {32, 64}) {
                const std::array<double, 3> fine = errors_on(cells, stretched, open, schemes);
                for (int k = 0; k < 3; ++k) {
                    INFO("stretched " << stretched << ", open " << open << ", " << cells << " cells, unknown " << k
                                      << ", errors " << coarse[k] << " " << fine[k] << ", order "
                                      << observed_order(coarse[k], fine[k]));
                    CHECK(std::abs(observed_order(coarse[k], fine[k]) - 2) < 0.25);
                }
                coarse = fine;
            }
        }
    }
}

TEST_CASE("Manufactured Navier-Stokes solution: a first-order scheme is told apart", "[manufactured]")
{
    const std::array<double, 3> coarse = errors_on(16, false, true, {Scheme::upwind, Scheme::upwind});
    const std::array<double, 3> fine = errors_on(32, false, true, {Scheme::upwind, Scheme::upwind});
    CHECK(observed_order(coarse[0], fine[0]) < 1.5);
}
