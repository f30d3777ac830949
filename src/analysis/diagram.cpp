#include "groundsill/diagram.hpp"

#include <algorithm>
#include <cmath>

#include "analysis/polynomial.hpp"

namespace groundsill {

namespace {

/// Places closer than this part of the member's length count as one.
constexpr double same_place = 1e-9;

DiagramPlace place_on(const DiagramPiece& piece, double s) {
    const double t = std::clamp(s - piece.from, 0.0, piece.to - piece.from);
    return {s,
            {clean_value_of(piece.N, t), clean_value_of(piece.V, t), clean_value_of(piece.M, t)},
            clean_value_of(piece.along, t),
            clean_value_of(piece.across, t)};
}

/// The places at which a function can have its extremes are offered from left to right; the first of equal ones is
/// kept.
struct Search {
    DiagramRange range;
    double tolerance = 0;
    bool any = false;

    void offer(double value, double at) {
        if (!any) range.max = range.min = {value, at};
        any = true;
        if (value > range.max.value + tolerance) range.max = {value, at};
        if (value < range.min.value - tolerance) range.min = {value, at};
    }

    template <std::size_t Size> void offer(const std::array<double, Size>& function, const DiagramPiece& piece) {
        const double span = piece.to - piece.from;
        offer(function[0], piece.from);
        const auto turns = roots_inside(derivative_of(function), span);
        for (std::size_t k = 0; k < turns.count; ++k)
            offer(clean_value_of(function, turns.values[k]), piece.from + turns.values[k]);
        offer(clean_value_of(function, span), piece.to);
    }
};

} // namespace

DiagramPlace Diagram::value(double s) const {
    const double near = same_place * length;
    auto piece = pieces.begin();
    while (std::next(piece) != pieces.end() && std::next(piece)->from <= s + near) ++piece;
    return place_on(*piece, s);
}

DiagramPlace Diagram::value_before(double s) const {
    const double near = same_place * length;
    auto piece = pieces.begin();
    while (std::next(piece) != pieces.end() && piece->to < s - near) ++piece;
    return place_on(*piece, s);
}

std::vector<DiagramPlace> Diagram::places(int parts) const {
    const double near = same_place * length;
    std::vector<DiagramPlace> listed;
    std::size_t next = 1; // the piece whose start is looked at next
    // lists the jumps up to s; true when there is one at s itself
    const auto list_jumps = [&](double s) {
        bool at_s = false;
        for (; next < pieces.size() && pieces[next].from <= s + near; ++next) {
            if (!pieces[next].jump) continue;
            const bool here = pieces[next].from >= s - near;
            listed.push_back(place_on(pieces[next - 1], pieces[next - 1].to));
            listed.push_back(place_on(pieces[next], pieces[next].from));
            if (here) listed.back().at = (listed.end() - 2)->at = s;
            at_s = at_s || here;
        }
        return at_s;
    };
    for (int k = 0; k <= parts; ++k) {
        const double s = k == parts ? length : length * k / parts;
        if (!list_jumps(s)) listed.push_back(k == parts ? value_before(s) : value(s));
    }
    return listed;
}

DiagramRange Diagram::extremes(Curve curve, double tolerance) const {
    Search search;
    search.tolerance = tolerance;
    for (const DiagramPiece& piece : pieces) {
        switch (curve) {
        case Curve::N:
            search.offer(piece.N, piece);
            break;
        case Curve::V:
            search.offer(piece.V, piece);
            break;
        case Curve::M:
            search.offer(piece.M, piece);
            break;
        case Curve::across:
            search.offer(piece.across, piece);
            break;
        }
    }
    return search.range;
}

} // namespace groundsill
