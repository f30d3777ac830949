// Natural frequencies on random frames: against a dense solution, bounds by Dunkerley and Rayleigh, and changes that
// change nothing.

#include "dense_modes.hpp"
#include "frame_text.hpp"
#include "random_frames.hpp"
#include "transformations.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "run_model.hpp"

using namespace reference;

namespace {

constexpr double pi = std::numbers::pi;
constexpr double gravity = 9.80665;
constexpr int asked = 6;

std::size_t index(int i) { return static_cast<std::size_t>(i); }

/// A frame with what has mass on it: all its cases, strains too (which have none), and a few nodes.
struct Vibrating {
    Frame frame;
    Masses masses;
};

Vibrating random_vibrating(std::uint64_t seed) {
    Vibrating result{random_frame(seed), {}};
    Dice dice(seed + 4711);
    result.masses.cases = {{0, dice.between(0, 1)}, {1, 1}, {2, dice.between(0.5, 1.5)}};
    const int count = dice.whole(0, 2);
    for (int i = 0; i < count; ++i) {
        const int node = dice.whole(0, static_cast<int>(result.frame.nodes.size()) - 1);
        const bool twice = i == 1 && node == result.masses.nodes[0].first;
        if (!twice) result.masses.nodes.push_back({node, dice.spread(50, 5000)});
    }
    return result;
}

std::string mass_table(const Frame& frame, const Masses& masses, int modes) {
    std::string cases, nodes;
    for (const auto& [load_case, factor] : masses.cases)
        cases += fmt::format("{}{} = {:.17g}", cases.empty() ? "" : ", ", frame.cases[index(load_case)].name, factor);
    for (const auto& [node, mass] : masses.nodes)
        nodes += fmt::format("{}{} = \"{:.17g} kg\"", nodes.empty() ? "" : ", ", frame.nodes[index(node)].name, mass);
    return fmt::format("[mass]\ncases = {{ {} }}\nnodes = {{ {} }}\nmodes = {}\n", cases, nodes, modes);
}

test::Result program(const Frame& frame, const Masses& masses, int modes = asked) {
    return test::run(model_text(frame, Units::si, mass_table(frame, masses, modes)), 0);
}

std::vector<double> frequencies(const test::Result& result) {
    std::vector<double> all;
    for (int i = 0; i < result.size("/modes"); ++i) all.push_back(result(fmt::format("/modes/{}/frequency", i)));
    return all;
}

void check_same(const std::vector<double>& expected, const std::vector<double>& got, double tolerance,
                const std::string& what) {
    REQUIRE_MESSAGE(expected.size() == got.size(), what);
    for (std::size_t i = 0; i < expected.size(); ++i)
        CHECK_MESSAGE(std::abs(got[i] - expected[i]) <= tolerance * expected[i],
                      fmt::format("{}, mode {}: {:.10g} Hz instead of {:.10g}, {:.2e}", what, i + 1, got[i],
                                  expected[i], got[i] / expected[i] - 1));
}

/// Effective masses add up over modes of nearly one frequency, which may be mixed: compared cluster by cluster.
void check_effective(const std::vector<DenseMode>& expected, const test::Result& got, const std::string& what) {
    double largest = 0;
    for (const DenseMode& mode : expected) largest = std::max({largest, mode.effective_x, mode.effective_y});
    for (std::size_t i = 0; i < expected.size();) {
        double x = 0, y = 0;
        std::size_t k = i;
        for (; k < expected.size() && expected[k].frequency < (k == i ? 1e300 : expected[k - 1].frequency * 1.02);
             ++k) {
            x += expected[k].effective_x - got(fmt::format("/modes/{}/effective_mass/x", k));
            y += expected[k].effective_y - got(fmt::format("/modes/{}/effective_mass/y", k));
        }
        // The last cluster may go on beyond the modes asked for.
        if (k < expected.size())
            CHECK_MESSAGE(std::hypot(x, y) < 1e-3 * largest,
                          fmt::format("{}, effective masses of modes {} to {}: {:.3g}, {:.3g} of {:.3g}", what, i + 1,
                                      k, x, y, largest));
        i = k;
    }
}

void compare(std::uint64_t seed) {
    const Vibrating v = random_vibrating(seed);
    const std::vector<DenseMode> expected = dense_modes(v.frame, v.masses, asked);
    const test::Result result = program(v.frame, v.masses);
    std::vector<double> values;
    for (const DenseMode& mode : expected) values.push_back(mode.frequency);
    const std::string what = fmt::format("seed {}", seed);
    check_same(values, frequencies(result), 1e-4, what);
    CHECK(result("/diagnostics/modes_missed") == 0);
    check_effective(expected, result, what);
}

/// A single member from A to B of 6 m, 0.3 x 0.6 m.
Frame single(const Support& left, const Support& right) {
    Frame frame;
    frame.materials = {{30e9, 12.5e9, 2500, 0}};
    Section section;
    section.A = 0.18;
    section.I = 0.0054;
    section.depth = 0.6;
    section.shear_area = 0.15;
    frame.sections = {section};
    frame.nodes = {{"A", 0, 0}, {"B", 6, 0}};
    frame.members = {{"AB", 0, 1, 0, 0, {}, {}, 1, {}}};
    frame.supports = {left, right};
    Load weight;
    weight.kind = Load::Kind::self_weight;
    weight.amount = 1;
    frame.cases = {{"dead", {weight}}};
    return frame;
}

const Support pin{0, {rigid(), rigid(), free()}, 0};
const Support roller{1, {free(), rigid(), free()}, 0};

} // namespace

