// Mechanisms in words.

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

#include "system/mechanism.hpp"

namespace groundsill {

namespace {

/// Movements below this part of the largest one are round-off of a shape, not movement.
constexpr Real still = 1e-6L;

constexpr std::size_t most_names = 8;

std::string join(const std::vector<std::string>& names) {
    std::string text;
    const std::size_t shown = std::min(names.size(), most_names);
    for (std::size_t k = 0; k < shown; ++k) {
        if (k > 0) text += (k + 1 == names.size()) ? " and " : ", ";
        text += names[k];
    }
    if (names.size() > shown) text += fmt::format(" and {} more", names.size() - shown);
    return text;
}

/// A node's movement in global axes.
struct Movement {
    Real x = 0, y = 0, rotation = 0;
};

Movement movement_of(const Structure& structure, const Shape& shape, int node) {
    const Vector travel = to_global(structure.turned_axes(node), shape[3 * node], shape[3 * node + 1]);
    return {travel.x, travel.y, shape[3 * node + 2]};
}

/// "along x", "along y", "along (0.60, 0.80)", "turn" or nothing for a node at rest.
std::string direction_of(const Movement& m, Real largest, Real size) {
    const Real travel = std::hypot(m.x, m.y);
    if (travel <= still * largest) return std::abs(m.rotation) * size > still * largest ? "turn" : "";
    if (std::abs(m.y) <= still * travel) return "along x";
    if (std::abs(m.x) <= still * travel) return "along y";
    const Real sign = m.x < 0 ? -1 : 1;
    return fmt::format("along ({:.2f}, {:.2f})", static_cast<double>(sign * m.x / travel),
                       static_cast<double>(sign * m.y / travel));
}

struct Moving {
    std::string direction;
    std::vector<std::string> nodes;
};

/// Something that lets a mechanism move, and where the file says so.
struct Freedom {
    std::string text;
    Position position;
};

/// Nodes that move, grouped by direction in the order in which they come.
std::vector<Moving> moving_nodes(const Structure& structure, const Shape& shape, Real largest) {
    std::vector<Moving> groups;
    for (int node = 0; node < structure.node_count; ++node) {
        const std::string direction = direction_of(movement_of(structure, shape, node), largest, structure.size);
        if (direction.empty()) continue;
        auto group =
            std::find_if(groups.begin(), groups.end(), [&](const Moving& g) { return g.direction == direction; });
        if (group == groups.end()) {
            if (groups.size() == most_names) break;
            group = groups.insert(groups.end(), Moving{direction, {}});
        }
        group->nodes.push_back(node_name(structure, node));
    }
    return groups;
}

std::string told(const Moving& group) {
    const bool one = group.nodes.size() == 1;
    if (group.direction == "turn") return join(group.nodes) + (one ? " turns" : " turn");
    return fmt::format("{} {} {}", join(group.nodes), one ? "moves" : "move", group.direction);
}

bool moves(const Structure& structure, const Shape& shape, int node, Real largest) {
    const Movement m = movement_of(structure, shape, node);
    return std::max(std::hypot(m.x, m.y), std::abs(m.rotation) * structure.size) > still * largest;
}

/// Members of which an end moves, in their order.
std::vector<std::string> moving_members(const Structure& structure, const Shape& shape, Real largest) {
    std::vector<std::string> names;
    for (const Segment& segment : structure.segments) {
        const std::string& name = structure.model->members[segment.member].name;
        if (!names.empty() && names.back() == name) continue;
        if (moves(structure, shape, segment.i, largest) || moves(structure, shape, segment.j, largest))
            names.push_back(name);
    }
    return names;
}

/// Free releases of a segment that open in a shape which puts no force on it.
void add_open_releases(const Structure& structure, const Segment& segment, const Shape& shape, Real largest,
                       std::vector<Freedom>& freedoms) {
    Movements u(structure.directions());
    u.high = shape;
    const elements::State at_i = end_state(structure, segment, false, u), at_j = end_state(structure, segment, true, u);
    elements::Loading none;
    elements::cut({}, segment.frame.length, none);
    elements::State start;
    elements::place_start(segment.frame, none, at_i, at_j, start);
    const elements::State end = elements::integrate(segment.frame, none, start);
    const Member& member = structure.model->members[segment.member];
    const auto check = [&](const Restraint& restraint, Real gap, const char* what, const char* where) {
        if (restraint.is_free() && std::abs(gap) > still * largest)
            freedoms.push_back({fmt::format("{} is released {} at its {}", member.name, what, where), member.position});
    };
    const Real L = segment.frame.length;
    check(segment.frame.start.axial, start.along - at_i.along, "axially", "start");
    check(segment.frame.start.shear, start.across - at_i.across, "in shear", "start");
    if (segment.i < static_cast<int>(structure.model->nodes.size()))
        check(segment.frame.start.moment, (start.rotation - at_i.rotation) * L, "in moment", "start");
    check(segment.frame.end.axial, end.along - at_j.along, "axially", "end");
    check(segment.frame.end.shear, end.across - at_j.across, "in shear", "end");
    if (segment.j < static_cast<int>(structure.model->nodes.size())) {
        check(segment.frame.end.moment, (end.rotation - at_j.rotation) * L, "in moment", "end");
    } else if (std::abs(end.rotation - at_j.rotation) * L > still * largest) {
        freedoms.push_back({fmt::format("{} opens", node_name(structure, segment.j)), member.position});
    }
}

/// Directions that supports leave free and in which the shape moves.
void add_free_supports(const Structure& structure, const Shape& shape, Real largest, std::vector<Freedom>& freedoms) {
    for (const Support& support : structure.model->supports) {
        const Real values[] = {shape[3 * support.node], shape[3 * support.node + 1],
                               shape[3 * support.node + 2] * structure.size};
        const Restraint* restraints[] = {&support.x, &support.y, &support.rotation};
        const char* names[] = {"x", "y", "rotation"};
        for (int c = 0; c < 3; ++c)
            if (restraints[c]->is_free() && std::abs(values[c]) > still * largest)
                freedoms.push_back(
                    {fmt::format("the support at {} leaves {}{} free", node_name(structure, support.node),
                                 c < 2 && structure.turned_axes(support.node) ? "its own " : "", names[c]),
                     support.position});
    }
}

std::string advice(const std::vector<Freedom>& freedoms) {
    if (freedoms.empty()) return "No support or member resists this: add one that does.";
    std::vector<std::string> texts;
    for (const Freedom& freedom : freedoms) texts.push_back(freedom.text);
    return fmt::format("What lets it: {}. Hold one of these, or add a support or a member.", join(texts));
}

Position first_moving_node(const Structure& structure, const Shape& shape, Real largest) {
    for (int node = 0; node < static_cast<int>(structure.model->nodes.size()); ++node)
        if (moves(structure, shape, node, largest)) return structure.model->nodes[node].position;
    return {};
}

} // namespace

Diagnostic describe_mechanism(const Structure& structure, const Shape& shape) {
    Real largest = 0;
    for (int node = 0; node < structure.node_count; ++node) {
        const Movement m = movement_of(structure, shape, node);
        largest = std::max({largest, std::hypot(m.x, m.y), std::abs(m.rotation) * structure.size});
    }
    std::vector<std::string> parts;
    for (const Moving& group : moving_nodes(structure, shape, largest)) parts.push_back(told(group));
    const std::vector<std::string> members = moving_members(structure, shape, largest);
    std::vector<Freedom> freedoms;
    add_free_supports(structure, shape, largest, freedoms);
    for (const Segment& segment : structure.segments)
        if (freedoms.size() <= most_names &&
            (moves(structure, shape, segment.i, largest) || moves(structure, shape, segment.j, largest)))
            add_open_releases(structure, segment, shape, largest, freedoms);
    std::string text = "the structure is a mechanism: ";
    for (std::size_t k = 0; k < parts.size(); ++k) {
        if (k > 0) text += ", ";
        text += parts[k];
    }
    if (members.size() == 1) text += fmt::format("; the member {} goes with it", members[0]);
    if (members.size() > 1) text += fmt::format("; the members {} go with it", join(members));
    text += ". ";
    text += advice(freedoms);
    return {Diagnostic::Severity::error,
            freedoms.empty() ? first_moving_node(structure, shape, largest) : freedoms[0].position, text};
}

Diagnostics describe_self_mechanisms(const Structure& structure) {
    Diagnostics found;
    for (const Segment& segment : structure.segments) {
        const std::string why = elements::self_mechanism(segment.frame);
        if (why.empty()) continue;
        const Member& member = structure.model->members[segment.member];
        found.push_back(
            {Diagnostic::Severity::error, member.position,
             fmt::format(
                 "the member {} is a mechanism by itself: {}. Hold one of these releases, or give it a stiffness.",
                 member.name, why)});
    }
    return found;
}

} // namespace groundsill
