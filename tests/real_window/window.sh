# What the scripts beside this file stand on: a display of its own, the program, pictures, polling. To be sourced with
# $root, $program and $pictures set.

# Rounds of polling, each a tenth of a second, before something counts as failed: machines may be slow.
MOST_ROUNDS=600
# A place where nothing reacts, for pictures without a tooltip.
NOWHERE="1279 799"
# Size of the window, points. tests/ui/layout.rs holds the window to the places of the scripts.
WINDOW="1280 800"

work=$(mktemp -d)
pictures=${pictures:-$work/pictures}
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
has_window() { window=$(xdotool search --onlyvisible --name Longember 2>/dev/null | tail -n 1) && [ -n "$window" ]; }
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
# Two pictures with nothing done between them are the same, so that a difference later means something.
settled() { shoot "$1" && sleep 0.3 && shoot "$work/again.png" && ! differ "$1" "$work/again.png"; }
is_gone() { ! kill -0 "$program_pid" 2>/dev/null; }

# A display of its own.
open_display() {
    Xvfb -displayfd 3 -screen 0 1400x900x24 -nolisten tcp -noreset 3>"$work/display" >"$work/xvfb" 2>&1 &
    xvfb_pid=$!
    has_display() { [ -s "$work/display" ]; }
    until_true "a display" has_display
    DISPLAY=:$(cat "$work/display")
    export DISPLAY
}

# open_window ARGUMENTS...: starts the program and waits until its window is there, painted and has the keyboard.
open_window() {
    "${alone[@]}" DISPLAY="$DISPLAY" "$program" "$@" >"$work/results" 2>"$work/messages" &
    program_pid=$!
    until_true "a window" has_window
    until_true "a painted window" is_painted
    until_true "a window of $WINDOW points" has_size
    xdotool windowfocus --sync "$window"
}

# close_window: by key; everything must have gone well.
close_window() {
    local round code=0
    xdotool key --clearmodifiers ctrl+q
    for ((round = 0; round < MOST_ROUNDS; round++)); do
        is_gone && break
        sleep 0.1
    done
    is_gone || fail "the window does not close"
    wait "$program_pid" || code=$?
    program_pid=""
    [ "$code" -eq 0 ] || fail "the exit code is $code"
    ! grep -qi 'panicked' "$work/messages" || fail "something panicked"
    [ ! -s "$work/results" ] || fail "there is something on standard output"
}
