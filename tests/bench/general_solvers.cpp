#include "general_solvers.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstdlib>

#include <Eigen/CholmodSupport>
#include <Eigen/OrderingMethods>
#include <Eigen/SparseCholesky>

#include <fmt/format.h>

extern "C" void dpbsv_(const char* uplo, const int* n, const int* kd, const int* nrhs, double* ab, const int* ldab,
                       double* b, const int* ldb, int* info);

namespace bench {

namespace {

constexpr int band = 5; // below the diagonal: two nodes of three directions

/// The textbook stiffness of a frame member in global axes.
std::array<double, 36> member_stiffness(const groundsill::Model& model, const groundsill::Member& member) {
    const groundsill::Node& i = model.nodes[member.from];
    const groundsill::Node& j = model.nodes[member.to];
    const double L = std::hypot(j.x - i.x, j.y - i.y);
    const double c = (j.x - i.x) / L, s = (j.y - i.y) / L;
    const double E = model.materials[member.material].E;
    const double a = E * model.sections[member.section].A / L;
    const double b = E * model.sections[member.section].I / (L * L * L);
    const double xx = a * c * c + 12 * b * s * s, xy = (a - 12 * b) * c * s, yy = a * s * s + 12 * b * c * c;
    const double xr = -6 * b * L * s, yr = 6 * b * L * c, near = 4 * b * L * L, far = 2 * b * L * L;
    return {xx,  xy,  xr,  -xx, -xy, xr,  xy,  yy,  yr,  -xy, -yy, yr,  xr, yr, near, -xr, -yr, far,
            -xx, -xy, -xr, xx,  xy,  -xr, -xy, -yy, -yr, xy,  yy,  -yr, xr, yr, far,  -xr, -yr, near};
}

/// Fixes a direction, or adds its spring.
void hold(const groundsill::Restraint& restraint, int direction, int size, Vector& AB) {
    const auto at = [&](int row, int column) -> double& { return AB[std::size_t(band + 1) * column + (row - column)]; };
    if (restraint.is_elastic()) at(direction, direction) += restraint.stiffness;
    if (!restraint.is_fixed()) return;
    for (int row = direction + 1; row <= std::min(direction + band, size - 1); ++row) at(row, direction) = 0;
    for (int column = std::max(0, direction - band); column < direction; ++column) at(direction, column) = 0;
    at(direction, direction) = 1;
}

} // namespace

void solve_band(const groundsill::Model& model, Vector& right_side) {
    const int n = static_cast<int>(right_side.size());
    Vector AB(std::size_t(band + 1) * n, 0.0);
    for (const groundsill::Member& member : model.members) {
        const std::array<double, 36> k = member_stiffness(model, member);
        const int first = 3 * member.from;
        for (int column = 0; column < 6; ++column)
            for (int row = column; row < 6; ++row)
                AB[std::size_t(band + 1) * (first + column) + (row - column)] += k[6 * row + column];
    }
    for (const groundsill::Support& support : model.supports) {
        hold(support.x, 3 * support.node, n, AB);
        hold(support.y, 3 * support.node + 1, n, AB);
        hold(support.rotation, 3 * support.node + 2, n, AB);
    }
    const int kd = band, rows = band + 1, one = 1;
    int info = 0;
    dpbsv_("L", &n, &kd, &one, AB.data(), &rows, right_side.data(), &n, &info);
    if (info != 0) {
        fmt::print(stderr, "dpbsv failed: {}\n", info);
        std::exit(1);
    }
}

Sparse lower_half(const groundsill::BlockMatrix& matrix) {
    std::vector<Eigen::Triplet<double>> entries;
    const auto add = [&](int row_node, int column_node, const groundsill::Block& block) {
        for (int row = 0; row < 3; ++row)
            for (int column = 0; column < 3; ++column) {
                const int r = 3 * row_node + row, c = 3 * column_node + column;
                if (row_node == column_node && r < c) continue;
                if (block[3 * row + column] != 0)
                    entries.emplace_back(std::max(r, c), std::min(r, c), block[3 * row + column]);
            }
    };
    for (int place = 0; place < matrix.size(); ++place) {
        add(matrix.node_at[place], matrix.node_at[place], matrix.diagonal[place]);
        for (int k = matrix.column_start[place]; k < matrix.column_start[place + 1]; ++k)
            add(matrix.node_at[matrix.rows[k]], matrix.node_at[place], matrix.blocks[k]);
    }
    Sparse lower(3 * matrix.size(), 3 * matrix.size());
    lower.setFromTriplets(entries.begin(), entries.end());
    return lower;
}

Vector solve_simplicial(const Sparse& lower, const Vector& right_side) {
    const int n = static_cast<int>(lower.rows());
    std::vector<Eigen::Triplet<double>> pairs;
    for (int column = 0; column < n; ++column)
        for (Sparse::InnerIterator entry(lower, column); entry; ++entry)
            if (entry.row() % 3 == 0 || column % 3 == 0) {
                const int a = static_cast<int>(entry.row()) / 3, b = column / 3;
                pairs.emplace_back(a, b, 1.0);
                pairs.emplace_back(b, a, 1.0);
            }
    Sparse nodes(n / 3, n / 3);
    nodes.setFromTriplets(pairs.begin(), pairs.end());
    Eigen::PermutationMatrix<Eigen::Dynamic, Eigen::Dynamic, int> of_nodes, order(n);
    Eigen::AMDOrdering<int>()(nodes, of_nodes);
    for (int k = 0; k < n; ++k) order.indices()[k] = 3 * of_nodes.indices()[k / 3] + k % 3;
    order = order.inverse().eval(); // AMD gives old from new, twistedBy takes new from old
    Sparse ordered(n, n);
    ordered.selfadjointView<Eigen::Lower>() = lower.selfadjointView<Eigen::Lower>().twistedBy(order);
    const Eigen::SimplicialLDLT<Sparse, Eigen::Lower, Eigen::NaturalOrdering<int>> factor(ordered);
    const Eigen::Map<const Eigen::VectorXd> f(right_side.data(), n);
    const Eigen::VectorXd x = order.inverse() * factor.solve(order * f);
    return {x.data(), x.data() + n};
}

Vector solve_supernodal(const Sparse& lower, const Vector& right_side) {
    const Eigen::CholmodSupernodalLLT<Sparse, Eigen::Lower> factor(lower);
    const Eigen::Map<const Eigen::VectorXd> f(right_side.data(), lower.rows());
    const Eigen::VectorXd x = factor.solve(f);
    return {x.data(), x.data() + x.size()};
}

} // namespace bench
