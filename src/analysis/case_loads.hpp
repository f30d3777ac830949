#pragma once
// Which loads act on which segment, case by case.

#include <vector>

#include "system/structure.hpp"

namespace groundsill {

/// The member loads of every case, sorted by member.
class CaseLoads {
  public:
    explicit CaseLoads(const Model& model);

    /// Adds `factor` times what a case puts on a segment, self-weight included.
    void add(const Structure& structure, int load_case, Real factor, const Segment& segment,
             elements::SegmentLoads& loads) const;

    /// True when the case loads any member.
    bool loads_members(int load_case) const;

  private:
    struct ByMember {
        std::vector<int>
            start; ///< by member into `order`, one more at the end; empty where the case has no member loads
        std::vector<int> order; ///< indices into LoadCase::member_loads
    };

    const Model* model_;
    std::vector<ByMember> cases_;
};

/// What an analysis keeps for its diagrams.
struct Internals {
    Structure structure;
    CaseLoads loads;
};

} // namespace groundsill
