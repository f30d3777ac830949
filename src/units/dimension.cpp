#include "units/dimension.hpp"

namespace groundsill {
namespace {

struct DimensionName {
    Dimension dimension;
    std::string_view words;
    std::string_view unit;
};

constexpr DimensionName dimension_names[] = {
    {dimension::none, "a number without a unit", ""},
    {dimension::length, "a length", "m"},
    {dimension::area, "an area", "mm2"},
    {{3, 0, 0, 0}, "a volume", "m3"},
    {dimension::second_moment, "a second moment of area", "mm4"},
    {dimension::mass, "a mass", "kg"},
    {dimension::density, "a mass per volume", "kg/m3"},
    {{-1, 1, 0, 0}, "a mass per length", "kg/m"},
    {{-2, 1, 0, 0}, "a mass per area", "kg/m2"},
    {dimension::time, "a time", "s"},
    {dimension::frequency, "a frequency", "Hz"},
    {dimension::velocity, "a speed", "m/s"},
    {dimension::acceleration, "an acceleration", "m/s2"},
    {dimension::temperature, "a temperature difference", "K"},
    {dimension::expansion, "a number per temperature", "/K"},
    {dimension::force, "a force", "kN"},
    {dimension::moment, "a force times a length", "kN m"},
    {dimension::force_per_length, "a force per length", "kN/m"},
    {dimension::stress, "a force per area", "MPa"},
    {dimension::force_per_volume, "a force per volume", "kN/m3"},
    {{3, 1, -2, 0}, "a force times an area", "kN m2"},
    {dimension::flexibility, "a length per force", "mm/kN"},
};

void append_power(std::string& text, std::string_view unit, int power) {
    if (power == 0) return;
    text += ' ';
    text += unit;
    if (power != 1) text += "^" + std::to_string(power);
}

} // namespace

std::string dimension_words(Dimension dimension) {
    for (const DimensionName& name : dimension_names) {
        if (name.dimension == dimension) return std::string(name.words);
    }
    std::string text = "a quantity in";
    append_power(text, "m", dimension.length);
    append_power(text, "kg", dimension.mass);
    append_power(text, "s", dimension.time);
    append_power(text, "K", dimension.temperature);
    return text;
}

std::string_view usual_unit(Dimension dimension) {
    for (const DimensionName& name : dimension_names) {
        if (name.dimension == dimension) return name.unit;
    }
    return {};
}

} // namespace groundsill
