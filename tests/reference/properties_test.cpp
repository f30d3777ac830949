// Laws that every right solution obeys, on 500 random structures each. Nothing here needs the reference solution.

#include "frame_text.hpp"
#include "random_frames.hpp"
#include "results.hpp"
#include "transformations.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <doctest/doctest.h>
#include <fmt/format.h>
#include <functional>

using namespace reference;

namespace {

constexpr double tolerance = 1e-9; // of the largest of its kind; see difference()
constexpr int places = 8;          // a multiple of the parts into which members are cut
constexpr std::uint64_t first_seed = 1000, structures = 500;

std::size_t index(int i) { return static_cast<std::size_t>(i); }

bool is_round_off(const PlaceValues& before, const PlaceValues& after) {
    constexpr double nothing = 1e-3; // N and N m: the random loads are a million times as large
    return std::fabs(before.N - after.N) < nothing && std::fabs(before.V - after.V) < nothing &&
           std::fabs(before.M - after.M) < nothing;
}

/// Where all forces of a member are round-off, a jump may be listed that is round-off too: it is left out.
void leave_out_round_off(std::vector<PlaceValues>& listed, double length, int parts) {
    std::vector<PlaceValues> kept;
    for (const PlaceValues& each : listed) {
        const bool noise = each.after && is_round_off(kept.back(), each);
        const bool evenly_spread = std::fabs(std::remainder(each.at, length / parts)) < 1e-9;
        if (noise && !evenly_spread) kept.pop_back();
        if (!noise) kept.push_back(each);
    }
    listed = std::move(kept);
}

std::vector<ResponseValues> solve(const Frame& frame, Units units = Units::si, int parts = places) {
    const test::Result result = test::run(model_text(frame, units), parts);
    std::vector<ResponseValues> all;
    for (const Case& each : frame.cases) {
        all.push_back(program_response(result, "cases/" + each.name, frame));
        for (int i = 0; i < static_cast<int>(frame.members.size()); ++i)
            leave_out_round_off(all.back().members[index(i)], member_length(frame, i), parts);
    }
    return all;
}

void check_same(const ResponseValues& expected, const ResponseValues& got, const Frame& frame, const std::string& what,
                double small_force = 1e3) {
    const Difference worst = difference(expected, got, frame, small_force);
    CHECK_MESSAGE(worst.relative < tolerance, fmt::format("{}: {:.2g}, {}", what, worst.relative, worst.where));
}

/// Compares every case of a changed frame, given how its results compare with the frame's.
using Change = std::function<ResponseValues(const ResponseValues& of_frame)>;
void check_changed(const Frame& frame, const Frame& changed, const Change& change, std::uint64_t seed) {
    const auto before = solve(frame);
    const auto after = solve(changed);
    for (std::size_t i = 0; i < before.size(); ++i)
        check_same(change(before[i]), after[i], changed, fmt::format("seed {} case {}", seed, frame.cases[i].name));
}

/// Movements of up to 0.1 m, rounded to 1e-17 m where they are imposed, times axial stiffnesses of up to 1e10 N/m leave
/// 1e-7 N; a wrong movement of 0.1 mm leaves 1e2 N on the softest spring.
constexpr double force_of_movements = 1e6;

/// The same results at the evenly spread places only, which every case lists.
ResponseValues evenly_spread(const ResponseValues& values, const Frame& frame) {
    ResponseValues result = values;
    for (std::size_t i = 0; i < result.members.size(); ++i) {
        const double part = member_length(frame, static_cast<int>(i)) / places;
        std::erase_if(result.members[i], [part](const PlaceValues& each) {
            return each.after || std::fabs(std::remainder(each.at, part)) > 1e-9;
        });
        REQUIRE(result.members[i].size() == places + 1);
    }
    return result;
}

template <class Check> void for_each_structure(const Check& check) {
    for (std::uint64_t seed = first_seed; seed < first_seed + structures; ++seed) check(seed);
}

struct Vector {
    double x, y;
};

Vector axis_of(const Frame& frame, int member) {
    const Node& from = frame.nodes[index(frame.members[index(member)].from)];
    const Node& to = frame.nodes[index(frame.members[index(member)].to)];
    const double length = member_length(frame, member);
    return {(to.x - from.x) / length, (to.y - from.y) / length};
}

/// A sum of forces and of their moments about the origin, with the sum of the sizes.
struct Balance {
    double x = 0, y = 0, moment = 0;
    double force_size = 0, moment_size = 0;

