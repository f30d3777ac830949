#pragma once
// Downward loads turned into mass.

#include <vector>

#include "analysis/case_loads.hpp"
#include "elements/mass.hpp"

namespace groundsill {

/// A mass at a place of a segment, m from its start; kg.
struct PointMass {
    Real a = 0;
    Real mass = 0;
};

/// All mass on one segment.
struct SegmentLoadMass {
    elements::SegmentMass spread;
    std::vector<PointMass> points;
};

/// Mass of a segment from the listed cases: the downward (global -y) part of their loads over g, where it acts. Couples
/// and upward parts give none. Only the self-weight of shear-flexible members brings rotary inertia, ρ I.
SegmentLoadMass mass_of_segment(const Internals& internals, const MassModel& mass, const Segment& segment);

/// Mass on nodes, by node of the structure: from node loads of the listed cases, and given as such; kg.
std::vector<double> mass_of_nodes(const Structure& structure, const MassModel& mass);

} // namespace groundsill
