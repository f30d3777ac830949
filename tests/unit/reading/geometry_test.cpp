// [nodes], [members], [supports] and the order of the file.

#include "read.hpp"

#include <numbers>

using groundsill::Model;
using groundsill::Restraint;
using groundsill::Support;
using test::says;

namespace {

std::string names(const auto& list) {
    std::string result;
    for (const auto& entity : list) result += entity.name + " ";
    return result;
}

std::string member_with(std::string_view keys) {
    return "[members.AB]\nfrom = 'A'\nto = 'B'\nsection = 'bar'\nmaterial = 'steel'\n" + std::string(keys) +
           "\n[members.BC]\nfrom = 'B'\nto = 'C'\nsection = 'bar'\nmaterial = 'steel'\n";
}

} // namespace

TEST_CASE("nodes and members, in the order of the file") {
    const Model model = test::read(
        "nodes", "[nodes]\nB = ['6 m', '0 ft']\nN10 = ['6 m', '3 m']\nN2 = ['7 m', '3 m']\nA = ['0 m', '0 "
                 "m']\nC = ['10 m', '0 m']\n[members.M10]\nfrom = 'N10'\nto = 'B'\nsection = 'bar'\nmaterial = "
                 "'steel'\n[members.M2]\nfrom = 'N10'\nto = 'N2'\nsection = 'bar'\nmaterial = 'steel'\n");
    CHECK(names(model.nodes) == "B N10 N2 A C ");
    CHECK(names(model.members) == "M10 M2 AB BC ");
    CHECK(model.nodes.at(1).x == 6);
    CHECK(model.nodes.at(1).y == 3);
    CHECK(model.members.at(0).from == 1);
    CHECK(model.members.at(0).to == 0);
    CHECK(model.members.at(2).from == 3);
    CHECK(model.members.at(0).section == 0);
    CHECK(model.members.at(0).material == 0);
    CHECK(model.members.at(0).stiffness_factor == 1);
}

TEST_CASE("releases and the stiffness factor") {
    const Model model =
        test::read("members", member_with("releases = { start = { moment = 'free', shear = '2 MN/m' }, end = "
                                          "{ moment = { stiffness = '40 MN m/rad' }, axial = 'free' } }\n"
                                          "stiffness_factor = 0.5"));
    const groundsill::Member& member = model.members.at(0);
    CHECK(member.start.moment.is_free());
    CHECK(member.start.shear.is_elastic());
    CHECK(member.start.shear.stiffness == 2e6);
    CHECK(member.start.axial.is_fixed());
    CHECK(member.end.moment.is_elastic());
    CHECK(member.end.moment.stiffness == 40e6);
    CHECK(member.end.axial.is_free());
    CHECK(member.stiffness_factor == 0.5);
    CHECK(test::read("members", member_with("stiffness_factor = '70 %'")).members.at(0).stiffness_factor == 0.7);
}

TEST_CASE("members that are refused") {
    CHECK(says("members", "[members.AB]\nfrom = 'A'\nto = 'B'\n") ==
          "1:10: error: members.AB lacks 'section'\n1:10: error: members.AB lacks 'material'\n");
    CHECK(says("members", member_with("releases = { start = { moment = 'loose' } }")) ==
          "6:24: error: members.AB.releases.start.moment takes a force times a length, like \"12 kN m\", or \"free\", "
          "or a "
          "table: 'loose' is none of them; the nearest word is \"free\"\n");
    CHECK(says("members", member_with("releases = { start = { moment = '5 kN' } }")) ==
          "6:24: error: members.AB.releases.start.moment does not fit: expected a force times a length, got a force\n");
    CHECK(says("members", member_with("releases = { start = { moment = {} } }")) ==
          "6:24: error: members.AB.releases.start.moment lacks 'stiffness'\n");
    CHECK(says("members", member_with("releases = { strat = { moment = 'free' } }")) ==
          "6:14: error: unknown key 'strat' in members.AB.releases; did you mean 'start'?\n");
    CHECK(says("members", member_with("stiffness_factor = 0")) ==
          "6:1: error: members.AB.stiffness_factor must be above 0\n");
    CHECK(says("members", "[members]\nAB = { from = 'A', to = 'X', section = 'bra', material = 'steel' }\n"
                          "BC = { from = 'B', to = 'C', section = 'bar', material = 'stele' }\n") ==
          "2:20: error: members.AB.to: there is no node 'X'; the nearest name is 'A'\n"
          "2:30: error: members.AB.section: there is no section 'bra'; the nearest name is 'bar'\n"
          "3:47: error: members.BC.material: there is no material 'stele'; the nearest name is 'steel'\n");
    CHECK(says("members", "[members]\nAB = { from = 1, to = 'B', section = 'bar', material = 'steel' }\n") ==
          "2:8: error: members.AB.from takes the name of a node in quotation marks: a number is given\n");
}

