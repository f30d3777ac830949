// Walking acceleration by AISC Design Guide 11.
//
// Source of the worked example: Structural Steel Designer's Handbook (Brockenbrough and Merritt, eds), chapter 6, pages
// 6.26 to 6.28, an office floor by the guide's method, re-run by hand to one more digit. Limits: Murray, Allen and
// Ungar 1997, Table 4.1 (from memory).

#include <cmath>

#include "floor_support.hpp"
#include "groundsill/model.hpp"

using namespace groundsill;

namespace {

constexpr double inch = 0.0254;
constexpr double foot = 12 * inch;
constexpr double pound = 4.4482216152605;
constexpr double kip = 1000 * pound;
constexpr double ksi = kip / (inch * inch);
constexpr double in4 = inch * inch * inch * inch;

// The example takes g = 386 in/s2, the program 9.80665 m/s2 = 386.0886 in/s2: frequencies by 0.18 sqrt(g/Delta) are
// compared after taking that difference, 1.1e-4, off.
const double with_rounded_g = std::sqrt(386 * inch / standard_gravity);

// Beams of 30 ft at 10 ft, I_t = 843.2 in4, w_j = 0.5993 kip/ft; girders of 30 ft, I_g = 4315 in4, with 30 ft of that
// load and 55 lb/ft; d_e = 4.25 in, n = E_s/(1.35 E_c) = 10.06; damping 0.03.
FloorModel office_floor() {
    FloorModel floor;
    floor.members = {0};
    floor.methods = {FloorMethod::dg11};
    floor.use = "office";
    floor.damping = 0.03;
    floor.spacing = 10 * foot;
    FloorModel::Panel panel;
    panel.slab_depth = 4.25 * inch;
    panel.slab_E = 29000 * ksi / 10.06 / 1.35;
    panel.floor_width = 90 * foot;
    panel.continuous = true;
    panel.girder = FloorModel::Girder{.E = 29000 * ksi,
                                      .I = 4315 * in4,
                                      .span = 30 * foot,
                                      .weight = (0.5993 * 3 + 0.055) * kip / foot,
                                      .floor_length = 90 * foot};
    floor.panel = panel;
    return floor;
}

/// The frequency of the beam is the guide's own, 0.18 sqrt(g/Delta_j).
FloorInput office_beam() {
    FloorInput input;
    input.span = 30 * foot;
    input.bending_stiffness = 29000 * ksi * 843.2 * in4;
    const double w = 0.5993 * kip / foot;
    input.mass_per_length = w / standard_gravity;
    input.static_deflection = 5 * w * std::pow(input.span, 4) / (384 * input.bending_stiffness);
    input.modes = {{.frequency = 0.18 * std::sqrt(standard_gravity / input.static_deflection),
                    .modal_mass = w * input.span / 2 / standard_gravity,
                    .vertical = 1,
                    .is_vertical = true}};
    return input;
}

FloorResult screened(const FloorModel& floor, const FloorInput& input) {
    REQUIRE(check_floor(floor).empty());
    const auto results = screen_floor(floor, input);
    REQUIRE(results.size() == 1);
    return results.front();
}

/// Beam panel alone, of given effective weight.
FloorResult with_weight(double frequency, double weight, const char* use = "office") {
    FloorModel floor = office_floor();
    floor.use = use;
    floor.panel = FloorModel::Panel{.weight = weight};
    FloorInput input = office_beam();
    input.modes.front().frequency = frequency;
    return screened(floor, input);
}

} // namespace

TEST_CASE("DG11: office floor of the Structural Steel Designer's Handbook, 6.26 to 6.28") {
    const auto result = screened(office_floor(), office_beam());
    check_digits(step(result, "Delta_j") / inch, 0.4467, 1e-4);
    check_digits(step(result, "B_j") / foot, 32.909, 1e-3);
    check_digits(step(result, "W_j") / kip, 88.750, 1e-3);
    check_digits(step(result, "w_g") / (kip / foot), 1.853, 1e-3);
    check_digits(step(result, "Delta_g") / inch, 0.2699, 1e-4);
    check_digits(with_rounded_g * step(result, "f_g"), 6.808, 1e-3);
    check_digits(step(result, "B_g") / foot, 47.251, 1e-3);
    check_digits(step(result, "W_g") / kip, 87.55, 1e-2);
    check_digits(step(result, "Delta_g_reduced") / inch, 0.246, 1e-3);
    check_digits(step(result, "W") / kip, 88.324, 1e-3);
    check_digits(with_rounded_g * step(result, "f_n"), 4.2491, 1e-4);
    check_digits(with_rounded_g * step(result, "f_n_estimate"), 4.2491, 1e-4);
    check_digits(100 * result.value.value(), 0.55, 1e-2);
    CHECK(result.limit == 0.005);
    CHECK(result.utilisation.value() == doctest::Approx(result.value.value() / 0.005).epsilon(1e-14));
    CHECK_FALSE(result.passed);
    CHECK(result.warnings.empty());
}

TEST_CASE("DG11: symbols are unique, every step has a clause") {
    const auto result = screened(office_floor(), office_beam());
    for (std::size_t i = 0; i < result.quantities.size(); ++i) {
        CHECK_FALSE(result.quantities[i].clause.empty());
        for (std::size_t j = 0; j < i; ++j) CHECK(result.quantities[i].symbol != result.quantities[j].symbol);
    }
}

TEST_CASE("DG11: effective widths end at two thirds of the floor") {
    FloorModel floor = office_floor();
    floor.panel->floor_width = 30 * foot;
    floor.panel->girder->floor_length = 60 * foot;
    const auto result = screened(floor, office_beam());
    check_digits(step(result, "B_j") / foot, 20, 1e-9);
    check_digits(step(result, "B_g") / foot, 40, 1e-9);
    // L_g/B_j = 30/20 is above 1: no reduction of the girder's deflection
    CHECK(step(result, "Delta_g_reduced") == step(result, "Delta_g"));
}

