#pragma once
// Small models for the tests of reading.

#include <doctest/doctest.h>

#include <string>
#include <string_view>
#include <utility>

#include "../units/contains.hpp"
#include "groundsill/reading.hpp"
#include "run_model.hpp"

namespace test {

/// The tables of a small sound model: two spans A-B-C.
inline constexpr std::pair<std::string_view, std::string_view> sound_tables[] = {
    {"materials", "[materials.steel]\nE = '210 GPa'\npoisson = 0.3\ndensity = '7850 kg/m3'\nexpansion = '12e-6 /K'\n"},
    {"sections", "[sections.bar]\nshape = 'rectangle'\nwidth = '100 mm'\ndepth = '200 mm'\n"},
    {"nodes", "[nodes]\nA = ['0 m', '0 m']\nB = ['6 m', '0 m']\nC = ['10 m', '0 m']\n"},
    {"members", "[members]\nAB = { from = 'A', to = 'B', section = 'bar', material = 'steel' }\n"
                "BC = { from = 'B', to = 'C', section = 'bar', material = 'steel' }\n"},
    {"supports", "[supports]\nA = 'pinned'\nC = 'roller'\n"},
    {"cases", "[cases.dead]\nloads = [{ member = 'AB', y = '-12 kN/m' }]\n"},
};

/// The sound model with one of its tables replaced, or with a further one. The text comes first, so that its lines
/// count from 1.
inline std::string with(std::string_view table, std::string_view text) {
    std::string result(text);
    result += '\n';
    for (const auto& [name, default_text] : sound_tables) {
        if (name != table) result += default_text;
    }
    return result;
}

/// What the reader says about that model.
inline std::string says(std::string_view table, std::string_view text) { return diagnostics(with(table, text)); }

/// What the reader says about one load, in one line that begins at column 10.
inline std::string says_of_load(std::string_view load) {
    return says("cases", "[cases.c]\nloads = [" + std::string(load) + "]\n");
}

/// A model that must be sound.
inline groundsill::Model read(std::string_view text) {
    groundsill::ReadResult result = groundsill::read_model(text);
    REQUIRE_MESSAGE(result.model, groundsill::describe(result.diagnostics, "model", text, false));
    return std::move(*result.model);
}

inline groundsill::Model read(std::string_view table, std::string_view text) { return read(with(table, text)); }

/// The loads on members of a case with one entry in `loads`.
inline std::vector<groundsill::MemberLoad> read_load(std::string_view load) {
    return read("cases", "[cases.c]\nloads = [" + std::string(load) + "]\n").cases.at(0).member_loads;
}

} // namespace test
