// Axes and signs of docs/model.md, by hand calculation: the formula stands beside each check.

#include <cmath>
#include <numbers>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

const Stiffness bar{};
const double EI = bar.EI();
const double EA = bar.EA();

/// A model of one member "AB" between two points, with whatever else is wanted of it.
struct OneMember {
    double x = 0, y = 0; ///< of B; A is the origin
    std::string left, right;
    std::vector<std::string> loads;
    std::string more{}; ///< further keys of the member
    Stiffness stiffness = bar;
    bool reversed = false; ///< drawn from B to A
};

Solved solve(const OneMember& m) {
    std::string text = header(m.stiffness) +
                       fmt::format("[nodes]\nA = [0, 0]\nB = [{}, {}]\n[members.AB]\n", m.x, m.y) +
                       fmt::format("from = \"{}\"\nto = \"{}\"\n", m.reversed ? "B" : "A", m.reversed ? "A" : "B") +
                       "section = \"bar\"\nmaterial = \"m\"\n" + m.more + "[supports]\n";
    if (!m.left.empty()) text += "A = " + m.left + "\n";
    if (!m.right.empty()) text += "B = " + m.right + "\n";
    return Solved(text + load_case(m.loads));
}

double radians(double degrees) { return degrees * std::numbers::pi / 180; }

} // namespace

TEST_CASE("member drawn from right to left") {
    // Its across axis points down, its -across face is the top: a sagging beam has M < 0 and moves to +across.
    const double L = 7.3, w = 12.4, P = 37, a = 2.1; // P at a from the member's start, which is B
    const Row row(Group::conventions, "simple span drawn from right to left");
    OneMember beam{L, 0, pinned, roller, {uniform("AB", w)}};
    beam.reversed = true;
    const Solved s = solve(beam);
    row.check("w: M at midspan = -wL2/8, kN m", -w * L * L / 8, s.least("AB", "M").value);
    row.check("w: V at the start = -wL/2, kN", -w * L / 2, s.V("AB", 0));
    row.check("w: largest across = 5wL4/384EI, m", 5 * w * std::pow(L, 4) / (384 * EI), s.most("AB", "across").value);
    beam.loads = {point("AB", P, a)};
    const Solved p = solve(beam);
    row.check("P at a from the start: reaction at A = Pa/L, kN", P * a / L, p.reaction_y("A"));
    row.check("P at a from the start: M = -Pa(L-a)/L, kN m", -P * a * (L - a) / L, p.M("AB", a));
    beam.loads = {fmt::format("{{ member = \"AB\", across = {}, along = {} }}", 3.1, 1.7)};
    const Solved local = solve(beam);
    row.check("local loads: reaction at B = q_across L/2, kN", 3.1 * L / 2, local.reaction_y("B"));
    row.check("local loads: horizontal reaction at A = q_along L, kN", 1.7 * L, local.reaction_x("A"));
    row.check("local loads: N at the end = -q_along L, kN", -1.7 * L, local.N("AB", L));
}

TEST_CASE("vertical cantilever") {
    // Drawn upward: across points to the left. A push to the right stretches the left side, +across: M < 0.
    const double h = 4.7, H = 17, Q = 90, q = 3.3;
    const Row row(Group::conventions, "column, fixed at its foot, drawn upward");
    const Solved s = solve({0, h, fixed, none, {fmt::format("{{ node = \"B\", x = {}, y = {} }}", H, -Q)}});
    row.check("H to the right at the top: M at the foot = -Hh, kN m", -H * h, s.M("AB", 0));
    row.check("reaction moment = Hh, kN m", H * h, s.reaction_moment("A"));
    row.check("horizontal reaction = -H, kN", -H, s.reaction_x("A"));
    row.check("V = dM/ds = H, kN", H, s.V("AB", h / 2));
    row.check("N = -Q, kN", -Q, s.N("AB", 0));
    row.check("top moves to the right by Hh3/3EI, m", H * std::pow(h, 3) / (3 * EI), s.x("B"));
    row.check("across at the top = -Hh3/3EI, m", -H * std::pow(h, 3) / (3 * EI), s.across("AB", h));
    row.check("rotation of the top = -Hh2/2EI, rad", -H * h * h / (2 * EI), s.rotation("B"));
    row.check("top sinks by Qh/EA, m", -Q * h / EA, s.y("B"));
    const Solved d = solve({0, h, fixed, none, {fmt::format("{{ member = \"AB\", x = {} }}", q)}});
    row.check("q to the right: M at the foot = -qh2/2, kN m", -q * h * h / 2, d.M("AB", 0));
    row.check("q to the right: top moves by qh4/8EI, m", q * std::pow(h, 4) / (8 * EI), d.x("B"));
    const Solved y = solve({0, h, fixed, none, {fmt::format("{{ member = \"AB\", y = {} }}", -q)}});
    row.check("q down the column: N at the foot = -qh, kN", -q * h, y.N("AB", 0));
    row.check("q down the column: top sinks by qh2/2EA, m", -q * h * h / (2 * EA), y.y("B"));
}

