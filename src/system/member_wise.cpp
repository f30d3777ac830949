#include "system/member_wise.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill {

using elements::BasicForces;
using elements::Deformation;
using elements::FixedEnd;
using elements::State;

namespace {

/// Chord deformations from the differences between the ends and the rotations there.
Deformation deformation(const Segment& segment, Real dx, Real dy, Real rotation_i, Real rotation_j) {
    const elements::Frame& frame = segment.frame;
    const Real chord = (-frame.sine * dx + frame.cosine * dy) / frame.length;
    return {frame.cosine * dx + frame.sine * dy, chord - rotation_i, rotation_j - chord};
}

Deformation deformation(const Structure& structure, const Segment& segment, const std::vector<Real>& x) {
    const int i = 3 * segment.i, j = 3 * segment.j;
    const Vector from = to_global(structure.turned_axes(segment.i), x[i], x[i + 1]);
    const Vector to = to_global(structure.turned_axes(segment.j), x[j], x[j + 1]);
    return deformation(segment, to.x - from.x, to.y - from.y, x[i + 2], x[j + 2]);
}

Deformation deformation(const Structure& structure, const Segment& segment, const Movements& u) {
    // differences of the high parts first: they are large and nearly equal
    const Deformation high = deformation(structure, segment, u.high);
    const Deformation low = deformation(structure, segment, u.low);
    return {high.axial + low.axial, high.first + low.first, high.second + low.second};
}

/// a + b, or 0 where that is round-off of the two: a force that is not there stays exactly 0.
Real clean_sum(Real a, Real b) {
    const Real sum = a + b;
    return std::abs(sum) < Real(1e-16) * (std::abs(a) + std::abs(b)) ? Real(0) : sum;
}

/// Adds forces on a segment's ends to the directions of its nodes.
void scatter(const Structure& structure, const Segment& segment, const EndForces& f, Real factor,
             std::vector<Real>& values) {
    const Real c = segment.frame.cosine, s = segment.frame.sine;
    const Vector at_i =
        to_node(structure.turned_axes(segment.i), c * f.along_i - s * f.across_i, s * f.along_i + c * f.across_i);
    const Vector at_j =
        to_node(structure.turned_axes(segment.j), c * f.along_j - s * f.across_j, s * f.along_j + c * f.across_j);
    const int i = 3 * segment.i, j = 3 * segment.j;
    values[i] += factor * at_i.x;
    values[i + 1] += factor * at_i.y;
    values[i + 2] += factor * f.moment_i;
    values[j] += factor * at_j.x;
    values[j + 1] += factor * at_j.y;
    values[j + 2] += factor * f.moment_j;
}

Real largest(const EndForces& f, Real size) {
    return std::max({std::abs(f.along_i), std::abs(f.across_i), std::abs(f.along_j), std::abs(f.across_j),
                     std::abs(f.moment_i) / size, std::abs(f.moment_j) / size});
}

} // namespace

void Movements::add(int direction, Real value) {
    // Knuth's two-sum: what the rounded sum loses goes into the low part
    Real& a = high[direction];
    const Real sum = a + value;
    const Real part = sum - a;
    low[direction] += (a - (sum - part)) + (value - part);
    a = sum;
}

BasicForces basic_forces(const Structure& structure, const Segment& segment, const Movements& u) {
    return segment.stiffness * deformation(structure, segment, u);
}

EndForces end_forces(const BasicForces& q, const FixedEnd* fixed) {
    if (!fixed) return {-q.N, q.V, -q.M1, q.N, -q.V, q.M2};
    const Real N = clean_sum(q.N, fixed->q.N);
    return {-N,
            clean_sum(q.V, fixed->V_start),
            -clean_sum(q.M1, fixed->q.M1),
            clean_sum(N, -fixed->P),
            -clean_sum(q.V, fixed->V_end),
            clean_sum(q.M2, fixed->q.M2)};
}

State end_state(const Structure& structure, const Segment& segment, bool at_end, const Movements& u) {
    const int node = at_end ? segment.j : segment.i;
    const Vector g = to_global(structure.turned_axes(node), u.value(3 * node), u.value(3 * node + 1));
    State state;
    state.along = segment.frame.cosine * g.x + segment.frame.sine * g.y;
    state.across = -segment.frame.sine * g.x + segment.frame.cosine * g.y;
    state.rotation = u.value(3 * node + 2);
    return state;
}

std::vector<Real> residual(const Structure& structure, const LoadVector& loads, const Movements& u, Real& scale) {
    std::vector<Real> r = loads.nodal;
    scale = 0;
    for (int d = 0; d < structure.directions(); ++d) {
        scale = std::max(scale, std::abs(r[d]) / (d % 3 == 2 ? structure.size : Real(1)));
        if (structure.spring[d] != 0) r[d] -= structure.spring[d] * u.value(d);
    }
    for (std::size_t k = 0; k < structure.segments.size(); ++k) {
        const Segment& segment = structure.segments[k];
        const FixedEnd* fixed = loads.fixed.empty() ? nullptr : &loads.fixed[k];
        const EndForces f = end_forces(basic_forces(structure, segment, u), fixed);
        scale = std::max(scale, largest(f, structure.size));
        scatter(structure, segment, f, -1, r);
    }
    return r;
}

void apply_stiffness(const Structure& structure, const std::vector<Real>& x, std::vector<Real>& y) {
    for (int d = 0; d < structure.directions(); ++d)
        y[d] = structure.spring[d] == 0 ? Real(0) : structure.spring[d] * x[d];
    for (const Segment& segment : structure.segments) {
        const BasicForces q = segment.stiffness * deformation(structure, segment, x);
        scatter(structure, segment, end_forces(q, nullptr), 1, y);
    }
    for (int d = 0; d < structure.directions(); ++d)
        if (!structure.active[d]) y[d] = 0;
}

namespace {

/// qᵀ F q instead of qᵀ e: where a release lets e pass without force, round-off comes in squared.
Real work_of(const Segment& segment, const BasicForces& a, const BasicForces& b) {
    const elements::BendingFlexibility f = elements::end_moment_flexibility(segment.frame);
    const Real axial = segment.stiffness.axial == 0 ? Real(0) : a.N * b.N / segment.stiffness.axial;
    return axial + f.f11 * a.M1 * b.M1 + f.f12 * (a.M1 * b.M2 + a.M2 * b.M1) + f.f22 * a.M2 * b.M2;
}

} // namespace

Real strain_energy(const Segment& segment, const BasicForces& q) { return work_of(segment, q, q); }

Real strain_energy(const Structure& structure, const std::vector<Real>& x, const std::vector<Real>& y) {
    Real energy = 0;
    for (int d = 0; d < structure.directions(); ++d)
        if (structure.spring[d] != 0) energy += structure.spring[d] * x[d] * y[d];
    for (const Segment& segment : structure.segments)
        energy += work_of(segment, segment.stiffness * deformation(structure, segment, x),
                          segment.stiffness * deformation(structure, segment, y));
    return energy;
}

} // namespace groundsill
