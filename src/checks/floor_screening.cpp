#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "checks/floor_methods.hpp"
#include "groundsill/model.hpp"

namespace groundsill {
namespace {

FloorResult screen_by(FloorMethod method, const FloorModel& floor, const FloorInput& input) {
    switch (method) {
    case FloorMethod::dg11:
        return screen_by_dg11(floor, input);
    case FloorMethod::en1995:
        return screen_by_en1995(floor, input);
    case FloorMethod::ccip016:
        return screen_by_ccip016(floor, input);
    }
    return {};
}

FloorResult without_vertical_mode() {
    FloorResult result;
    result.warnings.emplace_back(
        "none of the modes found is a vertical one of the floor's members: ask for more modes, or "
        "name other members");
    return result;
}

} // namespace

std::string_view floor_method_name(FloorMethod method) {
    switch (method) {
    case FloorMethod::dg11:
        return "DG11";
    case FloorMethod::en1995:
        return "EN 1995";
    case FloorMethod::ccip016:
        return "CCIP-016";
    }
    return {};
}

std::optional<FloorMethod> floor_method(std::string_view name, std::string& error) {
    for (FloorMethod method : {FloorMethod::dg11, FloorMethod::en1995, FloorMethod::ccip016}) {
        if (name == floor_method_name(method)) return method;
    }
    error = fmt::format("\"{}\" is not a method of floor screening: use \"DG11\", \"EN 1995\" or \"CCIP-016\"", name);
    return std::nullopt;
}

const FloorMode* first_vertical_mode(const FloorInput& input) {
    const auto mode = std::ranges::find_if(input.modes, &FloorMode::is_vertical);
    return mode == input.modes.end() ? nullptr : &*mode;
}

void cross_check_frequency(double frequency, const FloorInput& input, FloorSteps& steps,
                           std::vector<std::string>& warnings) {
    if (!(input.static_deflection > 0)) return;
    const double deflection = steps.add("static deflection of the model under the weight of its mass", "Delta_static",
                                        input.static_deflection, "m", "model");
    const double estimate =
        steps.add("estimate of the frequency from the static deflection, 0.18 sqrt(g/Delta_static)", "f_static",
                  0.18 * std::sqrt(standard_gravity / deflection), "Hz", "cross-check, DG11 Eq. 3.3");
    if (std::abs(frequency / estimate - 1) <= 0.15) return;
    warnings.push_back(
        fmt::format("the first vertical frequency, {:.3g} Hz, is far from the estimate {:.3g} Hz by the static "
                    "deflection: spans that vibrate against each other do this; without such, look for a "
                    "mistake in supports or mass",
                    frequency, estimate));
}

void conclude(FloorResult& result, std::string criterion, std::string unit, double value, double limit) {
    result.criterion = std::move(criterion);
    result.unit = std::move(unit);
    result.value = value;
    result.limit = limit;
    result.utilisation = value / limit;
    result.passed = value <= limit;
}

std::vector<FloorResult> screen_floor(const FloorModel& floor, const FloorInput& input) {
    std::vector<FloorResult> results;
    for (FloorMethod method : floor.methods) {
        FloorResult result =
            first_vertical_mode(input) == nullptr ? without_vertical_mode() : screen_by(method, floor, input);
        result.method = method;
        result.use = floor.use;
        results.push_back(std::move(result));
    }
    return results;
}

} // namespace groundsill
