// The entries of `loads`.

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "model/findings.hpp"
#include "reading/draft.hpp"

namespace groundsill::reading {
namespace {

constexpr std::string_view subjects[] = {"member", "members", "beam", "node", "support", "self_weight"};

bool has(const TomlNode& entry, std::string_view key) { return entry.find(key).kind() != TomlKind::none; }

/// The kind of load that the keys of an entry make it; load_any when it says on nothing what it acts.
unsigned kind_of(const TomlNode& entry) {
    if (has(entry, "self_weight")) return load_self_weight;
    if (has(entry, "node")) return load_node;
    if (has(entry, "support")) return load_support;
    if (!has(entry, "member") && !has(entry, "members") && !has(entry, "beam")) return load_any;
    if (has(entry, "temperature")) return load_temperature;
    if (has(entry, "lack_of_fit")) return load_lack_of_fit;
    if (has(entry, "ground")) return load_ground;
    return has(entry, "at") || has(entry, "moment") ? load_point : load_distributed;
}

/// A stretch of one member with its part of a load.
struct Stretch {
    int member = -1;
    double a = 0, b = 0;     ///< places on the member, m
    double from = 0, to = 1; ///< the same as parts of the whole loaded length
};

/// The number nearest to `place` among 0 and `length` when they differ by round-off only.
double snapped(double place, double length) {
    const double tolerance = place_tolerance(length);
    if (std::abs(place) <= tolerance) return 0;
    return std::abs(place - length) <= tolerance ? length : place;
}

class LoadReader {
  public:
    LoadReader(Draft& draft, LoadCase& load_case, const Path& path, const TomlNode& node, int entry,
               std::vector<int>& seen)
        : draft_(draft), case_(load_case), kind_(kind_of(node)), entry_(entry), seen_(seen),
          fields_(draft.context, key_group("load"), path, node, node.position(), kind_) {}

    void read() {
        if (!fields_.sound()) return;
        fields_.at_most_one({subjects[0], subjects[1], subjects[2], subjects[3], subjects[4], subjects[5]});
        switch (kind_) {
        case load_self_weight:
            case_.self_weight += fields_.required_number("self_weight");
            break;
        case load_node:
            read_node_load();
            break;
        case load_support:
            read_movement();
            break;
        case load_any:
            fields_.error("acts on nothing: add member, members, beam, node, support or self_weight");
            break;
        default:
            read_member_load();
        }
    }

  private:
    Draft& draft_;
    LoadCase& case_;
    unsigned kind_;
    int entry_;
    std::vector<int>& seen_; // by member: the last entry whose `members` listed it, plus one
    Fields fields_;
    std::vector<int> members_;
    const Beam* beam_ = nullptr;

    double component(std::string_view key) const { return fields_.optional_number(key).value_or(0); }

    void require_one_of(std::initializer_list<std::string_view> keys, std::string_view words) {
        if (std::none_of(keys.begin(), keys.end(), [&](auto key) { return fields_.find(key) != nullptr; })) {
            fields_.error(fmt::format("has no size: add {}", words));
        }
    }

    int subject(std::string_view key, const NameIndex& names) {
        const int found = resolve(fields_.context(), fields_.path(), *fields_.find(key), names);
        if (found < 0) fields_.set_unsound();
        return found;
    }

    void read_node_load() {
        require_one_of({"x", "y", "moment"}, "x, y or moment");
        const int node = subject("node", draft_.nodes);
        if (!fields_.sound()) return;
        case_.node_loads.push_back({node, entry_, component("x"), component("y"), component("moment")});
    }

    void read_movement() {
        require_one_of({"x", "y", "rotation"}, "x, y or rotation");
        const int support = subject("support", draft_.supports);
        if (!fields_.sound()) return;
        case_.movements.push_back({support, entry_, component("x"), component("y"), component("rotation")});
    }

    void read_member_load() {
        find_members();
        if (!fields_.sound()) return;
        switch (kind_) {
        case load_point:
            read_point();
            break;
        case load_temperature:
            read_temperature();
            break;
        case load_lack_of_fit:
            read_lack_of_fit();
            break;
        default:
            read_distributed();
        }
    }

    void find_members() {
        if (fields_.find("member") != nullptr) {
            members_ = {subject("member", draft_.members)};
        } else if (fields_.find("beam") != nullptr) {
            const int beam = subject("beam", draft_.beams);
            if (beam < 0) return;
            beam_ = &at(draft_.model.beams, beam);
            members_ = beam_->members;
        } else {
            find_listed_members();
        }
        // What is wrong with a member or beam has been said; where places on it are is not known then.
        const auto is_sound = [&](int member) { return draft_.is_sound(at(draft_.model.members, member).position); };
        if (fields_.sound() && (members_.empty() || !std::all_of(members_.begin(), members_.end(), is_sound))) {
            fields_.set_unsound();
        }
    }

