#include "random_frames.hpp"

#include "dense_reference.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <stdexcept>

namespace reference {

namespace {

constexpr double degree = std::numbers::pi / 180;

std::size_t index(int i) { return static_cast<std::size_t>(i); }
int count(const auto& list) { return static_cast<int>(list.size()); }

/// Builds one frame; the pieces call each other in a fixed order, so that a seed always gives the same frame.
class Builder {
  public:
    explicit Builder(std::uint64_t seed) : dice_(seed) {}

    Frame structure() {
        add_properties();
        switch (dice_.whole(0, 4)) {
        case 0:
            add_beam();
            break;
        case 1:
            add_storeys();
            break;
        case 2:
            add_truss();
            break;
        case 3:
            add_tree();
            break;
        default:
            add_chain();
            break;
        }
        return frame_;
    }

    Dice& dice() { return dice_; }

  private:
    void add_properties() {
        for (int i = 0; i < 3; ++i) {
            const double E = dice_.spread(8e9, 2.1e11);
            frame_.materials.push_back(
                {E, E / dice_.between(2.2, 2.8), dice_.between(400, 8000), dice_.between(5e-6, 25e-6)});
        }
        for (int i = 0; i < 4; ++i) {
            Section section;
            section.depth = dice_.between(0.15, 0.9);
            section.A = section.depth * dice_.between(0.02, 0.4);
            section.I = section.A * section.depth * section.depth * dice_.between(0.08, 0.16);
            section.shear_area = dice_.chance(0.5) ? section.A * dice_.between(0.3, 0.9) : 0;
            section.top = section.depth / 2;
            frame_.sections.push_back(section);
        }
        frame_.sections.push_back(tee());
        frame_.sections.push_back(rectangle());
    }

    /// Rectangle of 250 x 600 mm with its usual shear area, 5/6 A.
    static Section rectangle() {
        return {0.25 * 0.6, 0.25 * 0.6 * 0.6 * 0.6 / 12,
                0.6,        0.25 * 0.6 * 5 / 6,
                0.3,        "shape = \"rectangle\"\nwidth = \"250 mm\"\ndepth = \"600 mm\"\nshear = true\n"};
    }

    /// Tee of depth 400 mm, web 60 mm, flange 300 x 50 mm at +across, by the composite-area rule.
    static Section tee() {
        const double web = 0.06 * 0.35, flange = 0.3 * 0.05;
        const double A = web + flange;
        const double top = (flange * 0.025 + web * (0.05 + 0.175)) / A; // centroid from the flange's outer face
        const double I = 0.3 * 0.05 * 0.05 * 0.05 / 12 + flange * (top - 0.025) * (top - 0.025) +
                         0.06 * 0.35 * 0.35 * 0.35 / 12 + web * (0.225 - top) * (0.225 - top);
        return {A,   I,
                0.4, 0,
                top, "shape = \"tee\"\ndepth = \"400 mm\"\nwidth = \"300 mm\"\nweb = \"60 mm\"\nflange = \"50 mm\"\n"};
    }

    int add_node(double x, double y) {
        frame_.nodes.push_back({"n" + std::to_string(frame_.nodes.size()), x, y});
        return count(frame_.nodes) - 1;
    }

    Member& add_member(int from, int to) {
        if (dice_.chance(0.3)) std::swap(from, to);
        Member member{"m" + std::to_string(frame_.members.size()),
                      from,
                      to,
                      dice_.whole(0, count(frame_.sections) - 1),
                      dice_.whole(0, count(frame_.materials) - 1),
                      {},
                      {},
                      1,
                      {}};
        if (dice_.chance(0.2)) member.factor = dice_.between(0.3, 1.5);
        frame_.members.push_back(member);
        return frame_.members.back();
    }

    Joint random_spring(double low, double high) { return spring(dice_.spread(low, high)); }

    void release_at_random(Member& member) {
        for (Joints* end : {&member.start, &member.end}) {
            if (!dice_.chance(0.35)) continue;
            if (dice_.chance(0.6)) end->rotation = dice_.chance(0.5) ? free() : random_spring(1e5, 1e9);
            if (dice_.chance(0.2)) end->first = dice_.chance(0.3) ? free() : random_spring(1e6, 1e9);
            if (dice_.chance(0.2)) end->second = dice_.chance(0.3) ? free() : random_spring(1e6, 1e9);
        }
    }

