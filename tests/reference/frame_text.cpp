#include "frame_text.hpp"

#include <array>
#include <fmt/format.h>

namespace reference {

namespace {

std::size_t index(int i) { return static_cast<std::size_t>(i); }

enum Dimension {
    length,
    area,
    inertia,
    force,
    moment,
    line_force,
    turning,
    stress,
    temperature,
    expansion,
    density,
    angle
};

struct Unit {
    const char* name; ///< empty: a bare number
    double in_si;
};
using UnitTable = std::array<Unit, 12>;

constexpr double inch = 0.0254;
constexpr double foot = 0.3048;
constexpr double lbf = 4.4482216152605;
constexpr double kip = 1000 * lbf;
constexpr double pound = 0.45359237;
constexpr double fahrenheit = 5.0 / 9.0;

const UnitTable& table(Units units) {
    static const UnitTable si{{{"m", 1},
                               {"m2", 1},
                               {"m4", 1},
                               {"N", 1},
                               {"N m", 1},
                               {"N/m", 1},
                               {"N m/rad", 1},
                               {"Pa", 1},
                               {"K", 1},
                               {"1/K", 1},
                               {"kg/m3", 1},
                               {"rad", 1}}};
    static const UnitTable bare_si{{{"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"", 1},
                                    {"kg/m3", 1},
                                    {"rad", 1}}};
    static const UnitTable millimetre{{{"mm", 1e-3},
                                       {"mm2", 1e-6},
                                       {"mm^4", 1e-12},
                                       {"N", 1},
                                       {"N*mm", 1e-3},
                                       {"N/mm", 1e3},
                                       {"N mm/rad", 1e-3},
                                       {"MPa", 1e6},
                                       {"degC", 1},
                                       {"/K", 1},
                                       {"t/m³", 1e3},
                                       {"mrad", 1e-3}}};
    static const UnitTable us{{{"ft", foot},
                               {"in²", inch * inch},
                               {"in4", inch * inch * inch * inch},
                               {"kip", kip},
                               {"kip ft", kip * foot},
                               {"lbf/ft", lbf / foot},
                               {"kip ft/rad", kip * foot},
                               {"ksi", kip / (inch * inch)},
                               {"degF", fahrenheit},
                               {"1/degF", 1 / fahrenheit},
                               {"lb/ft3", pound / (foot * foot * foot)},
                               {"rad", 1}}};
    static const UnitTable bare_us{{{"", foot},
                                    {"", foot * foot},
                                    {"", foot * foot * foot * foot},
                                    {"", kip},
                                    {"", kip * foot},
                                    {"", kip / foot},
                                    {"", kip * foot},
                                    {"", kip / (foot * foot)},
                                    {"", 1},
                                    {"", 1},
                                    {"lb/ft3", pound / (foot * foot * foot)},
                                    {"rad", 1}}};
    switch (units) {
    case Units::bare_si:
        return bare_si;
    case Units::millimetre_newton:
        return millimetre;
    case Units::us:
        return us;
    case Units::bare_us:
        return bare_us;
    default:
        return si;
    }
}

class Writer {
  public:
    Writer(const Frame& frame, Units units) : frame_(frame), units_(units) {}

    std::string text() {
        if (units_ == Units::bare_si) text_ += "[units]\nlength = \"m\"\nforce = \"N\"\n";
        if (units_ == Units::bare_us) text_ += "[units]\nlength = \"ft\"\nforce = \"kip\"\n";
        write_materials();
        write_sections();
        write_nodes();
        write_members();
        write_supports();
        for (const Case& each : frame_.cases) write_case(each);
        return text_;
    }

  private:
    std::string quantity(double value, Dimension dimension) const {
        const Unit& unit = table(units_)[dimension];
        if (*unit.name == '\0') return fmt::format("{:.17g}", value / unit.in_si);
        return fmt::format("\"{:.17g} {}\"", value / unit.in_si, unit.name);
    }

    std::string held(const Joint& joint, Dimension dimension) const {
        if (joint.kind == Joint::Kind::rigid) return "\"fixed\"";
        if (joint.kind == Joint::Kind::free) return "\"free\"";
        return quantity(joint.stiffness, dimension);
    }

    void write_materials() {
        for (std::size_t i = 0; i < frame_.materials.size(); ++i) {
            const Material& each = frame_.materials[i];
            text_ += fmt::format("[materials.q{}]\nE = {}\nG = {}\ndensity = {}\nexpansion = {}\n", i,
                                 quantity(each.E, stress), quantity(each.G, stress), quantity(each.density, density),
                                 quantity(each.expansion, expansion));
        }
    }

    void write_sections() {
        for (std::size_t i = 0; i < frame_.sections.size(); ++i) {
            const Section& each = frame_.sections[i];
            text_ += fmt::format("[sections.s{}]\n", i);
            if (!each.shape.empty()) {
                text_ += each.shape;
                continue;
            }
            text_ += fmt::format("A = {}\nI = {}\ndepth = {}\n", quantity(each.A, area), quantity(each.I, inertia),
                                 quantity(each.depth, length));
            if (each.shear_area > 0) text_ += fmt::format("shear_area = {}\n", quantity(each.shear_area, area));
        }
    }

    void write_nodes() {
        text_ += "[nodes]\n";
        for (const Node& each : frame_.nodes)
            text_ += fmt::format("{} = [{}, {}]\n", each.name, quantity(each.x, length), quantity(each.y, length));
    }

    std::string release(const Joints& joints) const {
        std::string inside;
        const auto add = [&](const char* key, const Joint& joint, Dimension dimension) {
            if (joint.kind == Joint::Kind::rigid) return;
            inside += fmt::format("{}{} = {}", inside.empty() ? "" : ", ", key, held(joint, dimension));
        };
        add("axial", joints.first, line_force);
        add("shear", joints.second, line_force);
        add("moment", joints.rotation, turning);
        return inside;
    }

    std::string properties(const Member& each, const char* separator) const {
        std::string list = fmt::format("section = \"s{}\"{}material = \"q{}\"", each.section, separator, each.material);
        if (each.factor != 1) list += fmt::format("{}stiffness_factor = {:.17g}", separator, each.factor);
        const std::string start = release(each.start);
        const std::string end = release(each.end);
        if (start.empty() && end.empty()) return list;
        list += fmt::format("{}releases = {{ ", separator);
        if (!start.empty()) list += fmt::format("start = {{ {} }}", start);
        if (!end.empty()) list += fmt::format("{}end = {{ {} }}", start.empty() ? "" : ", ", end);
        return list + " }";
    }

    void write_members() {
        text_ += "[members]\n";
        for (const Member& each : frame_.members)
            if (each.hinges.empty())
                text_ += fmt::format("{} = {{ from = \"{}\", to = \"{}\", {} }}\n", each.name, name(each.from),
                                     name(each.to), properties(each, ", "));
        for (const Member& each : frame_.members) {
            if (each.hinges.empty()) continue;
            const std::string beam = each.name.substr(0, each.name.size() - 2); // without ".1"
            std::string hinges;
            for (const double hinge : each.hinges)
                hinges += fmt::format("{}{}", hinges.empty() ? "" : ", ", quantity(hinge, length));
            text_ += fmt::format("[beams.{}]\nnodes = [\"{}\", \"{}\"]\n{}\nhinges = [{}]\n", beam, name(each.from),
                                 name(each.to), properties(each, "\n"), hinges);
        }
    }

    void write_supports() {
        text_ += "[supports]\n";
        for (const Support& each : frame_.supports) {
            text_ +=
                fmt::format("{} = {{ x = {}, y = {}, rotation = {}", name(each.node), held(each.held.first, line_force),
                            held(each.held.second, line_force), held(each.held.rotation, turning));
            if (each.angle != 0) text_ += fmt::format(", angle = {}", quantity(each.angle, angle));
            text_ += " }\n";
        }
    }

    void write_case(const Case& each) {
        text_ += fmt::format("[cases.{}]\nloads = [\n", each.name);
        for (const Load& load : each.loads) text_ += fmt::format("  {{ {} }},\n", entry(load));
        text_ += "]\n";
    }

    std::string entry(const Load& load) const {
        const auto member = [&] { return fmt::format("member = \"{}\"", frame_.members[index(load.on)].name); };
        switch (load.kind) {
        case Load::Kind::self_weight:
            return fmt::format("self_weight = {:.17g}", load.amount);
        case Load::Kind::distributed:
            return member() + distributed(load);
        case Load::Kind::point:
            return member() + components(load, force, moment) + ", at = " + quantity(load.a, length);
        case Load::Kind::node:
            return fmt::format("node = \"{}\"", name(load.on)) + components(load, force, moment);
        case Load::Kind::lack_of_fit:
            return fmt::format("{}, lack_of_fit = {}", member(), quantity(load.amount, length));
        case Load::Kind::temperature:
            if (load.top == load.bottom)
                return fmt::format("{}, temperature = {}", member(), quantity(load.top, temperature));
            return fmt::format("{}, temperature = {{ top = {}, bottom = {} }}", member(),
                               quantity(load.top, temperature), quantity(load.bottom, temperature));
        default:
            return movement(load);
        }
    }

    std::string components(const Load& load, Dimension of_force, Dimension of_moment) const {
        const bool local = load.axes == Load::Axes::member;
        std::string list;
        if (load.first_a != 0)
            list += fmt::format(", {} = {}", local ? "along" : "x", quantity(load.first_a, of_force));
        if (load.second_a != 0)
            list += fmt::format(", {} = {}", local ? "across" : "y", quantity(load.second_a, of_force));
        if (load.moment != 0) list += fmt::format(", moment = {}", quantity(load.moment, of_moment));
        return list;
    }

    std::string movement(const Load& load) const {
        std::string list = fmt::format("support = \"{}\"", name(frame_.supports[index(load.on)].node));
        if (load.first_a != 0) list += fmt::format(", x = {}", quantity(load.first_a, length));
        if (load.second_a != 0) list += fmt::format(", y = {}", quantity(load.second_a, length));
        if (load.moment != 0) list += fmt::format(", rotation = {}", quantity(load.moment, angle));
        return list;
    }

    std::string distributed(const Load& load) const {
        const bool local = load.axes == Load::Axes::member;
        std::string list;
        const auto add = [&](const char* key, double a, double b) {
            if (a == 0 && b == 0) return;
            if (a == b)
                list += fmt::format(", {} = {}", key, quantity(a, line_force));
            else
                list += fmt::format(", {} = [{}, {}]", key, quantity(a, line_force), quantity(b, line_force));
        };
        add(local ? "along" : "x", load.first_a, load.first_b);
        add(local ? "across" : "y", load.second_a, load.second_b);
        if (!load.whole)
            list += fmt::format(", between = [{}, {}]", quantity(load.a, length), quantity(load.b, length));
        if (load.axes == Load::Axes::plan) list += ", per = \"plan\"";
        return list;
    }

    const std::string& name(int node) const { return frame_.nodes[index(node)].name; }

    const Frame& frame_;
    Units units_;
    std::string text_;
};

} // namespace

std::string model_text(const Frame& frame, Units units, const std::string& tail) {
    return Writer(frame, units).text() + tail;
}

} // namespace reference
