#include "cli/commands.hpp"

#include <algorithm>
#include <cerrno>
#include <cstdlib>
#include <cstring>
#include <fstream>
#include <functional>
#include <future>
#include <optional>
#include <vector>

#include <unistd.h>

#include <fmt/format.h>

#include "cli/exit_codes.hpp"
#include "cli/output.hpp"
#include "groundsill/groundsill.hpp"
#include "writing/sections_text.hpp"
#include "writing/starters.hpp"

namespace groundsill::cli {

namespace {

void complain(const std::string& message) { fmt::print(stderr, "{}\n", message); }

/// Colour is for people at a terminal who have not turned it off (the NO_COLOR convention).
bool colour_for(int descriptor) {
    const char* off = std::getenv("NO_COLOR");
    const char* terminal = std::getenv("TERM");
    return isatty(descriptor) && !(off && *off) && !(terminal && std::strcmp(terminal, "dumb") == 0);
}

/// The text of a file or pipe; empty after telling why it cannot be read.
std::optional<std::string> text_of(const std::string& path) {
    std::error_code error;
    if (std::filesystem::is_directory(path, error)) {
        complain(fmt::format("{}: error: this is a directory; name a model file", path));
        return std::nullopt;
    }
    std::ifstream file(path, std::ios::binary);
    std::string text;
    if (file && std::filesystem::is_regular_file(path, error)) {
        text.resize(std::filesystem::file_size(path, error));
        file.read(text.data(), static_cast<std::streamsize>(text.size()));
        text.resize(static_cast<std::size_t>(file.gcount()));
    } else if (file) {
        text.assign(std::istreambuf_iterator<char>(file), {});
    }
    if (!file && !file.eof()) {
        complain(fmt::format("{}: error: cannot be read: {}", path, std::strerror(errno)));
        return std::nullopt;
    }
    return text;
}

/// A model with the text that it was read from.
struct ModelFile {
    std::string path;
    std::string text;
    ReadResult read;

