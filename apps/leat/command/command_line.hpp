#pragma once

#include <stdexcept>
#include <string>
#include <vector>

namespace leat::driver {

/// What the command line asks for.
struct CommandLine {
    enum class Command { short_help, help, version, solve, check };

    Command command = Command::short_help;
    bool command_help = false; ///< `leat COMMAND --help`
    std::string case_path;
    std::string output; ///< folder for result files; empty: none
    bool json = false;
    bool force = false;
    bool quiet = false;
};

/// The command line cannot be understood; what() says why and what would be right.
class UsageError : public std::runtime_error {
public:
    using std::runtime_error::runtime_error;
};

/// Reads the arguments behind the program's name. Throws UsageError.
CommandLine read_command_line(const std::vector<std::string>& arguments);

/// The options of a command, as a list for its help.
std::string option_list(CommandLine::Command command);

} // namespace leat::driver
