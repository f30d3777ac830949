// Checks of nodes and members: lengths, ends, overlaps, hinges, releases.

#include <algorithm>
#include <cmath>
#include <tuple>
#include <utility>
#include <vector>

#include <fmt/format.h>

#include "model/findings.hpp"
#include "model/node_search.hpp"

namespace groundsill {
namespace {

/// Directions that differ by less than this (rad) count as one: 1 mm in 1000 km.
constexpr double parallel = 1e-9;

/// Two nodes closer than this are at one place: round-off of a sum of spans in the largest coordinate, a thousand times
/// less than any structure's tolerance of building.
double coincidence(const Model& model) {
    double largest = 0;
    for (const Node& node : model.nodes) largest = std::max({largest, std::abs(node.x), std::abs(node.y)});
    return 1e-12 * largest;
}

bool check_nodes(const Model& model, Findings& findings) {
    bool finite = true;
    for (const Node& node : model.nodes) {
        if (std::isfinite(node.x) && std::isfinite(node.y)) continue;
        finite = false;
        findings.error(node.position, fmt::format("node {}: both coordinates must be finite numbers", node.name));
    }
    return finite;
}

/// Nodes at one place: allowed (a joint drawn twice, tied by supports alone), but mostly a slip.
void check_coincident_nodes(const Model& model, double tolerance, Findings& findings) {
    // Sorted by a direction in which hardly any two nodes of a drawn structure fall together, neighbours in the plane
    // are neighbours in the list.
    const auto place = [](const Node& node) { return 0.7548776662466927 * node.x + 0.6558656180971893 * node.y; };
    std::vector<std::pair<double, int>> order;
    order.reserve(model.nodes.size());
    for (int i = 0; const Node& node : model.nodes) order.emplace_back(place(node), i++);
    if (!std::is_sorted(order.begin(), order.end())) std::sort(order.begin(), order.end());

    std::vector<std::pair<int, int>> pairs; // the later of the two, the earlier
    for (std::size_t i = 0; i < order.size(); ++i) {
        const Node& node = at(model.nodes, order[i].second);
        for (std::size_t j = i + 1; j < order.size() && order[j].first - order[i].first <= 2 * tolerance; ++j) {
            const Node& other = at(model.nodes, order[j].second);
            if (std::hypot(other.x - node.x, other.y - node.y) > tolerance) continue;
            pairs.emplace_back(std::max(order[i].second, order[j].second), std::min(order[i].second, order[j].second));
            break;
        }
    }
    std::sort(pairs.begin(), pairs.end());
    for (const auto& [later, earlier] : pairs) {
        findings.warning(
            at(model.nodes, later).position,
            fmt::format("nodes {} and {} are at the same place, and nothing joins them: use one node where their "
                        "members meet",
                        at(model.nodes, earlier).name, at(model.nodes, later).name));
    }
}

/// Members by node: those of node i are list[start[i]] .. list[start[i + 1]].
struct MembersAtNodes {
    std::vector<int> start, list;

    explicit MembersAtNodes(const Model& model) : start(model.nodes.size() + 1), list(2 * model.members.size()) {
        for (const Member& member : model.members) {
            ++start[static_cast<std::size_t>(member.from) + 1];
            ++start[static_cast<std::size_t>(member.to) + 1];
        }
        for (std::size_t i = 1; i < start.size(); ++i) start[i] += start[i - 1];
        std::vector<int> next(start.begin(), start.end() - 1);
        for (int i = 0; const Member& member : model.members) {
            for (const int node : {member.from, member.to}) {
                list[static_cast<std::size_t>(next[static_cast<std::size_t>(node)]++)] = i;
            }
            ++i;
        }
    }
};

Place place_of(const Model& model, int node) { return {at(model.nodes, node).x, at(model.nodes, node).y}; }

/// For each member the first other one that it shares its line with, and the first node that lies on it without being
/// its end and without a member along it.
///
/// Two members on one line overlap only if they run between the same nodes or if an end of one lies inside the other:
/// so it is enough to look at the nodes inside each member, and at the members that meet there.
class Overlaps {
  public:
    Overlaps(const Model& model, double tolerance)
        : member(model.members.size(), -1), node(model.members.size(), -1), model_(model), tolerance_(tolerance),
          members_at_(model) {
        find_doubled_members();
        const NodeSearch search(model.nodes);
        std::vector<int> found;
        for (int i = 0; i < static_cast<int>(model.members.size()); ++i) look_along(i, search, found);
    }

