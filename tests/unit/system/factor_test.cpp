// The block factor: both back ends against a dense solution, pivots, inertia, held directions.

#include <doctest/doctest.h>

#include <Eigen/Dense>

#include <cmath>
#include <vector>

#include "groundsill/model.hpp"
#include "system/factor.hpp"

using namespace groundsill;

namespace {

void add_node(Model& model, double x, double y) {
    Node& node = model.nodes.emplace_back();
    node.x = x;
    node.y = y;
}

void join(Model& model, int from, int to) {
    Member& member = model.members.emplace_back();
    member.from = from;
    member.to = to;
    member.section = member.material = 0;
}

/// A plane grid of `bays` by `storeys` rigid joints 5 m x 3 m apart, its lowest joints fixed.
Model grid(int bays, int storeys) {
    Model model;
    model.materials.emplace_back().E = 210e9;
    Section& section = model.sections.emplace_back();
    section.A = 9e-3;
    section.I = 2e-4;
    const int width = bays + 1;
    for (int row = 0; row <= storeys; ++row)
        for (int column = 0; column <= bays; ++column) add_node(model, 5.0 * column, 3.0 * row);
    for (int row = 0; row <= storeys; ++row)
        for (int column = 0; column <= bays; ++column) {
            if (column < bays && row > 0) join(model, row * width + column, row * width + column + 1);
            if (row < storeys) join(model, row * width + column, (row + 1) * width + column);
        }
    for (int column = 0; column <= bays; ++column) {
        Support& support = model.supports.emplace_back();
        support.node = column;
        support.x = support.y = support.rotation = Restraint{};
    }
    return model;
}

Eigen::MatrixXd dense(const BlockMatrix& matrix) {
    Eigen::MatrixXd result(3 * matrix.size(), 3 * matrix.size());
    std::vector<double> x(result.rows()), y(x.size());
    for (Eigen::Index column = 0; column < result.cols(); ++column) {
        std::fill(x.begin(), x.end(), 0.0);
        x[column] = 1;
        multiply(matrix, x, y);
        result.col(column) = Eigen::Map<Eigen::VectorXd>(y.data(), result.rows());
    }
    return result;
}

double difference_from_dense(const BlockMatrix& matrix) {
    std::vector<double> x(3 * static_cast<std::size_t>(matrix.size()));
    for (std::size_t d = 0; d < x.size(); ++d) x[d] = std::sin(1.0 + static_cast<double>(d));
    const Eigen::VectorXd f = Eigen::Map<Eigen::VectorXd>(x.data(), static_cast<Eigen::Index>(x.size()));
    const Eigen::VectorXd expected = dense(matrix).ldlt().solve(f);
    Factor(matrix).solve(x);
    const Eigen::VectorXd got = Eigen::Map<Eigen::VectorXd>(x.data(), static_cast<Eigen::Index>(x.size()));
    return (got - expected).norm() / expected.norm();
}

} // namespace

TEST_CASE("a narrow structure is solved in a band") {
    const Model model = grid(2, 6);
    const BlockMatrix matrix = assemble(number_structure(model));
    CHECK(matrix.bandwidth <= widest_band);
    CHECK(difference_from_dense(matrix) < 1e-10);
}

TEST_CASE("a wide structure is solved with its fill alone") {
    const Model model = grid(14, 14);
    const BlockMatrix matrix = assemble(number_structure(model));
    CHECK(matrix.bandwidth > widest_band);
    CHECK(difference_from_dense(matrix) < 1e-10);
}

TEST_CASE("negative pivots count the eigenvalues below a shift") {
    for (const int size : {3, 14}) {
        const Model model = grid(size, size);
        const BlockMatrix matrix = assemble(number_structure(model));
        BlockMatrix unit = zeros_like(matrix);
        for (Block& block : unit.diagonal) block = {1, 0, 0, 0, 1, 0, 0, 0, 1};
        const Eigen::VectorXd values = Eigen::SelfAdjointEigenSolver<Eigen::MatrixXd>(dense(matrix)).eigenvalues();
        for (const Eigen::Index k : {Eigen::Index(3), values.size() / 2, values.size() - 2}) {
            const double shift = (values[k] + values[k + 1]) / 2;
            if (values[k + 1] - values[k] < 1e-6 * values[k]) continue;
            CHECK(Factor(shifted(matrix, shift, unit), false).negative_pivots() == k + 1);
        }
    }
}

TEST_CASE("a direction that nothing holds is held by the factor, and listed") {
    Model model = grid(1, 1);
    for (Support& support : model.supports) support.x.kind = support.rotation.kind = Restraint::Kind::free;
    const BlockMatrix matrix = assemble(number_structure(model));
    const Factor factor(matrix);
    REQUIRE(factor.held().size() == 1); // the frame can slide along x, and only that
    CHECK(factor.held()[0].direction % 3 == 0);
    CHECK(factor.held()[0].stiffness > 0);
}
