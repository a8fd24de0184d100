"""Cases of field, uniform line, exact taper and stepped line."""
from mpmath import exp, log, mp, mpf, quad, sqrt

from field import Field, bisect, decades, draw, graded, random_site, told, upper


def field_case():
    site = random_site()
    field = Field(site)
    near = [float(field.balance * (1 + s * mpf(decades(-9, -4)))) for s in (-1, 1)]
    radii = [float(field.base), *near, float(field.base + (field.balance - field.base) * draw.random()), upper(field, site)]
    level = field.u(field.base)
    return dict(
        input=dict(site=site, radii=radii),
        expected=dict(
            balanceRadius=float(field.balance),
            climb=float(field.u(field.balance) - level),
            points=[
                dict(
                    g=float(field.g(mpf(r))),
                    rise=float(field.u(mpf(r)) - level),
                    depth=float(field.u(field.balance) - field.u(mpf(r))),
                    along=float(field.kx(mpf(r))),
                    inPlane=float(field.ky(mpf(r))),
                    outOfPlane=float(field.kz(mpf(r))),
                )
                for r in radii
            ],
        ),
    )


def uniform_case():
    site = random_site()
    field = Field(site)
    density = draw.uniform(500, 9000)
    climb = field.u(field.balance) - field.u(field.base)
    stress0 = draw.choice((0.0, float(density * climb * mpf(decades(-3, 1)))))
    wanted = field.u(field.base) - mpf(stress0) / mpf(density)
    if site["kind"] == "moon" and site["side"] == "near":
        high = mpf(site["distance"])
    else:
        high = field.balance * 2
        while field.u(high) > wanted:
            high *= 2
    end = bisect(lambda r: field.u(r) - wanted, field.balance, high)
    return dict(
        input=dict(site=site, density=density, stress=5e9, baseStress=stress0),
        expected=dict(peakStress=float(stress0 + density * climb), freeRadius=float(end)),
    )


class Taper:
    def __init__(self, field, density, stress, area0):
        self.field, self.rho, self.sigma = field, mpf(density), mpf(stress)
        self.peak = mpf(area0) * exp(self.rho * (field.u(field.balance) - field.u(field.base)) / self.sigma)

    def shape(self, r):
        return exp(-self.rho * (self.field.u(self.field.balance) - self.field.u(r)) / self.sigma)

    def mass(self, end):
        """Between r_s and `end`; panels as narrow as the peak."""
        s = self.field.balance
        width = 1 / sqrt(self.rho / self.sigma * -self.field.kx(s))
        count = max(8, int(log(abs(end - s) / width, 2)) + 8) if abs(end - s) > width else 8
        return self.rho * self.peak * quad(self.shape, graded(s, end, count))

    def counterweight(self, top):
        return self.sigma * self.peak * self.shape(top) / -self.field.g(top)


def base_of(field, design):
    base, reserve = design["base"], mpf(design["reserve"])
    sigma = mpf(design["allowable"]) / mpf(design["factorOfSafety"])
    area0 = mpf(base["lift"]) * field.g(field.base) * (1 + reserve) / sigma if base["kind"] == "lift" else mpf(base["area"])
    return sigma, area0


def random_design(field, site, steepest=2.6):
    density = draw.uniform(500, 9000)
    climb = field.u(field.balance) - field.u(field.base)
    safety = draw.choice((1.0, draw.uniform(1, 4)))
    allowable = float(density * climb / mpf(decades(-3, steepest)) * safety)
    base = draw.choice((dict(kind="lift", lift=decades(-1, 6)), dict(kind="area", area=decades(-9, -2))))
    reserve = draw.choice((0.0, draw.random()))
    return dict(
        site=site, density=density, allowable=allowable, factorOfSafety=safety, base=base, reserve=reserve,
        top=upper(field, site),
    )


def taper_case(design, field):
    sigma, area0 = base_of(field, design)
    taper = Taper(field, design["density"], sigma, area0)
    top = mpf(design["top"])
    below, above = taper.mass(field.base), taper.mass(top)
    counterweight = taper.counterweight(top)
    total = below + above + counterweight
    lift = sigma * area0 / field.g(field.base) / (1 + mpf(design["reserve"]))
    within = decades(-5, 0.5)
    expected = dict(
        taper=told(taper.peak / area0),
        baseArea=float(area0),
        balanceArea=told(taper.peak),
        topArea=told(taper.peak * taper.shape(top)),
        greatestTension=told(sigma * taper.peak),
        massBelow=told(below),
        massAbove=told(above),
        lineMass=told(below + above),
        counterweight=told(counterweight),
        total=told(total),
        totalPerLift=told(total / lift),
        lift=float(lift),
    )
    if draw.random() < 0.3:
        expected["topWithin"] = float(top_within(field, taper, total, top, mpf(within)))
    return dict(input=dict(design, within=within, rangePoints=2), expected=expected)


