#pragma once

#include <csignal>

namespace leat::driver {

/// While it lives, the first interrupt (Ctrl-C) is announced on the stream of messages and remembered, the second
/// ends the program at once with exit code 130. One at a time.
class InterruptWatch {
public:
    InterruptWatch();
    ~InterruptWatch();
    InterruptWatch(const InterruptWatch&) = delete;
    InterruptWatch& operator=(const InterruptWatch&) = delete;

    bool interrupted() const;

private:
    struct sigaction previous_ {};
};

} // namespace leat::driver
