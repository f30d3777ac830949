#pragma once
// Section properties of the usual shapes from their dimensions.
//
// Bending is about the strong axis, in the plane of the frame: depth is measured along the member's `across` axis.
// Sharp corners, except for the root radii of an I and of a channel.

#include <optional>
#include <string>

namespace groundsill {

/// A shape's name and its dimensions, m. What a shape does not use stays 0.
struct ShapeDimensions {
    std::string shape; ///< rectangle, circle, pipe, box, i, tee or channel
    double width = 0;
    double depth = 0;
    double diameter = 0;
    double wall = 0;
    double web = 0;
    double flange = 0;
    double root = 0; ///< radius of the fillets between web and flanges, of an i (four) or a channel (two)
};

/// What a section's dimensions give.
struct ShapeProperties {
    double A = 0;          ///< area, m2
    double I = 0;          ///< second moment of area for bending in the plane, m4
    double depth = 0;      ///< m
    double top = 0;        ///< from the centroid to the face at +across, m; a tee's flange is there
    double bottom = 0;     ///< from the centroid to the face at -across, m
    double shear_area = 0; ///< the usual one, m2: rectangle 5/6 A, circle 9/10 A, pipe A/2, all others depth x web
};

/// Properties of a shape, in closed form and without cancellation: exact to a few units in the last place, thin walls
/// included. \param error set to what is wrong and the way out when there is no result; untouched otherwise \return
/// nothing for an unknown shape, for a dimension that is not a number above 0, and for dimensions that do not fit
///         each other (a wall of half the depth, a web wider than its flange)
std::optional<ShapeProperties> section_of_shape(const ShapeDimensions& dimensions, std::string& error);

} // namespace groundsill
