#include "analysis/mass_loads.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill {

namespace {

/// Downward part of a load in a segment's axes, over g.
Real downward(const Segment& segment, Real along, Real across) {
    return -(segment.frame.sine * along + segment.frame.cosine * across) / Real(standard_gravity);
}

/// Adds the positive part of a line of mass: cut where it changes its sign.
void add_positive(elements::MassLine line, std::vector<elements::MassLine>& lines) {
    if (line.ma <= 0 && line.mb <= 0) return;
    if (line.ma < 0 || line.mb < 0) {
        const Real zero = line.a + (line.b - line.a) * line.ma / (line.ma - line.mb);
        if (line.ma < 0)
            line = {zero, line.b, 0, line.mb};
        else
            line = {line.a, zero, line.ma, 0};
    }
    lines.push_back(line);
}

} // namespace

SegmentLoadMass mass_of_segment(const Internals& internals, const MassModel& mass, const Segment& segment) {
    const Structure& structure = internals.structure;
    const Member& member = structure.model->members[segment.member];
    const Section& section = structure.model->sections[member.section];
    SegmentLoadMass result;
    elements::SegmentLoads acting;
    for (const Combination::Term& term : mass.cases) {
        acting.clear();
        internals.loads.add(structure, term.load_case, term.factor, segment, acting);
        for (const elements::LineLoad& line : acting.lines)
            add_positive({line.a, line.b, downward(segment, line.pa, line.qa), downward(segment, line.pb, line.qb)},
                         result.spread.lines);
        for (const elements::PointLoad& point : acting.points) {
            const Real kilograms = downward(segment, point.P, point.Q);
            if (kilograms > 0) result.points.push_back({point.a, kilograms});
        }
        const Real weight = term.factor * structure.model->cases[term.load_case].self_weight;
        if (section.shear_area && weight > 0)
            result.spread.rotary +=
                weight * structure.model->materials[member.material].density.value_or(0) * section.I;
    }
    return result;
}

std::vector<double> mass_of_nodes(const Structure& structure, const MassModel& mass) {
    std::vector<double> masses(structure.node_count, 0.0);
    for (const Combination::Term& term : mass.cases)
        for (const NodeLoad& load : structure.model->cases[term.load_case].node_loads)
            masses[load.node] += std::max(0.0, -term.factor * load.y / standard_gravity);
    for (const MassModel::NodeMass& node : mass.nodes) masses[node.node] += node.mass;
    return masses;
}

} // namespace groundsill
