#pragma once
// From a model to its responses.
//
// Theory: small displacements, linear elasticity, plane frames of straight prismatic members (Euler-Bernoulli, or
// Timoshenko where the section gives a shear area). Every case is solved on one factorisation; combinations are
// superposed.

#include <memory>
#include <optional>
#include <string>
#include <vector>

#include "groundsill/diagram.hpp"
#include "groundsill/model.hpp"
#include "groundsill/vibration.hpp"

namespace groundsill {

/// Movement of a node in global axes, m and rad.
struct NodeMovement {
    double x = 0;
    double y = 0;
    std::optional<double>
        rotation; ///< absent where every member is released in moment and no support holds the rotation
};

/// Force of a support on the structure, global axes, N and N m.
struct Reaction {
    double x = 0;
    double y = 0;
    double moment = 0;
};

/// What one segment of a member (the part between two hinges, mostly the whole member) carries and how its ends move:
/// all that its diagrams need besides the loads.
struct SegmentState {
    double N = 0;        ///< axial force that the node passes to the start, N (loads at the very start come after it)
    double V = 0;        ///< shear force there, N
    double M = 0;        ///< bending moment there, N m
    double along = 0;    ///< movement of the member's own first point along its axis, m
    double across = 0;   ///< and across it, m
    double rotation = 0; ///< and its rotation, rad
};

/// The answer of the structure to one case or combination: linear in the loads.
struct Response {
    std::vector<NodeMovement> movements; ///< by node
    std::vector<Reaction> reactions;     ///< by support
    std::vector<SegmentState> segments;  ///< by segment, members in order
};

/// How far the run can be trusted; results-format.md defines the figures.
struct Verification {
    double equilibrium = 0; ///< largest imbalance of reactions and loads, relative
    double residual = 0;    ///< largest |f - K u| after refinement, relative
    double condition = 0;   ///< of the diagonally scaled stiffness
};

/// A value on an envelope: where it stands, which combination governs and what acts together with it.
struct ForceExtreme {
    double value = 0;
    double at = 0;        ///< m from the member's start
    int combination = -1; ///< index into the combinations
    MemberForces with;
};
struct ReactionExtreme {
    double value = 0;
    int combination = -1;
    Reaction with;
};
template <class Extreme> struct LeastMost {
    Extreme least;
    Extreme most;
};

/// Least and most of everything over the combinations of one limit state.
struct Envelope {
    struct OfReaction {
        LeastMost<ReactionExtreme> x, y, moment;
    };
    struct OfMember {
        LeastMost<ForceExtreme> N, V, M;
    };
    std::vector<OfReaction> reactions; ///< by support
    std::vector<OfMember> members;     ///< by member
};

struct Internals; // the numbered structure and its loads by member

/// A finished analysis. Holds a pointer to the model, which must outlive it.
struct Analysis {
    const Model* model = nullptr;
    std::shared_ptr<const Internals> internals;
    std::vector<Response> cases;        ///< by case
    std::vector<Response> combinations; ///< by combination
    std::optional<Envelope> strength;   ///< absent where the model has no such combination
    std::optional<Envelope> service;
    std::optional<Vibration> vibration; ///< present where the model asks for it
    Verification verification;
    std::vector<std::string> warnings; ///< what to mind about these results
};

/// Either the analysis, or why there is none: a mechanism, told by who moves and what lets it, or numbers that cannot
/// be solved.
struct Outcome {
    std::optional<Analysis> analysis;
    Diagnostics refusals; ///< errors, with the place of what lets the structure move; empty when there is an analysis
};

/// Solves all cases and combinations of a model.
/// \pre the model is consistent, as read_model and check_model leave it
Outcome analyse(const Model& model);

/// The diagrams of one member under one case (its own loads, factor 1).
Diagram case_diagram(const Analysis& analysis, int load_case, int member);

/// The diagrams of one member under one combination.
Diagram combination_diagram(const Analysis& analysis, int combination, int member);

} // namespace groundsill
