#include "cli/output.hpp"

#include <array>
#include <atomic>
#include <cerrno>
#include <csignal>
#include <cstring>
#include <utility>

#include <fcntl.h>
#include <sys/stat.h>
#include <unistd.h>

#include <fmt/format.h>

#include "cli/exit_codes.hpp"

namespace groundsill::cli {

namespace {

/// Unfinished files, for the signal handler: it may touch nothing but such plain memory.
constexpr std::size_t most_files = 32;
constexpr std::size_t longest_path = 4096;
std::array<std::array<char, longest_path>, most_files> unfinished{};
std::array<std::atomic<bool>, most_files> in_use{};

void remember(const std::string& path) {
    for (std::size_t k = 0; k < most_files; ++k) {
        if (in_use[k] || path.size() >= longest_path) continue;
        std::memcpy(unfinished[k].data(), path.c_str(), path.size() + 1);
        in_use[k] = true;
        return;
    }
}

void forget(const std::string& path) {
    for (std::size_t k = 0; k < most_files; ++k)
        if (in_use[k] && path == unfinished[k].data()) in_use[k] = false;
}

extern "C" void interrupted(int /*signal*/) {
    for (std::size_t k = 0; k < most_files; ++k)
        if (in_use[k]) unlink(unfinished[k].data());
    _exit(exit_output);
}

[[noreturn]] void fail(const std::string& place) {
    throw OutputError(fmt::format("cannot write {}: {}", place, std::strerror(errno)));
}

void write_all(std::FILE* file, std::string_view text, const std::string& place) {
    if (std::fwrite(text.data(), 1, text.size(), file) != text.size()) fail(place);
}

/// Opens a new file beside `place`, with a name that no other run uses.
std::FILE* open_beside(const std::filesystem::path& place, std::filesystem::path& temporary) {
    std::string name = place.string() + ".XXXXXX";
    const int descriptor = mkstemp(name.data());
    if (descriptor < 0) return nullptr;
    const mode_t mask = umask(0);
    umask(mask);
    fchmod(descriptor, 0666 & ~mask); // as for any new file
    temporary = name;
    remember(name);
    return fdopen(descriptor, "wb");
}

} // namespace

OutputFile::OutputFile(std::filesystem::path place) : place_(std::move(place)) {
    std::error_code ignored;
    // through a link the file that it names is replaced, not the link
    if (std::filesystem::is_symlink(place_, ignored) && std::filesystem::exists(place_, ignored))
        place_ = std::filesystem::canonical(place_, ignored);
    const auto status = std::filesystem::status(place_, ignored);
    if (std::filesystem::is_directory(status)) {
        errno = EISDIR;
        fail(place_.string());
    }
    const bool is_file = !std::filesystem::exists(status) || std::filesystem::is_regular_file(status);
    file_ = is_file ? open_beside(place_, temporary_) : std::fopen(place_.c_str(), "wb");
    if (!file_) fail(place_.string());
}

OutputFile::OutputFile(OutputFile&& other) noexcept
    : place_(std::move(other.place_)), temporary_(std::move(other.temporary_)),
      file_(std::exchange(other.file_, nullptr)) {
    other.temporary_.clear();
}

OutputFile::~OutputFile() {
    if (file_) (void)std::fclose(file_);
    if (temporary_.empty()) return;
    std::error_code ignored;
    std::filesystem::remove(temporary_, ignored);
    forget(temporary_.string());
}

Sink OutputFile::sink() {
    return [this](std::string_view text) { write_all(file_, text, place_.string()); };
}

void OutputFile::commit() {
    if (std::fclose(std::exchange(file_, nullptr)) != 0) fail(place_.string());
    if (temporary_.empty()) return;
    if (std::rename(temporary_.c_str(), place_.c_str()) != 0) fail(place_.string());
    forget(temporary_.string());
    temporary_.clear();
}

Sink standard_output() {
    return [](std::string_view text) { write_all(stdout, text, "the standard output"); };
}

void finish_standard_output() {
    if (std::fflush(stdout) != 0) fail("the standard output");
}

void watch_for_interruption() {
    (void)std::signal(SIGINT, interrupted);
    (void)std::signal(SIGTERM, interrupted);
    (void)std::signal(SIGPIPE, SIG_IGN);
}

} // namespace groundsill::cli
