#include "elements/loading.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill::elements {

namespace {

/// Fills in pieces between the places where the loads change.
void make_pieces(const SegmentLoads& loads, Real length, Real near, std::vector<LoadPiece>& pieces) {
    pieces.assign(1, LoadPiece{.from = 0, .to = length});
    const auto inside = [&](Real place) { return place > near && place < length - near; };
    std::vector<Real> places;
    for (const LineLoad& line : loads.lines) {
        if (inside(line.a)) places.push_back(line.a);
        if (inside(line.b)) places.push_back(line.b);
    }
    for (const PointLoad& point : loads.points)
        if (inside(point.a)) places.push_back(point.a);
    std::sort(places.begin(), places.end());
    for (const Real place : places) {
        if (place <= pieces.back().from + near) continue;
        pieces.back().to = place;
        pieces.push_back({.from = place, .to = length});
    }
}

void add_line(const LineLoad& line, Real near, std::vector<LoadPiece>& pieces) {
    const Real span = line.b - line.a;
    if (!(span > near)) return;
    const Real slope_p = (line.pb - line.pa) / span;
    const Real slope_q = (line.qb - line.qa) / span;
    for (LoadPiece& piece : pieces) {
        const Real middle = (piece.from + piece.to) / 2;
        if (middle < line.a || middle > line.b) continue;
        piece.p0 += line.pa + slope_p * (piece.from - line.a);
        piece.q0 += line.qa + slope_q * (piece.from - line.a);
        piece.p1 += slope_p;
        piece.q1 += slope_q;
    }
}

void add_point(const PointLoad& point, Real length, Real near, Loading& loading) {
    if (point.a >= length - near) {
        loading.end_P += point.P;
        loading.end_Q += point.Q;
        loading.end_m += point.m;
        return;
    }
    for (LoadPiece& piece : loading.pieces) {
        if (std::abs(piece.from - point.a) > near) continue;
        piece.P += point.P;
        piece.Q += point.Q;
        piece.m += point.m;
        return;
    }
}

/// The state just after the point loads at the start of a piece.
State after_jump(State state, const LoadPiece& piece) {
    state.N -= piece.P;
    state.V += piece.Q;
    state.M -= piece.m;
    return state;
}

/// The state at distance t into a piece; `at` is the state at its start, after the jump there.
State advance(const Frame& frame, const Loading& loading, const LoadPiece& piece, const State& at, Real t) {
    const Real p0 = piece.p0, p1 = piece.p1, q0 = piece.q0, q1 = piece.q1;
    State next;
    next.N = at.N - t * (p0 + t * p1 / 2);
    next.V = at.V + t * (q0 + t * q1 / 2);
    next.M = at.M + t * (at.V + t * (q0 / 2 + t * q1 / 6));
    const Real bend = t * (at.M + t * (at.V / 2 + t * (q0 / 6 + t * q1 / 24))) * frame.bending_flexibility;
    const Real bend2 = t * t * (at.M / 2 + t * (at.V / 6 + t * (q0 / 24 + t * q1 / 120))) * frame.bending_flexibility;
    const Real slide = t * (at.V + t * (q0 / 2 + t * q1 / 6)) * frame.shear_flexibility;
    next.rotation = at.rotation + loading.curvature * t + bend;
    next.across = at.across + at.rotation * t + loading.curvature * t * t / 2 + bend2 - slide;
    next.along = at.along + loading.strain * t + t * (at.N - t * (p0 / 2 + t * p1 / 6)) * frame.axial_flexibility;
    return next;
}

/// Bending work of the loads in the two virtual states, and the axial stretch they make.
struct LoadWork {
    Real first = 0, second = 0; ///< ∫ m (M0/EI + κ0) + ∫ v V0/GA for M1 = 1 and M2 = 1
    Real stretch = 0;           ///< ∫ N0/EA + ε0 L with the start axially free
};

/// Adds the work of one piece; `at` is the state at its start after the jump.
void add_work(const Frame& frame, const Loading& loading, const LoadPiece& piece, const State& at, LoadWork& work) {
    // Gauss-Legendre, three points: exact to degree 5; M0 times a linear function has degree 4.
    static const Real node = std::sqrt(Real(3) / 5);
    static const Real nodes[] = {-node, 0, node};
    static const Real weights[] = {Real(5) / 18, Real(8) / 18, Real(5) / 18};
    const Real L = frame.length;
    const Real span = piece.to - piece.from;
    for (int g = 0; g < 3; ++g) {
        const Real t = span * (1 + nodes[g]) / 2;
        const Real M = at.M + t * (at.V + t * (piece.q0 / 2 + t * piece.q1 / 6));
        const Real V = at.V + t * (piece.q0 + t * piece.q1 / 2);
        const Real N = at.N - t * (piece.p0 + t * piece.p1 / 2);
        const Real ratio = (piece.from + t) / L;
        const Real bend = (M * frame.bending_flexibility + loading.curvature) * weights[g] * span;
        const Real slide = V * frame.shear_flexibility / L * weights[g] * span;
        work.first += (1 - ratio) * bend - slide;
        work.second += ratio * bend + slide;
        work.stretch += (N * frame.axial_flexibility + loading.strain) * weights[g] * span;
    }
}

/// Shear at the start of the simply supported segment: the one for which the moment at the far end vanishes.
State simply_supported_start(const Frame& frame, const Loading& loading) {
    State start;
    const State end = integrate(frame, loading, start);
    start.V = -end.M / frame.length;
    return start;
}

/// Shear forces at the two ends of the simply supported segment.
struct Shears {
    Real start = 0;
    Real end = 0;
};

/// The end moments that free releases alone demand (the particular part of q).
BasicForces particular(const Frame& frame, const Shears& simple) {
    BasicForces q;
    const bool start_shear = frame.start.shear.is_free();
    if (!start_shear && !frame.end.shear.is_free()) return q;
    // V = 0 at the free end: M2 - M1 = -V0 L, with the simply supported shear at that end
    const Real difference = -(start_shear ? simple.start : simple.end) * frame.length;
    if (frame.start.moment.is_free()) {
        q.M2 = difference;
    } else if (frame.end.moment.is_free()) {
        q.M1 = -difference;
    } else {
        q.M1 = -difference / 2;
        q.M2 = difference / 2;
    }
    return q;
}

/// Fixed-end moments: e = F (p + Z r) + e0 = 0, seen by the moments that can pass.
void set_moments(const Frame& frame, const Shears& simple, const LoadWork& work, FixedEnd& fixed) {
    const Real slips =
        (flexibility_of(frame.start.shear) * simple.start + flexibility_of(frame.end.shear) * simple.end) /
        frame.length;
    const BasicForces p = particular(frame, simple);
    const BendingFlexibility f = end_moment_flexibility(frame);
    const Real gap1 = work.first - slips + f.f11 * p.M1 + f.f12 * p.M2;
    const Real gap2 = work.second + slips + f.f12 * p.M1 + f.f22 * p.M2;
    const BasicStiffness k = basic_stiffness(frame);
    fixed.q.M1 = p.M1 - (k.k11 * gap1 + k.k12 * gap2);
    fixed.q.M2 = p.M2 - (k.k12 * gap1 + k.k22 * gap2);
}

/// Fixed-end shears. Where a shear passes between the ends it is found from the movement that it must undo, not as a
/// difference of moments: with a soft shear release it is small beside them.
void set_shears(const Frame& frame, const Shears& simple, const LoadWork& work, FixedEnd& fixed) {
    const Real total = simple.end - simple.start; // all loads across
    if (frame.start.shear.is_free() || frame.end.shear.is_free()) {
        fixed.V_start = frame.start.shear.is_free() ? Real(0) : -total;
        fixed.V_end = frame.end.shear.is_free() ? Real(0) : total;
        return;
    }
    const ShearPath path = shear_path(frame);
    if (!path.passes) {
        fixed.V_start = simple.start;
        fixed.V_end = simple.end;
        return;
    }
    // per L: bending (V - V0) + slips of both ends + the end rotations that the loads make = 0
    const Real turn = ((1 - path.share) * work.second - path.share * work.first) / frame.length;
    const Real squared = frame.length * frame.length;
    const Real slip_start = flexibility_of(frame.start.shear) / squared,
               slip_end = flexibility_of(frame.end.shear) / squared;
    fixed.V_start = (simple.start * path.bending - slip_end * total - turn) / path.flexibility;
    fixed.V_end = (simple.end * path.bending + slip_start * total - turn) / path.flexibility;
}

} // namespace

