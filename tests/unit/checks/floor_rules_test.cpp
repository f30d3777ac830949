// What check_floor refuses, and what the screening says without a vertical mode.

#include <string>

#include "floor_support.hpp"

using namespace groundsill;

namespace {

/// A floor that all three methods take.
FloorModel sound_floor() {
    FloorModel floor;
    floor.members = {0};
    floor.methods = {FloorMethod::dg11, FloorMethod::en1995, FloorMethod::ccip016};
    floor.use = "residence";
    floor.use_position = {7, 1};
    floor.damping = 0.03;
    floor.spacing = 3;
    floor.panel = FloorModel::Panel{.slab_depth = 0.11, .slab_E = 30e9, .floor_width = 18};
    floor.timber = FloorModel::Timber{.width = 5, .transverse = 4300};
    floor.footfall = FloorModel::Footfall{.pace_least = 1.5, .pace_most = 2.2};
    return floor;
}

/// The one complaint about a floor.
std::string complaint(const FloorModel& floor) {
    const auto found = check_floor(floor);
    REQUIRE(found.size() == 1);
    CHECK(found.front().severity == Diagnostic::Severity::error);
    return found.front().message;
}

bool contains(const std::string& text, const std::string& part) { return text.find(part) != std::string::npos; }

FloorModel only(FloorMethod method) {
    FloorModel floor = sound_floor();
    floor.methods = {method};
    return floor;
}

} // namespace

TEST_CASE("floor: a sound table has no findings") { CHECK(check_floor(sound_floor()).empty()); }

TEST_CASE("floor: names of the methods") {
    std::string error;
    for (FloorMethod method : {FloorMethod::dg11, FloorMethod::en1995, FloorMethod::ccip016}) {
        CHECK(floor_method(floor_method_name(method), error) == method);
    }
    CHECK(error.empty());
    CHECK_FALSE(floor_method("dg 11", error).has_value());
    CHECK(contains(error, "\"DG11\", \"EN 1995\" or \"CCIP-016\""));
}

TEST_CASE("floor: an unknown occupancy is refused with the words of the method, at its place") {
    FloorModel floor = only(FloorMethod::dg11);
    floor.use = "canteen";
    CHECK(contains(complaint(floor), "\"canteen\" is not an occupancy of DG11: use one of \"office\", \"residence\""));
    CHECK(check_floor(floor).front().position.line == 7);
    floor = only(FloorMethod::en1995);
    floor.use = "office";
    CHECK(contains(complaint(floor), "use one of \"residence\", \"residential\""));
    floor = only(FloorMethod::ccip016);
    floor.use = "church";
    CHECK(contains(complaint(floor), "\"operating theatre\""));
}

TEST_CASE("floor: every method must know the occupancy") {
    FloorModel floor = sound_floor();
    floor.use = "office"; // DG11 and CCIP-016 do, EN 1995 does not
    CHECK(contains(complaint(floor), "not an occupancy of EN 1995"));
}

TEST_CASE("floor: crowds, rhythmic activity and stairs are refused with the document to go to") {
    struct Row {
        const char* use;
        const char* activity;
        const char* document;
    };
    for (const Row& row :
         {Row{"stairs", "stairs", "SCI P354"}, Row{"Staircase", "stairs", "Design Guide 11"},
          Row{"gymnasium", "rhythmic activity", "chapter 5"}, Row{"dance hall", "rhythmic activity", "ISO 10137"},
          Row{"stadium", "crowds", "grandstands"}, Row{"crowd on a footbridge", "crowds", "EN 1991-2"}}) {
        CAPTURE(row.use);
        for (FloorMethod method : {FloorMethod::dg11, FloorMethod::en1995, FloorMethod::ccip016}) {
            FloorModel floor = only(method);
            floor.use = row.use;
            const std::string message = complaint(floor);
            CHECK(contains(message, row.activity));
            CHECK(contains(message, row.document));
        }
    }
}

TEST_CASE("floor: damping") {
    for (double damping : {0.0, -0.01, 1.0}) {
        CAPTURE(damping);
        FloorModel floor = sound_floor();
        floor.damping = damping;
        CHECK(contains(complaint(floor), "floor.damping must be above 0 and below 1"));
    }
    FloorModel floor = sound_floor();
    floor.damping.reset();
    CHECK(contains(complaint(floor), "floor.damping is missing"));
    floor = only(FloorMethod::en1995); // 0.01 by 7.3.1(3)
    floor.damping.reset();
    CHECK(check_floor(floor).empty());
}

TEST_CASE("floor: what a method needs must be there") {
    FloorModel floor = sound_floor();
    floor.members.clear();
    CHECK(contains(complaint(floor), "floor.members"));
    floor = sound_floor();
    floor.methods.clear();
    CHECK(contains(complaint(floor), "floor.method"));
    floor = only(FloorMethod::dg11);
    floor.use.clear();
    CHECK(contains(complaint(floor), "floor.use is missing"));
    floor = only(FloorMethod::en1995);
    floor.use.clear();
    CHECK(check_floor(floor).empty());
    floor = sound_floor();
    floor.panel.reset();
    CHECK(contains(complaint(floor), "floor.panel is missing"));
    floor = sound_floor();
    floor.timber.reset();
    CHECK(contains(complaint(floor), "floor.timber is missing"));
    floor = sound_floor();
    floor.footfall.reset();
    CHECK(contains(complaint(floor), "floor.footfall is missing"));
}

