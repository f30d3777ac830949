#include "system/eigen_modes.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <stdexcept>

#include <Eigen/Dense>
#include <Spectra/SymGEigsShiftSolver.h>
#include <fmt/format.h>

namespace groundsill {

namespace {

/// Active directions of a structure, counted from 0.
std::vector<int> active_directions(const Structure& structure) {
    std::vector<int> directions;
    for (int d = 0; d < structure.directions(); ++d)
        if (structure.active[d]) directions.push_back(d);
    return directions;
}

/// A shift a little below 0, on the scale of the structure's own stiffness over mass.
double shift_below_zero(const BlockMatrix& K, const BlockMatrix& M) {
    double stiffness = 0, mass = 0;
    for (std::size_t k = 0; k < K.diagonal.size(); ++k)
        for (int c = 0; c < 2; ++c) {
            if (!(M.diagonal[k][4 * c] > 0)) continue;
            stiffness += K.diagonal[k][4 * c];
            mass += M.diagonal[k][4 * c];
        }
    return mass > 0 ? -1e-9 * stiffness / mass : 0;
}

Eigen::MatrixXd dense(const BlockMatrix& matrix, const std::vector<int>& directions, int all) {
    std::vector<int> number(all, -1);
    for (std::size_t k = 0; k < directions.size(); ++k) number[directions[k]] = static_cast<int>(k);
    const auto n = static_cast<Eigen::Index>(directions.size());
    Eigen::MatrixXd result = Eigen::MatrixXd::Zero(n, n);
    const auto put = [&](int row_place, int column_place, const Block& block) {
        for (int i = 0; i < 3; ++i)
            for (int j = 0; j < 3; ++j) {
                const int row = number[3 * matrix.node_at[row_place] + i],
                          column = number[3 * matrix.node_at[column_place] + j];
                if (row >= 0 && column >= 0) result(row, column) = result(column, row) = block[3 * i + j];
            }
    };
    for (int column = 0; column < matrix.size(); ++column) {
        put(column, column, matrix.diagonal[column]);
        for (int k = matrix.column_start[column]; k < matrix.column_start[column + 1]; ++k)
            put(matrix.rows[k], column, matrix.blocks[k]);
    }
    return result;
}

/// M x = μ (K - σ M) x with the second matrix positive definite: massless movements have μ = 0 and stand last.
EigenPairs dense_modes(const Structure& structure, const BlockMatrix& K, const BlockMatrix& M, int count,
                       double sigma) {
    const std::vector<int> directions = active_directions(structure);
    if (directions.empty()) return {};
    const Eigen::MatrixXd mass = dense(M, directions, structure.directions());
    const Eigen::MatrixXd stiffness = dense(K, directions, structure.directions()) - sigma * mass;
    // scaled to a diagonal of 1, so that units do not spoil the Cholesky factor
    const Eigen::VectorXd scale = stiffness.diagonal().cwiseSqrt().cwiseInverse();
    const Eigen::GeneralizedSelfAdjointEigenSolver<Eigen::MatrixXd> solver(
        scale.asDiagonal() * mass * scale.asDiagonal(), scale.asDiagonal() * stiffness * scale.asDiagonal());
    if (solver.info() != Eigen::Success) throw std::runtime_error("the natural frequencies did not converge");
    EigenPairs pairs;
    const Eigen::Index n = mass.rows();
    const double largest = solver.eigenvalues()[n - 1];
    for (Eigen::Index k = n - 1; k >= 0 && static_cast<int>(pairs.values.size()) < count; --k) {
        const double mu = solver.eigenvalues()[k];
        if (!(mu > 1e-13 * largest)) break;
        const Eigen::VectorXd x = scale.asDiagonal() * solver.eigenvectors().col(k);
        const Eigen::VectorXd unit = x / std::sqrt(x.dot(mass * x));
        std::vector<double> vector(structure.directions(), 0);
        for (std::size_t d = 0; d < directions.size(); ++d) vector[directions[d]] = unit[static_cast<Eigen::Index>(d)];
        pairs.values.push_back(sigma + 1 / mu);
        pairs.vectors.push_back(std::move(vector));
    }
    return pairs;
}

/// x -> (K - σ M)⁻¹ x, as Spectra asks for it.
class ShiftInvert {
  public:
    using Scalar = double;

    ShiftInvert(const BlockMatrix& K, const BlockMatrix& M, double sigma)
        : factor_(shifted(K, sigma, M), sigma == 0), size_(3 * Eigen::Index(K.size())) {}

    Eigen::Index rows() const { return size_; }
    Eigen::Index cols() const { return size_; }
    void set_shift(double /*sigma*/) {} // factorised for its one shift already
    void perform_op(const double* in, double* out) const {
        work_.assign(in, in + size_);
        factor_.solve(work_);
        std::copy(work_.begin(), work_.end(), out);
    }

  private:
    Factor factor_;
    Eigen::Index size_;
    mutable std::vector<double> work_;
};

/// x -> M x, as Spectra asks for it.
class MassProduct {
  public:
    using Scalar = double;

    explicit MassProduct(const BlockMatrix& M) : M_(&M), result_(3 * std::size_t(M.size())) {}

    Eigen::Index rows() const { return static_cast<Eigen::Index>(result_.size()); }
    Eigen::Index cols() const { return rows(); }
    void perform_op(const double* in, double* out) const {
        work_.assign(in, in + result_.size());
        multiply(*M_, work_, result_);
        std::copy(result_.begin(), result_.end(), out);
    }

