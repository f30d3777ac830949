#pragma once
// A small picture of a model in characters.

#include <string>

#include "groundsill/model.hpp"

namespace groundsill::writing {

/// The geometry, at most 78 columns by 20 lines, true to scale as far as characters allow (one is taken to be twice as
/// high as wide), with node names where there is room, and a line that explains the signs. Empty for a model without
/// nodes.
std::string picture(const Model& model);

} // namespace groundsill::writing
