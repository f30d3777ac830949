#include "analysis/envelope.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill {

namespace {

/// Keeps the first of equal values: a later one must be beyond by more than round-off.
template <class Extreme> void offer(const Extreme& candidate, double tolerance, LeastMost<Extreme>& kept) {
    if (kept.least.combination < 0 || candidate.value < kept.least.value - tolerance) kept.least = candidate;
    if (kept.most.combination < 0 || candidate.value > kept.most.value + tolerance) kept.most = candidate;
}

void offer_reaction(const Reaction& r, int combination, Envelope::OfReaction& kept) {
    const double tolerance = 1e-12 * std::max({std::abs(r.x), std::abs(r.y)});
    offer({r.x, combination, r}, tolerance, kept.x);
    offer({r.y, combination, r}, tolerance, kept.y);
    offer({r.moment, combination, r}, 1e-12 * std::abs(r.moment), kept.moment);
}

/// The values at an extreme; at a jump those on the side that has it.
MemberForces forces_at(const Diagram& diagram, Curve curve, const DiagramExtreme& extreme) {
    const MemberForces after = diagram.value(extreme.at).forces, before = diagram.value_before(extreme.at).forces;
    const auto distance = [&](const MemberForces& f) {
        return std::abs((curve == Curve::N ? f.N : curve == Curve::V ? f.V : f.M) - extreme.value);
    };
    return distance(before) < distance(after) ? before : after;
}

void offer_member(const Diagram& diagram, int combination, Envelope::OfMember& kept) {
    const auto offer_one = [&](Curve curve, LeastMost<ForceExtreme>& into, double tolerance) {
        const DiagramRange range = diagram.extremes(curve, tolerance);
        for (const DiagramExtreme& extreme : {range.max, range.min})
            offer({extreme.value, extreme.at, combination, forces_at(diagram, curve, extreme)}, tolerance, into);
    };
    double force = 0;
    for (const DiagramPiece& piece : diagram.pieces)
        force = std::max({force, std::abs(piece.N[0]), std::abs(piece.V[0]), std::abs(piece.M[0]) / diagram.length});
    offer_one(Curve::N, kept.N, 1e-12 * force);
    offer_one(Curve::V, kept.V, 1e-12 * force);
    offer_one(Curve::M, kept.M, 1e-12 * force * diagram.length);
}

} // namespace

std::optional<Envelope> envelope(const Analysis& analysis, LimitState limit) {
    const Model& model = *analysis.model;
    const auto counts = [&](const Combination& combination) { return combination.limit == limit; };
    if (std::none_of(model.combinations.begin(), model.combinations.end(), counts)) return std::nullopt;
    Envelope result;
    result.reactions.resize(model.supports.size());
    result.members.resize(model.members.size());
    for (int k = 0; k < static_cast<int>(model.combinations.size()); ++k) {
        if (!counts(model.combinations[k])) continue;
        for (std::size_t s = 0; s < result.reactions.size(); ++s)
            offer_reaction(analysis.combinations[k].reactions[s], k, result.reactions[s]);
        for (int m = 0; m < static_cast<int>(result.members.size()); ++m)
            offer_member(combination_diagram(analysis, k, m), k, result.members[m]);
    }
    return result;
}

} // namespace groundsill
