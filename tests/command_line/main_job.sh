#!/usr/bin/env bash
# The main job without a window, with the program as it is shipped: numbers in their published limits, exit codes,
# a scenario from demo to file to table and back.
#
#   tests/command_line/main_job.sh [PROGRAM]
set -euo pipefail

root=$(cd "$(dirname "$0")/../.." && pwd)
program=$(realpath "${1:-$root/target/release/longember}")
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cd "$work"

fail() {
    echo "main job: $*" >&2
    exit 1
}

# The program in an empty environment, as a script on a server would start it.
longember() { env -i HOME="$work" LONGEMBER_CACHE_DIR="$work/cache" "$program" "$@"; }

# exits CODE WORDS...: runs and compares the exit code; results and messages are kept in files.
exits() {
    local wanted=$1 code=0
    shift
    longember "$@" >results 2>messages || code=$?
    [ "$code" -eq "$wanted" ] || fail "longember $* exits with $code, not $wanted: $(cat messages)"
    if [ "$wanted" -eq 0 ]; then
        [ ! -s messages ] || fail "longember $* succeeds with a message: $(cat messages)"
    else
        [ ! -s results ] || fail "longember $* fails with something on standard output"
        ! grep -qi panicked messages || fail "longember $* panics"
    fi
}

# value KEY: the first value of a key in the JSON results.
value() { sed -nE "s/^ *\"$1\": \"?([^\",]*)\"?,?\$/\1/p" results | head -n 1; }

# between KEY LOWEST HIGHEST
between() {
    awk -v value="$(value "$1")" -v low="$2" -v high="$3" 'BEGIN { exit !(value != "" && value + 0 >= low && value + 0 <= high) }' ||
        fail "$1 is $(value "$1"), allowed $2 to $3"
}

is() { [[ $(value "$1") =~ ^($2)$ ]] || fail "$1 is $(value "$1"), not $2"; }

# The Sun of today: IAU 2015 nominal values.
exits 0 star --mass 1 --at 4.57Gyr --format json
between luminosity_lsun 0.99 1.01
between radius_rsun 0.98 1.02
between effective_temperature_k 5712 5832
is phase main_sequence

exits 0 star --mass 5 --at 90Myr --format json
is phase main_sequence
exits 0 star --mass 1 --at 20Gyr --format json
is phase carbon_oxygen_white_dwarf
between mass_msun 0.50 0.56
exits 0 star --mass 25 --at 1Gyr --format json
is phase 'neutron_star|black_hole'
between mass_msun 1.1 25
exits 3 star --mass 0.01 --at 1Gyr
grep -q 'mass' messages || fail "a refused mass is not named: $(cat messages)"

# A scenario on its way through files.
exits 0 demo
grep -q '^sunlike_five_worlds ' results || fail "the demo is not listed"
exits 0 demo sunlike_five_worlds --out mine.ron
sed -i 's/mass_msun: 1,/mass_msun: 1.2,/' mine.ron
exits 0 state mine.ron --at "2 trillion years" --format json
is time_yr '2e12|2000000000000(\.0)?'
exits 0 state mine.ron --at now --format json
between mass_msun 1.199 1.2
between luminosity_lsun 2 3
for format in csv json ecsv; do
    exits 0 table mine.ron --points 200 --out "life.$format"
    [ "$(wc -c <"life.$format")" -gt 10000 ] || fail "life.$format is too short"
done
[ "$(wc -l <life.csv)" -eq 201 ] || fail "life.csv has $(wc -l <life.csv) lines, not a header and 200 rows"
! grep -qiE '(^|,)[-+]?(nan|inf|infinity)(,|$)' life.csv || fail "life.csv holds what is not a number"
exits 4 table mine.ron --out life.csv
exits 0 events mine.ron --format csv
grep -q ',engulfed,' results || fail "no planet is swallowed"
grep -q ',main_sequence_end,' results || fail "the main sequence does not end"
exits 0 sources
[ "$(wc -l <results)" -gt 50 ] || fail "the list of sources is short"

# What goes wrong says so.
exits 2 star --mass heavy --at 1Gyr
exits 2 state mine.ron
exits 4 state missing.ron --at now
sed -i 's/bond_albedo: 0.1,/bond_albedo: 1.4,/; s/mass_msun: 1.2,/mass_msun: -1,/' mine.ron
exits 3 state mine.ron --at now
[ "$(grep -cE 'mine\.ron:[0-9]+:[0-9]+' messages)" -eq 2 ] || fail "not every problem has its place: $(cat messages)"

echo "main job: numbers, files and exit codes hold"
