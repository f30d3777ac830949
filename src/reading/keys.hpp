#pragma once
// The table of keys: everything that a model file may say. It drives the checks of keys and values, the advice about
// misspelled ones and the refusals of what is not available yet.

#include <span>
#include <string_view>
#include <vector>

#include "units/dimension.hpp"

namespace groundsill::reading {

/// The forms that a value may take, to be joined by |, and what holds for its numbers.
enum Form : unsigned {
    quantity = 1U << 0,  ///< "12 kN/m", or a bare number where the file has [units]
    number = 1U << 1,    ///< a plain number, or a fraction: "50 %", "1/360"
    fraction = 1U << 2,  ///< a fraction beside a quantity, as in a place along a member
    integer = 1U << 3,   ///< a whole number
    boolean = 1U << 4,   ///< true or false
    text = 1U << 5,      ///< free text
    word = 1U << 6,      ///< one of the words of the row
    words = 1U << 7,     ///< an array of such words
    name = 1U << 8,      ///< the name of an entry of the model; the row's words say of what
    names = 1U << 9,     ///< an array of such names
    pair = 1U << 10,     ///< an array of two quantities, each as the row says
    list = 1U << 11,     ///< an array of any number of quantities, each as the row says
    range = 1U << 12,    ///< an array of two plain numbers
    numbers = 1U << 13,  ///< an array of any number of plain numbers
    table = 1U << 14,    ///< a table, its keys in the row's `inner` group
    tables = 1U << 15,   ///< an array of such tables
    positive = 1U << 16, ///< its numbers are above 0
    not_negative = 1U << 17,
    with_unit = 1U << 18, ///< always carries its unit, even where the file has [units]
};

/// The kinds of load, told apart by the keys of the entry. A row of the group "load" may be for some of them only.
enum LoadKind : unsigned {
    load_self_weight = 1U << 0,
    load_node = 1U << 1,
    load_support = 1U << 2,
    load_point = 1U << 3,
    load_distributed = 1U << 4,
    load_temperature = 1U << 5,
    load_lack_of_fit = 1U << 6,
    load_ground = 1U << 7,
    load_on_member = load_point | load_distributed | load_temperature | load_lack_of_fit | load_ground,
    load_any = ~0U,
};

/// One row of the table.
struct Key {
    std::string_view group; ///< the tables that have it: "member", or "member|beam" for both
    std::string_view name;  ///< "E", "start|end" for two keys alike, "*" for any name that the user chooses
    unsigned forms = 0;
    Dimension dimension;
    std::string_view words; ///< the allowed words "free|fixed", those of later work with ! before; or what a name names
    std::string_view inner; ///< the group of a table's own keys
    std::string_view meaning; ///< one line
    bool available = true;    ///< false: known, and refused as not available yet
    unsigned loads = load_any;
};

/// A key of a group: one name of one row.
struct GroupKey {
    std::string_view name;
    const Key* key;
};

/// The keys of one table of the file.
struct Group {
    std::string_view name;
    std::vector<GroupKey> keys;

    /// The row of a key, nullptr when there is none for one of these kinds of load.
    const Key* find(std::string_view key, unsigned loads = load_any) const;

    /// The row of what the user names: of the key "*".
    const Key& any() const { return *find("*"); }
};

/// All rows.
std::span<const Key> all_keys();

/// The keys of the group of that name. \pre it exists
const Group& key_group(std::string_view name);

/// Calls visit(word, available) for each part of "free|!long".
template <class Visit> void each_word(std::string_view words, Visit&& visit) {
    while (!words.empty()) {
        const std::size_t bar = words.find('|');
        std::string_view part = words.substr(0, bar);
        const bool later = part.starts_with('!');
        if (later) part.remove_prefix(1);
        visit(part, !later);
        words.remove_prefix(bar == std::string_view::npos ? words.size() : bar + 1);
    }
}

} // namespace groundsill::reading
