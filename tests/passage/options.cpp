#include "catch.hpp"

#include <leat/passage/options.hpp>

#include <cmath>
#include <string>

using namespace leat;

namespace {

/// The fields at fault, one after the other.
std::string faulty(const Accuracy& accuracy, const Options& options, double length = 1)
{
    std::string fields;
    for (const Fault& fault : faults_of(accuracy, options, length)) {
        UNSCOPED_INFO(fault.text());
        fields += fault.field + " ";
    }
    return fields;
}

std::string faulty_cells(int along, int across)
{
    Options options;
    options.cells = {along, across};
    return faulty({}, options);
}

} // namespace

TEST_CASE("The defaults and the ends of the ranges are valid", "[options]")
{
    CHECK(faulty({}, {}).empty());
    Options options;
    options.relaxation = Relaxation{1, 1e-3};
    options.iterations = 1;
    options.stations = {0, 0.5, 1};
    for (const double tolerance : {1e-14, 1e-2}) {
        options.tolerance = tolerance;
        CHECK(faulty({1e-5}, options).empty());
        CHECK(faulty({0.5}, options).empty());
    }
    CHECK(faulty_cells(16, 8).empty());
    CHECK(faulty_cells(5120, 1280).empty());
}

TEST_CASE("Every option out of range is a fault, all in one pass", "[options]")
{
    Options options;
    options.cells = {20, 8};
    options.relaxation = Relaxation{0, 1.01};
    options.iterations = 0;
    options.tolerance = 0.1;
    options.stations = {0.5, 0.5, 2, -1, NAN};
    CHECK(faulty({.band = 0.6, .band_on = {}}, options) ==
          "accuracy.band options.cells options.relaxation.velocity "
          "options.relaxation.pressure options.iterations options.tolerance "
          "options.stations options.stations options.stations options.stations ");
    CHECK(faulty({9e-6}, {}) == "accuracy.band ");
    CHECK(faulty({NAN}, {}) == "accuracy.band ");
    options = {};
    options.tolerance = 9e-15;
    CHECK(faulty({}, options) == "options.tolerance ");
}

TEST_CASE("Cells keep to their multiples and range", "[options]")
{
    for (const auto& [along, across] : {std::pair{8, 8}, {16, 4}, {5128, 8}, {16, 1284}, {20, 8}, {16, 10}, {-16, 8}}) {
        CHECK(faulty_cells(along, across) == "options.cells ");
    }
}

TEST_CASE("Stations are not measured against a length that is unknown", "[options]")
{
    Options options;
    options.stations = {2};
    CHECK(faulty({}, options, 0).empty());
    CHECK(faulty({}, options, 1) == "options.stations ");
}

TEST_CASE("A band is wanted on numbers that exist, and the cell budget has its range", "[options]")
{
    CHECK(faulty({0.002, {"development_length", "core_velocity_ratio"}}, {}).empty());
    CHECK(faulty({0.002, {"core_velocity", "development_length", "reynolds_number"}}, {}) ==
          "accuracy.band_on accuracy.band_on ");
    Options options;
    for (const int budget : {9999, 100000001}) {
        options.cell_budget = budget;
        CHECK(faulty({}, options) == "options.cell_budget ");
    }
    options.cell_budget = 10000;
    CHECK(faulty({}, options).empty());
}