    std::vector<int> member; ///< by member: an earlier one; -1: none
    std::vector<int> node;   ///< by member; -1: none

  private:
    /// Marks members between the same two nodes; the later names the first.
    void find_doubled_members() {
        struct Ends {
            int low, high, member;
        };
        std::vector<Ends> ends;
        ends.reserve(model_.members.size());
        for (int i = 0; const Member& m : model_.members)
            ends.push_back({std::min(m.from, m.to), std::max(m.from, m.to), i++});
        const auto before = [](const Ends& a, const Ends& b) {
            return std::tie(a.low, a.high, a.member) < std::tie(b.low, b.high, b.member);
        };
        if (!std::is_sorted(ends.begin(), ends.end(), before)) std::sort(ends.begin(), ends.end(), before);
        for (std::size_t i = 0, first = 0; i < ends.size(); ++i) {
            if (ends[i].low != ends[first].low || ends[i].high != ends[first].high) first = i;
            if (i != first) note_overlap(ends[i].member, ends[first].member);
        }
    }

    void look_along(int index, const NodeSearch& search, std::vector<int>& found) {
        const Member& m = at(model_.members, index);
        const double length = member_length(model_, m);
        if (length <= tolerance_) return;
        const Place from = place_of(model_, m.from);
        const Place to = place_of(model_, m.to);
        const double margin = std::max(tolerance_, parallel * length);
        search.nodes_on_line(from, to, margin, found);
        for (const int inner : found) {
            const Place place = place_of(model_, inner);
            // Ends of the member, and nodes at the same place as one, are not inside.
            if (std::hypot(place.x - from.x, place.y - from.y) <= margin) continue;
            if (std::hypot(place.x - to.x, place.y - to.y) <= margin) continue;
            look_at_inner_node(index, inner);
        }
    }

    void look_at_inner_node(int index, int inner) {
        bool on_one_line = false;
        for (int k = at(members_at_.start, inner); k < at(members_at_.start, inner + 1); ++k) {
            const int other = at(members_at_.list, k);
            if (!are_parallel(at(model_.members, index), at(model_.members, other))) continue;
            on_one_line = true;
            note_overlap(index, other);
        }
        int& lying = node[static_cast<std::size_t>(index)];
        if (!on_one_line && lying < 0) lying = inner;
    }

    void note_overlap(int a, int b) {
        int& known = member[static_cast<std::size_t>(std::max(a, b))];
        const int earlier = std::min(a, b);
        known = known < 0 ? earlier : std::min(known, earlier);
    }

    bool are_parallel(const Member& a, const Member& b) const {
        const double lengths = member_length(model_, a) * member_length(model_, b);
        if (member_length(model_, b) <= tolerance_) return false;
        const Place a1 = place_of(model_, a.from);
        const Place a2 = place_of(model_, a.to);
        const Place b1 = place_of(model_, b.from);
        const Place b2 = place_of(model_, b.to);
        const double cross = (a2.x - a1.x) * (b2.y - b1.y) - (a2.y - a1.y) * (b2.x - b1.x);
        return std::abs(cross) <= parallel * lengths;
    }

