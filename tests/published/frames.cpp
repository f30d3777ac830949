// Worked frames. Sources: register.cpp, Group::frames. Lengths in m, forces in kN.

#include <array>
#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

std::string head(double E) {
    return fmt::format("[units]\nlength = \"m\"\nforce = \"kN\"\n[materials.m]\nE = {}\n", E);
}

std::string member(std::string_view name, std::string_view from, std::string_view to, std::string_view section) {
    return fmt::format("{} = {{ from = \"{}\", to = \"{}\", section = \"{}\", material = \"m\" }}\n", name, from, to,
                       section);
}

} // namespace

TEST_CASE("Hibbeler, fixed portal with an eccentric load") {
    const double E = 2.1e8, I = 2e-4, A = axial_stiffness_ratio * I / 25;
    const Solved s(head(E) + fmt::format("[sections.s]\nA = {}\nI = {}\n", A, I) +
                   "[nodes]\nA = [0, 0]\nB = [0, 5]\nC = [5, 5]\nD = [5, 0]\n[members]\n" +
                   member("AB", "A", "B", "s") + member("BC", "B", "C", "s") + member("CD", "C", "D", "s") +
                   "[supports]\nA = \"fixed\"\nD = \"fixed\"\n" + load_case({point("BC", 16, 1)}));
    const std::array<double, 4> M{s.M("AB", 0), s.M("BC", 0), s.M("BC", 5), s.M("CD", 5)};
    const Row row(Group::frames, "portal 5 m x 5 m, 16 kN at 1 m from the left");
    row.check("M_A, kN m", 1.58476, M[0], printed(1e-5));
    row.check("M_B, kN m", -4.81524, M[1], printed(1e-5));
    row.check("M_C, kN m", -3.71810, M[2], printed(1e-5));
    row.check("M_D, kN m", 2.68190, M[3], printed(1e-5));
    // The book's moment distribution is rounded by hand at each step.
    constexpr Tolerance by_hand{0.02, 0, "below 2 % (hand rounding)"};
    const Row book(Group::frames, "the same, moment distribution", "R. C. Hibbeler, Structural Analysis, from memory");
    book.check("M_A, kN m", 1.57, M[0], by_hand);
    book.check("M_B, kN m", -4.79, M[1], by_hand);
    book.check("M_C, kN m", -3.71, M[2], by_hand);
    book.check("M_D, kN m", 2.63, M[3], by_hand);
}

TEST_CASE("Vierendeel girder") {
    // Bottom nodes b0 … b4, top nodes t0 … t4; posts are drawn upward.
    const double E = 2e8, I = 2e-4, A = axial_stiffness_ratio * I / 9;
    std::string nodes = "[nodes]\n", members = "[members]\n";
    for (int i = 0; i <= 4; ++i) {
        nodes += fmt::format("b{0} = [{1}, 0]\nt{0} = [{1}, 3]\n", i, 3 * i);
        members += member(fmt::format("post{}", i), fmt::format("b{}", i), fmt::format("t{}", i), "s");
        if (i == 4) break;
        members += member(fmt::format("bottom{}", i + 1), fmt::format("b{}", i), fmt::format("b{}", i + 1), "s");
        members += member(fmt::format("top{}", i + 1), fmt::format("t{}", i), fmt::format("t{}", i + 1), "s");
    }
    const Solved s(head(E) + fmt::format("[sections.s]\nA = {}\nI = {}\n", A, I) + nodes + members +
                   "[supports]\nb0 = \"pinned\"\nb4 = \"roller\"\n" +
                   load_case({force("t1", 20), force("t2", 20), force("t3", 20)}));
    const Row row(Group::frames, "Vierendeel girder, 4 panels of 3 m x 3 m, 20 kN at the inner top joints");
    for (const std::string chord : {"top", "bottom"}) {
        row.check(chord + " chord, panel 1: M at its start, kN m", -22.9091, s.M(chord + "1", 0), printed(1e-4));
        row.check(chord + " chord, panel 1: M at its end, kN m", 22.0909, s.M(chord + "1", 3), printed(1e-4));
        row.check(chord + " chord, panel 2: M at its start, kN m", -3.2727, s.M(chord + "2", 0), printed(1e-4));
        row.check(chord + " chord, panel 2: M at its end, kN m", 11.7273, s.M(chord + "2", 3), printed(1e-4));
        const double sign = chord == "top" ? -1 : 1;
        row.check(chord + " chord, panel 1: N, kN", sign * 15.2727, s.N(chord + "1", 0), printed(1e-4));
        row.check(chord + " chord, panel 2: N, kN", sign * 32.1818, s.N(chord + "2", 0), printed(1e-4));
    }
    row.check("end post: M at the top, kN m", -22.9091, s.M("post0", 3), printed(1e-4));
    row.check("second post: M at the top, kN m", -25.3636, s.M("post1", 3), printed(1e-4));
    row.check_zero("middle post: M at the top, kN m", s.M("post2", 3), 25);
    // Virtual work of these moments (in elevenths) with a unit load at midspan and zeros at the middle of every chord:
    // E I delta = 4 * 0.1875 (45 + 15) + 2 (0.375 * 252/11 + 0.75 * 279/11).
    row.check("deflection at midspan times E I", 45 + 2 * (0.375 * 252 / 11 + 0.75 * 279 / 11), -s.y("b2") * E * I,
              axially_stiff);
}

