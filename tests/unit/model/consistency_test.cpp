// Checks of a model that need no file. The models are made in code; line numbers stand for the entries they belong to.

#include <algorithm>
#include <chrono>
#include <cmath>
#include <limits>
#include <string>
#include <utility>

#include <doctest/doctest.h>

#include "groundsill/model.hpp"

using namespace groundsill;

namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();

/// A beam A-B of 6 m on two supports with a case of its own weight: nothing to say about it.
Model beam() {
    Model model;
    model.materials.push_back({.name = "steel",
                               .E = 210e9,
                               .G = 81e9,
                               .density = 7850,
                               .expansion = 12e-6,
                               .tension_strength = {},
                               .compression_strength = {},
                               .position = {1, 1}});
    Section section;
    section.name = "joist";
    section.A = 0.005;
    section.I = 8e-5;
    section.depth = 0.3;
    section.shear_area = 0.002;
    section.top = 0.15;
    section.bottom = 0.15;
    section.position = {2, 1};
    model.sections.push_back(section);
    model.nodes = {{"A", 0, 0, {3, 1}}, {"B", 6, 0, {4, 1}}};
    Member member;
    member.name = "AB";
    member.from = 0;
    member.to = 1;
    member.section = 0;
    member.material = 0;
    member.position = {5, 1};
    model.members.push_back(member);
    model.supports = {
        {.node = 0, .x = {}, .y = {}, .rotation = {Restraint::Kind::free}, .angle = 0, .position = {6, 1}},
        {.node = 1,
         .x = {Restraint::Kind::free},
         .y = {},
         .rotation = {Restraint::Kind::free},
         .angle = 0,
         .position = {7, 1}}};
    LoadCase dead;
    dead.name = "dead";
    dead.entries = 1;
    dead.self_weight = 1;
    dead.position = {8, 1};
    dead.entry_positions = {{9, 3}};
    model.cases.push_back(dead);
    return model;
}

Node node(const std::string& name, double x, double y) { return {name, x, y, {10, 1}}; }

/// Adds a member between two nodes, by index.
Member& join(Model& model, const std::string& name, int from, int to) {
    Member member = model.members.front();
    member.name = name;
    member.from = from;
    member.to = to;
    member.position = {20 + static_cast<int>(model.members.size()), 1};
    model.members.push_back(member);
    return model.members.back();
}

MemberLoad load(MemberLoad::Kind kind, double a, double b) {
    MemberLoad result;
    result.member = 0;
    result.kind = kind;
    result.a = a;
    result.b = b;
    result.second_a = result.second_b = -1000;
    return result;
}

Model beam_with(const MemberLoad& member_load) {
    Model model = beam();
    model.cases[0].member_loads.push_back(member_load);
    return model;
}

/// The findings, one a line: "LINE error: message".
std::string findings(const Model& model) {
    std::string text;
    for (const Diagnostic& diagnostic : check_model(model)) {
        text += std::to_string(diagnostic.position.line);
        text += diagnostic.severity == Diagnostic::Severity::error ? " error: " : " warning: ";
        text += diagnostic.message + "\n";
    }
    return text;
}

/// True when there is exactly one finding, of this line and severity, with these words in it.
bool only(const Model& model, const std::string& start, const std::string& words) {
    const std::string text = findings(model);
    INFO(text);
    const bool as_expected =
        text.starts_with(start) && text.find(words) != std::string::npos && text.find('\n') == text.size() - 1;
    CHECK(as_expected);
    return as_expected;
}

} // namespace

TEST_CASE("a sound model has no findings") { CHECK(findings(beam()).empty()); }

TEST_CASE("a model without members is refused") {
    Model model = beam();
    model.members.clear();
    only(model, "0 error", "no members");
}

TEST_CASE("material values") {
    for (const double bad : {0.0, -1.0, std::nan(""), infinity}) {
        CAPTURE(bad);
        Model model = beam();
        model.materials[0].E = bad;
        only(model, "1 error", "material steel: E must be");
        model = beam();
        model.materials[0].G = bad;
        only(model, "1 error", "material steel: G must be");
        model = beam();
        model.materials[0].tension_strength = bad;
        only(model, "1 error", "strength in tension");
        model = beam();
        model.materials[0].compression_strength = bad;
        only(model, "1 error", "strength in compression");
    }
    Model model = beam();
    model.materials[0].density = -1;
    only(model, "1 error", "density");
    model.materials[0].density = 0; // a massless material is one way to switch self-weight off
    CHECK(findings(model).empty());
    model.materials[0].expansion = infinity;
    only(model, "1 error", "expansion");
}

