#include "writing/picture.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <cstdlib>
#include <vector>

#include "writing/utf8.hpp"

namespace groundsill::writing {

namespace {

constexpr int most_columns = 76; // and two of indentation
constexpr int most_rows = 20;
constexpr double row_height = 2;             ///< of a character, in its widths
constexpr std::size_t most_named_nodes = 40; ///< above, names would cover the picture
constexpr int name_width = 12;
constexpr double tangent_of_slope = 0.4; ///< flatter lines look level, steeper than its reciprocal upright

constexpr char node_sign = 'o';
constexpr char hinge_sign = '*';

struct Cell {
    int column = 0;
    int row = 0;
};

/// A sheet of characters; each cell holds one code point.
class Sheet {
  public:
    Sheet(int columns, int rows)
        : columns_(columns), rows_(rows),
          cells_(static_cast<std::size_t>(columns) * static_cast<std::size_t>(rows), " ") {}

    void put(Cell cell, char sign) { at(cell) = std::string(1, sign); }
    bool is_free(Cell cell, int length) const {
        if (cell.row < 0 || cell.row >= rows_ || cell.column < 0 || cell.column + length > columns_) return false;
        for (int k = 0; k < length; ++k) {
            if (at({cell.column + k, cell.row}) != " ") return false;
        }
        return true;
    }
    void write(Cell cell, std::string_view text) {
        while (!text.empty()) {
            const std::size_t length = std::max<std::size_t>(sequence_length(text), 1);
            at(cell) = std::string(text.substr(0, length));
            text.remove_prefix(length);
            ++cell.column;
        }
    }
    std::string text() const {
        std::string result;
        for (int row = 0; row < rows_; ++row) {
            std::string line = "  ";
            for (int column = 0; column < columns_; ++column) line += at({column, row});
            line.erase(line.find_last_not_of(' ') + 1);
            if (!line.empty() || !result.empty()) result += line + '\n';
        }
        result.erase(result.find_last_not_of('\n') + 1);
        return result + '\n';
    }

  private:
    std::string& at(Cell cell) { return cells_[index(cell)]; }
    const std::string& at(Cell cell) const { return cells_[index(cell)]; }
    std::size_t index(Cell cell) const {
        return static_cast<std::size_t>(cell.row) * static_cast<std::size_t>(columns_) +
               static_cast<std::size_t>(cell.column);
    }

    int columns_;
    int rows_;
    std::vector<std::string> cells_;
};

/// Places of the model on the sheet. A margin of two rows and some columns is left for names.
class Scale {
  public:
    explicit Scale(const std::vector<Node>& nodes) {
        left_ = right_ = nodes.front().x;
        top_ = bottom_ = nodes.front().y;
        for (const Node& node : nodes) {
            left_ = std::min(left_, node.x);
            right_ = std::max(right_, node.x);
            bottom_ = std::min(bottom_, node.y);
            top_ = std::max(top_, node.y);
        }
        const double across = (right_ - left_) / (most_columns - 1 - 2 * margin_columns);
        const double upward = (top_ - bottom_) / (row_height * (most_rows - 1 - 2 * margin_rows));
        width_ = std::max(across, upward);
        if (width_ <= 0) width_ = 1;
    }

    int columns() const { return column(right_) + margin_columns + 1; }
    int rows() const { return row(bottom_) + margin_rows + 1; }
    Cell cell(double x, double y) const { return {column(x), row(y)}; }

  private:
    static constexpr int margin_columns = 4;
    static constexpr int margin_rows = 1;

    int column(double x) const { return margin_columns + static_cast<int>(std::lround((x - left_) / width_)); }
    int row(double y) const { return margin_rows + static_cast<int>(std::lround((top_ - y) / (row_height * width_))); }

