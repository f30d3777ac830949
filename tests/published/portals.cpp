// Portal frames after Kleinlogel. Sources: register.cpp, Group::portals. Bases A and D, eaves B and C; the left column
// is drawn upward, the beam to the right, the right column downward, so that M is positive with tension inside
// everywhere.

#include <array>
#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double stiff = axial_stiffness_ratio;

struct Portal {
    double L = 9.1;
    double h = 4.7;
    double Ib = 3.3e-4;
    double Ic = 1.9e-4;
    double E = 2.1e8;

    double k() const { return Ib / Ic * h / L; }
    double N() const { return 2 * k() + 3; }  // pinned bases
    double N1() const { return k() + 2; }     // fixed bases, symmetric
    double N2() const { return 6 * k() + 1; } // fixed bases, antisymmetric
};

constexpr double expansion = 1.2e-5;

std::string head(double E) {
    return fmt::format("[units]\nlength = \"m\"\nforce = \"kN\"\n[materials.m]\nE = {}\nexpansion = {}\n", E,
                       expansion);
}

Solved solve(const Portal& p, const std::string& bases, const std::vector<std::string>& loads) {
    return Solved(head(p.E) +
                  fmt::format(R"(
[sections]
column = {{ A = {}, I = {} }}
beam = {{ A = {}, I = {} }}
[nodes]
A = [0, 0]
B = [0, {h}]
C = [{L}, {h}]
D = [{L}, 0]
[members]
left = {{ from = "A", to = "B", section = "column", material = "m" }}
beam = {{ from = "B", to = "C", section = "beam", material = "m" }}
right = {{ from = "C", to = "D", section = "column", material = "m" }}
[supports]
A = {bases}
D = {bases}
)",
                              stiff * p.Ic / (p.h * p.h), p.Ic, stiff * p.Ib / (p.L * p.L), p.Ib, fmt::arg("h", p.h),
                              fmt::arg("L", p.L), fmt::arg("bases", bases)) +
                  load_case(loads));
}

/// Moments at A, B, C and D, tension inside positive; thrusts at the bases, inward positive.
struct Forces {
    std::array<double, 4> M{};
    double thrust_left = 0, thrust_right = 0;
};

Forces forces(const Solved& s, const Portal& p) {
    return {
        {s.M("left", 0), s.M("left", p.h), s.M("beam", p.L), s.M("right", p.h)}, s.reaction_x("A"), -s.reaction_x("D")};
}

/// A symmetric load: thrust H, moment at the eaves and at the bases (0: pinned, then it must vanish).
void check_symmetric(const Row& row, const Solved& s, const Portal& p, double H, double eaves, double base) {
    const Forces f = forces(s, p);
    row.check("thrust left, kN", H, f.thrust_left, axially_stiff);
    row.check("thrust right, kN", H, f.thrust_right, axially_stiff);
    row.check("M_B, kN m", eaves, f.M[1], axially_stiff);
    row.check("M_C, kN m", eaves, f.M[2], axially_stiff);
    if (base == 0) {
        row.check_zero("M_A, kN m", f.M[0], eaves);
    } else {
        row.check("M_A, kN m", base, f.M[0], axially_stiff);
        row.check("M_D, kN m", base, f.M[3], axially_stiff);
    }
}

std::string sideways(const std::string& node, double P) { return fmt::format("{{ node = \"{}\", x = {} }}", node, P); }

} // namespace

TEST_CASE("pinned portal, uniform load") {
    const Portal p;
    const double w = 12.4, H = w * p.L * p.L / (4 * p.h * p.N());
    check_symmetric(Row(Group::portals, "pinned, w on the beam"), solve(p, pinned, {uniform("beam", w)}), p, H,
                    -w * p.L * p.L / (4 * p.N()), 0);
}

TEST_CASE("fixed portal, uniform load") {
    const Portal p;
    const double w = 12.4, wL2 = w * p.L * p.L;
    check_symmetric(Row(Group::portals, "fixed, w on the beam"), solve(p, fixed, {uniform("beam", w)}), p,
                    wL2 / (4 * p.h * p.N1()), -wL2 / (6 * p.N1()), wL2 / (12 * p.N1()));
}

