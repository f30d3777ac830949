#include "writing/inventory.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <optional>

#include <fmt/format.h>

#include "units/display.hpp"
#include "writing/load_words.hpp"
#include "writing/names.hpp"
#include "writing/table.hpp"
#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

using Align = Table::Align;
constexpr std::size_t most_rows = 15; ///< of one list
constexpr int name_width = 24;
constexpr int words_width = 60;

std::string name_of(const std::string& name) { return shortened(printable(name), name_width); }

/// A heading with the count, and one row for each of the first entries.
template <class Entry, class Cells>
std::string list(std::string_view heading, const std::vector<Entry>& entries, std::size_t columns, const Cells& cells) {
    if (entries.empty()) return {};
    Table table(std::vector<Align>(columns, Align::left));
    const std::size_t shown = std::min(entries.size(), most_rows);
    for (std::size_t k = 0; k < shown; ++k) table.row(cells(entries[k]));
    std::string text = fmt::format("\n{} ({})\n{}", heading, entries.size(), table.text());
    if (shown < entries.size()) text += fmt::format("  … and {} more\n", entries.size() - shown);
    return text;
}

std::string labelled(std::string_view label, const std::string& value) { return fmt::format("{} {}", label, value); }

/// "depth 300 mm", or nothing where the model gives none.
std::string optional_value(const Display& display, std::string_view label, Shown kind,
                           const std::optional<double>& value) {
    return value ? labelled(label, display.given(kind, *value)) : std::string{};
}

std::string materials(const Model& model, const Display& display) {
    return list("Materials", model.materials, 5, [&](const Material& material) {
        return std::vector<std::string>{name_of(material.name), labelled("E", display.given(Shown::stress, material.E)),
                                        optional_value(display, "G", Shown::stress, material.G),
                                        optional_value(display, "density", Shown::density, material.density),
                                        optional_value(display, "expansion", Shown::expansion, material.expansion)};
    });
}

std::string sections(const Model& model, const Display& display) {
    return list("Sections", model.sections, 6, [&](const Section& section) {
        return std::vector<std::string>{name_of(section.name),
                                        shortened(printable(section.description), words_width),
                                        labelled("A", display.given(Shown::area, section.A)),
                                        labelled("I", display.given(Shown::second_moment, section.I)),
                                        optional_value(display, "depth", Shown::dimension, section.depth),
                                        section.shear_area
                                            ? labelled("shear area", display.given(Shown::area, *section.shear_area))
                                            : "rigid in shear"};
    });
}

std::string nodes(const Model& model, const Display& display) {
    return list("Nodes", model.nodes, 3, [&](const Node& node) {
        return std::vector<std::string>{name_of(node.name), labelled("x", display.given(Shown::length, node.x)),
                                        labelled("y", display.given(Shown::length, node.y))};
    });
}

/// "free" or the spring's stiffness; nothing where it is fixed.
std::string release_words(const Display& display, std::string_view direction, const Restraint& restraint, Shown kind) {
    if (restraint.is_fixed()) return {};
    return fmt::format(" {} {}", direction, restraint.is_free() ? "free" : display.given(kind, restraint.stiffness));
}

std::string end_words(const Display& display, std::string_view end, const Release& release) {
    const std::string words = release_words(display, "axial", release.axial, Shown::stiffness) +
                              release_words(display, "shear", release.shear, Shown::stiffness) +
                              release_words(display, "moment", release.moment, Shown::rotational_stiffness);
    return words.empty() ? words : fmt::format("; {}:{}", end, words);
}

std::string member_words(const Model& model, const Display& display, const Member& member) {
    std::string words = fmt::format("{}, {}", name_of(model.sections[member.section].name),
                                    name_of(model.materials[member.material].name));
    words += end_words(display, "start", member.start);
    words += end_words(display, "end", member.end);
    for (const double hinge : member.hinges) words += "; hinge at " + display.given(Shown::length, hinge);
    if (member.stiffness_factor != 1) words += "; stiffness times " + compact(member.stiffness_factor);
    return words;
}

std::string members(const Model& model, const Display& display) {
    return list("Members", model.members, 4, [&](const Member& member) {
        const Node& from = model.nodes[member.from];
        const Node& to = model.nodes[member.to];
        return std::vector<std::string>{name_of(member.name),
                                        fmt::format("{} to {}", name_of(from.name), name_of(to.name)),
                                        display.given(Shown::length, std::hypot(to.x - from.x, to.y - from.y)),
                                        member_words(model, display, member)};
    });
}

std::string restraint_words(const Display& display, std::string_view direction, const Restraint& restraint,
                            Shown kind) {
    if (restraint.is_fixed()) return fmt::format("{} fixed", direction);
    if (restraint.is_free()) return fmt::format("{} free", direction);
    return fmt::format("{} {}", direction, display.given(kind, restraint.stiffness));
}

std::string supports(const Model& model, const Display& display) {
    return list("Supports", model.supports, 5, [&](const Support& support) {
        const double degrees = support.angle * 180 / std::numbers::pi;
        return std::vector<std::string>{
            name_of(node_of(model, support)), restraint_words(display, "x", support.x, Shown::stiffness),
            restraint_words(display, "y", support.y, Shown::stiffness),
            restraint_words(display, "rotation", support.rotation, Shown::rotational_stiffness),
            support.angle == 0 ? "" : fmt::format("turned by {} deg", compact(degrees))};
    });
}

std::string cases(const Model& model, const Display& display) {
    std::string text;
    for (std::size_t k = 0; k < std::min(model.cases.size(), most_rows); ++k)
        text += case_words(model, display, model.cases[k]);
    if (text.empty()) return text;
    if (model.cases.size() > most_rows) text += fmt::format("  … and {} more\n", model.cases.size() - most_rows);
    return fmt::format("\nCases ({})\n{}", model.cases.size(), text);
}

std::string combinations(const Model& model) {
    return list("Combinations", model.combinations, 3, [&](const Combination& combination) {
        std::string terms;
        for (const Combination::Term& term : combination.terms) {
            terms += fmt::format("{}{} {}", terms.empty() ? "" : " + ", compact(term.factor),
                                 name_of(model.cases[term.load_case].name));
        }
        return std::vector<std::string>{name_of(combination.name), std::string(limit_name(combination.limit)), terms};
    });
}

} // namespace

std::string inventory(const Model& model) {
    const Display display(model.display);
    return materials(model, display) + sections(model, display) + nodes(model, display) + members(model, display) +
           supports(model, display) + cases(model, display) + combinations(model);
}

} // namespace groundsill::writing
