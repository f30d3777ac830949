#include "analysis/verification.hpp"

#include <algorithm>
#include <cmath>

namespace groundsill {

namespace {

/// Sums of forces and of their moments about a centre, and of their sizes.
class Sums {
  public:
    Sums(Real x, Real y, Real size) : x_(x), y_(y), size_(size) {}

    void add(Real x, Real y, Real Fx, Real Fy, Real moment) {
        Fx_ += Fx;
        Fy_ += Fy;
        M_ += moment + (x - x_) * Fy - (y - y_) * Fx;
        all_ += std::abs(Fx) + std::abs(Fy) + std::abs(moment) / size_;
    }

    double relative() const {
        if (all_ == 0) return 0;
        return static_cast<double>(std::max({std::abs(Fx_), std::abs(Fy_), std::abs(M_) / size_}) / all_);
    }

  private:
    Real x_, y_, size_;
    Real Fx_ = 0, Fy_ = 0, M_ = 0, all_ = 0;
};

/// Resultants of the loads on one segment.
void add_segment(const Structure& structure, const Segment& segment, const elements::SegmentLoads& loads, Sums& sums) {
    const Node& from = structure.model->nodes[structure.model->members[segment.member].from];
    const Real c = segment.frame.cosine, s = segment.frame.sine;
    const auto add = [&](Real at, Real P, Real Q, Real m) {
        const Real place = segment.offset + at;
        sums.add(from.x + c * place, from.y + s * place, c * P - s * Q, s * P + c * Q, m);
    };
    for (const elements::PointLoad& point : loads.points) add(point.a, point.P, point.Q, point.m);
    for (const elements::LineLoad& line : loads.lines) {
        // a trapezoid: two triangles, their resultants at the third points
        const Real span = line.b - line.a;
        add(line.a + span / 3, line.pa * span / 2, line.qa * span / 2, 0);
        add(line.b - span / 3, line.pb * span / 2, line.qb * span / 2, 0);
    }
}

} // namespace

double imbalance(const Internals& internals, int index, const Response& response) {
    const Structure& structure = internals.structure;
    const Model& model = *structure.model;
    Sums sums(model.nodes[0].x, model.nodes[0].y, structure.size);
    for (const NodeLoad& load : model.cases[index].node_loads)
        sums.add(model.nodes[load.node].x, model.nodes[load.node].y, load.x, load.y, load.moment);
    if (internals.loads.loads_members(index)) {
        elements::SegmentLoads acting;
        for (const Segment& segment : structure.segments) {
            acting.clear();
            internals.loads.add(structure, index, 1, segment, acting);
            add_segment(structure, segment, acting, sums);
        }
    }
    for (std::size_t k = 0; k < model.supports.size(); ++k) {
        const Node& node = model.nodes[model.supports[k].node];
        const Reaction& reaction = response.reactions[k];
        sums.add(node.x, node.y, reaction.x, reaction.y, reaction.moment);
    }
    return sums.relative();
}

} // namespace groundsill
