#pragma once

#include "command/engine.hpp"
#include "command/exit_code.hpp"
#include "terminal/text_sink.hpp"

#include <string>
#include <vector>

namespace leat::driver {

/// Does what the arguments (without the program's name) ask; results go to `results`, all else to `messages`.
/// Throws nothing: every failure becomes a message and an exit code.
ExitCode run(const std::vector<std::string>& arguments, TextSink& results, TextSink& messages,
             const Engine& engine = {});

} // namespace leat::driver
