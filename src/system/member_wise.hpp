#pragma once
// Equilibrium summed member by member from deformations, in long double: the reference against which a solution is
// refined. The assembled stiffness is only the preconditioner, since rounding that went into it could not be refined
// away on it.

#include <vector>

#include "system/structure.hpp"

namespace groundsill {

/// Movements by direction, each the unevaluated sum of two parts, so that differences of large movements stay exact.
struct Movements {
    std::vector<Real> high;
    std::vector<Real> low;

    explicit Movements(int directions = 0) : high(directions, 0), low(directions, 0) {}
    void add(int direction, Real value);
    Real value(int direction) const { return high[direction] + low[direction]; }
};

/// What acts on the structure in one case, ready to be balanced.
struct LoadVector {
    std::vector<Real> nodal;               ///< by direction: loads on nodes and what moved spring ends push
    std::vector<elements::FixedEnd> fixed; ///< by segment; empty where no segment is loaded
};

/// Forces on a segment at its two ends, in its own axes.
struct EndForces {
    Real along_i = 0, across_i = 0, moment_i = 0;
    Real along_j = 0, across_j = 0, moment_j = 0;
};

/// Forces N, M1, M2 and V of a segment from the movements of its nodes, without those of its loads.
elements::BasicForces basic_forces(const Structure& structure, const Segment& segment, const Movements& u);

/// The end forces that belong to basic forces and, where it is loaded, fixed-end forces. A sum at round-off of its
/// parts is 0.
EndForces end_forces(const elements::BasicForces& q, const elements::FixedEnd* fixed);

/// Movements of the node at one end of a segment, in the segment's axes.
elements::State end_state(const Structure& structure, const Segment& segment, bool at_end, const Movements& u);

/// r = f - K u on every direction: what is missing to equilibrium. On a direction that a support fixes, minus the
/// reaction. \param scale largest nodal load or end force met, moments divided by the structure's size
std::vector<Real> residual(const Structure& structure, const LoadVector& loads, const Movements& u, Real& scale);

/// y = K x on the active directions (0 on the others), without loads.
void apply_stiffness(const Structure& structure, const std::vector<Real>& x, std::vector<Real>& y);

/// Twice the strain energy of a segment under the basic forces q, its elastic releases included.
Real strain_energy(const Segment& segment, const elements::BasicForces& q);

/// xᵀ K y of two shapes (x = y: twice the strain energy), summed from their forces, so that a shape without forces
/// comes out at the square of round-off.
Real strain_energy(const Structure& structure, const std::vector<Real>& x, const std::vector<Real>& y);

} // namespace groundsill
