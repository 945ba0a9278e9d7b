#!/bin/sh
# By mouse and keys, as a user: move values by Ctrl and arrows, on their name, and in the state diagram; complete a tie; save, read the file.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-move.sh PROGRAM.  Needs an X display (Xvfb does), xdotool and python3.
. "$(dirname "$0")/scenario.sh"
cp "${HEATLOOM_DATADIR:-data}/examples/tallow-fen.heatloom" "$folder/plant.heatloom" || exit 1

"$program" "$folder/plant.heatloom" >"$trace" 2>"$folder/stderr" &
pid=$!
wait_line '^settled' 1 || fail "the plant opens"
sleep 0.5
window=$(xdotool search --onlyvisible --name 'Tallow Fen' | head -1)
[ -n "$window" ] || fail "the window has the title of the plant"
xdotool windowmove "$window" 0 0 windowsize "$window" 1280 800 sleep 1
wait_line '^state 1 ' 1 || fail "the diagram is drawn"
ok "the plant opens with its diagram"

xdotool mousemove $(place place T1) click 1
wait_line '^row T1.extraction1.p ' 1 || fail "the nameplate shows the turbine"
sleep 0.3
xdotool mousemove $(place row T1.extraction1.p) click 1 sleep 0.3 key ctrl+Up sleep 0.1 key ctrl+Up
step 1 "Ctrl and arrows: one step"       # 12 bar and twice 0.1 bar
sleep 1.1

set -- $(place row T1.extraction2.p)
drag $(($1 - 130)) "$2" $(($1 - 70)) "$2"
step 2 "a drag on the name: one step"

drag $(place state 1) $(place state 1 | { read -r x y; echo "$x $((y - 20))"; })
step 3 "a drag of the live steam: one step"
grep -q '^step Set steam temperature of B1' "$trace" || fail "upwards it is the temperature"
ok "upwards it is the temperature"

# Escape while the button is down: nothing happens.
set -- $(place state 1)
xdotool mousemove "$1" "$2" sleep 0.1 mousedown 1 sleep 0.1
for n in 4 8 12 16 20 24; do
  xdotool mousemove "$1" $(($2 + n)) sleep 0.03
done
xdotool sleep 0.2 key Escape sleep 0.3 mouseup 1 sleep 0.3
[ "$(grep -c '^step ' "$trace")" -eq 3 ] || fail "Escape takes the drag back"
ok "Escape takes the drag back"

# A tie: the list offers the address, an arrow key and Return choose it.
xdotool mousemove $(place place T1) click 1 sleep 0.6
xdotool mousemove $(place row T1.extraction3.p) click 1 sleep 0.3 key ctrl+a type --delay 25 "=0.42*L2.inl"
xdotool sleep 0.4 key Down sleep 0.2 key Return sleep 0.2 key Return
step 4 "a tie completed and typed"

xdotool key ctrl+s
wait_line '^saved ' 1 || fail "saved"
python3 - "$folder/plant.heatloom" <<'END' || fail "the file holds what was moved"
import json, sys
ids = {c["id"]: c for c in json.load(open(sys.argv[1]))["components"]}
turbine, boiler = ids["T1"], ids["B1"]
assert abs(turbine["given"]["extraction1.p"] - 12.2e5) < 1.0, turbine
assert turbine["given"]["extraction2.p"] > 6.3e5, turbine
assert boiler["given"]["steam.T"] > 758.15 + 10, boiler
assert "L2.inlet.p" in json.dumps(turbine["tied"]["extraction3.p"]), turbine
END
ok "the file holds what was moved"

[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"
echo "1..$count"