TEST_CASE("pinned portal, point load at midspan") {
    const Portal p;
    const double P = 37;
    check_symmetric(Row(Group::portals, "pinned, P at midspan of the beam"),
                    solve(p, pinned, {point("beam", P, p.L / 2)}), p, 3 * P * p.L / (8 * p.h * p.N()),
                    -3 * P * p.L / (8 * p.N()), 0);
}

TEST_CASE("fixed portal, point load at midspan") {
    const Portal p;
    const double P = 37;
    check_symmetric(Row(Group::portals, "fixed, P at midspan of the beam"),
                    solve(p, fixed, {point("beam", P, p.L / 2)}), p, 3 * P * p.L / (8 * p.h * p.N1()),
                    -P * p.L / (4 * p.N1()), P * p.L / (8 * p.N1()));
}

TEST_CASE("pinned portal, lateral load") {
    const Portal p;
    const double P = 17;
    const Row row(Group::portals, "pinned, P to the right at B");
    const Solved s = solve(p, pinned, {sideways("B", P)});
    const Forces f = forces(s, p);
    row.check("M_B, kN m", P * p.h / 2, f.M[1], axially_stiff);
    row.check("M_C, kN m", -P * p.h / 2, f.M[2], axially_stiff);
    row.check("vertical reaction at D, kN", P * p.h / p.L, s.reaction_y("D"), axially_stiff);
    row.check("vertical reaction at A, kN", -P * p.h / p.L, s.reaction_y("A"), axially_stiff);
    row.check("sway, m", P * std::pow(p.h, 3) / (12 * p.E * p.Ic) * (2 + 1 / p.k()), s.x("B"), axially_stiff);
}

TEST_CASE("fixed portal, lateral load") {
    const Portal p;
    const double P = 17, k = p.k(), half = P * p.h / 2;
    const Row row(Group::portals, "fixed, P to the right at B");
    const Solved s = solve(p, fixed, {sideways("B", P)});
    const Forces f = forces(s, p);
    row.check("M_A, kN m", -half * (3 * k + 1) / p.N2(), f.M[0], axially_stiff);
    row.check("M_B, kN m", half * 3 * k / p.N2(), f.M[1], axially_stiff);
    row.check("M_C, kN m", -half * 3 * k / p.N2(), f.M[2], axially_stiff);
    row.check("M_D, kN m", half * (3 * k + 1) / p.N2(), f.M[3], axially_stiff);
    row.check("vertical reaction at D, kN", 3 * P * p.h * k / (p.L * p.N2()), s.reaction_y("D"), axially_stiff);
    row.check("sway, m", P * std::pow(p.h, 3) / (12 * p.E * p.Ic) * (3 * k + 2) / p.N2(), s.x("B"), axially_stiff);
}

TEST_CASE("pinned portal, warm beam") {
    const Portal p;
    const double T = 31, H = 3 * p.E * p.Ib * expansion * T / (p.h * p.h * p.N());
    check_symmetric(Row(Group::portals, "pinned, beam warmer"), solve(p, pinned, {warm("beam", T)}), p, H, -H * p.h, 0);
}

TEST_CASE("fixed portal, warm beam") {
    const Portal p;
    const double T = 31, k = p.k(), common = 3 * p.E * p.Ib * expansion * T / (p.h * p.N1());
    check_symmetric(Row(Group::portals, "fixed, beam warmer"), solve(p, fixed, {warm("beam", T)}), p,
                    common * (2 * k + 1) / (p.h * k), -common, common * (k + 1) / k);
}

TEST_CASE("pinned portal, one base settles") {
    const Portal p;
    const double D = 0.013;
    const Row row(Group::portals, "pinned, base D settles");
    const Solved s = solve(p, pinned, {settle("D", D)});
    const double typical = 6 * p.E * p.Ib * D / (p.L * p.L);
    row.check_zero("M_B, kN m", s.M("left", p.h), typical);
    row.check_zero("M_C, kN m", s.M("beam", p.L), typical);
    row.check_zero("thrust, kN", s.reaction_x("A"), typical / p.h);
    row.check("rotation of the beam, rad", -D / p.L, s.rotation("B"), axially_stiff);
}

