#pragma once
// Units and digits of what is printed for people.

#include <array>
#include <string>
#include <string_view>

#include "groundsill/model.hpp"

namespace groundsill {

/// What a printed number measures: one dimension may be printed in several units, by what it is the size of.
enum class Shown {
    length,    ///< of members, places along them
    dimension, ///< of a section
    movement,
    rotation,
    force,
    line_load,
    moment,
    stress,
    area,
    second_moment,
    stiffness,            ///< force per movement
    rotational_stiffness, ///< moment per rotation
    density,
    temperature, ///< a difference
    expansion,
};
inline constexpr int shown_count = 15;

/// The display units of a model: metric (m, mm, kN, kN m, mrad, MPa) or US customary (ft, in, kip, kip ft, mrad, ksi).
class Display {
  public:
    explicit Display(DisplayUnits units);

    std::string_view unit(Shown kind) const { return names_[static_cast<std::size_t>(kind)]; }

    /// A value in SI turned into the display unit.
    double in_unit(Shown kind, double si) const;

    /// A result: four significant digits and no unit, for a column.
    std::string result(Shown kind, double si) const;
    /// The same with its unit.
    std::string result_with_unit(Shown kind, double si) const;
    /// A given quantity, with its unit and as many digits (six at most) as it needs: "6 m".
    std::string given(Shown kind, double si) const;

  private:
    const std::array<std::string_view, shown_count>& names_;
    std::array<double, shown_count> up_; ///< SI value = number * up / down
    std::array<double, shown_count> down_;
};

/// Four significant digits, trailing zeros kept: "12.30". From 1000 to a million whole numbers; outside of 0.001 to a
/// million powers of ten. 0 is "0".
std::string significant(double value);

/// Six significant digits at most, without trailing zeros: "0.18"; from a million to ten thousand million whole
/// numbers.
std::string compact(double value);

} // namespace groundsill
