#pragma once
// The assembled stiffness in 3 x 3 blocks, one row and column of blocks a node.

#include <array>
#include <vector>

#include "system/structure.hpp"

namespace groundsill {

/// A 3 x 3 block, row by row.
using Block = std::array<double, 9>;

/// A symmetric matrix of blocks: the diagonal and what stands above it, by columns with rising rows.
/// Row and column k belong to node `node_at[k]`; inactive directions carry 1 on the diagonal and nothing else.
struct BlockMatrix {
    std::vector<int> node_at;  ///< by place in the matrix
    std::vector<int> place_of; ///< by node
    std::vector<Block> diagonal;
    std::vector<int> column_start; ///< into rows and blocks, one more at the end
    std::vector<int> rows;
    std::vector<Block> blocks;
    int bandwidth = 0; ///< largest distance of an entry from the diagonal, in blocks

    int size() const { return static_cast<int>(diagonal.size()); }
};

/// Assembles the stiffness, its nodes ordered so that the factor stays small: as they come where that is a narrow band
/// already, else along the structure (Cuthill and McKee 1969), else by approximate minimum degree (Amestoy, Davis and
/// Duff 1996).
BlockMatrix assemble(const Structure& structure);

/// Adds a symmetric 6 x 6 matrix over the end movements of a segment, in its axes; entries of inactive directions are
/// left out.
void add_end_matrix(const Structure& structure, const Segment& segment, const std::array<double, 36>& values,
                    BlockMatrix& matrix);

/// Adds the same to x and y of a node (a point mass), where they are active.
void add_to_node(const Structure& structure, int node, double value, BlockMatrix& matrix);

/// The pattern of a matrix with zeros in it.
BlockMatrix zeros_like(const BlockMatrix& matrix);

/// A - s B of two matrices with one pattern.
BlockMatrix shifted(const BlockMatrix& A, double s, const BlockMatrix& B);

/// y = A x; both by direction of the structure.
void multiply(const BlockMatrix& matrix, const std::vector<double>& x, std::vector<double>& y);

/// The widest band, in nodes, for which a band factor is used.
inline constexpr int widest_band = 12;

} // namespace groundsill
