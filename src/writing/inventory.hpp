#pragma once
// A model as it was understood, in words and display units.

#include <string>

#include "groundsill/model.hpp"

namespace groundsill::writing {

/// Materials, sections, nodes, members, supports, cases with their loads, combinations. Long lists are cut.
std::string inventory(const Model& model);

} // namespace groundsill::writing
