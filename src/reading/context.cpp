#include "reading/context.hpp"

#include <utility>

#include <fmt/format.h>

#include "units/spelling.hpp"

namespace groundsill::reading {

std::string Path::text() const {
    std::string result = parent == nullptr ? std::string() : parent->text();
    if (index >= 0) return result + "[" + std::to_string(index) + "]";
    if (!result.empty()) result += '.';
    constexpr std::size_t most = 60; // a name may be megabytes long
    result += name.substr(0, most);
    return result;
}

std::string Path::text(std::string_view key) const { return Path{this, key}.text(); }

std::string Path::place() const {
    const std::string where = text();
    return where.empty() ? "at the top of the file" : "in " + where;
}

void Context::error(Position position, std::string message) {
    diagnostics.push_back({Diagnostic::Severity::error, position, std::move(message)});
}

std::string Context::nearest_name(const NameIndex& names, std::string_view wanted) {
    if (names.items().empty() || names.items().size() > comparisons_left_) return {};
    comparisons_left_ -= names.items().size();
    NearestWord nearest(wanted);
    for (const NameIndex::Item& item : names.items()) nearest.consider(item.name);
    return "; the nearest name is " + quoted(nearest.word());
}

void Context::unknown_name(Position position, std::string_view where, std::string_view kind, std::string_view wanted,
                           const NameIndex& names) {
    if (!names.is_complete()) return;
    error(position, fmt::format("{}: there is no {} {}{}", where, kind, quoted(wanted), nearest_name(names, wanted)));
}

} // namespace groundsill::reading
