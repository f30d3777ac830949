// Straight runs of members.

#include <algorithm>
#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "model/findings.hpp"
#include "reading/draft.hpp"
#include "units/spelling.hpp"

namespace groundsill::reading {
namespace {

/// Where nodes stand that exist already may differ from where the run puts them by this part of the run's length: a
/// hundredth of a millimetre on 10 m, which hand-written coordinates keep.
constexpr double misfit = 1e-6;
/// How far nodes may be off a straight line, as a part of the run's length: coordinates rounded to the millimetre fit.
constexpr double crookedness = 1e-4;

struct Direction {
    double cosine = 1;
    double sine = 0;
};

/// Multiples of a right angle come out exact, so that a run along an axis has round coordinates.
Direction direction_of(double angle) {
    const double quarters = angle / (std::numbers::pi / 2);
    const double nearest = std::round(quarters);
    if (std::abs(quarters - nearest) > 1e-12 || std::abs(nearest) > 1e6) return {std::cos(angle), std::sin(angle)};
    constexpr Direction axes[] = {{1, 0}, {0, 1}, {-1, 0}, {0, -1}};
    return axes[((static_cast<int>(nearest) % 4) + 4) % 4];
}

} // namespace

/// One beam while it is being read.
struct BeamReader::Run {
    Fields fields;
    const NamedEntry& entry;
    std::vector<TomlNode> names; ///< of the nodes, in order
    std::vector<double> starts;  ///< places of the nodes along the run, m; empty while they are not known
    std::vector<int> nodes;      ///< indices into the model's nodes

