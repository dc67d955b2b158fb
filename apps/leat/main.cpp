#include "command/run.hpp"

#include <csignal>

#include <fcntl.h>
#include <unistd.h>

namespace {

// A standard stream that the caller closed would otherwise be the next file opened, and take what is printed. What is
// put in its place refuses every write.
void occupy_closed_streams()
{
    for (int descriptor = 0; descriptor <= 2; ++descriptor) {
        if (::fcntl(descriptor, F_GETFD) == -1) {
            [[maybe_unused]] const int opened = ::open("/dev/null", descriptor == 0 ? O_WRONLY : O_RDONLY);
        }
    }
}

} // namespace

int main(int count, char** arguments)
{
    occupy_closed_streams();
    std::signal(SIGPIPE, SIG_IGN); // a closed pipe becomes a failed write, with message and exit code
    leat::driver::DescriptorSink results(STDOUT_FILENO);
    leat::driver::DescriptorSink messages(STDERR_FILENO);
    const std::vector<std::string> words(arguments + (count > 0 ? 1 : 0), arguments + count);
    return static_cast<int>(leat::driver::run(words, results, messages));
}
