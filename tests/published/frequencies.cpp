// Natural frequencies, modal and effective masses. Sources: register.cpp, Group::frequencies. Lengths in m, forces in
// kN, masses in kg. Loads stand for the masses, so that the axial stiffness can be as high as the formulas assume.

#include <array>
#include <cmath>
#include <numbers>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double pi = std::numbers::pi;
constexpr double g = 9.80665; // m/s2, what turns the model's loads into mass

/// For exact frequencies: members are cut until the parts' own error is below this.
constexpr Tolerance finely_cut{1e-5, 0, "below 1e-5"};

/// A uniform beam of span 6 m: E I in N m2, mass in kg/m; axially stiff.
constexpr double L = 6, EI = 2.1e7, m = 100;
const Stiffness stiff_axially{.A = 100};

double frequency_of(double lambda, double span = L) {
    return lambda * lambda / (2 * pi * span * span) * std::sqrt(EI / m);
}

std::string mass_load(std::string_view member, double kg_per_m = m) { return uniform(member, kg_per_m * g / 1000); }

/// `[mass]` with the case of solved.hpp.
std::string mass_table(int modes, const std::string& nodes = "") {
    return fmt::format("[mass]\ncases = {{ load = 1 }}\nmodes = {}\n{}", modes,
                       nodes.empty() ? nodes : "nodes = { " + nodes + " }\n");
}

Solved vibrate(const BeamModel& beam, int modes, const std::string& node_masses = "") {
    return Solved(text(beam) + mass_table(modes, node_masses), 0);
}

/// Numbers of mode `n`, counted from 1.
double frequency(const Solved& s, int n) { return s.json()(fmt::format("/modes/{}/frequency", n - 1)); }
double modal_mass(const Solved& s, int n) { return s.json()(fmt::format("/modes/{}/modal_mass", n - 1)); }
double effective(const Solved& s, int n, char axis) {
    return s.json()(fmt::format("/modes/{}/effective_mass/{}", n - 1, axis));
}

void check_frequency(const Row& row, const Solved& s, int n, double expected, Tolerance tolerance = finely_cut) {
    row.check(fmt::format("f{}, Hz", n), expected, frequency(s, n), tolerance);
}

/// A root of `f` between two places where its sign differs.
template <class F> double root(F&& f, double low, double high) {
    const bool rises = f(high) > 0;
    for (int i = 0; i < 200; ++i) {
        const double middle = (low + high) / 2;
        ((f(middle) > 0) == rises ? high : low) = middle;
    }
    return low;
}

const std::string guided = "{ x = \"fixed\", rotation = \"fixed\" }";

struct UniformBeam {
    std::string title;
    std::string left, right;
    std::vector<double> lambdas;
};

} // namespace

TEST_CASE("uniform beams by their end conditions") {
    const UniformBeam beams[] = {
        {"pinned-pinned, sin l = 0", pinned, roller, {pi, 2 * pi, 3 * pi, 4 * pi, 5 * pi}},
        {"guided-pinned, cos l = 0", guided, roller, {pi / 2, 3 * pi / 2, 5 * pi / 2, 7 * pi / 2}},
        {"fixed-free, cos l cosh l = -1",
         fixed,
         none,
         {1.87510406871, 4.69409113297, 7.85475743824, 10.9955407349, 14.137168391}},
        {"fixed-fixed, cos l cosh l = 1",
         fixed,
         fixed,
         {4.73004074486, 7.8532046241, 10.995607838, 14.1371654913, 17.2787596574}},
        {"fixed-pinned, tan l = tanh l",
         fixed,
         roller,
         {3.92660231205, 7.06858274563, 10.2101761228, 13.3517687778, 16.4933614313}},
        {"fixed-guided, tan l = -tanh l", fixed, guided, {2.36502037243, 5.497803919, 8.6393798287, 11.780972451}},
    };
    for (const UniformBeam& beam : beams) {
        const int modes = static_cast<int>(beam.lambdas.size());
        const Solved s = vibrate({{L}, {beam.left, beam.right}, {mass_load("AB")}, stiff_axially}, modes);
        const Row row(Group::frequencies, "uniform beam, " + beam.title);
        for (int n = 1; n <= modes; ++n)
            check_frequency(row, s, n, frequency_of(beam.lambdas[static_cast<std::size_t>(n - 1)]));
    }
}

