#pragma once
// The commands, each from its options to an exit code.

#include <optional>
#include <string>

namespace groundsill::cli {

struct RunOptions {
    std::string model;
    std::optional<std::string> json; ///< a file, or "-" for the standard output
    std::optional<std::string> csv;  ///< a directory
    int places = 20;
};

/// Reads, analyses and writes what was asked for. \throws OutputError
int run_command(const RunOptions& options);

/// Prints the model as it is understood. \throws OutputError
int sketch_command(const std::string& model);

/// Lists the rolled sections whose names contain the pattern, all for an empty one. \throws OutputError
int sections_command(const std::string& pattern);

/// Writes a starter model to a file, or to the standard output where `file` is empty; never over an existing file.
/// \throws OutputError
int new_command(const std::string& kind, const std::string& file);

} // namespace groundsill::cli
