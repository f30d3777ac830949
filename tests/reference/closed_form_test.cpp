// The reference solution against closed forms: S. P. Timoshenko and J. M. Gere, Mechanics of Materials, and W. C. Young
// and R. G. Budynas, Roark's Formulas for Stress and Strain, 7th ed. 2002, ch. 8 (both from memory).

#include "dense_reference.hpp"
#include "number.hpp"

#include <cmath>
#include <doctest/doctest.h>

using namespace reference;

namespace {

constexpr double E = 2.1e11, G = 8.1e10, A = 5e-3, I = 8e-5, depth = 0.3, L = 6;

Frame beam(double shear_area = 0) {
    Frame frame;
    frame.materials = {{E, G, 7850, 1.2e-5}};
    frame.sections = {{A, I, depth, shear_area, depth / 2, ""}};
    frame.nodes = {{"A", 0, 0}, {"B", L, 0}};
    frame.members = {{"AB", 0, 1, 0, 0, {}, {}, 1, {}}};
    return frame;
}

Load point(double at, double y) {
    Load load;
    load.kind = Load::Kind::point;
    load.a = at;
    load.second_a = y;
    return load;
}

Load uniform(double y) {
    Load load;
    load.kind = Load::Kind::distributed;
    load.whole = true;
    load.second_a = load.second_b = y;
    return load;
}

void check_equal(Quad value, double expected) {
    CHECK(static_cast<double>(value) == doctest::Approx(expected).epsilon(1e-13));
}

} // namespace

