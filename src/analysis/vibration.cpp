#include "analysis/vibration.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include <fmt/format.h>

#include "analysis/mass_loads.hpp"
#include "system/eigen_modes.hpp"
#include "system/member_wise.hpp"

namespace groundsill {

namespace {

/// Longest part of a segment, in lengths 1/β of its bending wave: cubic shapes err by (βh)⁴/1440 in frequency, here
/// 1e-6.
constexpr double wave = 0.2;

/// Most parts of one segment; a wave that short is of no structural interest.
constexpr int most_parts = 200;

/// \param fewest parts of a segment that has mass
int parts_of(const Segment& segment, const SegmentLoadMass& mass, double omega, int fewest) {
    Real total = 0;
    for (const elements::MassLine& line : mass.spread.lines) total += (line.ma + line.mb) / 2 * (line.b - line.a);
    const Real density = total / segment.frame.length;
    if (!(density > 0)) return 1;
    const Real bending = std::pow(density * Real(omega) * omega * segment.frame.bending_flexibility, Real(0.25));
    const Real axial = std::sqrt(density * segment.frame.axial_flexibility) * Real(omega);
    const Real wanted = std::ceil(std::max(bending, axial) * segment.frame.length / Real(wave));
    return static_cast<int>(std::clamp(wanted, Real(fewest), Real(most_parts)));
}

/// Fewest parts of a segment with mass, so that all of them together can move in as many ways as there are modes asked
/// for.
int fewest_parts(const std::vector<SegmentLoadMass>& masses, int modes) {
    const auto loaded =
        std::ranges::count_if(masses, [](const SegmentLoadMass& mass) { return !mass.spread.lines.empty(); });
    if (loaded == 0 || loaded > modes + 3) return 1;
    return 1 + (modes + 3 + static_cast<int>(loaded) - 1) / static_cast<int>(loaded);
}

/// Nearest that cuts and point masses may come to each other and to the ends, in lengths of an even part: shorter parts
/// would be so stiff that the others are lost beside them.
constexpr Real nearest = 1e-3L;

/// Places at which a segment is cut: at its point masses, and evenly where none of them is near.
std::vector<Real> cut_places(const Segment& segment, const SegmentLoadMass& mass, int parts) {
    const Real L = segment.frame.length, part = L / parts;
    std::vector<Real> places;
    for (const PointMass& point : mass.points) places.push_back(point.a);
    std::sort(places.begin(), places.end());
    std::vector<Real> kept;
    for (const Real place : places)
        if (place > nearest * part / 4 && place < L - nearest * part / 4 &&
            (kept.empty() || place > kept.back() + nearest * part))
            kept.push_back(place);
    const std::size_t points = kept.size();
    for (int k = 1; k < parts; ++k) {
        const Real place = part * k;
        const auto is_near = [&](Real other) { return std::abs(other - place) < part / 4; };
        if (std::none_of(kept.begin(), kept.begin() + static_cast<std::ptrdiff_t>(points), is_near))
            kept.push_back(place);
    }
    std::sort(kept.begin(), kept.end());
    return kept;
}

/// True where a release lets the member's end travel apart from the node; one in moment does not.
bool lets_travel(const Release& release) { return !release.axial.is_fixed() || !release.shear.is_fixed(); }

/// A mass at a released end stands on the member's side of the release: a little inside, where it gets a node of its
/// own.
void keep_inside(const Segment& segment, SegmentLoadMass& mass) {
    const Real L = segment.frame.length, margin = nearest * L / 2;
    for (PointMass& point : mass.points) {
        if (lets_travel(segment.frame.start)) point.a = std::max(point.a, margin);
        if (lets_travel(segment.frame.end)) point.a = std::min(point.a, L - margin);
    }
}

/// The mass of a part of a segment, from that of the whole.
elements::SegmentMass part_of(const elements::SegmentMass& whole, Real from, Real length) {
    elements::SegmentMass part;
    part.rotary = whole.rotary;
    for (const elements::MassLine& line : whole.lines) {
        const Real a = std::max(line.a, from), b = std::min(line.b, from + length);
        if (!(b > a)) continue;
        const Real slope = (line.mb - line.ma) / (line.b - line.a);
        part.lines.push_back({a - from, b - from, line.ma + slope * (a - line.a), line.ma + slope * (b - line.a)});
    }
    return part;
}

/// Adds what a movement of all nodes by 1 along x and y puts on the active directions: M 1, with the fixed directions
/// moving too.
void add_pull(const Structure& structure, const Segment& part, const elements::EndMatrix& M,
              VibratingStructure& result) {
    const double c = static_cast<double>(part.frame.cosine), s = static_cast<double>(part.frame.sine);
    for (int axis = 0; axis < 2; ++axis) {
        const double along = axis == 0 ? c : s, across = axis == 0 ? -s : c;
        std::array<Real, 6> f{};
        for (int row = 0; row < 6; ++row)
            f[row] = M[6 * row] * along + M[6 * row + 1] * across + M[6 * row + 3] * along + M[6 * row + 4] * across;
        std::vector<double>& pull = axis == 0 ? result.pull_x : result.pull_y;
        for (int end = 0; end < 2; ++end) {
            const int node = end == 0 ? part.i : part.j;
            const Vector force = to_node(structure.turned_axes(node), c * f[3 * end] - s * f[3 * end + 1],
                                         s * f[3 * end] + c * f[3 * end + 1]);
            pull[3 * node] += static_cast<double>(force.x);
            pull[3 * node + 1] += static_cast<double>(force.y);
            pull[3 * node + 2] += static_cast<double>(f[3 * end + 2]);
        }
    }
}

void add_point(const Structure& structure, int node, double mass, VibratingStructure& result) {
    add_to_node(structure, node, mass, result.mass);
    const Vector along_x = to_node(structure.turned_axes(node), mass, 0);
    const Vector along_y = to_node(structure.turned_axes(node), 0, mass);
    result.pull_x[3 * node] += static_cast<double>(along_x.x);
    result.pull_x[3 * node + 1] += static_cast<double>(along_x.y);
    result.pull_y[3 * node] += static_cast<double>(along_y.x);
    result.pull_y[3 * node + 1] += static_cast<double>(along_y.y);
}

/// The node of the fine structure at a place of a segment.
int node_at(const VibratingStructure& result, int segment, Real place) {
    const Structure& fine = result.fine.structure;
    int best = fine.segments[result.fine.first_part[segment]].i;
    Real distance = std::abs(place), from = 0;
    for (int k = result.fine.first_part[segment]; k < result.fine.first_part[segment + 1]; ++k) {
        from += fine.segments[k].frame.length;
        if (std::abs(place - from) >= distance) continue;
        distance = std::abs(place - from);
        best = fine.segments[k].j;
    }
    return best;
}

/// The largest translation of a mode and where it is; nodes first, then places inside members.
Mode::Place largest_translation(const Structure& structure, const Mode& mode, double& largest) {
    Mode::Place place;
    largest = 0;
    const double ahead = 1 + 1e-9; // a place inside a member must be ahead of a node by more than round-off
    for (std::size_t node = 0; node < mode.nodes.size(); ++node) {
        const double size = std::hypot(mode.nodes[node].x, mode.nodes[node].y);
        if (size <= largest * ahead) continue;
        largest = size;
        place = {static_cast<int>(node), -1, 0};
    }
    for (int m = 0; m < static_cast<int>(structure.model->members.size()); ++m) {
        const Diagram& shape = mode.members[m];
        const auto size_at = [&](double s) {
            const DiagramPlace at = shape.value(s);
            return std::hypot(at.along, at.across);
        };
        const DiagramRange range = shape.extremes(Curve::across, 0);
        for (const double s : {range.max.at, range.min.at}) {
            if (size_at(s) <= largest * ahead) continue;
            largest = size_at(s);
            place = {-1, m, s};
        }
    }
    return place;
}

/// The shape of one mode along the members: the movement of the fine structure's parts.
std::vector<Diagram> member_shapes(const Structure& fine, const Movements& u) {
    std::vector<Diagram> shapes(fine.model->members.size());
    const elements::Loading none = [] {
        elements::Loading loading;
        elements::cut({}, 1, loading);
        return loading;
    }();
    for (const Segment& part : fine.segments) {
        elements::Loading loading = none;
        loading.pieces[0].to = part.frame.length;
        const elements::State start = elements::start_of_shape(
            part.frame, part.stiffness, end_state(fine, part, false, u), end_state(fine, part, true, u));
        Diagram& shape = shapes[part.member];
        elements::append_diagram(part.frame, loading, start, static_cast<double>(part.offset), shape.pieces);
        shape.length = static_cast<double>(part.offset + part.frame.length);
    }
    for (Diagram& shape : shapes) shape.pieces.back().to = shape.length;
    return shapes;
}

void scale_shape(double factor, Mode& mode) {
    for (Mode::NodeShape& node : mode.nodes) {
        node.x *= factor;
        node.y *= factor;
        if (node.rotation) *node.rotation *= factor;
    }
    for (Diagram& shape : mode.members)
        for (DiagramPiece& piece : shape.pieces) {
            for (double& c : piece.along) c *= factor;
            for (double& c : piece.across) c *= factor;
        }
}

/// Shares of the strain energy by member and by support.
std::vector<Mode::Share> flexibility_shares(const Structure& fine, const Movements& u) {
    const Model& model = *fine.model;
    std::vector<Mode::Share> shares;
    for (int m = 0; m < static_cast<int>(model.members.size()); ++m) shares.push_back({.member = m});
    Real total = 0;
    for (const Segment& part : fine.segments) {
        const Real energy = strain_energy(part, basic_forces(fine, part, u));
        shares[part.member].share += static_cast<double>(energy);
        total += energy;
    }
    for (int s = 0; s < static_cast<int>(model.supports.size()); ++s) {
        const Support& support = model.supports[s];
        if (!support.x.is_elastic() && !support.y.is_elastic() && !support.rotation.is_elastic()) continue;
        Real energy = 0;
        for (int d = 3 * support.node; d < 3 * support.node + 3; ++d)
            energy += fine.spring[d] * u.value(d) * u.value(d);
        shares.push_back({.support = s, .share = static_cast<double>(energy)});
        total += energy;
    }
    if (total > 0)
        for (Mode::Share& share : shares) share.share /= static_cast<double>(total);
    return shares;
}

/// Work of the inertia of one part's shape on the further movement that it causes while the part's nodes stay: xᵀ M₂ x,
/// the next term of the exact dynamic stiffness K - λ M - λ² M₂ - ... of the part.
Real further_work(const Segment& part, const elements::SegmentMass& mass, const elements::State& node_i,
                  const elements::State& node_j) {
    if (mass.lines.empty()) return 0;
    Diagram shape;
    elements::Loading none;
    elements::cut({}, part.frame.length, none);
    elements::append_diagram(part.frame, none, elements::start_of_shape(part.frame, part.stiffness, node_i, node_j), 0,
                             shape.pieces);
    shape.length = static_cast<double>(part.frame.length);
    elements::SegmentLoads inertia;
    for (const elements::MassLine& line : mass.lines) {
        const DiagramPlace a = shape.value(static_cast<double>(line.a)), b = shape.value(static_cast<double>(line.b));
        inertia.lines.push_back(
            {line.a, line.b, line.ma * a.along, line.ma * a.across, line.mb * b.along, line.mb * b.across});
    }
    elements::Loading loading;
    elements::cut(inertia, part.frame.length, loading);
    const elements::FixedEnd held = elements::fixed_end(part.frame, loading);
    elements::State start;
    start.N = held.q.N;
    start.M = held.q.M1;
    start.V = held.V_start;
    elements::place_start(part.frame, loading, {}, {}, start);
    Diagram further;
    elements::append_diagram(part.frame, loading, start, 0, further.pieces);
    further.length = shape.length;
    constexpr std::array<double, 3> nodes{-0.7745966692414834, 0, 0.7745966692414834},
        weights{5. / 18, 8. / 18, 5. / 18};
    Real work = 0;
    for (const elements::LineLoad& line : inertia.lines)
        for (int g = 0; g < 3; ++g) {
            const Real t = (1 + nodes[g]) / 2, span = line.b - line.a;
            const DiagramPlace at = further.value(static_cast<double>(line.a + t * span));
            work += weights[g] * span *
                    ((line.pa + (line.pb - line.pa) * t) * at.along + (line.qa + (line.qb - line.qa) * t) * at.across);
        }
    if (mass.rotary > 0 && part.frame.shear_flexibility > 0) {
        // couples c = ρI θ along the held part turn it: c² L³/(12 EI) Φ/(1 + Φ)
        const Real L = part.frame.length;
        const Real phi = 12 * part.frame.shear_flexibility / (part.frame.bending_flexibility * L * L);
        const Real c = mass.rotary * (node_i.rotation + node_j.rotation) / 2;
        work += c * c * L * L * L * part.frame.bending_flexibility / 12 * phi / (1 + phi);
    }
    return work;
}

Real further_work(const VibratingStructure& vibrating, const Movements& u) {
    const Structure& fine = vibrating.fine.structure;
    Real work = 0;
    for (std::size_t k = 0; k < fine.segments.size(); ++k)
        work += further_work(fine.segments[k], vibrating.masses[k], end_state(fine, fine.segments[k], false, u),
                             end_state(fine, fine.segments[k], true, u));
    return work;
}

Mode make_mode(const VibratingStructure& vibrating, double lambda, const std::vector<double>& vector, bool rigid) {
    const Structure& fine = vibrating.fine.structure;
    const Model& model = *fine.model;
    Movements u(fine.directions());
    std::copy(vector.begin(), vector.end(), u.high.begin());
    lambda *= 1 - lambda * static_cast<double>(further_work(vibrating, u));
    Mode mode;
    mode.frequency = rigid ? 0 : std::sqrt(std::max(lambda, 0.0)) / (2 * std::numbers::pi);
    for (int node = 0; node < static_cast<int>(model.nodes.size()); ++node) {
        const Vector travel = to_global(fine.turned_axes(node), vector[3 * node], vector[3 * node + 1]);
        mode.nodes.push_back({static_cast<double>(travel.x), static_cast<double>(travel.y), std::nullopt});
        if (fine.has_rotation[node]) mode.nodes.back().rotation = vector[3 * node + 2];
    }
    mode.members = member_shapes(fine, u);
    double largest = 0;
    mode.largest = largest_translation(fine, mode, largest);
    // of the two signs that with the largest translation up or to the right
    const auto sign_at = [&] {
        if (mode.largest.node >= 0) {
            const Mode::NodeShape& node = mode.nodes[mode.largest.node];
            return std::abs(node.y) >= 0.999 * std::abs(node.x) ? node.y : node.x;
        }
        return mode.members[mode.largest.member].value(mode.largest.at).across;
    };
    if (largest > 0) scale_shape((sign_at() < 0 ? -1 : 1) / largest, mode);
    // the vector has φᵀ M φ = 1; scaled to largest translation 1 it has 1/largest²
    mode.modal_mass = largest > 0 ? 1 / (largest * largest) : 0;
    double gx = 0, gy = 0;
    for (std::size_t d = 0; d < vector.size(); ++d) {
        gx += vector[d] * vibrating.pull_x[d];
        gy += vector[d] * vibrating.pull_y[d];
    }
    mode.effective_x = gx * gx;
    mode.effective_y = gy * gy;
    mode.flexibility = flexibility_shares(fine, u);
    return mode;
}

} // namespace

VibratingStructure cut_for(const Internals& internals, const MassModel& mass, double omega) {
    const Structure& structure = internals.structure;
    std::vector<SegmentLoadMass> masses;
    for (const Segment& segment : structure.segments) masses.push_back(mass_of_segment(internals, mass, segment));
    for (std::size_t k = 0; k < masses.size(); ++k) keep_inside(structure.segments[k], masses[k]);
    const int fewest = fewest_parts(masses, mass.modes);
    VibratingStructure result;
    result.fine = subdivide(structure, [&](int k) {
        return cut_places(structure.segments[k], masses[k], parts_of(structure.segments[k], masses[k], omega, fewest));
    });
    const Structure& fine = result.fine.structure;
    result.stiffness = assemble(fine);
    result.mass = zeros_like(result.stiffness);
    result.pull_x.assign(fine.directions(), 0);
    result.pull_y.assign(fine.directions(), 0);
    for (int k = 0; k < static_cast<int>(structure.segments.size()); ++k) {
        for (int part = result.fine.first_part[k]; part < result.fine.first_part[k + 1]; ++part) {
            const Segment& segment = fine.segments[part];
            result.masses.push_back(
                part_of(masses[k].spread, segment.offset - structure.segments[k].offset, segment.frame.length));
            const elements::EndMatrix M =
                elements::consistent_mass(segment.frame, segment.stiffness, result.masses.back());
            add_end_matrix(fine, segment, M, result.mass);
            add_pull(fine, segment, M, result);
        }
        for (const PointMass& point : masses[k].points)
            add_point(fine, node_at(result, k, point.a), static_cast<double>(point.mass), result);
    }
    const std::vector<double> on_nodes = mass_of_nodes(structure, mass);
    for (int node = 0; node < structure.node_count; ++node)
        if (on_nodes[node] > 0) add_point(fine, node, on_nodes[node], result);
    return result;
}

Vibration find_modes(const Internals& internals, const MassModel& mass, bool is_free) {
    VibratingStructure vibrating = cut_for(internals, mass, 0);
    EigenPairs pairs;
    double fits = 0;
    for (int round = 0; round < 6; ++round) {
        pairs = lowest_modes(vibrating.fine.structure, vibrating.stiffness, vibrating.mass, mass.modes, is_free);
        if (pairs.values.empty()) break;
        const double omega = std::sqrt(std::max(pairs.values.back(), 0.0));
        // the parts must fit the highest mode; its own estimate can only fall as they get shorter
        if (omega <= fits) break;
        fits = omega;
        VibratingStructure finer = cut_for(internals, mass, fits);
        if (finer.fine.structure.node_count == vibrating.fine.structure.node_count) break;
        vibrating = std::move(finer);
    }
    Vibration result;
    result.modes_missed = pairs.missed;
    const double largest = pairs.values.empty() ? 0 : std::abs(pairs.values.back());
    for (std::size_t k = 0; k < pairs.values.size(); ++k)
        result.modes.push_back(
            make_mode(vibrating, pairs.values[k], pairs.vectors[k], is_free && pairs.values[k] < 1e-7 * largest));
    // the correction can change the order of modes that lie close together
    std::ranges::stable_sort(result.modes, {}, &Mode::frequency);
    if (pairs.exhausted)
        result.warnings.push_back(
            fmt::format("[mass] asks for {} modes, but the mass allows only {} with a finite frequency", mass.modes,
                        pairs.values.size()));
    if (pairs.missed > 0)
        result.warnings.push_back(
            fmt::format("{} natural frequencies below the last one listed were not found", pairs.missed));
    return result;
}

} // namespace groundsill
