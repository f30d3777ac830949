// Rolled sections by name. Sources: tables of EN 10365:2017 and of ASTM A6 (AISC Steel Construction Manual, table 1-1),
// from memory; they stand beside each row.

#include <algorithm>
#include <cmath>
#include <cstdlib>
#include <set>
#include <string>
#include <vector>

#include <doctest/doctest.h>

#include "model/designations.hpp"

using namespace groundsill;

namespace {

std::string found(std::string_view name) {
    const Designation* designation = find_designation(name);
    return designation ? std::string(designation->name) : "none";
}

/// The mass per metre (kg/m) or foot (lb/ft) that stands last in a name, 0 where the name has only a size.
double mass_in_name(std::string_view name) {
    const std::size_t last = name.rfind('x');
    return last == std::string_view::npos ? 0 : std::strtod(std::string(name.substr(last + 1)).c_str(), nullptr);
}

} // namespace

TEST_CASE("every row agrees with its tabulated area and second moment within 1 %") {
    int rows = 0;
    for (const DesignationSeries& series : designation_series()) {
        const double unit = series.in_inches ? 0.0254 : 0.01;
        for (const Designation& row : series.rows) {
            CAPTURE(row.name);
            const ShapeProperties section = section_of_designation(row);
            CHECK(std::abs(section.A / (unit * unit) / row.tabulated_A - 1) < 0.01);
            CHECK(std::abs(section.I / std::pow(unit, 4) / row.tabulated_I - 1) < 0.01);
            ++rows;
        }
    }
    CHECK(rows > 400);
}

TEST_CASE("a name that gives its mass agrees with the tabulated area within 4 % or half a unit") {
    // Steel weighs 7850 kg/m3 (EN 10365) or 490 lb/ft3 (ASTM A6); the names are rounded to whole units.
    int named = 0;
    for (const DesignationSeries& series : designation_series()) {
        for (const Designation& row : series.rows) {
            const double mass = mass_in_name(row.name);
            if (mass == 0) continue;
            CAPTURE(row.name);
            const double from_area = row.tabulated_A * (series.in_inches ? 490.0 / 144 : 0.785);
            CHECK(std::abs(from_area - mass) < std::max(0.5, 0.04 * mass));
            ++named;
        }
    }
    CHECK(named > 250);
}

TEST_CASE("names are spelt freely") {
    for (const char* name : {"IPE 300", "IPE300", "ipe 300", " Ipe-300 ", "ipe_300"}) CHECK(found(name) == "IPE 300");
    for (const char* name : {"HE 200 A", "HEA 200", "hea200", "HE200A", "HE A 200"}) CHECK(found(name) == "HE 200 A");
    CHECK(found("HEB 200") == "HE 200 B");
    CHECK(found("HEM200") == "HE 200 M");
    for (const char* name : {"W12x26", "w 12 x 26", "W 12 × 26", "W12X26", "W12*26"}) CHECK(found(name) == "W12x26");
    CHECK(found("W6x8.5") == "W6x8.5");
    for (const char* name : {"UB 457x191x67", "ub457X191X67", "457x191x67 UB", "457 × 191 × 67 UB"}) {
        CHECK(found(name) == "UB 457x191x67");
    }
    CHECK(found("UC 203x203x46") == "UC 203x203x46");
    CHECK(found("PFC 200x75x23") == "PFC 200x75x23");
}

TEST_CASE("what is no name is not found") {
    for (const char* name :
         {"", "IPE", "IPE 310", "300", "W12", "W12x27", "x", "×", "IPE 300 300", "\xff\xfe", "HE 200"}) {
        CHECK(found(name) == "none");
    }
}

TEST_CASE("every name finds its own row, and no two rows have the same name") {
    std::set<std::string_view> names;
    for (const DesignationSeries& series : designation_series()) {
        for (const Designation& row : series.rows) {
            CHECK(find_designation(row.name) == &row);
            CHECK(names.insert(row.name).second);
            CHECK(&series_of_designation(row) == &series);
        }
    }
}

TEST_CASE("an unknown name gets its neighbours") {
    using Names = std::vector<std::string>;
    CHECK(nearest_designations("IPE 310") == Names{"IPE 300", "IPE 330", "IPE 270"});
    CHECK(nearest_designations("W12x27").front() == "W12x26");
    CHECK(nearest_designations("HE 200") == Names{"HE 200 A", "HE 200 B", "HE 200 M"});
    CHECK(nearest_designations("IPN 200").front() == "IPE 200");
    CHECK(nearest_designations("UB 457x191x70").front() == "UB 457x191x67");
    CHECK(nearest_designations("steel beam").empty());
}

TEST_CASE("patterns") {
    const auto count = [](std::string_view pattern) { return matching_designations(pattern).size(); };
    CHECK(count("IPE") == 18);
    CHECK(count("ipe 3") == 3);
    CHECK(count("HE 200") == 3);
    CHECK(count("HEB") == 24);
    CHECK(count("nothing like it") == 0);
    CHECK(count("") > 400);
    CHECK(matching_designations("w12x26").front()->name == "W12x26");
}

TEST_CASE("section properties come in SI") {
    // IPE 300: A = 53.81 cm2, I = 8356 cm4 (EN 10365, from memory).
    const ShapeProperties ipe = section_of_designation(*find_designation("IPE 300"));
    CHECK(ipe.A == doctest::Approx(53.81e-4).epsilon(1e-4).scale(0));
    CHECK(ipe.I == doctest::Approx(8356e-8).epsilon(1e-4).scale(0));
    CHECK(ipe.shear_area == doctest::Approx(0.3 * 0.0071).epsilon(1e-12).scale(0));
    CHECK(ipe.depth == doctest::Approx(0.3).epsilon(1e-12).scale(0));
    CHECK(ipe.top == doctest::Approx(0.15).epsilon(1e-12).scale(0));
    // W12x26: d = 12.2 in, I = 204 in4 (AISC Manual, from memory).
    const ShapeProperties w = section_of_designation(*find_designation("W12x26"));
    CHECK(w.depth == doctest::Approx(12.2 * 0.0254).epsilon(1e-12).scale(0));
    CHECK(w.I == doctest::Approx(204 * std::pow(0.0254, 4)).epsilon(0.005).scale(0));
}
