#include "terminal/message.hpp"

namespace leat::driver {

void say(TextSink& messages, std::string_view text)
{
    try {
        messages.write("leat: " + std::string(text) + "\n");
    } catch (const SinkError&) {
        return; // the exit code still tells
    }
}

} // namespace leat::driver
