#!/usr/bin/env python3
"""Reference figures for sizing on known bodies, computed with mpmath at 40 digits and SciPy.

Shares nothing with the engine: constants are written out again from their sources, the potential is
used as it stands (no factoring), radii come from root finding, masses from tanh-sinh quadrature.

    python3 tests/reference/make_sizing.py

writes tests/reference/data/{taper,field,mass,moon}.json. Needs python3-mpmath and python3-scipy (1.10 or later).
"""
import json
import math
from pathlib import Path

from mpmath import exp, findroot, mp, mpf, pi, quad
from scipy.integrate import solve_ivp

mp.dps = 40
DATA = Path(__file__).parent / "data"

# WGS 84 (NIMA TR 8350.2); JPL and IAU WGCCRE; Dawn. As strings, so that no digit is lost.
BODIES = {
    "earth": dict(gm="3.986004418e14", radius="6378137", rate="7.292115e-5", j2="1.08263e-3"),
    "mars": dict(gm="4.2828375e13", radius="3396190", period="88642.66", j2="1.96045e-3"),
    "ceres": dict(gm="6.26284e10", radius="482000", period="32667.012", j2="0"),
}


class Field:
    def __init__(self, name, with_j2):
        body = BODIES[name]
        self.gm = mpf(body["gm"])
        self.radius = mpf(body["radius"])
        self.omega = mpf(body["rate"]) if "rate" in body else 2 * pi / mpf(body["period"])
        self.j2 = mpf(body["j2"]) if with_j2 else mpf(0)

    def g(self, r):
        return (
            self.gm / r**2
            - self.omega**2 * r
            + mpf(3) / 2 * self.j2 * self.gm * self.radius**2 / r**4
        )

    def potential(self, r):
        return (
            -self.gm / r
            - self.omega**2 * r**2 / 2
            - self.j2 * self.gm * self.radius**2 / (2 * r**3)
        )

    def synchronous(self):
        return findroot(self.g, (self.gm / self.omega**2) ** (mpf(1) / 3))

    def free_standing(self):
        rs = self.synchronous()
        level = self.potential(self.radius)
        guess = self.radius / 2 * ((1 + 8 * (rs / self.radius) ** 3) ** mpf("0.5") - 1)
        return findroot(lambda r: (self.potential(r) - level) / level, guess)


def taper_case(name, with_j2, density, stress, top_height, lift, reserve):
    field = Field(name, with_j2)
    base, rs = field.radius, field.synchronous()
    top = base + mpf(top_height)
    rho, sigma = mpf(density), mpf(stress)
    u0 = field.potential(base)
    area0 = mpf(lift) * field.g(base) * (1 + mpf(reserve)) / sigma
    area = lambda r: area0 * exp(rho * (field.potential(r) - u0) / sigma)
    mass = lambda a, b: quad(
        lambda r: rho * area(r), [a + (b - a) * mpf(i) / 16 for i in range(17)]
    )
    below, above = mass(base, rs), mass(rs, top)
    counterweight = sigma * area(top) / -field.g(top)
    return dict(
        body=name,
        withJ2=with_j2,
        density=density,
        designStress=stress,
        topHeight=top_height,
        lift=lift,
        reserve=reserve,
        expected={
            key: float(value)
            for key, value in dict(
                taper=area(rs) / area0,
                baseArea=area0,
                synchronousArea=area(rs),
                topArea=area(top),
                massBelow=below,
                massAbove=above,
                mass=below + above,
                counterweight=counterweight,
                total=below + above + counterweight,
                synchronousRadius=rs,
                uniformPeak=rho * (field.potential(rs) - u0),
                freeStandingHeight=field.free_standing() - base,
            ).items()
        },
    )


def tapers():
    grid = []
    for name, tops in dict(
        earth=(60_000e3, 100_000e3, 144_000e3),
        mars=(25_000e3, 60_000e3),
        ceres=(1_500e3, 4_000e3),
    ).items():
        for top in tops:
            for density, stress in ((1300, 50e9), (1520, 60.4e9), (1440, 3.6e9), (7900, 5e9)):
                for with_j2 in (False, True) if name != "ceres" else (False,):
                    reserve = 0.25 if with_j2 else 0
                    grid.append((name, with_j2, density, stress, top, 20e3, reserve))
    return [taper_case(*row) for row in grid]


def field_values():
    rows = []
    for name in BODIES:
        for with_j2 in (False, True) if name != "ceres" else (False,):
            field = Field(name, with_j2)
            rs = field.synchronous()
            for a, b in (
                (field.radius, field.radius + 1),
                (field.radius, rs),
                (rs, rs * (1 + mpf("1e-6"))),
                (rs, 3 * rs),
            ):
                # The engine is given doubles: the reference starts from the same doubles.
                a, b = mpf(float(a)), mpf(float(b))
                rows.append(
                    dict(
                        body=name,
                        withJ2=with_j2,
                        a=float(a),
                        b=float(b),
                        g=float(field.g(b)),
                        rise=float(field.potential(b) - field.potential(a)),
                    )
                )
    return rows


def mass_by_integration():
    """A second method: the mass as an initial value problem, SciPy's DOP853."""
    field = Field("earth", False)
    base, rs, top = (float(x) for x in (field.radius, field.synchronous(), field.radius + 100_000_000))
    gm, omega = float(field.gm), float(field.omega)
    rows = []
    for stress in (50e9, 65e9):
        # State: ln(A/A0), mass per A0.
        def slope(r, y):
            g = gm / r**2 - omega**2 * r
            return [1300 * g / stress, 1300 * math.exp(y[0])]

        area0 = 20e3 * (gm / base**2 - omega**2 * base) / stress
        solution = solve_ivp(
            slope, (base, top), [0, 0], method="DOP853", rtol=1e-12, atol=1e-9, first_step=1e3
        )
        rows.append(dict(designStress=stress, mass=float(solution.y[1][-1] * area0)))
    return rows


def moon_l1():
    """Distance of L1 from the Moon's centre, circular problem at the mean distance (JPL DE440 GM)."""
    earth, moon, d = mpf("3.986004418e14"), mpf("4.902800066e12"), mpf(384_400_000)
    rate2 = (earth + moon) / d**3
    centre = d * earth / (earth + moon)
    pull = lambda s: moon / s**2 - earth / (d - s) ** 2 + rate2 * (centre - s)
    return dict(distance=float(findroot(pull, mpf(58_000_000))))


if __name__ == "__main__":
    DATA.mkdir(exist_ok=True)
    for name, rows in dict(
        taper=tapers(),
        field=field_values(),
        mass=mass_by_integration(),
        moon=moon_l1(),
    ).items():
        (DATA / f"{name}.json").write_text(json.dumps(rows, indent="\t") + "\n")
        print(name, len(rows))
