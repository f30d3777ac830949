#pragma once
// From an analysis to text, JSON and CSV. Writers give text to a sink; files are opened elsewhere.

#include <functional>
#include <string>
#include <string_view>
#include <vector>

#include "groundsill/analysis.hpp"

namespace groundsill {

/// Takes the next stretch of output. A sink that cannot write throws.
using Sink = std::function<void(std::string_view)>;

struct WriteOptions {
    int places = 20; ///< equal parts of each member at which values are listed; 0: extremes only
};

/// The results in JSON, SI units (the format: docs/results.md). Streamed: memory does not grow with the model.
void write_json(const Analysis& analysis, const WriteOptions& options, const Sink& sink);

/// The names of all CSV files that a run can write.
inline constexpr const char* csv_names[] = {"reactions.csv", "displacements.csv", "members.csv",
                                            "extremes.csv",  "envelopes.csv",     "modes.csv"};

/// One CSV file: its name and how to write it.
struct CsvFile {
    std::string name;
    std::function<void(const Sink&)> write;
};

/// The CSV files of a run, SI units, headers `name [unit]`. The analysis must outlive them.
std::vector<CsvFile> csv_files(const Analysis& analysis, const WriteOptions& options);

/// The summary for a terminal, in display units.
/// \param colour emphasis by terminal control sequences
std::string summary_text(const Analysis& analysis, bool colour);

/// A small text picture and an inventory of the model as understood, in display units; nothing is solved.
std::string sketch_text(const Model& model);

} // namespace groundsill
