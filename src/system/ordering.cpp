#include "system/ordering.hpp"

#include <algorithm>
#include <cmath>
#include <cstdlib>

#include <Eigen/OrderingMethods>
#include <Eigen/SparseCore>

namespace groundsill {

namespace {

/// Neighbours of every node, one list behind the other.
struct Graph {
    std::vector<int> start;
    std::vector<int> neighbours;

    int degree(int node) const { return start[node + 1] - start[node]; }
};

Graph neighbours_of(int nodes, const Edges& edges) {
    Graph graph;
    graph.start.assign(nodes + 1, 0);
    for (const auto& [a, b] : edges) {
        ++graph.start[a + 1];
        ++graph.start[b + 1];
    }
    for (int k = 0; k < nodes; ++k) graph.start[k + 1] += graph.start[k];
    graph.neighbours.resize(graph.start[nodes]);
    std::vector<int> next(graph.start.begin(), graph.start.end() - 1);
    for (const auto& [a, b] : edges) {
        graph.neighbours[next[a]++] = b;
        graph.neighbours[next[b]++] = a;
    }
    return graph;
}

/// Appends the part of the graph that hangs together with `first`, breadth first, fewer neighbours first.
void walk(const Graph& graph, int first, std::vector<char>& seen, std::vector<int>& order) {
    std::size_t next = order.size();
    order.push_back(first);
    seen[first] = 1;
    while (next < order.size()) {
        const int node = order[next++];
        const std::size_t begin = order.size();
        for (int k = graph.start[node]; k < graph.start[node + 1]; ++k) {
            const int other = graph.neighbours[k];
            if (seen[other]) continue;
            seen[other] = 1;
            order.push_back(other);
        }
        std::sort(order.begin() + static_cast<std::ptrdiff_t>(begin), order.end(),
                  [&](int a, int b) { return std::pair(graph.degree(a), a) < std::pair(graph.degree(b), b); });
    }
}

} // namespace

int band_of(const Edges& edges, const std::vector<int>& place_of) {
    int band = 0;
    for (const auto& [a, b] : edges) band = std::max(band, std::abs(place_of[a] - place_of[b]));
    return band;
}

std::vector<int> order_along(int nodes, const Edges& edges) {
    const Graph graph = neighbours_of(nodes, edges);
    std::vector<char> seen(nodes, 0);
    std::vector<int> order;
    order.reserve(nodes);
    for (int node = 0; node < nodes; ++node) {
        if (seen[node]) continue;
        // the last node of a first walk lies at an end of its part; the second walk starts there
        const std::size_t begin = order.size();
        walk(graph, node, seen, order);
        const int end = order.back();
        for (std::size_t k = begin; k < order.size(); ++k) seen[order[k]] = 0;
        order.resize(begin);
        walk(graph, end, seen, order);
    }
    std::vector<int> place_of(nodes);
    for (int place = 0; place < nodes; ++place) place_of[order[place]] = place;
    return place_of;
}

std::vector<int> order_by_degree(int nodes, const Edges& edges) {
    std::vector<Eigen::Triplet<double, int>> entries;
    entries.reserve(2 * edges.size() + nodes);
    for (int node = 0; node < nodes; ++node) entries.emplace_back(node, node, 1.0);
    for (const auto& [a, b] : edges) {
        entries.emplace_back(a, b, 1.0);
        entries.emplace_back(b, a, 1.0);
    }
    Eigen::SparseMatrix<double> pattern(nodes, nodes);
    pattern.setFromTriplets(entries.begin(), entries.end());
    Eigen::PermutationMatrix<Eigen::Dynamic, Eigen::Dynamic, int> order;
    Eigen::AMDOrdering<int>()(pattern, order);
    std::vector<int> place_of(nodes);
    for (int place = 0; place < nodes; ++place) place_of[order.indices()[place]] = place;
    return place_of;
}

} // namespace groundsill
