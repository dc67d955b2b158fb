#include "terminal/interrupt.hpp"

#include "command/exit_code.hpp"

#include <cerrno>
#include <string_view>

#include <unistd.h>

namespace leat::driver {

namespace {

// A signal handler can reach nothing but a global of this type.
volatile std::sig_atomic_t interrupts = 0;

void on_interrupt(int)
{
    const int error = errno;
    if (interrupts != 0) {
        ::_exit(static_cast<int>(ExitCode::interrupted));
    }
    interrupts = 1;
    constexpr std::string_view said = "\nleat: interrupted: ending this iteration, then the numbers so far; once more "
                                      "stops at once\n";
    [[maybe_unused]] const ssize_t written = ::write(STDERR_FILENO, said.data(), said.size());
    errno = error;
}

} // namespace

InterruptWatch::InterruptWatch()
{
    interrupts = 0;
    struct sigaction action {};
    action.sa_handler = on_interrupt;
    ::sigemptyset(&action.sa_mask);
    action.sa_flags = SA_RESTART;
    ::sigaction(SIGINT, &action, &previous_);
}

InterruptWatch::~InterruptWatch()
{
    ::sigaction(SIGINT, &previous_, nullptr);
}

bool InterruptWatch::interrupted() const
{
    return interrupts != 0;
}

} // namespace leat::driver
