#pragma once

#include "analysis/case_loads.hpp"
#include "elements/mass.hpp"
#include "groundsill/vibration.hpp"
#include "system/block_matrix.hpp"
#include "system/subdivide.hpp"

namespace groundsill {

/// A structure cut finely enough for its modes, its stiffness and its mass.
struct VibratingStructure {
    Subdivided fine;
    BlockMatrix stiffness;
    BlockMatrix mass;
    std::vector<elements::SegmentMass> masses; ///< by segment of the fine structure
    std::vector<double> pull_x,
        pull_y; ///< M 1 for ground movements along x and y, by direction: fixed directions move too
};

/// Cuts every segment at its point masses and into parts no longer than `wave` times the length 1/β of a bending wave
/// of the given circular frequency, β = (m ω²/(E I))^¼.
VibratingStructure cut_for(const Internals& internals, const MassModel& mass, double circular_frequency);

/// The lowest modes that [mass] asks for. The cut follows the highest frequency found until it fits.
/// \param is_free the structure can move without strain
/// \throws std::runtime_error when the eigenvalue iteration fails
Vibration find_modes(const Internals& internals, const MassModel& mass, bool is_free);

} // namespace groundsill
