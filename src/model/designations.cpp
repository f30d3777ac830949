#include "model/designations.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstdlib>
#include <tuple>
#include <unordered_map>
#include <utility>

#include "model/designation_tables.hpp"
#include "units/spelling.hpp"

namespace groundsill {
namespace {

bool is_digit(char c) { return c >= '0' && c <= '9'; }
bool is_letter(char c) { return c >= 'A' && c <= 'Z'; }

/// Upper case without spaces, hyphens and underscores; every multiplication sign is an X.
std::string plain(std::string_view name) {
    std::string text;
    for (std::size_t i = 0; i < name.size(); ++i) {
        const std::string_view pair = name.substr(i, 2);
        if (pair == "\u00d7") { // × in UTF-8
            text += 'X';
            ++i;
        } else if (pair == "\u00a0") { // a space that does not break
            ++i;
        } else if (name[i] == '*') {
            text += 'X';
        } else if (name[i] >= 'a' && name[i] <= 'z') {
            text += static_cast<char>(name[i] - 'a' + 'A');
        } else if (name[i] != ' ' && name[i] != '-' && name[i] != '_' && name[i] != '\t') {
            text += name[i];
        }
    }
    return text;
}

/// The one spelling of a name that is looked up: all letters first, "HEA200" for HE 200 A, "UB457X191X67" for
/// 457x191x67 UB.
std::string key_of(std::string_view name) {
    std::string text = plain(name);
    std::size_t digits = 0;
    while (digits < text.size() && is_letter(text[digits])) ++digits;
    std::size_t tail = text.size();
    while (tail > digits && is_letter(text[tail - 1])) --tail;
    const bool letters_last = tail < text.size() && tail > digits && text[tail] != 'X';
    return letters_last ? text.substr(0, digits) + text.substr(tail) + text.substr(digits, tail - digits) : text;
}

using Index = std::unordered_map<std::string, const Designation*>;

const Index& index() {
    static const Index all = [] {
        Index result;
        for (const DesignationSeries& series : designation_series()) {
            for (const Designation& row : series.rows) result.emplace(key_of(row.name), &row);
        }
        return result;
    }();
    return all;
}

/// A key as its letters and its numbers.
struct Parts {
    std::string letters;
    std::array<double, 3> numbers{};
};

Parts parts_of(std::string_view key) {
    Parts parts;
    std::size_t i = 0;
    while (i < key.size() && is_letter(key[i])) parts.letters += key[i++];
    for (double& number : parts.numbers) {
        while (i < key.size() && !is_digit(key[i])) ++i;
        std::string digits;
        while (i < key.size() && (is_digit(key[i]) || key[i] == '.')) digits += key[i++];
        number = digits.empty() ? 0 : std::strtod(digits.c_str(), nullptr);
    }
    return parts;
}

/// Letters further apart than this (two replaced, or one added and one left out) were not meant.
constexpr int far = 4;

/// How far a name is from what was asked for: first its letters, then its numbers in turn.
using Distance = std::tuple<int, double, double, double>;

Distance distance(const Parts& asked, const Parts& known) {
    const int letters = asked.letters.empty() ? 0 : spelling_distance(asked.letters, known.letters, far + 1);
    return {letters, std::abs(asked.numbers[0] - known.numbers[0]), std::abs(asked.numbers[1] - known.numbers[1]),
            std::abs(asked.numbers[2] - known.numbers[2])};
}

} // namespace

std::span<const DesignationSeries> designation_series() {
    static const DesignationSeries all[] = {
        {"IPE", "EN 10365", "European I-beams", "i", false, designations_ipe},
        {"HEA", "EN 10365", "European wide-flange beams, light", "i", false, designations_hea},
        {"HEB", "EN 10365", "European wide-flange beams, medium", "i", false, designations_heb},
        {"HEM", "EN 10365", "European wide-flange beams, heavy", "i", false, designations_hem},
        {"UB", "EN 10365", "British universal beams", "i", false, designations_ub},
        {"UC", "EN 10365", "British universal columns", "i", false, designations_uc},
        {"PFC", "EN 10365", "British parallel flange channels", "channel", false, designations_pfc},
        {"UPE", "EN 10365", "European parallel flange channels", "channel", false, designations_upe},
        {"W", "ASTM A6", "American wide-flange shapes", "i", true, designations_w},
    };
    return all;
}

const DesignationSeries& series_of_designation(const Designation& designation) {
    for (const DesignationSeries& series : designation_series()) {
        const bool here = std::any_of(series.rows.begin(), series.rows.end(),
                                      [&](const Designation& row) { return &row == &designation; });
        if (here) return series;
    }
    std::abort(); // a Designation lives nowhere but in the tables
}

const Designation* find_designation(std::string_view name) {
    const auto found = index().find(key_of(name));
    return found == index().end() ? nullptr : found->second;
}

std::vector<std::string> nearest_designations(std::string_view name) {
    const Parts asked = parts_of(key_of(name));
    std::vector<std::pair<Distance, const Designation*>> ranked;
    for (const DesignationSeries& series : designation_series()) {
        for (const Designation& row : series.rows) {
            const Distance d = distance(asked, parts_of(key_of(row.name)));
            if (std::get<0>(d) <= far) ranked.emplace_back(d, &row);
        }
    }
    std::stable_sort(ranked.begin(), ranked.end(), [](const auto& a, const auto& b) { return a.first < b.first; });
    std::vector<std::string> names;
    for (std::size_t i = 0; i < std::min<std::size_t>(3, ranked.size()); ++i)
        names.emplace_back(ranked[i].second->name);
    return names;
}

std::vector<const Designation*> matching_designations(std::string_view pattern) {
    const std::string key = key_of(pattern);
    const std::string as_written = plain(pattern);
    std::vector<const Designation*> matches;
    for (const DesignationSeries& series : designation_series()) {
        for (const Designation& row : series.rows) {
            const bool match = key_of(row.name).find(key) != std::string::npos ||
                               plain(row.name).find(as_written) != std::string::npos;
            if (match) matches.push_back(&row);
        }
    }
    return matches;
}

ShapeProperties section_of_designation(const Designation& designation) {
    const DesignationSeries& series = series_of_designation(designation);
    const double unit = series.in_inches ? 0.0254 : 1e-3;
    std::string error;
    const auto section = section_of_shape({.shape = series.shape,
                                           .width = designation.width * unit,
                                           .depth = designation.depth * unit,
                                           .web = designation.web * unit,
                                           .flange = designation.flange * unit,
                                           .root = designation.root * unit},
                                          error);
    if (!section) std::abort(); // a row of the tables that is no section: the tests go through all of them
    return *section;
}

} // namespace groundsill