TEST_CASE("fixed portal, one base settles") {
    const Portal p;
    const double D = 0.013, M = 6 * p.E * p.Ib * D / (p.L * p.L * p.N2());
    const Row row(Group::portals, "fixed, base D settles");
    const Solved s = solve(p, fixed, {settle("D", D)});
    const Forces f = forces(s, p);
    row.check("M_A, kN m", -M, f.M[0], axially_stiff);
    row.check("M_B, kN m", -M, f.M[1], axially_stiff);
    row.check("M_C, kN m", M, f.M[2], axially_stiff);
    row.check("M_D, kN m", M, f.M[3], axially_stiff);
    row.check("vertical reaction at A, kN", 2 * M / p.L, s.reaction_y("A"), axially_stiff);
    row.check("vertical reaction at D, kN", -2 * M / p.L, s.reaction_y("D"), axially_stiff);
}

TEST_CASE("portal on rotational springs, lateral load") {
    // Slope-deflection of half the frame: [4K+k, 2K, 6K/h; 2K, 4K+6EIb/L, 6K/h; 6K/h, 6K/h, 12K/h2] x = [0, 0, P/2].
    const Portal p;
    const double P = 17, spring = 6100, K = p.E * p.Ic / p.h, shift = 6 * K / p.h;
    const double a = 4 * K + spring, b = 2 * K, c = 4 * K + 6 * p.E * p.Ib / p.L, d = 12 * K / (p.h * p.h);
    // From the first two rows the rotations are -shift (c - b)/(a c - b2) and -shift (a - b)/(a c - b2) times the sway.
    const double determinant = a * c - b * b;
    const double base = -shift * (c - b) / determinant, eaves = -shift * (a - b) / determinant;
    const double sway = P / 2 / (d + shift * (base + eaves));
    const Row row(Group::portals, "equal rotational base springs, P to the right at B", "slope-deflection equations");
    const std::string bases = fmt::format("{{ x = \"fixed\", y = \"fixed\", rotation = {} }}", spring);
    const Solved s = solve(p, bases, {sideways("B", P)});
    row.check("sway, m", sway, s.x("B"), axially_stiff);
    row.check("rotation of the base, rad", base * sway, s.rotation("A"), axially_stiff);
    row.check("rotation of the eaves, rad", eaves * sway, s.rotation("B"), axially_stiff);
    row.check("base moment, kN m", -spring * base * sway, s.reaction_moment("A"), axially_stiff);
}

TEST_CASE("portals, printed instance") {
    const Portal p{20, 6, 3.3, 2, 1e5};
    const double w = 7, P = 13;
    const Row row(Group::portals, "L = 20, h = 6, I_b = 3.3, I_c = 2, w = 7, P = 13");
    const Forces pu = forces(solve(p, pinned, {uniform("beam", w)}), p);
    row.check("pinned, w: thrust", 29.2397661, pu.thrust_left, axially_stiff);
    row.check("pinned, w: M_B", -175.438596, pu.M[1], axially_stiff);
    const Forces fu = forces(solve(p, fixed, {uniform("beam", w)}), p);
    row.check("fixed, w: thrust", 46.760187, fu.thrust_left, axially_stiff);
    row.check("fixed, w: M_B", -187.040748, fu.M[1], axially_stiff);
    row.check("fixed, w: M_A", 93.520374, fu.M[0], axially_stiff);
    const Solved lateral = solve(p, fixed, {sideways("B", P)});
    row.check("fixed, P: M_A", -24.411839, lateral.M("left", 0), axially_stiff);
    row.check("fixed, P: M_B", 14.588161, lateral.M("left", p.h), axially_stiff);
    row.check("fixed, P: sway E", 102.706549, lateral.x("B") * p.E, axially_stiff);
    row.check("pinned, P: sway E", 470.363636, solve(p, pinned, {sideways("B", P)}).x("B") * p.E, axially_stiff);
}

