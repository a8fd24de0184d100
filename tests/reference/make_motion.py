#!/usr/bin/env python3
"""Reference figures for natural periods and transits, computed with NumPy and SciPy.

Shares nothing with the engine. The equations of motion are taken as they stand (strong form) and collocated
at Chebyshev points on segments between the places where something jumps; the frequency enters the boundary
conditions, and the pencil is solved whole by the QZ algorithm, which finds every mode to a few digits. Each is
then settled by shooting: the motion is integrated from the anchor upwards with DOP853 at 1e-12, and the
frequency is the root of what is left over at the top. Transits are integrated with DOP853.

    python3 tests/reference/make_motion.py

writes tests/reference/data/periods.json and transits.json. Needs python3-numpy and python3-scipy (1.10 or later).
"""
import json
import math
from pathlib import Path

import numpy as np
from scipy.integrate import solve_ivp
from scipy.linalg import eig
from scipy.optimize import brentq

DATA = Path(__file__).parent / "data"
random = np.random.default_rng(20261201)

EARTH = dict(gm=3.986004418e14, radius=6378137.0, rate=7.292115e-5, j2=0.0)
MARS = dict(gm=4.2828375e13, radius=3396190.0, rate=2 * math.pi / 88642.66, j2=0.0)
CERES = dict(gm=6.26284e10, radius=482000.0, rate=2 * math.pi / (9.07417 * 3600), j2=0.0)


class Body:
    def __init__(self, gm, radius, rate, j2):
        self.gm, self.base, self.omega, self.j2 = gm, radius, rate, j2
        self.site = dict(kind="own", gm=gm, radius=radius, rate=rate, j2=j2)
        self.balance = brentq(self.g, radius, 1e3 * radius, xtol=1e-6, rtol=1e-15)

    def g(self, r):
        return (
            self.gm / r**2 - self.omega**2 * r + 1.5 * self.j2 * self.gm * self.base**2 / r**4
        )

    def potential(self, r):
        return (
            -self.gm / r
            - self.omega**2 * r**2 / 2
            - 0.5 * self.j2 * self.gm * self.base**2 / r**3
        )

    def along(self, r):
        return -2 * self.gm / r**3 - self.omega**2 - 6 * self.j2 * self.gm * self.base**2 / r**5

    def in_plane(self, r):
        return self.g(r) / r

    def out_of_plane(self, r):
        return self.gm / r**3 + 4.5 * self.j2 * self.gm * self.base**2 / r**5


class Moon:
    """A line from a moon, towards its primary or away from it."""

    def __init__(self, side, primary, moon, radius, distance):
        self.t = -1 if side == "near" else 1
        self.m1, self.m2, self.d, self.base = primary, moon, distance, radius
        self.omega = math.sqrt((primary + moon) / distance**3)
        self.x2 = distance * primary / (primary + moon)
        self.site = dict(
            kind="moon", side=side, moonGm=moon, moonRadius=radius, primaryGm=primary, distance=distance
        )
        hill = distance * (moon / (3 * primary)) ** (1 / 3)
        self.balance = brentq(self.g, 0.5 * hill, 1.5 * hill, xtol=1e-6, rtol=1e-15)

    def g(self, s):
        t, w2 = self.t, self.omega**2
        return self.m2 / s**2 + t * self.m1 / (self.d + t * s) ** 2 - t * w2 * (self.x2 + t * s)

    def potential(self, s):
        t = self.t
        return (
            -self.m2 / s
            - self.m1 / (self.d + t * s)
            - self.omega**2 * (self.x2 + t * s) ** 2 / 2
        )

    def along(self, s):
        return -2 * self.m2 / s**3 - 2 * self.m1 / (self.d + self.t * s) ** 3 - self.omega**2

    def out_of_plane(self, s):
        return self.m2 / s**3 + self.m1 / (self.d + self.t * s) ** 3

    def in_plane(self, s):
        return self.out_of_plane(s) - self.omega**2


def chebyshev(n):
    x = -np.cos(np.pi * np.arange(n + 1) / n)
    c = np.hstack([2, np.ones(n - 1), 2]) * (-1.0) ** np.arange(n + 1)
    dx = x[:, None] - x[None, :]
    d = np.outer(c, 1 / c) / (dx + np.eye(n + 1))
    return x, d - np.diag(d.sum(axis=1))


class Case:
    def __init__(self, field, density, area, top, counterweight, masses, modulus):
        self.field, self.density, self.area, self.top = field, density, area, top
        self.counterweight, self.masses, self.modulus = counterweight, masses, modulus

    def tension(self, r, pull):
        """T just above r; `pull(a, b)` is ∫ ρ A g dr."""
        above = sum(m * self.field.g(x) for x, m in self.masses if x > r * (1 + 1e-14))
        return -self.counterweight * self.field.g(self.top) - pull(r, self.top) - above


