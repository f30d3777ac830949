// EN 1995-1-1:2004, 7.3.1 and 7.3.3: floors of dwellings. Load distribution k_dist, shear k_amp and the limit a where
// none is given: UK National Annex, NA.2.7.2 and Table NA.6. Both from memory, k_dist and the formulas confirmed by
// hand.

#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include <fmt/format.h>

#include "checks/floor_methods.hpp"

namespace groundsill {
namespace {

constexpr double mm_per_kN = 1e-6; // m/N

/// n_40 = {[(40/f_1)^2 - 1] (b/l)^4 (EI)_l/(EI)_b}^(1/4): first-order modes below 40 Hz; none when f_1 is above.
double modes_below_40_hz(double f_1, double width, double span, double along, double across) {
    const double excess = std::max(0.0, std::pow(40 / f_1, 2) - 1);
    return std::pow(excess * std::pow(width / span, 4) * along / across, 0.25);
}

/// Part of a point load that the joist under it carries: max(0.38 - 0.08 ln(14 (EI)_b/s^4), 0.30), no strutting.
/// The Annex has (EI)_b in N mm2/m and s in mm: 1 N m2/m = 1e6 N mm2/m, 1 m4 = 1e12 mm4.
double share_of_joist(double across, double spacing) {
    return std::max(0.38 - 0.08 * std::log(14 * across * 1e6 / (std::pow(spacing, 4) * 1e12)), 0.30);
}

/// a of Table NA.6: 1.8 mm/kN up to a span of 4 m, above 16500/l^1.1 with l in mm.
double annex_deflection_limit(double span) {
    return (span <= 4 ? 1.8 : 16500 / std::pow(1000 * span, 1.1)) * mm_per_kN;
}

/// b over a by Figure 7.2: straight between (0.5, 150), (1, 120), (2, 80) and (4, 50), level outside; a in m/N.
double figure_velocity_limit(double a) {
    const double mm = std::clamp(a / mm_per_kN, 0.5, 4.0);
    if (mm <= 1) return 180 - 60 * mm;
    if (mm <= 2) return 160 - 40 * mm;
    return 110 - 15 * mm;
}

struct Criterion {
    std::string name;
    std::string unit;
    double value = 0;
    double limit = 0;
    double utilisation = 0;
};

Criterion deflection_criterion(const FloorModel& floor, const FloorInput& input, FloorSteps& steps) {
    const FloorModel::Timber& timber = *floor.timber;
    const double strip = steps.add("deflection of the strip alone under a unit force", "w_strip",
                                   input.point_deflection, "m/N", "model");
    const double k_dist =
        steps.add("part of the force that the strip carries, max(0.38 - 0.08 ln(14 (EI)_b/s^4), 0.30)", "k_dist",
                  share_of_joist(timber.transverse, *floor.spacing), "", "UK NA NA.2.7.2");
    const double k_amp = steps.add("factor for shear, 1 where the model has it", "k_amp",
                                   input.shear_flexible ? 1.0 : 1.05, "", "UK NA NA.2.7.2");
    const double w = steps.add("deflection under a unit force, k_dist k_amp w_strip", "w", k_dist * k_amp * strip,
                               "m/N", "EN 1995-1-1 7.3.3(2)");
    const double a =
        steps.add("limit of the deflection", "a", timber.deflection_limit.value_or(annex_deflection_limit(input.span)),
                  "m/N", timber.deflection_limit ? "given" : "UK NA Table NA.6");
    return {"deflection under a unit force", "m/N", w, a, w / a};
}

/// v = 4 (0.4 + 0.6 n_40)/(m b l + 200) against b^(f_1 zeta - 1).
Criterion velocity_criterion(const FloorModel& floor, const FloorInput& input, double f_1, double a,
                             FloorSteps& steps) {
    const FloorModel::Timber& timber = *floor.timber;
    const double m = input.mass_per_length / *floor.spacing;
    const double along = input.bending_stiffness / *floor.spacing;
    const double zeta = steps.add("damping ratio", "zeta", floor.damping.value_or(0.01), "",
                                  floor.damping ? "given" : "EN 1995-1-1 7.3.1(3)");
    const double n_40 = steps.add("number of first-order modes up to 40 Hz", "n_40",
                                  modes_below_40_hz(f_1, timber.width, input.span, along, timber.transverse), "",
                                  "EN 1995-1-1 Eq. 7.7");
    const double v =
        steps.add("unit impulse velocity response, 4 (0.4 + 0.6 n_40)/(m b l + 200)", "v",
                  4 * (0.4 + 0.6 * n_40) / (m * timber.width * input.span + 200), "m/(N s2)", "EN 1995-1-1 Eq. 7.6");
    const double b = steps.add("b of the limit", "b_limit", timber.velocity_limit.value_or(figure_velocity_limit(a)),
                               "", timber.velocity_limit ? "given" : "EN 1995-1-1 Figure 7.2");
    const double limit = steps.add("limit of the velocity response, b_limit^(f_1 zeta - 1)", "v_limit",
                                   std::pow(b, f_1 * zeta - 1), "m/(N s2)", "EN 1995-1-1 Eq. 7.4");
    return {"unit impulse velocity response", "m/(N s2)", v, limit, v / limit};
}

/// Notes the floor's own figures and Eq. 7.5, f_1 = pi/(2 l^2) sqrt((EI)_l/m) of a simply supported floor, beside the
/// model's.
double frequency(const FloorModel& floor, const FloorInput& input, FloorSteps& steps) {
    const double f_1 =
        steps.add("first vertical frequency of the model", "f_1", first_vertical_mode(input)->frequency, "Hz", "model");
    const double l = steps.add("span", "l", input.span, "m", "model");
    const double s = steps.add("spacing of the joists", "s", *floor.spacing, "m", "given");
    const double along =
        steps.add("stiffness along the joists, per width", "EI_l", input.bending_stiffness / s, "N m2/m", "model");
    steps.add("stiffness across them, per width", "EI_b", floor.timber->transverse, "N m2/m", "given");
    steps.add("width of the floor", "b", floor.timber->width, "m", "given");
    const double m = steps.add("mass per area", "m", input.mass_per_length / s, "kg/m2", "model");
    steps.add("frequency of a simply supported floor, pi/(2 l^2) sqrt((EI)_l/m)", "f_1_simple",
              std::acos(-1.0) / (2 * l * l) * std::sqrt(along / m), "Hz", "EN 1995-1-1 Eq. 7.5");
    return f_1;
}

void take_over(const Criterion& criterion, FloorResult& result) {
    result.criterion = criterion.name;
    result.unit = criterion.unit;
    result.value = criterion.value;
    result.limit = criterion.limit;
    result.utilisation = criterion.utilisation;
}

} // namespace

FloorResult screen_by_en1995(const FloorModel& floor, const FloorInput& input) {
    FloorResult result;
    FloorSteps steps;
    const double f_1 = frequency(floor, input, steps);
    cross_check_frequency(f_1, input, steps, result.warnings);
    const double least = steps.add("frequency that must be exceeded", "f_limit", 8, "Hz", "EN 1995-1-1 7.3.3(1)");
    const Criterion by_frequency{"first frequency, to be above the limit", "Hz", f_1, least, least / f_1};
    const Criterion by_deflection = deflection_criterion(floor, input, steps);
    if (!floor.timber->deflection_limit) {
        result.warnings.emplace_back("the limit of the deflection is that of the UK National Annex: give "
                                     "floor.timber.deflection_limit where another applies");
    }
    if (f_1 <= least) {
        take_over(by_frequency, result);
        result.warnings.push_back(
            fmt::format("the frequency, {:.3g} Hz, is not above 8 Hz: EN 1995-1-1 7.3.3(1) asks for a "
                        "special investigation and has no criteria for this floor",
                        f_1));
    } else {
        // Where a is not given, b goes with the deflection that the floor has, as in the UK Annex.
        const double a = floor.timber->deflection_limit.value_or(by_deflection.value);
        const Criterion by_velocity = velocity_criterion(floor, input, f_1, a, steps);
        const std::vector<Criterion> all{by_frequency, by_deflection, by_velocity};
        const auto governing = std::ranges::max_element(all, {}, &Criterion::utilisation);
        take_over(*governing, result);
        result.passed = governing->utilisation <= 1;
    }
    result.quantities = steps.take();
    return result;
}

} // namespace groundsill
