#include "reading/values.hpp"

#include <cmath>

#include <fmt/format.h>

#include "units/spelling.hpp"

namespace groundsill::reading {
namespace {

std::string_view kind_words(const TomlNode& node) {
    switch (node.kind()) {
    case TomlKind::table:
        return "a table";
    case TomlKind::array:
        return "an array";
    case TomlKind::text:
        return "a text";
    case TomlKind::integer:
        return "a number";
    case TomlKind::decimal:
        return std::isnan(node.number()) ? "nan" : std::isinf(node.number()) ? "inf" : "a number with decimals";
    case TomlKind::boolean:
        return "true or false";
    default:
        return "a date or time";
    }
}

std::string word_list(std::string_view words) {
    std::string result;
    each_word(words, [&](std::string_view word, bool) {
        if (!result.empty()) result += ", ";
        result += fmt::format("\"{}\"", word);
    });
    return result;
}

/// A unit to show in advice.
std::string_view unit_example(Dimension dimension) {
    return dimension == dimension::angle ? "deg" : usual_unit(dimension);
}

std::string quantity_words(Dimension dimension) {
    return fmt::format("{}, like \"12 {}\"", dimension == dimension::angle ? "an angle" : dimension_words(dimension),
                       unit_example(dimension));
}

/// The forms that a value may take, in words: "a force, like "12 kN", or one of "free"".
std::string expectation(const Key& key) {
    std::string result;
    const auto add = [&](unsigned form, std::string_view part) {
        if ((key.forms & form) == 0) return;
        if (!result.empty()) result += ", or ";
        result += part;
    };
    add(quantity, quantity_words(key.dimension));
    add(number, "a number, or a fraction like \"1/360\" or \"50 %\"");
    add(fraction, "a fraction like \"50 %\"");
    add(integer, "a whole number");
    add(boolean, "true or false");
    add(text, "a text in quotation marks");
    add(word, word_list(key.words));
    add(words, "an array of " + word_list(key.words));
    add(name, fmt::format("the name of a {} in quotation marks", key.words));
    add(names, fmt::format("an array of names of {}s", key.words));
    add(pair, fmt::format("an array of two, each {}", quantity_words(key.dimension)));
    add(list, fmt::format("an array, each {}", quantity_words(key.dimension)));
    add(range, "an array of two numbers");
    add(numbers, "an array of numbers");
    add(table, "a table");
    add(tables, "an array of tables");
    return result;
}

/// Reads one value for one row and says where an error is.
class ValueReader {
  public:
    ValueReader(Context& context, const Key& key, const Path& path, const Entry& entry)
        : context_(context), key_(key), path_(path), entry_(entry) {}

    Field read() {
        Field field{&key_, entry_, {}, false};
        if (!key_.available) {
            fail("is not available yet");
            return field;
        }
        field.sound = read_kind(entry_.value, field.measure);
        return field;
    }

    /// Reads a number or a quantity, be it the value itself or an element of its array.
    bool read_measure(const TomlNode& node, Measure& measure) {
        const bool is_text = node.kind() == TomlKind::text;
        if (!is_text && (!node.is_number() || !std::isfinite(node.number()))) return wrong_kind(node);
        const bool read = is_text ? read_quantity(node.text(), measure) : read_bare(node.number(), measure);
        return read && in_range(measure);
    }

    bool fail(const std::string& message) {
        context_.error(entry_.position, path_.text(entry_.key) + " " + message);
        return false;
    }

    bool wrong_kind(const TomlNode& node) {
        return fail(fmt::format("takes {}: {} is given", expectation(key_), kind_words(node)));
    }

  private:
    Context& context_;
    const Key& key_;
    const Path& path_;
    const Entry& entry_;

    bool takes(unsigned forms) const { return (key_.forms & forms) != 0; }

    bool read_kind(const TomlNode& node, Measure& measure) {
        switch (node.kind()) {
        case TomlKind::text:
            return read_text(node, measure);
        case TomlKind::integer:
        case TomlKind::decimal:
            return read_number(node, measure);
        case TomlKind::boolean:
            return takes(boolean) || wrong_kind(node);
        case TomlKind::table:
            return takes(table) || wrong_kind(node);
        case TomlKind::array:
            return takes(words | names | pair | list | range | numbers | tables) || wrong_kind(node);
        default:
            return wrong_kind(node);
        }
    }

    bool read_text(const TomlNode& node, Measure& measure) {
        if (takes(text | name)) return true;
        if (takes(word)) {
            const std::optional<bool> available = find_word(node.text());
            if (available && *available) return true;
            if (available) return fail(fmt::format("= \"{}\" is not available yet", node.text()));
            if (!takes(quantity) || !looks_like_quantity(node.text())) return unknown_word(node.text());
        }
        if (takes(quantity | number)) return read_measure(node, measure);
        return wrong_kind(node);
    }