def segments(case):
    stops = sorted({case.field.base, case.field.balance, case.top, *(r for r, _ in case.masses)})
    edges = []
    for a, b in zip(stops, stops[1:]):
        pieces = max(1, math.ceil(math.log(b / a) / math.log(1.7)))
        edges += list(np.geomspace(a, b, pieces + 1)[:-1])
    return [*edges, case.top]


def blocks(case, pull, families, n):
    """Matrices A, B of (A − λ B) q = 0 for one family, or the parts of the coupled problem."""
    edges = segments(case)
    x, d = chebyshev(n)
    size = (len(edges) - 1) * (n + 1)
    out = []
    for slope, slope_rate, stiffness in families:
        A, B = np.zeros((size, size)), np.zeros((size, size))
        for e, (a, b) in enumerate(zip(edges, edges[1:])):
            half = (b - a) / 2
            r = a + half * (1 + x)
            D = d / half
            rows = slice(e * (n + 1), (e + 1) * (n + 1))
            mu = case.density * case.area(r)
            # T just above the lower end holds inside the whole segment: no mass lies within.
            local = -(np.diag(slope(r, a)) @ D @ D + np.diag(slope_rate(r)) @ D)
            A[rows, rows] = np.diag(1 / mu) @ local + np.diag(stiffness(r))
            B[rows, rows] = np.eye(n + 1)
        # What holds at the ends stands in place of the equations there.
        for e, (a, b) in enumerate(zip(edges, edges[1:])):
            D = d / ((b - a) / 2)
            rows = slice(e * (n + 1), (e + 1) * (n + 1))
            first, last = e * (n + 1), (e + 1) * (n + 1) - 1
            if e == 0:
                A[first, :], B[first, :] = 0, 0
                A[first, first] = 1
            if e + 1 < len(edges) - 1:
                c = (edges[e + 2] - b) / 2
                A[last, :], B[last, :] = 0, 0
                A[last, last], A[last, last + 1] = 1, -1
                lump = sum(m for at, m in case.masses if abs(at - b) < 1e-6 * b)
                above, below = slope(np.array([b]), b)[0], slope(np.array([b]), a)[0]
                following = slice(last + 1, last + 2 + n)
                A[last + 1, :], B[last + 1, :] = 0, 0
                scale = max(abs(above), abs(below)) / b
                A[last + 1, following] = -above * (d[0] / c) / scale
                A[last + 1, rows] += below * D[-1] / scale
                A[last + 1, last + 1] += lump * stiffness(b) / scale
                B[last + 1, last + 1] = lump / scale
            else:
                A[last, :], B[last, :] = 0, 0
                scale = abs(slope(np.array([b]), a)[0]) / b + case.counterweight * abs(stiffness(b))
                A[last, rows] = slope(np.array([b]), a)[0] * D[-1] / scale
                A[last, last] += case.counterweight * stiffness(b) / scale
                B[last, last] = case.counterweight / scale
        out.append((A, B))
    return out


def finite_real(values, limit):
    good = [v.real for v in values if np.isfinite(v) and abs(v) < limit and abs(v.imag) < 1e-6 * abs(v)]
    return sorted(good)


def families(case, pull, area_rate):
    T = lambda r, a: np.array([case.tension(max(a, 0) * (1 + 1e-12), pull) + pull(a, x) for x in r])
    rate = lambda r: case.density * case.area(r) * case.field.g(r)
    EA = lambda r, a: case.modulus * case.area(r)
    return dict(
        inPlane=(T, rate, case.field.in_plane),
        outOfPlane=(T, rate, case.field.out_of_plane),
        along=(EA, lambda r: case.modulus * area_rate(r), case.field.along),
    )


def periods(case, pull, area_rate, n):
    w2 = case.field.omega**2
    found = {}
    parts = families(case, pull, area_rate)
    pencils = dict(zip(parts, blocks(case, pull, parts.values(), n)))
    for name, (A, B) in pencils.items():
        values = eig(A / w2, B, right=False)
        found[name] = [v * w2 for v in finite_real(values, 1e7)[:3]]
    # λ ↦ Ω²: rows of the coupled problem with x = a cos Ωt, y = b sin Ωt; where B is 0 nothing couples.
    (Ax, Bx), (Ay, By) = pencils["along"], pencils["inPlane"]
    N = len(Ax)
    Z, I = np.zeros((N, N)), np.eye(N)
    w = case.field.omega
    K = np.block([[Ax / w2, Z], [Z, Ay / w2]])
    M = np.block([[Bx, Z], [Z, By]])
    C = np.block([[Z, 2 * Bx], [2 * By, Z]])
    # (K + s C − s² M) q = 0, s = Ω/ω, as a pencil in s.
    left = np.block([[np.zeros((2 * N, 2 * N)), np.eye(2 * N)], [K, C]])
    right = np.block([[np.eye(2 * N), np.zeros((2 * N, 2 * N))], [np.zeros((2 * N, 2 * N)), M]])
    values = [v for v in finite_real(eig(left, right, right=False), 1e4) if v > 0]
    found["coupled"] = [(v * w) ** 2 for v in values[:4]]
    return found


