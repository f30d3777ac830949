// Diagnostics as text for a terminal.

#include <algorithm>

#include <fmt/format.h>

#include "groundsill/reading.hpp"

namespace groundsill {
namespace {

constexpr std::size_t most_shown = 200;  // diagnostics
constexpr std::size_t widest_line = 100; // characters of a quoted line
constexpr std::size_t shown_before = 60; // of them before the mark, at most
constexpr std::string_view bold = "\x1b[1m", red = "\x1b[1;31m", yellow = "\x1b[1;33m", plain = "\x1b[0m";

/// The number of bytes of the UTF-8 character at the start of a text; 0 when there is none that is valid in form.
std::size_t character_size(std::string_view text) {
    const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(text[i]); };
    const std::size_t size = byte(0) < 0x80   ? 1
                             : byte(0) < 0xC2 ? 0
                             : byte(0) < 0xE0 ? 2
                             : byte(0) < 0xF0 ? 3
                             : byte(0) < 0xF5 ? 4
                                              : 0;
    if (size == 0 || text.size() < size) return 0;
    for (std::size_t i = 1; i < size; ++i) {
        if ((byte(i) & 0xC0U) != 0x80U) return 0;
    }
    return size;
}

/// Splits a text into characters of one column each. A tab becomes a space; control characters, which could steer the
/// terminal, and bytes that are not UTF-8 become a question mark.
std::vector<std::string_view> harmless_characters(std::string_view text) {
    std::vector<std::string_view> characters;
    while (!text.empty()) {
        const std::size_t size = character_size(text);
        const auto first = static_cast<unsigned char>(text.front());
        const bool c1_control = size == 2 && first == 0xC2 && static_cast<unsigned char>(text[1]) < 0xA0;
        const bool control = first < 0x20 || first == 0x7F || c1_control;
        if (first == '\t')
            characters.push_back(" ");
        else if (size == 0 || control)
            characters.push_back("?");
        else
            characters.push_back(text.substr(0, size));
        text.remove_prefix(std::max<std::size_t>(size, 1));
    }
    return characters;
}

std::string joined(const std::vector<std::string_view>& characters, std::size_t from, std::size_t to) {
    std::string result;
    for (std::size_t i = from; i < to; ++i) result += characters[i];
    return result;
}

/// Finds lines by number, going forward through the text once: diagnostics come in order.
class Lines {
  public:
    explicit Lines(std::string_view text) : text_(text) {}

    std::string_view line(int number) {
        if (number < number_) {
            number_ = 1;
            start_ = 0;
        }
        while (number_ < number && start_ < text_.size()) {
            const std::size_t end = text_.find('\n', start_);
            start_ = end == std::string_view::npos ? text_.size() : end + 1;
            ++number_;
        }
        std::string_view line = text_.substr(start_, text_.find('\n', start_) - start_);
        if (line.ends_with('\r')) line.remove_suffix(1);
        return line;
    }

  private:
    std::string_view text_;
    int number_ = 1;
    std::size_t start_ = 0;
};

/// The line and below it the mark. Only the neighbourhood of the mark is looked at: a line may be megabytes long.
std::string quote_line(std::string_view line, int column) {
    std::size_t offset = 0; // of the marked character, in bytes
    for (int i = 1; i < column && offset < line.size(); ++i) {
        offset += std::max<std::size_t>(character_size(line.substr(offset)), 1);
    }
    const std::size_t reach = 4 * widest_line;
    std::size_t begin = offset > reach ? offset - reach : 0;
    while (begin > 0 && begin < offset && (static_cast<unsigned char>(line[begin]) & 0xC0U) == 0x80U) ++begin;
    const std::vector<std::string_view> before = harmless_characters(line.substr(begin, offset - begin));
    const std::vector<std::string_view> after = harmless_characters(line.substr(offset, reach));

    const bool fits = begin == 0 && before.size() + after.size() <= widest_line && offset + reach >= line.size();
    const std::size_t kept_before = fits ? before.size() : std::min(before.size(), shown_before);
    const std::size_t kept_after = std::min(after.size(), widest_line - std::min(kept_before, widest_line - 1));
    const bool cut_before = kept_before < before.size() || begin > 0;
    const bool cut_after = kept_after < after.size() || offset + reach < line.size();
    const std::string start = cut_before ? "... " : "";
    return fmt::format("    {}{}{}{}\n    {}^\n", start, joined(before, before.size() - kept_before, before.size()),
                       joined(after, 0, kept_after), cut_after ? " ..." : "",
                       std::string(start.size() + kept_before, ' '));
}

std::string harmless(std::string_view message) {
    const std::vector<std::string_view> characters = harmless_characters(message);
    return joined(characters, 0, characters.size());
}

std::string describe_one(const Diagnostic& diagnostic, std::string_view file, Lines& lines, bool colour) {
    const bool error = diagnostic.severity == Diagnostic::Severity::error;
    const auto in_colour = [&](std::string_view code) { return colour ? code : std::string_view(); };
    const auto& [line, column] = diagnostic.position;
    std::string place(file);
    if (line > 0) place += fmt::format(":{}:{}", line, column);
    std::string result =
        fmt::format("{}{}:{} {}{}:{} {}\n", in_colour(bold), place, in_colour(plain), in_colour(error ? red : yellow),
                    error ? "error" : "warning", in_colour(plain), harmless(diagnostic.message));
    if (line > 0) result += quote_line(lines.line(line), column);
    return result;
}

} // namespace

std::string describe(const Diagnostics& diagnostics, std::string_view file, std::string_view text, bool colour) {
    constexpr std::string_view byte_order_mark = "\xEF\xBB\xBF";
    if (text.starts_with(byte_order_mark)) text.remove_prefix(byte_order_mark.size());
    Lines lines(text);
    std::string result;
    const std::size_t shown = std::min(diagnostics.size(), most_shown);
    for (std::size_t i = 0; i < shown; ++i) result += describe_one(diagnostics[i], file, lines, colour);
    if (diagnostics.size() > shown) result += fmt::format("{}: and {} more\n", file, diagnostics.size() - shown);
    return result;
}

} // namespace groundsill
