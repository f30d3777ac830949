#include "writing/load_words.hpp"

#include <array>
#include <cmath>

#include <fmt/format.h>

#include "writing/names.hpp"
#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

constexpr std::size_t most_loads = 12; ///< lines of one case
constexpr int name_width = 24;

std::string name_of(const std::string& name) { return shortened(printable(name), name_width); }

/// In the order of Action.
constexpr std::array<std::string_view, 11> action_words = {
    "no action given", "permanent",  "imposed",    "roof",      "snow", "rain", "wind",
    "temperature",     "settlement", "earthquake", "accidental"};

/// Appends "y -12 kN" to a list of such components, unless the value is 0.
void add_component(std::string& words, std::string_view direction, const Display& display, Shown kind, double value) {
    if (value == 0) return;
    if (!words.empty()) words += ", ";
    words += fmt::format("{} {}", direction, display.given(kind, value));
}

/// The same for a load that runs from one value to another.
void add_ramp(std::string& words, std::string_view direction, const Display& display, double a, double b) {
    if (a == b) return add_component(words, direction, display, Shown::line_load, a);
    if (!words.empty()) words += ", ";
    words +=
        fmt::format("{} {} to {}", direction, display.given(Shown::line_load, a), display.given(Shown::line_load, b));
}

std::string_view first_direction(const MemberLoad& load) {
    return load.axes == MemberLoad::Axes::member ? "along" : "x";
}
std::string_view second_direction(const MemberLoad& load) {
    return load.axes == MemberLoad::Axes::member ? "across" : "y";
}

double length_of(const Model& model, const Member& member) {
    const Node& from = model.nodes[member.from];
    const Node& to = model.nodes[member.to];
    return std::hypot(to.x - from.x, to.y - from.y);
}

std::string distributed_words(const Model& model, const Display& display, const MemberLoad& load) {
    std::string words;
    add_ramp(words, first_direction(load), display, load.first_a, load.first_b);
    add_ramp(words, second_direction(load), display, load.second_a, load.second_b);
    if (load.axes == MemberLoad::Axes::global_plan) words += " per plan length";
    const double length = length_of(model, model.members[load.member]);
    const bool whole = load.a == 0 && std::abs(load.b - length) <= 1e-9 * length;
    if (whole) return words + ", whole length";
    return fmt::format("{}, from {} to {}", words, display.given(Shown::length, load.a),
                       display.given(Shown::length, load.b));
}

std::string point_words(const Display& display, const MemberLoad& load) {
    std::string words;
    add_component(words, first_direction(load), display, Shown::force, load.first_a);
    add_component(words, second_direction(load), display, Shown::force, load.second_a);
    add_component(words, "moment", display, Shown::moment, load.moment);
    return fmt::format("{} at {}", words, display.given(Shown::length, load.a));
}

std::string temperature_words(const Display& display, const MemberLoad& load) {
    if (!load.through_depth) return "warmer by " + display.given(Shown::temperature, load.top);
    return fmt::format("warmer by {} at the top, {} at the bottom", display.given(Shown::temperature, load.top),
                       display.given(Shown::temperature, load.bottom));
}

std::string member_load_words(const Model& model, const Display& display, const MemberLoad& load) {
    switch (load.kind) {
    case MemberLoad::Kind::distributed:
        return distributed_words(model, display, load);
    case MemberLoad::Kind::point:
        return point_words(display, load);
    case MemberLoad::Kind::temperature:
        return temperature_words(display, load);
    case MemberLoad::Kind::lack_of_fit:
        break;
    }
    return "made too long by " + display.given(Shown::movement, load.amount);
}

std::string node_load_words(const Display& display, const NodeLoad& load) {
    std::string words;
    add_component(words, "x", display, Shown::force, load.x);
    add_component(words, "y", display, Shown::force, load.y);
    add_component(words, "moment", display, Shown::moment, load.moment);
    return words;
}

std::string movement_words(const Display& display, const SupportMovement& movement) {
    std::string words;
    add_component(words, "x", display, Shown::movement, movement.x);
    add_component(words, "y", display, Shown::movement, movement.y);
    add_component(words, "rotation", display, Shown::rotation, movement.rotation);
    return words;
}

/// Collects the lines of a case, up to the limit, and counts the rest.
class Lines {
  public:
    /// \param words gives the line's end; not called for lines that are not shown
    template <class Words> void add(const std::string& subject, const Words& words) {
        if (count_++ < most_loads) text_ += fmt::format("    {}: {}\n", subject, words());
    }
    std::string text() const {
        return count_ <= most_loads ? text_ : fmt::format("{}    … and {} more\n", text_, count_ - most_loads);
    }

  private:
    std::string text_;
    std::size_t count_ = 0;
};

} // namespace

std::string case_words(const Model& model, const Display& display, const LoadCase& load_case) {
    Lines lines;
    if (load_case.self_weight != 0) {
        lines.add("every member", [&] { return fmt::format("self-weight times {}", compact(load_case.self_weight)); });
    }
    for (const MemberLoad& load : load_case.member_loads) {
        lines.add("member " + name_of(model.members[load.member].name),
                  [&] { return member_load_words(model, display, load); });
    }
    for (const NodeLoad& load : load_case.node_loads) {
        lines.add("node " + name_of(model.nodes[load.node].name), [&] { return node_load_words(display, load); });
    }
    for (const SupportMovement& movement : load_case.movements) {
        lines.add("support " + name_of(node_of(model, model.supports[movement.support])) + " moves",
                  [&] { return movement_words(display, movement); });
    }
    const std::string category = load_case.category.empty() ? "" : ", category " + printable(load_case.category);
    return fmt::format("  {} ({}{})\n{}", name_of(load_case.name),
                       action_words[static_cast<std::size_t>(load_case.action)], category, lines.text());
}

} // namespace groundsill::writing