    bool read_number(const TomlNode& node, Measure& measure) {
        if (takes(integer)) {
            measure.value = node.number();
            return (node.kind() == TomlKind::integer || wrong_kind(node)) && in_range(measure);
        }
        if (takes(quantity | number)) return read_measure(node, measure);
        return wrong_kind(node);
    }

    bool is_quantity() const { return takes(quantity | pair | list); }

    std::optional<bool> find_word(std::string_view wanted) const {
        std::optional<bool> found;
        each_word(key_.words, [&](std::string_view known, bool available) {
            if (known == wanted) found = available;
        });
        return found;
    }

    static bool looks_like_quantity(std::string_view value) {
        return !value.empty() && value.find_first_of("0123456789") != std::string_view::npos;
    }

    bool unknown_word(std::string_view wanted) {
        NearestWord nearest(wanted);
        each_word(key_.words, [&](std::string_view known, bool) { nearest.consider(known); });
        return fail(fmt::format("takes {}: {} is none of them; the nearest word is \"{}\"", expectation(key_),
                                quoted(wanted), nearest.word()));
    }

    bool read_quantity(std::string_view value, Measure& measure) {
        std::string error;
        const std::optional<Quantity> read = parse_quantity(value, error);
        if (!read) return fail("cannot be read: " + error);
        measure = {read->value, read->is_fraction};
        if (!is_quantity()) {
            if (read->is_fraction) return true;
            return fail(read->has_unit ? fmt::format("takes {}: {} is given", expectation(key_),
                                                     dimension_words(read->unit.dimension))
                                       : "takes a number: write it without quotation marks");
        }
        if (!read->has_unit) return missing_unit(value);
        if (read->is_fraction && takes(fraction)) return true;
        if (read->is_fraction || read->unit.dimension != key_.dimension) {
            return fail("does not fit: " + mismatch_words(key_.dimension, *read));
        }
        return true;
    }

    bool read_bare(double value, Measure& measure) {
        measure = {value, false};
        if (!is_quantity()) return true;
        const Dimension& d = key_.dimension;
        // Coherent with a length L and a force F: L^l M^m T^t = F^m L^(l - m), where T^(t + 2 m) leaves nothing.
        const bool needs_force = d.mass != 0;
        const bool needs_length = d.length != d.mass;
        const bool coherent = d.time == -2 * d.mass;
        const BareUnits& bare = context_.bare;
        if (!bare.present || takes(with_unit) || !coherent || (needs_force && !bare.force) ||
            (needs_length && !bare.length)) {
            return missing_unit(fmt::format("{}", value));
        }
        Unit unit;
        if (needs_force) unit = unit.times(*bare.force, d.mass);
        if (needs_length) unit = unit.times(*bare.length, d.length - d.mass);
        measure.value = unit.to_si(value);
        return std::isfinite(measure.value) || fail("is beyond what a computer's number can hold");
    }

    bool missing_unit(std::string_view value) {
        const BareUnits& bare = context_.bare;
        const std::string start =
            fmt::format("has no unit: write {}, as in \"{} {}\"",
                        key_.dimension == dimension::angle ? "an angle" : dimension_words(key_.dimension),
                        value.substr(0, 40), unit_example(key_.dimension));
        if (takes(with_unit)) return fail(start + "; [units] does not cover it");
        if (!bare.present) return fail(start + ", or name the units of bare numbers in [units]");
        if (entry_.value.kind() == TomlKind::text) return fail(start + ", or a bare number without quotation marks");
        return fail(start + (bare.length ? ", or add force to [units]" : ", or add length to [units]"));
    }

    bool in_range(const Measure& measure) {
        if (takes(positive) && !(measure.value > 0)) return fail("must be above 0");
        if (takes(not_negative) && !(measure.value >= 0)) return fail("must not be negative");
        return true;
    }
};

} // namespace

Field read_field(Context& context, const Key& key, const Path& path, const Entry& entry) {
    return ValueReader(context, key, path, entry).read();
}

std::optional<std::array<Measure, 2>> read_pair(Context& context, const Path& path, const Field& field) {
    ValueReader reader(context, *field.key, path, field.entry);
    if (field.node().size() != 2) {
        const int size = field.node().size();
        reader.fail(
            fmt::format("takes {}: {} {} given", expectation(*field.key), size, size == 1 ? "value is" : "values are"));
        return {};
    }
    std::array<Measure, 2> values;
    for (int i = 0; i < 2; ++i) {
        if (!reader.read_measure(field.node().element(i), values[static_cast<std::size_t>(i)])) return {};
    }
    return values;
}

std::optional<std::vector<Measure>> read_list(Context& context, const Path& path, const Field& field) {
    ValueReader reader(context, *field.key, path, field.entry);
    std::vector<Measure> values(static_cast<std::size_t>(field.node().size()));
    for (std::size_t i = 0; i < values.size(); ++i) {
        if (!reader.read_measure(field.node().element(static_cast<int>(i)), values[i])) return {};
    }
    return values;
}

} // namespace groundsill::reading
