#pragma once

#include "command/command_line.hpp"
#include "command/engine.hpp"
#include "command/exit_code.hpp"
#include "terminal/text_sink.hpp"

namespace leat::driver {

/// Solves a case, writes its result files when asked, prints its numbers. Throws CaseError, FileError, SinkError.
ExitCode solve_command(const CommandLine& line, TextSink& results, TextSink& messages, const Engine& engine);

} // namespace leat::driver
