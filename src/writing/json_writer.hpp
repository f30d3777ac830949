#pragma once
// JSON (RFC 8259) written as it comes: keys and values in order, commas and indentation by the writer.

#include <string_view>
#include <vector>

#include "writing/output.hpp"

namespace groundsill::writing {

/// Objects and arrays in block layout put each entry on a line of its own; in row layout everything stands on one line,
/// whatever it holds.
class JsonWriter {
  public:
    explicit JsonWriter(Output& output) : output_(output) {}

    void open_object() { open('{', false); }
    void open_object_row() { open('{', true); }
    void open_array() { open('[', false); }
    void open_array_row() { open('[', true); }
    /// Closes the innermost object or array.
    void close();

    /// A key of the format itself, which needs no escaping.
    JsonWriter& key(std::string_view key);
    /// A key that is a name of the model.
    JsonWriter& name(std::string_view name);

    /// NaN and infinities become null.
    void number(double value);
    void string(std::string_view text);

    /// After the outermost object: the last line's end.
    void end_document() { output_.character('\n'); }

  private:
    struct Level {
        char closing = '}';
        bool row = false;
        bool empty = true;
    };

    void open(char bracket, bool row);
    void start_entry();
    void start_value();
    void new_line();
    void quoted(std::string_view text);

    Output& output_;
    std::vector<Level> levels_;
    bool after_key_ = false;
};

} // namespace groundsill::writing