TEST_CASE("couple inside a span") {
    // A counter-clockwise couple m at a: R_A = m/L, M rises to m a/L, drops by m.
    const double L = 7.3, m = 41, a = 2.1;
    const Row row(Group::conventions, "simple span, counter-clockwise couple m at 2.1 m");
    const Solved s = solve({L, 0, pinned, roller, {fmt::format("{{ member = \"AB\", moment = {}, at = {} }}", m, a)}});
    row.check("reaction left = m/L, kN", m / L, s.reaction_y("A"));
    row.check("M just before = ma/L, kN m", m * a / L, s.M("AB", a));
    row.check("M just after = ma/L - m, kN m", m * a / L - m, s.M("AB", a, true));
    row.check("movement there = m a(L-a)(L-2a)/3EIL, m", m * a * (L - a) * (L - 2 * a) / (3 * EI * L),
              s.across("AB", a));
}

TEST_CASE("turned roller") {
    // Holds along (-sin, cos) of its angle: R_Bx = -tan R_By. With R_By = wL/2: N = R_Bx, B slides along (cos, sin).
    const double L = 7.3, w = 12.4, t = std::tan(radians(30));
    const Row row(Group::conventions, "simple span, right roller turned by 30 deg");
    const Solved s = solve({L, 0, pinned, "{ y = \"fixed\", angle = \"30 deg\" }", {uniform("AB", w)}});
    row.check("vertical reaction = wL/2, kN", w * L / 2, s.reaction_y("B"));
    row.check("horizontal reaction = -tan wL/2, kN", -t * w * L / 2, s.reaction_x("B"));
    row.check("N = -tan wL/2, kN", -t * w * L / 2, s.N("AB", L / 2));
    row.check("slides back by tan wL2/2EA, m", -t * w * L * L / (2 * EA), s.x("B"));
    row.check("and down by tan of that, m", -t * t * w * L * L / (2 * EA), s.y("B"));
}

TEST_CASE("turned support, imposed movement and spring") {
    // A rigid settlement D of the turned roller, own y: with no load the beam stays straight and unstressed, u_x = 0,
    // and -u_x sin + u_y cos = -D gives u_y = -D/cos.
    const double L = 7.3, D = 0.013, k = 2300, P = 37, angle = radians(40);
    const Row row(Group::conventions, "support turned by 40 deg");
    const Solved s = solve({L, 0, pinned, "{ y = \"fixed\", angle = \"40 deg\" }", {settle("B", D)}});
    row.check("own y moves by -D: node moves by -D/cos, m", -D / std::cos(angle), s.y("B"));
    row.check_zero("N, kN", s.N("AB", 0), EA * D / L);
    // A spring of stiffness k along its own y alone, and a vertical force P at B: R_y = P, R = P/cos along the spring,
    // R_x = -P tan, its movement -R/k = -u_x sin + u_y cos with u_x = R_x L/EA.
    const Solved e = solve({L, 0, pinned, fmt::format("{{ y = {}, angle = \"40 deg\" }}", k), {force("B", P)}});
    const double ux = -P * std::tan(angle) * L / EA;
    row.check("spring along own y: horizontal reaction = -P tan, kN", -P * std::tan(angle), e.reaction_x("B"));
    row.check("spring along own y: u_x, m", ux, e.x("B"));
    row.check("spring along own y: u_y, m", (ux * std::sin(angle) - P / std::cos(angle) / k) / std::cos(angle),
              e.y("B"));
}

