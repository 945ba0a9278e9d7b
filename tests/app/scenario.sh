# What the scenarios share: a folder of their own, TAP lines, waiting for the trace, dragging.  Sourced with the program as $1.
# SPDX-License-Identifier: GPL-3.0-or-later
program=$1
if [ -z "$DISPLAY" ] || ! command -v xdotool >/dev/null || ! command -v python3 >/dev/null; then
  echo "1..0 # SKIP needs a display, xdotool and python3"
  exit 0
fi

folder=$(mktemp -d)
trace=$folder/trace
export HEATLOOM_TRACE=1 HEATLOOM_NON_UNIQUE=1 GTK_A11Y=none HOME=$folder
export XDG_CONFIG_HOME=$folder/config XDG_DATA_HOME=$folder/data XDG_STATE_HOME=$folder/state
count=0

finish () {
  kill "$pid" 2>/dev/null
  wait "$pid" 2>/dev/null
  rm -rf "$folder"
}
trap finish EXIT

ok () {
  count=$((count + 1))
  echo "ok $count - $1"
}
fail () {
  echo "not ok $((count + 1)) - $1"
  grep -v '^frame' "$trace" | tail -25 | sed 's/^/# /'
  sed 's/^/# stderr: /' "$folder/stderr"
  echo "1..$((count + 1))"
  exit 1
}

# wait_line PATTERN COUNT: until so many lines of the trace match; 20 s.
wait_line () {
  tries=0
  while [ "$(grep -c "$1" "$trace")" -lt "$2" ]; do
    tries=$((tries + 1))
    [ $tries -gt 400 ] && return 1
    sleep 0.05
  done
}
place () { grep "^$1 $2 " "$trace" | tail -1 | cut -d' ' -f3,4; }

# drag X Y TO_X TO_Y: in several steps, or the threshold of a drag is not crossed.
drag () {
  xdotool mousemove "$1" "$2" sleep 0.1 mousedown 1 sleep 0.1
  for n in 1 2 3 4 5 6 7 8 9 10 11 12; do
    xdotool mousemove $(($1 + ($3 - $1) * n / 12)) $(($2 + ($4 - $2) * n / 12)) sleep 0.015
  done
  xdotool sleep 0.15 mouseup 1
}
# step COUNT NAME: waits for the step and for the places after it.
step () {
  wait_line '^step ' "$1" || fail "$2"
  sleep 0.3
  ok "$2"
}
