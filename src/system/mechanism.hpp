#pragma once
// Whether a structure can stand, and if not, who moves and what lets it.

#include "system/refine.hpp"

namespace groundsill {

/// What the directions that the factor holds turned out to be.
struct MechanismSearch {
    std::vector<Shape> mechanisms; ///< shapes that nothing resists, each with largest movement 1
    SoftShapes soft;               ///< shapes that are soft beside the rest, but resisted
};

/// Looks at the directions that the factor holds. A shape is a mechanism when its strain energy, summed member by
/// member, is at round-off (below 1e-25) against Σ Kᵢᵢ vᵢ²: a cantilever in 10,000 parts has 5e-17, contrasts of 1e12
/// have 1e-12, a mechanism has the square of round-off, about 1e-38.
MechanismSearch find_mechanisms(const Structure& structure, const BlockMatrix& matrix, const Factor& factor);

/// Tells a mechanism: which node moves how, which members go with it, and what lets it; with the place of the first
/// thing that lets it, or of the first node that moves.
Diagnostic describe_mechanism(const Structure& structure, const Shape& shape);

/// The members that their own releases set free.
Diagnostics describe_self_mechanisms(const Structure& structure);

} // namespace groundsill
