#include "checks/floor_uses.hpp"

#include <algorithm>
#include <array>
#include <cctype>
#include <vector>

#include <fmt/format.h>

namespace groundsill {
namespace {

constexpr double pound_force = 4.4482216152605; // N, exact

// Murray, Allen and Ungar 1997, Table 4.1 (from memory; office row confirmed by a published example).
struct Dg11Row {
    std::string_view use;
    WalkingOccupancy occupancy;
};
constexpr std::array<Dg11Row, 8> dg11_table{{
    {"office", {65 * pound_force, 0.005}},
    {"residence", {65 * pound_force, 0.005}},
    {"residential", {65 * pound_force, 0.005}},
    {"church", {65 * pound_force, 0.005}},
    {"mall", {65 * pound_force, 0.015}},
    {"shopping mall", {65 * pound_force, 0.015}},
    {"indoor footbridge", {92 * pound_force, 0.015}},
    {"outdoor footbridge", {92 * pound_force, 0.05}},
}};

// EN 1995-1-1 7.3.3 is written for dwellings alone.
constexpr std::array<std::string_view, 2> en1995_words{"residence", "residential"};

// All from memory. Where a table gives a range, its lower end.
struct ResponseRow {
    std::string_view use;
    ResponseLimit limit;
};
constexpr const char* sci_p354 = "CCIP-016 and SCI P354 Table 5.2";
constexpr const char* iso_10137 = "ISO 10137:2007 Table C.1";
constexpr std::array<ResponseRow, 13> response_table{{
    {"office", {8, sci_p354}},
    {"mall", {4, sci_p354}},
    {"shopping mall", {4, sci_p354}},
    {"dealing floor", {4, sci_p354}},
    {"general office", {4, iso_10137}},
    {"quiet office", {2, iso_10137}},
    {"workshop", {8, iso_10137}},
    {"residence", {2, iso_10137}},
    {"residential", {2, iso_10137}},
    {"residence at night", {1.4, iso_10137}},
    {"residential at night", {1.4, iso_10137}},
    {"operating theatre", {1, iso_10137}},
    {"critical area", {1, iso_10137}},
}};

struct Outside {
    std::vector<std::string_view> parts; ///< of the words that mean it
    std::string_view activity;
    std::string_view document;
};

const std::vector<Outside>& outside_activities() {
    static const std::vector<Outside> list{
        {{"stair", "steps"},
         "stairs",
         "AISC Design Guide 11, 2nd edition 2016, chapter 4, or SCI P354, both with limits of their own for stairs"},
        {{"danc", "gym", "aerobic", "rhythmic", "fitness", "sport", "jump", "exercise"},
         "rhythmic activity",
         "AISC Design Guide 11 chapter 5 or ISO 10137 Annexes A and C"},
        {{"crowd", "stadium", "grandstand", "concert", "spectator", "audience", "marathon"},
         "crowds",
         "EN 1991-2 5.7 with its National Annex for footbridges, Dynamic performance requirements for permanent "
         "grandstands "
         "(Institution of Structural Engineers 2008) for stands, ISO 10137 for both"},
    };
    return list;
}

std::string lower_case(std::string text) {
    std::ranges::transform(text, text.begin(), [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
    return text;
}

const Outside* outside_activity(const std::string& use) {
    const std::string word = lower_case(use);
    for (const Outside& entry : outside_activities()) {
        for (std::string_view part : entry.parts) {
            if (word.find(part) != std::string::npos) return &entry;
        }
    }
    return nullptr;
}

template <class Row, std::size_t Count> std::vector<std::string_view> words(const std::array<Row, Count>& table) {
    std::vector<std::string_view> list;
    list.reserve(Count);
    for (const Row& row : table) list.push_back(row.use);
    return list;
}

std::vector<std::string_view> words_of(FloorMethod method) {
    switch (method) {
    case FloorMethod::dg11:
        return words(dg11_table);
    case FloorMethod::en1995:
        return {en1995_words.begin(), en1995_words.end()};
    case FloorMethod::ccip016:
        return words(response_table);
    }
    return {};
}

} // namespace

std::optional<WalkingOccupancy> dg11_occupancy(std::string_view use) {
    const auto row = std::ranges::find(dg11_table, use, &Dg11Row::use);
    if (row == dg11_table.end()) return std::nullopt;
    return row->occupancy;
}

std::optional<ResponseLimit> response_limit_of(std::string_view use) {
    const auto row = std::ranges::find(response_table, use, &ResponseRow::use);
    if (row == response_table.end()) return std::nullopt;
    return row->limit;
}

std::string occupancy_refusal(FloorMethod method, const std::string& use) {
    const auto allowed = words_of(method);
    if (std::ranges::find(allowed, use) != allowed.end()) return {};
    if (const Outside* outside = outside_activity(use)) {
        return fmt::format(
            "{} (use = \"{}\") are not covered by {}, which is for one person walking on a floor: go to {}",
            outside->activity, use, floor_method_name(method), outside->document);
    }
    return fmt::format("\"{}\" is not an occupancy of {}: use one of \"{}\"", use, floor_method_name(method),
                       fmt::join(allowed, "\", \""));
}

} // namespace groundsill
