#include "writing/json_writer.hpp"

#include <array>

#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

constexpr int indentation = 2;

bool is_plain(char c) {
    return static_cast<unsigned char>(c) >= 0x20 && static_cast<unsigned char>(c) < 0x80 && c != '"' && c != '\\';
}

/// The escape of a control character, a quotation mark or a backslash.
void write_escape(Output& output, char c) {
    constexpr std::string_view digits = "0123456789abcdef";
    const auto code = static_cast<unsigned char>(c);
    switch (c) {
    case '"':
        return output.text("\\\"");
    case '\\':
        return output.text("\\\\");
    case '\b':
        return output.text("\\b");
    case '\f':
        return output.text("\\f");
    case '\n':
        return output.text("\\n");
    case '\r':
        return output.text("\\r");
    case '\t':
        return output.text("\\t");
    default:
        break;
    }
    output.text("\\u00");
    output.character(digits[code >> 4U]);
    output.character(digits[code & 0xFU]);
}

} // namespace

void JsonWriter::open(char bracket, bool row) {
    start_value();
    const bool inside_row = !levels_.empty() && levels_.back().row;
    levels_.push_back({bracket == '{' ? '}' : ']', row || inside_row, true});
    output_.character(bracket);
}

void JsonWriter::close() {
    const Level level = levels_.back();
    levels_.pop_back();
    if (!level.row && !level.empty) new_line();
    output_.character(level.closing);
}

void JsonWriter::new_line() {
    output_.character('\n');
    output_.spaces(indentation * static_cast<int>(levels_.size()));
}

void JsonWriter::start_entry() {
    if (levels_.empty()) return;
    Level& level = levels_.back();
    if (!level.empty) output_.text(level.row ? ", " : ",");
    level.empty = false;
    if (!level.row) new_line();
}

void JsonWriter::start_value() {
    if (!after_key_) start_entry();
    after_key_ = false;
}

JsonWriter& JsonWriter::key(std::string_view key) {
    start_entry();
    output_.character('"');
    output_.text(key);
    output_.text("\": ");
    after_key_ = true;
    return *this;
}

JsonWriter& JsonWriter::name(std::string_view name) {
    start_entry();
    quoted(name);
    output_.text(": ");
    after_key_ = true;
    return *this;
}

void JsonWriter::number(double value) {
    start_value();
    output_.number(value, "null");
}

void JsonWriter::string(std::string_view text) {
    start_value();
    quoted(text);
}

void JsonWriter::quoted(std::string_view text) {
    output_.character('"');
    while (!text.empty()) {
        std::size_t plain = 0;
        while (plain < text.size() && is_plain(text[plain])) ++plain;
        output_.text(text.substr(0, plain));
        text.remove_prefix(plain);
        if (text.empty()) break;
        const std::size_t length = sequence_length(text);
        if (length > 1) {
            output_.text(text.substr(0, length));
        } else if (length == 1) {
            write_escape(output_, text.front());
        } else {
            output_.text("\uFFFD"); // a stray byte: JSON must be UTF-8 throughout
        }
        text.remove_prefix(length == 0 ? 1 : length);
    }
    output_.character('"');
}

} // namespace groundsill::writing
