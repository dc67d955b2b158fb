#include "catch.hpp"
#include "passage_cases.hpp"
#include "reference/csv.hpp"

#include <leat/passage/cautions.hpp>
#include <leat/passage/development_length.hpp>
#include <leat/passage/laminar_limit.hpp>

#include <cmath>

using namespace leat;
using leat::passage::cautions_before;
using leat::passage::development_length_estimate;
using leat::passage::regime_text;

namespace {

Passage at(const Shape& shape, double reynolds_number, InletProfile profile = InletProfile::flat)
{
    Passage passage = test::oil_in(shape);
    passage.inlet = {};
    passage.inlet.profile = profile;
    passage.inlet.reynolds_number = reynolds_number;
    return passage;
}

/// All cautions of a passage, one a line.
std::string cautions(const Passage& passage)
{
    std::string text;
    for (const std::string& caution : cautions_before(passage, derive(passage))) {
        text += caution + "\n";
    }
    return text;
}

bool has(const std::string& text, const std::string& part)
{
    return text.find(part) != std::string::npos;
}

} // namespace

TEST_CASE("An ordinary passage needs no caution", "[cautions]")
{
    CHECK(cautions(test::oil_line()).empty());
}

// practice_and_gci.csv; Walker, Whan & Rothfus 1957 for the annulus
TEST_CASE("Above the laminar limit of its shape a passage is cautioned with limit and source", "[cautions]")
{
    const auto rows = reference::read("practice_and_gci.csv");
    const auto practical = [&rows](const char* geometry) {
        return reference::select(rows, {{"geometry", geometry}}).front().number("value");
    };
    const Shape tube = Tube{8e-3, 0.8};
    const Shape channel = Channel{4e-3, 0.8};
    const Shape annulus = Annulus{2e-3, 8e-3, 0.8};
    CHECK(leat::passage::laminar_limit(tube).reynolds_number == practical("circular tube"));
    CHECK(leat::passage::laminar_limit(channel).reynolds_number == practical("parallel plates"));
    struct Expected {
        Shape shape;
        double limit;
        std::string words;
    };
    for (const auto& [shape, limit, words] :
         {Expected{tube, 2300, "above 2300, the laminar limit of practice (tube, Schlichting 1979)"},
          {channel, 2300, "above 2300, the laminar limit of practice (channel, Patel & Head 1969)"},
          {annulus, 2000, "above 2000, the laminar limit of practice (annulus, Walker, Whan & Rothfus 1957)"}}) {
        CHECK(has(cautions(at(shape, limit * 1.0001)), words));
        CHECK_FALSE(has(cautions(at(shape, limit)), "laminar limit"));
        CHECK(has(regime_text(at(shape, limit), derive(at(shape, limit))), "laminar: Re"));
        CHECK(has(regime_text(at(shape, 9e3), derive(at(shape, 9e3))), "beyond the laminar limit: Re 9000 is above"));
    }
    CHECK(has(cautions(at(tube, 2300.1)), "Re 2300.1 is above 2300")); // never "2300 is above 2300"
    const Passage line = test::oil_line();
    CHECK(regime_text(line, derive(line)) == "laminar: Re 111.2 is not above 2300 (tube, Schlichting 1979)");
}

TEST_CASE("Short passages, creeping flat inlets and long passages are cautioned", "[cautions]")
{
    CHECK(has(cautions(at(Tube{1e-2, 2.99e-2}, 100)), "2.99 hydraulic diameters, below 3"));
    CHECK_FALSE(has(cautions(at(Tube{1e-2, 3e-2}, 100)), "hydraulic diameters"));
    CHECK(has(cautions(at(Channel{1e-2, 5.9e-2}, 100)), "hydraulic diameters"));
    CHECK_FALSE(has(cautions(at(Channel{1e-2, 6.1e-2}, 100)), "hydraulic diameters"));

    CHECK(has(cautions(at(Tube{1e-2, 0.1}, 0.5)), "Re 0.5 is below 1 with a flat inlet"));
    CHECK_FALSE(has(cautions(at(Tube{1e-2, 0.1}, 1)), "flat inlet"));
    CHECK_FALSE(has(cautions(at(Tube{1e-2, 0.1}, 0.5, InletProfile::developed)), "flat inlet"));

    const double development = development_length_estimate(Tube{1e-2, 1}, 100);
    CHECK(has(cautions(at(Tube{1e-2, 20.01 * development}, 100)), "the developed-flow formula with f Re = 16 serves"));
    CHECK_FALSE(has(cautions(at(Tube{1e-2, 19.99 * development}, 100)), "developed-flow"));
}

// Durst, Ray, Unsal & Bayoumi 2005: hydrodynamic_entrance.csv, the channel on its gap
TEST_CASE("The development length of Durst et al. 2005", "[cautions]")
{
    const auto rows = reference::read("hydrodynamic_entrance.csv");
    const Tube tube{1, 1};
    const Channel channel{1, 1};
    for (const auto& row : reference::select(rows, {{"quantity", "development length L/D"}})) {
        const double estimate = development_length_estimate(tube, row.stated("condition", "Re"));
        INFO(row.where());
        // the formula itself to the digits of the row, the full equations within its 5 %
        CHECK(estimate == Approx(row.number("value")).epsilon(row["provenance"] == "memory" ? 5e-6 : 0.055));
    }
    for (const auto& row : reference::select(rows, {{"quantity", "development length L/h (h gap, Re=um h/nu)"}})) {
        const double estimate = development_length_estimate(channel, 2 * row.stated("condition", "Re"));
        INFO(row.where());
        CHECK(estimate == Approx(row.number("value")).epsilon(row["provenance"] == "memory" ? 5e-6 : 0.055));
    }
    CHECK(development_length_estimate(Annulus{1, 3, 1}, 77) == development_length_estimate(channel, 77));
}