TEST_CASE("roller on a wall") {
    // Turned by 90 deg a roller holds x. A ladder from A (pinned) up to B under w per length, whole weight W = wl at
    // midspan: R_Bx = -W (l_x/2)/l_y, R_Ax = -R_Bx, R_Ay = W.
    const double x = 2.1, y = 5.3, w = 1.9, W = w * std::hypot(x, y);
    const Row row(Group::conventions, "ladder against a wall, roller turned by 90 deg");
    const Solved s = solve({x, y, pinned, "{ y = \"fixed\", angle = \"90 deg\" }", {uniform("AB", w)}});
    row.check("push of the wall = -W x/2y, kN", -W * x / (2 * y), s.reaction_x("B"));
    row.check("thrust at the foot, kN", W * x / (2 * y), s.reaction_x("A"));
    row.check("vertical reaction at the foot = W, kN", W, s.reaction_y("A"));
    row.check_zero("vertical reaction at the wall, kN", s.reaction_y("B"), W);
}

TEST_CASE("far end of a spring settles") {
    const double L = 7.3, D = 0.021, k = 310;
    const Row row(Group::conventions, "imposed movement D of the far end of a spring");
    // Cantilever stiffness 3EI/L3 in series with k: R = -D/(1/k + L3/3EI).
    const double R = -D / (1 / k + std::pow(L, 3) / (3 * EI));
    const Solved s = solve({L, 0, fixed, spring_y(k), {settle("B", D)}});
    row.check("propped on k: reaction, kN", R, s.reaction_y("B"));
    row.check("propped on k: the node moves by R L3/3EI, m", R * std::pow(L, 3) / (3 * EI), s.y("B"));
    // Two equal spans, centre on k: R = -D/(1/k + L3/6EI).
    const double R2 = -D / (1 / k + std::pow(L, 3) / (6 * EI));
    const Solved two = solve(BeamModel{{L, L}, {pinned, spring_y(k), roller}, {settle("B", D)}});
    row.check("two spans, centre on k: reaction, kN", R2, two.reaction_y("B"));
    row.check("two spans: M over the centre = -R L/2, kN m", -R2 * L / 2, two.M("AB", L));
    // Rotational spring c at the foot of a propped beam: m = theta/(1/c + L/3EI).
    const double c = 5700, theta = 0.0083;
    const Solved r =
        solve({L, 0, fmt::format("{{ x = \"fixed\", y = \"fixed\", rotation = {} }}", c), roller, {turn("A", theta)}});
    row.check("rotational spring: reaction moment, kN m", theta / (1 / c + L / (3 * EI)), r.reaction_moment("A"));
}

TEST_CASE("inclined member, loads per length and per plan") {
    const double x = 6.4, y = 2.9, l = std::hypot(x, y), q = 2.3;
    const double cosine = x / l, sine = y / l;
    const Row row(Group::conventions, "rafter from a pin up to a roller, 6.4 m by 2.9 m");
    // Snow q per plan length: total q x, M = q x2/8; the reaction at A has the components q x/2 along the member's
    // axes.
    const Solved snow =
        solve({x, y, pinned, roller, {fmt::format("{{ member = \"AB\", y = {}, per = \"plan\" }}", -q)}});
    row.check("per plan: reaction at A = qx/2, kN", q * x / 2, snow.reaction_y("A"));
    row.check("per plan: M at midspan = qx2/8, kN m", q * x * x / 8, snow.most("AB", "M").value);
    row.check("per plan: N at A = -qx sin/2, kN", -q * x / 2 * sine, snow.N("AB", 0));
    row.check("per plan: V at A = qx cos/2, kN", q * x / 2 * cosine, snow.V("AB", 0));
    const Solved own = solve({x, y, pinned, roller, {uniform("AB", q)}});
    row.check("per length: reaction at A = ql/2, kN", q * l / 2, own.reaction_y("A"));
    row.check("per length: M at midspan = q l x/8, kN m", q * l * x / 8, own.most("AB", "M").value);
    // Wind q per vertical length to the right: total q y, about A: R_B x = -q y y/2.
    const Solved wind =
        solve({x, y, pinned, roller, {fmt::format("{{ member = \"AB\", x = {}, per = \"plan\" }}", q)}});
    row.check("x per plan: horizontal reaction = -qy, kN", -q * y, wind.reaction_x("A"));
    row.check("x per plan: reaction at B = qy2/2x, kN", q * y * y / (2 * x), wind.reaction_y("B"));
    // Suction across the slope: total q l along across, R_B = -q l2/2x.
    const Solved suction = solve({x, y, pinned, roller, {fmt::format("{{ member = \"AB\", across = {} }}", q)}});
    row.check("across: reaction at B = -ql2/2x, kN", -q * l * l / (2 * x), suction.reaction_y("B"));
    row.check("across: horizontal reaction at A = q l sin, kN", q * l * sine, suction.reaction_x("A"));
    row.check("across: M at midspan = -ql2/8, kN m", -q * l * l / 8, suction.least("AB", "M").value);
    row.check("length, m", l, suction.length("AB"));
}