    const Model& model_;
    double tolerance_;
    MembersAtNodes members_at_;
};

void check_overlap(const Model& model, const Overlaps& overlaps, std::size_t index, Findings& findings) {
    const Member& member = model.members[index];
    if (const int other = overlaps.member[index]; other >= 0) {
        const Member& first = at(model.members, other);
        const bool same_ends = std::minmax(first.from, first.to) == std::minmax(member.from, member.to);
        findings.error(
            member.position,
            same_ends ? fmt::format("members {} and {} run between the same two nodes: keep one of them, with the "
                                    "section of both together",
                                    first.name, member.name)
                      : fmt::format("members {} and {} lie on one line and overlap: end each at the node where the "
                                    "other begins",
                                    first.name, member.name));
    }
    if (const int node = overlaps.node[index]; node >= 0) {
        findings.warning(member.position,
                         fmt::format("node {} lies on member {}, but is not joined to it: make two members, "
                                     "ending at {}, if they are connected",
                                     at(model.nodes, node).name, member.name, at(model.nodes, node).name));
    }
}

void check_hinges(const Model& model, const Member& member, double length, Findings& findings) {
    double before = 0;
    for (const double hinge : member.hinges) {
        const double margin = place_tolerance(length);
        if (!(hinge > margin && hinge < length - margin)) {
            findings.error(
                member.position,
                fmt::format("member {}: the hinge at {} is not inside the member, which is {} long: use releases for "
                            "a hinge at an end",
                            member.name, length_text(model, hinge), length_text(model, length)));
        } else if (hinge <= before + margin) {
            findings.error(member.position,
                           fmt::format("member {}: the hinges must stand in rising order, each at a place of its "
                                       "own",
                                       member.name));
        }
        before = hinge;
    }
}

void check_release(const Member& member, const Release& release, const char* end, Findings& findings) {
    const auto check = [&](const Restraint& restraint, const char* direction) {
        if (restraint.is_elastic() && !(restraint.stiffness > 0 && std::isfinite(restraint.stiffness))) {
            findings.error(member.position,
                           fmt::format("member {}: the stiffness of the {} release at its {} must be above 0: "
                                       "write \"free\" for none, or leave it out for a rigid joint",
                                       member.name, direction, end));
        }
    };
    check(release.axial, "axial");
    check(release.shear, "shear");
    check(release.moment, "moment");
}

/// \return true when the member has two different nodes at two different places
bool check_ends(const Model& model, const Member& member, double tolerance, Findings& findings) {
    if (member.from == member.to) {
        findings.error(member.position,
                       fmt::format("member {} runs from node {} to the same node: give it two different nodes",
                                   member.name, at(model.nodes, member.from).name));
        return false;
    }
    if (member_length(model, member) <= tolerance) {
        findings.error(member.position,
                       fmt::format("member {} has no length, because its nodes {} and {} are at the same place: "
                                   "move one of them",
                                   member.name, at(model.nodes, member.from).name, at(model.nodes, member.to).name));
        return false;
    }
    return true;
}

void check_turned_section(const Model& model, const Member& member, Findings& findings) {
    const Section& section = at(model.sections, member.section);
    if (!section.top || !section.bottom || *section.top == *section.bottom || !across_points_down(model, member))
        return;
    findings.warning(member.position,
                     fmt::format("member {} is drawn from right to left, so that the top of its section {} is "
                                 "below: exchange from and to if that is not meant",
                                 member.name, section.name));
}

} // namespace

double member_length(const Model& model, const Member& member) {
    const Node& from = at(model.nodes, member.from);
    const Node& to = at(model.nodes, member.to);
    return std::hypot(to.x - from.x, to.y - from.y);
}

double place_tolerance(double length) { return 1e-9 * length; }

bool across_points_down(const Model& model, const Member& member) {
    return at(model.nodes, member.to).x - at(model.nodes, member.from).x < -parallel * member_length(model, member);
}

void check_geometry(const Model& model, Findings& findings) {
    if (model.members.empty()) {
        findings.error({}, "the model has no members: add at least one below [members], or a run below [beams]");
    }
    if (!check_nodes(model, findings)) return;
    const double tolerance = coincidence(model);
    check_coincident_nodes(model, tolerance, findings);
    const Overlaps overlaps(model, tolerance);
    for (std::size_t i = 0; i < model.members.size(); ++i) {
        const Member& member = model.members[i];
        if (!(member.stiffness_factor > 0) || !std::isfinite(member.stiffness_factor)) {
            findings.error(
                member.position,
                fmt::format("member {}: stiffness_factor must be above 0, 1 for the full stiffness", member.name));
        }
        check_release(member, member.start, "start", findings);
        check_release(member, member.end, "end", findings);
        if (!check_ends(model, member, tolerance, findings)) continue;
        check_overlap(model, overlaps, i, findings);
        check_hinges(model, member, member_length(model, member), findings);
        check_turned_section(model, member, findings);
    }
}

} // namespace groundsill
