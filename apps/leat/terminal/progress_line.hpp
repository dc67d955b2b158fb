#pragma once

#include "terminal/text_sink.hpp"

#include <leat/base/observer.hpp>

#include <chrono>

namespace leat::driver {

/// Tells how far a solve is: on a decorated stream one line that is rewritten, else a plain line every 10 s.
class ProgressLine {
public:
    using Clock = std::chrono::steady_clock;

    explicit ProgressLine(TextSink& messages, Clock::time_point start = Clock::now());
    /// Wipes the rewritten line.
    ~ProgressLine();
    ProgressLine(const ProgressLine&) = delete;
    ProgressLine& operator=(const ProgressLine&) = delete;

    void show(const Progress& progress, Clock::time_point now = Clock::now());

private:
    TextSink& messages_;
    Clock::time_point last_;
    bool on_screen_ = false;
};

} // namespace leat::driver