TEST_SUITE("quick") {
    TEST_CASE("the dense solution itself: closed forms") {
        // Timoshenko beam on two supports: a w^4 - b w^2 + c = 0; along it c/(4 L).
        Frame frame = single(pin, roller);
        const double E = 30e9, G = 12.5e9, rho = 2500, A = 0.18, I = 0.0054, kappa = 5.0 / 6, L = 6;
        std::vector<double> expected{std::sqrt(E / rho) / (4 * L)};
        for (int n = 1; n <= 3; ++n) {
            const double k = n * pi / L;
            const double a = rho * rho / (kappa * G * E);
            const double b = rho * A / (E * I) + k * k * rho / E * (1 + E / (kappa * G));
            const double c = std::pow(k, 4);
            expected.push_back(std::sqrt((b - std::sqrt(b * b - 4 * a * c)) / (2 * a)) / (2 * pi));
        }
        std::ranges::sort(expected);
        const std::vector<DenseMode> modes = dense_modes(frame, {{{0, 1}}, {}}, 4);
        for (std::size_t i = 0; i < 4; ++i) CHECK(modes[i].frequency == doctest::Approx(expected[i]).epsilon(1e-9));
        // Euler-Bernoulli: (n pi/L)^2 sqrt(E I/m)/(2 pi), and 8/(n pi)^2 of the mass in mode 1.
        frame.sections[0].shear_area = 0;
        const std::vector<DenseMode> slender = dense_modes(frame, {{{0, 1}}, {}}, 1);
        const double first = std::pow(pi / L, 2) * std::sqrt(E * I / (rho * A)) / (2 * pi);
        CHECK(slender[0].frequency == doctest::Approx(first).epsilon(1e-9));
        CHECK(slender[0].effective_y == doctest::Approx(8 / (pi * pi) * rho * A * L).epsilon(1e-9));
    }

    TEST_CASE("20 random frames agree with the dense solution") {
        for (std::uint64_t seed = 1; seed <= 20; ++seed) compare(seed);
    }
}

TEST_SUITE("full") {
    TEST_CASE("the dense solution itself: higher degrees change nothing") {
        for (std::uint64_t seed = 1; seed <= 15; ++seed) {
            const Vibrating v = random_vibrating(seed);
            const std::vector<DenseMode> some = dense_modes(v.frame, v.masses, asked);
            const std::vector<DenseMode> more = dense_modes(v.frame, v.masses, asked, 3);
            REQUIRE(some.size() == more.size());
            for (std::size_t i = 0; i < some.size(); ++i)
                CHECK(some[i].frequency == doctest::Approx(more[i].frequency).epsilon(1e-6));
        }
    }

    TEST_CASE("180 further random frames agree with the dense solution") {
        for (std::uint64_t seed = 21; seed <= 200; ++seed) compare(seed);
    }

    TEST_CASE("a member cut in two is the same member") {
        for (std::uint64_t seed = 1; seed <= 30; ++seed) {
            const Vibrating v = random_vibrating(seed);
            const std::vector<double> whole = frequencies(program(v.frame, v.masses));
            const std::vector<double> cut = frequencies(program(subdivided(v.frame, 2), v.masses));
            check_same(whole, cut, 1e-5, fmt::format("seed {}", seed));
        }
    }

    // A short thick bar has up to 5e10 N/m, so that such a spring gives up to some 1e-4 of what the bar does.
    TEST_CASE("very stiff springs come close to rigid supports, from below") {
        for (std::uint64_t seed = 1; seed <= 30; ++seed) {
            Vibrating v = random_vibrating(seed);
            const std::vector<double> held = frequencies(program(v.frame, v.masses));
            for (Support& support : v.frame.supports)
                for (Joint* joint : {&support.held.first, &support.held.second, &support.held.rotation})
                    if (joint->kind == Joint::Kind::rigid) *joint = spring(1e14);
            const std::vector<double> sprung = frequencies(program(v.frame, v.masses));
            check_same(held, sprung, 1e-4, fmt::format("seed {}", seed));
            for (std::size_t i = 0; i < held.size(); ++i) CHECK(sprung[i] <= held[i] * (1 + 1e-7));
        }
    }
}

