#pragma once
// Internal to the consistency checks: what they collect, and the parts they are made of.

#include <cstddef>
#include <string>
#include <utility>
#include <vector>

#include "groundsill/model.hpp"

namespace groundsill {

/// The diagnostics found so far.
class Findings {
  public:
    void error(Position position, std::string message) {
        list_.push_back({Diagnostic::Severity::error, position, std::move(message)});
    }
    void warning(Position position, std::string message) {
        list_.push_back({Diagnostic::Severity::warning, position, std::move(message)});
    }
    Diagnostics take() { return std::move(list_); }

  private:
    Diagnostics list_;
};

/// The element of a list that an index of the model refers to.
template <class Entity> const Entity& at(const std::vector<Entity>& list, int index) {
    return list[static_cast<std::size_t>(index)];
}

/// Distance between the ends of a member, m.
double member_length(const Model& model, const Member& member);

/// True when two lengths along a member differ by round-off only: by no more than 1e-9 of the member's length. On a 10
/// m beam that is a hundredth of a micrometre; a wider margin would hide a load that really lies off the member.
double place_tolerance(double length);

/// True when the member is drawn from right to left, so that its `across` axis points down. Vertical members are not.
bool across_points_down(const Model& model, const Member& member);

/// A length for a message, in the model's display units: "2.5 m", "8.2 ft".
std::string length_text(const Model& model, double metres);

void check_geometry(const Model& model, Findings& findings);
void check_cases(const Model& model, Findings& findings);

} // namespace groundsill
