#!/usr/bin/env python3
"""Reference figures for release, reach, calendar, severed line, cut rate and spinning tether.

Shares nothing with the engine. Orbits come from position and velocity by vectors, in mpmath at 60 digits:
energy, angular momentum and the eccentricity vector, Kepler's equation as it stands, the calendar in three dimensions with
rotated axes; thresholds from polynomial roots and root finding. Falls are also integrated step by step with SciPy (DOP853),
masses of spinning arms by quadrature. Random cases are seeded.

    python3 tests/reference/make_release.py

writes tests/reference/data/release.json. Needs mpmath and SciPy (1.10 or later).
"""
import json
import math
import random
from pathlib import Path

from mpmath import acos, asin, atan2, cos, erf, exp, expm1, findroot, log, log10, matrix, mp, mpf, pi, polyroots, quad, sin, sqrt
from scipy.integrate import solve_ivp

mp.dps = 60
DATA = Path(__file__).parent / "data"
rng = random.Random(20_271)

SUN = mpf(1.32712440018e20)
AU = mpf("149597870700")

# WGS 84 (NIMA TR 8350.2); JPL and IAU WGCCRE; JPL DE440; Dawn. GM, radius, ω as doubles: a hair from a
# threshold the last digit of ω decides, so both sides start from the same double.
KNOWN = {
    "earth": (3.986004418e14, 6378137, 7.292115e-5),
    "mars": (4.2828375e13, 3396190, 2 * math.pi / 88642.66),
    "moon": (4.902800066e12, 1737400, 2 * math.pi / (27.321661 * 86400)),
    "ceres": (6.26284e10, 482000, 2 * math.pi / (9.07417 * 3600)),
}


class Body:
    """Figures of a known body, or of one of one's own as the doubles that the engine is given."""

    def __init__(self, name=None, gm=None, radius=None, rate=None):
        if name:
            self.gm, self.radius, self.rate = map(mpf, KNOWN[name])
            self.site = {"kind": "body", "body": name}
        else:
            self.gm, self.radius, self.rate = mpf(gm), mpf(radius), mpf(rate)
            self.site = {"kind": "own", "gm": gm, "radius": radius, "rate": rate}

    @property
    def balance(self):
        return (self.gm / self.rate**2) ** (mpf(1) / 3)

    @property
    def escape(self):
        return self.balance * mpf(2) ** (mpf(1) / 3)

    def grazing(self, entry):
        def excess(r):
            _, periapsis, _ = apsides(self, r)
            return periapsis - entry

        low, high = entry, self.balance
        for _ in range(400):
            middle = (low + high) / 2
            low, high = (middle, high) if excess(middle) < 0 else (low, middle)
        return low


def apsides(body, r):
    """Energy, periapsis and apoapsis (None when open) from speed and radius at an apsis."""
    v = body.rate * r
    energy = v**2 / 2 - body.gm / r
    momentum = r * v
    e = sqrt(max(mpf(0), 1 + 2 * energy * momentum**2 / body.gm**2))
    p = momentum**2 / body.gm
    return energy, p / (1 + e), (p / (1 - e) if energy < 0 else None)


def own_body():
    """Anything from a pebble to a giant, its balance radius between 1.0003 and 1e5 radii."""
    radius = 10 ** rng.uniform(1, 9)
    density = 10 ** rng.uniform(2, 4.3)
    gm = 6.6743e-11 * 4 / 3 * math.pi * radius**3 * density
    ratio = 1 + 10 ** rng.uniform(-3.5, 5)
    return Body(gm=gm, radius=radius, rate=math.sqrt(gm / (ratio * radius) ** 3))


def figure(x):
    """A double, or its decimal logarithm where it is beyond one."""
    if x is None:
        return None
    return {"log10": float(log10(x))} if x > mpf(10) ** 300 else float(x)


def figures(**named):
    return {name: figure(x) for name, x in named.items()}


BODIES = [Body(name) for name in KNOWN] + [own_body() for _ in range(16)]
NEAR = [1e-15, 1e-13, 1e-10, 1e-7, 1e-4, 1e-2]


