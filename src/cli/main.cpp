// Options in, exit code out.

#include <exception>
#include <iostream>

#include <malloc.h>

#include <CLI/CLI.hpp>
#include <fmt/format.h>

#include "cli/commands.hpp"
#include "cli/exit_codes.hpp"
#include "cli/output.hpp"

namespace {

using namespace groundsill::cli;

constexpr const char* footer =
    "Exit codes: 0 analysed, within limits; 1 a check is over its limit; 2 wrong command line or model;\n"
    "3 the structure cannot be analysed; 4 an output could not be written.\n\n"
    "First steps:\n"
    "  groundsill new beam my-beam.toml     a commented model to start from\n"
    "  groundsill sketch my-beam.toml       the model as understood, before anything is solved\n"
    "  groundsill run my-beam.toml          forces, reactions and movements\n\n"
    "Results depend on the model; local codes govern; a licensed engineer reviews and signs.";

struct CommandLine {
    CLI::App app{"groundsill analyses beams and plane frames on supports that give: forces, reactions and movements\n"
                 "under load cases and combinations, from a model in a TOML file.",
                 "groundsill"};
    RunOptions run;
    std::string report, only, sketch_model, pattern, kind, file;
    CLI::App *run_app = nullptr, *sketch_app = nullptr, *sections_app = nullptr, *new_app = nullptr;

    CommandLine() {
        app.require_subcommand(1);
        app.set_version_flag("--version", "groundsill " GROUNDSILL_VERSION, "Print the version");
        app.set_help_flag("-h,--help", "Print this help");
        app.footer(footer);

        run_app = app.add_subcommand("run", "Analyse a model and print a summary");
        run_app->add_option("MODEL", run.model, "The model, a TOML file")->required();
        run_app->add_option("--json", run.json, "Write all results as JSON to a file, or to the standard output with -")
            ->type_name("FILE");
        run_app->add_option("--csv", run.csv, "Write the results as CSV files into a directory")->type_name("DIR");
        run_app->add_option("--places", run.places, "List values along each member at N equal parts; 0: extremes only")
            ->type_name("N")
            ->check(CLI::Range(0, 100000))
            ->capture_default_str();
        run_app->add_option("--report", report, "Write a report page (not available yet)")->type_name("FILE");
        run_app->add_option("--only", only, "Do one part of the analysis (not available yet)")->type_name("PART");

        sketch_app = app.add_subcommand("sketch", "Show a model as it is understood, without solving it");
        sketch_app->add_option("MODEL", sketch_model, "The model, a TOML file")->required();

        sections_app = app.add_subcommand("sections", "List the rolled sections that a model can name");
        sections_app->add_option("PATTERN", pattern, "A part of the names, such as \"IPE\" or \"W12\"");

        new_app = app.add_subcommand("new", "Write a commented model to start from");
        new_app->add_option("KIND", kind, "beam, portal or grade-beam")->required();
        new_app->add_option("FILE", file, "Where to write it; without it, to the standard output");
    }

    int dispatch() {
        if (*run_app) {
            for (const auto& [value, name] : {std::pair{&report, "--report"}, std::pair{&only, "--only"}})
                if (!value->empty()) {
                    fmt::print(stderr, "error: {} is not available yet\n", name);
                    return exit_wrong_input;
                }
            return run_command(run);
        }
        if (*sketch_app) return sketch_command(sketch_model);
        if (*sections_app) return sections_command(pattern);
        return new_command(kind, file);
    }
};

} // namespace

int main(int argc, char** argv) {
    // Large vectors come and go: their memory is kept for the next one instead of being handed back and cleared anew.
    mallopt(M_MMAP_THRESHOLD, 1 << 30);
    mallopt(M_TRIM_THRESHOLD, 1 << 30);
    CommandLine line;
    try {
        line.app.parse(argc, argv);
    } catch (const CLI::ParseError& error) {
        if (line.app.exit(error) != 0) return exit_wrong_input;
        return std::cout.flush() ? exit_ok : exit_output;
    }
    try {
        watch_for_interruption();
        return line.dispatch();
    } catch (const OutputError& error) {
        fmt::print(stderr, "error: {}\n", error.what());
        return exit_output;
    } catch (const std::bad_alloc&) {
        fmt::print(stderr, "error: the model is too large for this machine's memory\n");
        return exit_cannot_stand;
    } catch (const std::exception& error) {
        fmt::print(stderr, "error: {}\n", error.what());
        return exit_output;
    }
}