TEST_CASE("self-weight of an inclined member") {
    const double x = 6.4, y = 2.9, l = std::hypot(x, y), area = 0.4 * 0.65, weight = 2450 * 9.80665 / 1000 * area;
    const Row row(Group::conventions, "self-weight, rectangle 400 mm x 650 mm, 2450 kg/m3");
    const Solved s(fmt::format(R"(
[units]
length = "m"
force = "kN"
[materials.concrete]
E = "31 GPa"
density = "2450 kg/m3"
[sections.rib]
shape = "rectangle"
width = "400 mm"
depth = "650 mm"
[nodes]
A = [0, 0]
B = [{}, {}]
[members.AB]
from = "A"
to = "B"
section = "rib"
material = "concrete"
[supports]
A = "pinned"
B = "roller"
[cases.load]
loads = [{{ self_weight = 1.1 }}]
)",
                               x, y));
    row.check("reaction at B = 1.1 rho g A l/2, kN", 1.1 * weight * l / 2, s.reaction_y("B"));
    row.check("M at midspan = 1.1 rho g A l x/8, kN m", 1.1 * weight * l * x / 8, s.most("AB", "M").value);
}

TEST_CASE("temperature of a tee") {
    // Linear between the faces; the mean part is the temperature at the centroid, which lies z below the top (flange at
    // +across): N = -EA a (T_top + (T_bottom - T_top) z/h), M = -EI a (T_bottom - T_top)/h with fixed ends.
    const double h = 0.7, width = 1.5, web = 0.3, flange = 0.12, L = 7.3, E = 31e6, a = 1e-5, top = 24, bottom = 9;
    const double A1 = width * flange, A2 = web * (h - flange);
    const double z = (A1 * flange / 2 + A2 * (flange + (h - flange) / 2)) / (A1 + A2);
    const double I = width * std::pow(flange, 3) / 12 + A1 * std::pow(z - flange / 2, 2) +
                     web * std::pow(h - flange, 3) / 12 + A2 * std::pow(flange + (h - flange) / 2 - z, 2);
    const std::string model = fmt::format(R"(
[units]
length = "m"
force = "kN"
[materials.concrete]
E = {}
expansion = "10e-6 /K"
[sections.tee]
shape = "tee"
depth = {}
width = {}
web = {}
flange = {}
[nodes]
A = [0, 0]
B = [{}, 0]
[members.AB]
from = "A"
to = "B"
section = "tee"
material = "concrete"
[supports]
A = "fixed"
B = "fixed"
)",
                                          E, h, width, web, flange, L);
    const Row row(Group::conventions, "tee with fixed ends, top 24 K, bottom 9 K");
    const Solved s(model + load_case({warm("AB", top, bottom)}));
    row.check("N, kN", -E * (A1 + A2) * a * (top + (bottom - top) * z / h), s.N("AB", L / 2));
    row.check("M, kN m", -E * I * a * (bottom - top) / h, s.M("AB", L / 2));
    const Solved even(model + load_case({warm("AB", 18)}));
    row.check("uniform 18 K: N, kN", -E * (A1 + A2) * a * 18, even.N("AB", 0));
    row.check_zero("uniform 18 K: M, kN m", even.M("AB", 0), E * I * a * 18 / h);
}

TEST_CASE("lack of fit") {
    const double L = 7.3, e = 0.0027, k = 52000;
    const Row row(Group::conventions, "member made too long by 2.7 mm");
    const std::vector<std::string> loads{fmt::format("{{ member = \"AB\", lack_of_fit = \"{} mm\" }}", 1000 * e)};
    const Solved rigid = solve({L, 0, fixed, fixed, loads});
    row.check("between rigid ends: N = -EA e/L, kN", -EA * e / L, rigid.N("AB", L / 2));
    const Solved free = solve({L, 0, fixed, none, loads});
    row.check("free end: movement, m", e, free.x("B"));
    row.check("free end: half way, m", e / 2, free.along("AB", L / 2));
    const Solved spring = solve({L, 0, fixed, fmt::format("{{ x = {} }}", k), loads});
    row.check("against a spring: N = -e/(L/EA + 1/k), kN", -e / (L / EA + 1 / k), spring.N("AB", 0));
}

