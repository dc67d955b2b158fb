#pragma once

#include "terminal/text_sink.hpp"

#include <string_view>

namespace leat::driver {

/// Writes "leat: TEXT" as a line of its own. A stream of messages that takes none is no reason to fail: it is ignored.
void say(TextSink& messages, std::string_view text);

} // namespace leat::driver
