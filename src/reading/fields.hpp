#pragma once
// One table of the file with its keys checked.

#include <array>
#include <initializer_list>
#include <optional>
#include <span>
#include <string_view>
#include <vector>

#include "reading/values.hpp"

namespace groundsill::reading {

/// The fields of one table. Unknown keys, keys not available yet and values that do not fit their row are reported
/// while it is made. To go on after an error without reporting what follows from it, a value that was reported reads as
/// `stand_in`; the table is then not sound, and the model that comes of it is never given away.
class Fields {
  public:
    static constexpr double stand_in = 1;
    static constexpr std::size_t most = 32; ///< more than any group has keys

    /// \param position where to report what the table lacks
    /// \param loads for entries of `loads`: the kinds whose keys are allowed
    Fields(Context& context, const Group& group, const Path& path, const TomlNode& table, Position position,
           unsigned loads = load_any);

    /// The field of a key, sound or not; nullptr where the key is absent.
    const Field* find(std::string_view key) const;

    /// The field of a key if it is there and sound.
    const Field* sound_field(std::string_view key) const;

    std::span<const Field> all() const { return {fields_.data(), count_}; }

    /// A number that must be there; reports it when it is missing.
    double required_number(std::string_view key, std::string_view advice = {});

    /// A number that may be absent.
    std::optional<double> optional_number(std::string_view key) const;

    /// A text that may be absent: empty then.
    std::string_view optional_text(std::string_view key) const;

    /// A field that must be there; reports it when it is missing. nullptr then, and when it is not sound.
    const Field* required(std::string_view key, std::string_view advice = {});

    /// True when an unknown key was probably meant to be this one: it is not missing then.
    bool is_misspelled(std::string_view key) const;

    /// Reports it when more than one of the keys is there.
    void at_most_one(std::initializer_list<std::string_view> keys);

    /// Reports that the table lacks something or contradicts itself.
    void error(const std::string& message);
    /// Reports that something is wrong with one field.
    void error(const Field& field, const std::string& message);

    /// False after any error in this table; also when what it refers to is wrong.
    bool sound() const { return sound_; }
    void set_unsound() { sound_ = false; }

    Context& context() const { return context_; }
    const Path& path() const { return path_; }

  private:
    void unknown_key(const Group& group, const Entry& entry, unsigned loads);

    Context& context_;
    const Path& path_;
    Position position_;
    std::array<Field, most> fields_;
    std::size_t count_ = 0;
    std::vector<std::string_view> misspelled_; ///< known keys that unknown ones were probably meant to be
    bool sound_ = true;
};

/// An entry of a table whose names the user chooses.
struct NamedEntry {
    Field field;
    Path path;
    std::string_view name() const { return field.entry.key; }
};

/// Checks one such entry against the row of "*" in `group`; a bad name is reported too.
/// \param path of the table, which must outlive the entry
NamedEntry named_entry(Context& context, const Group& group, const Path& path, const Entry& entry);

/// Calls visit(const NamedEntry&) for each entry of such a table in the order of the file. Nothing happens where the
/// table is absent or not sound. \param path of the table \param begin is called with the number of entries before the
/// first of them
template <class Begin, class Visit>
void each_named_entry(Context& context, const Path& path, const Field* table, Begin&& begin, Visit&& visit) {
    if (table == nullptr || !table->is_table()) return;
    const Group& group = key_group(table->key->inner);
    const std::vector<Entry> entries = table->node().entries();
    begin(entries.size());
    for (const Entry& entry : entries) visit(named_entry(context, group, path, entry));
}

/// The entries of such a table, all at once.
/// \param path of the table, which must outlive the entries
std::vector<NamedEntry> named_entries(Context& context, const Path& path, const Field* table);

/// Finds what a field names; reports an unknown name. \return -1 after an error
int resolve(Context& context, const Path& path, const Field& field, const NameIndex& names);

/// As above, for a name that stands at `node`, which is the field's value or an element of it.
int resolve(Context& context, const Path& path, const Field& field, const TomlNode& node, const NameIndex& names);

} // namespace groundsill::reading
