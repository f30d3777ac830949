#pragma once
// What a run checks of itself.

#include "analysis/case_loads.hpp"
#include "groundsill/analysis.hpp"

namespace groundsill {

/// The largest of ΣFx, ΣFy and ΣM about the first node over Σ|loads| + Σ|reactions| (moments: times the
/// structure's size), taken from the loads as the model gives them and the reactions. 0 where nothing acts.
double imbalance(const Internals& internals, int load_case, const Response& response);

} // namespace groundsill
