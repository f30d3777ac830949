// Secondary moments from settlement of supports. Sources: register.cpp, Group::settlement.

#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double D = 0.0137;

/// One support of equal spans sinks by D: M = c E I D / L^2 over the inner supports, R = c E I D / L^3.
void check_equal_spans(const Row& row, const std::string& sinking, const std::vector<double>& moments,
                       const std::vector<double>& reactions) {
    const double L = 5.3, EI = Stiffness{}.EI();
    const std::size_t spans = reactions.size() - 1;
    BeamModel beam{std::vector<double>(spans, L), std::vector<std::string>(spans + 1, roller), {settle(sinking, D)}};
    beam.supports[0] = pinned;
    const Solved s = solve(beam);
    for (std::size_t i = 0; i < moments.size(); ++i) {
        const char left = static_cast<char>('A' + i), here = static_cast<char>('B' + i);
        row.check(fmt::format("M over {}, kN m", here), moments[i] * EI * D / (L * L),
                  s.M(fmt::format("{}{}", left, here), L));
    }
    for (std::size_t i = 0; i <= spans; ++i) {
        const std::string node(1, static_cast<char>('A' + i));
        row.check(fmt::format("reaction at {}, kN", node), reactions[i] * EI * D / std::pow(L, 3), s.reaction_y(node));
    }
}

/// Three members of their own E I on the x axis.
std::string three_spans(double L1, double L2, double L3, double EI1, double EI2, double EI3) {
    const double E = 2e8;
    return fmt::format(R"(
[units]
length = "m"
force = "kN"
[materials.m]
E = {}
[sections]
s1 = {{ A = 0.01, I = {} }}
s2 = {{ A = 0.01, I = {} }}
s3 = {{ A = 0.01, I = {} }}
[nodes]
A = [0, 0]
B = [{b}, 0]
C = [{c}, 0]
D = [{d}, 0]
[members]
AB = {{ from = "A", to = "B", section = "s1", material = "m" }}
BC = {{ from = "B", to = "C", section = "s2", material = "m" }}
CD = {{ from = "C", to = "D", section = "s3", material = "m" }}
)",
                       E, EI1 / E, EI2 / E, EI3 / E, fmt::arg("b", L1), fmt::arg("c", L1 + L2),
                       fmt::arg("d", L1 + L2 + L3));
}

const std::string simple_supports = "[supports]\nA = \"pinned\"\nB = \"roller\"\nC = \"roller\"\nD = \"roller\"\n";

} // namespace

TEST_CASE("two equal spans, an end sinks") {
    check_equal_spans(Row(Group::settlement, "2 equal spans, end A sinks"), "A", {-1.5}, {-1.5, 3, -1.5});
}
TEST_CASE("two equal spans, the centre sinks") {
    check_equal_spans(Row(Group::settlement, "2 equal spans, centre B sinks"), "B", {3}, {3, -6, 3});
}
TEST_CASE("three equal spans, an end sinks") {
    check_equal_spans(Row(Group::settlement, "3 equal spans, end A sinks"), "A", {-1.6, 0.4}, {-1.6, 3.6, -2.4, 0.4});
}
TEST_CASE("three equal spans, an inner support sinks") {
    check_equal_spans(Row(Group::settlement, "3 equal spans, B sinks"), "B", {3.6, -2.4}, {3.6, -9.6, 8.4, -2.4});
}

TEST_CASE("Kassimali, three spans with fixed ends") {
    // Data, fixed-end moments and distribution factors are the book's; the final moments of the exact distribution
    // follow.
    const Row row(Group::settlement, "three spans of 8 m, fixed ends, B sinks 20 mm",
                  "A. Kassimali, Structural Analysis, Example 16.5");
    const double EI = 70e6 * 800e-6;
    const Solved s(three_spans(8, 8, 8, EI, EI, EI) +
                   "[supports]\nA = \"fixed\"\nB = \"roller\"\nC = \"roller\"\nD = \"fixed\"\n" +
                   load_case({settle("B", 0.02)}));
    // Counter-clockwise end moments m: M = -m at the start of a member, +m at its end.
    row.check("end moment A of AB, kN m", 98, -s.M("AB", 0));
    row.check("end moment B of AB, kN m", 91, s.M("AB", 8));
    row.check("end moment B of BC, kN m", -91, -s.M("BC", 0));
    row.check("end moment C of BC, kN m", -56, s.M("BC", 8));
    row.check("end moment C of CD, kN m", 56, -s.M("CD", 0));
    row.check("end moment D of CD, kN m", 28, s.M("CD", 8));
    row.check("reaction at A, kN", 23.625, s.reaction_y("A"));
    row.check("reaction at B, kN", -42, s.reaction_y("B"));
    row.check("reaction at C, kN", 28.875, s.reaction_y("C"));
    row.check("reaction at D, kN", -10.5, s.reaction_y("D"));
}

