// Continuous beams with equal spans. Sources: register.cpp, Group::continuous. Each is one run of `beams`.

#include <cmath>

#include <doctest/doctest.h>
#include <fmt/format.h>

#include "register.hpp"
#include "solved.hpp"

using namespace published;

namespace {

constexpr double L = 5.3;
constexpr double w = 14.2;
constexpr double P = 37;
const double EI = Stiffness{}.EI();

std::string member(std::size_t span) { return fmt::format("run.{}", span); }
std::string node(std::size_t i) { return fmt::format("S{}", i); }

/// A run of `count` spans on simple supports S0, S1 …
Solved run_of_spans(std::size_t count, const std::vector<std::string>& loads) {
    std::vector<std::string> nodes, supports;
    for (std::size_t i = 0; i <= count; ++i) {
        nodes.push_back("\"" + node(i) + "\"");
        supports.push_back(node(i) + " = " + (i == 0 ? pinned : roller));
    }
    const std::string beam =
        fmt::format("[beams.run]\nnodes = [{}]\nspans = [{}]\nsection = \"bar\"\nmaterial = \"m\"\n",
                    fmt::join(nodes, ", "), fmt::join(std::vector<double>(count, L), ", "));
    return Solved(header({}) + beam + fmt::format("[supports]\n{}\n", fmt::join(supports, "\n")) + load_case(loads));
}

/// Loads on the given spans, counted from 1.
std::vector<std::string> uniform_on(const std::vector<std::size_t>& spans) {
    std::vector<std::string> loads;
    for (const std::size_t span : spans) loads.push_back(uniform(member(span), w));
    return loads;
}

/// Uniform load on all spans: support moments (in w L2, ends left out) and reactions (in w L) of the table; moments and
/// deflections of the spans follow from them by statics.
void check_all_loaded(const Row& row, const std::vector<double>& moments, const std::vector<double>& reactions) {
    const std::size_t count = moments.size() + 1;
    const Solved s = run_of_spans(count, {fmt::format("{{ beam = \"run\", y = {} }}", -w)});
    for (std::size_t i = 0; i <= count; ++i) {
        row.check(fmt::format("reaction {}, kN", i + 1), reactions[i] * w * L, s.reaction_y(node(i)));
    }
    for (std::size_t i = 1; i <= count; ++i) {
        const double left = i == 1 ? 0 : moments[i - 2], right = i == count ? 0 : moments[i - 1];
        if (i < count) row.check(fmt::format("M over support {}, kN m", i + 1), right * w * L * L, s.M(member(i), L));
        const double place = 0.5 + right - left; // of zero shear, in L
        row.check(fmt::format("largest M of span {}, kN m", i), (left + place * place / 2) * w * L * L,
                  s.most(member(i), "M").value);
        row.check(fmt::format("its place in span {}, m", i), place * L, s.most(member(i), "M").at);
        row.check(fmt::format("midspan deflection of span {}, m", i),
                  -(5.0 / 384 + (left + right) / 16) * w * std::pow(L, 4) / EI, s.across(member(i), L / 2));
    }
}

} // namespace

TEST_CASE("two equal spans, uniform load") {
    check_all_loaded(Row(Group::continuous, "2 spans, w on all"), {-1.0 / 8}, {3.0 / 8, 5.0 / 4, 3.0 / 8});
}

TEST_CASE("three equal spans, uniform load") {
    check_all_loaded(Row(Group::continuous, "3 spans, w on all"), {-0.1, -0.1}, {0.4, 1.1, 1.1, 0.4});
}

TEST_CASE("four equal spans, uniform load") {
    check_all_loaded(Row(Group::continuous, "4 spans, w on all"), {-3.0 / 28, -1.0 / 14, -3.0 / 28},
                     {11.0 / 28, 8.0 / 7, 13.0 / 14, 8.0 / 7, 11.0 / 28});
}

TEST_CASE("five equal spans, uniform load") {
    check_all_loaded(Row(Group::continuous, "5 spans, w on all"), {-2.0 / 19, -3.0 / 38, -3.0 / 38, -2.0 / 19},
                     {15.0 / 38, 43.0 / 38, 37.0 / 38, 37.0 / 38, 43.0 / 38, 15.0 / 38});
}