TEST_CASE("axial loads along a bar") {
    // Both ends held: the load splits as its distances from the far ends: R_A = -P b/L, N_A = P b/L.
    const double L = 7.3, a = 2.1, P = 37, q = 5.1;
    const Row row(Group::conventions, "bar held at both ends, loads along it");
    const Solved p = solve({L, 0, fixed, fixed, {fmt::format("{{ member = \"AB\", along = {}, at = {} }}", P, a)}});
    row.check("P at a: N before = P(L-a)/L, kN", P * (L - a) / L, p.N("AB", a));
    row.check("P at a: N after = -Pa/L, kN", -P * a / L, p.N("AB", a, true));
    row.check("P at a: along there = Pa(L-a)/EAL, m", P * a * (L - a) / (EA * L), p.along("AB", a));
    const Solved t = solve({L, 0, fixed, fixed, {fmt::format("{{ member = \"AB\", along = [0, {}] }}", q)}});
    row.check("0 to q: N at the start = qL/6, kN", q * L / 6, t.N("AB", 0));
    row.check("0 to q: N at the end = -qL/3, kN", -q * L / 3, t.N("AB", L));
    row.check("0 to q: largest N = qL/6, kN", q * L / 6, t.most("AB", "N").value);
}

TEST_CASE("semi-rigid connections") {
    const double L = 7.3, w = 12.4, c = 5700;
    const Row row(Group::conventions, "members with elastic connections");
    // Equal moment springs at both ends: M = (wL2/12)/(1 + 2EI/(cL)).
    const Solved both =
        solve({L,
               0,
               fixed,
               fixed,
               {uniform("AB", w)},
               fmt::format("releases = {{ start = {{ moment = {0} }}, end = {{ moment = {0} }} }}\n", c)});
    row.check("both ends: M = -(wL2/12)/(1+2EI/cL), kN m", -w * L * L / 12 / (1 + 2 * EI / (c * L)), both.M("AB", 0));
    row.check("both ends: deflection, m",
              -5 * w * std::pow(L, 4) / (384 * EI) + w * std::pow(L, 4) / (96 * EI) / (1 + 2 * EI / (c * L)),
              both.across("AB", L / 2));
    row.check_zero("both ends: the node does not turn, rad", both.rotation("A"), w * std::pow(L, 3) / (24 * EI));
    // One end: the prop's rotation wL3/48EI closes over the spring and 4EI/L.
    const double M = w * std::pow(L, 3) / (48 * EI) / (1 / c + L / (4 * EI));
    const Solved one = solve({L,
                              0,
                              fixed,
                              fixed,
                              {uniform("AB", w)},
                              fmt::format("releases = {{ end = {{ moment = \"{} kN m/rad\" }} }}\n", c)});
    row.check("right end: M there, kN m", -M, one.M("AB", L));
    row.check("right end: M left = -wL2/8 + M/2, kN m", -w * L * L / 8 + M / 2, one.M("AB", 0));
    // Axial spring k in series with EA/L: N = -EA a T/(1 + EA/(kL)).
    const double k = 52000, T = 31;
    const Solved axial =
        solve({L, 0, fixed, fixed, {warm("AB", T)}, fmt::format("releases = {{ end = {{ axial = {} }} }}\n", k)});
    row.check("axial spring, warm bar: N, kN", -EA * bar.expansion * T / (1 + EA / (k * L)), axial.N("AB", 0));
    // Shear spring k in series with 12EI/L3 under a settlement D: V = D/(L3/12EI + 1/k).
    const double D = 0.0123, ks = 480;
    const Solved shear =
        solve({L, 0, fixed, fixed, {settle("B", D)}, fmt::format("releases = {{ end = {{ shear = {} }} }}\n", ks)});
    const double V = D / (std::pow(L, 3) / (12 * EI) + 1 / ks);
    row.check("shear spring, settlement: V, kN", V, shear.V("AB", 0));
    row.check("shear spring, settlement: M left, kN m", -V * L / 2, shear.M("AB", 0));
    row.check("shear spring, settlement: the member's end, m", -D + V / ks, shear.across("AB", L));
}

