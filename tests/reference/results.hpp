#pragma once
// One response of the program or of the reference as plain numbers, by the indices of a reference frame, and how to
// compare two.

#include "dense_reference.hpp"
#include "frame.hpp"

#include "run_model.hpp"

#include <string>
#include <vector>

namespace reference {

struct PlaceValues {
    double at = 0;
    bool after = false; ///< the second one of two values at a jump
    double N = 0, V = 0, M = 0, along = 0, across = 0;
};

struct ResponseValues {
    struct Movement {
        double x = 0, y = 0, rotation = 0; ///< rotation 0 where there is none
    };
    struct Reaction {
        double x = 0, y = 0, moment = 0;
    };
    std::vector<Movement> movements;               ///< by node
    std::vector<Reaction> reactions;               ///< by support
    std::vector<std::vector<PlaceValues>> members; ///< by member, then listed place
};

/// The program's response at `scope` ("cases/dead"), found by the frame's names.
ResponseValues program_response(const test::Result& result, const std::string& scope, const Frame& frame);

/// The reference's response at the same places as `listed`.
template <class S>
ResponseValues reference_response(const Reference<S>& solution, int load_case, const Frame& frame,
                                  const ResponseValues& listed);

/// factor x a + b, of responses with the same places.
ResponseValues scaled_sum(double factor, const ResponseValues& a, const ResponseValues& b);

/// The largest difference, each relative to the largest of its kind (translation, rotation, force by N, V and
/// reactions, moment). A kind that is small beside its family counts as 1e-3 of the family (N beside V): its exact
/// value may be 0. \param small_force strains in a statically determinate frame cause exactly no force: their round-off
/// is seen against 1e-3 of
///        this, N and N m; the loads of the random frames are ten times the default, restrained strains cause a
///        thousand times it
struct Difference {
    double relative = 0;
    std::string where; ///< what differs most
};
Difference difference(const ResponseValues& expected, const ResponseValues& got, const Frame& frame,
                      double small_force = 1e3);

} // namespace reference
