#!/bin/sh
# Usage: sh models/try.sh
#
# From a fresh machine to a first result: installs what is missing (Debian packages), builds the program in build/, runs a
# worked model and says where its results are.
set -eu
cd "$(dirname -- "$0")/.."

sh .ci/install_packages.sh cmake=cmake ninja=ninja-build g++=g++ libeigen3-dev libspectra-dev libfmt-dev libtomlplusplus-dev \
    libcli11-dev

echo "Building groundsill in build/ (about two minutes the first time) ..."
[ -f build/CMakeCache.txt ] || set -- -G Ninja # a build folder keeps the generator that it began with
cmake -S . -B build "$@" -DCMAKE_BUILD_TYPE=Release -DGROUNDSILL_TESTS=OFF
cmake --build build --target groundsill_program

model=models/net-loft-floor.toml
results=build/net-loft-floor
mkdir -p "$results"
echo
echo "\$ build/groundsill run $model --json $results/results.json --csv $results"
build/groundsill run "$model" --json "$results/results.json" --csv "$results"

cat <<END

This was $model: a floor beam on four columns, one of which has gone down.
Every number is in $results/results.json (and, as tables, in the CSV files beside it).
Next:  build/groundsill sketch $model     what the program understands of a model
       build/groundsill new portal mine.toml            a commented model to start from
       build/groundsill --help
END