def taper_case(field, density, stress, base_area, top, excess, climbers, modulus):
    k = density / stress
    area = lambda r: base_area * np.exp(k * (field.potential(r) - field.potential(field.base)))
    area_rate = lambda r: k * field.g(r) * area(r)
    pull = lambda a, b: stress * (area(b) - area(a))
    counterweight = excess * stress * area(top) / -field.g(top)
    section = dict(kind="taper", baseArea=base_area, designStress=stress, top=top)
    return Case(field, density, area, top, counterweight, climbers, modulus), pull, area_rate, section


def uniform_case(field, density, base_area, top, base_tension, climbers, modulus):
    area = lambda r: base_area * np.ones_like(r)
    pull = lambda a, b: density * base_area * (field.potential(b) - field.potential(a))
    counterweight = (base_tension + pull(field.base, top)) / -field.g(top)
    section = dict(kind="stepped", sections=[dict(to=top, area=base_area)])
    return Case(field, density, area, top, counterweight, climbers, modulus), pull, lambda r: 0 * r, section


def stated(case, section):
    return dict(
        site=case.field.site,
        density=case.density,
        section=section,
        masses=[dict(radius=r, mass=m) for r, m in case.masses],
        counterweight=case.counterweight,
        modulus=case.modulus,
        count=3,
    )


def shoot(case, parts, lam, starts, coriolis):
    """What is left over at the top when the anchor is pulled at: one column for each start."""
    field = case.field
    edges = sorted({field.base, field.balance, case.top, *(r for r, _ in case.masses)})
    columns = []
    # A slope of one over the anchor's radius: then y is of the size of 1 all along.
    force = [slope(np.array([field.base]), field.base)[0] / field.base for slope, _, _ in parts]
    size = np.array([x for f in force for x in (1, f)])
    for state in np.array(starts, dtype=float) * size:
        for a, b in zip(edges, edges[1:]):

            def rate(r, q, a=a):
                mu = case.density * case.area(r)
                out = []
                for n, (slope, _, stiffness) in enumerate(parts):
                    y, f = q[2 * n], q[2 * n + 1]
                    out += [f / slope(np.array([r]), a)[0], mu * (stiffness(r) - lam) * y]
                if coriolis:
                    out[1] += mu * coriolis * q[2]
                    out[3] += mu * coriolis * q[0]
                return out

            step = solve_ivp(rate, (a, b), state, method="DOP853", rtol=1e-12, atol=1e-12 * size)
            state = step.y[:, -1].copy()
            lump = sum(m for r, m in case.masses if abs(r - b) < 1e-9 * b)
            lump += case.counterweight if b == case.top else 0
            y = state[::2].copy()
            for n, (_, _, stiffness) in enumerate(parts):
                state[2 * n + 1] += lump * (stiffness(b) - lam) * y[n]
            if coriolis:
                state[1] += lump * coriolis * y[1]
                state[3] += lump * coriolis * y[0]
        columns.append(state[1::2] / force)
    return np.array(columns)


def settle(left_over, guess):
    """The root next to a guess that is right to a few per cent; None where there is not just one."""
    for width in (2e-3, 1e-2, 5e-2):
        points = guess * np.linspace(1 - width, 1 + width, 8)
        signs = np.sign([left_over(x) for x in points]) if guess > 0 else np.ones(8)
        changes = np.nonzero(signs[1:] != signs[:-1])[0]
        if len(changes) == 1:
            a, b = points[changes[0]], points[changes[0] + 1]
            return brentq(left_over, a, b, xtol=1e-14 * guess, rtol=1e-13)
    return None


def settled(case, pull, area_rate):
    rough = periods(case, pull, area_rate, 17)
    parts = families(case, pull, area_rate)
    w = case.field.omega
    found = {}
    for name, part in parts.items():
        f = lambda lam: shoot(case, [part], lam, [[0, 1]], 0)[0, 0]
        found[name] = [settle(f, lam) for lam in rough[name][:2]]
    pair = [parts["along"], parts["inPlane"]]
    f = lambda s: np.linalg.det(shoot(case, pair, s * s, [[0, 1, 0, 0], [0, 0, 0, 1]], 2 * w * s))
    roots = [settle(f, math.sqrt(lam)) for lam in rough["coupled"][:3]]
    found["coupled"] = [root and root**2 for root in roots]
    return found


