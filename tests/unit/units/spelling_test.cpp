// Advice about misspelled words.

#include <doctest/doctest.h>

#include "units/spelling.hpp"

using namespace groundsill;

TEST_CASE("distances between words") {
    CHECK(spelling_distance("load", "load", 100) == 0);
    CHECK(spelling_distance("lod", "load", 100) == 2);   // a letter missing
    CHECK(spelling_distance("lozad", "load", 100) == 2); // one too many
    CHECK(spelling_distance("loas", "load", 100) == 2);  // one replaced
    CHECK(spelling_distance("laod", "load", 100) == 2);  // two exchanged
    CHECK(spelling_distance("Load", "load", 100) == 1);  // the wrong case
    CHECK(spelling_distance("", "load", 100) == 8);
    CHECK(spelling_distance("xyzw", "load", 3) >= 3); // beyond the limit any larger number will do
}

TEST_CASE("the nearest word") {
    NearestWord nearest("poison");
    CHECK(nearest.word().empty());
    CHECK_FALSE(nearest.is_near());
    for (const char* word : {"E", "poisson", "G", "expansion"}) nearest.consider(word);
    CHECK(nearest.word() == "poisson");
    CHECK(nearest.is_near());

    NearestWord far("colour");
    for (const char* word : {"E", "G"}) far.consider(word);
    CHECK(far.word() == "E");
    CHECK_FALSE(far.is_near());
}

TEST_CASE("a quoted word is cut to a readable length, between characters") {
    CHECK(quoted("AB") == "'AB'");
    const std::string long_word = std::string(59, 'a') + "ä" + std::string(50, 'b');
    CHECK(quoted(long_word) == "'" + std::string(59, 'a') + "...'");
    CHECK(spelling_distance(std::string(1000000, 'a'), std::string(1000000, 'b'), 1000) == 128);
}
