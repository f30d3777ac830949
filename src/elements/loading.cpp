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

/// The end moments that free releases alone demand (the particular part of q).
Basic particular(const Frame& frame, const FixedEnd& simple) {
    Basic q;
    const bool start_shear = frame.start.shear.is_free();
    if (!start_shear && !frame.end.shear.is_free()) return q;
    // V = 0 at the free end: M2 - M1 = -V0 L, with the simply supported shear at that end
    const Real difference = -(start_shear ? simple.V0 : simple.VL) * frame.length;
    if (frame.start.moment.is_free()) {
        q.second = difference;
    } else if (frame.end.moment.is_free()) {
        q.first = -difference;
    } else {
        q.first = -difference / 2;
        q.second = difference / 2;
    }
    return q;
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
    fixed.V0 = start.V;
    fixed.VL = state.V + loading.end_Q;

    if (frame.end.axial.is_free()) {
        fixed.q.axial = fixed.P;
    } else if (!frame.start.axial.is_free()) {
        // 0 = f N + ∫ N0/EA + ε0 L - P/k at the end: no elongation between the nodes
        fixed.q.axial = (fixed.P * flexibility_of(frame.end.axial) - work.stretch) / elongation_flexibility(frame);
    }

    const Real slips = (flexibility_of(frame.start.shear) * fixed.V0 + flexibility_of(frame.end.shear) * fixed.VL) / frame.length;
    const Basic p = particular(frame, fixed);
    const BendingFlexibility f = end_moment_flexibility(frame);
    const BendingSpace space = bending_space(frame);
    // e = F (p + Z r) + e0 = 0, seen by the forces that can pass
    const Real gap1 = work.first - slips + f.f11 * p.first + f.f12 * p.second;
    const Real gap2 = work.second + slips + f.f12 * p.first + f.f22 * p.second;
    fixed.q.first = p.first;
    fixed.q.second = p.second;
    if (space.count == 0) return fixed;
    const BasicStiffness k = basic_stiffness(frame);
    fixed.q.first -= k.k11 * gap1 + k.k12 * gap2;
    fixed.q.second -= k.k12 * gap1 + k.k22 * gap2;
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

    // What the attached connections say of the segment's own ends; a free one says nothing.
    const Real across_i = node_i.across - start.V * flexibility_of(frame.start.shear);
    const Real across_j = node_j.across + free_end.V * flexibility_of(frame.end.shear);
    const bool start_held = !frame.start.shear.is_free();
    const bool end_held = !frame.end.shear.is_free();
    if (start_held && end_held) {
        start.across = across_i;
        start.rotation = (across_j - across_i - free_end.across) / L;
        return;
    }
    if (!frame.start.moment.is_free()) {
        start.rotation = node_i.rotation + start.M * flexibility_of(frame.start.moment);
    } else {
        start.rotation = node_j.rotation - free_end.M * flexibility_of(frame.end.moment) - free_end.rotation;
    }
    start.across = start_held ? across_i : across_j - free_end.across - start.rotation * L;
}

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
        piece.N = {d(at.N), d(-load.p0), d(-load.p1 / 2)};
        piece.V = {d(at.V), d(q0), d(q1 / 2)};
        piece.M = {d(at.M), d(at.V), d(q0 / 2), d(q1 / 6)};
        piece.along = {d(at.along), d(at.N * a + loading.strain), d(-load.p0 * a / 2), d(-load.p1 * a / 6)};
        piece.across = {d(at.across),
                        d(at.rotation - at.V * g),
                        d((at.M * f + loading.curvature - q0 * g) / 2),
                        d((at.V * f - q1 * g) / 6),
                        d(q0 * f / 24),
                        d(q1 * f / 120)};
        pieces.push_back(piece);
        state = advance(frame, loading, load, at, load.to - load.from);
    }
}

} // namespace groundsill::elements
