#include "catch.hpp"

#include "sample_case.hpp"

using namespace leat::driver;

namespace {

const std::string table_case = with(tube_case, "profile = flat", "profile = table\ntable = pitot.csv");

// What is wrong with a case whose table has that text.
Messages faults_of_table(const std::string& text)
{
    const ScratchFolder folder;
    folder.file("pitot.csv", text);
    const std::string prefix = folder.path("");
    try {
        read_case_file(folder.file("a.case", table_case));
    } catch (const CaseError& error) {
        Messages messages = error.messages();
        for (std::string& message : messages) {
            message.erase(0, prefix.size());
        }
        return messages;
    }
    return {};
}

} // namespace

TEST_CASE("a table beside the case is read with the units of its header")
{
    const ScratchFolder folder;
    folder.file("pitot.csv", "# measured\nradius [mm], velocity [cm/s]\n0, 60\n2, 50\r\n4, 0\n");
    const CaseFile of = read_case_file(folder.file("a.case", table_case));
    REQUIRE(of.passage.inlet.table.has_value());
    REQUIRE(of.passage.inlet.table->position.size() == 3);
    CHECK(of.passage.inlet.profile == leat::InletProfile::table);
    CHECK(of.passage.inlet.table->position[2] == Approx(4e-3).epsilon(1e-15));
    CHECK(of.passage.inlet.table->velocity[1] == Approx(0.5).epsilon(1e-15));
}

TEST_CASE("faults of a table have its name and line")
{
    CHECK(faults_of_table("radius, velocity [m/s]\n0, 1\n4, 0\n") ==
          Messages{"pitot.csv:1: column 'radius' has no unit; a length is needed, such as radius [mm]"});
    CHECK(faults_of_table("radius [s], speed [m/s]\n0, 1\n4, 0\n") ==
          Messages{"pitot.csv:1: column 'radius': 's' is a time (s); a length is needed, such as mm",
                   "pitot.csv:1: column 'speed' is not known; write velocity"});
    CHECK(faults_of_table("radius [mm], velocity [m/s]\n0, 1\n2, fast\n2, 1, 3\n4, nan\n") ==
          Messages{"pitot.csv:3: 'fast': does not begin with a number",
                   "pitot.csv:4: '2, 1, 3' does not have two columns; write position, velocity",
                   "pitot.csv:5: 'nan': nan is not a finite number"});
    CHECK(faults_of_table("radius [mm], velocity [m/s]\n0, 1\n4, 1\n3, 0\n") ==
          Messages{"pitot.csv:4: position 3 is not beyond the one before; positions must increase"});
    CHECK(
        faults_of_table("radius [mm], velocity [m/s]\n0, 1\n") ==
        Messages{
            "pitot.csv:2: has too few points (1); a header such as 'radius [mm], velocity [m/s]' and at least 2 points "
            "are needed"});
    CHECK(faults_of_table(std::string("rad\0us", 6)) ==
          Messages{"pitot.csv:1: holds a control byte; this is no text file"});
}

TEST_CASE("a table that does not fit the passage is told on the line that names it")
{
    const Messages messages = faults_of_table("radius [mm], velocity [m/s]\n0, 1\n3, 0\n");
    REQUIRE(messages.size() == 1);
    CHECK(messages[0].starts_with("a.case:11: [inlet] table = pitot.csv: positions must run from 0 m to 0.004 m"));
}

TEST_CASE("a table that is not there makes the case unreadable")
{
    const ScratchFolder folder;
    try {
        read_case_file(folder.file("a.case", table_case));
        FAIL("was read");
    } catch (const CaseError& error) {
        CHECK(error.unreadable());
        REQUIRE(error.messages().size() == 1);
        CHECK(error.messages()[0] ==
              folder.path("a.case") + ":11: [inlet] table = pitot.csv: cannot be read: No such file or directory");
    }
}
