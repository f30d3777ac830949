#pragma once

namespace groundsill::cli {

/// What the program's exit code says.
enum ExitCode {
    exit_ok = 0,
    exit_over_limit = 1,   ///< analysed, a check is over its limit
    exit_wrong_input = 2,  ///< the command line or the model is wrong
    exit_cannot_stand = 3, ///< the structure cannot be analysed
    exit_output = 4,       ///< an output could not be written, or the run was interrupted
};

} // namespace groundsill::cli
