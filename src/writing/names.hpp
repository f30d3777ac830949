#pragma once
// Names of the model's parts, as every output writes them.

#include <string>
#include <string_view>

#include "groundsill/model.hpp"

namespace groundsill::writing {

/// The node under a support: supports have no names of their own.
inline const std::string& node_of(const Model& model, const Support& support) { return model.nodes[support.node].name; }

inline std::string_view limit_name(LimitState limit) { return limit == LimitState::strength ? "strength" : "service"; }

} // namespace groundsill::writing
