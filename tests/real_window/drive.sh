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
WINDOW="1280 800"
STRIP_FROM="300 690"
STRIP_TO="700 690"
MASS_FIELD="160 178"
# A place where nothing reacts, for pictures without a tooltip.
NOWHERE="1279 799"

# Rounds of polling, each a tenth of a second, before something counts as failed: machines may be slow.
MOST_ROUNDS=600

root=$(cd "$(dirname "$0")/../.." && pwd)
program=$(realpath "${1:-$root/target/release/longember}")
work=$(mktemp -d)
pictures=${2:-$work/pictures}
mkdir -p "$pictures" "$work"/{home,config,state,cache,run}
xvfb_pid="" program_pid=""

clean_up() {
    [ -z "$program_pid" ] || kill "$program_pid" 2>/dev/null || true
    [ -z "$xvfb_pid" ] || kill "$xvfb_pid" 2>/dev/null || true
    wait 2>/dev/null || true
    rm -rf "$work"
}
trap clean_up EXIT

fail() {
    echo "real window: $*" >&2
    sed 's/^/    program says: /' "$work/messages" >&2 2>/dev/null || true
    exit 1
}

# until_true WORDS COMMAND...: polls until the command succeeds; fails with the words when it never does.
until_true() {
    local words=$1 round
    shift
    for ((round = 0; round < MOST_ROUNDS; round++)); do
        "$@" && return
        [ -z "$program_pid" ] || kill -0 "$program_pid" 2>/dev/null || fail "the program ended before: $words"
        sleep 0.1
    done
    fail "never came: $words"
}

# The program finds nothing of the user who runs this. A list, not a function: the program keeps the process of env.
alone=(env -i PATH="$PATH" HOME="$work/home" LONGEMBER_CONFIG_DIR="$work/config" LONGEMBER_STATE_DIR="$work/state"
    LONGEMBER_CACHE_DIR="$work/cache" XDG_RUNTIME_DIR="$work/run" LIBGL_ALWAYS_SOFTWARE=1)

shoot() { import -window "$window" "$1"; }
colours() { identify -format %k "$1"; }
differ() { [ "$(compare -metric AE "$1" "$2" null: 2>&1 | grep -oE '^[0-9.e+]+')" != 0 ]; }
has_window() { window=$(xdotool search --onlyvisible --pid "$program_pid" 2>/dev/null | tail -n 1) && [ -n "$window" ]; }
has_size() {
    local WIDTH=0 HEIGHT=0
    eval "$(xdotool getwindowgeometry --shell "$window" | grep -E '^(WIDTH|HEIGHT)=[0-9]+$')"
    [ "$WIDTH $HEIGHT" = "$WINDOW" ]
}
title() { xdotool getwindowname "$window"; }
is_unsaved() { [[ $(title) == *" *"* ]]; }
is_saved() { ! is_unsaved; }
is_painted() { shoot "$pictures/first.png" 2>/dev/null && [ "$(colours "$pictures/first.png")" -gt 200 ]; }
changes() { shoot "$2" && differ "$1" "$2"; }
file_holds() { grep -qE "^ *mass_msun: $1,\$" "$file"; }
is_gone() { ! kill -0 "$program_pid" 2>/dev/null; }

# --- without a display -------------------------------------------------------------------------------------------
code=0
"${alone[@]}" "$program" >"$work/results" 2>"$work/messages" || code=$?
[ "$code" -eq 4 ] || fail "without a display the exit code is $code, not 4"
[ ! -s "$work/results" ] || fail "without a display there is something on standard output"
[ "$(grep -c . "$work/messages")" -eq 1 ] || fail "without a display there is not exactly one message"
grep -q 'longember demo' "$work/messages" && grep -q 'longember state' "$work/messages" ||
    fail "the message does not name the commands that need no display"

# --- with a display of its own -----------------------------------------------------------------------------------
Xvfb -displayfd 3 -screen 0 1400x900x24 -nolisten tcp -noreset 3>"$work/display" >"$work/xvfb" 2>&1 &
xvfb_pid=$!
has_display() { [ -s "$work/display" ]; }
until_true "a display" has_display
DISPLAY=:$(cat "$work/display")
export DISPLAY

file="$work/mine.ron"
cp "$root/scenarios/sunlike_five_worlds.ron" "$file"
file_holds 1 || fail "the scenario to start from has not the mass this test expects"

"${alone[@]}" DISPLAY="$DISPLAY" "$program" "$file" >"$work/results" 2>"$work/messages" &
program_pid=$!
until_true "a window" has_window
until_true "a painted window" is_painted
until_true "a window of $WINDOW points" has_size
xdotool windowfocus --sync "$window"
is_saved || fail "a file that was just opened counts as changed: $(title)"

# Two pictures with nothing done between them are the same, so that a difference later means something.
xdotool mousemove --window "$window" $NOWHERE
settled() { shoot "$1" && sleep 0.3 && shoot "$work/again.png" && ! differ "$1" "$work/again.png"; }
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

# Close.
xdotool key --clearmodifiers ctrl+q
for ((round = 0; round < MOST_ROUNDS; round++)); do
    is_gone && break
    sleep 0.1
done
is_gone || fail "the window does not close"
code=0
wait "$program_pid" || code=$?
program_pid=""
[ "$code" -eq 0 ] || fail "the exit code is $code"
! grep -qi 'panicked' "$work/messages" || fail "something panicked"
[ ! -s "$work/results" ] || fail "there is something on standard output"
[ "$(ls "$work" | grep -c '^mine')" -eq 1 ] || fail "a stray file is left beside the scenario"

# The file is a whole scenario in which nothing but the mass changed.
[ "$(diff "$root/scenarios/sunlike_five_worlds.ron" "$file" | grep -c '^[<>]')" -eq 2 ] || fail "more than the mass changed in the file"
"${alone[@]}" "$program" state "$file" --at now --format json | grep -qE '"mass_msun": 1\.(19|2)' || fail "the saved file does not give the edited star"
echo "real window: opened, dragged, edited, saved, closed ($(colours "$pictures/after.png") colours)"
