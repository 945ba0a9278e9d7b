#!/bin/sh
# By mouse and keys, as a user: edit a plant, have the program killed, start it again and take up the offer.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-recover.sh PROGRAM.  Needs an X display (Xvfb does), xdotool and python3.
. "$(dirname "$0")/scenario.sh"
plant=$folder/loop.heatloom

start () {
  : >"$trace"
  "$program" "$plant" >"$trace" 2>"$folder/stderr" &
  pid=$!
  wait_line '^settled' 1 || fail "starts"
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
wait_line '^kept ' 1 || fail "an edit is kept"
ok "an edit is kept"
[ "$(place_of "$plant")" = "$before" ] || fail "the file itself is as it was"
ok "the file itself is as it was"
kill -9 "$pid"
wait "$pid" 2>/dev/null

start
wait_line '^offer ' 1 || fail "the next start offers to recover"
ok "the next start offers to recover"
sleep 0.7
[ -n "$HEATLOOM_PICTURES" ] && import -window root "$HEATLOOM_PICTURES/recover.png"
xdotool key Return
wait_line '^recovered' 1 || fail "Return recovers"
ok "Return recovers"
sleep 0.5
xdotool key ctrl+s
wait_line '^saved ' 1 || fail "the recovered plant is saved"
after=$(place_of "$plant")
[ "$after" != "$before" ] || fail "the edit is in the file"
ok "the edit is in the file"
[ "$(ls -A "$folder" | grep -c autosave)" = 0 ] || fail "nothing is left behind"
ok "nothing is left behind"
[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"
echo "1..$count"
