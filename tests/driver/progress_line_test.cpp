#include "catch.hpp"

#include "terminal/progress_line.hpp"

using namespace leat::driver;
using namespace std::chrono_literals;

namespace {

class TerminalSink : public StringSink {
public:
    bool decorated() const override { return true; }
};

const leat::Progress progress{.grid = 1, .grid_count = 4, .iteration = 123, .mass = 1.23e-5, .momentum = 4.5e-4};
const ProgressLine::Clock::time_point start{};

} // namespace

TEST_CASE("where nothing can be rewritten, a plain line comes every ten seconds")
{
    StringSink sink;
    {
        ProgressLine line(sink, start);
        line.show(progress, start + 9s);
        CHECK(sink.text().empty());
        line.show(progress, start + 10s);
        line.show(progress, start + 19s);
    }
    CHECK(sink.text() == "leat: grid 2 of 4, iteration 123: mass 1.2e-05, momentum 4.5e-04\n");
}

TEST_CASE("on a terminal one line is rewritten and wiped at the end")
{
    TerminalSink sink;
    {
        ProgressLine line(sink, start);
        line.show(progress, start + 50ms);
        CHECK(sink.text().empty());
        line.show(progress, start + 100ms);
    }
    CHECK(sink.text() == "\r\x1b[Kgrid 2 of 4, iteration 123: mass 1.2e-05, momentum 4.5e-04\r\x1b[K");
}
