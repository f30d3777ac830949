// Structures that cannot stand are told by who moves, how, what goes with it and what lets it; soft ones are not
// refused.

#include <doctest/doctest.h>

#include <string>

#include <fmt/format.h>

#include "run_model.hpp"

namespace {

/// A model in metres and kN with a joist section, from its nodes, members and supports.
std::string model(const std::string& nodes, const std::string& members, const std::string& supports,
                  const std::string& loads = "{ self_weight = 1.0 }") {
    return "[units]\nlength = 'm'\nforce = 'kN'\n[materials.steel]\nE = '210 GPa'\ndensity = '7850 kg/m3'\n"
           "[sections.joist]\nA = 0.005\nI = 8e-5\n[nodes]\n" +
           nodes + "[members]\n" + members + "[supports]\n" + supports + "[cases.dead]\nloads = [" + loads + "]\n";
}

std::string member(const std::string& name, const std::string& from, const std::string& to,
                   const std::string& releases = "") {
    return fmt::format("{} = {{ from = '{}', to = '{}', section = 'joist', material = 'steel'{} }}\n", name, from, to,
                       releases.empty() ? "" : ", releases = " + releases);
}

const std::string two_spans = "A = [0, 0]\nB = [6, 0]\nC = [12, 0]\n";

} // namespace

TEST_CASE("a beam that can slide names its nodes, its members and the supports that let it") {
    CHECK(test::refusal(model(two_spans, member("AB", "A", "B") + member("BC", "B", "C"),
                              "A = 'roller'\nB = 'roller'\nC = 'roller'\n")) ==
          "the structure is a mechanism: A, B and C move along x; the members AB and BC go with it. What lets it: the "
          "support at "
          "A leaves x free, the support at B leaves x free and the support at C leaves x free. Hold one of these, or "
          "add a support "
          "or a member.");
}

TEST_CASE("a hinge too many is named with the members that turn") {
    const std::string said =
        test::refusal(model(two_spans, member("AB", "A", "B", "{ end = { moment = 'free' } }") + member("BC", "B", "C"),
                            "A = 'pinned'\nC = 'roller'\n"));
    CHECK(said.find("B moves along y") != std::string::npos);
    CHECK(said.find("the members AB and BC go with it") != std::string::npos);
    CHECK(said.find("AB is released in moment at its end") != std::string::npos);
}

TEST_CASE("a hinge inside a run is named by its place") {
    const std::string said = test::refusal("[materials.steel]\nE = '210 GPa'\n[sections.joist]\nA = '5000 mm2'\nI = "
                                           "'8000 cm4'\n[beams.run]\nnodes = ['A', 'B']\n"
                                           "spans = ['6 m']\nhinges = ['2 m']\nsection = 'joist'\nmaterial = "
                                           "'steel'\n[supports]\nA = 'pinned'\nB = 'roller'\n"
                                           "[cases.dead]\nloads = [{ beam = 'run', y = '-1 kN/m' }]\n");
    CHECK(said.find("the hinge of run.1 at 2 m moves along y") != std::string::npos);
    CHECK(said.find("the hinge of run.1 at 2 m opens") != std::string::npos);
}

TEST_CASE("a member that its own releases set free is named") {
    CHECK(
        test::refusal(model(two_spans,
                            member("AB", "A", "B", "{ start = { axial = 'free' }, end = { axial = 'free' } }") +
                                member("BC", "B", "C"),
                            "A = 'fixed'\nB = 'fixed'\nC = 'fixed'\n")) ==
        "the member AB is a mechanism by itself: axial is free at both ends. Hold one of these releases, or give it a "
        "stiffness.");
}

TEST_CASE("a moment on a node without rotation is a mechanism") {
    const std::string pinned = "{ start = { moment = 'free' }, end = { moment = 'free' } }";
    const std::string said = test::refusal(model("A = [0, 0]\nB = [4, 0]\nC = [0, 3]\n",
                                                 member("AB", "A", "B", pinned) + member("CB", "C", "B", pinned),
                                                 "A = 'pinned'\nC = 'pinned'\n", "{ node = 'B', moment = 2 }"));
    CHECK(said.find("the moment of case dead at node B turns it freely") != std::string::npos);
}

TEST_CASE("two separate mechanisms are told one by one") {
    const std::string said = test::refusal(model("A = [0, 0]\nB = [6, 0]\nC = [0, 9]\nD = [6, 9]\n",
                                                 member("AB", "A", "B") + member("CD", "C", "D"),
                                                 "A = 'roller'\nB = 'roller'\nC = 'roller'\nD = 'roller'\n"));
    CHECK(said.find("A and B move along x; the member AB goes with it") != std::string::npos);
    CHECK(said.find("C and D move along x; the member CD goes with it") != std::string::npos);
}

TEST_CASE("what is soft but stands is not refused") {
    // a spring of 1e-12 of the axial stiffness holds the beam along x
    CHECK(test::refusal(model(two_spans, member("AB", "A", "B") + member("BC", "B", "C"),
                              "A = { x = 1.75e-7, y = 'fixed' }\nB = 'roller'\nC = 'roller'\n")) == "");
}

TEST_CASE("a cantilever in 10,000 parts stands, and its tip moves by PL³/3EI") {
    // E I = 16.8 MN m2, L = 10 m, P = 1 kN at the tip
    std::string nodes, members;
    for (int k = 0; k <= 10000; ++k) nodes += fmt::format("n{} = [{}, 0]\n", k, k / 1000.0);
    for (int k = 0; k < 10000; ++k)
        members += member(fmt::format("m{}", k), fmt::format("n{}", k), fmt::format("n{}", k + 1));
    const test::Result result = test::run(model(nodes, members, "n0 = 'fixed'\n", "{ node = 'n10000', y = -1 }"), 0);
    CHECK(result("/cases/dead/displacements/n10000/y") ==
          doctest::Approx(-1e3 * 1000 / (3 * 210e9 * 8e-5)).epsilon(1e-9));
    CHECK(result("/cases/dead/reactions/n0/moment") == doctest::Approx(1e4).epsilon(1e-9));
}
