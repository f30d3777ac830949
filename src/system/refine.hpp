#pragma once
// From loads to movements: the factor gives the direction, the member-wise residual says what is still missing.

#include "system/factor.hpp"
#include "system/member_wise.hpp"

namespace groundsill {

/// A shape held out of the factor: movements in which one of the factor's held directions moves by 1, and their
/// energies. \see mechanism.hpp
using Shape = std::vector<Real>;

/// What the factor needs to be a good inverse although it holds some directions: soft but stable shapes, K-orthogonal.
struct SoftShapes {
    std::vector<Shape> shapes;
    std::vector<Real> energies; ///< vᵀ K v, above 0
};

/// How the refinement ended.
struct Refined {
    Movements u;
    double residual = 0; ///< largest |f - K u| over the largest nodal load or end force, moments divided by the size
    Real held = 0; ///< largest force that would act if no free node moved: beside it, less than 1e-19 is round-off
};

/// Solves K u = f. Conjugate gradients on the member-wise residual in long double, preconditioned by the factor and
/// started anew from the true residual until that no longer falls. \param given movements of the inactive directions
/// (imposed ones), 0 on the active
Refined refine(const Structure& structure, const Factor& factor, const SoftShapes& soft, const LoadVector& loads,
               const Movements& given);

/// Approximate x = K⁻¹ r of the factor and the soft shapes together, zero on inactive directions.
std::vector<double> precondition(const Structure& structure, const Factor& factor, const SoftShapes& soft,
                                 std::vector<double> r);
std::vector<Real> precondition(const Structure& structure, const Factor& factor, const SoftShapes& soft,
                               const std::vector<Real>& r);

/// Condition number (2-norm, to about 1 %) of D^-½ K D^-½, D the diagonal of K, by power and inverse iteration.
double scaled_condition(const Structure& structure, const BlockMatrix& matrix, const Factor& factor,
                        const SoftShapes& soft);

} // namespace groundsill
