// [mass].

#include "read.hpp"

using groundsill::MassModel;
using groundsill::Model;
using test::says;

TEST_CASE("cases and nodes of [mass] come in the order of the file") {
    const Model model =
        test::read("cases", "[cases.dead]\nloads = [{ self_weight = 1 }]\n"
                            "[cases.imposed]\nloads = [{ member = 'AB', y = '-3 kN/m' }]\n"
                            "[mass]\ncases = { imposed = '10 %', dead = 1 }\nnodes = { C = '0.5 t', B = '0 kg' }\n"
                            "modes = 12\n");
    REQUIRE(model.mass);
    const MassModel& mass = *model.mass;
    REQUIRE(mass.cases.size() == 2);
    CHECK(mass.cases[0].load_case == 1);
    CHECK(mass.cases[0].factor == doctest::Approx(0.1).epsilon(1e-15));
    CHECK(mass.cases[1].load_case == 0);
    CHECK(mass.cases[1].factor == 1);
    REQUIRE(mass.nodes.size() == 2);
    CHECK(mass.nodes[0].node == 2);
    CHECK(mass.nodes[0].mass == 500);
    CHECK(mass.nodes[0].position.line == 7);
    CHECK(mass.nodes[1].node == 1);
    CHECK(mass.nodes[1].mass == 0);
    CHECK(mass.modes == 12);
    CHECK(mass.position.line == 5);
}

TEST_CASE("without [mass] no frequencies are asked for; with it, six") {
    CHECK_FALSE(test::read("mass", "").mass);
    CHECK(test::read("mass", "[mass]\ncases = { dead = 1 }\n").mass.value().modes == 6);
    CHECK(test::read("mass", "[mass]\nnodes = { B = '1 t' }\n").mass.value().cases.empty());
    CHECK(test::read("mass", "[mass]\ncases = { dead = 1 }\nmodes = 1000\n").mass.value().modes == 1000);
}

TEST_CASE("masses that are refused") {
    const auto mass = [](std::string_view keys) { return says("mass", "[mass]\n" + std::string(keys)); };
    const std::string nothing = "1:2: error: mass lists nothing that has mass: add cases = { dead = 1.0 }, whose "
                                "downward loads become mass, or nodes = { B = \"500 kg\" }\n";
    CHECK(mass("modes = 3") == nothing);
    CHECK(mass("cases = {}\nnodes = {}") == nothing);
    CHECK(mass("case = { dead = 1 }") == "2:1: error: unknown key 'case' in mass; did you mean 'cases'?\n");
    CHECK(mass("cases = { deed = 1, dead = 1 }") ==
          "2:11: error: mass.cases: there is no case 'deed'; the nearest name is 'dead'\n");
    CHECK(mass("nodes = { BB = '1 t' }") ==
          "2:11: error: mass.nodes: there is no node 'BB'; the nearest name is 'B'\n");
    CHECK(mass("cases = { dead = -0.5 }") == "2:11: error: mass.cases.dead must not be negative\n");
    CHECK(mass("cases = { dead = nan }") ==
          "2:11: error: mass.cases.dead takes a number, or a fraction like \"1/360\" or \"50 %\": nan is given\n");
    CHECK(mass("nodes = { B = '-1 kg' }") == "2:11: error: mass.nodes.B must not be negative\n");
    CHECK(mass("nodes = { B = '1 kN' }") == "2:11: error: mass.nodes.B does not fit: expected a mass, got a force\n");
    CHECK(mass("cases = { dead = 1 }\nmodes = 0") == "3:1: error: mass.modes must be above 0\n");
    CHECK(mass("cases = { dead = 1 }\nmodes = 1001") == "3:1: error: mass asks for too many modes: 1000 at most\n");
    CHECK(mass("cases = { dead = 1 }\nmodes = 1.5") == test::Contains{"3:1: error: mass.modes takes a whole number"});
    CHECK(says("units", "[units]\nlength = 'm'\nforce = 'kN'\n[mass]\nnodes = { B = 500 }\n") ==
          "5:11: error: mass.nodes.B has no unit: write a mass, as in \"500 kg\"; [units] does not cover it\n");
}
