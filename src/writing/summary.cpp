// The summary for a terminal: the answers first, then what was verified, then the cautions. It fits on one screen.

#include <algorithm>
#include <cmath>
#include <functional>

#include <fmt/format.h>

#include "analysis/case_loads.hpp"
#include "analysis/extremes.hpp"
#include "groundsill/writing.hpp"
#include "units/display.hpp"
#include "writing/names.hpp"
#include "writing/style.hpp"
#include "writing/table.hpp"
#include "writing/utf8.hpp"

namespace groundsill {

namespace {

using writing::counted;
using writing::Style;
using writing::Table;
using Align = Table::Align;

constexpr std::size_t most_supports = 8; ///< rows of the reaction table
constexpr int name_width = 20;
constexpr double printed_noise = 1e-9; ///< below this part of the largest of its kind a number is printed as 0

double larger(double a, double b) { return std::max(std::abs(a), std::abs(b)); }
double largest(const LeastMost<Peak>& peaks) { return larger(peaks.least.value, peaks.most.value); }

/// Sizes below which a value is printed as 0.
struct Thresholds {
    double force = 0;
    double moment = 0;
    double movement = 0;
    double rotation = 0;
};

Thresholds thresholds(const Analysis& analysis, const Peaks& peaks) {
    const auto size = static_cast<double>(analysis.internals->structure.size);
    const double force =
        std::max({largest(peaks.N), largest(peaks.V), largest(peaks.reaction_x), largest(peaks.reaction_y)});
    const double moment = std::max(largest(peaks.M), largest(peaks.reaction_moment));
    const double movement = std::max(largest(peaks.x), largest(peaks.y));
    return {std::max(peaks.rounding.force, printed_noise * force),
            std::max({peaks.rounding.moment, peaks.rounding.force * size, printed_noise * moment}),
            std::max(peaks.rounding.movement, printed_noise * movement),
            printed_noise * std::max(largest(peaks.rotation), size > 0 ? movement / size : 0)};
}

/// The rows of governing values.
class PeakRows {
  public:
    PeakRows(const Analysis& analysis, const Display& display)
        : analysis_(analysis), display_(display),
          table_({Align::left, Align::right, Align::left, Align::left, Align::left}) {}

    /// Values of one sign: "none" where there is none. The label tells the direction, so the size is printed.
    void positive(std::string label, Shown kind, const Peak& most, double threshold) {
        row(std::move(label), kind, most, most.value > threshold);
    }
    void negative(std::string label, Shown kind, const Peak& least, double threshold) {
        row(std::move(label), kind, least, least.value < -threshold);
    }
    /// The larger of both signs.
    void either(std::string label, Shown kind, const LeastMost<Peak>& peaks, double threshold) {
        const Peak& peak = -peaks.least.value > peaks.most.value ? peaks.least : peaks.most;
        row(std::move(label), kind, peak, std::abs(peak.value) > threshold);
    }
    std::string text() const { return table_.text(); }

  private:
    void row(std::string label, Shown kind, const Peak& peak, bool exists) {
        if (!exists || peak.response < 0) {
            table_.row({std::move(label), "none"});
            return;
        }
        table_.row(
            {std::move(label), display_.result(kind, peak.value), std::string(display_.unit(kind)), where(peak),
             "in " + writing::shortened(writing::printable(governing_name(analysis_, peak.response)), name_width)});
    }
    std::string where(const Peak& peak) const {
        const Model& model = *analysis_.model;
        const auto name = [](const std::string& text) {
            return writing::shortened(writing::printable(text), name_width);
        };
        if (peak.member < 0) return "node " + name(model.nodes[peak.node].name);
        const std::string& member = model.members[peak.member].name;
        return fmt::format("{} at {}", name(member), display_.result_with_unit(Shown::length, peak.at));
    }

