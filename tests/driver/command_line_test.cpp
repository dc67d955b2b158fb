#include "catch.hpp"

#include "command/command_line.hpp"

using namespace leat::driver;
using Command = CommandLine::Command;

namespace {

std::string refusal(const std::vector<std::string>& arguments)
{
    try {
        read_command_line(arguments);
    } catch (const UsageError& error) {
        return error.what();
    }
    return "was taken";
}

} // namespace

TEST_CASE("options may stand before and behind the case")
{
    const CommandLine line = read_command_line({"solve", "--json", "a.case", "--output", "out", "--force", "--quiet"});
    CHECK(line.command == Command::solve);
    CHECK(line.case_path == "a.case");
    CHECK(line.output == "out");
    CHECK((line.json && line.force && line.quiet));
    const CommandLine plain = read_command_line({"check", "a.case"});
    CHECK(plain.command == Command::check);
    CHECK_FALSE((plain.json || plain.force || plain.quiet || plain.command_help));
    CHECK(read_command_line({"solve", "a.case", "--output=b c"}).output == "b c");
    CHECK(read_command_line({"solve", "--", "--strange.case"}).case_path == "--strange.case");
}

TEST_CASE("help and version")
{
    CHECK(read_command_line({}).command == Command::short_help);
    CHECK(read_command_line({"--help"}).command == Command::help);
    CHECK(read_command_line({"--version"}).command == Command::version);
    CHECK(read_command_line({"solve", "--help"}).command_help);
    CHECK(read_command_line({"check", "--help"}).command == Command::check);
}

TEST_CASE("what cannot be understood is refused with what would be right")
{
    CHECK(refusal({"sovle", "a.case"}) == "unknown command 'sovle'; did you mean 'solve'?");
    CHECK(refusal({"bake"}) == "unknown command 'bake'; known are solve or check");
    CHECK(refusal({"solve"}) == "no case given; write leat solve CASE");
    CHECK(refusal({"check", "a", "b"}) == "more than one case given; write leat check CASE");
    CHECK(refusal({"solve", "a", "--jsn"}) == "unknown option '--jsn' of leat solve; did you mean '--json'?");
    CHECK(refusal({"solve", "a", "--js"}).starts_with("unknown option '--js' of leat solve;"));
    CHECK(refusal({"solve", "a", "-j"}).starts_with("unknown option '-j' of leat solve; known are --help"));
    CHECK(refusal({"check", "a", "--output", "d"}).starts_with("unknown option '--output' of leat check;"));
    CHECK(refusal({"solve", "a", "--force"}) == "--force overwrites result files; it needs --output DIR");
    CHECK(refusal({"solve", "a", "--output="}) != "was taken");
    CHECK(refusal({"solve", "a", "--output"}) != "was taken");
    CHECK(refusal({"solve", "a", "--output", "b", "--output", "c"}) != "was taken");
    CHECK(refusal({"solve", "a", "--json=yes"}) != "was taken");
    CHECK(refusal({"--json", "solve"}) == "options follow the command: leat solve CASE --json; see leat --help");
    CHECK(refusal({"--version", "x"}) == "--version stands alone; 'x' is too much");
}