namespace {

/// Stiffness, kN/m, of end springs so soft that the bending frequencies of a beam that nothing holds rise by less than
/// 1e-7: the first of them by 4 k L^3/(E I lambda^4), half of the springs' share in its energy.
constexpr double soft = 1e-5 * EI / (L * L * L) / 1000;

} // namespace

TEST_CASE("beams that nothing holds, on very soft springs") {
    const std::string spring = fmt::format("{{ y = {} }}", soft);
    const std::string spring_and_x = fmt::format("{{ x = \"fixed\", y = {} }}", soft);
    const std::string guided_soft = fmt::format("{{ x = \"fixed\", y = {}, rotation = \"fixed\" }}", soft);
    const std::string pin_soft = fmt::format("{{ x = \"fixed\", y = \"fixed\", rotation = {} }}", soft * L * L);
    struct Free : UniformBeam {
        int rigid; ///< movements without bending
    };
    const Free beams[] = {
        {{"free-free, cos l cosh l = 1", spring_and_x, spring, {4.73004074486, 7.8532046241, 10.995607838}}, 2},
        {{"guided-guided, sin l = 0", guided_soft, guided_soft, {pi, 2 * pi, 3 * pi}}, 1},
        {{"pinned-free, tan l = tanh l", pin_soft, none, {3.92660231205, 7.06858274563, 10.2101761228}}, 1},
        {{"guided-free, tan l = -tanh l", guided_soft, none, {2.36502037243, 5.497803919, 8.6393798287}}, 1},
    };
    for (const Free& beam : beams) {
        const int modes = beam.rigid + static_cast<int>(beam.lambdas.size());
        const Solved s = vibrate({{L}, {beam.left, beam.right}, {mass_load("AB")}, stiff_axially}, modes);
        const Row row(Group::frequencies, "uniform beam on soft springs, " + beam.title);
        for (int n = beam.rigid + 1; n <= modes; ++n)
            check_frequency(row, s, n, frequency_of(beam.lambdas[static_cast<std::size_t>(n - beam.rigid - 1)]));
    }
    // A rigid beam on two springs k: omega^2 = 2 k/(m L) up and down, k (L^2/2)/(m L^3/12) turning.
    const Solved s = vibrate({{L}, {spring_and_x, spring}, {mass_load("AB")}, stiff_axially}, 2);
    const Row row(Group::frequencies, "rigid beam on two springs");
    constexpr Tolerance nearly_rigid{1e-5, 0, "below 1e-5 (k L^3 = 1e-5 E I)"};
    check_frequency(row, s, 1, std::sqrt(2 * soft * 1000 / (m * L)) / (2 * pi), nearly_rigid);
    check_frequency(row, s, 2, std::sqrt(6 * soft * 1000 / (m * L)) / (2 * pi), nearly_rigid);
}

TEST_CASE("cantilever with a mass at its tip") {
    struct Tip {
        double ratio; ///< tip mass over that of the beam
        std::array<double, 2> lambdas;
    };
    const Tip tips[] = {
        {0.1, {1.72274152059, 4.39952281616}},
        {0.5, {1.41996442977, 4.11113338642}},
        {1, {1.24791740961, 4.03113943671}},
        {5, {0.87002145889, 3.94998049114}},
    };
    for (const Tip& tip : tips) {
        const double mass = tip.ratio * m * L;
        const Solved s =
            vibrate({{L}, {fixed, none}, {mass_load("AB")}, stiff_axially}, 2, fmt::format("B = \"{} kg\"", mass));
        const Row row(Group::frequencies, fmt::format("cantilever, tip mass {} m L", tip.ratio));
        for (int n = 1; n <= 2; ++n)
            check_frequency(row, s, n, frequency_of(tip.lambdas[static_cast<std::size_t>(n - 1)]));
    }
}

