#pragma once
// A look over the text before it is parsed.

#include <optional>
#include <string_view>

#include "groundsill/diagnostics.hpp"

namespace groundsill::reading {

/// Finds the first thing in a text that must not reach the TOML library, or on which it says too little:
/// - UTF-16 and NUL bytes;
/// - tables and arrays nested more than 200 deep, by brackets or by the parts of dotted keys. No model needs a tenth of
///   that, and the library works through nested values by recursion: tens of thousands would overflow the stack;
/// - characters outside ASCII, except in strings and comments: errors in TOML 1.0, of which the library accepts some.
std::optional<Diagnostic> find_harm(std::string_view text);

} // namespace groundsill::reading