void SegmentLoads::clear() {
    lines.clear();
    points.clear();
    strain = 0;
    curvature = 0;
}

void cut(const SegmentLoads& loads, Real length, Loading& loading) {
    const Real near = Real(1e-12) * length;
    make_pieces(loads, length, near, loading.pieces);
    loading.end_P = loading.end_Q = loading.end_m = 0;
    loading.strain = loads.strain;
    loading.curvature = loads.curvature;
    for (const LineLoad& line : loads.lines) add_line(line, near, loading.pieces);
    for (const PointLoad& point : loads.points) add_point(point, length, near, loading);
}

State integrate(const Frame& frame, const Loading& loading, const State& start) {
    State state = start;
    for (const LoadPiece& piece : loading.pieces)
        state = advance(frame, loading, piece, after_jump(state, piece), piece.to - piece.from);
    state.N -= loading.end_P;
    state.V += loading.end_Q;
    state.M -= loading.end_m;
    return state;
}

FixedEnd fixed_end(const Frame& frame, const Loading& loading) {
    FixedEnd fixed;
    const State start = simply_supported_start(frame, loading);
    State state = start;
    LoadWork work;
    for (const LoadPiece& piece : loading.pieces) {
        state = after_jump(state, piece);
        add_work(frame, loading, piece, state, work);
        state = advance(frame, loading, piece, state, piece.to - piece.from);
    }
    fixed.P = loading.end_P - state.N;
    if (frame.end.axial.is_free()) {
        fixed.q.N = fixed.P;
    } else if (!frame.start.axial.is_free()) {
        // 0 = f N + ∫ N0/EA + ε0 L - P/k at the end: no elongation between the nodes
        fixed.q.N = (fixed.P * flexibility_of(frame.end.axial) - work.stretch) / elongation_flexibility(frame);
    }
    const Shears simple{start.V, state.V + loading.end_Q};
    set_moments(frame, simple, work, fixed);
    set_shears(frame, simple, work, fixed);
    return fixed;
}

