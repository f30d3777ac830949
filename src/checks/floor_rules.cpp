// What must hold of the table [floor] before the structure is solved.

#include <algorithm>
#include <cmath>
#include <optional>
#include <string>

#include <fmt/format.h>

#include "checks/floor_uses.hpp"
#include "groundsill/floor.hpp"
#include "model/findings.hpp"

namespace groundsill {
namespace {

void require_positive(double value, const char* key, Position position, Findings& findings) {
    if (std::isfinite(value) && value > 0) return;
    findings.error(position, fmt::format("{} must be above 0", key));
}

void positive_where_given(std::optional<double> value, const char* key, Position position, Findings& findings) {
    if (value) require_positive(*value, key, position, findings);
}

void require_given(std::optional<double> value, const char* key, FloorMethod method, Position position,
                   Findings& findings) {
    if (!value) findings.error(position, fmt::format("{} is missing: {} needs it", key, floor_method_name(method)));
}

void check_damping(const FloorModel& floor, Findings& findings) {
    if (floor.damping) {
        if (*floor.damping > 0 && *floor.damping < 1) return;
        findings.error(floor.position, "floor.damping must be above 0 and below 1, as a part of critical damping");
        return;
    }
    const bool needed = std::ranges::any_of(floor.methods, [](FloorMethod m) { return m != FloorMethod::en1995; });
    if (needed) {
        findings.error(floor.position,
                       "floor.damping is missing: DG11 takes 0.02 for bare or open floors, churches and malls, "
                       "0.03 for modular offices, 0.05 with full-height partitions and 0.01 for footbridges");
    }
}

void check_use(const FloorModel& floor, FloorMethod method, Findings& findings) {
    if (!floor.use.empty()) {
        const std::string refusal = occupancy_refusal(method, floor.use);
        if (!refusal.empty()) findings.error(floor.use_position, "floor.use: " + refusal);
        return;
    }
    // EN 1995 knows dwellings only; CCIP-016 takes nothing but a limit from the word.
    if (method == FloorMethod::en1995 || (method == FloorMethod::ccip016 && floor.response_limit)) return;
    findings.error(floor.position,
                   fmt::format("floor.use is missing: {} takes its limit from it", floor_method_name(method)));
}

void check_slab(const FloorModel::Panel& panel, Findings& findings) {
    const bool by_depth = panel.slab_depth || panel.slab_E;
    if (by_depth && panel.slab_stiffness) {
        findings.error(panel.position,
                       "floor.panel gives the slab twice: keep slab_depth and slab_E, or slab_stiffness");
    } else if (by_depth && !(panel.slab_depth && panel.slab_E)) {
        findings.error(panel.position, "floor.panel gives only one of slab_depth and slab_E: give both");
    } else if (!by_depth && !panel.slab_stiffness && !panel.weight) {
        findings.error(panel.position,
                       "floor.panel gives neither the slab (slab_depth and slab_E, or slab_stiffness) nor the "
                       "effective weight (weight)");
    }
    positive_where_given(panel.slab_depth, "floor.panel.slab_depth", panel.position, findings);
    positive_where_given(panel.slab_E, "floor.panel.slab_E", panel.position, findings);
    positive_where_given(panel.slab_stiffness, "floor.panel.slab_stiffness", panel.position, findings);
}

void check_girder(const FloorModel::Girder& girder, Position position, Findings& findings) {
    require_positive(girder.E, "floor.panel.girder.E", position, findings);
    require_positive(girder.I, "floor.panel.girder.I", position, findings);
    require_positive(girder.span, "floor.panel.girder.span", position, findings);
    require_positive(girder.weight, "floor.panel.girder.weight", position, findings);
    require_positive(girder.floor_length, "floor.panel.girder.floor_length", position, findings);
}

void check_dg11(const FloorModel& floor, Findings& findings) {
    if (!floor.panel) {
        findings.error(floor.position, "floor.panel is missing: DG11 takes the effective weight of the floor from it");
        return;
    }
    const FloorModel::Panel& panel = *floor.panel;
    check_slab(panel, findings);
    positive_where_given(panel.weight, "floor.panel.weight", panel.position, findings);
    positive_where_given(panel.floor_width, "floor.panel.floor_width", panel.position, findings);
    if (panel.girder) check_girder(*panel.girder, panel.position, findings);
    if (panel.weight) return;
    require_given(panel.floor_width, "floor.panel.floor_width", FloorMethod::dg11, panel.position, findings);
    require_given(floor.spacing, "floor.spacing", FloorMethod::dg11, floor.position, findings);
}

void check_en1995(const FloorModel& floor, Findings& findings) {
    require_given(floor.spacing, "floor.spacing", FloorMethod::en1995, floor.position, findings);
    if (!floor.timber) {
        findings.error(floor.position,
                       "floor.timber is missing: EN 1995 needs the floor's width and transverse stiffness");
        return;
    }
    const FloorModel::Timber& timber = *floor.timber;
    require_positive(timber.width, "floor.timber.width", timber.position, findings);
    require_positive(timber.transverse, "floor.timber.transverse", timber.position, findings);
    positive_where_given(timber.deflection_limit, "floor.timber.deflection_limit", timber.position, findings);
    if (timber.velocity_limit && !(*timber.velocity_limit > 1)) {
        findings.error(timber.position,
                       "floor.timber.velocity_limit must be above 1; EN 1995-1-1 Figure 7.2 has 50 to 150");
    }
}

void check_ccip016(const FloorModel& floor, Findings& findings) {
    if (!floor.footfall) {
        findings.error(floor.position, "floor.footfall is missing: CCIP-016 needs the range of paces");
        return;
    }
    const FloorModel::Footfall& footfall = *floor.footfall;
    if (!(footfall.pace_least >= 1 && footfall.pace_most <= 2.8 && footfall.pace_least <= footfall.pace_most)) {
        findings.error(footfall.position,
                       "floor.footfall.pace must rise and lie between 1 Hz and 2.8 Hz, the walking paces "
                       "that CCIP-016 has forces for");
    }
    positive_where_given(footfall.walk, "floor.footfall.walk", footfall.position, findings);
    require_positive(footfall.stride, "floor.footfall.stride", footfall.position, findings);
    require_positive(footfall.walker, "floor.footfall.walker", footfall.position, findings);
    positive_where_given(footfall.effective_width, "floor.footfall.effective_width", footfall.position, findings);
    if (footfall.effective_width && !floor.spacing) {
        findings.error(footfall.position,
                       "floor.footfall.effective_width needs floor.spacing: the modal mass is that of the "
                       "strip times effective_width / spacing");
    }
}

void check_method(const FloorModel& floor, FloorMethod method, Findings& findings) {
    check_use(floor, method, findings);
    switch (method) {
    case FloorMethod::dg11:
        return check_dg11(floor, findings);
    case FloorMethod::en1995:
        return check_en1995(floor, findings);
    case FloorMethod::ccip016:
        return check_ccip016(floor, findings);
    }
}

} // namespace

Diagnostics check_floor(const FloorModel& floor) {
    Findings findings;
    if (floor.members.empty())
        findings.error(floor.position, "floor.members is empty: name the members that are the floor");
    if (floor.methods.empty()) {
        findings.error(floor.position, "floor.method is empty: give \"DG11\", \"EN 1995\" or \"CCIP-016\"");
    }
    check_damping(floor, findings);
    positive_where_given(floor.spacing, "floor.spacing", floor.position, findings);
    positive_where_given(floor.target, "floor.target", floor.position, findings);
    positive_where_given(floor.acceleration_limit, "floor.acceleration_limit", floor.position, findings);
    positive_where_given(floor.response_limit, "floor.response_limit", floor.position, findings);
    for (FloorMethod method : floor.methods) check_method(floor, method, findings);
    return findings.take();
}

} // namespace groundsill
