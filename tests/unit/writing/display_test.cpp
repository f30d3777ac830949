#include <doctest/doctest.h>

#include <limits>

#include "units/display.hpp"

using namespace groundsill;

TEST_SUITE("display units") {
    TEST_CASE("four significant digits") {
        CHECK(significant(0) == "0");
        CHECK(significant(-0.0) == "0");
        CHECK(significant(12.3) == "12.30");
        CHECK(significant(-12.345678) == "-12.35");
        CHECK(significant(0.00123456) == "0.001235");
        CHECK(significant(9.99996) == "10.00"); // rounding moves the point
        CHECK(significant(999.96) == "1000");
        CHECK(significant(123456.7) == "123457");
        CHECK(significant(1.23456e9) == "1.235e+09");
        CHECK(significant(1.23456e-7) == "1.235e-07");
        CHECK(significant(std::numeric_limits<double>::quiet_NaN()) == "-");
    }

    TEST_CASE("given quantities keep the digits they came with") {
        const Display metric(DisplayUnits::metric);
        CHECK(metric.given(Shown::length, 6) == "6 m");
        CHECK(metric.given(Shown::dimension, 0.325) == "325 mm");
        CHECK(metric.given(Shown::line_load, -12e3) == "-12 kN/m");
        CHECK(metric.given(Shown::second_moment, 8.356e-5) == "8356 cm4");
        CHECK(metric.given(Shown::second_moment, 0.0256) == "2560000 cm4");
        CHECK(metric.given(Shown::expansion, 1.2e-5) == "1.2e-05 1/K");
        CHECK(metric.given(Shown::density, 2500) == "2500 kg/m3");
    }

    // 1 ft = 0.3048 m and 1 lb = 0.45359237 kg exactly (international yard and pound, 1959); 1 kip = 1000 lb x 9.80665
    // m/s2 = 4448.2216152605 N; K and degF as differences 5 : 9.
    TEST_CASE("US customary units") {
        const Display us(DisplayUnits::us);
        CHECK(us.result_with_unit(Shown::length, 0.3048) == "1.000 ft");
        CHECK(us.result_with_unit(Shown::movement, 0.0254) == "1.000 in");
        CHECK(us.result_with_unit(Shown::force, 4448.2216152605) == "1.000 kip");
        CHECK(us.result_with_unit(Shown::moment, 4448.2216152605 * 0.3048) == "1.000 kip ft");
        CHECK(us.result_with_unit(Shown::stress, 4448.2216152605 / (0.0254 * 0.0254)) == "1.000 ksi");
        CHECK(us.result_with_unit(Shown::stiffness, 4448.2216152605 / 0.0254) == "1.000 kip/in");
        CHECK(us.result_with_unit(Shown::density, 0.45359237 / (0.3048 * 0.3048 * 0.3048)) == "1.000 lb/ft3");
        CHECK(us.result_with_unit(Shown::temperature, 5) == "9.000 degF");
        CHECK(us.result_with_unit(Shown::rotation, 0.004) == "4.000 mrad");
    }
}
