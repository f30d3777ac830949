// [cases], every form of load, [combinations].

#include "read.hpp"

using doctest::Approx;
using groundsill::Action;
using groundsill::LoadCase;
using groundsill::MemberLoad;
using groundsill::Model;
using test::read_load;
using test::says;
using test::says_of_load;

namespace {

/// A beam A-B-C of 6 m and 8 m, and the member loads of one entry on it.
Model read_on_beam(std::string_view load) {
    std::string text;
    for (const auto& [name, table] : test::sound_tables) {
        if (name != "nodes" && name != "members" && name != "cases") text += table;
    }
    return test::read(text +
                      "[beams.floor]\nnodes = ['A', 'B', 'C']\nspans = ['6 m', '8 m']\nsection = 'bar'\nmaterial = "
                      "'steel'\n[cases.c]\nloads = [" +
                      std::string(load) + "]\n");
}

std::vector<MemberLoad> load_on_beam(std::string_view load) { return read_on_beam(load).cases.at(0).member_loads; }

} // namespace

TEST_CASE("what a case says of itself") {
    const Model model =
        test::read("cases", "[cases.left]\naction = 'wind'\ngroup = 'wind'\nduration = 'short'\nloads = [{ "
                            "member = 'AB', x = '2 kN/m' }]\n[cases.suction]\naction = 'wind'\nwith = "
                            "'left'\ncategory = 'B'\nloads = [{ self_weight = 0.5 }, { self_weight = 0.25 }]\n");
    const LoadCase& left = model.cases.at(0);
    CHECK(left.name == "left");
    CHECK(left.action == Action::wind);
    CHECK(left.group == "wind");
    CHECK(left.with == -1);
    CHECK(left.entries == 1);
    const LoadCase& suction = model.cases.at(1);
    CHECK(suction.with == 0);
    CHECK(suction.category == "B");
    CHECK(suction.self_weight == 0.75);
    CHECK(suction.entries == 2);
    CHECK(suction.entry_positions.at(1).line == 10);
    CHECK(suction.entry_positions.at(1).column == 33);
}

TEST_CASE("every action") {
    const std::pair<const char*, Action> actions[] = {
        {"permanent", Action::permanent},
        {"imposed", Action::imposed},
        {"roof", Action::roof},
        {"snow", Action::snow},
        {"rain", Action::rain},
        {"wind", Action::wind},
        {"temperature", Action::temperature},
        {"settlement", Action::settlement},
        {"earthquake", Action::earthquake},
        {"accidental", Action::accidental},
    };
    for (const auto& [word, action] : actions) {
        const std::string text = "[cases.c]\naction = '" + std::string(word) + "'\nloads = [{ self_weight = 1 }]\n";
        CHECK(test::read("cases", text).cases.at(0).action == action);
    }
    CHECK(test::read("cases", "[cases.c]\nloads = [{ self_weight = 1 }]\n").cases.at(0).action == Action::none);
}

TEST_CASE("loads along a member") {
    const MemberLoad whole = read_load("{ member = 'AB', y = '-12 kN/m' }").at(0);
    CHECK(whole.kind == MemberLoad::Kind::distributed);
    CHECK(whole.axes == MemberLoad::Axes::global);
    CHECK(whole.member == 0);
    CHECK(whole.a == 0);
    CHECK(whole.b == 6);
    CHECK(whole.first_a == 0);
    CHECK(whole.second_a == -12000);
    CHECK(whole.second_b == -12000);

    const std::vector<MemberLoad> both =
        read_load("{ members = ['BC', 'AB'], y = ['-5 kN/m', '-20 kN/m'], x = '1 kN/m', between = ['1 m', '50 %'] }");
    REQUIRE(both.size() == 2);
    CHECK(both.at(0).member == 1);
    CHECK(both.at(0).a == 1);
    CHECK(both.at(0).b == 2);
    CHECK(both.at(0).second_a == -5000);
    CHECK(both.at(0).second_b == -20000);
    CHECK(both.at(0).first_a == 1000);
    CHECK(both.at(0).first_b == 1000);
    CHECK(both.at(1).member == 0);
    CHECK(both.at(1).b == 3);

    CHECK(read_load("{ member = 'AB', y = '-1 kN/m', per = 'plan' }").at(0).axes == MemberLoad::Axes::global_plan);
    CHECK(read_load("{ member = 'AB', y = '-1 kN/m', per = 'length' }").at(0).axes == MemberLoad::Axes::global);
    const MemberLoad local = read_load("{ member = 'AB', across = '-3 kN/m', along = '1 kN/m' }").at(0);
    CHECK(local.axes == MemberLoad::Axes::member);
    CHECK(local.first_a == 1000);
    CHECK(local.second_a == -3000);
}

