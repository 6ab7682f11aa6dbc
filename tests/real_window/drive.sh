#!/usr/bin/env bash
# Drives the real window under a display of its own, with OpenGL in software:
# start with a file, drag the strip, edit the star's mass, save, close. The file must hold the edit.
#
#   tests/real_window/drive.sh [PROGRAM] [FOLDER]
#
# PROGRAM is the built program (target/release/longember), FOLDER takes the screenshots (a temporary one).
# Needs Xvfb, xdotool and imagemagick.
set -euo pipefail

# Places in a window of 1280 by 800 points. tests/ui/layout.rs holds the window to them.
STRIP_FROM="300 690"
STRIP_TO="700 690"
MASS_FIELD="160 178"

root=$(cd "$(dirname "$0")/../.." && pwd)
program=$(realpath "${1:-$root/target/release/longember}")
pictures=${2:-}
. "$root/tests/real_window/window.sh"

file_holds() { grep -qE "^ *mass_msun: $1,\$" "$file"; }

# --- without a display -------------------------------------------------------------------------------------------
code=0
"${alone[@]}" "$program" >"$work/results" 2>"$work/messages" || code=$?
[ "$code" -eq 4 ] || fail "without a display the exit code is $code, not 4"
[ ! -s "$work/results" ] || fail "without a display there is something on standard output"
[ "$(grep -c . "$work/messages")" -eq 1 ] || fail "without a display there is not exactly one message"
grep -q 'longember demo' "$work/messages" && grep -q 'longember state' "$work/messages" ||
    fail "the message does not name the commands that need no display"

# --- with a display of its own -----------------------------------------------------------------------------------
open_display

file="$work/mine.ron"
cp "$root/scenarios/sunlike_five_worlds.ron" "$file"
file_holds 1 || fail "the scenario to start from has not the mass this test expects"

open_window "$file"
is_saved || fail "a file that was just opened counts as changed: $(title)"

xdotool mousemove --window "$window" $NOWHERE
until_true "a window at rest" settled "$pictures/before.png"

# Drag along the strip: every view moves. Each step waits for the picture, as a hand waits for the eye.
xdotool mousemove --window "$window" $STRIP_FROM mousedown 1 mousemove_relative 20 0
until_true "a picture of the first moment of the drag" changes "$pictures/before.png" "$pictures/first.png"
xdotool mousemove --window "$window" $STRIP_TO
until_true "a picture of the last moment of the drag" changes "$pictures/first.png" "$pictures/moved.png"
xdotool mouseup 1 mousemove --window "$window" $NOWHERE
until_true "a window at rest after the drag" settled "$pictures/moved.png"
differ "$pictures/before.png" "$pictures/moved.png" || fail "the drag moved nothing"
is_saved || fail "moving through time counts as a change of the scenario"

# Edit the star's mass. The field must have the focus before anything is typed.
xdotool mousemove --window "$window" $MASS_FIELD click 1
until_true "a field that has the focus" changes "$pictures/moved.png" "$pictures/focus.png"
xdotool key --clearmodifiers ctrl+a
xdotool type --delay 30 "1.2"
xdotool key Return
until_true "a title with the mark of unsaved changes" is_unsaved
file_holds 1 || fail "the file changed before it was saved"

# Save.
xdotool key --clearmodifiers ctrl+s
until_true "the edit in the file" file_holds 1.2
until_true "a title without the mark" is_saved
xdotool mousemove --window "$window" $NOWHERE
until_true "a window at rest with the new mass" settled "$pictures/after.png"
differ "$pictures/moved.png" "$pictures/after.png" || fail "the new mass is not to be seen"
for picture in before moved after; do
    [ "$(colours "$pictures/$picture.png")" -gt 200 ] || fail "$picture.png has only $(colours "$pictures/$picture.png") colours"
done

# At rest, for the log only: ticks of processor time over two seconds.
ticks() { awk '{print $14 + $15}' "/proc/$program_pid/stat"; }
used=$(ticks)
sleep 2
echo "real window: at rest it used $(($(ticks) - used)) of 200 ticks of processor time"

close_window
[ "$(ls "$work" | grep -c '^mine')" -eq 1 ] || fail "a stray file is left beside the scenario"

# The file is a whole scenario in which nothing but the mass changed.
[ "$(diff "$root/scenarios/sunlike_five_worlds.ron" "$file" | grep -c '^[<>]')" -eq 2 ] || fail "more than the mass changed in the file"
"${alone[@]}" "$program" state "$file" --at now --format json | grep -qE '"mass_msun": 1\.(19|2)' || fail "the saved file does not give the edited star"
echo "real window: opened, dragged, edited, saved, closed ($(colours "$pictures/after.png") colours)"
