// Simply supported beams and cantilevers, one row of the beam tables a test. Sources: register.cpp,
// Group::simple_spans. Deflections of the tables are downward, y of the results is upward; L = 7.3 m, E I = 21000 kN m2
// throughout.

#include <cmath>

#include <doctest/doctest.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 7.3;
const double EI = Stiffness{}.EI();

Solved simple_span(const std::vector<std::string>& loads) { return solve({{L}, {pinned, roller}, loads}); }
Solved cantilever(const std::vector<std::string>& loads) { return solve({{L}, {fixed, none}, loads}); }

/// Tip movements and root moment of a cantilever, each downward, clockwise and hogging positive.
void check_cantilever(const Row& row, const Solved& s, double root, double deflection, double slope) {
    row.check("M at the root, kN m", -root, s.M("AB", 0));
    row.check("reaction moment, kN m", root, s.reaction_moment("A"));
    row.check("movement of the tip, m", -deflection, s.y("B"));
    row.check("rotation of the tip, rad", -slope, s.rotation("B"));
}

} // namespace

TEST_CASE("simply supported beam, uniform load") {
    const double w = 12.4;
    const Row row(Group::simple_spans, "1 simple span, uniform load w");
    const Solved s = simple_span({uniform("AB", w)});
    row.check("reaction left, kN", w * L / 2, s.reaction_y("A"));
    row.check("V left, kN", w * L / 2, s.V("AB", 0));
    row.check("V right, kN", -w * L / 2, s.V("AB", L));
    row.check("largest M, kN m", w * L * L / 8, s.most("AB", "M").value);
    row.check("place of largest M, m", L / 2, s.most("AB", "M").at);
    row.check("largest deflection, m", -5 * w * std::pow(L, 4) / (384 * EI), s.least("AB", "across").value);
    row.check("rotation left, rad", -w * std::pow(L, 3) / (24 * EI), s.rotation("A"));
    row.check("rotation right, rad", w * std::pow(L, 3) / (24 * EI), s.rotation("B"));
}

TEST_CASE("simply supported beam, point load at midspan") {
    const double P = 37;
    const Row row(Group::simple_spans, "2 simple span, P at midspan");
    const Solved s = simple_span({point("AB", P, L / 2)});
    row.check("M at midspan, kN m", P * L / 4, s.most("AB", "M").value);
    row.check("deflection at midspan, m", -P * std::pow(L, 3) / (48 * EI), s.across("AB", L / 2));
    row.check("rotation left, rad", -P * L * L / (16 * EI), s.rotation("A"));
}

TEST_CASE("simply supported beam, point load anywhere") {
    const double P = 37, a = 2.1, b = L - a;
    const Row row(Group::simple_spans, "3 simple span, P at a from the left");
    const Solved s = simple_span({point("AB", P, a)});
    row.check("reaction left, kN", P * b / L, s.reaction_y("A"));
    row.check("V just before the load, kN", P * b / L, s.V("AB", a));
    row.check("V just after the load, kN", -P * a / L, s.V("AB", a, true));
    row.check("M under the load, kN m", P * a * b / L, s.most("AB", "M").value);
    row.check("place of largest M, m", a, s.most("AB", "M").at);
    row.check("deflection under the load, m", -P * a * a * b * b / (3 * EI * L), s.across("AB", a));
    row.check("rotation left, rad", -P * a * b * (L + b) / (6 * EI * L), s.rotation("A"));
    row.check("rotation right, rad", P * a * b * (L + a) / (6 * EI * L), s.rotation("B"));
    row.check("largest deflection, m", -P * a * std::pow(L * L - a * a, 1.5) / (9 * std::sqrt(3.0) * EI * L),
              s.least("AB", "across").value);
    row.check("its place from the right, m", std::sqrt((L * L - a * a) / 3), L - s.least("AB", "across").at);
    row.check("deflection at midspan, m", -P * a * (3 * L * L - 4 * a * a) / (48 * EI), s.across("AB", L / 2));
}

