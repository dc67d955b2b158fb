#include "command/run.hpp"

#include "casefile/case_file.hpp"
#include "command/check_command.hpp"
#include "command/command_line.hpp"
#include "command/help_text.hpp"
#include "command/solve_command.hpp"
#include "terminal/message.hpp"
#include "units/unit_system.hpp"

#include <leat/base/error.hpp>
#include <leat/base/version.hpp>

namespace leat::driver {

namespace {

ExitCode dispatch(const CommandLine& line, TextSink& results, TextSink& messages, const Engine& engine)
{
    using Command = CommandLine::Command;
    if (line.command_help) {
        results.write(command_help(line.command));
        return ExitCode::success;
    }
    switch (line.command) {
    case Command::short_help:
        results.write(short_help());
        return ExitCode::success;
    case Command::help:
        results.write(long_help());
        return ExitCode::success;
    case Command::version:
        results.write("leat " + std::string(version()) + "\n");
        return ExitCode::success;
    case Command::solve:
        return solve_command(line, results, messages, engine);
    case Command::check:
        break;
    }
    return check_command(line, results, engine);
}

ExitCode code_of(FileError::Action action)
{
    switch (action) {
    case FileError::Action::create:
    case FileError::Action::refuse_overwrite:
        return ExitCode::cannot_create;
    case FileError::Action::read:
        return ExitCode::unreadable;
    case FileError::Action::write:
        break;
    }
    return ExitCode::input_output;
}

} // namespace

ExitCode run(const std::vector<std::string>& arguments, TextSink& results, TextSink& messages, const Engine& engine)
{
    try {
        return dispatch(read_command_line(arguments), results, messages, engine);
    } catch (const UsageError& error) {
        say(messages, error.what());
        return ExitCode::usage;
    } catch (const CaseError& error) {
        for (const std::string& message : error.messages()) {
            say(messages, message);
        }
        return error.unreadable() ? ExitCode::unreadable : ExitCode::invalid_case;
    } catch (const FileError& error) {
        const bool exists = error.action() == FileError::Action::refuse_overwrite;
        say(messages, std::string(error.what()) + (exists ? "; --force overwrites" : ""));
        return code_of(error.action());
    } catch (const SinkError& error) {
        say(messages, std::string("cannot write the result to the standard output: ") + error.what());
        return ExitCode::input_output;
    } catch (const UnitSystemError& error) {
        say(messages, error.what());
        return ExitCode::internal;
    } catch (const std::bad_alloc&) {
        say(messages, "internal: out of memory; state fewer cells");
        return ExitCode::internal;
    } catch (const std::exception& error) {
        say(messages, std::string("internal: ") + error.what());
        return ExitCode::internal;
    }
}

} // namespace leat::driver