def radii_of(body, entry):
    """Radii over the whole range, and a hair on either side of where the fate changes."""
    found = [float(body.radius * (1 + 10 ** mpf(rng.uniform(-6, 3)))) for _ in range(8)]
    found += [float(body.radius + (body.escape - body.radius) * rng.random()) for _ in range(6)]
    for centre in (body.escape, body.balance, body.grazing(entry)):
        found += [float(centre * (1 + rng.choice([-1, 1]) * h)) for h in NEAR]
    return [r for r in found if r >= body.radius]


def interface(body):
    """A height below the balance radius."""
    if rng.random() < 0.3:
        return 0.0
    return float((body.balance - body.radius) * mpf(10) ** rng.uniform(-4, -0.2))


def releases():
    cases = []
    for body in BODIES:
        height = interface(body)
        entry = body.radius + mpf(height)
        rows = []
        for radius in radii_of(body, entry):
            r = mpf(radius)
            energy, periapsis, apoapsis = apsides(body, r)
            e = sqrt(1 + 2 * energy * (body.rate * r**2) ** 2 / body.gm**2)
            a = -body.gm / (2 * energy)
            fate = "comesDown" if periapsis < entry else "escapes" if energy >= 0 else "staysBound"
            rows.append(
                dict(
                    radius=radius,
                    fate=fate,
                    **figures(
                        speed=body.rate * r,
                        c3=2 * energy,
                        eccentricity=e,
                        periapsis=periapsis,
                        apoapsis=apoapsis,
                        period=2 * pi * sqrt(a**3 / body.gm) if energy < 0 else None,
                        excessSpeed=sqrt(2 * energy) if energy >= 0 else None,
                    ),
                )
            )
        cases.append(
            dict(
                site=body.site,
                interfaceHeight=height,
                **figures(
                    balanceRadius=body.balance,
                    escapeRadius=body.escape,
                    grazingRadius=body.grazing(entry),
                ),
                releases=rows,
            )
        )
    return cases


def fall(body, r, entry):
    """Entry of a mass let go at r > entry; None where its periapsis is not below."""
    energy, periapsis, _ = apsides(body, r)
    if periapsis >= entry or energy >= 0:
        return None
    e = sqrt(1 + 2 * energy * (body.rate * r**2) ** 2 / body.gm**2)
    a = -body.gm / (2 * energy)
    eccentric = acos((1 - entry / a) / e)
    # Inbound: beyond the apoapsis at E = π.
    eccentric = 2 * pi - eccentric
    anomaly = 2 * pi - acos((a * (1 - e**2) / entry - 1) / e)
    time = (eccentric - e * sin(eccentric) - pi) * sqrt(a**3 / body.gm)
    momentum = body.rate * r**2
    across = momentum / entry
    speed = sqrt(2 * (energy + body.gm / entry))
    down = sqrt(speed**2 - across**2)
    ahead = across - body.rate * entry
    return figures(
        speed=speed,
        relativeSpeed=sqrt(down**2 + ahead**2),
        pathAngle=atan2(down, across),
        relativePathAngle=atan2(down, ahead),
        time=time,
        longitudeOffset=anomaly - pi - body.rate * time,
    )


def severed():
    cases = []
    for body in BODIES:
        height = interface(body)
        entry = body.radius + mpf(height)
        grazing = body.grazing(entry)
        near = [entry * (1 + mpf(10) ** -k) for k in (13, 11, 9, 7, 5, 3)]
        near += [grazing * (1 - mpf(10) ** -k) for k in (15, 13, 11, 9, 7, 5, 3)]
        between = [entry + (grazing - entry) * mpf(rng.random()) for _ in range(6)]
        rows = []
        for radius in map(float, near + between):
            if mpf(radius) <= entry:
                continue
            found = fall(body, mpf(radius), entry)
            if found:
                rows.append(dict(radius=radius, entry=found))
        cases.append(dict(site=body.site, interfaceHeight=height, elements=rows))
    return cases


