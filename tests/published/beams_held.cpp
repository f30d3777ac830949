// Propped and fixed beams and beams with an overhang, one row of the beam tables a test. Sources: register.cpp,
// Group::held_spans. The left end is fixed, the prop is at the right; L = 7.3 m, E I = 21000 kN m2 throughout.

#include <cmath>

#include <doctest/doctest.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 7.3;
constexpr double w = 12.4;
constexpr double P = 37;
const double EI = Stiffness{}.EI();
const double wL4 = w * std::pow(L, 4) / EI;
const double PL3 = P * std::pow(L, 3) / EI;

Solved propped(const std::vector<std::string>& loads) { return solve({{L}, {fixed, roller}, loads}); }
Solved both_fixed(const std::vector<std::string>& loads) { return solve({{L}, {fixed, fixed}, loads}); }

} // namespace

TEST_CASE("propped cantilever, uniform load") {
    const Row row(Group::held_spans, "16 propped, uniform load w");
    const Solved s = propped({uniform("AB", w)});
    row.check("M at the fixed end, kN m", -w * L * L / 8, s.M("AB", 0));
    row.check("reaction of the prop, kN", 3 * w * L / 8, s.reaction_y("B"));
    row.check("largest M, kN m", 9 * w * L * L / 128, s.most("AB", "M").value);
    row.check("its place from the prop, m", 3 * L / 8, L - s.most("AB", "M").at);
    const Extreme deflection = s.least("AB", "across");
    row.check("largest deflection / (w L^4 / E I)", 0.0054161216, -deflection.value / wL4, printed(1e-10));
    row.check("its place from the prop, m", (1 + std::sqrt(33.0)) * L / 16, L - deflection.at);
    row.check("deflection at midspan, m", -wL4 / 192, s.across("AB", L / 2));
    row.check("rotation at the prop, rad", w * std::pow(L, 3) / (48 * EI), s.rotation("B"));
}

TEST_CASE("propped cantilever, point load at midspan") {
    const Row row(Group::held_spans, "17 propped, P at midspan");
    const Solved s = propped({point("AB", P, L / 2)});
    row.check("M at the fixed end, kN m", -3 * P * L / 16, s.M("AB", 0));
    row.check("largest M, kN m", 5 * P * L / 32, s.most("AB", "M").value);
    row.check("reaction of the prop, kN", 5 * P / 16, s.reaction_y("B"));
    row.check("largest deflection, m", -PL3 / (48 * std::sqrt(5.0)), s.least("AB", "across").value);
    row.check("its place from the prop, m", L / std::sqrt(5.0), L - s.least("AB", "across").at);
    row.check("deflection at midspan, m", -7 * PL3 / 768, s.across("AB", L / 2));
    row.check("rotation at the prop, rad", P * L * L / (32 * EI), s.rotation("B"));
}

TEST_CASE("propped cantilever, point load anywhere") {
    const double a = 2.6, b = L - a;
    const Row row(Group::held_spans, "18 propped, P at a from the prop");
    const Solved s = propped({point("AB", P, b)});
    row.check("reaction of the prop, kN", P * b * b * (a + 2 * L) / (2 * std::pow(L, 3)), s.reaction_y("B"));
    row.check("M at the fixed end, kN m", -P * a * b * (a + L) / (2 * L * L), s.M("AB", 0));
    row.check("deflection under the load, m", -P * a * a * std::pow(b, 3) * (3 * L + a) / (12 * EI * std::pow(L, 3)),
              s.across("AB", b));
}

TEST_CASE("propped cantilever, triangular load") {
    const Row row(Group::held_spans, "19 propped, load from w at the fixed end to 0");
    const Solved s = propped({linear("AB", w, 0)});
    row.check("M at the fixed end, kN m", -w * L * L / 15, s.M("AB", 0));
    row.check("reaction of the prop, kN", w * L / 10, s.reaction_y("B"));
    row.check("largest deflection, m", -2 * wL4 / (375 * std::sqrt(5.0)), s.least("AB", "across").value);
    row.check("its place from the prop, m", L / std::sqrt(5.0), L - s.least("AB", "across").at);
}

TEST_CASE("propped cantilever, couple at the prop") {
    const double M0 = 41;
    const Row row(Group::held_spans, "20 propped, couple M0 at the prop");
    const Solved s = propped({couple("B", M0)});
    row.check("M at the fixed end, kN m", -M0 / 2, s.M("AB", 0));
    row.check("M at the prop, kN m", M0, s.M("AB", L));
    row.check("reaction of the prop, kN", -3 * M0 / (2 * L), s.reaction_y("B"));
    row.check("rotation at the prop, rad", M0 * L / (4 * EI), s.rotation("B"));
}

TEST_CASE("fixed beam, uniform load") {
    const Row row(Group::held_spans, "21 fixed ends, uniform load w");
    const Solved s = both_fixed({uniform("AB", w)});
    row.check("M at the ends, kN m", -w * L * L / 12, s.M("AB", L));
    row.check("M at midspan, kN m", w * L * L / 24, s.most("AB", "M").value);
    row.check("deflection at midspan, m", -wL4 / 384, s.across("AB", L / 2));
}

