// The results in JSON; the layout is that of docs/results.md.

#include <array>
#include <utility>

#include "analysis/extremes.hpp"
#include "groundsill/writing.hpp"
#include "writing/json_writer.hpp"
#include "writing/names.hpp"

namespace groundsill {

namespace {

using writing::JsonWriter;
using writing::node_of;

void write_row(JsonWriter& json, const Reaction& reaction) {
    json.open_object_row();
    json.key("x").number(reaction.x);
    json.key("y").number(reaction.y);
    json.key("moment").number(reaction.moment);
    json.close();
}

void write_row(JsonWriter& json, const NodeMovement& movement) {
    json.open_object_row();
    json.key("x").number(movement.x);
    json.key("y").number(movement.y);
    if (movement.rotation) json.key("rotation").number(*movement.rotation);
    json.close();
}

void write_row(JsonWriter& json, const DiagramPlace& place) {
    json.open_object_row();
    json.key("at").number(place.at);
    json.key("N").number(place.forces.N);
    json.key("V").number(place.forces.V);
    json.key("M").number(place.forces.M);
    json.key("along").number(place.along);
    json.key("across").number(place.across);
    json.close();
}

void write_row(JsonWriter& json, const DiagramExtreme& extreme) {
    json.open_object_row();
    json.key("value").number(extreme.value);
    json.key("at").number(extreme.at);
    json.close();
}

void write_row(JsonWriter& json, const DiagramRange& range) {
    json.open_object_row();
    write_row(json.key("max"), range.max);
    write_row(json.key("min"), range.min);
    json.close();
}

constexpr std::array<std::pair<std::string_view, Curve>, 4> curves = {
    {{"N", Curve::N}, {"V", Curve::V}, {"M", Curve::M}, {"across", Curve::across}}};

void write_member(JsonWriter& json, const Diagram& diagram, const WriteOptions& options, const RoundOff& rounding) {
    json.open_object();
    json.key("length").number(diagram.length);
    if (options.places > 0) {
        json.key("places").open_array();
        for (const DiagramPlace& place : diagram.places(options.places)) write_row(json, place);
        json.close();
    }
    json.key("extremes").open_object();
    for (const auto& [name, curve] : curves) write_row(json.key(name), member_range(diagram, curve, rounding));
    json.close();
    json.close();
}

/// The parts of a RESPONSE, inside an object that is already open.
/// \param diagram_of gives the diagrams of the member with an index
template <class DiagramOf>
void write_response(JsonWriter& json, const Analysis& analysis, const WriteOptions& options, const Response& response,
                    const DiagramOf& diagram_of) {
    const Model& model = *analysis.model;
    json.key("displacements").open_object();
    for (std::size_t node = 0; node < model.nodes.size(); ++node) {
        write_row(json.name(model.nodes[node].name), response.movements[node]);
    }
    json.close();
    json.key("reactions").open_object();
    for (std::size_t support = 0; support < model.supports.size(); ++support) {
        write_row(json.name(node_of(model, model.supports[support])), response.reactions[support]);
    }
    json.close();
    const RoundOff rounding = round_off(analysis, response);
    json.key("members").open_object();
    for (std::size_t member = 0; member < model.members.size(); ++member) {
        json.name(model.members[member].name);
        write_member(json, diagram_of(static_cast<int>(member)), options, rounding);
    }
    json.close();
}

void write_cases(JsonWriter& json, const Analysis& analysis, const WriteOptions& options) {
    json.key("cases").open_object();
    for (std::size_t index = 0; index < analysis.cases.size(); ++index) {
        json.name(analysis.model->cases[index].name).open_object();
        write_response(json, analysis, options, analysis.cases[index],
                       [&](int member) { return case_diagram(analysis, static_cast<int>(index), member); });
        json.close();
    }
    json.close();
}

void write_combinations(JsonWriter& json, const Analysis& analysis, const WriteOptions& options) {
    if (analysis.combinations.empty()) return;
    const Model& model = *analysis.model;
    json.key("combinations").open_object();
    for (std::size_t index = 0; index < analysis.combinations.size(); ++index) {
        const Combination& combination = model.combinations[index];
        json.name(combination.name).open_object();
        json.key("limit").string(writing::limit_name(combination.limit));
        json.key("factors").open_object_row();
        for (const Combination::Term& term : combination.terms) {
            json.name(model.cases[term.load_case].name).number(term.factor);
        }
        json.close();
        write_response(json, analysis, options, analysis.combinations[index],
                       [&](int member) { return combination_diagram(analysis, static_cast<int>(index), member); });
        json.close();
    }
    json.close();
}

void write_with(JsonWriter& json, const MemberForces& forces) {
    json.key("with").open_object_row();
    json.key("N").number(forces.N);
    json.key("V").number(forces.V);
    json.key("M").number(forces.M);
    json.close();
}

void write_extreme(JsonWriter& json, const Model& model, const ForceExtreme& extreme) {
    json.open_object_row();
    json.key("value").number(extreme.value);
    json.key("at").number(extreme.at);
    json.key("combination").string(model.combinations[extreme.combination].name);
    write_with(json, extreme.with);
    json.close();
}

void write_extreme(JsonWriter& json, const Model& model, const ReactionExtreme& extreme) {
    json.open_object_row();
    json.key("value").number(extreme.value);
    json.key("combination").string(model.combinations[extreme.combination].name);
    write_row(json.key("with"), extreme.with);
    json.close();
}

template <class Extreme>
void write_least_most(JsonWriter& json, const Model& model, std::string_view quantity,
                      const LeastMost<Extreme>& range) {
    json.key(quantity).open_object();
    write_extreme(json.key("least"), model, range.least);
    write_extreme(json.key("most"), model, range.most);
    json.close();
}

void write_envelope(JsonWriter& json, const Model& model, const Envelope& envelope) {
    json.open_object();
    json.key("reactions").open_object();
    for (std::size_t support = 0; support < model.supports.size(); ++support) {
        const Envelope::OfReaction& reaction = envelope.reactions[support];
        json.name(node_of(model, model.supports[support])).open_object();
        write_least_most(json, model, "x", reaction.x);
        write_least_most(json, model, "y", reaction.y);
        write_least_most(json, model, "moment", reaction.moment);
        json.close();
    }
    json.close();
    json.key("members").open_object();
    for (std::size_t member = 0; member < model.members.size(); ++member) {
        const Envelope::OfMember& forces = envelope.members[member];
        json.name(model.members[member].name).open_object();
        write_least_most(json, model, "N", forces.N);
        write_least_most(json, model, "V", forces.V);
        write_least_most(json, model, "M", forces.M);
        json.close();
    }
    json.close();
    json.close();
}

void write_envelopes(JsonWriter& json, const Analysis& analysis) {
    if (!analysis.strength && !analysis.service) return;
    json.key("envelopes").open_object();
    if (analysis.strength) write_envelope(json.key("strength"), *analysis.model, *analysis.strength);
    if (analysis.service) write_envelope(json.key("service"), *analysis.model, *analysis.service);
    json.close();
}

void write_place(JsonWriter& json, const Model& model, const Mode::Place& place) {
    json.open_object_row();
    if (place.node >= 0) {
        json.key("node").string(model.nodes[place.node].name);
    } else if (place.member >= 0) {
        json.key("member").string(model.members[place.member].name);
        json.key("at").number(place.at);
    }
    json.close();
}

void write_shape(JsonWriter& json, const Model& model, const Mode& mode, int places) {
    json.open_object();
    json.key("nodes").open_object();
    for (std::size_t node = 0; node < model.nodes.size(); ++node) {
        const Mode::NodeShape& shape = mode.nodes[node];
        write_row(json.name(model.nodes[node].name), NodeMovement{shape.x, shape.y, shape.rotation});
    }
    json.close();
    if (places > 0) {
        json.key("members").open_object();
        for (std::size_t member = 0; member < model.members.size(); ++member) {
            json.name(model.members[member].name).open_array();
            for (const DiagramPlace& place : mode.members[member].places(places)) {
                json.open_object_row();
                json.key("at").number(place.at);
                json.key("along").number(place.along);
                json.key("across").number(place.across);
                json.close();
            }
            json.close();
        }
        json.close();
    }
    json.close();
}

void write_mode(JsonWriter& json, const Model& model, const Mode& mode, int places) {
    json.open_object();
    json.key("frequency").number(mode.frequency);
    json.key("modal_mass").number(mode.modal_mass);
    json.key("effective_mass").open_object_row();
    json.key("x").number(mode.effective_x);
    json.key("y").number(mode.effective_y);
    json.close();
    json.key("flexibility").open_array();
    for (const Mode::Share& share : mode.flexibility) {
        json.open_object_row();
        if (share.member >= 0)
            json.key("member").string(model.members[share.member].name);
        else
            json.key("support").string(node_of(model, model.supports[share.support]));
        json.key("share").number(share.share);
        json.close();
    }
    json.close();
    write_place(json.key("largest"), model, mode.largest);
    write_shape(json.key("shape"), model, mode, places);
    json.close();
}

void write_modes(JsonWriter& json, const Analysis& analysis, int places) {
    if (!analysis.vibration) return;
    json.key("modes").open_array();
    for (const Mode& mode : analysis.vibration->modes) write_mode(json, *analysis.model, mode, places);
    json.close();
}

void write_diagnostics(JsonWriter& json, const Analysis& analysis) {
    json.key("diagnostics").open_object();
    json.key("equilibrium").number(analysis.verification.equilibrium);
    json.key("residual").number(analysis.verification.residual);
    json.key("condition").number(analysis.verification.condition);
    if (analysis.vibration) json.key("modes_missed").number(analysis.vibration->modes_missed);
    json.key("warnings").open_array();
    for (const std::string& warning : analysis.warnings) json.string(warning);
    json.close();
    json.close();
}

} // namespace

void write_json(const Analysis& analysis, const WriteOptions& options, const Sink& sink) {
    writing::Output output(sink);
    JsonWriter json(output);
    json.open_object();
    json.key("program").string("groundsill");
    json.key("version").string(GROUNDSILL_VERSION);
    if (!analysis.model->title.empty()) json.key("title").string(analysis.model->title);
    json.key("units").string("SI");
    write_cases(json, analysis, options);
    write_combinations(json, analysis, options);
    write_envelopes(json, analysis);
    write_modes(json, analysis, options.places);
    write_diagnostics(json, analysis);
    json.close();
    json.end_document();
    output.finish();
}

} // namespace groundsill
