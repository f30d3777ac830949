#pragma once
// What the tests of the floor screening share.

#include <cmath>
#include <string>

#include <doctest/doctest.h>

#include "groundsill/floor.hpp"

/// The step of that symbol, which must be there.
inline double step(const groundsill::FloorResult& result, const std::string& symbol) {
    for (const auto& quantity : result.quantities) {
        if (quantity.symbol == symbol) return quantity.value;
    }
    FAIL("no step ", symbol);
    return 0;
}

inline bool has_step(const groundsill::FloorResult& result, const std::string& symbol) {
    for (const auto& quantity : result.quantities) {
        if (quantity.symbol == symbol) return true;
    }
    return false;
}

/// The value is that of the source to all the digits printed there: off by half a unit of the last one at most.
inline void check_digits(double value, double expected, double last_digit) {
    CAPTURE(value);
    CAPTURE(expected);
    CHECK(std::abs(value - expected) <= 0.5000001 * last_digit);
}

inline bool says(const std::vector<std::string>& warnings, const std::string& part) {
    for (const auto& warning : warnings) {
        if (warning.find(part) != std::string::npos) return true;
    }
    return false;
}
