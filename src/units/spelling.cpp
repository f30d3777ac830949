#include "units/spelling.hpp"

#include <algorithm>
#include <array>

namespace groundsill {
namespace {

constexpr std::size_t longest = 64;

char lower(char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c; }

int replacement_cost(char a, char b) {
    if (a == b) return 0;
    return lower(a) == lower(b) ? 1 : 2;
}

} // namespace

// Optimal string alignment, row by row.
int spelling_distance(std::string_view a, std::string_view b, int limit) {
    a = a.substr(0, longest);
    b = b.substr(0, longest);
    const int length_difference = 2 * std::abs(static_cast<int>(a.size()) - static_cast<int>(b.size()));
    if (length_difference >= limit) return length_difference;

    std::array<int, longest + 1> before_last{}, last{}, row{};
    for (std::size_t j = 0; j <= b.size(); ++j) last[j] = 2 * static_cast<int>(j);
    for (std::size_t i = 1; i <= a.size(); ++i) {
        row[0] = 2 * static_cast<int>(i);
        int least = row[0];
        for (std::size_t j = 1; j <= b.size(); ++j) {
            row[j] = std::min({last[j] + 2, row[j - 1] + 2, last[j - 1] + replacement_cost(a[i - 1], b[j - 1])});
            const bool exchanged = i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1];
            if (exchanged) row[j] = std::min(row[j], before_last[j - 2] + 2);
            least = std::min(least, row[j]);
        }
        if (least >= limit) return least;
        before_last = last;
        last = row;
    }
    return last[b.size()];
}

void NearestWord::consider(std::string_view known) {
    const int distance = spelling_distance(wanted_, known, distance_);
    if (distance >= distance_) return;
    distance_ = distance;
    best_ = known;
}

bool NearestWord::is_near() const {
    // One letter in three may be wrong, and one in any case.
    const auto letters = static_cast<int>(std::max(wanted_.size(), best_.size()));
    return !best_.empty() && distance_ <= std::max(2, 2 * letters / 3);
}

std::string quoted(std::string_view word) {
    constexpr std::size_t most = 60;
    if (word.size() <= most) return "'" + std::string(word) + "'";
    std::size_t cut = most;
    while (cut > 0 && (static_cast<unsigned char>(word[cut]) & 0xC0U) == 0x80U) --cut; // not inside a UTF-8 sequence
    return "'" + std::string(word.substr(0, cut)) + "...'";
}

} // namespace groundsill
