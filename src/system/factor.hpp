#pragma once
// K = L D Lᵀ of the assembled stiffness, in 3 x 3 blocks, with two back ends: a narrow band and a sparse one.

#include <vector>

#include "system/block_matrix.hpp"

namespace groundsill {

/// A diagonal block of D, itself factorised as l d lᵀ.
struct Pivot {
    double d0 = 1, d1 = 1, d2 = 1;
    double l10 = 0, l20 = 0, l21 = 0;
};

/// The factorised stiffness. A pivot far below its diagonal (less than `small_pivot` of it) may stand for a direction
/// in which nothing resists: such a direction is held by a spring as stiff as its diagonal, and is listed, so that the
/// factor exists and stays well conditioned; whether it is a mechanism is found out elsewhere (mechanism.hpp).
class Factor {
  public:
    static constexpr double small_pivot = 1e-10;

    /// A direction that the factor holds by a spring of its own.
    struct Held {
        int direction = -1;
        double stiffness = 0;
    };

    /// Factorises. Cost: n b² for a band of b nodes, else that of the fill.
    /// \param hold_small_pivots false for matrices that may be indefinite: pivots stay as they are
    explicit Factor(const BlockMatrix& matrix, bool hold_small_pivots = true);

    /// Solves in place; `x` holds one value a direction, in the structure's numbering.
    void solve(std::vector<double>& x) const;

    const std::vector<Held>& held() const { return held_; }

    /// How many pivots are below zero: as many eigenvalues of the matrix are (Sylvester's law of inertia).
    int negative_pivots() const;

  private:
    void factorise_band(const BlockMatrix& matrix);
    void factorise_sparse(const BlockMatrix& matrix);
    void find_columns(const BlockMatrix& matrix);
    void solve_band(std::vector<double>& x) const;
    void solve_sparse(std::vector<double>& x) const;
    Pivot make_pivot(const Block& block, const Block& original, int place);

    bool hold_small_pivots_;
    int band_ = 0; ///< in nodes; used when the band back end is
    bool is_band_ = false;
    std::vector<int> node_at_;
    std::vector<Pivot> pivots_;
    std::vector<Block> lower_; ///< band: rows k+1 .. k+b of column k; sparse: by column_start_
    std::vector<std::size_t> column_start_;
    std::vector<int> rows_;
    std::vector<int> parent_; ///< elimination tree
    std::vector<Held> held_;
};

} // namespace groundsill
