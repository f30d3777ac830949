#pragma once
// Rolled steel sections by their names: EN 10365 (IPE, HE, UB, UC, PFC, UPE) and ASTM A6 (W).

#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "model/shapes.hpp"

namespace groundsill {

/// A rolled section as the standard gives it, in the units of its series.
struct Designation {
    std::string_view name; ///< "IPE 300", "HE 200 A", "UB 457x191x67", "W12x26"
    double depth = 0;
    double width = 0;
    double web = 0;
    double flange = 0;
    double root = 0;        ///< radius between web and flange
    double tabulated_A = 0; ///< what the standard's table says: for checks only, see section_of_designation
    double tabulated_I = 0;
};

/// Sections of one kind in one standard.
struct DesignationSeries {
    std::string_view letters;  ///< that its names have in common, as they are looked up: "IPE", "HEA", "W"
    std::string_view standard; ///< "EN 10365" or "ASTM A6"
    std::string_view title;    ///< "European I-beams"
    const char* shape;         ///< "i" or "channel"
    bool in_inches;            ///< dimensions in inches, A in in2, I in in4; otherwise mm, cm2, cm4
    std::span<const Designation> rows;
};

/// All series, in the order in which they are listed.
std::span<const DesignationSeries> designation_series();

/// The series that a designation of the tables belongs to.
/// \pre the designation is one of the tables' rows, not a copy
const DesignationSeries& series_of_designation(const Designation& designation);

/// The section of this name; null when there is none. Case, spaces and the signs x, X, ×, * and - do not matter;
/// "HEA 200" is "HE 200 A", and the letters may follow the numbers ("457x191x67 UB").
const Designation* find_designation(std::string_view name);

/// Up to three names that an unknown one may have meant, the most likely first.
std::vector<std::string> nearest_designations(std::string_view name);

/// All sections whose name contains the pattern, spelt as freely as in find_designation; all there are for an empty
/// one. In the order of the tables.
std::vector<const Designation*> matching_designations(std::string_view pattern);

/// Properties computed from the nominal dimensions, root radii included; shear area depth x web. They agree with the
/// tabulated area and second moment within 1 % (EN 10365: within 0.5 %).
ShapeProperties section_of_designation(const Designation& designation);

} // namespace groundsill
