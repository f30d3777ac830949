// The unit grammar of the model file.

#include <doctest/doctest.h>

#include <numbers>
#include <string>

#include "contains.hpp"
#include "units/grammar.hpp"

using namespace groundsill;

namespace {

double si(std::string_view text) {
    std::string error;
    const std::optional<Quantity> quantity = parse_quantity(text, error);
    REQUIRE_MESSAGE(quantity, text, ": ", error);
    return quantity->value;
}

Dimension dimension_of(std::string_view text) {
    std::string error;
    const std::optional<Quantity> quantity = parse_quantity(text, error);
    REQUIRE_MESSAGE(quantity, text, ": ", error);
    return quantity->unit.dimension;
}

std::string error_of(std::string_view text) {
    std::string error = "none";
    CHECK_FALSE_MESSAGE(parse_quantity(text, error), text);
    return error;
}

std::string mismatch(Dimension expected, std::string_view text) {
    std::string error;
    return mismatch_words(expected, parse_quantity(text, error).value());
}

} // namespace

TEST_CASE("each unit has its SI value and dimension") {
    struct Row {
        const char* text;
        double value;
        Dimension dimension;
    };
    // SI units by definition (BIPM, The International System of Units, 9th edition, 2019). Customary units by
    // definition: yard 0.9144 m and pound 0.45359237 kg (international yard and pound agreement, 1959), g = 9.80665
    // m/s2 (CGPM 1901); the derived figures as in NIST SP 811 (2008), appendix B.8, in full: psi 6894.757 Pa,
    // slug 14.59390 kg, psf 47.88026 Pa.
    const double pi = std::numbers::pi;
    const Row rows[] = {
        {"1 m", 1, dimension::length},
        {"1 mm", 0.001, dimension::length},
        {"1 cm", 0.01, dimension::length},
        {"1 km", 1000, dimension::length},
        {"1 in", 0.0254, dimension::length},
        {"1 ft", 0.3048, dimension::length},
        {"1 N", 1, dimension::force},
        {"1 kN", 1e3, dimension::force},
        {"1 MN", 1e6, dimension::force},
        {"1 lbf", 4.4482216152605, dimension::force},
        {"1 kip", 4448.2216152605, dimension::force},
        {"1 Pa", 1, dimension::stress},
        {"1 kPa", 1e3, dimension::stress},
        {"1 MPa", 1e6, dimension::stress},
        {"1 GPa", 1e9, dimension::stress},
        {"1 psi", 6894.757293168361, dimension::stress},
        {"1 psf", 47.88025898033584, dimension::stress},
        {"1 ksi", 6894757.293168361, dimension::stress},
        {"1 kg", 1, dimension::mass},
        {"1 g", 0.001, dimension::mass},
        {"1 t", 1000, dimension::mass},
        {"1 lb", 0.45359237, dimension::mass},
        {"1 slug", 14.593902937206364, dimension::mass},
        {"1 s", 1, dimension::time},
        {"1 Hz", 1, dimension::frequency},
        {"1 rad", 1, dimension::angle},
        {"1 mrad", 0.001, dimension::angle},
        {"180 deg", pi, dimension::angle},
        {"1 K", 1, dimension::temperature},
        {"1 degC", 1, dimension::temperature},
        {"9 degF", 5, dimension::temperature},
        {"1 Nm", 1, dimension::moment},
        {"1 kNm", 1e3, dimension::moment},
        {"1 MNm", 1e6, dimension::moment},
    };
    for (const Row& row : rows) {
        CAPTURE(row.text);
        CHECK(si(row.text) == doctest::Approx(row.value).epsilon(1e-15));
        CHECK(dimension_of(row.text) == row.dimension);
    }
}

TEST_CASE("a value in a small unit is the same double as in the base unit") {
    CHECK(si("300 mm") == 0.3);
    CHECK(si("12.5 kN/m") == 12500.0);
    CHECK(si("5380 mm2") == 0.00538);
    CHECK(si("8356e4 mm4") == 8356e-8);
    CHECK(si("90 deg") == std::numbers::pi / 2);
    CHECK(si("12 in") == si("1 ft"));
    CHECK(si("1000 lbf") == si("1 kip"));
    CHECK(si("1 lbf/in2") == doctest::Approx(si("1 psi")).epsilon(1e-15));
}

TEST_CASE("products, divisors and powers") {
    for (const char* text : {"25 kN m", "25 kN*m", "25 kN * m", "25 kN·m", "25kNm", "25 kN m/rad", "25 kN\u00A0m"}) {
        CAPTURE(text);
        CHECK(si(text) == 25000);
        CHECK(dimension_of(text) == dimension::moment);
    }
    for (const char* text : {"3 m2", "3 m^2", "3 m²", "3 m m"}) CHECK(dimension_of(text) == dimension::area);
    for (const char* text : {"2 in4", "2 in^4", "2 in⁴"}) {
        CAPTURE(text);
        CHECK(si(text) == doctest::Approx(2 * 4.162314256e-7).epsilon(1e-15)); // 0.0254^4
        CHECK(dimension_of(text) == dimension::second_moment);
    }
    CHECK(dimension_of("20 MN/m3") == dimension::force_per_volume);
    CHECK(dimension_of("20 MN/m³") == dimension::force_per_volume);
    CHECK(dimension_of("5 kN/m/m") == dimension::stress);
    CHECK(dimension_of("5 kN / m / m") == dimension::stress);
    CHECK(dimension_of("2500 kg/m3") == dimension::density);
    CHECK(dimension_of("4 kN m2/m") == dimension::moment);
    for (const char* text :
         {"10e-6 /K", "10e-6 1/K", "10e-6 1 / K", "10e-6/K", "10e-6 K^-1", "10e-6 K⁻¹", "10e-6 /degC"}) {
        CAPTURE(text);
        CHECK(si(text) == 10e-6);
        CHECK(dimension_of(text) == dimension::expansion);
    }
}