TEST_CASE("section values") {
    for (const double bad : {0.0, -1.0, std::nan(""), infinity}) {
        CAPTURE(bad);
        Model model = beam();
        model.sections[0].A = bad;
        only(model, "2 error", "section joist: A must be");
        model = beam();
        model.sections[0].I = bad;
        only(model, "2 error", "section joist: I must be");
        model = beam();
        model.sections[0].depth = bad;
        only(model, "2 error", "section joist: depth must be");
        model = beam();
        model.sections[0].shear_area = bad;
        only(model, "2 error", "section joist: shear_area must be");
    }
}

TEST_CASE("what a load or a section needs of material and section") {
    Model model = beam();
    model.materials[0].density.reset();
    only(model, "1 error", "material steel has no density, and case dead has self_weight");
    model.cases[0].self_weight = 0;
    model.cases[0].node_loads.push_back({.node = 1, .entry = 0, .x = 1, .y = 0, .moment = 0});
    CHECK(findings(model).empty());

    model = beam();
    model.materials[0].G.reset();
    only(model, "1 error", "section joist is shear-flexible");
    model.sections[0].shear_area.reset();
    CHECK(findings(model).empty());

    MemberLoad heat = load(MemberLoad::Kind::temperature, 0, 0);
    heat.top = heat.bottom = 20;
    model = beam_with(heat);
    model.materials[0].expansion.reset();
    only(model, "1 error", "material steel has no expansion, and case dead");

    model = beam_with(heat);
    model.sections[0].depth.reset();
    CHECK(findings(model).empty()); // a uniform change needs no depth
    model.cases[0].member_loads[0].through_depth = true;
    only(model, "2 error", "section joist has no depth, and case dead");
}

TEST_CASE("an unused material or section needs nothing") {
    Model model = beam();
    Material bare = model.materials[0];
    bare.density.reset();
    bare.G.reset();
    bare.expansion.reset();
    model.materials.push_back(bare);
    CHECK(findings(model).empty());
}

TEST_CASE("members without length") {
    Model model = beam();
    model.members[0].to = 0;
    only(model, "5 error", "from node A to the same node");

    model = beam();
    model.nodes.push_back(node("C", 6, 0));
    join(model, "BC", 1, 2);
    const std::string text = findings(model);
    CHECK(text.find("10 warning: nodes B and C are at the same place") != std::string::npos);
    CHECK(text.find("21 error: member BC has no length") != std::string::npos);
    CHECK(text.find("overlap") == std::string::npos);
}

TEST_CASE("nodes at the same place to within round-off") {
    Model model = beam();
    model.nodes.push_back(node("C", 0.1 + 0.2 + 5.7, 1e-13));
    only(model, "10 warning", "nodes B and C are at the same place");
    model.nodes[2] = node("C", 6, 1e-3);
    CHECK(findings(model).empty());
}

TEST_CASE("two members between the same nodes") {
    for (const bool turned : {false, true}) {
        CAPTURE(turned);
        Model model = beam();
        join(model, "twin", turned ? 1 : 0, turned ? 0 : 1);
        only(model, "21 error", "members AB and twin run between the same two nodes");
    }
}

TEST_CASE("members that overlap on one line") {
    SUBCASE("from a common node") {
        Model model = beam();
        model.nodes.push_back(node("C", 9, 0));
        join(model, "AC", 0, 2);
        only(model, "21 error", "members AB and AC lie on one line and overlap");
    }
    SUBCASE("one inside the other") {
        Model model = beam();
        model.nodes.push_back(node("C", 1, 0));
        model.nodes.push_back(node("D", 2, 0));
        join(model, "DC", 3, 2);
        only(model, "21 error", "members AB and DC lie on one line and overlap");
    }
    SUBCASE("with different ends") {
        Model model = beam();
        model.nodes.push_back(node("C", 4, 0));
        model.nodes.push_back(node("D", 8, 0));
        join(model, "CD", 2, 3);
        only(model, "21 error", "members AB and CD lie on one line and overlap");
    }
    SUBCASE("on a sloping line far from the origin") {
        Model model = beam();
        const double slope = 0.3;
        model.nodes = {node("A", 1e4, 1e4 * slope), node("B", 1e4 + 6, (1e4 + 6) * slope),
                       node("C", 1e4 + 9, (1e4 + 9) * slope)};
        join(model, "AC", 0, 2);
        only(model, "21 error", "members AB and AC lie on one line and overlap");
    }
}

TEST_CASE("members that meet, cross or run on do not overlap") {
    Model model = beam();
    model.nodes.push_back(node("C", 12, 0));
    model.nodes.push_back(node("D", 3, -2));
    model.nodes.push_back(node("E", 3, 2));
    join(model, "BC", 1, 2);
    join(model, "CD", 2, 3);
    join(model, "DE", 3, 4); // crosses AB at its middle, where there is no node
    join(model, "EA", 4, 0);
    CHECK(findings(model).empty());
}

