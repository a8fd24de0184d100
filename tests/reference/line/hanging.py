"""Cases of the as-built analysis and of the climber envelope."""
import math

from mpmath import mp, mpf, quad
from scipy.integrate import solve_ivp

from field import BODIES, Field, bisect, decades, draw, graded, random_site, upper
from sizing import Taper


class Piece:
    """A stretch with A(r) and an antiderivative of A g, at 40 digits, where no cancellation matters."""

    def __init__(self, field, a, b, area_a, area_b):
        slope = (area_b - area_a) / (b - a)
        self.a, self.b, self.slope = a, b, slope
        self.area = lambda r: area_a + slope * (r - a)
        self.w = lambda r: self.area(r) * field.u(r) - slope * field.v(r)
        self.volume = (area_a + area_b) / 2 * (b - a)


class TaperPiece:
    def __init__(self, taper, a, b):
        self.a, self.b, self.slope = a, b, None
        self.area = lambda r: taper.peak * taper.shape(r)
        self.w = lambda r: self.area(r) * taper.sigma / taper.rho
        self.volume = quad(self.area, sorted(set(graded(a, b) + graded(b, a))))


class Line:
    def __init__(self, field, density, pieces, masses, counterweight):
        self.field, self.rho, self.pieces = field, mpf(density), pieces
        self.masses = sorted((mpf(m["radius"]), mpf(m["mass"])) for m in masses)
        self.counterweight = mpf(counterweight)
        self.bottom, self.top = pieces[0].a, pieces[-1].b
        self.spans = self.hang()

    def hang(self):
        """[(piece, a, b, T just above a, T just below b)] from the top down, then turned round."""
        field, spans = self.field, []
        tension = -self.counterweight * field.g(self.top)
        left = list(self.masses)
        for piece in reversed(self.pieces):
            cuts = {piece.a, piece.b, *(r for r, _ in self.masses if piece.a < r < piece.b)}
            if piece.a < field.balance < piece.b:
                cuts.add(field.balance)
            cuts = sorted(cuts)
            for a, b in reversed(list(zip(cuts, cuts[1:]))):
                while left and left[-1][0] >= b:
                    tension -= left[-1][1] * field.g(left.pop()[0])
                lower = tension - self.rho * (piece.w(b) - piece.w(a))
                spans.append((piece, a, b, lower, tension))
                tension = lower
        for r, mass in left:
            tension -= mass * field.g(r)
        self.anchor = tension
        return spans[::-1]

    def tension(self, span, r):
        piece, _, b, _, upper = span
        return upper - self.rho * (piece.w(b) - piece.w(r))

    def greatest_stress(self):
        best = -mpf(10) ** 400
        for span in self.spans:
            piece, a, b, lower, upper = span
            best = max(best, lower / piece.area(a), upper / piece.area(b))
            if not piece.slope:
                continue
            climb = lambda r: self.rho * self.field.g(r) - self.tension(span, r) / piece.area(r) ** 2 * piece.slope
            points = [a + (b - a) * i / 40 for i in range(41)]
            signs = [climb(r) for r in points]
            for p, q, x, y in zip(points, points[1:], signs, signs[1:]):
                if x > 0 > y:
                    r = bisect(climb, p, q)
                    best = max(best, self.tension(span, r) / piece.area(r))
        return best

    def stretch(self, modulus, thermal):
        def share(span, r):
            strain = self.tension(span, r) / span[0].area(r) / modulus + thermal
            return strain / (1 + strain)

        mp.dps = 18
        total = mpf(0)
        for span in self.spans:
            _, a, b, _, _ = span
            total += quad(lambda r: share(span, r), sorted(set(graded(a, b, 6) + graded(b, a, 6))))
        mp.dps = 40
        return total

    def slack(self):
        found = []
        for span in self.spans:
            _, a, b, lower, upper = span
            if lower >= 0 and upper >= 0:
                continue
            turn = bisect(lambda r: self.tension(span, r), a, b) if (lower < 0) != (upper < 0) else None
            part = [a if lower < 0 else turn, b if upper < 0 else turn]
            if found and found[-1][1] == part[0]:
                found[-1][1] = part[1]
            else:
                found.append(part)
        if self.anchor < 0 and not (found and found[0][0] == self.bottom):
            found.insert(0, [self.bottom, self.bottom])
        return [dict(zip(("from", "to"), map(float, part))) for part in found]


def random_line():
    """One whose section is not all but nothing somewhere."""
    while True:
        drawn = line_near_a_taper()
        if min(piece.area(r) for piece in drawn[2] for r in (piece.a, piece.b)) > 1e-60:
            return drawn


