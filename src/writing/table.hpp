#pragma once
// Aligned columns of text for a terminal.

#include <string>
#include <string_view>
#include <vector>

namespace groundsill::writing {

/// Rows of cells. Each column is as wide as its widest cell; lines are indented by two and carry no trailing spaces.
class Table {
  public:
    enum class Align { left, right };

    explicit Table(std::vector<Align> columns) : columns_(std::move(columns)) {}

    /// \pre as many cells as there are columns, or fewer: the others are empty
    void row(std::vector<std::string> cells) { rows_.push_back(std::move(cells)); }

    std::string text() const;

  private:
    std::vector<Align> columns_;
    std::vector<std::vector<std::string>> rows_;
};

/// "1 node", "3 nodes", "2 entries".
std::string counted(std::size_t count, std::string_view singular, std::string_view plural);

} // namespace groundsill::writing
