#include "register.hpp"

#include <array>
#include <cmath>
#include <vector>

#include <doctest/doctest.h>
#include <fmt/format.h>

namespace published {

namespace {

constexpr double zero_tolerance = 1e-9;

struct GroupText {
    Group group;
    std::string_view title;
    std::string_view source;
};

constexpr std::string_view beam_tables = "Formulas: American Institute of Steel Construction, *Steel Construction "
                                         "Manual*, 14th ed. 2011, Table 3-23; W. C. Young "
                                         "and R. G. Budynas, *Roark's Formulas for Stress and Strain*, 7th ed. 2002, "
                                         "Table 8.1. From memory, and confirmed by an "
                                         "independent Macaulay integration of E I v'' = M.";

constexpr std::array<GroupText, 11> groups{{
    {Group::simple_spans, "Simply supported beams and cantilevers", beam_tables},
    {Group::held_spans, "Propped, fixed and overhanging beams", beam_tables},
    {Group::imposed, "Imposed movements, temperature and elastic ends",
     "Formulas of any text on strength of materials, from memory, and confirmed by an independent matrix solution; "
     "rows that "
     "name a publication were read there."},
    {Group::shear_flexible, "Shear-flexible beams",
     "J. S. Przemieniecki, *Theory of Matrix Structural Analysis*, 1968; R. D. Cook, D. S. Malkus, M. E. Plesha, "
     "*Concepts and "
     "Applications of Finite Element Analysis*, 3rd ed. 1989. From memory, and confirmed by an independent matrix "
     "solution. "
     "Phi = 12 E I / (kappa G A L^2)."},
    {Group::continuous, "Continuous beams with equal spans",
     "Coefficients solved in exact fractions from the three-moment equation; rounded, they are those of American "
     "Institute of "
     "Steel Construction, *Steel Construction Manual*, 14th ed. 2011, Table 3-23 (from memory)."},
    {Group::portals, "Portal frames",
     "A. Kleinlogel, *Rigid Frame Formulas*, 1952. From memory, and confirmed by an independent matrix solution of two "
     "geometries each. The formulas are for axially rigid members."},
    {Group::settlement, "Secondary moments from settlement",
     "Coefficients solved in exact fractions from the three-moment equation (B. P. E. Clapeyron, 1857)."},
    {Group::influence, "Influence coefficients and axle positions",
     "Formulas: American Institute of Steel Construction, *Steel Construction Manual*, 14th ed. 2011, Table 3-23, "
     "moving loads. "
     "From memory, and confirmed by an independent search over all positions."},
    {Group::frames, "Worked frames", "Solved by an independent matrix program, unless a row names a publication."},
    {Group::frequencies, "Natural frequencies",
     "Frequency equations: R. D. Blevins, *Formulas for Natural Frequency and Mode Shape*, 1979; S. Timoshenko, "
     "*Vibration "
     "Problems in Engineering*, 2nd ed. 1937. From memory, and confirmed by an independent solution with exact dynamic "
     "stiffnesses; the roots l of the equations were solved to 12 digits, f = l^2/(2 pi L^2) sqrt(E I/m). Frames: "
     "solved by "
     "that independent program, unless a row names a publication."},
    {Group::conventions, "Axes, signs and connections",
     "Statics and the force method by hand; the formula stands beside each check in `tests/published`."},
}};

struct Entry {
    Group group;
    std::string row;
    std::string quantity;
    double expected;
    double got;
    std::string difference;
};

std::vector<Entry>& entries() {
    static std::vector<Entry> all;
    return all;
}

/// Six digits. The nudge takes values that end in a 5 at the seventh digit clear of the tie, where round-off would
/// decide.
std::string six_digits(double value) { return fmt::format("{:.6g}", value * (1 + 1.1e-8)); }

} // namespace

Row::Row(Group group, std::string title, const std::string& source) : group_(group), title_(std::move(title)) {
    if (!source.empty()) title_ += " (" + source + ")";
}

void Row::check(std::string_view quantity, double expected, double got, Tolerance tolerance) const {
    const double allowed = tolerance.relative * std::abs(expected) + tolerance.absolute;
    const bool agrees = std::abs(got - expected) <= allowed;
    CHECK_MESSAGE(expected != 0, title_ << ": " << quantity << ": use check_zero");
    CHECK_MESSAGE(agrees, fmt::format("{}: {}: expected {:.12g}, got {:.12g}, relative difference {:.2e}", title_,
                                      quantity, expected, got, (got - expected) / expected));
    entries().push_back({group_, title_, std::string(quantity), expected, got, std::string(tolerance.words)});
}

void Row::check_zero(std::string_view quantity, double got, double scale) const {
    const bool vanishes = std::abs(got) <= zero_tolerance * std::abs(scale);
    CHECK_MESSAGE(vanishes,
                  fmt::format("{}: {}: expected 0, got {:.6g} where {:.6g} is typical", title_, quantity, got, scale));
    entries().push_back({group_, title_, std::string(quantity), 0, vanishes ? 0 : got, "below 1e-9 of a typical size"});
}

std::string verification_page() {
    std::string page = fmt::format("# Checks against published sources\n\n"
                                   "Written by the test program `published_tests` (`published_tests "
                                   "--write-verification`); a test fails when this page is "
                                   "out of date. {} values are compared. Expected values come from the formulas, "
                                   "evaluated in double precision, or from the "
                                   "digits that the source prints, never from groundsill. The last column is the limit "
                                   "that the relative difference is "
                                   "held to: \"below 1e-9\" where the formula is exact for the model, \"below 1e-7\" "
                                   "where the formula is for axially rigid "
                                   "members and the model's are only very stiff, \"below 1e-6\" for frequencies, whose "
                                   "members are cut into parts, \"printed digits\" where a printed "
                                   "value is compared (half a unit in "
                                   "its last place, unless the row says otherwise). Downward loads are positive in the "
                                   "formulas; signs of the results are "
                                   "those of `model.md`.\n",
                                   entries().size());
    for (const GroupText& group : groups) {
        page += fmt::format("\n## {}\n\n{}\n\n", group.title, group.source);
        page += "| case | quantity | expected | got | relative difference |\n| --- | --- | ---: | ---: | --- |\n";
        for (const Entry& e : entries()) {
            if (e.group != group.group) continue;
            page += fmt::format("| {} | {} | {} | {} | {} |\n", e.row, e.quantity, six_digits(e.expected),
                                six_digits(e.got), e.difference);
        }
    }
    return page;
}

} // namespace published
