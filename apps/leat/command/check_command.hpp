#pragma once

#include "command/command_line.hpp"
#include "command/engine.hpp"
#include "command/exit_code.hpp"
#include "terminal/text_sink.hpp"

namespace leat::driver {

/// Validates a case and shows what would be solved. Throws CaseError, SinkError.
ExitCode check_command(const CommandLine& line, TextSink& results, const Engine& engine);

} // namespace leat::driver
