#pragma once
// Natural frequencies of a reference frame by a dense solution that shares nothing with the program.
//
// Every member is cut at its hinges and wherever its mass changes; on each part the movements are polynomials of high
// degree (Hermite cubics and bubbles for bending without shear; for shear-flexible members the deflection and the
// rotation on their own), integrated with Gauss-Legendre points. A release is a spring, or nothing, between a movement
// of the member's end and its node's. K x = lambda M x is then solved whole: M x = mu K x by Cholesky and all
// eigenvalues of a full symmetric matrix. (B. Szabó, I. Babuška, Finite Element Analysis, 1991, ch. 3 and 11; cited
// from memory.)

#include "frame.hpp"

#include <utility>
#include <vector>

namespace reference {

/// What has mass besides: cases by index with their factors, and masses at nodes, kg.
struct Masses {
    std::vector<std::pair<int, double>> cases;
    std::vector<std::pair<int, double>> nodes;
};

struct DenseMode {
    double frequency = 0;                    ///< Hz
    double effective_x = 0, effective_y = 0; ///< kg
};

/// The lowest modes with a finite frequency, `count` at most.
/// \param more degrees beyond the usual ones, to see what that changes
std::vector<DenseMode> dense_modes(const Frame& frame, const Masses& masses, int count, int more = 0);

} // namespace reference
