#include "catch.hpp"

#include "poisson.hpp"

#include <leat/linear/stencil_system.hpp>

#include <algorithm>
#include <random>

using namespace leat;

namespace {

template <int D>
field::Values random_values(const field::Layout<D>& layout, unsigned seed)
{
    std::mt19937 random(seed);
    std::uniform_real_distribution<double> spread(-1, 1);
    field::Values values = field::zeros(layout);
    std::generate(values.begin(), values.end(), [&] { return spread(random); });
    return values;
}

/// Makes the system unsymmetric, as convection does, and keeps its diagonal dominant.
template <int D>
void add_wind(linear::StencilSystem<D>& system)
{
    for (int d = 0; d < D; ++d) {
        for (std::size_t at = 0; at < system.centre.size(); ++at) {
            const double wind = 0.8 * system.lower[d][at];
            system.lower[d][at] += wind;
            system.centre[at] -= wind;
        }
    }
}

template <int D>
void check_residual(const std::array<int, D>& nodes, const std::array<double, D>& strength)
{
    Poisson<D> problem(nodes, strength, true);
    add_wind<D>(problem.system);
    const field::Values x = random_values<D>(problem.system.layout, 1);
    field::Values out = field::zeros(problem.system.layout);
    linear::residual(problem.system, x, problem.right, out);
    const Eigen::VectorXd expected = problem.gathered(problem.right) - problem.matrix() * problem.gathered(x);
    CHECK((problem.gathered(out) - expected).norm() <= 1e-13 * expected.norm());
}

} // namespace

TEST_CASE("The residual of a stencil system is that of its matrix", "[linear]")
{
    check_residual<2>({9, 7}, {1, 3});
    check_residual<3>({5, 6, 7}, {1, 3, 0.2});
}

TEST_CASE("A line sweep solves one line exactly, in either direction", "[linear]")
{
    for (const bool backwards : {false, true}) {
        Poisson<2> problem({1, 200}, {1, 5}, true);
        add_wind<2>(problem.system);
        field::Values x = random_values<2>(problem.system.layout, 2);
        field::Values scratch(200);
        linear::line_sweep(problem.system, problem.right, backwards, x, scratch);
        field::Values out = field::zeros(problem.system.layout);
        linear::residual(problem.system, x, problem.right, out);
        CHECK(problem.gathered(out).cwiseAbs().maxCoeff() < 1e-12);
        CHECK(problem.gathered(x).cwiseAbs().maxCoeff() > 0.01);
    }
}

TEST_CASE("A line sweep is one of Gauss-Seidel's: the last line visited is satisfied, and no value is used twice",
          "[linear]")
{
    for (const bool backwards : {false, true}) {
        Poisson<3> problem({4, 5, 9}, {1, 0.5, 2}, true);
        field::Values x = random_values<3>(problem.system.layout, 4);
        field::Values scratch(9);
        linear::line_sweep(problem.system, problem.right, backwards, x, scratch);
        field::Values out = field::zeros(problem.system.layout);
        linear::residual(problem.system, x, problem.right, out);
        const auto line = [&](int i, int j) {
            double worst = 0;
            for (int k = 0; k < 9; ++k) {
                worst = std::max(worst, std::abs(out[problem.system.layout.index({i, j, k})]));
            }
            return worst;
        };
        CHECK(line(backwards ? 0 : 3, backwards ? 0 : 4) < 1e-13);
        CHECK(line(backwards ? 3 : 0, backwards ? 4 : 0) > 1e-3);
    }
}

TEST_CASE("Where nothing comes back from downstream one line sweep along the stream is exact", "[linear]")
{
    Poisson<2> problem({30, 12}, {1, 2}, true);
    for (double& upper : problem.system.upper[0]) {
        upper = 0; // nothing comes from the line above
    }
    field::Values x = random_values<2>(problem.system.layout, 6);
    field::Values against = x;
    field::Values scratch(12);
    field::Values out = field::zeros(problem.system.layout);
    linear::line_sweep(problem.system, problem.right, false, x, scratch);
    linear::residual(problem.system, x, problem.right, out);
    CHECK(problem.gathered(out).cwiseAbs().maxCoeff() < 1e-13);
    linear::line_sweep(problem.system, problem.right, true, against, scratch);
    linear::residual(problem.system, against, problem.right, out);
    CHECK(problem.gathered(out).cwiseAbs().maxCoeff() > 1e-2);
}
