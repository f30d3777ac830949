#pragma once
// The numbered structure: nodes with three directions each, segments between them, springs to the ground.
//
// Every node owns three directions (x, y, rotation), so that a direction's number is 3 node + c. A node with a turned
// support has its x and y in the support's axes. A direction that a support fixes, or a rotation that nothing reaches,
// is inactive: its movement is given (mostly 0) instead of solved for.

#include <string>
#include <vector>

#include "elements/frame.hpp"
#include "elements/member_loads.hpp"
#include "groundsill/model.hpp"

namespace groundsill {

using elements::Real;

/// The part of a member between two hinges, or the whole member.
struct Segment {
    int member = -1;
    int i = -1; ///< node numbers; those from Model::nodes.size() on are hinges inside members
    int j = -1;
    Real offset = 0; ///< from the start of the member, m
    elements::Frame frame;
    elements::BasicStiffness stiffness;
};

/// Axes of a node turned by its support.
struct TurnedAxes {
    Real cosine = 1;
    Real sine = 0;
};

/// Two components, in global axes or in those of a node.
struct Vector {
    Real x = 0;
    Real y = 0;
};

/// Components in global axes from those in a node's own axes; null axes are the global ones.
inline Vector to_global(const TurnedAxes* axes, Real first, Real second) {
    if (!axes) return {first, second};
    return {axes->cosine * first - axes->sine * second, axes->sine * first + axes->cosine * second};
}

/// Components in a node's own axes from those in global axes.
inline Vector to_node(const TurnedAxes* axes, Real x, Real y) {
    if (!axes) return {x, y};
    return {axes->cosine * x + axes->sine * y, -axes->sine * x + axes->cosine * y};
}

struct Structure {
    const Model* model = nullptr;
    int node_count = 0;                      ///< hinges inside members included
    std::vector<Segment> segments;           ///< members in order
    std::vector<int> first_segment;          ///< by member, and one more at the end
    std::vector<int> support_of_node;        ///< -1 where there is none
    std::vector<TurnedAxes> axes_of_support; ///< by support
    std::vector<char> active;                ///< by direction
    std::vector<char> has_rotation;          ///< by node
    std::vector<double> spring;              ///< by direction: stiffness of the support's springs
    Real size = 0;                           ///< diagonal of the box around all nodes, m

    int directions() const { return 3 * node_count; }
    /// The axes of a node, or null where they are the global ones.
    const TurnedAxes* turned_axes(int node) const {
        const int support = support_of_node[node];
        if (support < 0 || axes_of_support[support].cosine == 1) return nullptr;
        return &axes_of_support[support];
    }
};

/// A point in the plane of the structure.
struct Point {
    double x = 0;
    double y = 0;
};

/// Where a node stands, hinges inside members included.
Point node_point(const Structure& structure, int node);

/// "C", or "the hinge of floor.2 at 3.2 m" for a hinge inside a member.
std::string node_name(const Structure& structure, int node);

/// Numbers the structure.
Structure number_structure(const Model& model);

/// The place of a segment in its member, for its loads.
elements::SegmentPlace segment_place(const Structure& structure, const Segment& segment);

} // namespace groundsill