TEST_CASE("simply supported beam, two equal point loads") {
    const double P = 37, a = 2.3;
    const Row row(Group::simple_spans, "4 simple span, two P at a from each end");
    const Solved s = simple_span({point("AB", P, a), point("AB", P, L - a)});
    row.check("largest M, kN m", P * a, s.most("AB", "M").value);
    row.check("first place of the largest M, m", a, s.most("AB", "M").at);
    row.check("M at midspan, kN m", P * a, s.M("AB", L / 2));
    row.check("deflection at midspan, m", -P * a * (3 * L * L - 4 * a * a) / (24 * EI), s.across("AB", L / 2));
}

TEST_CASE("simply supported beam, uniform load over a part") {
    const double w = 12.4, a = 0.43 * L;
    const Row row(Group::simple_spans, "5 simple span, w over the left length a");
    const Solved s = simple_span({linear("AB", w, w, 0, a)});
    const double R1 = w * a * (2 * L - a) / (2 * L), R2 = w * a * a / (2 * L);
    row.check("reaction left, kN", R1, s.reaction_y("A"));
    row.check("reaction right, kN", R2, s.reaction_y("B"));
    row.check("largest M, kN m", R1 * R1 / (2 * w), s.most("AB", "M").value);
    row.check("its place, m", R1 / w, s.most("AB", "M").at);
    const double x = L / 5;
    row.check("deflection inside the load, m",
              -w * x * (a * a * std::pow(2 * L - a, 2) - 2 * a * x * x * (2 * L - a) + L * x * x * x) / (24 * EI * L),
              s.across("AB", x));
    const double z = 3 * L / 4;
    row.check("deflection outside the load, m", -w * a * a * (L - z) * (4 * z * L - 2 * z * z - a * a) / (24 * EI * L),
              s.across("AB", z));
}

TEST_CASE("simply supported beam, triangular load") {
    const double w = 12.4, W = w * L / 2;
    const Row row(Group::simple_spans, "6 simple span, load from 0 to w");
    const Solved s = simple_span({linear("AB", 0, w)});
    row.check("reaction left, kN", W / 3, s.reaction_y("A"));
    row.check("reaction right, kN", 2 * W / 3, s.reaction_y("B"));
    row.check("largest M, kN m", 2 * W * L / (9 * std::sqrt(3.0)), s.most("AB", "M").value);
    row.check("its place, m", L / std::sqrt(3.0), s.most("AB", "M").at);
    const double x = 0.35 * L;
    row.check("deflection at 0.35 L, m",
              -W * x * (3 * std::pow(x, 4) - 10 * L * L * x * x + 7 * std::pow(L, 4)) / (180 * EI * L * L),
              s.across("AB", x));
    const double x_max = L * std::sqrt(1 - std::sqrt(8.0 / 15));
    row.check("place of largest deflection, m", x_max, s.least("AB", "across").at);
    const double coefficient = W * std::pow(L, 3) / EI;
    row.check("largest deflection / (W L^3 / E I)", 0.013044368, -s.least("AB", "across").value / coefficient,
              printed(1e-9));
    row.check("deflection at midspan, m", -5 * w * std::pow(L, 4) / (768 * EI), s.across("AB", L / 2));
    row.check("rotation left, rad", -7 * w * std::pow(L, 3) / (360 * EI), s.rotation("A"));
    row.check("rotation right, rad", 8 * w * std::pow(L, 3) / (360 * EI), s.rotation("B"));
}

TEST_CASE("simply supported beam, symmetric triangular load") {
    const double w = 12.4, W = w * L / 2;
    const Row row(Group::simple_spans, "7 simple span, load 0 to w at midspan to 0");
    const Solved s = simple_span({linear("AB", 0, w, 0, L / 2), linear("AB", w, 0, L / 2, L)});
    row.check("largest M, kN m", W * L / 6, s.most("AB", "M").value);
    row.check("deflection at midspan, m", -W * std::pow(L, 3) / (60 * EI), s.across("AB", L / 2));
    row.check("rotation left, rad", -5 * w * std::pow(L, 3) / (192 * EI), s.rotation("A"));
}

