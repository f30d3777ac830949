// Bad input is refused with the right place and words.
//
// Each file in tests/bad begins with what is expected of it, one line for each error:
//     # expect: LINE:COLUMN: error: a part of the message
// or, for a model that reads well but cannot stand,
//     # expect: mechanism: a part of the message
// Warnings may come as well. What is too large for a file is made here.

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <random>
#include <sstream>
#include <string>
#include <string_view>
#include <vector>

#include <doctest/doctest.h>

#include "groundsill/groundsill.hpp"
#include "run_model.hpp"

namespace {

std::string contents(const std::filesystem::path& path) {
    std::ifstream file(path, std::ios::binary);
    std::ostringstream text;
    text << file.rdbuf();
    return text.str();
}

std::vector<std::string> lines(const std::string& text) {
    std::vector<std::string> result;
    std::istringstream stream(text);
    for (std::string line; std::getline(stream, line);) result.push_back(line);
    return result;
}

/// What the head of a file expects: the lines without "# expect: ".
std::vector<std::string> expectations(const std::string& text) {
    constexpr std::string_view mark = "# expect: ";
    std::vector<std::string> result;
    for (const std::string& line : lines(text)) {
        if (!line.starts_with(mark)) break;
        result.push_back(line.substr(mark.size()));
    }
    return result;
}

/// True when a line begins with the place and severity that are expected and has the words in it.
bool is_as_expected(const std::string& line, const std::string& expectation) {
    const std::string mark = ": error: ";
    const std::size_t words = expectation.find(mark);
    if (words == std::string::npos) return false;
    const std::size_t begin = words + mark.size();
    return line.starts_with(expectation.substr(0, begin)) &&
           line.find(expectation.substr(begin), begin) != std::string::npos;
}

void check_errors(const std::string& text, const std::vector<std::string>& expected) {
    std::vector<std::string> errors = lines(test::diagnostics(text));
    std::erase_if(errors, [](const std::string& line) { return line.find(": error: ") == std::string::npos; });
    CHECK_MESSAGE(errors.size() == expected.size(), test::diagnostics(text));
    for (std::size_t i = 0; i < std::min(errors.size(), expected.size()); ++i) {
        CHECK_MESSAGE(is_as_expected(errors[i], expected[i]), errors[i], " instead of ", expected[i]);
    }
}

/// All that is said about a text that must be refused.
std::string refusal_of(std::string_view text) {
    const groundsill::ReadResult result = groundsill::read_model(text);
    CHECK_FALSE(result.model.has_value());
    CHECK(groundsill::has_errors(result.diagnostics));
    // What is shown of it must be bounded too, however long its lines are.
    CHECK(groundsill::describe(result.diagnostics, "model.toml", text, false).size() < 100'000);
    std::string messages;
    for (const groundsill::Diagnostic& diagnostic : result.diagnostics) messages += diagnostic.message + "\n";
    return messages;
}

std::string repeated(std::string_view part, int times) {
    std::string text;
    text.reserve(part.size() * static_cast<std::size_t>(times));
    for (int i = 0; i < times; ++i) text += part;
    return text;
}

bool contains(const std::string& text, std::string_view part) { return text.find(part) != std::string::npos; }

} // namespace

TEST_CASE("each file in tests/bad is refused at the right place and in the right words") {
    std::vector<std::filesystem::path> files;
    for (const auto& entry : std::filesystem::directory_iterator(GROUNDSILL_SOURCE_DIR "/tests/bad")) {
        files.push_back(entry.path());
    }
    std::sort(files.begin(), files.end());
    CHECK(files.size() >= 60);
    for (const std::filesystem::path& path : files) {
        CAPTURE(path.filename().string());
        const std::string text = contents(path);
        const std::vector<std::string> expected = expectations(text);
        REQUIRE_FALSE(expected.empty());
        const std::string mechanism = "mechanism: ";
        if (expected.front().starts_with(mechanism)) {
            const std::string refusal = test::refusal(text);
            CHECK_MESSAGE(!refusal.empty(), "can be analysed");
            CHECK_MESSAGE(contains(refusal, expected.front().substr(mechanism.size())), refusal);
        } else {
            check_errors(text, expected);
        }
    }
}

TEST_CASE("the comparison of bad files can fail") {
    CHECK(is_as_expected("3:1: error: no unit here", "3:1: error: no unit"));
    CHECK_FALSE(is_as_expected("3:1: error: no unit here", "3:2: error: no unit"));
    CHECK_FALSE(is_as_expected("13:1: error: no unit here", "3:1: error: no unit"));
    CHECK_FALSE(is_as_expected("3:1: warning: no unit here", "3:1: error: no unit"));
    CHECK_FALSE(is_as_expected("3:1: error: something else", "3:1: error: no unit"));
}

TEST_CASE("nesting 100,000 deep is refused without overflowing the stack") {
    constexpr int deep = 100'000;
    const std::string monsters[] = {
        "title = " + repeated("[", deep) + repeated("]", deep),
        "title = " + repeated("[", deep),
        "title = " + repeated("{a=", deep) + "1" + repeated("}", deep),
        "title = " + repeated("[{a=", deep),
        repeated("a.", deep) + "a = 1",
        "[" + repeated("a.", deep) + "a]\n",
        "[[" + repeated("a.", deep) + "a]]\n",
        "job = { " + repeated("a.", deep) + "a = 1 }",
        "title = 'x'\n" + repeated("'a' . ", deep) + "a = 1",
    };
    for (const std::string& monster : monsters) {
        CAPTURE(monster.substr(0, 20));
        CHECK(contains(refusal_of(monster), "nested"));
    }
}

TEST_CASE("brackets and dots in texts and comments are not nesting") {
    const std::string title = "title = \"" + repeated("[.{", 10'000) + "\" # " + repeated("[[", 10'000) + "\n";
    CHECK_FALSE(contains(refusal_of(title), "nested"));
}

TEST_CASE("a line of 10 MB, and of 1 MB in other ways") {
    constexpr int million = 1'000'000;
    CHECK(contains(refusal_of("title = 5" + repeated(" ", 10 * million)), "title takes a text"));
    CHECK(contains(refusal_of(repeated(" ", million) + "nonsense = 1"), "unknown key"));
    CHECK(contains(refusal_of(repeated("k", million) + " = 1"), "unknown key"));
    CHECK(contains(refusal_of("title = \"" + repeated("\u00e9", million / 2)), "this is not TOML"));
    CHECK(contains(refusal_of("[materials.steel]\nE = \"" + repeated("9", million) + " Pa\""),
                   "beyond what a computer's number can hold"));
    CHECK(contains(refusal_of("[materials.steel]\nE = \"1 " + repeated("m*", million / 2) + "m\""), "powers"));
}

TEST_CASE("binary junk is refused") {
    std::mt19937 random(20240229);
    for (int size : {1, 2, 3, 10, 100, 1000, 100'000}) {
        for (int i = 0; i < 50; ++i) {
            std::string junk(static_cast<std::size_t>(size), '\0');
            for (char& c : junk) c = static_cast<char>(random() & 0xffU);
            refusal_of(junk);
        }
    }
}

TEST_CASE("texts that are not UTF-8, and empty ones") {
    CHECK(contains(refusal_of(""), "not complete"));
    CHECK(contains(refusal_of("\xef\xbb\xbf"), "not complete"));
    CHECK(contains(refusal_of("# only a comment"), "not complete"));
    refusal_of(std::string_view("title = \"a\0b\"", 13));
    refusal_of(std::string_view("\xff\xfet\0i\0", 6)); // UTF-16
    refusal_of("title = \"\xed\xa0\x80\"");            // half of a surrogate pair
    refusal_of("title = \"\xc0\xaf\"");                // an overlong slash
}
