// Load cases and combinations.

#include "reading/draft.hpp"

namespace groundsill::reading {
namespace {

Action action_of(std::string_view word) {
    constexpr std::pair<std::string_view, Action> actions[] = {
        {"permanent", Action::permanent},
        {"imposed", Action::imposed},
        {"roof", Action::roof},
        {"snow", Action::snow},
        {"rain", Action::rain},
        {"wind", Action::wind},
        {"temperature", Action::temperature},
        {"settlement", Action::settlement},
        {"earthquake", Action::earthquake},
        {"accidental", Action::accidental},
    };
    for (const auto& [name, action] : actions) {
        if (name == word) return action;
    }
    return Action::none;
}

LoadCase read_case(Draft& draft, const NamedEntry& entry) {
    LoadCase result;
    Fields fields(draft.context, key_group("case"), entry.path, entry.field.node(), entry.field.position());
    result.action = action_of(fields.optional_text("action"));
    result.category = fields.optional_text("category");
    result.group = fields.optional_text("group");
    if (const Field* with = fields.sound_field("with")) {
        result.with = resolve(draft.context, entry.path, *with, draft.cases);
    }
    const Field* loads = fields.required("loads", ", a list of what acts");
    if (loads != nullptr) read_loads(draft, result, *loads, entry.path);
    return result;
}

} // namespace

void read_cases(Draft& draft, const Fields& top) {
    const Path path{nullptr, "cases"};
    const std::vector<NamedEntry> entries = named_entries(draft.context, path, top.find("cases"));
    for (std::size_t i = 0; i < entries.size(); ++i) draft.cases.add(entries[i].name(), static_cast<int>(i));
    for (const NamedEntry& entry : entries) {
        LoadCase load_case;
        if (entry.field.is_table()) load_case = read_case(draft, entry);
        load_case.name = entry.name();
        load_case.position = entry.field.position();
        draft.model.cases.push_back(std::move(load_case));
    }
}

namespace {

void read_factors(Draft& draft, Fields& fields, Combination& combination) {
    const Field* table = fields.required("factors", ", like factors = { dead = 1.35 }");
    const Path path{&fields.path(), "factors"};
    for (const NamedEntry& entry : named_entries(draft.context, path, table)) {
        const int load_case = draft.cases.find(entry.name());
        if (load_case < 0) {
            draft.context.unknown_name(entry.field.position(), path.text(), "case", entry.name(), draft.cases);
        } else {
            combination.terms.push_back({load_case, entry.field.measure.value});
        }
    }
}

} // namespace

void read_combinations(Draft& draft, const Fields& top) {
    const Path path{nullptr, "combinations"};
    for (const NamedEntry& entry : named_entries(draft.context, path, top.find("combinations"))) {
        Combination combination;
        combination.name = entry.name();
        combination.position = entry.field.position();
        if (entry.field.is_table()) {
            Fields fields(draft.context, key_group("combination"), entry.path, entry.field.node(),
                          combination.position);
            const Field* limit = fields.find("limit");
            if (limit != nullptr && limit->is_word("service")) combination.limit = LimitState::service;
            // A combination that misspells `factors`, or asks for generated ones, lacks no factors.
            if (fields.sound() || fields.find("factors") != nullptr) read_factors(draft, fields, combination);
        }
        draft.model.combinations.push_back(std::move(combination));
    }
}

} // namespace groundsill::reading
