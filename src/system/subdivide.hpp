#pragma once
// A structure whose segments are cut into shorter ones, as vibration and stability need it.

#include <functional>
#include <vector>

#include "system/structure.hpp"

namespace groundsill {

/// A structure cut finer, and which of its segments came from which.
struct Subdivided {
    Structure structure;
    std::vector<int> first_part; ///< by segment of the original: its first part; one more at the end
};

/// Cuts every segment at the given places (distances from its start, rising, strictly inside). Nodes of the original
/// keep their numbers.
Subdivided subdivide(const Structure& structure, const std::function<std::vector<Real>(int segment)>& places);

} // namespace groundsill
