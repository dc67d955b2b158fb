#include "terminal/text_sink.hpp"

#include <cerrno>
#include <cstdlib>
#include <system_error>

#include <unistd.h>

namespace leat::driver {

namespace {

bool may_decorate(int descriptor)
{
    const char* no_colour = std::getenv("NO_COLOR");
    const char* terminal = std::getenv("TERM");
    return ::isatty(descriptor) == 1 && (no_colour == nullptr || *no_colour == '\0') && terminal != nullptr &&
           std::string_view(terminal) != "dumb";
}

} // namespace

DescriptorSink::DescriptorSink(int descriptor) : descriptor_(descriptor), decorated_(may_decorate(descriptor)) {}

void DescriptorSink::write(std::string_view text)
{
    while (!text.empty()) {
        const ssize_t count = ::write(descriptor_, text.data(), text.size());
        if (count < 0) {
            if (errno == EINTR) {
                continue;
            }
            throw SinkError(std::generic_category().message(errno));
        }
        text.remove_prefix(static_cast<std::size_t>(count));
    }
}

} // namespace leat::driver
