#pragma once
// The same systems by general-purpose libraries.

#include <vector>

#include <Eigen/SparseCore>

#include "groundsill/model.hpp"
#include "system/block_matrix.hpp"

namespace bench {

using Vector = std::vector<double>;

/// Assembles the stiffness of a chain straight into a band, node after node, and solves it with LAPACK's dpbsv.
/// \pre a member joins two nodes that follow each other, without releases and shear flexibility; no support is turned
/// \param right_side three directions a node; overwritten by the solution
void solve_band(const groundsill::Model& model, Vector& right_side);

using Sparse = Eigen::SparseMatrix<double>;

/// The lower half of an assembled stiffness, three directions a node in the model's numbering.
Sparse lower_half(const groundsill::BlockMatrix& matrix);

/// Eigen's SimplicialLDLT, ordered by approximate minimum degree on the nodes instead of the directions.
Vector solve_simplicial(const Sparse& lower, const Vector& right_side);

/// CHOLMOD's supernodal factorisation.
Vector solve_supernodal(const Sparse& lower, const Vector& right_side);

} // namespace bench
