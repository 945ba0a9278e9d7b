#!/bin/sh
# By mouse and keys, as a user: edit a plant, have the program killed, start it again and take up the offer.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-recover.sh PROGRAM.  Needs an X display (Xvfb does), xdotool and python3.
program=$1
if [ -z "$DISPLAY" ] || ! command -v xdotool >/dev/null || ! command -v python3 >/dev/null; then
  echo "1..0 # SKIP needs a display, xdotool and python3"
  exit 0
fi

folder=$(mktemp -d)
trace=$folder/trace
plant=$folder/loop.heatloom
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
  echo "1..$((count + 1))"
  exit 1
}
# wait_line PATTERN: until a line of the trace matches; 20 s.
wait_line () {
  tries=0
  until grep -q "$1" "$trace"; do
    tries=$((tries + 1))
    [ $tries -gt 400 ] && return 1
    sleep 0.05
  done
}
start () {
  : >"$trace"
  "$program" "$plant" >"$trace" 2>"$folder/stderr" &
  pid=$!
  wait_line '^settled' || fail "starts"
  sleep 1       # until the window has its size, places are told again
}
# place_of FILE: where the turbine stands.
place_of () {
  python3 -c 'import json,sys
print([c["at"] for c in json.load(open(sys.argv[1]))["components"] if c["id"] == "T1"][0])' "$1"
}

cp "$HEATLOOM_DATADIR/examples/linden-row.heatloom" "$plant"
before=$(place_of "$plant")
start
set -- $(grep '^place T1 ' "$trace" | tail -1)
xdotool mousemove "$3" "$4" click 1 sleep 0.3 key Right key Right key Right
wait_line '^kept ' || fail "an edit is kept"
ok "an edit is kept"
[ "$(place_of "$plant")" = "$before" ] || fail "the file itself is as it was"
ok "the file itself is as it was"
kill -9 "$pid"
wait "$pid" 2>/dev/null

start
wait_line '^offer ' || fail "the next start offers to recover"
ok "the next start offers to recover"
sleep 0.7
[ -n "$HEATLOOM_PICTURES" ] && import -window root "$HEATLOOM_PICTURES/recover.png"
xdotool key Return
wait_line '^recovered' || fail "Return recovers"
ok "Return recovers"
sleep 0.5
xdotool key ctrl+s
wait_line '^saved ' || fail "the recovered plant is saved"
after=$(place_of "$plant")
[ "$after" != "$before" ] || fail "the edit is in the file"
ok "the edit is in the file"
[ "$(ls -A "$folder" | grep -c autosave)" = 0 ] || fail "nothing is left behind"
ok "nothing is left behind"
[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"
echo "1..$count"