def integrated_falls():
    """From the equations of motion alone."""
    cases = []
    for name, radius, height in [
        ("earth", 6.6e6, 120e3),
        ("earth", 1.2e7, 100e3),
        ("earth", 2.5e7, 120e3),
        ("earth", 2.98e7, 120e3),
        ("mars", 5e6, 125e3),
        ("mars", 1.3e7, 125e3),
        ("ceres", 7e5, 0.0),
    ]:
        body = Body(name)
        gm, rate, entry = float(body.gm), float(body.rate), float(body.radius) + height

        def motion(_, y):
            r3 = math.hypot(y[0], y[1]) ** 3
            return [y[2], y[3], -gm * y[0] / r3, -gm * y[1] / r3]

        def reached(_, y):
            return math.hypot(y[0], y[1]) - entry

        reached.terminal = True
        found = solve_ivp(
            motion,
            (0, 3e5),
            [radius, 0, 0, rate * radius],
            method="DOP853",
            rtol=1e-13,
            atol=1e-9,
            events=reached,
        )
        time = found.t_events[0][0]
        x, y, vx, vy = found.y_events[0][0]
        cases.append(
            dict(
                site=body.site,
                radius=radius,
                interfaceHeight=height,
                entry=dict(
                    speed=math.hypot(vx, vy),
                    relativeSpeed=math.hypot(vx + rate * y, vy - rate * x),
                    time=time,
                    longitudeOffset=math.atan2(y, x) - rate * time,
                ),
            )
        )
    return cases


def about_sun(position, velocity, gm):
    """Nearest and furthest point and inclination from position and velocity, vectors from the Sun."""
    cross = lambda a, b: [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]]
    dot = lambda a, b: sum(x * y for x, y in zip(a, b))
    h = cross(position, velocity)
    size = sqrt(dot(position, position))
    e_vector = [x / gm - y / size for x, y in zip(cross(velocity, h), position)]
    e = sqrt(dot(e_vector, e_vector))
    p = dot(h, h) / gm
    energy = dot(velocity, velocity) / 2 - gm / size
    inclination = atan2(sqrt(h[0] ** 2 + h[1] ** 2), h[2])
    return figures(nearPoint=p / (1 + e), farPoint=p / (1 - e) if energy < 0 else None, inclination=inclination)


def departure(longitude, tilt, distance, excess, sense, gm=SUN):
    """The body's place from the Sun's longitude, v∞ from the projection on the equator by its axes."""
    body_at = longitude + pi
    position = [distance * cos(body_at), distance * sin(body_at), mpf(0)]
    speed = sqrt(gm / distance)
    motion = [-sin(body_at), cos(body_at), mpf(0)]
    # Axes of the equator in the ecliptic: the equinox, and 90° of right ascension.
    first, second = [mpf(1), mpf(0), mpf(0)], [mpf(0), cos(tilt), -sin(tilt)]
    along = [sum(a * b for a, b in zip(motion, axis)) for axis in (first, second)]
    projected = [along[0] * a + along[1] * b for a, b in zip(first, second)]
    size = sqrt(sum(x**2 for x in projected))
    velocity = [speed * m + sense * excess * x / size for m, x in zip(motion, projected)]
    return acos(min(mpf(1), size)), about_sun(position, velocity, gm)


