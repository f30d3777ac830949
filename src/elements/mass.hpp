#pragma once
// Mass of a segment that moves as its own statics bend it.

#include <array>
#include <vector>

#include "elements/loading.hpp"

namespace groundsill::elements {

/// Mass spread linearly from a to b, kg/m.
struct MassLine {
    Real a = 0, b = 0;
    Real ma = 0, mb = 0;
};

/// All mass along one segment; concentrated mass belongs to its nodes.
struct SegmentMass {
    std::vector<MassLine> lines;
    Real rotary = 0; ///< rotary inertia ρI of a shear-flexible segment, kg m
};

/// Symmetric 6 x 6 matrix over along, across, rotation at i and the same at j, in the segment's axes, row by row.
using EndMatrix = std::array<double, 36>;

/// Consistent mass (Archer 1963): ∫ m φᵢ φⱼ + ∫ ρI θᵢ θⱼ over the shapes that unit movements of the nodes give the
/// segment, releases and shear flexibility included.
EndMatrix consistent_mass(const Frame& frame, const BasicStiffness& stiffness, const SegmentMass& mass);

/// The state at the start of a segment whose nodes move, without loads.
State start_of_shape(const Frame& frame, const BasicStiffness& stiffness, const State& node_i, const State& node_j);

} // namespace groundsill::elements
