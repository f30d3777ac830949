#include "writing/output.hpp"

#include <algorithm>
#include <cmath>

#include <fmt/compile.h>

namespace groundsill::writing {

namespace {

constexpr std::size_t stretch = std::size_t{1} << 16;
/// More than the longest double in its shortest form, "-1.2345678901234567e-308".
constexpr std::size_t longest_number = 32;

} // namespace

Output::Output(const Sink& sink) : sink_(sink), buffer_(stretch) {}

void Output::long_text(std::string_view text) {
    while (!text.empty()) {
        make_room(1);
        const std::size_t count = std::min(text.size(), buffer_.size() - used_);
        this->text(text.substr(0, count));
        text.remove_prefix(count);
    }
}

void Output::spaces(int count) {
    for (; count > 0; --count) character(' ');
}

void Output::number(double value, std::string_view missing) {
    if (!std::isfinite(value)) return text(missing);
    if (value == 0) return character('0');
    make_room(longest_number);
    char* const begin = buffer_.data() + used_;
    used_ += static_cast<std::size_t>(fmt::format_to(begin, FMT_COMPILE("{}"), value) - begin);
}

void Output::number(int value) {
    make_room(longest_number);
    char* const begin = buffer_.data() + used_;
    used_ += static_cast<std::size_t>(fmt::format_to(begin, FMT_COMPILE("{}"), value) - begin);
}

void Output::finish() {
    if (used_ == 0) return;
    const std::size_t count = used_;
    used_ = 0;
    sink_(std::string_view(buffer_.data(), count));
}

} // namespace groundsill::writing
