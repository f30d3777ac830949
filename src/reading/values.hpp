#pragma once
// Single values of the file, checked against their row of the table of keys.

#include <array>
#include <optional>
#include <vector>

#include "reading/context.hpp"
#include "reading/keys.hpp"
#include "reading/toml_tree.hpp"

namespace groundsill::reading {

/// A number of the file: SI, or a fraction where the row allows it beside a quantity.
struct Measure {
    double value = 0;
    bool is_fraction = false;

    /// As a part of a length, m: fractions are of `whole`.
    double of(double whole) const { return is_fraction ? value * whole : value; }
};

/// A key with its value, checked.
struct Field {
    const Key* key = nullptr;
    Entry entry;
    Measure measure;    ///< of a single number or quantity
    bool sound = false; ///< false: an error was reported, do not use the value

    Position position() const { return entry.position; }
    const TomlNode& node() const { return entry.value; }
    bool is_text() const { return sound && node().kind() == TomlKind::text; }
    bool is_table() const { return sound && node().kind() == TomlKind::table; }
    bool is_array() const { return sound && node().kind() == TomlKind::array; }
    bool is_word(std::string_view word) const { return is_text() && node().text() == word; }
};

/// Checks an entry of the table at `path` against its row; errors go to the context.
Field read_field(Context& context, const Key& key, const Path& path, const Entry& entry);

/// The two values of an array; nothing after an error.
std::optional<std::array<Measure, 2>> read_pair(Context& context, const Path& path, const Field& field);

/// The values of an array of any size; nothing after an error.
std::optional<std::vector<Measure>> read_list(Context& context, const Path& path, const Field& field);

} // namespace groundsill::reading
