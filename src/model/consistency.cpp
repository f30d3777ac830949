// Checks of single entries of the model and of its combinations. Geometry and load cases have files of their own.

#include <cmath>
#include <optional>
#include <unordered_map>

#include <fmt/format.h>

#include "model/findings.hpp"

namespace groundsill {
namespace {

bool above_zero(double value) { return value > 0 && std::isfinite(value); }

/// What loads and sections ask of materials and sections. Each entry is the name of the first case or section that
/// asks.
struct Needs {
    std::string density;                    ///< of every material in use; the case
    std::vector<std::string> expansion;     ///< by material; the case
    std::vector<std::string> shear_modulus; ///< by material; the section
    std::vector<std::string> depth;         ///< by section; the case
};

void note(std::string& need, const std::string& asked_by) {
    if (need.empty()) need = asked_by;
}

Needs needs_of(const Model& model) {
    Needs needs{{},
                std::vector<std::string>(model.materials.size()),
                std::vector<std::string>(model.materials.size()),
                std::vector<std::string>(model.sections.size())};
    for (const Member& member : model.members) {
        const Section& section = at(model.sections, member.section);
        if (section.shear_area) note(needs.shear_modulus[static_cast<std::size_t>(member.material)], section.name);
    }
    for (const LoadCase& load_case : model.cases) {
        if (load_case.self_weight != 0) note(needs.density, load_case.name);
        for (const MemberLoad& load : load_case.member_loads) {
            if (load.kind != MemberLoad::Kind::temperature) continue;
            const Member& member = at(model.members, load.member);
            note(needs.expansion[static_cast<std::size_t>(member.material)], load_case.name);
            if (load.through_depth) note(needs.depth[static_cast<std::size_t>(member.section)], load_case.name);
        }
    }
    return needs;
}

void check_material_values(const Material& material, Findings& findings) {
    const auto refuse = [&](const char* what, const char* way_out) {
        findings.error(material.position, fmt::format("material {}: {} must be {}", material.name, what, way_out));
    };
    if (!above_zero(material.E)) refuse("E", "a stress above 0, like \"31 GPa\"");
    if (material.G && !above_zero(*material.G)) refuse("G", "a stress above 0, like \"13 GPa\"; poisson gives it too");
    if (material.density && !(*material.density >= 0 && std::isfinite(*material.density))) {
        refuse("density or weight", "0 or more, like \"2500 kg/m3\" or \"24.5 kN/m3\"");
    }
    if (material.expansion && !std::isfinite(*material.expansion))
        refuse("expansion", "a number per K, like \"10e-6 /K\"");
    if (material.tension_strength && !above_zero(*material.tension_strength)) {
        refuse("strength in tension", "a stress above 0: leave it out where none is known");
    }
    if (material.compression_strength && !above_zero(*material.compression_strength)) {
        refuse("strength in compression", "a stress above 0: leave it out where none is known");
    }
}

void check_materials(const Model& model, const Needs& needs, Findings& findings) {
    std::vector<bool> used(model.materials.size());
    for (const Member& member : model.members) used[static_cast<std::size_t>(member.material)] = true;
    for (std::size_t i = 0; i < model.materials.size(); ++i) {
        const Material& material = model.materials[i];
        check_material_values(material, findings);
        if (used[i] && !needs.density.empty() && !material.density) {
            findings.error(material.position,
                           fmt::format("material {} has no density, and case {} has self_weight: add "
                                       "density or weight to the material",
                                       material.name, needs.density));
        }
        if (!needs.expansion[i].empty() && !material.expansion) {
            findings.error(material.position,
                           fmt::format("material {} has no expansion, and case {} heats or cools a member "
                                       "of it: add expansion, like \"12e-6 /K\" for steel",
                                       material.name, needs.expansion[i]));
        }
        if (!needs.shear_modulus[i].empty() && !material.G) {
            findings.error(
                material.position,
                fmt::format("material {} has neither poisson nor G, and section {} is shear-flexible: add one of "
                            "the two, or take the shear area off the section",
                            material.name, needs.shear_modulus[i]));
        }
    }
}

void check_section_values(const Section& section, Findings& findings) {
    const auto check = [&](const std::optional<double>& value, const char* name, const char* kind) {
        if (value && !above_zero(*value)) {
            findings.error(section.position,
                           fmt::format("section {}: {} must be {} above 0", section.name, name, kind));
        }
    };
    check(section.A, "A", "an area");
    check(section.I, "I", "a second moment of area");
    check(section.depth, "depth", "a length");
    check(section.shear_area, "shear_area", "an area");
    check(section.top, "the distance from the centroid to the top face", "a length");
    check(section.bottom, "the distance from the centroid to the bottom face", "a length");
}

void check_sections(const Model& model, const Needs& needs, Findings& findings) {
    for (std::size_t i = 0; i < model.sections.size(); ++i) {
        const Section& section = model.sections[i];
        check_section_values(section, findings);
        if (!needs.depth[i].empty() && !section.depth) {
            findings.error(section.position,
                           fmt::format("section {} has no depth, and case {} heats the two faces of a member "
                                       "of it differently: add depth to the section",
                                       section.name, needs.depth[i]));
        }
    }
}

void check_supports(const Model& model, Findings& findings) {
    std::vector<bool> supported(model.nodes.size());
    for (const Support& support : model.supports) {
        const std::string& name = at(model.nodes, support.node).name;
        if (supported[static_cast<std::size_t>(support.node)]) {
            findings.error(support.position, fmt::format("node {} has two supports: put both into one entry", name));
        }
        supported[static_cast<std::size_t>(support.node)] = true;
        const auto check = [&](const Restraint& restraint, const char* direction) {
            if (restraint.is_elastic() && !above_zero(restraint.stiffness)) {
                findings.error(support.position,
                               fmt::format("support {}: the stiffness in {} must be above 0: write \"free\" "
                                           "where nothing holds it",
                                           name, direction));
            }
        };
        check(support.x, "x");
        check(support.y, "y");
        check(support.rotation, "rotation");
        if (!std::isfinite(support.angle)) {
            findings.error(support.position, fmt::format("support {}: the angle must be a finite number", name));
        }
        if (support.x.is_free() && support.y.is_free() && support.rotation.is_free()) {
            findings.warning(support.position,
                             fmt::format("support {} holds nothing: give it x, y or rotation, or take it out", name));
        }
    }
}

void check_terms(const Model& model, const Combination& combination, Findings& findings) {
    std::unordered_map<std::string, int> first_of_group;
    for (const Combination::Term& term : combination.terms) {
        const LoadCase& load_case = at(model.cases, term.load_case);
        if (!std::isfinite(term.factor)) {
            findings.error(combination.position,
                           fmt::format("combination {}: the factor of case {} must be a finite number",
                                       combination.name, load_case.name));
        }
        if (load_case.group.empty() || term.factor == 0) continue;
        const auto [before, is_new] = first_of_group.emplace(load_case.group, term.load_case);
        // Cases that stand `with` each other are one action, in whatever group.
        const LoadCase& other = at(model.cases, before->second);
        if (is_new || load_case.with == before->second || other.with == term.load_case) continue;
        findings.warning(
            combination.position,
            fmt::format("combination {} adds the cases {} and {}, which group {} makes alternatives of each "
                        "other: leave one out, or take it out of the group",
                        combination.name, other.name, load_case.name, load_case.group));
    }
}

void check_combinations(const Model& model, Findings& findings) {
    for (const Combination& combination : model.combinations) {
        if (combination.terms.empty()) {
            findings.error(
                combination.position,
                fmt::format("combination {} has no cases: give it factors, like {{ dead = 1.35 }}", combination.name));
        }
        check_terms(model, combination, findings);
    }
}

} // namespace

std::string length_text(const Model& model, double metres) {
    return model.display == DisplayUnits::us ? fmt::format("{:.6g} ft", metres / 0.3048)
                                             : fmt::format("{:.6g} m", metres);
}

Diagnostics check_model(const Model& model) {
    Findings findings;
    const Needs needs = needs_of(model);
    check_materials(model, needs, findings);
    check_sections(model, needs, findings);
    check_geometry(model, findings);
    check_supports(model, findings);
    check_cases(model, findings);
    check_combinations(model, findings);
    return findings.take();
}

} // namespace groundsill
