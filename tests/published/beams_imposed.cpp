// Imposed movements, temperature and elastic ends, one row of the tables a test. Sources: register.cpp, Group::imposed.
// Gradients: bottom warmer than top by dT, free curvature kappa = expansion dT / depth, hot side convex (sagging).

#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 7.3;
constexpr double w = 12.4;
const Stiffness bar{};
const double EI = bar.EI();
const double EA = bar.EA();

// Faces that differ by dT, with a mean that is not zero.
constexpr double top = 4.5, bottom = 26.5, dT = bottom - top;
const double kappa = bar.expansion * dT / bar.depth;

Solved one_span(const std::string& left, const std::string& right, const std::vector<std::string>& loads) {
    return solve({{L}, {left, right}, loads});
}

} // namespace

TEST_CASE("fixed beam, one end settles") {
    const double D = 0.0123;
    const Row row(Group::imposed, "29 fixed ends, right end settles",
                  "I. A. Karnovsky, O. Lebed, Advanced Methods of Structural Analysis, 2010, p. 158");
    const Solved s = one_span(fixed, fixed, {settle("B", D)});
    row.check("M at the left end, kN m", -6 * EI * D / (L * L), s.M("AB", 0));
    row.check("M at the right end, kN m", 6 * EI * D / (L * L), s.M("AB", L));
    row.check("V, kN", 12 * EI * D / std::pow(L, 3), s.V("AB", L / 2));
    row.check("movement of the node, m", -D, s.y("B"));
}

TEST_CASE("propped cantilever, prop settles") {
    const double D = 0.0123;
    const Row row(Group::imposed, "30 propped, prop settles");
    const Solved s = one_span(fixed, roller, {settle("B", D)});
    row.check("M at the fixed end, kN m", -3 * EI * D / (L * L), s.M("AB", 0));
    row.check("reaction of the prop, kN", -3 * EI * D / std::pow(L, 3), s.reaction_y("B"));
}

TEST_CASE("fixed beam, one end rotates") {
    const double theta = 0.0041;
    const Row row(Group::imposed, "31 fixed ends, left end rotates");
    const Solved s = one_span(fixed, fixed, {turn("A", theta)});
    row.check("reaction moment near, kN m", 4 * EI * theta / L, s.reaction_moment("A"));
    row.check("reaction moment far, kN m", 2 * EI * theta / L, s.reaction_moment("B"));
    row.check("V, kN", 6 * EI * theta / (L * L), s.V("AB", 0));
    row.check("M near, kN m", -4 * EI * theta / L, s.M("AB", 0));
}

TEST_CASE("propped cantilever, fixed end rotates") {
    const double theta = 0.0041;
    const Row row(Group::imposed, "32 propped, fixed end rotates");
    const Solved s = one_span(fixed, roller, {turn("A", theta)});
    row.check("reaction moment, kN m", 3 * EI * theta / L, s.reaction_moment("A"));
}

TEST_CASE("fixed beam, temperature gradient") {
    const Row row(Group::imposed, "33 fixed ends, gradient", "I. A. Karnovsky, O. Lebed, 2010, p. 559");
    const Solved s = one_span(fixed, fixed, {warm("AB", top, bottom)});
    row.check("M left, kN m", -EI * kappa, s.M("AB", 0));
    row.check("M right, kN m", -EI * kappa, s.M("AB", L));
    row.check("N from the mean, kN", -EA * bar.expansion * (top + bottom) / 2, s.N("AB", L / 2));
    row.check_zero("V, kN", s.V("AB", 0), EI * kappa / L);
    row.check_zero("deflection at midspan, m", s.across("AB", L / 2), kappa * L * L / 8);
}

TEST_CASE("propped cantilever, temperature gradient") {
    const Row row(Group::imposed, "34 propped, gradient",
                  "J. M. Gere, Mechanics of Materials, 7th ed., Problem 10.5-2");
    const Solved s = one_span(fixed, roller, {warm("AB", top, bottom)});
    row.check("M at the fixed end, kN m", -1.5 * EI * kappa, s.M("AB", 0));
    row.check("reaction of the prop, kN", -1.5 * EI * kappa / L, s.reaction_y("B"));
}

TEST_CASE("statically determinate beams, temperature gradient") {
    const Row row(Group::imposed, "35 determinate, gradient");
    const Solved s = one_span(pinned, roller, {warm("AB", top, bottom)});
    row.check("simple span: deflection, m", -kappa * L * L / 8, s.least("AB", "across").value);
    row.check("simple span: rotation left, rad", -kappa * L / 2, s.rotation("A"));
    row.check_zero("simple span: M at midspan, kN m", s.M("AB", L / 2), EI * kappa);
    const Solved c = one_span(fixed, none, {warm("AB", top, bottom)});
    row.check("cantilever: movement of the tip, m", kappa * L * L / 2, c.y("B"));
    row.check("cantilever: rotation of the tip, rad", kappa * L, c.rotation("B"));
}

