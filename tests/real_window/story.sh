#!/usr/bin/env bash
# A story in ten steps in the real window: open, go to an event, edit two planets, take one edit back, pin a reference,
# export, crash, start again, take the unsaved work up, save.
#
#   tests/real_window/story.sh [PROGRAM] [auto|opengl|processor] [FOLDER]
#
# With "hidden" in place of the second word the OpenGL drivers cannot be found, and the program must find its own way.
# Needs Xvfb, xdotool and imagemagick.
set -euo pipefail

# Places in a window of 1280 by 800 points. tests/ui/layout.rs holds the window to them.
FIRST_PLANET="60 296"
LAST_PLANET="60 408"
DISTANCE_FIELD="160 562"

root=$(cd "$(dirname "$0")/../.." && pwd)
program=$(realpath "${1:-$root/target/release/longember}")
graphics=${2:-auto}
pictures=${3:-}
. "$root/tests/real_window/window.sh"
if [ "$graphics" = hidden ]; then
    alone+=(LIBGL_DRIVERS_PATH=/nonexistent __EGL_VENDOR_LIBRARY_DIRS=/nonexistent)
    graphics=auto
fi

file="$work/mine.ron"
file_holds() { [ "$(grep -cE "^ *semi_major_axis_au: $1,\$" "$file")" -eq 1 ]; }
exists() { [ -s "$1" ]; }

# type_distance ROW AU: chooses a planet and types its distance from the star.
type_distance() {
    xdotool mousemove --window "$window" $1 click 1
    until_true "the form of the planet" changes "$pictures/before.png" "$pictures/form.png"
    xdotool mousemove --window "$window" $DISTANCE_FIELD
    sleep 0.6
    shoot "$pictures/over.png"
    xdotool click 1
    until_true "a field that has the focus" changes "$pictures/over.png" "$pictures/focus.png"
    xdotool key --clearmodifiers ctrl+a
    xdotool type --delay 30 "$2"
    xdotool key Return
    xdotool mousemove --window "$window" $NOWHERE
    until_true "a window at rest after the edit" settled "$pictures/before.png"
}

open_display
cp "$root/scenarios/sunlike_five_worlds.ron" "$file"

# 1 open
open_window "$file" --graphics "$graphics"
xdotool mousemove --window "$window" $NOWHERE
until_true "a window at rest" settled "$pictures/before.png"
# 2 go to an event by key
xdotool key Next
until_true "the next event" changes "$pictures/before.png" "$pictures/event.png"
until_true "a window at rest" settled "$pictures/before.png"
is_saved || fail "moving through time counts as a change of the scenario"
# 3 and 4 edit two planets
type_distance "$FIRST_PLANET" 0.31
until_true "the mark of unsaved changes" is_unsaved
type_distance "$LAST_PLANET" 9.7
# 5 take the second edit back
xdotool key --clearmodifiers ctrl+z
until_true "the edit taken back" changes "$pictures/before.png" "$pictures/undone.png"
until_true "a window at rest" settled "$pictures/before.png"
# 6 pin the system as a reference
xdotool key --clearmodifiers ctrl+p
until_true "the pinned reference" changes "$pictures/before.png" "$pictures/pinned.png"
until_true "a window at rest" settled "$pictures/before.png"
# 7 export the fact sheet, found by its words
xdotool key --clearmodifiers ctrl+k
until_true "the list of commands" changes "$pictures/before.png" "$pictures/commands.png"
xdotool type --delay 30 "export fact"
sleep 0.5
xdotool key Return
until_true "the question for a path" changes "$pictures/commands.png" "$pictures/path.png"
sleep 1
xdotool key --clearmodifiers ctrl+a
xdotool type --delay 20 "$work/sheet.html"
xdotool key Return
until_true "the fact sheet" exists "$work/sheet.html"
grep -q "Cindrel" "$work/sheet.html" || fail "the fact sheet does not know the planet"
echo "real window: memory after all this: $(awk '/^VmRSS/ {print int($2 / 1024)}' "/proc/$(xdotool getwindowpid "$window")/status") MB"
# 8 crash: the recovery copy is written in the background, a moment after the edit
sleep 2
crashed=$(xdotool getwindowpid "$window")
kill -9 "$crashed"
wait "$program_pid" 2>/dev/null || true
program_pid=""
file_holds 0.25 || fail "the file changed although nothing was saved"
# 9 start again and take the unsaved work up: the first button of the question
open_window "$file" --graphics "$graphics"
until_true "a window at rest" settled "$pictures/question.png"
xdotool key Tab
sleep 0.3
xdotool key Return
until_true "the unsaved work" is_unsaved
# 10 save
xdotool mousemove --window "$window" $NOWHERE
until_true "a window at rest" settled "$pictures/recovered.png"
xdotool key --clearmodifiers ctrl+s
until_true "the first edit in the file" file_holds 0.31
file_holds 9 || fail "the edit that was taken back is in the file"
until_true "a title without the mark" is_saved
close_window
echo "real window: the story in ten steps holds, drawn by $(basename "${2:-auto}")"
