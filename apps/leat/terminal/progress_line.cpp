#include "terminal/progress_line.hpp"

#include "report/number_text.hpp"

namespace leat::driver {

namespace {

constexpr std::string_view wipe = "\r\x1b[K";

std::string text_of(const Progress& progress)
{
    return "grid " + std::to_string(progress.grid + 1) + " of " + std::to_string(progress.grid_count) + ", iteration " +
           std::to_string(progress.iteration) + ": mass " + magnitude(progress.mass) + ", momentum " +
           magnitude(progress.momentum);
}

void try_write(TextSink& sink, std::string_view text)
{
    try {
        sink.write(text);
    } catch (const SinkError&) {
        return; // progress that nobody can read must not end the solve
    }
}

} // namespace

ProgressLine::ProgressLine(TextSink& messages, Clock::time_point start) : messages_(messages), last_(start) {}

ProgressLine::~ProgressLine()
{
    if (on_screen_) {
        try_write(messages_, wipe);
    }
}

void ProgressLine::show(const Progress& progress, Clock::time_point now)
{
    const bool rewritten = messages_.decorated();
    const Clock::duration pause =
        rewritten ? Clock::duration(std::chrono::milliseconds(100)) : std::chrono::seconds(10);
    if (now - last_ < pause) {
        return;
    }
    last_ = now;
    if (rewritten) {
        try_write(messages_, std::string(wipe) + text_of(progress));
        on_screen_ = true;
    } else {
        try_write(messages_, "leat: " + text_of(progress) + "\n");
    }
}

} // namespace leat::driver
