#include "writing/sections_text.hpp"

#include <algorithm>
#include <iterator>
#include <vector>

#include <fmt/format.h>

#include "model/designations.hpp"
#include "writing/table.hpp"

namespace groundsill {
namespace {

using writing::Table;

std::string number(double value) { return fmt::format("{}", value); }

/// Four digits, as the standards' tables give them, without an exponent.
std::string computed(double value) {
    const int decimals = value >= 1000 ? 0 : value >= 100 ? 1 : value >= 10 ? 2 : 3;
    return fmt::format("{:.{}f}", value, decimals);
}

std::string table_of(const DesignationSeries& series, const std::vector<const Designation*>& rows) {
    const double unit = series.in_inches ? 0.0254 : 1e-2; // of area and second moment: in, cm
    const char* length = series.in_inches ? "in" : "mm";
    const char* of_area = series.in_inches ? "in" : "cm";
    Table table({Table::Align::left, Table::Align::right, Table::Align::right, Table::Align::right, Table::Align::right,
                 Table::Align::right, Table::Align::right, Table::Align::right, Table::Align::right});
    table.row({"", "depth", "width", "web", "flange", "root", "A", "I", "shear area"});
    table.row({"", length, length, length, length, length, fmt::format("{}2", of_area), fmt::format("{}4", of_area),
               fmt::format("{}2", of_area)});
    for (const Designation* row : rows) {
        const ShapeProperties section = section_of_designation(*row);
        table.row({std::string(row->name), number(row->depth), number(row->width), number(row->web),
                   number(row->flange), number(row->root), computed(section.A / (unit * unit)),
                   computed(section.I / (unit * unit * unit * unit)), computed(section.shear_area / (unit * unit))});
    }
    return fmt::format("{}, {} ({})\n{}", series.title, series.letters, series.standard, table.text());
}

} // namespace

std::string sections_text(std::string_view pattern) {
    const std::vector<const Designation*> matches = matching_designations(pattern);
    std::string text;
    for (const DesignationSeries& series : designation_series()) {
        std::vector<const Designation*> rows;
        std::copy_if(matches.begin(), matches.end(), std::back_inserter(rows),
                     [&](const Designation* match) { return &series_of_designation(*match) == &series; });
        if (rows.empty()) continue;
        if (!text.empty()) text += '\n';
        text += table_of(series, rows);
    }
    if (!text.empty()) {
        text += "\nA and I are computed from the nominal dimensions, which are from memory of the standards' tables: "
                "compare a\n"
                "section that matters with the maker's own table.\n";
    }
    return text;
}

} // namespace groundsill