TEST_CASE("simply supported beam, couple at one end") {
    const double M0 = 41;
    const Row row(Group::simple_spans, "8 simple span, couple M0 at the left end");
    const Solved s = simple_span({couple("A", M0)});
    row.check("reaction left, kN", M0 / L, s.reaction_y("A"));
    row.check("reaction right, kN", -M0 / L, s.reaction_y("B"));
    row.check("M at the loaded end, kN m", -M0, s.M("AB", 0));
    row.check("rotation near, rad", M0 * L / (3 * EI), s.rotation("A"));
    row.check("rotation far, rad", -M0 * L / (6 * EI), s.rotation("B"));
    row.check("largest movement, m", M0 * L * L / (9 * std::sqrt(3.0) * EI), s.most("AB", "across").value);
    row.check("its place, m", L * (1 - 1 / std::sqrt(3.0)), s.most("AB", "across").at);
    row.check("movement at midspan, m", M0 * L * L / (16 * EI), s.across("AB", L / 2));
}

TEST_CASE("cantilever, point load at the tip") {
    const double P = 37;
    const Row row(Group::simple_spans, "9 cantilever, P at the tip");
    check_cantilever(row, cantilever({force("B", P)}), P * L, P * std::pow(L, 3) / (3 * EI), P * L * L / (2 * EI));
}

TEST_CASE("cantilever, point load anywhere") {
    const double P = 37, a = 4.7;
    const Row row(Group::simple_spans, "10 cantilever, P at a from the root");
    check_cantilever(row, cantilever({point("AB", P, a)}), P * a, P * a * a * (3 * L - a) / (6 * EI),
                     P * a * a / (2 * EI));
}

TEST_CASE("cantilever, uniform load") {
    const double w = 12.4;
    const Row row(Group::simple_spans, "11 cantilever, uniform load w");
    check_cantilever(row, cantilever({uniform("AB", w)}), w * L * L / 2, w * std::pow(L, 4) / (8 * EI),
                     w * std::pow(L, 3) / (6 * EI));
}

TEST_CASE("cantilever, triangular load largest at the root") {
    const double w = 12.4;
    const Row row(Group::simple_spans, "12 cantilever, load from w at the root to 0");
    check_cantilever(row, cantilever({linear("AB", w, 0)}), w * L * L / 6, w * std::pow(L, 4) / (30 * EI),
                     w * std::pow(L, 3) / (24 * EI));
}

TEST_CASE("cantilever, triangular load largest at the tip") {
    const double w = 12.4;
    const Row row(Group::simple_spans, "13 cantilever, load from 0 to w at the tip");
    check_cantilever(row, cantilever({linear("AB", 0, w)}), w * L * L / 3, 11 * w * std::pow(L, 4) / (120 * EI),
                     w * std::pow(L, 3) / (8 * EI));
}

TEST_CASE("cantilever, couple at the tip") {
    const double M0 = 41; // clockwise: the tip goes down
    const Row row(Group::simple_spans, "14 cantilever, couple M0 at the tip");
    check_cantilever(row, cantilever({couple("B", -M0)}), M0, M0 * L * L / (2 * EI), M0 * L / EI);
}

TEST_CASE("cantilever, uniform load over a part") {
    const double w = 12.4, a = 4.7;
    const Row row(Group::simple_spans, "15 cantilever, w over the length a from the root");
    check_cantilever(row, cantilever({linear("AB", w, w, 0, a)}), w * a * a / 2,
                     w * std::pow(a, 3) * (4 * L - a) / (24 * EI), w * std::pow(a, 3) / (6 * EI));
}