TEST_CASE("free connections") {
    const double L = 7.3, w = 12.4, P = 37;
    const Row row(Group::conventions, "members with free connections");
    // Fixed ends, moment released right: a propped cantilever.
    const Solved moment =
        solve({L, 0, fixed, fixed, {uniform("AB", w)}, "releases = { end = { moment = \"free\" } }\n"});
    row.check("moment free: M left = -wL2/8, kN m", -w * L * L / 8, moment.M("AB", 0));
    row.check("moment free: reaction right = 3wL/8, kN", 3 * w * L / 8, moment.reaction_y("B"));
    // Shear released right, where the member cannot turn: M left = -wL2/3, right wL2/6, V right 0; end sinks by
    // wL4/24EI.
    const Solved shear = solve({L, 0, fixed, fixed, {uniform("AB", w)}, "releases = { end = { shear = \"free\" } }\n"});
    row.check("shear free: M left = -wL2/3, kN m", -w * L * L / 3, shear.M("AB", 0));
    row.check("shear free: M right = wL2/6, kN m", w * L * L / 6, shear.M("AB", L));
    row.check("shear free: the member's end sinks by wL4/24EI, m", -w * std::pow(L, 4) / (24 * EI),
              shear.across("AB", L));
    row.check_zero("shear free: reaction right, kN", shear.reaction_y("B"), w * L);
    // Axial released right: a warm bar carries nothing and a load along it goes to the left end.
    const Solved axial = solve({L,
                                0,
                                fixed,
                                fixed,
                                {fmt::format("{{ member = \"AB\", along = {}, at = 2.1 }}", P)},
                                "releases = { end = { axial = \"free\" } }\n"});
    row.check("axial free: reaction left = -P, kN", -P, axial.reaction_x("A"));
    row.check("axial free: the member's end moves by P 2.1/EA, m", P * 2.1 / EA, axial.along("AB", L));
}

TEST_CASE("loads at a released end") {
    // They act on the member's side. Two simple spans (AB released at B) with a couple m at the end of AB, -m at the
    // node: each span bends as under a couple at its end: M = m at B in both, rotations m L/3EI to either side.
    const double L = 7.3, m = 41;
    const Row row(Group::conventions, "couple at a released end, its counterpart at the node");
    const Solved s(header(bar) +
                   "[nodes]\nA = [0, 0]\nB = [7.3, 0]\nC = [14.6, 0]\n[members]\n"
                   "AB = { from = \"A\", to = \"B\", section = \"bar\", material = \"m\", "
                   "releases = { end = { moment = \"free\" } } }\n"
                   "BC = { from = \"B\", to = \"C\", section = \"bar\", material = \"m\" }\n"
                   "[supports]\nA = \"pinned\"\nB = \"roller\"\nC = \"roller\"\n" +
                   load_case({fmt::format("{{ member = \"AB\", moment = {}, at = {} }}", m, L), couple("B", -m)}));
    row.check("M just inside AB = m, kN m", m, s.least("AB", "M").value + s.most("AB", "M").value);
    row.check("M of BC at B = m, kN m", m, s.M("BC", 0));
    row.check("rotation of A = -mL/6EI, rad", -m * L / (6 * EI), s.rotation("A"));
    row.check("rotation of B = -mL/3EI, rad", -m * L / (3 * EI), s.rotation("B"));
    row.check("reaction at B = -2m/L, kN", -2 * m / L, s.reaction_y("B"));
    // Influence line of M over B by a unit kink: 2 m L/3EI = 1 gives m = 3EI/2L.
    const double xi = 0.4, unit = 3 * EI / (2 * L);
    row.check("unit kink: influence of M over B at 0.4 L, m", -L / 4 * xi * (1 - xi * xi),
              s.across("AB", xi * L) * unit / m);
}

TEST_CASE("beam with a hinge, statically determinate") {
    // Fixed at A, hinge at a, roller at B; w over all. Hinge force V_h = w(L-a)/2: M_A = -(V_h a + w a2/2).
    const double L = 7.3, a = 3.285, w = 12.4, Vh = w * (L - a) / 2;
    const Row row(Group::conventions, "fixed, hinge at 3.285 m, roller at 7.3 m, w over all");
    const Solved s(
        header(bar) +
        "[beams.run]\nnodes = [\"A\", \"B\"]\nspans = [7.3]\nsection = \"bar\"\nmaterial = \"m\"\nhinges = [3.285]\n"
        "[supports]\nA = \"fixed\"\nB = \"roller\"\n" +
        load_case({fmt::format("{{ beam = \"run\", y = {} }}", -w)}));
    row.check("reaction at B = w(L-a)/2, kN", Vh, s.reaction_y("B"));
    row.check("M at A = -(V_h a + wa2/2), kN m", -(Vh * a + w * a * a / 2), s.M("run.1", 0));
    row.check("hinge sinks by V_h a3/3EI + wa4/8EI, m",
              -(Vh * std::pow(a, 3) / (3 * EI) + w * std::pow(a, 4) / (8 * EI)), s.across("run.1", a));
    row.check_zero("M at the hinge, kN m", s.M("run.1", a), w * L * L / 8);
    row.check("largest M = w(L-a)2/8, kN m", w * (L - a) * (L - a) / 8, s.most("run.1", "M").value);
}