    void hinge_at_random(Member& member, double probability) {
        if (!dice_.chance(probability)) return;
        const double length = member_length(frame_, count(frame_.members) - 1);
        member.name = "b" + std::to_string(frame_.members.size() - 1) + ".1";
        member.hinges.push_back(length * dice_.between(0.1, 0.9));
    }

    Joint held(double spring_chance, double low, double high) {
        return dice_.chance(spring_chance) ? random_spring(low, high) : rigid();
    }

    /// Holds x and y, mostly; sometimes turned, sometimes the rotation too.
    void add_support(int node, bool both, double rotation_chance) {
        Support support{node, {free(), held(0.4, 1e6, 1e9), free()}, 0};
        if (both) support.held.first = held(0.3, 1e6, 1e9);
        if (dice_.chance(rotation_chance)) support.held.rotation = held(0.5, 1e6, 1e9);
        if (dice_.chance(0.3)) support.angle = dice_.between(-60, 60) * degree;
        frame_.supports.push_back(support);
    }

    void add_beam() {
        const int spans = dice_.whole(1, 6);
        const double slope = dice_.chance(0.5) ? 0 : dice_.between(-40, 40) * degree;
        double place = 0;
        int before = add_node(1.5, -2);
        add_support(before, true, 0.5);
        for (int span = 0; span < spans; ++span) {
            place += dice_.between(1.5, 9);
            const int node = add_node(1.5 + place * std::cos(slope), -2 + place * std::sin(slope));
            Member& member = add_member(before, node);
            if (dice_.chance(0.5))
                release_at_random(member);
            else
                hinge_at_random(member, 0.3);
            add_support(node, dice_.chance(0.2), 0.2);
            before = node;
        }
    }

    void add_storeys() {
        const int bays = dice_.whole(1, 3);
        const int storeys = dice_.whole(1, 3);
        std::vector<double> x{0}, y{0};
        for (int i = 0; i < bays; ++i) x.push_back(x.back() + dice_.between(3, 8));
        for (int i = 0; i < storeys; ++i) y.push_back(y.back() + dice_.between(2.5, 5));
        const auto node = [&](int bay, int storey) { return storey * (bays + 1) + bay; };
        for (int storey = 0; storey <= storeys; ++storey)
            for (int bay = 0; bay <= bays; ++bay)
                add_node(x[index(bay)] + (storey > 0 ? dice_.between(-0.4, 0.4) : 0),
                         y[index(storey)] + dice_.between(-0.3, 0.3));
        for (int bay = 0; bay <= bays; ++bay) add_support(node(bay, 0), true, 0.6);
        for (int storey = 1; storey <= storeys; ++storey)
            for (int bay = 0; bay <= bays; ++bay) {
                add_member(node(bay, storey - 1), node(bay, storey));
                if (dice_.chance(0.3)) release_at_random(frame_.members.back());
                if (bay == 0) continue;
                add_member(node(bay - 1, storey), node(bay, storey));
                if (dice_.chance(0.5))
                    release_at_random(frame_.members.back());
                else
                    hinge_at_random(frame_.members.back(), 0.3);
            }
    }

    /// Triangulated panels with bars pinned at both ends, or continuous chords now and then.
    void add_truss() {
        const int panels = dice_.whole(2, 4);
        const double panel = dice_.between(1.5, 4);
        const double height = dice_.between(1.2, 3);
        const bool continuous = dice_.chance(0.4);
        const auto bar = [&](int from, int to, bool chord) {
            Member& member = add_member(from, to);
            if (chord && continuous) return;
            member.start.rotation = member.end.rotation = free();
            if (dice_.chance(0.1)) member.end.first = random_spring(1e6, 1e9);
        };
        for (int i = 0; i <= panels; ++i) {
            add_node(panel * i, dice_.between(-0.1, 0.1));
            if (i < panels) add_node(panel * (i + 0.5), height + dice_.between(-0.2, 0.2));
        }
        for (int i = 0; i < panels; ++i) {
            bar(2 * i, 2 * i + 2, true);
            bar(2 * i, 2 * i + 1, false);
            bar(2 * i + 1, 2 * i + 2, false);
            if (i > 0) bar(2 * i - 1, 2 * i + 1, true);
        }
        add_support(0, true, 0);
        add_support(2 * panels, dice_.chance(0.3), 0);
    }

