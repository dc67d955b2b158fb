#include "catch.hpp"

#include "command/run.hpp"
#include "sample_answer.hpp"
#include "sample_case.hpp"

#include <leat/base/error.hpp>

#include <csignal>
#include <stdexcept>

using namespace leat::driver;
using leat::FileError;
using leat::Outcome;

namespace {

// The library's calls, answered at once.
Engine quick_engine(Outcome outcome)
{
    Engine engine;
    engine.solve = [=](const leat::Passage&, const leat::Accuracy&, const leat::Options&, const leat::Observer&,
                       std::stop_token) { return sample_answer(outcome); };
    engine.check_writable = [](const std::string&, const std::string&, bool) {};
    engine.write_result = [](const std::string& directory, const std::string& name, const std::string&,
                             const leat::Answer&, bool) {
        return leat::record::ResultFiles{directory + "/" + name + ".h5", directory + "/" + name + ".xdmf"};
    };
    return engine;
}

struct Run {
    ExitCode code;
    std::string results;
    std::string messages;
};

Run run_on_tube(const Engine& engine, const std::vector<std::string>& more = {}, const std::string& text = tube_case)
{
    const ScratchFolder folder;
    std::vector<std::string> arguments{"solve", folder.file("tube.case", text)};
    arguments.insert(arguments.end(), more.begin(), more.end());
    StringSink results;
    StringSink messages;
    const ExitCode code = run(arguments, results, messages, engine);
    return {code, results.text(), messages.text()};
}

class FullSink : public TextSink {
public:
    void write(std::string_view) override { throw SinkError("No space left on device"); }
};

} // namespace

TEST_CASE("the exit code follows the outcome, and numbers are printed for each")
{
    const std::vector<std::pair<Outcome, ExitCode>> table{{Outcome::converged, ExitCode::success},
                                                          {Outcome::stalled, ExitCode::not_converged},
                                                          {Outcome::out_of_budget, ExitCode::not_converged},
                                                          {Outcome::diverged, ExitCode::diverged},
                                                          {Outcome::cancelled, ExitCode::interrupted}};
    for (const auto& [outcome, code] : table) {
        const Run result = run_on_tube(quick_engine(outcome));
        CHECK(result.code == code);
        CHECK(result.results.find("8435.2") != std::string::npos);
        CHECK(result.messages.empty());
    }
}

TEST_CASE("a fault of the program has its own exit code")
{
    Engine engine = quick_engine(Outcome::converged);
    engine.solve = [](const leat::Passage&, const leat::Accuracy&, const leat::Options&, const leat::Observer&,
                      std::stop_token) -> leat::Answer { throw std::logic_error("a sum went wrong"); };
    const Run result = run_on_tube(engine);
    CHECK(result.code == ExitCode::internal);
    CHECK(result.messages == "leat: internal: a sum went wrong\n");
    CHECK(result.results.empty());
}

TEST_CASE("what the library refuses after all is still a fault of the case")
{
    Engine engine = quick_engine(Outcome::converged);
    engine.solve = [](const leat::Passage&, const leat::Accuracy&, const leat::Options&, const leat::Observer&,
                      std::stop_token) -> leat::Answer {
        throw leat::InvalidInput({{"options.cells", "8 x 8", "too few"}});
    };
    const Run result = run_on_tube(engine);
    CHECK(result.code == ExitCode::invalid_case);
    CHECK(result.messages.find("tube.case: options.cells = 8 x 8: too few\n") != std::string::npos);
}

TEST_CASE("result files are tried before the solve and written after it")
{
    Engine engine = quick_engine(Outcome::converged);
    CHECK(run_on_tube(engine, {"--output", "out"}).results.find("Written: out/tube.h5\nWritten: out/tube.xdmf\n") !=
          std::string::npos);

    engine.check_writable = [](const std::string& directory, const std::string&, bool overwrite) {
        if (!overwrite) {
            throw FileError(FileError::Action::refuse_overwrite, directory + "/tube.h5", "exists already");
        }
    };
    Run result = run_on_tube(engine, {"--output", "out"});
    CHECK(result.code == ExitCode::cannot_create);
    CHECK(result.messages == "leat: out/tube.h5: exists already; --force overwrites\n");
    CHECK(result.results.empty());
    CHECK(run_on_tube(engine, {"--output", "out", "--force"}).code == ExitCode::success);

    engine.write_result = [](const std::string&, const std::string&, const std::string&, const leat::Answer&,
                             bool) -> leat::record::ResultFiles {
        throw FileError(FileError::Action::write, "out/tube.h5", "No space left on device");
    };
    result = run_on_tube(engine, {"--output", "out", "--force"});
    CHECK(result.code == ExitCode::input_output);
    CHECK(result.messages == "leat: out/tube.h5: No space left on device\n");
    CHECK(result.results.find("8435.2") != std::string::npos); // the work is not lost
}

TEST_CASE("a result that cannot be printed is a failure")
{
    const ScratchFolder folder;
    FullSink results;
    StringSink messages;
    CHECK(run({"solve", folder.file("tube.case", tube_case)}, results, messages, quick_engine(Outcome::converged)) ==
          ExitCode::input_output);
    CHECK(messages.text() == "leat: cannot write the result to the standard output: No space left on device\n");
    CHECK(run({"--version"}, results, messages) == ExitCode::input_output);
}

TEST_CASE("a message that cannot be printed is none")
{
    StringSink results;
    FullSink messages;
    CHECK(run({"sovle"}, results, messages) == ExitCode::usage);
}

TEST_CASE("the first interrupt asks the solve to stop")
{
    Engine engine = quick_engine(Outcome::converged);
    engine.solve = [](const leat::Passage&, const leat::Accuracy&, const leat::Options&, const leat::Observer& observer,
                      std::stop_token stop) {
        observer({});
        CHECK_FALSE(stop.stop_requested());
        std::raise(SIGINT);
        observer({});
        return sample_answer(stop.stop_requested() ? Outcome::cancelled : Outcome::converged);
    };
    CHECK(run_on_tube(engine).code == ExitCode::interrupted);
}
