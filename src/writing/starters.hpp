#pragma once
// Commented models to start from.

#include <optional>
#include <string>
#include <string_view>

namespace groundsill {

/// The text of a starter model, ready to run: "beam" (a run of spans on unequal supports), "portal" (a frame under dead
/// load, snow and wind) or "grade-beam" (a strip beam on four springs). Nothing for another kind.
std::optional<std::string> starter_model(std::string_view kind);

} // namespace groundsill
