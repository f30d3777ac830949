#include "system/factor.hpp"

#include <algorithm>

#include "system/block_algebra.hpp"

namespace groundsill {

Factor::Factor(const BlockMatrix& matrix, bool hold_small_pivots)
    : hold_small_pivots_(hold_small_pivots), band_(matrix.bandwidth), is_band_(matrix.bandwidth <= widest_band),
      node_at_(matrix.node_at) {
    pivots_.resize(matrix.diagonal.size());
    if (is_band_)
        factorise_band(matrix);
    else
        factorise_sparse(matrix);
    for (Held& held : held_) held.direction = 3 * node_at_[held.direction / 3] + held.direction % 3;
}

/// l d lᵀ of a diagonal block after elimination, whose diagonal before it was `original`.
Pivot Factor::make_pivot(const Block& block, const Block& original, int place) {
    const auto checked = [&](double d, int c) {
        if (!hold_small_pivots_ || d > small_pivot * original[4 * c]) return d;
        const double stiffness = original[4 * c] > 0 ? original[4 * c] : 1;
        held_.push_back({3 * place + c, stiffness});
        return std::max(d, 0.0) + stiffness;
    };
    Pivot D;
    D.d0 = checked(block[0], 0);
    D.l10 = block[3] / D.d0;
    D.l20 = block[6] / D.d0;
    D.d1 = checked(block[4] - D.l10 * block[3], 1);
    D.l21 = (block[7] - D.l20 * block[3]) / D.d1;
    D.d2 = checked(block[8] - D.l20 * block[6] - D.l21 * D.l21 * D.d1, 2);
    return D;
}

void Factor::factorise_band(const BlockMatrix& matrix) {
    const int n = matrix.size(), b = band_;
    std::vector<Block> diagonal = matrix.diagonal;
    lower_.assign(std::size_t(n) * b, Block{});
    for (int column = 0; column < n; ++column)
        for (int k = matrix.column_start[column]; k < matrix.column_start[column + 1]; ++k) {
            // the block above the diagonal at (row, column) is the transposed one below it at (column, row)
            const int row = matrix.rows[k];
            const Block& upper = matrix.blocks[k];
            lower_[std::size_t(row) * b + (column - row - 1)] = {upper[0], upper[3], upper[6], upper[1], upper[4],
                                                                 upper[7], upper[2], upper[5], upper[8]};
        }
    for (int k = 0; k < n; ++k) {
        const Pivot D = pivots_[k] = make_pivot(diagonal[k], matrix.diagonal[k], k);
        const int below = std::min(b, n - 1 - k);
        Block* column = lower_.data() + std::size_t(k) * b;
        // right-looking: A_ij -= L_ik A_jkᵀ for the band below and right of k
        for (int i = 0; i < below; ++i) {
            const Block L = times_inverse(column[i], D);
            for (int j = 0; j < i; ++j) {
                // A_jk is still needed unscaled, so scale row i last: column[j] for j < i holds L_jk; L_ik A_jkᵀ = A_ik
                // L_jkᵀ
                subtract_product_transposed(column[i], column[j], lower_[std::size_t(k + 1 + j) * b + (i - j - 1)]);
            }
            subtract_product_transposed(L, column[i], diagonal[k + 1 + i]);
            column[i] = L;
        }
    }
}

void Factor::find_columns(const BlockMatrix& matrix) {
    // Elimination tree and column counts (Liu 1990): row k of L has a block at every node on the paths from the entries
    // of column k of the matrix up to k.
    const int n = matrix.size();
    parent_.assign(n, -1);
    std::vector<int> mark(n, -1), count(n, 0);
    for (int k = 0; k < n; ++k) {
        mark[k] = k;
        for (int entry = matrix.column_start[k]; entry < matrix.column_start[k + 1]; ++entry)
            for (int node = matrix.rows[entry]; mark[node] != k; node = parent_[node]) {
                if (parent_[node] < 0) parent_[node] = k;
                ++count[node];
                mark[node] = k;
            }
    }
    column_start_.assign(n + 1, 0);
    for (int k = 0; k < n; ++k) column_start_[k + 1] = column_start_[k] + count[k];
    rows_.resize(column_start_[n]);
    lower_.assign(column_start_[n], Block{});
}

void Factor::factorise_sparse(const BlockMatrix& matrix) {
    // Up-looking: row k of L from the rows before it.
    const int n = matrix.size();
    find_columns(matrix);
    std::vector<std::size_t> filled(column_start_.begin(), column_start_.end() - 1);
    std::vector<int> mark(n, -1), path(n), pattern(n);
    std::vector<Block> work(n, Block{});
    for (int k = 0; k < n; ++k) {
        int top = n;
        mark[k] = k;
        for (int entry = matrix.column_start[k]; entry < matrix.column_start[k + 1]; ++entry) {
            int length = 0;
            work[matrix.rows[entry]] = matrix.blocks[entry];
            for (int node = matrix.rows[entry]; mark[node] != k; node = parent_[node]) {
                path[length++] = node;
                mark[node] = k;
            }
            while (length > 0) pattern[--top] = path[--length];
        }
        Block diagonal = matrix.diagonal[k];
        for (; top < n; ++top) {
            const int j = pattern[top];
            const Block Z = work[j]; // Z = L_jk before scaling, transposed: Z_j = A_jk - ...
            work[j] = Block{};
            for (std::size_t p = column_start_[j]; p < filled[j]; ++p) subtract_product(lower_[p], Z, work[rows_[p]]);
            const Block transposed{Z[0], Z[3], Z[6], Z[1], Z[4], Z[7], Z[2], Z[5], Z[8]};
            const Block L = times_inverse(transposed, pivots_[j]); // L_kj = Z_jᵀ D_j⁻¹
            subtract_product(L, Z, diagonal);
            rows_[filled[j]] = k;
            lower_[filled[j]++] = L;
        }
        pivots_[k] = make_pivot(diagonal, matrix.diagonal[k], k);
    }
}

void Factor::solve(std::vector<double>& x) const {
    std::vector<double> y(x.size());
    for (std::size_t place = 0; place < node_at_.size(); ++place)
        for (int c = 0; c < 3; ++c) y[3 * place + c] = x[3 * std::size_t(node_at_[place]) + c];
    if (is_band_)
        solve_band(y);
    else
        solve_sparse(y);
    for (std::size_t place = 0; place < node_at_.size(); ++place)
        for (int c = 0; c < 3; ++c) x[3 * std::size_t(node_at_[place]) + c] = y[3 * place + c];
}

void Factor::solve_band(std::vector<double>& x) const {
    const int n = static_cast<int>(pivots_.size()), b = band_;
    for (int k = 0; k < n; ++k)
        for (int i = 0; i < std::min(b, n - 1 - k); ++i)
            subtract_times(lower_[std::size_t(k) * b + i], &x[3 * std::size_t(k)], &x[3 * std::size_t(k + 1 + i)]);
    for (int k = n - 1; k >= 0; --k) {
        solve_pivot(pivots_[k], &x[3 * std::size_t(k)]);
        for (int i = 0; i < std::min(b, n - 1 - k); ++i)
            subtract_transposed_times(lower_[std::size_t(k) * b + i], &x[3 * std::size_t(k + 1 + i)],
                                      &x[3 * std::size_t(k)]);
    }
}

void Factor::solve_sparse(std::vector<double>& x) const {
    const int n = static_cast<int>(pivots_.size());
    for (int k = 0; k < n; ++k)
        for (std::size_t p = column_start_[k]; p < column_start_[k + 1]; ++p)
            subtract_times(lower_[p], &x[3 * std::size_t(k)], &x[3 * std::size_t(rows_[p])]);
    for (int k = n - 1; k >= 0; --k) {
        solve_pivot(pivots_[k], &x[3 * std::size_t(k)]);
        for (std::size_t p = column_start_[k]; p < column_start_[k + 1]; ++p)
            subtract_transposed_times(lower_[p], &x[3 * std::size_t(rows_[p])], &x[3 * std::size_t(k)]);
    }
}

int Factor::negative_pivots() const {
    int count = 0;
    for (const Pivot& D : pivots_) count += int(D.d0 < 0) + int(D.d1 < 0) + int(D.d2 < 0);
    return count;
}

} // namespace groundsill
