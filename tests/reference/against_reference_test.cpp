// The program against the reference solution in 113 bits on random frames: every node movement, reaction and listed
// place of every member. Long double would do: it differs from 113 bits by less than 1e-15 on these frames.

#include "frame_text.hpp"
#include "number.hpp"
#include "random_frames.hpp"
#include "results.hpp"

#include <algorithm>
#include <cmath>
#include <doctest/doctest.h>
#include <fmt/format.h>

using namespace reference;

namespace {

constexpr double tolerance =
    1e-9; // of the largest of its kind; inputs carry 1e-16 and these frames are well-conditioned

void compare(std::uint64_t seed) {
    const Frame frame = random_frame(seed);
    const Reference<Quad> solution(frame);
    const test::Result result = test::run(model_text(frame));
    for (int load_case = 0; load_case < static_cast<int>(frame.cases.size()); ++load_case) {
        const std::string name = frame.cases[static_cast<std::size_t>(load_case)].name;
        const ResponseValues got = program_response(result, "cases/" + name, frame);
        const ResponseValues expected = reference_response(solution, load_case, frame, got);
        for (int node = 0; node < static_cast<int>(frame.nodes.size()); ++node)
            CHECK(solution.has_rotation(node) ==
                  result.has(fmt::format("/cases/{}/displacements/{}/rotation", name,
                                         frame.nodes[static_cast<std::size_t>(node)].name)));
        const Difference worst = difference(expected, got, frame);
        CHECK_MESSAGE(worst.relative < tolerance,
                      fmt::format("seed {} case {}: {:.2g}, {}", seed, name, worst.relative, worst.where));
    }
}

/// The listed extremes stand where the program says, and nothing along the member goes beyond them.
void compare_extremes(std::uint64_t seed) {
    const Frame frame = random_frame(seed);
    const Reference<Quad> solution(frame);
    const test::Result result = test::run(model_text(frame), 0);
    for (int member = 0; member < static_cast<int>(frame.members.size()); ++member)
        for (const char* quantity : {"N", "V", "M", "across"}) {
            const std::string kind = quantity;
            const auto value = [&](double at, bool after) {
                const Place<Quad> place = solution.place(0, member, at, after);
                return static_cast<double>(kind == "N"   ? place.N
                                           : kind == "V" ? place.V
                                           : kind == "M" ? place.M
                                                         : place.across);
            };
            const std::string path = fmt::format("/cases/forces/members/{}/extremes/{}/",
                                                 frame.members[static_cast<std::size_t>(member)].name, kind);
            const double most = result(path + "max/value"), least = result(path + "min/value");
            const double at_most = result(path + "max/at"), at_least = result(path + "min/at");
            const double scale = 1e-9 * std::max({std::fabs(most), std::fabs(least), kind == "across" ? 1e-4 : 1e4});
            const auto near = [&](double at, double expected) {
                return std::min(std::fabs(value(at, false) - expected), std::fabs(value(at, true) - expected)) < scale;
            };
            INFO("seed ", seed, " ", path);
            CHECK(near(at_most, most));
            CHECK(near(at_least, least));
            const double length = member_length(frame, member);
            for (int i = 0; i <= 40; ++i)
                for (const bool after : {false, true}) {
                    const double here = value(length * i / 40, after);
                    REQUIRE(here < most + scale);
                    REQUIRE(here > least - scale);
                }
        }
}

} // namespace

TEST_SUITE("quick") {
    TEST_CASE("20 random frames agree with the reference") {
        for (std::uint64_t seed = 1; seed <= 20; ++seed) compare(seed);
    }
}

TEST_SUITE("full") {
    TEST_CASE("200 random frames agree with the reference") {
        for (std::uint64_t seed = 21; seed <= 220; ++seed) compare(seed);
    }

    TEST_CASE("extremes of 60 random frames stand where they are said to and bound the diagrams") {
        for (std::uint64_t seed = 1; seed <= 60; ++seed) compare_extremes(seed);
    }
}
