#!/bin/sh
# Usage: sh tests/program/run.sh PROGRAM
#
# What only the program itself can show: exit codes, outputs that cannot be written, nothing left half-written.
set -u
program=$1
models=$(cd "$(dirname -- "$0")/../../models" && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cd "$work" || exit 1
model="$models/net-loft-floor.toml"
failed=0

# expect CODE WORDS COMMAND...: the command ends with the code and says the words (on either stream)
expect() {
    code=$1 words=$2
    shift 2
    said=$("$@" 2>&1)
    got=$?
    if [ "$got" -ne "$code" ] || ! printf '%s\n' "$said" | grep -qF -- "$words"; then
        printf 'FAILED: %s\n  exit code %s instead of %s, or without "%s":\n%s\n' "$*" "$got" "$code" "$words" "$said"
        failed=1
    fi
}
# nothing_left NAME...: none of these exists, nor anything that a broken-off run could have left beside it
nothing_left() {
    for name in "$@"; do
        for found in "$name" "$name".*; do
            [ -e "$found" ] && printf 'FAILED: %s was left behind\n' "$found" && failed=1
        done
    done
}

expect 0 "Net loft" "$program" run "$model"
expect 0 "groundsill " "$program" --version
expect 0 "First steps" "$program" --help
expect 2 "subcommand" "$program" nonsense
expect 2 "MODEL" "$program" run
expect 2 "cannot be read" "$program" run missing.toml
expect 2 "directory" "$program" run .
expect 2 "not available yet" "$program" run "$model" --report page.html
expect 2 "--places" "$program" run "$model" --places many

# outputs
expect 0 "" "$program" run "$model" --json results.json --csv tables
[ -s results.json ] && [ -s tables/reactions.csv ] || { echo "FAILED: outputs are missing"; failed=1; }
expect 4 "cannot write" "$program" run "$model" --json nowhere/results.json
expect 4 "cannot write" "$program" run "$model" --json tables
expect 4 "No space left" "$program" run "$model" --json /dev/full
expect 4 "No space left" sh -c "'$program' run '$model' --json full.json --csv full >/dev/full"
nothing_left full.json full/reactions.csv
expect 4 "" sh -c "'$program' --help >/dev/full"
expect 4 "" sh -c "{ '$program' run '$model' --json - ; echo \$? >code; } | true; sleep 1; exit \$(cat code)"
expect 2 "needs the name" "$program" run "$model" --json ""
cp "$model" own.toml
expect 2 "write over the model" "$program" run own.toml --json own.toml
cmp -s "$model" own.toml || { echo "FAILED: the model was written over"; failed=1; }

# a structure that cannot stand leaves no file, and keeps an old one
sed 's/^A = "pinned"/A = "roller"/' "$model" >slides.toml
echo old >kept.json
expect 3 "mechanism" "$program" run slides.toml --json kept.json --csv none
[ "$(cat kept.json)" = old ] || { echo "FAILED: an old file was lost"; failed=1; }
nothing_left none

# starters and lists
expect 0 "Wrote" "$program" new beam first.toml
expect 2 "exists already" "$program" new beam first.toml
expect 0 "" "$program" run first.toml
expect 0 "IPE 300" "$program" sections ipe300
expect 2 "no section" "$program" sections nothing
expect 0 "Net loft" sh -c "'$program' run /dev/stdin <'$model'"

[ "$failed" -eq 0 ] && echo "the program behaves"
exit "$failed"