    std::size_t spans() const { return names.empty() ? 0 : names.size() - 1; }
    double length() const { return starts.back(); }
};

namespace {

void read_node_names(Fields& fields, std::vector<TomlNode>& names) {
    const Field* field = fields.required("nodes");
    if (field == nullptr) return;
    NameIndex seen;
    for (int i = 0; i < field->node().size(); ++i) {
        const TomlNode node = field->node().element(i);
        if (node.kind() != TomlKind::text) {
            fields.error(*field, "takes the names of its nodes in quotation marks");
        } else if (node.text().empty() || node.text().find('.') != std::string_view::npos) {
            fields.error(*field, fmt::format("cannot create a node {}: names hold no dots and have at least one letter",
                                             quoted(node.text())));
        } else if (seen.contains(node.text())) {
            fields.error(*field, fmt::format("passes node {} twice: it runs straight on", quoted(node.text())));
        } else {
            seen.add(node.text(), i);
            names.push_back(node);
        }
    }
    if (field->node().size() < 2) fields.error(*field, "needs two nodes at least");
}

/// Sums up the spans; without spans or after an error nothing comes back.
std::vector<double> read_starts(Fields& fields) {
    const Field* field = fields.sound_field("spans");
    const Field* nodes = fields.sound_field("nodes");
    if (field == nullptr || nodes == nullptr) return {};
    const std::optional<std::vector<Measure>> spans = read_list(fields.context(), fields.path(), *field);
    if (!spans) {
        fields.set_unsound();
        return {};
    }
    const auto node_count = static_cast<std::size_t>(nodes->node().size());
    if (node_count >= 2 && spans->size() + 1 != node_count) {
        fields.error(*field, fmt::format("has {} {} between {} nodes: give one span fewer than nodes", spans->size(),
                                         spans->size() == 1 ? "span" : "spans", node_count));
        return {};
    }
    std::vector<double> starts{0};
    for (const Measure& span : *spans) starts.push_back(starts.back() + span.value);
    return starts;
}

void check_run_keys(Fields& fields) {
    if (fields.find("spans") != nullptr || fields.is_misspelled("spans")) return;
    for (const std::string_view key : {"start", "direction"}) {
        if (const Field* field = fields.find(key)) {
            fields.error(*field, fmt::format("has {} but no spans: add spans, or take {} out where all its nodes exist",
                                             quoted(key), quoted(key)));
        }
    }
}

} // namespace

BeamReader::BeamReader(Draft& draft, const Fields& top)
    : draft_(draft), entries_(named_entries(draft.context, path_, top.find("beams"))) {
    for (const NamedEntry& entry : entries_) {
        draft_.beams.add(entry.name(), static_cast<int>(draft_.beams.items().size()));
        if (!entry.field.sound) draft_.mark_unsound(entry.field.position());
        if (!entry.field.is_table()) continue;
        const Fields fields(draft_.context, key_group("beam"), entry.path, entry.field.node(), entry.field.position());
        runs_.push_back({fields, entry, {}, {}, {}});
        Run& run = runs_.back();
        read_node_names(run.fields, run.names);
        run.starts = read_starts(run.fields);
        check_run_keys(run.fields);
    }
}

BeamReader::~BeamReader() = default;

namespace {

struct Start {
    double x = 0;
    double y = 0;
};

Start read_start(Fields& fields) {
    const Field* field = fields.sound_field("start");
    if (field == nullptr) return {};
    const auto pair = read_pair(fields.context(), fields.path(), *field);
    if (pair) return {(*pair)[0].value, (*pair)[1].value};
    fields.set_unsound();
    return {};
}

} // namespace

// First the beams with spans, which say where their nodes stand; the others find all nodes there afterwards.
void BeamReader::create_nodes() {
    for (Run& run : runs_) {
        if (!run.starts.empty()) create_nodes(run);
    }
    for (Run& run : runs_) {
        for (const TomlNode& name : run.names) {
            if (!draft_.nodes.contains(name.text())) create_unknown_node(run, name);
        }
    }
}

void BeamReader::create_nodes(Run& run) {
    const Start start = read_start(run.fields);
    const Direction direction = direction_of(run.fields.optional_number("direction").value_or(0));
    for (std::size_t i = 0; i < std::min(run.names.size(), run.starts.size()); ++i) {
        const Node node{std::string(run.names[i].text()), start.x + run.starts[i] * direction.cosine,
                        start.y + run.starts[i] * direction.sine, run.names[i].position()};
        const int known = draft_.nodes.find(node.name);
        if (known >= 0) {
            check_place(run, node, at(draft_.model.nodes, known));
            continue;
        }
        draft_.nodes.add(run.names[i].text(), static_cast<int>(draft_.model.nodes.size()));
        draft_.model.nodes.push_back(node);
        if (!run.fields.sound()) draft_.mark_unsound(node.position);
    }
}

/// Reports a node that exists already and does not stand where the run puts it.
void BeamReader::check_place(Run& run, const Node& wanted, const Node& existing) {
    const bool fits = std::hypot(existing.x - wanted.x, existing.y - wanted.y) <= misfit * run.length();
    if (fits || !run.fields.sound() || !draft_.is_sound(existing.position)) return;
    const auto place = [&](const Node& node) {
        return fmt::format("({}, {})", length_text(draft_.model, node.x), length_text(draft_.model, node.y));
    };
    run.fields.error(*run.fields.find("nodes"),
                     fmt::format("puts node {} at {}, but it stands at {} already: mend start, direction or spans, or "
                                 "the node",
                                 wanted.name, place(wanted), place(existing)));
}

/// A node that no table and no spans create. It gets into the model all the same, so that others can refer to it.
void BeamReader::create_unknown_node(Run& run, const TomlNode& name) {
    const bool asked_for_spans = run.fields.find("spans") != nullptr || run.fields.is_misspelled("spans");
    if (!asked_for_spans && draft_.nodes.is_complete()) {
        run.fields.set_unsound();
        draft_.context.error(
            name.position(),
            fmt::format("{}: node {} does not exist, and without spans the beam cannot create it; give "
                        "spans{}",
                        run.fields.path().text("nodes"), quoted(name.text()),
                        draft_.context.nearest_name(draft_.nodes, name.text())));
    }
    draft_.nodes.add(name.text(), static_cast<int>(draft_.model.nodes.size()));
    draft_.model.nodes.push_back({std::string(name.text()), 0, 0, name.position()});
    draft_.mark_unsound(name.position());
}

namespace {

/// Places of existing nodes along the straight run through them; reports it when they do not make one.
std::vector<double> starts_of_nodes(Fields& fields, const Model& model, const std::vector<int>& nodes) {
    const Node& first = at(model.nodes, nodes.front());
    const Node& last = at(model.nodes, nodes.back());
    const double length = std::hypot(last.x - first.x, last.y - first.y);
    std::vector<double> starts{0};
    double done = 0;
    for (std::size_t i = 1; i < nodes.size(); ++i) {
        const Node& before = at(model.nodes, nodes[i - 1]);
        const Node& node = at(model.nodes, nodes[i]);
        const double off = ((last.x - first.x) * (node.y - first.y) - (last.y - first.y) * (node.x - first.x)) / length;
        const double along =
            ((last.x - first.x) * (node.x - first.x) + (last.y - first.y) * (node.y - first.y)) / length;
        if (!(std::abs(off) <= crookedness * length) || !(along > done)) {
            fields.error(*fields.find("nodes"),
                         fmt::format("is no straight run: node {} does not stand between its neighbours on the line "
                                     "from {} to {}",
                                     node.name, first.name, last.name));
            return starts;
        }
        done = along;
        starts.push_back(starts.back() + std::hypot(node.x - before.x, node.y - before.y));
    }
    return starts;
}

/// Puts a moment hinge at a place of the run: inside a span, or at the end of the member before a node.
bool place_hinge(double place, const std::vector<double>& starts, std::vector<Member>& members) {
    const double tolerance = place_tolerance(starts.back());
    if (!(place > tolerance) || place > starts.back() + tolerance) return false;
    for (std::size_t i = 0; i < members.size(); ++i) {
        if (std::abs(place - starts[i + 1]) <= tolerance) {
            members[i].end.moment = {Restraint::Kind::free, 0};
            return true;
        }
        if (place < starts[i + 1]) {
            members[i].hinges.push_back(place - starts[i]);
            return true;
        }
    }
    return false;
}

void read_hinges(Fields& fields, const Model& model, const std::vector<double>& starts, std::vector<Member>& members) {
    const Field* field = fields.sound_field("hinges");
    if (field == nullptr) return;
    const std::optional<std::vector<Measure>> measures = read_list(fields.context(), fields.path(), *field);
    if (!measures) return fields.set_unsound();
    std::vector<double> places;
    for (const Measure& measure : *measures) places.push_back(measure.of(starts.back()));
    std::sort(places.begin(), places.end());
    for (std::size_t i = 0; i < places.size(); ++i) {
        if (i > 0 && places[i] - places[i - 1] <= place_tolerance(starts.back())) {
            fields.error(*field, fmt::format("has two hinges at {}: keep one", length_text(model, places[i])));
        } else if (!place_hinge(places[i], starts, members)) {
            fields.error(*field,
                         fmt::format("has a hinge at {}, not on the run, which is {} long: use releases for one at its "
                                     "very start",
                                     length_text(model, places[i]), length_text(model, starts.back())));
        }
    }
}

} // namespace

void BeamReader::create_members() {
    for (Run& run : runs_) {
        Fields& fields = run.fields;
        for (const TomlNode& name : run.names) run.nodes.push_back(draft_.nodes.find(name.text()));
        const bool nodes_sound = std::all_of(run.nodes.begin(), run.nodes.end(), [&](int node) {
            return draft_.is_sound(at(draft_.model.nodes, node).position);
        });
        if (run.starts.empty() && fields.sound() && nodes_sound) {
            run.starts = starts_of_nodes(fields, draft_.model, run.nodes);
        }
        Member common;
        common.position = run.entry.field.position();
        read_member_properties(draft_, fields, common);
        std::vector<Member> members(run.spans(), common);
        for (std::size_t i = 0; i < members.size(); ++i) {
            members[i].name = fmt::format("{}.{}", run.entry.name(), i + 1);
            members[i].from = run.nodes[i];
            members[i].to = run.nodes[i + 1];
        }
        if (fields.sound() && nodes_sound) read_hinges(fields, draft_.model, run.starts, members);
        if (!fields.sound() || !nodes_sound) draft_.mark_unsound(common.position);
        std::move(members.begin(), members.end(), std::back_inserter(draft_.model.members));
    }
}

void BeamReader::find_members() {
    for (const NamedEntry& entry : entries_) {
        draft_.model.beams.push_back({std::string(entry.name()), {}, {}, entry.field.position()});
    }
    for (Run& run : runs_) {
        Beam& beam = at(draft_.model.beams, draft_.beams.find(run.entry.name()));
        beam.starts = run.starts;
        for (std::size_t i = 0; i < run.spans(); ++i) {
            beam.members.push_back(draft_.members.find(fmt::format("{}.{}", beam.name, i + 1)));
        }
    }
}

} // namespace groundsill::reading
