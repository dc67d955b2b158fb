#include "catch.hpp"

#include "correction_solver.hpp"

#include <leat/balance/balance.hpp>
#include <leat/mesh/grading.hpp>

#include <array>
#include <cmath>
#include <numbers>
#include <vector>

using namespace leat;
using balance::Side;

// Steady conduction in a box with a uniform source, against its double Fourier series by separation of variables
// (Carslaw & Jaeger 1959, chapters 3 and 6): value zero at x = 0 and 1, no flux at y = 0, exchange at y = a, value zero
// at z = 0, and a given flux at z = b.

namespace {

constexpr double a = 0.8;
constexpr double b = 0.6;
constexpr double conductivity = 0.7;
constexpr double exchange = 1.1; // flux per unit of difference
constexpr double source = 2.3;   // per unit of volume
constexpr double flux = 0.9;     // into the box, in the shape of the first wave along x and y

/// The n-th root of k beta tan(beta a) = exchange.
double root(int n)
{
    double low = n * std::numbers::pi / a;
    double high = (n + 0.5) * std::numbers::pi / a;
    for (int step = 0; step < 200; ++step) {
        const double beta = 0.5 * (low + high);
        const bool below = conductivity * beta * std::sin(beta * a) < exchange * std::cos(beta * a);
        // the sign of the cosine alternates from one interval to the next
        ((n % 2 == 0) == below ? low : high) = beta;
    }
    return 0.5 * (low + high);
}

/// The exact temperature at every node of the grid.
field::Values series(const balance::Transport<3>& transport)
{
    constexpr int waves = 40;
    const auto& v = transport.volumes();
    field::Values exact = field::zeros(transport.layout());
    std::vector<double> profile(std::size_t(v.nodes(2)));
    for (int n = 0; n < waves; ++n) {
        const double beta = root(n);
        const double part_y = (std::sin(beta * a) / beta) / (0.5 * a + std::sin(2 * beta * a) / (4 * beta));
        for (int m = 1; m < 2 * waves; m += 2) {
            const double alpha = m * std::numbers::pi;
            const double rate = std::hypot(alpha, beta);
            const double strength = 4 / alpha * part_y * source / conductivity / (rate * rate);
            for (int k = 0; k < v.nodes(2); ++k) {
                const double z = v.node[2][k];
                profile[k] = strength * (1 - std::cosh(rate * (b - z)) / std::cosh(rate * b));
                if (n == 0 && m == 1) {
                    profile[k] += flux / conductivity * std::sinh(rate * z) / (rate * std::cosh(rate * b));
                }
            }
            for (int i = 0; i < v.nodes(0); ++i) {
                for (int j = 0; j < v.nodes(1); ++j) {
                    const double shape = std::sin(alpha * v.node[0][i]) * std::cos(beta * v.node[1][j]);
                    for (int k = 0; k < v.nodes(2); ++k) {
                        exact[transport.layout().index({i, j, k})] += shape * profile[k];
                    }
                }
            }
        }
    }
    return exact;
}

/// Mean error over the box, relative to the largest temperature.
double error(int n)
{
    const mesh::Grid<3> grid(mesh::Coordinates::cartesian, {mesh::sample(mesh::towards_both(0.8), 8 * n, 0, 1),
                                                            mesh::sample(mesh::towards_end(0.7), 8 * n, 0, a),
                                                            mesh::sample(mesh::towards_both(0.5), 8 * n, 0, b)});
    balance::Transport<3>::Setup setup;
    setup.diffusivity = conductivity;
    setup.sides[1] = {Side{Side::Kind::flux, 0}, Side{Side::Kind::exchange, exchange}};
    setup.sides[2][1].kind = Side::Kind::flux;
    const balance::Transport<3> transport(grid, -1, setup);
    const mesh::ControlVolumes<3> cells(grid, -1);
    balance::Balance<3> balance(transport, cells, 1);
    field::Values sources = field::zeros(transport.layout());
    field::for_each_row<3>(transport.solved(), [&](std::array<int, 3> k) {
        for (; k[2] < transport.volumes().nodes(2); ++k[2]) {
            sources[transport.layout().index(k)] = source * cells.volume(k);
        }
    });
    const double beta = root(0);
    transport.add_side_flux(2, 1, sources, [&](const std::array<int, 3>& k) {
        return flux * std::sin(std::numbers::pi * cells.node[0][k[0]]) * std::cos(beta * cells.node[1][k[1]]);
    });
    const field::Values still = field::zeros(transport.layout());
    field::Values value = still;
    CorrectionSolver<3> solver(balance, {still.data(), still.data(), still.data()}, sources);
    solver.solve(value, 1e-11, 1000);
    CHECK(solver.reduction() <= 1e-11);

    const field::Values exact = series(transport);
    double sum = 0;
    double largest = 0;
    field::for_each_row<3>(transport.solved(), [&](std::array<int, 3> k) {
        for (; k[2] < transport.volumes().nodes(2); ++k[2]) {
            const std::ptrdiff_t at = transport.layout().index(k);
            sum += cells.volume(k) * std::abs(value[at] - exact[at]);
            largest = std::max(largest, exact[at]);
        }
    });
    return sum / (a * b * largest);
}

} // namespace

TEST_CASE("Diffusion in a box agrees with its Fourier series", "[balance]")
{
    const double coarse = error(1);
    const double middle = error(2);
    const double fine = error(4);
    INFO(coarse << ", " << middle << ", " << fine);
    CHECK(fine < 5e-4);
    CHECK(std::abs(std::log2(coarse / middle) - 2) < 0.15);
    CHECK(std::abs(std::log2(middle / fine) - 2) < 0.15);
}
