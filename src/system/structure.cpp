#include "system/structure.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/format.h>

namespace groundsill {

namespace {

elements::Frame make_frame(const Model& model, const Member& member) {
    const Section& section = model.sections[member.section];
    const Material& material = model.materials[member.material];
    const Real dx = Real(model.nodes[member.to].x) - model.nodes[member.from].x;
    const Real dy = Real(model.nodes[member.to].y) - model.nodes[member.from].y;
    elements::Frame frame;
    frame.length = dy == 0 ? std::abs(dx) : std::sqrt(dx * dx + dy * dy);
    frame.cosine = dx / frame.length;
    frame.sine = dy / frame.length;
    frame.axial_flexibility = 1 / (Real(member.stiffness_factor) * material.E * section.A);
    frame.bending_flexibility = 1 / (Real(member.stiffness_factor) * material.E * section.I);
    if (section.shear_area)
        frame.shear_flexibility = 1 / (Real(member.stiffness_factor) * material.G.value_or(0) * *section.shear_area);
    return frame;
}

/// Cuts a member at its hinges; each hinge is a node, its rotation that of the later segment.
void add_segments(const Model& model, int index, Structure& structure) {
    const Member& member = model.members[index];
    const elements::Frame whole = make_frame(model, member);
    Real offset = 0;
    int from = member.from;
    for (std::size_t k = 0; k <= member.hinges.size(); ++k) {
        const bool last = k == member.hinges.size();
        Segment segment;
        segment.member = index;
        segment.i = from;
        segment.j = last ? member.to : structure.node_count++;
        segment.offset = offset;
        segment.frame = whole;
        segment.frame.length = (last ? whole.length : Real(member.hinges[k])) - offset;
        if (k == 0) segment.frame.start = member.start;
        if (last)
            segment.frame.end = member.end;
        else
            segment.frame.end.moment.kind = Restraint::Kind::free;
        segment.stiffness = elements::basic_stiffness(segment.frame);
        offset += segment.frame.length;
        from = segment.j;
        structure.segments.push_back(segment);
    }
}

void mark_rotations(Structure& structure) {
    structure.has_rotation.assign(structure.node_count, 0);
    for (const Segment& segment : structure.segments) {
        if (!segment.frame.start.moment.is_free()) structure.has_rotation[segment.i] = 1;
        if (!segment.frame.end.moment.is_free()) structure.has_rotation[segment.j] = 1;
    }
    for (const Support& support : structure.model->supports)
        if (!support.rotation.is_free()) structure.has_rotation[support.node] = 1;
}

void add_supports(const Model& model, Structure& structure) {
    for (std::size_t k = 0; k < model.supports.size(); ++k) {
        const Support& support = model.supports[k];
        structure.support_of_node[support.node] = static_cast<int>(k);
        TurnedAxes axes{std::cos(Real(support.angle)), std::sin(Real(support.angle))};
        // a right angle is given in a unit that rounds: 1e-15 rad is far below any angle that is meant
        if (std::abs(axes.sine) < Real(1e-15)) axes = {std::copysign(Real(1), axes.cosine), 0};
        if (std::abs(axes.cosine) < Real(1e-15)) axes = {0, std::copysign(Real(1), axes.sine)};
        structure.axes_of_support.push_back(axes);
        const Restraint* restraints[] = {&support.x, &support.y, &support.rotation};
        for (int c = 0; c < 3; ++c) {
            const int direction = 3 * support.node + c;
            if (restraints[c]->is_fixed()) structure.active[direction] = 0;
            if (restraints[c]->is_elastic()) structure.spring[direction] = restraints[c]->stiffness;
        }
    }
}

Real box_diagonal(const Model& model) {
    Real left = model.nodes[0].x, right = left, low = model.nodes[0].y, high = low;
    for (const Node& node : model.nodes) {
        left = std::min(left, Real(node.x));
        right = std::max(right, Real(node.x));
        low = std::min(low, Real(node.y));
        high = std::max(high, Real(node.y));
    }
    return std::hypot(right - left, high - low);
}

/// The segment that ends at a hinge node.
const Segment& segment_before_hinge(const Structure& structure, int node) {
    const auto found = std::find_if(structure.segments.begin(), structure.segments.end(),
                                    [node](const Segment& segment) { return segment.j == node; });
    return *found;
}

} // namespace

Structure number_structure(const Model& model) {
    Structure structure;
    structure.model = &model;
    structure.node_count = static_cast<int>(model.nodes.size());
    structure.segments.reserve(model.members.size());
    structure.first_segment.reserve(model.members.size() + 1);
    for (int index = 0; index < static_cast<int>(model.members.size()); ++index) {
        structure.first_segment.push_back(static_cast<int>(structure.segments.size()));
        add_segments(model, index, structure);
    }
    structure.first_segment.push_back(static_cast<int>(structure.segments.size()));
    structure.support_of_node.assign(structure.node_count, -1);
    structure.active.assign(structure.directions(), 1);
    structure.spring.assign(structure.directions(), 0);
    mark_rotations(structure);
    add_supports(model, structure);
    for (int node = 0; node < structure.node_count; ++node)
        if (!structure.has_rotation[node]) structure.active[3 * node + 2] = 0;
    structure.size = box_diagonal(model);
    return structure;
}

Point node_point(const Structure& structure, int node) {
    const Model& model = *structure.model;
    if (node < static_cast<int>(model.nodes.size())) return {model.nodes[node].x, model.nodes[node].y};
    const Segment& segment = segment_before_hinge(structure, node);
    const Node& from = model.nodes[model.members[segment.member].from];
    const Real s = segment.offset + segment.frame.length;
    return {static_cast<double>(from.x + s * segment.frame.cosine),
            static_cast<double>(from.y + s * segment.frame.sine)};
}

std::string node_name(const Structure& structure, int node) {
    const Model& model = *structure.model;
    if (node < static_cast<int>(model.nodes.size())) return model.nodes[node].name;
    const Segment& segment = segment_before_hinge(structure, node);
    return fmt::format("the hinge of {} at {:.4g} m", model.members[segment.member].name,
                       static_cast<double>(segment.offset + segment.frame.length));
}

elements::SegmentPlace segment_place(const Structure& structure, const Segment& segment) {
    const Model& model = *structure.model;
    const Member& member = model.members[segment.member];
    const Section& section = model.sections[member.section];
    const Segment& last = structure.segments[structure.first_segment[segment.member + 1] - 1];
    elements::SegmentPlace place;
    place.offset = segment.offset;
    place.length = segment.frame.length;
    place.member_length = last.offset + last.frame.length;
    place.cosine = segment.frame.cosine;
    place.sine = segment.frame.sine;
    place.is_last = &last == &segment;
    place.expansion = model.materials[member.material].expansion.value_or(0);
    place.depth = section.depth.value_or(0);
    place.bottom = section.bottom.value_or(place.depth / 2);
    return place;
}

} // namespace groundsill