TEST_CASE("equal spans, printed coefficients of span moments and deflections") {
    const Row row(Group::continuous, "w on all, printed coefficients");
    const double wL2 = w * L * L, wL4 = w * std::pow(L, 4) / EI;
    const Solved four = run_of_spans(4, uniform_on({1, 2, 3, 4}));
    row.check("4 spans: M of span 1 / (w L^2)", 0.077168, four.most("run.1", "M").value / wL2, printed(1e-6));
    row.check("4 spans: M of span 2 / (w L^2)", 0.036352, four.most("run.2", "M").value / wL2, printed(1e-6));
    row.check("4 spans: place in span 2 / L", 0.5357, four.most("run.2", "M").at / L, printed(1e-4));
    row.check("4 spans: deflection of span 1 / (w L^4 / E I)", 0.0063244, -four.across("run.1", L / 2) / wL4,
              printed(1e-7));
    const Solved five = run_of_spans(5, uniform_on({1, 2, 3, 4, 5}));
    row.check("5 spans: M of span 1 / (w L^2)", 0.077909, five.most("run.1", "M").value / wL2, printed(1e-6));
    row.check("5 spans: M of span 2 / (w L^2)", 0.033241, five.most("run.2", "M").value / wL2, printed(1e-6));
    row.check("5 spans: M of span 3 / (w L^2)", 0.046053, five.most("run.3", "M").value / wL2, printed(1e-6));
    row.check("5 spans: deflection of span 3 / (w L^4 / E I)", 0.0031524, -five.across("run.3", L / 2) / wL4,
              printed(1e-7));
}

TEST_CASE("two equal spans, point loads at every midspan") {
    const Row row(Group::continuous, "2 spans, P at every midspan");
    const Solved s = run_of_spans(2, {point("run.1", P, L / 2), point("run.2", P, L / 2)});
    row.check("M over the support, kN m", -3 * P * L / 16, s.M("run.1", L));
    row.check("reaction 1, kN", 5 * P / 16, s.reaction_y("S0"));
    row.check("reaction 2, kN", 11 * P / 8, s.reaction_y("S1"));
    row.check("largest M, kN m", 5 * P * L / 32, s.most("run.1", "M").value);
}

TEST_CASE("three equal spans, point loads at every midspan") {
    const Row row(Group::continuous, "3 spans, P at every midspan");
    const Solved s = run_of_spans(3, {point("run.1", P, L / 2), point("run.2", P, L / 2), point("run.3", P, L / 2)});
    row.check("M over support 2, kN m", -3 * P * L / 20, s.M("run.1", L));
    row.check("reaction 1, kN", 7 * P / 20, s.reaction_y("S0"));
    row.check("reaction 2, kN", 23 * P / 20, s.reaction_y("S1"));
    row.check("largest M of span 1, kN m", 0.175 * P * L, s.most("run.1", "M").value);
    row.check("largest M of span 2, kN m", 0.1 * P * L, s.most("run.2", "M").value);
}

TEST_CASE("two equal spans, one loaded") {
    const Row row(Group::continuous, "2 spans, w on span 1");
    const Solved s = run_of_spans(2, uniform_on({1}));
    row.check("largest M, kN m", 49 * w * L * L / 512, s.most("run.1", "M").value);
    row.check("reaction 1, kN", 7 * w * L / 16, s.reaction_y("S0"));
}

TEST_CASE("three equal spans, patterns of load") {
    const Row row(Group::continuous, "3 spans, patterns");
    const Solved outer = run_of_spans(3, uniform_on({1, 3}));
    row.check("spans 1 and 3: largest M, kN m", 81 * w * L * L / 800, outer.most("run.1", "M").value);
    row.check("spans 1 and 3: reaction 1, kN", 9 * w * L / 20, outer.reaction_y("S0"));
    const Solved middle = run_of_spans(3, uniform_on({2}));
    row.check("span 2: largest M, kN m", 3 * w * L * L / 40, middle.most("run.2", "M").value);
    row.check("span 2: reaction 1, kN", -w * L / 20, middle.reaction_y("S0"));
    const Solved left = run_of_spans(3, uniform_on({1, 2}));
    row.check("spans 1 and 2: M over support 2, kN m", -7 * w * L * L / 60, left.M("run.1", L));
    row.check("spans 1 and 2: reaction 2, kN", 6 * w * L / 5, left.reaction_y("S1"));
}
