"""Reads a table of ours with astropy and compares it with the JSON of the same moments, to the last bit.

    python ecsv.py PROGRAM
"""
import json
import math
import struct
import subprocess
import sys
import tempfile
from pathlib import Path

from astropy import units
from astropy.table import Table

UNITS = {
    "time_yr": units.yr,
    "luminosity_lsun": units.solLum,
    "radius_rsun": units.solRad,
    "effective_temperature_k": units.K,
    "mass_msun": units.solMass,
    "mass_loss_msun_yr": units.solMass / units.yr,
    "talune_semi_major_axis_au": units.AU,
    "talune_star_angular_diameter_deg": units.deg,
    "exitance_w_m2": units.W / units.m**2,
}


def bits(value):
    return struct.pack("<d", value)


def main(program):
    words = [program, "table", "demo:sunlike_five_worlds", "--points", "150"]
    run = lambda *more: subprocess.run(words + list(more), check=True, capture_output=True).stdout
    with tempfile.TemporaryDirectory() as folder:
        path = Path(folder) / "life.ecsv"
        path.write_bytes(run("--format", "ecsv"))
        table = Table.read(path, format="ascii.ecsv")
    expected = json.loads(run("--format", "json"))
    assert table.colnames == [column["key"] for column in expected["columns"]]
    assert table.meta["title"] == expected["title"] and table.meta["program"] == expected["program"]
    assert len(table.meta["methods"]) == len(expected["methods"])
    for name, unit in UNITS.items():
        assert table[name].unit == unit, f"{name} has {table[name].unit}, not {unit}"
    for column in expected["columns"]:
        found, unit = table[column["key"]], column["unit"]
        assert (found.unit is None) == (unit is None), column["key"]
        assert found.unit is None or not isinstance(found.unit, units.UnrecognizedUnit), column["key"]
    compared = 0
    for index, row in enumerate(expected["rows"]):
        for key, value in row.items():
            cell = table[key][index]
            if value is None:
                assert getattr(cell, "mask", False) or cell == "" or math.isnan(cell), f"{key} in row {index}: {cell!r}"
            elif isinstance(value, str):
                assert cell == value, f"{key} in row {index}: {cell!r}"
            else:
                assert bits(float(cell)) == bits(float(value)), f"{key} in row {index}: {cell!r} and {value!r}"
                compared += 1
    assert compared > 5000, compared
    print(f"astropy reads {len(table.colnames)} columns with their units; {compared} values are equal to the last bit")


main(sys.argv[1])
