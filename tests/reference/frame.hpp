#pragma once
// A plane frame as plain data for the reference solution, in SI, with the axes and signs of docs/model.md. It is kept
// apart from the program's own model on purpose: the two meet only in the TOML text and in the JSON.

#include <string>
#include <vector>

namespace reference {

/// How one relative movement is held: by nothing, by a spring (N/m or N m/rad), or rigidly.
struct Joint {
    enum class Kind { rigid, free, spring };
    Kind kind = Kind::rigid;
    double stiffness = 0;
};
inline Joint rigid() { return {}; }
inline Joint free() { return {Joint::Kind::free, 0}; }
inline Joint spring(double stiffness) { return {Joint::Kind::spring, stiffness}; }

/// Three joints: along, across and rotation of a member end, or x, y and rotation of a support.
struct Joints {
    Joint first;
    Joint second;
    Joint rotation;
};

struct Material {
    double E = 0;         ///< Pa
    double G = 0;         ///< Pa
    double density = 0;   ///< kg/m3
    double expansion = 0; ///< 1/K
};

struct Section {
    double A = 0;          ///< m2
    double I = 0;          ///< m4
    double depth = 0;      ///< m
    double shear_area = 0; ///< m2; 0: rigid in shear
    double top = 0;        ///< centroid to the face at +across, m
    std::string shape;     ///< the section's TOML where it is given by shape; empty: by properties
};

struct Node {
    std::string name;
    double x = 0;
    double y = 0;
};

struct Member {
    std::string name;
    int from = 0;
    int to = 0;
    int section = 0;
    int material = 0;
    Joints start;
    Joints end;
    double factor = 1;          ///< on all stiffnesses
    std::vector<double> hinges; ///< m from the start; such a member is written as a beam and its name ends in ".1"
};

struct Support {
    int node = 0;
    Joints held{free(), free(), free()};
    double angle = 0; ///< rad
};

struct Load {
    enum class Kind { self_weight, distributed, point, node, temperature, lack_of_fit, movement };
    enum class Axes { global, plan, member };
    Kind kind = Kind::node;
    Axes axes = Axes::global;
    int on = 0;          ///< index of the member, node or support
    bool whole = false;  ///< a distributed load on the whole member: a and b say nothing
    double a = 0, b = 0; ///< m from the member's start
    double first_a = 0;  ///< x or along: N/m at a, N of a point or node load, m of a support movement
    double second_a = 0; ///< y or across
    double first_b = 0;  ///< N/m at b
    double second_b = 0; ///< N/m at b
    double moment = 0;   ///< N m; rad of a support movement
    double top = 0;      ///< K at the face at +across
    double bottom = 0;   ///< K
    double amount = 0;   ///< m of lack of fit, or the factor of self-weight
};

struct Case {
    std::string name;
    std::vector<Load> loads;
};

struct Frame {
    std::vector<Material> materials;
    std::vector<Section> sections;
    std::vector<Node> nodes;
    std::vector<Member> members;
    std::vector<Support> supports;
    std::vector<Case> cases;
};

double member_length(const Frame& frame, int member);

} // namespace reference
