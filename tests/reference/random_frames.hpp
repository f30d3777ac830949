#pragma once
// Seeded random frames that stand.

#include "frame.hpp"

#include <cstdint>

namespace reference {

/// Pseudo-random numbers that are the same with every library: SplitMix64 (G. L. Steele, D. Lea, C. H. Flood, Fast
/// splittable pseudorandom number generators, 2014; constants from memory, any odd mixing constants would do).
class Dice {
  public:
    explicit Dice(std::uint64_t seed) : state_(seed * 0x2545F4914F6CDD1DULL + 1) {}

    double between(double low, double high) { return low + (high - low) * unit(); }
    double spread(double low, double high); ///< evenly in the logarithm
    int whole(int low, int high) { return low + static_cast<int>(unit() * (high - low + 1)); } ///< both included
    bool chance(double probability) { return unit() < probability; }
    double sign() { return chance(0.5) ? 1 : -1; }

  private:
    double unit();

    std::uint64_t state_;
};

/// A stable frame: continuous beams (hinges included), frames of several storeys, trusses, trees, irregular chains;
/// with mixed sections, releases, supports and cases that hold every kind of load. Cases: "forces" (nodal and member
/// loads), "strains" (temperature, lack of fit, support movements), "mixed" (all, self-weight too).
Frame random_frame(std::uint64_t seed);

/// The structure of random_frame(seed) alone, without cases.
Frame random_structure(std::uint64_t seed);

/// Adds `count` random loads that are forces on nodes and at places of members (no moments at hinges or on free nodes).
void add_point_loads(Frame& frame, Case& load_case, Dice& dice, int count);

/// True where at least one member or a support holds the rotation of the node.
bool node_turns(const Frame& frame, int node);

} // namespace reference
