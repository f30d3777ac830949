#include "units/grammar.hpp"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <numbers>

#include "units/spelling.hpp"

namespace groundsill {
namespace {

struct NamedUnit {
    std::string_view name;
    Unit unit;
};

// Pound-force in newtons, times 1e13: 0.45359237 * 9.80665.
constexpr double lbf_e13 = 44482216152605;

// Sorted by name, as bytes.
constexpr NamedUnit known_units[] = {
    {"%", {1, 100, dimension::none}},
    {"GPa", {1e9, 1, dimension::stress}},
    {"Hz", {1, 1, dimension::frequency}},
    {"K", {1, 1, dimension::temperature}},
    {"MN", {1e6, 1, dimension::force}},
    {"MNm", {1e6, 1, dimension::moment}},
    {"MPa", {1e6, 1, dimension::stress}},
    {"N", {1, 1, dimension::force}},
    {"Nm", {1, 1, dimension::moment}},
    {"Pa", {1, 1, dimension::stress}},
    {"cm", {1, 100, dimension::length}},
    {"deg", {std::numbers::pi, 180, dimension::angle}},
    {"degC", {1, 1, dimension::temperature}},
    {"degF", {5, 9, dimension::temperature}},
    {"ft", {3048, 10000, dimension::length}},
    {"g", {1, 1000, dimension::mass, 0, 1}},
    {"in", {254, 10000, dimension::length}},
    {"kN", {1e3, 1, dimension::force}},
    {"kNm", {1e3, 1, dimension::moment}},
    {"kPa", {1e3, 1, dimension::stress}},
    {"kg", {1, 1, dimension::mass, 0, 1}},
    {"kip", {lbf_e13, 1e10, dimension::force}},
    {"km", {1e3, 1, dimension::length}},
    {"ksi", {lbf_e13, 6451600, dimension::stress}}, // 1e10 * 0.0254^2
    {"lb", {45359237, 1e8, dimension::mass, 1, 0}},
    {"lbf", {lbf_e13, 1e13, dimension::force}},
    {"m", {1, 1, dimension::length}},
    {"mm", {1, 1000, dimension::length}},
    {"mrad", {1, 1000, dimension::angle}},
    {"psf", {lbf_e13, 929030400000, dimension::stress}}, // 1e13 * 0.3048^2
    {"psi", {lbf_e13, 6451600000, dimension::stress}},   // 1e13 * 0.0254^2
    {"rad", {1, 1, dimension::angle}},
    {"s", {1, 1, dimension::time}},
    {"slug", {lbf_e13, 3048000000000, dimension::mass, 0, 1}}, // lbf s2/ft
    {"t", {1000, 1, dimension::mass, 0, 1}},
};
static_assert(std::ranges::is_sorted(known_units, {}, &NamedUnit::name));

const Unit* find_unit(std::string_view name) {
    const auto* found = std::ranges::lower_bound(known_units, name, {}, &NamedUnit::name);
    return found != std::end(known_units) && found->name == name ? &found->unit : nullptr;
}

// Spellings of other places for which the nearest name would mislead.
struct OtherSpelling {
    std::string_view written;
    std::string_view meant;
};
constexpr OtherSpelling other_spellings[] = {
    {"°", "deg"}, {"°C", "degC"}, {"C", "degC"}, {"°F", "degF"}, {"F", "degF"}, {"lbs", "lb' or 'lbf"}, {"\"", "in"},
    {"'", "ft"},  {"kgf", "N"},   {"tf", "kN"},  {"sec", "s"},   {"ton", "t"},  {"degrees", "deg"},     {"k", "kip"},
};

std::string unknown_unit(std::string_view name) {
    const std::string start = "unknown unit " + quoted(name) + ": did you mean '";
    for (const OtherSpelling& other : other_spellings) {
        if (other.written == name) return start + std::string(other.meant) + "'?";
    }
    NearestWord nearest(name);
    for (const NamedUnit& unit : known_units) nearest.consider(unit.name);
    return start + std::string(nearest.word()) + "'?";
}

bool starts_number(char c) { return (c >= '0' && c <= '9') || c == '.'; }

/// Walks over the text of a unit.
class UnitParser {
  public:
    UnitParser(std::string_view text, std::string& error) : text_(text), rest_(text), error_(error) {}

    std::optional<Unit> parse() {
        skip_spaces();
        if (rest_.starts_with('1')) { // "1/K"
            take(1);
            skip_spaces();
            if (!rest_.starts_with('/'))
                return fail("a unit begins with a name, as in \"kN/m\", or with 1/, as in \"1/K\"");
        } else if (!rest_.starts_with('/') && !factor(1)) {
            return {};
        }
        while (skip_spaces(), !rest_.empty()) {
            if (!next_factor()) return {};
        }
        return unit_;
    }

