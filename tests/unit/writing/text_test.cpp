// What is printed for people: snapshots whose numbers come from hand calculation.

#include <doctest/doctest.h>

#include <algorithm>
#include <string>

#include "groundsill/groundsill.hpp"
#include "simple_beam.hpp"
#include "writing/starters.hpp"

using namespace groundsill;

namespace {

std::string summary_of(const Model& model, bool colour = false) {
    const Outcome outcome = analyse(model);
    REQUIRE_MESSAGE(outcome.analysis, outcome.refusals.front().message);
    return summary_text(*outcome.analysis, colour);
}

std::string until(const std::string& text, const std::string& mark) { return text.substr(0, text.find(mark)); }

const std::string portal = R"(
title = "Portal"
[materials.steel]
E = "200 GPa"
G = "80 GPa"
density = "7850 kg/m3"
expansion = "12e-6 /K"
[sections.leg]
A = "53.8 cm2"
I = "8356 cm4"
shear_area = "25.68 cm2"
[sections.rafter]
shape = "rectangle"
width = "0.2 m"
depth = "0.4 m"
[nodes]
A = ["0 m", "0 m"]
B = ["0 m", "4 m"]
C = ["8 m", "4 m"]
D = ["8 m", "0 m"]
[members.AB]
from = "A"
to = "B"
section = "leg"
material = "steel"
stiffness_factor = 0.5
[beams.top]
nodes = ["B", "C"]
section = "rafter"
material = "steel"
hinges = ["2 m"]
[members.CD]
from = "C"
to = "D"
section = "leg"
material = "steel"
releases = { end = { moment = "40 MN m/rad" } }
[supports]
A = "fixed"
D = { y = "25 MN/m", angle = "30 deg" }
[cases.all]
action = "imposed"
category = "B"
loads = [
  { self_weight = 1.0 },
  { member = "top.1", y = "-3 kN/m", per = "plan" },
  { member = "AB", across = ["-2 kN/m", "-4 kN/m"], between = ["1 m", "3 m"] },
  { member = "top.1", y = "-40 kN", at = "3 m" },
  { member = "top.1", temperature = { top = "30 K", bottom = "10 K" } },
  { member = "CD", lack_of_fit = "2 mm" },
  { node = "B", x = "10 kN", moment = "5 kN m" },
  { support = "D", y = "-15 mm" },
]
[combinations.usual]
factors = { all = 1.25 }
limit = "service"
)";

bool holds(const std::string& text, const std::string& part) { return text.find(part) != std::string::npos; }

} // namespace

TEST_SUITE("summary") {
    // 1.5 x 96 kN m, 1.5 x 48 kN; movements of the service combination alone: 10 mm and 4 mrad
    TEST_CASE("a simply supported beam") {
        const std::string text = summary_of(test::combined_beam());
        CHECK(until(text, "\nVerified") == R"(Hand-checked beam
2 nodes, 1 member, 2 supports; 1 case, 2 combinations; linear elastic, small movements.

Largest over 2 combinations; movements over 1 for service
  moment, sagging         144.0  kN m  AB at 4.000 m  in uls
  moment, hogging          none
  shear, most             72.00  kN    AB at 0 m      in uls
  shear, least           -72.00  kN    AB at 8.000 m  in uls
  axial, tension           none
  axial, compression       none
  movement up              none
  movement down          -10.00  mm    AB at 4.000 m  in sls
  movement to the right    none
  movement to the left     none
  rotation of a node      4.000  mrad  node B         in sls
  reaction up             72.00  kN    node A         in uls
  reaction down            none
  reaction sideways        none
  reaction moment          none

Reactions, kN and kN m
  node  x least  x most  y least  y most  moment least  moment most
  A           0       0    48.00   72.00             0            0
  B           0       0    48.00   72.00             0            0
)");
        for (const char* caution : {"confirm ground and structure as built", "local codes govern", "licensed engineer",
                                    "Not checked:", "lateral-torsional", "connections", "cracking"}) {
            CHECK(holds(text, caution));
        }
        CHECK(std::count(text.begin(), text.end(), '\n') <= 40);
        CHECK_FALSE(holds(text, "\x1b"));
        CHECK(holds(summary_of(test::combined_beam(), true), "\x1b[1mHand-checked beam\x1b[0m"));
    }

    // w = 12 kN/m = 12 kN/m / (4.4482216152605 kN / 0.3048 m) = 0.822258 kip/ft, L = 26.246719 ft:
    // M = wL²/8 = 70.81 kip ft, V = wL/2 = 10.79 kip, δ = 10 mm = 0.3937 in
    TEST_CASE("in US units") {
        Model model = test::simple_beam();
        model.display = DisplayUnits::us;
        const std::string text = summary_of(model);
        CHECK(holds(text, "70.81  kip ft  AB at 13.12 ft"));
        CHECK(holds(text, "10.79  kip "));
        CHECK(holds(text, "-0.3937  in "));
        CHECK(holds(text, "Reactions, kip and kip ft"));
    }

    TEST_CASE("round-off is printed as none and 0") {
        const std::string text = summary_of(test::settling_beam());
        CHECK(holds(text, "moment, sagging          none"));
        CHECK(holds(text, "reaction up              none"));
        CHECK(holds(text, "-12.30  mm    node B"));
        CHECK(holds(text, "  A     0  0       0\n"));
    }

    // A row of 29 spans on 30 supports, of which the table shows the first.
    TEST_CASE("large models: the reaction table is cut and says so") {
        std::string toml =
            "[units]\nlength = \"m\"\nforce = \"N\"\n[materials.m]\nE = 1e9\n[sections.s]\nA = 1\nI = 1\n"
            "[beams.row]\nsection = \"s\"\nmaterial = \"m\"\nnodes = [\"N0\"";
        std::string spans, supports;
        for (int k = 1; k < 30; ++k) {
            toml += ", \"N" + std::to_string(k) + "\"";
            spans += k == 1 ? "3" : ", 3";
            supports += "N" + std::to_string(k) + " = \"roller\"\n";
        }
        toml += "]\nspans = [" + spans + "]\n[supports]\nN0 = \"pinned\"\n" + supports +
                "[cases.dead]\nloads = [{ beam = \"row\", y = -1000 }]\n";
        const Model model = test::model_of(toml);
        const std::string text = summary_of(model);
        CHECK(holds(text, "… and 22 more: see the JSON or CSV output"));
        CHECK(std::count(text.begin(), text.end(), '\n') <= 40);
    }

    TEST_CASE("names of the model cannot steer the terminal, and long ones are cut") {
        Model model = test::simple_beam();
        model.title = "red \x1b[31m";
        model.members[0].name = "a member with a name longer than any table can bear";
        const std::string text = summary_of(model);
        CHECK_FALSE(holds(text, "\x1b"));
        CHECK(holds(text, "a member with a nam… at 4.000 m"));
    }
}

