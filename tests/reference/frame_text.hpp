#pragma once
// A reference frame as the text of a model file.

#include "frame.hpp"

#include <string>

namespace reference {

/// The units in which a text states the same frame. Conversions are exact by definition (NIST SP 811, 2008, app. B).
enum class Units { si, bare_si, millimetre_newton, us, bare_us };

/// \param tail TOML that follows, for combinations
std::string model_text(const Frame& frame, Units units = Units::si, const std::string& tail = "");

} // namespace reference
