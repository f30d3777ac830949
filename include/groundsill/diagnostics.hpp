#pragma once
// What reading a model has to say: errors and warnings, each with its place in the file.

#include <string>
#include <vector>

namespace groundsill {

/// A place in the model file: line and column count from 1; 0 means that the thing has no place (a model made in code).
struct Position {
    int line = 0;
    int column = 0;
};

/// One thing to tell the user about the model.
struct Diagnostic {
    enum class Severity { error, warning };

    Severity severity = Severity::error;
    Position position;
    std::string message; ///< what is wrong and, after it, the way out; one sentence or two, no trailing newline
};

using Diagnostics = std::vector<Diagnostic>;

/// True when at least one of them is an error.
bool has_errors(const Diagnostics& diagnostics);

} // namespace groundsill
