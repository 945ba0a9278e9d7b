#!/bin/sh
# By mouse and keys, as a user: make a variant, change a value in it, look at the base and back, undo, do it again, save.
# SPDX-License-Identifier: GPL-3.0-or-later
# Usage: scenario-variants.sh PROGRAM.  Needs an X display (Xvfb does), xdotool and python3.
. "$(dirname "$0")/scenario.sh"
plant=$folder/fen.heatloom
cp "$HEATLOOM_DATADIR/examples/tallow-fen.heatloom" "$plant"
: >"$trace"
"$program" "$plant" >"$trace" 2>"$folder/stderr" &
pid=$!
wait_line '^settled' 1 || fail "starts"
sleep 1       # until the window has its size, places are told again

# changes NAME: the changes of a variant in the file.
changes () {
  python3 -c 'import json,sys
plant = json.load(open(sys.argv[1]))
print(*[json.dumps(change) for v in plant["variants"] if v["name"] == sys.argv[2] for change in v["changes"]], sep=" ")' "$plant" "$1"
}
# press_row ADDRESS: into its entry, as soon as the nameplate stands.
press_row () {
  wait_line "^row $1 " 1 || fail "the nameplate shows $1"
  sleep 0.3
  set -- $(place row "$1")
  xdotool mousemove "$1" "$2" sleep 0.1 click 1 sleep 0.5
}

# The chooser by its key: Base, river cooling, then New variant.
xdotool key F4
wait_line '^variants listed' 1 || fail "F4 lists the variants"
xdotool sleep 1 key Down sleep 0.2 key Down sleep 0.2 key Return
wait_line '^asks for a name' 1 || fail "the third line asks for a name"
xdotool sleep 1 key ctrl+a type --delay 20 "weaker sun"
xdotool sleep 0.2 key Return
wait_line '^step ' 1 || fail "F4 and Return make a variant"
ok "F4 and Return make a variant"
sleep 0.3
set -- $(place place T1)
xdotool mousemove "$1" "$2" sleep 0.1 click 1 sleep 0.4
press_row T1.isentropic_efficiency
xdotool key ctrl+a type --delay 20 "0.8"
xdotool key Return
step 2 "a value is typed in the variant"
[ -n "$HEATLOOM_PICTURES" ] && import -window root "$HEATLOOM_PICTURES/variant.png"

xdotool key ctrl+Prior
wait_line '^variant river cooling' 1 || fail "Ctrl and page up looks at the one before"
xdotool key ctrl+Prior
wait_line '^variant $' 1 || fail "and then at the base"
ok "Ctrl and page up look at the others"
xdotool key ctrl+s
wait_line '^saved ' 1 || fail "saves"
[ "$(changes 'weaker sun')" = '{"set": "T1.isentropic_efficiency", "to": 0.8}' ] || fail "the file holds one change: $(changes 'weaker sun')"
ok "the file holds one change"

xdotool sleep 0.2 key ctrl+z sleep 0.5 key ctrl+s
wait_line '^saved ' 2 || fail "saves again"
[ -z "$(changes 'weaker sun')" ] || fail "undo takes the change back, wherever one looks"
ok "undo takes the change back, wherever one looks"
xdotool sleep 0.2 key ctrl+shift+z sleep 0.5 key ctrl+s
wait_line '^saved ' 3 || fail "saves once more"
[ "$(changes 'weaker sun')" = '{"set": "T1.isentropic_efficiency", "to": 0.8}' ] || fail "redo brings it back"
ok "redo brings it back"
[ "$(changes 'river cooling' | grep -c terminal_difference)" = 1 ] || fail "the other variant is as it was"
ok "the other variant is as it was"
[ -s "$folder/stderr" ] && fail "nothing on standard error"
ok "nothing on standard error"
echo "1..$count"
