#pragma once
// Physical dimensions: what a quantity measures, apart from its size.

#include <cstdint>
#include <string>
#include <string_view>

namespace groundsill {

/// Exponents of the base quantities. Angles count as dimensionless.
struct Dimension {
    std::int8_t length = 0;
    std::int8_t mass = 0;
    std::int8_t time = 0;
    std::int8_t temperature = 0;

    friend constexpr bool operator==(Dimension, Dimension) = default;

    /// This dimension times another one raised to a power.
    constexpr Dimension times(Dimension other, int power = 1) const {
        const auto add = [power](int a, int b) { return static_cast<std::int8_t>(a + power * b); };
        return {add(length, other.length), add(mass, other.mass), add(time, other.time),
                add(temperature, other.temperature)};
    }
};

/// The dimensions that models use. Several have two names, for the reader's sake.
namespace dimension {
inline constexpr Dimension none{};
inline constexpr Dimension angle{};
inline constexpr Dimension length{1, 0, 0, 0};
inline constexpr Dimension area{2, 0, 0, 0};
inline constexpr Dimension second_moment{4, 0, 0, 0};
inline constexpr Dimension mass{0, 1, 0, 0};
inline constexpr Dimension density{-3, 1, 0, 0};
inline constexpr Dimension time{0, 0, 1, 0};
inline constexpr Dimension frequency{0, 0, -1, 0};
inline constexpr Dimension velocity{1, 0, -1, 0};
inline constexpr Dimension acceleration{1, 0, -2, 0};
inline constexpr Dimension temperature{0, 0, 0, 1};
inline constexpr Dimension expansion{0, 0, 0, -1};
inline constexpr Dimension force{1, 1, -2, 0};
inline constexpr Dimension moment{2, 1, -2, 0};            ///< also a rotational stiffness, N m/rad
inline constexpr Dimension force_per_length{0, 1, -2, 0};  ///< also a stiffness, N/m
inline constexpr Dimension stress{-1, 1, -2, 0};           ///< also a stiffness per length, N/m2
inline constexpr Dimension force_per_volume{-2, 1, -2, 0}; ///< also a bed modulus, N/m3
inline constexpr Dimension flexibility{0, -1, 2, 0};       ///< m/N
} // namespace dimension

/// The dimension in words, with its article: "a force per length"; where it has no name, in base units: "a quantity in
/// m^3 kg".
std::string dimension_words(Dimension dimension);

/// A unit that such a quantity is often given in, for advice in messages: "kN/m"; empty where there is none.
std::string_view usual_unit(Dimension dimension);

} // namespace groundsill
