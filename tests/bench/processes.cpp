#include "processes.hpp"

#include <algorithm>
#include <chrono>
#include <cstdlib>

#include <fcntl.h>
#include <spawn.h>
#include <sys/resource.h>
#include <sys/wait.h>

#include <fmt/format.h>

extern char** environ;

namespace bench {

ProcessCost run_process(const std::vector<std::string>& command) {
    std::vector<char*> arguments;
    for (const std::string& word : command) arguments.push_back(const_cast<char*>(word.c_str()));
    arguments.push_back(nullptr);
    posix_spawn_file_actions_t actions;
    posix_spawn_file_actions_init(&actions);
    posix_spawn_file_actions_addopen(&actions, 1, "/dev/null", O_WRONLY, 0);
    const auto start = std::chrono::steady_clock::now();
    pid_t child = 0;
    int status = posix_spawn(&child, arguments[0], &actions, nullptr, arguments.data(), environ);
    rusage usage{};
    if (status == 0) wait4(child, &status, 0, &usage);
    const std::chrono::duration<double> took = std::chrono::steady_clock::now() - start;
    posix_spawn_file_actions_destroy(&actions);
    if (status != 0) {
        fmt::print(stderr, "{} failed\n", command[0]);
        std::exit(1);
    }
    return {took.count(), static_cast<double>(usage.ru_maxrss) / 1024};
}

ProcessCost median_process(const std::vector<std::string>& command, int runs) {
    std::vector<ProcessCost> costs;
    for (int k = 0; k < runs; ++k) costs.push_back(run_process(command));
    std::sort(costs.begin(), costs.end(), [](const auto& a, const auto& b) { return a.seconds < b.seconds; });
    return costs[costs.size() / 2];
}

} // namespace bench
