#include "units/display.hpp"

#include <cmath>
#include <cstdlib>

#include <fmt/format.h>

#include "units/grammar.hpp"

namespace groundsill {

namespace {

using Names = std::array<std::string_view, shown_count>;

/// In the order of Shown. Written in the grammar of model files, which also tells their sizes.
constexpr Names metric_names = {"m",   "mm",  "mm",   "mrad",     "kN",    "kN/m", "kN m", "MPa",
                                "cm2", "cm4", "kN/m", "kN m/rad", "kg/m3", "K",    "1/K"};
constexpr Names us_names = {"ft",  "in",  "in",     "mrad",       "kip",    "kip/ft", "kip ft", "ksi",
                            "in2", "in4", "kip/in", "kip ft/rad", "lb/ft3", "degF",   "1/degF"};

} // namespace

Display::Display(DisplayUnits units) : names_(units == DisplayUnits::us ? us_names : metric_names) {
    std::string error;
    for (std::size_t kind = 0; kind < names_.size(); ++kind) {
        const Unit unit = parse_unit(names_[kind], error).value();
        up_[kind] = unit.up;
        down_[kind] = unit.down;
    }
}

double Display::in_unit(Shown kind, double si) const {
    const auto index = static_cast<std::size_t>(kind);
    return si * down_[index] / up_[index];
}

std::string Display::result(Shown kind, double si) const { return significant(in_unit(kind, si)); }

std::string Display::result_with_unit(Shown kind, double si) const {
    return fmt::format("{} {}", result(kind, si), unit(kind));
}

std::string Display::given(Shown kind, double si) const {
    return fmt::format("{} {}", compact(in_unit(kind, si)), unit(kind));
}

std::string significant(double value) {
    if (value == 0) return "0";
    if (!std::isfinite(value)) return "-";
    std::string scientific = fmt::format("{:.3e}", value);
    const int exponent = std::atoi(scientific.c_str() + scientific.find('e') + 1);
    if (exponent < -3 || exponent > 6) return scientific;
    return fmt::format("{:.{}f}", value, exponent >= 3 ? 0 : 3 - exponent);
}

std::string compact(double value) {
    const double size = std::abs(value);
    if (value == 0) return "0";
    return size >= 1e6 && size < 1e10 ? fmt::format("{:.0f}", value) : fmt::format("{:.6g}", value);
}

} // namespace groundsill