TEST_CASE("a node on a member that does not end there") {
    Model model = beam();
    model.nodes.push_back(node("C", 3, 0));
    model.nodes.push_back(node("D", 3, -3));
    join(model, "CD", 2, 3);
    only(model, "5 warning", "node C lies on member AB, but is not joined to it");
}

TEST_CASE("stiffness factor, releases and hinges") {
    for (const double bad : {0.0, -0.5, std::nan(""), infinity}) {
        CAPTURE(bad);
        Model model = beam();
        model.members[0].stiffness_factor = bad;
        only(model, "5 error", "stiffness_factor must be above 0");
        model = beam();
        model.members[0].start.moment = {Restraint::Kind::elastic, bad};
        only(model, "5 error", "moment release at its start must be above 0");
        model = beam();
        model.members[0].end.axial = {Restraint::Kind::elastic, bad};
        only(model, "5 error", "axial release at its end must be above 0");
    }
    Model model = beam();
    model.members[0].hinges = {2, 4};
    CHECK(findings(model).empty());
    for (const double outside : {-1.0, 0.0, 6.0, 7.0}) {
        CAPTURE(outside);
        model.members[0].hinges = {outside};
        only(model, "5 error", "not inside the member, which is 6 m long");
    }
    model.members[0].hinges = {2, 2};
    only(model, "5 error", "rising order");
    model.members[0].hinges = {4, 2};
    only(model, "5 error", "rising order");
}

TEST_CASE("supports") {
    for (const double bad : {0.0, -0.5, std::nan(""), infinity}) {
        CAPTURE(bad);
        Model model = beam();
        model.supports[1].y = {Restraint::Kind::elastic, bad};
        only(model, "7 error", "support B: the stiffness in y must be above 0");
    }
    Model model = beam();
    model.supports[1].node = 0;
    only(model, "7 error", "node A has two supports");
    model = beam();
    model.supports[1].y.kind = Restraint::Kind::free;
    only(model, "7 warning", "support B holds nothing");
    model = beam();
    model.supports[1].angle = infinity;
    only(model, "7 error", "angle");
}

TEST_CASE("loads off the member") {
    using Kind = MemberLoad::Kind;
    CHECK(findings(beam_with(load(Kind::distributed, 0, 6))).empty());
    CHECK(findings(beam_with(load(Kind::distributed, -1e-10, 6 + 1e-10))).empty());
    CHECK(findings(beam_with(load(Kind::point, 6, 6))).empty());
    only(beam_with(load(Kind::distributed, -0.5, 6)), "9 error",
         "begins at -0.5 m, off the member, which runs from 0 to 6 m");
    only(beam_with(load(Kind::distributed, 0, 6.5)), "9 error", "ends at 6.5 m, off the member");
    only(beam_with(load(Kind::distributed, 4, 2)), "9 error", "ends at 2 m, before it begins at 4 m");
    only(beam_with(load(Kind::distributed, 2, 2)), "9 error", "begins and ends at 2 m");
    only(beam_with(load(Kind::point, 6.001, 0)), "9 error", "stands at 6.001 m, off the member");
    only(beam_with(load(Kind::point, -0.001, 0)), "9 error", "stands at -0.001 m, off the member");

    Model us = beam_with(load(Kind::point, 3.048 * 3, 0));
    us.display = DisplayUnits::us;
    only(us, "9 error", "stands at 30 ft, off the member, which runs from 0 to 19.685 ft");
}

TEST_CASE("a case made in code has no places of entries: its own place is told") {
    Model model = beam_with(load(MemberLoad::Kind::point, 7, 0));
    model.cases[0].entry_positions.clear();
    only(model, "8 error", "off the member");
}

TEST_CASE("plan loads") {
    using Kind = MemberLoad::Kind;
    MemberLoad plan = load(Kind::distributed, 0, 6);
    plan.axes = MemberLoad::Axes::global_plan;
    CHECK(findings(beam_with(plan)).empty());
    plan.first_a = plan.first_b = 1;
    only(beam_with(plan), "9 warning", "x per plan length is no load at all on the horizontal member AB");
    plan.kind = Kind::point;
    only(beam_with(plan), "9 error", "has no plan length");
}