def line_near_a_taper(steepest=0.6):
    """A site, its field, and a line near the taper that a random design would have."""
    site = random_site()
    field = Field(site)
    density = draw.uniform(500, 9000)
    climb = field.u(field.balance) - field.u(field.base)
    stress = float(density * climb / mpf(decades(-1.5, steepest)))
    top = upper(field, site, -1.5)
    taper = Taper(field, density, stress, decades(-9, -3))
    area0 = float(taper.peak * taper.shape(field.base))
    taper.peak = mpf(area0) / taper.shape(field.base)
    counterweight = float(taper.counterweight(mpf(top)) * mpf(draw.uniform(0.7, 1.5)))
    kind = draw.choice(("taper", "stepped", "table", "table"))
    if kind == "taper":
        section = dict(kind=kind, baseArea=area0, designStress=stress, top=top)
        cuts = [field.base, field.balance, mpf(top)]
        pieces = [TaperPiece(taper, a, b) for a, b in zip(cuts, cuts[1:])]
    else:
        inner = sorted(float(field.base) * (top / float(field.base)) ** draw.random() for _ in range(draw.randint(0, 12)))
        radii = [float(field.base), *inner, top]
        areas = [float(taper.peak * taper.shape(mpf(r)) * mpf(draw.uniform(0.6, 1.8))) for r in radii]
        if kind == "stepped":
            sections = [dict(to=r, area=a) for r, a in zip(radii[1:], areas)]
            section = dict(kind=kind, sections=sections)
            ends = areas[:-1]
        else:
            section = dict(kind=kind, rows=[dict(radius=r, area=a) for r, a in zip(radii, areas)])
            ends = areas[1:]
        pieces = [
            Piece(field, mpf(a), mpf(b), mpf(p), mpf(q)) for a, b, p, q in zip(radii, radii[1:], areas, ends)
        ]
    pull = stress * area0 / float(field.g(field.base))
    places = [float(field.base), top, *(float(piece.a) for piece in pieces)]
    spot = lambda: draw.choice((draw.choice(places), draw.uniform(float(field.base), top), draw.uniform(float(field.base), top)))
    masses = [dict(radius=spot(), mass=pull * decades(-3, -0.7)) for _ in range(draw.randint(0, 5))]
    described = dict(site=site, density=density, section=section, masses=masses, counterweight=counterweight)
    return described, field, pieces, stress, spot, pull


def as_built_case():
    described, field, pieces, stress, _, pull = random_line()
    line = Line(field, described["density"], pieces, described["masses"], described["counterweight"])
    allowable, safety = stress * draw.uniform(1, 3), draw.uniform(1, 2)
    modulus = stress * decades(0.7, 2.5)
    expansion, rise = draw.choice(((0.0, 0.0), (draw.uniform(-1, 3) * 1e-5, draw.uniform(-150, 80))))
    greatest = line.greatest_stress()
    lift = dict(mass=pull * draw.uniform(0.1, 1), reserve=draw.random())
    stretch = line.stretch(mpf(modulus), mpf(expansion) * mpf(rise))
    volume = sum(piece.volume for piece in pieces)
    expected = dict(
        anchorTension=float(line.anchor),
        greatestTension=float(max(max(lower, upper) for *_, lower, upper in line.spans)),
        greatestStress=float(greatest),
        slack=line.slack(),
        lineMass=float(line.rho * volume),
        stretch=float(stretch),
        manufacturedLength=float(line.top - line.bottom - stretch),
        requiredTension=float(mpf(lift["mass"]) * mpf(lift["reserve"]) * field.g(line.bottom)),
    )
    if greatest > 0:
        expected["leastMargin"] = float(mpf(allowable) / mpf(safety) / greatest - 1)
    return dict(
        input=dict(
            described,
            allowable=allowable,
            factorOfSafety=safety,
            lift=lift,
            elasticity=dict(modulus=modulus, expansion=expansion, temperatureRise=rise),
            points=draw.choice((2, 50)),
        ),
        expected=expected,
    )


def envelope_case():
    described, field, pieces, stress, spot, pull = random_line()
    moments = [
        dict(climbers=[dict(radius=spot(), mass=pull * decades(-2, -0.5)) for _ in range(draw.randint(0, 3))])
        for _ in range(5)
    ]
    expected = []
    for moment in moments:
        masses = described["masses"] + moment["climbers"]
        line = Line(field, described["density"], pieces, masses, described["counterweight"])
        least = min(line.anchor, *(min(lower, upper) for *_, lower, upper in line.spans))
        expected.append(
            dict(
                greatestStress=float(line.greatest_stress()),
                anchorTension=float(line.anchor),
                leastTension=float(least),
                greatestTension=float(max(max(lower, upper) for *_, lower, upper in line.spans)),
            )
        )
    climbers = dict(kind="schedule", moments=moments)
    return dict(
        input=dict(described, climbers=climbers, allowable=stress, factorOfSafety=1.0),
        expected=expected,
    )




def d1_by_steps():
    """A second method: case D1 with three climbers as an initial value problem downwards, SciPy's DOP853."""
    gm, base, rate, _ = BODIES["earth"]
    top, density, stress = base + 1e8, 1300.0, 50e9
    g = lambda r: gm / r**2 - rate**2 * r
    u = lambda r: -gm / r - rate**2 * r**2 / 2
    area0 = 20e3 * g(base) / stress
    area = lambda r: area0 * math.exp(density / stress * (u(r) - u(base)))
    climbers = [(base + 1.2e6, 12e3), (base + 9.1e6, 12e3), (base + 2.4e7, 12e3)]
    counterweight = stress * area(top) / -g(top)
    stops = [top, *(r for r, _ in reversed(climbers)), base]
    tension = -counterweight * g(top)
    for start, end in zip(stops, stops[1:]):
        slope = lambda r, _: [density * area(r) * g(r)]
        steps = solve_ivp(slope, (start, end), [tension], method="DOP853", rtol=1e-12, atol=1e-7)
        tension = steps.y[0][-1] - sum(mass * g(r) for r, mass in climbers if r == end)
    return dict(
        baseArea=area0,
        counterweight=counterweight,
        climbers=[dict(radius=r, mass=mass) for r, mass in climbers],
        anchorTension=float(tension),
    )
