#pragma once
// Finds the nodes that lie on a straight line between two places, without asking every node.

#include <vector>

#include "groundsill/model.hpp"

namespace groundsill {

/// A place in the plane, m.
struct Place {
    double x = 0;
    double y = 0;
};

/// A tree of boxes over the nodes (a k-d tree: Bentley 1975). Building takes O(n log n); a search takes O(log n) for a
/// short line among evenly spread nodes, and O(sqrt n) for one that crosses all of them.
class NodeSearch {
  public:
    /// \pre all coordinates are finite
    explicit NodeSearch(const std::vector<Node>& nodes);

    /// Indices of the nodes whose distance from the line between two places is at most `tolerance` (m), in rising
    /// order. \param found overwritten; the caller keeps it from search to search
    void nodes_on_line(Place from, Place to, double tolerance, std::vector<int>& found) const;

  private:
    struct Entry {
        Place place;
        int node;
    };
    struct Box {
        Place least, most;
        int first, last;         // entries [first, last)
        int near = -1, far = -1; // the two halves; -1: a leaf
    };

    int build(int first, int last);

    std::vector<Entry> entries_;
    std::vector<Box> boxes_;
    int root_ = -1;
};

} // namespace groundsill
