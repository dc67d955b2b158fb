#include "catch.hpp"
#include "duct.hpp"

#include <cmath>

using namespace leat;
using namespace leat::published;

namespace {

Answer solve_with(int iterations)
{
    Options options;
    options.cells = {{320, 80}};
    options.iterations = iterations;
    options.tolerance = 1e-12;
    return solve(passage_of({"circular tube", 500, 40}), {}, options);
}

// Known from the statement alone, so right however the solve ends.
bool follows_from_the_passage(std::string_view name)
{
    return name == "reynolds_number" || name == "hydraulic_diameter" || name == "mean_velocity" ||
           name == "mass_flow_rate";
}

} // namespace

TEST_CASE("A solve whose iterations are spent marks its numbers unusable", "[published]")
{
    const Answer answer = solve_with(3);
    CHECK(answer.outcome == Outcome::out_of_budget);
    CHECK_FALSE(answer.usable);
    CHECK(answer.grids.back().iterations == 3);
    CHECK(answer.message.find('3') != std::string::npos);
    CHECK(answer.imbalances.worst() > 1e-12);
    int marked = 0;
    for (const NamedNumber& row : answer.named_numbers()) {
        if (!row.number) {
            CHECK_FALSE(row.reason.empty());
            continue;
        }
        INFO(row.name);
        CHECK(std::isfinite(row.number->value));
        CHECK(row.number->usable == follows_from_the_passage(row.name));
        CHECK((row.number->usable || row.number->reason.find("out_of_budget") != std::string::npos));
        marked += row.number->usable ? 0 : 1;
    }
    CHECK(marked >= 10);
}

TEST_CASE("The same solve with iterations enough is usable throughout", "[published]")
{
    const Answer answer = solve_with(100);
    CHECK(answer.outcome == Outcome::converged);
    CHECK(answer.usable);
    for (const NamedNumber& row : answer.named_numbers()) {
        CHECK((!row.number || row.number->usable));
    }
}

TEST_CASE("A solve that is told to stop says so and marks its numbers unusable", "[published]")
{
    std::stop_source source;
    source.request_stop();
    const Answer answer = solve(passage_of({"parallel plates", 500, 40}), {}, {}, {}, source.get_token());
    CHECK(answer.outcome == Outcome::cancelled);
    CHECK_FALSE(answer.usable);
    CHECK_FALSE(answer.numbers.pressure_drop.usable);
    CHECK(std::isfinite(answer.numbers.pressure_drop.value));
}
