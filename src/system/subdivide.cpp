#include "system/subdivide.hpp"

namespace groundsill {

namespace {

/// Appends the parts of one segment. Its releases stay at its two ends.
void add_parts(const Segment& whole, const std::vector<Real>& places, Structure& fine) {
    Real from = 0;
    int node = whole.i;
    for (std::size_t k = 0; k <= places.size(); ++k) {
        const bool last = k == places.size();
        Segment part = whole;
        part.i = node;
        part.j = last ? whole.j : fine.node_count++;
        part.offset = whole.offset + from;
        part.frame.length = (last ? whole.frame.length : places[k]) - from;
        if (k > 0) part.frame.start = Release{};
        if (!last) part.frame.end = Release{};
        part.stiffness = elements::basic_stiffness(part.frame);
        from += part.frame.length;
        node = part.j;
        fine.segments.push_back(part);
    }
}

} // namespace

Subdivided subdivide(const Structure& structure, const std::function<std::vector<Real>(int segment)>& places) {
    Subdivided result;
    Structure& fine = result.structure;
    fine = structure;
    fine.segments.clear();
    fine.first_segment.clear();
    int member = -1;
    for (int k = 0; k < static_cast<int>(structure.segments.size()); ++k) {
        result.first_part.push_back(static_cast<int>(fine.segments.size()));
        if (structure.segments[k].member != member) fine.first_segment.push_back(result.first_part.back());
        member = structure.segments[k].member;
        add_parts(structure.segments[k], places(k), fine);
    }
    result.first_part.push_back(static_cast<int>(fine.segments.size()));
    fine.first_segment.push_back(result.first_part.back());
    fine.support_of_node.resize(fine.node_count, -1);
    fine.has_rotation.resize(fine.node_count, 1);
    fine.active.resize(fine.directions(), 1);
    fine.spring.resize(fine.directions(), 0);
    return result;
}

} // namespace groundsill
