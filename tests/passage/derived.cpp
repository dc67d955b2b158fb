#include "catch.hpp"
#include "passage_cases.hpp"

#include <numbers>

using namespace leat;
using leat::test::oil_in;
using leat::test::oil_line;

TEST_CASE("Derived numbers of the three shapes", "[derived]")
{
    const double pi = std::numbers::pi;
    const Derived tube = derive(oil_line());
    CHECK(tube.length == 0.5);
    CHECK(tube.hydraulic_diameter == 8e-3);
    CHECK(tube.area == Approx(pi * 16e-6).epsilon(1e-14));
    CHECK(tube.wetted_perimeter == Approx(pi * 8e-3).epsilon(1e-14));
    CHECK(tube.mass_flow_rate == Approx(865 * 0.45 * pi * 16e-6).epsilon(1e-14));
    CHECK(tube.reynolds_number == Approx(865 * 0.45 * 8e-3 / 28e-3).epsilon(1e-14));

    const Derived channel = derive(oil_in(Channel{2e-3, 0.1}));
    CHECK(channel.hydraulic_diameter == 4e-3);
    CHECK(channel.area == 2e-3);
    CHECK(channel.wetted_perimeter == 2);

    const Derived annulus = derive(oil_in(Annulus{4e-3, 8e-3, 0.1}));
    CHECK(annulus.hydraulic_diameter == Approx(4e-3).epsilon(1e-14));
    CHECK(annulus.area == Approx(pi * 12e-6).epsilon(1e-14));
    // 4 area / wetted perimeter is the hydraulic diameter in every shape
    for (const Derived& derived : {tube, channel, annulus}) {
        CHECK(4 * derived.area / derived.wetted_perimeter == Approx(derived.hydraulic_diameter).epsilon(1e-14));
    }
}

TEST_CASE("The four statements of one flow derive the same passage", "[derived]")
{
    for (const Shape& shape : {Shape(Tube{8e-3, 1}), Shape(Channel{2e-3, 1}), Shape(Annulus{4e-3, 8e-3, 1})}) {
        Passage passage = oil_in(shape);
        const Derived wanted = derive(passage);
        const auto check = [&passage, &wanted] {
            const Derived derived = derive(passage);
            CHECK(derived.mean_velocity == Approx(wanted.mean_velocity).epsilon(1e-14));
            CHECK(derived.mass_flow_rate == Approx(wanted.mass_flow_rate).epsilon(1e-14));
            CHECK(derived.reynolds_number == Approx(wanted.reynolds_number).epsilon(1e-14));
            CHECK(derived.viscosity == Approx(28e-3).epsilon(1e-14));
        };
        passage.inlet = {};
        passage.inlet.flow_rate = wanted.mean_velocity * wanted.area;
        check();
        passage.inlet = {};
        passage.inlet.mass_flow_rate = wanted.mass_flow_rate;
        check();
        passage.inlet = {};
        passage.inlet.reynolds_number = wanted.reynolds_number;
        check();
        passage.fluid.viscosity.reset();
        passage.fluid.kinematic_viscosity = 28e-3 / 865;
        check();
    }
}
