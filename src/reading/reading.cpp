// From the text to the model: the whole way at a glance.

#include "groundsill/reading.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "reading/draft.hpp"
#include "reading/scan.hpp"
#include "reading/sound_part.hpp"

namespace groundsill {

bool has_errors(const Diagnostics& diagnostics) {
    return std::ranges::any_of(
        diagnostics, [](const Diagnostic& diagnostic) { return diagnostic.severity == Diagnostic::Severity::error; });
}

namespace reading {
namespace {

/// Marks the names of tables that could not be read, so that references to them are not reported one by one.
void mark_incomplete_names(Draft& draft, const Fields& top) {
    const std::pair<std::string_view, std::vector<NameIndex*>> sources[] = {
        {"materials", {&draft.materials}},
        {"sections", {&draft.sections}},
        {"nodes", {&draft.nodes}},
        {"members", {&draft.members}},
        {"beams", {&draft.beams, &draft.nodes, &draft.members}},
        {"supports", {&draft.supports}},
        {"cases", {&draft.cases}},
    };
    for (const auto& [key, lists] : sources) {
        const bool unreadable = top.find(key) != nullptr && top.sound_field(key) == nullptr;
        if (!unreadable && !top.is_misspelled(key)) continue;
        for (NameIndex* names : lists) names->set_incomplete();
    }
}

/// Reports which of the parts that every model needs are missing.
void check_completeness(Draft& draft) {
    std::string missing;
    const auto need = [&](const NameIndex& names, std::string_view words) {
        if (!names.items().empty() || !names.is_complete()) return;
        if (!missing.empty()) missing += ", ";
        missing += words;
    };
    // A beam that creates nothing has been reported.
    if (draft.beams.items().empty()) {
        need(draft.nodes, "nodes ([nodes] or [beams])");
        need(draft.members, "members ([members] or [beams])");
    }
    need(draft.cases, "load cases ([cases.NAME])");
    if (!missing.empty()) draft.context.error({1, 1}, "the model is not complete: it has no " + missing);
}

void read_tables(Draft& draft, const Fields& top) {
    mark_incomplete_names(draft, top);
    read_head(draft, top);
    read_units(draft, top);
    read_materials(draft, top);
    read_sections(draft, top);
    read_geometry(draft, top);
    read_supports(draft, top);
    read_cases(draft, top);
    read_combinations(draft, top);
    read_mass(draft, top);
}

/// Reads the model of a text that was found harmless. The parsed tree is gone when this returns.
Draft read_text(std::string_view text) {
    Draft draft;
    Document document;
    Diagnostic syntax_error;
    if (!document.parse(text, syntax_error)) {
        draft.context.diagnostics.push_back(std::move(syntax_error));
        return draft;
    }
    const Path path;
    const Fields top(draft.context, key_group("model"), path, document.root(), {1, 1});
    read_tables(draft, top);
    check_completeness(draft);
    return draft;
}

} // namespace
} // namespace reading

ReadResult read_model(std::string_view text) {
    constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";
    if (text.starts_with(byte_order_mark)) text.remove_prefix(byte_order_mark.size());
    if (auto harm = reading::find_harm(text)) return {std::nullopt, {std::move(*harm)}};

    reading::Draft draft = reading::read_text(text);
    ReadResult result{std::nullopt, std::move(draft.context.diagnostics)};
    const bool sound = !has_errors(result.diagnostics);
    std::ranges::move(sound ? check_model(draft.model) : reading::check_sound_part(draft),
                      std::back_inserter(result.diagnostics));
    std::ranges::stable_sort(result.diagnostics, {}, [](const Diagnostic& diagnostic) {
        return std::pair(diagnostic.position.line, diagnostic.position.column);
    });
    if (!has_errors(result.diagnostics)) result.model = std::move(draft.model);
    return result;
}

} // namespace groundsill