    void tell(const Diagnostics& diagnostics) const {
        if (!diagnostics.empty())
            fmt::print(stderr, "{}", describe(diagnostics, path, text, colour_for(STDERR_FILENO)));
    }
};

/// The model of a file; empty after telling what is wrong with it. Warnings are told too.
std::optional<ModelFile> model_of(const std::string& path) {
    std::optional<std::string> text = text_of(path);
    if (!text) return std::nullopt;
    ModelFile file{path, std::move(*text), {}};
    file.read = read_model(file.text);
    file.tell(file.read.diagnostics);
    if (!file.read.model) return std::nullopt;
    return file;
}

/// True when an output would fall on the model itself.
bool is_the_model(const std::string& output, const std::string& model) {
    std::error_code error;
    return std::filesystem::equivalent(output, model, error);
}

/// Why the names of the outputs cannot be meant; empty when they can.
std::string wrong_outputs(const RunOptions& options) {
    if (options.json && options.json->empty()) return "--json needs the name of a file, or - for the standard output";
    if (options.csv && options.csv->empty()) return "--csv needs the name of a directory";
    if (options.csv == "-") return "--csv writes several files: it needs the name of a directory";
    if (options.json && is_the_model(*options.json, options.model))
        return fmt::format("--json would write over the model {}: name another file", options.model);
    return {};
}

std::filesystem::path directory_of(const std::string& csv) {
    std::error_code error;
    std::filesystem::create_directories(csv, error);
    if (error && !std::filesystem::is_directory(csv))
        throw OutputError(fmt::format("cannot write {}: {}", csv, error.message()));
    return csv;
}

/// Writes the CSV files; each waits for its commit.
std::vector<OutputFile> write_csv(const Analysis& analysis, const WriteOptions& options, const std::string& csv) {
    const std::filesystem::path directory = directory_of(csv);
    std::vector<OutputFile> files;
    for (const CsvFile& file : csv_files(analysis, options)) {
        files.emplace_back(directory / file.name);
        file.write(files.back().sink());
    }
    return files;
}

/// Tells of CSV files that this program writes, lie in the directory and are not of this run.
void tell_stale(const Analysis& analysis, const WriteOptions& options, const std::string& csv) {
    const std::vector<CsvFile> written = csv_files(analysis, options);
    for (const char* name : csv_names)
        if (std::ranges::none_of(written, [&](const CsvFile& file) { return file.name == name; }) &&
            std::filesystem::exists(std::filesystem::path(csv) / name))
            complain(fmt::format("{}/{}: warning: this file is from an earlier run; the model as it is now has none",
                                 csv, name));
}

/// Everything that was asked for: files first, beside their places, then the text, then the files into their places, so
/// that nothing is left behind when anything cannot be written.
void write_outputs(const Analysis& analysis, const RunOptions& options, std::optional<OutputFile>& json) {
    const WriteOptions write_options{options.places};
    const bool text = options.json != "-";
    // the summary looks through all diagrams, and so do the files: both at once
    std::future<std::string> summary;
    if (text) summary = std::async(std::launch::async, summary_text, std::cref(analysis), colour_for(STDOUT_FILENO));
    if (json) write_json(analysis, write_options, json->sink());
    std::vector<OutputFile> csv;
    if (options.csv) csv = write_csv(analysis, write_options, *options.csv);
    if (text)
        standard_output()(summary.get());
    else
        write_json(analysis, write_options, standard_output());
    finish_standard_output();
    if (json) json->commit();
    for (OutputFile& file : csv) file.commit();
    if (options.csv) tell_stale(analysis, write_options, *options.csv);
}

} // namespace

int run_command(const RunOptions& options) {
    if (const std::string wrong = wrong_outputs(options); !wrong.empty()) {
        complain("error: " + wrong);
        return exit_wrong_input;
    }
    std::optional<ModelFile> file = model_of(options.model);
    if (!file) return exit_wrong_input;
    std::optional<OutputFile> json;
    if (options.json && options.json != "-") json.emplace(*options.json);
    Outcome outcome = analyse(*file->read.model);
    if (!outcome.analysis) {
        file->tell(outcome.refusals);
        return exit_cannot_stand;
    }
    Analysis& analysis = *outcome.analysis;
    for (const std::string& warning : analysis.warnings)
        complain(fmt::format("{}: warning: {}", options.model, warning));
    // what reading warned of goes into the results, too
    std::vector<std::string> warnings;
    for (const Diagnostic& diagnostic : file->read.diagnostics) warnings.push_back(diagnostic.message);
    analysis.warnings.insert(analysis.warnings.begin(), warnings.begin(), warnings.end());
    write_outputs(analysis, options, json);
    return exit_ok;
}

int sketch_command(const std::string& path) {
    const std::optional<ModelFile> file = model_of(path);
    if (!file) return exit_wrong_input;
    standard_output()(sketch_text(*file->read.model));
    finish_standard_output();
    return exit_ok;
}

int sections_command(const std::string& pattern) {
    const std::string text = sections_text(pattern);
    if (text.empty()) {
        complain(fmt::format("error: no section of the tables has \"{}\" in its name; without a pattern all are listed",
                             pattern));
        return exit_wrong_input;
    }
    standard_output()(text);
    finish_standard_output();
    return exit_ok;
}

int new_command(const std::string& kind, const std::string& file) {
    const std::optional<std::string> text = starter_model(kind);
    if (!text) {
        complain(fmt::format("error: there is no starter model \"{}\"; choose beam, portal or grade-beam", kind));
        return exit_wrong_input;
    }
    if (file.empty()) {
        standard_output()(*text);
        finish_standard_output();
        return exit_ok;
    }
    std::error_code error;
    if (std::filesystem::exists(std::filesystem::symlink_status(file, error))) {
        complain(fmt::format("{}: error: this exists already; name a new file, or remove this one first", file));
        return exit_wrong_input;
    }
    OutputFile output{file};
    output.sink()(*text);
    output.commit();
    fmt::print("Wrote {}. Next: groundsill run {}\n", file, file);
    return exit_ok;
}

} // namespace groundsill::cli
