// [mass]: what becomes mass, and how many natural modes are asked for.

#include <fmt/format.h>

#include "reading/draft.hpp"

namespace groundsill::reading {
namespace {

constexpr int most_modes = 1000; // a mistake in the number would ask for hours

/// Calls visit(index, entry) for each entry of a table inside [mass] whose keys are names of the model.
/// \param kind "case" or "node"
template <class Visit>
void each_known(Draft& draft, const Fields& fields, std::string_view key, std::string_view kind, const NameIndex& names,
                Visit&& visit) {
    const Path path{&fields.path(), key};
    for (const NamedEntry& entry : named_entries(draft.context, path, fields.find(key))) {
        const int found = names.find(entry.name());
        if (found < 0)
            draft.context.unknown_name(entry.field.position(), path.text(), kind, entry.name(), names);
        else
            visit(found, entry);
    }
}

/// True for a table that is there and not empty, sound or not.
bool says_something(const Fields& fields, std::string_view key) {
    const Field* field = fields.find(key);
    return field != nullptr && (!field->is_table() || !field->node().entries().empty());
}

void read_modes(Fields& fields, MassModel& mass) {
    const Field* modes = fields.sound_field("modes");
    if (modes == nullptr) return;
    if (modes->measure.value > most_modes)
        return fields.error(*modes, fmt::format("asks for too many modes: {} at most", most_modes));
    mass.modes = static_cast<int>(modes->measure.value);
}

} // namespace

void read_mass(Draft& draft, const Fields& top) {
    const Field* field = top.sound_field("mass");
    if (field == nullptr) return;
    const Path path{nullptr, "mass"};
    Fields fields(draft.context, key_group("mass"), path, field->node(), field->position());
    MassModel mass;
    mass.position = field->position();
    each_known(draft, fields, "cases", "case", draft.cases, [&mass](int load_case, const NamedEntry& entry) {
        mass.cases.push_back({load_case, entry.field.measure.value});
    });
    each_known(draft, fields, "nodes", "node", draft.nodes, [&mass](int node, const NamedEntry& entry) {
        mass.nodes.push_back({node, entry.field.measure.value, entry.field.position()});
    });
    read_modes(fields, mass);
    const bool misspelled = fields.is_misspelled("cases") || fields.is_misspelled("nodes");
    if (!misspelled && !says_something(fields, "cases") && !says_something(fields, "nodes"))
        fields.error("lists nothing that has mass: add cases = { dead = 1.0 }, whose downward loads become mass, or "
                     "nodes = { B = \"500 kg\" }");
    draft.model.mass = std::move(mass);
}

} // namespace groundsill::reading
