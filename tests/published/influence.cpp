// Influence coefficients by unit loads, and axles at the positions that govern. Sources: register.cpp,
// Group::influence.

#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 6.7;

/// Two equal spans; loads at fractions of the first one, downward.
Solved two_spans(const std::vector<std::string>& loads) { return solve({{L, L}, {pinned, roller, roller}, loads}); }

double influence_MB(double xi) { return -xi * (1 - xi * xi) / 4; } // times L

} // namespace

TEST_CASE("two equal spans, influence lines") {
    for (const double xi : {0.11, 0.27, 0.43232044, 0.61, 0.83}) {
        const Row row(Group::influence, fmt::format("two equal spans, unit load at {} L", xi));
        const Solved s = two_spans({point("AB", 1, xi * L)});
        const double M = influence_MB(xi);
        row.check("M over B / L", M, s.M("AB", L) / L);
        row.check("reaction at A", 1 - xi + M, s.reaction_y("A"));
        row.check("reaction at B", xi * (3 - xi * xi) / 2, s.reaction_y("B"));
        row.check("reaction at C", M, s.reaction_y("C"));
    }
}

TEST_CASE("two equal spans, largest influence values") {
    const Row row(Group::influence, "two equal spans, largest values");
    const Solved worst = two_spans({point("AB", 1, L / std::sqrt(3.0))});
    row.check("M over B / L, load at 0.577350 L", -0.09622504, worst.M("AB", L) / L, printed(1e-8));
    const Solved span = two_spans({point("AB", 1, 0.43232044 * L)});
    row.check("M under a load at 0.43232044 L, / L", 0.20742723, span.most("AB", "M").value / L, printed(1e-8));
    for (const double xi : {0.42, 0.445}) {
        const Solved beside = two_spans({point("AB", 1, xi * L)});
        CHECK(beside.most("AB", "M").value / L < 0.20742723);
    }
    const Solved area = two_spans({uniform("AB", 1)});
    row.check("area of M over B, one span / L^2", -1.0 / 16, area.M("AB", L) / (L * L));
}

TEST_CASE("two equal spans, sixth points") {
    // The table cuts moments after the fourth decimal (0.07407 is 0.0740 there): one unit. Its shears are sums of such
    // a moment and the rounded shear of the simple span (0.6667 - 0.0740 = 0.5927): one unit and a half.
    const Row row(Group::influence, "two equal spans, sixth points",
                  "I. A. Karnovsky, O. Lebed, Advanced Methods of Structural Analysis, 2010, Table A.13; M to one "
                  "unit, V to one and a half units of the last place");
    const double moments[] = {-0.0405, -0.0740, -0.0938, -0.0926, -0.0636};
    const double reactions[] = {0.7928, 0.5927, 0.4062, 0.2407, 0.1031};
    for (int i = 0; i < 5; ++i) {
        const Solved s = two_spans({point("AB", 1, (i + 1) * L / 6)});
        row.check(fmt::format("M over B / L, load at {}/6 L", i + 1), moments[i], s.M("AB", L) / L, printed(2e-4));
        row.check(fmt::format("shear at A, load at {}/6 L", i + 1), reactions[i], s.V("AB", 0), printed(3e-4));
    }
    const Solved section_8 = two_spans({point("BC", 1, 2 * L / 6)});
    row.check("reaction at A, load at section 8", -0.0926, section_8.reaction_y("A"), printed(1e-4));
    row.check("reaction at C, load at section 8", 0.2407, section_8.reaction_y("C"), printed(1e-4));
    row.check("reaction at B, load at section 8", 0.8519, section_8.reaction_y("B"), printed(1e-4));
}

TEST_CASE("influence lines as deflected shapes") {
    const Row row(Group::influence, "two equal spans, unit movement instead of the demand",
                  "H. Müller-Breslau, Die graphische Statik der Baukonstruktionen, 1887, from memory");
    const Solved a = two_spans({settle("A", -1)});
    const Solved b = two_spans({settle("B", -1)});
    for (const double xi : {0.2, 0.45, 0.7}) {
        row.check(fmt::format("reaction at A, load at {} L", xi), 1 - xi + influence_MB(xi), a.across("AB", xi * L));
        row.check(fmt::format("reaction at B, load at {} L", xi), xi * (3 - xi * xi) / 2, b.across("AB", xi * L));
    }
    row.check("reaction at A, load at midspan of BC", influence_MB(0.5), a.across("BC", L / 2));
}

