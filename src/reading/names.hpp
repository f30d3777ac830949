#pragma once
// From names to indices.

#include <cstdint>
#include <string_view>
#include <vector>

namespace groundsill::reading {

/// Finds the indices of named things, a million of them if need be. It keeps no copies of the names, which must outlive
/// it.
///
/// Files mostly refer to the same thing again, or to things in the order in which they were made: those are looked at
/// first. Only a name that is not among them makes it build its hash table.
class NameIndex {
  public:
    void reserve(std::size_t count) { items_.reserve(count); }

    /// Adds a name that is not there yet.
    void add(std::string_view name, int index);

    /// The index of a name, -1 when it is not known.
    int find(std::string_view name) const;

    void clear(); ///< Forgets all names.

    /// Says that names may be missing, because where they come from could not be read.
    void set_incomplete() { complete_ = false; }
    bool is_complete() const { return complete_; }

    bool contains(std::string_view name) const { return find(name) >= 0; }

    struct Item {
        std::string_view name;
        int index;
    };
    /// All names in the order in which they were added.
    const std::vector<Item>& items() const { return items_; }

  private:
    /// Part of the hash beside the item, so that other names in the way are passed without a look at them.
    struct Slot {
        std::uint32_t hash = 0;
        std::uint32_t item = 0; ///< index into items_ plus one; 0 is empty
    };

    std::size_t slot_of(std::string_view name, std::size_t hash) const;
    void enter(std::size_t item) const;
    void build() const;

    std::vector<Item> items_;
    bool complete_ = true;
    mutable std::vector<Slot> slots_; // open addressing; none, or a power of two of them
    mutable std::size_t last_ = 0;    // the item found last
};

} // namespace groundsill::reading
