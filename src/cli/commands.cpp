#include "cli/commands.hpp"

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

/// The text of a file; empty after telling why it cannot be read.
std::optional<std::string> text_of(const std::string& path) {
    std::error_code error;
    if (std::filesystem::is_directory(path, error)) {
        complain(fmt::format("{}: error: this is a directory; name a model file", path));
        return std::nullopt;
    }
    std::ifstream file(path, std::ios::binary | std::ios::ate);
    if (!file) {
        complain(fmt::format("{}: error: cannot be read: {}", path, std::strerror(errno)));
        return std::nullopt;
    }
    std::string text;
    const std::streamoff size = file.tellg();
    if (size > 0) text.resize(static_cast<std::size_t>(size));
    file.seekg(0);
    file.read(text.data(), static_cast<std::streamsize>(text.size()));
    if (!file.good() || file.peek() != std::char_traits<char>::eof()) {
        // not a plain file, whose size says nothing: take what comes
        file.clear();
        file.seekg(0);
        file.clear();
        text.assign(std::istreambuf_iterator<char>(file), {});
    }
    return text;
}

/// The model of a file; empty after telling what is wrong with it. Warnings are told too.
std::optional<Model> model_of(const std::string& path) {
    const std::optional<std::string> text = text_of(path);
    if (!text) return std::nullopt;
    ReadResult read = read_model(*text);
    if (!read.diagnostics.empty())
        fmt::print(stderr, "{}", describe(read.diagnostics, path, *text, colour_for(STDERR_FILENO)));
    return std::move(read.model);
}

std::filesystem::path directory_of(const std::string& csv) {
    std::error_code error;
    std::filesystem::create_directories(csv, error);
    if (error && !std::filesystem::is_directory(csv))
        throw OutputError(fmt::format("cannot write {}: {}", csv, error.message()));
    return csv;
}

void write_outputs(const Analysis& analysis, const RunOptions& options, std::optional<OutputFile>& json) {
    const WriteOptions write_options{options.places};
    if (options.json == "-") write_json(analysis, write_options, standard_output());
    if (json) write_json(analysis, write_options, json->sink());
    std::vector<OutputFile> csv;
    if (!options.csv.empty()) {
        const std::filesystem::path directory = directory_of(options.csv);
        for (const CsvFile& file : csv_files(analysis, write_options)) {
            csv.emplace_back(directory / file.name);
            file.write(csv.back().sink());
        }
    }
    if (json) json->commit();
    for (OutputFile& file : csv) file.commit();
}

} // namespace

int run_command(const RunOptions& options) {
    std::optional<OutputFile> json;
    const std::optional<Model> model = model_of(options.model);
    if (!model) return exit_wrong_input;
    if (!options.json.empty() && options.json != "-") json.emplace(options.json);
    const Outcome outcome = analyse(*model);
    if (!outcome.analysis) {
        complain(fmt::format("{}: error: {}", options.model, outcome.refusal.message));
        return exit_cannot_stand;
    }
    for (const std::string& warning : outcome.analysis->warnings)
        complain(fmt::format("{}: warning: {}", options.model, warning));
    // the summary looks through all diagrams, and so do the files: both at once
    std::future<std::string> summary;
    if (options.json != "-")
        summary = std::async(std::launch::async, summary_text, std::cref(*outcome.analysis), colour_for(STDOUT_FILENO));
    write_outputs(*outcome.analysis, options, json);
    if (summary.valid()) standard_output()(summary.get());
    finish_standard_output();
    return exit_ok;
}

int sketch_command(const std::string& path) {
    const std::optional<Model> model = model_of(path);
    if (!model) return exit_wrong_input;
    standard_output()(sketch_text(*model));
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
