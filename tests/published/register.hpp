#pragma once
// Every check against a published source is asserted and, in the same breath, entered in a register, from which
// docs/verification.md is written.

#include <string>
#include <string_view>

namespace published {

/// The sections of the page, in its order.
enum class Group {
    simple_spans,
    held_spans,
    imposed,
    shear_flexible,
    continuous,
    portals,
    settlement,
    influence,
    frames,
    frequencies,
    conventions,
};

/// How closely a value must agree, and why no closer.
struct Tolerance {
    double relative = 0;    ///< of the expected value
    double absolute = 0;    ///< in the unit of the quantity; added to the relative part
    std::string_view words; ///< as the page prints it
};

/// For a formula that is exact for the model and is evaluated in double precision here.
inline constexpr Tolerance exact{1e-9, 0, "below 1e-9"};

/// E A L^2 / (E I) of the members that stand for axially rigid ones: their axial effect is then of the order of 1e-8,
/// and the contrast of stiffnesses, E A / L to 12 E I / L^3, stays below 1e9.
inline constexpr double axial_stiffness_ratio = 1e10;

/// For formulas of axially rigid members, whose models' members are that stiff, not rigid.
inline constexpr Tolerance axially_stiff{1e-7, 0, "below 1e-7"};

/// For a value that is known as far as it is printed.
/// \param last one unit in the last printed place
constexpr Tolerance printed(double last) { return {0, 0.5 * last, "printed digits"}; }

/// One row of a source's table, or one worked example.
class Row {
  public:
    /// \param source the publication, where the row's differs from the group's; empty otherwise
    Row(Group group, std::string title, const std::string& source = {});

    /// Asserts that `got` agrees with `expected` and enters both in the register.
    /// \param quantity what is compared, with its unit: "M at midspan, kN m"
    /// \pre expected is not 0
    void check(std::string_view quantity, double expected, double got, Tolerance tolerance = exact) const;

    /// The same for a value that ought to vanish: its size must stay below 1e-9 of `scale`, a typical size of the
    /// quantity.
    void check_zero(std::string_view quantity, double got, double scale) const;

  private:
    Group group_;
    std::string title_;
};

/// The page docs/verification.md of all checks made so far. The same bytes on every machine: values have six digits,
/// and of a difference only the limit is given below which it lies.
std::string verification_page();

} // namespace published
