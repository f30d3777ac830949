// Every worked model in models/ runs, and gives a figure that can be found by hand from equilibrium or a textbook
// formula. Figures below are in kN and kN m, as an engineer would write them; the results are in N and N m.

#include <cmath>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <set>
#include <string>
#include <string_view>
#include <vector>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "run_model.hpp"

namespace {

constexpr double g = 9.80665; // m/s2

std::filesystem::path models_folder() { return std::filesystem::path(GROUNDSILL_SOURCE_DIR) / "models"; }

test::Result run_worked_model(std::string_view name) {
    std::ifstream file(models_folder() / fmt::format("{}.toml", name));
    REQUIRE(file);
    test::Result result = test::run(std::string(std::istreambuf_iterator<char>(file), {}));
    CHECK(result.size("/diagnostics/warnings") == 0);
    CHECK(result("/diagnostics/equilibrium") < 1e-12);
    CHECK(result("/diagnostics/residual") < 1e-12);
    return result;
}

doctest::Approx close_to(double value) { return doctest::Approx(value).epsilon(1e-9); }

double reaction(const test::Result& result, std::string_view load_case, std::string_view node, std::string_view part) {
    return result(fmt::format("/cases/{}/reactions/{}/{}", load_case, node, part)) / 1e3;
}

double total(const test::Result& result, std::string_view load_case, const std::vector<std::string>& nodes,
             std::string_view part) {
    double sum = 0;
    for (const std::string& node : nodes) sum += reaction(result, load_case, node, part);
    return sum;
}

double force(const test::Result& result, std::string_view load_case, std::string_view member, std::string_view part,
             double at) {
    return result.place(fmt::format("cases/{}", load_case), member, part, at) / 1e3;
}

} // namespace

TEST_CASE("every worked model has a check of its own below") {
    const std::set<std::string> checked{"net-loft-floor",    "crane-shed-grade-beam",    "ferry-hall-portal",
                                        "smokehouse-lintel", "boat-hall-pitched-portal", "cannery-gallery-us",
                                        "lock-footbridge",   "mast-store-girder",        "grain-store-frame"};
    std::set<std::string> found;
    for (const auto& entry : std::filesystem::directory_iterator(models_folder())) {
        if (entry.path().extension() == ".toml") found.insert(entry.path().stem().string());
    }
    CHECK(found == checked);
}

TEST_CASE("net loft: the columns carry the floor, and the settlement obeys the three-moment equation") {
    const test::Result result = run_worked_model("net-loft-floor");
    const std::vector<std::string> columns{"A", "B", "C", "D"};

    // 6 kN/m and the beam's own 53.81 cm2 of steel on 17.5 m.
    const double dead = 17.5 * (6 + 53.81e-4 * 7850 * g / 1e3);
    CHECK(total(result, "dead", columns, "y") == close_to(dead));

    // C goes down by d; spans a = 5.5, b = 6.5, a (three-moment equation, Clapeyron 1857):
    //   2 (a + b) MB + b MC = -6 EI d/b,    b MB + 2 (a + b) MC = 6 EI d (1/b + 1/a)
    const double a = 5.5;
    const double b = 6.5;
    const double EId = 210e6 * 8356e-8 * 0.018;
    const double determinant = 4 * (a + b) * (a + b) - b * b;
    const double right_b = -6 * EId / b;
    const double right_c = 6 * EId * (1 / b + 1 / a);
    CHECK(force(result, "sunk", "floor.1", "M", a) ==
          close_to((2 * (a + b) * right_b - b * right_c) / determinant)); // -20.86 kN m
    CHECK(force(result, "sunk", "floor.2", "M", b) ==
          close_to((2 * (a + b) * right_c - b * right_b) / determinant)); // +32.15 kN m
}

TEST_CASE("crane shed: the pile pairs balance the loads") {
    const test::Result result = run_worked_model("crane-shed-grade-beam");
    const std::vector<std::string> piles{"P1", "P2", "P3", "P4"};
    CHECK(total(result, "dead", piles, "y") == close_to(0.5 * 0.7 * 2500 * g / 1e3 * 12 + 14 * 11 + 2 * 85));
    CHECK(total(result, "crane", piles, "y") == close_to(130));
    // Moments about P1: 130 kN at 9 m and 24 kN m clockwise.
    const double about_first = 4 * reaction(result, "crane", "P2", "y") + 8 * reaction(result, "crane", "P3", "y") +
                               12 * reaction(result, "crane", "P4", "y");
    CHECK(about_first == close_to(130 * 9 + 24));
    // The soft pair by its own spring.
    CHECK(reaction(result, "crane", "P3", "y") == close_to(-30000 * result("/cases/crane/displacements/P3/y")));
}

