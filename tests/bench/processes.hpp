#pragma once
// Time and memory of other programs.

#include <string>
#include <vector>

namespace bench {

struct ProcessCost {
    double seconds = 0;   ///< from start to end, on the clock
    double megabytes = 0; ///< largest resident memory
};

/// Runs a program to its end, its standard output thrown away. Ends the benchmark when it fails.
ProcessCost run_process(const std::vector<std::string>& command);

/// As above; the seconds are the median of `runs` runs.
ProcessCost median_process(const std::vector<std::string>& command, int runs);

} // namespace bench
