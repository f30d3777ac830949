#pragma once
// Natural frequencies and mode shapes of the undamped structure.

#include <optional>
#include <string>
#include <vector>

#include "groundsill/diagram.hpp"
#include "groundsill/model.hpp"

namespace groundsill {

/// One natural mode, scaled so that the largest translation anywhere, places inside members included, is 1.
struct Mode {
    /// Where strain energy sits: the share of a member (its releases included) or of a support's springs.
    struct Share {
        int member = -1;
        int support = -1;
        double share = 0; ///< of the whole, 0 to 1
    };
    /// The place of the largest translation: a node, or a place in a member.
    struct Place {
        int node = -1;
        int member = -1;
        double at = 0; ///< m from the member's start
    };
    struct NodeShape {
        double x = 0, y = 0;
        std::optional<double> rotation; ///< per m of the largest translation, rad/m
    };

    double frequency = 0;   ///< Hz; 0 for a free body
    double modal_mass = 0;  ///< φᵀ M φ, kg
    double effective_x = 0; ///< effective mass (φᵀ M 1)²/(φᵀ M φ) of a movement of the ground along x, kg
    double effective_y = 0; ///< and along y
    std::vector<Share> flexibility; ///< every member, then every support with springs
    Place largest;
    std::vector<NodeShape> nodes; ///< by node
    std::vector<Diagram> members; ///< by member; of the diagrams only `along` and `across` mean something
};

struct Vibration {
    std::vector<Mode> modes; ///< rising frequencies
    int modes_missed =
        0; ///< eigenvalues below the last mode's, by Sylvester's law of inertia, less those that were found
    std::vector<std::string> warnings;
};

} // namespace groundsill
