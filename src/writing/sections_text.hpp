#pragma once
// The list of rolled sections that the program knows by name.

#include <string>
#include <string_view>

namespace groundsill {

/// The sections that match a pattern (see matching_designations) as a table: EN 10365 in mm, cm2 and cm4, ASTM A6 in
/// inches. \return empty when none matches
std::string sections_text(std::string_view pattern);

} // namespace groundsill
