#pragma once

#include <vector>

#include "elements/frame.hpp"

namespace groundsill {

inline elements::Real dot(const std::vector<elements::Real>& a, const std::vector<elements::Real>& b) {
    elements::Real sum = 0;
    for (std::size_t d = 0; d < a.size(); ++d) sum += a[d] * b[d];
    return sum;
}

/// Preconditioned conjugate gradients (Hestenes and Stiefel 1952) for A x = f from a start whose residual is r, until
/// the residual has fallen by 1e-9. \param apply      apply(p, Ap) sets Ap = A p, A symmetric and not negative \param
/// invert     invert(r) gives z near A⁻¹ r \param move       move(alpha, p) does x += alpha p
template <class Apply, class Invert, class Move>
void conjugate_gradients(std::vector<elements::Real> r, int steps, const Apply& apply, const Invert& invert,
                         const Move& move) {
    using elements::Real;
    std::vector<Real> z = invert(r);
    std::vector<Real> p = z, Ap(z.size());
    Real rz = dot(r, z);
    const Real enough = dot(r, r) * Real(1e-18);
    for (int step = 1; rz > 0; ++step) {
        apply(p, Ap);
        const Real curvature = dot(p, Ap);
        if (!(curvature > 0)) return;
        const Real alpha = rz / curvature;
        move(alpha, p);
        if (step == steps) return;
        for (std::size_t d = 0; d < r.size(); ++d) r[d] -= alpha * Ap[d];
        if (dot(r, r) <= enough) return;
        z = invert(r);
        const Real next = dot(r, z);
        for (std::size_t d = 0; d < p.size(); ++d) p[d] = z[d] + (next / rz) * p[d];
        rz = next;
    }
}

} // namespace groundsill
