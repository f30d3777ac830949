#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

unsigned byte(std::string_view text, std::size_t at) { return static_cast<unsigned char>(text[at]); }

std::size_t announced_length(unsigned lead) {
    if (lead < 0x80) return 1;
    if (lead >= 0xC2 && lead <= 0xDF) return 2;
    if (lead >= 0xE0 && lead <= 0xEF) return 3;
    if (lead >= 0xF0 && lead <= 0xF4) return 4;
    return 0;
}

/// Second bytes that would give overlong forms, surrogates or numbers above U+10FFFF.
bool second_is_wrong(unsigned lead, unsigned second) {
    return (lead == 0xE0 && second < 0xA0) || (lead == 0xED && second > 0x9F) || (lead == 0xF0 && second < 0x90) ||
           (lead == 0xF4 && second > 0x8F);
}

/// Bytes to step over: a sequence, or one stray byte.
std::size_t step(std::string_view text) {
    const std::size_t length = sequence_length(text);
    return length == 0 ? 1 : length;
}

/// C0 and C1 control characters and DEL.
bool is_control(std::string_view sequence) {
    const unsigned lead = byte(sequence, 0);
    return lead < 0x20 || lead == 0x7F || (lead == 0xC2 && sequence.size() == 2 && byte(sequence, 1) < 0xA0);
}

} // namespace

std::size_t sequence_length(std::string_view text) {
    if (text.empty()) return 0;
    const unsigned lead = byte(text, 0);
    const std::size_t length = announced_length(lead);
    if (length == 0 || length > text.size()) return 0;
    for (std::size_t k = 1; k < length; ++k) {
        if ((byte(text, k) & 0xC0U) != 0x80U) return 0;
    }
    if (length > 1 && second_is_wrong(lead, byte(text, 1))) return 0;
    return length;
}

int width(std::string_view text) {
    int count = 0;
    for (; !text.empty(); text.remove_prefix(step(text))) ++count;
    return count;
}

std::string shortened(std::string_view text, int limit) {
    if (width(text) <= limit) return std::string(text);
    std::size_t end = 0;
    for (int count = 1; count < limit; ++count) end += step(text.substr(end));
    return std::string(text.substr(0, end)) + "…";
}

std::string printable(std::string_view text) {
    std::string result;
    result.reserve(text.size());
    while (!text.empty()) {
        const std::size_t length = sequence_length(text);
        const std::string_view sequence = text.substr(0, length);
        if (length == 0) {
            result += '?';
        } else if (is_control(sequence)) {
            result += ' ';
        } else {
            result += sequence;
        }
        text.remove_prefix(length == 0 ? 1 : length);
    }
    return result;
}

} // namespace groundsill::writing
