#pragma once
// The plane frame member: stiffness of one straight prismatic segment between two nodes, end releases included.
//
// Symbols
//   i, j      start and end of the segment
//   L         length, m;  c, s: cosine and sine of the angle from global x to the segment
//   E A, E I, G A   axial, bending and shear stiffness, N, N m2, N
//   e         deformations of the chord: eN = elongation; e1, e2 = rotations of the ends against the chord, each
//   positive
//             where it goes with a sagging moment: e1 = -(θi - ψ), e2 = θj - ψ, ψ = (vj - vi)/L
//   q         the forces that do work on them: N at the start, M1, M2 = bending moments at the two ends, sagging
//   positive V         shear force dM/ds: without loads (M2 - M1)/L
//
// Forces "at an end" are those passed between node and segment, outside of loads that stand at the very end.

#include "groundsill/model.hpp"

namespace groundsill::elements {

/// The precision in which deformations are taken and forces are summed, so that the rounding of large movements does
/// not reach small deformations (64-bit mantissa on x86).
using Real = long double;

/// What a segment is made of.
struct Frame {
    Real length = 0;
    Real cosine = 1;
    Real sine = 0;
    Real axial_flexibility = 0;   ///< 1/(E A)
    Real bending_flexibility = 0; ///< 1/(E I)
    Real shear_flexibility = 0;   ///< 1/(G A); 0 where the segment is rigid in shear (Euler-Bernoulli)
    Release start;
    Release end;
};

/// Deformations of the chord: eN, e1, e2.
struct Deformation {
    Real axial = 0;
    Real first = 0;
    Real second = 0;
};

/// The forces that go with them: N at the start, M1, M2, and the shear force V that is the same all along while no load
/// acts. V is (M2 - M1)/L, but kept apart: where a soft shear release makes it small, that difference would be all
/// round-off.
struct BasicForces {
    Real N = 0;
    Real M1 = 0;
    Real M2 = 0;
    Real V = 0;
};

/// q = K e: the symmetric stiffness of the chord deformations, and V = v1 e1 + v2 e2. Axial and bending do not couple.
struct BasicStiffness {
    Real axial = 0;
    Real k11 = 0;
    Real k12 = 0;
    Real k22 = 0;
    Real v1 = 0;
    Real v2 = 0;

    BasicForces operator*(const Deformation& e) const {
        return {axial * e.axial, k11 * e.first + k12 * e.second, k12 * e.first + k22 * e.second,
                v1 * e.first + v2 * e.second};
    }
};

/// The bending moments at the ends that the free releases leave open, and how flexible the segment is to them.
/// A free moment release asks M = 0, a free shear release asks V = 0 at its end; what is left is q = particular + Z r
/// with `count` columns in Z.
struct BendingSpace {
    int count = 2;
    Real z1 = 0, z2 = 0; ///< the column of Z when count is 1
};

/// Flexibility of bending, F in e = F q, from the segment, its shear flexibility and its elastic releases.
struct BendingFlexibility {
    Real f11 = 0;
    Real f12 = 0;
    Real f22 = 0;
    Real determinant = 0; ///< f11 f22 - f12², summed from positive terms
};

/// How a movement of one end across the segment works while the ends cannot turn more than their releases let them.
struct ShearPath {
    bool passes = false;  ///< whether a shear force can pass from end to end without loads
    Real share = 0;       ///< M1 = -share L V and M2 = (1 - share) L V go with the shear force V
    Real bending = 0;     ///< movement per V L from bending and shear deformation, m/(N m)
    Real flexibility = 0; ///< with the elastic shear releases added
};

BendingFlexibility end_moment_flexibility(const Frame& frame);
ShearPath shear_path(const Frame& frame);
BendingSpace bending_space(const Frame& frame);

/// Flexibility of the axial force, eN = f N; meaningless where a release is axially free.
Real elongation_flexibility(const Frame& frame);

/// 1/k of an elastic restraint, 0 of a fixed one; meaningless for a free one.
inline Real flexibility_of(const Restraint& restraint) {
    return restraint.is_elastic() ? 1 / Real(restraint.stiffness) : Real(0);
}

/// True where an axial release is free, so that the axial force follows from the loads alone.
bool is_axially_free(const Frame& frame);

/// Stiffness of the chord deformations by the flexibility method (Przemieniecki 1968, ch. 5, with the flexibilities of
/// end springs added; free releases by projection on the forces that they can pass). \pre the releases leave the
/// segment attached (self_mechanism gives an empty text)
BasicStiffness basic_stiffness(const Frame& frame);

/// Why the releases let the segment move by itself, with both nodes held; empty when they do not.
/// It is held where at least one end is held axially, one across, and two of its four transverse connections in all.
std::string self_mechanism(const Frame& frame);

} // namespace groundsill::elements
