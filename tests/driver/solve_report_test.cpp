#include "catch.hpp"

#include "report/solve_report.hpp"
#include "sample_answer.hpp"

#include <nlohmann/json.hpp>

#include <limits>

using namespace leat::driver;
using leat::Outcome;
using nlohmann::json;

namespace {

SolveReport report_of(Outcome outcome)
{
    return {.name = "oil", .answer = sample_answer(outcome), .seconds = 0.2149, .files = {"out/oil.h5"}};
}

bool has(const std::string& text, const std::string& part)
{
    INFO(text);
    return text.find(part) != std::string::npos;
}

} // namespace

TEST_CASE("the table shows numbers with units, the handbook beside the pressure drop, and the cautions first")
{
    const std::string text = solve_text(report_of(Outcome::converged), false);
    CHECK(has(text, "oil: converged in 0.21 s, 160 x 40 cells\n"));
    CHECK(text.find("Caution: the flow is fast") < text.find("pressure drop"));
    CHECK(has(text, "8435.2  Pa"));
    CHECK(has(text, "8400  Pa"));
    CHECK(has(text, "handbook: Shah 1978\n"));
    CHECK(has(text, "111.214 \u00b1 0.013"));
    CHECK(has(text, "Note: handbook: high Reynolds numbers\n"));
    CHECK(has(text, "Note: development length: the passage ends before\n"));
    CHECK(has(text, "Imbalances: mass 3.1e-12, momentum 2.5e-11\n"));
    CHECK(has(text, "Note: pressure drop: not estimated\n"));
    CHECK(has(text, "Written: out/oil.h5\n"));
    CHECK_FALSE(has(text, "!"));
    CHECK_FALSE(has(text, "\x1b"));
    CHECK(has(solve_text(report_of(Outcome::converged), true), "\x1b[1;33mCaution:"));
}

TEST_CASE("numbers that may not be used are marked, each one")
{
    const std::string text = solve_text(report_of(Outcome::out_of_budget), false);
    CHECK(has(text, "oil: out_of_budget"));
    CHECK(has(text, "THESE NUMBERS ARE NOT USABLE"));
    CHECK(has(text, "! 8435.2"));
    CHECK(has(text, "! 111.214"));
}

TEST_CASE("a band wider than wanted is marked and explained, the other numbers are not")
{
    SolveReport report = report_of(Outcome::out_of_budget);
    report.answer.usable = true;
    report.answer.numbers.pressure_drop.band = 50;
    report.answer.numbers.pressure_drop.reason = "the band is too wide";
    const std::string text = solve_text(report, false);
    CHECK(has(text, "! 8440 \u00b1 50  Pa"));
    CHECK(has(text, "Note: pressure drop: the band is too wide\n"));
    CHECK_FALSE(has(text, "! 111.214"));
    CHECK_FALSE(has(text, "NOT USABLE"));
}

TEST_CASE("the document holds every key of the contract")
{
    const json document = json::parse(solve_document(report_of(Outcome::converged)));
    for (const char* key : {"program", "version", "case", "outcome", "usable", "numbers", "imbalances", "grids",
                            "cautions", "stations"}) {
        INFO(key);
        CHECK(document.contains(key));
    }
    CHECK(document["program"] == "leat");
    CHECK(document["case"] == "oil");
    CHECK(document["outcome"] == "converged");
    const json& drop = document["numbers"]["pressure_drop"];
    CHECK(drop["value"] == 8435.2345);
    CHECK(drop["band"].is_null());
    CHECK(drop["unit"] == "Pa");
    CHECK(drop["usable"] == true);
    CHECK(drop["reason"] == "not estimated");
    const json& absent = document["numbers"]["development_length"];
    CHECK(absent["value"].is_null());
    CHECK(absent["usable"] == false);
    CHECK(absent["unit"] == "m");
    CHECK(absent["reason"] == "the passage ends before");
    CHECK(document["numbers"]["reynolds_number"]["band"] == 0.0123);
    CHECK(document["imbalances"]["mass"] == 3.14e-12);
    CHECK(document["grids"][1]["cells"] == json::array({160, 40}));
    CHECK(document["stations"]["core_pressure"] == json::array({nullptr, 2.5}));
    CHECK(document["stations"]["x"] == json::array({0.0, 0.1}));
}

TEST_CASE("nothing in the document of an unusable answer is called usable")
{
    const json document = json::parse(solve_document(report_of(Outcome::diverged)));
    CHECK(document["usable"] == false);
    for (const auto& [name, number] : document["numbers"].items()) {
        INFO(name);
        CHECK(number["usable"] == false);
        CHECK_FALSE(number["reason"].get<std::string>().empty());
    }
}

TEST_CASE("no number of the document is infinite or NaN, whatever comes in")
{
    SolveReport report = report_of(Outcome::converged);
    report.name = "\xFF";
    report.answer.numbers.pressure_drop.value = std::numeric_limits<double>::quiet_NaN();
    report.answer.stations.core_pressure[1] = std::numeric_limits<double>::infinity();
    report.answer.imbalances.mass = std::numeric_limits<double>::infinity();
    const json document = json::parse(solve_document(report));
    CHECK(document["numbers"]["pressure_drop"]["value"].is_null());
    CHECK(document["numbers"]["pressure_drop"]["usable"] == false);
    CHECK(document["stations"]["core_pressure"][1].is_null());
    CHECK(document["imbalances"]["mass"].is_null());
}
