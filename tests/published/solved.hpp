#pragma once
// Small models in metres and kilonewtons, and their results in the same units.

#include <string>
#include <string_view>
#include <vector>

#include "run_model.hpp"

namespace published {

/// A value and the place on the member where it stands, m.
struct Extreme {
    double value = 0;
    double at = 0;
};

/// The results of a model's case `load`: kN, kN m, m, rad; signs as in the results.
class Solved {
  public:
    /// Runs a model; see `model_text` for what it holds.
    explicit Solved(std::string_view toml, int places = 20) : result_(test::run(toml, places)) {}

    double reaction_x(std::string_view node) const { return at_node("reactions", node, "x") / 1000; }
    double reaction_y(std::string_view node) const { return at_node("reactions", node, "y") / 1000; }
    double reaction_moment(std::string_view node) const { return at_node("reactions", node, "moment") / 1000; }
    double x(std::string_view node) const { return at_node("displacements", node, "x"); }
    double y(std::string_view node) const { return at_node("displacements", node, "y"); }
    double rotation(std::string_view node) const { return at_node("displacements", node, "rotation"); }

    /// At a place that the results list: one of twenty parts, or a jump (the value before it, or after it).
    double N(std::string_view member, double at, bool after = false) const;
    double V(std::string_view member, double at, bool after = false) const;
    double M(std::string_view member, double at, bool after = false) const;
    double across(std::string_view member, double at) const;
    double along(std::string_view member, double at) const;
    double length(std::string_view member) const;

    /// Largest and smallest "N", "V", "M" or "across" of a member.
    Extreme most(std::string_view member, std::string_view quantity) const { return extreme(member, quantity, "max"); }
    Extreme least(std::string_view member, std::string_view quantity) const { return extreme(member, quantity, "min"); }

    const test::Result& json() const { return result_; }

  private:
    double at_node(std::string_view what, std::string_view node, std::string_view component) const;
    Extreme extreme(std::string_view member, std::string_view quantity, std::string_view which) const;

    test::Result result_;
};

/// One material and section for all members, as numbers in kN and m.
struct Stiffness {
    double E = 2.1e8;
    double I = 1e-4;
    double A = 0.0047;
    double G = 8e7;
    double shear_area = 0; ///< 0: not shear-flexible
    double depth = 0.31;
    double expansion = 1.2e-5;

    double EI() const { return E * I; }
    double EA() const { return E * A; }
};

/// `[units]` and a material and section "bar".
std::string header(const Stiffness& stiffness);

/// `[cases.load]` with these entries.
std::string load_case(const std::vector<std::string>& loads);

/// A beam on the x axis: nodes A, B, C … and members AB, BC … from left to right.
struct BeamModel {
    std::vector<double> spans;
    std::vector<std::string> supports; ///< one a node, as TOML: `"roller"`; empty for none
    std::vector<std::string> loads;    ///< entries of the case, as TOML
    Stiffness stiffness{};
};
std::string text(const BeamModel& beam);
Solved solve(const BeamModel& beam);

// Supports.
inline const std::string fixed = "\"fixed\"";
inline const std::string pinned = "\"pinned\"";
inline const std::string roller = "\"roller\"";
inline const std::string none;
std::string spring_y(double stiffness); ///< a vertical spring alone, kN/m

// Load entries. Downward forces and downward distributed loads are positive, as in the beam tables.
std::string uniform(std::string_view member, double w);
std::string linear(std::string_view member, double w_start, double w_end);
std::string linear(std::string_view member, double w_start, double w_end, double from, double to);
std::string point(std::string_view member, double P, double at);
std::string force(std::string_view node, double P);
std::string couple(std::string_view node, double ccw);
std::string settle(std::string_view node, double down);
std::string turn(std::string_view node, double ccw);
std::string warm(std::string_view member, double change);
std::string warm(std::string_view member, double top, double bottom);

} // namespace published