void place_start(const Frame& frame, const Loading& loading, const State& node_i, const State& node_j, State& start) {
    start.along = start.across = start.rotation = 0;
    const State free_end = integrate(frame, loading, start);
    const Real L = frame.length;

    if (!frame.start.axial.is_free()) {
        start.along = node_i.along + start.N * flexibility_of(frame.start.axial);
    } else {
        start.along = node_j.along - free_end.N * flexibility_of(frame.end.axial) - free_end.along;
    }

    // What the attached connections say of the segment's own ends. A gap is force over stiffness, so that a soft spring
    // says little: its force is a small difference. Both shears place the segment unless one is far softer than the
    // segment itself.
    const Real soft = 10 * L * L * L * frame.bending_flexibility;
    const auto places = [&](const Restraint& restraint, Real limit) {
        return !restraint.is_free() && flexibility_of(restraint) <= limit;
    };
    const Real across_i = node_i.across - start.V * flexibility_of(frame.start.shear);
    const Real across_j = node_j.across + free_end.V * flexibility_of(frame.end.shear);
    const bool start_moment = places(frame.start.moment, soft / (L * L)),
               end_moment = places(frame.end.moment, soft / (L * L));
    const bool by_shears =
        (places(frame.start.shear, soft) && places(frame.end.shear, soft)) || !(start_moment || end_moment);
    if (by_shears && !frame.start.shear.is_free() && !frame.end.shear.is_free()) {
        start.across = across_i;
        start.rotation = (across_j - across_i - free_end.across) / L;
        return;
    }
    if (start_moment || (!end_moment && !frame.start.moment.is_free())) {
        start.rotation = node_i.rotation + start.M * flexibility_of(frame.start.moment);
    } else {
        start.rotation = node_j.rotation - free_end.M * flexibility_of(frame.end.moment) - free_end.rotation;
    }
    const bool by_start =
        !frame.start.shear.is_free() &&
        (frame.end.shear.is_free() || flexibility_of(frame.start.shear) <= flexibility_of(frame.end.shear));
    start.across = by_start ? across_i : across_j - free_end.across - start.rotation * L;
}

namespace {

/// a + b, or 0 where that is the rounding of two doubles: a temperature that is held bends and stretches nothing.
Real held_sum(Real a, Real b) {
    const Real sum = a + b;
    return std::abs(sum) < Real(4e-16) * (std::abs(a) + std::abs(b)) ? Real(0) : sum;
}

} // namespace

void append_diagram(const Frame& frame, const Loading& loading, const State& start, double offset,
                    std::vector<DiagramPiece>& pieces) {
    const auto d = [](Real value) { return static_cast<double>(value); };
    const Real a = frame.axial_flexibility, f = frame.bending_flexibility, g = frame.shear_flexibility;
    State state = start;
    for (const LoadPiece& load : loading.pieces) {
        const State at = after_jump(state, load);
        const Real q0 = load.q0, q1 = load.q1;
        DiagramPiece piece;
        piece.from = offset + d(load.from);
        piece.to = offset + d(load.to);
        piece.jump = load.P != 0 || load.Q != 0 || load.m != 0;
        piece.N = {d(at.N), d(-load.p0), d(-load.p1 / 2)};
        piece.V = {d(at.V), d(q0), d(q1 / 2)};
        piece.M = {d(at.M), d(at.V), d(q0 / 2), d(q1 / 6)};
        piece.along = {d(at.along), d(held_sum(at.N * a, loading.strain)), d(-load.p0 * a / 2), d(-load.p1 * a / 6)};
        piece.across = {d(at.across),
                        d(at.rotation - at.V * g),
                        d((held_sum(at.M * f, loading.curvature) - q0 * g) / 2),
                        d((at.V * f - q1 * g) / 6),
                        d(q0 * f / 24),
                        d(q1 * f / 120)};
        pieces.push_back(piece);
        state = advance(frame, loading, load, at, load.to - load.from);
    }
}

} // namespace groundsill::elements
