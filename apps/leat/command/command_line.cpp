#include "command/command_line.hpp"

#include "terminal/quoted.hpp"
#include "terminal/suggestion.hpp"

#include <boost/program_options.hpp>

#include <array>
#include <sstream>

namespace leat::driver {

namespace {

namespace options = boost::program_options;
using Command = CommandLine::Command;

constexpr std::array<std::string_view, 2> commands{"solve", "check"};

options::options_description described(Command command)
{
    options::options_description list;
    auto add = list.add_options();
    add("help", "show this");
    add("json", "print one JSON document instead of a table");
    if (command == Command::solve) {
        add("output", options::value<std::string>()->value_name("DIR"),
            "write DIR/NAME.h5 and DIR/NAME.xdmf, NAME being the case's; DIR is made when missing");
        add("force", "overwrite result files that exist");
        add("quiet", "no progress");
    }
    return list;
}

std::string name_of(Command command)
{
    return command == Command::solve ? "solve" : "check";
}

[[noreturn]] void fail_unknown_option(const std::string& token, Command command)
{
    std::string option = token.substr(0, token.find('='));
    std::vector<std::string> spelled;
    const auto list = described(command);
    for (const auto& known : list.options()) {
        spelled.push_back("--" + known->long_name());
    }
    const std::vector<std::string_view> known(spelled.begin(), spelled.end());
    const std::string_view near = nearest(option, known);
    throw UsageError("unknown option " + quoted(option) + " of leat " + name_of(command) + "; " +
                     (near.empty() ? "known are " + any_of(known) : "did you mean '" + std::string(near) + "'?"));
}

options::variables_map parsed(const std::vector<std::string>& arguments, Command command)
{
    auto list = described(command);
    list.add_options()("case", options::value<std::vector<std::string>>());
    options::positional_options_description positional;
    positional.add("case", -1);
    namespace style = options::command_line_style;
    options::variables_map values;
    try {
        options::store(options::command_line_parser(arguments)
                           .options(list)
                           .positional(positional)
                           .style(style::allow_long | style::long_allow_next | style::long_allow_adjacent |
                                  style::allow_short | style::allow_dash_for_short | style::short_allow_next)
                           .run(),
                       values);
    } catch (const options::unknown_option& error) {
        fail_unknown_option(error.get_option_name(), command);
    } catch (const options::error& error) {
        throw UsageError(std::string(error.what()) + "; see leat " + name_of(command) + " --help");
    }
    return values;
}

CommandLine read_command(Command command, const std::vector<std::string>& arguments)
{
    const options::variables_map values = parsed(arguments, command);
    CommandLine line;
    line.command = command;
    line.command_help = values.count("help") > 0;
    line.json = values.count("json") > 0;
    line.force = values.count("force") > 0;
    line.quiet = values.count("quiet") > 0;
    if (line.command_help) {
        return line;
    }
    if (values.count("output") > 0) {
        line.output = values["output"].as<std::string>();
        if (line.output.empty()) {
            throw UsageError("--output needs the name of a folder; write --output DIR, or --output . for this one");
        }
    } else if (line.force) {
        throw UsageError("--force overwrites result files; it needs --output DIR");
    }
    const auto paths =
        values.count("case") > 0 ? values["case"].as<std::vector<std::string>>() : std::vector<std::string>{};
    if (paths.size() != 1) {
        throw UsageError((paths.empty() ? "no case given" : "more than one case given") + std::string("; write leat ") +
                         name_of(command) + " CASE");
    }
    line.case_path = paths.front();
    return line;
}

} // namespace

CommandLine read_command_line(const std::vector<std::string>& arguments)
{
    if (arguments.empty()) {
        return {};
    }
    const std::string& first = arguments.front();
    const std::vector<std::string> rest(arguments.begin() + 1, arguments.end());
    if (first == "solve") {
        return read_command(Command::solve, rest);
    }
    if (first == "check") {
        return read_command(Command::check, rest);
    }
    CommandLine line;
    if (first == "--help" || first == "--version") {
        if (!rest.empty()) {
            throw UsageError(first + " stands alone; " + quoted(rest.front()) + " is too much");
        }
        line.command = first == "--help" ? Command::help : Command::version;
        return line;
    }
    if (first.starts_with('-')) {
        throw UsageError("options follow the command: leat solve CASE " + shortened(first) + "; see leat --help");
    }
    const std::string_view near = nearest(first, commands);
    throw UsageError("unknown command " + quoted(first) + "; " +
                     (near.empty() ? "known are " + any_of(commands) : "did you mean '" + std::string(near) + "'?"));
}

std::string option_list(Command command)
{
    std::ostringstream text;
    text.imbue(std::locale::classic());
    text << described(command);
    return text.str();
}

} // namespace leat::driver