TEST_CASE("point loads on a member") {
    const MemberLoad force = read_load("{ member = 'AB', y = '-40 kN', at = '50 %' }").at(0);
    CHECK(force.kind == MemberLoad::Kind::point);
    CHECK(force.a == 3);
    CHECK(force.second_a == -40000);
    const MemberLoad moment = read_load("{ member = 'AB', moment = '25 kN m', at = '2 m' }").at(0);
    CHECK(moment.kind == MemberLoad::Kind::point);
    CHECK(moment.moment == 25000);
    CHECK(moment.a == 2);
    CHECK(read_load("{ member = 'AB', across = '-3 kN', at = '2 m' }").at(0).axes == MemberLoad::Axes::member);
    // A place that misses the end by round-off is at the end.
    CHECK(read_load("{ member = 'AB', y = '-1 kN', at = '6.0000000001 m' }").at(0).a == 6);
}

TEST_CASE("temperatures and lack of fit") {
    const MemberLoad uniform = read_load("{ member = 'AB', temperature = '25 K' }").at(0);
    CHECK(uniform.kind == MemberLoad::Kind::temperature);
    CHECK(uniform.top == 25);
    CHECK(uniform.bottom == 25);
    CHECK_FALSE(uniform.through_depth);
    const MemberLoad faces =
        read_load("{ member = 'AB', temperature = { top = '30 degC', bottom = '18 degF' } }").at(0);
    CHECK(faces.top == 30);
    CHECK(faces.bottom == 10);
    CHECK(faces.through_depth);
    const MemberLoad misfit = read_load("{ member = 'AB', lack_of_fit = '2 mm' }").at(0);
    CHECK(misfit.kind == MemberLoad::Kind::lack_of_fit);
    CHECK(misfit.amount == 0.002);
}

TEST_CASE("loads on nodes and movements of supports") {
    const Model model = test::read("cases", "[cases.c]\nloads = [{ node = 'B', x = '10 kN', y = '-5 kN', moment = '3 "
                                            "kN m' }, { support = 'C', y = '-15 mm' "
                                            "}, { support = 'A', x = '1 mm' }]\n");
    const LoadCase& load_case = model.cases.at(0);
    CHECK(load_case.node_loads.at(0).node == 1);
    CHECK(load_case.node_loads.at(0).x == 10000);
    CHECK(load_case.node_loads.at(0).y == -5000);
    CHECK(load_case.node_loads.at(0).moment == 3000);
    CHECK(load_case.movements.at(0).support == 1);
    CHECK(load_case.movements.at(0).entry == 1);
    CHECK(load_case.movements.at(0).y == -0.015);
    CHECK(load_case.movements.at(1).x == 0.001);
    const Model turned =
        test::read("supports", "[units]\nlength = 'm'\nforce = 'kN'\n[supports]\nA = 'fixed'\n[cases.turn]\n"
                               "loads = [{ support = 'A', rotation = 0.002 }]\n");
    CHECK(turned.cases.at(0).movements.at(0).rotation == 0.002);
}

