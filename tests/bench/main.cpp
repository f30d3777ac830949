// Timings side by side with general-purpose libraries, on the same structures and in one run. Nothing is asserted:
// machines differ and are noisy, so the ratios are what counts.

#include <algorithm>
#include <chrono>
#include <cmath>
#include <cstdio>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <string>
#include <string_view>
#include <thread>
#include <vector>

#include <fmt/compile.h>
#include <fmt/format.h>

#include "general_solvers.hpp"
#include "groundsill/groundsill.hpp"
#include "processes.hpp"
#include "structures.hpp"
#include "system/factor.hpp"
#include "toml_parse.hpp"
#include "writing/json_writer.hpp"

namespace {

using bench::Vector;

template <class Work> double seconds(const Work& work) {
    const auto start = std::chrono::steady_clock::now();
    work();
    return std::chrono::duration<double>(std::chrono::steady_clock::now() - start).count();
}

double median(std::vector<double> times) {
    std::sort(times.begin(), times.end());
    return times[times.size() / 2];
}

/// Medians of two works, run in turns so that noise meets both.
template <class Ours, class Theirs>
std::pair<double, double> in_turns(int runs, const Ours& ours, const Theirs& theirs) {
    std::vector<double> a, b;
    for (int k = 0; k < runs; ++k) {
        a.push_back(seconds(ours));
        b.push_back(seconds(theirs));
    }
    return {median(a), median(b)};
}

std::string in_units(double time) {
    return time < 0.1 ? fmt::format("{:.3g} ms", 1e3 * time) : fmt::format("{:.3g} s", time);
}

void row(std::string_view work, double ours, std::string_view beside, double theirs, std::string_view target) {
    fmt::print("{:<46} {:>10}   {:<34} {:>10} {:>8.2f}   {}\n", work, in_units(ours), beside, in_units(theirs),
               ours / theirs, target);
    std::fflush(stdout);
}

void save(const std::filesystem::path& path, const std::string& text) { std::ofstream(path, std::ios::binary) << text; }

/// A number in the program must use what was computed, or the compiler may leave it out.
volatile double used;

Vector loads_of(const groundsill::Structure& structure) {
    Vector f(structure.directions(), 0.0);
    for (int d = 0; d < structure.directions(); ++d)
        if (structure.active[d]) f[d] = d % 3 == 1 ? -72e3 : (d % 3 == 0 ? 1e3 : 0);
    return f;
}

void print_difference(const Vector& ours, const Vector& theirs) {
    double difference = 0, size = 0;
    for (std::size_t d = 0; d < ours.size(); ++d) {
        difference = std::max(difference, std::abs(ours[d] - theirs[d]));
        size = std::max(size, std::abs(theirs[d]));
    }
    fmt::print("    (solutions differ by {:.0e} of the largest movement)\n", difference / size);
}

void measure_start(const std::filesystem::path& folder) {
    const auto model = folder / "portal.toml", json = folder / "portal.json";
    save(model, bench::portal());
    const std::vector<std::string> run{GROUNDSILL_PROGRAM, "run", model, "--json", json, "--places", "0"};
    const auto [ours, empty] = in_turns(
        401, [&] { bench::run_process(run); }, [&] { bench::run_process({EMPTY_PROGRAM}); });
    row("portal, 20 members, 10 combinations, to JSON", ours, "empty process", empty, "below 6");
}

void measure_solvers(std::string_view name, const std::string& text, int runs) {
    const groundsill::Model model = groundsill::read_model(text).model.value();
    const groundsill::Structure structure = groundsill::number_structure(model);
    const Vector f = loads_of(structure);
    const bench::Sparse lower = bench::lower_half(groundsill::assemble(structure));
    Vector x, y, z;
    const auto ours = [&] {
        x = f;
        groundsill::Factor(groundsill::assemble(structure)).solve(x);
    };
    std::vector<double> a, b, c;
    for (int k = 0; k < runs; ++k) {
        a.push_back(seconds(ours));
        b.push_back(seconds([&] { y = bench::solve_simplicial(lower, f); }));
        c.push_back(seconds([&] { z = bench::solve_supernodal(lower, f); }));
    }
    const std::string work = fmt::format("{}: assemble, order, factor, solve", name);
    row(work, median(a), "SimplicialLDLT, AMD on nodes *", median(b), "at most 1");
    row(work, median(a), "CHOLMOD supernodal *", median(c), "first 1.5 for 100, later 2 for 300");
    print_difference(x, y);
    print_difference(x, z);
}

void measure_chain_solver(const groundsill::Model& model) {
    Vector x, y;
    double numbering = 0;
    const auto ours = [&] {
        groundsill::Structure structure;
        numbering = seconds([&] { structure = groundsill::number_structure(model); });
        x = loads_of(structure);
        groundsill::Factor(groundsill::assemble(structure)).solve(x);
    };
    ours();
    const Vector f = loads_of(groundsill::number_structure(model));
    const auto [mine, band] = in_turns(5, ours, [&] {
        y = f;
        bench::solve_band(model, y);
    });
    row("chain(1e6): number, assemble, factor, solve", mine, "assemble and LAPACK dpbsv", band, "below 0.8");
    row("  the same without numbering", mine - numbering, "assemble and LAPACK dpbsv", band, "");
    print_difference(x, y);
}

void measure_chain(const std::filesystem::path& folder) {
    const std::string text = bench::chain(1'000'000);
    const auto model_file = folder / "chain.toml", json = folder / "chain.json";
    save(model_file, text);
    std::optional<groundsill::Model> model;
    const auto [reading, parsing] = in_turns(
        3, [&] { model = groundsill::read_model(text).model; },
        [&] { used = static_cast<double>(bench::parse_toml(text)); });
    row(fmt::format("chain(1e6), {} MB: text to model", text.size() / 1'000'000), reading, "toml++'s own parse",
        parsing, "at most 1.3");
    measure_chain_solver(*model);
    model.reset();
    const bench::ProcessCost whole =
        bench::median_process({GROUNDSILL_PROGRAM, "run", model_file, "--json", json, "--places", "0"}, 3);
    row("chain(1e6): end to end, to JSON", whole.seconds, "toml++'s own parse", parsing, "at most 1.5");
    fmt::print("    (peak memory {:.2f} GiB, wanted below 4; {} MB of JSON)\n", whole.megabytes / 1024,
               std::filesystem::file_size(json) / 1'000'000);
}

/// A row of results with six numbers, a million times.
void measure_json() {
    constexpr int rows = 1'000'000;
    Vector values(6 * 1024);
    unsigned state = 1;
    for (double& value : values) {
        state = state * 1664525U + 1013904223U;
        value = (static_cast<double>(state) - 2e9) * 1e-5 / 3;
    }
    const auto numbers_of = [&](int k) { return &values[6 * std::size_t(k % 1024)]; };
    std::size_t written = 0;
    const groundsill::Sink sink = [&](std::string_view text) { written += text.size(); };
    const auto ours = [&] {
        groundsill::writing::Output output(sink);
        groundsill::writing::JsonWriter json(output);
        json.open_array();
        for (int k = 0; k < rows; ++k) {
            const double* v = numbers_of(k);
            json.open_object_row();
            for (const char* key : {"at", "N", "V", "M", "along", "across"}) json.key(key).number(*v++);
            json.close();
        }
        json.close();
        output.finish();
    };
    const auto theirs = [&] {
        fmt::memory_buffer buffer;
        for (int k = 0; k < rows; ++k) {
            const double* v = numbers_of(k);
            fmt::format_to(
                std::back_inserter(buffer),
                FMT_COMPILE("{{\"at\": {}, \"N\": {}, \"V\": {}, \"M\": {}, \"along\": {}, \"across\": {}}},\n"), v[0],
                v[1], v[2], v[3], v[4], v[5]);
            if (buffer.size() < 60'000) continue;
            sink({buffer.data(), buffer.size()});
            buffer.clear();
        }
    };
    const auto [mine, fmt_time] = in_turns(5, ours, theirs);
    row("JSON: 1e6 rows of six numbers", mine, "fmt, compiled format", fmt_time, "");
    fmt::print("    ({:.0f} ns a number)\n", 1e9 * mine / (6.0 * rows));
}

} // namespace

int main(int argc, char** argv) {
    const std::filesystem::path folder = argc > 1 ? argv[1] : ".";
    fmt::print("{} cores; medians, run in turns; * without assembly, which is in groundsill's time\n\n",
               std::thread::hardware_concurrency());
    fmt::print("{:<46} {:>10}   {:<34} {:>10} {:>8}   {}\n", "work", "groundsill", "beside", "", "ratio", "target");
    measure_start(folder);
    measure_json();
    measure_solvers("grid(100,100)", bench::grid(100, 100), 5);
    measure_solvers("grid(300,300)", bench::grid(300, 300), 3);
    measure_chain(folder);
    return 0;
}