TEST_CASE("axially restrained bar, uniform temperature") {
    const double T = 31, k = 52000;
    const Row row(Group::imposed, "36 restrained bar, uniform change");
    const Solved rigid = one_span(fixed, fixed, {warm("AB", T)});
    row.check("rigid ends: N, kN", -EA * bar.expansion * T, rigid.N("AB", L / 2));
    const Solved s = one_span(fixed, fmt::format("{{ x = {} }}", k), {warm("AB", T)});
    const double N = EA * bar.expansion * T / (1 + EA / (k * L));
    row.check("end on a spring: N, kN", -N, s.N("AB", L / 2));
    row.check("end on a spring: movement, m", N / k, s.x("B"));
    row.check("end on a spring: reaction, kN", -N, s.reaction_x("B"));
}

TEST_CASE("propped cantilever on a spring, temperature gradient") {
    const double k = 310;
    const Row row(Group::imposed, "37 propped on a spring, gradient",
                  "J. M. Gere, Mechanics of Materials, 7th ed., Problem 10.5-3");
    const Solved s = one_span(fixed, spring_y(k), {warm("AB", top, bottom)});
    row.check("reaction of the spring, kN", -(kappa * L * L / 2) * 3 * EI * k / (3 * EI + k * std::pow(L, 3)),
              s.reaction_y("B"));
}

TEST_CASE("propped cantilever on a spring, loads") {
    const double k = 310, P = 37;
    const double give = 1 + 3 * EI / (k * std::pow(L, 3));
    const Row row(Group::imposed, "38 propped on a spring");
    const Solved u = one_span(fixed, spring_y(k), {uniform("AB", w)});
    row.check("uniform load: reaction of the spring, kN", 3 * w * L / 8 / give, u.reaction_y("B"));
    row.check("uniform load: movement, m", -3 * w * L / 8 / give / k, u.y("B"));
    const Solved p = one_span(fixed, spring_y(k), {point("AB", P, L / 2)});
    row.check("P at midspan: reaction of the spring, kN", 5 * P / 16 / give, p.reaction_y("B"));
}

TEST_CASE("beam with rotational springs, uniform load") {
    const double k = 5700;
    const Row row(Group::imposed, "39 equal rotational springs at both ends, uniform load");
    const Solved s = one_span(fmt::format("{{ x = \"fixed\", y = \"fixed\", rotation = {} }}", k),
                              fmt::format("{{ y = \"fixed\", rotation = {} }}", k), {uniform("AB", w)});
    const double M = w * L * L / 12 / (1 + 2 * EI / (k * L));
    row.check("M left, kN m", -M, s.M("AB", 0));
    row.check("M right, kN m", -M, s.M("AB", L));
    row.check("rotation left, rad", -M / k, s.rotation("A"));
    row.check("reaction moment left, kN m", M, s.reaction_moment("A"));
}

TEST_CASE("two spans on a central spring, uniform load") {
    const double k = 910;
    const Row row(Group::imposed, "40 two equal spans, centre on a spring, uniform load");
    const Solved s = solve({{L, L}, {pinned, spring_y(k), roller}, {uniform("AB", w), uniform("BC", w)}});
    row.check("reaction of the spring, kN", 5 * w * L / 4 / (1 + 6 * EI / (k * std::pow(L, 3))), s.reaction_y("B"));
}

TEST_CASE("two spans, the centre settles") {
    const double D = 0.0123;
    const Row row(Group::imposed, "41 two equal spans, centre settles");
    const Solved s = solve({{L, L}, {pinned, roller, roller}, {settle("B", D)}});
    row.check("M over the centre, kN m", 3 * EI * D / (L * L), s.M("AB", L));
    row.check("reaction of the centre, kN", -6 * EI * D / std::pow(L, 3), s.reaction_y("B"));
}

TEST_CASE("continuous beams, temperature gradient") {
    const Row row(Group::imposed, "42 equal spans, gradient");
    const Solved two = solve({{L, L}, {pinned, roller, roller}, {warm("AB", top, bottom), warm("BC", top, bottom)}});
    row.check("two spans: M over the support, kN m", -1.5 * EI * kappa, two.M("AB", L));
    const Solved three = solve({{L, L, L},
                                {pinned, roller, roller, roller},
                                {warm("AB", top, bottom), warm("BC", top, bottom), warm("CD", top, bottom)}});
    row.check("three spans: M over the first support, kN m", -1.2 * EI * kappa, three.M("AB", L));
    row.check("three spans: M over the second support, kN m", -1.2 * EI * kappa, three.M("CD", 0));
}
