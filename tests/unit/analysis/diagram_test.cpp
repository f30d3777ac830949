// Diagrams: places, jumps, exact extremes, and the roots behind them.

#include <doctest/doctest.h>

#include <cmath>

#include "analysis/polynomial.hpp"
#include "groundsill/diagram.hpp"

using namespace groundsill;

namespace {

/// A simply supported beam of 8 m with 60 kN at 3 m: V = 37.5, then -22.5 kN; M = 112.5 kN m under the load.
Diagram point_load() {
    Diagram diagram;
    diagram.length = 8;
    DiagramPiece left, right;
    left.to = right.from = 3;
    right.to = 8;
    right.jump = true;
    left.V = {37.5, 0, 0};
    left.M = {0, 37.5, 0, 0};
    right.V = {-22.5, 0, 0};
    right.M = {112.5, -22.5, 0, 0};
    diagram.pieces = {left, right};
    return diagram;
}

} // namespace

TEST_CASE("a jump between two places is listed twice, the value before it first") {
    const std::vector<DiagramPlace> places = point_load().places(4);
    REQUIRE(places.size() == 7);
    CHECK(places[2].at == 3);
    CHECK(places[2].forces.V == 37.5);
    CHECK(places[3].at == 3);
    CHECK(places[3].forces.V == -22.5);
    CHECK(places[3].forces.M == 112.5);
}

TEST_CASE("a jump at a place takes that place's one row and makes it two") {
    const std::vector<DiagramPlace> places = point_load().places(8);
    REQUIRE(places.size() == 10);
    CHECK(places[3].at == 3);
    CHECK(places[4].at == 3);
    CHECK(places[5].at == 4);
}

TEST_CASE("values at a jump can be had from both sides") {
    CHECK(point_load().value(3).forces.V == -22.5);
    CHECK(point_load().value_before(3).forces.V == 37.5);
}

TEST_CASE("extremes are found at turning points and jumps; a plateau gives its first place") {
    const DiagramRange V = point_load().extremes(Curve::V, 1e-9);
    CHECK(V.max.value == 37.5);
    CHECK(V.max.at == 0);
    CHECK(V.min.value == -22.5);
    CHECK(V.min.at == 3);
    const DiagramRange M = point_load().extremes(Curve::M, 1e-9);
    CHECK(M.max.value == 112.5);
    CHECK(M.max.at == 3);
    CHECK(M.min.at == 0);
}

TEST_CASE("the turning point of a parabola is exact") {
    // q = 10 kN/m on 7.3 m: qL²/8 at L/2
    Diagram diagram;
    diagram.length = 7.3;
    DiagramPiece piece;
    piece.to = 7.3;
    piece.V = {36.5, -10, 0};
    piece.M = {0, 36.5, -5, 0};
    diagram.pieces = {piece};
    const DiagramRange M = diagram.extremes(Curve::M, 0);
    CHECK(M.max.value == doctest::Approx(10 * 7.3 * 7.3 / 8).epsilon(1e-15));
    CHECK(M.max.at == doctest::Approx(3.65).epsilon(1e-15));
}

TEST_CASE("roots of a polynomial made from its roots") {
    // (t - 0.5)(t - 1.25)(t - 2)(t - 7), of which three lie inside (0, 3)
    const std::array<double, 5> c = {8.75, -30.125, 30.375, -10.75, 1};
    const auto roots = roots_inside(c, 3.0);
    REQUIRE(roots.count == 3);
    CHECK(roots.values[0] == doctest::Approx(0.5).epsilon(1e-13));
    CHECK(roots.values[1] == doctest::Approx(1.25).epsilon(1e-13));
    CHECK(roots.values[2] == doctest::Approx(2).epsilon(1e-13));
    for (std::size_t k = 0; k < roots.count; ++k) CHECK(std::abs(value_of(c, roots.values[k])) < 1e-12);
}

TEST_CASE("a value that is round-off of its terms is 0") {
    const std::array<double, 3> c = {0.1 + 0.2, -0.3, 0};
    CHECK(value_of(c, 1.0) != 0);
    CHECK(clean_value_of(c, 1.0) == 0);
}
