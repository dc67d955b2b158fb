#include "catch.hpp"
#include "record/sample_answer.hpp"
#include "record/scratch_folder.hpp"

#include <leat/base/version.hpp>
#include <leat/record/image.hpp>
#include <leat/record/read.hpp>
#include <leat/record/result.hpp>

#include <cmath>

using namespace leat;
using namespace leat::record;
using test::sample_answer;
using test::ScratchFolder;

TEST_CASE("what was written is read back bit for bit")
{
    const ScratchFolder scratch;
    const Answer answer = sample_answer();
    const std::string case_text = "# Rücklauf\n[passage]\nshape = tube\n";
    const ResultFiles files = write_result(scratch / "new/deep", "line", case_text, answer, false);
    CHECK(files.hdf5 == scratch / "new/deep/line.h5");
    CHECK(files.xdmf == scratch / "new/deep/line.xdmf");
    CHECK(test::tree(scratch.path()).size() == 4); // two folders, two files

    const StoredResult stored = read_result(files.hdf5);
    CHECK(stored.writer == "leat " + std::string(version()));
    CHECK(stored.case_text == case_text);
    CHECK(stored.outcome == Outcome::out_of_budget);
    CHECK(stored.restart.cells == answer.fields->cells);
    CHECK(stored.restart.points_x == answer.fields->points_x);
    CHECK(stored.restart.points_y == answer.fields->points_y);
    CHECK(stored.restart.pressure == answer.fields->pressure);
    CHECK(stored.restart.face_velocity_along == answer.fields->face_velocity_along);
    CHECK(stored.restart.face_velocity_across == answer.fields->face_velocity_across);

    const std::vector<NamedNumber> rows = answer.named_numbers();
    REQUIRE(stored.numbers.size() == rows.size());
    int absent = 0;
    for (std::size_t k = 0; k < rows.size(); ++k) {
        const StoredNumber& number = stored.numbers[k];
        CAPTURE(number.name);
        CHECK(number.name == rows[k].name);
        CHECK(number.unit == rows[k].unit);
        CHECK(number.meaning == rows[k].meaning);
        CHECK(number.reason == rows[k].reason);
        REQUIRE(number.number.has_value() == rows[k].number.has_value());
        if (!number.number) {
            ++absent;
            continue;
        }
        CHECK(number.number->value == rows[k].number->value);
        CHECK(number.number->band == rows[k].number->band);
        CHECK(number.number->usable == rows[k].number->usable);
        CHECK(number.number->reason == rows[k].number->reason);
    }
    CHECK(absent >= 1);
    CHECK(absent < static_cast<int>(rows.size()));
}

TEST_CASE("every outcome comes back")
{
    const ScratchFolder scratch;
    Answer answer = sample_answer(1, 1);
    for (const Outcome outcome :
         {Outcome::converged, Outcome::stalled, Outcome::diverged, Outcome::out_of_budget, Outcome::cancelled}) {
        answer.outcome = outcome;
        CHECK(read_result(write_result(scratch.path(), "line", "", answer, true).hdf5).outcome == outcome);
    }
}

TEST_CASE("equal input gives equal bytes, another input others")
{
    const auto first = result_image("case", sample_answer());
    // What the heap holds between two writes must not reach the file.
    const std::vector<std::string> litter(100, std::string(5000, '\x5a'));
    CHECK(result_image("case", sample_answer()) == first);
    Answer other = sample_answer();
    other.fields->pressure[7] = std::nextafter(other.fields->pressure[7], 0.0);
    CHECK(result_image("case", other) != first);
    CHECK(result_image("Case", sample_answer()) != first);
    // Wall time is the one thing in which equal runs differ; it is not stored.
    Answer slower = sample_answer();
    slower.grids.push_back({.cells = {6, 4}, .iterations = 3, .seconds = 12.5});
    CHECK(result_image("case", slower) == first);
}

TEST_CASE("texts of every length, empty columns")
{
    const ScratchFolder scratch;
    Answer answer = sample_answer();
    answer.history.clear();
    answer.stations = {};
    for (const std::size_t length : {0u, 1u, 65'000u, 70'000u, 1'000'000u}) {
        CAPTURE(length);
        const std::string text(length, 'k');
        const ResultFiles files = write_result(scratch.path(), "line", text, answer, true);
        CHECK(read_result(files.hdf5).case_text == text);
    }
}

TEST_CASE("an answer that cannot be stored is refused with every fault, nothing is written")
{
    const ScratchFolder scratch;
    const auto faults_of = [&](const Answer& answer, const std::string& case_text = "") {
        std::string text;
        try {
            write_result(scratch / "out", "line", case_text, answer, false);
        } catch (const InvalidInput& failure) {
            text = failure.what();
        }
        CHECK(test::tree(scratch.path()).empty());
        return text;
    };
    Answer answer = sample_answer();
    answer.fields.reset();
    CHECK(faults_of(answer) == "answer.fields: must be set (solve with Options::keep_fields)");

    answer = sample_answer();
    answer.fields->cells = {6, 0};
    CHECK(faults_of(answer) == "answer.fields.cells = 6 x 0: must be >= 1 x 1");

    answer = sample_answer();
    answer.fields->pressure.pop_back();
    answer.fields->face_velocity_across[3] = std::nan("");
    answer.numbers.pressure_drop.value = HUGE_VAL;
    answer.numbers.pressure_drop.band = std::nan("");
    answer.stations.core_pressure[1] = std::nan("");
    answer.stations.wall_shear.pop_back();
    CHECK(faults_of(answer, std::string("a\0b", 3)) ==
          "case_text: must hold no NUL\n"
          "answer.fields.pressure: must have 24 values, has 23\n"
          "answer.fields.face_velocity_across[3] = nan: must be finite\n"
          "answer.stations.core_pressure = nan: must be finite or absent\n"
          "answer.stations.wall_shear: must have 3 values as x, has 2\n"
          "answer.numbers.pressure_drop = inf: must be finite or absent\n"
          "answer.numbers.pressure_drop.band = nan: must be finite or absent");
}
