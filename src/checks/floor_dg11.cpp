// Murray, Allen and Ungar, AISC Design Guide 11, 1997, chapters 3 and 4. Equation numbers from memory.
//
// Letters as in the guide: j the beam (joist), g the girder, s the slab; D stiffness per width, here with its modulus
// as E I per metre, so that no modular ratio is needed; B effective width, W effective weight, S spacing, L span.

#include <algorithm>
#include <cmath>
#include <optional>
#include <string>

#include <fmt/format.h>

#include "checks/floor_methods.hpp"
#include "checks/floor_uses.hpp"
#include "groundsill/model.hpp"

namespace groundsill {
namespace {

/// Deflection at the middle of a uniformly loaded, simply supported beam: the guide takes this one for continuous beams
/// too.
double simple_deflection(double w, double L, double EI) { return 5 * w * std::pow(L, 4) / (384 * EI); }

double frequency_of_deflection(double deflection) { return 0.18 * std::sqrt(standard_gravity / deflection); }

/// A part of the floor that moves: what the guide's Eq. 4.1 needs of it.
struct MovingPanel {
    double frequency = 0;  ///< Hz
    double deflection = 0; ///< m
    double weight = 0;     ///< W, N
};

struct BeamPanel : MovingPanel {
    double D = 0;            ///< E I per width, N m2/m; 0 without a spacing
    std::optional<double> B; ///< effective width, m; absent when the slab is not given
};

double slab_stiffness(const FloorModel::Panel& panel, FloorSteps& steps) {
    constexpr const char* name = "stiffness of the slab, E I per width";
    if (panel.slab_stiffness) return steps.add(name, "D_s", *panel.slab_stiffness, "N m2/m", "given");
    const double E =
        steps.add("dynamic modulus of the slab's concrete, 1.35 E_c", "E_dyn", 1.35 * *panel.slab_E, "Pa", "DG11 3.2");
    const double d = steps.add("effective depth of the slab", "d_e", *panel.slab_depth, "m", "given");
    return steps.add(std::string(name) + ", E_dyn d_e^3/12", "D_s", E * std::pow(d, 3) / 12, "N m2/m", "DG11 Eq. 4.3a");
}

/// B_j = C_j (D_s/D_j)^(1/4) L_j, not above 2/3 of the floor's width.
double beam_width(const FloorModel::Panel& panel, double D_j, double L_j, FloorSteps& steps) {
    const double D_s = slab_stiffness(panel, steps);
    const double C_j = steps.add("factor of the beam panel, 1 at a free edge, else 2", "C_j", panel.edge ? 1.0 : 2.0,
                                 "", "DG11 Eq. 4.3a");
    double B = C_j * std::pow(D_s / D_j, 0.25) * L_j;
    if (panel.floor_width) B = std::min(B, 2.0 / 3.0 * *panel.floor_width);
    return steps.add("effective width of the beam panel, C_j (D_s/D_j)^(1/4) L_j, at most 2/3 of the floor's width",
                     "B_j", B, "m", "DG11 Eq. 4.3a");
}

BeamPanel beam_panel(const FloorModel& floor, const FloorInput& input, FloorSteps& steps) {
    const FloorModel::Panel& panel = *floor.panel;
    BeamPanel beam;
    beam.frequency =
        steps.add("first vertical frequency of the model", "f_j", first_vertical_mode(input)->frequency, "Hz", "model");
    const double L = steps.add("span of the beam", "L_j", input.span, "m", "model");
    const double EI = steps.add("bending stiffness of the beam", "EI_j", input.bending_stiffness, "N m2", "model");
    const double w = steps.add("weight on the beam", "w_j", input.mass_per_length * standard_gravity, "N/m", "model");
    beam.deflection = steps.add("deflection of the beam, 5 w_j L_j^4/(384 EI_j)", "Delta_j",
                                simple_deflection(w, L, EI), "m", "DG11 3.3");
    steps.add("estimate of the beam's frequency, 0.18 sqrt(g/Delta_j)", "f_j_estimate",
              frequency_of_deflection(beam.deflection), "Hz", "DG11 Eq. 3.3");
    if (floor.spacing) {
        const double S = steps.add("spacing of the beams", "S", *floor.spacing, "m", "given");
        beam.D = steps.add("stiffness of the beams, E I per width", "D_j", EI / S, "N m2/m", "DG11 Eq. 4.3a");
        if (panel.slab_depth || panel.slab_stiffness) beam.B = beam_width(panel, beam.D, L, steps);
    }
    if (!panel.weight) {
        const double continuity = steps.add("factor of continuity, 1.5 for beams continuous over their supports", "c_j",
                                            panel.continuous ? 1.5 : 1.0, "", "DG11 4.2");
        beam.weight = steps.add("effective weight of the beam panel, c_j (w_j/S) B_j L_j", "W_j",
                                continuity * w / *floor.spacing * *beam.B * L, "N", "DG11 Eq. 4.2");
    }
    return beam;
}

/// The girder's deflection falls by L_g/B_j, 0.5 at least, where the girder is shorter than the beam panel is wide.
double reduced_deflection(double deflection, double L_g, std::optional<double> B_j, FloorSteps& steps) {
    const double ratio = B_j ? std::clamp(L_g / *B_j, 0.5, 1.0) : 1.0;
    return steps.add("deflection of the girder in the combined panel, Delta_g L_g/B_j with 0.5 <= L_g/B_j <= 1",
                     "Delta_g_reduced", deflection * ratio, "m", "DG11 Eq. 4.5");
}

MovingPanel girder_panel(const FloorModel& floor, const BeamPanel& beam, double L_j, FloorSteps& steps) {
    const FloorModel::Girder& girder = *floor.panel->girder;
    MovingPanel moving;
    const double L = steps.add("span of the girder", "L_g", girder.span, "m", "given");
    const double EI = steps.add("bending stiffness of the girder", "EI_g", girder.E * girder.I, "N m2", "given");
    const double w = steps.add("weight on the girder", "w_g", girder.weight, "N/m", "given");
    const double deflection = steps.add("deflection of the girder, 5 w_g L_g^4/(384 EI_g)", "Delta_g",
                                        simple_deflection(w, L, EI), "m", "DG11 3.3");
    moving.frequency = steps.add("frequency of the girder, 0.18 sqrt(g/Delta_g)", "f_g",
                                 frequency_of_deflection(deflection), "Hz", "DG11 Eq. 3.3");
    moving.deflection = reduced_deflection(deflection, L, beam.B, steps);
    if (floor.panel->weight) return moving;
    const double D_g =
        steps.add("stiffness of the girders, E I per width, EI_g/L_j", "D_g", EI / L_j, "N m2/m", "DG11 Eq. 4.3b");
    const double C = steps.add("factor of the girder panel, 1.6 with joist seats, else 1.8", "C_g",
                               girder.seats ? 1.6 : 1.8, "", "DG11 Eq. 4.3b");
    const double B = std::min(C * std::pow(beam.D / D_g, 0.25) * L, 2.0 / 3.0 * girder.floor_length);
    steps.add("effective width of the girder panel, C_g (D_j/D_g)^(1/4) L_g, at most 2/3 of the floor's length", "B_g",
              B, "m", "DG11 Eq. 4.3b");
    moving.weight = steps.add("effective weight of the girder panel, (w_g/L_j) B_g L_g", "W_g", w / L_j * B * L, "N",
                              "DG11 Eq. 4.2");
    return moving;
}

/// Frequencies by Dunkerley, weights by deflections.
MovingPanel combined_panel(const FloorModel& floor, const BeamPanel& beam, const MovingPanel& girder,
                           FloorSteps& steps) {
    MovingPanel both;
    both.deflection = beam.deflection + girder.deflection;
    const double f_g = steps.add("frequency of the girder in the combined panel, 0.18 sqrt(g/Delta_g_reduced)",
                                 "f_g_reduced", frequency_of_deflection(girder.deflection), "Hz", "DG11 Eq. 3.3");
    both.frequency =
        steps.add("frequency of the combined panel, 1/f_n^2 = 1/f_j^2 + 1/f_g_reduced^2", "f_n",
                  1 / std::sqrt(1 / (beam.frequency * beam.frequency) + 1 / (f_g * f_g)), "Hz", "DG11 Eq. 3.2");
    steps.add("its estimate, 0.18 sqrt(g/(Delta_j + Delta_g_reduced))", "f_n_estimate",
              frequency_of_deflection(both.deflection), "Hz", "DG11 Eq. 3.4");
    if (!floor.panel->weight) {
        both.weight = steps.add(
            "effective weight of the combined panel, (Delta_j W_j + Delta_g_reduced W_g)/(Delta_j + Delta_g_reduced)",
            "W", (beam.deflection * beam.weight + girder.deflection * girder.weight) / both.deflection, "N",
            "DG11 Eq. 4.4");
    }
    return both;
}

/// a_p/g = P_0 exp(-0.35 f_n)/(beta W).
double peak_acceleration(double P_0, double frequency, double beta, double W) {
    return P_0 * std::exp(-0.35 * frequency) / (beta * W);
}

void warn_of_range(double frequency, FloorResult& result) {
    if (frequency > 9) {
        result.warnings.push_back(
            fmt::format("the frequency, {:.3g} Hz, is above 9 Hz, where DG11's walking formula ends (2nd edition, "
                        "2016): the guide then also "
                        "asks for a stiffness of 1 kN/mm under a point load (1997, 4.1); screen by CCIP-016 as well",
                        frequency));
    }
    if (frequency < 3) {
        result.warnings.push_back(fmt::format("the frequency, {:.3g} Hz, is below 3 Hz: DG11 advises against such "
                                              "floors, which can be excited on purpose",
                                              frequency));
    }
}

/// The panel that moves more: the combined one, and also the beam panel alone where the girder is long (L_j < L_g/2).
double governing_acceleration(const FloorModel& floor, const FloorInput& input, double P_0, FloorResult& result,
                              FloorSteps& steps) {
    const BeamPanel beam = beam_panel(floor, input, steps);
    cross_check_frequency(beam.frequency, input, steps, result.warnings);
    MovingPanel panel = beam;
    if (floor.panel->girder) panel = combined_panel(floor, beam, girder_panel(floor, beam, input.span, steps), steps);
    if (floor.panel->weight) panel.weight = steps.add("effective weight", "W", *floor.panel->weight, "N", "given");
    warn_of_range(panel.frequency, result);
    const double beta = steps.add("damping ratio", "beta", *floor.damping, "", "given");
    double peak = steps.add("peak acceleration over g, P_0 exp(-0.35 f)/(beta W)", "a_p",
                            peak_acceleration(P_0, panel.frequency, beta, panel.weight), "", "DG11 Eq. 4.1");
    const bool long_girder =
        floor.panel->girder && !floor.panel->weight && input.span < 0.5 * floor.panel->girder->span;
    if (long_girder) {
        const double alone = steps.add("the same of the beam panel alone, as L_j < L_g/2", "a_p_beam",
                                       peak_acceleration(P_0, beam.frequency, beta, beam.weight), "", "DG11 4.2");
        peak = std::max(peak, alone);
    }
    return peak;
}

} // namespace

FloorResult screen_by_dg11(const FloorModel& floor, const FloorInput& input) {
    FloorResult result;
    FloorSteps steps;
    const WalkingOccupancy occupancy = *dg11_occupancy(floor.use);
    const double P_0 = steps.add("force of the walker", "P_0", occupancy.force, "N", "DG11 Table 4.1");
    const double peak = governing_acceleration(floor, input, P_0, result, steps);
    const double limit =
        steps.add("limit of peak acceleration over g", "a_0", floor.acceleration_limit.value_or(occupancy.limit), "",
                  floor.acceleration_limit ? "given" : "DG11 Table 4.1");
    conclude(result, "peak acceleration over g", "", peak, limit);
    result.quantities = steps.take();
    return result;
}

} // namespace groundsill