    void find_listed_members() {
        const Field& field = *fields_.find("members");
        const int count = field.node().size();
        if (count == 0) return fields_.error(field, "lists no members: name at least one");
        members_.reserve(static_cast<std::size_t>(count));
        seen_.resize(draft_.model.members.size(), 0);
        for (int i = 0; i < count; ++i) {
            const TomlNode node = field.node().element(i);
            const int member = resolve(fields_.context(), fields_.path(), field, node, draft_.members);
            if (member < 0) {
                fields_.set_unsound();
            } else if (at(seen_, member) == entry_ + 1) {
                fields_.error(field, fmt::format("lists member {} twice: once is enough, its load is given for each",
                                                 at(draft_.model.members, member).name));
            } else {
                at(seen_, member) = entry_ + 1;
                members_.push_back(member);
            }
        }
    }

    double length_of(int member) const { return member_length(draft_.model, at(draft_.model.members, member)); }

    MemberLoad new_load(MemberLoad::Kind kind) const {
        MemberLoad load;
        load.entry = entry_;
        load.kind = kind;
        return load;
    }

    void read_temperature() {
        MemberLoad load = new_load(MemberLoad::Kind::temperature);
        const Field& field = *fields_.find("temperature");
        load.through_depth = field.is_table();
        if (load.through_depth) {
            const Path path{&fields_.path(), "temperature"};
            Fields faces(fields_.context(), key_group("face_temperatures"), path, field.node(), field.position());
            load.top = faces.required_number("top", ": give both faces");
            load.bottom = faces.required_number("bottom", ": give both faces");
            if (!faces.sound()) return fields_.set_unsound();
        } else {
            load.top = load.bottom = field.measure.value;
        }
        for (const int member : members_) add(load, member);
    }

    // A beam is made too long as a whole: each member takes its share by length.
    void read_lack_of_fit() {
        MemberLoad load = new_load(MemberLoad::Kind::lack_of_fit);
        const double amount = fields_.required_number("lack_of_fit");
        for (std::size_t i = 0; i < members_.size(); ++i) {
            const double share =
                beam_ == nullptr ? 1 : (beam_->starts[i + 1] - beam_->starts[i]) / beam_->starts.back();
            load.amount = amount * share;
            add(load, members_[i]);
        }
    }

    void add(MemberLoad load, int member) {
        load.member = member;
        case_.member_loads.push_back(load);
    }

    /// The axes of the load's components; reports it when they are mixed.
    MemberLoad::Axes read_axes() {
        const auto first = [&](std::string_view a, std::string_view b) {
            const Field* field = fields_.find(a);
            return field != nullptr ? field : fields_.find(b);
        };
        const Field* global = first("x", "y");
        const Field* local = first("along", "across");
        if (global != nullptr && local != nullptr) {
            fields_.error(*local, fmt::format("mixes {} of the global axes with {} of the member's: write two loads",
                                              global->entry.key, local->entry.key));
        }
        if (local == nullptr) return MemberLoad::Axes::global;
        return MemberLoad::Axes::member;
    }

    void read_point() {
        MemberLoad load = new_load(MemberLoad::Kind::point);
        require_one_of({"x", "y", "along", "across", "moment"}, "x, y, along, across or moment");
        const Field* at_field = fields_.required("at", ", the place on the member");
        load.axes = read_axes();
        if (!fields_.sound()) return;
        const bool local = load.axes == MemberLoad::Axes::member;
        load.first_a = component(local ? "along" : "x");
        load.second_a = component(local ? "across" : "y");
        load.moment = component("moment");
        if (beam_ != nullptr) return add_point_on_beam(load, *at_field);
        for (const int member : members_) {
            const double length = length_of(member);
            load.a = load.b = snapped(at_field->measure.of(length), length);
            add(load, member);
        }
    }

    // At an inner node the load acts on the start of the member that follows, at the last one on the last member's end.
    void add_point_on_beam(MemberLoad load, const Field& at_field) {
        const std::vector<double>& starts = beam_->starts;
        const double place = at_field.measure.of(starts.back());
        const double tolerance = place_tolerance(starts.back());
        if (place > starts.back() + tolerance) return off_the_beam(at_field, place);
        std::size_t i = members_.size() - 1;
        while (i > 0 && place < starts[i] - tolerance) --i;
        const double length = length_of(members_[i]);
        load.a = load.b = std::clamp(snapped(place - starts[i], length), 0.0, length);
        add(load, members_[i]);
    }