TEST_CASE("two-storey frame") {
    // L, M, U are the left joints from the base up; l, m, u the right ones. E I of the columns is 1 unit.
    const double E = 1e5, A = axial_stiffness_ratio / 36;
    const Solved s(
        head(E) +
        fmt::format("[sections]\ncolumn = {{ A = {0}, I = 1 }}\nfloor = {{ A = {0}, I = 2 }}\n"
                    "roof = {{ A = {0}, I = 1.5 }}\n",
                    2 * A) +
        "[nodes]\nL = [0, 0]\nM = [0, 4]\nU = [0, 7.5]\nl = [6, 0]\nm = [6, 4]\nu = [6, 7.5]\n[members]\n" +
        member("LM", "L", "M", "column") + member("MU", "M", "U", "column") + member("lm", "l", "m", "column") +
        member("mu", "m", "u", "column") + member("floor", "M", "m", "floor") + member("roof", "U", "u", "roof") +
        "[supports]\nL = \"fixed\"\nl = \"fixed\"\n" +
        load_case({"{ node = \"M\", x = 20 }", "{ node = \"U\", x = 10 }", uniform("floor", 12), uniform("roof", 8)}));
    const Row row(Group::frames, "two storeys of 4 m and 3.5 m, span 6 m, E I 1 (columns), 2 (floor), 1.5 (roof)");
    // Counter-clockwise end moments m: M = -m at the start of a member, +m at its end.
    row.check("left base moment, kN m", 28.73533, s.reaction_moment("L"), printed(1e-5));
    row.check("right base moment, kN m", 39.32692, s.reaction_moment("l"), printed(1e-5));
    row.check("top of the lower left column, kN m", 15.37728, s.M("LM", 4), printed(1e-5));
    row.check("top of the lower right column, kN m", 36.56047, s.M("lm", 4), printed(1e-5));
    row.check("floor beam left, kN m", -3.31006, -s.M("floor", 0), printed(1e-5));
    row.check("floor beam right, kN m", -61.18793, s.M("floor", 6), printed(1e-5));
    row.check("roof beam left, kN m", 7.31779, -s.M("roof", 0), printed(1e-5));
    row.check("roof beam right, kN m", -29.75755, s.M("roof", 6), printed(1e-5));
    // By statics from the beams' end moments above: w L/2 of both beams and the sum of the four moments over L.
    const double transfer = (-3.31006 - 61.18793 + 7.31779 - 29.75755) / 6;
    row.check("left vertical reaction, kN", 60 + transfer, s.reaction_y("L"), printed(1e-5));
    row.check("right vertical reaction, kN", 60 - transfer, s.reaction_y("l"), printed(1e-5));
    row.check("left horizontal reaction, kN", -11.02815, s.reaction_x("L"), printed(1e-5));
    row.check("right horizontal reaction, kN", -18.97185, s.reaction_x("l"), printed(1e-5));
    row.check("sway of the floor times E I", 112.249, s.x("M") * E, printed(1e-3));
    row.check("sway of the roof times E I", 171.421, s.x("U") * E, printed(1e-3));
}

