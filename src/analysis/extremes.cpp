#include "analysis/extremes.hpp"

#include <algorithm>
#include <cmath>
#include <iterator>
#include <numeric>

#include "analysis/case_loads.hpp"

namespace groundsill {

namespace {

/// Relative size of what counts as rounding in a response.
constexpr double relative_rounding = 1e-12;
/// Forces below this part of stiffness times movement are nothing but rounding: a few units in the last place of a
/// movement.
constexpr double strainless = 1e-15;
/// A later value governs only when it is larger by more than this part.
constexpr double tie = 1e-9;

void raise(double& largest, double value) { largest = std::max(largest, std::abs(value)); }

/// Largest force, moment and movement of a response; a couple held over the size of the structure counts as a force.
RoundOff largest_values(const Response& response, double size) {
    RoundOff largest;
    for (const SegmentState& segment : response.segments) {
        raise(largest.force, segment.N);
        raise(largest.force, segment.V);
        raise(largest.moment, segment.M);
        raise(largest.movement, segment.along);
        raise(largest.movement, segment.across);
    }
    for (const Reaction& reaction : response.reactions) {
        raise(largest.force, reaction.x);
        raise(largest.force, reaction.y);
        raise(largest.moment, reaction.moment);
    }
    for (const NodeMovement& movement : response.movements) {
        raise(largest.movement, movement.x);
        raise(largest.movement, movement.y);
    }
    if (size > 0) raise(largest.force, largest.moment / size);
    return largest;
}

/// Length and direction of a member.
struct Line {
    double length = 0;
    double cosine = 1;
    double sine = 0;
};

Line line_of(const Model& model, const Member& member) {
    const double dx = model.nodes[member.to].x - model.nodes[member.from].x;
    const double dy = model.nodes[member.to].y - model.nodes[member.from].y;
    const double length = std::hypot(dx, dy);
    return {length, dx / length, dy / length};
}

/// The stiffest part of the model, N/m: E A/L and 12 E I/L³ of its members, the springs of its supports.
double largest_stiffness(const Model& model) {
    double largest = 0;
    for (const Member& member : model.members) {
        const double length = line_of(model, member).length;
        const double E = member.stiffness_factor * model.materials[member.material].E;
        raise(largest, E * model.sections[member.section].A / length);
        raise(largest, 12 * E * model.sections[member.section].I / (length * length * length));
    }
    for (const Support& support : model.supports) {
        raise(largest, support.x.stiffness);
        raise(largest, support.y.stiffness);
    }
    return largest;
}

/// A bound of |function| over a piece: Σ |c| tᵏ at its end, which is also the size at which its evaluation rounds.
template <std::size_t Count> double bound(const std::array<double, Count>& coefficients, double length) {
    double sum = 0;
    for (std::size_t k = Count; k-- > 0;) sum = sum * length + std::abs(coefficients[k]);
    return sum;
}

double bound(const Diagram& diagram, Curve curve) {
    double largest = 0;
    for (const DiagramPiece& piece : diagram.pieces) {
        const double length = piece.to - piece.from;
        switch (curve) {
        case Curve::N:
            raise(largest, bound(piece.N, length));
            break;
        case Curve::V:
            raise(largest, bound(piece.V, length));
            break;
        case Curve::M:
            raise(largest, bound(piece.M, length));
            break;
        case Curve::across:
            raise(largest, bound(piece.across, length));
            break;
        }
    }
    return largest;
}

double own_rounding(Curve curve, const RoundOff& rounding, double length) {
    switch (curve) {
    case Curve::N:
    case Curve::V:
        return rounding.force;
    case Curve::M:
        return std::max(rounding.moment, rounding.force * length);
    case Curve::across:
        break;
    }
    return rounding.movement;
}

DiagramRange range_below(const Diagram& diagram, Curve curve, const RoundOff& rounding, double largest) {
    const double tolerance = std::max(own_rounding(curve, rounding, diagram.length), relative_rounding * largest);
    return diagram.extremes(curve, tolerance);
}

/// The diagram whose `across` is the movement along the direction (c along + s across).
Diagram movement_towards(const Diagram& diagram, double c, double s) {
    Diagram turned = diagram;
    for (DiagramPiece& piece : turned.pieces) {
        for (double& coefficient : piece.across) coefficient *= s;
        for (std::size_t k = 0; k < piece.along.size(); ++k) piece.across[k] += c * piece.along[k];
    }
    return turned;
}

/// Where a value stands.
struct Place {
    int response = -1;
    int node = -1;
    int member = -1;
};

/// Keeps the least and the most of what it is offered.
void offer(LeastMost<Peak>& peaks, const DiagramRange& range, const Place& place, double rounding) {
    const auto peak = [&](const DiagramExtreme& extreme) {
        return Peak{extreme.value, place.response, place.node, place.member, extreme.at};
    };
    const auto margin = [&](const Peak& held) { return std::max(rounding, tie * std::abs(held.value)); };
    Peak& most = peaks.most;
    Peak& least = peaks.least;
    if (most.response < 0 || range.max.value > most.value + margin(most)) most = peak(range.max);
    if (least.response < 0 || range.min.value < least.value - margin(least)) least = peak(range.min);
}

void offer(LeastMost<Peak>& peaks, double value, const Place& place, double rounding) {
    offer(peaks, DiagramRange{{value, 0}, {value, 0}}, place, rounding);
}

/// Whether values no larger than `largest` in size leave the peaks as they are.
bool cannot_change(const LeastMost<Peak>& peaks, double largest) {
    return peaks.most.response >= 0 && largest <= peaks.most.value && -largest >= peaks.least.value;
}

/// Searches one diagram, unless its bound tells that nothing larger can be in it.
void search(LeastMost<Peak>& peaks, const Diagram& diagram, Curve curve, const RoundOff& rounding, const Place& place) {
    const double largest = bound(diagram, curve);
    if (cannot_change(peaks, largest)) return;
    offer(peaks, range_below(diagram, curve, rounding, largest), place, own_rounding(curve, rounding, diagram.length));
}

void search_forces(Peaks& peaks, const Diagram& diagram, const RoundOff& rounding, const Place& place) {
    search(peaks.N, diagram, Curve::N, rounding, place);
    search(peaks.V, diagram, Curve::V, rounding, place);
    search(peaks.M, diagram, Curve::M, rounding, place);
}

void search_movements(Peaks& peaks, const Diagram& diagram, const Model& model, const RoundOff& rounding,
                      const Place& place) {
    const auto [length, c, s] = line_of(model, model.members[place.member]);
    search(peaks.x, movement_towards(diagram, c, -s), Curve::across, rounding, place);
    search(peaks.y, movement_towards(diagram, s, c), Curve::across, rounding, place);
}

void search_nodes(Peaks& peaks, const Model& model, const Response& response, int index, const RoundOff& rounding) {
    for (int node = 0; node < static_cast<int>(model.nodes.size()); ++node) {
        const NodeMovement& movement = response.movements[node];
        const Place place{index, node, -1};
        offer(peaks.x, movement.x, place, rounding.movement);
        offer(peaks.y, movement.y, place, rounding.movement);
        if (movement.rotation) offer(peaks.rotation, *movement.rotation, place, 0);
    }
}

void search_supports(Peaks& peaks, const Model& model, const Response& response, int index, const RoundOff& rounding) {
    for (std::size_t support = 0; support < response.reactions.size(); ++support) {
        const Reaction& reaction = response.reactions[support];
        const Place place{index, model.supports[support].node, -1};
        offer(peaks.reaction_x, reaction.x, place, rounding.force);
        offer(peaks.reaction_y, reaction.y, place, rounding.force);
        offer(peaks.reaction_moment, reaction.moment, place, rounding.moment);
    }
}

void search_response(Peaks& peaks, const Analysis& analysis, int index, bool movements) {
    const Model& model = *analysis.model;
    const Response& response = governing_responses(analysis)[index];
    const RoundOff rounding = round_off(analysis, response);
    raise(peaks.rounding.force, rounding.force);
    raise(peaks.rounding.moment, rounding.moment);
    raise(peaks.rounding.movement, rounding.movement);
    search_supports(peaks, model, response, index, rounding);
    if (movements) search_nodes(peaks, model, response, index, rounding);
    for (int member = 0; member < static_cast<int>(model.members.size()); ++member) {
        const Diagram diagram = speaks_of_combinations(analysis) ? combination_diagram(analysis, index, member)
                                                                 : case_diagram(analysis, index, member);
        const Place place{index, -1, member};
        search_forces(peaks, diagram, rounding, place);
        if (movements) search_movements(peaks, diagram, model, rounding, place);
    }
}

void widen(LeastMost<double>& range, double value) {
    range.least = std::min(range.least, value);
    range.most = std::max(range.most, value);
}

} // namespace

RoundOff round_off(const Analysis& analysis, const Response& response) {
    const RoundOff largest = largest_values(response, static_cast<double>(analysis.internals->structure.size));
    const bool only_rounding = largest.force < strainless * largest_stiffness(*analysis.model) * largest.movement;
    // Twice the largest, because two values may differ by so much.
    const double part = only_rounding ? 2 : relative_rounding;
    return {part * largest.force, part * largest.moment, relative_rounding * largest.movement};
}

DiagramRange member_range(const Diagram& diagram, Curve curve, const RoundOff& rounding) {
    return range_below(diagram, curve, rounding, bound(diagram, curve));
}

bool speaks_of_combinations(const Analysis& analysis) { return !analysis.combinations.empty(); }

const std::vector<Response>& governing_responses(const Analysis& analysis) {
    return speaks_of_combinations(analysis) ? analysis.combinations : analysis.cases;
}

const std::string& governing_name(const Analysis& analysis, int response) {
    const auto index = static_cast<std::size_t>(response);
    return speaks_of_combinations(analysis) ? analysis.model->combinations[index].name
                                            : analysis.model->cases[index].name;
}

std::vector<int> movement_responses(const Analysis& analysis) {
    std::vector<int> indices(governing_responses(analysis).size());
    std::iota(indices.begin(), indices.end(), 0);
    if (!speaks_of_combinations(analysis)) return indices;
    std::vector<int> service;
    std::copy_if(indices.begin(), indices.end(), std::back_inserter(service),
                 [&](int index) { return analysis.model->combinations[index].limit == LimitState::service; });
    return service.empty() ? indices : service;
}

Peaks find_peaks(const Analysis& analysis) {
    Peaks peaks;
    const std::vector<int> for_movements = movement_responses(analysis);
    for (int index = 0; index < static_cast<int>(governing_responses(analysis).size()); ++index) {
        const bool movements = std::binary_search(for_movements.begin(), for_movements.end(), index);
        search_response(peaks, analysis, index, movements);
    }
    return peaks;
}

ReactionRange reaction_range(const Analysis& analysis, int support) {
    const std::vector<Response>& responses = governing_responses(analysis);
    const Reaction& first = responses.front().reactions[support];
    ReactionRange range{{first.x, first.x}, {first.y, first.y}, {first.moment, first.moment}};
    for (const Response& response : responses) {
        const Reaction& reaction = response.reactions[support];
        widen(range.x, reaction.x);
        widen(range.y, reaction.y);
        widen(range.moment, reaction.moment);
    }
    return range;
}

} // namespace groundsill