TEST_CASE("loads on a beam are cut into its members") {
    const std::vector<MemberLoad> whole = load_on_beam("{ beam = 'floor', y = '-2 kN/m' }");
    REQUIRE(whole.size() == 2);
    CHECK(whole.at(0).a == 0);
    CHECK(whole.at(0).b == 6);
    CHECK(whole.at(1).a == 0);
    CHECK(whole.at(1).b == 8);

    // From 4 m to 12 m, rising from 0 to 8 kN/m: 2 kN/m at the node B.
    const std::vector<MemberLoad> part =
        load_on_beam("{ beam = 'floor', y = ['0 N/m', '8 kN/m'], between = ['4 m', '12 m'] }");
    REQUIRE(part.size() == 2);
    CHECK(part.at(0).member == 0);
    CHECK(part.at(0).a == 4);
    CHECK(part.at(0).b == 6);
    CHECK(part.at(0).second_a == 0);
    CHECK(part.at(0).second_b == 2000);
    CHECK(part.at(1).member == 1);
    CHECK(part.at(1).a == 0);
    CHECK(part.at(1).b == 6);
    CHECK(part.at(1).second_a == 2000);
    CHECK(part.at(1).second_b == 8000);

    const std::vector<MemberLoad> second_span =
        load_on_beam("{ beam = 'floor', y = '1 kN/m', between = ['6 m', '100 %'] }");
    REQUIRE(second_span.size() == 1);
    CHECK(second_span.at(0).member == 1);
    CHECK(second_span.at(0).b == 8);
}

TEST_CASE("a point load at an inner node of a beam is at the start of the member that follows") {
    const auto place = [](std::string_view at) {
        const std::vector<MemberLoad> loads =
            load_on_beam("{ beam = 'floor', y = '-40 kN', at = '" + std::string(at) + "' }");
        REQUIRE(loads.size() == 1);
        return std::pair(loads.at(0).member, loads.at(0).a);
    };
    CHECK(place("0 m") == std::pair(0, 0.0));
    CHECK(place("2 m") == std::pair(0, 2.0));
    CHECK(place("6 m") == std::pair(1, 0.0));
    CHECK(place("5.9999999999 m") == std::pair(1, 0.0)); // but for round-off
    CHECK(place("9.5 m") == std::pair(1, 3.5));
    CHECK(place("14 m") == std::pair(1, 8.0));
    CHECK(place("50 %") == std::pair(1, 1.0));
}

TEST_CASE("temperature acts on each member of a beam; lack of fit is that of the whole run") {
    const std::vector<MemberLoad> warm = load_on_beam("{ beam = 'floor', temperature = '20 K' }");
    REQUIRE(warm.size() == 2);
    CHECK(warm.at(1).top == 20);
    const std::vector<MemberLoad> misfit = load_on_beam("{ beam = 'floor', lack_of_fit = '14 mm' }");
    CHECK(misfit.at(0).amount == Approx(0.006).epsilon(1e-15));
    CHECK(misfit.at(1).amount == Approx(0.008).epsilon(1e-15));
}