TEST_CASE("simple beam with a mass at midspan") {
    const std::pair<double, double> centres[] = {{0.5, 2.6393143307}, {1, 2.3831906937}, {5, 1.71984679231}};
    for (const auto& [ratio, lambda] : centres) {
        const double mass = ratio * m * L;
        const std::vector<std::string> loads{mass_load("AB"), mass_load("BC")};
        const Solved node = vibrate({{L / 2, L / 2}, {pinned, none, roller}, loads, stiff_axially}, 2,
                                    fmt::format("B = \"{} kg\"", mass));
        const Row row(Group::frequencies, fmt::format("simple beam, mass {} m L at midspan", ratio));
        check_frequency(row, node, 1, frequency_of(lambda));
        check_frequency(row, node, 2, frequency_of(2 * pi)); // its node is where the mass is

        const Solved place =
            vibrate({{L}, {pinned, roller}, {mass_load("AB"), point("AB", mass * g / 1000, L / 2)}, stiff_axially}, 2);
        const Row same(Group::frequencies, fmt::format("the same, as a point load inside a member, {} m L", ratio));
        check_frequency(same, place, 1, frequency_of(lambda));
        check_frequency(same, place, 2, frequency_of(2 * pi));
    }
}

TEST_CASE("simple beam with rotational springs at both ends") {
    struct Ends {
        double ratio; ///< k L/(E I)
        std::vector<double> lambdas;
    };
    const Ends ends[] = {
        {1, {3.39879933495, 6.42725907332}}, {10, {4.15566423069, 7.06824935382}}, {100, {4.64131896232}}};
    for (const Ends& each : ends) {
        const double k = each.ratio * EI / L / 1000;
        const std::string support = fmt::format("{{ x = \"fixed\", y = \"fixed\", rotation = {} }}", k);
        const int modes = static_cast<int>(each.lambdas.size());
        const Solved s = vibrate({{L}, {support, support}, {mass_load("AB")}, stiff_axially}, modes);
        const Row row(Group::frequencies, fmt::format("rotational end springs, k L/(E I) = {}", each.ratio));
        for (int n = 1; n <= modes; ++n)
            check_frequency(row, s, n, frequency_of(each.lambdas[static_cast<std::size_t>(n - 1)]));

        // Springs in the connections of the member instead of under its nodes are the same beam.
        const std::string released =
            fmt::format("[nodes]\nA = [0, 0]\nB = [{}, 0]\n[members]\nAB = {{ from = \"A\", to = \"B\", section = "
                        "\"bar\", material = \"m\", releases = {{ start = {{ moment = {} }}, end = {{ moment = {} }} "
                        "}} }}\n[supports]\nA = \"fixed\"\nB = \"fixed\"\n",
                        L, k, k);
        const Solved r(header(stiff_axially) + released + load_case({mass_load("AB")}) + mass_table(modes), 0);
        const Row same(Group::frequencies, fmt::format("the same, by releases, k L/(E I) = {}", each.ratio));
        for (int n = 1; n <= modes; ++n)
            check_frequency(same, r, n, frequency_of(each.lambdas[static_cast<std::size_t>(n - 1)]));
    }
}

TEST_CASE("free beam on equal springs at both ends") {
    struct Ends {
        double ratio; ///< k L^3/(E I)
        std::array<double, 3> lambdas;
    };
    const Ends ends[] = {
        {10, {2.03234135617, 2.76660910601, 4.91338272322}},
        {100, {2.87675069401, 4.66378459604, 6.07617114011}},
        {1000, {3.11106346888, 6.03706304389, 8.56559445744}},
    };
    for (const Ends& each : ends) {
        const double k = each.ratio * EI / (L * L * L) / 1000;
        const std::string left = fmt::format("{{ x = \"fixed\", y = {} }}", k);
        const Solved s = vibrate({{L}, {left, spring_y(k)}, {mass_load("AB")}, stiff_axially}, 3);
        const Row row(Group::frequencies, fmt::format("free beam on end springs, k L^3/(E I) = {}", each.ratio));
        for (int n = 1; n <= 3; ++n)
            check_frequency(row, s, n, frequency_of(each.lambdas[static_cast<std::size_t>(n - 1)]));
    }
}