TEST_CASE("numbers without bound in loads") {
    double MemberLoad::*const fields[] = {&MemberLoad::first_a, &MemberLoad::second_b, &MemberLoad::moment,
                                          &MemberLoad::a,       &MemberLoad::top,      &MemberLoad::amount};
    for (const auto field : fields) {
        for (const double bad : {std::nan(""), infinity, -infinity}) {
            MemberLoad spoilt = load(MemberLoad::Kind::distributed, 0, 6);
            spoilt.*field = bad;
            only(beam_with(spoilt), "9 error", "the load on member AB must be a finite number");
        }
    }
    Model model = beam();
    model.cases[0].node_loads.push_back({.node = 1, .entry = 0, .x = infinity, .y = 0, .moment = 0});
    only(model, "9 error", "the load on node B must be a finite number");
    model = beam();
    model.cases[0].self_weight = infinity;
    only(model, "8 error", "self_weight must be a finite number");
    model = beam();
    model.nodes[1].x = infinity;
    only(model, "4 error", "node B: both coordinates");
}

TEST_CASE("support movements") {
    Model model = beam();
    model.cases[0].movements.push_back({.support = 1, .entry = 0, .x = 0, .y = -0.01, .rotation = 0});
    CHECK(findings(model).empty());
    model.cases[0].movements[0].x = 0.01;
    only(model, "9 error", "support B is free in x");
    model.cases[0].movements[0] = {.support = 1, .entry = 0, .x = 0, .y = 0, .rotation = 0.01};
    only(model, "9 error", "support B is free in rotation");
}

TEST_CASE("members drawn from right to left") {
    Model model = beam();
    std::swap(model.members[0].from, model.members[0].to);
    CHECK(findings(model).empty());

    MemberLoad heat = load(MemberLoad::Kind::temperature, 0, 0);
    heat.through_depth = true;
    heat.top = 20;
    model.cases[0].member_loads = {heat, heat};
    only(model, "9 warning", "member AB is drawn from right to left");

    model.cases[0].member_loads.clear();
    model.sections[0].top = 0.1;
    model.sections[0].bottom = 0.2;
    only(model, "5 warning", "member AB is drawn from right to left, so that the top of its section joist is below");

    model.nodes[1] = node("B", 0, 6); // vertical
    CHECK(findings(model).empty());
}

TEST_CASE("cases") {
    Model model = beam();
    model.cases[0].self_weight = 0;
    only(model, "8 warning", "case dead has no loads");
    model = beam();
    model.cases[0].with = 0;
    only(model, "8 error", "with names the case itself");
}

TEST_CASE("combinations") {
    Model model = beam();
    LoadCase wind = model.cases[0];
    wind.group = "wind";
    for (const char* name : {"left", "right"}) {
        wind.name = name;
        model.cases.push_back(wind);
    }
    Combination uls{.name = "uls", .limit = LimitState::strength, .terms = {{0, 1.35}, {1, 1.5}}, .position = {30, 1}};
    model.combinations.push_back(uls);
    CHECK(findings(model).empty());
    model.combinations[0].terms.push_back({2, 1.5});
    only(model, "30 warning", "adds the cases left and right, which group wind makes alternatives");
    model.combinations[0].terms.back().factor = 0;
    CHECK(findings(model).empty());
    model.combinations[0].terms.back().factor = 1.5;
    model.cases[2].with = 1;
    CHECK(findings(model).empty());
    model.combinations[0].terms[0].factor = infinity;
    only(model, "30 error", "factor of case dead must be a finite number");
    model.combinations[0].terms.clear();
    only(model, "30 error", "has no cases");
}

TEST_CASE("all findings come at once, in the order of the model's lists") {
    Model model = beam();
    model.materials[0].E = -1;
    model.sections[0].I = 0;
    model.members[0].stiffness_factor = 0;
    model.cases[0].member_loads.push_back(load(MemberLoad::Kind::point, 7, 0));
    const std::string text = findings(model);
    const auto order = {text.find("1 error"), text.find("2 error"), text.find("5 error"), text.find("9 error")};
    CHECK(std::is_sorted(order.begin(), order.end()));
    CHECK(text.find("9 error") != std::string::npos);
}

TEST_CASE("a long chain and a large grid are checked without comparing all pairs") {
    // All pairs of 90,000 nodes and 180,000 members would be 16 billion questions: minutes, not a second or two.
    constexpr int side = 300;
    Model model = beam();
    model.nodes.clear();
    model.members.resize(1);
    for (int i = 0; i < side; ++i) {
        for (int j = 0; j < side; ++j) model.nodes.push_back(node("n", 7.0 * j, 3.5 * i));
    }
    const Member pattern = model.members[0];
    model.members.clear();
    for (int n = 0; n < side * side; ++n) {
        Member member = pattern;
        member.from = n;
        if (n % side + 1 < side) {
            member.to = n + 1;
            model.members.push_back(member);
        }
        if (n + side < side * side) {
            member.to = n + side;
            model.members.push_back(member);
        }
    }
    model.supports.resize(1);
    const auto start = std::chrono::steady_clock::now();
    CHECK(findings(model).empty());
    const std::chrono::duration<double> taken = std::chrono::steady_clock::now() - start;
    CHECK(taken.count() < 20);
}
