#include "command/solve_command.hpp"

#include "casefile/case_file.hpp"
#include "report/solve_report.hpp"
#include "terminal/interrupt.hpp"
#include "terminal/progress_line.hpp"

#include <chrono>
#include <exception>
#include <stop_token>

namespace leat::driver {

namespace {

Answer solve(const CaseFile& of, bool quiet, TextSink& messages, const Engine& engine)
{
    const InterruptWatch watch;
    std::stop_source stop;
    ProgressLine progress_line(messages);
    const auto observe = [&](const Progress& progress) {
        if (watch.interrupted()) {
            stop.request_stop(); // not in the signal handler: it may take a lock
        } else if (!quiet) {
            progress_line.show(progress);
        }
    };
    return engine.solve(of.passage, of.accuracy, of.options, observe, stop.get_token());
}

ExitCode code_of(const Answer& answer)
{
    switch (answer.outcome) {
    case Outcome::converged:
        return ExitCode::success;
    case Outcome::diverged:
        return ExitCode::diverged;
    case Outcome::cancelled:
        return ExitCode::interrupted;
    case Outcome::stalled:
    case Outcome::out_of_budget:
        break;
    }
    return ExitCode::not_converged;
}

} // namespace

ExitCode solve_command(const CommandLine& line, TextSink& results, TextSink& messages, const Engine& engine)
{
    CaseFile of = read_case_file(line.case_path);
    const bool files_wanted = !line.output.empty();
    if (files_wanted) {
        engine.check_writable(line.output, of.name, line.force); // before the work, not after it
    }
    of.options.keep_fields = files_wanted;
    const auto start = std::chrono::steady_clock::now();
    SolveReport report;
    report.name = of.name;
    report.answer = with_case_faults(line.case_path, [&] { return solve(of, line.quiet, messages, engine); });
    report.seconds = std::chrono::duration<double>(std::chrono::steady_clock::now() - start).count();
    std::exception_ptr file_failure;
    if (files_wanted) {
        try {
            const auto files = engine.write_result(line.output, of.name, of.text, report.answer, line.force);
            report.files = {files.hdf5, files.xdmf};
        } catch (const Error&) {
            file_failure = std::current_exception(); // the numbers are worth printing all the same
        }
    }
    results.write(line.json ? solve_document(report) : solve_text(report, results.decorated()));
    if (file_failure) {
        std::rethrow_exception(file_failure);
    }
    return code_of(report.answer);
}

} // namespace leat::driver
