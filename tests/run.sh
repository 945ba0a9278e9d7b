#!/bin/sh
# Installs what the tests need, builds, runs every test and closes with the true counts.
# SPDX-License-Identifier: GPL-3.0-or-later
#
# sh tests/run.sh [TEST ...]     names as `meson test --list` prints them; all when none is given
set -u
cd "$(dirname "$0")/.." || exit 1
. src/setup.sh

test_packages='xvfb xauth dbus xdotool x11-utils imagemagick librsvg2-bin poppler-utils
  libxml2-utils desktop-file-utils appstream shared-mime-info locales
  python3 python3-iapws python3-jsonschema'

need_packages $build_packages $test_packages

build=build-tests
# In a subshell, so that a failed build still ends in the counts.
if ! (build_in "$build" -Dwerror=true)
then
  say "FAIL the build in $build" '0 passed, 1 failed, 0 skipped'
  exit 1
fi

# Nothing of the person who runs this is read or written.
home=$(mktemp -d) || fail "no temporary directory could be made"
trap 'rm -rf "$home"' EXIT
trap 'exit 130' HUP INT TERM
mkdir -m 700 "$home/run"
export XDG_RUNTIME_DIR="$home/run" XDG_DATA_HOME="$home/data" XDG_CONFIG_HOME="$home/config"
export XDG_CACHE_HOME="$home/cache" XDG_STATE_HOME="$home/state"

# A locale with a decimal comma, for tests that must print points all the same; its place is searched besides C.UTF-8,
# which is built in.
mkdir "$home/locales"
if localedef --no-archive -i de_DE -f UTF-8 "$home/locales/de_DE.UTF-8" 2>/dev/null
then
  export LOCPATH="$home/locales"
fi

logs=$build/meson-logs
rm -f "$logs/plain.json" "$logs/window.json"

# Everything that needs no display runs without one, so that nothing leans on it by accident.
(
  unset DISPLAY WAYLAND_DISPLAY
  meson test -C "$build" --no-rebuild --print-errorlogs --no-suite app --logbase plain "$@" </dev/null
)
xvfb-run -a -s '-screen 0 1600x1000x24 -nolisten tcp' dbus-run-session -- \
  meson test -C "$build" --no-rebuild --print-errorlogs --suite app --logbase window "$@" </dev/null

say ''
some=
[ $# -eq 0 ] || some=--some
python3 tests/summary.py $some "$logs/plain.json" "$logs/window.json"