TEST_SUITE("sketch") {
    TEST_CASE("a portal with a hinge, a spring and a turned support") {
        const Model model = test::model_of(portal);
        CHECK(sketch_text(model) == R"(Portal

      B                                                                  C
      o----------------*-------------------------------------------------o
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  |
      |                                                                  *
      F                                                                  S
      A                                                                  D

  o node   P held in x and y   R held in x or y   F fixed   H held otherwise
  S on a spring   * hinge or rotational spring in a member

Materials (1)
  steel  E 200000 MPa  G 80000 MPa  density 7850 kg/m3  expansion 1.2e-05 1/K

Sections (2)
  leg     properties               A 53.8 cm2  I 8356 cm4                  shear area 25.68 cm2
  rafter  rectangle 0.2 m x 0.4 m  A 800 cm2   I 106667 cm4  depth 400 mm  rigid in shear

Nodes (4)
  A  x 0 m  y 0 m
  B  x 0 m  y 4 m
  C  x 8 m  y 4 m
  D  x 8 m  y 0 m

Members (3)
  AB     A to B  4 m  leg, steel; stiffness times 0.5
  top.1  B to C  8 m  rafter, steel; hinge at 2 m
  CD     C to D  4 m  leg, steel; end: moment 40000 kN m/rad

Supports (2)
  A  x fixed  y fixed       rotation fixed
  D  x free   y 25000 kN/m  rotation free   turned by 30 deg

Cases (1)
  all (imposed, category B)
    every member: self-weight times 1
    member top.1: y -3 kN/m per plan length, whole length
    member AB: across -2 kN/m to -4 kN/m, from 1 m to 3 m
    member top.1: y -40 kN at 3 m
    member top.1: warmer by 30 K at the top, 10 K at the bottom
    member CD: made too long by 2 mm
    node B: x 10 kN, moment 5 kN m
    support D moves: y -15 mm

Combinations (1)
  usual  service  1.25 all
)");
    }

    TEST_CASE("any geometry fits 78 columns and 20 lines") {
        for (const double height : {0.0, 0.01, 4.0, 400.0}) {
            for (const double span : {0.0, 0.01, 6.0, 6000.0}) {
                if (height == 0 && span == 0) continue;
                Model model = test::simple_beam();
                model.nodes[1].x = span;
                model.nodes[1].y = height;
                const std::string text = until(sketch_text(model), "\n  o node");
                CAPTURE(text);
                CHECK(std::count(text.begin(), text.end(), '\n') <= 2 + 20);
                std::size_t longest = 0;
                for (std::size_t from = 0; from < text.size(); from = text.find('\n', from) + 1) {
                    longest = std::max(longest, text.find('\n', from) - from);
                }
                CHECK(longest <= 78);
            }
        }
    }

    TEST_CASE("long lists are cut") {
        Model model = test::simple_beam();
        model.nodes.resize(100);
        const std::string text = sketch_text(model);
        CHECK(holds(text, "Nodes (100)"));
        CHECK(holds(text, "… and 85 more"));
    }
}

TEST_SUITE("starter models") {
    TEST_CASE("each reads without a word and can be analysed") {
        for (const char* kind : {"beam", "portal", "grade-beam"}) {
            CAPTURE(kind);
            const auto text = starter_model(kind);
            REQUIRE(text);
            const ReadResult read = read_model(*text);
            const std::string said = describe(read.diagnostics, kind, *text, false);
            CAPTURE(said);
            CHECK(read.diagnostics.empty());
            REQUIRE(read.model);
            const Outcome outcome = analyse(*read.model);
            REQUIRE_MESSAGE(outcome.analysis, outcome.refusals.front().message);
            CHECK(outcome.analysis->warnings.empty());
            CHECK(outcome.analysis->verification.equilibrium < 1e-12);
            CHECK(outcome.analysis->strength);
            CHECK(outcome.analysis->service);
        }
    }

    TEST_CASE("other kinds do not exist") {
        CHECK_FALSE(starter_model("bridge"));
        CHECK_FALSE(starter_model(""));
    }
}
