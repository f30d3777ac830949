// Diagnostics for a terminal.

#include "read.hpp"

#include <algorithm>

using namespace groundsill;

namespace {

std::string describe_at(std::string_view text, int line, int column, std::string message = "wrong") {
    return describe({{Diagnostic::Severity::error, {line, column}, std::move(message)}}, "shed.toml", text, false);
}

} // namespace

TEST_CASE("has_errors looks for errors alone") {
    CHECK_FALSE(has_errors({}));
    CHECK_FALSE(has_errors({{Diagnostic::Severity::warning, {1, 1}, "odd"}}));
    CHECK(has_errors({{Diagnostic::Severity::warning, {1, 1}, "odd"}, {Diagnostic::Severity::error, {1, 1}, "wrong"}}));
}

TEST_CASE("the line is quoted with a mark under the column") {
    CHECK(describe_at("[a]\nbc = 1\n", 2, 2) == "shed.toml:2:2: error: wrong\n    bc = 1\n     ^\n");
    CHECK(describe_at("[a]\r\nbc = 1\r\n", 2, 1) == "shed.toml:2:1: error: wrong\n    bc = 1\n    ^\n");
    CHECK(describe_at("", 1, 1) == "shed.toml:1:1: error: wrong\n    \n    ^\n");
    CHECK(describe_at("a", 9, 9) == "shed.toml:9:9: error: wrong\n    \n    ^\n");
    CHECK(describe_at("\xEF\xBB\xBF"
                      "ab = 1",
                      1, 1) == "shed.toml:1:1: error: wrong\n    ab = 1\n    ^\n");
    CHECK(describe({{Diagnostic::Severity::warning, {}, "odd"}}, "shed.toml", "a = 1", false) ==
          "shed.toml: warning: odd\n");
}

TEST_CASE("the mark stands right after tabs and beyond ASCII") {
    CHECK(describe_at("\tab = 1", 1, 2) == "shed.toml:1:2: error: wrong\n     ab = 1\n     ^\n");
    CHECK(describe_at("Säge = 1, b = 2", 1, 11) ==
          "shed.toml:1:11: error: wrong\n    Säge = 1, b = 2\n              ^\n");
}

TEST_CASE("a long line is cut around the mark") {
    const std::string line = "x = [" + std::string(1000, 'a') + "bc" + std::string(1000, 'd') + "]";
    CHECK(describe_at(line, 1, 1006) == "shed.toml:1:1006: error: wrong\n    ... " + std::string(60, 'a') + "bc" +
                                            std::string(38, 'd') + " ...\n    " + std::string(64, ' ') + "^\n");
    CHECK(describe_at(line, 1, 1) == "shed.toml:1:1: error: wrong\n    x = [" + std::string(95, 'a') + " ...\n    ^\n");
    const std::string umlauts = "y" + [] {
        std::string text;
        for (int i = 0; i < 500; ++i) text += "ä";
        return text;
    }();
    CHECK(describe_at(umlauts, 1, 400) == test::Contains{"... ä"});
}

TEST_CASE("nothing in a file can steer the terminal") {
    const std::string said = describe_at("a = \"\x1b[2J\x07\x7f\"", 1, 1, "name '\x1b]0;x\x07\xC2\x9B' is odd\n");
    CHECK(said == "shed.toml:1:1: error: name '?]0;x?\?' is odd?\n    a = \"?[2J??\"\n    ^\n");
    CHECK(describe_at("a\xFF\xC3 = 1", 1, 1) == "shed.toml:1:1: error: wrong\n    a?? = 1\n    ^\n");
}

TEST_CASE("colour marks the place and the severity") {
    CHECK(describe({{Diagnostic::Severity::error, {1, 1}, "wrong"}}, "f", "a", true) ==
          "\x1b[1mf:1:1:\x1b[0m \x1b[1;31merror:\x1b[0m wrong\n    a\n    ^\n");
}

TEST_CASE("200 diagnostics are shown, the others counted") {
    Diagnostics many;
    for (int i = 1; i <= 1234; ++i) many.push_back({Diagnostic::Severity::error, {1, 1}, "wrong"});
    const std::string said = describe(many, "f", "a", false);
    CHECK(said.ends_with("f: and 1034 more\n"));
    CHECK(std::count(said.begin(), said.end(), '^') == 200);
}
