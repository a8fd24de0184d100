"""The field along a line at 40 digits, as textbooks write it, and places for lines drawn at random."""
import math
import random

from mpmath import findroot, log, log10, mp, mpf

mp.dps = 40
draw = random.Random(20261201)

# WGS 84 (NIMA TR 8350.2); JPL and IAU WGCCRE; Dawn. Rates are rounded to doubles, as a caller's are.
BODIES = {
    "earth": (3.986004418e14, 6378137.0, 7.292115e-5, 1.08263e-3),
    "mars": (4.2828375e13, 3396190.0, 2 * math.pi / 88642.66, 1.96045e-3),
    "ceres": (6.26284e10, 482000.0, 2 * math.pi / (9.07417 * 3600), 0.0),
}


class Field:
    """g, U, V = ∫U dr and stiffnesses, each as it stands."""

    def __init__(self, site):
        if site["kind"] == "moon":
            m, p, d = (mpf(site[key]) for key in ("moonGm", "primaryGm", "distance"))
            t = -1 if site["side"] == "near" else 1
            self.base, rate2, x2 = mpf(site["moonRadius"]), (m + p) / d**3, d * p / (m + p)
            self.g = lambda r: m / r**2 + t * p / (d + t * r) ** 2 - t * rate2 * (x2 + t * r)
            self.u = lambda r: -m / r - p / (d + t * r) - rate2 * (x2 + t * r) ** 2 / 2
            self.v = lambda r: -m * log(r) - t * p * log(d + t * r) - t * rate2 * (x2 + t * r) ** 3 / 6
            self.kx = lambda r: -2 * m / r**3 - 2 * p / (d + t * r) ** 3 - rate2
            self.kz = lambda r: m / r**3 + p / (d + t * r) ** 3
            self.ky = lambda r: self.kz(r) - rate2
            high = d if t < 0 else 3 * d
        else:
            if site["kind"] == "body":
                gm, radius, rate, j2 = map(mpf, BODIES[site["body"]])
                j2 = j2 if site["j2"] else mpf(0)
            else:
                gm, radius, rate, j2 = (mpf(site[key]) for key in ("gm", "radius", "rate", "j2"))
            self.base, flat = radius, j2 * gm * radius**2
            self.g = lambda r: gm / r**2 - rate**2 * r + mpf(3) / 2 * flat / r**4
            self.u = lambda r: -gm / r - rate**2 * r**2 / 2 - flat / r**3 / 2
            self.v = lambda r: -gm * log(r) - rate**2 * r**3 / 6 + flat / r**2 / 4
            self.kx = lambda r: -2 * gm / r**3 - rate**2 - 6 * flat / r**5
            self.ky = lambda r: self.g(r) / r
            self.kz = lambda r: gm / r**3 + mpf(9) / 2 * flat / r**5
            high = 2 * (gm / rate**2) ** (mpf(1) / 3) + 10 * radius
        self.balance = bisect(self.g, self.base / 1000, high)


def bisect(f, low, high):
    """A root between two places where f has opposite signs: halving, then secants at full precision."""
    width = (high - low) * mpf(10) ** -30
    low, high = low + width, high - width
    positive = f(low) > 0
    for _ in range(50):
        middle = (low + high) / 2
        low, high = (middle, high) if (f(middle) > 0) == positive else (low, middle)
    return findroot(f, (low, high), solver="illinois", verify=False, maxsteps=30)


def decades(a, b):
    return 10 ** draw.uniform(a, b)


def random_site():
    kind = draw.choice(("body", "own", "own", "moon", "moon"))
    if kind == "body":
        body = draw.choice(list(BODIES))
        return dict(kind=kind, body=body, j2=draw.random() < 0.5)
    if kind == "own":
        radius = decades(2, 8)
        gm = 4 / 3 * math.pi * 6.674e-11 * draw.uniform(500, 6000) * radius**3
        balance = radius * (1 + decades(-3, 2.5))
        j2 = draw.choice((0.0, 0.0, decades(-5, -1)))
        return dict(kind=kind, gm=gm, radius=radius, rate=math.sqrt(gm / balance**3), j2=j2)
    primary, distance = decades(8, 17), decades(6, 9)
    moon = primary * decades(-9, -0.6)
    hill = distance * (moon / primary / 3) ** (1 / 3)
    side = draw.choice(("near", "far"))
    radius = hill * decades(-2.5, -0.4)
    return dict(kind=kind, side=side, moonGm=moon, primaryGm=primary, moonRadius=radius, distance=distance)


def upper(field, site, least=-8.5):
    """A radius above the balance radius: from a hair to far beyond."""
    beyond = field.balance * (1 + mpf(decades(least, 1)))
    if site["kind"] == "moon" and site["side"] == "near":
        beyond = min(beyond, field.balance + (mpf(site["distance"]) - field.balance) * mpf(draw.uniform(0.05, 0.95)))
    return float(beyond)


def told(value):
    value = mpf(value)
    return dict(log10=float(log10(value))) if value > mpf(10) ** 300 else float(value)


def graded(near, far, count=14):
    """Panels that halve towards `near`."""
    edges = sorted([near] + [near + (far - near) / mpf(2) ** i for i in range(count)])
    return edges