TEST_CASE("continuous beams of equal spans") {
    constexpr double span = L;
    const Solved two =
        vibrate({{span, span}, {pinned, roller, roller}, {mass_load("AB"), mass_load("BC")}, stiff_axially}, 4);
    const Row row(Group::frequencies, "two equal spans");
    int n = 0;
    for (const double lambda : {pi, 3.92660231205, 2 * pi, 7.06858274563})
        check_frequency(row, two, ++n, frequency_of(lambda));

    const Solved three = vibrate({{span, span, span},
                                  {pinned, roller, roller, roller},
                                  {mass_load("AB"), mass_load("BC"), mass_load("CD")},
                                  stiff_axially},
                                 6);
    const Row row3(Group::frequencies, "three equal spans");
    n = 0;
    for (const double lambda : {pi, 3.55640845976, 4.2975296929, 2 * pi, 6.70759564883, 7.42954133318})
        check_frequency(row3, three, ++n, frequency_of(lambda));

    // (sin l cosh l - cos l sinh l) + (sinh l - sin l) cos(j pi/n) = 0; the first n frequencies have one root each
    // between pi and that of the fixed span.
    const std::vector<std::string> loads{mass_load("AB"), mass_load("BC"), mass_load("CD"), mass_load("DE"),
                                         mass_load("EF")};
    const std::vector<double> spans(5, span);
    const auto lambda_of = [](int j) {
        return root(
            [j](double l) {
                return std::sin(l) * std::cosh(l) - std::cos(l) * std::sinh(l) +
                       (std::sinh(l) - std::sin(l)) * std::cos(j * pi / 5);
            },
            3, 4.75);
    };
    const Solved five = vibrate({spans, {pinned, roller, roller, roller, roller, roller}, loads, stiff_axially}, 5);
    const Row row5(Group::frequencies, "five equal spans");
    for (int j = 5; j >= 1; --j) check_frequency(row5, five, 6 - j, frequency_of(lambda_of(j)));
    const Solved clamped = vibrate({spans, {fixed, roller, roller, roller, roller, fixed}, loads, stiff_axially}, 5);
    const Row row5c(Group::frequencies, "five equal spans, outer ends fixed");
    for (int j = 4; j >= 0; --j) check_frequency(row5c, clamped, 5 - j, frequency_of(lambda_of(j)));
}

TEST_CASE("shear-flexible beam with rotary inertia") {
    const Solved s("[materials.m]\nE = \"30 GPa\"\npoisson = 0.2\ndensity = \"2500 kg/m3\"\n"
                   "[sections.bar]\nshape = \"rectangle\"\nwidth = \"0.3 m\"\ndepth = \"0.6 m\"\nshear = true\n"
                   "[nodes]\nA = [\"0 m\", \"0 m\"]\nB = [\"6 m\", \"0 m\"]\n"
                   "[members]\nAB = { from = \"A\", to = \"B\", section = \"bar\", material = \"m\" }\n"
                   "[supports]\nA = \"pinned\"\nB = \"roller\"\n[cases.load]\nloads = [ { self_weight = 1 } ]\n" +
                       mass_table(4),
                   0);
    const Row row(Group::frequencies, "Timoshenko beam 0.3 x 0.6 m, 6 m, pinned",
                  "S. P. Timoshenko, Phil. Mag. 41, 1921");
    check_frequency(row, s, 1, 25.7743127, finely_cut);
    check_frequency(row, s, 2, 98.736181, finely_cut);
    check_frequency(row, s, 4, 208.682239, finely_cut);
    // Between them the bar held at one end swings along itself: c/(4 L), c^2 = E/rho.
    check_frequency(row, s, 3, std::sqrt(30e9 / 2500) / (4 * 6));
}

TEST_CASE("bars that swing along themselves") {
    const Stiffness bar{.A = 0.0047};
    const double c = std::sqrt(bar.EA() * 1000 / m);
    // The stiffness in bending is so high that no bending comes between.
    Stiffness stiff = bar;
    stiff.I = 100;
    const Row row(Group::frequencies, "uniform bar along itself, held at one end, (2n - 1) c/(4 L)");
    const Solved s = vibrate({{L}, {fixed, none}, {mass_load("AB")}, stiff}, 4);
    for (int n = 1; n <= 4; ++n) check_frequency(row, s, n, (2 * n - 1) * c / (4 * L));
    // Mass M at the end: (w L/c) tan(w L/c) = m L/M.
    const double x = root([](double z) { return z * std::tan(z) - 0.5; }, 0.1, 1.5);
    const Solved loaded =
        vibrate({{L}, {fixed, none}, {mass_load("AB")}, stiff}, 1, fmt::format("B = \"{} kg\"", 2 * m * L));
    check_frequency(Row(Group::frequencies, "the same with a mass 2 m L at its end"), loaded, 1, x * c / (2 * pi * L));
}

