// Section properties of shapes.
//
// Sources: EN 10365 tables of IPE, HE and UB sections (from memory) for the I with root radii; EN 10219 and EN 10210
// tables of hollow sections (from memory) for the pipe; hand calculations with whole numbers for the others.

#include <cmath>
#include <limits>
#include <string>

#include <doctest/doctest.h>

#include "model/shapes.hpp"

using groundsill::section_of_shape;
using groundsill::ShapeDimensions;
using groundsill::ShapeProperties;

namespace {

ShapeProperties properties(const ShapeDimensions& dimensions) {
    std::string error;
    const auto section = section_of_shape(dimensions, error);
    REQUIRE_MESSAGE(section.has_value(), error);
    CHECK(error.empty());
    return *section;
}

std::string refusal(const ShapeDimensions& dimensions) {
    std::string error;
    CHECK_FALSE(section_of_shape(dimensions, error).has_value());
    return error;
}

bool contains(const std::string& text, const std::string& part) { return text.find(part) != std::string::npos; }

/// Equal to 12 digits: closed forms have nothing but round-off.
doctest::Approx exactly(double value) { return doctest::Approx(value).epsilon(1e-12).scale(0); }

/// Equal to a table that gives four digits.
doctest::Approx to_four_digits(double value) { return doctest::Approx(value).epsilon(6e-4).scale(0); }

constexpr double mm = 1e-3;

} // namespace

TEST_CASE("rectangle: b h, b h^3/12, 5/6 of the area") {
    const auto s = properties({.shape = "rectangle", .width = 0.6, .depth = 0.75});
    CHECK(s.A == exactly(0.45));
    CHECK(s.I == exactly(0.02109375));
    CHECK(s.shear_area == exactly(0.375));
    CHECK(s.depth == 0.75);
    CHECK(s.top == exactly(0.375));
    CHECK(s.bottom == exactly(0.375));
}

TEST_CASE("circle: pi D^2/4, pi D^4/64, 9/10 of the area") {
    const auto s = properties({.shape = "circle", .diameter = 2});
    CHECK(s.A == exactly(std::acos(-1.0)));
    CHECK(s.I == exactly(std::acos(-1.0) / 4));
    CHECK(s.shear_area == exactly(0.9 * std::acos(-1.0)));
    CHECK(s.top == exactly(1));
}

TEST_CASE("pipe 168.3 x 5: table of EN 10219, from memory") {
    const auto s = properties({.shape = "pipe", .diameter = 168.3 * mm, .wall = 5 * mm});
    CHECK(s.A * 1e4 == doctest::Approx(25.7).epsilon(0.003).scale(0));
    CHECK(s.I * 1e8 == to_four_digits(856));
    CHECK(s.shear_area == exactly(s.A / 2));
}

TEST_CASE("a foil-thin pipe keeps its digits: I tends to pi t D^3/8") {
    // With t = 1e-9 D the next terms of the series are relative 3 t/D and 4 (t/D)^2: I = pi t D^3/8 (1 - 3 t/D + ...).
    const double t = 1e-9;
    const auto s = properties({.shape = "pipe", .diameter = 1, .wall = t});
    CHECK(s.A == exactly(std::acos(-1.0) * t * (1 - t)));
    CHECK(s.I == exactly(std::acos(-1.0) * t / 8 * (1 - 3 * t)));
}

TEST_CASE("box 200 x 300 x 10 mm: outer rectangle less the inner one") {
    const auto s = properties({.shape = "box", .width = 200 * mm, .depth = 300 * mm, .wall = 10 * mm});
    CHECK(s.A == exactly((200 * 300 - 180 * 280) * 1e-6));
    CHECK(s.I == exactly((200.0 * 27e6 - 180.0 * 21952000) / 12 * 1e-12));
    CHECK(s.shear_area == exactly(2 * 300 * 10 * 1e-6));
}

TEST_CASE("i with root radii: tables of EN 10365, from memory") {
    struct Row {
        double h, b, tw, tf, r, A_cm2, I_cm4;
    };
    const Row rows[] = {{200, 100, 5.6, 8.5, 12, 28.48, 1943},
                        {300, 150, 7.1, 10.7, 15, 53.81, 8356},
                        {400, 180, 8.6, 13.5, 21, 84.46, 23130},
                        {190, 200, 6.5, 10, 18, 53.83, 3692},
                        {300, 300, 11, 19, 27, 149.1, 25170}};
    for (const Row& row : rows) {
        CAPTURE(row.h);
        const auto s = properties({.shape = "i",
                                   .width = row.b * mm,
                                   .depth = row.h * mm,
                                   .web = row.tw * mm,
                                   .flange = row.tf * mm,
                                   .root = row.r * mm});
        CHECK(s.A * 1e4 == to_four_digits(row.A_cm2));
        CHECK(s.I * 1e8 == to_four_digits(row.I_cm4));
        CHECK(s.shear_area == exactly(row.h * row.tw * 1e-6));
        CHECK(s.top == exactly(row.h / 2 * mm));
    }
}

TEST_CASE("i without root radii: outer rectangle less the two inner ones") {
    const auto s = properties({.shape = "i", .width = 0.2, .depth = 0.4, .web = 0.01, .flange = 0.02});
    CHECK(s.A == exactly(0.2 * 0.4 - 0.19 * 0.36));
    CHECK(s.I == exactly((0.2 * 0.064 - 0.19 * 0.046656) / 12));
}