TEST_CASE("DG11: free edge, joist seats and simply supported beams") {
    FloorModel floor = office_floor();
    floor.panel->edge = true;
    floor.panel->continuous = false;
    floor.panel->girder->seats = true;
    const auto result = screened(floor, office_beam());
    check_digits(step(result, "B_j") / foot, 32.909 / 2, 1e-3); // C_j = 1 in place of 2
    check_digits(step(result, "W_j") / kip, 88.750 / 3, 1e-3);  // half the width, and no 1.5
    check_digits(step(result, "B_g") / foot, 42.001, 1e-3);     // 47.251 x 1.6/1.8
}

TEST_CASE("DG11: a slab given by its stiffness is taken as dynamic") {
    FloorModel floor = office_floor();
    floor.panel->slab_stiffness = 1.35 * *floor.panel->slab_E * std::pow(*floor.panel->slab_depth, 3) / 12;
    floor.panel->slab_depth.reset();
    floor.panel->slab_E.reset();
    check_digits(step(screened(floor, office_beam()), "B_j") / foot, 32.909, 1e-3);
}

TEST_CASE("DG11: the girder's deflection is at least halved only") {
    FloorModel floor = office_floor();
    floor.panel->girder->span = 10 * foot; // L_g/B_j = 0.304
    const auto result = screened(floor, office_beam());
    CHECK(step(result, "Delta_g_reduced") == doctest::Approx(0.5 * step(result, "Delta_g")).epsilon(1e-14));
}

TEST_CASE("DG11: beams shorter than half the girder are screened alone too, and the larger counts") {
    FloorModel floor = office_floor();
    floor.panel->girder->span = 61 * foot;
    floor.panel->girder->I *= 1000; // so stiff that the combined panel moves less
    FloorInput input = office_beam();
    const auto result = screened(floor, input);
    REQUIRE(has_step(result, "a_p_beam"));
    // by hand: 289.134 N exp(-0.35 x 5.2919 Hz)/(0.03 x 394.78 kN) = 0.3831 %
    check_digits(100 * step(result, "a_p_beam"), 0.383, 1e-3);
    CHECK(result.value == std::max(step(result, "a_p"), step(result, "a_p_beam")));
    CHECK_FALSE(has_step(screened(office_floor(), office_beam()), "a_p_beam"));
}

TEST_CASE("DG11: given weight, by hand") {
    // 65 lb x 4.44822 N/lb = 289.134 N; exp(-0.35 x 5) = 0.1737739; over 0.03 x 395 kN: 0.00424000
    const auto result = with_weight(5, 395e3);
    check_digits(result.value.value(), 0.00424000, 1e-8);
    CHECK(result.passed);
    CHECK(step(result, "W") == 395e3);
}

TEST_CASE("DG11: given weight with a girder keeps the weight and lowers the frequency") {
    FloorModel floor = office_floor();
    floor.panel->weight = 88.324 * kip;
    auto result = screened(floor, office_beam());
    check_digits(with_rounded_g * step(result, "f_n"), 4.2491, 1e-4);
    check_digits(100 * result.value.value(), 0.55, 1e-2);
    // without the slab, B_j is not known and the girder's deflection is not reduced: 0.18 sqrt(386.089/(0.4467 +
    // 0.2699))
    floor.panel->slab_depth.reset();
    floor.panel->slab_E.reset();
    result = screened(floor, office_beam());
    check_digits(with_rounded_g * step(result, "f_n"), 4.178, 1e-3);
}

TEST_CASE("DG11: limits and forces of Table 4.1") {
    struct Row {
        const char* use;
        double pounds, limit;
    };
    for (const Row& row : {Row{"office", 65, 0.005}, Row{"residence", 65, 0.005}, Row{"residential", 65, 0.005},
                           Row{"church", 65, 0.005}, Row{"mall", 65, 0.015}, Row{"shopping mall", 65, 0.015},
                           Row{"indoor footbridge", 92, 0.015}, Row{"outdoor footbridge", 92, 0.05}}) {
        CAPTURE(row.use);
        const auto result = with_weight(5, 395e3, row.use);
        CHECK(step(result, "P_0") == doctest::Approx(row.pounds * pound).epsilon(1e-14));
        CHECK(result.limit == row.limit);
        CHECK(result.use == row.use);
    }
}

TEST_CASE("DG11: a given limit goes before the table's") {
    FloorModel floor = office_floor();
    floor.acceleration_limit = 0.006;
    const auto result = screened(floor, office_beam());
    CHECK(result.limit == 0.006);
    CHECK(result.passed);
}

TEST_CASE("DG11: warnings outside of 3 Hz to 9 Hz") {
    CHECK(says(with_weight(9.1, 395e3).warnings, "above 9 Hz"));
    CHECK_FALSE(says(with_weight(9.0, 395e3).warnings, "above 9 Hz"));
    CHECK(says(with_weight(2.9, 395e3).warnings, "below 3 Hz"));
    CHECK_FALSE(says(with_weight(3.0, 395e3).warnings, "below 3 Hz"));
}

TEST_CASE("DG11: the static deflection warns of a frequency that does not belong to it") {
    FloorInput input = office_beam();
    CHECK(step(screened(office_floor(), input), "f_static") ==
          doctest::Approx(input.modes.front().frequency).epsilon(1e-14));
    input.modes.front().frequency *= 1.16;
    CHECK(says(screened(office_floor(), input).warnings, "far from the estimate"));
    input.static_deflection = 0; // nothing to compare with
    CHECK(screened(office_floor(), input).warnings.empty());
}
