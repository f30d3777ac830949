#pragma once
// Text on its way to a sink, collected in stretches of 64 kB: what is written may be larger than the memory.

#include <cstddef>
#include <cstring>
#include <string_view>
#include <vector>

#include "groundsill/writing.hpp"

namespace groundsill::writing {

/// A buffer before a sink. finish() hands over the last stretch; a buffer that is dropped without it loses that
/// stretch.
class Output {
  public:
    explicit Output(const Sink& sink);
    Output(const Output&) = delete;
    Output& operator=(const Output&) = delete;

    void text(std::string_view text) {
        if (text.size() > buffer_.size() - used_) return long_text(text);
        std::memcpy(buffer_.data() + used_, text.data(), text.size());
        used_ += text.size();
    }
    void character(char c) {
        make_room(1);
        buffer_[used_++] = c;
    }
    void spaces(int count);

    /// The shortest digits that read back to the same double; -0 as 0. A value that does not exist (NaN, infinity) is
    /// written as `missing`.
    void number(double value, std::string_view missing);
    void number(int value);

    /// Hands everything to the sink. Lets through what the sink throws.
    void finish();

  private:
    void long_text(std::string_view text);
    void make_room(std::size_t count) {
        if (count > buffer_.size() - used_) finish();
    }

    const Sink& sink_;
    std::vector<char> buffer_;
    std::size_t used_ = 0;
};

} // namespace groundsill::writing
