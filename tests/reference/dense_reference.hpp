#pragma once
// The reference solution of a plane frame. It shares nothing with the program, not even the method.
//
// Method of initial parameters (W. D. Pilkey, Formulas for Stress, Strain, and Structural Matrices, 2nd ed. 2005, ch.
// 11; cited from memory): the state of a member at a place s, three movements and three internal forces, follows from
// its state at the start by integrating the field equations
//     dN/ds = -p      dV/ds = q      dM/ds = V                                   (p along, q across, per length)
//     du/ds = N/EA + e0      dr/ds = M/EI + k0      dw/ds = r - V/GAs            (e0, k0: free strain and curvature)
// piece by piece, each with polynomials of s. The unknowns are the nodes' movements, the reactions and every member's
// six initial parameters (one more a hinge); the equations are the joints at both ends, equilibrium of the nodes and
// the supports' laws. Nothing is condensed, no stiffness matrix or fixed-end force appears, a release is its own law
// and not a limit.

#include "frame.hpp"

#include <memory>
#include <optional>

namespace reference {

template <class S> struct Movement { S x, y, rotation; };
template <class S> struct Force { S x, y, moment; };
/// What a member carries and how it moves at one place, signs as in docs/results.md.
template <class S> struct Place { S N, V, M, along, across, rotation; };

template <class S> class Reference {
  public:
    /// Solves all the cases of a frame.
    /// \pre every index is valid; loads lie on their members
    explicit Reference(const Frame& frame);

    /// Smallest pivot of the equations, rows scaled to 1: round-off only for a mechanism.
    double smallest_pivot() const { return smallest_pivot_; }

    /// Movement of a node in global axes; the rotation is 0 where `has_rotation` is false.
    Movement<S> movement(int load_case, int node) const;
    bool has_rotation(int node) const;

    /// Force of a support on the structure, global axes.
    Force<S> reaction(int load_case, int support) const;

    /// \param at m from the start; a place closer than 1e-9 of the length to a load's or hinge's place is that place
    /// \param after at a jump: the value after it. Loads at the member's very ends act outside of the places 0 and L.
    Place<S> place(int load_case, int member, double at, bool after) const;

  private:
    struct Course;
    struct Layout;

    std::shared_ptr<const Frame> frame_;
    std::shared_ptr<const Layout> layout_;
    std::vector<std::shared_ptr<const Course>> courses_;
    std::vector<std::vector<S>> unknowns_;
    double smallest_pivot_ = 0;
};

} // namespace reference
