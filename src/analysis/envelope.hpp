#pragma once

#include <optional>

#include "groundsill/analysis.hpp"

namespace groundsill {

/// Least and most over the combinations of one limit state, with what acts together with them; the first of equal
/// combinations governs. Absent where the model has no such combination.
std::optional<Envelope> envelope(const Analysis& analysis, LimitState limit);

} // namespace groundsill
