#pragma once
// Runs a model from its text to its JSON, as a user would, and reads values out of that JSON.

#include <memory>
#include <string>
#include <string_view>

namespace test {

/// The JSON of a run. A pointer is a JSON pointer (RFC 6901): "/cases/dead/reactions/A/y",
/// "/cases/dead/members/AB/places/3/M".
class Result {
  public:
    explicit Result(const std::string& json);

    /// The number at `pointer`; fails the test when there is none.
    double operator()(std::string_view pointer) const;
    /// The string at `pointer`; fails the test when there is none.
    std::string text(std::string_view pointer) const;
    /// How many members or elements stand at `pointer`; fails the test when there is no object or array.
    int size(std::string_view pointer) const;
    bool has(std::string_view pointer) const;
    bool is_null(std::string_view pointer) const;

    /// `quantity` (N, V, M, along, across) of a member at the place `at`, a listed place to within 1e-9 m.
    /// \param scope "cases/dead" or "combinations/uls"
    /// \param after at a jump: the value after it instead of the one before
    double place(std::string_view scope, std::string_view member, std::string_view quantity, double at,
                 bool after = false) const;

  private:
    struct Document;
    std::shared_ptr<const Document> document_;
};

/// Reads, analyses and writes a model; fails the test with the diagnostics when it is refused.
Result run(std::string_view toml, int places = 20);

/// What the reader says about a text, `line:column: severity: message` a line; empty when it has nothing to say.
std::string diagnostics(std::string_view toml);

/// The refusal of a model that reads well but cannot be analysed; empty when it can.
std::string refusal(std::string_view toml);

} // namespace test