namespace {

/// Pinned bases A and E, eaves B and D, ridge C; the right half is drawn downward.
struct Pitched {
    double L = 24, h = 5, f = 3, I2 = 2.2, I1 = 3.1, E = 1e5; // I2: rafters
    double s = std::hypot(L / 2, f);
    double k = I2 / I1 * h / s, phi = f / h, m = 1 + phi, B = 2 * (k + 1) + m, C = 1 + 2 * m, N = B + m * C;
};

Solved solve(const Pitched& p, const std::vector<std::string>& loads) {
    return Solved(head(p.E) +
                  fmt::format(R"(
[sections]
column = {{ A = {}, I = {} }}
rafter = {{ A = {}, I = {} }}
[nodes]
A = [0, 0]
B = [0, {h}]
C = [{half}, {top}]
D = [{L}, {h}]
E = [{L}, 0]
[members]
left = {{ from = "A", to = "B", section = "column", material = "m" }}
up = {{ from = "B", to = "C", section = "rafter", material = "m" }}
down = {{ from = "C", to = "D", section = "rafter", material = "m" }}
right = {{ from = "D", to = "E", section = "column", material = "m" }}
[supports]
A = "pinned"
E = "pinned"
)",
                              stiff * p.I1 / (p.h * p.h), p.I1, stiff * p.I2 / (p.s * p.s), p.I2, fmt::arg("h", p.h),
                              fmt::arg("L", p.L), fmt::arg("half", p.L / 2), fmt::arg("top", p.h + p.f)) +
                  load_case(loads));
}

std::vector<std::string> snow(double w) {
    return {fmt::format("{{ members = [\"up\", \"down\"], y = {}, per = \"plan\" }}", -w)};
}

} // namespace

TEST_CASE("pitched portal, uniform load on plan") {
    const Pitched p{.L = 19.3, .h = 4.9, .f = 2.7, .I2 = 2.6e-4, .I1 = 3.7e-4, .E = 2.1e8};
    const double w = 6.2, H = w * p.L * p.L * (3 + 5 * p.m) / (16 * p.N * p.h);
    const Row row(Group::portals, "pitched, pinned, w on plan");
    const Solved s = solve(p, snow(w));
    row.check("thrust, kN", H, s.reaction_x("A"), axially_stiff);
    row.check("M_B, kN m", -H * p.h, s.M("left", p.h), axially_stiff);
    row.check("M_D, kN m", -H * p.h, s.M("right", 0), axially_stiff);
    row.check("M at the ridge, kN m", w * p.L * p.L / 8 - p.m * H * p.h, s.M("down", 0), axially_stiff);
}

TEST_CASE("pitched portal, lateral load") {
    const Pitched p{.L = 19.3, .h = 4.9, .f = 2.7, .I2 = 2.6e-4, .I1 = 3.7e-4, .E = 2.1e8};
    const double P = 17, M_D = -P * p.h * (p.B + p.C) / (2 * p.N);
    const Row row(Group::portals, "pitched, pinned, P to the right at the left eaves");
    const Solved s = solve(p, {sideways("B", P)});
    row.check("M_D, kN m", M_D, s.M("right", 0), axially_stiff);
    row.check("M_B, kN m", P * p.h + M_D, s.M("left", p.h), axially_stiff);
    row.check("M at the ridge, kN m", P * p.h / 2 + p.m * M_D, s.M("down", 0), axially_stiff);
}

TEST_CASE("pitched portal, printed instance") {
    const Pitched p;
    const Row row(Group::portals, "pitched, L = 24, h = 5, f = 3, I_2 = 2.2, I_1 = 3.1, w = 7");
    const Solved s = solve(p, snow(7));
    row.check("thrust", 50.891612, s.reaction_x("A"), axially_stiff);
    row.check("M_B", -254.458061, s.M("left", p.h), axially_stiff);
    row.check("M at the ridge", 96.867103, s.M("up", p.s), axially_stiff);
}
