#!/usr/bin/env python3
"""Standard uncertainties through notes, computed with mpmath at 150 digits.

Shares nothing with the engine. Every quantity is written out as a function of the note's givens, from
Python functions of mpmath; its slope by each given is mpmath's numerical derivative at 150 digits, and its
standard uncertainty the root of the sum of (slope times the given's uncertainty) squared: JCGM 100
(GUM) 5.1.2, givens independent. The line of constant stress is written out from its integral.

    python3 tests/reference/make_uncertainty.py

writes tests/reference/data/uncertainty.json. Needs python3-mpmath. Takes a minute.
"""
import json
import random
from pathlib import Path

import mpmath as mp
from mpmath import mpf

mp.mp.dps = 150
DATA = Path(__file__).parent / "data"
rng = random.Random(20260)


def slope(f, values, i):
    """Central difference at 150 digits, extrapolated once: its error is far below 1e-20, though erfc may be 1e-40."""
    x = values[i]
    h = (abs(x) if x else mpf(1)) * mpf(10) ** -12

    def at(step):
        up = f([*values[:i], x + step, *values[i + 1 :]])
        down = f([*values[:i], x - step, *values[i + 1 :]])
        return (up - down) / (2 * step)

    return (4 * at(h / 2) - at(h)) / 3


def standard(f, values, uncertainties):
    return mp.sqrt(
        sum((slope(f, values, i) * u) ** 2 for i, u in enumerate(uncertainties) if u)
    )


# Random notes of pure numbers: each calculation names some of what stands before it. --------------

UNARY = {
    "sqrt": mp.sqrt,
    "cbrt": mp.cbrt,
    "exp": mp.exp,
    "expm1": mp.expm1,
    "ln": mp.log,
    "log1p": mp.log1p,
    "log2": lambda x: mp.log(x) / mp.log(2),
    "log10": mp.log10,
    "sin": mp.sin,
    "cos": mp.cos,
    "tan": mp.tan,
    "atan": mp.atan,
    "sinh": mp.sinh,
    "cosh": mp.cosh,
    "tanh": mp.tanh,
    "erf": mp.erf,
    "erfc": mp.erfc,
    "abs": abs,
}
BOUNDED = {"asin": mp.asin, "acos": mp.acos}
POSITIVE = {"sqrt", "ln", "log1p", "log2", "log10", "cbrt"}


def leaf(names):
    if rng.random() < 0.75:
        name = rng.choice(names)
        return name, lambda env: env[name]
    number = rng.choice(["2", "0.5", "3", "1.25", "7", "0.125"])
    return number, lambda env: mpf(number)


def expression(names, depth):
    """Text, and the same as a function of what the names stand for."""
    if depth == 0:
        return leaf(names)
    kind = rng.random()
    a, fa = expression(names, depth - 1)
    if kind < 0.35:
        name = rng.choice(list(UNARY))
        f = UNARY[name]
        if name in POSITIVE:
            return f"{name}(1 + ({a})^2)", lambda env: f(1 + fa(env) ** 2)
        if name in ("exp", "expm1", "sinh", "cosh", "tan"):
            return f"{name}(sin({a}))", lambda env: f(mp.sin(fa(env)))
        return f"{name}({a})", lambda env: f(fa(env))
    if kind < 0.4:
        name = rng.choice(list(BOUNDED))
        f = BOUNDED[name]
        return f"{name}(0.9 * tanh({a}))", lambda env: f(mpf("0.9") * mp.tanh(fa(env)))
    b, fb = expression(names, depth - 1)
    if kind < 0.52:
        return f"({a}) + ({b})", lambda env: fa(env) + fb(env)
    if kind < 0.62:
        return f"({a}) - ({b})", lambda env: fa(env) - fb(env)
    if kind < 0.74:
        return f"({a}) * ({b})", lambda env: fa(env) * fb(env)
    if kind < 0.82:
        return f"({a}) / (2 + cos({b}))", lambda env: fa(env) / (2 + mp.cos(fb(env)))
    if kind < 0.86:
        return f"(1 + ({a})^2)^(tanh({b}))", lambda env: (1 + fa(env) ** 2) ** mp.tanh(fb(env))
    if kind < 0.9:
        return f"hypot({a}, 1 + ({b})^2)", lambda env: mp.hypot(fa(env), 1 + fb(env) ** 2)
    if kind < 0.94:
        return f"atan2({a}, 2 + sin({b}))", lambda env: mp.atan2(fa(env), 2 + mp.sin(fb(env)))
    if kind < 0.97:
        return f"max({a}, {b})", lambda env: max(fa(env), fb(env))
    return f"({a}) < ({b}) ? ({b})^2 : ({a})/3", lambda env: (
        fb(env) ** 2 if fa(env) < fb(env) else fa(env) / 3
    )


