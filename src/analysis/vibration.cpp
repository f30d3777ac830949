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

/// Error in frequency that is allowed to the shapes along the axis and to shear, whose slopes are constant in a part:
/// each errs by (kh)²/24 of its share of the mode's strain energy, k the wave number.
constexpr double straight_error = 1e-5;

/// Most parts of one segment; a wave that short is of no structural interest.
constexpr int most_parts = 200;

/// Mass per length where it is densest, or a little more where line loads do not overlap.
Real densest(const SegmentLoadMass& mass) {
    Real density = 0;
    for (const elements::MassLine& line : mass.spread.lines) density += std::max(line.ma, line.mb);
    return density;
}

/// Wave numbers of bending, (m ω² /EI)^¼, and along the axis, (m ω²/EA)^½; 1/m.
struct WaveNumbers {
    Real bending = 0;
    Real axial = 0;
};

WaveNumbers wave_numbers(const Segment& segment, Real density, Real omega) {
    return {std::pow(density * omega * omega * segment.frame.bending_flexibility, Real(0.25)),
            std::sqrt(density * segment.frame.axial_flexibility) * omega};
}

int parts_of(const Segment& segment, const SegmentLoadMass& mass, const Fineness& fineness, int index) {
    const Real density = densest(mass);
    if (!(density > 0)) return 1;
    const WaveNumbers waves = wave_numbers(segment, density, fineness.circular_frequency);
    Real finest = std::max(waves.bending, waves.axial) / Real(wave);
    if (!fineness.per_segment.empty()) finest = std::max(finest, Real(fineness.per_segment[index]));
    return static_cast<int>(std::clamp(std::ceil(finest * segment.frame.length), Real(1), Real(most_parts)));
}

/// Places at which a segment is cut: evenly, and at its point masses.
std::vector<Real> cut_places(const Segment& segment, const SegmentLoadMass& mass, int parts) {
    const Real L = segment.frame.length;
    std::vector<Real> places;
    for (int k = 1; k < parts; ++k) places.push_back(L * k / parts);
    for (const PointMass& point : mass.points) places.push_back(point.a);
    std::sort(places.begin(), places.end());
    const Real near = Real(1e-9) * L;
    std::vector<Real> kept;
    for (const Real place : places)
        if (place > near && place < L - near && (kept.empty() || place > kept.back() + near)) kept.push_back(place);
    return kept;
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

Movements movements_of(const std::vector<double>& vector) {
    Movements u(static_cast<int>(vector.size()));
    std::copy(vector.begin(), vector.end(), u.high.begin());
    return u;
}

Mode make_mode(const VibratingStructure& vibrating, double lambda, const std::vector<double>& vector, bool rigid) {
    const Structure& fine = vibrating.fine.structure;
    const Model& model = *fine.model;
    const Movements u = movements_of(vector);
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

VibratingStructure cut_for(const Internals& internals, const MassModel& mass, const Fineness& fineness) {
    const Structure& structure = internals.structure;
    std::vector<SegmentLoadMass> masses;
    for (const Segment& segment : structure.segments) masses.push_back(mass_of_segment(internals, mass, segment));
    VibratingStructure result;
    result.fine = subdivide(structure, [&](int k) {
        return cut_places(structure.segments[k], masses[k], parts_of(structure.segments[k], masses[k], fineness, k));
    });
    const Structure& fine = result.fine.structure;
    result.stiffness = assemble(fine);
    result.mass = zeros_like(result.stiffness);
    result.pull_x.assign(fine.directions(), 0);
    result.pull_y.assign(fine.directions(), 0);
    for (int k = 0; k < static_cast<int>(structure.segments.size()); ++k) {
        for (int part = result.fine.first_part[k]; part < result.fine.first_part[k + 1]; ++part) {
            const Segment& segment = fine.segments[part];
            const elements::EndMatrix M = elements::consistent_mass(
                segment.frame, segment.stiffness,
                part_of(masses[k].spread, segment.offset - structure.segments[k].offset, segment.frame.length));
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

namespace {

/// Strain energies of one mode in a segment, along the axis and from shear.
struct StraightEnergies {
    Real axial = 0;
    Real shear = 0;
};

StraightEnergies straight_energies(const VibratingStructure& vibrating, int segment, const Movements& u) {
    const Structure& fine = vibrating.fine.structure;
    StraightEnergies energies;
    for (int part = vibrating.fine.first_part[segment]; part < vibrating.fine.first_part[segment + 1]; ++part) {
        const elements::BasicForces q = basic_forces(fine, fine.segments[part], u);
        const elements::Frame& frame = fine.segments[part].frame;
        energies.axial += q.N * q.N * frame.length * frame.axial_flexibility;
        energies.shear += q.V * q.V * frame.length * frame.shear_flexibility;
    }
    return energies;
}

/// The cut that the modes found so far ask for.
Fineness fineness_for(const Internals& internals, const MassModel& mass, const VibratingStructure& vibrating,
                      const EigenPairs& pairs) {
    const Structure& structure = internals.structure;
    Fineness fineness;
    fineness.circular_frequency = std::sqrt(std::max(pairs.values.back(), 0.0));
    fineness.per_segment.assign(structure.segments.size(), 0);
    std::vector<Real> densities;
    for (const Segment& segment : structure.segments)
        densities.push_back(densest(mass_of_segment(internals, mass, segment)));
    for (std::size_t mode = 0; mode < pairs.values.size(); ++mode) {
        if (!(pairs.values[mode] > 0)) continue;
        const Movements u = movements_of(pairs.vectors[mode]);
        // φᵀ K φ = λ, as φᵀ M φ = 1
        const Real scale = 24 * Real(straight_error) * pairs.values[mode];
        for (int k = 0; k < static_cast<int>(structure.segments.size()); ++k) {
            const StraightEnergies energies = straight_energies(vibrating, k, u);
            const WaveNumbers waves =
                wave_numbers(structure.segments[k], densities[k], std::sqrt(Real(pairs.values[mode])));
            const Real finest = std::max(waves.axial * std::sqrt(energies.axial / scale),
                                         waves.bending * std::sqrt(energies.shear / scale));
            fineness.per_segment[k] = std::max(fineness.per_segment[k], static_cast<double>(finest));
        }
    }
    return fineness;
}

} // namespace

Vibration find_modes(const Internals& internals, const MassModel& mass, bool is_free) {
    VibratingStructure vibrating = cut_for(internals, mass, {});
    EigenPairs pairs;
    for (int round = 0; round < 6; ++round) {
        pairs = lowest_modes(vibrating.fine.structure, vibrating.stiffness, vibrating.mass, mass.modes, is_free);
        if (pairs.values.empty()) break;
        VibratingStructure finer = cut_for(internals, mass, fineness_for(internals, mass, vibrating, pairs));
        // the frequencies can only fall as parts get shorter: a cut that is no finer will do
        if (finer.fine.structure.node_count <= vibrating.fine.structure.node_count) break;
        vibrating = std::move(finer);
    }
    Vibration result;
    result.modes_missed = pairs.missed;
    const double largest = pairs.values.empty() ? 0 : std::abs(pairs.values.back());
    for (std::size_t k = 0; k < pairs.values.size(); ++k)
        result.modes.push_back(
            make_mode(vibrating, pairs.values[k], pairs.vectors[k], is_free && pairs.values[k] < 1e-7 * largest));
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