namespace {

/// Columns IPE 300, h = 4 m, beam IPE 360, L = 8 m; 15 kN/m on the beam, 20 kN to the right at the left eaves.
Solved steel_portal(const std::string& bases, const std::string& column_shear, const std::string& beam_shear) {
    return Solved(fmt::format(R"(
[units]
length = "m"
force = "kN"
[materials.m]
E = "210 GPa"
poisson = 0.3
[sections]
column = {{ A = "53.81 cm2", I = "8356 cm4"{} }}
beam = {{ A = "72.73 cm2", I = "16270 cm4"{} }}
[nodes]
A = [0, 0]
B = [0, 4]
C = [8, 4]
D = [8, 0]
)",
                              column_shear, beam_shear) +
                  "[members]\n" + member("AB", "A", "B", "column") + member("BC", "B", "C", "beam") +
                  member("CD", "C", "D", "column") + fmt::format("[supports]\nA = {0}\nD = {0}\n", bases) +
                  load_case({uniform("BC", 15), "{ node = \"B\", x = 20 }"}));
}

const std::string springs = "{ x = \"40 MN/m\", y = 60000, rotation = \"8000 kN m/rad\" }";

struct PortalValues {
    double base_left, eaves_left, eaves_right, base_right; // counter-clockwise end moments of the columns
    double sway_left, sway_right;                          // mm
    double H_left, V_left, H_right, V_right;
};

void check_portal(const Row& row, const Solved& s, const PortalValues& v) {
    row.check("base left, kN m", v.base_left, -s.M("AB", 0), printed(1e-5));
    row.check("eaves left, kN m", v.eaves_left, s.M("AB", 4), printed(1e-5));
    row.check("eaves right, kN m", v.eaves_right, -s.M("CD", 0), printed(1e-5));
    row.check("base right, kN m", v.base_right, s.M("CD", 4), printed(1e-5));
    row.check("base moment left as a reaction, kN m", v.base_left, s.reaction_moment("A"), printed(1e-5));
    row.check("sway left, mm", v.sway_left, 1000 * s.x("B"), printed(1e-5));
    row.check("sway right, mm", v.sway_right, 1000 * s.x("C"), printed(1e-5));
    row.check("H left, kN", v.H_left, s.reaction_x("A"), printed(1e-4));
    row.check("V left, kN", v.V_left, s.reaction_y("A"), printed(1e-4));
    row.check("H right, kN", v.H_right, s.reaction_x("D"), printed(1e-4));
    row.check("V right, kN", v.V_right, s.reaction_y("D"), printed(1e-4));
}

} // namespace

TEST_CASE("steel portal on springs") {
    check_portal(Row(Group::frames, "steel portal on springs"), steel_portal(springs, "", ""),
                 {6.83242, -25.39064, 74.00761, 24.55061, 9.23539, 9.10633, 4.6396, 53.9229, -24.6396, 66.0771});
}

TEST_CASE("steel portal on rigid bases") {
    check_portal(Row(Group::frames, "steel portal on rigid bases"), steel_portal(fixed, "", ""),
                 {-3.62259, -36.57571, 70.70060, 49.49770, 4.45729, 4.29989, 10.0496, 55.7344, -30.0496, 64.2656});
}

TEST_CASE("steel portal on springs, shear-flexible") {
    check_portal(Row(Group::frames, "steel portal on springs, shear-flexible"),
                 steel_portal(springs, ", shear_area = \"25.68 cm2\"", ", shear_area = \"35.14 cm2\""),
                 {7.30774, -25.00953, 73.51784, 24.18394, 9.47961, 9.35167, 4.4254, 53.9365, -24.4254, 66.0635});
}

