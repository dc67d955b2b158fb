#include "catch.hpp"

#include <leat/scheme/scheme.hpp>

#include <array>
#include <cmath>
#include <random>

using namespace leat;
using scheme::face_weights;

namespace {

struct Places {
    double far, up, down, face;
};

/// Nodes in random order of distance, the flow towards rising coordinate for sense +1 and falling for -1.
Places random_places(std::mt19937& random, int sense)
{
    std::uniform_real_distribution<double> step(0.05, 1);
    const double start = step(random);
    const double up = start + step(random);
    const double face = up + step(random);
    const double down = face + step(random);
    return {sense * start, sense * up, sense * down, sense * face};
}

double interpolated(Scheme scheme, const Places& x, const std::array<double, 3>& coefficients)
{
    const auto value = [&](double s) { return coefficients[0] + s * (coefficients[1] + s * coefficients[2]); };
    const auto weights = face_weights(scheme, x.far, x.up, x.down, x.face);
    return weights.far * value(x.far) + weights.up * value(x.up) + weights.down * value(x.down) - value(x.face);
}

} // namespace

TEST_CASE("Weights are exact for linear profiles on random stretched nodes, quick for quadratic ones", "[scheme]")
{
    std::mt19937 random(11);
    for (const int sense : {1, -1}) {
        for (int trial = 0; trial < 500; ++trial) {
            const Places x = random_places(random, sense);
            for (const Scheme scheme : {Scheme::central, Scheme::linear_upwind, Scheme::quick}) {
                INFO(name(scheme) << ", sense " << sense);
                REQUIRE(interpolated(scheme, x, {0.7, -1.3, 0}) == Approx(0).margin(1e-12));
            }
            REQUIRE(interpolated(Scheme::quick, x, {0.7, -1.3, 2.1}) == Approx(0).margin(1e-11));
            // what the lower schemes cannot do, so that the check above can fail
            REQUIRE(std::abs(interpolated(Scheme::central, x, {0, 0, 1})) > 1e-4);
            REQUIRE(std::abs(interpolated(Scheme::linear_upwind, x, {0, 0, 1})) > 1e-4);
            REQUIRE(std::abs(interpolated(Scheme::upwind, x, {0, 1, 0})) > 1e-4);
        }
    }
}

TEST_CASE("On equal cells the weights are the familiar ones", "[scheme]")
{
    const auto check = [](Scheme scheme, double far, double up, double down) {
        const auto weights = face_weights(scheme, 0, 1, 2, 1.5);
        CHECK(weights.far == Approx(far).margin(1e-15));
        CHECK(weights.up == Approx(up));
        CHECK(weights.down == Approx(down).margin(1e-15));
    };
    check(Scheme::upwind, 0, 1, 0);
    check(Scheme::central, 0, 0.5, 0.5);
    check(Scheme::linear_upwind, -0.5, 1.5, 0);
    check(Scheme::quick, -0.125, 0.75, 0.375); // Leonard (1979)
    check(Scheme::power_law, 0, 1, 0);
    check(Scheme::van_leer, 0, 1, 0);
    check(Scheme::minmod, 0, 1, 0);
}
