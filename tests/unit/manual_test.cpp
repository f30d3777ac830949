// The manual of the model format: its examples read without a word, and its list of keys is that of the reader.
//
// GROUNDSILL_WRITE_DOCS=1 in the environment writes the list of keys into docs/model.md instead of comparing it.

#include <cstdlib>
#include <fstream>
#include <set>
#include <sstream>
#include <string>
#include <string_view>
#include <vector>

#include <doctest/doctest.h>

#include "reading/keys.hpp"
#include "run_model.hpp"

namespace {

using namespace groundsill::reading;

const std::string manual_file = GROUNDSILL_SOURCE_DIR "/docs/model.md";
constexpr std::string_view list_begins = "## Every key\n";

std::string manual() {
    std::ifstream file(manual_file, std::ios::binary);
    std::ostringstream text;
    text << file.rdbuf();
    return text.str();
}

/// The contents of the blocks ```toml.
std::vector<std::string> examples(const std::string& page) {
    constexpr std::string_view fence = "\n```toml\n";
    std::vector<std::string> result;
    for (std::size_t begin = page.find(fence); begin != std::string::npos; begin = page.find(fence, begin)) {
        begin += fence.size();
        const std::size_t end = page.find("```\n", begin);
        result.push_back(page.substr(begin, end - begin));
    }
    return result;
}

/// What an example leaves out: each part is added unless the example has a table that begins like it.
std::string completed(const std::string& example) {
    struct Part {
        std::vector<std::string_view> unless;
        std::string_view text;
    };
    const Part parts[] = {
        {{"[materials."},
         "[materials.steel]\nE = \"210 GPa\"\npoisson = 0.3\ndensity = \"7850 kg/m3\"\nexpansion = \"12e-6 /K\"\n"},
        {{"[sections."}, "[sections.joist]\nA = \"5380 mm2\"\nI = \"8356e4 mm4\"\ndepth = \"300 mm\"\n"},
        {{"[nodes]", "[beams."}, "[nodes]\nA = [\"0 m\", \"0 m\"]\nB = [\"6 m\", \"0 m\"]\nC = [\"12 m\", \"0 m\"]\n"},
        {{"[members", "[beams."},
         "[members]\nAB = { from = \"A\", to = \"B\", section = \"joist\", material = \"steel\" }\n"
         "BC = { from = \"B\", to = \"C\", section = \"joist\", material = \"steel\" }\n"},
        {{"[supports]"}, "[supports]\nA = \"pinned\"\nB = \"roller\"\nC = \"roller\"\n"},
        {{"[cases."}, "[cases.dead]\nloads = [ { self_weight = 1 } ]\n"},
    };
    std::string text = example;
    for (const Part& part : parts) {
        bool has = false;
        for (const std::string_view start : part.unless) has = has || example.find(start) != std::string::npos;
        if (!has) text += part.text;
    }
    // Examples of materials and sections alone name others than the rest of the model needs.
    const bool needs_steel = text.find("\"steel\"") != std::string::npos;
    if (needs_steel && text.find("[materials.steel]") == std::string::npos) text += parts[0].text;
    const bool needs_joist = text.find("\"joist\"") != std::string::npos;
    if (needs_joist && text.find("[sections.joist]") == std::string::npos) text += parts[1].text;
    return text;
}

std::string with_article(std::string_view word) { return "name of a " + std::string(word); }

/// What holds for the numbers of a key.
std::string bounds(const Key& key) {
    std::string result;
    if ((key.forms & positive) != 0) result += " above 0";
    if ((key.forms & not_negative) != 0) result += " not below 0";
    if ((key.forms & with_unit) != 0) result += ", always with its unit";
    return result;
}

/// What a key takes, in a few words.
std::string takes(const Key& key) {
    const bool is_angle = key.dimension == groundsill::dimension::angle;
    const std::string measure = (is_angle ? "an angle" : dimension_words(key.dimension)) + bounds(key);
    std::string words;
    each_word(key.words, [&](std::string_view word, bool available) {
        if (available) words += (words.empty() ? "`\"" : ", `\"") + std::string(word) + "\"`";
    });
    std::string result;
    const auto add = [&](unsigned form, const std::string& what) {
        if ((key.forms & form) == 0) return;
        if (!result.empty()) result += "; ";
        result += what;
    };
    add(quantity, measure);
    add(number | integer, "a number" + bounds(key));
    add(pair, "two, each " + measure);
    add(list, "list, each " + measure);
    add(fraction, "fraction");
    add(boolean, "`true` or `false`");
    add(text, "text");
    add(word, words);
    add(name, with_article(key.words));
    add(names, "list, each the " + with_article(key.words));
    add(table, "table");
    add(tables, "list of tables");
    return result;
}

/// For which loads a key of an entry of `loads` is.
std::string load_kinds(unsigned loads) {
    struct Kind {
        unsigned bit;
        std::string_view words;
    };
    constexpr Kind kinds[] = {
        {load_self_weight, "self-weight"},    {load_node, "node"},
        {load_support, "support movement"},   {load_point, "at a place"},
        {load_distributed, "along a member"}, {load_temperature, "temperature"},
        {load_lack_of_fit, "lack of fit"},
    };
    if ((loads & load_on_member) == load_on_member) return "any on a member";
    std::string result;
    for (const Kind& kind : kinds) {
        if ((loads & kind.bit) != 0) result += (result.empty() ? "" : ", ") + std::string(kind.words);
    }
    return result;
}

/// Walks from the top of the file through all tables that can be reached and lists their keys.
class KeyList {
  public:
    std::string text() {
        visit("model", "");
        return std::string(list_begins) +
               "\nNAME stands for a name of yours, N for a place in a list, x|y for x and y alike. A number may be a "
               "fraction.\n" +
               tables_ +
               "\n## Known, but not available yet\n\nThese keys are refused, with a message that says so:\n\n" + later_;
    }

