// Footfall response by CCIP-016, Willford and Young 2006 (formulas from memory of the guide).
//
// The worked values of one mode were calculated by hand from those formulas; the base curve is that of ISO 10137:2007
// and BS 6472:1992; the rms of several modes is checked against quadrature in time.

#include <algorithm>
#include <cmath>
#include <vector>

#include "checks/floor_footfall.hpp"
#include "floor_support.hpp"

using namespace groundsill;

namespace {

const double pi = std::acos(-1.0);

FloorModel walked_floor(double least, double most) {
    FloorModel floor;
    floor.members = {0};
    floor.methods = {FloorMethod::ccip016};
    floor.use = "office";
    floor.damping = 0.03;
    floor.footfall = FloorModel::Footfall{.pace_least = least, .pace_most = most};
    return floor;
}

FloorInput modes_of(std::vector<FloorMode> modes) {
    FloorInput input;
    input.modes = std::move(modes);
    input.span = 9;
    input.bending_stiffness = 1e8;
    input.mass_per_length = 1000;
    return input;
}

FloorResult screened(const FloorModel& floor, const FloorInput& input) {
    REQUIRE(check_floor(floor).empty());
    return screen_floor(floor, input).front();
}

const FloorMode low_mode{.frequency = 5.2, .modal_mass = 18000, .vertical = 1, .is_vertical = true};
const FloorMode high_mode{.frequency = 12, .modal_mass = 9000, .vertical = 1, .is_vertical = true};

} // namespace

TEST_CASE("CCIP-016: one mode of 5.2 Hz in resonance with the third harmonic") {
    const auto result = screened(walked_floor(5.2 / 3, 5.2 / 3), modes_of({low_mode}));
    check_digits(step(result, "h1_alpha"), 0.3211667, 1e-7);
    check_digits(step(result, "h2_alpha"), 0.0884133, 1e-7);
    check_digits(step(result, "h3_alpha"), 0.06628, 1e-7);
    check_digits(step(result, "h4_alpha"), 0.0580667, 1e-7);
    check_digits(step(result, "h1_R"), 0.1457398, 1e-7);
    check_digits(step(result, "h2_R"), 0.3622826, 1e-7);
    check_digits(step(result, "h3_R"), 6.0505999, 1e-7);
    check_digits(step(result, "h4_R"), 0.723154, 1e-6);
    check_digits(result.value.value(), 6.106161, 1e-6);
    CHECK(result.limit == 8);
    CHECK(result.passed);
    CHECK_FALSE(result.over_pace.front().impulsive.has_value());
}

TEST_CASE("CCIP-016: the same away from resonance, pace 2 Hz") {
    check_digits(screened(walked_floor(2, 2), modes_of({low_mode})).value.value(), 1.829962, 1e-6);
}

TEST_CASE("CCIP-016: impulsive response of one mode of 12 Hz") {
    const auto result = screened(walked_floor(2.2, 2.2), modes_of({high_mode}));
    check_digits(1e4 * step(result, "v_1"), 7.326222, 1e-6);
    check_digits(1e4 * step(result, "v_rms"), 3.376272, 1e-6);
    check_digits(result.value.value(), 3.376272, 1e-6);
    CHECK_FALSE(result.over_pace.front().resonant.has_value());
    CHECK(says(result.warnings, "more modes")); // up to 24 Hz could take part
}

TEST_CASE("CCIP-016: over a range of paces the resonances are met exactly") {
    const auto result = screened(walked_floor(1.5, 2.2), modes_of({low_mode}));
    const auto& curve = result.over_pace;
    CHECK(curve.front().pace == 1.5);
    CHECK(curve.back().pace == 2.2);
    CHECK(std::ranges::is_sorted(curve, std::less_equal{}, &PaceResponse::pace)); // no pace twice
    CHECK(step(result, "f_w") == 5.2 / 3);
    check_digits(result.value.value(), 6.106161, 1e-6);
    for (std::size_t i = 1; i < curve.size(); ++i) CHECK(curve[i].pace - curve[i - 1].pace < 0.0051);
}