namespace {

constexpr double hinge_a = 4, hinge_b = 6, hinge_P = 50, hinge_EI = 1000;

/// The head of the model of the fixed-fixed beam with a hinge.
std::string hinged(std::string_view rest) {
    return head(1e7) + "[sections.s]\nA = 0.01\nI = 1e-4\n" + std::string(rest) +
           "[supports]\nA = \"fixed\"\nC = \"fixed\"\n";
}

const double hinge_deflection = hinge_P / (3 * hinge_EI / std::pow(hinge_a, 3) + 3 * hinge_EI / std::pow(hinge_b, 3));

/// Fixed-fixed beam with a hinge at 4 m of 10 m, P = 50 kN there: delta = P/(3EI/a3 + 3EI/b3).
void check_hinged(const Row& row, const Solved& s) {
    row.check("left root moment, kN m", 3 * hinge_EI * hinge_deflection / (hinge_a * hinge_a), s.reaction_moment("A"));
    row.check("right root moment, kN m", -3 * hinge_EI * hinge_deflection / (hinge_b * hinge_b),
              s.reaction_moment("C"));
    row.check("left root moment (printed), kN m", 154.28571, s.reaction_moment("A"), printed(1e-5));
    row.check("right root moment (printed), kN m", -68.57143, s.reaction_moment("C"), printed(1e-5));
}

} // namespace

TEST_CASE("internal hinge by a release") {
    const Row row(Group::frames, "fixed beam 4 + 6 m with a hinge, 50 kN at it, by a release");
    const Solved s(hinged("[nodes]\nA = [0, 0]\nB = [4, 0]\nC = [10, 0]\n[members]\n"
                          "AB = { from = \"A\", to = \"B\", section = \"s\", material = \"m\", "
                          "releases = { end = { moment = \"free\" } } }\n" +
                          member("BC", "B", "C", "s")) +
                   load_case({force("B", hinge_P)}));
    check_hinged(row, s);
    row.check("deflection of the hinge, m", -hinge_deflection, s.y("B"));
    row.check("deflection (printed), m", -0.82285714, s.y("B"), printed(1e-8));
    row.check_zero("M at the hinge, kN m", s.M("AB", 4), 100);
}

TEST_CASE("internal hinge with both members released") {
    const Row row(Group::frames, "the same, both members released at the joint");
    const Solved s(hinged("[nodes]\nA = [0, 0]\nB = [4, 0]\nC = [10, 0]\n[members]\n"
                          "AB = { from = \"A\", to = \"B\", section = \"s\", material = \"m\", "
                          "releases = { end = { moment = \"free\" } } }\n"
                          "BC = { from = \"B\", to = \"C\", section = \"s\", material = \"m\", "
                          "releases = { start = { moment = \"free\" } } }\n") +
                   load_case({force("B", hinge_P)}));
    check_hinged(row, s);
    row.check("deflection of the hinge, m", -hinge_deflection, s.y("B"));
    CHECK_FALSE(s.json().has("/cases/load/displacements/B/rotation"));
}

TEST_CASE("internal hinge inside a member of a run") {
    const Row row(Group::frames, "the same, one span of a run with a hinge at a place");
    const Solved s(hinged("[beams.run]\nnodes = [\"A\", \"C\"]\nspans = [\"10 m\"]\nsection = \"s\"\nmaterial = \"m\"\n"
                          "hinges = [\"4 m\"]\n") +
                   load_case({fmt::format("{{ beam = \"run\", y = {}, at = 4 }}", -hinge_P)}));
    check_hinged(row, s);
    row.check("largest deflection, m", -hinge_deflection, s.least("run.1", "across").value);
    row.check("its place, m", hinge_a, s.least("run.1", "across").at);
    row.check_zero("M at the hinge, kN m", s.M("run.1", 4), 100);
}

TEST_CASE("internal hinge at a node of a run") {
    const Row row(Group::frames, "the same, hinge at a node of a run");
    const Solved s(hinged("[beams.run]\nnodes = [\"A\", \"B\", \"C\"]\nspans = [\"4 m\", \"6 m\"]\nsection = \"s\"\n"
                          "material = \"m\"\nhinges = [\"4 m\"]\n") +
                   load_case({force("B", hinge_P)}));
    check_hinged(row, s);
    // The hinge is in the member before the node: the node turns with the member after it.
    row.check("rotation of the node, rad", 3 * hinge_deflection / (2 * hinge_b), s.rotation("B"));
}