TEST_CASE("two equal axles on a simple span") {
    const double P = 80, a = 3, span = 12;
    const Row row(Group::influence, "two axles of 80 kN, 3 m apart, span 12 m");
    const double x = span / 2 - a / 4;
    const Solved s = solve({{span}, {pinned, roller}, {point("AB", P, x), point("AB", P, x + a)}});
    row.check("largest M, kN m", 367.5, s.most("AB", "M").value);
    row.check("its place, m", 5.25, s.most("AB", "M").at);
    row.check("largest M by formula, kN m", P / (2 * span) * std::pow(span - a / 2, 2), s.most("AB", "M").value);
    const Solved v = solve({{span}, {pinned, roller}, {point("AB", P, 0), point("AB", P, a)}});
    row.check("reaction with one axle on the support, kN", P * (2 - a / span), v.reaction_y("A"));
    for (const double beside : {x - 0.1, x + 0.1}) {
        const Solved other = solve({{span}, {pinned, roller}, {point("AB", P, beside), point("AB", P, beside + a)}});
        CHECK(other.most("AB", "M").value < 367.5);
    }
}

TEST_CASE("two unequal axles on a simple span") {
    const double P1 = 120, P2 = 60, a = 3, span = 12;
    const Row row(Group::influence, "axles of 120 and 60 kN, 3 m apart, span 12 m");
    const double x = span / 2 - P2 * a / (P1 + P2) / 2; // the heavy axle and the resultant stand evenly about midspan
    const Solved s = solve({{span}, {pinned, roller}, {point("AB", P1, x), point("AB", P2, x + a)}});
    row.check("largest M, kN m", 453.75, s.most("AB", "M").value);
    row.check("its place, m", x, s.most("AB", "M").at);
    const Solved v = solve({{span}, {pinned, roller}, {point("AB", P1, 0), point("AB", P2, a)}});
    row.check("reaction with the heavy axle on the support, kN", 165, v.reaction_y("A"));
}

TEST_CASE("HS20-44 truck at its governing position") {
    // 8 + 32 + 32 kip, 14 ft apart; resultant 72 kip, 14/3 ft behind the middle axle. The middle axle and the resultant
    // stand evenly about midspan: M = 72 (L/2 - 7/3)^2 / L - 8 * 14.
    const double kip_ft = 4448.2216152605 * 0.3048;
    for (const double span : {40.0, 60.0, 100.0}) {
        const double x = span / 2 - 7.0 / 3;
        const Row row(Group::influence, fmt::format("HS20-44 truck, span {} ft", span),
                      "AASHTO, Standard Specifications for Highway Bridges, Appendix A, from memory");
        const test::Result r = test::run(fmt::format(R"(
[units]
length = "ft"
force = "kip"
[materials.steel]
E = "29000 ksi"
[sections.girder]
A = "60 in2"
I = "12000 in4"
[nodes]
A = [0, 0]
B = [{0}, 0]
[members.AB]
from = "A"
to = "B"
section = "girder"
material = "steel"
[supports]
A = "pinned"
B = "roller"
[cases.truck]
loads = [
  {{ member = "AB", y = -8, at = {1} }},
  {{ member = "AB", y = -32, at = {2} }},
  {{ member = "AB", y = "-32 kip", at = "{3} ft" }},
]
)",
                                                     span, x - 14, x, x + 14));
        const double M = r("/cases/truck/members/AB/extremes/M/max/value") / kip_ft;
        row.check("largest M, kip ft", 72 * std::pow(span / 2 - 7.0 / 3, 2) / span - 8 * 14, M);
        row.check("its place, ft", x, r("/cases/truck/members/AB/extremes/M/max/at") / 0.3048);
        if (span == 40) row.check("largest M (table), kip ft", 449.8, M, printed(0.1));
        if (span == 60) row.check("largest M (table), kip ft", 806.5, M, printed(0.1));
    }
}