  private:
    std::string_view text_;
    std::string_view rest_;
    std::string& error_;
    Unit unit_;
    bool divided_ = false;

    std::nullopt_t fail(std::string message) {
        error_ = std::move(message);
        return std::nullopt;
    }

    void take(std::size_t bytes) { rest_.remove_prefix(bytes); }

    bool accept(std::string_view token) {
        if (!rest_.starts_with(token)) return false;
        take(token.size());
        return true;
    }

    void skip_spaces() {
        // A plain space, the no-break space U+00A0 and its narrow sister U+202F, as typesetting puts them.
        while (accept(" ") || accept("\u00A0") || accept("\u202F")) {
        }
    }

    bool next_factor() {
        if (accept("/")) {
            divided_ = true;
            skip_spaces();
            return factor(-1);
        }
        if (accept("*") || accept("\u00B7") || accept("\u22C5")) skip_spaces();
        if (divided_) {
            fail("it is not clear whether what follows the divisor in " + quoted(text_) +
                 " multiplies or divides: put products first, as in \"kN m/rad\", or repeat the slash, as in "
                 "\"kN/m/m\"");
            return false;
        }
        return factor(1);
    }

    bool factor(int sign) {
        const std::string_view name = symbol();
        if (name.empty()) {
            fail(misplaced());
            return false;
        }
        const Unit* found = find_unit(name);
        if (found == nullptr) {
            fail(unknown_unit(name));
            return false;
        }
        const std::optional<int> exponent = power();
        if (!exponent) return false;
        unit_ = unit_.times(*found, sign * *exponent);
        const Dimension& d = unit_.dimension;
        const auto too_high = [](int e) { return e > 20 || e < -20; };
        if (too_high(d.length) || too_high(d.mass) || too_high(d.time) || too_high(d.temperature)) {
            fail("the powers in " + quoted(text_) + " add up to more than any quantity has");
            return false;
        }
        return true;
    }

    std::string_view symbol() {
        std::size_t end = 0;
        while (end < rest_.size() && is_symbol_byte(end)) ++end;
        const std::string_view name = rest_.substr(0, end);
        take(end);
        return name;
    }