TEST_CASE("CCIP-016: build-up, walker and shape") {
    FloorModel floor = walked_floor(5.2 / 3, 5.2 / 3);
    floor.footfall->walk = 12; // N = 0.55 x 3 x 12/0.75 = 26.4 cycles: rho = 1 - exp(-4.976283) = 0.993100
    const auto result = screened(floor, modes_of({low_mode}));
    check_digits(step(result, "h3_rho"), 0.993100, 1e-6);
    check_digits(step(result, "h3_R"), 6.0505999 * 0.993100, 1e-5);

    floor = walked_floor(5.2 / 3, 5.2 / 3);
    floor.footfall->walker = 770;
    FloorMode part = low_mode;
    part.vertical = 0.5;
    check_digits(screened(floor, modes_of({part})).value.value(), 6.106161 * 1.1 / 4, 1e-6);
}

TEST_CASE("CCIP-016: the floor beside the strip adds its mass") {
    FloorModel floor = walked_floor(5.2 / 3, 5.2 / 3);
    CHECK(says(screened(floor, modes_of({low_mode})).warnings, "effective_width"));
    floor.spacing = 3;
    floor.footfall->effective_width = 6;
    const auto result = screened(floor, modes_of({low_mode}));
    CHECK(step(result, "m_1") == 36000);
    check_digits(result.value.value(), 6.106161 / 2, 1e-6);
    CHECK_FALSE(says(result.warnings, "effective_width"));
}

TEST_CASE("CCIP-016: design force coefficients") {
    CHECK(force_coefficient(1, 0.9) == 0);                                    // never negative
    CHECK(force_coefficient(1, 2) == doctest::Approx(0.4305).epsilon(1e-12)); // 0.41 x 1.05
    CHECK(force_coefficient(1, 2.8) == 0.56);                                 // not above
    CHECK(force_coefficient(2, 4) == doctest::Approx(0.0914).epsilon(1e-12));
    CHECK(force_coefficient(3, 6) == doctest::Approx(0.0714).epsilon(1e-12));
    CHECK(force_coefficient(4, 8) == doctest::Approx(0.065).epsilon(1e-12));
}

TEST_CASE("CCIP-016: bases are the curve of ISO 10137, the guide's rounding within half a per cent") {
    // rms m/s2: 0.01/sqrt f to 4 Hz, 0.005 to 8 Hz, 0.005 f/8 above
    struct Point {
        double f, rms;
    };
    for (const Point& point : {Point{1, 0.01}, Point{2.25, 0.01 / 1.5}, Point{4, 0.005}, Point{6, 0.005},
                               Point{8, 0.005}, Point{12, 0.0075}, Point{40, 0.025}}) {
        CAPTURE(point.f);
        CHECK(base_acceleration(point.f) / std::sqrt(2.0) == doctest::Approx(point.rms).epsilon(0.005));
    }
    for (double f : {5.0, 8.0, 12.0, 40.0}) {
        CAPTURE(f);
        const double rms = f > 8 ? 0.005 * f / 8 : 0.005;
        CHECK(2 * pi * f * base_velocity(f) == doctest::Approx(rms).epsilon(0.006));
    }
}

TEST_CASE("CCIP-016: modes add with their phases") {
    // Half way between two equal modes far from it in damping the real parts nearly cancel; the sum by the equation of
    // motion: q'' + 2 zeta w q' + w^2 q = F/m exp(i W t) has a = -W^2 F/m / (w^2 - W^2 + 2 i zeta w W)
    const std::vector<WalkedMode> modes{{1, 5.0, 18000, 1}, {2, 7.0, 20000, 0.8}};
    const Walk walk{700, 0.03, std::nullopt};
    const auto response = resonant_response(modes, walk, 2.0);
    const double F = 700 * (0.033 + 0.0064 * 6);
    const double W = 2 * pi * 6;
    std::complex<double> sum;
    for (const WalkedMode& mode : modes) {
        const double w = 2 * pi * mode.frequency;
        sum += -W * W * F * mode.shape * mode.shape / mode.mass / std::complex(w * w - W * W, 2 * 0.03 * w * W);
    }
    CHECK(response.harmonics[2].acceleration == doctest::Approx(std::abs(sum)).epsilon(1e-12));
}

