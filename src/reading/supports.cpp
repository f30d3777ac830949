// Supports.

#include "reading/draft.hpp"

namespace groundsill::reading {
namespace {

constexpr Restraint fixed{Restraint::Kind::fixed, 0};

void read_word(Support& support, std::string_view word) {
    support.y = fixed;
    if (word != "roller") support.x = fixed;
    if (word == "fixed") support.rotation = fixed;
}

void read_table(Draft& draft, Support& support, const NamedEntry& entry) {
    Fields fields(draft.context, key_group("support"), entry.path, entry.field.node(), entry.field.position());
    support.x = read_restraint(fields, "x", Restraint::Kind::free);
    support.y = read_restraint(fields, "y", Restraint::Kind::free);
    support.rotation = read_restraint(fields, "rotation", Restraint::Kind::free);
    support.angle = fields.optional_number("angle").value_or(0);
    if (!fields.sound()) draft.mark_unsound(support.position);
}

} // namespace

void read_supports(Draft& draft, const Fields& top) {
    const Path path{nullptr, "supports"};
    const auto begin = [&](std::size_t count) {
        draft.supports.reserve(count);
        draft.model.supports.reserve(count);
    };
    each_named_entry(draft.context, path, top.find("supports"), begin, [&](const NamedEntry& entry) {
        Support support;
        support.position = entry.field.position();
        support.node = draft.nodes.find(entry.name());
        if (support.node < 0 && entry.field.sound) {
            draft.context.unknown_name(support.position, "supports", "node", entry.name(), draft.nodes);
        }
        if (support.node < 0 || !entry.field.sound) draft.mark_unsound(support.position);
        if (entry.field.is_text()) read_word(support, entry.field.node().text());
        if (entry.field.is_table()) read_table(draft, support, entry);
        draft.supports.add(entry.name(), static_cast<int>(draft.model.supports.size()));
        draft.model.supports.push_back(support);
    });
}

} // namespace groundsill::reading