    void off_the_beam(const Field& field, double place) {
        fields_.error(field, fmt::format("has a place at {}, off the beam {}, which is {} long",
                                         length_text(draft_.model, place), beam_->name,
                                         length_text(draft_.model, beam_->starts.back())));
    }

    /// The values of a component at both ends of the loaded length.
    std::array<double, 2> ends(std::string_view key) {
        const Field* field = fields_.find(key);
        if (field == nullptr) return {0, 0};
        if (!field->is_array()) return {field->measure.value, field->measure.value};
        const auto values = read_pair(fields_.context(), fields_.path(), *field);
        if (!values) fields_.set_unsound();
        return values ? std::array{(*values)[0].value, (*values)[1].value} : std::array<double, 2>{};
    }

    void read_distributed() {
        MemberLoad load = new_load(MemberLoad::Kind::distributed);
        require_one_of({"x", "y", "along", "across"},
                       "x, y, along, across, moment with at, temperature or lack_of_fit");
        load.axes = read_axes();
        const Field* per = fields_.find("per");
        if (per != nullptr && per->is_word("plan")) {
            if (load.axes == MemberLoad::Axes::member)
                fields_.error(*per, "is per plan length along the member's axes: use x or y");
            load.axes = MemberLoad::Axes::global_plan;
        }
        if (!fields_.sound()) return;
        const bool local = load.axes == MemberLoad::Axes::member;
        const std::array<double, 2> first = ends(local ? "along" : "x");
        const std::array<double, 2> second = ends(local ? "across" : "y");
        const std::vector<Stretch> stretches = read_stretches();
        if (!fields_.sound()) return;
        case_.member_loads.reserve(case_.member_loads.size() + stretches.size());
        for (const Stretch& stretch : stretches) {
            load.a = stretch.a;
            load.b = stretch.b;
            load.first_a = std::lerp(first[0], first[1], stretch.from);
            load.first_b = std::lerp(first[0], first[1], stretch.to);
            load.second_a = std::lerp(second[0], second[1], stretch.from);
            load.second_b = std::lerp(second[0], second[1], stretch.to);
            add(load, stretch.member);
        }
    }

    /// Where the load lies: the whole length without `between`.
    std::vector<Stretch> read_stretches() {
        std::array<Measure, 2> places{Measure{0, true}, Measure{1, true}};
        const Field* field = fields_.find("between");
        if (field != nullptr) {
            const auto pair = read_pair(fields_.context(), fields_.path(), *field);
            if (!pair) {
                fields_.set_unsound();
                return {};
            }
            places = *pair;
        }
        if (beam_ != nullptr) return stretches_of_beam(field, places);
        std::vector<Stretch> stretches;
        stretches.reserve(members_.size());
        for (const int member : members_) {
            const double length = length_of(member);
            stretches.push_back({member, snapped(places[0].of(length), length), snapped(places[1].of(length), length)});
        }
        return stretches;
    }

    std::vector<Stretch> stretches_of_beam(const Field* between, const std::array<Measure, 2>& places) {
        const std::vector<double>& starts = beam_->starts;
        const double begin = places[0].of(starts.back());
        const double end = places[1].of(starts.back());
        const double tolerance = place_tolerance(starts.back());
        if (end > starts.back() + tolerance) {
            off_the_beam(*between, end);
            return {};
        }
        if (end - begin <= tolerance) {
            fields_.error(*between, "begins its load where it ends or behind that: put the smaller place first");
            return {};
        }
        std::vector<Stretch> stretches;
        for (std::size_t i = 0; i < members_.size(); ++i) {
            const double from = std::max(begin, starts[i]);
            const double to = std::min(end, starts[i + 1]);
            if (to - from <= tolerance) continue;
            const double length = length_of(members_[i]);
            stretches.push_back({members_[i], snapped(from - starts[i], length), snapped(to - starts[i], length),
                                 (from - begin) / (end - begin), (to - begin) / (end - begin)});
        }
        return stretches;
    }
};

} // namespace

void read_loads(Draft& draft, LoadCase& load_case, const Field& loads, const Path& case_path) {
    const Path list_path{&case_path, "loads"};
    load_case.entries = loads.node().size();
    load_case.entry_positions.reserve(static_cast<std::size_t>(load_case.entries));
    std::vector<int> seen;
    for (int i = 0; i < load_case.entries; ++i) {
        const TomlNode entry = loads.node().element(i);
        const Path path{&list_path, {}, i};
        load_case.entry_positions.push_back(entry.position());
        if (entry.kind() != TomlKind::table) {
            draft.context.error(
                entry.position(),
                fmt::format("{} takes a table, like {{ member = \"AB\", y = \"-12 kN/m\" }}", path.text()));
            continue;
        }
        LoadReader(draft, load_case, path, entry, i, seen).read();
    }
}

} // namespace groundsill::reading
