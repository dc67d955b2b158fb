#include "catch.hpp"

#include <leat/linear/pentadiagonal.hpp>

#include <Eigen/Dense>

#include <random>
#include <vector>

using namespace leat;

namespace {

struct Bands {
    std::vector<double> below_2, below_1, here, above_1, above_2;
};

Bands random_bands(int rows, unsigned seed)
{
    std::mt19937 generator(seed);
    std::uniform_real_distribution<double> number(-1, 1);
    Bands bands;
    for (int j = 0; j < rows; ++j) {
        bands.below_2.push_back(number(generator));
        bands.below_1.push_back(number(generator));
        bands.here.push_back(4.5 + number(generator));
        bands.above_1.push_back(number(generator));
        bands.above_2.push_back(number(generator));
    }
    return bands;
}

Eigen::MatrixXd dense(const Bands& bands)
{
    const int rows = static_cast<int>(bands.here.size());
    Eigen::MatrixXd matrix = Eigen::MatrixXd::Zero(rows, rows);
    for (int j = 0; j < rows; ++j) {
        const double row[] = {bands.below_2[j], bands.below_1[j], bands.here[j], bands.above_1[j], bands.above_2[j]};
        for (int m = -2; m <= 2; ++m) {
            if (j + m >= 0 && j + m < rows) {
                matrix(j, j + m) = row[m + 2];
            }
        }
    }
    return matrix;
}

} // namespace

// Reference: Eigen's dense LU with full pivoting.
TEST_CASE("A pentadiagonal system is solved as a dense one is, from one row to many", "[pentadiagonal]")
{
    for (int rows = 1; rows <= 40; ++rows) {
        const Bands bands = random_bands(rows, static_cast<unsigned>(rows));
        std::vector<double> pivot(rows), outward(rows), inward(rows);
        const linear::OuterBands outer{bands.below_2.data(), bands.above_2.data()};
        const linear::PentadiagonalFactors factors{pivot.data(), outward.data(), inward.data()};
        linear::factorise(rows, outer, bands.below_1.data(), bands.here.data(), bands.above_1.data(), factors);
        for (unsigned seed = 1; seed <= 2; ++seed) { // the factors serve any right-hand side
            std::mt19937 generator(1000 + seed);
            std::uniform_real_distribution<double> number(-1, 1);
            Eigen::VectorXd right(rows);
            std::vector<double> x(rows);
            for (int j = 0; j < rows; ++j) {
                right(j) = x[j] = number(generator);
            }
            linear::solve(rows, outer, factors, x.data());
            const Eigen::VectorXd expected = dense(bands).fullPivLu().solve(right);
            INFO(rows << " rows");
            for (int j = 0; j < rows; ++j) {
                CHECK(x[j] == Approx(expected(j)).epsilon(1e-12).margin(1e-13));
            }
        }
    }
}