    const Analysis& analysis_;
    const Display& display_;
    Table table_;
};

std::string peak_table(const Analysis& analysis, const Display& display, const Peaks& peaks, const Thresholds& zero) {
    PeakRows rows(analysis, display);
    rows.positive("moment, sagging", Shown::moment, peaks.M.most, zero.moment);
    rows.negative("moment, hogging", Shown::moment, peaks.M.least, zero.moment);
    rows.positive("shear, most", Shown::force, peaks.V.most, zero.force);
    rows.negative("shear, least", Shown::force, peaks.V.least, zero.force);
    rows.positive("axial, tension", Shown::force, peaks.N.most, zero.force);
    rows.negative("axial, compression", Shown::force, peaks.N.least, zero.force);
    rows.positive("movement up", Shown::movement, peaks.y.most, zero.movement);
    rows.negative("movement down", Shown::movement, peaks.y.least, zero.movement);
    rows.positive("movement to the right", Shown::movement, peaks.x.most, zero.movement);
    rows.negative("movement to the left", Shown::movement, peaks.x.least, zero.movement);
    rows.either("rotation of a node", Shown::rotation, peaks.rotation, zero.rotation);
    rows.positive("reaction up", Shown::force, peaks.reaction_y.most, zero.force);
    rows.negative("reaction down", Shown::force, peaks.reaction_y.least, zero.force);
    rows.either("reaction sideways", Shown::force, peaks.reaction_x, zero.force);
    rows.either("reaction moment", Shown::moment, peaks.reaction_moment, zero.moment);
    return rows.text();
}

std::string counts(const Analysis& analysis) {
    const Model& model = *analysis.model;
    std::string text = fmt::format("{}, {}, {}; {}", counted(model.nodes.size(), "node", "nodes"),
                                   counted(model.members.size(), "member", "members"),
                                   counted(model.supports.size(), "support", "supports"),
                                   counted(model.cases.size(), "case", "cases"));
    if (speaks_of_combinations(analysis))
        text += ", " + counted(model.combinations.size(), "combination", "combinations");
    return text + "; linear elastic, small movements.\n";
}

std::string peak_heading(const Analysis& analysis) {
    const std::size_t all = governing_responses(analysis).size();
    const bool combinations = speaks_of_combinations(analysis);
    std::string text =
        "Largest over " + (combinations ? counted(all, "combination", "combinations") : counted(all, "case", "cases"));
    const std::size_t service = movement_responses(analysis).size();
    if (service != all) text += fmt::format("; movements over {} for service", service);
    return text;
}

/// Prints values of one column kind, noise as 0.
std::string cell(const Display& display, Shown kind, double value, double threshold) {
    return display.result(kind, std::abs(value) > threshold ? value : 0);
}

std::string reaction_table(const Analysis& analysis, const Display& display, const Thresholds& zero) {
    const Model& model = *analysis.model;
    const bool single = governing_responses(analysis).size() == 1;
    std::vector<Align> columns(single ? 4 : 7, Align::right);
    columns.front() = Align::left;
    Table table(columns);
    table.row(single ? std::vector<std::string>{"node", "x", "y", "moment"}
                     : std::vector<std::string>{"node", "x least", "x most", "y least", "y most", "moment least",
                                                "moment most"});
    for (std::size_t support = 0; support < std::min(model.supports.size(), most_supports); ++support) {
        const ReactionRange range = reaction_range(analysis, static_cast<int>(support));
        std::vector<std::string> row{
            writing::shortened(writing::printable(writing::node_of(model, model.supports[support])), name_width)};
        const auto add = [&](const LeastMost<double>& values, Shown kind, double threshold) {
            row.push_back(cell(display, kind, values.least, threshold));
            if (!single) row.push_back(cell(display, kind, values.most, threshold));
        };
        add(range.x, Shown::force, zero.force);
        add(range.y, Shown::force, zero.force);
        add(range.moment, Shown::moment, zero.moment);
        table.row(std::move(row));
    }
    std::string text = table.text();
    if (model.supports.size() > most_supports) {
        text += fmt::format("  … and {} more: see the JSON or CSV output\n", model.supports.size() - most_supports);
    }
    return text;
}

std::string small_number(double value) { return value == 0 ? "0" : fmt::format("{:.1e}", value); }

std::string verification(const Analysis& analysis) {
    const Verification& figures = analysis.verification;
    return fmt::format("  Reactions and loads balance but for {} of their sum (round-off is about 1e-16).\n"
                       "  The solution leaves {} of the largest force. Condition of the stiffness: {}.\n",
                       small_number(figures.equilibrium), small_number(figures.residual),
                       small_number(figures.condition));
}

std::string place_of(const Model& model, const Display& display, const Mode::Place& place) {
    if (place.node >= 0) return "node " + writing::printable(model.nodes[place.node].name);
    if (place.member < 0) return "none";
    return writing::printable(model.members[place.member].name) + " at " +
           display.result_with_unit(Shown::length, place.at);
}

/// The two parts of the structure that hold the most strain energy of a mode: "70 % roof, 21 % support A".
std::string softest_parts(const Model& model, const Mode& mode) {
    std::vector<Mode::Share> shares = mode.flexibility;
    std::ranges::stable_sort(shares, std::greater<>{}, &Mode::Share::share);
    std::string text;
    for (std::size_t k = 0; k < std::min<std::size_t>(2, shares.size()); ++k) {
        if (shares[k].share < 0.005) break;
        const std::string name =
            shares[k].member >= 0
                ? writing::printable(model.members[shares[k].member].name)
                : "support " + writing::printable(writing::node_of(model, model.supports[shares[k].support]));
        if (k > 0) text += ", ";
        text += fmt::format("{:.0f} % {}", 100 * shares[k].share, name);
    }
    return text;
}

std::string mode_table(const Model& model, const Display& display, const Vibration& vibration) {
    constexpr std::size_t most_modes = 10;
    Table table({Align::left, Align::right, Align::right, Align::left, Align::left});
    const bool metric = model.display == DisplayUnits::metric;
    table.row({"mode", "Hz", metric ? "modal kg" : "modal lb", "moves most", "strain energy in"});
    const double unit = metric ? 1 : 0.45359237; // the pound, exact by definition (1959)
    for (std::size_t k = 0; k < std::min(most_modes, vibration.modes.size()); ++k) {
        const Mode& mode = vibration.modes[k];
        table.row({fmt::format("{}", k + 1), significant(mode.frequency), significant(mode.modal_mass / unit),
                   place_of(model, display, mode.largest), softest_parts(model, mode)});
    }
    std::string text = table.text();
    if (vibration.modes.size() > most_modes)
        text += fmt::format("  ... and {} more, in the JSON and CSV files\n", vibration.modes.size() - most_modes);
    return text;
}

constexpr std::string_view cautions = "Holds for the model as assumed; confirm ground and structure as built; local "
                                      "codes govern; a licensed engineer reviews and signs.\n"
                                      "Not checked: strength, deflections, buckling (lateral-torsional too), "
                                      "second-order effects, connections, cracking, bearing.\n";

} // namespace

std::string summary_text(const Analysis& analysis, bool colour) {
    const Model& model = *analysis.model;
    const Display display(model.display);
    const Style style(colour);
    std::string text;
    if (!model.title.empty()) text += style.strong(writing::printable(model.title)) + '\n';
    text += counts(analysis);
    if (!governing_responses(analysis).empty()) {
        const Peaks peaks = find_peaks(analysis);
        const Thresholds zero = thresholds(analysis, peaks);
        text += '\n' + style.strong(peak_heading(analysis)) + '\n' + peak_table(analysis, display, peaks, zero);
        text +=
            '\n' +
            style.strong(fmt::format("Reactions, {} and {}", display.unit(Shown::force), display.unit(Shown::moment))) +
            '\n' + reaction_table(analysis, display, zero);
    }
    if (analysis.vibration && !analysis.vibration->modes.empty())
        text += '\n' + style.strong("Natural frequencies") + '\n' + mode_table(model, display, *analysis.vibration);
    text += '\n' + style.strong("Verified") + '\n' + verification(analysis);
    if (!analysis.warnings.empty())
        text += "  " + counted(analysis.warnings.size(), "warning", "warnings") + " on standard error.\n";
    text += '\n';
    text += cautions;
    return text;
}

} // namespace groundsill
