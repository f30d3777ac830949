// The list of rolled sections.

#include <string>

#include <doctest/doctest.h>

#include "writing/sections_text.hpp"

using groundsill::sections_text;

TEST_CASE("a list of sections: each in the units of its standard") {
    const std::string text = sections_text("IPE 300");
    INFO(text);
    CHECK(text.find("European I-beams, IPE (EN 10365)") == 0);
    CHECK(text.find("IPE 300    300    150  7.1    10.7    15  53.81  8356       21.30") != std::string::npos);
    CHECK(text.find("cm4") != std::string::npos);
    const std::string w = sections_text("w12x26");
    INFO(w);
    CHECK(w.find("American wide-flange shapes, W (ASTM A6)") == 0);
    CHECK(w.find("in4") != std::string::npos);
    CHECK(w.find("cm") == std::string::npos);
}

TEST_CASE("a pattern that nothing matches gives no text") { CHECK(sections_text("nothing like it").empty()); }

TEST_CASE("an empty pattern lists every series") {
    const std::string text = sections_text("");
    for (const char* series : {"IPE", "HEA", "HEB", "HEM", "UB", "UC", "PFC", "UPE", "W"}) {
        CHECK(text.find(std::string(", ") + series + " (") != std::string::npos);
    }
}
