// Reads a model, analyses it and prints the largest moment of a member: what a first-time user of the library would
// write.
//
//   A simply supported beam, span L = 8 m, under w = 15 kN/m:  M = w L^2 / 8 = 120 kN m at 4 m.

#include <cmath>
#include <cstdio>

#include <groundsill/groundsill.hpp>

namespace {

constexpr const char* text = R"(
title = "Sill over the boat gate"
[materials.steel]
E = "210 GPa"
[sections.sill]
A = "8446 mm2"
I = "23130 cm4"
[nodes]
A = ["0 m", "0 m"]
B = ["8 m", "0 m"]
[members]
AB = { from = "A", to = "B", section = "sill", material = "steel" }
[supports]
A = "pinned"
B = "roller"
[cases.dead]
loads = [{ member = "AB", y = "-15 kN/m" }]
)";

} // namespace

int main() {
    const groundsill::ReadResult reading = groundsill::read_model(text);
    if (!reading.model) {
        std::fputs(groundsill::describe(reading.diagnostics, "sill", text, false).c_str(), stderr);
        return 2;
    }
    const groundsill::Outcome outcome = groundsill::analyse(*reading.model);
    if (!outcome.analysis) {
        std::fputs(outcome.refusals.front().message.c_str(), stderr);
        return 3;
    }
    const auto moment = groundsill::case_diagram(*outcome.analysis, 0, 0).extremes(groundsill::Curve::M, 1e-6).max;
    std::printf("Largest moment %.6f kN m at %.6f m\n", moment.value / 1e3, moment.at);
    return std::abs(moment.value - 120e3) < 1e-4 && std::abs(moment.at - 4) < 1e-9 ? 0 : 1;
}
