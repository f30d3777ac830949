// The results as CSV files (RFC 4180 quoting); the columns are those of docs/results.md.

#include <array>
#include <initializer_list>

#include "analysis/extremes.hpp"
#include "groundsill/writing.hpp"
#include "writing/names.hpp"
#include "writing/output.hpp"

namespace groundsill {

namespace {

using writing::Output;

/// Writes cells of one file, row by row. A value that does not exist is an empty cell.
class Rows {
  public:
    explicit Rows(const Sink& sink) : output_(sink) {}

    void header(std::initializer_list<std::string_view> columns) {
        for (const std::string_view column : columns) cell(column);
        end();
    }
    void cell(std::string_view text) {
        separate();
        if (text.find_first_of(",\"\r\n") == std::string_view::npos) return output_.text(text);
        output_.character('"');
        for (const char c : text) {
            if (c == '"') output_.character('"');
            output_.character(c);
        }
        output_.character('"');
    }
    void cell(double value) {
        separate();
        output_.number(value, "");
    }
    void empty(int cells) {
        for (; cells > 0; --cells) separate();
    }
    void end() {
        output_.character('\n');
        first_ = true;
    }
    void finish() { output_.finish(); }

  private:
    void separate() {
        if (!first_) output_.character(',');
        first_ = false;
    }

    Output output_;
    bool first_ = true;
};

/// One case or combination: what its rows begin with, and its answers.
struct Scope {
    const Analysis& analysis;
    bool is_combination;
    int index;

    const std::string& name() const {
        const auto i = static_cast<std::size_t>(index);
        return is_combination ? analysis.model->combinations[i].name : analysis.model->cases[i].name;
    }
    const Response& response() const {
        const auto i = static_cast<std::size_t>(index);
        return is_combination ? analysis.combinations[i] : analysis.cases[i];
    }
    Diagram diagram(std::size_t member) const {
        const int m = static_cast<int>(member);
        return is_combination ? combination_diagram(analysis, index, m) : case_diagram(analysis, index, m);
    }
    void begin_row(Rows& rows, std::string_view subject) const {
        rows.cell(name());
        rows.cell(is_combination ? "combination" : "case");
        rows.cell(subject);
    }
};

/// Calls `write(scope)` for every case, then for every combination.
template <class Write> void for_each_scope(const Analysis& analysis, const Write& write) {
    for (int index = 0; index < static_cast<int>(analysis.cases.size()); ++index) write(Scope{analysis, false, index});
    for (int index = 0; index < static_cast<int>(analysis.combinations.size()); ++index) {
        write(Scope{analysis, true, index});
    }
}

void write_reactions(const Analysis& analysis, Rows& rows) {
    const Model& model = *analysis.model;
    rows.header({"case or combination", "kind", "node", "x [N]", "y [N]", "moment [N m]"});
    for_each_scope(analysis, [&](const Scope& scope) {
        for (std::size_t support = 0; support < model.supports.size(); ++support) {
            const Reaction& reaction = scope.response().reactions[support];
            scope.begin_row(rows, writing::node_of(model, model.supports[support]));
            for (const double value : {reaction.x, reaction.y, reaction.moment}) rows.cell(value);
            rows.end();
        }
    });
}

void write_displacements(const Analysis& analysis, Rows& rows) {
    const Model& model = *analysis.model;
    rows.header({"case or combination", "kind", "node", "x [m]", "y [m]", "rotation [rad]"});
    for_each_scope(analysis, [&](const Scope& scope) {
        for (std::size_t node = 0; node < model.nodes.size(); ++node) {
            const NodeMovement& movement = scope.response().movements[node];
            scope.begin_row(rows, model.nodes[node].name);
            rows.cell(movement.x);
            rows.cell(movement.y);
            if (movement.rotation) {
                rows.cell(*movement.rotation);
            } else {
                rows.empty(1);
            }
            rows.end();
        }
    });
}

void write_members(const Analysis& analysis, int places, Rows& rows) {
    const Model& model = *analysis.model;
    rows.header(
        {"case or combination", "kind", "member", "at [m]", "N [N]", "V [N]", "M [N m]", "along [m]", "across [m]"});
    for_each_scope(analysis, [&](const Scope& scope) {
        for (std::size_t member = 0; member < model.members.size(); ++member) {
            for (const DiagramPlace& place : scope.diagram(member).places(places)) {
                scope.begin_row(rows, model.members[member].name);
                const MemberForces& forces = place.forces;
                for (const double value : {place.at, forces.N, forces.V, forces.M, place.along, place.across}) {
                    rows.cell(value);
                }
                rows.end();
            }
        }
    });
}

void write_extremes(const Analysis& analysis, Rows& rows) {
    const Model& model = *analysis.model;
    rows.header({"case or combination", "kind", "member", "N max [N]", "N max at [m]", "N min [N]", "N min at [m]",
                 "V max [N]", "V max at [m]", "V min [N]", "V min at [m]", "M max [N m]", "M max at [m]", "M min [N m]",
                 "M min at [m]", "across max [m]", "across max at [m]", "across min [m]", "across min at [m]"});
    for_each_scope(analysis, [&](const Scope& scope) {
        const RoundOff rounding = round_off(analysis, scope.response());
        for (std::size_t member = 0; member < model.members.size(); ++member) {
            const Diagram diagram = scope.diagram(member);
            scope.begin_row(rows, model.members[member].name);
            for (const Curve curve : {Curve::N, Curve::V, Curve::M, Curve::across}) {
                const DiagramRange range = member_range(diagram, curve, rounding);
                for (const double value : {range.max.value, range.max.at, range.min.value, range.min.at})
                    rows.cell(value);
            }
            rows.end();
        }
    });
}

/// Writes the envelope of one limit state: a row for each governing value, with all that acts together there.
class EnvelopeRows {
  public:
    EnvelopeRows(const Model& model, LimitState limit, Rows& rows) : model_(model), limit_(limit), rows_(rows) {}

