#pragma once
// A look over the text before it is parsed.

#include <optional>
#include <string_view>

#include "groundsill/diagnostics.hpp"

namespace groundsill::reading {

/// Finds the first place where tables and arrays are nested more than 200 deep, by brackets or by the parts of dotted
/// keys. No model needs a tenth of that, and the TOML library works through nested values by recursion: tens of
/// thousands of them would overflow the stack. Brackets and dots in strings and comments do not count.
std::optional<Diagnostic> find_deep_nesting(std::string_view text);

/// Finds the first byte that no TOML text in UTF-8 may hold: NUL, or the marks of UTF-16.
std::optional<Diagnostic> find_foreign_bytes(std::string_view text);

} // namespace groundsill::reading