TEST_CASE("stiffness factor") {
    const double L = 7.3, w = 12.4;
    const Row row(Group::conventions, "cantilever with half its stiffness");
    const Solved s =
        solve({L, 0, fixed, none, {uniform("AB", w), "{ node = \"B\", x = 90 }"}, "stiffness_factor = 0.5\n"});
    row.check("tip sinks by wL4/(8EI/2), m", -w * std::pow(L, 4) / (4 * EI), s.y("B"));
    row.check("tip moves by PL/(EA/2), m", 2 * 90 * L / EA, s.x("B"));
}

TEST_CASE("combinations and coexisting forces") {
    // Superposition of two cases on a simple span, and what acts together with an extreme.
    const double L = 7.3, g = 8.2, q = 5.9;
    const Row row(Group::conventions, "simple span, 1.35 g + 1.5 q");
    const test::Result r = test::run(
        header(bar) +
        "[nodes]\nA = [0, 0]\nB = [7.3, 0]\n[members]\nAB = { from = \"A\", to = \"B\", section = \"bar\", "
        "material = \"m\" }\n[supports]\nA = \"pinned\"\nB = \"roller\"\n" +
        fmt::format(
            "[cases.dead]\naction = \"permanent\"\nloads = [{}]\n[cases.floor]\naction = \"imposed\"\nloads = [{}]\n",
            uniform("AB", g), uniform("AB", q)) +
        "[combinations.uls]\nfactors = { dead = 1.35, floor = 1.5 }\n[combinations.low]\nfactors = { dead = 1.0 }\n");
    const double most = (1.35 * g + 1.5 * q) * L;
    row.check("M at midspan, kN m", most * L / 8, r("/combinations/uls/members/AB/extremes/M/max/value") / 1000);
    row.check("envelope: most M, kN m", most * L / 8, r("/envelopes/strength/members/AB/M/most/value") / 1000);
    row.check_zero("envelope: V with it, kN", r("/envelopes/strength/members/AB/M/most/with/V") / 1000, most);
    row.check("envelope: most reaction, kN", most / 2, r("/envelopes/strength/reactions/A/y/most/value") / 1000);
    row.check("envelope: least reaction, kN", g * L / 2, r("/envelopes/strength/reactions/A/y/least/value") / 1000);
    CHECK(r.text("/envelopes/strength/reactions/A/y/least/combination") == "low");
    CHECK(r.text("/envelopes/strength/members/AB/M/most/combination") == "uls");
}

TEST_CASE("loads by their place along a run") {
    // A run of two unequal spans; the same load given on the run and member by member, and as a fraction of the length.
    const double L1 = 4.2, L2 = 6.3, w1 = 5.1, w2 = 17.4, from = 1.7, to = 8.9, P = 37;
    const auto model = [&](const std::vector<std::string>& loads) {
        return Solved(header(bar) +
                      "[beams.run]\nnodes = [\"A\", \"B\", \"C\"]\nspans = [4.2, 6.3]\nsection = \"bar\"\n"
                      "material = \"m\"\n[supports]\nA = \"pinned\"\nC = \"roller\"\n" +
                      load_case(loads));
    };
    const Row row(Group::conventions, "simple span as a run of two members");
    // Resultant W of the trapezoid at z from its start: R_C = W (from + z)/(L1 + L2).
    const double c = to - from, W = (w1 + w2) * c / 2, z = c * (w1 + 2 * w2) / (3 * (w1 + w2));
    const Solved s = model({fmt::format("{{ beam = \"run\", y = [{}, {}], between = [{}, {}] }}", -w1, -w2, from, to)});
    row.check("trapezoid over a node: reaction at C, kN", W * (from + z) / (L1 + L2), s.reaction_y("C"));
    row.check("trapezoid over a node: reaction at A, kN", W - W * (from + z) / (L1 + L2), s.reaction_y("A"));
    // M at the node = R_A L1 - (w1 d2/2 + slope d3/6), d = L1 - from.
    const double d = L1 - from, slope = (w2 - w1) / c;
    row.check("trapezoid over a node: M at B, kN m",
              s.reaction_y("A") * L1 - w1 * d * d / 2 - slope * std::pow(d, 3) / 6, s.M("run.1", L1));
    const Solved p =
        model({fmt::format("{{ beam = \"run\", y = {}, at = 7.35 }}", -P)}); // in the middle of the second span
    row.check("P at 7.35 m of the run: reaction at C, kN", P * 7.35 / (L1 + L2), p.reaction_y("C"));
    row.check("P at 7.35 m of the run: M there, kN m", P * 7.35 * (L1 + L2 - 7.35) / (L1 + L2), p.M("run.2", L2 / 2));
    const Solved half = model({fmt::format("{{ member = \"run.2\", y = {}, at = \"50 %\" }}", -P)});
    row.check("P at 50 % of the second member: reaction at C, kN", P * 7.35 / (L1 + L2), half.reaction_y("C"));
}

