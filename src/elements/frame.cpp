#include "elements/frame.hpp"

namespace groundsill::elements {

namespace {

bool any_shear_free(const Frame& frame) { return frame.start.shear.is_free() || frame.end.shear.is_free(); }

} // namespace

BendingFlexibility end_moment_flexibility(const Frame& frame) {
    const Real L = frame.length;
    // Virtual forces: the states M1 = 1 and M2 = 1 have the moments 1 - s/L and s/L and the shears -1/L and 1/L.
    const Real shear =
        (frame.shear_flexibility + (flexibility_of(frame.start.shear) + flexibility_of(frame.end.shear)) / L) / L;
    const Real b = L * frame.bending_flexibility / 6;
    const Real start = flexibility_of(frame.start.moment);
    const Real end = flexibility_of(frame.end.moment);
    // (2b + start + shear)(2b + end + shear) - (b - shear)², opened up so that only positive terms are added
    const Real bending = 3 * b * b + 2 * b * (start + end) + start * end;
    return {2 * b + start + shear, b - shear, 2 * b + end + shear, bending + shear * (6 * b + start + end)};
}

BendingSpace bending_space(const Frame& frame) {
    const bool first = frame.start.moment.is_free();
    const bool second = frame.end.moment.is_free();
    const bool shear = any_shear_free(frame);
    if (int(first) + int(second) + int(shear) >= 2) return {.count = 0};
    if (first) return {.count = 1, .z1 = 0, .z2 = 1};
    if (second) return {.count = 1, .z1 = 1, .z2 = 0};
    if (shear) return {.count = 1, .z1 = 1, .z2 = 1};
    return {};
}

ShearPath shear_path(const Frame& frame) {
    const bool first = frame.start.moment.is_free(), second = frame.end.moment.is_free();
    if (any_shear_free(frame) || (first && second)) return {};
    const Real L = frame.length;
    const Real b = L * frame.bending_flexibility / 6;
    const Real start = flexibility_of(frame.start.moment), end = flexibility_of(frame.end.moment);
    ShearPath path{.passes = true};
    Real turning = 0;
    if (first) {
        turning = 2 * b + end;
    } else if (second) {
        path.share = 1;
        turning = 2 * b + start;
    } else {
        // both moments act: e1 + e2 = 0 while only the chord turns
        path.share = (3 * b + end) / (6 * b + start + end);
        turning = (3 * b * b + 2 * b * (start + end) + start * end) / (6 * b + start + end);
    }
    path.bending = turning + frame.shear_flexibility / L;
    path.flexibility = path.bending + (flexibility_of(frame.start.shear) + flexibility_of(frame.end.shear)) / (L * L);
    return path;
}

Real elongation_flexibility(const Frame& frame) {
    return frame.length * frame.axial_flexibility + flexibility_of(frame.start.axial) + flexibility_of(frame.end.axial);
}

bool is_axially_free(const Frame& frame) { return frame.start.axial.is_free() || frame.end.axial.is_free(); }

BasicStiffness basic_stiffness(const Frame& frame) {
    BasicStiffness k;
    if (!is_axially_free(frame)) k.axial = 1 / elongation_flexibility(frame);
    const BendingFlexibility f = end_moment_flexibility(frame);
    const BendingSpace space = bending_space(frame);
    if (space.count == 2) {
        // K = F⁻¹
        const Real inverse = 1 / f.determinant;
        k = {k.axial, f.f22 * inverse, -f.f12 * inverse, f.f11 * inverse, 0, 0};
    } else if (space.count == 1) {
        // K = Z (Zᵀ F Z)⁻¹ Zᵀ
        const Real flex = space.z1 * space.z1 * f.f11 + 2 * space.z1 * space.z2 * f.f12 + space.z2 * space.z2 * f.f22;
        k.k11 = space.z1 * space.z1 / flex;
        k.k12 = space.z1 * space.z2 / flex;
        k.k22 = space.z2 * space.z2 / flex;
    }
    const ShearPath path = shear_path(frame);
    if (path.passes) {
        k.v1 = -path.share / (path.flexibility * frame.length);
        k.v2 = (1 - path.share) / (path.flexibility * frame.length);
    }
    return k;
}

std::string self_mechanism(const Frame& frame) {
    if (frame.start.axial.is_free() && frame.end.axial.is_free()) return "axial is free at both ends";
    if (frame.start.shear.is_free() && frame.end.shear.is_free()) return "shear is free at both ends";
    if (frame.start.moment.is_free() && frame.end.moment.is_free() && any_shear_free(frame))
        return "moment is free at both ends and shear at one, so that it can turn";
    return {};
}

} // namespace groundsill::elements
