#pragma once

#include "analysis/case_loads.hpp"
#include "groundsill/vibration.hpp"
#include "system/block_matrix.hpp"
#include "system/subdivide.hpp"

namespace groundsill {

/// A structure cut finely enough for its modes, its stiffness and its mass.
struct VibratingStructure {
    Subdivided fine;
    BlockMatrix stiffness;
    BlockMatrix mass;
    std::vector<double> pull_x,
        pull_y; ///< M 1 for ground movements along x and y, by direction: fixed directions move too
};

/// How finely a structure is to be cut.
struct Fineness {
    double circular_frequency = 0; ///< of the fastest mode, rad/s
    std::vector<double>
        per_segment; ///< fewest parts per length that the modes' axial and shear strains ask for, 1/m; may be empty
};

/// Cuts every segment at its point masses and as finely as the bending and axial waves of the given frequency and the
/// given density of parts ask for.
VibratingStructure cut_for(const Internals& internals, const MassModel& mass, const Fineness& fineness);

/// The lowest modes that [mass] asks for. The cut follows the highest frequency found until it fits.
/// \param is_free the structure can move without strain
/// \throws std::runtime_error when the eigenvalue iteration fails
Vibration find_modes(const Internals& internals, const MassModel& mass, bool is_free);

} // namespace groundsill