  private:
    void visit(std::string_view group_name, const std::string& path) {
        if (!seen_.insert(group_name).second) return;
        const Group& group = key_group(group_name);
        const bool of_names = group.keys.size() == 1 && group.keys.front().name == "*";
        if (!of_names) list(group, path);
        for (const GroupKey& entry : group.keys) {
            if (!entry.key->available || entry.key->inner.empty()) continue;
            visit(entry.key->inner, inner_path(path, entry));
        }
    }

    static std::string inner_path(const std::string& path, const GroupKey& entry) {
        const std::string name = entry.name == "*" ? "NAME" : std::string(entry.key->name); // "x|y" for both
        const std::string full = path.empty() ? name : path + "." + name;
        return (entry.key->forms & tables) != 0 ? full + "[N]" : full;
    }

    void list(const Group& group, const std::string& path) {
        const bool is_load = group.name == "load";
        tables_ += path.empty() ? "\n### Top of the file\n\n" : "\n### `" + path + "`\n\n";
        tables_ += is_load ? "| key | load | takes | meaning |\n| --- | --- | --- | --- |\n"
                           : "| key | takes | meaning |\n| --- | --- | --- |\n";
        for (const GroupKey& entry : group.keys) {
            const Key& key = *entry.key;
            if (!key.available) {
                later_ += "- `" + inner_path(path, entry) + "`: " + std::string(key.meaning) + "\n";
                continue;
            }
            const std::string kinds = is_load ? " | " + load_kinds(key.loads) : "";
            tables_ += "| `" + std::string(entry.name) + "`" + kinds + " | " + takes(key) + " | " +
                       std::string(key.meaning) + " |\n";
            each_word(key.words, [&](std::string_view word, bool available) {
                if (!available) later_ += "- `" + inner_path(path, entry) + " = \"" + std::string(word) + "\"`\n";
            });
        }
    }

    std::set<std::string_view> seen_;
    std::string tables_;
    std::string later_;
};

} // namespace

TEST_CASE("every example of the manual is a sound model, with the rest of one around it") {
    const std::vector<std::string> all = examples(manual());
    CHECK(all.size() > 8);
    for (const std::string& example : all) {
        const std::string model = completed(example);
        CAPTURE(model);
        CHECK(test::diagnostics(model) == "");
        CHECK(test::refusal(model) == "");
    }
}

TEST_CASE("the manual lists every key of the reader") {
    const std::string page = manual();
    const std::string list = KeyList().text();
    const std::size_t begin = page.find(list_begins);
    if (std::getenv("GROUNDSILL_WRITE_DOCS") != nullptr) {
        std::ofstream(manual_file, std::ios::binary) << page.substr(0, begin) << list;
        return;
    }
    REQUIRE(begin != std::string::npos);
    CHECK_MESSAGE(page.substr(begin) == list, "out of date: run this test with GROUNDSILL_WRITE_DOCS=1");
}