def make_periods():
    lunar = dict(primary=3.986004418e14, moon=4.902800066e12, radius=1737400.0, distance=3.844e8)
    fields = [
        Body(**EARTH),
        Body(**{**EARTH, "j2": 1.08263e-3}),
        Body(**MARS),
        Body(**CERES),
        Moon("near", **lunar),
        Moon("far", **lunar),
        Body(gm=8e14, radius=9e6, rate=5e-5, j2=0.0),
    ]
    cases = []
    for n in range(30):
        field = fields[n % len(fields)]
        limit = field.d - 2e7 if isinstance(field, Moon) and field.t < 0 else 6 * field.balance
        top = field.balance + random.uniform(0.15, 0.9) * (min(limit, 4 * field.balance) - field.balance)
        rise = field.potential(field.balance) - field.potential(field.base)
        density = random.uniform(900, 2500)
        stress = density * rise / random.uniform(0.05, 4)
        base_area = 10 ** random.uniform(-6, -4)
        weight = stress * base_area
        climbers = [
            (float(r), float(random.uniform(0.01, 0.1) * weight / abs(field.g(field.base))))
            for r in np.sort(random.uniform(field.base * 1.01, field.balance * 0.95, n % 3))
        ]
        modulus = stress * 10 ** random.uniform(1, 2)
        if n % 4 == 3:
            built = uniform_case(
                field, density, base_area, top, density * base_area * rise * random.uniform(0.3, 2), climbers, density * rise * 10 ** random.uniform(1, 2)
            )
        else:
            built = taper_case(
                field, density, stress, base_area, top, random.uniform(1, 1.3), climbers, modulus
            )
        case, pull, area_rate, section = built
        found = settled(case, pull, area_rate)
        # Two guesses near each other may settle on one root: then the other was missed.
        apart = all(len(set(np.float32(values))) == len(values) for values in found.values() if None not in values)
        if apart and all(v is not None and v > 0 for values in found.values() for v in values):
            cases.append(dict(input=stated(case, section), expected=found))
    return cases


def make_transits():
    """Speed min(v_max, η P/(m |g|)) integrated in time until the far end is reached."""
    cases = []
    for n in range(40):
        field = Body(**(EARTH, MARS, CERES)[n % 3])
        start = field.base * random.uniform(1.0, 1.2) if n % 4 else field.base
        end = field.balance * random.uniform(0.8, 2.5)
        mass = 10 ** random.uniform(2.5, 4.5)
        efficiency = random.uniform(0.5, 1)
        top_speed = random.uniform(20, 120)
        kink = field.balance * random.uniform(0.2, 0.8)
        power = mass * field.g(kink) * top_speed / efficiency
        recovery = random.uniform(0, 0.9)

        def speed(r):
            pull = abs(field.g(r)) * mass
            return top_speed if pull * top_speed <= efficiency * power else efficiency * power / pull

        def slowness(s, _):
            r = start + s
            return [1 / speed(r), mass * max(field.g(r), 0) / efficiency, mass * max(-field.g(r), 0)]

        turns = [start, end, field.balance]
        level = efficiency * power / (mass * top_speed)
        for sign in (1, -1):
            f = lambda r: field.g(r) - sign * level
            for a, b in ((field.base, field.balance), (field.balance, 50 * field.balance)):
                if f(a) * f(b) < 0:
                    turns.append(brentq(f, a, b, xtol=1e-9, rtol=1e-15))
        turns = sorted(r for r in set(turns) if start <= r <= end)
        total = np.zeros(3)
        for a, b in zip(turns, turns[1:]):
            step = solve_ivp(
                slowness, (a - start, b - start), [0, 0, 0], method="DOP853", rtol=1e-12, atol=1e-6
            )
            total += step.y[:, -1]
        cases.append(
            dict(
                input=dict(
                    site=field.site,
                    mass=mass,
                    **{"from": start},
                    to=end,
                    topSpeed=top_speed,
                    power=power,
                    efficiency=efficiency,
                    recovery=recovery,
                ),
                expected=dict(
                    time=total[0],
                    energy=total[1],
                    braked=total[2],
                    recovered=total[2] * recovery,
                    greatestSideForce=2 * mass * field.omega * max(speed(r) for r in turns),
                ),
            )
        )
    return cases


for name, cases in (("periods", make_periods()), ("transits", make_transits())):
    (DATA / f"{name}.json").write_text(json.dumps(cases, indent="\t") + "\n")
    print(name, len(cases))
