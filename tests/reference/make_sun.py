#!/usr/bin/env python3
"""The Sun's apparent longitude of date at 0 h UT, from ERFA, the free edition of the IAU's SOFA routines.

    python3 tests/reference/make_sun.py

writes tests/reference/data/sun.json: days from 1900 to 2100 with the longitude in radians. The Earth is epv00 (a
series fitted to JPL DE405, 1900 to 2100), precession and nutation are IAU 2006/2000A, light takes its time to reach
us. Needs python3-erfa (Debian).
"""
import json
import math
from datetime import date, timedelta
from pathlib import Path

import erfa
import numpy as np

DATA = Path(__file__).parent / "data"
LIGHT_DAY = 499.004783836 / 86400  # of an astronomical unit, IAU 2012 and CODATA
J2000 = 2451545.0


def delta_t(year):
    """TT − UT, s: a rough course through the tables of Morrison and Stephenson; 10 s are 0.4 arcseconds."""
    known = [(1900, -3), (1920, 21), (1950, 29), (1980, 51), (2000, 64), (2020, 69), (2100, 150)]
    return float(np.interp(year, *zip(*known)))


def longitude(day):
    year = 2000 + day / 365.25
    t = J2000, day + delta_t(year) / 86400
    # Light left the Sun 499 s before: the Earth moves on, the Sun all but stands.
    earth = erfa.epv00(t[0], t[1] - LIGHT_DAY)[0]["p"]
    sun = erfa.rxp(erfa.pnm06a(*t), -np.asarray(earth))
    tilt = erfa.obl06(*t) + erfa.nut06a(*t)[1]
    across = sun[1] * math.cos(tilt) + sun[2] * math.sin(tilt)
    return math.atan2(across, sun[0]) % (2 * math.pi)


if __name__ == "__main__":
    cases = []
    for k in range(400):
        name = date(1900, 1, 1) + timedelta(days=183 * k + 7)
        day = (name - date(2000, 1, 1)).days - 0.5
        cases.append(dict(day=name.isoformat(), longitude=longitude(day)))
    (DATA / "sun.json").write_text(json.dumps(cases) + "\n")
    print(len(cases), cases[-1])
