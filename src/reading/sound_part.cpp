#include "reading/sound_part.hpp"

#include <algorithm>

namespace groundsill::reading {
namespace {

/// Copies the sound entities of a list and returns the new index of each old one, -1 for those left out.
template <class List, class IsSound> std::vector<int> copy_sound(const List& from, List& to, IsSound&& is_sound) {
    std::vector<int> new_index;
    for (const auto& entity : from) {
        const bool sound = is_sound(entity);
        new_index.push_back(sound ? static_cast<int>(to.size()) : -1);
        if (sound) to.push_back(entity);
    }
    return new_index;
}

int look_up(const std::vector<int>& new_index, int old) { return old < 0 ? -1 : at(new_index, old); }

/// Renumbers what the entries of a list refer to; those whose reference was left out go.
template <class List, class Index> void renumber(List& list, Index index, const std::vector<int>& new_index) {
    for (auto& entry : list) entry.*index = look_up(new_index, entry.*index);
    std::erase_if(list, [&](const auto& entry) { return entry.*index < 0; });
}

Model sound_part(const Draft& draft) {
    const Model& model = draft.model;
    const auto is_sound = [&](const auto& entity) { return draft.is_sound(entity.position); };
    Model part;
    part.display = model.display;
    part.materials = model.materials; // those with an error have stand-ins for all that others ask of them
    part.sections = model.sections;
    const std::vector<int> nodes = copy_sound(model.nodes, part.nodes, is_sound);
    const std::vector<int> members = copy_sound(model.members, part.members, [&](const Member& member) {
        return is_sound(member) && look_up(nodes, member.from) >= 0 && look_up(nodes, member.to) >= 0;
    });
    for (Member& member : part.members) {
        member.from = at(nodes, member.from);
        member.to = at(nodes, member.to);
    }
    const std::vector<int> supports = copy_sound(model.supports, part.supports, [&](const Support& support) {
        return is_sound(support) && look_up(nodes, support.node) >= 0;
    });
    for (Support& support : part.supports) support.node = at(nodes, support.node);
    part.cases = model.cases;
    for (LoadCase& load_case : part.cases) {
        renumber(load_case.member_loads, &MemberLoad::member, members);
        renumber(load_case.node_loads, &NodeLoad::node, nodes);
        renumber(load_case.movements, &SupportMovement::support, supports);
    }
    return part;
}

} // namespace

Diagnostics check_sound_part(const Draft& draft) {
    const Model part = sound_part(draft);
    if (part.members.empty()) return {};
    Diagnostics findings = check_model(part);
    std::erase_if(findings, [](const Diagnostic& finding) { return finding.severity != Diagnostic::Severity::error; });
    return findings;
}

} // namespace groundsill::reading
