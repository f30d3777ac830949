// The index of names.

#include <doctest/doctest.h>

#include <string>
#include <vector>

#include "reading/names.hpp"

using groundsill::reading::NameIndex;

TEST_CASE("names are found in any order, also while more are added") {
    std::vector<std::string> names;
    for (int i = 0; i < 2000; ++i) names.push_back("N" + std::to_string(i));
    NameIndex index;
    CHECK(index.find("N0") == -1);
    for (int i = 0; i < 1000; ++i) index.add(names[static_cast<std::size_t>(i)], i);
    for (int i = 0; i < 1000; ++i) CHECK(index.find(names[static_cast<std::size_t>(i)]) == i); // in order
    CHECK(index.find("N1500") == -1);
    for (int i = 1000; i < 2000; ++i) index.add(names[static_cast<std::size_t>(i)], i);
    for (int i = 0; i < 2000; ++i) {
        const int other = i * 769 % 2000; // in disorder
        CHECK(index.find(names[static_cast<std::size_t>(other)]) == other);
    }
    CHECK(index.find("") == -1);
    CHECK(index.items().size() == 2000);
}
