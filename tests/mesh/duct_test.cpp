#include "catch.hpp"

#include <leat/base/error.hpp>
#include <leat/mesh/duct.hpp>

#include <algorithm>
#include <cmath>
#include <vector>

using namespace leat;
using namespace leat::mesh;

namespace {

/// Short and long ducts, gentle and strong clustering, with and without a tail.
std::vector<AlongDuct> wishes()
{
    std::vector<AlongDuct> all;
    for (const int cells : {40, 64, 160, 320}) {
        for (const double length : {0.05, 1.0, 30.0, 5000.0}) {
            for (const double first_cell : {1e-3, 1e-2}) {
                for (const double tail : {0.0, 1.5}) {
                    all.push_back({cells, length, std::min(first_cell, length / cells), tail});
                }
            }
        }
    }
    return all;
}

/// How often a count can be halved with at least `least` left.
int halvings(int cells, int least)
{
    int times = 0;
    for (; cells % 2 == 0 && cells / 2 >= least; cells /= 2) {
        ++times;
    }
    return times;
}

double roughness(const std::vector<double>& faces)
{
    double worst = 0;
    for (std::size_t k = 2; k < faces.size(); ++k) {
        worst = std::max(worst, std::abs(std::log((faces[k] - faces[k - 1]) / (faces[k - 1] - faces[k - 2]))));
    }
    return worst;
}

} // namespace

TEST_CASE("The end of a duct is a face, exactly, and the tail reaches as far as asked", "[mesh]")
{
    for (const AlongDuct& wish : wishes()) {
        CAPTURE(wish.cells, wish.length, wish.first_cell, wish.tail_length);
        const DuctFaces duct = along_duct(wish);
        REQUIRE(duct.end == wish.cells);
        CHECK(duct.faces.front() == 0);
        CHECK(duct.faces[duct.end] == wish.length);
        for (std::size_t k = 1; k < duct.faces.size(); ++k) {
            REQUIRE(duct.faces[k] > duct.faces[k - 1]);
        }
        if (wish.tail_length == 0) {
            CHECK(duct.faces.size() == static_cast<std::size_t>(wish.cells) + 1);
        } else {
            CHECK(duct.faces.back() >= wish.length + wish.tail_length * (1 - 1e-12));
            CHECK(duct.faces.size() <= 3 * static_cast<std::size_t>(wish.cells) + 1);
        }
    }
}

TEST_CASE("The first cell of a duct is about what was asked, never above the mean", "[mesh]")
{
    for (const AlongDuct& wish : wishes()) {
        CAPTURE(wish.cells, wish.length, wish.first_cell, wish.tail_length);
        const std::vector<double> faces = along_duct(wish).faces;
        CHECK(faces[1] == Approx(wish.first_cell).epsilon(0.05));
    }
    const std::vector<double> equal = along_duct({40, 1, 1, 0}).faces; // larger than the mean cell: equal cells
    CHECK(equal[1] == Approx(1.0 / 40));
    CHECK(equal[40] - equal[39] == Approx(1.0 / 40));
}

TEST_CASE("Inlet and end stay faces on every nested grid", "[mesh]")
{
    for (const AlongDuct& wish : wishes()) {
        CAPTURE(wish.cells, wish.length, wish.first_cell, wish.tail_length);
        const DuctFaces duct = along_duct(wish);
        const int times = halvings(wish.cells, 5);
        const int step = 1 << times;
        REQUIRE(times >= 3);
        CHECK(duct.end % step == 0);
        CHECK((static_cast<int>(duct.faces.size()) - 1) % step == 0);
    }
}

TEST_CASE("Twice as many cells split every cell of a duct in two", "[mesh]")
{
    for (const double tail : {0.0, 1.5}) {
        // ratio of the first cell to the mean unchanged: the same map, sampled twice as densely
        const DuctFaces coarse = along_duct({80, 3, 0.01, tail});
        const DuctFaces fine = along_duct({160, 3, 0.005, tail});
        CAPTURE(tail);
        for (int k = 0; k <= coarse.end; ++k) {
            REQUIRE(fine.faces[2 * k] == Approx(coarse.faces[k]).margin(1e-12));
        }
        REQUIRE(fine.faces.size() == 2 * coarse.faces.size() - 1);
        for (std::size_t k = 0; k < coarse.faces.size(); ++k) {
            REQUIRE(fine.faces[2 * k] == Approx(coarse.faces[k]).margin(1e-12));
        }
    }
}

TEST_CASE("Cells of a duct grow smoothly, across the end too", "[mesh]")
{
    for (const AlongDuct& wish : wishes()) {
        AlongDuct finer = wish;
        finer.cells *= 2;
        finer.first_cell /= 2;
        CAPTURE(wish.cells, wish.length, wish.first_cell, wish.tail_length);
        // the ratio of neighbours tends to 1 with the number of cells
        CHECK(roughness(along_duct(finer).faces) <= 0.6 * roughness(along_duct(wish).faces) + 1e-9);
    }
}

TEST_CASE("Every fault of a wish is reported at once", "[mesh]")
{
    try {
        along_duct({0, -1, std::nan(""), -2});
        FAIL("nothing was thrown");
    } catch (const InvalidInput& error) {
        CHECK(error.faults().size() == 4);
    }
}

TEST_CASE("Gradings across a duct put small cells at its walls", "[mesh]")
{
    const auto cell = [](const Grading& g, int k) { return g((k + 1) / 40.0) - g(k / 40.0); };
    CHECK(cell(centre_to_wall(2.2), 39) < 0.6 * cell(centre_to_wall(2.2), 0));
    CHECK(cell(wall_to_centre(2.2), 0) < 0.6 * cell(wall_to_centre(2.2), 39));
    CHECK(cell(wall_to_wall(1.2, 0.999), 0) == Approx(cell(wall_to_wall(1.2, 0.999), 39)).epsilon(0.01));
    double last = 1;
    for (const double ratio : {0.9, 0.5, 0.1, 0.02, 0.001}) { // the thinner the inner wall, the smaller its cell
        const Grading g = wall_to_wall(1.2, ratio);
        CAPTURE(ratio);
        CHECK(g(0) == Approx(0).margin(1e-15));
        CHECK(g(1) == Approx(1));
        CHECK(cell(g, 0) < last);
        CHECK(cell(g, 0) < cell(g, 39));
        last = cell(g, 0);
    }
}