def note():
    givens = [f"x_{i}" for i in range(rng.randint(1, 6))]
    size = rng.choice([0, 0, 0, -3, 3])
    values = [f"{rng.uniform(-4, 4) * 10 ** size:.6g}" for _ in givens]
    spread = [f"{abs(float(v)) * 10 ** rng.uniform(-6, -1):.4g}" for v in values]
    spread = [u if rng.random() < 0.8 else "" for u in spread]
    names, texts, made = list(givens), [], []
    for k in range(rng.randint(1, 5)):
        text, f = expression(names, rng.randint(1, 3))
        made.append(f)
        texts.append(text)
        names.append(f"q_{k}")

    def through(k):
        def of(xs):
            env = dict(zip(givens, xs))
            for j in range(k + 1):
                env[f"q_{j}"] = made[j](env)
            return env[f"q_{k}"]

        return of

    xs = [mpf(v) for v in values]
    us = [mpf(u or 0) for u in spread]
    expected = []
    for k in range(len(texts)):
        y, u = through(k)(xs), standard(through(k), xs, us)
        if not mp.isfinite(y) or abs(y) > 1e100:
            return None
        # What has lost its digits by cancelling tests the arithmetic of doubles, not the slopes.
        with mp.workprec(53):
            rough = through(k)(xs)
        if abs(rough - y) > mpf("1e-9") * abs(y):
            return None
        parts = sum(abs(slope(through(k), xs, i)) * uu for i, uu in enumerate(us))
        if u and u < parts * mpf("1e-3"):
            return None
        expected.append({"value": float(y), "uncertainty": float(u)})
    return {
        "givens": [
            {"symbol": g, "value": v, "uncertainty": u} for g, v, u in zip(givens, values, spread)
        ],
        "calculations": texts,
        "expected": expected,
    }


# A line of constant stress on Earth: density, allowable and top uncertain. ------------------------

GM, RADIUS, RATE = mpf("3.986004418e14"), mpf("6378137"), mpf("7.292115e-5")


def line(density, allowable, height, lift, reserve):
    stress = allowable / 2
    g = lambda r: GM / r**2 - RATE**2 * r
    potential = lambda r: -GM / r - RATE**2 * r**2 / 2
    synchronous = mp.cbrt(GM / RATE**2)
    top = RADIUS + height
    base = lift * g(RADIUS) * (1 + reserve) / stress
    area = lambda r: base * mp.exp(density * (potential(r) - potential(RADIUS)) / stress)
    # Panels halve towards the synchronous radius, where a steep taper peaks.
    halvings = [mpf(2) ** -i for i in range(14)] + [mpf(0)]
    below_mass = density * mp.quad(area, [synchronous + (RADIUS - synchronous) * h for h in halvings])
    above_mass = density * mp.quad(area, [synchronous + (top - synchronous) * h for h in halvings][::-1])
    counterweight = stress * area(top) / -g(top)
    return {
        "taper": area(synchronous) / base,
        "A0": base,
        "As": area(synchronous),
        "At": area(top),
        "T_max": area(synchronous) * stress,
        "mass": below_mass + above_mass,
        "counterweight": counterweight,
        "total": below_mass + above_mass + counterweight,
        "length": height,
    }


LINES = [
    ("1300", "1.0e11", "1.0e8", "20000", "0"),
    ("1300", "1.1e11", "4.0e7", "20000", "0.1"),
    ("1740", "4.0e10", "1.5e8", "900", "0"),
    ("1440", "1.2e10", "1.0e8", "500", "0.05"),
    ("970", "6.0e9", "6.0e7", "10", "0"),
    ("1300", "1.0e11", "3.6e7", "20000", "0"),
    # A taper of 1e33, a top a hair above the synchronous height, a top far out, a line of gossamer.
    ("7900", "1.0e10", "1.0e8", "20000", "0"),
    ("1300", "1.0e11", "3.57875e7", "20000", "0"),
    ("1300", "1.0e11", "1.5e9", "20000", "0.2"),
    ("1300", "1.0e11", "1.0e8", "1e-6", "0"),
]
SPREAD = ["0.01", "0.02", "0.001", "0.03", "0.05"]


def line_case(texts):
    xs = [mpf(t) for t in texts]
    us = [x * mpf(s) if x else mpf(s) for x, s in zip(xs, SPREAD)]
    names = list(line(*xs))
    mp.mp.dps = 30
    squares = dict.fromkeys(names, mpf(0))
    for i in range(len(xs)):
        h = (xs[i] or mpf(1)) * mpf(10) ** -8
        sides = {}
        for step in (h, h / 2):
            up = line(*[*xs[:i], xs[i] + step, *xs[i + 1 :]])
            down = line(*[*xs[:i], xs[i] - step, *xs[i + 1 :]])
            sides[step] = {n: (up[n] - down[n]) / (2 * step) for n in names}
        for n in names:
            squares[n] += ((4 * sides[h / 2][n] - sides[h][n]) / 3 * us[i]) ** 2
    mp.mp.dps = 150
    return {
        "inputs": list(texts),
        "uncertainties": [mp.nstr(u, 15) for u in us],
        "expected": {n: float(mp.sqrt(squares[n])) for n in names},
    }


notes = []
while len(notes) < 250:
    made = note()
    if made:
        notes.append(made)
DATA.mkdir(exist_ok=True)
(DATA / "uncertainty.json").write_text(
    json.dumps({"notes": notes, "lines": [line_case(t) for t in LINES]}, indent=1, ensure_ascii=False)
    + "\n"
)
