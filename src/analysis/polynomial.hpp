#pragma once
// Polynomials of low degree: values and real roots in an interval.

#include <algorithm>
#include <array>
#include <cmath>
#include <cstddef>

namespace groundsill {

template <std::size_t Size> double value_of(const std::array<double, Size>& c, double t) {
    double value = 0;
    for (std::size_t k = Size; k-- > 0;) value = value * t + c[k];
    return value;
}

/// The value, or 0 where it is round-off of the terms that make it up: a moment that vanishes at an end reads 0.
template <std::size_t Size> double clean_value_of(const std::array<double, Size>& c, double t) {
    double value = 0, size = 0;
    for (std::size_t k = Size; k-- > 0;) {
        value = value * t + c[k];
        size = size * t + std::abs(c[k]);
    }
    return std::abs(value) < 1e-15 * size ? 0 : value;
}

template <std::size_t Size> std::array<double, Size - 1> derivative_of(const std::array<double, Size>& c) {
    std::array<double, Size - 1> derivative{};
    for (std::size_t k = 1; k < Size; ++k) derivative[k - 1] = static_cast<double>(k) * c[k];
    return derivative;
}

/// Roots, at most as many as the degree, in rising order.
template <std::size_t Most> struct Roots {
    std::array<double, Most> values{};
    std::size_t count = 0;

    void add(double root) {
        if (count < Most) values[count++] = root;
    }
};

/// The root between a and b, where the polynomial changes its sign once: Newton's steps, halving where one leaves the
/// bracket, until the bracket or the step is at the last bits.
template <std::size_t Size> double root_between(const std::array<double, Size>& c, double a, double b) {
    const auto slope = derivative_of(c);
    const bool rising = value_of(c, a) < 0;
    const double last_bits = 4e-16 * std::max(std::abs(a), std::abs(b));
    double root = a + (b - a) / 2;
    for (int step = 0; step < 200; ++step) {
        const double value = value_of(c, root);
        if (value == 0) return root;
        ((value < 0) == rising ? a : b) = root;
        double next = root - value / value_of(slope, root);
        if (!(next > a && next < b)) next = a + (b - a) / 2;
        if (std::abs(next - root) <= last_bits) return next;
        root = next;
    }
    return root;
}

/// Real roots strictly inside (0, end) at which the polynomial changes its sign. Between two neighbouring roots of its
/// derivative a polynomial is monotonic, so that each holds at most one.
template <std::size_t Size> Roots<Size - 1> roots_inside(const std::array<double, Size>& c, double end) {
    Roots<Size - 1> roots;
    if constexpr (Size == 2) {
        if (c[1] != 0 && -c[0] / c[1] > 0 && -c[0] / c[1] < end) roots.add(-c[0] / c[1]);
    } else if constexpr (Size > 2) {
        const auto turns = roots_inside(derivative_of(c), end);
        double from = 0;
        for (std::size_t k = 0; k <= turns.count; ++k) {
            const double to = k < turns.count ? turns.values[k] : end;
            const double at_from = value_of(c, from), at_to = value_of(c, to);
            if ((at_from < 0 && at_to > 0) || (at_from > 0 && at_to < 0))
                roots.add(root_between(c, from, to));
            else if (at_to == 0 && k < turns.count)
                roots.add(to);
            from = to;
        }
    }
    return roots;
}

} // namespace groundsill