namespace {

/// A continuous beam without mass of its own, on rigid or elastic supports, with masses at inner nodes; axially so
/// stiff that its first modes move up and down. A case `weight` for all masses, and `at_n` with 1 N on each.
struct MassyBeam {
    std::string text;
    std::vector<std::pair<std::string, double>> masses;
};

MassyBeam random_massy_beam(std::uint64_t seed) {
    Dice dice(seed + 99);
    const int spans = dice.whole(1, 4);
    std::string nodes = "[nodes]\nn0 = [0, 0]\n", members = "[members]\n", cases, table, weight, supports;
    MassyBeam beam;
    double x = 0;
    int last = 0;
    const auto add_node = [&](double step) {
        x += step;
        ++last;
        nodes += fmt::format("n{} = [{:.17g}, 0]\n", last, x);
        members += fmt::format("m{0} = {{ from = \"n{1}\", to = \"n{0}\", section = \"s\", material = \"q\" }}\n", last,
                               last - 1);
    };
    const auto vertical = [&] {
        return dice.chance(0.4) ? fmt::format("{:.17g}", dice.spread(1e6, 1e9)) : std::string("\"fixed\"");
    };
    supports = fmt::format("[supports]\nn0 = {{ x = \"fixed\", y = {} }}\n", vertical());
    for (int span = 0; span < spans; ++span) {
        const int inner = dice.whole(1, 3);
        for (int i = 0; i < inner; ++i) {
            add_node(dice.between(0.8, 3));
            const std::string name = fmt::format("n{}", last);
            const double mass = dice.spread(100, 5000);
            beam.masses.push_back({name, mass});
            weight += fmt::format("{{ node = \"{}\", y = {:.17g} }}, ", name, -mass * gravity);
            cases += fmt::format("[cases.at_{0}]\nloads = [ {{ node = \"{0}\", y = -1 }} ]\n", name);
            table += fmt::format("{}{} = \"{:.17g} kg\"", table.empty() ? "" : ", ", name, mass);
        }
        add_node(dice.between(0.8, 3));
        supports += fmt::format("n{} = {{ y = {} }}\n", last, vertical());
    }
    beam.text = fmt::format("[units]\nlength = \"m\"\nforce = \"N\"\n[materials.q]\nE = {:.17g}\n[sections.s]\n"
                            "A = 100\nI = {:.17g}\n",
                            dice.spread(1e10, 2e11), dice.spread(1e-5, 1e-3)) +
                nodes + members + supports + cases + "[cases.weight]\nloads = [ " + weight + "]\n" +
                "[mass]\nmodes = 1\nnodes = { " + table + " }\n";
    return beam;
}

} // namespace

TEST_SUITE("quick") {
    TEST_CASE("Dunkerley from below and Rayleigh from above, 200 random beams") {
        for (std::uint64_t seed = 1; seed <= 200; ++seed) {
            const MassyBeam beam = random_massy_beam(seed);
            const test::Result result = test::run(beam.text, 0);
            const double omega = 2 * pi * result("/modes/0/frequency");
            double trace = 0, work = 0, square = 0;
            for (const auto& [node, mass] : beam.masses) {
                trace -= mass * result(fmt::format("/cases/at_{0}/displacements/{0}/y", node));
                const double delta = result(fmt::format("/cases/weight/displacements/{}/y", node));
                work -= gravity * mass * delta;
                square += mass * delta * delta;
            }
            INFO("seed ", seed);
            CHECK(omega * omega * trace >= 1 - 1e-9);           // 1/w_D^2 is the sum of all 1/w_i^2
            CHECK(omega * omega <= work / square * (1 + 1e-9)); // the quotient of any shape is an upper bound
            if (beam.masses.size() > 1) continue;
            CHECK(omega * omega * trace == doctest::Approx(1).epsilon(1e-9)); // one mass: both are exact
            CHECK(omega * omega == doctest::Approx(work / square).epsilon(1e-9));
        }
    }
}
