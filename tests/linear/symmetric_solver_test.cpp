#include "catch.hpp"

#include "poisson.hpp"

#include <leat/linear/symmetric_solver.hpp>

#include <Eigen/SparseCholesky>

#include <algorithm>
#include <cmath>

using namespace leat;

namespace {

/// Iterations to reduce the residual to `tolerance`; checks the solution on the way.
template <int D>
int iterations(const std::array<int, D>& nodes, const std::array<double, D>& strength, bool fixed,
               double tolerance = 1e-10)
{
    const Poisson<D> problem(nodes, strength, fixed);
    linear::SymmetricSolver<D> solver(problem.system.layout, problem.system.box);
    solver.prepare(problem.system, !fixed);
    field::Values x = field::zeros(problem.system.layout);
    const auto result = solver.solve(problem.right, x, tolerance, 500);
    CHECK(result.reduction <= tolerance);
    field::Values out = field::zeros(problem.system.layout);
    linear::residual(problem.system, x, problem.right, out);
    CHECK(problem.gathered(out).norm() <= 2 * tolerance * problem.gathered(problem.right).norm());
    return result.iterations;
}

/// Largest difference from Eigen's direct solution, relative to its largest value.
template <int D>
double difference(const std::array<int, D>& nodes, const std::array<double, D>& strength, bool fixed)
{
    const Poisson<D> problem(nodes, strength, fixed);
    linear::SymmetricSolver<D> solver(problem.system.layout, problem.system.box);
    solver.prepare(problem.system, !fixed);
    field::Values x = field::zeros(problem.system.layout);
    solver.solve(problem.right, x, 1e-13, 500);

    Eigen::SparseMatrix<double> matrix = problem.matrix();
    if (!fixed) { // pins one node; the solution is then known but for a constant
        matrix.coeffRef(0, 0) *= 2;
    }
    const Eigen::SimplicialLDLT<Eigen::SparseMatrix<double>> direct(matrix);
    Eigen::VectorXd exact = direct.solve(problem.gathered(problem.right));
    const Eigen::VectorXd found = problem.gathered(x);
    if (!fixed) {
        exact.array() -= exact.mean();
        CHECK(std::abs(found.mean()) <= 1e-12 * found.cwiseAbs().maxCoeff());
    }
    return (found - exact).cwiseAbs().maxCoeff() / exact.cwiseAbs().maxCoeff();
}

} // namespace

TEST_CASE("The symmetric solver gives Eigen's direct solution to 1e-8", "[linear]")
{
    for (const bool fixed : {true, false}) {
        for (const double aspect : {1.0, 10.0, 100.0, 1e3, 1e4}) {
            INFO("aspect " << aspect << ", fixed " << fixed);
            // At the last aspect the condition number times round-off is what two direct solvers differ by.
            const double bound = aspect < 5e3 ? 1e-8 : 1e-5;
            CHECK(difference<2>({40, 24}, {1, aspect * aspect}, fixed) < bound);
            CHECK(difference<2>({33, 19}, {1, aspect * aspect}, fixed) < bound);
            CHECK(difference<3>({12, 10, 9}, {1, aspect, aspect * aspect}, fixed) < bound);
        }
    }
}

TEST_CASE("The symmetric solver converges in few iterations at any aspect ratio of the cells", "[linear]")
{
    // cells `aspect` times as long as they are thin, lines across: what a duct brings
    for (const bool fixed : {true, false}) {
        for (const double aspect : {1.0, 10.0, 100.0, 1e3, 1e4}) {
            INFO("aspect " << aspect << ", fixed " << fixed);
            // Rounding of the diagonal alone moves the smallest eigenvalues by 1e-16 of the largest.
            const double tolerance = std::max(1e-10, 1e-13 * aspect * aspect);
            const double across = aspect * aspect;
            const int plane = iterations<2>({160, 40}, {1, across}, fixed, tolerance);
            const int solid = iterations<3>({24, 20, 16}, {1, across, across}, fixed, tolerance);
            const int flat = iterations<3>({24, 20, 16}, {1, aspect, across}, fixed, tolerance);
            INFO("2-D " << plane << ", 3-D " << solid << ", flat 3-D " << flat << " iterations");
            CHECK(plane <= 30);
            CHECK(solid <= 30);
            CHECK(flat <= 30);
        }
    }
}

TEST_CASE("The iterations of the symmetric solver grow little with the grid", "[linear]")
{
    const int coarse = iterations<2>({80, 20}, {1, 100}, false);
    const int fine = iterations<2>({640, 160}, {1, 100}, false);
    INFO("80 x 20 " << coarse << ", 640 x 160 " << fine);
    CHECK(fine <= coarse + 8);
}

TEST_CASE("Strong coupling along the duct does not stop the symmetric solver", "[linear]")
{
    // cells `aspect` times shorter along the duct than across, as beside a finely resolved inlet
    for (const double aspect : {10.0, 100.0}) {
        INFO("aspect " << aspect);
        CHECK(iterations<2>({160, 40}, {aspect * aspect, 1}, true) <= 50);
        CHECK(iterations<3>({24, 20, 16}, {aspect * aspect, 1, 1}, true) <= 200);
    }
}

TEST_CASE("The symmetric solver does nothing to a solution, and stops when told", "[linear]")
{
    const Poisson<2> problem({20, 12}, {1, 4}, true);
    linear::SymmetricSolver<2> solver(problem.system.layout, problem.system.box);
    solver.prepare(problem.system, false);
    field::Values x = field::zeros(problem.system.layout);
    const field::Values nothing = x;
    CHECK(solver.solve(nothing, x, 1e-10, 50).iterations == 0);
    CHECK(x == nothing);
    const auto cut = solver.solve(problem.right, x, 1e-14, 2);
    CHECK(cut.iterations == 2);
    CHECK(cut.reduction < 1);
    CHECK(cut.reduction > 1e-14);
    CHECK(solver.bytes() > 10 * sizeof(double) * problem.system.centre.size());
}

TEST_CASE("Asked for more than round-off allows, the symmetric solver ends without spoiling the solution", "[linear]")
{
    for (const bool fixed : {true, false}) {
        const Poisson<2> problem({30, 16}, {1, 1e6}, fixed);
        linear::SymmetricSolver<2> solver(problem.system.layout, problem.system.box);
        solver.prepare(problem.system, !fixed);
        field::Values x = field::zeros(problem.system.layout);
        solver.solve(problem.right, x, 0, 300);
        field::Values out = field::zeros(problem.system.layout);
        linear::residual(problem.system, x, problem.right, out);
        CHECK(problem.gathered(out).norm() < 1e-6 * problem.gathered(problem.right).norm());
    }
}

TEST_CASE("Single lines, and single rows of lines, are solved too", "[linear]")
{
    CHECK(difference<2>({1, 50}, {1, 4}, true) < 1e-8);
    CHECK(difference<3>({2, 1, 20}, {1, 1, 4}, false) < 1e-8);
    CHECK(difference<3>({1, 7, 20}, {1, 1, 4}, false) < 1e-8);
}
