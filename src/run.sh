#!/bin/sh
# From a fresh Debian 12 to the running program: installs what is missing, builds, opens the demo plant.
# Where there is no display it solves the demo plant and writes its pictures to build/out/.
# SPDX-License-Identifier: GPL-3.0-or-later
#
# sh src/run.sh [PLANT]
set -u
plant=${1:-}
case $plant in
  ''|/*) ;;
  *) plant=$PWD/$plant ;;
esac
cd "$(dirname "$0")/.." || exit 1
. src/setup.sh

plant=${plant:-$PWD/data/examples/tallow-fen.heatloom}
[ -f "$plant" ] || fail "there is no plant file $plant"

need_packages $build_packages
# The programs and what they read, without the tests.
targets='src/app/heatloom src/batch/heatloom-batch data/gschemas.compiled'
for language in $(cat po/LINGUAS)
do
  targets="$targets po/$language/LC_MESSAGES/heatloom.mo"
done
build_in build

# The translations of the build, where the program is not installed.
APP_LOCALEDIR=$PWD/build/po
export APP_LOCALEDIR

if [ -n "${DISPLAY:-}" ] || [ -n "${WAYLAND_DISPLAY:-}" ]
then
  exec build/src/app/heatloom "$plant"
fi

name=$(basename "$plant" .heatloom)
out=build/out
mkdir -p "$out" || fail "$out cannot be made"
say '' "There is no display (neither DISPLAY nor WAYLAND_DISPLAY is set), so the plant is solved without a window." ''
status=0
build/src/batch/heatloom-batch solve "$plant" \
  --drawing "$out/$name.svg" --diagram ts "$out/$name-ts.svg" --csv "$out/$name.csv" || status=$?
[ $status -le 1 ] || exit $status
say '' "Written to $PWD/$out:" \
    "  $name.svg      the drawing" \
    "  $name-ts.svg   its temperature-entropy diagram" \
    "  $name.csv      its streams"
exit $status
