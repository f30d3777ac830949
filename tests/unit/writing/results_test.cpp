// JSON and CSV of models whose answers are known by hand.

#include <doctest/doctest.h>

#include <algorithm>
#include <cmath>
#include <fstream>
#include <iterator>
#include <map>
#include <string>

#include "groundsill/groundsill.hpp"
#include "run_model.hpp"
#include "simple_beam.hpp"

using namespace groundsill;

namespace {

std::string json_of(const Analysis& analysis, int places) {
    std::string text;
    write_json(analysis, {places}, [&](std::string_view part) { text += part; });
    return text;
}

std::map<std::string, std::string> csv_of(const Analysis& analysis, int places) {
    std::map<std::string, std::string> files;
    for (const CsvFile& file : csv_files(analysis, {places})) {
        file.write([&](std::string_view part) { files[file.name] += part; });
    }
    return files;
}

std::ptrdiff_t lines(const std::string& text) { return std::count(text.begin(), text.end(), '\n'); }

/// An answer written down by hand: what the writers show of it needs no engine.
Analysis hand_made(const Model& model) {
    Analysis analysis;
    analysis.model = &model;
    Response response;
    response.movements = {{0, -0.0, -0.004}, {0, 0, std::nullopt}};
    response.reactions = {{0, 48000, 0}, {0, 48000.5, 0}};
    analysis.cases = {response};
    return analysis;
}

} // namespace