TEST_CASE("loads that are refused") {
    CHECK(says_of_load("{ y = '-1 kN/m' }") ==
          "2:10: error: cases.c.loads[0] acts on nothing: add member, members, beam, node, support or self_weight\n");
    CHECK(says_of_load("{ member = 'AB' }") ==
          "2:10: error: cases.c.loads[0] has no size: add x, y, along, across, moment with "
          "at, temperature or lack_of_fit\n");
    CHECK(says_of_load("{ node = 'B' }") == "2:10: error: cases.c.loads[0] has no size: add x, y or moment\n");
    CHECK(says_of_load("{ support = 'A' }") == "2:10: error: cases.c.loads[0] has no size: add x, y or rotation\n");
    CHECK(says_of_load("{ member = 'AB', at = '1 m' }") ==
          "2:10: error: cases.c.loads[0] has no size: add x, y, along, across or moment\n");
    CHECK(says_of_load("{ member = 'AB', moment = '1 kN m' }") ==
          "2:10: error: cases.c.loads[0] lacks 'at', the place on the member\n");
    CHECK(says_of_load("{ member = 'AB', members = ['BC'], y = '-1 kN/m' }") ==
          "2:27: error: cases.c.loads[0] has both 'member' and 'members': take one of them\n");
    CHECK(says_of_load("{ node = 'B', member = 'AB', y = '-1 kN' }") ==
          "2:24: error: 'member' does not go with a load on a node, which cases.c.loads[0] is\n");
    CHECK(says_of_load("{ node = 'B', y = '-1 kN', at = '1 m' }") ==
          "2:37: error: 'at' does not go with a load on a node, which cases.c.loads[0] is\n");
    CHECK(says_of_load("{ self_weight = 1, member = 'AB' }") ==
          "2:29: error: 'member' does not go with self_weight, which cases.c.loads[0] is\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN', at = '1 m', between = ['0 m', '1 m'] }") ==
          "2:52: error: 'between' does not go with a point load, which cases.c.loads[0] is\n");
    CHECK(says_of_load("{ membr = 'AB', y = '-1 kN/m' }") ==
          "2:12: error: unknown key 'membr' in cases.c.loads[0]; did you mean 'member'?\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN', att = '1 m' }") ==
          "2:40: error: unknown key 'att' in cases.c.loads[0]; did you mean 'at'?\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN' }") ==
          "2:27: error: cases.c.loads[0].y does not fit: expected a force per length, got a force\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 lb/ft' }") ==
          "2:27: error: cases.c.loads[0].y does not fit: expected a force per length, got a mass per length: did you "
          "mean lbf "
          "instead of lb?\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN/m', at = '1 m' }") ==
          "2:27: error: cases.c.loads[0].y does not fit: expected a force, got a force per length\n");
    CHECK(says_of_load("{ support = 'A', y = '-1 kN' }") ==
          "2:27: error: cases.c.loads[0].y does not fit: expected a length, got a force\n");
    CHECK(says_of_load("{ member = 'AB', y = -1 }") == "2:27: error: cases.c.loads[0].y has no unit: write a force per "
                                                       "length, as in \"-1 kN/m\", or name the units of bare "
                                                       "numbers in [units]\n");
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN', at = '-1 m' }") ==
          "2:40: error: cases.c.loads[0].at must not be negative\n");
    CHECK(says_of_load("{ member = 'AB', x = '1 kN/m', across = '1 kN/m' }") ==
          "2:41: error: cases.c.loads[0] mixes x of the global axes with across of the member's: write two loads\n");
    CHECK(says_of_load("{ member = 'AB', across = '1 kN/m', per = 'plan' }") ==
          "2:46: error: cases.c.loads[0] is per plan length along the member's axes: use x or y\n");
    CHECK(says_of_load("{ member = 'AB', temperature = { top = '1 K' } }") ==
          "2:27: error: cases.c.loads[0].temperature lacks 'bottom': give both faces\n");
    CHECK(says_of_load("{ member = 'AB', y = ['-1 kN/m'] }") ==
          "2:27: error: cases.c.loads[0].y takes a force per length, like \"12 kN/m\", or an array of two, each a "
          "force per "
          "length, like \"12 kN/m\": 1 value is given\n");
    CHECK(says_of_load("{ members = [], y = '-1 kN/m' }") ==
          "2:12: error: cases.c.loads[0] lists no members: name at least one\n");
    CHECK(says_of_load("{ members = ['AB', 'AB'], y = '-1 kN/m' }") ==
          "2:12: error: cases.c.loads[0] lists member AB twice: once is enough, its load is given for each\n");
    CHECK(says_of_load("{ members = ['AB', 'XB', 3], y = '-1 kN/m' }") ==
          "2:29: error: cases.c.loads[0].members: there is no member 'XB'; the nearest name is 'AB'\n"
          "2:35: error: cases.c.loads[0].members takes names in quotation marks\n");
    CHECK(says_of_load("{ node = 'D', y = '1 kN' }") ==
          "2:12: error: cases.c.loads[0].node: there is no node 'D'; the nearest name is 'A'\n");
    CHECK(says_of_load("{ support = 'B', y = '1 mm' }") ==
          "2:12: error: cases.c.loads[0].support: there is no support 'B'; the nearest name is 'A'\n");
    CHECK(says_of_load("{ beam = 'floor', y = '1 kN/m' }") ==
          "2:12: error: cases.c.loads[0].beam: there is no beam 'floor'\n");
    CHECK(says_of_load("'AB'") ==
          "2:10: error: cases.c.loads[0] takes a table, like { member = \"AB\", y = \"-12 kN/m\" }\n");
    // Found by the checks of the finished model, at the entry.
    CHECK(says_of_load("{ member = 'AB', y = '-1 kN', at = '7 m' }") == test::Contains{"2:10: error: "});
    CHECK(says_of_load("{ support = 'C', x = '1 mm' }") == test::Contains{"2:10: error: "});
}

