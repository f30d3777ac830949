#pragma once
// A thin view of a parsed TOML text. The TOML library is a large header: it is included in toml_tree.cpp alone.

#include <cstdint>
#include <memory>
#include <string>
#include <string_view>
#include <vector>

#include "groundsill/diagnostics.hpp"

namespace groundsill::reading {

struct Entry;

enum class TomlKind : std::uint8_t { none, table, array, text, integer, decimal, boolean, time };

/// One value of the file. A handle: it lives as long as the document does.
class TomlNode {
  public:
    TomlNode() = default;

    TomlKind kind() const;
    bool is_number() const { return kind() == TomlKind::integer || kind() == TomlKind::decimal; }

    /// Where the value begins.
    Position position() const;

    std::string_view text() const; ///< \pre kind() is text
    double number() const;         ///< \pre is_number(); NaN and infinities are possible
    bool boolean() const;          ///< \pre kind() is boolean

    int size() const;                          ///< of an array or a table
    TomlNode element(int i) const;             ///< \pre kind() is array, 0 <= i < size()
    TomlNode find(std::string_view key) const; ///< \pre kind() is table; a node of kind none when the key is not there

    /// The entries of a table in the order of the file. \pre kind() is table
    std::vector<Entry> entries() const;

    /// Calls visit(const Entry&) for each entry of a table, in no useful order, without allocating. \pre kind() is
    /// table
    template <class Visit> void each_entry(Visit&& visit) const;

  private:
    friend class Document;
    explicit TomlNode(const void* node) : node_(node) {}
    void each_entry(void (*visit)(void*, const Entry&), void* visitor) const;

    const void* node_ = nullptr; // a toml::node
};

/// A key with its value, and where the key stands.
struct Entry {
    std::string_view key;
    Position position;
    TomlNode value;
};

template <class Visit> void TomlNode::each_entry(Visit&& visit) const {
    each_entry([](void* visitor, const Entry& entry) { (*static_cast<Visit*>(visitor))(entry); }, &visit);
}

/// A parsed text. Nodes and their strings belong to it.
class Document {
  public:
    Document();
    ~Document();
    Document(Document&&) noexcept;
    Document& operator=(Document&&) noexcept;

    /// Parses the text. The first error of syntax goes into `error`, and the document stays empty.
    /// \pre nothing in the text can harm the library (find_harm)
    /// \return whether it could be parsed
    bool parse(std::string_view text, Diagnostic& error);

    TomlNode root() const;

  private:
    struct Tree;
    std::unique_ptr<Tree> tree_;
};

} // namespace groundsill::reading
