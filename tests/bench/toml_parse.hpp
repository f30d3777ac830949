#pragma once

#include <cstddef>
#include <string_view>

namespace bench {

/// toml++'s own parse of a text, its tree thrown away. \return how many tables stand at the top
std::size_t parse_toml(std::string_view text);

} // namespace bench
