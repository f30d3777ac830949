#pragma once
// Comparing a text with a part of it, so that a failing check shows both.

#include <ostream>
#include <string>
#include <string_view>

namespace test {

/// Equal to every text that contains the part.
struct Contains {
    std::string_view part;

    friend bool operator==(const std::string& text, const Contains& expected) {
        return text.find(expected.part) != std::string::npos;
    }
    friend std::ostream& operator<<(std::ostream& out, const Contains& expected) {
        return out << "..." << expected.part << "...";
    }
};

} // namespace test
