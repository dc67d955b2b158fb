#include "catch.hpp"
#include "duct.hpp"

#include <cstdio>
#include <functional>
#include <iostream>
#include <unistd.h>

using namespace leat;
using namespace leat::published;

namespace {

/// Turns one stream of this process into a nameless file for as long as it lives.
class Capture {
public:
    explicit Capture(int descriptor) : descriptor_(descriptor), file_(std::tmpfile())
    {
        REQUIRE(file_ != nullptr);
        flush();
        kept_ = dup(descriptor_);
        REQUIRE(dup2(fileno(file_), descriptor_) == descriptor_);
    }
    Capture(const Capture&) = delete;
    Capture& operator=(const Capture&) = delete;
    ~Capture()
    {
        restore();
        std::fclose(file_);
    }

    /// Bytes written so far; ends the capture.
    long bytes()
    {
        restore();
        std::fseek(file_, 0, SEEK_END);
        return std::ftell(file_);
    }

private:
    static void flush()
    {
        std::cout.flush();
        std::cerr.flush();
        std::clog.flush();
        std::fflush(nullptr);
    }
    void restore()
    {
        if (kept_ >= 0) {
            flush();
            dup2(kept_, descriptor_);
            close(kept_);
            kept_ = -1;
        }
    }

    int descriptor_;
    std::FILE* file_;
    int kept_ = -1;
};

struct Written {
    long out = 0;
    long err = 0;
};

Written written_by(const std::function<void()>& work)
{
    Capture out(STDOUT_FILENO);
    Capture err(STDERR_FILENO);
    work();
    const long err_bytes = err.bytes();
    return {out.bytes(), err_bytes};
}

} // namespace

TEST_CASE("Solving writes nothing to the streams of the program", "[published]")
{
    Outcome outcome{};
    Written written = written_by([&] { outcome = solve(passage_of({"circular tube", 500, 30})).outcome; });
    CHECK(outcome == Outcome::converged);
    CHECK(written.out == 0);
    CHECK(written.err == 0);

    written = written_by([&] {
        Options options;
        options.iterations = 1;
        outcome = solve(passage_of({"concentric annulus", 2e4, 30, 0.2}), {}, options).outcome;
        (void)plan(passage_of({"parallel plates", 0.1, 1}));
    });
    CHECK(outcome == Outcome::out_of_budget);
    CHECK(written.out == 0);
    CHECK(written.err == 0);

    bool refused = false;
    written = written_by([&] {
        try {
            (void)solve({});
        } catch (const InvalidInput&) {
            refused = true;
        }
    });
    CHECK(refused);
    CHECK(written.out == 0);
    CHECK(written.err == 0);
}

TEST_CASE("What is written to the streams is noticed", "[published]")
{
    Written written = written_by([] { std::cout << "ab"; });
    CHECK(written.out == 2);
    CHECK(written.err == 0);
    written = written_by([] { std::fputs("abc", stderr); });
    CHECK(written.out == 0);
    CHECK(written.err == 3);
    written = written_by([] { CHECK(write(STDOUT_FILENO, "a", 1) == 1); });
    CHECK(written.out == 1);
}
