#pragma once
// The elementary functions that the reference needs, for long double (64 bits) and for a 113-bit number.

#include <cmath>

namespace reference {

__extension__ typedef __float128 Quad; ///< 113 bits: no standard type holds as many on every machine

template <class S> S magnitude(S x) { return x < 0 ? -x : x; }

/// Square root: the long double's, then two Newton steps, each doubling the digits.
template <class S> S square_root(S x) {
    S root = std::sqrt(static_cast<long double>(x));
    for (int step = 0; step < 2; ++step) root = (root + x / root) / 2;
    return root;
}

template <class S> struct Direction {
    S cosine;
    S sine;
};

/// Cosine and sine of an angle of a few radians by their power series; 60 terms leave nothing at 113 bits for |angle| <
/// 2 pi.
template <class S> Direction<S> direction_of(double angle) {
    Direction<S> sum{1, 0};
    S term = 1;
    for (int power = 1; power < 60; ++power) {
        term *= S(angle) / power;
        const bool minus = power % 4 == 2 || power % 4 == 3;
        (power % 2 == 0 ? sum.cosine : sum.sine) += minus ? -term : term;
    }
    return sum;
}

} // namespace reference
