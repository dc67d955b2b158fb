#include "answer_bits.hpp"
#include "catch.hpp"
#include "duct.hpp"

#include <cmath>
#include <thread>

using namespace leat;
using namespace leat::published;

namespace {

Answer tube(Coupling coupling)
{
    Options options;
    options.cells = {{64, 16}};
    options.coupling = coupling;
    options.tolerance = 1e-7;
    options.keep_fields = true;
    return solve(passage_of({"circular tube", 300, 12}), {}, options);
}

Answer annulus()
{
    Options options;
    options.keep_fields = true;
    return solve(passage_of({"concentric annulus", 50, 5, 0.3}), {}, options);
}

} // namespace

TEST_CASE("Solving twice gives the same bits", "[published]")
{
    for (const Coupling coupling : {Coupling::simple, Coupling::simplec, Coupling::lines}) {
        CHECK(bits_of(tube(coupling)) == bits_of(tube(coupling)));
    }
    CHECK(bits_of(annulus()) == bits_of(annulus()));
}

TEST_CASE("Two threads that solve at once get the bits of one", "[published]")
{
    const Answer serial_tube = tube(Coupling::lines);
    const Answer serial_annulus = annulus();
    for (int round = 0; round < 3; ++round) {
        Answer first;
        Answer second;
        Answer third;
        std::thread one([&first] { first = annulus(); });
        std::thread two([&second] { second = annulus(); });
        std::thread three([&third] { third = tube(Coupling::lines); });
        one.join();
        two.join();
        three.join();
        CHECK(bits_of(first) == bits_of(serial_annulus));
        CHECK(bits_of(second) == bits_of(serial_annulus));
        CHECK(bits_of(third) == bits_of(serial_tube));
    }
}

TEST_CASE("One changed bit of an answer is noticed", "[published]")
{
    const Answer answer = annulus();
    const auto next = [](double value) { return std::nextafter(value, INFINITY); };
    Answer changed = answer;
    changed.numbers.pressure_drop.value = next(changed.numbers.pressure_drop.value);
    CHECK(bits_of(changed) != bits_of(answer));
    changed = answer;
    changed.stations.wall_shear_inner.back() = next(changed.stations.wall_shear_inner.back().value());
    CHECK(bits_of(changed) != bits_of(answer));
    changed = answer;
    changed.fields->face_velocity_across[100] = next(changed.fields->face_velocity_across[100]);
    CHECK(bits_of(changed) != bits_of(answer));
    changed = answer;
    changed.grids.back().seconds += 1; // the only member that may differ
    CHECK(bits_of(changed) == bits_of(answer));
}
