// [beams]: runs of members through supports.

#include "read.hpp"

using doctest::Approx;
using groundsill::Model;

namespace {

/// A model whose members and nodes come from its beams and what else is given.
std::string with_beams(std::string_view text, std::string_view supports = "A = 'pinned'\nC = 'roller'\n") {
    std::string result(text);
    for (const auto& [name, table] : test::sound_tables) {
        if (name == "materials" || name == "sections") result += table;
    }
    return result + "[supports]\n" + std::string(supports) + "[cases.c]\nloads = [{ self_weight = 1 }]\n";
}

std::string beam_with(std::string_view keys) {
    return with_beams("[beams.floor]\nnodes = ['A', 'B', 'C']\nsection = 'bar'\nmaterial = 'steel'\n" +
                      std::string(keys) + "\n");
}

std::string says(const std::string& text) { return test::diagnostics(text); }

std::string names(const auto& list) {
    std::string result;
    for (const auto& entity : list) result += entity.name + " ";
    return result;
}

} // namespace

TEST_CASE("a beam creates its nodes and members") {
    const Model model = test::read(beam_with("spans = ['6 m', '8 m']"));
    CHECK(names(model.nodes) == "A B C ");
    CHECK(names(model.members) == "floor.1 floor.2 ");
    CHECK(model.nodes.at(2).x == 14);
    CHECK(model.nodes.at(2).y == 0);
    CHECK(model.members.at(1).from == 1);
    CHECK(model.members.at(1).to == 2);
    REQUIRE(model.beams.size() == 1);
    CHECK(model.beams.at(0).name == "floor");
    CHECK(model.beams.at(0).members == std::vector{0, 1});
    CHECK(model.beams.at(0).starts == std::vector{0.0, 6.0, 14.0});
}

TEST_CASE("start and direction place the run; along an axis its coordinates are exact") {
    const Model up = test::read(beam_with("spans = ['6 m', '8 m']\nstart = ['1 m', '2 m']\ndirection = '90 deg'"));
    CHECK(up.nodes.at(2).x == 1);
    CHECK(up.nodes.at(2).y == 16);
    const Model left = test::read(beam_with("spans = ['6 m', '8 m']\ndirection = '-180 deg'"));
    CHECK(left.nodes.at(2).x == -14);
    CHECK(left.nodes.at(2).y == 0);
    const Model sloping = test::read(beam_with("spans = ['6 m', '8 m']\ndirection = '30 deg'"));
    CHECK(sloping.nodes.at(2).x == Approx(14 * 0.8660254037844386).epsilon(1e-15));
    CHECK(sloping.nodes.at(2).y == Approx(7).epsilon(1e-15));
}

TEST_CASE("nodes of a beam stand where its array names them, its members where the beam stands") {
    const Model model = test::read(with_beams(
        "[members]\nfirst = { from = 'P', to = 'A', section = 'bar', material = 'steel' }\n"
        "[nodes]\nP = ['0 m', '-3 m']\nQ = ['14 m', '-3 m']\n"
        "[beams.floor]\nsection = 'bar'\nmaterial = 'steel'\nspans = ['6 m', '8 m']\nnodes = ['A', 'B', 'C']\n"
        "[members.last]\nfrom = 'Q'\nto = 'C'\nsection = 'bar'\nmaterial = 'steel'\n"
        "[beams.roof]\nnodes = ['A2', 'B2']\nstart = ['0 m', '5 m']\nspans = ['6 m']\nsection = 'bar'\nmaterial = "
        "'steel'\n"
        "[members.post]\nfrom = 'B'\nto = 'B2'\nsection = 'bar'\nmaterial = 'steel'\n",
        "P = 'fixed'\n"));
    CHECK(names(model.nodes) == "P Q A B C A2 B2 ");
    CHECK(names(model.members) == "first floor.1 floor.2 last roof.1 post ");
}

TEST_CASE("a beam through existing nodes") {
    const Model model =
        test::read(with_beams("[nodes]\nA = ['0 m', '0 m']\nB = ['3 m', '4 m']\nC = ['9 m', '12 m']\n"
                              "[beams.floor]\nnodes = ['A', 'B', 'C']\nsection = 'bar'\nmaterial = 'steel'\n"));
    CHECK(model.beams.at(0).starts == std::vector{0.0, 5.0, 15.0});
    // Spans may be given too: they must agree.
    CHECK(
        says(with_beams("[nodes]\nB = ['6 m', '0 m']\n[beams.floor]\nnodes = ['A', 'B', 'C']\nspans = ['6 m', '8 m']\n"
                        "section = 'bar'\nmaterial = 'steel'\n"))
            .empty());
    CHECK(says(with_beams(
              "[nodes]\nB = ['6.1 m', '0 m']\n[beams.floor]\nnodes = ['A', 'B', 'C']\nspans = ['6 m', '8 m']\n"
              "section = 'bar'\nmaterial = 'steel'\n")) == "4:1: error: beams.floor puts node B at (6 m, 0 m), but it "
                                                           "stands at (6.1 m, 0 m) already: mend start, direction or "
                                                           "spans, or the node\n");
}