TEST_CASE("nodes that are refused") {
    const std::string sound = "B = ['6 m', '0 m']\nC = ['10 m', '0 m']\n";
    const auto node = [&](std::string_view line) {
        return says("nodes", "[nodes]\n" + std::string(line) + "\n" + sound);
    };
    CHECK(node("A = [0, 0]") ==
          "2:1: error: nodes.A has no unit: write a length, as in \"0 m\", or name the units of bare "
          "numbers in [units]\n");
    CHECK(node("A = ['0 m']") ==
          "2:1: error: nodes.A takes an array of two, each a length, like \"12 m\": 1 value is given\n");
    CHECK(node("A = ['0 m', '50 %']") == "2:1: error: nodes.A does not fit: expected a length, got a fraction\n");
    CHECK(node("A = '0 m'") ==
          "2:1: error: nodes.A takes an array of two, each a length, like \"12 m\": a text is given\n");
    CHECK(node("'A.1' = ['0 m', '0 m']\nA = ['0 m', '1 m']") ==
          "2:1: error: nodes: the name 'A.1' holds a dot: dots separate the parts of a key\n");
    CHECK(node("'' = ['0 m', '0 m']\nA = ['0 m', '1 m']") ==
          "2:1: error: nodes: a name is empty: give it at least one letter\n");
    CHECK(node("\"A\\u0007\" = ['0 m', '0 m']\nA = ['0 m', '1 m']") == test::Contains{"control character"});
}

TEST_CASE("every form of a support") {
    const auto support = [](std::string_view value) {
        return test::read("supports", "[supports]\nC = 'fixed'\nA = " + std::string(value) + "\n").supports.at(1);
    };
    const Support fixed = support("'fixed'");
    CHECK((fixed.x.is_fixed() && fixed.y.is_fixed() && fixed.rotation.is_fixed()));
    const Support pinned = support("'pinned'");
    CHECK((pinned.x.is_fixed() && pinned.y.is_fixed() && pinned.rotation.is_free()));
    const Support roller = support("'roller'");
    CHECK((roller.x.is_free() && roller.y.is_fixed() && roller.rotation.is_free()));
    const Support spring = support("{ y = '25 MN/m' }");
    CHECK((spring.x.is_free() && spring.y.is_elastic() && spring.rotation.is_free()));
    CHECK(spring.y.stiffness == 25e6);
    CHECK(support("{ y = { stiffness = '25 MN/m' } }").y.stiffness == 25e6);
    CHECK(support("{ y = { stiffness = 'fixed' } }").y.is_fixed());
    const Support turned = support("{ x = 'free', y = 'fixed', rotation = '8 MN m/rad', angle = '30 deg' }");
    CHECK((turned.x.is_free() && turned.y.is_fixed() && turned.rotation.is_elastic()));
    CHECK(turned.rotation.stiffness == 8e6);
    CHECK(turned.angle == doctest::Approx(std::numbers::pi / 6).epsilon(1e-15));
    CHECK(turned.node == 0);
    CHECK(turned.position.line == 3);
}

TEST_CASE("supports that are refused") {
    const auto support = [](std::string_view line) {
        return says("supports", "[supports]\n" + std::string(line) + "\nC = 'pinned'\n");
    };
    CHECK(support("AA = 'pinned'") == "2:1: error: supports: there is no node 'AA'; the nearest name is 'A'\n");
    CHECK(support("A = 'pined'") ==
          "2:1: error: supports.A takes \"pinned\", \"fixed\", \"roller\", or a table: 'pined' is "
          "none of them; the nearest word is \"pinned\"\n");
    CHECK(support("A = { y = 'fixd' }") == "2:7: error: supports.A.y takes a force per length, like \"12 kN/m\", or "
                                           "\"fixed\", \"free\", or a table: 'fixd' is "
                                           "none of them; the nearest word is \"fixed\"\n");
    CHECK(support("A = { y = '25 MN' }") ==
          "2:7: error: supports.A.y does not fit: expected a force per length, got a force\n");
    CHECK(support("A = { y = '0 MN/m' }") == "2:7: error: supports.A.y must be above 0\n");
    CHECK(support("A = { y = 25 }") ==
          "2:7: error: supports.A.y has no unit: write a force per length, as in \"25 kN/m\", or "
          "name the units of bare numbers in [units]\n");
    CHECK(support("A = { y = { stifness = '25 MN/m' } }") ==
          "2:13: error: unknown key 'stifness' in supports.A.y; did you mean 'stiffness'?\n");
    CHECK(support("A = { y = 'fixed', angle = 30 }") ==
          "2:20: error: supports.A.angle has no unit: write an angle, as in \"30 "
          "deg\"; [units] does not cover it\n");
    CHECK(support("A = { y = 'fixed', angle = '30 m' }") ==
          "2:20: error: supports.A.angle does not fit: expected an angle, got a length\n");
}
