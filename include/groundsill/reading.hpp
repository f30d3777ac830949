#pragma once
// From TOML text to a model.

#include <optional>
#include <string>
#include <string_view>

#include "groundsill/diagnostics.hpp"
#include "groundsill/model.hpp"

namespace groundsill {

/// What reading gave: the model, unless there was an error, and everything there is to say about the text.
struct ReadResult {
    std::optional<Model> model;
    Diagnostics diagnostics; ///< in the order of the file
};

/// Reads a model from TOML 1.0 text in UTF-8 (the format: docs/model.md).
/// All errors of the model are found in one call; of TOML syntax, the first. Never throws for bad text.
ReadResult read_model(std::string_view text);

/// Writes diagnostics for a terminal: `file:line:column: error: message`, the line of the text (cut when long) and a
/// mark under the column. \param file name to print before each place \param text the model's text, from which the
/// lines are quoted \param colour emphasis by terminal control sequences
std::string describe(const Diagnostics& diagnostics, std::string_view file, std::string_view text, bool colour);

} // namespace groundsill
