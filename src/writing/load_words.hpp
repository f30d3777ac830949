#pragma once
// Loads in words.

#include <string>

#include "groundsill/model.hpp"
#include "units/display.hpp"

namespace groundsill::writing {

/// A case: a line with its name and action, then a line for each load. Long lists are cut.
std::string case_words(const Model& model, const Display& display, const LoadCase& load_case);

} // namespace groundsill::writing
