#pragma once
// Gaussian elimination with partial pivoting for unsymmetric equations, several right-hand sides. Each row is stored
// from its first to its last coefficient, so that chains of any length stay cheap.

#include "number.hpp"

#include <algorithm>
#include <limits>
#include <vector>

namespace reference {

template <class S> struct Equation {
    std::vector<std::pair<int, S>> terms; ///< unknown and coefficient; an unknown may come twice
    std::vector<S> right;                 ///< one a case
};

template <class S> struct Solved {
    std::vector<std::vector<S>> unknowns; ///< by unknown, then case
    double smallest_pivot = 0;            ///< of rows that were scaled to a largest coefficient of 1
};

template <class S> class Elimination {
  public:
    Elimination(const std::vector<Equation<S>>& equations, int cases) : cases_(cases) {
        const auto size = equations.size();
        starting_at_.resize(size + 1);
        for (const auto& equation : equations) take(equation);
    }

    Solved<S> solve() {
        const int size = static_cast<int>(rows_.size());
        std::vector<int> pivots;
        double smallest = std::numeric_limits<double>::infinity();
        for (int column = 0; column < size; ++column) {
            const int pivot = eliminate(column);
            if (pivot < 0) return {{}, 0};
            smallest = std::min(smallest, static_cast<double>(magnitude(rows_[index(pivot)].values.front())));
            pivots.push_back(pivot);
        }
        return {substitute(pivots), smallest};
    }

  private:
    struct Row {
        int first = 0;
        std::vector<S> values;
        std::vector<S> right;
    };

    static std::size_t index(int i) { return static_cast<std::size_t>(i); }

    void take(const Equation<S>& equation) {
        int first = std::numeric_limits<int>::max();
        int last = 0;
        for (const auto& [unknown, coefficient] : equation.terms) {
            if (coefficient == 0) continue;
            first = std::min(first, unknown);
            last = std::max(last, unknown);
        }
        if (first > last) first = last = 0;
        Row row{first, std::vector<S>(index(last - first + 1), S(0)), equation.right};
        for (const auto& [unknown, coefficient] : equation.terms)
            if (coefficient != 0) row.values[index(unknown - first)] += coefficient;
        scale(row);
        rows_.push_back(std::move(row));
        settle(static_cast<int>(rows_.size()) - 1);
    }

    static void scale(Row& row) {
        S largest = 0;
        for (const S& value : row.values) largest = std::max(largest, magnitude(value));
        if (largest == 0) return;
        for (S& value : row.values) value /= largest;
        for (S& value : row.right) value /= largest;
    }

    /// Drops leading zeros and files the row under its first unknown.
    void settle(int number) {
        Row& row = rows_[index(number)];
        const auto lead = std::find_if(row.values.begin(), row.values.end(), [](const S& value) { return value != 0; });
        if (lead == row.values.end()) return; // an equation that says nothing: the missing pivot will show it
        row.first += static_cast<int>(lead - row.values.begin());
        row.values.erase(row.values.begin(), lead);
        starting_at_[index(row.first)].push_back(number);
    }

    int eliminate(int column) {
        auto& candidates = starting_at_[index(column)];
        if (candidates.empty()) return -1;
        const auto lead = [this](int row) { return magnitude(rows_[index(row)].values.front()); };
        const int pivot = *std::max_element(candidates.begin(), candidates.end(),
                                            [&](int left, int right) { return lead(left) < lead(right); });
        for (const int other : candidates)
            if (other != pivot) subtract(rows_[index(pivot)], other);
        return pivot;
    }

    void subtract(const Row& pivot, int number) {
        Row& row = rows_[index(number)];
        if (row.values.size() < pivot.values.size()) row.values.resize(pivot.values.size(), S(0));
        const S factor = row.values.front() / pivot.values.front();
        for (std::size_t i = 1; i < pivot.values.size(); ++i)
            if (pivot.values[i] != 0) row.values[i] -= factor * pivot.values[i];
        for (std::size_t i = 0; i < row.right.size(); ++i) row.right[i] -= factor * pivot.right[i];
        row.values.front() = 0;
        settle(number);
    }

    std::vector<std::vector<S>> substitute(const std::vector<int>& pivots) const {
        std::vector<std::vector<S>> unknowns(pivots.size(), std::vector<S>(index(cases_), S(0)));
        for (std::size_t column = pivots.size(); column-- > 0;) {
            const Row& row = rows_[index(pivots[column])];
            for (std::size_t load_case = 0; load_case < index(cases_); ++load_case) {
                S sum = row.right[load_case];
                for (std::size_t i = 1; i < row.values.size(); ++i)
                    if (row.values[i] != 0) sum -= row.values[i] * unknowns[column + i][load_case];
                unknowns[column][load_case] = sum / row.values.front();
            }
        }
        return unknowns;
    }

    int cases_;
    std::vector<Row> rows_;
    std::vector<std::vector<int>> starting_at_;
};

} // namespace reference
