#include "system/mechanism.hpp"

#include <cmath>

#include <Eigen/Dense>

#include "system/conjugate_gradients.hpp"

namespace groundsill {

namespace {

using Matrix = Eigen::Matrix<Real, Eigen::Dynamic, Eigen::Dynamic>;

/// Most directions whose shapes are looked at one by one; the time grows with the square.
constexpr std::size_t most_shapes = 200;

/// The shape that forms when one held direction is moved and the others stay held: (K + S) v = s_j e_j, with S the
/// springs that the factor adds, refined member by member.
Shape held_shape(const Structure& structure, const Factor& factor, std::size_t index) {
    const auto& held = factor.held();
    const auto apply = [&](const Shape& p, Shape& Kp) {
        apply_stiffness(structure, p, Kp);
        for (const auto& spring : held) Kp[spring.direction] += spring.stiffness * p[spring.direction];
    };
    const auto invert = [&](const Shape& r) { return precondition(structure, factor, {}, r); };
    Shape v(structure.directions(), 0);
    const auto move = [&](Real alpha, const Shape& p) {
        for (std::size_t d = 0; d < v.size(); ++d) v[d] += alpha * p[d];
    };
    Shape Kv(v.size());
    for (int round = 0; round < 4; ++round) {
        apply(v, Kv);
        Shape r(v.size(), 0);
        r[held[index].direction] = held[index].stiffness;
        for (std::size_t d = 0; d < r.size(); ++d) r[d] -= Kv[d];
        conjugate_gradients(r, 6, apply, invert, move);
    }
    return v;
}

/// Diagonal of K by direction; a direction without any stiffness weighs as much as the spring that holds it.
Shape weights(const Structure& structure, const BlockMatrix& matrix, const Factor& factor) {
    Shape weight(structure.directions());
    for (int d = 0; d < structure.directions(); ++d) weight[d] = matrix.diagonal[matrix.place_of[d / 3]][4 * (d % 3)];
    for (const auto& spring : factor.held())
        if (!(weight[spring.direction] > 0)) weight[spring.direction] = spring.stiffness;
    return weight;
}

Real weighted(const Shape& weight, const Shape& x, const Shape& y) {
    Real sum = 0;
    for (std::size_t d = 0; d < x.size(); ++d) sum += weight[d] * x[d] * y[d];
    return sum;
}

Shape combined(const std::vector<Shape>& shapes, const Matrix& amounts, Eigen::Index column) {
    Shape sum(shapes[0].size(), 0);
    for (std::size_t k = 0; k < shapes.size(); ++k)
        for (std::size_t d = 0; d < sum.size(); ++d)
            sum[d] += amounts(static_cast<Eigen::Index>(k), column) * shapes[k][d];
    return sum;
}

/// Turns mechanisms into ones that are as local as can be: each moves one held direction by 1 that no other moves
/// (Gauss-Jordan with full pivoting over the held directions).
void separate(const Factor& factor, std::vector<Shape>& mechanisms) {
    std::vector<char> used(mechanisms.size(), 0);
    for (std::size_t round = 0; round < mechanisms.size(); ++round) {
        std::size_t best = 0;
        int direction = -1;
        Real most = 0;
        for (std::size_t m = 0; m < mechanisms.size(); ++m)
            for (const auto& held : factor.held())
                if (!used[m] && std::abs(mechanisms[m][held.direction]) > most) {
                    most = std::abs(mechanisms[m][held.direction]);
                    best = m;
                    direction = held.direction;
                }
        if (direction < 0) return;
        used[best] = 1;
        const Real pivot = mechanisms[best][direction];
        for (Real& value : mechanisms[best]) value /= pivot;
        for (std::size_t m = 0; m < mechanisms.size(); ++m) {
            const Real factor_m = mechanisms[m][direction];
            if (m == best || factor_m == 0) continue;
            for (std::size_t d = 0; d < mechanisms[m].size(); ++d) mechanisms[m][d] -= factor_m * mechanisms[best][d];
        }
    }
}

} // namespace

MechanismSearch find_mechanisms(const Structure& structure, const BlockMatrix& matrix, const Factor& factor) {
    MechanismSearch search;
    const std::size_t count = std::min(factor.held().size(), most_shapes);
    if (count == 0) return search;
    const Shape weight = weights(structure, matrix, factor);
    std::vector<Shape> shapes;
    for (std::size_t k = 0; k < count; ++k) {
        shapes.push_back(held_shape(structure, factor, k));
        const Real size = std::sqrt(weighted(weight, shapes[k], shapes[k]));
        for (Real& value : shapes[k]) value /= size;
    }
    // E c = λ D c: the softest combinations of the shapes
    const auto n = static_cast<Eigen::Index>(count);
    Matrix E(n, n), D(n, n);
    for (Eigen::Index i = 0; i < n; ++i)
        for (Eigen::Index j = 0; j <= i; ++j) {
            E(i, j) = E(j, i) = strain_energy(structure, shapes[i], shapes[j]);
            D(i, j) = D(j, i) = weighted(weight, shapes[i], shapes[j]);
        }
    const Eigen::GeneralizedSelfAdjointEigenSolver<Matrix> solver(E, D);
    for (Eigen::Index k = 0; k < n; ++k) {
        Shape shape = combined(shapes, solver.eigenvectors(), k);
        const Real energy = strain_energy(structure, shape, shape);
        if (energy < Real(1e-25) * weighted(weight, shape, shape)) {
            search.mechanisms.push_back(std::move(shape));
        } else {
            search.soft.shapes.push_back(std::move(shape));
            search.soft.energies.push_back(energy);
        }
    }
    separate(factor, search.mechanisms);
    return search;
}

} // namespace groundsill
