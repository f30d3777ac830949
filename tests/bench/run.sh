#!/bin/sh
# Usage: sh tests/bench/run.sh
#
# Installs what is missing (Debian packages; the libraries to compare with are for this alone), builds in build-bench/ and
# prints a table of timings side by side. It takes some minutes and 6 GB of memory and disk; nothing else should be running.
set -eu
cd "$(dirname -- "$0")/../.."

sh .ci/install_packages.sh cmake=cmake ninja=ninja-build g++=g++ libeigen3-dev libspectra-dev libfmt-dev libtomlplusplus-dev \
    libcli11-dev libopenblas-dev libsuitesparse-dev

cmake -S . -B build-bench -G Ninja -DCMAKE_BUILD_TYPE=Release -DGROUNDSILL_TESTS=OFF -DGROUNDSILL_BENCH=ON >/dev/null
cmake --build build-bench >/dev/null
build-bench/tests/bench/bench build-bench
