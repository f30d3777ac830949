// Cases on one factorisation, combinations by superposition.

#include <algorithm>
#include <cmath>
#include <initializer_list>
#include <iterator>
#include <stdexcept>

#include <fmt/format.h>

#include "analysis/case_loads.hpp"
#include "analysis/envelope.hpp"
#include "analysis/verification.hpp"
#include "analysis/vibration.hpp"
#include "groundsill/analysis.hpp"
#include "system/mechanism.hpp"

namespace groundsill {

namespace {

/// A load in global axes turned into those of a node.
void add_to_node(const Structure& structure, int node, Real x, Real y, Real moment, std::vector<Real>& nodal) {
    const Vector force = to_node(structure.turned_axes(node), x, y);
    nodal[3 * node] += force.x;
    nodal[3 * node + 1] += force.y;
    nodal[3 * node + 2] += moment;
}

/// Imposed movements of the supports' own directions, by direction; zero where none is imposed.
std::vector<Real> imposed_movements(const Structure& structure, const LoadCase& load_case) {
    std::vector<Real> imposed(structure.directions(), 0);
    for (const SupportMovement& movement : load_case.movements) {
        const int node = structure.model->supports[movement.support].node;
        imposed[3 * node] += movement.x;
        imposed[3 * node + 1] += movement.y;
        imposed[3 * node + 2] += movement.rotation;
    }
    return imposed;
}

LoadVector make_load_vector(const Internals& internals, int index, const std::vector<Real>& imposed) {
    const Structure& structure = internals.structure;
    const LoadCase& load_case = structure.model->cases[index];
    LoadVector loads;
    loads.nodal.assign(structure.directions(), 0);
    for (const NodeLoad& load : load_case.node_loads)
        add_to_node(structure, load.node, load.x, load.y, load.moment, loads.nodal);
    // a spring whose far end moves by Δ pushes with k Δ
    for (int d = 0; d < structure.directions(); ++d)
        if (imposed[d] != 0 && structure.spring[d] != 0) loads.nodal[d] += structure.spring[d] * imposed[d];
    if (!internals.loads.loads_members(index)) return loads;
    loads.fixed.resize(structure.segments.size());
    elements::SegmentLoads acting;
    elements::Loading loading;
    for (std::size_t k = 0; k < structure.segments.size(); ++k) {
        const Segment& segment = structure.segments[k];
        acting.clear();
        internals.loads.add(structure, index, 1, segment, acting);
        if (acting.empty()) continue;
        elements::cut(acting, segment.frame.length, loading);
        loads.fixed[k] = elements::fixed_end(segment.frame, loading);
    }
    return loads;
}

/// A force below the noise is none.
Real cleaned(Real force, Real noise) { return std::abs(force) < noise ? Real(0) : force; }

Reaction reaction_of(const Structure& structure, const Support& support, const std::vector<Real>& missing,
                     const std::vector<Real>& imposed, const Movements& u, Real noise) {
    const Restraint* restraints[] = {&support.x, &support.y, &support.rotation};
    Real force[3] = {0, 0, 0};
    for (int c = 0; c < 3; ++c) {
        const int d = 3 * support.node + c;
        if (restraints[c]->is_fixed()) force[c] = -missing[d];
        if (restraints[c]->is_elastic()) force[c] = -restraints[c]->stiffness * ((u.high[d] - imposed[d]) + u.low[d]);
        force[c] = cleaned(force[c], noise * (c == 2 ? structure.size : Real(1)));
    }
    const Vector global = to_global(structure.turned_axes(support.node), force[0], force[1]);
    return {static_cast<double>(global.x), static_cast<double>(global.y), static_cast<double>(force[2])};
}

NodeMovement movement_of(const Structure& structure, int node, const Movements& u) {
    const Vector travel = to_global(structure.turned_axes(node), u.value(3 * node), u.value(3 * node + 1));
    NodeMovement movement{static_cast<double>(travel.x), static_cast<double>(travel.y), std::nullopt};
    if (structure.has_rotation[node]) movement.rotation = static_cast<double>(u.value(3 * node + 2));
    return movement;
}

/// \param acting, loading room to work in
/// \param noise size of forces that are round-off
SegmentState state_of(const Internals& internals, int load_case, const Segment& segment,
                      const elements::FixedEnd* fixed, const Movements& u, Real noise, elements::SegmentLoads& acting,
                      elements::Loading& loading) {
    const Structure& structure = internals.structure;
    const EndForces f = end_forces(basic_forces(structure, segment, u), fixed);
    acting.clear();
    if (fixed) internals.loads.add(structure, load_case, 1, segment, acting);
    elements::State start;
    start.N = cleaned(-f.along_i, noise);
    start.V = cleaned(f.across_i, noise);
    start.M = cleaned(-f.moment_i, noise * structure.size);
    elements::cut(acting, segment.frame.length, loading);
    elements::place_start(segment.frame, loading, end_state(structure, segment, false, u),
                          end_state(structure, segment, true, u), start);
    const auto d = [](Real value) { return static_cast<double>(value); };
    return {d(start.N), d(start.V), d(start.M), d(start.along), d(start.across), d(start.rotation)};
}

/// The finished response of a case from its movements.
Response respond(const Internals& internals, int load_case, const LoadVector& loads, const std::vector<Real>& imposed,
                 const Refined& refined) {
    const Structure& structure = internals.structure;
    const Model& model = *structure.model;
    const Movements& u = refined.u;
    const Real noise = Real(1e-19) * refined.held;
    Response response;
    response.movements.reserve(model.nodes.size());
    for (int node = 0; node < static_cast<int>(model.nodes.size()); ++node)
        response.movements.push_back(movement_of(structure, node, u));
    Real scale = 0;
    const std::vector<Real> missing = residual(structure, loads, u, scale);
    for (const Support& support : model.supports)
        response.reactions.push_back(reaction_of(structure, support, missing, imposed, u, noise));
    response.segments.reserve(structure.segments.size());
    elements::SegmentLoads acting;
    elements::Loading loading;
    for (std::size_t k = 0; k < structure.segments.size(); ++k)
        response.segments.push_back(state_of(internals, load_case, structure.segments[k],
                                             loads.fixed.empty() ? nullptr : &loads.fixed[k], u, noise, acting,
                                             loading));
    return response;
}

Response solve_case(const Internals& internals, const Factor& factor, const SoftShapes& soft, int load_case,
                    Verification& verification) {
    const Structure& structure = internals.structure;
    const std::vector<Real> imposed = imposed_movements(structure, structure.model->cases[load_case]);
    const LoadVector loads = make_load_vector(internals, load_case, imposed);
    Movements given(structure.directions());
    for (int d = 0; d < structure.directions(); ++d)
        if (!structure.active[d]) given.high[d] = imposed[d];
    const Refined refined = refine(structure, factor, soft, loads, given);
    verification.residual = std::max(verification.residual, refined.residual);
    Response response = respond(internals, load_case, loads, imposed, refined);
    verification.equilibrium = std::max(verification.equilibrium, imbalance(internals, load_case, response));
    return response;
}

void add_scaled(const Response& from, double factor, Response& to) {
    for (std::size_t k = 0; k < from.movements.size(); ++k) {
        to.movements[k].x += factor * from.movements[k].x;
        to.movements[k].y += factor * from.movements[k].y;
        if (from.movements[k].rotation)
            to.movements[k].rotation = to.movements[k].rotation.value_or(0) + factor * *from.movements[k].rotation;
    }
    for (std::size_t k = 0; k < from.reactions.size(); ++k) {
        to.reactions[k].x += factor * from.reactions[k].x;
        to.reactions[k].y += factor * from.reactions[k].y;
        to.reactions[k].moment += factor * from.reactions[k].moment;
    }
    for (std::size_t k = 0; k < from.segments.size(); ++k) {
        const SegmentState& a = from.segments[k];
        SegmentState& b = to.segments[k];
        b.N += factor * a.N;
        b.V += factor * a.V;
        b.M += factor * a.M;
        b.along += factor * a.along;
        b.across += factor * a.across;
        b.rotation += factor * a.rotation;
    }
}

Response superpose(const std::vector<Response>& cases, const Combination& combination) {
    Response sum;
    sum.movements.resize(cases[0].movements.size());
    sum.reactions.resize(cases[0].reactions.size());
    sum.segments.resize(cases[0].segments.size());
    for (std::size_t k = 0; k < sum.movements.size(); ++k)
        if (cases[0].movements[k].rotation) sum.movements[k].rotation = 0;
    for (const Combination::Term& term : combination.terms) add_scaled(cases[term.load_case], term.factor, sum);
    return sum;
}

/// A moment on a node that has no rotation has nothing to work against.
Diagnostics describe_lost_moments(const Structure& structure) {
    Diagnostics found;
    for (const LoadCase& load_case : structure.model->cases)
        for (const NodeLoad& load : load_case.node_loads)
            if (load.moment != 0 && !structure.has_rotation[load.node])
                found.push_back(
                    {Diagnostic::Severity::error, load_case.position,
                     fmt::format(
                         "the structure is a mechanism: the moment of case {} at node {} turns it freely. What lets "
                         "it: every "
                         "member there is released in moment and no support holds the rotation. Put the moment on a "
                         "member, or take one release away.",
                         load_case.name, node_name(structure, load.node))});
    return found;
}

/// Most mechanisms that are told one by one.
constexpr std::size_t most_told = 5;

Diagnostics describe_all(const Structure& structure, const std::vector<Shape>& mechanisms) {
    Diagnostics found;
    for (std::size_t k = 0; k < std::min(mechanisms.size(), most_told); ++k)
        found.push_back(describe_mechanism(structure, mechanisms[k]));
    if (mechanisms.size() > most_told)
        found.back().message += fmt::format(" It has {} more ways to move.", mechanisms.size() - most_told);
    return found;
}

/// Why the structure cannot stand; nothing when it can.
Diagnostics find_refusals(const Structure& structure) {
    Diagnostics found = describe_self_mechanisms(structure);
    if (found.empty()) found = describe_lost_moments(structure);
    return found;
}

bool is_finite(const Response& response) {
    const auto all = [](std::initializer_list<double> values) {
        return std::all_of(values.begin(), values.end(), [](double value) { return std::isfinite(value); });
    };
    return std::ranges::all_of(response.movements,
                               [&](const NodeMovement& u) {
                                   return all({u.x, u.y, u.rotation.value_or(0)});
                               }) &&
           std::ranges::all_of(response.reactions,
                               [&](const Reaction& r) {
                                   return all({r.x, r.y, r.moment});
                               }) &&
           std::ranges::all_of(response.segments, [&](const SegmentState& s) {
               return all({s.N, s.V, s.M, s.along, s.across, s.rotation});
           });
}

/// Largest relative residual that still is an answer; a thousandth of it is warned of.
constexpr double largest_residual = 1e-6;

/// Results that are none: numbers out of range, or a solution that does not balance its loads.
Diagnostics find_failures(const Analysis& analysis) {
    const auto refuse = [](std::string message) {
        return Diagnostics{{Diagnostic::Severity::error, {}, std::move(message)}};
    };
    if (!std::ranges::all_of(analysis.cases, is_finite) || !std::ranges::all_of(analysis.combinations, is_finite))
        return refuse("the results are beyond what numbers can hold: check the units of lengths, stiffnesses, loads "
                      "and factors.");
    if (analysis.verification.residual > largest_residual)
        return refuse(fmt::format(
            "the structure cannot be solved: its stiffnesses differ so much that {:.1e} of the forces is left "
            "unbalanced; check for members that are extremely short or stiff, and for slips of units.",
            analysis.verification.residual));
    return {};
}

void warn(Analysis& analysis) {
    if (analysis.verification.residual > largest_residual / 1000)
        analysis.warnings.push_back(
            fmt::format("the residual of {:.1e} is larger than round-off: stiffnesses differ so much that "
                        "small forces may be wrong; check members and springs for slips of units.",
                        analysis.verification.residual));
    // many short parts have a large condition number too, but they balance to round-off
    if (analysis.verification.condition > 1e13 && analysis.verification.residual > 1e-12)
        analysis.warnings.push_back(
            fmt::format("the stiffness is badly conditioned ({:.1e}): the structure is close to a "
                        "mechanism; check for nearly free directions.",
                        analysis.verification.condition));
}

} // namespace

Outcome analyse(const Model& model) {
    Outcome outcome;
    const auto internals = std::make_shared<Internals>(Internals{number_structure(model), CaseLoads(model)});
    const Structure& structure = internals->structure;
    outcome.refusals = find_refusals(structure);
    if (!outcome.refusals.empty()) return outcome;

    const BlockMatrix matrix = assemble(structure);
    const Factor factor(matrix);
    const MechanismSearch search = find_mechanisms(structure, matrix, factor);
    if (!search.mechanisms.empty()) {
        outcome.refusals = describe_all(structure, search.mechanisms);
        return outcome;
    }
    Analysis analysis;
    analysis.model = &model;
    analysis.internals = internals;
    for (int k = 0; k < static_cast<int>(model.cases.size()); ++k)
        analysis.cases.push_back(solve_case(*internals, factor, search.soft, k, analysis.verification));
    for (const Combination& combination : model.combinations)
        analysis.combinations.push_back(superpose(analysis.cases, combination));
    analysis.verification.condition = scaled_condition(structure, matrix, factor, search.soft);
    outcome.refusals = find_failures(analysis);
    if (!outcome.refusals.empty()) return outcome;
    analysis.strength = envelope(analysis, LimitState::strength);
    analysis.service = envelope(analysis, LimitState::service);
    warn(analysis);
    if (model.mass) {
        try {
            analysis.vibration = find_modes(*internals, *model.mass, false);
            std::ranges::copy(analysis.vibration->warnings, std::back_inserter(analysis.warnings));
        } catch (const std::runtime_error& error) {
            // the statics stand without them
            analysis.warnings.push_back(fmt::format("no natural frequencies: {}", error.what()));
        }
    }
    outcome.analysis = std::move(analysis);
    return outcome;
}

} // namespace groundsill
