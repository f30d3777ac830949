// Nodes and members.

#include <algorithm>

#include <fmt/format.h>

#include "reading/draft.hpp"

namespace groundsill::reading {

Restraint read_restraint(Fields& table, std::string_view key, Restraint::Kind absent) {
    const Field* field = table.find(key);
    if (field == nullptr) return {absent, 0};
    if (!field->sound || field->is_word("fixed")) return {Restraint::Kind::fixed, 0};
    if (field->is_word("free")) return {Restraint::Kind::free, 0};
    if (!field->is_table()) return {Restraint::Kind::elastic, field->measure.value};

    const Path path{&table.path(), key};
    Fields spring(table.context(), key_group(field->key->inner), path, field->node(), field->position());
    const Field* stiffness = spring.required("stiffness");
    if (!spring.sound()) table.set_unsound();
    if (stiffness == nullptr || stiffness->is_word("fixed")) return {Restraint::Kind::fixed, 0};
    return {Restraint::Kind::elastic, stiffness->measure.value};
}

namespace {

Release read_release(Fields& releases, std::string_view end) {
    Release release;
    const Field* field = releases.sound_field(end);
    if (field == nullptr) return release;
    const Path path{&releases.path(), end};
    Fields fields(releases.context(), key_group("release"), path, field->node(), field->position());
    release.axial = read_restraint(fields, "axial", Restraint::Kind::fixed);
    release.shear = read_restraint(fields, "shear", Restraint::Kind::fixed);
    release.moment = read_restraint(fields, "moment", Restraint::Kind::fixed);
    if (!fields.sound()) releases.set_unsound();
    return release;
}

} // namespace

Ends read_releases(Fields& member) {
    const Field* field = member.sound_field("releases");
    if (field == nullptr) return {};
    const Path path{&member.path(), "releases"};
    Fields releases(member.context(), key_group("releases"), path, field->node(), field->position());
    const Ends ends{read_release(releases, "start"), read_release(releases, "end")};
    if (!releases.sound()) member.set_unsound();
    return ends;
}

namespace {

/// What a required name refers to; -1 after an error.
int required_reference(Fields& fields, std::string_view key, const NameIndex& names) {
    const Field* field = fields.required(key);
    const int found = field == nullptr ? -1 : resolve(fields.context(), fields.path(), *field, names);
    if (found < 0) fields.set_unsound();
    return found;
}

} // namespace

void read_member_properties(Draft& draft, Fields& table, Member& member) {
    member.section = required_reference(table, "section", draft.sections);
    member.material = required_reference(table, "material", draft.materials);
    member.stiffness_factor = table.optional_number("stiffness_factor").value_or(1);
    const Ends ends = read_releases(table);
    member.start = ends.start;
    member.end = ends.end;
}

namespace {

void read_nodes(Draft& draft, const Fields& top) {
    const Path path{nullptr, "nodes"};
    const auto begin = [&](std::size_t count) {
        draft.model.nodes.reserve(count);
        draft.nodes.reserve(count);
    };
    each_named_entry(draft.context, path, top.find("nodes"), begin, [&](const NamedEntry& entry) {
        Node node{std::string(entry.name()), 0, 0, entry.field.position()};
        std::optional<std::array<Measure, 2>> place;
        if (entry.field.sound) place = read_pair(draft.context, path, entry.field);
        if (place) {
            node.x = (*place)[0].value;
            node.y = (*place)[1].value;
        } else {
            draft.mark_unsound(node.position);
        }
        draft.nodes.add(entry.name(), static_cast<int>(draft.model.nodes.size()));
        draft.model.nodes.push_back(std::move(node));
    });
}

Member read_member(Draft& draft, const NamedEntry& entry) {
    static const Group& group = key_group("member");
    Member member;
    Fields fields(draft.context, group, entry.path, entry.field.node(), entry.field.position());
    member.from = required_reference(fields, "from", draft.nodes);
    member.to = required_reference(fields, "to", draft.nodes);
    read_member_properties(draft, fields, member);
    if (!fields.sound()) draft.mark_unsound(entry.field.position());
    return member;
}

void read_members(Draft& draft, const Fields& top) {
    const Path path{nullptr, "members"};
    const auto begin = [&](std::size_t count) { draft.model.members.reserve(count); };
    each_named_entry(draft.context, path, top.find("members"), begin, [&](const NamedEntry& entry) {
        Member member;
        if (entry.field.is_table()) member = read_member(draft, entry);
        if (!entry.field.sound) draft.mark_unsound(entry.field.position());
        member.name = entry.name();
        member.position = entry.field.position();
        draft.model.members.push_back(std::move(member));
    });
}

/// Brings nodes or members into the order of the file; beams have put theirs at the end.
template <class List> void sort_by_place(List& list) {
    const auto before = [](const auto& a, const auto& b) {
        return std::pair(a.position.line, a.position.column) < std::pair(b.position.line, b.position.column);
    };
    if (!std::is_sorted(list.begin(), list.end(), before)) std::stable_sort(list.begin(), list.end(), before);
}

template <class List> void index_names(NameIndex& names, const List& list) {
    names.clear();
    names.reserve(list.size());
    for (std::size_t i = 0; i < list.size(); ++i) names.add(list[i].name, static_cast<int>(i));
}

} // namespace

void read_geometry(Draft& draft, const Fields& top) {
    read_nodes(draft, top);
    BeamReader beams(draft, top);
    const std::size_t plain_nodes = draft.model.nodes.size();
    beams.create_nodes();
    if (draft.model.nodes.size() != plain_nodes) {
        sort_by_place(draft.model.nodes);
        index_names(draft.nodes, draft.model.nodes);
    }

    read_members(draft, top);
    beams.create_members();
    sort_by_place(draft.model.members);
    index_names(draft.members, draft.model.members);
    beams.find_members();
}

} // namespace groundsill::reading