TEST_CASE("channel: as the i, with two fillets") {
    const ShapeDimensions sharp{.shape = "channel", .width = 0.2, .depth = 0.4, .web = 0.01, .flange = 0.02};
    CHECK(properties(sharp).A == exactly(0.2 * 0.4 - 0.19 * 0.36));
    CHECK(properties(sharp).I == exactly((0.2 * 0.064 - 0.19 * 0.046656) / 12));

    auto rounded = sharp;
    rounded.root = 0.015;
    auto rounded_i = rounded;
    rounded_i.shape = "i";
    CHECK(properties(rounded).A - properties(sharp).A ==
          doctest::Approx((properties(rounded_i).A - properties(sharp).A) / 2).epsilon(1e-9).scale(0));
}

TEST_CASE("tee 100 x 120 x 20 mm: centroid 40 mm below the top of the flange") {
    // Two areas of 2000 mm2, centroids 10 and 70 mm below the top: I = 100 20^3/12 + 20 100^3/12 + 2 (2000 30^2) mm4.
    const auto s =
        properties({.shape = "tee", .width = 100 * mm, .depth = 120 * mm, .web = 20 * mm, .flange = 20 * mm});
    CHECK(s.A == exactly(4000e-6));
    CHECK(s.top == exactly(40 * mm));
    CHECK(s.bottom == exactly(80 * mm));
    CHECK(s.I == exactly(16e6 / 3 * 1e-12));
    CHECK(s.shear_area == exactly(2400e-6));
}

TEST_CASE("impossible dimensions are refused with a way out") {
    CHECK(contains(refusal({.shape = "pipe", .diameter = 0.1, .wall = 0.05}), "half its diameter"));
    CHECK(contains(refusal({.shape = "box", .width = 0.2, .depth = 0.1, .wall = 0.05}),
                   "half its width and half its depth"));
    CHECK(contains(refusal({.shape = "box", .width = 0.1, .depth = 0.2, .wall = 0.05}),
                   "half its width and half its depth"));
    CHECK(contains(refusal({.shape = "i", .width = 0.1, .depth = 0.2, .web = 0.11, .flange = 0.01}),
                   "wider than the flanges"));
    CHECK(contains(refusal({.shape = "i", .width = 0.1, .depth = 0.2, .web = 0.01, .flange = 0.1}), "half the depth"));
    CHECK(contains(refusal({.shape = "i", .width = 0.1, .depth = 0.2, .web = 0.01, .flange = 0.01, .root = 0.046}),
                   "root"));
    CHECK(contains(refusal({.shape = "i", .width = 0.1, .depth = 0.2, .web = 0.01, .flange = 0.01, .root = -0.01}),
                   "root"));
    CHECK(contains(refusal({.shape = "tee", .width = 0.1, .depth = 0.2, .web = 0.2, .flange = 0.01}),
                   "wider than its flange"));
    CHECK(contains(refusal({.shape = "tee", .width = 0.1, .depth = 0.2, .web = 0.01, .flange = 0.2}), "whole depth"));
    CHECK(contains(refusal({.shape = "channel", .width = 0.1, .depth = 0.2, .web = 0.2, .flange = 0.01}), "wider"));
    CHECK(contains(refusal({.shape = "hexagon"}), "take rectangle, circle"));
}

TEST_CASE("each dimension of each shape must be a length above 0") {
    const ShapeDimensions good[] = {
        {.shape = "rectangle", .width = 0.2, .depth = 0.3},
        {.shape = "circle", .diameter = 0.2},
        {.shape = "pipe", .diameter = 0.2, .wall = 0.01},
        {.shape = "box", .width = 0.2, .depth = 0.3, .wall = 0.01},
        {.shape = "i", .width = 0.2, .depth = 0.3, .web = 0.01, .flange = 0.01},
        {.shape = "tee", .width = 0.2, .depth = 0.3, .web = 0.01, .flange = 0.01},
        {.shape = "channel", .width = 0.2, .depth = 0.3, .web = 0.01, .flange = 0.01},
    };
    double ShapeDimensions::*const fields[] = {&ShapeDimensions::width,    &ShapeDimensions::depth,
                                               &ShapeDimensions::diameter, &ShapeDimensions::wall,
                                               &ShapeDimensions::web,      &ShapeDimensions::flange};
    for (const ShapeDimensions& shape : good) {
        CAPTURE(shape.shape);
        properties(shape);
        for (const auto field : fields) {
            if (shape.*field == 0) continue;
            for (const double bad : {0.0, -0.1, std::nan(""), std::numeric_limits<double>::infinity()}) {
                auto spoilt = shape;
                spoilt.*field = bad;
                CHECK(contains(refusal(spoilt), "must be a length above 0"));
            }
        }
    }
}

TEST_CASE("dimensions beyond the range of numbers are refused") {
    CHECK(contains(refusal({.shape = "rectangle", .width = 1e200, .depth = 1e200}), "check their units"));
    CHECK(contains(refusal({.shape = "circle", .diameter = 1e-100}), "check their units"));
}
