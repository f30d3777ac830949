#include "reading/names.hpp"

#include <bit>
#include <functional>

namespace groundsill::reading {
namespace {

std::size_t hash_of(std::string_view name) { return std::hash<std::string_view>{}(name); }

} // namespace

void NameIndex::add(std::string_view name, int index) {
    items_.push_back({name, index});
    if (slots_.empty()) return;
    if (2 * items_.size() > slots_.size())
        build();
    else
        enter(items_.size() - 1);
}

int NameIndex::find(std::string_view name) const {
    for (std::size_t i = last_; i < items_.size() && i < last_ + 2; ++i) {
        if (items_[i].name != name) continue;
        last_ = i;
        return items_[i].index;
    }
    if (items_.empty()) return -1;
    if (slots_.empty()) build();
    const std::uint32_t found = slots_[slot_of(name, hash_of(name))].item;
    if (found == 0) return -1;
    last_ = found - 1;
    return items_[last_].index;
}

void NameIndex::clear() {
    items_.clear();
    slots_.clear();
    last_ = 0;
}

void NameIndex::build() const {
    slots_.assign(std::bit_ceil(4 * items_.size()), {});
    for (std::size_t i = 0; i < items_.size(); ++i) enter(i);
}

void NameIndex::enter(std::size_t item) const {
    const std::size_t hash = hash_of(items_[item].name);
    slots_[slot_of(items_[item].name, hash)] = {static_cast<std::uint32_t>(hash), static_cast<std::uint32_t>(item + 1)};
}

/// The slot that holds the name or, if none does, the empty one where it belongs.
std::size_t NameIndex::slot_of(std::string_view name, std::size_t hash) const {
    const std::size_t mask = slots_.size() - 1;
    const auto part = static_cast<std::uint32_t>(hash);
    std::size_t slot = (hash >> 16) & mask;
    while (slots_[slot].item != 0) {
        if (slots_[slot].hash == part && items_[slots_[slot].item - 1].name == name) break;
        slot = (slot + 1) & mask;
    }
    return slot;
}

} // namespace groundsill::reading
