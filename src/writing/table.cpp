#include "writing/table.hpp"

#include <algorithm>

#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

constexpr int gap = 2;

std::string blanks(int count) { return std::string(static_cast<std::size_t>(std::max(count, 0)), ' '); }

} // namespace

std::string Table::text() const {
    std::vector<int> widths(columns_.size(), 0);
    for (const auto& row : rows_) {
        for (std::size_t column = 0; column < row.size(); ++column) {
            widths[column] = std::max(widths[column], width(row[column]));
        }
    }
    std::string result;
    for (const auto& row : rows_) {
        std::string line;
        for (std::size_t column = 0; column < row.size(); ++column) {
            const std::string padding = blanks(widths[column] - width(row[column]));
            line += blanks(gap);
            line += columns_[column] == Align::left ? row[column] + padding : padding + row[column];
        }
        line.erase(line.find_last_not_of(' ') + 1);
        result += line + '\n';
    }
    return result;
}

std::string counted(std::size_t count, std::string_view singular, std::string_view plural) {
    return std::to_string(count) + ' ' + std::string(count == 1 ? singular : plural);
}

} // namespace groundsill::writing
