#pragma once
// Consistency of a model that has errors already.

#include "reading/draft.hpp"

namespace groundsill::reading {

/// What check_model finds in the part of the model that was read without error, so that all errors come out in one run.
/// Entities with an error are left out, and with them all that refers to them; so are combinations and warnings.
Diagnostics check_sound_part(const Draft& draft);

} // namespace groundsill::reading