TEST_CASE("floor: the spacing is needed by panels, by timber and by an effective width") {
    FloorModel floor = only(FloorMethod::dg11);
    floor.spacing.reset();
    CHECK(contains(complaint(floor), "floor.spacing is missing: DG11"));
    floor.panel->weight = 395e3;
    CHECK(check_floor(floor).empty());
    floor = only(FloorMethod::en1995);
    floor.spacing.reset();
    CHECK(contains(complaint(floor), "floor.spacing is missing: EN 1995"));
    floor = only(FloorMethod::ccip016);
    floor.spacing.reset();
    CHECK(check_floor(floor).empty());
    floor.footfall->effective_width = 6;
    CHECK(contains(complaint(floor), "effective_width needs floor.spacing"));
}

TEST_CASE("floor: the slab is given once and whole") {
    FloorModel floor = only(FloorMethod::dg11);
    floor.panel->slab_stiffness = 4e6;
    CHECK(contains(complaint(floor), "twice"));
    floor.panel->slab_depth.reset();
    floor.panel->slab_E.reset();
    CHECK(check_floor(floor).empty());
    floor.panel->slab_stiffness.reset();
    CHECK(contains(complaint(floor), "neither the slab"));
    floor.panel->slab_depth = 0.11;
    CHECK(contains(complaint(floor), "only one of slab_depth and slab_E"));
    floor = only(FloorMethod::dg11);
    floor.panel->floor_width.reset();
    CHECK(contains(complaint(floor), "floor_width is missing"));
}

TEST_CASE("floor: sizes are above 0") {
    const auto refused = [](auto change, const char* key) {
        FloorModel floor = sound_floor();
        floor.panel->girder = FloorModel::Girder{.E = 2e11, .I = 1e-3, .span = 9, .weight = 3e4, .floor_length = 27};
        REQUIRE(check_floor(floor).empty());
        change(floor);
        CAPTURE(key);
        CHECK(contains(complaint(floor), key));
    };
    refused([](FloorModel& f) { f.spacing = 0; }, "floor.spacing");
    refused([](FloorModel& f) { f.target = -8; }, "floor.target");
    refused([](FloorModel& f) { f.acceleration_limit = 0; }, "floor.acceleration_limit");
    refused([](FloorModel& f) { f.response_limit = 0; }, "floor.response_limit");
    refused([](FloorModel& f) { f.panel->weight = 0; }, "floor.panel.weight");
    refused([](FloorModel& f) { f.panel->slab_depth = 0; }, "floor.panel.slab_depth");
    refused([](FloorModel& f) { f.panel->slab_E = 0; }, "floor.panel.slab_E");
    refused([](FloorModel& f) { f.panel->floor_width = 0; }, "floor.panel.floor_width");
    refused([](FloorModel& f) { f.panel->girder->E = 0; }, "floor.panel.girder.E");
    refused([](FloorModel& f) { f.panel->girder->I = 0; }, "floor.panel.girder.I");
    refused([](FloorModel& f) { f.panel->girder->span = 0; }, "floor.panel.girder.span");
    refused([](FloorModel& f) { f.panel->girder->weight = 0; }, "floor.panel.girder.weight");
    refused([](FloorModel& f) { f.panel->girder->floor_length = 0; }, "floor.panel.girder.floor_length");
    refused([](FloorModel& f) { f.timber->width = 0; }, "floor.timber.width");
    refused([](FloorModel& f) { f.timber->transverse = 0; }, "floor.timber.transverse");
    refused([](FloorModel& f) { f.timber->deflection_limit = 0; }, "floor.timber.deflection_limit");
    refused([](FloorModel& f) { f.timber->velocity_limit = 1; }, "floor.timber.velocity_limit");
    refused([](FloorModel& f) { f.footfall->walk = 0; }, "floor.footfall.walk");
    refused([](FloorModel& f) { f.footfall->stride = 0; }, "floor.footfall.stride");
    refused([](FloorModel& f) { f.footfall->walker = 0; }, "floor.footfall.walker");
    refused([](FloorModel& f) { f.footfall->effective_width = 0; }, "floor.footfall.effective_width");
    refused([](FloorModel& f) { f.footfall->pace_least = 0.9; }, "floor.footfall.pace");
    refused([](FloorModel& f) { f.footfall->pace_most = 2.9; }, "floor.footfall.pace");
    refused([](FloorModel& f) { f.footfall->pace_least = 2.5; }, "floor.footfall.pace");
}

TEST_CASE("floor: without a vertical mode there is no value and no pass") {
    FloorInput input;
    input.span = 6;
    input.bending_stiffness = 1e7;
    input.mass_per_length = 500;
    for (bool with_sway : {false, true}) {
        if (with_sway) input.modes = {{.frequency = 2, .modal_mass = 1000, .vertical = 0.01, .is_vertical = false}};
        const auto results = screen_floor(sound_floor(), input);
        REQUIRE(results.size() == 3);
        CHECK(results[1].method == FloorMethod::en1995);
        for (const auto& result : results) {
            CHECK(result.use == "residence");
            CHECK_FALSE(result.value.has_value());
            CHECK_FALSE(result.utilisation.has_value());
            CHECK_FALSE(result.passed);
            CHECK(says(result.warnings, "none of the modes found is a vertical one"));
        }
    }
}
