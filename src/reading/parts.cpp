// The head of the file, units, materials and sections.

#include <algorithm>
#include <fmt/format.h>

#include "model/designations.hpp"
#include "model/shapes.hpp"
#include "reading/draft.hpp"

namespace groundsill::reading {

void read_head(Draft& draft, const Fields& top) {
    Model& model = draft.model;
    model.title = top.optional_text("title");
    model.notes = top.optional_text("notes");
    const Field* field = top.sound_field("job");
    if (field == nullptr) return;
    const Path path{nullptr, "job"};
    const Fields job(draft.context, key_group("job"), path, field->node(), field->position());
    model.job.number = job.optional_text("number");
    model.job.client = job.optional_text("client");
    model.job.revision = job.optional_text("revision");
    model.job.by = job.optional_text("by");
    model.job.checked = job.optional_text("checked");
    model.job.date = job.optional_text("date");
}

namespace {

/// A unit of [units]; the SI one after an error, so that the numbers in it are not reported as well.
std::optional<Unit> read_unit(Fields& units, std::string_view key) {
    const Field* field = units.sound_field(key);
    if (field == nullptr) return units.sound() ? std::nullopt : std::optional<Unit>(Unit{});
    std::string error;
    const std::optional<Unit> unit = parse_unit(field->node().text(), error);
    if (unit && unit->dimension == field->key->dimension) return unit;
    if (unit) error = mismatch_words(field->key->dimension, Quantity{1, *unit, true, false});
    units.error(*field, fmt::format("gives no unit of {}: {}", key, error));
    return Unit{};
}

} // namespace

void read_units(Draft& draft, const Fields& top) {
    const Field* field = top.find("units");
    if (field == nullptr) return;
    BareUnits& bare = draft.context.bare;
    if (!field->sound) {
        bare = {true, Unit{}, Unit{}};
        return;
    }
    const Path path{nullptr, "units"};
    Fields units(draft.context, key_group("units"), path, field->node(), field->position());
    bare = {true, read_unit(units, "length"), read_unit(units, "force")};
    const std::string_view length = units.optional_text("length");
    const Field* display = units.sound_field("display");
    const bool us = display != nullptr ? display->is_word("us") : length == "ft" || length == "in";
    draft.model.display = us ? DisplayUnits::us : DisplayUnits::metric;
}

namespace {

void read_shear_modulus(Fields& fields, Material& material) {
    fields.at_most_one({"poisson", "G"});
    material.G = fields.optional_number("G");
    const Field* poisson = fields.sound_field("poisson");
    if (poisson == nullptr) return;
    const double ratio = poisson->measure.value;
    if (!(ratio > -1 && ratio <= 0.5)) { // where an isotropic material is stable
        fields.error(*poisson, "needs a poisson above -1 and up to 0.5, like 0.2 for concrete and 0.3 for steel");
        return;
    }
    material.G = material.E / (2 * (1 + ratio));
}

void read_strength(Fields& fields, Material& material) {
    const Field* field = fields.sound_field("strength");
    if (field == nullptr) return;
    if (!field->is_table()) {
        material.tension_strength = material.compression_strength = field->measure.value;
        return;
    }
    const Path path{&fields.path(), "strength"};
    Fields strength(fields.context(), key_group("strength"), path, field->node(), field->position());
    material.tension_strength = strength.required_number("tension");
    material.compression_strength = strength.required_number("compression");
    if (!strength.sound()) fields.set_unsound();
}

Material read_material(Draft& draft, const NamedEntry& entry) {
    Material material;
    Fields fields(draft.context, key_group("material"), entry.path, entry.field.node(), entry.field.position());
    material.E = fields.required_number("E", ": add Young's modulus, like E = \"31 GPa\"");
    read_shear_modulus(fields, material);
    fields.at_most_one({"density", "weight"});
    material.density = fields.optional_number("density");
    if (const std::optional<double> weight = fields.optional_number("weight"))
        material.density = *weight / standard_gravity;
    material.expansion = fields.optional_number("expansion");
    read_strength(fields, material);
    if (!fields.sound()) draft.mark_unsound(entry.field.position());
    return material;
}

/// Gives an unsound material everything that loads may ask of it, so that they do not complain as well.
void complete(Material& material) { material = {material.name, 1, 1, 1, 1, 1, 1, material.position}; }

} // namespace

void read_materials(Draft& draft, const Fields& top) {
    const Path path{nullptr, "materials"};
    for (const NamedEntry& entry : named_entries(draft.context, path, top.find("materials"))) {
        Material material;
        if (entry.field.is_table())
            material = read_material(draft, entry);
        else
            draft.mark_unsound(entry.field.position());
        material.name = entry.name();
        material.position = entry.field.position();
        if (!draft.is_sound(material.position)) complete(material);
        draft.materials.add(entry.name(), static_cast<int>(draft.model.materials.size()));
        draft.model.materials.push_back(std::move(material));
    }
}

namespace {

/// The dimensions of each shape, in the order in which they are spoken; `root` may be left out.
struct ShapeKeys {
    std::string_view shape;
    std::vector<std::string_view> keys;
};
const std::vector<ShapeKeys>& shape_keys() {
    static const std::vector<ShapeKeys> shapes = {
        {"rectangle", {"width", "depth"}},
        {"circle", {"diameter"}},
        {"pipe", {"diameter", "wall"}},
        {"box", {"width", "depth", "wall"}},
        {"i", {"depth", "width", "web", "flange", "root"}},
        {"tee", {"depth", "width", "web", "flange"}},
        {"channel", {"depth", "width", "web", "flange"}},
    };
    return shapes;
}

double* dimension_of(ShapeDimensions& dimensions, std::string_view key) {
    if (key == "width") return &dimensions.width;
    if (key == "depth") return &dimensions.depth;
    if (key == "diameter") return &dimensions.diameter;
    if (key == "wall") return &dimensions.wall;
    if (key == "web") return &dimensions.web;
    if (key == "flange") return &dimensions.flange;
    return &dimensions.root;
}

/// A value as the file writes it, for the inventory.
std::string as_written(const TomlNode& node) {
    return node.kind() == TomlKind::text ? std::string(node.text()) : fmt::format("{}", node.number());
}

/// Reads the dimensions of a shape; reports those that are missing and those that it does not have.
ShapeDimensions read_dimensions(Fields& fields, const ShapeKeys& shape, std::string& description) {
    ShapeDimensions dimensions;
    dimensions.shape = description = shape.shape;
    std::string_view separator = " ";
    for (const std::string_view key : shape.keys) {
        if (key == "root" && fields.find(key) == nullptr) continue;
        const std::string advice = fmt::format(", which {} {} needs", shape.shape == "i" ? "an" : "a", shape.shape);
        *dimension_of(dimensions, key) = fields.required_number(key, advice);
        if (const Field* field = fields.sound_field(key))
            description.append(separator).append(as_written(field->node()));
        separator = " x ";
    }
    for (const Field& field : fields.all()) {
        const std::string_view key = field.entry.key;
        const bool is_dimension = key == "width" || key == "diameter" || key == "wall" || key == "web" ||
                                  key == "flange" || key == "root"; // depth may be a property too
        if (is_dimension && std::find(shape.keys.begin(), shape.keys.end(), key) == shape.keys.end()) {
            fields.error(field, fmt::format("gives {}, which the shape {} does not have", key, shape.shape));
        }
    }
    return dimensions;
}

void take(const ShapeProperties& properties, const Fields& fields, Section& section) {
    section.A = properties.A;
    section.I = properties.I;
    section.depth = properties.depth;
    section.top = properties.top;
    section.bottom = properties.bottom;
    const Field* shear = fields.sound_field("shear");
    if (shear != nullptr && shear->node().boolean()) section.shear_area = properties.shear_area;
}

void read_shape(Fields& fields, const Field& shape, Section& section) {
    const std::string_view name = shape.node().text();
    const auto found = std::find_if(shape_keys().begin(), shape_keys().end(),
                                    [&](const ShapeKeys& candidate) { return candidate.shape == name; });
    const ShapeDimensions dimensions = read_dimensions(fields, *found, section.description);
    if (!fields.sound()) return;
    std::string error;
    const std::optional<ShapeProperties> properties = section_of_shape(dimensions, error);
    if (!properties) return fields.error(shape, "is no section: " + error);
    take(*properties, fields, section);
}

/// Dimensions belong to shapes: a table's section and one given by its properties have none.
void refuse_dimensions(Fields& fields, std::string_view advice) {
    for (const std::string_view key : {"width", "diameter", "wall", "web", "flange", "root"})
        if (const Field* field = fields.find(key)) fields.error(*field, fmt::format("gives {} {}", key, advice));
}

/// A rolled section of the built-in tables.
void read_designation(Fields& fields, const Field& field, Section& section) {
    refuse_dimensions(fields, "beside a designation, which has its own dimensions: take it out");
    const std::string_view name = field.node().text();
    const Designation* designation = find_designation(name);
    if (designation == nullptr) {
        const std::string nearest = fmt::format("{}", fmt::join(nearest_designations(name), ", "));
        fields.error(field,
                     fmt::format("names \"{}\", which is not in the tables{}{}; `groundsill sections` lists them", name,
                                 nearest.empty() ? "" : ": did you mean ", nearest));
        return;
    }
    section.description = designation->name;
    take(section_of_designation(*designation), fields, section);
}

/// A section given by its properties alone; its centroid is taken at mid-depth.
void read_properties(Fields& fields, Section& section) {
    section.description = "properties";
    if (const Field* shear = fields.find("shear")) {
        fields.error(*shear, "has shear without a shape: give shear_area instead");
    }
    refuse_dimensions(fields, "without a shape: add shape = \"...\", or take it out");
    const std::string_view advice = ": give the section a shape, a designation, or A and I";
    fields.required_number("A", advice);
    fields.required_number("I", advice);
}

/// Properties that stand in the file override those of the shape.
void override_properties(const Fields& fields, Section& section) {
    if (const auto A = fields.optional_number("A")) section.A = *A;
    if (const auto I = fields.optional_number("I")) section.I = *I;
    if (const auto shear_area = fields.optional_number("shear_area")) section.shear_area = shear_area;
    const std::optional<double> depth = fields.optional_number("depth");
    if (!depth || depth == section.depth) return; // the depth of a shape that has one is a dimension of it
    section.depth = depth;
    section.top = section.bottom = *depth / 2;
}

Section read_section(Draft& draft, const NamedEntry& entry) {
    Section section;
    Fields fields(draft.context, key_group("section"), entry.path, entry.field.node(), entry.field.position());
    fields.at_most_one({"shape", "designation"});
    const Field* shape = fields.find("shape");
    const Field* designation = fields.find("designation");
    if (shape != nullptr && designation != nullptr)
        draft.mark_unsound(entry.field.position()); // told by at_most_one
    else if (shape != nullptr && shape->sound)
        read_shape(fields, *shape, section);
    else if (designation != nullptr && designation->sound)
        read_designation(fields, *designation, section);
    else if (shape == nullptr && designation == nullptr && fields.sound())
        read_properties(fields, section);
    override_properties(fields, section);
    if (!fields.sound()) draft.mark_unsound(entry.field.position());
    return section;
}

/// As for materials.
void complete(Section& section) {
    section = {section.name, section.description, 1, 1, 1, section.shear_area, 0.5, 0.5, section.position};
}

} // namespace

void read_sections(Draft& draft, const Fields& top) {
    const Path path{nullptr, "sections"};
    for (const NamedEntry& entry : named_entries(draft.context, path, top.find("sections"))) {
        Section section;
        if (entry.field.is_table())
            section = read_section(draft, entry);
        else
            draft.mark_unsound(entry.field.position());
        section.name = entry.name();
        section.position = entry.field.position();
        if (!draft.is_sound(section.position)) complete(section);
        draft.sections.add(entry.name(), static_cast<int>(draft.model.sections.size()));
        draft.model.sections.push_back(std::move(section));
    }
}

} // namespace groundsill::reading