TEST_CASE("fractions and bare numbers") {
    std::string error;
    const Quantity half = parse_quantity("50 %", error).value();
    CHECK(half.value == 0.5);
    CHECK(half.is_fraction);
    const Quantity span = parse_quantity("1/360", error).value();
    CHECK(span.value == 1.0 / 360);
    CHECK(span.is_fraction);
    const Quantity bare = parse_quantity("-12.5", error).value();
    CHECK(bare.value == -12.5);
    CHECK_FALSE(bare.has_unit);
    CHECK(si("+3 m") == 3);
    CHECK(si("  3   m ") == 3);
    CHECK(si(".5 m") == 0.5);
}

TEST_CASE("what cannot be read is refused with the way out") {
    const auto contains = [](const char* text) { return test::Contains{text}; };
    CHECK(error_of("5 kN/m mm") == contains("repeat the slash"));
    CHECK(error_of("5 kN/m*mm") == contains("repeat the slash"));
    CHECK(error_of("5 kN/(m m)") == contains("parentheses do not belong into a unit"));
    CHECK(error_of("5 KN") == "unknown unit 'KN': did you mean 'kN'?");
    CHECK(error_of("5 meter") == contains("unknown unit 'meter'"));
    CHECK(error_of("5 lbs") == "unknown unit 'lbs': did you mean 'lb' or 'lbf'?");
    CHECK(error_of("5 °C") == "unknown unit '°C': did you mean 'degC'?");
    CHECK(error_of("5 kips") == "unknown unit 'kips': did you mean 'kip'?");
    CHECK(error_of("5'") == "unknown unit ''': did you mean 'ft'?");
    CHECK(error_of("5 kN-m") == contains("units are multiplied by a space"));
    CHECK(error_of("5 kN.m") == contains("units are multiplied by a space"));
    CHECK(error_of("5 kN/") == "a unit is missing at the end of 'kN/'");
    CHECK(error_of("5 m^") == contains("a whole number must follow ^"));
    CHECK(error_of("5 m0") == contains("whole numbers from 1 to 9"));
    CHECK(error_of("5 m12") == contains("whole numbers from 1 to 9"));
    CHECK(error_of("5 m2.5") == contains("whole numbers from 1 to 9"));
    CHECK(error_of("5 m9 m9 m9") == contains("more than any quantity has"));
    CHECK(error_of("5 6 m") == contains("expected the name of a unit"));
    CHECK(error_of("5 1 m") == contains("a unit begins with a name"));
    CHECK(error_of("") == contains("the text is empty"));
    CHECK(error_of("kN") == contains("does not begin with a number"));
    CHECK(error_of("nan m") == contains("does not begin with a number"));
    CHECK(error_of("inf m") == contains("does not begin with a number"));
    CHECK(error_of("-inf m") == contains("does not begin with a number"));
    CHECK(error_of("−5 kN") == contains("typographic"));
    CHECK(error_of("1,5 m") == contains("decimal point"));
    CHECK(error_of("1_500 m") == contains("decimal point"));
    CHECK(error_of("1e999 m") == contains("beyond what a computer's number can hold"));
    CHECK(error_of("1e308 km") == contains("beyond what a computer's number can hold"));
    CHECK(error_of("1/0") == contains("a fraction is written as in"));
    CHECK(error_of("1/360 m") == contains("a fraction is written as in"));
}

TEST_CASE("a dimension that does not fit is told in words") {
    CHECK(mismatch(dimension::force_per_length, "3 m") == "expected a force per length, got a length");
    CHECK(mismatch(dimension::force, "5 kN/m") == "expected a force, got a force per length");
    CHECK(mismatch(dimension::length, "5 deg") == "expected a length, got an angle");
    CHECK(mismatch(dimension::angle, "5 m") == "expected an angle, got a length");
    CHECK(mismatch(dimension::length, "50 %") == "expected a length, got a fraction");
    CHECK(mismatch(dimension::force, "5 kg m3") == "expected a force, got a quantity in m^3 kg");
    // A pound is a mass; the force is the pound-force.
    CHECK(mismatch(dimension::force, "5 lb") == "expected a force, got a mass: did you mean lbf instead of lb?");
    CHECK(mismatch(dimension::stress, "5 lb/ft2") ==
          "expected a force per area, got a mass per area: did you mean lbf instead of lb?");
    CHECK(mismatch(dimension::force_per_length, "5 kg/m") == "expected a force per length, got a mass per length: give "
                                                             "the weight instead of the mass, 1 kg weighs 9.80665 N");
    CHECK(mismatch(dimension::length, "5 lb") == "expected a length, got a mass");
}
