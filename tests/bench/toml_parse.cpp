#include "toml_parse.hpp"

#define TOML_ENABLE_FORMATTERS 0
#include <toml++/toml.h>

namespace bench {

std::size_t parse_toml(std::string_view text) { return toml::parse(text).size(); }

} // namespace bench
