#pragma once
// What all parts of the reader share: the diagnostics, the units of bare numbers, and where in the file they are.

#include <optional>
#include <string>
#include <string_view>

#include "groundsill/diagnostics.hpp"
#include "reading/names.hpp"
#include "units/grammar.hpp"

namespace groundsill::reading {

/// The way from the top of the file to a table: put together as text only for messages.
struct Path {
    const Path* parent = nullptr;
    std::string_view name;
    int index = -1; ///< of an element of an array; the name is empty then

    std::string text() const;                     ///< "cases.dead.loads[0]"; empty at the top
    std::string text(std::string_view key) const; ///< the same with a key below it
    std::string place() const;                    ///< "in cases.dead", or "at the top of the file"
};

/// What bare numbers are in.
struct BareUnits {
    bool present = false; ///< the file has [units]
    std::optional<Unit> length;
    std::optional<Unit> force;
};

class Context {
  public:
    Diagnostics diagnostics;
    BareUnits bare;

    void error(Position position, std::string message);

    /// The name nearest to an unknown one, as the end of a sentence: "; the nearest name is 'AB'". Empty when there is
    /// no name at all, and when so many unknown names have been looked up that the search would take seconds.
    std::string nearest_name(const NameIndex& names, std::string_view wanted);

    /// Reports that a name is not known, unless names are missing anyway.
    /// \param where the key that names it; \param kind "node", "member", ...
    void unknown_name(Position position, std::string_view where, std::string_view kind, std::string_view wanted,
                      const NameIndex& names);

  private:
    std::size_t comparisons_left_ = 5'000'000;
};

} // namespace groundsill::reading
