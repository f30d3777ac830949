#pragma once
// Internal to the designations: their tables.

#include <span>

#include "model/designations.hpp"

namespace groundsill {

extern const std::span<const Designation> designations_ipe;
extern const std::span<const Designation> designations_hea;
extern const std::span<const Designation> designations_heb;
extern const std::span<const Designation> designations_hem;
extern const std::span<const Designation> designations_ub;
extern const std::span<const Designation> designations_uc;
extern const std::span<const Designation> designations_pfc;
extern const std::span<const Designation> designations_upe;
extern const std::span<const Designation> designations_w;

} // namespace groundsill
