// The largest values of a run. Closed forms: any text on the strength of materials (from memory).

#include <doctest/doctest.h>

#include <cmath>
#include <utility>
#include <vector>

#include "../writing/simple_beam.hpp"
#include "analysis/extremes.hpp"
#include "groundsill/groundsill.hpp"

using namespace groundsill;

namespace {

/// Two humps of the given heights, one behind the other, each 1 m long.
Diagram humps(double first, double second) {
    Diagram diagram;
    diagram.length = 2;
    diagram.pieces.resize(2);
    diagram.pieces[0].to = diagram.pieces[1].from = 1;
    diagram.pieces[1].to = 2;
    diagram.pieces[0].M = {0, 4 * first, -4 * first, 0};
    diagram.pieces[1].M = {0, 4 * second, -4 * second, 0};
    return diagram;
}

Analysis analysed(const Model& model) {
    const Outcome outcome = analyse(model);
    REQUIRE_MESSAGE(outcome.analysis, outcome.refusals.front().message);
    return *outcome.analysis;
}

} // namespace

TEST_SUITE("extremes") {
    TEST_CASE("of two peaks that differ by rounding alone the first place is named") {
        const DiagramRange range = member_range(humps(100, 100 * (1 + 1e-15)), Curve::M, {});
        CHECK(range.max.at == doctest::Approx(0.5));
        CHECK(range.min.at == 0);
    }

    TEST_CASE("a difference above rounding counts") {
        CHECK(member_range(humps(100, 100.0001), Curve::M, {}).max.at == doctest::Approx(1.5));
    }

    TEST_CASE("movements inside members are found: both ends fixed, δ = wL⁴/384EI = 2 mm at the middle") {
        Model model = test::simple_beam();
        for (Support& support : model.supports) support.x = support.y = support.rotation = Restraint{};
        const Peaks peaks = find_peaks(analysed(model));
        CHECK(peaks.y.least.value == doctest::Approx(-0.002).epsilon(1e-12));
        CHECK(peaks.y.least.member == 0);
        CHECK(peaks.y.least.at == doctest::Approx(4));
        CHECK(peaks.y.most.value == 0);
        CHECK(peaks.y.most.node == 0);
        CHECK(peaks.M.least.value == doctest::Approx(-64e3).epsilon(1e-12)); // wL²/12
        CHECK(peaks.M.least.at == 0);                                        // not 8 m, where it is the same
    }

    // The simple beam stood upright, its load from the left: the axes of the member are turned against the global ones.
    TEST_CASE("movements are global: an upright member bends along x") {
        Model model = test::simple_beam();
        model.nodes[1].x = 0;
        model.nodes[1].y = 8;
        std::swap(model.supports[1].x, model.supports[1].y);
        MemberLoad& load = model.cases[0].member_loads[0];
        load.first_a = load.first_b = 12e3;
        load.second_a = load.second_b = 0;
        const Peaks peaks = find_peaks(analysed(model));
        CHECK(peaks.x.most.value == doctest::Approx(0.010).epsilon(1e-12));
        CHECK(peaks.x.most.member == 0);
        CHECK(peaks.x.most.at == doctest::Approx(4));
        CHECK(std::abs(peaks.y.most.value) <= peaks.rounding.movement);
        CHECK(std::abs(peaks.y.least.value) <= peaks.rounding.movement);
    }

    // Statically determinate: a settlement turns the beam and leaves it without force.
    TEST_CASE("where nothing but rounding flows, everything counts as rounding") {
        const Model model = test::settling_beam();
        const Analysis analysis = analysed(model);
        const Peaks peaks = find_peaks(analysis);
        CHECK(peaks.y.least.value == doctest::Approx(-0.0123));
        for (const Peak& peak : {peaks.N.most, peaks.N.least, peaks.V.most, peaks.V.least}) {
            CHECK(std::abs(peak.value) <= peaks.rounding.force);
        }
        const DiagramRange axial =
            member_range(case_diagram(analysis, 0, 0), Curve::N, round_off(analysis, analysis.cases[0]));
        CHECK(axial.max.at == 0);
        CHECK(axial.min.at == 0);
    }

    TEST_CASE("forces over all combinations, movements over those for service") {
        const Model model = test::combined_beam();
        const Analysis analysis = analysed(model);
        const Peaks peaks = find_peaks(analysis);
        CHECK(peaks.M.most.value == doctest::Approx(144e3).epsilon(1e-12));
        CHECK(governing_name(analysis, peaks.M.most.response) == "uls");
        CHECK(peaks.y.least.value == doctest::Approx(-0.010).epsilon(1e-12));
        CHECK(governing_name(analysis, peaks.y.least.response) == "sls");
        CHECK(movement_responses(analysis) == std::vector<int>{1});
    }

    TEST_CASE("reactions over the combinations") {
        const Model model = test::combined_beam();
        const Analysis analysis = analysed(model);
        const ReactionRange range = reaction_range(analysis, 0);
        CHECK(range.y.least == doctest::Approx(48e3).epsilon(1e-12));
        CHECK(range.y.most == doctest::Approx(72e3).epsilon(1e-12));
    }
}
