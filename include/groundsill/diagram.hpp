#pragma once
// Internal forces and movements along one member, as exact functions of the place.

#include <array>
#include <vector>

namespace groundsill {

/// Internal forces at one place: N positive in tension, V = dM/ds, M positive sagging (tension at -across). N, N, N m.
struct MemberForces {
    double N = 0;
    double V = 0;
    double M = 0;
};

/// A polynomial c[0] + c[1] t + c[2] t^2 + ...
template <int Degree> using Polynomial = std::array<double, Degree + 1>;

/// The functions between two places where the load changes, of t = s - from.
struct DiagramPiece {
    double from = 0; ///< m from the member's start
    double to = 0;
    bool jump = false; ///< a point load stands at `from`: N, V or M jump there
    Polynomial<2> N{};
    Polynomial<2> V{};
    Polynomial<3> M{};
    Polynomial<3> along{};  ///< movement along the member's axis, m
    Polynomial<5> across{}; ///< movement across it, m
};

/// Everything at one place of a member.
struct DiagramPlace {
    double at = 0;
    MemberForces forces;
    double along = 0;
    double across = 0;
};

struct DiagramExtreme {
    double value = 0;
    double at = 0;
};
struct DiagramRange {
    DiagramExtreme max;
    DiagramExtreme min;
};

/// The functions of a diagram whose extremes can be asked for.
enum class Curve { N, V, M, across };

/// The diagrams of a whole member. Loads at its very ends act outside of it: the functions are those inside.
struct Diagram {
    double length = 0;                ///< m
    std::vector<DiagramPiece> pieces; ///< in order, from 0 to length, at least one

    /// The values at place s, 0 <= s <= length; at a jump those just after it.
    DiagramPlace value(double s) const;

    /// The values at s when it is approached from the start of the member; at a jump those just before it.
    DiagramPlace value_before(double s) const;

    /// Values at `parts` + 1 evenly spread places and, at a jump of N, V or M, the values before and after it.
    std::vector<DiagramPlace> places(int parts) const;

    /// Exact largest and smallest value: from the functions' own turning points; on a plateau the smallest place.
    /// \param tolerance differences up to this count as a plateau (round-off)
    DiagramRange extremes(Curve curve, double tolerance) const;
};

} // namespace groundsill
