#include "solved.hpp"

#include <fmt/format.h>

namespace published {

namespace {

std::string node_name(std::size_t i) { return std::string(1, static_cast<char>('A' + i)); }

} // namespace

double Solved::at_node(std::string_view what, std::string_view node, std::string_view component) const {
    return result_(fmt::format("/cases/load/{}/{}/{}", what, node, component));
}

Extreme Solved::extreme(std::string_view member, std::string_view quantity, std::string_view which) const {
    const std::string pointer = fmt::format("/cases/load/members/{}/extremes/{}/{}", member, quantity, which);
    const double scale = quantity == "across" ? 1 : 1000;
    return {result_(pointer + "/value") / scale, result_(pointer + "/at")};
}

double Solved::N(std::string_view member, double at, bool after) const {
    return result_.place("cases/load", member, "N", at, after) / 1000;
}
double Solved::V(std::string_view member, double at, bool after) const {
    return result_.place("cases/load", member, "V", at, after) / 1000;
}
double Solved::M(std::string_view member, double at, bool after) const {
    return result_.place("cases/load", member, "M", at, after) / 1000;
}
double Solved::across(std::string_view member, double at) const {
    return result_.place("cases/load", member, "across", at);
}
double Solved::along(std::string_view member, double at) const {
    return result_.place("cases/load", member, "along", at);
}
double Solved::length(std::string_view member) const {
    return result_(fmt::format("/cases/load/members/{}/length", member));
}

std::string header(const Stiffness& s) {
    const std::string shear = s.shear_area > 0 ? fmt::format("shear_area = {}\n", s.shear_area) : "";
    return fmt::format("[units]\nlength = \"m\"\nforce = \"kN\"\n"
                       "[materials.m]\nE = {}\nG = {}\nexpansion = {}\n"
                       "[sections.bar]\nA = {}\nI = {}\ndepth = {}\n{}",
                       s.E, s.G, s.expansion, s.A, s.I, s.depth, shear);
}

std::string load_case(const std::vector<std::string>& loads) {
    return fmt::format("[cases.load]\nloads = [\n  {},\n]\n", fmt::join(loads, ",\n  "));
}

std::string text(const BeamModel& beam) {
    std::string nodes = "[nodes]\nA = [0, 0]\n";
    std::string members = "[members]\n";
    double x = 0;
    for (std::size_t i = 0; i < beam.spans.size(); ++i) {
        x += beam.spans[i];
        const std::string from = node_name(i), to = node_name(i + 1);
        nodes += fmt::format("{} = [{}, 0]\n", to, x);
        members +=
            fmt::format("{0}{1} = {{ from = \"{0}\", to = \"{1}\", section = \"bar\", material = \"m\" }}\n", from, to);
    }
    std::string supports = "[supports]\n";
    for (std::size_t i = 0; i < beam.supports.size(); ++i) {
        if (!beam.supports[i].empty()) supports += fmt::format("{} = {}\n", node_name(i), beam.supports[i]);
    }
    return header(beam.stiffness) + nodes + members + supports + load_case(beam.loads);
}

Solved solve(const BeamModel& beam) { return Solved(text(beam)); }

std::string spring_y(double stiffness) { return fmt::format("{{ y = {} }}", stiffness); }

std::string uniform(std::string_view member, double w) {
    return fmt::format("{{ member = \"{}\", y = {} }}", member, -w);
}
std::string linear(std::string_view member, double w_start, double w_end) {
    return fmt::format("{{ member = \"{}\", y = [{}, {}] }}", member, -w_start, -w_end);
}
std::string linear(std::string_view member, double w_start, double w_end, double from, double to) {
    return fmt::format("{{ member = \"{}\", y = [{}, {}], between = [{}, {}] }}", member, -w_start, -w_end, from, to);
}
std::string point(std::string_view member, double P, double at) {
    return fmt::format("{{ member = \"{}\", y = {}, at = {} }}", member, -P, at);
}
std::string force(std::string_view node, double P) { return fmt::format("{{ node = \"{}\", y = {} }}", node, -P); }
std::string couple(std::string_view node, double ccw) {
    return fmt::format("{{ node = \"{}\", moment = {} }}", node, ccw);
}
std::string settle(std::string_view node, double down) {
    return fmt::format("{{ support = \"{}\", y = {} }}", node, -down);
}
std::string turn(std::string_view node, double ccw) {
    return fmt::format("{{ support = \"{}\", rotation = {} }}", node, ccw);
}
std::string warm(std::string_view member, double change) {
    return fmt::format("{{ member = \"{}\", temperature = {} }}", member, change);
}
std::string warm(std::string_view member, double top, double bottom) {
    return fmt::format("{{ member = \"{}\", temperature = {{ top = {}, bottom = {} }} }}", member, top, bottom);
}

} // namespace published
