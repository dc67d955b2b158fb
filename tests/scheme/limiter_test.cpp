#include "catch.hpp"

#include <leat/scheme/scheme.hpp>

#include <algorithm>
#include <cmath>
#include <limits>

using namespace leat;
using scheme::limiter;

TEST_CASE("Limiters stay within Sweby's region", "[scheme]")
{
    // Sweby (1984): 0 <= psi <= min(2 r, 2), psi = 0 where the gradient changes sign; and the part of
    // it in which the scheme lies between central (psi = 1) and linear upwind (psi = r).
    for (const Scheme scheme : {Scheme::van_leer, Scheme::minmod}) {
        INFO(name(scheme));
        for (double r = -1e3; r <= 1e3; r += 0.0625) {
            const double psi = limiter(scheme, r);
            REQUIRE(psi >= 0);
            REQUIRE(psi <= std::max(0.0, std::min(2 * r, 2.0)) + 1e-15);
            if (r > 0) {
                REQUIRE(psi >= std::min(r, 1.0) - 1e-15);
                REQUIRE(psi <= std::max(r, 1.0) + 1e-15);
                REQUIRE(psi / r ==
                        Approx(limiter(scheme, 1 / r)).epsilon(1e-12)); // symmetric: both senses of a gradient alike
            }
        }
        CHECK(limiter(scheme, 0) == 0);
        CHECK(limiter(scheme, 1) == 1);
    }
    CHECK(limiter(Scheme::van_leer, 3) == Approx(1.5));
    CHECK(limiter(Scheme::minmod, 0.25) == 0.25);
}

TEST_CASE("Limiters keep their bounds at any gradient ratio", "[scheme]")
{
    const double infinity = std::numeric_limits<double>::infinity();
    for (const Scheme scheme : {Scheme::van_leer, Scheme::minmod}) {
        INFO(name(scheme));
        for (const double r : {infinity, std::numeric_limits<double>::max(), 1e300}) {
            CHECK(limiter(scheme, r) == Approx(scheme == Scheme::minmod ? 1 : 2));
            CHECK(limiter(scheme, -r) == 0);
        }
        CHECK(std::abs(limiter(scheme, std::numeric_limits<double>::denorm_min())) < 1e-15);
    }
}

TEST_CASE("The power law follows the exact solution of convection and diffusion", "[scheme]")
{
    // Patankar (1980), section 5.2: A(|P|) against the exact P/(e^P - 1).
    CHECK(scheme::power_law_factor(0) == 1);
    for (double peclet = 0.01; peclet < 40; peclet *= 1.05) {
        const double exact = peclet / std::expm1(peclet);
        CHECK(std::abs(scheme::power_law_factor(peclet) - exact) < 0.015);
    }
    CHECK(scheme::power_law_factor(5) == Approx(0.03125));
    CHECK(scheme::power_law_factor(10) == 0);
    CHECK(scheme::power_law_factor(1e300) == 0);
}