TEST_CASE("releases and hinges of a beam") {
    const Model model = test::read(beam_with(
        "spans = ['6 m', '8 m']\nhinges = ['7.2 m', '6 m']\nreleases = { start = { moment = '5 kN m/rad' } }"));
    CHECK(model.members.at(0).hinges.empty());
    CHECK(model.members.at(0).end.moment.is_free()); // the hinge at the node is in the member before it
    CHECK(model.members.at(0).start.moment.stiffness == 5000);
    CHECK(model.members.at(1).start.moment.stiffness == 5000);
    REQUIRE(model.members.at(1).hinges.size() == 1);
    CHECK(model.members.at(1).hinges.at(0) == Approx(1.2).epsilon(1e-15));
    CHECK(model.members.at(1).end.moment.is_fixed());

    const Model halves = test::read(beam_with("spans = ['6 m', '8 m']\nhinges = ['25 %']"));
    CHECK(halves.members.at(0).hinges.at(0) == 3.5);
}

TEST_CASE("beams that are refused") {
    CHECK(says(beam_with("spans = ['6 m']")) ==
          "5:1: error: beams.floor has 1 span between 3 nodes: give one span fewer than nodes\n");
    CHECK(says(beam_with("spans = ['6 m', '-8 m']")) == "5:1: error: beams.floor.spans must be above 0\n");
    CHECK(says(beam_with("spans = '6 m'")) ==
          "5:1: error: beams.floor.spans takes an array, each a length, like \"12 m\": a text is given\n");
    CHECK(says(beam_with("spns = ['6 m', '8 m']")) ==
          "5:1: error: unknown key 'spns' in beams.floor; did you mean 'spans'?\n");
    CHECK(says(beam_with("")) == "2:10: error: beams.floor.nodes: node 'A' does not exist, and without spans the beam "
                                 "cannot create it; give spans\n"
                                 "2:15: error: beams.floor.nodes: node 'B' does not exist, and without spans the beam "
                                 "cannot create it; give spans; "
                                 "the nearest name is 'A'\n"
                                 "2:20: error: beams.floor.nodes: node 'C' does not exist, and without spans the beam "
                                 "cannot create it; give spans; "
                                 "the nearest name is 'A'\n");
    CHECK(
        says(beam_with("spans = ['6 m', '8 m']\ndirection = 30")) ==
        "6:1: error: beams.floor.direction has no unit: write an angle, as in \"30 deg\"; [units] does not cover it\n");
    CHECK(says(beam_with("spans = ['6 m', '8 m']\nhinges = ['15 m']")) ==
          "6:1: error: beams.floor has a hinge at 15 m, not on the run, which is 14 m long: use releases for one at "
          "its very "
          "start\n");
    CHECK(says(beam_with("spans = ['6 m', '8 m']\nhinges = ['2 m', '2 m']")) ==
          "6:1: error: beams.floor has two hinges at 2 m: keep one\n");
    const auto nodes = [](std::string_view array) {
        return says(with_beams("[beams.floor]\nnodes = " + std::string(array) +
                               "\nspans = ['6 m', '8 m']\nsection = 'bar'\nmaterial = 'steel'\n"));
    };
    CHECK(nodes("['A', 'C', 'A']") == "2:1: error: beams.floor passes node 'A' twice: it runs straight on\n");
    CHECK(nodes("['A', 3, 'C']") == "2:1: error: beams.floor takes the names of its nodes in quotation marks\n");
    CHECK(nodes("['A', 'B.1', 'C']") == test::Contains{"cannot create a node 'B.1': names hold no dots"});
    CHECK(says(with_beams("[nodes]\nA = ['0 m', '0 m']\nB = ['3 m', '1 m']\nC = ['9 m', '0 m']\n"
                          "[beams.floor]\nnodes = ['A', 'B', 'C']\nsection = 'bar'\nmaterial = 'steel'\n")) ==
          "6:1: error: beams.floor is no straight run: node B does not stand between its neighbours on the line from A "
          "to C\n");
    CHECK(
        says(with_beams(
            "[nodes]\nA = ['0 m', '0 m']\nC = ['9 m', '0 m']\n"
            "[beams.floor]\nnodes = ['A', 'C']\nsection = 'bar'\nmaterial = 'steel'\nstart = ['0 m', '0 m']\n")) ==
        "8:1: error: beams.floor has 'start' but no spans: add spans, or take 'start' out where all its nodes exist\n");
    // A user's own member cannot take the name of a beam's, as names hold no dots.
    CHECK(
        says(beam_with("spans = ['6 m', '8 m']\n[members.'floor.1']\nfrom = 'A'\nto = 'B'\nsection = 'bar'\nmaterial = "
                       "'steel'")) ==
        "6:10: error: members: the name 'floor.1' holds a dot: dots separate the parts of a key\n");
}

TEST_CASE("members of a beam can be named where members are") {
    const Model model =
        test::read(with_beams("[beams.floor]\nnodes = ['A', 'B', 'C']\nspans = ['6 m', '8 m']\nsection = 'bar'\n"
                              "material = 'steel'\n[cases.d]\nloads = [{ member = 'floor.2', y = '-1 kN/m' }]\n"));
    CHECK(model.cases.at(0).member_loads.at(0).member == 1);
}
