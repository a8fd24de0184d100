#!/usr/bin/env python3
"""Conversion factors from GNU units (Debian package `units`), for every unit that may be typed.

The names are written out here with GNU units' own spelling; the coherent SI unit is named likewise.

    python3 tests/reference/make_units.py

writes tests/reference/data/units.json. Needs the program `units` (2.22 or later).
"""
import json
import subprocess
from pathlib import Path

DATA = Path(__file__).parent / "data"
ALL = "E P T G M k h da d c m µ u n p f".split()
LARGE = "k M G T".split()
SMALL = "m µ u n".split()

# Name as typed in a note: GNU units' spelling, coherent SI unit, prefixes.
UNITS = {
    "m": ("m", "m", ALL),
    "g": ("g", "kg", ALL),
    "s": ("s", "s", ALL),
    "A": ("A", "A", ALL),
    "K": ("K", "K", ALL),
    "mol": ("mol", "mol", ALL),
    "cd": ("cd", "cd", ALL),
    "rad": ("radian", "radian", SMALL),
    "sr": ("sr", "sr", []),
    "Hz": ("Hz", "1/s", ALL),
    "N": ("N", "kg m/s^2", ALL),
    "Pa": ("Pa", "kg/(m s^2)", ALL),
    "J": ("J", "kg m^2/s^2", ALL),
    "W": ("W", "kg m^2/s^3", ALL),
    "C": ("coulomb", "A s", ALL),
    "V": ("V", "kg m^2/(A s^3)", ALL),
    "F": ("farad", "A^2 s^4/(kg m^2)", ALL),
    "ohm": ("ohm", "kg m^2/(A^2 s^3)", ALL),
    "Ω": ("ohm", "kg m^2/(A^2 s^3)", ALL),
    "min": ("minute", "s", []),
    "h": ("hour", "s", []),
    "d": ("day", "s", []),
    "day": ("day", "s", []),
    "au": ("astronomicalunit", "m", []),
    "deg": ("degree", "radian", []),
    "°": ("degree", "radian", []),
    "arcmin": ("arcmin", "radian", []),
    "arcsec": ("arcsec", "radian", []),
    "ha": ("hectare", "m^2", []),
    "L": ("liter", "m^3", ALL),
    "l": ("liter", "m^3", ALL),
    "t": ("tonne", "kg", LARGE),
    "eV": ("electronvolt", "kg m^2/s^2", ALL),
    "tex": ("tex", "kg/m", ALL),
    "den": ("denier", "kg/m", []),
    "%": ("percent", "1", []),
    "ppm": ("ppm", "1", []),
    "week": ("week", "s", []),
    "yr": ("julianyear", "s", []),
    "bar": ("bar", "kg/(m s^2)", ["m", "k", "M"]),
    "atm": ("atm", "kg/(m s^2)", []),
    "Wh": ("watt hour", "kg m^2/s^2", LARGE),
    "kgf": ("kgf", "kg m/s^2", []),
    "in": ("inch", "m", []),
    "inch": ("inch", "m", []),
    "ft": ("foot", "m", []),
    "yd": ("yard", "m", []),
    "mi": ("mile", "m", []),
    "nmi": ("nauticalmile", "m", []),
    "lb": ("pound", "kg", []),
    "lbf": ("lbf", "kg m/s^2", []),
    "kip": ("kip", "kg m/s^2", []),
    "psi": ("psi", "kg/(m s^2)", []),
    "ksi": ("ksi", "kg/(m s^2)", []),
    "Msi": ("1e6 psi", "kg/(m s^2)", []),
}
SPELLED = dict(zip(ALL, "exa peta tera giga mega kilo hecto deca deci centi milli micro micro nano pico femto".split()))


def factor(have, want):
    out = subprocess.run(
        ["units", "-1", "-t", "-o", "%.17g", have, want], capture_output=True, text=True
    )
    return float(out.stdout.split()[0])


factors = {}
for name, (spelling, si, prefixes) in UNITS.items():
    factors[name] = factor(spelling, si)
    for prefix in prefixes:
        if prefix + name not in UNITS:
            factors[prefix + name] = factor(f"1 {SPELLED[prefix]} {spelling}", si)
(DATA / "units.json").write_text(json.dumps(factors, indent="\t", ensure_ascii=False) + "\n")
print(len(factors))