    bool is_symbol_byte(std::size_t i) const {
        const char c = rest_[i];
        if ((c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || c == '%' || c == '\'' || c == '"') return true;
        if (static_cast<unsigned char>(c) < 0x80) return false;
        const std::string_view here = rest_.substr(i);
        for (const std::string_view other : {"\u00A0", "\u202F", "\u00B7", "\u22C5", "²", "³", "⁴", "¹", "⁻"}) {
            if (here.starts_with(other)) return false;
        }
        return true;
    }

    /// What is wrong where a unit's name should begin.
    std::string misplaced() const {
        const std::string in = " in " + quoted(text_);
        if (rest_.empty()) return "a unit is missing at the end of " + quoted(text_);
        if (rest_.front() == '(' || rest_.front() == ')') {
            return "parentheses do not belong into a unit: repeat the slash, as in \"kN/m/m\"";
        }
        if (rest_.front() == '-' || rest_.front() == '.') {
            return "units are multiplied by a space, * or ·, as in \"kN m\": found " + quoted(rest_.substr(0, 1)) + in;
        }
        return "expected the name of a unit" + in;
    }

    /// The power after a name: "2", "^2", "²", "^-1"; 1 when there is none.
    std::optional<int> power() {
        if (accept("²")) return 2;
        if (accept("³")) return 3;
        if (accept("⁴")) return 4;
        if (accept("⁻¹")) return -1;
        const bool caret = accept("^");
        const bool minus = rest_.size() > 1 && rest_[0] == '-' && rest_[1] >= '0' && rest_[1] <= '9';
        if (minus) take(1);
        int exponent = 0;
        const auto [end, status] = std::from_chars(rest_.data(), rest_.data() + rest_.size(), exponent);
        if (end == rest_.data()) {
            if (!caret) return 1;
            return fail("a whole number must follow ^ in " + quoted(text_));
        }
        if (status != std::errc{} || exponent < 1 || exponent > 9 ||
            (end != rest_.data() + rest_.size() && *end == '.')) {
            return fail("the powers in a unit are whole numbers from 1 to 9: found " + quoted(text_));
        }
        take(static_cast<std::size_t>(end - rest_.data()));
        return minus ? -exponent : exponent;
    }
};

std::string_view trimmed(std::string_view text) {
    while (text.starts_with(' ')) text.remove_prefix(1);
    while (text.ends_with(' ')) text.remove_suffix(1);
    return text;
}

/// Reads the number at the start of `text` and takes it off.
std::optional<double> take_number(std::string_view& text, std::string& error) {
    const std::string_view whole = text;
    std::string_view digits = text;
    if (digits.starts_with('+')) digits.remove_prefix(1);
    const std::string_view unsigned_part = digits.starts_with('-') ? digits.substr(1) : digits;
    double number = 0;
    const bool has_number = !unsigned_part.empty() && starts_number(unsigned_part.front());
    const auto [end, status] = std::from_chars(digits.data(), digits.data() + digits.size(), number);
    if (!has_number || status == std::errc::invalid_argument) {
        error = whole.empty() ? "the text is empty: a quantity is a number with a unit, as in \"12.5 kN/m\""
                : whole.starts_with("\u2212")
                    ? "the minus of " + quoted(whole) + " is a typographic one: write -"
                    : quoted(whole) +
                          " does not begin with a number: a quantity is a number with a unit, as in \"12.5 kN/m\"";
        return {};
    }
    if (status != std::errc{} || !std::isfinite(number)) {
        error = "the number in " + quoted(whole) + " is beyond what a computer's number can hold";
        return {};
    }
    text = digits.substr(static_cast<std::size_t>(end - digits.data()));
    if (text.starts_with(',') || text.starts_with('_')) {
        error =
            "write the number in " + quoted(whole) + " with a decimal point and without separators, as in \"1234.5\"";
        return {};
    }
    return number;
}

/// The rest of "1/360" after the 1, if it is that: a slash and a number.
bool is_fraction(std::string_view rest) {
    if (!rest.starts_with('/')) return false;
    rest = trimmed(rest.substr(1));
    return !rest.empty() && starts_number(rest.front());
}

std::optional<Quantity> parse_fraction(double numerator, std::string_view rest, std::string& error) {
    const std::string_view whole = rest;
    rest = trimmed(rest.substr(1));
    const std::optional<double> denominator = take_number(rest, error);
    if (!denominator) return {};
    if (!rest.empty() || *denominator == 0) {
        error = "a fraction is written as in \"1/360\", without a unit: found " + quoted(rest.empty() ? whole : rest);
        return {};
    }
    return Quantity{numerator / *denominator, {}, true, true};
}

} // namespace

Unit Unit::times(const Unit& other, int power) const {
    Unit result = *this;
    for (int i = 0; i < std::abs(power); ++i) {
        result.up *= power > 0 ? other.up : other.down;
        result.down *= power > 0 ? other.down : other.up;
    }
    result.dimension = dimension.times(other.dimension, power);
    result.pounds += power * other.pounds;
    result.masses += power * other.masses;
    return result;
}

std::optional<Unit> parse_unit(std::string_view text, std::string& error) {
    return UnitParser(trimmed(text), error).parse();
}

std::optional<Quantity> parse_quantity(std::string_view text, std::string& error) {
    std::string_view rest = trimmed(text);
    const std::optional<double> number = take_number(rest, error);
    if (!number) return {};
    rest = trimmed(rest);
    if (rest.empty()) return Quantity{*number, {}, false, false};
    if (is_fraction(rest)) return parse_fraction(*number, rest, error);
    const std::optional<Unit> unit = parse_unit(rest, error);
    if (!unit) return {};
    const double value = unit->to_si(*number);
    if (!std::isfinite(value)) {
        error = quoted(text) + " is beyond what a computer's number can hold";
        return {};
    }
    return Quantity{value, *unit, true, rest == "%"};
}

std::string mismatch_words(Dimension expected, const Quantity& got) {
    const auto words = [](Dimension d) { return d == dimension::angle ? "an angle" : dimension_words(d); };
    std::string message =
        "expected " + words(expected) + ", got " + (got.is_fraction ? "a fraction" : words(got.unit.dimension));
    const Dimension weight = dimension::acceleration; // what makes a force of a mass
    if (got.unit.pounds != 0 && got.unit.dimension.times(weight, got.unit.pounds) == expected) {
        return message + ": did you mean lbf instead of lb?";
    }
    if (got.unit.masses != 0 && got.unit.dimension.times(weight, got.unit.masses) == expected) {
        return message + ": give the weight instead of the mass, 1 kg weighs 9.80665 N";
    }
    return message;
}

} // namespace groundsill
