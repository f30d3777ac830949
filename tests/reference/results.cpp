#include "results.hpp"

#include "number.hpp"

#include <algorithm>
#include <cmath>
#include <fmt/format.h>
#include <limits>

namespace reference {

namespace {

/// Movements can be exactly 0 as well (a node between two fixed supports): round-off is seen against 1e-3 of this, m
/// and rad.
constexpr double small_movement = 1e-6;

std::size_t index(int i) { return static_cast<std::size_t>(i); }

std::vector<PlaceValues> program_places(const test::Result& result, const std::string& path) {
    std::vector<PlaceValues> places(index(result.size(path)));
    for (std::size_t i = 0; i < places.size(); ++i) {
        const std::string at = fmt::format("{}/{}/", path, i);
        PlaceValues& each = places[i];
        each = {result(at + "at"),    false, result(at + "N"), result(at + "V"), result(at + "M"), result(at + "along"),
                result(at + "across")};
        each.after = i > 0 && each.at == places[i - 1].at;
    }
    return places;
}

/// Collects differences of one kind.
class Kind {
  public:
    void add(double expected, double got, const std::string& where) {
        largest_ = std::max(largest_, std::fabs(expected));
        const double error = std::fabs(expected - got);
        if (error <= error_) return; // also passes by the very first 0
        error_ = error;
        where_ = fmt::format("{}: expected {:.17g}, got {:.17g}", where, expected, got);
        if (std::isnan(error)) error_ = std::numeric_limits<double>::infinity();
    }
    double largest() const { return largest_; }
    /// \param family the largest value of the kinds of the same dimension
    void report(double family, Difference& worst) const {
        const double scale = std::max(largest_, 1e-3 * family);
        const double relative = scale > 0 ? error_ / scale : error_ > 0 ? std::numeric_limits<double>::infinity() : 0;
        if (relative > worst.relative) worst = {relative, where_};
    }

  private:
    double largest_ = 0;
    double error_ = 0;
    std::string where_;
};

} // namespace

ResponseValues program_response(const test::Result& result, const std::string& scope, const Frame& frame) {
    ResponseValues response;
    for (const Node& node : frame.nodes) {
        const std::string at = fmt::format("/{}/displacements/{}/", scope, node.name);
        const bool turns = result.has(at + "rotation");
        response.movements.push_back({result(at + "x"), result(at + "y"), turns ? result(at + "rotation") : 0});
    }
    for (const Support& support : frame.supports) {
        const std::string at = fmt::format("/{}/reactions/{}/", scope, frame.nodes[index(support.node)].name);
        response.reactions.push_back({result(at + "x"), result(at + "y"), result(at + "moment")});
    }
    for (const Member& member : frame.members)
        response.members.push_back(program_places(result, fmt::format("/{}/members/{}/places", scope, member.name)));
    return response;
}

template <class S>
ResponseValues reference_response(const Reference<S>& solution, int load_case, const Frame& frame,
                                  const ResponseValues& listed) {
    const auto number = [](S value) { return static_cast<double>(value); };
    ResponseValues response;
    for (int node = 0; node < static_cast<int>(frame.nodes.size()); ++node) {
        const auto [x, y, rotation] = solution.movement(load_case, node);
        response.movements.push_back({number(x), number(y), number(rotation)});
    }
    for (int support = 0; support < static_cast<int>(frame.supports.size()); ++support) {
        const auto [x, y, moment] = solution.reaction(load_case, support);
        response.reactions.push_back({number(x), number(y), number(moment)});
    }
    for (int member = 0; member < static_cast<int>(frame.members.size()); ++member) {
        std::vector<PlaceValues> places = listed.members[index(member)];
        for (PlaceValues& each : places) {
            const auto place = solution.place(load_case, member, each.at, each.after);
            each = {each.at,         each.after,          number(place.N),     number(place.V),
                    number(place.M), number(place.along), number(place.across)};
        }
        response.members.push_back(std::move(places));
    }
    return response;
}

template ResponseValues reference_response(const Reference<long double>&, int, const Frame&, const ResponseValues&);
template ResponseValues reference_response(const Reference<Quad>&, int, const Frame&, const ResponseValues&);

ResponseValues scaled_sum(double factor, const ResponseValues& a, const ResponseValues& b) {
    ResponseValues sum = b;
    for (std::size_t i = 0; i < sum.movements.size(); ++i) {
        sum.movements[i].x += factor * a.movements[i].x;
        sum.movements[i].y += factor * a.movements[i].y;
        sum.movements[i].rotation += factor * a.movements[i].rotation;
    }
    for (std::size_t i = 0; i < sum.reactions.size(); ++i) {
        sum.reactions[i].x += factor * a.reactions[i].x;
        sum.reactions[i].y += factor * a.reactions[i].y;
        sum.reactions[i].moment += factor * a.reactions[i].moment;
    }
    for (std::size_t i = 0; i < sum.members.size(); ++i)
        for (std::size_t j = 0; j < sum.members[i].size(); ++j) {
            PlaceValues& to = sum.members[i][j];
            const PlaceValues& from = a.members[i].at(j);
            to.N += factor * from.N;
            to.V += factor * from.V;
            to.M += factor * from.M;
            to.along += factor * from.along;
            to.across += factor * from.across;
        }
    return sum;
}

Difference difference(const ResponseValues& expected, const ResponseValues& got, const Frame& frame,
                      double small_force) {
    Kind x, y, rotation, reaction_x, reaction_y, reaction_moment, N, V, M, along, across;
    for (std::size_t i = 0; i < expected.movements.size(); ++i) {
        const auto &a = expected.movements[i], &b = got.movements.at(i);
        x.add(a.x, b.x, frame.nodes[i].name + " x");
        y.add(a.y, b.y, frame.nodes[i].name + " y");
        rotation.add(a.rotation, b.rotation, frame.nodes[i].name + " rotation");
    }
    for (std::size_t i = 0; i < expected.reactions.size(); ++i) {
        const auto &a = expected.reactions[i], &b = got.reactions.at(i);
        const std::string name = "reaction of " + frame.nodes[index(frame.supports[i].node)].name;
        reaction_x.add(a.x, b.x, name + " x");
        reaction_y.add(a.y, b.y, name + " y");
        reaction_moment.add(a.moment, b.moment, name + " moment");
    }
    for (std::size_t i = 0; i < expected.members.size(); ++i)
        for (std::size_t j = 0; j < expected.members[i].size(); ++j) {
            const PlaceValues &a = expected.members[i][j], &b = got.members.at(i).at(j);
            const std::string name =
                fmt::format("{} at {:.17g}{}", frame.members[i].name, a.at, a.after ? " after" : "");
            N.add(a.N, b.N, name + " N");
            V.add(a.V, b.V, name + " V");
            M.add(a.M, b.M, name + " M");
            along.add(a.along, b.along, name + " along");
            across.add(a.across, b.across, name + " across");
        }
    Difference worst;
    const auto report = [&worst](double family, std::initializer_list<const Kind*> kinds) {
        for (const Kind* kind : kinds) family = std::max(family, kind->largest());
        for (const Kind* kind : kinds) kind->report(family, worst);
    };
    // a rotation is small beside the translation that it makes over a metre
    const double translation = std::max({x.largest(), y.largest(), along.largest(), across.largest()});
    report(small_movement, {&x, &y, &along, &across});
    report(std::max(small_movement, translation), {&rotation});
    report(small_force, {&reaction_x, &reaction_y, &N, &V});
    report(small_force, {&reaction_moment, &M});
    return worst;
}

} // namespace reference
