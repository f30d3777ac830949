// Checks of load cases: loads that lie on their members, numbers that are finite, movements of what is held.

#include <cmath>
#include <initializer_list>
#include <vector>

#include <fmt/format.h>

#include "model/findings.hpp"

namespace groundsill {
namespace {

/// The checks of one case.
class CaseCheck {
  public:
    CaseCheck(const Model& model, const LoadCase& load_case, std::vector<bool>& turned, Findings& findings)
        : model_(model), case_(load_case), turned_(turned), findings_(findings) {}

    void run() {
        check_partner();
        if (!std::isfinite(case_.self_weight))
            error(case_.position, "the factor of self_weight must be a finite number");
        if (case_.member_loads.empty() && case_.node_loads.empty() && case_.movements.empty() &&
            case_.self_weight == 0) {
            findings_.warning(case_.position,
                              fmt::format("case {} has no loads: add some, or take the case out", case_.name));
        }
        for (const MemberLoad& load : case_.member_loads) check(load);
        for (const NodeLoad& load : case_.node_loads) {
            check_finite({load.x, load.y, load.moment}, load.entry,
                         fmt::format("node {}", at(model_.nodes, load.node).name));
        }
        for (const SupportMovement& movement : case_.movements) check(movement);
    }

  private:
    void error(Position position, const std::string& message) {
        findings_.error(position, fmt::format("case {}: {}", case_.name, message));
    }

    Position place_of_entry(int entry) const {
        const auto index = static_cast<std::size_t>(entry);
        return index < case_.entry_positions.size() ? case_.entry_positions[index] : case_.position;
    }

    void check_partner() {
        if (case_.with < 0) return;
        const LoadCase& partner = at(model_.cases, case_.with);
        if (&partner == &case_) {
            error(case_.position, "with names the case itself: name the case that it always acts together with");
        }
    }

    bool check_finite(std::initializer_list<double> values, int entry, const std::string& subject) {
        for (const double value : values) {
            if (std::isfinite(value)) continue;
            error(place_of_entry(entry), fmt::format("the load on {} must be a finite number", subject));
            return false;
        }
        return true;
    }

    void check(const MemberLoad& load) {
        const Member& member = at(model_.members, load.member);
        const std::string subject = "member " + member.name;
        if (!check_finite({load.a, load.b, load.first_a, load.second_a, load.first_b, load.second_b, load.moment,
                           load.top, load.bottom, load.amount},
                          load.entry, subject)) {
            return;
        }
        const double length = member_length(model_, member);
        if (!(length > 0)) return; // told as an error of the member
        if (load.kind == MemberLoad::Kind::point) check_point(load, length);
        if (load.kind == MemberLoad::Kind::distributed) check_distributed(load, length);
        if (load.kind == MemberLoad::Kind::temperature && load.through_depth) check_faces(load);
    }

    bool check_on_member(const MemberLoad& load, double place, double length, const char* what) {
        const double margin = place_tolerance(length);
        if (place >= -margin && place <= length + margin) return true;
        error(
            place_of_entry(load.entry),
            fmt::format(
                "the load on member {} {} at {}, off the member, which runs from 0 to {}: places count from its first "
                "node",
                at(model_.members, load.member).name, what, length_text(model_, place), length_text(model_, length)));
        return false;
    }

    void check_point(const MemberLoad& load, double length) {
        check_on_member(load, load.a, length, "stands");
        if (load.axes == MemberLoad::Axes::global_plan) {
            error(place_of_entry(load.entry),
                  fmt::format("the point load on member {} has no plan length: leave per out",
                              at(model_.members, load.member).name));
        }
    }

    void check_distributed(const MemberLoad& load, double length) {
        const Member& member = at(model_.members, load.member);
        if (!check_on_member(load, load.a, length, "begins") || !check_on_member(load, load.b, length, "ends")) return;
        if (load.b - load.a <= place_tolerance(length)) {
            error(place_of_entry(load.entry),
                  load.b < load.a
                      ? fmt::format("the load on member {} ends at {}, before it begins at {}: exchange the two places "
                                    "of between",
                                    member.name, length_text(model_, load.b), length_text(model_, load.a))
                      : fmt::format(
                            "the load on member {} begins and ends at {}: give between two different places, or make "
                            "it a point load with at",
                            member.name, length_text(model_, load.a)));
            return;
        }
        if (load.axes == MemberLoad::Axes::global_plan) check_plan(load, length);
    }

    /// A load per plan length is nothing on a member that has no such length.
    void check_plan(const MemberLoad& load, double length) {
        const Member& member = at(model_.members, load.member);
        const double horizontal = std::abs(at(model_.nodes, member.to).x - at(model_.nodes, member.from).x);
        const double vertical = std::abs(at(model_.nodes, member.to).y - at(model_.nodes, member.from).y);
        const bool lost_y = (load.second_a != 0 || load.second_b != 0) && horizontal <= place_tolerance(length);
        const bool lost_x = (load.first_a != 0 || load.first_b != 0) && vertical <= place_tolerance(length);
        if (!lost_x && !lost_y) return;
        findings_.warning(
            place_of_entry(load.entry),
            fmt::format("case {}: {} per plan length is no load at all on the {} member {}: take per = \"length\" if "
                        "it is meant along the member",
                        case_.name, lost_y ? "y" : "x", lost_y ? "vertical" : "horizontal", member.name));
    }

    void check_faces(const MemberLoad& load) {
        const Member& member = at(model_.members, load.member);
        const auto index = static_cast<std::size_t>(load.member);
        if (turned_[index] || load.top == load.bottom || !across_points_down(model_, member)) return;
        turned_[index] = true;
        findings_.warning(
            place_of_entry(load.entry),
            fmt::format("case {}: member {} is drawn from right to left, so that its top face, the one at +across, "
                        "is below: exchange from and to, or top and bottom, if that is not meant",
                        case_.name, member.name));
    }

    void check(const SupportMovement& movement) {
        const Support& support = at(model_.supports, movement.support);
        const std::string& name = at(model_.nodes, support.node).name;
        if (!check_finite({movement.x, movement.y, movement.rotation}, movement.entry, "support " + name)) return;
        const auto check_held = [&](const Restraint& restraint, double value, const char* direction) {
            if (value == 0 || !restraint.is_free()) return;
            error(
                place_of_entry(movement.entry),
                fmt::format(
                    "support {} is free in {}, so no movement can be imposed on it there: hold it in {}, or leave the "
                    "movement out",
                    name, direction, direction));
        };
        check_held(support.x, movement.x, "x");
        check_held(support.y, movement.y, "y");
        check_held(support.rotation, movement.rotation, "rotation");
    }

    const Model& model_;
    const LoadCase& case_;
    std::vector<bool>& turned_; ///< members that were told to be turned over: once is enough
    Findings& findings_;
};

} // namespace

void check_cases(const Model& model, Findings& findings) {
    std::vector<bool> turned(model.members.size());
    for (const LoadCase& load_case : model.cases) CaseCheck(model, load_case, turned, findings).run();
}

} // namespace groundsill
