#include "catch.hpp"

#include <leat/base/error.hpp>

#include <cmath>
#include <limits>
#include <string>

using namespace leat;

TEST_CASE("A fault names the field, its value and what would be right", "[error]")
{
    CHECK(Fault{"inlet.mean_velocity", "-0.45", "must be > 0 m/s"}.text() ==
          "inlet.mean_velocity = -0.45: must be > 0 m/s");
    CHECK(Fault{"inlet", "", "must state one flow"}.text() == "inlet: must state one flow");
}

TEST_CASE("Invalid input carries every fault, one to a line", "[error]")
{
    const InvalidInput error({{"a", "1", "must be 2"}, {"b", "", "is missing"}});
    CHECK(std::string(error.what()) == "a = 1: must be 2\nb: is missing");
    REQUIRE(error.faults().size() == 2);
    CHECK(error.faults()[1].field == "b");
}

TEST_CASE("Faults are collected and thrown together", "[error]")
{
    Faults faults;
    CHECK(faults.empty());
    CHECK_NOTHROW(faults.throw_if_any());
    faults.require_positive("length", 1e-300, "m");
    faults.require_positive("length", std::numeric_limits<double>::max(), "m");
    CHECK(faults.empty());

    faults.add("shape", "cube", "must be tube, channel or annulus");
    const double infinity = std::numeric_limits<double>::infinity();
    for (const double number : {0.0, -0.0, -2.5, infinity, -infinity, std::nan("")}) {
        faults.require_positive("length", number, "m");
    }
    faults.require_positive("ratio", -1, "");
    REQUIRE(faults.list().size() == 8);
    CHECK(faults.list()[0].field == "shape");
    CHECK(faults.list()[3].text() == "length = -2.5: must be finite and > 0 m");
    CHECK(faults.list()[4].value == "inf");
    CHECK(faults.list()[6].value.find("nan") != std::string::npos);
    CHECK(faults.list()[7].text() == "ratio = -1: must be finite and > 0");
    try {
        faults.throw_if_any();
        FAIL("nothing was thrown");
    } catch (const InvalidInput& error) {
        CHECK(error.faults().size() == 8);
    }
}

TEST_CASE("A file error says what was being done, and with which file", "[error]")
{
    const FileError error(FileError::Action::refuse_overwrite, "out/line.h5", "exists already");
    CHECK(std::string(error.what()) == "out/line.h5: exists already");
    CHECK(error.path() == "out/line.h5");
    CHECK(error.action() == FileError::Action::refuse_overwrite);
}

TEST_CASE("Every failure can be caught as one kind", "[error]")
{
    CHECK_THROWS_AS(throw InvalidInput({{"a", "1", "must be 2"}}), Error);
    CHECK_THROWS_AS(throw FileError(FileError::Action::read, "a", "b"), Error);
    CHECK_THROWS_AS(throw Error("c"), std::runtime_error);
}
