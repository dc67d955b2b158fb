#include "catch.hpp"

#include "sample_case.hpp"

TEST_CASE("a valid case has no fault, with any line ends and with a byte order mark")
{
    CHECK(faults_of_text(tube_case) == Messages{});
    std::string crlf;
    for (const char c : tube_case) {
        crlf += c == '\n' ? "\r\n" : std::string(1, c);
    }
    CHECK(faults_of_text(crlf) == Messages{});
    CHECK(faults_of_text("\xEF\xBB\xBF" + tube_case) == Messages{});
    CHECK(faults_of_text(tube_case.substr(0, tube_case.size() - 1)) == Messages{});
}

TEST_CASE("unknown, misspelt and misplaced words come with a suggestion")
{
    CHECK(faults_of_text(with(tube_case, "mean_velocity", "mean_velocty")) ==
          Messages{"a.case:9: [inlet] states no flow; give mean_velocity, flow_rate, mass_flow_rate or "
                   "reynolds_number, such as mean_velocity = 0.45 m/s",
                   "a.case:11: unknown key 'mean_velocty' in [inlet]; did you mean 'mean_velocity'?"});
    CHECK(faults_of_text(tube_case + "colour = red\n") ==
          Messages{"a.case:12: unknown key 'colour' in [inlet]; known are profile, table, mean_velocity, flow_rate, "
                   "mass_flow_rate or reynolds_number"});
    CHECK(faults_of_text(tube_case + "outlet = cut\n") ==
          Messages{"a.case:12: unknown key 'outlet' in [inlet]; it belongs in [passage]"});
    CHECK(faults_of_text(tube_case + "[numeric]\n") ==
          Messages{"a.case:12: unknown section [numeric]; did you mean 'numerics'?"});
    CHECK(faults_of_text(with(tube_case, "= flat", "= flaat")) ==
          Messages{"a.case:10: [inlet] profile = flaat is not known; did you mean 'flat'?"});
    CHECK(faults_of_text(with(tube_case, "= tube", "= pipe")) ==
          Messages{"a.case:3: [passage] shape = pipe is not known; write tube, channel or annulus"});
}

TEST_CASE("a unit that is missing or of the wrong dimension")
{
    CHECK(faults_of_text(with(tube_case, "8 mm", "8")) ==
          Messages{"a.case:4: [passage] diameter = 8: has no unit; a length is needed, such as 8 mm"});
    CHECK(faults_of_text(with(tube_case, "8 mm", "8 Pa")) ==
          Messages{"a.case:4: [passage] diameter = 8 Pa: 'Pa' is a pressure (m-1.kg.s-2); a length is needed, such as "
                   "mm"});
}

TEST_CASE("what is given twice")
{
    CHECK(faults_of_text(with(tube_case, "length", "diameter = 9 mm\nlength")) ==
          Messages{"a.case:5: 'diameter' was already given in line 4; keep one of the two"});
    CHECK(faults_of_text(tube_case + "[fluid]\n") ==
          Messages{"a.case:12: section [fluid] was already opened in line 6; keep one"});
    CHECK(faults_of_text(tube_case + "flow_rate = 3 L/min\n") ==
          Messages{"a.case:12: 'flow_rate' states the flow again after 'mean_velocity' in line 11; keep exactly one"});
    CHECK(faults_of_text(with(tube_case, "mean_velocity", "flow_rate = 3 L/min\nmean_velocity")) ==
          Messages{"a.case:12: 'mean_velocity' states the flow again after 'flow_rate' in line 11; keep exactly one"});
    CHECK(faults_of_text(with(tube_case, "[inlet]", "kinematic_viscosity = 32 cSt\n[inlet]")) ==
          Messages{"a.case:9: 'kinematic_viscosity' states the viscosity again after 'viscosity' in line 8; keep "
                   "exactly one"});
}

