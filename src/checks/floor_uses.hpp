#pragma once
// Occupancies of the floor methods and the limits that go with them.

#include <optional>
#include <string>
#include <string_view>

#include "groundsill/floor.hpp"

namespace groundsill {

/// A row of DG11 Table 4.1.
struct WalkingOccupancy {
    double force = 0; ///< P_0, N
    double limit = 0; ///< peak acceleration over g
};
/// \return nothing for a word that the table does not have
std::optional<WalkingOccupancy> dg11_occupancy(std::string_view use);

/// A limit on the response factor and the table it comes from.
struct ResponseLimit {
    double factor = 0;
    const char* source = "";
};
/// \return nothing for a word that the tables do not have
std::optional<ResponseLimit> response_limit_of(std::string_view use);

/// Why a method does not take this occupancy: the words it has, or the document to go to for an activity that is
/// outside of all three methods. \return empty when the method takes it
std::string occupancy_refusal(FloorMethod method, const std::string& use);

} // namespace groundsill