TEST_CASE("fixed beam, point load at midspan") {
    const Row row(Group::held_spans, "22 fixed ends, P at midspan");
    const Solved s = both_fixed({point("AB", P, L / 2)});
    row.check("M at the ends, kN m", -P * L / 8, s.M("AB", 0));
    row.check("deflection at midspan, m", -PL3 / 192, s.across("AB", L / 2));
}

TEST_CASE("fixed beam, point load anywhere") {
    const double a = 2.6, b = L - a;
    const Row row(Group::held_spans, "23 fixed ends, P at a from the left");
    const Solved s = both_fixed({point("AB", P, a)});
    row.check("M at the left end, kN m", -P * a * b * b / (L * L), s.M("AB", 0));
    row.check("M at the right end, kN m", -P * a * a * b / (L * L), s.M("AB", L));
    row.check("reaction left, kN", P * b * b * (3 * a + b) / std::pow(L, 3), s.reaction_y("A"));
    row.check("M under the load, kN m", 2 * P * a * a * b * b / std::pow(L, 3), s.M("AB", a));
    row.check("deflection under the load, m", -P * std::pow(a * b, 3) / (3 * EI * std::pow(L, 3)), s.across("AB", a));
    const double stretch = 3 * b + a;
    row.check("largest deflection, m", -2 * P * a * a * std::pow(b, 3) / (3 * EI * stretch * stretch),
              s.least("AB", "across").value);
    row.check("its place from the right, m", 2 * b * L / stretch, L - s.least("AB", "across").at);
}

TEST_CASE("fixed beam, triangular load") {
    const Row row(Group::held_spans, "24 fixed ends, load from 0 to w");
    const Solved s = both_fixed({linear("AB", 0, w)});
    row.check("M at the left end, kN m", -w * L * L / 30, s.M("AB", 0));
    row.check("M at the right end, kN m", -w * L * L / 20, s.M("AB", L));
    row.check("reaction left, kN", 3 * w * L / 20, s.reaction_y("A"));
    row.check("reaction right, kN", 7 * w * L / 20, s.reaction_y("B"));
    row.check("deflection at midspan, m", -wL4 / 768, s.across("AB", L / 2));
    const Extreme deflection = s.least("AB", "across"), moment = s.most("AB", "M");
    row.check("largest deflection / (w L^4 / E I)", 0.0013085379, -deflection.value / wL4, printed(1e-10));
    row.check("its place / L", 0.5246951, deflection.at / L, printed(1e-7));
    row.check("largest M / (w L^2)", 0.021438922, moment.value / (w * L * L), printed(1e-9));
    row.check("its place / L", 0.5477226, moment.at / L, printed(1e-7));
}

TEST_CASE("fixed beam, trapezoidal load") {
    const double q1 = 5.3, q2 = 17.9;
    const Row row(Group::held_spans, "25 fixed ends, load from q1 to q2");
    const Solved s = both_fixed({linear("AB", q1, q2)});
    row.check("M at the left end, kN m", -L * L * (3 * q1 + 2 * q2) / 60, s.M("AB", 0));
    row.check("M at the right end, kN m", -L * L * (2 * q1 + 3 * q2) / 60, s.M("AB", L));
}

TEST_CASE("fixed beam, symmetric triangular load") {
    const Row row(Group::held_spans, "26 fixed ends, load 0 to w at midspan to 0");
    const Solved s = both_fixed({linear("AB", 0, w, 0, L / 2), linear("AB", w, 0, L / 2, L)});
    row.check("M at the ends, kN m", -5 * w * L * L / 96, s.M("AB", 0));
    row.check("M at midspan, kN m", w * L * L / 32, s.most("AB", "M").value);
    row.check("deflection at midspan, m", -7 * wL4 / 3840, s.across("AB", L / 2));
}

TEST_CASE("overhang, point load at the tip") {
    const double c = 2.15;
    const Row row(Group::held_spans, "27 overhang c, P at its tip");
    const Solved s = solve({{L, c}, {pinned, roller, none}, {force("C", P)}});
    row.check("M over the support, kN m", -P * c, s.M("AB", L));
    row.check("reaction at the start, kN", -P * c / L, s.reaction_y("A"));
    row.check("movement of the tip, m", -P * c * c * (L + c) / (3 * EI), s.y("C"));
    row.check("largest uplift in the span, m", P * c * L * L / (9 * std::sqrt(3.0) * EI), s.most("AB", "across").value);
}

TEST_CASE("overhang, uniform load") {
    const double c = 2.15;
    const Row row(Group::held_spans, "28 overhang c, w on everything");
    const Solved s = solve({{L, c}, {pinned, roller, none}, {uniform("AB", w), uniform("BC", w)}});
    row.check("reaction at the start, kN", w * (L * L - c * c) / (2 * L), s.reaction_y("A"));
    row.check("reaction beside the overhang, kN", w * (L + c) * (L + c) / (2 * L), s.reaction_y("B"));
    row.check("largest M, kN m", w * std::pow((L + c) * (L - c), 2) / (8 * L * L), s.most("AB", "M").value);
    row.check("its place, m", L / 2 * (1 - c * c / (L * L)), s.most("AB", "M").at);
    row.check("movement of the tip, m", -w * c * (3 * std::pow(c, 3) + 4 * c * c * L - std::pow(L, 3)) / (24 * EI),
              s.y("C"));
}