TEST_SUITE("results in JSON") {
    TEST_CASE("a case: values by hand, parts that nobody asked for absent") {
        const Model model = test::simple_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        const test::Result result(json_of(*outcome.analysis, 4));
        CHECK(result.text("/program") == "groundsill");
        CHECK(result.text("/title") == "Hand-checked beam");
        CHECK(result.text("/units") == "SI");
        CHECK(result.has("/version"));
        CHECK(result("/cases/dead/reactions/A/y") == doctest::Approx(48e3).epsilon(1e-12));
        CHECK(result("/cases/dead/displacements/A/rotation") == doctest::Approx(-0.004).epsilon(1e-12));
        CHECK(result("/cases/dead/members/AB/length") == 8);
        CHECK(result.size("/cases/dead/members/AB/places") == 5);
        CHECK(result("/cases/dead/members/AB/extremes/M/max/value") == doctest::Approx(96e3).epsilon(1e-12));
        CHECK(result("/cases/dead/members/AB/extremes/M/max/at") == doctest::Approx(4).epsilon(1e-12));
        CHECK(result("/cases/dead/members/AB/extremes/across/min/value") == doctest::Approx(-0.01).epsilon(1e-12));
        CHECK(result("/cases/dead/members/AB/extremes/M/min/at") == 0); // 0 at both ends: the smaller place
        CHECK(result("/diagnostics/equilibrium") < 1e-15);
        CHECK(result.size("/diagnostics/warnings") == 0);
        CHECK_FALSE(result.has("/combinations"));
        CHECK_FALSE(result.has("/envelopes"));
    }

    TEST_CASE("without places only the extremes are written") {
        const Model model = test::simple_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        const test::Result result(json_of(*outcome.analysis, 0));
        CHECK_FALSE(result.has("/cases/dead/members/AB/places"));
        CHECK(result("/cases/dead/members/AB/extremes/V/max/value") == doctest::Approx(48e3).epsilon(1e-12));
    }

    TEST_CASE("combinations with limit and factors, envelopes by limit state with what acts together") {
        const Model model = test::combined_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        const test::Result result(json_of(*outcome.analysis, 4));
        CHECK(result.text("/combinations/uls/limit") == "strength");
        CHECK(result.text("/combinations/sls/limit") == "service");
        CHECK(result("/combinations/uls/factors/dead") == 1.5);
        CHECK_FALSE(result.has("/combinations/uls/clause"));
        CHECK(result("/combinations/uls/members/AB/extremes/M/max/value") == doctest::Approx(144e3).epsilon(1e-12));
        CHECK(result("/envelopes/strength/members/AB/V/most/value") == doctest::Approx(72e3).epsilon(1e-12));
        CHECK(result.text("/envelopes/strength/members/AB/V/most/combination") == "uls");
        CHECK(std::abs(result("/envelopes/strength/members/AB/V/most/with/M")) < 1e-6);
        CHECK(result("/envelopes/service/reactions/B/y/most/with/y") == doctest::Approx(48e3).epsilon(1e-12));
    }

    TEST_CASE("a node without rotation has no rotation; names are escaped; no title, no key") {
        Model model = test::simple_beam();
        model.title.clear();
        model.nodes[1].name = "B \"pier\"\n";
        model.members.clear();
        Analysis analysis = hand_made(model);
        analysis.internals = analyse(test::simple_beam()).analysis->internals;
        const std::string text = json_of(analysis, 0);
        CHECK(text.find(R"("A": {"x": 0, "y": 0, "rotation": -0.004})") != std::string::npos);
        CHECK(text.find(R"("B \"pier\"\n": {"x": 0, "y": 0})") != std::string::npos);
        CHECK(text.find("title") == std::string::npos);
        CHECK(text.find("-0,") == std::string::npos);
    }
}

TEST_SUITE("results in CSV") {
    TEST_CASE("reactions and displacements to the letter") {
        Model model = test::simple_beam();
        model.nodes[1].name = "B, \"pier\"";
        const Analysis analysis = hand_made(model);
        std::map<std::string, std::string> files;
        for (const CsvFile& file : csv_files(analysis, {0})) {
            if (file.name == "extremes.csv") continue; // needs diagrams
            file.write([&](std::string_view part) { files[file.name] += part; });
        }
        CHECK(files.size() == 2);
        CHECK(files["reactions.csv"] == "case or combination,kind,node,x [N],y [N],moment [N m]\n"
                                        "dead,case,A,0,48000,0\n"
                                        "dead,case,\"B, \"\"pier\"\"\",0,48000.5,0\n");
        CHECK(files["displacements.csv"] == "case or combination,kind,node,x [m],y [m],rotation [rad]\n"
                                            "dead,case,A,0,0,-0.004\n"
                                            "dead,case,\"B, \"\"pier\"\"\",0,0,\n");
    }

    TEST_CASE("the other files: columns, and one row a place, a member or a governing value") {
        const Model model = test::combined_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        std::map<std::string, std::string> files = csv_of(*outcome.analysis, 4);
        CHECK(files.size() == 5);
        CHECK(files["members.csv"].starts_with(
            "case or combination,kind,member,at [m],N [N],V [N],M [N m],along [m],across [m]\n"
            "dead,case,AB,0,"));
        CHECK(lines(files["members.csv"]) == 1 + 3 * 5); // a case, two combinations; five places
        CHECK(files["extremes.csv"].starts_with("case or combination,kind,member,N max [N],N max at [m],"));
        CHECK(lines(files["extremes.csv"]) == 1 + 3);
        CHECK(files["envelopes.csv"].starts_with(
            "combination,limit,node,member,quantity,extreme,at [m],N [N],V [N],M [N m],x [N],y [N],moment [N m]\n"
            "uls,strength,A,,x,least,,,,,"));
        CHECK(lines(files["envelopes.csv"]) == 1 + 2 * 2 * (2 * 3 + 3)); // limits, senses, (supports and member) x 3
        for (const auto& [name, text] : files) {
            CAPTURE(name);
            const std::string header = text.substr(0, text.find('\n'));
            const auto commas = std::count(header.begin(), header.end(), ',');
            CHECK(std::count(text.begin(), text.end(), ',') == commas * lines(text)); // no name here needs quoting
        }
    }

    TEST_CASE("docs/results.md names each file and its columns") {
        std::ifstream file(GROUNDSILL_SOURCE_DIR "/docs/results.md");
        REQUIRE(file);
        const std::string manual{std::istreambuf_iterator<char>(file), {}};
        const Model model = test::combined_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        for (const auto& [name, text] : csv_of(*outcome.analysis, 4)) {
            CAPTURE(name);
            CHECK(manual.find("`" + name + "`") != std::string::npos);
            CHECK(manual.find("\n" + text.substr(0, text.find('\n') + 1)) != std::string::npos);
        }
    }

    TEST_CASE("files that do not exist: members without places, envelopes without combinations") {
        const Model model = test::simple_beam();
        const Outcome outcome = analyse(model);
        REQUIRE(outcome.analysis);
        const std::map<std::string, std::string> files = csv_of(*outcome.analysis, 0);
        CHECK(files.size() == 3);
        CHECK_FALSE(files.contains("members.csv"));
        CHECK_FALSE(files.contains("envelopes.csv"));
    }
}