  private:
    const BlockMatrix* M_;
    mutable std::vector<double> work_, result_;
};

double dot(const std::vector<double>& a, const std::vector<double>& b) {
    return std::inner_product(a.begin(), a.end(), b.begin(), 0.0);
}

/// Directions that carry mass: an upper bound of the rank of M.
int rank_of(const BlockMatrix& M) {
    int rank = 0;
    for (const Block& block : M.diagonal)
        for (int c = 0; c < 3; ++c) rank += int(block[4 * c] > 0);
    return rank;
}

EigenPairs sparse_modes(const BlockMatrix& K, const BlockMatrix& M, int count, double sigma) {
    const int rank = rank_of(M);
    const int wanted = std::min(count, rank - 1);
    EigenPairs pairs;
    if (wanted < 1) return pairs;
    ShiftInvert invert(K, M, sigma);
    MassProduct mass(M);
    Spectra::SymGEigsShiftSolver<ShiftInvert, MassProduct, Spectra::GEigsMode::ShiftInvert> solver(
        invert, mass, wanted, std::min(rank, std::max(2 * wanted + 1, 20)), sigma);
    // a start in the range of (K - σM)⁻¹ M: elsewhere the iteration would meet massless movements
    std::vector<double> start(mass.rows()), image(start.size());
    unsigned state = 2463534242U;
    for (double& value : start) {
        state = state * 1664525U + 1013904223U;
        value = 0.5 + static_cast<double>(state >> 8) / (1U << 24);
    }
    mass.perform_op(start.data(), image.data());
    invert.perform_op(image.data(), start.data());
    solver.init(start.data());
    solver.compute(Spectra::SortRule::LargestMagn, 1000, 1e-12, Spectra::SortRule::SmallestAlge);
    if (solver.info() != Spectra::CompInfo::Successful)
        throw std::runtime_error("the natural frequencies did not converge");
    for (Eigen::Index k = 0; k < solver.eigenvalues().size(); ++k) {
        const Eigen::VectorXd x = solver.eigenvectors().col(k);
        pairs.values.push_back(solver.eigenvalues()[k]);
        pairs.vectors.emplace_back(x.data(), x.data() + x.size());
    }
    return pairs;
}

/// Scales the vectors to xᵀ M x = 1 and checks residuals and M-orthogonality.
void check_pairs(const BlockMatrix& K, const BlockMatrix& M, EigenPairs& pairs) {
    const std::size_t size = 3 * std::size_t(K.size());
    std::vector<std::vector<double>> Mx(pairs.values.size(), std::vector<double>(size));
    std::vector<double> Kx(size);
    for (std::size_t k = 0; k < pairs.values.size(); ++k) {
        multiply(M, pairs.vectors[k], Mx[k]);
        const double norm = std::sqrt(dot(pairs.vectors[k], Mx[k]));
        for (double& value : pairs.vectors[k]) value /= norm;
        for (double& value : Mx[k]) value /= norm;
        multiply(K, pairs.vectors[k], Kx);
        // r = K x - λ M x, measured in the energy that it could take: Σ rᵢ²/Kᵢᵢ against Σ (K x)ᵢ²/Kᵢᵢ
        double missing = 0, whole = 0;
        for (std::size_t d = 0; d < size; ++d) {
            const double stiffness = K.diagonal[K.place_of[d / 3]][4 * (d % 3)];
            if (!(stiffness > 0)) continue;
            missing += std::pow(Kx[d] - pairs.values[k] * Mx[k][d], 2) / stiffness;
            whole += std::max(Kx[d] * Kx[d], std::pow(pairs.values[k] * Mx[k][d], 2)) / stiffness;
        }
        if (std::sqrt(missing) > 1e-4 * std::sqrt(whole) && pairs.values[k] > 1e-6 * std::abs(pairs.values.back()))
            throw std::runtime_error(fmt::format("mode {} fails its check: it leaves {:.1e} of its forces", k + 1,
                                                 std::sqrt(missing / whole)));
        for (std::size_t j = 0; j < k; ++j)
            if (std::abs(dot(pairs.vectors[j], Mx[k])) > 1e-6)
                throw std::runtime_error(
                    fmt::format("modes {} and {} fail their check: they are not orthogonal", j + 1, k + 1));
    }
}

} // namespace

int eigenvalues_below(const BlockMatrix& K, const BlockMatrix& M, double sigma) {
    return Factor(shifted(K, sigma, M), false).negative_pivots();
}

EigenPairs lowest_modes(const Structure& structure, const BlockMatrix& K, const BlockMatrix& M, int count,
                        bool is_free) {
    const double sigma = is_free ? shift_below_zero(K, M) : 0;
    const int directions = static_cast<int>(std::count(structure.active.begin(), structure.active.end(), 1));
    // a few more than asked for: they separate the last one from its neighbours
    const int wanted = count + 3;
    EigenPairs pairs =
        directions <= most_dense ? dense_modes(structure, K, M, wanted, sigma) : sparse_modes(K, M, wanted, sigma);
    if (pairs.values.empty()) {
        pairs.exhausted = true;
        return pairs;
    }
    const std::size_t kept = std::min<std::size_t>(count, pairs.values.size());
    pairs.exhausted = static_cast<int>(kept) < count;
    // counted at a shift in the widest gap from the last wanted mode on
    std::size_t gap = kept - 1;
    double width = 0;
    for (std::size_t k = gap; k + 1 < pairs.values.size(); ++k) {
        if (pairs.values[k + 1] - pairs.values[k] <= width) continue;
        width = pairs.values[k + 1] - pairs.values[k];
        gap = k;
    }
    const double shift = width > 0 ? pairs.values[gap] + width / 2 : pairs.values[gap] * (1 + 1e-6);
    pairs.missed = std::max(0, eigenvalues_below(K, M, shift) - static_cast<int>(gap + 1));
    pairs.values.resize(kept);
    pairs.vectors.resize(kept);
    check_pairs(K, M, pairs);
    return pairs;
}

} // namespace groundsill
