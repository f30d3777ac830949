#pragma once
// Emphasis on a terminal (ECMA-48 control sequences).

#include <string>
#include <string_view>

namespace groundsill::writing {

class Style {
  public:
    explicit Style(bool colour) : colour_(colour) {}

    std::string strong(std::string_view text) const {
        return colour_ ? "\x1b[1m" + std::string(text) + "\x1b[0m" : std::string(text);
    }

  private:
    bool colour_;
};

} // namespace groundsill::writing
