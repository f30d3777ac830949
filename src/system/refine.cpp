#include "system/refine.hpp"

#include <algorithm>
#include <cmath>

#include "system/conjugate_gradients.hpp"

namespace groundsill {

namespace {

Real largest(const Structure& structure, const std::vector<Real>& r) {
    Real most = 0;
    for (int d = 0; d < structure.directions(); ++d)
        most = std::max(most, std::abs(r[d]) / (d % 3 == 2 ? structure.size : Real(1)));
    return most;
}

void clear_inactive(const Structure& structure, std::vector<Real>& values) {
    for (int d = 0; d < structure.directions(); ++d)
        if (!structure.active[d]) values[d] = 0;
}

double norm(const std::vector<double>& x) {
    double sum = 0;
    for (const double value : x) sum += value * value;
    return std::sqrt(sum);
}

/// A start vector without symmetry, the same on every machine.
std::vector<double> start_vector(std::size_t size) {
    std::vector<double> x(size);
    unsigned state = 12345;
    for (double& value : x) {
        state = state * 1664525U + 1013904223U; // a linear congruential generator (Numerical Recipes)
        value = 0.5 + static_cast<double>(state >> 8) / (1U << 24);
    }
    return x;
}

/// Largest eigenvalue of a symmetric operator x -> A x by power iteration, to about 1 %.
template <class Operator> double largest_eigenvalue(std::vector<double> x, const Operator& apply) {
    double value = 0;
    for (int step = 0; step < 100; ++step) {
        const double length = norm(x);
        if (length == 0) return 0;
        for (double& entry : x) entry /= length;
        apply(x);
        const double next = norm(x);
        if (std::abs(next - value) < 1e-3 * next) return next;
        value = next;
    }
    return value;
}

} // namespace

std::vector<double> precondition(const Structure& structure, const Factor& factor, const SoftShapes& soft,
                                 std::vector<double> r) {
    // z += Σ v (vᵀ r)/(vᵀ K v)
    std::vector<Real> amounts(soft.shapes.size(), 0);
    for (std::size_t k = 0; k < amounts.size(); ++k)
        for (std::size_t d = 0; d < r.size(); ++d) amounts[k] += soft.shapes[k][d] * r[d] / soft.energies[k];
    factor.solve(r);
    for (int d = 0; d < structure.directions(); ++d)
        if (!structure.active[d]) r[d] = 0;
    for (std::size_t k = 0; k < amounts.size(); ++k)
        for (std::size_t d = 0; d < r.size(); ++d) r[d] += static_cast<double>(amounts[k] * soft.shapes[k][d]);
    return r;
}

std::vector<Real> precondition(const Structure& structure, const Factor& factor, const SoftShapes& soft,
                               const std::vector<Real>& r) {
    const std::vector<double> z = precondition(structure, factor, soft, std::vector<double>(r.begin(), r.end()));
    return {z.begin(), z.end()};
}

Refined refine(const Structure& structure, const Factor& factor, const SoftShapes& soft, const LoadVector& loads,
               const Movements& given) {
    Refined best;
    best.u = given;
    Real scale = 0;
    std::vector<Real> r = residual(structure, loads, best.u, scale);
    best.held = scale;
    clear_inactive(structure, r);
    Real missing = largest(structure, r);
    const Real held_scale = scale; // the forces while no free node has moved
    // 1e-18: about ten roundings of a long double; below it nothing more is to be won
    for (int round = 0; round < 20 && missing > Real(1e-18) * scale; ++round) {
        Movements u = best.u;
        conjugate_gradients(
            r, 8 + 2 * static_cast<int>(soft.shapes.size()),
            [&](const std::vector<Real>& p, std::vector<Real>& Kp) { apply_stiffness(structure, p, Kp); },
            [&](const std::vector<Real>& v) { return precondition(structure, factor, soft, v); },
            [&](Real alpha, const std::vector<Real>& p) {
                for (int d = 0; d < structure.directions(); ++d) u.add(d, alpha * p[d]);
            });
        std::vector<Real> next = residual(structure, loads, u, scale);
        clear_inactive(structure, next);
        const Real left = largest(structure, next);
        if (!(left < missing)) break;
        const bool stalled = left > missing / 2;
        missing = left;
        best.u = std::move(u);
        r = std::move(next);
        if (stalled) break;
    }
    // a determinate structure that settles is left without any force: round-off is measured against what it gave way to
    if (scale < Real(1e-15) * held_scale) scale = held_scale;
    // a structure that yields without force has only round-off left, which is no measure of itself
    const bool forces = scale > Real(1e-18) * best.held;
    best.residual = forces ? static_cast<double>(missing / scale) : 0;
    return best;
}

double scaled_condition(const Structure& structure, const BlockMatrix& matrix, const Factor& factor,
                        const SoftShapes& soft) {
    const std::size_t size = structure.directions();
    std::vector<double> root(size); // D^½
    for (std::size_t d = 0; d < size; ++d) root[d] = std::sqrt(matrix.diagonal[matrix.place_of[d / 3]][4 * (d % 3)]);
    std::vector<double> work(size);
    const double most = largest_eigenvalue(start_vector(size), [&](std::vector<double>& x) {
        for (std::size_t d = 0; d < size; ++d) x[d] /= root[d];
        multiply(matrix, x, work);
        for (std::size_t d = 0; d < size; ++d) x[d] = work[d] / root[d];
    });
    const double inverse_least = largest_eigenvalue(start_vector(size), [&](std::vector<double>& x) {
        for (std::size_t d = 0; d < size; ++d) x[d] *= root[d];
        x = precondition(structure, factor, soft, std::move(x));
        for (std::size_t d = 0; d < size; ++d) x[d] *= root[d];
    });
    return most * inverse_least;
}

} // namespace groundsill
