#!/bin/sh
# By mouse and keys, as a user: a reheat plant with four feedwater heaters from an empty sheet - components by their names, options and
# values in the nameplate, every line from port to port - until it solves, then saved and read back.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-reheat.sh PROGRAM; PICTURE=FILE in the environment keeps a picture of the window.  Needs an X display of at least 1600x1000, xdotool and python3.
. "$(dirname "$0")/scenario.sh"
export HEATLOOM_DATADIR=$folder      # no demo plant: an empty sheet

"$program" >"$trace" 2>"$folder/stderr" &
pid=$!
wait_line '^settled' 1 || fail "the window opens"
sleep 0.5
window=$(xdotool search --onlyvisible --name '^Heatloom' | head -1)
[ -n "$window" ] || fail "the window has a title"
xdotool windowmove "$window" 0 0 windowsize "$window" 1600 1000 sleep 0.8
wait_line '^canvas right-bottom 1[23]' 1 || fail "the window grows"
sleep 0.5
set -- $(place canvas left-top)
left=$1 top=$2
xdotool mousemove $((left + 60)) $((top + 400)) click 1 sleep 0.2
for n in 1 2 3; do xdotool key minus sleep 0.1; done      # room for a large plant
ok "the window opens on an empty sheet"

count_steps=0
next () {
  count_steps=$((count_steps + 1))
  wait_line '^step ' "$count_steps" || fail "$1"
  sleep 0.25
}

# put ID NAME X Y: a component by its name; X and Y in grid units of a sheet that begins at the corner of the canvas.
put () {
  xdotool mousemove $((left + 14 + $3 * 66 / 10)) $((top + 14 + $4 * 66 / 10)) sleep 0.05 key slash
  boxes=$((boxes + 1))
  wait_line '^quick-add' "$boxes" || fail "a box for the name of $1"
  xdotool sleep 0.15 type --delay 8 "$2"
  xdotool sleep 0.1 key Return
  next "put $1"
  wait_line "^place $1 " 1 || fail "$1 is on the sheet"
}
boxes=0
put B1 "fired boiler" 12 30
put T1 "turbine section" 36 10
put T2 "turbine section" 72 10
put G1 "generator" 92 10
put C1 "condenser" 124 32
put P1 "pump" 114 50
put H1 "closed heater" 96 50
put D1 "open heater" 78 50
put P2 "pump" 58 59
put H2 "closed heater" 42 59
put H3 "closed heater" 26 59
put V1 "throttle valve" 58 66
ok "twelve components by their names"

# choose ID OPTION VALUE: a count in the nameplate.
choose () {
  xdotool mousemove $(place place "$1") click 1 sleep 0.5
  wait_line "^option $1.$2 " 1 || fail "the nameplate shows the options of $1"
  xdotool mousemove $(place option "$1.$2") click 1 sleep 0.1 key ctrl+a type --delay 8 "$3"
  xdotool key Return
  next "option $2 of $1"
}
choose B1 reheats 1
choose T1 extractions 1
choose T2 extractions 3
choose D1 inlets 2
ok "options in the nameplate"

for pump in P1 P2; do
  xdotool mousemove $(place place $pump) click 1 sleep 0.2 key m
  next "mirror $pump"
done

# line FROM TO: from port to port.
line () {
  drag $(place port "$1") $(place port "$2")
  next "line from $1 to $2"
}
line B1.steam T1.inlet
line T1.exhaust B1.cold_reheat1
line B1.hot_reheat1 T2.inlet
line T2.exhaust C1.steam
line C1.condensate P1.inlet
line P1.outlet H1.feed_inlet
line H1.feed_outlet D1.inlet1
line D1.outlet P2.inlet
line P2.outlet H2.feed_inlet
line H2.feed_outlet H3.feed_inlet
line H3.feed_outlet B1.feed
line T1.extraction1 H3.steam
line T2.extraction1 H2.steam
line T2.extraction2 D1.steam
line T2.extraction3 H1.steam
line H3.drain H2.drain_inlet
line H2.drain V1.inlet
line V1.outlet D1.inlet2
line H1.drain C1.drain
ok "nineteen lines from port to port"
drag $(place shaft T1.1) $(place place T2); next "shaft of both sections"
drag $(place shaft T2.1) $(place place G1); next "shaft to the generator"
ok "one shaft"

# value ID KEY TEXT: into the nameplate.
value () {
  xdotool mousemove $(place place "$1") click 1 sleep 0.6
  wait_line "^row $1.$2 " 1 || fail "the nameplate shows $2 of $1"
  xdotool mousemove $(place row "$1.$2") click 1 sleep 0.2 key ctrl+a type --delay 8 "$3"
  xdotool key Return
  next "$2 of $1"
}
value T1 inlet.p "125 bar"
value T1 exhaust.p "30 bar"
value T1 extraction1.p "36 bar"
value T2 extraction1.p "13 bar"
value T2 extraction2.p "3.3 bar"
value T2 extraction3.p "0.53 bar"
ok "pressures typed"
xdotool key Escape mousemove $((left + 20)) $((top + 300)) click 1 sleep 0.6
wait_line '^row plant.net_power ' 1 || fail "the nameplate shows the plant"
xdotool mousemove $(place row plant.net_power) click 1 sleep 0.2 key ctrl+a type --delay 8 "100 MW"
xdotool key Return
next "net power of the plant"
xdotool key Escape mousemove $((left + 20)) $((top + 300)) click 1 sleep 0.3 key 0 sleep 0.6
grep '^solved\|^unsolved' "$trace" | tail -1 | grep -q '^solved' || fail "the plant solves"
ok "the plant solves"

[ -n "$PICTURE" ] && import -window root "$PICTURE"

xdotool key ctrl+s sleep 1.5 key ctrl+a type --delay 10 "$folder/reheat.heatloom"
xdotool sleep 0.3 key Return
wait_line '^saved ' 1 || fail "saved by the dialog"
python3 - "$folder/reheat.heatloom" <<'END' || fail "the file holds what was drawn"
import json, sys
plant = json.load(open(sys.argv[1]))
ids = {c["id"]: c for c in plant["components"]}
assert set(ids) == {"B1", "T1", "T2", "G1", "C1", "P1", "P2", "H1", "H2", "H3", "D1", "V1"}, ids.keys()
assert ids["B1"]["reheats"] == 1 and ids["T2"]["extractions"] == 3 and ids["D1"]["inlets"] == 2
assert len(plant["streams"]) == 19, len(plant["streams"])
assert [sorted(s["joins"]) for s in plant["shafts"]] == [["G1", "T1", "T2"]], plant["shafts"]
assert ids["T1"]["given"]["inlet.p"] == 125e5 and ids["T2"]["given"]["extraction3.p"] == 53000.0
END
ok "the file holds what was drawn"
[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"
echo "1..$count"
