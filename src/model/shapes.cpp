#include "model/shapes.hpp"

#include <cmath>
#include <initializer_list>
#include <numbers>
#include <utility>
#include <vector>

namespace groundsill {
namespace {

using std::numbers::pi;

double square(double value) { return value * value; }

/// b h^3 / 12
double rectangle_second_moment(double b, double h) { return b * h * h * h / 12; }

ShapeProperties symmetric(double A, double I, double depth, double shear_area) {
    return {A, I, depth, depth / 2, depth / 2, shear_area};
}

ShapeProperties rectangle(const ShapeDimensions& d) {
    const double A = d.width * d.depth;
    return symmetric(A, rectangle_second_moment(d.width, d.depth), d.depth, A * 5 / 6);
}

ShapeProperties circle(const ShapeDimensions& d) {
    const double A = pi * square(d.diameter) / 4;
    return symmetric(A, A * square(d.diameter) / 16, d.diameter, A * 9 / 10);
}

/// A = pi t (D - t) and I = A (D^2 + d^2)/16 do not subtract nearly equal numbers, however thin the wall is.
ShapeProperties pipe(const ShapeDimensions& d) {
    const double A = pi * d.wall * (d.diameter - d.wall);
    const double inner = d.diameter - 2 * d.wall;
    return symmetric(A, A * (square(d.diameter) + square(inner)) / 16, d.diameter, A / 2);
}

/// Two equal flanges b x tf at the faces and a web tw between them, without fillets.
ShapeProperties two_flanges(double h, double b, double tw, double tf) {
    const double clear = h - 2 * tf;
    const double A = 2 * b * tf + tw * clear;
    const double I =
        2 * (rectangle_second_moment(b, tf) + b * tf * square((h - tf) / 2)) + rectangle_second_moment(tw, clear);
    return symmetric(A, I, h, h * tw);
}

ShapeProperties box(const ShapeDimensions& d) { return two_flanges(d.depth, d.width, 2 * d.wall, d.wall); }

/// Adds the fillets of radius r in the corners between web and flanges. Each is a square r x r less a quarter circle:
/// area (1 - pi/4) r^2, its centroid r (10 - 3 pi)/(12 - 3 pi) from the corner, its own second moment
/// r^4 (1/3 - pi/16 - 1/(9 (4 - pi))). Elementary geometry.
ShapeProperties with_fillets(ShapeProperties section, const ShapeDimensions& d, int count) {
    const double r = d.root;
    const double area = (1 - pi / 4) * r * r;
    const double from_corner = r * (10 - 3 * pi) / (12 - 3 * pi);
    const double own = square(r * r) * (1.0 / 3 - pi / 16 - 1 / (9 * (4 - pi)));
    section.A += count * area;
    section.I += count * (own + area * square(d.depth / 2 - d.flange - from_corner));
    return section;
}

ShapeProperties i_shape(const ShapeDimensions& d) {
    return with_fillets(two_flanges(d.depth, d.width, d.web, d.flange), d, 4);
}

ShapeProperties channel(const ShapeDimensions& d) {
    return with_fillets(two_flanges(d.depth, d.width, d.web, d.flange), d, 2);
}

ShapeProperties tee(const ShapeDimensions& d) {
    const double stem = d.depth - d.flange;
    const double flange_area = d.width * d.flange;
    const double stem_area = d.web * stem;
    const double A = flange_area + stem_area;
    // The centroids of flange and stem are depth/2 apart; the common one divides that distance by the areas.
    const double below_flange_centroid = d.depth / 2 * stem_area / A;
    const double I = rectangle_second_moment(d.width, d.flange) + rectangle_second_moment(d.web, stem) +
                     flange_area * (stem_area / A) * square(d.depth / 2);
    const double top = d.flange / 2 + below_flange_centroid;
    return {A, I, d.depth, top, d.depth - top, d.depth * d.web};
}

/// One thing that must hold between dimensions, and what to say when it does not.
using Rule = std::pair<bool, const char*>;

bool fits(std::initializer_list<Rule> rules, std::string& error) {
    for (const auto& [holds, otherwise] : rules) {
        if (!holds) {
            error = otherwise;
            return false;
        }
    }
    return true;
}

bool pipe_fits(const ShapeDimensions& d, std::string& error) {
    return fits(
        {{2 * d.wall < d.diameter, "the wall of a pipe must be thinner than half its diameter: make wall smaller, or "
                                   "take shape = \"circle\" for a solid bar"}},
        error);
}

bool box_fits(const ShapeDimensions& d, std::string& error) {
    const char* hint =
        "the wall of a box must be thinner than half its width and half its depth: make wall smaller, or "
        "take shape = \"rectangle\" for a solid bar";
    return fits({{2 * d.wall < d.width, hint}, {2 * d.wall < d.depth, hint}}, error);
}

bool tee_fits(const ShapeDimensions& d, std::string& error) {
    return fits(
        {{d.flange < d.depth, "the flange of a tee must be thinner than its whole depth: make flange smaller, or "
                              "depth (flange included) larger"},
         {d.web <= d.width, "the web of a tee cannot be wider than its flange: exchange or correct web and width"}},
        error);
}

/// The rules of an i and of a channel; their fillets have to fit between the flanges and on the flange beside the web.
/// \param web_sides how many sides of the web have fillets
bool flanged_fits(const ShapeDimensions& d, int web_sides, std::string& error) {
    return fits(
        {{2 * d.flange < d.depth, "each flange must be thinner than half the depth: make flange smaller, or depth "
                                  "(over both flanges) larger"},
         {d.web <= d.width, "the web cannot be wider than the flanges: exchange or correct web and width"},
         {d.root >= 0, "root, the radius between web and flange, cannot be below 0: leave it out for sharp corners"},
         {2 * d.root <= d.depth - 2 * d.flange && web_sides * d.root <= d.width - d.web,
          "root, the radius between web and flange, does not fit between the flanges: make it smaller"}},
        error);
}

bool i_fits(const ShapeDimensions& d, std::string& error) { return flanged_fits(d, 2, error); }

bool channel_fits(const ShapeDimensions& d, std::string& error) { return flanged_fits(d, 1, error); }

/// A dimension by the name that the model file gives it.
struct NamedDimension {
    const char* name;
    double ShapeDimensions::*value;
};

bool anything_fits(const ShapeDimensions& /*dimensions*/, std::string& /*error*/) { return true; }

struct Shape {
    const char* name;
    std::vector<NamedDimension> needs;
    bool (*fits)(const ShapeDimensions&, std::string&);
    ShapeProperties (*properties)(const ShapeDimensions&);
};

constexpr NamedDimension width{"width", &ShapeDimensions::width};
constexpr NamedDimension depth{"depth", &ShapeDimensions::depth};
constexpr NamedDimension diameter{"diameter", &ShapeDimensions::diameter};
constexpr NamedDimension wall{"wall", &ShapeDimensions::wall};
constexpr NamedDimension web{"web", &ShapeDimensions::web};
constexpr NamedDimension flange{"flange", &ShapeDimensions::flange};

const std::vector<Shape>& shapes() {
    static const std::vector<Shape> all = {{"rectangle", {width, depth}, anything_fits, rectangle},
                                           {"circle", {diameter}, anything_fits, circle},
                                           {"pipe", {diameter, wall}, pipe_fits, pipe},
                                           {"box", {width, depth, wall}, box_fits, box},
                                           {"i", {depth, width, web, flange}, i_fits, i_shape},
                                           {"tee", {depth, width, web, flange}, tee_fits, tee},
                                           {"channel", {depth, width, web, flange}, channel_fits, channel}};
    return all;
}

bool all_above_zero(const Shape& shape, const ShapeDimensions& d, std::string& error) {
    for (const auto& dimension : shape.needs) {
        const double value = d.*dimension.value;
        if (!(value > 0) || !std::isfinite(value)) {
            error = std::string("the ") + dimension.name + " of a section of shape \"" + shape.name +
                    "\" must be a length above 0";
            return false;
        }
    }
    return true;
}

/// Dimensions far beyond any structure would overflow or vanish in the second moment.
bool representable(const ShapeProperties& section) {
    return std::isnormal(section.A) && std::isnormal(section.I) && std::isnormal(section.shear_area);
}

} // namespace

std::optional<ShapeProperties> section_of_shape(const ShapeDimensions& dimensions, std::string& error) {
    for (const Shape& shape : shapes()) {
        if (dimensions.shape != shape.name) continue;
        if (!all_above_zero(shape, dimensions, error) || !shape.fits(dimensions, error)) return std::nullopt;
        const ShapeProperties section = shape.properties(dimensions);
        if (representable(section)) return section;
        error = "these dimensions are beyond what can be computed: check their units";
        return std::nullopt;
    }
    error = "there is no shape \"" + dimensions.shape + "\": take rectangle, circle, pipe, box, i, tee or channel";
    return std::nullopt;
}

} // namespace groundsill
