#!/usr/bin/env python3
"""Reference figures for numerical tools, computed with mpmath at 40 digits.

    python3 tests/reference/make_numerics.py

writes tests/reference/data/{erf,integrals}.json. Needs python3-mpmath.
"""
import json
from pathlib import Path

from mpmath import erf, erfc, exp, inf, log, mp, mpf, quad

mp.dps = 40
DATA = Path(__file__).parent / "data"


def error_function():
    points = [i / 10 for i in range(-60, 61)] + [1e-8, 1e-3, 2.4999, 2.5001, 8, 12, 25]
    return [dict(x=x, erf=float(erf(mpf(x))), erfc=float(erfc(mpf(x)))) for x in points]


def integrals():
    """Integrals with closed forms or at 40 digits, to hold the quadrature against."""
    return dict(
        gaussian=float(quad(lambda x: exp(-(x**2) * 1e6), [-1, -0.01, 0, 0.01, 1])),
        logarithm=float(quad(lambda x: log(1 + x) / x, [mpf("1e-3"), 1])),
        decay=float(quad(lambda x: exp(-x), [0, inf])),
    )


if __name__ == "__main__":
    DATA.mkdir(exist_ok=True)
    for name, rows in dict(erf=error_function(), integrals=integrals()).items():
        (DATA / f"{name}.json").write_text(json.dumps(rows, indent="\t") + "\n")
        print(name, len(rows))
