#include "reading/scan.hpp"

#include <string>
#include <utility>
#include <vector>

namespace groundsill::reading {
namespace {

constexpr int deepest = 200;

Position position_of(std::string_view text, std::size_t offset) {
    Position position{1, 1};
    for (const char c : text.substr(0, offset)) {
        if (c == '\n') {
            ++position.line;
            position.column = 1;
        } else if ((static_cast<unsigned char>(c) & 0xC0U) != 0x80U) { // columns count characters, not bytes
            ++position.column;
        }
    }
    return position;
}

/// The offset just after the string that begins at `start`; of a string that does not end, the end of its line or the
/// text: the parser will report it.
std::size_t end_of_string(std::string_view text, std::size_t start) {
    const char quote = text[start];
    const std::string_view triple = quote == '"' ? R"(""")" : "'''";
    const bool multiline = text.substr(start).starts_with(triple);
    std::size_t i = start + (multiline ? 3 : 1);
    while (i < text.size()) {
        if (text[i] == '\\' && quote == '"') {
            i += 2;
        } else if (multiline && text.substr(i).starts_with(triple)) {
            i += 3;
            while (i < text.size() && text[i] == quote) ++i; // quotes may stand before the closing three
            return i;
        } else if (!multiline && (text[i] == quote || text[i] == '\n')) {
            return i + 1;
        } else {
            ++i;
        }
    }
    return text.size();
}

/// Follows the depth of the text's tables and arrays, one significant character after the other.
class DepthCounter {
  public:
    int depth() const { return depth_ + dots_; }

    void read(char c) {
        switch (c) {
        case '.':
            ++dots_;
            break;
        case '=': // the parts of the key deepen what its value opens
            key_dots_ = dots_;
            dots_ = 0;
            break;
        case '[':
        case '{':
            open_.push_back(1 + key_dots_);
            depth_ += open_.back();
            key_dots_ = dots_ = 0;
            break;
        case ']':
        case '}':
            if (!open_.empty()) {
                depth_ -= open_.back();
                open_.pop_back();
            }
            key_dots_ = dots_ = 0;
            break;
        default:
            key_dots_ = dots_ = 0; // a comma or the end of a line
        }
    }

  private:
    std::vector<int> open_; // how much each open bracket adds
    int depth_ = 0;
    int dots_ = 0;     // in the key or number that is being read
    int key_dots_ = 0; // in the key whose value is being read
};

Diagnostic error_at(std::string_view text, std::size_t offset, std::string message) {
    return {Diagnostic::Severity::error, position_of(text, offset), std::move(message)};
}

/// Looks at what stands outside of strings and comments.
std::optional<Diagnostic> find_harm_in_structure(std::string_view text) {
    DepthCounter counter;
    std::size_t i = 0;
    while (i < text.size()) {
        switch (text[i]) {
        case '"':
        case '\'':
            i = end_of_string(text, i);
            continue;
        case '#':
            i = text.find('\n', i);
            if (i == std::string_view::npos) return {};
            continue;
        case '.':
        case '=':
        case '[':
        case '{':
        case ']':
        case '}':
        case ',':
        case '\n':
            counter.read(text[i]);
            break;
        default:
            if (static_cast<unsigned char>(text[i]) < 0x80) break;
            return error_at(
                text, i,
                "this character may stand only between quotation marks (\" or ') and in comments: names, numbers "
                "and spaces outside of them are plain ASCII");
        }
        if (counter.depth() > deepest) {
            return error_at(text, i,
                            "tables and arrays are nested more than " + std::to_string(deepest) +
                                " deep here: a model needs five or six levels");
        }
        ++i;
    }
    return {};
}

} // namespace

std::optional<Diagnostic> find_harm(std::string_view text) {
    if (text.starts_with("\xFF\xFE") || text.starts_with("\xFE\xFF")) {
        return error_at(text, 0, "the file is in UTF-16: save it as UTF-8");
    }
    const std::size_t nul = text.find('\0');
    if (nul != std::string_view::npos) {
        return error_at(text, nul, "there is a NUL byte here: a model is plain text in UTF-8");
    }
    return find_harm_in_structure(text);
}

} // namespace groundsill::reading
