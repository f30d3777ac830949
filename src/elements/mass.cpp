#include "elements/mass.hpp"

#include <algorithm>

namespace groundsill::elements {

namespace {

/// Gauss-Legendre with five points, exact to degree 9: two cubic shapes times a linear mass make 7.
constexpr Real gauss_nodes[] = {-0.906179845938663992797627L, -0.538469310105683091036314L, 0,
                                0.538469310105683091036314L, 0.906179845938663992797627L};
constexpr Real gauss_weights[] = {0.118463442528094543757132L, 0.239314335249683234020646L, 0.284444444444444444444444L,
                                  0.239314335249683234020646L, 0.118463442528094543757132L};

/// The shapes of the six unit movements at one place.
struct Shapes {
    std::array<Real, 6> along{}, across{}, rotation{};
};

using Starts = std::array<State, 6>;

Starts unit_shapes(const Frame& frame, const BasicStiffness& stiffness) {
    Starts starts;
    for (int k = 0; k < 6; ++k) {
        State i, j;
        State& moved = k < 3 ? i : j;
        (k % 3 == 0 ? moved.along : k % 3 == 1 ? moved.across : moved.rotation) = 1;
        starts[k] = start_of_shape(frame, stiffness, i, j);
    }
    return starts;
}

Shapes shapes_at(const Frame& frame, const Starts& starts, Real s) {
    Shapes shapes;
    for (int k = 0; k < 6; ++k) {
        const State& at = starts[k];
        shapes.along[k] = at.along + s * at.N * frame.axial_flexibility;
        shapes.across[k] = at.across + s * (at.rotation - at.V * frame.shear_flexibility +
                                            s * (at.M / 2 + s * at.V / 6) * frame.bending_flexibility);
        shapes.rotation[k] = at.rotation + s * (at.M + s * at.V / 2) * frame.bending_flexibility;
    }
    return shapes;
}

/// Adds the mass dm at one place.
void add_mass(const Shapes& shapes, Real dm, EndMatrix& M) {
    for (int i = 0; i < 6; ++i) {
        for (int j = 0; j < 6; ++j)
            M[6 * i + j] +=
                static_cast<double>(dm * (shapes.along[i] * shapes.along[j] + shapes.across[i] * shapes.across[j]));
    }
}

} // namespace

State start_of_shape(const Frame& frame, const BasicStiffness& stiffness, const State& node_i, const State& node_j) {
    const Real chord = (node_j.across - node_i.across) / frame.length;
    const BasicForces q =
        stiffness * Deformation{node_j.along - node_i.along, chord - node_i.rotation, node_j.rotation - chord};
    State start;
    start.N = q.N;
    start.M = q.M1;
    start.V = q.V;
    Loading none;
    cut({}, frame.length, none);
    place_start(frame, none, node_i, node_j, start);
    return start;
}

EndMatrix consistent_mass(const Frame& frame, const BasicStiffness& stiffness, const SegmentMass& mass) {
    EndMatrix M{};
    const Starts starts = unit_shapes(frame, stiffness);
    for (const MassLine& line : mass.lines) {
        const Real span = line.b - line.a;
        for (int g = 0; g < 5; ++g) {
            const Real ratio = (1 + gauss_nodes[g]) / 2;
            const Real density = line.ma + (line.mb - line.ma) * ratio;
            add_mass(shapes_at(frame, starts, line.a + span * ratio), density * gauss_weights[g] * span, M);
        }
    }
    if (mass.rotary == 0) return M;
    for (int g = 0; g < 5; ++g) {
        const Shapes shapes = shapes_at(frame, starts, frame.length * (1 + gauss_nodes[g]) / 2);
        const Real inertia = mass.rotary * gauss_weights[g] * frame.length;
        for (int i = 0; i < 6; ++i)
            for (int j = 0; j < 6; ++j)
                M[6 * i + j] += static_cast<double>(inertia * shapes.rotation[i] * shapes.rotation[j]);
    }
    return M;
}

} // namespace groundsill::elements
