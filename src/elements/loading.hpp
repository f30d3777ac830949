#pragma once
// Loads along one segment, in its own axes, as piecewise functions; fixed-end forces and diagrams by exact integration.
//
// Equilibrium of a slice: N' = -p, V' = q, M' = V; a point load makes N jump by -P, V by +Q and M by -m.
// Movements: θ' = M/EI + κ0, v' = θ - V/GA, u' = N/EA + ε0.

#include <vector>

#include "elements/frame.hpp"
#include "groundsill/diagram.hpp"

namespace groundsill::elements {

/// A load spread linearly from a to b; p along and q across the segment, N/m.
struct LineLoad {
    Real a = 0, b = 0;
    Real pa = 0, qa = 0;
    Real pb = 0, qb = 0;
};

/// A concentrated load at a: P along, Q across (N), m counter-clockwise (N m).
struct PointLoad {
    Real a = 0;
    Real P = 0, Q = 0;
    Real m = 0;
};

/// All that acts on one segment.
struct SegmentLoads {
    std::vector<LineLoad> lines;
    std::vector<PointLoad> points;
    Real strain = 0;    ///< free strain ε0 of the axis
    Real curvature = 0; ///< free curvature κ0, positive where it sags (bottom longer than top), 1/m

    bool empty() const { return lines.empty() && points.empty() && strain == 0 && curvature == 0; }
    void clear();
};

/// Loads between two places: jumps at its start, then line loads p = p0 + p1 t, q = q0 + q1 t with t = s - from.
struct LoadPiece {
    Real from = 0, to = 0;
    Real P = 0, Q = 0, m = 0;
    Real p0 = 0, p1 = 0;
    Real q0 = 0, q1 = 0;
};

/// The loads of a segment, cut where they change.
struct Loading {
    std::vector<LoadPiece> pieces;        ///< from 0 to L, at least one
    Real end_P = 0, end_Q = 0, end_m = 0; ///< point loads at the very end
    Real strain = 0;
    Real curvature = 0;
};

/// Cuts the loads of a segment of the given length. Places closer than 1e-12 L count as one.
/// \param loading overwritten; its memory is used again
void cut(const SegmentLoads& loads, Real length, Loading& loading);

/// Forces and movements at one place.
struct State {
    Real N = 0, V = 0, M = 0;
    Real along = 0, across = 0, rotation = 0;
};

/// The state at the end of the segment, outside of loads at the very end, from that at its start.
State integrate(const Frame& frame, const Loading& loading, const State& start);

/// Forces passed at the ends when the loads act and no node moves (fixed-end forces).
struct FixedEnd {
    BasicForces q;    ///< N at the start, M1, M2; V stays 0
    Real P = 0;       ///< N at the start minus N at the end: all loads along
    Real V_start = 0; ///< shear force at the start
    Real V_end = 0;   ///< and at the end
};

/// Fixed-end forces by the force method: the simply supported segment under the loads, corrected by q so that the nodes
/// need not move (virtual work; Gauss-Legendre with three points, exact for the polynomials that occur).
FixedEnd fixed_end(const Frame& frame, const Loading& loading);

/// The movements of a segment's own first point, which a release sets apart from the node's: from the movements of the
/// nodes in the segment's axes (along, across, rotation at i and j) and the forces at the ends.
/// \param start forces at the start; its movements are filled in
void place_start(const Frame& frame, const Loading& loading, const State& node_i, const State& node_j, State& start);

/// Appends the diagrams of a segment, moved by `offset` along the member.
void append_diagram(const Frame& frame, const Loading& loading, const State& start, double offset,
                    std::vector<DiagramPiece>& pieces);

} // namespace groundsill::elements