TEST_CASE("frequency from the deflection under the same weight") {
    struct Rule {
        std::string title, left, right;
        double C; ///< f = C/sqrt(delta in mm), for g = 9.81
        bool most;
    };
    const Rule rules[] = {
        {"simple beam, midspan", pinned, roller, 17.753082, true},
        {"fixed beam, midspan", fixed, fixed, 17.997774, true},
        {"propped beam, largest", fixed, roller, 17.886801, true},
        {"propped beam, midspan", fixed, roller, 17.540334, false},
        {"cantilever, tip", fixed, none, 19.595683, true},
    };
    for (const Rule& rule : rules) {
        const BeamModel beam{{L}, {rule.left, rule.right}, {mass_load("AB")}, stiff_axially};
        const Solved s(text(beam) + mass_table(1), 2);
        const double delta = -1000 * (rule.most ? s.least("AB", "across").value : s.across("AB", L / 2));
        const Row row(Group::frequencies, "f sqrt(delta), " + rule.title);
        row.check("C for g = 9.81, Hz sqrt(mm)", rule.C, frequency(s, 1) * std::sqrt(delta * 9.81 / g), finely_cut);
        if (rule.C == 17.753082)
            row.check("f sqrt(delta/g)", 0.17924179, frequency(s, 1) * std::sqrt(delta / 1000 / g), finely_cut);
    }
    // One mass on the tip of a cantilever without mass: a mass on a spring.
    const Solved s(text({{L}, {fixed, none}, {force("B", 5)}, stiff_axially}) + mass_table(1), 0);
    Row(Group::frequencies, "f sqrt(delta), mass on a spring")
        .check("C for g = 9.81, Hz sqrt(mm)", 15.763572, frequency(s, 1) * std::sqrt(-1000 * s.y("B") * 9.81 / g),
               finely_cut);
}

TEST_CASE("two masses on a beam without mass") {
    // At the third points: a11 = 4 L^3/(243 E I), a12 = 7 L^3/(486 E I); 1/w^2 = M (a11 +- a12).
    const double a11 = 4 * L * L * L / (243 * EI), a12 = 7 * L * L * L / (486 * EI), M = 800;
    const Solved s = Solved(text({{L},
                                  {pinned, roller},
                                  {point("AB", M * g / 1000, L / 3), point("AB", M * g / 1000, 2 * L / 3)},
                                  stiff_axially}) +
                                mass_table(2),
                            0);
    const Row row(Group::frequencies, "two masses at the third points of a simple beam",
                  "flexibility coefficients by hand");
    check_frequency(row, s, 1, 1 / (2 * pi * std::sqrt(M * (a11 + a12))), exact);
    check_frequency(row, s, 2, 1 / (2 * pi * std::sqrt(M * (a11 - a12))), exact);
    row.check("effective mass y of mode 1, kg", 2 * M, effective(s, 1, 'y'), exact);
    row.check_zero("effective mass y of mode 2, kg", effective(s, 2, 'y'), M);
    // Dunkerley's sum is the trace of flexibility times mass, which takes all modes.
    const double sum = std::pow(frequency(s, 1), -2) + std::pow(frequency(s, 2), -2);
    Row(Group::frequencies, "the same, S. Dunkerley 1894")
        .check("sum of 1/f^2, s2", 4 * pi * pi * 2 * M * a11, sum, exact);
    // J. W. Strutt, Lord Rayleigh: g sum(M d)/sum(M d^2), exact where the deflections are the mode.
    const double delta = M * g * (a11 + a12);
    check_frequency(Row(Group::frequencies, "the same, Lord Rayleigh 1877"), s, 1, std::sqrt(g / delta) / (2 * pi),
                    exact);
}

