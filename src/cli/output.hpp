#pragma once
// Files that are whole or not there: written beside their place, renamed when complete.

#include <cstdio>
#include <filesystem>
#include <stdexcept>
#include <string>

#include "groundsill/writing.hpp"

namespace groundsill::cli {

/// An output that could not be written; the message names the file and the reason.
struct OutputError : std::runtime_error {
    using std::runtime_error::runtime_error;
};

/// A file on its way. Opened before the long work, so that a wrong path is found out at once; without commit() nothing
/// is left behind. Where the place is taken by something else than a file (a device, a pipe) it is written straight
/// through.
class OutputFile {
  public:
    /// \throws OutputError when it cannot be opened
    explicit OutputFile(std::filesystem::path place);
    ~OutputFile();
    OutputFile(OutputFile&& other) noexcept;
    OutputFile(const OutputFile&) = delete;
    OutputFile& operator=(const OutputFile&) = delete;
    OutputFile& operator=(OutputFile&&) = delete;

    /// Takes text; throws OutputError when it cannot be written.
    Sink sink();

    /// Puts the finished file into its place. \throws OutputError
    void commit();

  private:
    std::filesystem::path place_;
    std::filesystem::path temporary_; ///< empty when written straight through
    std::FILE* file_ = nullptr;
};

/// Writes text to the standard output. \throws OutputError
Sink standard_output();

/// Flushes the standard output. \throws OutputError
void finish_standard_output();

/// From now on an interruption (SIGINT, SIGTERM) removes unfinished files and ends the program with exit code 4, and a
/// closed pipe is an error of writing.
void watch_for_interruption();

} // namespace groundsill::cli
