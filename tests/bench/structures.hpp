#pragma once
// The models that are measured, as text: every node, member and support on a line of its own.

#include <string>

namespace bench {

/// `spans` spans of 6 m in a row, on a vertical spring of 20 MN/m at every node, under 12 kN/m.
std::string chain(int spans);

/// A frame of storeys x bays, 3.5 m x 7 m, on vertical and rotational springs, loaded on every node.
std::string grid(int storeys, int bays);

/// A portal whose columns have five members each and whose beam has ten, in four cases and ten combinations.
std::string portal();

} // namespace bench