TEST_CASE("pin-ended cross") {
    // NAFEMS: four arms of 5 m, 0.125 m square, outer ends pinned.
    std::string text =
        "[units]\nlength = \"m\"\nforce = \"kN\"\n[materials.m]\nE = \"200 GPa\"\ndensity = \"8000 kg/m3\"\n"
        "[sections.s]\nshape = \"rectangle\"\nwidth = 0.125\ndepth = 0.125\n[nodes]\nO = [0, 0]\n"
        "E = [5, 0]\nN = [0, 5]\nW = [-5, 0]\nS = [0, -5]\n[members]\n";
    for (const char* end : {"E", "N", "W", "S"})
        text += fmt::format("O{0} = {{ from = \"O\", to = \"{0}\", section = \"s\", material = \"m\" }}\n", end);
    text += "[supports]\nE = \"pinned\"\nN = \"pinned\"\nW = \"pinned\"\nS = \"pinned\"\n"
            "[cases.load]\nloads = [ { self_weight = 1 } ]\n";
    const Solved s(text + mass_table(8), 0);
    const Row row(Group::frequencies, "pin-ended cross, axial flexibility of the arms included");
    int n = 0;
    for (const double f : {11.336246, 17.680766, 17.680766, 17.709380, 45.344984, 57.074562, 57.074562, 57.389734})
        check_frequency(row, s, ++n, f, finely_cut);
    constexpr Tolerance axially_rigid_arms{0.006, 0, "below 0.6 % (the source leaves axial flexibility out)"};
    const Row printed_row(Group::frequencies, "the same, published targets",
                          "F. Abbassian, D. J. Dawswell, N. C. Knowles, Selected Benchmarks for Natural Frequency "
                          "Analysis, NAFEMS 1987, test 1, from memory");
    n = 0;
    for (const double f : {11.336, 17.709, 17.709, 17.709, 45.345, 57.390, 57.390, 57.390})
        check_frequency(printed_row, s, ++n, f, axially_rigid_arms);
}

namespace {

std::string portal(double h, double l, const std::string& bases, const std::string& sections, const std::string& E,
                   const std::vector<std::string>& loads) {
    return fmt::format("[units]\nlength = \"m\"\nforce = \"kN\"\n[materials.m]\nE = {}\n{}[nodes]\nA = [0, 0]\n"
                       "B = [0, {}]\nC = [{}, {}]\nD = [{}, 0]\n[members]\n"
                       "AB = {{ from = \"A\", to = \"B\", section = \"column\", material = \"m\" }}\n"
                       "BC = {{ from = \"B\", to = \"C\", section = \"beam\", material = \"m\" }}\n"
                       "CD = {{ from = \"C\", to = \"D\", section = \"column\", material = \"m\" }}\n"
                       "[supports]\nA = {}\nD = {}\n",
                       E, sections, h, l, h, l, bases, bases) +
           load_case(loads);
}

} // namespace

TEST_CASE("square portals") {
    // E I as that of the beams above, E A L^2/(E I) = 1e8.
    const double I = EI / 2.1e11;
    const std::string sections = fmt::format(
        "[sections]\ncolumn = {{ A = {0}, I = {1} }}\nbeam = {{ A = {0}, I = {1} }}\n", 1e8 * I / (L * L), I);
    const std::vector<std::string> loads{mass_load("AB"), mass_load("BC"), mass_load("CD")};
    const auto check = [&](const std::string& title, const std::string& bases, const std::array<double, 3>& lambdas) {
        const Solved s(portal(L, L, bases, sections, "\"210 GPa\"", loads) + mass_table(3), 0);
        const Row row(Group::frequencies, title);
        for (int n = 1; n <= 3; ++n) check_frequency(row, s, n, frequency_of(lambdas[static_cast<std::size_t>(n - 1)]));
    };
    check("square portal, fixed bases", fixed, {1.79013212, 3.55640808, 4.5419244});
    check("square portal, pinned bases", pinned, {1.20951962, 3.1415925, 3.85428314});
}

TEST_CASE("portal of rolled sections, bare and loaded") {
    const std::string sections = "[sections]\ncolumn = { A = \"53.8 cm2\", I = \"8356 cm4\" }\n"
                                 "beam = { A = \"72.7 cm2\", I = \"16270 cm4\" }\n";
    const auto check = [&](const std::string& title, double added, const std::array<double, 3>& frequencies) {
        const std::vector<std::string> loads{mass_load("AB", 42.2), mass_load("BC", 57.1 + added),
                                             mass_load("CD", 42.2)};
        const Solved s(portal(5, 8, fixed, sections, "\"210 GPa\"", loads) + mass_table(3), 0);
        const Row row(Group::frequencies, title);
        for (int n = 1; n <= 3; ++n) check_frequency(row, s, n, frequencies[static_cast<std::size_t>(n - 1)]);
    };
    check("steel portal 8 m x 5 m, bare", 0, {10.263186, 26.089747, 70.875351});
    check("the same, 1500 kg/m on the beam", 1500, {2.224658, 5.093466, 15.813103});
}

