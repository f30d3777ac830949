#include "reading/toml_tree.hpp"

#include <algorithm>
#include <exception>

#define TOML_ENABLE_FORMATTERS 0
#include <toml++/toml.h>

namespace groundsill::reading {
namespace {

const toml::node& as_node(const void* node) { return *static_cast<const toml::node*>(node); }

Position as_position(const toml::source_position& position) {
    return {static_cast<int>(position.line), static_cast<int>(position.column)};
}

bool stands_before(const Position& a, const Position& b) {
    return a.line != b.line ? a.line < b.line : a.column < b.column;
}

TomlKind kind_of(const toml::node& node) {
    switch (node.type()) {
    case toml::node_type::table:
        return TomlKind::table;
    case toml::node_type::array:
        return TomlKind::array;
    case toml::node_type::string:
        return TomlKind::text;
    case toml::node_type::integer:
        return TomlKind::integer;
    case toml::node_type::floating_point:
        return TomlKind::decimal;
    case toml::node_type::boolean:
        return TomlKind::boolean;
    case toml::node_type::none:
        return TomlKind::none;
    default:
        return TomlKind::time;
    }
}

} // namespace

TomlKind TomlNode::kind() const { return node_ == nullptr ? TomlKind::none : kind_of(as_node(node_)); }

Position TomlNode::position() const { return as_position(as_node(node_).source().begin); }

std::string_view TomlNode::text() const { return as_node(node_).as_string()->get(); }

double TomlNode::number() const {
    const toml::node& node = as_node(node_);
    return node.is_integer() ? static_cast<double>(node.as_integer()->get()) : node.as_floating_point()->get();
}

bool TomlNode::boolean() const { return as_node(node_).as_boolean()->get(); }

int TomlNode::size() const {
    const toml::node& node = as_node(node_);
    return static_cast<int>(node.is_array() ? node.as_array()->size() : node.as_table()->size());
}

TomlNode TomlNode::element(int i) const { return TomlNode(&(*as_node(node_).as_array())[static_cast<std::size_t>(i)]); }

TomlNode TomlNode::find(std::string_view key) const {
    const toml::node* found = as_node(node_).as_table()->get(key);
    return found == nullptr ? TomlNode() : TomlNode(found);
}

void TomlNode::each_entry(void (*visit)(void*, const Entry&), void* visitor) const {
    for (const auto& [key, value] : *as_node(node_).as_table()) {
        visit(visitor, {key.str(), as_position(key.source().begin), TomlNode(&value)});
    }
}

// The library keeps tables sorted by name: the order of the file comes back from the places of the keys.
std::vector<Entry> TomlNode::entries() const {
    std::vector<Entry> list;
    list.reserve(static_cast<std::size_t>(size()));
    each_entry([&list](const Entry& entry) { list.push_back(entry); });
    std::sort(list.begin(), list.end(),
              [](const Entry& a, const Entry& b) { return stands_before(a.position, b.position); });
    return list;
}

struct Document::Tree {
    toml::table root;
};

Document::Document() = default;
Document::~Document() = default;
Document::Document(Document&&) noexcept = default;
Document& Document::operator=(Document&&) noexcept = default;

bool Document::parse(std::string_view text, Diagnostic& error) {
    try {
        tree_ = std::make_unique<Tree>(Tree{toml::parse(text)});
        return true;
    } catch (const toml::parse_error& failure) {
        error = {Diagnostic::Severity::error, as_position(failure.source().begin),
                 "this is not TOML: " + std::string(failure.description())};
    } catch (const std::exception& failure) {
        error = {Diagnostic::Severity::error, {1, 1}, std::string("the text cannot be read: ") + failure.what()};
    }
    return false;
}

TomlNode Document::root() const { return TomlNode(&tree_->root); }

} // namespace groundsill::reading
