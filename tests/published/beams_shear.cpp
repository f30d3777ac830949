// Shear-flexible (Timoshenko) beams. Sources: register.cpp, Group::shear_flexible. The instance is a concrete beam of
// 0.3 m x 0.6 m, E = 30e6 kN/m2, Poisson's ratio 0.2, kappa = 5/6, L = 2.4 m: E I = 162000 kN m2, Phi = 0.18.

#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 2.4;
constexpr double w = 85;
constexpr double P = 120;
constexpr double EI = 162000;
constexpr double shear = 1.875e6; // kappa G A, kN
constexpr double Phi = 12 * EI / (shear * L * L);

const Stiffness concrete{.E = 30e6, .I = 0.0054, .A = 0.18, .G = 12.5e6, .shear_area = 0.15, .depth = 0.6};

Solved span(const std::string& left, const std::string& right, const std::vector<std::string>& loads) {
    return solve({{L}, {left, right}, loads, concrete});
}

} // namespace

TEST_CASE("shear-flexible simple span by its shape") {
    // The rectangle with `shear = true` must give the same as the properties: kappa = 5/6 and G from Poisson's ratio.
    const std::string model = fmt::format(R"(
[units]
length = "m"
force = "kN"
[materials.concrete]
E = "30 GPa"
poisson = 0.2
[sections.rib]
shape = "rectangle"
width = "300 mm"
depth = "600 mm"
shear = true
[nodes]
A = [0, 0]
B = [2.4, 0]
[members.AB]
from = "A"
to = "B"
section = "rib"
material = "concrete"
[supports]
A = "pinned"
B = "roller"
)");
    const Row row(Group::shear_flexible, "rectangle with its shear area, simple span");
    const Solved u(model + load_case({uniform("AB", w)}));
    row.check("w = 85 kN/m: deflection, mm", 0.259306667, -1000 * u.least("AB", "across").value, printed(1e-9));
    const Solved p(model + load_case({point("AB", P, L / 2)}));
    row.check("P = 120 kN at midspan: deflection, mm", 0.251733333, -1000 * p.across("AB", L / 2), printed(1e-9));
}

TEST_CASE("shear-flexible simple span") {
    const Row row(Group::shear_flexible, "simple span");
    const Solved u = span(pinned, roller, {uniform("AB", w)});
    row.check("uniform load: deflection, m", -5 * w * std::pow(L, 4) / (384 * EI) - w * L * L / (8 * shear),
              u.least("AB", "across").value);
    row.check("uniform load: M, kN m", w * L * L / 8, u.most("AB", "M").value);
    const Solved p = span(pinned, roller, {point("AB", P, L / 2)});
    row.check("P at midspan: deflection, m", -P * std::pow(L, 3) / (48 * EI) - P * L / (4 * shear),
              p.across("AB", L / 2));
}

TEST_CASE("shear-flexible cantilever") {
    const Row row(Group::shear_flexible, "cantilever");
    const Solved p = span(fixed, none, {force("B", P)});
    row.check("P at the tip: deflection, m", -P * std::pow(L, 3) / (3 * EI) - P * L / shear, p.y("B"));
    row.check("P at the tip: rotation, rad", -P * L * L / (2 * EI), p.rotation("B"));
    const Solved u = span(fixed, none, {uniform("AB", w)});
    row.check("uniform load: deflection, m", -w * std::pow(L, 4) / (8 * EI) - w * L * L / (2 * shear), u.y("B"));
}

TEST_CASE("shear-flexible fixed beam, symmetric loads") {
    const Row row(Group::shear_flexible, "fixed ends");
    const Solved u = span(fixed, fixed, {uniform("AB", w)});
    row.check("uniform load: M at the ends, kN m", -w * L * L / 12, u.M("AB", 0));
    row.check("uniform load: deflection, m", -w * std::pow(L, 4) / (384 * EI) - w * L * L / (8 * shear),
              u.across("AB", L / 2));
    const Solved p = span(fixed, fixed, {point("AB", P, L / 2)});
    row.check("P at midspan: M at the ends, kN m", -P * L / 8, p.M("AB", L));
    row.check("P at midspan: deflection, m", -P * std::pow(L, 3) / (192 * EI) - P * L / (4 * shear),
              p.across("AB", L / 2));
}

TEST_CASE("shear-flexible propped cantilever") {
    const Row row(Group::shear_flexible, "propped");
    const Solved u = span(fixed, roller, {uniform("AB", w)});
    row.check("uniform load: M at the fixed end, kN m", -(w * L * L / 8) / (1 + Phi / 4), u.M("AB", 0));
    row.check("w = 85 kN/m: M at the fixed end, kN m", -58.5645933, u.M("AB", 0), printed(1e-7));
    const Solved p = span(fixed, roller, {point("AB", P, L / 2)});
    row.check("P at midspan: M at the fixed end, kN m", -(3 * P * L / 16) / (1 + Phi / 4), p.M("AB", 0));
}

TEST_CASE("shear-flexible fixed beam, point load anywhere") {
    const double a = 0.8, b = L - a;
    const Row row(Group::shear_flexible, "fixed ends, P at 0.8 m");
    const Solved s = span(fixed, fixed, {point("AB", P, a)});
    const double common = P * a * b / (L * L * (1 + Phi));
    row.check("M left, kN m", -common * (b + Phi * L / 2), s.M("AB", 0));
    row.check("M right, kN m", -common * (a + Phi * L / 2), s.M("AB", L));
    row.check("M left (printed), kN m", -41.0395480, s.M("AB", 0), printed(1e-7));
    row.check("M right (printed), kN m", -22.9604520, s.M("AB", L), printed(1e-7));
}

TEST_CASE("shear-flexible beams, imposed movements") {
    const double D = 0.0031, theta = 0.0017;
    const Row row(Group::shear_flexible, "imposed movements");
    const Solved s = span(fixed, fixed, {settle("B", D)});
    row.check("fixed ends, right settles: M left, kN m", -6 * EI * D / (L * L * (1 + Phi)), s.M("AB", 0));
    const Solved r = span(fixed, fixed, {turn("A", theta)});
    row.check("fixed ends, left rotates: moment near, kN m", (4 + Phi) * EI * theta / ((1 + Phi) * L),
              r.reaction_moment("A"));
    row.check("fixed ends, left rotates: moment far, kN m", (2 - Phi) * EI * theta / ((1 + Phi) * L),
              r.reaction_moment("B"));
    const Solved p = span(fixed, roller, {turn("A", theta)});
    row.check("propped, fixed end rotates: moment, kN m", 3 * EI * theta / (L * (1 + Phi / 4)), p.reaction_moment("A"));
}

TEST_CASE("shear-flexible beam of two spans") {
    const Row row(Group::shear_flexible, "two equal spans, uniform load");
    const Solved s = solve({{L, L}, {pinned, roller, roller}, {uniform("AB", w), uniform("BC", w)}, concrete});
    row.check("M over the support, kN m", -(w * L * L / 8) / (1 + Phi / 4), s.M("BC", 0));
}
