#pragma once
// The model: plain data in SI (m, N, N m, rad, kg, K), in the order of the model file.
//
// Axes: global x to the right, y up, rotation counter-clockwise. A member's `along` axis runs from its first node to
// its second, `across` is 90 degrees counter-clockwise from it. Entries refer to each other by index into the model's
// lists: names are resolved once, while reading, where an unknown name can still be reported with its line.

#include <limits>
#include <optional>
#include <string>
#include <vector>

#include "groundsill/diagnostics.hpp"

namespace groundsill {

/// Standard acceleration of gravity, m/s2 (CGPM 1901, exact by definition).
inline constexpr double standard_gravity = 9.80665;

struct Material {
    std::string name;
    double E = 0;                               ///< Young's modulus, Pa
    std::optional<double> G;                    ///< shear modulus, Pa; given or E/(2(1 + poisson))
    std::optional<double> density;              ///< kg/m3; a given weight is divided by g
    std::optional<double> expansion;            ///< thermal expansion, 1/K
    std::optional<double> tension_strength;     ///< Pa, positive
    std::optional<double> compression_strength; ///< Pa, positive
    Position position;
};

struct Section {
    std::string name;
    std::string description; ///< how the file gives it, for the inventory: "rectangle 600 mm x 750 mm", "properties"
    double A = 0;            ///< area, m2
    double I = 0;            ///< second moment of area for bending in the plane, m4
    std::optional<double> depth;      ///< m
    std::optional<double> shear_area; ///< m2; present: the member is shear-flexible (Timoshenko)
    std::optional<double> top;        ///< distance from the centroid to the face at +across, m
    std::optional<double> bottom;     ///< distance from the centroid to the face at -across, m
    Position position;
};

struct Node {
    std::string name;
    double x = 0;
    double y = 0;
    Position position;
};

/// How one relative movement is held: rigidly, not at all, or by a spring (N/m, or N m/rad for rotations).
struct Restraint {
    enum class Kind { fixed, free, elastic };

    Kind kind = Kind::fixed;
    double stiffness = 0; ///< of an elastic restraint, above 0

    bool is_fixed() const { return kind == Kind::fixed; }
    bool is_free() const { return kind == Kind::free; }
    bool is_elastic() const { return kind == Kind::elastic; }
};

/// The connection of one member end to its node, in the member's axes.
struct Release {
    Restraint axial;
    Restraint shear;
    Restraint moment;
};

struct Member {
    std::string name;
    int from = -1; ///< index of a node
    int to = -1;
    int section = -1;
    int material = -1;
    Release start;
    Release end;
    double stiffness_factor = 1; ///< times E A, E I and shear stiffness
    std::vector<double> hinges;  ///< moment hinges inside, distances from the start in rising order, m
    Position position;
};

/// A straight run of members, one behind the other.
struct Beam {
    std::string name;
    std::vector<int> members;
    std::vector<double> starts; ///< where each member begins along the run, and last the length of the run, m
    Position position;
};

struct Support {
    int node = -1;
    Restraint x{Restraint::Kind::free}; ///< in the support's own axes
    Restraint y{Restraint::Kind::free};
    Restraint rotation{Restraint::Kind::free};
    double angle = 0; ///< of the support's axes, counter-clockwise from the global ones, rad
    Position position;
};

enum class Action { none, permanent, imposed, roof, snow, rain, wind, temperature, settlement, earthquake, accidental };

/// A load on one member. Places are distances from the member's start, m.
struct MemberLoad {
    enum class Kind {
        distributed, ///< per length, linear from `a` to `b`
        point,       ///< force and moment at `a`
        temperature, ///< change at the two faces, K; equal for a uniform change
        lack_of_fit, ///< made too long by `amount`, spread evenly
    };
    enum class Axes {
        global,      ///< first = x, second = y; a distributed load per member length
        global_plan, ///< the same, per horizontal length for y and per vertical length for x
        member,      ///< first = along, second = across
    };

    int member = -1;
    int entry = 0; ///< index in the case's `loads`
    Kind kind = Kind::distributed;
    Axes axes = Axes::global;
    double a = 0;
    double b = 0;
    double first_a = 0, second_a = 0; ///< N/m at `a`, or N for a point load
    double first_b = 0, second_b = 0; ///< N/m at `b`
    double moment = 0;                ///< of a point load, N m, counter-clockwise
    double top = 0, bottom = 0;       ///< temperature changes of the faces at +across and -across, K
    bool through_depth = false;       ///< the file gives the two faces apart, so that the section's depth matters
    double amount = 0;                ///< lack of fit, m
};

struct NodeLoad {
    int node = -1;
    int entry = 0;
    double x = 0, y = 0; ///< N
    double moment = 0;   ///< N m
};

/// A movement imposed on a support, in the support's own axes; of a spring it moves the far end.
struct SupportMovement {
    int support = -1;
    int entry = 0;
    double x = 0, y = 0; ///< m
    double rotation = 0; ///< rad
};

struct LoadCase {
    std::string name;
    Action action = Action::none;
    std::string category;                  ///< of EN 1990, empty when none is given
    std::string group;                     ///< empty when none is given
    int with = -1;                         ///< index of the case that this one acts together with
    int entries = 0;                       ///< how many entries its `loads` has
    std::vector<Position> entry_positions; ///< of each of these entries; empty for a model made in code
    double self_weight = 0;                ///< factor on the weight of every member, acting along -y
    std::vector<MemberLoad> member_loads;  ///< without the self-weight
    std::vector<NodeLoad> node_loads;
    std::vector<SupportMovement> movements;
    Position position;
};

enum class LimitState { strength, service };

struct Combination {
    struct Term {
        int load_case = -1;
        double factor = 1;
    };

    std::string name;
    LimitState limit = LimitState::strength;
    std::vector<Term> terms; ///< in the order of the file
    Position position;
};

/// What becomes mass, and how many natural modes are asked for.
struct MassModel {
    struct NodeMass {
        int node = -1;
        double mass = 0; ///< kg
        Position position;
    };

    std::vector<Combination::Term> cases; ///< whose downward loads, times the factor and over g, are mass
    std::vector<NodeMass> nodes;
    int modes = 6;
    Position position;
};

/// What is printed at the head of every page of a report; empty where the file gives nothing.
struct Job {
    std::string number, client, revision, by, checked, date;
};

enum class DisplayUnits { metric, us };

struct Model {
    std::string title;
    std::string notes;
    Job job;
    DisplayUnits display = DisplayUnits::metric;
    std::vector<Material> materials;
    std::vector<Section> sections;
    std::vector<Node> nodes;
    std::vector<Member> members;
    std::vector<Beam> beams;
    std::vector<Support> supports;
    std::vector<LoadCase> cases;
    std::vector<Combination> combinations;
    std::optional<MassModel> mass; ///< present: natural frequencies are asked for
};

/// Checks of a model that need no file: lengths, stiffnesses, loads that lie on their members, properties that a load
/// needs (density for self-weight, expansion and depth for temperatures), angles at which supports cannot take a load.
/// Indices must be valid. The findings come in the order of the model's lists.
Diagnostics check_model(const Model& model);

} // namespace groundsill
