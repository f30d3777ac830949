#include "elements/member_loads.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill::elements {

namespace {

struct Local {
    Real along = 0;
    Real across = 0;
};

/// The two components of a load in the segment's axes.
Local to_local(const MemberLoad& load, Real first, Real second, const SegmentPlace& place) {
    if (load.axes == MemberLoad::Axes::member) return {first, second};
    if (load.axes == MemberLoad::Axes::global_plan) {
        // per horizontal length for y, per vertical length for x
        first *= std::abs(place.sine);
        second *= std::abs(place.cosine);
    }
    return {first * place.cosine + second * place.sine, -first * place.sine + second * place.cosine};
}

void add_distributed(const MemberLoad& load, Real factor, const SegmentPlace& place, SegmentLoads& loads) {
    const Real a = std::max(Real(load.a), place.offset);
    const Real b = std::min(Real(load.b), place.offset + place.length);
    const Real span = Real(load.b) - load.a;
    if (!(b > a)) return;
    const auto at = [&](Real s, double from, double to) {
        return (from + (Real(to) - from) * ((s - load.a) / span)) * factor;
    };
    const Local start = to_local(load, at(a, load.first_a, load.first_b), at(a, load.second_a, load.second_b), place);
    const Local end = to_local(load, at(b, load.first_a, load.first_b), at(b, load.second_a, load.second_b), place);
    loads.lines.push_back({a - place.offset, b - place.offset, start.along, start.across, end.along, end.across});
}

void add_point(const MemberLoad& load, Real factor, const SegmentPlace& place, SegmentLoads& loads) {
    const Real near = Real(1e-12) * place.member_length;
    const Real s = load.a - place.offset;
    if (s < -near && place.offset > 0) return;
    if (place.is_last ? s > place.length + near * 1000 : s > place.length - near) return;
    const Local force = to_local(load, load.first_a, load.second_a, place);
    loads.points.push_back(
        {std::clamp(s, Real(0), place.length), force.along * factor, force.across * factor, load.moment * factor});
}

} // namespace

void add_load(const MemberLoad& load, Real factor, const SegmentPlace& place, SegmentLoads& loads) {
    switch (load.kind) {
    case MemberLoad::Kind::distributed:
        add_distributed(load, factor, place, loads);
        break;
    case MemberLoad::Kind::point:
        add_point(load, factor, place, loads);
        break;
    case MemberLoad::Kind::temperature: {
        Real mean = load.top;
        if (load.through_depth) {
            // linear between the faces: the mean part is the temperature at the centroid
            const Real gradient = (Real(load.top) - load.bottom) / place.depth;
            mean = load.bottom + gradient * place.bottom;
            loads.curvature -= factor * place.expansion * gradient;
        }
        loads.strain += factor * place.expansion * mean;
        break;
    }
    case MemberLoad::Kind::lack_of_fit:
        loads.strain += factor * load.amount / place.member_length;
        break;
    }
}

void add_self_weight(Real weight, const SegmentPlace& place, SegmentLoads& loads) {
    const Real p = -weight * place.sine;
    const Real q = -weight * place.cosine;
    loads.lines.push_back({0, place.length, p, q, p, q});
}

} // namespace groundsill::elements