TEST_CASE("two-storey shear frame") {
    // Lower columns 2 E I, upper E I, rigid beams with 2 M and M: w^2 = 12 and 48 E I/(M h^3).
    const double h = 3.5, M = 4000, unit = 2e6; // E I in N m2
    const std::string text = fmt::format(
        "[units]\nlength = \"m\"\nforce = \"N\"\n[materials.m]\nE = 2e11\n[sections]\nlower = {{ A = 1000, I = {} }}\n"
        "upper = {{ A = 1000, I = {} }}\nrigid = {{ A = 1000, I = 1000 }}\n[nodes]\nA = [0, 0]\nB = [0, {h}]\nC = [0, "
        "{H}]\n"
        "a = [5, 0]\nb = [5, {h}]\nc = [5, {H}]\n[members]\n"
        "AB = {{ from = \"A\", to = \"B\", section = \"lower\", material = \"m\" }}\n"
        "ab = {{ from = \"a\", to = \"b\", section = \"lower\", material = \"m\" }}\n"
        "BC = {{ from = \"B\", to = \"C\", section = \"upper\", material = \"m\" }}\n"
        "bc = {{ from = \"b\", to = \"c\", section = \"upper\", material = \"m\" }}\n"
        "Bb = {{ from = \"B\", to = \"b\", section = \"rigid\", material = \"m\" }}\n"
        "Cc = {{ from = \"C\", to = \"c\", section = \"rigid\", material = \"m\" }}\n"
        "[supports]\nA = \"fixed\"\na = \"fixed\"\n[cases.load]\nloads = [ {{ node = \"B\", x = 1 }} ]\n",
        2 * unit / 2e11, unit / 2e11, fmt::arg("h", h), fmt::arg("H", 2 * h));
    const std::string masses = fmt::format(
        "[mass]\nmodes = 2\nnodes = {{ B = \"{0} kg\", b = \"{0} kg\", C = \"{1} kg\", c = \"{1} kg\" }}\n", M, M / 2);
    const Solved s(text + masses, 0);
    const double scale = std::sqrt(unit / (M * h * h * h)) / (2 * pi);
    const Row row(Group::frequencies, "two-storey shear frame",
                  "I. A. Karnovsky, O. Lebed, Advanced Methods of Structural Analysis, 2010, Problem 14.10");
    check_frequency(row, s, 1, std::sqrt(12.0) * scale);
    check_frequency(row, s, 2, std::sqrt(48.0) * scale);
    row.check("w1 over sqrt(E I/(M h^3)), as printed", 3.4641, frequency(s, 1) / scale, printed(1e-4));
    row.check("w2 over sqrt(E I/(M h^3)), as printed", 6.9282, frequency(s, 2) / scale, printed(1e-4));
    // Equal storeys of the mode shapes (1, 2) and (1, -1) with masses 2 M, M: (4 M)^2/(6 M) and M^2/(3 M).
    row.check("effective mass x of mode 1, kg", 16 * M / 6, effective(s, 1, 'x'), finely_cut);
    row.check("effective mass x of mode 2, kg", M / 3, effective(s, 2, 'x'), finely_cut);
    row.check("modal mass of mode 1, kg", 1.5 * M, modal_mass(s, 1), finely_cut);
    row.check("modal mass of mode 2, kg", 3 * M, modal_mass(s, 2), finely_cut);
}

