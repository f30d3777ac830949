#include "transformations.hpp"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <stdexcept>

namespace reference {

namespace {

std::size_t index(int i) { return static_cast<std::size_t>(i); }
int count(const auto& list) { return static_cast<int>(list.size()); }

struct Turn {
    double cosine, sine;
    void operator()(double& x, double& y) const {
        const double turned_x = cosine * x - sine * y;
        y = sine * x + cosine * y;
        x = turned_x;
    }
};

Turn turn_by(double angle) { return {std::cos(angle), std::sin(angle)}; }

Turn axis_of(const Frame& frame, int member) {
    const Node& from = frame.nodes[index(frame.members[index(member)].from)];
    const Node& to = frame.nodes[index(frame.members[index(member)].to)];
    const double length = member_length(frame, member);
    return {(to.x - from.x) / length, (to.y - from.y) / length};
}

/// Self-weight as loads per length on every member.
std::vector<Load> weight_loads(const Frame& frame, double factor) {
    std::vector<Load> loads;
    for (int i = 0; i < count(frame.members); ++i) {
        const Member& member = frame.members[index(i)];
        Load load;
        load.kind = Load::Kind::distributed;
        load.on = i;
        load.whole = true;
        load.second_a = load.second_b = -9.80665 * factor * frame.materials[index(member.material)].density *
                                        frame.sections[index(member.section)].A;
        loads.push_back(load);
    }
    return loads;
}

/// The loads of a case with none per plan length and no self-weight.
std::vector<Load> per_length(const Frame& frame, const Case& load_case) {
    std::vector<Load> loads;
    for (Load load : load_case.loads) {
        if (load.kind == Load::Kind::self_weight) {
            const std::vector<Load> weight = weight_loads(frame, load.amount);
            loads.insert(loads.end(), weight.begin(), weight.end());
            continue;
        }
        if (load.kind == Load::Kind::distributed && load.axes == Load::Axes::plan) {
            const Turn axis = axis_of(frame, load.on);
            load.axes = Load::Axes::global;
            load.first_a *= std::fabs(axis.sine);
            load.first_b *= std::fabs(axis.sine);
            load.second_a *= std::fabs(axis.cosine);
            load.second_b *= std::fabs(axis.cosine);
        }
        loads.push_back(load);
    }
    return loads;
}

bool is_global_force(const Load& load) {
    const bool force =
        load.kind == Load::Kind::distributed || load.kind == Load::Kind::point || load.kind == Load::Kind::node;
    return force && load.axes != Load::Axes::member;
}

bool has_places(const Load& load) {
    return load.kind == Load::Kind::point || (load.kind == Load::Kind::distributed && !load.whole);
}

/// A load on a member that runs the other way along the same line.
void reverse(Load& load, double length) {
    if (load.kind == Load::Kind::distributed) {
        std::swap(load.first_a, load.first_b);
        std::swap(load.second_a, load.second_b);
    }
    if (has_places(load)) {
        const double b = load.kind == Load::Kind::point ? load.a : load.b;
        load.b = length - load.a;
        load.a = length - b;
    }
    if (load.axes == Load::Axes::member)
        for (double* along : {&load.first_a, &load.first_b}) *along = -*along;
}

/// The mirror image of a load on the mirror image of its member, from and to kept: across is turned over against the
/// material.
void mirror(Load& load, bool swapped) {
    load.moment = -load.moment;
    if (load.kind == Load::Kind::movement) load.first_a = -load.first_a;
    if (is_global_force(load))
        for (double* x : {&load.first_a, &load.first_b}) *x = -*x;
    if (swapped) return; // running the other way turns across back
    if (load.axes == Load::Axes::member)
        for (double* across : {&load.second_a, &load.second_b}) *across = -*across;
    std::swap(load.top, load.bottom);
}

/// The part of a load between s0 and s1 of its member, in that part's own places; false when there is none.
bool cut(Load& load, double s0, double s1, double length, bool first, bool last) {
    const double share = (s1 - s0) / length;
    if (load.kind == Load::Kind::lack_of_fit) load.amount *= share;
    if (load.kind == Load::Kind::point) {
        const bool here = (load.a >= s0 || first) && (load.a < s1 || last);
        load.a = std::clamp(load.a - s0, 0.0, s1 - s0);
        return here;
    }
    if (load.kind != Load::Kind::distributed) return true;
    const double a = load.whole ? 0 : load.a;
    const double b = load.whole ? length : load.b;
    const double from = std::max(a, s0);
    const double to = std::min(b, s1);
    if (to - from < 1e-9 * length) return false;
    const auto between = [&](double at_a, double at_b, double s) { return at_a + (at_b - at_a) * (s - a) / (b - a); };
    Load part = load;
    part.first_a = between(load.first_a, load.first_b, from);
    part.first_b = between(load.first_a, load.first_b, to);
    part.second_a = between(load.second_a, load.second_b, from);
    part.second_b = between(load.second_a, load.second_b, to);
    part.whole = from == s0 && to == s1;
    part.a = from - s0;
    part.b = to - s0;
    load = part;
    return true;
}

const PlaceValues& nearest(const std::vector<PlaceValues>& places, double at, bool after) {
    const PlaceValues* best = &places.front();
    for (const PlaceValues& each : places) {
        const double gain = std::fabs(best->at - at) - std::fabs(each.at - at);
        if (gain > 1e-9 || (gain > -1e-9 && each.after == after)) best = &each;
    }
    if (std::fabs(best->at - at) > 1e-8) throw std::runtime_error("a place is missing in the subdivided frame");
    return *best;
}

std::vector<int> random_order(int size, Dice& dice) {
    std::vector<int> order(index(size));
    std::iota(order.begin(), order.end(), 0);
    for (int i = size - 1; i > 0; --i) std::swap(order[index(i)], order[index(dice.whole(0, i))]);
    return order;
}

/// Rearranges a list; returns the new index of each old one.
template <class T> std::vector<int> rearrange(std::vector<T>& list, Dice& dice) {
    const std::vector<int> order = random_order(count(list), dice);
    std::vector<T> arranged;
    std::vector<int> now(list.size());
    for (const int old : order) {
        now[index(old)] = count(arranged);
        arranged.push_back(list[index(old)]);
    }
    list = std::move(arranged);
    return now;
}

template <class List> int find_name(const List& list, const std::string& name) {
    const auto found = std::find_if(list.begin(), list.end(), [&](const auto& each) { return each.name == name; });
    if (found == list.end()) throw std::runtime_error("no " + name);
    return static_cast<int>(found - list.begin());
}

} // namespace

Frame turned(const Frame& frame, double angle) {
    const Turn turn = turn_by(angle);
    Frame result = frame;
    for (Node& node : result.nodes) turn(node.x, node.y);
    for (Support& support : result.supports) support.angle += angle;
    for (Case& load_case : result.cases) {
        load_case.loads = per_length(frame, load_case);
        for (Load& load : load_case.loads) {
            if (!is_global_force(load)) continue;
            turn(load.first_a, load.second_a);
            turn(load.first_b, load.second_b);
        }
    }
    return result;
}

ResponseValues turned(const ResponseValues& values, double angle) {
    const Turn turn = turn_by(angle);
    ResponseValues result = values;
    for (auto& each : result.movements) turn(each.x, each.y);
    for (auto& each : result.reactions) turn(each.x, each.y);
    return result;
}

Frame mirrored(const Frame& frame, const std::vector<bool>& swapped) {
    Frame result = frame;
    for (Node& node : result.nodes) node.x = -node.x;
    for (Support& support : result.supports) support.angle = -support.angle;
    for (std::size_t i = 0; i < result.members.size(); ++i) {
        if (!swapped[i]) continue;
        Member& member = result.members[i];
        std::swap(member.from, member.to);
        std::swap(member.start, member.end);
        for (double& hinge : member.hinges) hinge = member_length(frame, static_cast<int>(i)) - hinge;
        std::reverse(member.hinges.begin(), member.hinges.end());
    }
    for (Case& load_case : result.cases)
        for (Load& load : load_case.loads) {
            const bool on_node = load.kind == Load::Kind::node || load.kind == Load::Kind::movement ||
                                 load.kind == Load::Kind::self_weight;
            const bool swap = !on_node && swapped[index(load.on)];
            mirror(load, swap);
            if (swap) reverse(load, member_length(frame, load.on));
        }
    return result;
}

ResponseValues mirrored(const ResponseValues& values, const std::vector<bool>& swapped,
                        const std::vector<double>& lengths) {
    ResponseValues result = values;
    for (auto& each : result.movements) {
        each.x = -each.x;
        each.rotation = -each.rotation;
    }
    for (auto& each : result.reactions) {
        each.x = -each.x;
        each.moment = -each.moment;
    }
    for (std::size_t i = 0; i < result.members.size(); ++i) {
        std::vector<PlaceValues>& places = result.members[i];
        for (PlaceValues& each : places) {
            if (!swapped[i]) { // across is turned over
                each.V = -each.V;
                each.M = -each.M;
                each.across = -each.across;
            } else { // s runs backwards
                each.V = -each.V;
                each.along = -each.along;
                each.at = lengths[i] - each.at;
            }
        }
        if (!swapped[i]) continue;
        std::reverse(places.begin(), places.end());
        for (std::size_t j = 0; j < places.size(); ++j) places[j].after = j > 0 && places[j - 1].at == places[j].at;
    }
    return result;
}

Frame subdivided(const Frame& frame, int parts) {
    Frame result = frame;
    result.members.clear();
    for (int i = 0; i < count(frame.members); ++i) {
        const Member& whole = frame.members[index(i)];
        const Node from = frame.nodes[index(whole.from)];
        const Node to = frame.nodes[index(whole.to)];
        const double length = member_length(frame, i);
        int before = whole.from;
        for (int part = 0; part < parts; ++part) {
            const double s0 = length * part / parts, s1 = length * (part + 1) / parts;
            const double share = static_cast<double>(part + 1) / parts;
            Member piece = whole;
            piece.hinges.clear();
            for (const double hinge : whole.hinges)
                if (hinge > s0 && hinge < s1) piece.hinges.push_back(hinge - s0);
            const std::string name = "c" + std::to_string(i) + "_" + std::to_string(part);
            piece.name = piece.hinges.empty() ? name : name + ".1";
            piece.from = before;
            if (part > 0) piece.start = {};
            if (part + 1 < parts) {
                piece.end = {};
                piece.to = count(result.nodes);
                result.nodes.push_back({"i" + std::to_string(i) + "_" + std::to_string(part),
                                        from.x + (to.x - from.x) * share, from.y + (to.y - from.y) * share});
            }
            before = piece.to;
            result.members.push_back(piece);
        }
    }
    for (Case& load_case : result.cases) {
        std::vector<Load> loads;
        for (const Load& load : load_case.loads) {
            if (load.kind == Load::Kind::node || load.kind == Load::Kind::movement ||
                load.kind == Load::Kind::self_weight) {
                loads.push_back(load);
                continue;
            }
            const double length = member_length(frame, load.on);
            for (int part = 0; part < parts; ++part) {
                Load piece = load;
                piece.on = load.on * parts + part;
                if (cut(piece, length * part / parts, length * (part + 1) / parts, length, part == 0,
                        part + 1 == parts))
                    loads.push_back(piece);
            }
        }
        load_case.loads = std::move(loads);
    }
    return result;
}

ResponseValues joined(const ResponseValues& values, const ResponseValues& listed, const Frame& frame, int parts) {
    ResponseValues result;
    result.movements.assign(values.movements.begin(), values.movements.begin() + count(frame.nodes));
    result.reactions = values.reactions;
    for (int i = 0; i < count(frame.members); ++i) {
        const double part_length = member_length(frame, i) / parts;
        std::vector<PlaceValues> places;
        for (const PlaceValues& each : listed.members[index(i)]) {
            const int part = std::clamp(static_cast<int>(std::floor(each.at / part_length + 1e-9)), 0, parts - 1);
            PlaceValues found =
                nearest(values.members[index(i * parts + part)], each.at - part * part_length, each.after);
            found.at = each.at;
            found.after = each.after;
            places.push_back(found);
        }
        result.members.push_back(std::move(places));
    }
    return result;
}

Frame shuffled(const Frame& frame, Dice& dice) {
    Frame result = frame;
    const std::vector<int> nodes = rearrange(result.nodes, dice);
    const std::vector<int> members = rearrange(result.members, dice);
    const std::vector<int> supports = rearrange(result.supports, dice);
    const std::vector<int> sections = rearrange(result.sections, dice);
    for (Member& member : result.members) {
        member.from = nodes[index(member.from)];
        member.to = nodes[index(member.to)];
        member.section = sections[index(member.section)];
    }
    for (Support& support : result.supports) support.node = nodes[index(support.node)];
    for (Case& load_case : result.cases) {
        for (Load& load : load_case.loads) {
            if (load.kind == Load::Kind::self_weight) continue;
            const bool node = load.kind == Load::Kind::node, movement = load.kind == Load::Kind::movement;
            load.on = (node ? nodes : movement ? supports : members)[index(load.on)];
        }
        rearrange(load_case.loads, dice);
    }
    return result;
}

ResponseValues reordered(const ResponseValues& values, const Frame& other, const Frame& frame) {
    ResponseValues result;
    for (const Node& node : frame.nodes)
        result.movements.push_back(values.movements[index(find_name(other.nodes, node.name))]);
    for (const Support& support : frame.supports)
        for (std::size_t i = 0; i < other.supports.size(); ++i)
            if (other.nodes[index(other.supports[i].node)].name == frame.nodes[index(support.node)].name)
                result.reactions.push_back(values.reactions[i]);
    for (const Member& member : frame.members)
        result.members.push_back(values.members[index(find_name(other.members, member.name))]);
    return result;
}

} // namespace reference
