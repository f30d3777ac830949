// Timber floors by EN 1995-1-1 7.3.3.
//
// Worked by hand from the standard's formulas (those of n_40 and of the UK National Annex from memory): joists 45 x 220
// at 400 mm, E = 11 GPa, span 4 m, floor 5 m wide, deck 22 mm of E = 4.9 GPa, 55 kg/m2.

#include <cmath>

#include "floor_support.hpp"

using namespace groundsill;

namespace {

constexpr double mm_per_kN = 1e-6;
constexpr double joist_EI = 11e9 * 0.045 * 0.220 * 0.220 * 0.220 / 12;          // (EI)_l = 1.09808e6 N m2/m
const double first_frequency = std::acos(-1.0) / 32 * std::sqrt(joist_EI / 22); // pi/(2 l^2) sqrt(EI/m) = 13.87186 Hz

FloorModel timber_floor() {
    FloorModel floor;
    floor.members = {0};
    floor.methods = {FloorMethod::en1995};
    floor.use = "residential";
    floor.spacing = 0.4;
    floor.timber = FloorModel::Timber{.width = 5,
                                      .transverse = 4.9e9 * 0.022 * 0.022 * 0.022 / 12,
                                      .deflection_limit = 1.8 * mm_per_kN,
                                      .velocity_limit = 120};
    return floor;
}

FloorInput joist() {
    FloorInput input;
    input.modes = {{.frequency = first_frequency, .modal_mass = 44, .vertical = 1, .is_vertical = true}};
    input.span = 4;
    input.bending_stiffness = joist_EI;
    input.mass_per_length = 55 * 0.4;
    input.point_deflection = 64 / (48 * joist_EI); // l^3/(48 EI)
    return input;
}

FloorResult screened(const FloorModel& floor, const FloorInput& input) {
    REQUIRE(check_floor(floor).empty());
    return screen_floor(floor, input).front();
}

} // namespace

TEST_CASE("EN 1995: the joists by hand, damping 0.01: the velocity governs and fails") {
    const auto result = screened(timber_floor(), joist());
    check_digits(step(result, "EI_l") / 1e6, 1.09808, 1e-5);
    check_digits(step(result, "EI_b"), 4347.93, 1e-2);
    check_digits(step(result, "f_1_simple"), 13.87186, 1e-5);
    check_digits(step(result, "n_40"), 8.19498, 1e-5);
    check_digits(step(result, "v"), 0.0163600, 1e-7);
    CHECK(step(result, "zeta") == 0.01);
    check_digits(step(result, "v_limit"), 0.0161897, 1e-7);
    CHECK(result.criterion == "unit impulse velocity response");
    CHECK(result.value == step(result, "v"));
    CHECK(result.limit == step(result, "v_limit"));
    CHECK_FALSE(result.passed);
    CHECK(result.warnings.empty());
}

TEST_CASE("EN 1995: the same with the damping 0.02 of the UK Annex passes") {
    FloorModel floor = timber_floor();
    floor.damping = 0.02;
    const auto result = screened(floor, joist());
    check_digits(step(result, "v_limit"), 0.0314529, 1e-7);
    CHECK(result.passed);
    CHECK(result.utilisation.value() ==
          doctest::Approx(8 / first_frequency).epsilon(1e-14)); // the frequency is nearest to its limit
}

TEST_CASE("EN 1995: deflection under 1 kN with the load distribution of the UK Annex") {
    const auto result = screened(timber_floor(), joist());
    check_digits(step(result, "k_dist"), 0.310707, 1e-6);
    CHECK(step(result, "k_amp") == 1.05);
    check_digits(step(result, "w") / mm_per_kN, 0.990345, 1e-6);
    FloorInput with_shear = joist();
    with_shear.shear_flexible = true;
    CHECK(step(screened(timber_floor(), with_shear), "k_amp") == 1);
}

TEST_CASE("EN 1995: a stiff deck spreads the load to 0.30 at the least") {
    FloorModel floor = timber_floor();
    floor.timber->transverse = 1e6;
    CHECK(step(screened(floor, joist()), "k_dist") == 0.30);
}

TEST_CASE("EN 1995: the deflection governs against a hard limit") {
    FloorModel floor = timber_floor();
    floor.timber->deflection_limit = 0.5 * mm_per_kN;
    const auto result = screened(floor, joist());
    CHECK(result.criterion == "deflection under a unit force");
    CHECK(result.utilisation.value() == doctest::Approx(0.990345 / 0.5).epsilon(1e-6));
    CHECK_FALSE(result.passed);
}

TEST_CASE("EN 1995: limits of the UK Annex where none is given") {
    FloorModel floor = timber_floor();
    floor.timber->deflection_limit.reset();
    floor.timber->velocity_limit.reset();
    auto result = screened(floor, joist());
    CHECK(step(result, "a") == doctest::Approx(1.8 * mm_per_kN).epsilon(1e-14));
    check_digits(step(result, "b_limit"), 180 - 60 * 0.990345, 1e-4); // of the floor's own deflection
    CHECK(says(result.warnings, "UK National Annex"));
    FloorInput longer = joist();
    longer.span = 5;
    // 16500/5000^1.1: 1.1 ln 5000 = 9.368912, exp = 11718.4, so 1.40804 mm/kN
    check_digits(step(screened(floor, longer), "a") / mm_per_kN, 1.4080, 1e-4);
}

TEST_CASE("EN 1995: b by Figure 7.2 for a given a") {
    struct Point {
        double a, b;
    };
    FloorModel floor = timber_floor();
    floor.timber->velocity_limit.reset();
    for (const Point& point :
         {Point{0.4, 150}, Point{0.5, 150}, Point{1, 120}, Point{2, 80}, Point{4, 50}, Point{5, 50}}) {
        CAPTURE(point.a);
        floor.timber->deflection_limit = point.a * mm_per_kN;
        CHECK(step(screened(floor, joist()), "b_limit") == doctest::Approx(point.b).epsilon(1e-12));
    }
}

TEST_CASE("EN 1995: at 8 Hz and below the standard asks for a special investigation") {
    FloorInput input = joist();
    for (double frequency : {8.0, 6.0}) {
        input.modes.front().frequency = frequency;
        const auto result = screened(timber_floor(), input);
        CHECK_FALSE(result.passed);
        CHECK(result.value == frequency);
        CHECK(result.limit == 8);
        CHECK(result.utilisation == 8 / frequency);
        CHECK(says(result.warnings, "special investigation"));
        CHECK_FALSE(has_step(result, "v"));
    }
    input.modes.front().frequency = 8.001;
    CHECK(has_step(screened(timber_floor(), input), "v"));
}

TEST_CASE("EN 1995: no first-order mode below 40 Hz when the first is above") {
    FloorInput input = joist();
    input.modes.front().frequency = 41;
    const auto result = screened(timber_floor(), input);
    CHECK(step(result, "n_40") == 0);
    CHECK(step(result, "v") == doctest::Approx(1.6 / (55 * 5 * 4 + 200)).epsilon(1e-14));
}