TEST_CASE("modal and effective masses of uniform beams") {
    const Solved simple = vibrate({{L}, {pinned, roller}, {mass_load("AB")}, stiff_axially}, 5);
    const Row row(Group::frequencies, "masses of the modes of a simple beam, shapes sin(n pi x/L)");
    for (int n = 1; n <= 5; ++n) {
        row.check(fmt::format("modal mass {}, kg", n), m * L / 2, modal_mass(simple, n), finely_cut);
        if (n % 2 == 1)
            row.check(fmt::format("effective mass y {}, kg", n), 8 / (n * n * pi * pi) * m * L,
                      effective(simple, n, 'y'), finely_cut);
        else
            row.check_zero(fmt::format("effective mass y {}, kg", n), effective(simple, n, 'y'), m * L);
        row.check_zero(fmt::format("effective mass x {}, kg", n), effective(simple, n, 'x'), m * L);
    }
    CHECK(simple.json().text("/modes/0/largest/member") == "AB");
    row.check("place of the largest movement of mode 1, m", L / 2, simple.json()("/modes/0/largest/at"), finely_cut);
    // Fixed-free: cosh - cos - s (sinh - sin), s = (sinh l - sin l)/(cosh l + cos l): 2 at the tip, mean 2 s/l.
    const double l = 1.87510406871, s = (std::sinh(l) - std::sin(l)) / (std::cosh(l) + std::cos(l));
    const double participating = 4 * s * s / (l * l) * m * L;
    const Solved cantilever = vibrate({{L}, {fixed, none}, {mass_load("AB")}, stiff_axially}, 1);
    const Row row2(Group::frequencies, "masses of the first mode of a cantilever");
    row2.check("modal mass, kg", m * L / 4, modal_mass(cantilever, 1), finely_cut);
    row2.check("effective mass y, kg", participating, effective(cantilever, 1, 'y'), finely_cut);
    // Fixed-fixed: cosh - cos - s (sinh - sin), s = (cosh l - cos l)/(sinh l - sin l), largest at midspan, mean
    // square 1.
    const double k = 4.73004074486, t = (std::cosh(k) - std::cos(k)) / (std::sinh(k) - std::sin(k));
    const double top = std::cosh(k / 2) - std::cos(k / 2) - t * (std::sinh(k / 2) - std::sin(k / 2));
    const Solved clamped = vibrate({{L}, {fixed, fixed}, {mass_load("AB")}, stiff_axially}, 1);
    const Row row3(Group::frequencies, "masses of the first mode of a fixed beam");
    row3.check("modal mass, kg", m * L / (top * top), modal_mass(clamped, 1), finely_cut);
    row3.check("effective mass y, kg", 16 * t * t / (k * k) * m * L, effective(clamped, 1, 'y'), finely_cut);
    // The cantilever turned by 30 deg, on turned supports: its mass moves across it.
    const Solved turned(header(stiff_axially) +
                            fmt::format("[nodes]\nA = [1, 2]\nB = [{}, {}]\n[members]\nAB = {{ from = \"A\", to = "
                                        "\"B\", section = \"bar\", material = \"m\" }}\n[supports]\nA = {{ x = "
                                        "\"fixed\", y = \"fixed\", rotation = \"fixed\", angle = \"30 deg\" }}\n",
                                        1 + L * std::cos(pi / 6), 2 + L * std::sin(pi / 6)) +
                            load_case({mass_load("AB")}) + mass_table(1),
                        0);
    const Row row4(Group::frequencies, "the cantilever at 30 deg");
    check_frequency(row4, turned, 1, frequency_of(l));
    row4.check("effective mass x, kg", participating / 4, effective(turned, 1, 'x'), finely_cut);
    row4.check("effective mass y, kg", participating * 3 / 4, effective(turned, 1, 'y'), finely_cut);
}

TEST_CASE("where the flexibility of a mode lies") {
    // One mass at midspan of a beam without mass on springs k1, k2: energies of the static shape under P,
    // (P/2)^2/(2 k) and P^2 L^3/(96 E I).
    const double k1 = 2e6, k2 = 5e6, M = 3000;
    const double one = 1 / (8 * k1), two = 1 / (8 * k2), bending = L * L * L / (96 * EI);
    const std::string left = fmt::format("{{ x = \"fixed\", y = {} }}", k1 / 1000);
    const Solved s(
        text({{L / 2, L / 2}, {left, none, spring_y(k2 / 1000)}, {force("B", M * g / 1000)}, stiff_axially}) +
            mass_table(1),
        0);
    const Row row(Group::frequencies, "mass on a beam on springs, statics by hand");
    check_frequency(row, s, 1, std::sqrt(1 / (2 * M * (one + two + bending))) / (2 * pi), exact);
    const double all = one + two + bending;
    const auto share = [&s](int entry) { return s.json()(fmt::format("/modes/0/flexibility/{}/share", entry)); };
    CHECK(s.json().text("/modes/0/flexibility/0/member") == "AB");
    CHECK(s.json().text("/modes/0/flexibility/2/support") == "A");
    CHECK(s.json().text("/modes/0/largest/member") == "AB"); // the left spring is the softer one
    row.check("share of strain energy in the left half", bending / 2 / all, share(0), exact);
    row.check("share of strain energy in the right half", bending / 2 / all, share(1), exact);
    row.check("share of strain energy in the left spring", one / all, share(2), exact);
    row.check("share of strain energy in the right spring", two / all, share(3), exact);
}