TEST_CASE("what is missing")
{
    CHECK(faults_of_text(with(tube_case, "mean_velocity = 0.45 m/s\n", "")) ==
          Messages{"a.case:9: [inlet] states no flow; give mean_velocity, flow_rate, mass_flow_rate or "
                   "reynolds_number, such as mean_velocity = 0.45 m/s"});
    CHECK(faults_of_text(with(tube_case, "diameter = 8 mm\n", "")) ==
          Messages{"a.case:2: [passage] has no 'diameter', which shape = tube needs; write diameter = 8 mm"});
    CHECK(faults_of_text(with(tube_case, "density = 865 kg/m^3\n", "")) ==
          Messages{"a.case:6: [fluid] has no 'density'; write density = 865 kg/m^3"});
    CHECK(faults_of_text(with(tube_case, "= flat", "= table")) ==
          Messages{"a.case:9: [inlet] has no 'table', which profile = table needs; write table = FILE"});
    CHECK(faults_of_text(with(tube_case, "8 mm", "")) ==
          Messages{"a.case:4: [passage] diameter has no value; write 'diameter = value'"});
    CHECK(faults_of_text("[passage]\nshape = tube\ndiameter = 1 mm\nlength = 1 m\n") ==
          Messages{"a.case: section [fluid] is missing", "a.case: section [inlet] is missing"});
    CHECK(faults_of_text("") == Messages{"a.case: is empty; a case has the sections [passage], [fluid] and [inlet]"});
    CHECK(faults_of_text("# nothing\n\n") ==
          Messages{"a.case: is empty; a case has the sections [passage], [fluid] and [inlet]"});
}

TEST_CASE("a size that the shape does not use")
{
    CHECK(faults_of_text(with(tube_case, "length", "gap = 9 mm\nlength")) ==
          Messages{"a.case:5: 'gap' is not used by shape = tube; its sizes are diameter or length"});
    CHECK(faults_of_text(with(tube_case, "profile = flat", "table = a.csv")).size() == 2); // unused, and not there
}

TEST_CASE("lines that are no lines of a case")
{
    CHECK(faults_of_text("shape = tube\n" + tube_case) ==
          Messages{"a.case:1: 'shape' stands before any section; a case begins with [passage]"});
    CHECK(faults_of_text(tube_case + "hello\n") ==
          Messages{"a.case:12: 'hello' is neither a [section] nor 'key = value'"});
    CHECK(faults_of_text(tube_case + "[accuracy\nband = 0.2 %\n") ==
          Messages{"a.case:12: '[accuracy' is no section; write [name] alone on its line"});
    CHECK(faults_of_text(tube_case + "= 5\n") == Messages{"a.case:12: '= 5' has no key; write 'key = value'"});
}

TEST_CASE("files that are no text")
{
    CHECK(faults_of_text(std::string("[passage]\nsha\0pe", 16)) ==
          Messages{"a.case:2: holds a control byte; this is no text file"});
    CHECK(faults_of_text("\x89HDF\r\n\x1a\n") ==
          Messages{"a.case:1: holds a byte that is not UTF-8; this is no text file"});
    CHECK(faults_of_text("# \xC0\xAF overlong") ==
          Messages{"a.case:1: holds a byte that is not UTF-8; this is no text file"});
    CHECK(faults_of_text("[passage]\n" + std::string(10'000'000, 'x')) ==
          Messages{"a.case:2: line is longer than 4096 bytes"});
    CHECK(faults_of_text("# \xC2\xB5m is fine in a comment\n" + tube_case) == Messages{});
}

TEST_CASE("a value is never echoed whole")
{
    const Messages messages = faults_of_text(with(tube_case, "8 mm", std::string(4000, 'z')));
    REQUIRE(messages.size() == 1);
    CHECK(messages[0].size() < 250);
}

TEST_CASE("a file of nothing but faults is cut short")
{
    std::string text = "[passage]\n";
    for (int i = 0; i < 100'000; ++i) {
        text += "hello\n";
    }
    const Messages messages = faults_of_text(text);
    CHECK(messages.size() == 201);
    CHECK(messages.back().find("more faults") != std::string::npos);
}
