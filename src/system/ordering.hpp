#pragma once
// In which order the nodes stand in the matrix.

#include <utility>
#include <vector>

namespace groundsill {

/// Pairs of nodes that a segment joins.
using Edges = std::vector<std::pair<int, int>>;

/// Largest distance between the places of two joined nodes.
int band_of(const Edges& edges, const std::vector<int>& place_of);

/// Places of the nodes along the structure: breadth first from an end (Cuthill and McKee 1969).
std::vector<int> order_along(int nodes, const Edges& edges);

/// Places of the nodes by approximate minimum degree, as Eigen does it.
std::vector<int> order_by_degree(int nodes, const Edges& edges);

} // namespace groundsill
