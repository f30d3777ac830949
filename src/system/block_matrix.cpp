#include "system/block_matrix.hpp"

#include <algorithm>
#include <numeric>

#include "system/ordering.hpp"

namespace groundsill {

namespace {

std::vector<int> choose_order(int nodes, const Edges& edges) {
    std::vector<int> as_they_come(nodes);
    std::iota(as_they_come.begin(), as_they_come.end(), 0);
    if (band_of(edges, as_they_come) <= 2) return as_they_come;
    std::vector<int> along = order_along(nodes, edges);
    if (band_of(edges, along) <= widest_band) return along;
    return order_by_degree(nodes, edges);
}

/// Stiffness of a segment between the directions of its nodes: Kii, Kij, Kjj.
struct SegmentBlocks {
    Block ii, ij, jj;
};

/// How the chord deformations go with the three directions of one end: rows eN, e1, e2.
Block chord_rows(const Structure& structure, const Segment& segment, bool at_end) {
    double c = static_cast<double>(segment.frame.cosine);
    double s = static_cast<double>(segment.frame.sine);
    if (const TurnedAxes* axes = structure.turned_axes(at_end ? segment.j : segment.i)) {
        const double turned =
            static_cast<double>(segment.frame.cosine * axes->cosine + segment.frame.sine * axes->sine);
        s = static_cast<double>(segment.frame.sine * axes->cosine - segment.frame.cosine * axes->sine);
        c = turned;
    }
    const double L = static_cast<double>(segment.frame.length);
    if (at_end) return {c, s, 0, -s / L, c / L, 0, s / L, -c / L, 1};
    return {-c, -s, 0, s / L, -c / L, -1, -s / L, c / L, 0};
}

/// Aᵀ K B for the basic stiffness K.
Block product(const Block& A, const elements::BasicStiffness& stiffness, const Block& B) {
    const double kN = static_cast<double>(stiffness.axial), k11 = static_cast<double>(stiffness.k11),
                 k12 = static_cast<double>(stiffness.k12), k22 = static_cast<double>(stiffness.k22);
    Block result;
    for (int column = 0; column < 3; ++column) {
        const double qN = kN * B[column];
        const double q1 = k11 * B[3 + column] + k12 * B[6 + column];
        const double q2 = k12 * B[3 + column] + k22 * B[6 + column];
        for (int row = 0; row < 3; ++row) result[3 * row + column] = A[row] * qN + A[3 + row] * q1 + A[6 + row] * q2;
    }
    return result;
}

void add(const Block& from, Block& to) {
    for (int k = 0; k < 9; ++k) to[k] += from[k];
}

Block transposed(const Block& block) {
    return {block[0], block[3], block[6], block[1], block[4], block[7], block[2], block[5], block[8]};
}

/// Fills the pattern above the diagonal: sorted rows by column, each once.
void make_pattern(const Structure& structure, BlockMatrix& matrix) {
    const int n = structure.node_count;
    const auto column_of = [&](const Segment& segment) {
        return std::max(matrix.place_of[segment.i], matrix.place_of[segment.j]);
    };
    const auto row_of = [&](const Segment& segment) {
        return std::min(matrix.place_of[segment.i], matrix.place_of[segment.j]);
    };
    std::vector<int> start(n + 1, 0);
    for (const Segment& segment : structure.segments) ++start[column_of(segment) + 1];
    for (int k = 0; k < n; ++k) start[k + 1] += start[k];
    std::vector<int> rows(start[n]);
    std::vector<int> next(start.begin(), start.end() - 1);
    for (const Segment& segment : structure.segments) rows[next[column_of(segment)]++] = row_of(segment);
    matrix.column_start.assign(1, 0);
    matrix.column_start.reserve(n + 1);
    matrix.rows.reserve(rows.size());
    for (int column = 0; column < n; ++column) {
        const auto first = rows.begin() + start[column], last = rows.begin() + start[column + 1];
        std::sort(first, last);
        for (auto row = first; row != last; ++row) {
            if (row != first && *row == row[-1]) continue;
            matrix.rows.push_back(*row);
            matrix.bandwidth = std::max(matrix.bandwidth, column - *row);
        }
        matrix.column_start.push_back(static_cast<int>(matrix.rows.size()));
    }
}

/// Clears rows and columns of inactive directions in a block between two nodes.
void clear_inactive(const Structure& structure, int row_node, int column_node, Block& block) {
    for (int row = 0; row < 3; ++row)
        for (int column = 0; column < 3; ++column)
            if (!structure.active[3 * row_node + row] || !structure.active[3 * column_node + column])
                block[3 * row + column] = 0;
}

/// The block of a matrix between two nodes, given for (i, j); added transposed where j stands before i.
void add_between(int i, int j, const Block& block, BlockMatrix& matrix) {
    const auto first = matrix.rows.begin() + matrix.column_start[std::max(i, j)];
    const auto last = matrix.rows.begin() + matrix.column_start[std::max(i, j) + 1];
    const auto found = std::lower_bound(first, last, std::min(i, j));
    add(i < j ? block : transposed(block), matrix.blocks[found - matrix.rows.begin()]);
}

void add_segment(const Structure& structure, const Segment& segment, BlockMatrix& matrix) {
    const Block at_i = chord_rows(structure, segment, false);
    const Block at_j = chord_rows(structure, segment, true);
    const int i = matrix.place_of[segment.i], j = matrix.place_of[segment.j];
    add(product(at_i, segment.stiffness, at_i), matrix.diagonal[i]);
    add(product(at_j, segment.stiffness, at_j), matrix.diagonal[j]);
    Block between = product(at_i, segment.stiffness, at_j);
    clear_inactive(structure, segment.i, segment.j, between);
    add_between(i, j, between, matrix);
}

/// Turns the axes of a node into those of a segment: rows along, across, rotation.
Block turn(const Structure& structure, const Segment& segment, int node) {
    Real c = segment.frame.cosine, s = segment.frame.sine;
    if (const TurnedAxes* axes = structure.turned_axes(node)) {
        const Real turned = c * axes->cosine + s * axes->sine;
        s = s * axes->cosine - c * axes->sine;
        c = turned;
    }
    const double cosine = static_cast<double>(c), sine = static_cast<double>(s);
    return {cosine, sine, 0, -sine, cosine, 0, 0, 0, 1};
}

/// Aᵀ V B for the 3 x 3 part of V that starts at (row, column).
Block turned_part(const std::array<double, 36>& V, int row, int column, const Block& A, const Block& B) {
    Block result{};
    for (int i = 0; i < 3; ++i)
        for (int j = 0; j < 3; ++j)
            for (int k = 0; k < 3; ++k)
                for (int l = 0; l < 3; ++l)
                    result[3 * i + j] += A[3 * k + i] * V[6 * (row + k) + column + l] * B[3 * l + j];
    return result;
}

void finish_diagonal(const Structure& structure, int node, Block& block) {
    for (int c = 0; c < 3; ++c) block[4 * c] += structure.spring[3 * node + c];
    clear_inactive(structure, node, node, block);
    for (int c = 0; c < 3; ++c)
        if (!structure.active[3 * node + c]) block[4 * c] = 1;
}

} // namespace

BlockMatrix assemble(const Structure& structure) {
    Edges edges;
    edges.reserve(structure.segments.size());
    for (const Segment& segment : structure.segments) edges.emplace_back(segment.i, segment.j);
    BlockMatrix matrix;
    matrix.place_of = choose_order(structure.node_count, edges);
    matrix.node_at.resize(structure.node_count);
    for (int node = 0; node < structure.node_count; ++node) matrix.node_at[matrix.place_of[node]] = node;
    make_pattern(structure, matrix);
    matrix.diagonal.assign(structure.node_count, Block{});
    matrix.blocks.assign(matrix.rows.size(), Block{});
    for (const Segment& segment : structure.segments) add_segment(structure, segment, matrix);
    for (int node = 0; node < structure.node_count; ++node)
        finish_diagonal(structure, node, matrix.diagonal[matrix.place_of[node]]);
    return matrix;
}

void add_end_matrix(const Structure& structure, const Segment& segment, const std::array<double, 36>& values,
                    BlockMatrix& matrix) {
    const Block at_i = turn(structure, segment, segment.i), at_j = turn(structure, segment, segment.j);
    Block ii = turned_part(values, 0, 0, at_i, at_i), ij = turned_part(values, 0, 3, at_i, at_j),
          jj = turned_part(values, 3, 3, at_j, at_j);
    clear_inactive(structure, segment.i, segment.i, ii);
    clear_inactive(structure, segment.i, segment.j, ij);
    clear_inactive(structure, segment.j, segment.j, jj);
    const int i = matrix.place_of[segment.i], j = matrix.place_of[segment.j];
    add(ii, matrix.diagonal[i]);
    add(jj, matrix.diagonal[j]);
    add_between(i, j, ij, matrix);
}

void add_to_node(const Structure& structure, int node, double value, BlockMatrix& matrix) {
    for (int c = 0; c < 2; ++c)
        if (structure.active[3 * node + c]) matrix.diagonal[matrix.place_of[node]][4 * c] += value;
}

BlockMatrix zeros_like(const BlockMatrix& matrix) {
    BlockMatrix zeros = matrix;
    std::fill(zeros.diagonal.begin(), zeros.diagonal.end(), Block{});
    std::fill(zeros.blocks.begin(), zeros.blocks.end(), Block{});
    return zeros;
}

BlockMatrix shifted(const BlockMatrix& A, double s, const BlockMatrix& B) {
    BlockMatrix result = A;
    for (std::size_t k = 0; k < A.diagonal.size(); ++k)
        for (int e = 0; e < 9; ++e) result.diagonal[k][e] -= s * B.diagonal[k][e];
    for (std::size_t k = 0; k < A.blocks.size(); ++k)
        for (int e = 0; e < 9; ++e) result.blocks[k][e] -= s * B.blocks[k][e];
    return result;
}

void multiply(const BlockMatrix& matrix, const std::vector<double>& x, std::vector<double>& y) {
    std::fill(y.begin(), y.end(), 0.0);
    for (int column = 0; column < matrix.size(); ++column) {
        const std::size_t c = 3 * std::size_t(matrix.node_at[column]);
        const Block& diagonal = matrix.diagonal[column];
        for (int i = 0; i < 3; ++i)
            y[c + i] += diagonal[3 * i] * x[c] + diagonal[3 * i + 1] * x[c + 1] + diagonal[3 * i + 2] * x[c + 2];
        for (int k = matrix.column_start[column]; k < matrix.column_start[column + 1]; ++k) {
            const Block& B = matrix.blocks[k];
            const std::size_t r = 3 * std::size_t(matrix.node_at[matrix.rows[k]]);
            for (int i = 0; i < 3; ++i) {
                y[r + i] += B[3 * i] * x[c] + B[3 * i + 1] * x[c + 1] + B[3 * i + 2] * x[c + 2];
                y[c + i] += B[i] * x[r] + B[3 + i] * x[r + 1] + B[6 + i] * x[r + 2];
            }
        }
    }
}

} // namespace groundsill
