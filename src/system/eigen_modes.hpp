#pragma once
// The lowest eigenpairs of K x = λ M x.

#include <vector>

#include "system/factor.hpp"

namespace groundsill {

/// Eigenpairs in rising order; vectors by direction, M-orthogonal, with xᵀ M x = 1.
struct EigenPairs {
    std::vector<double> values; ///< λ, (rad/s)²
    std::vector<std::vector<double>> vectors;
    int missed = 0;         ///< eigenvalues below the largest found, by the inertia of K - σ M, that were not found
    bool exhausted = false; ///< there are no more finite eigenvalues than those found
};

/// Finds the `count` lowest finite eigenpairs, K not negative, M symmetric and not negative (it may be of low rank),
/// each checked by its residual and by M-orthogonality. Up to `most_dense` directions by a dense solution of M x =
/// (1/λ) K x; above by Lanczos iteration in shift-invert mode (Spectra) over the block factor of K - σ M. \param
/// is_free the structure can move without strain: K is singular, and is shifted by a little below 0 \throws
/// std::runtime_error when the iteration does not converge or a pair fails its check
EigenPairs lowest_modes(const Structure& structure, const BlockMatrix& K, const BlockMatrix& M, int count,
                        bool is_free);

/// Number of eigenvalues of K x = λ M x below σ: the negative pivots of K - σ M (Sylvester's law of inertia).
int eigenvalues_below(const BlockMatrix& K, const BlockMatrix& M, double sigma);

/// Up to so many active directions the dense solution is taken.
inline constexpr int most_dense = 400;

} // namespace groundsill
