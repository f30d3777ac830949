#include "structures.hpp"

#include <iterator>

#include <fmt/format.h>

namespace bench {

namespace {

constexpr const char* steel = R"([units]
length = "m"
force = "kN"
[materials.steel]
E = "210 GPa"
density = "7850 kg/m3"
[sections.bar]
A = "9e-3 m2"
I = "2e-4 m4"
)";

} // namespace

std::string chain(int spans) {
    std::string text = R"([units]
length = "m"
force = "kN"
[materials.concrete]
E = "30 GPa"
[sections.strip]
A = 0.18
I = 0.0054
[nodes]
)";
    auto out = std::back_inserter(text);
    for (int k = 0; k <= spans; ++k) fmt::format_to(out, "N{} = [{}, 0]\n", k, 6 * k);
    text += "[members]\n";
    for (int k = 0; k < spans; ++k)
        fmt::format_to(out,
                       "M{0} = {{ from = \"N{0}\", to = \"N{1}\", section = \"strip\", material = \"concrete\" }}\n", k,
                       k + 1);
    text += "[supports]\nN0 = { x = \"fixed\", y = 20000 }\n";
    for (int k = 1; k <= spans; ++k) fmt::format_to(out, "N{} = {{ y = 20000 }}\n", k);
    text += "[cases.dead]\nloads = [{ y = -12, members = [\n";
    for (int k = 0; k < spans; ++k) fmt::format_to(out, "\"M{}\",{}", k, k % 10 == 9 ? '\n' : ' ');
    text += "] }]\n";
    return text;
}

std::string grid(int storeys, int bays) {
    std::string text = steel;
    auto out = std::back_inserter(text);
    const char* properties = "section = \"bar\", material = \"steel\"";
    text += "[nodes]\n";
    for (int s = 0; s <= storeys; ++s)
        for (int b = 0; b <= bays; ++b) fmt::format_to(out, "N{}_{} = [{}, {}]\n", s, b, 7 * b, 3.5 * s);
    text += "[members]\n";
    for (int s = 1; s <= storeys; ++s)
        for (int b = 0; b <= bays; ++b) {
            fmt::format_to(out, "C{0}_{1} = {{ from = \"N{2}_{1}\", to = \"N{0}_{1}\", {3} }}\n", s, b, s - 1,
                           properties);
            if (b < bays)
                fmt::format_to(out, "B{0}_{1} = {{ from = \"N{0}_{1}\", to = \"N{0}_{2}\", {3} }}\n", s, b, b + 1,
                               properties);
        }
    text += "[supports]\n";
    for (int b = 0; b <= bays; ++b)
        fmt::format_to(out, "N0_{} = {{ x = \"fixed\", y = 80000, rotation = 40000 }}\n", b);
    text += "[cases.dead]\nloads = [\n";
    for (int s = 1; s <= storeys; ++s)
        for (int b = 0; b <= bays; ++b) fmt::format_to(out, "{{ node = \"N{}_{}\", x = 1, y = -84 }},\n", s, b);
    text += "]\n";
    return text;
}

std::string portal() {
    std::string text = steel;
    auto out = std::back_inserter(text);
    text += R"([beams.left]
nodes = ["A0", "A1", "A2", "A3", "A4", "B0"]
spans = [1, 1, 1, 1, 1]
direction = "90 deg"
section = "bar"
material = "steel"
[beams.right]
nodes = ["D0", "D1", "D2", "D3", "D4", "B10"]
spans = [1, 1, 1, 1, 1]
start = [12, 0]
direction = "90 deg"
section = "bar"
material = "steel"
[beams.top]
nodes = ["B0", "B1", "B2", "B3", "B4", "B5", "B6", "B7", "B8", "B9", "B10"]
spans = [1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2]
start = [0, 5]
section = "bar"
material = "steel"
[supports]
A0 = { x = "fixed", y = 80000 }
D0 = { x = "fixed", y = 80000, rotation = 20000 }
[cases.dead]
loads = [{ self_weight = 1.0 }, { beam = "top", y = -8 }]
[cases.snow]
loads = [{ beam = "top", y = -6, per = "plan" }]
[cases.wind]
loads = [{ beam = "left", x = 3 }, { beam = "right", x = 1.8 }]
[cases.sunk]
loads = [{ support = "D0", y = "-10 mm" }]
)";
    for (int k = 0; k < 10; ++k)
        fmt::format_to(out, "[combinations.c{}]\nfactors = {{ dead = 1.35, snow = {}, wind = {}, sunk = {} }}\n{}", k,
                       0.15 * k, 1.5 - 0.15 * k, k % 2, k < 5 ? "" : "limit = \"service\"\n");
    return text;
}

} // namespace bench