TEST_CASE("CCIP-016: rms velocity of several modes against quadrature") {
    const std::vector<WalkedMode> modes{{1, 11.0, 9000, 1}, {2, 13.5, 12000, 0.7}, {3, 19.0, 7000, 0.9}};
    const double zeta = 0.02;
    const auto response = impulsive_response(modes, {700, zeta, std::nullopt}, 2.0);
    constexpr int parts = 20000;
    double sum = 0;
    for (int i = 0; i < parts; ++i) { // midpoint rule, error below 1e-6 of the sum
        const double t = 0.5 * (i + 0.5) / parts;
        double v = 0;
        for (const WalkedMode& mode : modes) {
            const double w = 2 * pi * mode.frequency;
            const double peak =
                54 * std::pow(2.0, 1.43) / std::pow(mode.frequency, 1.3) * mode.shape * mode.shape / mode.mass;
            v += peak * std::exp(-zeta * w * t) * std::sin(w * std::sqrt(1 - zeta * zeta) * t);
        }
        sum += v * v;
    }
    CHECK(response.rms == doctest::Approx(std::sqrt(sum / parts)).epsilon(1e-6));
}

TEST_CASE("CCIP-016: which modes take part") {
    const FloorMode sway{.frequency = 2.1, .modal_mass = 50000, .vertical = 0.01, .is_vertical = false};
    const FloorMode sideways{.frequency = 3.0, .modal_mass = 50000, .vertical = 0, .is_vertical = false};
    const FloorMode middle{.frequency = 14.9, .modal_mass = 18000, .vertical = 1, .is_vertical = true};
    const FloorMode above{.frequency = 15.1, .modal_mass = 18000, .vertical = 1, .is_vertical = true};
    const FloorMode far{.frequency = 30.3, .modal_mass = 18000, .vertical = 1, .is_vertical = true};
    const auto result = screened(walked_floor(1.5, 2.2), modes_of({sway, sideways, low_mode, middle, above, far}));
    CHECK(step(result, "f_cut_off") == doctest::Approx(9.24).epsilon(1e-14));
    CHECK(has_step(result, "h1_m1_A"));       // sway moves the floor a little
    CHECK_FALSE(has_step(result, "h1_m2_A")); // not at all
    CHECK(has_step(result, "h1_m3_A"));
    CHECK(has_step(result, "h1_m4_A"));
    CHECK_FALSE(has_step(result, "h1_m5_A")); // above 15 Hz
    CHECK(has_step(result, "I_4"));           // impulsive from 9.24 Hz
    CHECK(has_step(result, "I_5"));
    CHECK_FALSE(has_step(result, "I_6")); // above 2 x 14.9 Hz
    CHECK_FALSE(has_step(result, "I_3"));
    CHECK_FALSE(says(result.warnings, "more modes"));
    for (std::size_t i = 0; i < result.quantities.size(); ++i) {
        for (std::size_t j = 0; j < i; ++j) CHECK(result.quantities[i].symbol != result.quantities[j].symbol);
    }
}

TEST_CASE("CCIP-016: limits by use") {
    // SCI P354 Table 5.2 and ISO 10137:2007 Table C.1, from memory; the lower end of ranges
    struct Row {
        const char* use;
        double limit;
    };
    for (const Row& row : {Row{"office", 8}, Row{"mall", 4}, Row{"shopping mall", 4}, Row{"dealing floor", 4},
                           Row{"general office", 4}, Row{"quiet office", 2}, Row{"workshop", 8}, Row{"residence", 2},
                           Row{"residential", 2}, Row{"residence at night", 1.4}, Row{"residential at night", 1.4},
                           Row{"operating theatre", 1}, Row{"critical area", 1}}) {
        CAPTURE(row.use);
        FloorModel floor = walked_floor(2, 2);
        floor.use = row.use;
        CHECK(screened(floor, modes_of({low_mode})).limit == row.limit);
    }
    FloorModel floor = walked_floor(2, 2);
    floor.use.clear();
    floor.response_limit = 3;
    CHECK(screened(floor, modes_of({low_mode})).limit == 3);
}
