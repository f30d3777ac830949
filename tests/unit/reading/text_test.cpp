// The text as a whole: syntax, bytes, depth, completeness, several errors at once.

#include "read.hpp"
#include "reading/scan.hpp"

using groundsill::reading::find_harm;

namespace {

std::string repeated(std::string_view part, int count) {
    std::string result;
    for (int i = 0; i < count; ++i) result += part;
    return result;
}

} // namespace

TEST_CASE("an empty model is told what it needs") {
    const char* all =
        "1:1: error: the model is not complete: it has no nodes ([nodes] or [beams]), members ([members] or "
        "[beams]), load cases ([cases.NAME])\n";
    CHECK(test::diagnostics("") == all);
    CHECK(test::diagnostics("# nothing\n") == all);
    CHECK(test::diagnostics("[nodes]\n[members]\n[supports]\n[cases]\n") == all);
    CHECK(test::says("supports", "") == ""); // it reads, and falls: see the mechanisms
    CHECK(test::says("supports", "[suports]\nA = 'fixed'") ==
          "1:2: error: unknown key 'suports' at the top of the file; did you mean 'supports'?\n");
    CHECK(test::says("nodes", "nodes = 5") == "1:1: error: nodes takes a table: a number is given\n");
}

TEST_CASE("of TOML syntax the first error is reported") {
    const std::string said = test::diagnostics("title = 'a'\nnotes = \n[nodes\n");
    CHECK(said == test::Contains{"2:"});
    CHECK(said == test::Contains{"this is not TOML: "});
    CHECK(said.find('\n') == said.size() - 1);
    CHECK(test::diagnostics("[nodes]\nA = ['0 m', '0 m']\nA = ['1 m', '0 m']\n") == test::Contains{"this is not TOML"});
}

TEST_CASE("a header that begins with a dot is an error like any other") {
    CHECK(test::diagnostics("[.joist]\n") == test::Contains{"1:2: error: this is not TOML: "});
    CHECK(test::diagnostics("[[ =]]\n") == test::Contains{"error: this is not TOML: "});
}

TEST_CASE("a letter outside ASCII where a value is malformed is an error like any other") {
    CHECK(test::diagnostics("title = 5\"µ\"\n") == test::Contains{"error: this is not TOML: "});
    CHECK(test::diagnostics("title = 1979-05-27 \"µ\"\n") == test::Contains{"error: this is not TOML: "});
}

TEST_CASE("bytes that do not belong into a text are refused") {
    CHECK(test::diagnostics(std::string_view("title = 'a'\nb\0c", 15)) ==
          test::Contains{"2:2: error: there is a NUL byte here"});
    CHECK(test::diagnostics("\xFF\xFEt\0i\0") == test::Contains{"UTF-16"});
    CHECK(test::diagnostics("title = '\xC3\x28'\n") == test::Contains{"error: this is not TOML"});
    CHECK(test::diagnostics("title = '\xED\xA0\x80'\n") == test::Contains{"error: "}); // a surrogate
}

TEST_CASE("characters outside ASCII stand in strings and comments only") {
    CHECK(test::says("job", "title = “a”") == "1:9: error: this character may stand only between quotation marks (\" "
                                              "or ') and in comments: names, numbers and spaces "
                                              "outside of them are plain ASCII\n");
    CHECK(test::says("job", "title =\u00A0'a'") == test::Contains{"1:8: error: this character may stand only"});
    CHECK(test::says("job", "Säge = 1") == test::Contains{"1:2: error: this character may stand only"});
    CHECK(test::says("job", "title = 'Säge' # Säge\n\"Säge\" = 1") == test::Contains{"2:1: error: unknown key 'Säge'"});
}

TEST_CASE("a byte order mark is passed over and does not move the columns") {
    CHECK(test::says("job", "\xEF\xBB\xBFtitle = 5") == test::says("job", "title = 5"));
    CHECK(test::says("job", "\xEF\xBB\xBFtitle = 'a'").empty());
    CHECK(test::diagnostics("\xEF\xBB\xBF") == test::diagnostics(""));
}

TEST_CASE("columns count characters") {
    CHECK(test::says("job", "job = { client = 'Säge', numbr = '1' }") ==
          test::Contains{"1:26: error: unknown key 'numbr'"});
}

