#pragma once
// Quantities as the model file writes them: "12.5 kN/m", "25 MN m/rad", "10e-6 /K", "50 %", "1/360".
//
// Units: m mm cm km in ft, N kN MN lbf kip, Pa kPa MPa GPa psi psf ksi, kg t g lb slug, s, Hz, rad deg mrad,
// K degC degF (temperature differences). Exact by definition: 1 in = 25.4 mm, 1 lb = 0.45359237 kg (international yard
// and pound, 1959), g = 9.80665 m/s2 (CGPM 1901), from which lbf, kip, psi, psf, ksi and slug follow.

#include <optional>
#include <string>
#include <string_view>

#include "units/dimension.hpp"

namespace groundsill {

/// A unit. A number in it has the SI value number * up / down. Both are whole numbers as far as possible, so that "300
/// mm" is the same double as "0.3 m".
struct Unit {
    double up = 1;
    double down = 1;
    Dimension dimension;
    int pounds = 0; ///< power of `lb` in it, to advise where lbf was meant
    int masses = 0; ///< power of the other units of mass in it

    /// This unit times another one raised to a power.
    Unit times(const Unit& other, int power = 1) const;

    double to_si(double number) const { return number * up / down; }
};

/// What a text says: its SI value and the unit it is given in.
struct Quantity {
    double value = 0; ///< SI
    Unit unit;
    bool has_unit = false;    ///< a unit stands there, be it dimensionless
    bool is_fraction = false; ///< "50 %" or "1/360"
};

/// Reads a unit without a number: "kN/m".
/// \param error set to what is wrong and the way out when there is no result; untouched otherwise
std::optional<Unit> parse_unit(std::string_view text, std::string& error);

/// Reads a number and its unit; the number alone is fine too. The value is finite.
/// \param error as above
std::optional<Quantity> parse_quantity(std::string_view text, std::string& error);

/// What to say when a quantity has another dimension than the one expected: "expected a force, got a mass: did you mean
/// lbf?"
std::string mismatch_words(Dimension expected, const Quantity& got);

} // namespace groundsill