TEST_CASE("three unequal spans, load and settlement") {
    const Row row(Group::settlement, "6/8/6 m, E I = 40000/60000/40000, B -12 mm, C -5 mm",
                  "independent matrix solution");
    const std::string model = three_spans(6, 8, 6, 40000, 60000, 40000) + simple_supports;
    const std::vector<std::string> movements{settle("B", 0.012), settle("C", 0.005)};
    const Solved alone(model + load_case(movements));
    row.check("settlement: M over B, kN m", 32.335165, alone.M("AB", 6), printed(1e-6));
    row.check("settlement: M over C, kN m", -8.049451, alone.M("CD", 0), printed(1e-6));
    row.check("settlement: reaction at A, kN", 5.38919, alone.reaction_y("A"), printed(1e-5));
    row.check("settlement: reaction at B, kN", -10.43727, alone.reaction_y("B"), printed(1e-5));
    row.check("settlement: reaction at C, kN", 6.38965, alone.reaction_y("C"), printed(1e-5));
    row.check("settlement: reaction at D, kN", -1.34158, alone.reaction_y("D"), printed(1e-5));
    std::vector<std::string> all = movements;
    for (const char* member : {"AB", "BC", "CD"}) all.push_back(uniform(member, 18));
    const Solved s(model + load_case(all));
    row.check("with 18 kN/m: M over B, kN m", -57.236264, s.M("AB", 6), printed(1e-6));
    row.check("with 18 kN/m: M over C, kN m", -97.620879, s.M("CD", 0), printed(1e-6));
    row.check("with 18 kN/m: reaction at A, kN", 44.46062, s.reaction_y("A"), printed(1e-5));
    row.check("with 18 kN/m: reaction at B, kN", 130.4913, s.reaction_y("B"), printed(1e-4));
    row.check("with 18 kN/m: reaction at C, kN", 147.31822, s.reaction_y("C"), printed(1e-5));
    row.check("with 18 kN/m: reaction at D, kN", 37.72985, s.reaction_y("D"), printed(1e-5));
}

TEST_CASE("two spans on three springs") {
    const Row row(Group::settlement, "5 + 5 m on springs of 8000/5000/8000 kN/m", "independent matrix solution");
    const std::string left = "{ x = \"fixed\", y = 8000 }";
    BeamModel beam{
        {5, 5}, {left, spring_y(5000), spring_y(8000)}, {uniform("AB", 10), uniform("BC", 10), point("AB", 90, 3)}};
    beam.stiffness.E = 2e8; // E I = 20000 kN m2
    const Solved s = solve(beam);
    row.check("reaction at A, kN", 55.020767, s.reaction_y("A"), printed(1e-6));
    row.check("reaction at B, kN", 115.958466, s.reaction_y("B"), printed(1e-6));
    row.check("reaction at C, kN", 19.020767, s.reaction_y("C"), printed(1e-6));
    row.check("M over B, kN m", -29.896166, s.M("AB", 5), printed(1e-6));
    row.check("M under the load, kN m", 120.0623, s.M("AB", 3), printed(1e-4));
    row.check("settlement of A, mm", 6.8776, -1000 * s.y("A"), printed(1e-4));
    row.check("settlement of B, mm", 23.19169, -1000 * s.y("B"), printed(1e-5));
    row.check("settlement of C, mm", 2.3776, -1000 * s.y("C"), printed(1e-4));
}

TEST_CASE("three-moment equation with settlement") {
    // M1 L1 + 2 M2 (L1 + L2) + M3 L2 = -w1 L1^3/4 - w2 L2^3/4 + 6EI [(D2 - D1)/L1 + (D2 - D3)/L2], over B and over C.
    const double L1 = 4.7, L2 = 6.1, L3 = 3.9, EI = 23000;
    const double w1 = 11.3, w2 = 7.9, w3 = 15.1;
    const double DA = 0.0032, DB = 0.0117, DC = 0.0071, DD = 0.0019;
    const double rB = -w1 * std::pow(L1, 3) / 4 - w2 * std::pow(L2, 3) / 4 + 6 * EI * ((DB - DA) / L1 + (DB - DC) / L2);
    const double rC = -w2 * std::pow(L2, 3) / 4 - w3 * std::pow(L3, 3) / 4 + 6 * EI * ((DC - DB) / L2 + (DC - DD) / L3);
    const double a = 2 * (L1 + L2), b = 2 * (L2 + L3), determinant = a * b - L2 * L2;
    const double MB = (rB * b - rC * L2) / determinant, MC = (rC * a - rB * L2) / determinant;
    const Row row(Group::settlement, "4.7/6.1/3.9 m, four settlements, three loads",
                  "B. P. E. Clapeyron, three-moment equation");
    const Solved s(three_spans(L1, L2, L3, EI, EI, EI) + simple_supports +
                   load_case({uniform("AB", w1), uniform("BC", w2), uniform("CD", w3), settle("A", DA), settle("B", DB),
                              settle("C", DC), settle("D", DD)}));
    row.check("M over B, kN m", MB, s.M("BC", 0));
    row.check("M over C, kN m", MC, s.M("BC", L2));
    row.check("reaction at A, kN", w1 * L1 / 2 + MB / L1, s.reaction_y("A"));
    row.check("reaction at B, kN", (w1 * L1 + w2 * L2) / 2 - MB / L1 + (MC - MB) / L2, s.reaction_y("B"));
}