    double left_ = 0, right_ = 0, top_ = 0, bottom_ = 0;
    double width_ = 1; ///< of a character, m
};

/// The sign of a line's direction on the screen.
char line_sign(const Node& from, const Node& to) {
    const double dx = to.x - from.x;
    const double dy = to.y - from.y;
    if (std::abs(dy) <= tangent_of_slope * std::abs(dx)) return '-';
    if (std::abs(dx) <= tangent_of_slope * std::abs(dy)) return '|';
    return (dx > 0) == (dy > 0) ? '/' : '\\';
}

/// The cell at the k-th of `steps` equal steps from one cell to another.
Cell between(Cell from, Cell to, int k, int steps) {
    const double part = static_cast<double>(k) / steps;
    return {from.column + static_cast<int>(std::lround(part * (to.column - from.column))),
            from.row + static_cast<int>(std::lround(part * (to.row - from.row)))};
}

void draw_member(Sheet& sheet, const Scale& scale, const Model& model, const Member& member) {
    const Node& from = model.nodes[member.from];
    const Node& to = model.nodes[member.to];
    const Cell start = scale.cell(from.x, from.y);
    const Cell end = scale.cell(to.x, to.y);
    const int steps = std::max({std::abs(end.column - start.column), std::abs(end.row - start.row), 1});
    for (int k = 0; k <= steps; ++k) sheet.put(between(start, end, k, steps), line_sign(from, to));
}

void draw_hinges(Sheet& sheet, const Scale& scale, const Model& model, const Member& member) {
    const Node& from = model.nodes[member.from];
    const Node& to = model.nodes[member.to];
    const double length = std::hypot(to.x - from.x, to.y - from.y);
    for (const double hinge : member.hinges) {
        const double part = hinge / length;
        sheet.put(scale.cell(from.x + part * (to.x - from.x), from.y + part * (to.y - from.y)), hinge_sign);
    }
    const Cell start = scale.cell(from.x, from.y);
    const Cell end = scale.cell(to.x, to.y);
    const int steps = std::max(std::abs(end.column - start.column), std::abs(end.row - start.row));
    if (steps < 3) return;
    if (!member.start.moment.is_fixed()) sheet.put(between(start, end, 1, steps), hinge_sign);
    if (!member.end.moment.is_fixed()) sheet.put(between(start, end, steps - 1, steps), hinge_sign);
}

/// F holds everything, P both movements, R one of them, S has a spring; H holds in another way.
char support_sign(const Support& support) {
    if (support.x.is_elastic() || support.y.is_elastic() || support.rotation.is_elastic()) return 'S';
    if (support.rotation.is_fixed()) return support.x.is_fixed() && support.y.is_fixed() ? 'F' : 'H';
    if (support.x.is_fixed() && support.y.is_fixed()) return 'P';
    return support.x.is_fixed() || support.y.is_fixed() ? 'R' : 'H';
}

/// Writes a name beside its node where there is room: above, below, and so on around it.
void place_name(Sheet& sheet, Cell node, const std::string& name) {
    const int length = width(name);
    const int centred = node.column - length / 2;
    const std::array<Cell, 6> choices = {{{centred, node.row - 1},
                                          {centred, node.row + 1},
                                          {node.column + 1, node.row - 1},
                                          {node.column + 1, node.row + 1},
                                          {node.column + 2, node.row},
                                          {node.column - length - 1, node.row}}};
    for (const Cell& choice : choices) {
        if (sheet.is_free(choice, length)) return sheet.write(choice, name);
    }
}

constexpr std::string_view legend = "  o node   P held in x and y   R held in x or y   F fixed   H held otherwise\n"
                                    "  S on a spring   * hinge or rotational spring in a member\n";

} // namespace

std::string picture(const Model& model) {
    if (model.nodes.empty()) return {};
    const Scale scale(model.nodes);
    Sheet sheet(scale.columns(), scale.rows());
    for (const Member& member : model.members) draw_member(sheet, scale, model, member);
    for (const Node& node : model.nodes) sheet.put(scale.cell(node.x, node.y), node_sign);
    for (const Member& member : model.members) draw_hinges(sheet, scale, model, member);
    for (const Support& support : model.supports) {
        const Node& node = model.nodes[support.node];
        sheet.put(scale.cell(node.x, node.y), support_sign(support));
    }
    if (model.nodes.size() <= most_named_nodes) {
        for (const Node& node : model.nodes) {
            place_name(sheet, scale.cell(node.x, node.y), shortened(printable(node.name), name_width));
        }
    }
    return sheet.text() + '\n' + std::string(legend);
}

} // namespace groundsill::writing
