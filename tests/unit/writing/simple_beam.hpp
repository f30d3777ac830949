#pragma once
// A simply supported beam whose answers are round numbers.
//
//      12 kN/m
//   A ↓↓↓↓↓↓↓↓↓↓↓ B     L = 8 m, E = 200 GPa, I = 3.2e-4 m4: EI = 6.4e7 N m2
//   △             ○
//   M = wL²/8 = 96 kN m, V = wL/2 = 48 kN, δ = 5wL⁴/384EI = 10 mm, θ = wL³/24EI = 4 mrad
// (any text on the strength of materials, from memory)

#include <string>

#include <doctest/doctest.h>

#include "groundsill/reading.hpp"

namespace test {

/// The model of a text that reads without a word.
inline groundsill::Model model_of(const std::string& toml) {
    groundsill::ReadResult result = groundsill::read_model(toml);
    const std::string said = groundsill::describe(result.diagnostics, "model", toml, false);
    REQUIRE_MESSAGE(said.empty(), said);
    return std::move(*result.model);
}

inline const std::string simple_beam_text = R"(
title = "Hand-checked beam"
[units]
length = "m"
force = "N"
[materials.steel]
E = 200e9
[sections.joist]
A = 0.01
I = 3.2e-4
[nodes]
A = [0, 0]
B = [8, 0]
[members]
AB = { from = "A", to = "B", section = "joist", material = "steel" }
[supports]
A = "pinned"
B = "roller"
[cases.dead]
action = "permanent"
loads = [{ member = "AB", y = -12e3 }]
)";

inline groundsill::Model simple_beam() { return model_of(simple_beam_text); }

/// The beam under 1.5 times the load for strength and 1.0 times for service.
inline groundsill::Model combined_beam() {
    return model_of(simple_beam_text + R"(
[combinations.uls]
factors = { dead = 1.5 }
[combinations.sls]
factors = { dead = 1 }
limit = "service"
)");
}

/// The beam, inclined, with nothing but a settlement of its second support: statically determinate, no force flows.
inline groundsill::Model settling_beam() {
    return model_of(R"(
[units]
length = "m"
force = "N"
[materials.steel]
E = 200e9
[sections.joist]
A = 0.01
I = 3.2e-4
[nodes]
A = [0, 0]
B = [7.3, 2.9]
[members]
AB = { from = "A", to = "B", section = "joist", material = "steel" }
[supports]
A = "pinned"
B = "roller"
[cases.sinking]
action = "settlement"
loads = [{ support = "B", y = -0.0123 }]
)");
}

} // namespace test