TEST_CASE("cases that are refused") {
    CHECK(says("cases", "[cases.c]\naction = 'wind'\n") == "1:8: error: cases.c lacks 'loads', a list of what acts\n");
    CHECK(says("cases", "[cases.c]\naction = 'wnd'\nloads = []\n") == test::Contains{"the nearest word is \"wind\""});
    CHECK(says("cases", "[cases.c]\nwith = 'd'\nloads = [{ self_weight = 1 }]\n") ==
          "2:1: error: cases.c.with: there is no case 'd'; the nearest name is 'c'\n");
    CHECK(says("cases", "[cases.c]\nloads = 5\n") ==
          "2:1: error: cases.c.loads takes an array of tables: a number is given\n");
    CHECK(says("cases", "[cases.c]\nloads = [{ self_weight = inf }]\n") ==
          "2:12: error: cases.c.loads[0].self_weight takes a number, or a fraction like \"1/360\" or \"50 %\": inf is "
          "given\n");
}

TEST_CASE("combinations") {
    const Model model =
        test::read("cases", "[cases.z]\nloads = [{ self_weight = 1 }]\n[cases.a]\nloads = [{ self_weight = 1 }]\n"
                            "[combinations.uls]\nfactors = { z = 1.35, a = -1.5 }\n[combinations.sls]\nlimit = "
                            "'service'\nfactors = { a = 1 }\n");
    REQUIRE(model.combinations.size() == 2);
    const groundsill::Combination& uls = model.combinations.at(0);
    CHECK(uls.name == "uls");
    CHECK(uls.limit == groundsill::LimitState::strength);
    REQUIRE(uls.terms.size() == 2);
    CHECK(uls.terms.at(0).load_case == 0);
    CHECK(uls.terms.at(0).factor == 1.35);
    CHECK(uls.terms.at(1).load_case == 1);
    CHECK(uls.terms.at(1).factor == -1.5);
    CHECK(model.combinations.at(1).limit == groundsill::LimitState::service);
}

TEST_CASE("combinations that are refused") {
    const auto combination = [](std::string_view keys) {
        return says("combinations", "[combinations.uls]\n" + std::string(keys));
    };
    CHECK(combination("limit = 'service'") ==
          "1:15: error: combinations.uls lacks 'factors', like factors = { dead = 1.35 }\n");
    CHECK(combination("factors = { deed = 1.35 }") ==
          "2:13: error: combinations.uls.factors: there is no case 'deed'; the nearest name is 'dead'\n");
    CHECK(combination("factors = { dead = '1.35' }") ==
          "2:13: error: combinations.uls.factors.dead takes a number: write it without quotation marks\n");
    CHECK(combination("factor = { dead = 1.35 }") ==
          "2:1: error: unknown key 'factor' in combinations.uls; did you mean 'factors'?\n");
    CHECK(combination("factors = {}") == test::Contains{"1:15: error: combination uls has no cases"});
    CHECK(combination("factors = { dead = 1 }\nlimit = 'serviceability'") ==
          test::Contains{"the nearest word is \"service\""});
}