TEST_CASE("deep nesting is refused before it is parsed") {
    const auto deep_at = [](const std::string& text) {
        const auto found = find_harm(text);
        return found ? std::pair(found->position.line, found->position.column) : std::pair(0, 0);
    };
    const auto nowhere = std::pair(0, 0);
    CHECK(deep_at("a = " + repeated("[", 200) + repeated("]", 200)) == nowhere);
    CHECK(deep_at("a = " + repeated("[", 201) + repeated("]", 201)) == std::pair(1, 205));
    CHECK(deep_at("b = 1\na = " + repeated("{a=", 100000)) == std::pair(2, 5 + 3 * 200));
    CHECK(deep_at(repeated("a.", 300) + "a = 1") == std::pair(1, 402));
    CHECK(deep_at("[" + repeated("a.", 300) + "a]") == std::pair(1, 401));
    // 150 parts of a key and 60 brackets below them
    CHECK(deep_at(repeated("a.", 150) + "a = " + repeated("[", 60) + repeated("]", 60)) != nowhere);
    // Neither strings nor comments count.
    {
        const std::string open = repeated("[", 300);
        CHECK(deep_at("a = \"" + open + "\"") == nowhere);
        CHECK(deep_at("a = \"\\\"" + open + "\"") == nowhere);
        CHECK(deep_at("a = '" + open + "'") == nowhere);
        CHECK(deep_at("a = '\\' # '" + open) == nowhere);
        CHECK(deep_at("a = \"\"\"\n\"\"" + open + "\"\"\"\"\"") == nowhere);
        CHECK(deep_at("a = '''\n''" + open + "'''''\n# " + open + "\nb = 1") == nowhere);
        CHECK(deep_at("a = '''x'''" + open) != nowhere);
    }
    // Many brackets and dots that are not inside each other
    CHECK(deep_at("a = [" + repeated("[1.5, 2.5],", 1000) + "]") == nowhere);
    CHECK(deep_at(repeated("x.y = 1.5\n", 1000)) == nowhere);
    CHECK(test::diagnostics("a = " + repeated("[", 100000)) == test::Contains{"nested more than 200 deep"});
    CHECK(test::diagnostics(repeated("a.", 100000) + "a = 1") == test::Contains{"nested more than 200 deep"});
    CHECK(test::diagnostics("[" + repeated("a.", 100000) + "a]") == test::Contains{"nested more than 200 deep"});
}

TEST_CASE("all errors come in one run, in the order of the file, and none twice") {
    const char* text = "[cases.c]\n"                                     // 1
                       "loads = [{ member = 'XY', y = '-1 kN/m' },\n"    // 2: unknown
                       "  { member = 'AB', y = '-1 kN', at = '9 m' },\n" // 3: off the member
                       "  { member = 'BC', temperature = '20 K' }]\n"    // 4: fine, although steel has an error
                       "[members]\n"                                     // 5
                       "AB = { from = 'A', to = 'B', section = 'bar', material = 'steel' }\n"
                       "BC = { from = 'B', to = 'D', section = 'bar', material = 'steel' }\n" // 7: unknown node
                       "[nodes]\n"                                                            // 8
                       "A = ['0 m', '0 m']\n"
                       "B = ['6 m', '0 m']\n"
                       "[materials.steel]\n" // 11
                       "E = '210 kN'\n"      // 12: dimension
                       "[sections.bar]\n"    // 13
                       "shape = 'circle'\n"  // 14: diameter is missing
                       "[supports]\n"        // 15
                       "A = 'fixed'\n";
    CHECK(test::diagnostics(text) ==
          "2:12: error: cases.c.loads[0].member: there is no member 'XY'; the nearest name is 'AB'\n"
          "3:3: error: case c: the load on member AB stands at 9 m, off the member, which runs from 0 to 6 m: places "
          "count "
          "from its first node\n"
          "7:20: error: members.BC.to: there is no node 'D'; the nearest name is 'A'\n"
          "12:1: error: materials.steel.E does not fit: expected a force per area, got a force\n"
          "13:11: error: sections.bar lacks 'diameter', which a circle needs\n");
}

TEST_CASE("an entity with an error is not reported again where others refer to it") {
    CHECK(test::says("nodes", "[nodes]\nA = 5\nB = ['6 m', '0 m']\nC = ['10 m', '0 m']") ==
          "2:1: error: nodes.A takes an array of two, each a length, like \"12 m\": a number is given\n");
    CHECK(test::says("materials", "[materals.steel]\nE = '210 GPa'") ==
          "1:2: error: unknown key 'materals' at the top of the file; did you mean 'materials'?\n");
    CHECK(test::says("sections", "sections.bar = 5") == "1:10: error: sections.bar takes a table: a number is given\n");
    CHECK(
        test::says("materials",
                   "[materials.steel]\nE = '210 GPa'\ndensty = '1 kg/m3'\n[cases.w]\nloads = [{ self_weight = 1 }]") ==
        "3:1: error: unknown key 'densty' in materials.steel; did you mean 'density'?\n");
    CHECK(test::says("members",
                     "[members]\nAB = 'x'\nBC = { from = 'B', to = 'C', section = 'bar', material = 'steel' }") ==
          "2:1: error: members.AB takes a table: a text is given\n");
}

TEST_CASE("advice on unknown names stays quick when a large model has many of them") {
    std::string text = "[nodes]\n", members = "[members]\n";
    for (int i = 0; i < 3000; ++i) {
        text += "N" + std::to_string(i) + " = ['" + std::to_string(i) + " m', '0 m']\n";
        members += "M" + std::to_string(i) + " = { from = 'x', to = 'y', section = 's', material = 'm' }\n";
    }
    const groundsill::ReadResult result = groundsill::read_model(text + members);
    CHECK_FALSE(result.model);
    CHECK(result.diagnostics.size() == 4 * 3000 + 1);
}
