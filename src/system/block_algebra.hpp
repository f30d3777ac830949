#pragma once
// Arithmetic of 3 x 3 blocks, row by row, as the factorisation needs it.

#include "system/factor.hpp"

namespace groundsill {

/// C -= A B
inline void subtract_product(const Block& A, const Block& B, Block& C) {
    for (int row = 0; row < 3; ++row)
        for (int column = 0; column < 3; ++column)
            C[3 * row + column] -=
                A[3 * row] * B[column] + A[3 * row + 1] * B[3 + column] + A[3 * row + 2] * B[6 + column];
}

/// C -= A Bᵀ
inline void subtract_product_transposed(const Block& A, const Block& B, Block& C) {
    for (int row = 0; row < 3; ++row)
        for (int column = 0; column < 3; ++column)
            C[3 * row + column] -=
                A[3 * row] * B[3 * column] + A[3 * row + 1] * B[3 * column + 1] + A[3 * row + 2] * B[3 * column + 2];
}

/// One vector solved with a diagonal block: x = D⁻¹ x.
inline void solve_pivot(const Pivot& D, double* x) {
    x[1] -= D.l10 * x[0];
    x[2] -= D.l20 * x[0] + D.l21 * x[1];
    x[0] /= D.d0;
    x[1] /= D.d1;
    x[2] /= D.d2;
    x[1] -= D.l21 * x[2];
    x[0] -= D.l10 * x[1] + D.l20 * x[2];
}

/// A D⁻¹ for a symmetric D: each row of A solved.
inline Block times_inverse(Block A, const Pivot& D) {
    for (int row = 0; row < 3; ++row) solve_pivot(D, &A[3 * row]);
    return A;
}

/// y -= A x
inline void subtract_times(const Block& A, const double* x, double* y) {
    for (int row = 0; row < 3; ++row) y[row] -= A[3 * row] * x[0] + A[3 * row + 1] * x[1] + A[3 * row + 2] * x[2];
}

/// y -= Aᵀ x
inline void subtract_transposed_times(const Block& A, const double* x, double* y) {
    for (int column = 0; column < 3; ++column)
        y[column] -= A[column] * x[0] + A[3 + column] * x[1] + A[6 + column] * x[2];
}

} // namespace groundsill