TEST_CASE("run in a direction of its own") {
    // A mast of two members, 90 deg: pinned foot, held sideways at 3.5 m, H to the right at its top, 6 m.
    const double a = 3.5, c = 2.5, H = 17;
    const Row row(Group::conventions, "mast as a run turned by 90 deg, H at the top");
    const Solved s(header(bar) +
                   "[beams.mast]\nnodes = [\"A\", \"B\", \"C\"]\nspans = [3.5, 2.5]\ndirection = \"90 deg\"\n"
                   "section = \"bar\"\nmaterial = \"m\"\n[supports]\nA = \"pinned\"\n"
                   "B = { x = \"fixed\" }\n" +
                   load_case({fmt::format("{{ node = \"C\", x = {} }}", H)}));
    row.check("reaction at the stay = -H(a+c)/a, kN", -H * (a + c) / a, s.reaction_x("B"));
    row.check("reaction at the foot = Hc/a, kN", H * c / a, s.reaction_x("A"));
    row.check("M at the stay = -Hc, kN m", -H * c, s.M("mast.1", a));
    row.check("top moves by Hc2(a+c)/3EI, m", H * c * c * (a + c) / (3 * EI), s.x("C"));
}

TEST_CASE("two pinned bars") {
    // Bars from A and C up to B, load P at B: N = -P/(2 sin), B sinks by P l/(2 EA sin2); no bending.
    const double x = 3.1, y = 2.3, l = std::hypot(x, y), sine = y / l, P = 90;
    const std::string ends = "section = \"bar\", material = \"m\", releases = { start = { moment = \"free\" }, end = { "
                             "moment = \"free\" } } }\n";
    const Row row(Group::conventions, "two bars, pinned at all ends, P at their apex");
    const Solved s(header(bar) +
                   fmt::format("[nodes]\nA = [0, 0]\nB = [{}, {}]\nC = [{}, 0]\n[members]\n", x, y, 2 * x) +
                   "AB = { from = \"A\", to = \"B\", " + ends + "BC = { from = \"B\", to = \"C\", " + ends +
                   "[supports]\nA = \"pinned\"\nC = \"pinned\"\n" + load_case({force("B", P)}));
    row.check("N = -P/2sin, kN", -P / (2 * sine), s.N("AB", 0));
    row.check("thrust = P x/2y, kN", P * x / (2 * y), s.reaction_x("A"));
    row.check("apex sinks by Pl/(2EA sin2), m", -P * l / (2 * EA * sine * sine), s.y("B"));
    row.check_zero("M at midspan, kN m", s.M("AB", l / 2), P * l);
    CHECK_FALSE(s.json().has("/cases/load/displacements/B/rotation"));
}

TEST_CASE("loads on supports") {
    // A load on a held node goes straight into its support; on a spring the node gives by P/k.
    const double L = 7.3, P = 37, m = 41, k = 2300;
    const Row row(Group::conventions, "loads at supported nodes");
    const Solved s = solve({L, 0, fixed, "{ y = 2300 }", {force("A", P), couple("A", m)}});
    row.check("force on a fixed support: reaction = P, kN", P, s.reaction_y("A"));
    row.check("couple on a fixed support: reaction moment = -m, kN m", -m, s.reaction_moment("A"));
    row.check_zero("M of the beam, kN m", s.M("AB", 0), m);
    const Solved e = solve({L, 0, pinned, "{ y = 2300 }", {force("B", P)}});
    row.check("force on a spring: reaction = P, kN", P, e.reaction_y("B"));
    row.check("force on a spring: movement = -P/k, m", -P / k, e.y("B"));
    row.check_zero("a roller has no reaction along x, kN", e.reaction_x("B"), P);
    row.check_zero("and no moment, kN m", e.reaction_moment("B"), P * L);
}
