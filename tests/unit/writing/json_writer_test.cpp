#include <doctest/doctest.h>

#include <cmath>
#include <cstdlib>
#include <limits>
#include <string>

#include "writing/json_writer.hpp"
#include "writing/utf8.hpp"

using namespace groundsill;
using writing::JsonWriter;
using writing::Output;

namespace {

template <class Write> std::string written(const Write& write) {
    std::string text;
    const Sink sink = [&](std::string_view part) { text += part; };
    Output output(sink);
    JsonWriter json(output);
    write(json);
    output.finish();
    return text;
}

std::string string_as_json(std::string_view text) {
    return written([&](JsonWriter& json) { json.string(text); });
}

std::string number_as_json(double value) {
    return written([&](JsonWriter& json) { json.number(value); });
}

} // namespace

TEST_SUITE("JSON writer") {
    TEST_CASE("strings are escaped as RFC 8259 asks") {
        CHECK(string_as_json("plain") == R"("plain")");
        CHECK(string_as_json("a \"quay\" \\ b") == R"("a \"quay\" \\ b")");
        CHECK(string_as_json("\n\t\r\b\f") == R"("\n\t\r\b\f")");
        CHECK(string_as_json(std::string_view("\0\x1f", 2)) == R"("\u0000\u001f")");
        CHECK(string_as_json("Träger α 梁 🏗") == "\"Träger α 梁 🏗\"");
    }

    TEST_CASE("bytes that are no UTF-8 become replacement characters") {
        CHECK(string_as_json("a\xff"
                             "b") == "\"a\uFFFDb\"");
        CHECK(string_as_json("\xc3") == "\"\uFFFD\"");                               // cut short
        CHECK(string_as_json("\xc0\xaf") == "\"\uFFFD\uFFFD\"");                     // overlong
        CHECK(string_as_json("\xed\xa0\x80") == "\"\uFFFD\uFFFD\uFFFD\"");           // a surrogate
        CHECK(string_as_json("\xf4\x90\x80\x80") == "\"\uFFFD\uFFFD\uFFFD\uFFFD\""); // above U+10FFFF
    }

    TEST_CASE("numbers read back to the same double") {
        for (const double value : {1.0 / 3, 0.1, 5e-324, 1.7976931348623157e308, 123456789.125, -2.5e-17}) {
            CHECK(std::strtod(number_as_json(value).c_str(), nullptr) == value);
        }
        CHECK(number_as_json(6) == "6");
        CHECK(number_as_json(-0.0) == "0");
        CHECK(number_as_json(0.0) == "0");
    }

    TEST_CASE("what is no number is null") {
        CHECK(number_as_json(std::nan("")) == "null");
        CHECK(number_as_json(std::numeric_limits<double>::infinity()) == "null");
        CHECK(number_as_json(-std::numeric_limits<double>::infinity()) == "null");
    }

    TEST_CASE("layout: blocks a line an entry, rows on one line, empty ones closed at once") {
        const std::string text = written([](JsonWriter& json) {
            json.open_object();
            json.key("nothing").open_array();
            json.close();
            json.name("a\"b").open_object_row();
            json.key("x").number(1);
            json.key("inner").open_object();
            json.key("y").number(2);
            json.close();
            json.close();
            json.key("list").open_array();
            json.number(1);
            json.string("two");
            json.close();
            json.close();
            json.end_document();
        });
        CHECK(text == R"({
  "nothing": [],
  "a\"b": {"x": 1, "inner": {"y": 2}},
  "list": [
    1,
    "two"
  ]
}
)");
    }

    TEST_CASE("text longer than the buffer arrives whole and in order") {
        const std::string name(200'000, 'q');
        int parts = 0;
        std::string text;
        const Sink sink = [&](std::string_view part) {
            text += part;
            ++parts;
        };
        Output output(sink);
        output.text("<");
        output.text(name);
        output.text(">");
        output.finish();
        CHECK(text == "<" + name + ">");
        CHECK(parts > 1);
    }
}

TEST_SUITE("UTF-8") {
    TEST_CASE("names are counted and cut by code points") {
        CHECK(writing::width("Träger") == 6);
        CHECK(writing::shortened("Träger", 6) == "Träger");
        CHECK(writing::shortened("Träger", 4) == "Trä…");
        CHECK(writing::width("a\xff") == 2);
    }

    TEST_CASE("a model's words cannot steer the terminal") {
        CHECK(writing::printable("a\x1b[31mb\nc") == "a [31mb c");
        CHECK(writing::printable("a\xc2\x9b"
                                 "31mb") == "a 31mb"); // C1 control sequence introducer
        CHECK(writing::printable("\xff") == "?");
        CHECK(writing::printable("Träger") == "Träger");
    }
}