    void add_tree() {
        const int branches = dice_.whole(2, 8);
        add_node(0, 0);
        frame_.supports.push_back({0, {held(0.5, 1e6, 1e9), held(0.5, 1e6, 1e9), held(0.5, 1e6, 1e9)}, 0});
        if (dice_.chance(0.5)) frame_.supports.back().angle = dice_.between(-170, 170) * degree;
        for (int i = 0; i < branches; ++i) {
            const int root = dice_.whole(std::max(0, i - 2), i);
            const double angle = dice_.between(20, 160) * degree + 0.13 * i;
            const double length = dice_.between(1, 5);
            const Node& from = frame_.nodes[index(root)];
            const int tip = add_node(from.x + length * std::cos(angle), from.y + length * std::sin(angle));
            Member& member = add_member(root, tip);
            for (Joints* end : {&member.start, &member.end}) {
                if (dice_.chance(0.2)) end->rotation = random_spring(1e5, 1e9);
                if (dice_.chance(0.2)) end->first = random_spring(1e6, 1e9);
                if (dice_.chance(0.2)) end->second = random_spring(1e6, 1e9);
            }
            if (dice_.chance(0.25)) add_support(tip, dice_.chance(0.4), 0.3);
        }
    }

    /// An irregular chain between two held ends, an arch in rough outline.
    void add_chain() {
        const int links = dice_.whole(2, 7);
        int before = add_node(0, 0);
        add_support(before, true, 0.7);
        for (int i = 1; i <= links; ++i) {
            const double rise = i < links ? dice_.between(0.5, 3) : dice_.between(-1, 1);
            const int node = add_node(2.5 * i + dice_.between(-0.8, 0.8), rise);
            add_member(before, node);
            if (dice_.chance(0.15))
                release_at_random(frame_.members.back());
            else
                hinge_at_random(frame_.members.back(), 0.1);
            before = node;
        }
        add_support(before, true, 0.7);
    }

    Dice dice_;
    Frame frame_;
};

/// Adds random loads of every kind to a structure.
class Loader {
  public:
    Loader(Frame& frame, Dice& dice) : frame_(frame), dice_(dice) {}

    void add_forces(Case& load_case, int loads) {
        for (int i = 0; i < loads; ++i) {
            if (dice_.chance(0.6))
                load_case.loads.push_back(distributed());
            else
                add_point_loads(frame_, load_case, dice_, 1);
        }
    }

    void add_strains(Case& load_case, int loads) {
        for (int i = 0; i < loads; ++i) {
            const int kind = dice_.whole(0, 3);
            Load load;
            load.on = dice_.whole(0, count(frame_.members) - 1);
            load.kind = kind == 0 ? Load::Kind::lack_of_fit : Load::Kind::temperature;
            if (kind == 0) load.amount = dice_.between(-0.005, 0.005);
            load.top = load.bottom = dice_.between(-30, 30);
            if (kind == 1) load.bottom = dice_.between(-30, 30);
            load_case.loads.push_back(kind == 3 ? movement() : load);
        }
    }

  private:
    Load distributed() {
        Load load;
        load.kind = Load::Kind::distributed;
        load.on = dice_.whole(0, count(frame_.members) - 1);
        load.axes = static_cast<Load::Axes>(dice_.whole(0, 2));
        load.whole = dice_.chance(0.4);
        const double length = member_length(frame_, load.on);
        load.a = length * dice_.between(0, 0.5);
        load.b = load.a + length * dice_.between(0.05, 0.5);
        load.second_a = load.second_b = dice_.between(-20e3, 5e3);
        if (dice_.chance(0.5)) load.second_b = dice_.between(-20e3, 5e3);
        if (!dice_.chance(0.5)) return load;
        load.first_a = load.first_b = dice_.between(-8e3, 8e3);
        if (load.second_a != load.second_b) load.first_b = dice_.between(-8e3, 8e3);
        return load;
    }