TEST_CASE("ferry hall: the feet hold the gale's overturning and uplift") {
    const test::Result result = run_worked_model("ferry-hall-portal");
    CHECK(total(result, "gale", {"foot_left", "foot_right"}, "x") == close_to(-(4.0 + 2.5) * 4.5));
    // About the left foot: (4.0 + 2.5) 4.5^2/2 - 3.5 * 12^2/2 = 12 V.
    CHECK(reaction(result, "gale", "foot_right", "y") == close_to((6.5 * 4.5 * 4.5 / 2 - 3.5 * 72) / 12));
    CHECK(reaction(result, "snow", "foot_left", "y") == close_to(6.0 * 12 / 2));
}

TEST_CASE("cannery in US units: statics of the overhanging gallery") {
    const test::Result result = run_worked_model("cannery-gallery-us");
    const double kip = 4.4482216152605; // kN
    // 0.9 kip/ft on 30 ft and 4.5 kip at its end; about F: 24 R = 27 * 15 + 4.5 * 30.
    CHECK(reaction(result, "belt", "G", "y") == close_to(22.5 * kip));
    CHECK(reaction(result, "belt", "F", "y") == close_to(9.0 * kip));
    // The post's top moment over the quay: 6 ft of overhang.
    CHECK(force(result, "belt", "JK", "M", 0) == close_to(-(0.9 * 18 + 4.5 * 6) * kip * 0.3048));
}

TEST_CASE("boat hall: symmetric snow, and the moment at the ridge from the forces at the foot") {
    const test::Result result = run_worked_model("boat-hall-pitched-portal");
    const double V = 4.5 * 9;
    CHECK(reaction(result, "snow", "A", "y") == close_to(V));
    CHECK(reaction(result, "snow", "E", "y") == close_to(V));
    // The left half cut at the ridge: M = MA - H 7.6 + V 9 - w 9^2/2, with MA against the reaction's sense.
    const double H = reaction(result, "snow", "A", "x");
    const double MA = -reaction(result, "snow", "A", "moment");
    CHECK(force(result, "snow", "BC", "M", std::hypot(9.0, 2.4)) == close_to(MA - H * 7.6 + V * 9 - 4.5 * 81 / 2));
}

TEST_CASE("smokehouse: propped cantilever under a temperature gradient") {
    const test::Result result = run_worked_model("smokehouse-lintel");
    // M = 3 EI alpha dT/(2 h), R = M/L (Gere, Mechanics of Materials, 7th edition, problem 10.5-2); cracked: half of E
    // I.
    const double EI = 0.5 * 30e6 * 0.22 * 0.22 * 0.22 / 12;
    const double M = 3 * EI * 10e-6 * (28 - 4) / (2 * 0.22);
    CHECK(force(result, "fire_lit", "strip", "M", 0) == close_to(M));
    CHECK(reaction(result, "fire_lit", "yard", "y") == close_to(M / 4.8));
}

TEST_CASE("lock footbridge: determinate, so a sinking pier moves it and strains nothing") {
    const test::Result result = run_worked_model("lock-footbridge");
    // The drop-in span of 7 m hangs 3.5 w on each arm of 2.5 m.
    const double M = -5 * (2.5 * 2.5 / 2 + 3.5 * 2.5);
    CHECK(force(result, "deck", "bridge.1", "M", 9) == close_to(M));
    CHECK(reaction(result, "deck", "west_bank", "y") == close_to(5 * 4.5 + M / 9));
    // With the hinges stiff it would be 6 EI d/L^2 or 20 kN m: what is left is round-off of that.
    CHECK(std::abs(force(result, "pier_sinks", "bridge.1", "M", 9)) < 1e-9 * 20);
    // The east arm turns about its bank: its hinge goes down by 30 * 11.5/9; 0.5 m before it, on the drop-in
    // span, 6.5/7.
    CHECK(result.place("cases/pier_sinks", "bridge.2", "across", 9) == close_to(-0.030 * 11.5 / 9 * 6.5 / 7));
}

TEST_CASE("mast store: bar forces by the method of sections") {
    const test::Result result = run_worked_model("mast-store-girder");
    CHECK(force(result, "masts", "B2B3", "N", 0) == close_to((45 * 4 - 18 * 2) / 1.5));           // about T2
    CHECK(force(result, "masts", "T2T3", "N", 0) == close_to(-(45 * 6 - 18 * 4 - 18 * 2) / 1.5)); // about B3
    // Unit-load theorem: 1 kN at B3 puts 0.5 * 4/1.5 into the bar that is 3 mm too long.
    CHECK(result("/cases/tight/displacements/B3/y") == close_to(-0.003 * 0.5 * 4 / 1.5));
    // No joint has a rotation: all its bars are released.
    CHECK_FALSE(result.has("/cases/masts/displacements/B3/rotation"));
}

TEST_CASE("grain store: base shear and weight of a frame of 102 members") {
    const test::Result result = run_worked_model("grain-store-frame");
    const std::vector<std::string> feet{"a0", "b0", "c0", "d0", "e0", "f0", "g0", "h0", "i0"};
    CHECK(result.size("/cases/wind/members") == 102);
    CHECK(total(result, "wind", feet, "x") == close_to(-(5 * 17 + 9)));
    CHECK(total(result, "grain", feet, "y") == close_to(5 * 22 * 8 * 5.4));
}
