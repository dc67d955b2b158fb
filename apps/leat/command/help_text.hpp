#pragma once

#include "command/command_line.hpp"

#include <string>

namespace leat::driver {

/// What a bare call shows.
std::string short_help();
/// What --help shows.
std::string long_help();
/// What COMMAND --help shows.
std::string command_help(CommandLine::Command command);

} // namespace leat::driver
