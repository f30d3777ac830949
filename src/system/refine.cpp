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

/// y = K x of the assembled matrix; both in the order of the matrix.
void multiply(const BlockMatrix& matrix, const std::vector<double>& x, std::vector<double>& y) {
    std::fill(y.begin(), y.end(), 0.0);
    for (int column = 0; column < matrix.size(); ++column) {
        const double* xc = &x[3 * std::size_t(column)];
        double* yc = &y[3 * std::size_t(column)];
        for (int i = 0; i < 3; ++i)
            for (int j = 0; j < 3; ++j) yc[i] += matrix.diagonal[column][3 * i + j] * xc[j];
        for (int k = matrix.column_start[column]; k < matrix.column_start[column + 1]; ++k) {
            const Block& block = matrix.blocks[k];
            const std::size_t row = 3 * std::size_t(matrix.rows[k]);
            for (int i = 0; i < 3; ++i)
                for (int j = 0; j < 3; ++j) {
                    y[row + i] += block[3 * i + j] * xc[j];
                    yc[j] += block[3 * i + j] * x[row + i];
                }
        }
    }
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

std::vector<Real> precondition(const Structure& structure, const Factor& factor, const SoftShapes& soft,
                               const std::vector<Real>& r) {
    std::vector<double> x(r.size());
    for (std::size_t d = 0; d < r.size(); ++d) x[d] = static_cast<double>(r[d]);
    factor.solve(x);
    std::vector<Real> z(x.begin(), x.end());
    clear_inactive(structure, z);
    // z += Σ v (vᵀ r)/(vᵀ K v)
    for (std::size_t k = 0; k < soft.shapes.size(); ++k) {
        const Real amount = dot(soft.shapes[k], r) / soft.energies[k];
        for (std::size_t d = 0; d < z.size(); ++d) z[d] += amount * soft.shapes[k][d];
    }
    return z;
}

Refined refine(const Structure& structure, const Factor& factor, const SoftShapes& soft, const LoadVector& loads,
               const Movements& given) {
    Refined best;
    best.u = given;
    Real scale = 0;
    std::vector<Real> r = residual(structure, loads, best.u, scale);
    clear_inactive(structure, r);
    Real missing = largest(structure, r);
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
    best.residual = scale > 0 ? static_cast<double>(missing / scale) : 0;
    return best;
}

double scaled_condition(const Structure& structure, const BlockMatrix& matrix, const Factor& factor, const SoftShapes& soft) {
    const std::size_t size = 3 * std::size_t(matrix.size());
    std::vector<double> root(size); // D^½, in the order of the matrix
    for (int place = 0; place < matrix.size(); ++place)
        for (int c = 0; c < 3; ++c) root[3 * std::size_t(place) + c] = std::sqrt(matrix.diagonal[place][4 * c]);
    std::vector<double> work(size);
    const double most = largest_eigenvalue(start_vector(size), [&](std::vector<double>& x) {
        for (std::size_t d = 0; d < size; ++d) x[d] /= root[d];
        multiply(matrix, x, work);
        for (std::size_t d = 0; d < size; ++d) x[d] = work[d] / root[d];
    });
    const double inverse_least = largest_eigenvalue(start_vector(size), [&](std::vector<double>& x) {
        std::vector<Real> r(size);
        for (std::size_t d = 0; d < size; ++d) r[3 * std::size_t(matrix.node_at[d / 3]) + d % 3] = root[d] * x[d];
        const std::vector<Real> z = precondition(structure, factor, soft, r);
        for (std::size_t d = 0; d < size; ++d) x[d] = root[d] * static_cast<double>(z[3 * std::size_t(matrix.node_at[d / 3]) + d % 3]);
    });
    return most * inverse_least;
}

} // namespace groundsill