    Load movement() {
        Load load;
        load.kind = Load::Kind::movement;
        load.on = dice_.whole(0, count(frame_.supports) - 1);
        const Joints& held = frame_.supports[index(load.on)].held;
        if (held.first.kind != Joint::Kind::free) load.first_a = dice_.between(-0.02, 0.02);
        if (held.second.kind != Joint::Kind::free) load.second_a = dice_.between(-0.02, 0.02);
        if (held.rotation.kind != Joint::Kind::free) load.moment = dice_.between(-0.005, 0.005);
        return load;
    }

    Frame& frame_;
    Dice& dice_;
};

} // namespace

double Dice::unit() {
    std::uint64_t z = (state_ += 0x9E3779B97F4A7C15ULL);
    z = (z ^ (z >> 30)) * 0xBF58476D1CE4E5B9ULL;
    z = (z ^ (z >> 27)) * 0x94D049BB133111EBULL;
    return static_cast<double>((z ^ (z >> 31)) >> 11) * 0x1p-53;
}

double Dice::spread(double low, double high) { return low * std::pow(high / low, unit()); }

bool node_turns(const Frame& frame, int node) {
    const auto holds = [node](const Member& member) {
        return (member.from == node && member.start.rotation.kind != Joint::Kind::free) ||
               (member.to == node && member.end.rotation.kind != Joint::Kind::free);
    };
    const auto supports = [node](const Support& support) {
        return support.node == node && support.held.rotation.kind != Joint::Kind::free;
    };
    return std::any_of(frame.members.begin(), frame.members.end(), holds) ||
           std::any_of(frame.supports.begin(), frame.supports.end(), supports);
}

void add_point_loads(Frame& frame, Case& load_case, Dice& dice, int loads) {
    for (int i = 0; i < loads; ++i) {
        Load load;
        load.first_a = dice.between(-30e3, 30e3);
        load.second_a = dice.between(-50e3, 30e3);
        if (dice.chance(0.5)) {
            load.kind = Load::Kind::node;
            load.on = dice.whole(0, count(frame.nodes) - 1);
            if (node_turns(frame, load.on)) load.moment = dice.between(-20e3, 20e3);
        } else {
            load.kind = Load::Kind::point;
            load.on = dice.whole(0, count(frame.members) - 1);
            load.axes = dice.chance(0.5) ? Load::Axes::member : Load::Axes::global;
            const double place = dice.chance(0.1) ? dice.whole(0, 1) : dice.between(0.02, 0.98);
            load.a = place * member_length(frame, load.on);
            if (dice.chance(0.4)) load.moment = dice.between(-20e3, 20e3);
        }
        load_case.loads.push_back(load);
    }
}

Frame random_structure(std::uint64_t seed) {
    // Pivots of a structure that stands lie above 1e-9 here, those of a mechanism at round-off (1e-19): a wide gap.
    constexpr double mechanism = 1e-13;
    for (std::uint64_t attempt = 0; attempt < 100; ++attempt) {
        Frame frame = Builder(seed * 1000 + attempt).structure();
        if (Reference<long double>(frame).smallest_pivot() > mechanism) return frame;
    }
    throw std::runtime_error("no stable frame for this seed");
}

Frame random_frame(std::uint64_t seed) {
    Frame frame = random_structure(seed);
    Dice dice(seed + 77);
    Loader loader(frame, dice);
    Case forces{"forces", {}}, strains{"strains", {}}, mixed{"mixed", {}};
    loader.add_forces(forces, dice.whole(1, 6));
    loader.add_strains(strains, dice.whole(1, 5));
    Load weight;
    weight.kind = Load::Kind::self_weight;
    weight.amount = dice.between(0.5, 1.5);
    mixed.loads.push_back(weight);
    loader.add_forces(mixed, dice.whole(1, 4));
    loader.add_strains(mixed, dice.whole(1, 3));
    frame.cases = {forces, strains, mixed};
    return frame;
}

} // namespace reference