def reaches():
    cases = []
    for body, distance in [
        (Body("earth"), AU),
        (Body("mars"), mpf(float(mpf("1.52371034") * AU))),
        (Body("ceres"), mpf(float(mpf("2.767") * AU))),
    ] + [(own_body(), mpf(10 ** rng.uniform(8, 14))) for _ in range(20)]:
        speed = sqrt(SUN / distance)
        # Excess speeds around a fall into the Sun and an escape from it, and anywhere.
        wanted = [mpf(10) ** rng.uniform(-4, 1) for _ in range(6)]
        wanted += [mpf(1) + s * mpf(10) ** -k for k in (1, 4, 8) for s in (-1, 1)]
        wanted += [sqrt(2) - 1 + s * mpf(10) ** -k for k in (1, 4, 8) for s in (-1, 1)]
        wanted += [sqrt(2) + 1 + s * mpf(10) ** -k for k in (1, 4, 8) for s in (-1, 1)]
        paths = []
        for w in wanted:
            radius = float(radius_for(body, (w * speed) ** 2))
            r = mpf(radius)
            c3 = (body.rate * r) ** 2 - 2 * body.gm / r
            if radius < body.radius or c3 < 0:
                continue
            each = [departure(mpf(0), mpf(0), distance, sqrt(c3), sense)[1] for sense in (1, -1)]
            paths.append(dict(radius=radius, outward=each[0], inward=each[1]))
        targets = []
        for i in range(8):
            target = float(distance * (1 + rng.choice([-1, 1]) * mpf(10) ** rng.uniform(-9, -0.1)))
            if i > 3:
                target = float(distance * mpf(10) ** rng.uniform(-3, 3))
            a = (mpf(target) + distance) / 2
            excess = abs(sqrt(SUN * (2 / distance - 1 / a)) - speed)
            targets.append(
                dict(distance=target, **figures(c3=excess**2, radius=radius_for(body, excess**2)))
            )
        cases.append(dict(site=body.site, sunDistance=float(distance), paths=paths, targets=targets))
    return cases


def radius_for(body, c3):
    roots = polyroots([body.rate**2, 0, -c3, -2 * body.gm], maxsteps=500, extraprec=400)
    return max(z.real for z in roots if abs(z.imag) < mpf(10) ** -30 * abs(z))


def calendars():
    cases = []
    places = [(Body("earth"), mpf(float(mpf("84381.406") / 3600 * pi / 180)), AU)]
    places += [(own_body(), mpf(rng.uniform(0, math.pi)), mpf(10 ** rng.uniform(9, 13))) for _ in range(9)]
    for body, tilt, distance in places:
        speed = sqrt(SUN / distance)
        for w in [mpf(10) ** rng.uniform(-3, 0.5) for _ in range(2)] + [mpf(1), sqrt(2) - 1]:
            radius = float(radius_for(body, (w * speed) ** 2))
            r = mpf(radius)
            c3 = (body.rate * r) ** 2 - 2 * body.gm / r
            if radius < body.radius or c3 < 0:
                continue
            days = []
            for longitude in [0.0, 1.5707963267948966] + [rng.uniform(0, 2 * math.pi) for _ in range(6)]:
                out, back = (departure(mpf(longitude), tilt, distance, sqrt(c3), s) for s in (1, -1))
                angle = float(asin(abs(sin(tilt) * cos(mpf(longitude)))))
                days.append(dict(sunLongitude=longitude, declination=angle, outward=out[1], inward=back[1]))
            cases.append(
                dict(site=body.site, radius=radius, tilt=float(tilt), sunDistance=float(distance), days=days)
            )
    return cases


def cut_rates():
    cases = []
    for _ in range(40):
        edge, bands = 10 ** rng.uniform(3, 6), []
        for _ in range(rng.randint(1, 12)):
            start = edge * (1 if rng.random() < 0.5 else 1 + rng.random())
            edge = start * (1 + 10 ** rng.uniform(-3, 1))
            bands.append({"from": start, "to": edge, "flux": 10 ** rng.uniform(-18, -9), "width": 10 ** rng.uniform(-3, 1)})
        time = 10 ** rng.uniform(0, 10)
        rate = sum((mpf(b["to"]) - mpf(b["from"])) * mpf(b["flux"]) * mpf(b["width"]) for b in bands)
        cases.append(
            dict(bands=bands, time=time, **figures(rate=rate, probability=-expm1(-rate * mpf(time)), meanTime=1 / rate))
        )
    return cases


