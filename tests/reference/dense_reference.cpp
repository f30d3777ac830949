#include "dense_reference.hpp"

#include "elimination.hpp"
#include "number.hpp"

#include <array>
#include <cmath>

namespace reference {

namespace {

constexpr double gravity = 9.80665; // m/s2, CGPM 1901

std::size_t index(int i) { return static_cast<std::size_t>(i); }

/// Order of a state's components.
enum Component { along, across, rotation, axial, shear, bending };

template <class S> struct Axis { S length, cosine, sine; };

template <class S> Axis<S> axis_of(const Frame& frame, const Member& member) {
    const Node& from = frame.nodes[index(member.from)];
    const Node& to = frame.nodes[index(member.to)];
    const S dx = S(to.x) - S(from.x);
    const S dy = S(to.y) - S(from.y);
    const S length = square_root(dx * dx + dy * dy);
    return {length, dx / length, dy / length};
}

} // namespace

double member_length(const Frame& frame, int member) {
    return static_cast<double>(axis_of<long double>(frame, frame.members[index(member)]).length);
}

// ---------------------------------------------------------------------------------------------------------------------
// One member: its state as a linear function of initial parameters and hinge rotations, plus one free column a case.

template <class S> struct Reference<S>::Course {
    struct Spread { // a distributed load in member axes
        S a, b, along_a, across_a, along_b, across_b;
        int load_case;
    };
    struct Jump { // a point load (case >= 0) or a hinge
        S at, along, across, moment;
        int load_case;
        int hinge;
    };
    using State = std::array<std::vector<S>, 6>;

    Axis<S> axis;
    S EA, EI, shear_flexibility;
    int hinges = 0;
    int cases = 0;
    std::vector<Spread> spreads;
    std::vector<Jump> jumps;
    std::vector<S> free_strain, free_curvature; // by case

    Course(const Frame& frame, int number);
    State state(S at, bool after) const;
    S snapped(double at) const;

  private:
    void take(const Load& load, int load_case);
    void take_self_weight(const Frame& frame, const Load& load, int load_case, const Member& member);
    void take_distributed(const Load& load, int load_case);
    void take_point(const Load& load, int load_case);
    void take_temperature(const Frame& frame, const Load& load, int load_case, const Member& member);
    S on_member(double at) const;
    void advance(State& state, S from, S to) const;
    void jump(State& state, const Jump& jump) const;
    std::vector<S> breaks(S at) const;
    std::size_t case_column(int load_case) const { return index(6 + hinges + load_case); }
};

template <class S>
Reference<S>::Course::Course(const Frame& frame, int number) : axis(axis_of<S>(frame, frame.members[index(number)])) {
    const Member& member = frame.members[index(number)];
    const Section& section = frame.sections[index(member.section)];
    const Material& material = frame.materials[index(member.material)];
    EA = S(material.E) * section.A * member.factor;
    EI = S(material.E) * section.I * member.factor;
    shear_flexibility = section.shear_area > 0 ? 1 / (S(material.G) * section.shear_area * member.factor) : S(0);
    hinges = static_cast<int>(member.hinges.size());
    cases = static_cast<int>(frame.cases.size());
    free_strain.assign(index(cases), S(0));
    free_curvature.assign(index(cases), S(0));
    for (int hinge = 0; hinge < hinges; ++hinge) jumps.push_back({S(member.hinges[index(hinge)]), 0, 0, 0, -1, hinge});
    for (int load_case = 0; load_case < cases; ++load_case)
        for (const Load& load : frame.cases[index(load_case)].loads) {
            if (load.kind == Load::Kind::self_weight)
                take_self_weight(frame, load, load_case, member);
            else if (load.kind == Load::Kind::node || load.kind == Load::Kind::movement || load.on != number)
                continue;
            else if (load.kind == Load::Kind::temperature)
                take_temperature(frame, load, load_case, member);
            else
                take(load, load_case);
        }
}

/// A load's place; the rounded length counts as the member's end.
template <class S> S Reference<S>::Course::on_member(double at) const {
    return magnitude(S(at) - axis.length) < axis.length * 1e-12L ? axis.length : S(at);
}

template <class S> void Reference<S>::Course::take(const Load& load, int load_case) {
    if (load.kind == Load::Kind::distributed) take_distributed(load, load_case);
    if (load.kind == Load::Kind::point) take_point(load, load_case);
    if (load.kind == Load::Kind::lack_of_fit) free_strain[index(load_case)] += S(load.amount) / axis.length;
}

template <class S>
void Reference<S>::Course::take_self_weight(const Frame& frame, const Load& load, int load_case, const Member& member) {
    const S weight = S(frame.materials[index(member.material)].density) * frame.sections[index(member.section)].A *
                     S(gravity) * load.amount;
    const S p = -weight * axis.sine;
    const S q = -weight * axis.cosine;
    spreads.push_back({0, axis.length, p, q, p, q, load_case});
}

template <class S> void Reference<S>::Course::take_distributed(const Load& load, int load_case) {
    // (x, y) per length = (x |sin|, y |cos|) of a load per vertical and per horizontal length
    const bool plan = load.axes == Load::Axes::plan;
    const S of_x = plan ? magnitude(axis.sine) : S(1);
    const S of_y = plan ? magnitude(axis.cosine) : S(1);
    const bool local = load.axes == Load::Axes::member;
    const S c = local ? S(1) : axis.cosine;
    const S s = local ? S(0) : axis.sine;
    const auto p = [&](double x, double y) { return c * of_x * x + s * of_y * y; };
    const auto q = [&](double x, double y) { return -s * of_x * x + c * of_y * y; };
    const S a = load.whole ? S(0) : on_member(load.a);
    const S b = load.whole ? axis.length : on_member(load.b);
    spreads.push_back({a, b, p(load.first_a, load.second_a), q(load.first_a, load.second_a),
                       p(load.first_b, load.second_b), q(load.first_b, load.second_b), load_case});
}

template <class S> void Reference<S>::Course::take_point(const Load& load, int load_case) {
    const bool local = load.axes == Load::Axes::member;
    const S c = local ? S(1) : axis.cosine;
    const S s = local ? S(0) : axis.sine;
    jumps.push_back({on_member(load.a), c * load.first_a + s * load.second_a, -s * load.first_a + c * load.second_a,
                     S(load.moment), load_case, -1});
}

template <class S>
void Reference<S>::Course::take_temperature(const Frame& frame, const Load& load, int load_case, const Member& member) {
    const Section& section = frame.sections[index(member.section)];
    const S expansion = frame.materials[index(member.material)].expansion;
    const S difference = S(load.top) - S(load.bottom);
    S gradient = 0; // dT/dn, n towards +across
    if (difference != 0) gradient = difference / S(section.depth);
    // at the centroid: T(top) less what the gradient takes off on the way from the top face
    free_strain[index(load_case)] += expansion * (S(load.top) - gradient * S(section.top));
    // the hotter face becomes the longer one: hot at +across hogs, curvature counts positive sagging
    free_curvature[index(load_case)] -= expansion * gradient;
}

/// From s = from to s = to, with loads linear in between: the integrals of the field equations over t = to - from.
template <class S> void Reference<S>::Course::advance(State& state, S from, S to) const {
    const S t = to - from;
    const S t2 = t * t;
    const S t3 = t2 * t;
    for (std::size_t column = 0; column < state[0].size(); ++column) {
        const S N = state[axial][column], V = state[shear][column], M = state[bending][column];
        state[along][column] += N * t / EA;
        state[across][column] +=
            state[rotation][column] * t + (M * t2 / 2 + V * t3 / 6) / EI - V * t * shear_flexibility;
        state[rotation][column] += (M * t + V * t2 / 2) / EI;
        state[bending][column] += V * t;
    }
    for (int load_case = 0; load_case < cases; ++load_case) {
        state[along][case_column(load_case)] += free_strain[index(load_case)] * t;
        state[rotation][case_column(load_case)] += free_curvature[index(load_case)] * t;
        state[across][case_column(load_case)] += free_curvature[index(load_case)] * t2 / 2;
    }
    for (const Spread& load : spreads) {
        if (load.a > from || load.b < to || load.b <= load.a) continue;
        const std::size_t column = case_column(load.load_case);
        const S p1 = (load.along_b - load.along_a) / (load.b - load.a);
        const S q1 = (load.across_b - load.across_a) / (load.b - load.a);
        const S p0 = load.along_a + p1 * (from - load.a);
        const S q0 = load.across_a + q1 * (from - load.a);
        state[axial][column] -= p0 * t + p1 * t2 / 2;
        state[along][column] -= (p0 * t2 / 2 + p1 * t3 / 6) / EA;
        state[shear][column] += q0 * t + q1 * t2 / 2;
        state[bending][column] += q0 * t2 / 2 + q1 * t3 / 6;
        state[rotation][column] += (q0 * t3 / 6 + q1 * t3 * t / 24) / EI;
        state[across][column] +=
            (q0 * t3 * t / 24 + q1 * t3 * t2 / 120) / EI - (q0 * t2 / 2 + q1 * t3 / 6) * shear_flexibility;
    }
}

template <class S> void Reference<S>::Course::jump(State& state, const Jump& jump) const {
    if (jump.hinge >= 0) {
        state[rotation][index(6 + jump.hinge)] += 1;
        return;
    }
    const std::size_t column = case_column(jump.load_case);
    state[axial][column] -= jump.along;
    state[shear][column] += jump.across;
    state[bending][column] -= jump.moment;
}

/// 0, the places up to `at` where a load or hinge begins or ends, and `at`.
template <class S> std::vector<S> Reference<S>::Course::breaks(S at) const {
    std::vector<S> places{S(0), at};
    const auto add = [&](S place) {
        if (place > 0 && place < at) places.push_back(place);
    };
    for (const Spread& load : spreads) {
        add(load.a);
        add(load.b);
    }
    for (const Jump& jump : jumps) add(jump.at);
    std::sort(places.begin(), places.end());
    places.erase(std::unique(places.begin(), places.end()), places.end());
    return places;
}

template <class S> typename Reference<S>::Course::State Reference<S>::Course::state(S at, bool after) const {
    State state;
    for (std::size_t component = 0; component < 6; ++component) {
        state[component].assign(index(6 + hinges + cases), S(0));
        state[component][component] = 1;
    }
    const std::vector<S> places = breaks(at);
    for (std::size_t i = 0; i < places.size(); ++i) {
        if (i > 0) advance(state, places[i - 1], places[i]);
        if (places[i] == at && !after) break;
        for (const Jump& each : jumps)
            if (each.at == places[i]) jump(state, each);
    }
    return state;
}

template <class S> S Reference<S>::Course::snapped(double at) const {
    const S reach = axis.length * 1e-9L;
    S best = at;
    const auto consider = [&](S place) {
        if (magnitude(place - S(at)) < reach) best = place;
    };
    for (const Spread& load : spreads) {
        consider(load.a);
        consider(load.b);
    }
    for (const Jump& each : jumps) consider(each.at);
    consider(0);
    consider(axis.length);
    return best;
}

// ---------------------------------------------------------------------------------------------------------------------
// The structure: which unknown stands where, and the equations.

template <class S> struct Reference<S>::Layout {
    std::vector<int> node;    // first of x, y, rotation
    std::vector<int> support; // first of the reaction's components in the support's axes
    std::vector<int> member;  // first of the initial parameters; hinge rotations follow
    std::vector<bool> turns;  // whether the node has a rotation
    int size = 0;
    S force_unit = 1; // unknown forces are counted in this unit, so that pivots compare like with like

    explicit Layout(const Frame& frame);
    std::vector<Equation<S>> equations(const Frame& frame,
                                       const std::vector<std::shared_ptr<const Course>>& courses) const;

  private:
    struct End {
        int node;
        const Joints* joints;
        const typename Course::State* state;
        const Course* course;
        int first_unknown;
        int sign; // of the forces of the node on the member against N, -V, M: -1 at the start, +1 at the end
    };
    void add_joints(std::vector<Equation<S>>& equations, const End& end) const;
    void add_to_node(std::vector<Equation<S>>& equations, const End& end) const;
    void add_support(std::vector<Equation<S>>& equations, const Frame& frame, int number) const;
    void add_node_loads(std::vector<Equation<S>>& equations, const Frame& frame) const;
    /// Adds factor x (a component of a member's state) to an equation that reads sum of terms = right.
    void add_state(Equation<S>& equation, const End& end, Component component, S factor) const;
    S unit(int component) const { return component >= axial ? force_unit : S(1); }
};

template <class S> Reference<S>::Layout::Layout(const Frame& frame) {
    node.resize(frame.nodes.size());
    support.resize(frame.supports.size());
    member.resize(frame.members.size());
    turns.assign(frame.nodes.size(), false);
    for (const Member& each : frame.members) {
        if (each.start.rotation.kind != Joint::Kind::free) turns[index(each.from)] = true;
        if (each.end.rotation.kind != Joint::Kind::free) turns[index(each.to)] = true;
        const double EA = frame.materials[index(each.material)].E * frame.sections[index(each.section)].A;
        force_unit = std::max(force_unit, S(EA));
    }
    for (const Support& each : frame.supports)
        if (each.held.rotation.kind != Joint::Kind::free) turns[index(each.node)] = true;
    for (std::size_t i = 0; i < frame.nodes.size(); ++i) {
        node[i] = size;
        size += 3;
        for (std::size_t j = 0; j < frame.supports.size(); ++j)
            if (index(frame.supports[j].node) == i) {
                support[j] = size;
                size += 3;
            }
        for (std::size_t j = 0; j < frame.members.size(); ++j)
            if (index(std::min(frame.members[j].from, frame.members[j].to)) == i) {
                member[j] = size;
                size += 6 + static_cast<int>(frame.members[j].hinges.size());
            }
    }
}

template <class S>
void Reference<S>::Layout::add_state(Equation<S>& equation, const End& end, Component component, S factor) const {
    const std::vector<S>& row = (*end.state)[component];
    const int own = 6 + end.course->hinges;
    for (int column = 0; column < own; ++column) {
        const S scale = column < 6 ? unit(column) : S(1);
        equation.terms.emplace_back(end.first_unknown + column, factor * row[index(column)] * scale);
    }
    for (std::size_t load_case = 0; load_case < equation.right.size(); ++load_case)
        equation.right[load_case] -= factor * row[index(own) + load_case];
}

/// The law of each joint: rigid, the two movements agree; free, no force; spring, force on the member = k (node's
/// movement less the member's).
template <class S> void Reference<S>::Layout::add_joints(std::vector<Equation<S>>& equations, const End& end) const {
    const S c = end.course->axis.cosine;
    const S s = end.course->axis.sine;
    const std::array<const Joint*, 3> joints{&end.joints->first, &end.joints->second, &end.joints->rotation};
    for (std::size_t i = 0; i < 3; ++i) {
        const auto movement = static_cast<Component>(along + i);
        const auto force = static_cast<Component>(axial + i);
        Equation<S> equation{{}, std::vector<S>(index(end.course->cases), S(0))};
        const S sign = end.sign * (force == shear ? -1 : 1); // force on the member = sign x internal force
        const S k = joints[i]->kind == Joint::Kind::rigid ? S(1) : S(joints[i]->stiffness);
        if (joints[i]->kind != Joint::Kind::rigid) add_state(equation, end, force, sign);
        if (joints[i]->kind != Joint::Kind::free) {
            add_state(equation, end, movement, k);
            const S x = movement == along ? c : movement == across ? -s : S(0);
            const S y = movement == along ? s : movement == across ? c : S(0);
            equation.terms.emplace_back(end.node, -k * x);
            equation.terms.emplace_back(end.node + 1, -k * y);
            equation.terms.emplace_back(end.node + 2, movement == rotation ? -k : S(0));
        }
        equations.push_back(std::move(equation));
    }
}

/// What the member's end does to its node: the opposite of the node's force on the member.
template <class S> void Reference<S>::Layout::add_to_node(std::vector<Equation<S>>& equations, const End& end) const {
    const S c = end.course->axis.cosine;
    const S s = end.course->axis.sine;
    const S sign = -end.sign;
    const std::size_t row = index(end.node);
    add_state(equations[row], end, axial, sign * c);
    add_state(equations[row], end, shear, sign * s); // across force on the member is -V: (-V)(-s) = V s
    add_state(equations[row + 1], end, axial, sign * s);
    add_state(equations[row + 1], end, shear, -sign * c);
    add_state(equations[row + 2], end, bending, sign);
}

template <class S>
void Reference<S>::Layout::add_support(std::vector<Equation<S>>& equations, const Frame& frame, int number) const {
    const Support& each = frame.supports[index(number)];
    const auto [c, s] = direction_of<S>(each.angle);
    const int at = node[index(each.node)];
    const int reaction = support[index(number)];
    const std::array<std::array<S, 3>, 3> axes{{{c, s, 0}, {-s, c, 0}, {0, 0, 1}}};
    const std::array<const Joint*, 3> joints{&each.held.first, &each.held.second, &each.held.rotation};
    for (std::size_t i = 0; i < 3; ++i) {
        const int own = reaction + static_cast<int>(i);
        for (int j = 0; j < 3; ++j) // the reaction on the node
            equations[index(at + j)].terms.emplace_back(own, axes[i][index(j)] * force_unit);
        // rigid: movement = imposed; free: reaction = 0; spring: reaction + k movement = k imposed
        Equation<S> law{{}, std::vector<S>(frame.cases.size(), S(0))};
        const S k = joints[i]->kind == Joint::Kind::rigid ? S(1) : S(joints[i]->stiffness);
        if (joints[i]->kind != Joint::Kind::rigid) law.terms.emplace_back(own, force_unit);
        if (joints[i]->kind != Joint::Kind::free)
            for (int j = 0; j < 3; ++j) law.terms.emplace_back(at + j, k * axes[i][index(j)]);
        for (std::size_t load_case = 0; load_case < frame.cases.size(); ++load_case)
            for (const Load& load : frame.cases[load_case].loads)
                if (load.kind == Load::Kind::movement && load.on == number)
                    law.right[load_case] += k * std::array<double, 3>{load.first_a, load.second_a, load.moment}[i];
        equations[index(own)] = std::move(law);
    }
}

template <class S>
void Reference<S>::Layout::add_node_loads(std::vector<Equation<S>>& equations, const Frame& frame) const {
    for (std::size_t load_case = 0; load_case < frame.cases.size(); ++load_case)
        for (const Load& load : frame.cases[load_case].loads) {
            if (load.kind != Load::Kind::node) continue;
            const std::size_t row = index(node[index(load.on)]);
            equations[row].right[load_case] -= load.first_a;
            equations[row + 1].right[load_case] -= load.second_a;
            equations[row + 2].right[load_case] -= load.moment;
        }
}

template <class S>
std::vector<Equation<S>>
Reference<S>::Layout::equations(const Frame& frame, const std::vector<std::shared_ptr<const Course>>& courses) const {
    std::vector<Equation<S>> all(index(size), Equation<S>{{}, std::vector<S>(frame.cases.size(), S(0))});
    add_node_loads(all, frame);
    for (std::size_t i = 0; i < frame.members.size(); ++i) {
        const Member& each = frame.members[i];
        const Course& course = *courses[i];
        const auto start = course.state(0, false);
        const auto finish = course.state(course.axis.length, true);
        const End first{node[index(each.from)], &each.start, &start, &course, member[i], -1};
        const End second{node[index(each.to)], &each.end, &finish, &course, member[i], 1};
        std::vector<Equation<S>> own;
        add_joints(own, first);
        add_joints(own, second);
        for (std::size_t hinge = 0; hinge < each.hinges.size(); ++hinge) {
            const auto state = course.state(S(each.hinges[hinge]), false);
            Equation<S> no_moment{{}, std::vector<S>(frame.cases.size(), S(0))};
            add_state(no_moment, {0, nullptr, &state, &course, member[i], 1}, bending, 1);
            own.push_back(std::move(no_moment));
        }
        std::move(own.begin(), own.end(), all.begin() + member[i]);
        add_to_node(all, first);
        add_to_node(all, second);
    }
    for (std::size_t i = 0; i < frame.supports.size(); ++i) add_support(all, frame, static_cast<int>(i));
    for (std::size_t i = 0; i < turns.size(); ++i)
        if (!turns[i]) all[index(node[i] + 2)] = {{{node[i] + 2, S(1)}}, std::vector<S>(frame.cases.size(), S(0))};
    return all;
}

template <class S> Reference<S>::Reference(const Frame& frame) : frame_(std::make_shared<const Frame>(frame)) {
    for (int i = 0; i < static_cast<int>(frame.members.size()); ++i)
        courses_.push_back(std::make_shared<const Course>(frame, i));
    layout_ = std::make_shared<const Layout>(frame);
    Elimination<S> elimination(layout_->equations(frame, courses_), static_cast<int>(frame.cases.size()));
    Solved<S> solved = elimination.solve();
    unknowns_ = std::move(solved.unknowns);
    smallest_pivot_ = solved.smallest_pivot;
}

template <class S> Movement<S> Reference<S>::movement(int load_case, int node) const {
    const auto at = index(layout_->node[index(node)]);
    const auto value = [&](std::size_t i) { return unknowns_[at + i][index(load_case)]; };
    return {value(0), value(1), value(2)};
}

template <class S> bool Reference<S>::has_rotation(int node) const { return layout_->turns[index(node)]; }

template <class S> Force<S> Reference<S>::reaction(int load_case, int support) const {
    const auto [c, s] = direction_of<S>(frame_->supports[index(support)].angle);
    const auto at = index(layout_->support[index(support)]);
    const auto value = [&](std::size_t i) { return unknowns_[at + i][index(load_case)] * layout_->force_unit; };
    return {c * value(0) - s * value(1), s * value(0) + c * value(1), value(2)};
}

template <class S> Place<S> Reference<S>::place(int load_case, int member, double at, bool after) const {
    const Course& course = *courses_[index(member)];
    const S where = course.snapped(at);
    const bool inside_after = where == 0 || (after && where < course.axis.length);
    const auto state = course.state(where, inside_after);
    const auto value = [&](Component component) {
        S sum = state[component][index(6 + course.hinges + load_case)];
        for (int column = 0; column < 6 + course.hinges; ++column) {
            const S scale = column >= axial && column < 6 ? layout_->force_unit : S(1);
            sum += state[component][index(column)] *
                   unknowns_[index(layout_->member[index(member)] + column)][index(load_case)] * scale;
        }
        return sum;
    };
    return {value(axial), value(shear), value(bending), value(along), value(across), value(rotation)};
}

template class Reference<long double>;
template class Reference<Quad>;

} // namespace reference
