#include "reading/fields.hpp"

#include <algorithm>

#include <fmt/format.h>

#include "units/spelling.hpp"

namespace groundsill::reading {
namespace {

std::string load_words(unsigned loads) {
    switch (loads) {
    case load_self_weight:
        return "self_weight";
    case load_node:
        return "a load on a node";
    case load_support:
        return "a movement of a support";
    case load_point:
        return "a point load";
    case load_distributed:
        return "a load along a member";
    case load_temperature:
        return "a temperature load";
    case load_lack_of_fit:
        return "a lack of fit";
    default:
        return "a load of the ground";
    }
}

bool is_control(char c) { return static_cast<unsigned char>(c) < 0x20 || c == 0x7F; }

/// Reports a name that no entry may have.
bool check_name(Context& context, const Path& table, const Entry& entry) {
    std::string message;
    if (entry.key.empty()) message = "a name is empty: give it at least one letter";
    if (entry.key.find('.') != std::string_view::npos) {
        message = fmt::format("the name {} holds a dot: dots separate the parts of a key", quoted(entry.key));
    } else if (std::ranges::any_of(entry.key, is_control)) {
        message = fmt::format("the name {} holds a line break, a tab or another control character", quoted(entry.key));
    }
    if (message.empty()) return true;
    context.error(entry.position, fmt::format("{}: {}", table.text(), message));
    return false;
}

} // namespace

Fields::Fields(Context& context, const Group& group, const Path& path, const TomlNode& table, Position position,
               unsigned loads)
    : context_(context), path_(path), position_(position) {
    table.each_entry([&](const Entry& entry) {
        const Key* key = group.find(entry.key, loads);
        if (key == nullptr) {
            unknown_key(group, entry, loads);
        } else {
            fields_[count_++] = {key, entry, {}, false};
        }
    });
    // What a misspelled key was meant to say may decide what the values of a load mean: one message is enough then.
    if (!sound_ && group.name == "load") return;
    for (std::size_t i = 0; i < count_; ++i) {
        fields_[i] = read_field(context_, *fields_[i].key, path_, fields_[i].entry);
        sound_ = sound_ && fields_[i].sound;
    }
}

void Fields::unknown_key(const Group& group, const Entry& entry, unsigned loads) {
    sound_ = false;
    if (group.find(entry.key) != nullptr) {
        context_.error(entry.position, fmt::format("{} does not go with {}, which {} is", quoted(entry.key),
                                                   load_words(loads), path_.text()));
        return;
    }
    NearestWord nearest(entry.key);
    for (const GroupKey& known : group.keys) nearest.consider(known.name);
    if (nearest.is_near()) misspelled_.push_back(nearest.word());
    context_.error(entry.position, fmt::format("unknown key {} {}; {} {}", quoted(entry.key), path_.place(),
                                               nearest.is_near() ? "did you mean" : "the nearest known key is",
                                               quoted(nearest.word())) +
                                       (nearest.is_near() ? "?" : ""));
}

const Field* Fields::find(std::string_view key) const {
    for (const Field& field : all()) {
        if (field.entry.key == key) return &field;
    }
    return nullptr;
}

const Field* Fields::sound_field(std::string_view key) const {
    const Field* field = find(key);
    return field != nullptr && field->sound ? field : nullptr;
}

const Field* Fields::required(std::string_view key, std::string_view advice) {
    const Field* field = find(key);
    if (field == nullptr && !is_misspelled(key)) error(fmt::format("lacks {}{}", quoted(key), advice));
    return field != nullptr && field->sound ? field : nullptr;
}

bool Fields::is_misspelled(std::string_view key) const {
    return std::ranges::find(misspelled_, key) != misspelled_.end();
}

double Fields::required_number(std::string_view key, std::string_view advice) {
    const Field* field = required(key, advice);
    return field == nullptr ? stand_in : field->measure.value;
}

std::optional<double> Fields::optional_number(std::string_view key) const {
    const Field* field = find(key);
    if (field == nullptr) return {};
    return field->sound ? field->measure.value : stand_in;
}

std::string_view Fields::optional_text(std::string_view key) const {
    const Field* field = sound_field(key);
    return field == nullptr ? std::string_view() : field->node().text();
}

void Fields::at_most_one(std::initializer_list<std::string_view> keys) {
    const Field* first = nullptr;
    for (const std::string_view key : keys) {
        const Field* field = find(key);
        if (field == nullptr) continue;
        if (first != nullptr) {
            error(*field, fmt::format("has both {} and {}: take one of them", quoted(first->entry.key), quoted(key)));
        }
        first = field;
    }
}

void Fields::error(const std::string& message) {
    sound_ = false;
    context_.error(position_, fmt::format("{} {}", path_.text(), message));
}

void Fields::error(const Field& field, const std::string& message) {
    sound_ = false;
    context_.error(field.position(), fmt::format("{} {}", path_.text(), message));
}

NamedEntry named_entry(Context& context, const Group& group, const Path& path, const Entry& entry) {
    NamedEntry result{read_field(context, group.any(), path, entry), Path{&path, entry.key}};
    if (!check_name(context, path, entry)) result.field.sound = false;
    return result;
}

std::vector<NamedEntry> named_entries(Context& context, const Path& path, const Field* table) {
    std::vector<NamedEntry> result;
    each_named_entry(
        context, path, table, [&](std::size_t count) { result.reserve(count); },
        [&](const NamedEntry& entry) { result.push_back(entry); });
    return result;
}

int resolve(Context& context, const Path& path, const Field& field, const TomlNode& node, const NameIndex& names) {
    if (node.kind() != TomlKind::text) {
        context.error(node.position(), fmt::format("{} takes names in quotation marks", path.text(field.entry.key)));
        return -1;
    }
    const int found = names.find(node.text());
    if (found < 0) {
        const bool element = field.node().kind() == TomlKind::array;
        context.unknown_name(element ? node.position() : field.position(), path.text(field.entry.key), field.key->words,
                             node.text(), names);
    }
    return found;
}

int resolve(Context& context, const Path& path, const Field& field, const NameIndex& names) {
    return resolve(context, path, field, field.node(), names);
}

} // namespace groundsill::reading
