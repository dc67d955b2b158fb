#include "command/check_command.hpp"

#include "casefile/case_file.hpp"
#include "report/check_report.hpp"

namespace leat::driver {

ExitCode check_command(const CommandLine& line, TextSink& results, const Engine& engine)
{
    const CaseFile of = read_case_file(line.case_path);
    const Plan plan =
        with_case_faults(line.case_path, [&] { return engine.plan(of.passage, of.accuracy, of.options); });
    results.write(line.json ? check_document(of, plan) : check_text(of, plan, results.decorated()));
    return ExitCode::success;
}

} // namespace leat::driver
