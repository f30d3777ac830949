// The same model gives the same bytes.

#include "frame_text.hpp"
#include "random_frames.hpp"

#include "groundsill/groundsill.hpp"

#include <doctest/doctest.h>

using namespace reference;

namespace {

std::string json_of(const std::string& text) {
    const groundsill::ReadResult read = groundsill::read_model(text);
    REQUIRE(read.model.has_value());
    const groundsill::Outcome outcome = groundsill::analyse(*read.model);
    REQUIRE(outcome.analysis.has_value());
    std::string json;
    groundsill::write_json(*outcome.analysis, {}, [&json](std::string_view part) { json += part; });
    return json;
}

} // namespace

TEST_SUITE("quick") {
    TEST_CASE("the same model twice gives the same JSON") {
        for (std::uint64_t seed = 1; seed <= 30; ++seed) {
            const std::string text = model_text(random_frame(seed));
            const std::string json = json_of(text);
            CHECK(json == json_of(text));
            CHECK(json != json_of(model_text(random_frame(seed + 1)))); // so that the comparison can fail
        }
    }
}