    void add(double fx, double fy, double m, Vector at) {
        x += fx;
        y += fy;
        const double of_x = -at.y * fx, of_y = at.x * fy;
        moment += of_x + of_y + m;
        force_size += std::fabs(fx) + std::fabs(fy);
        moment_size += std::fabs(of_x) + std::fabs(of_y) + std::fabs(m);
    }
    void check(const std::string& what) const {
        INFO(what);
        CHECK(std::fabs(x) <= tolerance * force_size);
        CHECK(std::fabs(y) <= tolerance * force_size);
        CHECK(std::fabs(moment) <= tolerance * moment_size);
    }
};

Vector place_on(const Frame& frame, int member, double s) {
    const Node& from = frame.nodes[index(frame.members[index(member)].from)];
    const Vector axis = axis_of(frame, member);
    return {from.x + axis.x * s, from.y + axis.y * s};
}

void add_distributed(Balance& sum, const Frame& frame, const Load& load) {
    const Vector axis = axis_of(frame, load.on);
    const double length = member_length(frame, load.on);
    const double a = load.whole ? 0 : load.a, b = load.whole ? length : load.b;
    // the trapezoid as two triangles, each half its height times its base, at a third of the base from its high side
    for (const bool at_a : {true, false}) {
        const double half = (b - a) / 2;
        double x = half * (at_a ? load.first_a : load.first_b), y = half * (at_a ? load.second_a : load.second_b);
        if (load.axes == Load::Axes::plan) {
            x *= std::fabs(axis.y);
            y *= std::fabs(axis.x);
        }
        if (load.axes == Load::Axes::member) {
            const double along = x;
            x = axis.x * along - axis.y * y;
            y = axis.y * along + axis.x * y;
        }
        sum.add(x, y, 0, place_on(frame, load.on, at_a ? a + (b - a) / 3 : b - (b - a) / 3));
    }
}

Vector point_force(const Frame& frame, const Load& load) {
    if (load.kind == Load::Kind::node || load.axes != Load::Axes::member) return {load.first_a, load.second_a};
    const Vector axis = axis_of(frame, load.on);
    return {axis.x * load.first_a - axis.y * load.second_a, axis.y * load.first_a + axis.x * load.second_a};
}

void add_load(Balance& sum, const Frame& frame, const Load& load) {
    if (load.kind == Load::Kind::distributed) add_distributed(sum, frame, load);
    if (load.kind == Load::Kind::self_weight)
        for (int i = 0; i < static_cast<int>(frame.members.size()); ++i) {
            const Member& member = frame.members[index(i)];
            const double length = member_length(frame, i);
            const double weight = 9.80665 * frame.materials[index(member.material)].density *
                                  frame.sections[index(member.section)].A * length * load.amount;
            sum.add(0, -weight, 0, place_on(frame, i, length / 2));
        }
    if (load.kind != Load::Kind::node && load.kind != Load::Kind::point) return;
    const auto [x, y] = point_force(frame, load);
    const Node& node = frame.nodes[index(load.kind == Load::Kind::node ? load.on : 0)];
    sum.add(x, y, load.moment,
            load.kind == Load::Kind::node ? Vector{node.x, node.y} : place_on(frame, load.on, load.a));
}

Balance of_structure(const Frame& frame, const Case& load_case, const ResponseValues& values) {
    Balance sum;
    for (const Load& load : load_case.loads) add_load(sum, frame, load);
    for (std::size_t i = 0; i < frame.supports.size(); ++i) {
        const Node& node = frame.nodes[index(frame.supports[i].node)];
        sum.add(values.reactions[i].x, values.reactions[i].y, values.reactions[i].moment, {node.x, node.y});
    }
    return sum;
}

/// What acts on a node: its loads and reaction, loads at the very ends of its members, the members' end forces.
Balance of_node(const Frame& frame, int node, const Case& load_case, const ResponseValues& values) {
    Balance sum;
    for (const Load& load : load_case.loads) {
        const bool at_end = load.kind == Load::Kind::point &&
                            ((load.a == 0 && frame.members[index(load.on)].from == node) ||
                             (load.a == member_length(frame, load.on) && frame.members[index(load.on)].to == node));
        if (!at_end && !(load.kind == Load::Kind::node && load.on == node)) continue;
        const auto [x, y] = point_force(frame, load);
        sum.add(x, y, load.moment, {0, 0});
    }
    for (std::size_t i = 0; i < frame.supports.size(); ++i)
        if (frame.supports[i].node == node)
            sum.add(values.reactions[i].x, values.reactions[i].y, values.reactions[i].moment, {0, 0});
    for (int i = 0; i < static_cast<int>(frame.members.size()); ++i) {
        const auto [c, s] = axis_of(frame, i);
        const PlaceValues& start = values.members[index(i)].front();
        const PlaceValues& end = values.members[index(i)].back();
        if (frame.members[index(i)].from == node) // N pulls the node along, V presses it to -across
            sum.add(c * start.N + s * start.V, s * start.N - c * start.V, start.M, {0, 0});
        if (frame.members[index(i)].to == node) sum.add(-c * end.N - s * end.V, -s * end.N + c * end.V, -end.M, {0, 0});
    }
    // where only strains act and nothing resists them, all that is left is round-off
    sum.force_size += 1e3;
    sum.moment_size += 1e3;
    return sum;
}

/// Work of one state's loads on another's movements, less that of the first's imposed movements on the other's
/// reactions: by Betti, P1 u2 + R1 d2 = P2 u1 + R2 d1, or P1 u2 - R2 d1 = P2 u1 - R1 d2.
struct Work {
    double sum = 0;
    double size = 0;
    void add(double force, double movement) {
        sum += force * movement;
        size += std::fabs(force * movement);
    }
};

/// Reactions and imposed movements meet in the support's own axes, so that work is done in held directions only.
Work work_of(const Frame& frame, const Case& loads, const test::Result& result, const std::string& other) {
    Work work;
    for (const Load& load : loads.loads) {
        if (load.kind == Load::Kind::movement) {
            const Support& support = frame.supports[index(load.on)];
            const std::string path =
                fmt::format("/cases/{}/reactions/{}/", other, frame.nodes[index(support.node)].name);
            const double x = result(path + "x"), y = result(path + "y");
            const double c = std::cos(support.angle), s = std::sin(support.angle);
            work.add(load.first_a, -(c * x + s * y));
            work.add(load.second_a, -(c * y - s * x));
            work.add(load.moment, -result(path + "moment"));
            continue;
        }
        const auto [x, y] = point_force(frame, load);
        if (load.kind == Load::Kind::node) {
            const std::string path =
                fmt::format("/cases/{}/displacements/{}/", other, frame.nodes[index(load.on)].name);
            work.add(x, result(path + "x"));
            work.add(y, result(path + "y"));
            if (load.moment != 0) work.add(load.moment, result(path + "rotation"));
            continue;
        }
        const auto [c, s] = axis_of(frame, load.on);
        const std::string& member = frame.members[index(load.on)].name;
        work.add(c * x + s * y, result.place("cases/" + other, member, "along", load.a));
        work.add(c * y - s * x, result.place("cases/" + other, member, "across", load.a));
    }
    return work;
}

Load support_movement(const Frame& frame, int support, Vector by, double rotation) {
    const Support& each = frame.supports[index(support)];
    const double c = std::cos(each.angle), s = std::sin(each.angle);
    Load load;
    load.kind = Load::Kind::movement;
    load.on = support;
    if (each.held.first.kind != Joint::Kind::free) load.first_a = c * by.x + s * by.y;
    if (each.held.second.kind != Joint::Kind::free) load.second_a = c * by.y - s * by.x;
    if (each.held.rotation.kind != Joint::Kind::free) load.moment = rotation;
    return load;
}

/// Small movement of a rigid plane: a shift and a turn about a point.
struct RigidMovement {
    Vector shift, centre;
    double rotation;
    Vector at(Vector place) const {
        return {shift.x - rotation * (place.y - centre.y), shift.y + rotation * (place.x - centre.x)};
    }
};

ResponseValues moved_rigidly(const Frame& frame, const RigidMovement& movement, const ResponseValues& listed) {
    ResponseValues values;
    for (int i = 0; i < static_cast<int>(frame.nodes.size()); ++i) {
        const Vector by = movement.at({frame.nodes[index(i)].x, frame.nodes[index(i)].y});
        values.movements.push_back({by.x, by.y, node_turns(frame, i) ? movement.rotation : 0});
    }
    values.reactions.resize(frame.supports.size());
    for (int i = 0; i < static_cast<int>(frame.members.size()); ++i) {
        const auto [c, s] = axis_of(frame, i);
        std::vector<PlaceValues> along_member;
        for (const PlaceValues& each : listed.members[index(i)]) {
            const Vector by = movement.at(place_on(frame, i, each.at));
            along_member.push_back({each.at, each.after, 0, 0, 0, c * by.x + s * by.y, c * by.y - s * by.x});
        }
        values.members.push_back(std::move(along_member));
    }
    return values;
}

bool is_determinate(const Frame& frame) {
    int held = 0;
    for (const Support& support : frame.supports)
        for (const Joint* joint : {&support.held.first, &support.held.second, &support.held.rotation})
            held += joint->kind != Joint::Kind::free;
    return held == 3 && frame.members.size() + 1 == frame.nodes.size();
}

} // namespace