TEST_SUITE("quick") {

    TEST_CASE("simply supported beam, uniform load and a shear-flexible section") {
        const double shear_area = 2e-3, q = 8e3;
        Frame frame = beam(shear_area);
        frame.supports = {{0, {rigid(), rigid(), free()}, 0}, {1, {free(), rigid(), free()}, 0}};
        frame.cases = {{"q", {uniform(-q)}}};
        const Reference<Quad> solution(frame);
        check_equal(solution.reaction(0, 0).y, q * L / 2);
        check_equal(solution.place(0, 0, 0, true).V, q * L / 2);
        const auto middle = solution.place(0, 0, L / 2, true);
        check_equal(middle.M, q * L * L / 8);
        check_equal(middle.across, -5 * q * std::pow(L, 4) / (384 * E * I) - q * L * L / (8 * G * shear_area));
        check_equal(solution.movement(0, 1).rotation, q * L * L * L / (24 * E * I));
    }

    TEST_CASE("propped cantilever under a point load") {
        const double P = 30e3, a = 2.5, b = L - a;
        Frame frame = beam();
        frame.supports = {{0, {rigid(), rigid(), rigid()}, 0}, {1, {free(), rigid(), free()}, 0}};
        frame.cases = {{"P", {point(a, -P)}}};
        const Reference<Quad> solution(frame);
        check_equal(solution.reaction(0, 1).y, P * a * a * (3 * L - a) / (2 * L * L * L));
        check_equal(solution.reaction(0, 0).moment, P * b * (L * L - b * b) / (2 * L * L));
        check_equal(solution.place(0, 0, 0, true).M, -P * b * (L * L - b * b) / (2 * L * L));
        check_equal(solution.place(0, 0, a, true).V - solution.place(0, 0, a, false).V, -P);
    }

    TEST_CASE("fixed beam: settlement, temperature and lack of fit") {
        Frame frame = beam();
        frame.supports = {{0, {rigid(), rigid(), rigid()}, 0}, {1, {rigid(), rigid(), rigid()}, 0}};
        Load settlement, heat, fit;
        settlement.kind = Load::Kind::movement;
        settlement.on = 1;
        settlement.second_a = -0.01;
        heat.kind = Load::Kind::temperature;
        heat.top = 30;
        heat.bottom = 10;
        fit.kind = Load::Kind::lack_of_fit;
        fit.amount = 0.002;
        frame.cases = {{"settlement", {settlement}}, {"heat", {heat}}, {"fit", {fit}}};
        const Reference<Quad> solution(frame);
        check_equal(solution.place(0, 0, 0, true).M, -6 * E * I * 0.01 / (L * L));
        check_equal(solution.place(0, 0, L, false).M, 6 * E * I * 0.01 / (L * L));
        check_equal(solution.place(1, 0, L / 3, true).M,
                    E * I * 1.2e-5 * 20 / depth); // the hot top is compressed: sagging moment
        check_equal(solution.place(1, 0, L / 3, true).N, -E * A * 1.2e-5 * 20);
        check_equal(solution.place(2, 0, L / 3, true).N, -E * A * 0.002 / L);
    }

    TEST_CASE("releases, hinges and springs") {
        const double P = 12e3, k = 4e6;
        Frame frame = beam();
        frame.members[0].start.rotation = spring(k);
        frame.supports = {{0, {rigid(), rigid(), rigid()}, 0}};
        frame.cases = {{"P", {point(L, -P)}}};
        check_equal(Reference<Quad>(frame).place(0, 0, L, false).across, -P * L * L * L / (3 * E * I) - P * L / k * L);
        // fixed at both ends with a hinge in the middle and a load on it: two cantilevers share it
        frame = beam();
        frame.members[0].hinges = {L / 2};
        frame.supports = {{0, {rigid(), rigid(), rigid()}, 0}, {1, {rigid(), rigid(), rigid()}, 0}};
        frame.cases = {{"P", {point(L / 2, -P)}}};
        const Reference<Quad> hinged(frame);
        check_equal(hinged.place(0, 0, L / 2, true).across, -P / 2 * std::pow(L / 2, 3) / (3 * E * I));
        check_equal(hinged.reaction(0, 0).moment, P / 2 * L / 2);
        // a beam without an axial hold at the end, pulled there: nothing reaches the far support
        frame.members[0].hinges.clear();
        frame.members[0].end.first = free();
        frame.supports[1].held.first = spring(k);
        frame.cases[0].loads[0].first_a = P;
        check_equal(Reference<Quad>(frame).reaction(0, 0).x, -P);
    }

    TEST_CASE("a turned support and an inclined bar") {
        // bar at 45 degrees from a pin to a roller whose own y is turned by 60 degrees, vertical load: by hand, N from
        // the equilibrium of the node, N (cos 45, sin 45) + R (-sin 60, cos 60) = (0, -P) reversed
        const double P = 10e3, c = std::sqrt(0.5), sine = std::sqrt(3.0) / 2;
        Frame frame = beam();
        frame.nodes[1] = {"B", 3, 3};
        frame.members[0].start.rotation = frame.members[0].end.rotation = free();
        frame.supports = {{0, {rigid(), rigid(), free()}, 0}, {1, {free(), rigid(), free()}, std::acos(0.5)}};
        Load load;
        load.on = 1;
        load.second_a = -P;
        frame.cases = {{"P", {load}}};
        const Reference<Quad> solution(frame);
        // -N c - R sine = 0 and -N c + R/2 - P = 0
        const double R = P / (0.5 + sine);
        check_equal(solution.reaction(0, 1).y, R / 2);
        check_equal(solution.place(0, 0, 1, true).N, -R * sine / c);
    }

    TEST_CASE("plan loads and self-weight of an inclined beam") {
        Frame frame = beam();
        frame.nodes[1] = {"B", 4, 3};
        frame.supports = {{0, {rigid(), rigid(), free()}, 0}, {1, {free(), rigid(), free()}, 0}};
        Load snow = uniform(-5e3);
        snow.axes = Load::Axes::plan;
        Load weight;
        weight.kind = Load::Kind::self_weight;
        weight.amount = 1;
        frame.cases = {{"snow", {snow}}, {"weight", {weight}}};
        const Reference<Quad> solution(frame);
        check_equal(solution.reaction(0, 1).y, 5e3 * 4 / 2);
        check_equal(solution.place(0, 0, 2.5, true).M, 5e3 * 4 * 4 / 8);
        check_equal(solution.reaction(1, 1).y, 7850 * A * 9.80665 * 5 / 2);
    }
}
