#include "model/node_search.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <utility>

namespace groundsill {
namespace {

/// Boxes with this many nodes or fewer are not divided further: looking at each is then as fast.
constexpr int leaf_size = 8;

/// A line between two places with its bounds and its normal, so that each test is a few multiplications.
struct Line {
    Place from, to;
    double length, nx, ny, tolerance;

    Line(Place a, Place b, double margin)
        : from(a), to(b), length(std::hypot(b.x - a.x, b.y - a.y)), nx(length > 0 ? (a.y - b.y) / length : 0),
          ny(length > 0 ? (b.x - a.x) / length : 0), tolerance(margin) {}

    bool may_touch(Place least, Place most) const {
        if (std::min(from.x, to.x) - tolerance > most.x || std::max(from.x, to.x) + tolerance < least.x ||
            std::min(from.y, to.y) - tolerance > most.y || std::max(from.y, to.y) + tolerance < least.y) {
            return false;
        }
        // Distance of the box's centre from the line against the box's half size seen along the normal.
        const double distance = nx * ((least.x + most.x) / 2 - from.x) + ny * ((least.y + most.y) / 2 - from.y);
        const double reach = (std::abs(nx) * (most.x - least.x) + std::abs(ny) * (most.y - least.y)) / 2;
        return std::abs(distance) <= reach + tolerance;
    }

    bool passes(Place place) const {
        const double dx = place.x - from.x;
        const double dy = place.y - from.y;
        const double s = ny * dx - nx * dy; // along the line: the normal is the direction turned by 90 degrees
        const double beyond = s < 0 ? -s : std::max(0.0, s - length);
        const double aside = nx * dx + ny * dy;
        return length > 0 ? std::hypot(beyond, aside) <= tolerance : std::hypot(dx, dy) <= tolerance;
    }
};

} // namespace

NodeSearch::NodeSearch(const std::vector<Node>& nodes) {
    entries_.reserve(nodes.size());
    for (int i = 0; const Node& node : nodes) entries_.push_back({{node.x, node.y}, i++});
    if (!entries_.empty()) root_ = build(0, static_cast<int>(entries_.size()));
}

int NodeSearch::build(int first, int last) {
    const auto begin = entries_.begin() + first;
    const auto end = entries_.begin() + last;
    Box box{begin->place, begin->place, first, last};
    for (auto entry = begin; entry != end; ++entry) {
        box.least = {std::min(box.least.x, entry->place.x), std::min(box.least.y, entry->place.y)};
        box.most = {std::max(box.most.x, entry->place.x), std::max(box.most.y, entry->place.y)};
    }
    const int index = static_cast<int>(boxes_.size());
    boxes_.push_back(box);
    if (last - first <= leaf_size) return index;

    const bool wide = box.most.x - box.least.x >= box.most.y - box.least.y;
    const auto before = [wide](const Entry& a, const Entry& b) {
        return wide ? a.place.x < b.place.x : a.place.y < b.place.y;
    };
    const int middle = first + (last - first) / 2;
    // Nodes often come in order along the structure already; then there is nothing to do.
    if (!std::is_sorted(begin, end, before)) std::nth_element(begin, entries_.begin() + middle, end, before);
    const int near = build(first, middle);
    const int far = build(middle, last);
    boxes_[static_cast<std::size_t>(index)].near = near;
    boxes_[static_cast<std::size_t>(index)].far = far;
    return index;
}

void NodeSearch::nodes_on_line(Place from, Place to, double tolerance, std::vector<int>& found) const {
    found.clear();
    if (root_ < 0) return;
    const Line line(from, to, tolerance);
    // The tree halves the entries at each level: no deeper than 32 for any number of nodes that an int counts.
    std::array<int, 64> stack{};
    std::size_t waiting = 0;
    stack[waiting++] = root_;
    while (waiting > 0) {
        const Box& box = boxes_[static_cast<std::size_t>(stack[--waiting])];
        if (!line.may_touch(box.least, box.most)) continue;
        if (box.near >= 0) {
            stack[waiting++] = box.far;
            stack[waiting++] = box.near;
            continue;
        }
        for (int i = box.first; i < box.last; ++i) {
            const Entry& entry = entries_[static_cast<std::size_t>(i)];
            if (line.passes(entry.place)) found.push_back(entry.node);
        }
    }
    std::sort(found.begin(), found.end());
}

} // namespace groundsill
