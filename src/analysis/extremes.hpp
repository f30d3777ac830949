#pragma once
// The largest values of a run: along one member, and over the whole structure.
//
// Round-off decides nothing here: what differs by less than the arithmetic can tell counts as equal, and of equals the
// first is named (the smallest place, the first member, the first combination).

#include "groundsill/analysis.hpp"

namespace groundsill {

/// Differences up to these are rounding.
struct RoundOff {
    double force = 0;    ///< N
    double moment = 0;   ///< N m
    double movement = 0; ///< m
};

/// What counts as rounding in one response: 1e-12 of its largest force, moment and movement (doubles carry 1e-16; the
/// solution loses some of it, refinement restores it). Where nothing but rounding flows - the loads leave the structure
/// free of force, as when a determinate frame settles - it is the whole of what was found: forces below 1e-15 of
/// stiffness times movement.
RoundOff round_off(const Analysis& analysis, const Response& response);

/// Exact extremes of one quantity along a member; on a plateau the smallest place.
DiagramRange member_range(const Diagram& diagram, Curve curve, const RoundOff& rounding);

/// Whether the tables of a run speak of its combinations; of its cases where it has no combinations.
bool speaks_of_combinations(const Analysis& analysis);

/// The responses that the tables speak of: combinations, or cases where there are none.
const std::vector<Response>& governing_responses(const Analysis& analysis);

/// Name of one of them.
const std::string& governing_name(const Analysis& analysis, int response);

/// Indices of the responses over which movements are compared: those of the service limit state where there are any,
/// otherwise all.
std::vector<int> movement_responses(const Analysis& analysis);

/// A largest or smallest value and where it stands: at a node or in a member.
struct Peak {
    double value = 0;
    int response = -1; ///< index into governing_responses; -1: there is no such value at all
    int node = -1;
    int member = -1;
    double at = 0; ///< m from the member's start
};

/// Least and most of everything over the whole structure.
struct Peaks {
    LeastMost<Peak> N, V, M;  ///< over all governing responses
    LeastMost<Peak> x, y;     ///< movements in global axes, places inside members included,
    LeastMost<Peak> rotation; ///< and of nodes alone, both over movement_responses
    LeastMost<Peak> reaction_x, reaction_y,
        reaction_moment; ///< over all governing responses; `node` is the supported one
    RoundOff rounding;   ///< the largest of all responses
};

/// One pass over the members for each governing response.
Peaks find_peaks(const Analysis& analysis);

/// Least and most reaction of one support.
struct ReactionRange {
    LeastMost<double> x, y, moment;
};

/// Of a support over all governing responses. \pre there is at least one
ReactionRange reaction_range(const Analysis& analysis, int support);

} // namespace groundsill
