#!/bin/sh
# By mouse and keys, as a user: draw a loop from the shelf, type values, undo and redo, save by the dialog, read the file.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-draw.sh PROGRAM.  Needs an X display (Xvfb does), xdotool and python3.
. "$(dirname "$0")/scenario.sh"
export HEATLOOM_DATADIR=$folder      # no demo plant: an empty sheet

# take KIND TO_X TO_Y: drags from the shelf; lets go once the canvas has answered.
take () {
  set -- $(place shelf "$1") "$2" "$3" "$1"
  seen=$(grep -c "^over $5 " "$trace")
  xdotool mousemove "$1" "$2" sleep 0.1 mousedown 1 sleep 0.1
  for n in 1 2 3 4 5 6 7 8 9 10 11 12; do
    xdotool mousemove $(($1 + ($3 - $1) * n / 12)) $(($2 + ($4 - $2) * n / 12)) sleep 0.015
  done
  wait_line "^over $5 " $((seen + 1))
  xdotool sleep 0.3 mouseup 1
}
steps () { grep -c '^step ' "$trace"; }

"$program" >"$trace" 2>"$folder/stderr" &
pid=$!
wait_line '^shelf steam_user ' 1 || fail "the window opens"
wait_line '^settled' 1
sleep 0.5
window=$(xdotool search --onlyvisible --name '^Heatloom' | head -1)
[ -n "$window" ] || fail "the window has a title"
xdotool windowmove "$window" 0 0 windowsize "$window" 1280 720 sleep 0.6
ok "the window opens on an empty sheet"

# The shelf's places do not change with the height; the canvas begins right of it.
take heat_input 300 220; step 1 "heat input from the shelf"
take turbine 560 140;    step 2 "turbine from the shelf"
# The others stand further down the shelf than the window is high: by their names.
# named NAME X Y: types the name in the box that opens there.
named () {
  xdotool mousemove "$2" "$3" sleep 0.1 key slash
  boxes=$((boxes + 1))
  wait_line '^quick-add' "$boxes" || fail "a box for the name"
  xdotool sleep 0.2 type --delay 15 "$1"
  xdotool sleep 0.2 key Return
}
boxes=0
named generator 700 140; step 3 "generator by its name"
named condenser 640 260; step 4 "condenser by its name"
named pump 440 330;      step 5 "pump by its name"

drag $(place port Q1.steam) $(place port T1.inlet);       step 6 "steam line"
drag $(place port T1.exhaust) $(place port C1.steam);     step 7 "exhaust line"
drag $(place port C1.condensate) $(place port P1.inlet);  step 8 "condensate line"
drag $(place port P1.outlet) $(place port Q1.feed);       step 9 "feed line"
drag $(place shaft T1.1) $(place place G1);               step 10 "shaft"
wait_line '^solved' 2 || fail "the loop solves"
ok "the loop solves as soon as it is closed"

# Type into the nameplate.
xdotool mousemove $(place place T1) click 1
sleep 0.6
wait_line '^row T1.inlet.p ' 1 || fail "the nameplate shows the turbine"
xdotool mousemove $(place row T1.inlet.p) click 1 sleep 0.3 key ctrl+a type --delay 20 "80 bar"
xdotool key Return
step 11 "live steam pressure typed"
# Delete in an entry takes a character, never a component.
xdotool mousemove $(place row T1.isentropic_efficiency) click 1 sleep 0.3 key ctrl+a key Delete type --delay 20 "0.85"
xdotool key Return
step 12 "efficiency typed after Delete"
[ "$(place place T1)" != "" ] && ! grep -q '^step Delete' "$trace" || fail "Delete in an entry deletes no component"
ok "Delete in an entry deletes no component"

# Keys on the canvas: turn and back, delete and undo.
xdotool mousemove $(place place P1) click 1 sleep 0.3 key Right
step 13 "arrow key moves the pump"
xdotool key Delete
step 14 "Delete on the canvas deletes the pump"
xdotool key ctrl+z sleep 0.4 key ctrl+z sleep 0.4
xdotool key ctrl+shift+z sleep 0.4

# Save by the dialog.
xdotool key ctrl+s sleep 1.5
xdotool key ctrl+a type --delay 15 "$folder/loop.heatloom"
xdotool sleep 0.3 key Return
wait_line '^saved ' 1 || fail "saved by the dialog"
ok "saved by the dialog"

python3 - "$folder/loop.heatloom" <<'END' || fail "the file holds what was drawn"
import json, sys
plant = json.load(open(sys.argv[1]))
ids = {c["id"]: c for c in plant["components"]}
assert set(ids) == {"Q1", "T1", "G1", "C1", "P1"}, ids.keys()
lines = {(s["from"], s["to"]) for s in plant["streams"]}
assert lines == {("Q1.steam", "T1.inlet"), ("T1.exhaust", "C1.steam"), ("C1.condensate", "P1.inlet"), ("P1.outlet", "Q1.feed")}, lines
assert [sorted(s["joins"]) for s in plant["shafts"]] == [["G1", "T1"]], plant["shafts"]
assert ids["T1"]["given"]["inlet.p"] == 8e6, ids["T1"]
assert ids["T1"]["given"]["isentropic_efficiency"] == 0.85, ids["T1"]
END
ok "the file holds what was drawn"

[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"

# Nothing is unsaved: the window closes without a question.
xdotool key ctrl+q
for n in 1 2 3 4 5 6 7 8 9 10 11 12 13 14 15 16 17 18 19 20; do
  kill -0 "$pid" 2>/dev/null || break
  sleep 0.1
done
kill -0 "$pid" 2>/dev/null && fail "closes without a question"
ok "closes without a question"
echo "1..$count"