def spinning():
    cases = []
    for i in range(60):
        density, stress = 10 ** rng.uniform(2, 4.5), 10 ** rng.uniform(6, 11.5)
        x = 10 ** rng.uniform(-4, 0) if i % 3 == 0 else rng.uniform(0.1, 26) if i % 3 == 1 else rng.uniform(26, 4000)
        speed = x * math.sqrt(2 * stress / density)
        length, mass = 10 ** rng.uniform(0, 8), 10 ** rng.uniform(-3, 6)
        d, s, v, l, m = map(mpf, (density, stress, speed, length, mass))
        ratio = v / sqrt(2 * s / d)
        tip = m * v**2 / (l * s)
        if i % 3 == 2:
            arm = sqrt(pi) * ratio * exp(ratio**2) * erf(ratio)
        else:
            # The mass from the taper itself: ρ ∫ A dr over the tip mass.
            edges = sorted({mpf(0), *(min(mpf(1), k / ratio) for k in (0.5, 1, 2, 4, 8)), mpf(1)})
            arm = d * l * tip / m * exp(ratio**2) * quad(lambda t: exp(-((ratio * t) ** 2)), edges)
        cases.append(
            dict(
                density=density,
                designStress=stress,
                tipSpeed=speed,
                length=length,
                tipMass=mass,
                expected=figures(
                    characteristicSpeed=sqrt(2 * s / d),
                    areaRatio=exp(ratio**2),
                    massRatio=arm,
                    rate=v / l,
                    tipAcceleration=v**2 / l,
                    tipArea=tip,
                    hubArea=tip * exp(ratio**2),
                    hubTension=s * tip * exp(ratio**2),
                    armMass=arm * m,
                    tetherMass=2 * arm * m,
                ),
            )
        )
    return cases


def spinning_as_built():
    cases = []
    for _ in range(24):
        r = 0.0 if rng.random() < 0.5 else 10 ** rng.uniform(-2, 3)
        rows = [{"radius": r, "area": 10 ** rng.uniform(-8, -3)}]
        for _ in range(rng.randint(1, 8)):
            r += 10 ** rng.uniform(0, 5)
            rows.append({"radius": r, "area": rows[-1]["area"] * 10 ** rng.uniform(-0.5, 0.2)})
        density, speed, mass = 10 ** rng.uniform(2.8, 4), rng.uniform(10, 4000), 10 ** rng.uniform(-1, 4)
        rate = mpf(speed) / mpf(rows[-1]["radius"])
        tension = mpf(mass) * rate**2 * mpf(rows[-1]["radius"])
        volume, best = mpf(0), None
        pairs = list(zip(rows, rows[1:]))
        for low, high in reversed(pairs):
            a, b, start, end = (mpf(x) for x in (low["radius"], high["radius"], low["area"], high["area"]))
            area = lambda x: start + (end - start) * (x - a) / (b - a)
            upper = tension
            at = lambda x: upper + quad(lambda y: mpf(density) * area(y) * rate**2 * y, [x, b])
            mp.dps = 25
            stresses = [at(a + (b - a) * k / 200) / area(a + (b - a) * k / 200) for k in range(201)]
            k = max(range(201), key=lambda j: stresses[j])
            peak = stresses[k]
            if 0 < k < 200:
                slope = lambda x: -mpf(density) * area(x) ** 2 * rate**2 * x - at(x) * (end - start) / (b - a)
                where = findroot(slope, (a + (b - a) * (k - 1) / 200, a + (b - a) * (k + 1) / 200), solver="anderson")
                peak = at(where) / area(where)
            mp.dps = 60
            best = peak if best is None or peak > best else best
            tension = at(a)
            volume += (start + end) / 2 * (b - a)
        cases.append(
            dict(
                density=density,
                tipSpeed=speed,
                tipMass=mass,
                rows=rows,
                expected=figures(hubTension=tension, greatestStress=best, armMass=mpf(density) * volume),
            )
        )
    return cases


if __name__ == "__main__":
    data = dict(
        releases=releases(),
        severed=severed(),
        integratedFalls=integrated_falls(),
        reaches=reaches(),
        calendars=calendars(),
        cutRates=cut_rates(),
        spinning=spinning(),
        spinningAsBuilt=spinning_as_built(),
    )
    (DATA / "release.json").write_text(json.dumps(data, ensure_ascii=False) + "\n")
    for name, cases in data.items():
        inner = [sum(len(v) for v in c.values() if isinstance(v, list)) for c in cases]
        print(name, len(cases), sum(inner))
