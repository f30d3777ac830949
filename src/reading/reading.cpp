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

/// Reports which of the tables that every model needs are missing or empty. \return whether none is
bool check_completeness(Draft& draft, const Fields& top) {
    const Model& model = draft.model;
    std::string missing;
    const auto need = [&](bool empty, std::initializer_list<std::string_view> tables, std::string_view words) {
        const auto has_error = [&](std::string_view key) { return top.find(key) != nullptr && !top.sound_field(key); };
        if (!empty || std::ranges::any_of(tables, has_error)) return;
        if (!missing.empty()) missing += ", ";
        missing += words;
    };
    need(model.nodes.empty(), {"nodes", "beams"}, "nodes ([nodes] or [beams])");
    need(model.members.empty(), {"members", "beams"}, "members ([members] or [beams])");
    need(model.supports.empty(), {"supports"}, "supports ([supports])");
    need(model.cases.empty(), {"cases"}, "load cases ([cases.NAME])");
    if (!missing.empty()) draft.context.error({1, 1}, "the model is not complete: it has no " + missing);
    return missing.empty();
}

void read_tables(Draft& draft, const Fields& top) {
    read_head(draft, top);
    read_units(draft, top);
    read_materials(draft, top);
    read_sections(draft, top);
    read_geometry(draft, top);
    read_supports(draft, top);
    read_cases(draft, top);
    read_combinations(draft, top);
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
    check_completeness(draft, top);
    return draft;
}

} // namespace
} // namespace reading

ReadResult read_model(std::string_view text) {
    constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";
    if (text.starts_with(byte_order_mark)) text.remove_prefix(byte_order_mark.size());
    if (auto foreign = reading::find_foreign_bytes(text)) return {std::nullopt, {std::move(*foreign)}};
    if (auto deep = reading::find_deep_nesting(text)) return {std::nullopt, {std::move(*deep)}};

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
