#!/bin/sh
# Usage: sh tests/run.sh
#
# Installs what is missing (Debian packages), builds in build-tests/ with warnings as errors, checks the format and the
# static analysis of the sources and runs every test. The exit code is 0 only when all of that went well.
set -eu
cd "$(dirname -- "$0")/.."

sh .ci/install_packages.sh cmake=cmake ninja=ninja-build g++=g++ clang-format=clang-format clang-tidy=clang-tidy \
    libeigen3-dev libspectra-dev libfmt-dev libtomlplusplus-dev libcli11-dev doctest-dev nlohmann-json3-dev

echo "== Format"
find src include tests models -name '*.[ch]pp' -exec clang-format --dry-run --Werror {} +

echo "== Build"
cmake -S . -B build-tests -G Ninja -DCMAKE_BUILD_TYPE=Release -DGROUNDSILL_WERROR=ON
cmake --build build-tests

echo "== Static analysis"
find src -name '*.cpp' -print0 |
    xargs -0 -n 1 -P "$(nproc)" clang-tidy --quiet -p build-tests >build-tests/tidy.log 2>&1 ||
    { grep -v 'warnings generated' build-tests/tidy.log; exit 1; }

echo "== Tests"
ctest --test-dir build-tests --output-on-failure -j "$(nproc)"