    void reaction(const std::string& node, std::string_view quantity, const LeastMost<ReactionExtreme>& range) {
        row(node, quantity, "least", range.least);
        row(node, quantity, "most", range.most);
    }
    void member(const std::string& member, std::string_view quantity, const LeastMost<ForceExtreme>& range) {
        row(member, quantity, "least", range.least);
        row(member, quantity, "most", range.most);
    }

  private:
    void begin(int combination) {
        rows_.cell(model_.combinations[combination].name);
        rows_.cell(writing::limit_name(limit_));
    }
    void row(const std::string& node, std::string_view quantity, std::string_view sense,
             const ReactionExtreme& extreme) {
        begin(extreme.combination);
        rows_.cell(node);
        rows_.empty(1);
        rows_.cell(quantity);
        rows_.cell(sense);
        rows_.empty(4);
        for (const double value : {extreme.with.x, extreme.with.y, extreme.with.moment}) rows_.cell(value);
        rows_.end();
    }
    void row(const std::string& member, std::string_view quantity, std::string_view sense,
             const ForceExtreme& extreme) {
        begin(extreme.combination);
        rows_.empty(1);
        rows_.cell(member);
        rows_.cell(quantity);
        rows_.cell(sense);
        for (const double value : {extreme.at, extreme.with.N, extreme.with.V, extreme.with.M}) rows_.cell(value);
        rows_.empty(3);
        rows_.end();
    }

    const Model& model_;
    LimitState limit_;
    Rows& rows_;
};

void write_envelope(const Model& model, LimitState limit, const Envelope& envelope, Rows& rows) {
    EnvelopeRows lines(model, limit, rows);
    for (std::size_t support = 0; support < model.supports.size(); ++support) {
        const std::string& node = writing::node_of(model, model.supports[support]);
        lines.reaction(node, "x", envelope.reactions[support].x);
        lines.reaction(node, "y", envelope.reactions[support].y);
        lines.reaction(node, "moment", envelope.reactions[support].moment);
    }
    for (std::size_t member = 0; member < model.members.size(); ++member) {
        const std::string& name = model.members[member].name;
        lines.member(name, "N", envelope.members[member].N);
        lines.member(name, "V", envelope.members[member].V);
        lines.member(name, "M", envelope.members[member].M);
    }
}

void write_envelopes(const Analysis& analysis, Rows& rows) {
    rows.header({"combination", "limit", "node", "member", "quantity", "extreme", "at [m]", "N [N]", "V [N]", "M [N m]",
                 "x [N]", "y [N]", "moment [N m]"});
    if (analysis.strength) write_envelope(*analysis.model, LimitState::strength, *analysis.strength, rows);
    if (analysis.service) write_envelope(*analysis.model, LimitState::service, *analysis.service, rows);
}

void write_mode_figures(const Mode& mode, int number, Rows& rows) {
    rows.cell(static_cast<double>(number));
    rows.cell(mode.frequency);
    rows.cell(mode.modal_mass);
    rows.cell(mode.effective_x);
    rows.cell(mode.effective_y);
}

/// One row a node, then one a place of each member.
void write_modes(const Analysis& analysis, int places, Rows& rows) {
    rows.header({"mode", "frequency [Hz]", "modal mass [kg]", "effective mass x [kg]", "effective mass y [kg]", "node",
                 "x", "y", "rotation [rad/m]", "member", "at [m]", "along", "across"});
    const Model& model = *analysis.model;
    int number = 0;
    for (const Mode& mode : analysis.vibration->modes) {
        ++number;
        for (std::size_t node = 0; node < model.nodes.size(); ++node) {
            write_mode_figures(mode, number, rows);
            rows.cell(model.nodes[node].name);
            rows.cell(mode.nodes[node].x);
            rows.cell(mode.nodes[node].y);
            if (mode.nodes[node].rotation)
                rows.cell(*mode.nodes[node].rotation);
            else
                rows.empty(1);
            rows.empty(4);
            rows.end();
        }
        for (std::size_t member = 0; places > 0 && member < model.members.size(); ++member)
            for (const DiagramPlace& place : mode.members[member].places(places)) {
                write_mode_figures(mode, number, rows);
                rows.empty(4);
                rows.cell(model.members[member].name);
                rows.cell(place.at);
                rows.cell(place.along);
                rows.cell(place.across);
                rows.end();
            }
    }
}

/// A file whose rows come from `write(rows)`.
template <class Write> CsvFile file(std::string name, Write write) {
    return {std::move(name), [write](const Sink& sink) {
                Rows rows(sink);
                write(rows);
                rows.finish();
            }};
}

} // namespace

std::vector<CsvFile> csv_files(const Analysis& analysis, const WriteOptions& options) {
    const Analysis* const a = &analysis;
    const int places = options.places;
    std::vector<CsvFile> files;
    files.push_back(file("reactions.csv", [a](Rows& rows) { write_reactions(*a, rows); }));
    files.push_back(file("displacements.csv", [a](Rows& rows) { write_displacements(*a, rows); }));
    if (places > 0) files.push_back(file("members.csv", [a, places](Rows& rows) { write_members(*a, places, rows); }));
    files.push_back(file("extremes.csv", [a](Rows& rows) { write_extremes(*a, rows); }));
    if (analysis.strength || analysis.service) {
        files.push_back(file("envelopes.csv", [a](Rows& rows) { write_envelopes(*a, rows); }));
    }
    if (analysis.vibration)
        files.push_back(file("modes.csv", [a, places](Rows& rows) { write_modes(*a, places, rows); }));
    return files;
}

} // namespace groundsill
