#include "reading/keys.hpp"

#include <cstdlib>

namespace groundsill::reading {
namespace {

namespace dim = dimension;
constexpr bool later = false; // in the place of `available`

// clang-format off
constexpr Key rows[] = {
    // The whole file
    {"model", "title", text, {}, "", "", "title of the job, printed at the head of the results"},
    {"model", "notes", text, {}, "", "", "free text, printed in the report"},
    {"model", "job", table, {}, "", "job", "what is printed at the head of every page of the report"},
    {"model", "units", table, {}, "", "units", "units of bare numbers and of printed results"},
    {"model", "materials", table, {}, "", "materials", "materials by name"},
    {"model", "sections", table, {}, "", "sections", "cross-sections by name"},
    {"model", "soils", table, {}, "", "soils", "soils by name", later},
    {"model", "nodes", table, {}, "", "nodes", "nodes by name, each [x, y]"},
    {"model", "members", table, {}, "", "members", "straight members between two nodes"},
    {"model", "beams", table, {}, "", "beams", "straight runs of members through supports"},
    {"model", "supports", table, {}, "", "supports", "supports, by the node they stand under"},
    {"model", "cases", table, {}, "", "cases", "load cases"},
    {"model", "combinations", table, {}, "", "combinations", "sums of cases with factors"},
    {"model", "checks", table, {}, "", "checks", "limits to be kept", later},
    {"model", "mass", table, {}, "", "mass", "asks for natural frequencies"},
    {"model", "floor", table, {}, "", "floor", "asks for walking-vibration screening", later},
    {"model", "stability", table, {}, "", "stability", "asks for critical load factors", later},

    {"job", "number", text, {}, "", "", "number of the job"},
    {"job", "client", text, {}, "", "", "who it is for"},
    {"job", "revision", text, {}, "", "", "revision of the calculation"},
    {"job", "by", text, {}, "", "", "who made it"},
    {"job", "checked", text, {}, "", "", "who checked it"},
    {"job", "date", text, {}, "", "", "date of the calculation"},

    {"units", "length", text, dim::length, "", "", "unit of length of bare numbers, like \"m\""},
    {"units", "force", text, dim::force, "", "", "unit of force of bare numbers, like \"kN\""},
    {"units", "display", word, {}, "metric|us", "", "units of printed results; default follows length"},

    // Materials, sections, soils
    {"materials", "*", table, {}, "", "material", "a material"},
    {"material", "E", quantity | positive, dim::stress, "", "", "Young's modulus"},
    {"material", "poisson", number, {}, "", "", "Poisson's ratio, for shear flexibility"},
    {"material", "G", quantity | positive, dim::stress, "", "", "shear modulus, instead of poisson"},
    {"material", "density", quantity | not_negative | with_unit, dim::density, "", "", "mass per volume, for self-weight"},
    {"material", "weight", quantity | not_negative, dim::force_per_volume, "", "", "weight per volume, instead of density"},
    {"material", "expansion", quantity, dim::expansion, "", "", "coefficient of thermal expansion"},
    {"material", "creep", number | not_negative, {}, "", "", "creep coefficient: long cases act on E/(1 + creep)", later},
    {"material", "strength", quantity | table | positive, dim::stress, "", "strength", "elastic limit of the fibre stress"},
    {"strength", "tension", quantity | positive, dim::stress, "", "", "limit in tension"},
    {"strength", "compression", quantity | positive, dim::stress, "", "", "limit in compression"},

    {"sections", "*", table, {}, "", "section", "a cross-section"},
    {"section", "shape", word, {}, "rectangle|circle|pipe|box|i|tee|channel", "", "shape, given by its dimensions"},
    {"section", "designation", text, {}, "", "", "rolled section of the built-in tables, like \"IPE 300\""},
    {"section", "width", quantity | positive, dim::length, "", "", "width of a rectangle, box, i, tee or channel"},
    {"section", "depth", quantity | positive, dim::length, "", "", "depth, along the member's across axis"},
    {"section", "diameter", quantity | positive, dim::length, "", "", "outer diameter of a circle or pipe"},
    {"section", "wall", quantity | positive, dim::length, "", "", "wall thickness of a pipe or box"},
    {"section", "web", quantity | positive, dim::length, "", "", "web thickness of an i, tee or channel"},
    {"section", "flange", quantity | positive, dim::length, "", "", "flange thickness of an i, tee or channel"},
    {"section", "root", quantity | not_negative, dim::length, "", "", "root radius of an i; default 0"},
    {"section", "shear", boolean, {}, "", "", "takes the usual shear area of the shape"},
    {"section", "A", quantity | positive, dim::area, "", "", "area"},
    {"section", "I", quantity | positive, dim::second_moment, "", "", "second moment of area in the plane of the frame"},
    {"section", "shear_area", quantity | positive, dim::area, "", "", "shear area: makes the member shear-flexible"},

    {"soils", "*", table, {}, "", "soil", "an isotropic half-space", later},
    {"soil", "E", quantity | positive, dim::stress, "", "", "Young's modulus", later},
    {"soil", "G", quantity | positive, dim::stress, "", "", "shear modulus, instead of E", later},
    {"soil", "poisson", number, {}, "", "", "Poisson's ratio", later},
    {"soil", "varies", range | positive, {}, "", "", "range of its stiffness, as factors", later},
    {"soil", "nominal", number | positive, {}, "", "", "factor of the nominal model", later},

    // Nodes, members, beams
    {"nodes", "*", pair, dim::length, "", "", "coordinates x and y"},

    {"members", "*", table, {}, "", "member", "a straight member"},
    {"member", "from", name, {}, "node", "", "node at its start"},
    {"member", "to", name, {}, "node", "", "node at its end"},
    {"member|beam", "section", name, {}, "section", "", "its section"},
    {"member|beam", "material", name, {}, "material", "", "its material"},
    {"member|beam", "releases", table, {}, "", "releases", "ends that are not rigidly connected"},
    {"member|beam", "acts", word, {}, "both|tension|compression", "", "sign of the axial force that it can carry", later},
    {"member|beam", "stiffness_factor", number | positive, {}, "", "", "times E A, E I and shear stiffness; default 1"},
    {"member|beam", "bed", table, {}, "", "bed", "Winkler ground below it", later},

    {"releases", "start|end", table, {}, "", "release", "the connection at that end"},
    {"release", "axial|shear", word | quantity | table | positive, dim::force_per_length, "free", "spring", "connection along or across the member"},
    {"release", "moment", word | quantity | table | positive, dim::moment, "free", "rotation_spring", "connection in rotation"},
    {"spring", "stiffness", quantity | positive, dim::force_per_length, "", "", "stiffness"},
    {"rotation_spring", "stiffness", quantity | positive, dim::moment, "", "", "stiffness"},
    {"spring|rotation_spring", "varies", range | positive, {}, "", "", "range of the stiffness, as factors", later},
    {"spring|rotation_spring", "nominal", number | positive, {}, "", "", "factor of the nominal model", later},

    {"bed", "modulus", quantity | positive, dim::force_per_volume, "", "", "bed modulus, with width", later},
    {"bed", "width", quantity | positive, dim::length, "", "", "width of the bed", later},
    {"bed", "stiffness", quantity | positive, dim::stress, "", "", "stiffness per length, instead of modulus", later},
    {"bed", "soil", name, {}, "soil", "", "soil whose stiffness gives that of the bed, with width", later},
    {"bed", "along", quantity | positive, dim::stress, "", "", "stiffness per length along the member", later},
    {"bed", "contact", word, {}, "both|compression", "", "whether the bed can pull", later},
    {"bed", "varies", range | positive, {}, "", "", "range of the stiffness, as factors", later},
    {"bed", "nominal", number | positive, {}, "", "", "factor of the nominal model", later},

    {"beams", "*", table, {}, "", "beam", "a straight run of members"},
    {"beam", "nodes", names, {}, "node", "", "its nodes in order, created where they do not exist"},
    {"beam", "spans", list | positive, dim::length, "", "", "distances between them"},
    {"beam", "start", pair, dim::length, "", "", "where the run begins; default the origin"},
    {"beam", "direction", quantity | with_unit, dim::angle, "", "", "direction of the run, counter-clockwise from x"},
    {"beam", "hinges", list | fraction | positive, dim::length, "", "", "moment hinges, as places along the run"},

    // Supports
    {"supports", "*", word | table, {}, "pinned|fixed|roller", "support", "a support"},
    {"support", "x|y", word | quantity | table | positive, dim::force_per_length, "fixed|free", "support_spring", "how it holds that direction"},
    {"support", "rotation", word | quantity | table | positive, dim::moment, "fixed|free", "support_rotation", "how it holds the rotation"},
    {"support", "angle", quantity | with_unit, dim::angle, "", "", "turn of its axes, counter-clockwise"},
    {"support", "pad", table, {}, "", "pad", "rigid pad on a half-space", later},
    {"support", "pile", table, {}, "", "pile", "vertical pile", later},
    {"support_spring", "stiffness", word | quantity | positive, dim::force_per_length, "fixed", "", "stiffness"},
    {"support_rotation", "stiffness", word | quantity | positive, dim::moment, "fixed", "", "stiffness"},
    {"support_spring|support_rotation", "varies", range | positive, {}, "", "", "range of the stiffness, as factors", later},
    {"support_spring|support_rotation", "nominal", number | positive, {}, "", "", "factor of the nominal model", later},
    {"support_spring", "contact", word, {}, "both|compression|tension", "", "whether it holds one way only", later},
    {"support_spring", "gap", quantity | not_negative, dim::length, "", "", "play before it holds", later},
    {"pad", "width", quantity | positive, dim::length, "", "", "width along x", later},
    {"pad", "length", quantity | positive, dim::length, "", "", "length across the frame", later},
    {"pad", "diameter", quantity | positive, dim::length, "", "", "diameter, instead of width and length", later},
    {"pad", "embedment", quantity | not_negative, dim::length, "", "", "depth of the underside below ground", later},
    {"pad|pile", "soil", name, {}, "soil", "", "the soil it stands in", later},
    {"pile", "stiffness", quantity | positive, dim::force_per_length, "", "", "vertical stiffness", later},
    {"pile", "E", quantity | positive, dim::stress, "", "", "Young's modulus of the pile", later},
    {"pile", "diameter", quantity | positive, dim::length, "", "", "diameter of the pile", later},
    {"pile", "length", quantity | positive, dim::length, "", "", "length of the pile", later},
    {"pile", "end", word, {}, "rock", "", "what the pile's end stands on", later},
    {"pile", "lateral", quantity | positive, dim::force_per_length, "", "", "lateral stiffness", later},
    {"pile", "rotation", quantity | positive, dim::moment, "", "", "rotational stiffness", later},

    // Cases and their loads
    {"cases", "*", table, {}, "", "case", "a load case"},
    {"case", "action", word, {}, "permanent|imposed|roof|snow|rain|wind|temperature|settlement|earthquake|accidental", "", "kind of action, for generated combinations"},
    {"case", "category", text, {}, "", "", "category of EN 1990, for psi factors"},
    {"case", "group", text, {}, "", "", "cases of one group are alternatives of each other"},
    {"case", "with", name, {}, "case", "", "case with which it makes one action"},
    {"case", "duration", word, {}, "short|!long", "", "long: creep acts"},
    {"case", "loads", tables, {}, "", "load", "what acts"},

    {"load", "member", name, {}, "member", "", "the member that it acts on", true, load_on_member},
    {"load", "members", names, {}, "member", "", "the members, each loaded alike", true, load_on_member},
    {"load", "beam", name, {}, "beam", "", "the beam, with places along its run", true, load_on_member},
    {"load", "node", name, {}, "node", "", "the node that it acts on", true, load_node},
    {"load", "support", name, {}, "support", "", "the support that is moved", true, load_support},
    {"load", "self_weight", number, {}, "", "", "factor on the weight of all members", true, load_self_weight},
    {"load", "x|y", quantity | pair, dim::force_per_length, "", "", "load per length along a global axis, or its values at both ends", true, load_distributed},
    {"load", "along|across", quantity | pair, dim::force_per_length, "", "", "load per length along an axis of the member", true, load_distributed},
    {"load", "x|y", quantity, dim::force, "", "", "force along a global axis", true, load_point | load_node},
    {"load", "along|across", quantity, dim::force, "", "", "force along an axis of the member", true, load_point},
    {"load", "x|y", quantity, dim::length, "", "", "movement along an axis of the support", true, load_support},
    {"load", "rotation", quantity, dim::angle, "", "", "rotation of the support", true, load_support},
    {"load", "moment", quantity, dim::moment, "", "", "moment, counter-clockwise", true, load_point | load_node},
    {"load", "at", quantity | fraction | not_negative, dim::length, "", "", "place of a point load", true, load_point},
    {"load", "between", pair | fraction | not_negative, dim::length, "", "", "where the load begins and ends", true, load_distributed | load_ground},
    {"load", "per", word, {}, "length|plan", "", "what the intensity is per", true, load_distributed},
    {"load", "temperature", quantity | table, dim::temperature, "", "face_temperatures", "change of temperature", true, load_temperature},
    {"load", "lack_of_fit", quantity, dim::length, "", "", "by how much it was made too long", true, load_lack_of_fit},
    {"load", "ground", quantity | pair, dim::length, "", "", "settlement of the bed", later, load_ground},
    {"load", "varies", range, {}, "", "", "range of its size, as factors", later},
    {"load", "nominal", number, {}, "", "", "factor of the nominal model", later},
    {"face_temperatures", "top", quantity, dim::temperature, "", "", "change at the face at +across"},
    {"face_temperatures", "bottom", quantity, dim::temperature, "", "", "change at the face at -across"},

    // Combinations
    {"combinations", "*", table, {}, "", "combination", "a combination, or a set of generated ones"},
    {"combination", "factors", table, {}, "", "factors", "factor of each case"},
    {"combination", "limit", word, {}, "strength|service", "", "limit state; default strength"},
    {"combination", "standard", word, {}, "EN 1990|ASCE 7", "", "standard that generates the combinations", later},
    {"combination", "sets", words, {}, "strength|characteristic|frequent|quasi-permanent|allowable", "", "sets to generate", later},
    {"combination", "expression", word, {}, "6.10|6.10ab", "", "expression of EN 1990", later},
    {"combination", "edition", word, {}, "7-16|7-22", "", "edition of ASCE 7", later},
    {"combination", "gamma", table, {}, "", "gamma", "partial factors instead of the published ones", later},
    {"combination", "psi", table, {}, "", "psi", "psi factors instead of the published ones", later},
    {"factors", "*", number, {}, "case", "", "factor of that case"},
    {"gamma", "permanent", range, {}, "", "", "lower and upper factor of permanent actions", later},
    {"gamma", "variable", number, {}, "", "", "factor of variable actions", later},
    {"gamma", "settlement", number, {}, "", "", "factor of settlements", later},
    {"gamma", "xi", number, {}, "", "", "reduction of permanent actions in expression 6.10b", later},
    {"psi", "*", numbers, {}, "", "", "psi factors of a category or an action", later},

    // Checks
    {"checks", "*", table, {}, "", "check", "a limit", later},
    {"check", "member", name, {}, "member", "", "member to be checked", later},
    {"check", "members", names, {}, "member", "", "members to be checked", later},
    {"check", "beam", name, {}, "beam", "", "beam to be checked", later},
    {"check", "supports", names, {}, "support", "", "supports to be checked", later},
    {"check", "nodes", names, {}, "node", "", "nodes to be checked", later},
    {"check", "node", name, {}, "node", "", "node to be checked", later},
    {"check", "combinations", names, {}, "combination", "", "combinations it is for", later},
    {"check", "deflection", quantity | fraction, dim::length, "", "", "movement from the chord, of the span or a length", later},
    {"check", "span", word, {}, "whole", "", "keeps a chain of members one span", later},
    {"check", "moment", quantity | table, dim::moment, "", "moment_limits", "bending moment", later},
    {"check", "shear", quantity, dim::force, "", "", "shear force", later},
    {"check", "axial", quantity | table, dim::force, "", "axial_limits", "axial force", later},
    {"check", "stress", quantity | word, dim::stress, "strength", "", "fibre stress", later},
    {"check", "reaction", quantity, dim::force, "", "", "most that the support may push up", later},
    {"check", "uplift", quantity, dim::force, "", "", "most that it may hold down", later},
    {"check", "pressure", quantity, dim::stress, "", "", "ground pressure", later},
    {"check", "distortion", number, {}, "", "", "difference in vertical movement over distance", later},
    {"check", "tilt", word, {}, "kept|removed", "", "whether the tilt of the line counts", later},
    {"check", "x", quantity | fraction, dim::length, "", "", "sway, of the height or a length", later},
    {"moment_limits", "sagging|hogging", quantity, dim::moment, "", "", "limit of one sign", later},
    {"axial_limits", "tension|compression", quantity, dim::force, "", "", "limit of one sign", later},

    // Vibration
    {"mass", "cases", table, {}, "", "mass_cases", "cases whose downward loads are mass"},
    {"mass", "nodes", table, {}, "", "mass_nodes", "masses at nodes"},
    {"mass", "modes", integer | positive, {}, "", "", "how many modes, up to 1000; default 6"},
    {"mass", "state", name, {}, "combination", "", "combination whose contact state is kept", later},
    {"mass_cases", "*", number | not_negative, {}, "case", "", "factor of that case"},
    {"mass_nodes", "*", quantity | not_negative | with_unit, dim::mass, "node", "", "mass at that node"},
    {"floor", "members", names, {}, "member", "", "members of the floor", later},
    {"floor", "beam", name, {}, "beam", "", "beam of the floor", later},
    {"floor", "method", words, {}, "DG11|EN 1995|CCIP-016", "", "methods of screening", later},
    {"floor", "use", text, {}, "", "", "occupancy, in the method's words", later},
    {"floor", "damping", number, {}, "", "", "damping ratio", later},
    {"floor", "acceleration_limit", number, {}, "", "", "limit of acceleration, as a fraction of g", later},
    {"floor", "response_limit", number, {}, "", "", "limit of the response factor", later},
    {"floor", "target", quantity, dim::frequency, "", "", "frequency to be reached", later},
    {"floor", "spacing", quantity, dim::length, "", "", "distance between such beams", later},
    {"floor", "panel", table, {}, "", "panel", "effective weight by DG11", later},
    {"floor", "timber", table, {}, "", "timber", "floor by EN 1995-1-1 7.3.3", later},
    {"floor", "footfall", table, {}, "", "footfall", "walking by CCIP-016", later},
    {"panel", "weight", quantity, dim::force, "", "", "effective weight, when given", later},
    {"panel", "slab_depth", quantity, dim::length, "", "", "depth of the slab", later},
    {"panel", "slab_E", quantity, dim::stress, "", "", "static Young's modulus of the slab", later},
    {"panel", "slab_stiffness", quantity, dim::moment, "", "", "stiffness of the slab per width", later},
    {"panel", "floor_width", quantity, dim::length, "", "", "width across the beams", later},
    {"panel", "edge", boolean, {}, "", "", "at a free edge", later},
    {"panel", "continuous", boolean, {}, "", "", "takes the factor 1.5 for continuity", later},
    {"panel", "girder", table, {}, "", "girder", "girder of a combined panel", later},
    {"girder", "I", quantity, dim::second_moment, "", "", "second moment of area", later},
    {"girder", "E", quantity, dim::stress, "", "", "Young's modulus", later},
    {"girder", "span", quantity, dim::length, "", "", "span", later},
    {"girder", "weight", quantity, dim::force_per_length, "", "", "weight on it per length", later},
    {"girder", "floor_length", quantity, dim::length, "", "", "length of the floor along the beams", later},
    {"girder", "seats", boolean, {}, "", "", "the beams stand on seats", later},
    {"timber", "width", quantity, dim::length, "", "", "width of the floor", later},
    {"timber", "transverse", quantity, dim::moment, "", "", "stiffness across per width", later},
    {"timber", "deflection_limit", quantity, dim::flexibility, "", "", "limit a of EN 1995-1-1", later},
    {"timber", "velocity_limit", number, {}, "", "", "limit b of EN 1995-1-1", later},
    {"footfall", "pace", pair, dim::frequency, "", "", "range of the walking pace", later},
    {"footfall", "walk", quantity, dim::length, "", "", "length of the walking path", later},
    {"footfall", "stride", quantity, dim::length, "", "", "length of a step", later},
    {"footfall", "walker", quantity, dim::force, "", "", "weight of the walker", later},
    {"footfall", "effective_width", quantity, dim::length, "", "", "width of floor that moves with the strip", later},

    // Stability
    {"stability", "modes", integer | positive, {}, "", "", "how many critical factors", later},
    {"stability", "second_order", boolean, {}, "", "", "asks for second-order forces", later},
    {"stability", "sway_imperfection", number, {}, "", "", "initial sway of the structure", later},
};
// clang-format on

Group& group_to_fill(std::vector<Group>& groups, std::string_view name) {
    for (Group& group : groups) {
        if (group.name == name) return group;
    }
    groups.push_back({name, {}});
    return groups.back();
}

std::vector<Group> make_groups() {
    std::vector<Group> groups;
    for (const Key& row : rows) {
        each_word(row.group, [&](std::string_view group, bool) {
            each_word(row.name, [&](std::string_view name, bool) {
                group_to_fill(groups, group).keys.push_back({name, &row});
            });
        });
    }
    return groups;
}

} // namespace

const Key* Group::find(std::string_view key, unsigned loads) const {
    for (const GroupKey& candidate : keys) {
        if (candidate.name == key && (candidate.key->loads & loads) != 0) return candidate.key;
    }
    return nullptr;
}

std::span<const Key> all_keys() { return rows; }

const Group& key_group(std::string_view name) {
    static const std::vector<Group> groups = make_groups();
    for (const Group& group : groups) {
        if (group.name == name) return group;
    }
    std::abort(); // a row of the table or a call names a group without keys: a test walks through all of them
}

} // namespace groundsill::reading
