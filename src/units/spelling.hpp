#pragma once
// Which known word did somebody mean?

#include <string>
#include <string_view>

namespace groundsill {

/// How far apart two words are spelled: 2 for each letter that is missing, added, replaced, or exchanged with its
/// neighbour, 1 for one in the wrong case. Only the first 64 bytes count.
/// \param limit distances of this size and above need not be told apart: any number from `limit` on may come back
int spelling_distance(std::string_view a, std::string_view b, int limit);

/// Keeps the nearest of the words that it is shown; of equally near ones, the first.
class NearestWord {
  public:
    explicit NearestWord(std::string_view wanted) : wanted_(wanted) {}

    void consider(std::string_view known);

    /// Empty when no word was considered.
    std::string_view word() const { return best_; }

    /// True when the nearest word is so near that it may well have been meant.
    bool is_near() const;

  private:
    std::string_view wanted_;
    std::string_view best_;
    int distance_ = 1000;
};

/// A word in quotation marks for a message; long ones are cut.
std::string quoted(std::string_view word);

} // namespace groundsill
