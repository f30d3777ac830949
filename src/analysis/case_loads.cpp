#include "analysis/case_loads.hpp"

namespace groundsill {

CaseLoads::CaseLoads(const Model& model) : model_(&model), cases_(model.cases.size()) {
    for (std::size_t c = 0; c < model.cases.size(); ++c) {
        const auto& loads = model.cases[c].member_loads;
        if (loads.empty()) continue;
        ByMember& by_member = cases_[c];
        by_member.start.assign(model.members.size() + 1, 0);
        for (const MemberLoad& load : loads) ++by_member.start[load.member + 1];
        for (std::size_t m = 0; m < model.members.size(); ++m) by_member.start[m + 1] += by_member.start[m];
        by_member.order.resize(loads.size());
        std::vector<int> next(by_member.start.begin(), by_member.start.end() - 1);
        for (int k = 0; k < static_cast<int>(loads.size()); ++k) by_member.order[next[loads[k].member]++] = k;
    }
}

void CaseLoads::add(const Structure& structure, int load_case, Real factor, const Segment& segment,
                    elements::SegmentLoads& loads) const {
    const LoadCase& acting = model_->cases[load_case];
    const ByMember& by_member = cases_[load_case];
    if (acting.self_weight == 0 && by_member.order.empty()) return;
    const elements::SegmentPlace place = segment_place(structure, segment);
    if (acting.self_weight != 0) {
        const Member& member = model_->members[segment.member];
        const Real weight = Real(model_->materials[member.material].density.value_or(0)) * standard_gravity *
                            model_->sections[member.section].A;
        elements::add_self_weight(factor * acting.self_weight * weight, place, loads);
    }
    if (by_member.order.empty()) return;
    for (int k = by_member.start[segment.member]; k < by_member.start[segment.member + 1]; ++k)
        elements::add_load(acting.member_loads[by_member.order[k]], factor, place, loads);
}

bool CaseLoads::loads_members(int load_case) const {
    return model_->cases[load_case].self_weight != 0 || !cases_[load_case].order.empty();
}

} // namespace groundsill
