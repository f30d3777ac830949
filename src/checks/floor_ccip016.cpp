// Screening by CCIP-016 over a range of paces. Which modes take part, from memory of the guide's sections 4.3 and 4.4:
// in resonance all modes up to 15 Hz, if a vertical one lies below 4.2 times the fastest pace; in impulsive response
// the modes from the first vertical one above that to twice its frequency. The two are not added: the larger counts.

#include <algorithm>
#include <cmath>
#include <limits>
#include <string>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "checks/floor_footfall.hpp"
#include "checks/floor_methods.hpp"
#include "checks/floor_uses.hpp"

namespace groundsill {
namespace {

constexpr double highest_resonant = 15; // Hz
constexpr double pace_step = 0.005; // Hz; the exact resonances are added, so this shapes the curve between them only

struct Question {
    double cut_off = 0; ///< 4.2 times the fastest pace, Hz
    Walk walk;
    std::vector<WalkedMode> resonant; ///< empty where no vertical mode lies below the cut-off
    std::vector<WalkedMode> impulsive;
    std::vector<double> paces;
};

double mass_factor(const FloorModel& floor) {
    return floor.footfall->effective_width ? *floor.footfall->effective_width / *floor.spacing : 1;
}

/// Modes that move the floor vertically at all, with the mass of the floor that moves.
std::vector<WalkedMode> walked_modes(const FloorModel& floor, const FloorInput& input) {
    std::vector<WalkedMode> modes;
    int number = 0;
    for (const FloorMode& mode : input.modes) {
        ++number;
        if (mode.vertical > 0) {
            modes.push_back({number, mode.frequency, mode.modal_mass * mass_factor(floor), mode.vertical});
        }
    }
    return modes;
}

/// From slowest to fastest in equal steps, and every pace of which a harmonic meets a mode.
std::vector<double> paces_of(const FloorModel::Footfall& footfall, const std::vector<WalkedMode>& modes) {
    const double range = footfall.pace_most - footfall.pace_least;
    const int steps = static_cast<int>(std::ceil(range / pace_step));
    std::vector<double> paces{footfall.pace_least, footfall.pace_most};
    for (int i = 1; i < steps; ++i) paces.push_back(footfall.pace_least + range * i / steps);
    for (const WalkedMode& mode : modes) {
        for (int h = 1; h <= harmonic_count; ++h) {
            const double pace = mode.frequency / h;
            if (pace > footfall.pace_least && pace < footfall.pace_most) paces.push_back(pace);
        }
    }
    std::ranges::sort(paces);
    paces.erase(std::unique(paces.begin(), paces.end()), paces.end());
    return paces;
}

/// The first vertical mode above the cut-off; infinite without one, so that no mode is as high.
double lowest_impulsive(const FloorInput& input, double cut_off) {
    const auto mode = std::ranges::find_if(
        input.modes, [cut_off](const FloorMode& m) { return m.is_vertical && m.frequency >= cut_off; });
    return mode == input.modes.end() ? std::numeric_limits<double>::infinity() : mode->frequency;
}

Question question_of(const FloorModel& floor, const FloorInput& input) {
    const FloorModel::Footfall& footfall = *floor.footfall;
    Question question;
    question.cut_off = 4.2 * footfall.pace_most;
    question.walk = {footfall.walker, *floor.damping, std::nullopt};
    if (footfall.walk) question.walk.strides = *footfall.walk / footfall.stride;
    const bool resonance = first_vertical_mode(input)->frequency < question.cut_off;
    const double lowest = lowest_impulsive(input, question.cut_off);
    for (const WalkedMode& mode : walked_modes(floor, input)) {
        if (resonance && mode.frequency <= highest_resonant) question.resonant.push_back(mode);
        if (mode.frequency >= lowest && mode.frequency <= 2 * lowest) question.impulsive.push_back(mode);
    }
    question.paces = paces_of(footfall, question.resonant);
    return question;
}

PaceResponse response_at(const Question& question, double pace) {
    PaceResponse response;
    response.pace = pace;
    if (!question.resonant.empty())
        response.resonant = resonant_response(question.resonant, question.walk, pace).factor;
    if (!question.impulsive.empty())
        response.impulsive = impulsive_response(question.impulsive, question.walk, pace).factor;
    response.response = std::max(response.resonant.value_or(0), response.impulsive.value_or(0));
    return response;
}

void note_modes(const Question& question, FloorSteps& steps) {
    std::vector<WalkedMode> modes = question.resonant;
    for (const WalkedMode& mode : question.impulsive) {
        if (std::ranges::find(modes, mode.number, &WalkedMode::number) == modes.end()) modes.push_back(mode);
    }
    for (const WalkedMode& mode : modes) {
        const int m = mode.number;
        steps.add(fmt::format("frequency of mode {}", m), fmt::format("f_{}", m), mode.frequency, "Hz", "model");
        steps.add(fmt::format("modal mass of mode {}, effective width in it", m), fmt::format("m_{}", m), mode.mass,
                  "kg", "model");
        steps.add(fmt::format("shape of mode {} at walker and receiver", m), fmt::format("mu_{}", m), mode.shape, "",
                  "model");
    }
}

void note_harmonic(const Question& question, const HarmonicResponse& harmonic, int h, FloorSteps& steps) {
    const std::string of = fmt::format(" of harmonic {}", h);
    steps.add("frequency" + of, fmt::format("h{}_f", h), harmonic.frequency, "Hz", "CCIP-016 4.3");
    steps.add("force coefficient" + of, fmt::format("h{}_alpha", h), harmonic.coefficient, "", "CCIP-016 Table 4.3");
    steps.add("force" + of, fmt::format("h{}_F", h), harmonic.force, "N", "CCIP-016 4.3");
    steps.add("build-up of resonance" + of, fmt::format("h{}_rho", h), harmonic.build_up, "", "CCIP-016 4.3");
    for (std::size_t i = 0; i < harmonic.modes.size(); ++i) {
        const ModeTerm& term = harmonic.modes[i];
        const int m = question.resonant[i].number;
        const std::string mode = fmt::format("{} in mode {}", of, m);
        const std::string key = fmt::format("h{}_m{}_", h, m);
        steps.add("A = 1 - (h f_w/f_m)^2" + mode, key + "A", term.A, "", "CCIP-016 4.3");
        steps.add("B = 2 zeta h f_w/f_m" + mode, key + "B", term.B, "", "CCIP-016 4.3");
        steps.add("real acceleration" + mode, key + "a_real", term.acceleration.real(), "m/s2", "CCIP-016 4.3");
        steps.add("imaginary acceleration" + mode, key + "a_imag", term.acceleration.imag(), "m/s2", "CCIP-016 4.3");
    }
    steps.add("peak acceleration" + of, fmt::format("h{}_a", h), harmonic.acceleration, "m/s2", "CCIP-016 4.3");
    steps.add("peak acceleration of response factor 1" + of, fmt::format("h{}_a_base", h), harmonic.base, "m/s2",
              "ISO 10137 base curve");
    steps.add("response factor" + of, fmt::format("h{}_R", h), harmonic.factor, "", "CCIP-016 4.3");
}

void note_resonant(const Question& question, double pace, FloorSteps& steps) {
    const ResonantResponse response = resonant_response(question.resonant, question.walk, pace);
    for (int h = 1; h <= harmonic_count; ++h) {
        note_harmonic(question, response.harmonics[static_cast<std::size_t>(h - 1)], h, steps);
    }
    steps.add("resonant response factor, root of the sum of squares of the harmonics", "R_resonant", response.factor,
              "", "CCIP-016 4.3");
}

void note_impulsive(const Question& question, double pace, FloorSteps& steps) {
    const ImpulsiveResponse response = impulsive_response(question.impulsive, question.walk, pace);
    for (std::size_t i = 0; i < response.impulses.size(); ++i) {
        const int m = question.impulsive[i].number;
        steps.add(fmt::format("effective impulse on mode {}, 54 f_w^1.43/f_m^1.3", m), fmt::format("I_{}", m),
                  response.impulses[i], "N s", "CCIP-016 4.4");
        steps.add(fmt::format("peak velocity of mode {}, mu^2 I/m", m), fmt::format("v_{}", m), response.velocities[i],
                  "m/s", "CCIP-016 4.4");
    }
    steps.add("rms velocity over one footfall", "v_rms", response.rms, "m/s", "CCIP-016 4.4");
    steps.add("rms velocity of response factor 1", "v_base", response.base, "m/s", "ISO 10137 base curve");
    steps.add("impulsive response factor", "R_impulsive", response.factor, "", "CCIP-016 4.4");
}

/// Every step at the governing pace.
void note_steps(const FloorModel& floor, const Question& question, double pace, FloorSteps& steps) {
    steps.add("cut-off of resonance, 4.2 times the fastest pace", "f_cut_off", question.cut_off, "Hz", "CCIP-016 4.3");
    steps.add("weight of the walker", "P", question.walk.weight, "N", "CCIP-016 4.3");
    steps.add("damping ratio", "zeta", question.walk.damping, "", "given");
    steps.add("floor that moves with the strip, effective width over spacing", "mass_factor", mass_factor(floor), "",
              "given");
    note_modes(question, steps);
    steps.add("governing pace", "f_w", pace, "Hz", "CCIP-016 4.3");
    if (!question.resonant.empty()) note_resonant(question, pace, steps);
    if (!question.impulsive.empty()) note_impulsive(question, pace, steps);
}

void warn_of_strip(const FloorModel& floor, FloorResult& result) {
    if (floor.footfall->effective_width) return;
    result.warnings.emplace_back(
        "no effective_width: the strip moves alone, without the floor beside it, and the response is "
        "overestimated where the floor is continuous across the beams");
}

/// The highest mode found must lie beyond the last one that could take part.
void warn_of_missing_modes(const Question& question, const FloorInput& input, FloorResult& result) {
    double needed = question.impulsive.empty() ? question.cut_off : 2 * question.impulsive.front().frequency;
    if (!question.resonant.empty()) needed = std::max(needed, highest_resonant);
    const double highest = input.modes.back().frequency;
    if (highest > needed) return;
    result.warnings.push_back(
        fmt::format("CCIP-016 takes modes up to {:.3g} Hz and the highest found is {:.3g} Hz: ask for "
                    "more modes",
                    needed, highest));
}

} // namespace

FloorResult screen_by_ccip016(const FloorModel& floor, const FloorInput& input) {
    FloorResult result;
    FloorSteps steps;
    const Question question = question_of(floor, input);
    for (double pace : question.paces) result.over_pace.push_back(response_at(question, pace));
    const auto governing = std::ranges::max_element(result.over_pace, {}, &PaceResponse::response);
    cross_check_frequency(first_vertical_mode(input)->frequency, input, steps, result.warnings);
    note_steps(floor, question, governing->pace, steps);
    const auto by_use = response_limit_of(floor.use);
    const double limit = floor.response_limit
                             ? steps.add("limit of the response factor", "R_limit", *floor.response_limit, "", "given")
                             : steps.add("limit of the response factor", "R_limit", by_use->factor, "", by_use->source);
    conclude(result, "response factor", "", governing->response, limit);
    warn_of_strip(floor, result);
    warn_of_missing_modes(question, input, result);
    result.quantities = steps.take();
    return result;
}

} // namespace groundsill
