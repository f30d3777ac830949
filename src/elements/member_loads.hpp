#pragma once
// A member's loads, as the model gives them, turned into the axes of one of its segments.

#include "elements/loading.hpp"

namespace groundsill::elements {

/// Where a segment lies in its member, and what its material and section do under temperature.
struct SegmentPlace {
    Real offset = 0;        ///< of its start from the member's start, m
    Real length = 0;        ///< m
    Real member_length = 0; ///< m
    Real cosine = 1, sine = 0;
    bool is_last = true;  ///< the segment ends where the member ends
    double expansion = 0; ///< 1/K
    double depth = 0,
           bottom = 0; ///< of the section and from centroid to the face at -across, m; used by face temperatures
};

/// Adds `factor` times a load to what acts on the segment; nothing where the load lies on another segment.
/// A point load where two segments meet belongs to the later one.
void add_load(const MemberLoad& load, Real factor, const SegmentPlace& place, SegmentLoads& loads);

/// Adds the weight of the segment, `weight` N/m along -y.
void add_self_weight(Real weight, const SegmentPlace& place, SegmentLoads& loads);

} // namespace groundsill::elements