TEST_SUITE("full") {
    TEST_CASE("the structure and each of its nodes are in equilibrium") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            const auto values = solve(frame);
            for (std::size_t i = 0; i < values.size(); ++i) {
                const Case& load_case = frame.cases[i];
                Balance whole = of_structure(frame, load_case, values[i]);
                whole.force_size += 1e3;
                whole.moment_size += 1e3;
                whole.check(fmt::format("seed {} case {}", seed, load_case.name));
                for (int node = 0; node < static_cast<int>(frame.nodes.size()); ++node)
                    of_node(frame, node, load_case, values[i])
                        .check(fmt::format("seed {} case {} node {}", seed, load_case.name, node));
            }
        });
    }

    // E. Betti, Teoria della elasticita, 1872, and J. C. Maxwell, 1864 (from memory): the work of the forces of one
    // state on the movements of another equals that of the other's on the first; forces of moved supports included
    TEST_CASE("reciprocity") {
        for_each_structure([](std::uint64_t seed) {
            Frame frame = random_structure(seed);
            Dice dice(seed);
            Case first{"first", {}}, second{"second", {}};
            for (Case* load_case : {&first, &second}) {
                add_point_loads(frame, *load_case, dice, 3);
                for (Load& load : load_case->loads) {
                    if (load.kind != Load::Kind::point) continue;
                    load.moment = 0; // a member's rotation is not listed
                    load.a = dice.whole(0, places) * member_length(frame, load.on) / places;
                }
                const int support = dice.whole(0, static_cast<int>(frame.supports.size()) - 1);
                load_case->loads.push_back(
                    support_movement(frame, support, {dice.between(-0.02, 0.02), dice.between(-0.02, 0.02)}, 0.003));
            }
            frame.cases = {first, second};
            const test::Result result = test::run(model_text(frame), places);
            const Work one = work_of(frame, first, result, "second"), two = work_of(frame, second, result, "first");
            INFO("seed ", seed, ": ", one.sum, " and ", two.sum);
            CHECK(std::fabs(one.sum - two.sum) <= tolerance * (one.size + two.size));
        });
    }

    TEST_CASE("superposition") {
        for_each_structure([](std::uint64_t seed) {
            Frame frame = random_frame(seed);
            Case all{"all", frame.cases[0].loads};
            for (const Case* each : {&frame.cases[1], &frame.cases[2]})
                all.loads.insert(all.loads.end(), each->loads.begin(), each->loads.end());
            frame.cases.push_back(all);
            const std::string tail = "[combinations.sum]\nfactors = { forces = 1, strains = 1, mixed = 1 }\n"
                                     "[combinations.difference]\nfactors = { all = 0.5, mixed = -2.25 }\n";
            const test::Result result = test::run(model_text(frame, Units::si, tail), places);
            const auto values = [&](const char* scope) {
                return evenly_spread(program_response(result, scope, frame), frame);
            };
            const auto sum = values("combinations/sum"), rest = values("combinations/difference");
            const auto mixed = values("cases/mixed"), whole = values("cases/all");
            check_same(whole, sum, frame, fmt::format("seed {} sum", seed));
            check_same(scaled_sum(-2.25, mixed, scaled_sum(-0.5, whole, whole)), rest, frame,
                       fmt::format("seed {} difference", seed));
        });
    }

    TEST_CASE("supports that move together as on a rigid plane cause no force") {
        for_each_structure([](std::uint64_t seed) {
            Frame frame = random_structure(seed);
            Dice dice(seed);
            const RigidMovement movement{{dice.between(-0.1, 0.1), dice.between(-0.1, 0.1)},
                                         {dice.between(-5, 5), dice.between(-5, 5)},
                                         dice.between(-0.01, 0.01)};
            Case together{"together", {}};
            for (int i = 0; i < static_cast<int>(frame.supports.size()); ++i) {
                const Node& node = frame.nodes[index(frame.supports[index(i)].node)];
                together.loads.push_back(support_movement(frame, i, movement.at({node.x, node.y}), movement.rotation));
            }
            frame.cases = {together};
            const auto values = solve(frame).front();
            check_same(moved_rigidly(frame, movement, values), values, frame, fmt::format("seed {}", seed),
                       force_of_movements);
        });
    }

    TEST_CASE("any support movement of a statically determinate structure causes no force") {
        int tried = 0;
        for (std::uint64_t seed = first_seed; tried < 100; ++seed) {
            Frame frame = random_structure(seed);
            if (!is_determinate(frame)) continue;
            ++tried;
            Case moved{"moved", {}};
            for (int i = 0; i < static_cast<int>(frame.supports.size()); ++i)
                moved.loads.push_back(support_movement(frame, i, {0.013 * (i + 1), -0.02}, 0.004));
            frame.cases = {moved};
            const auto values = solve(frame).front();
            ResponseValues expected = values;
            for (auto& each : expected.reactions) each = {};
            for (auto& member : expected.members)
                for (PlaceValues& each : member) each.N = each.V = each.M = 0;
            check_same(expected, values, frame, fmt::format("seed {}", seed), force_of_movements);
        }
    }

    TEST_CASE("cutting every member in parts changes nothing") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            const int parts = seed % 2 == 0 ? 2 : 4;
            const Frame cut = subdivided(frame, parts);
            const auto before = solve(frame);
            const auto after = solve(cut, Units::si, places / parts);
            for (std::size_t i = 0; i < before.size(); ++i)
                check_same(before[i], joined(after[i], before[i], frame, parts), frame,
                           fmt::format("seed {} case {}", seed, frame.cases[i].name));
        });
    }

    TEST_CASE("turning the model by any angle turns the results") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            const double angle = Dice(seed).between(-3.1, 3.1);
            const auto change = [&](const ResponseValues& values) { return turned(values, angle); };
            check_changed(frame, turned(frame, angle), change, seed);
        });
    }

    TEST_CASE("mirroring the model mirrors the results, whichever way the members run") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            Dice dice(seed);
            std::vector<bool> swapped;
            std::vector<double> lengths;
            for (int i = 0; i < static_cast<int>(frame.members.size()); ++i) {
                // a section that is not symmetric must keep its top on the same side
                const Section& section = frame.sections[index(frame.members[index(i)].section)];
                swapped.push_back(section.top != section.depth / 2 || dice.chance(0.5));
                lengths.push_back(member_length(frame, i));
            }
            const auto change = [&](const ResponseValues& values) { return mirrored(values, swapped, lengths); };
            check_changed(frame, mirrored(frame, swapped), change, seed);
        });
    }

    TEST_CASE("the units of the file change nothing") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            const auto units =
                std::array{Units::bare_si, Units::millimetre_newton, Units::us, Units::bare_us}[seed % 4];
            const auto before = solve(frame);
            const auto after = solve(frame, units);
            for (std::size_t i = 0; i < before.size(); ++i)
                check_same(before[i], after[i], frame, fmt::format("seed {} units {}", seed, seed % 4));
        });
    }

    TEST_CASE("the order of nodes, members, supports and loads changes nothing") {
        for_each_structure([](std::uint64_t seed) {
            const Frame frame = random_frame(seed);
            Dice dice(seed);
            const Frame other = shuffled(frame, dice);
            const auto before = solve(frame);
            const auto after = solve(other);
            for (std::size_t i = 0; i < before.size(); ++i)
                check_same(before[i], reordered(after[i], other, frame), frame, fmt::format("seed {}", seed));
        });
    }
}
