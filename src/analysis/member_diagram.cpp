// Diagrams of cases and combinations, made when they are asked for.

#include "analysis/case_loads.hpp"
#include "groundsill/analysis.hpp"

namespace groundsill {

namespace {

using Terms = std::vector<Combination::Term>;

Diagram make_diagram(const Internals& internals, const Terms& terms, const Response& response, int member) {
    const Structure& structure = internals.structure;
    Diagram diagram;
    elements::SegmentLoads acting;
    elements::Loading loading;
    for (int k = structure.first_segment[member]; k < structure.first_segment[member + 1]; ++k) {
        const Segment& segment = structure.segments[k];
        acting.clear();
        for (const Combination::Term& term : terms)
            internals.loads.add(structure, term.load_case, term.factor, segment, acting);
        const SegmentState& s = response.segments[k];
        elements::cut(acting, segment.frame.length, loading);
        elements::append_diagram(segment.frame, loading, {s.N, s.V, s.M, s.along, s.across, s.rotation},
                                 static_cast<double>(segment.offset), diagram.pieces);
        diagram.length = static_cast<double>(segment.offset + segment.frame.length);
    }
    diagram.pieces.back().to = diagram.length;
    return diagram;
}

} // namespace

Diagram case_diagram(const Analysis& analysis, int load_case, int member) {
    return make_diagram(*analysis.internals, {{load_case, 1.0}}, analysis.cases[load_case], member);
}

Diagram combination_diagram(const Analysis& analysis, int combination, int member) {
    return make_diagram(*analysis.internals, analysis.model->combinations[combination].terms,
                        analysis.combinations[combination], member);
}

} // namespace groundsill
