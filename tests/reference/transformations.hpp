#pragma once
// Changes of a frame that change nothing or change the results in a known way.

#include "random_frames.hpp"
#include "results.hpp"

namespace reference {

/// The frame turned counter-clockwise about the origin. Loads turn with it, so those per plan length and self-weight
/// become loads per length.
Frame turned(const Frame& frame, double angle);
/// The results of the turned frame, from those of the frame.
ResponseValues turned(const ResponseValues& values, double angle);

/// The mirror image at the y axis; the members of which `swapped` says so run the other way.
Frame mirrored(const Frame& frame, const std::vector<bool>& swapped);
/// The results of the mirror image; `lengths` of the members.
ResponseValues mirrored(const ResponseValues& values, const std::vector<bool>& swapped,
                        const std::vector<double>& lengths);

/// Every member cut into `parts` equal members, loads cut with them. Parts of member i are i x parts, ...; the nodes of
/// the frame come first.
Frame subdivided(const Frame& frame, int parts);
/// Results of the frame from those of the subdivided one, at the places of `listed`.
ResponseValues joined(const ResponseValues& values, const ResponseValues& listed, const Frame& frame, int parts);

/// The same frame with nodes, members, supports, loads, sections in another order.
Frame shuffled(const Frame& frame, Dice& dice);
/// Results in the order of `frame` from those of `other`, by name.
ResponseValues reordered(const ResponseValues& values, const Frame& other, const Frame& frame);

} // namespace reference
