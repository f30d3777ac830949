#!/bin/sh
# Usage: sh .ci/install_packages.sh NEED...
#
# Installs, through apt-get, those of the needs that are missing; does nothing when there is none. A need is a Debian
# package (libeigen3-dev), or command=package (cmake=cmake) where any program of that name will do, wherever it came from.
set -eu

missing=""

installed() {
    dpkg-query -W -f='${Status}' "$1" 2>/dev/null | grep -q '^install ok installed$'
}

for need in "$@"; do
    package=${need#*=}
    if [ "$need" != "$package" ]; then
        command -v "${need%%=*}" >/dev/null 2>&1 || missing="$missing $package"
    elif command -v dpkg-query >/dev/null 2>&1; then
        installed "$package" || missing="$missing $package"
    fi # without dpkg nothing can be said about a library: CMake will name what it does not find
done

if [ -z "$missing" ]; then
    exit 0
fi

give_up() {
    echo "Missing:$missing" >&2
    echo "$1 Please install what is named above (Debian's package names), then run this again." >&2
    exit 1
}

command -v apt-get >/dev/null 2>&1 || give_up "There is no apt-get here to install it with."

as_root=""
if [ "$(id -u)" -ne 0 ]; then
    command -v sudo >/dev/null 2>&1 || give_up "It takes root, or sudo, to install it."
    as_root="sudo"
    [ -t 0 ] || as_root="sudo -n" # nobody is there to type a password
fi

apt() {
    # shellcheck disable=SC2086 # the words of $as_root are meant to be split
    $as_root env DEBIAN_FRONTEND=noninteractive apt-get -y -o DPkg::Lock::Timeout=300 "$@" </dev/null
}

# The lists of a new machine are empty, and those of an old one name files that are gone: only then are they fetched anew.
install_missing() {
    # shellcheck disable=SC2086 # a list of packages
    apt install --no-install-recommends $missing
}

echo "Installing:$missing"
install_missing >/dev/null 2>&1 || {
    apt update && install_missing
} || give_up "apt-get could not install it."
