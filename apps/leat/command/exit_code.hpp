#pragma once

namespace leat::driver {

/// What the program returns; part of its contract.
enum class ExitCode {
    success = 0,
    not_converged = 1,  ///< or budget spent before the wanted band; numbers printed, marked
    diverged = 2,       ///< numbers printed, marked
    usage = 64,         ///< the command line is wrong
    invalid_case = 65,  ///< the case, or a file that it names, is wrong
    unreadable = 66,    ///< the case, or a file that it names, cannot be read
    internal = 70,      ///< a fault of leat or of its installation
    cannot_create = 73, ///< a result cannot be made, or exists already
    input_output = 74,  ///< writing failed
    interrupted = 130   ///< numbers so far printed, marked
};

} // namespace leat::driver
