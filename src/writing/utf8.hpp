#pragma once
// UTF-8 as far as names in tables and JSON need it.

#include <cstddef>
#include <string>
#include <string_view>

namespace groundsill::writing {

/// Length in bytes (1 to 4) of the well-formed UTF-8 sequence (RFC 3629) at the start of `text`; 0 where there is none.
std::size_t sequence_length(std::string_view text);

/// Number of code points; a byte outside of any well-formed sequence counts as one.
int width(std::string_view text);

/// At most `limit` code points: longer text is cut and ends in an ellipsis. \pre limit > 0
std::string shortened(std::string_view text, int limit);

/// For a terminal: control characters become spaces, stray bytes question marks, so that a model's words cannot steer
/// it.
std::string printable(std::string_view text);

} // namespace groundsill::writing