def top_within(field, taper, total, top, share):
    """The radius at which line and counterweight are (1 + share) times the total at the top."""
    s, density = field.balance, taper.rho * taper.peak
    low, held = s * (1 + mpf(10) ** -9), taper.counterweight(top)
    mp.dps = 25

    def excess(x):
        """In the logarithm of the distance beyond r_s, where the total falls evenly."""
        r = s + exp(x)
        if r >= top:
            return mpf(-100)
        width = 1 / (taper.rho / taper.sigma * -field.g(r) + 2 * field.kx(r) / field.g(r))
        line = density * quad(taper.shape, graded(r, top, max(6, int(log((top - r) / width, 2)) + 7)))
        more = (taper.counterweight(r) - held - line) / total / share
        return log(more) if more > 0 else mpf(-100)

    if excess(log(low - s)) <= 0:
        found = low
    else:
        found = s + exp(bisect(excess, log(low - s), log(top - s)))
    mp.dps = 40
    return found


def stepped_case(design, field):
    sigma, area0 = base_of(field, design)
    rho, top, s = mpf(design["density"]), mpf(design["top"]), field.balance
    # As many boundaries as let every section carry itself, at random places among them.
    count = draw.randint(1, 40)
    fall = (2 * field.u(s) - field.u(field.base) - field.u(top)) * rho / sigma
    count = max(count, int(fall * mpf(draw.uniform(1.2, 3))) + 1)
    if count > 120:
        return None
    boundaries = []
    for i in range(1, count):
        path = (2 * field.u(s) - field.u(field.base) - field.u(top)) * (i + mpf(draw.uniform(-0.2, 0.2))) / count
        level = field.u(field.base) + path
        if level < field.u(s):
            boundaries.append(float(bisect(lambda r: field.u(r) - level, field.base, s)))
        else:
            level = 2 * field.u(s) - level
            boundaries.append(float(bisect(lambda r: field.u(r) - level, s, top)))
    boundaries = sorted(b for b in set(boundaries) if field.base < b < top)
    joint = draw.choice((0.0, float(sigma * area0 / abs(field.g(field.base)) * mpf(decades(-6, -2)))))
    radii = [field.base, *map(mpf, boundaries), top]
    tension, mass, greatest, sections = sigma * area0, mpf(0), mpf(0), []
    for i, (a, b) in enumerate(zip(radii, radii[1:])):
        highest = b if b <= s else (s if a < s else a)
        spare = sigma - rho * (field.u(highest) - field.u(a))
        if spare <= 0:
            return None
        area = tension / spare
        upper_tension = tension + rho * area * (field.u(b) - field.u(a))
        sections.append(dict(area=told(area), lowerTension=told(tension), upperTension=told(upper_tension)))
        mass += rho * area * (b - a)
        greatest = max(greatest, area * sigma)
        tension = upper_tension + (joint * field.g(b) if i < len(radii) - 2 else 0)
        if tension <= 0:
            return None
    counterweight = tension / -field.g(top)
    taper = Taper(field, design["density"], sigma, area0)
    exact = taper.mass(field.base) + taper.mass(top)
    line = mass + joint * (len(radii) - 2)
    return dict(
        input=dict(design, sections=dict(kind="radii", boundaries=boundaries), jointMass=joint),
        expected=dict(
            sectionMass=told(mass),
            lineMass=told(line),
            counterweight=told(counterweight),
            total=told(line + counterweight),
            taperLineMass=told(exact),
            greatestTension=told(greatest),
            linePenalty=told(line / exact - 1),
            totalPenalty=told((line + counterweight) / (exact + taper.counterweight(top)) - 1),
            sections=sections,
        ),
    )


def random_stepped():
    """Not so steep that the sections are too many to write down."""
    site = random_site()
    field = Field(site)
    design = random_design(field, site, steepest=1.3)
    if site["kind"] != "moon":
        design["top"] = float(field.balance * (1 + mpf(decades(-8, 0.2))))
    return design, field


def designs():
    """Random designs, and extremes: tapers of 1e33 and far beyond, all but none, tops near and far."""
    earth = dict(kind="body", body="earth", j2=False)
    found = []
    for _ in range(60):
        site = random_site()
        field = Field(site)
        found.append((random_design(field, site), field))
    field = Field(earth)
    plain = dict(site=earth, factorOfSafety=1.0, base=dict(kind="lift", lift=20e3), reserve=0.0)
    for density, allowable, top in (
        (1300.0, 50e9, 106378137.0),
        (1300.0, 65e9, 106378137.0),
        (7900.0, 5e9, 106378137.0),
        (7900.0, 0.4e9, 1e8),
        (7900.0, 1e6, 1e8),
        (1300.0, 1e16, 1e8),
        (1300.0, 50e9, float(field.balance * (1 + mpf("1.5e-9")))),
        (1300.0, 50e9, 4.2e10),
    ):
        found.append((dict(plain, density=density, allowable=allowable, top=top), field))
    return found


