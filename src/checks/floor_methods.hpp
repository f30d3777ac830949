#pragma once
// Internal to the floor screening: the three methods and what they share.

#include <string>
#include <utility>
#include <vector>

#include "groundsill/floor.hpp"

namespace groundsill {

/// The steps of a calculation in the order in which they are made.
class FloorSteps {
  public:
    /// Notes a step and hands its value back, so that a formula can be written where it is noted.
    double add(std::string name, std::string symbol, double value, std::string unit, std::string clause) {
        list_.push_back({std::move(name), std::move(symbol), value, std::move(unit), std::move(clause)});
        return value;
    }
    std::vector<FloorQuantity> take() { return std::move(list_); }

  private:
    std::vector<FloorQuantity> list_;
};

/// The first mode of the floor itself, or nothing.
const FloorMode* first_vertical_mode(const FloorInput& input);

/// Notes the frequency estimate 0.18 sqrt(g / deflection) and warns when the model's frequency is far from it.
/// Far means more than 15 %: the exact constant lies between 0.158 (one mass on a spring) and 0.196 (uniform
/// cantilever), within 12.5 % of 0.18, so that a larger difference has a cause other than the shape of the beam.
void cross_check_frequency(double frequency, const FloorInput& input, FloorSteps& steps,
                           std::vector<std::string>& warnings);

/// A result with `value` against `limit`, where more is worse.
void conclude(FloorResult& result, std::string criterion, std::string unit, double value, double limit);

FloorResult screen_by_dg11(const FloorModel& floor, const FloorInput& input);
FloorResult screen_by_en1995(const FloorModel& floor, const FloorInput& input);
FloorResult screen_by_ccip016(const FloorModel& floor, const FloorInput& input);

} // namespace groundsill
