#include "catch.hpp"

#include "gradings.hpp"

#include <leat/base/error.hpp>

#include <cmath>
#include <vector>

using namespace leat;
using namespace leat::mesh;

TEST_CASE("Every grading maps the unit interval onto itself, rising and smooth", "[mesh]")
{
    for (const NamedGrading& g : gradings()) {
        INFO(g.name);
        CHECK(g.map(0) == Approx(0).margin(1e-15));
        CHECK(g.map(1) == Approx(1));
        constexpr int n = 1000;
        for (int k = 1; k <= n; ++k) {
            REQUIRE(g.map(double(k) / n) > g.map(double(k - 1) / n));
        }
        // neighbouring cells differ by a factor 1 + O(1/n): halving all cells halves the distance from 1
        const auto roughness = [&](int cells) {
            const std::vector<double> faces = sample(g.map, cells, 0, 1);
            double worst = 0;
            for (int k = 1; k < cells; ++k) {
                worst = std::max(worst, std::abs((faces[k + 1] - faces[k]) / (faces[k] - faces[k - 1]) - 1));
            }
            return worst;
        };
        CHECK(roughness(400) <= 0.6 * roughness(200) + 1e-10);
    }
}

TEST_CASE("Cells are small where the name says", "[mesh]")
{
    const auto width = [](const Grading& g, int k) {
        const std::vector<double> faces = sample(g, 40, 0, 1);
        return faces[k + 1] - faces[k];
    };
    CHECK(width(uniform(), 0) == Approx(1.0 / 40));
    CHECK(width(towards_start(2), 0) < 0.6 / 40);
    CHECK(width(towards_start(2), 39) > 1.5 / 40);
    CHECK(width(towards_both(2), 0) < 0.3 / 40);
    CHECK(width(towards_both(2), 39) == Approx(width(towards_both(2), 0)));
    CHECK(width(towards_both(2), 20) > 1.5 / 40);
    for (int k = 0; k < 40; ++k) {
        CHECK(width(towards_end(2), k) == Approx(width(towards_start(2), 39 - k)));
    }
    CHECK(width(towards_both(0), 0) == Approx(1.0 / 40));
    CHECK(width(towards_start(0), 0) == Approx(1.0 / 40));
}

TEST_CASE("The strength for a first cell gives that first cell", "[mesh]")
{
    for (const double ratio : {1.0, 0.99, 0.5, 0.1, 1e-2, 1e-4}) {
        INFO(ratio);
        const double strength = strength_for_first_cell(ratio);
        constexpr int cells = 100000; // the limit of many cells
        CHECK(towards_start(strength)(1.0 / cells) * cells == Approx(ratio).epsilon(1e-6));
    }
    for (const double ratio : {0.0, -1.0, 1.01, std::nan("")}) {
        CHECK_THROWS_AS(strength_for_first_cell(ratio), InvalidInput);
    }
}

TEST_CASE("Sampling hits both ends exactly and refuses what makes no cells", "[mesh]")
{
    const std::vector<double> faces = sample(towards_both(1.7), 13, 0.1, 0.7);
    REQUIRE(faces.size() == 14);
    CHECK(faces.front() == 0.1);
    CHECK(faces.back() == 0.7);
    CHECK_THROWS_AS(sample(uniform(), 0, 0, 1), InvalidInput);
    CHECK_THROWS_AS(sample(uniform(), 4, 1, 1), InvalidInput);
    CHECK_THROWS_AS(sample(uniform(), 4, 0, std::nan("")), InvalidInput);
    CHECK_THROWS_AS(sample([](double s) { return s * (2 - 1.5 * s); }, 8, 0, 1), InvalidInput);
    CHECK_THROWS_AS(sample([](double) { return std::nan(""); }, 8, 0, 1), InvalidInput);
    try {
        sample(uniform(), -3, 2, 1);
        FAIL("nothing was thrown");
    } catch (const InvalidInput& error) {
        CHECK(error.faults().size() == 2);
    }
}
