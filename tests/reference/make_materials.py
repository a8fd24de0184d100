#!/usr/bin/env python3
"""Reference figures for material allowables, with mpmath and SciPy.

Shares nothing with the engine: tolerance factors by mpmath's quadrature of the non-central t at 30 digits and
its own root finding; tests of fit from SciPy's distributions; the k-sample test from SciPy; Weibull limits by
a two-dimensional integral over location and scale instead of the one-dimensional form.

    python3 tests/reference/make_materials.py

writes tests/reference/data/materials.json. Needs python3-mpmath and python3-scipy (1.10 or later).
"""
import json
import math
import warnings
from pathlib import Path

import numpy as np
from mpmath import erfc, erfinv, exp, findroot, gamma, inf, log, mp, mpf, quad, sqrt
from scipy.integrate import quad as integral
from scipy.optimize import brentq
from scipy.stats import anderson_ksamp, binom, norm, t as student, weibull_min

warnings.simplefilter("ignore")
mp.dps = 30
random = np.random.default_rng(20261202)
DATA = Path(__file__).parent / "data"


def factor(n, share, confidence):
    nu = n - 1
    delta = sqrt(2) * erfinv(2 * mpf(share) - 1) * sqrt(n)
    c = 2 * (mpf(nu) / 2) ** (mpf(nu) / 2) / gamma(mpf(nu) / 2)
    width = 1 / sqrt(2 * mpf(nu))
    points = sorted({mpf(0), *(1 + k * width for k in (-14, -6, -3, -1, 0, 1, 3, 6, 14) if 1 + k * width > 0), 1 + 30 * width + 12 / sqrt(mpf(nu))})

    def above(t):
        f = lambda s: erfc((t * s - delta) / sqrt(2)) / 2 * c * s ** (nu - 1) * exp(-nu * s * s / 2)
        turn = delta / t
        edges = sorted({*points, *(x for x in (turn - 6 / t, turn, turn + 6 / t) if 0 < x < points[-1])})
        return quad(f, edges)

    start = float(norm.ppf(share) * math.sqrt(n) + norm.ppf(confidence) * math.sqrt(1 + norm.ppf(share) ** 2 * n / (2 * nu)))
    low, high = mpf(start) - 3, mpf(start) + 6
    goal = 1 - mpf(confidence)
    while above(low) < goal:
        low -= 6
    while above(high) > goal:
        high *= 2
    root = findroot(lambda t: above(t) - goal, (low, high), solver="anderson", tol=1e-22, maxsteps=80)
    return float(root / sqrt(n))


def factors():
    sizes = [2, 3, 4, 5, 7, 10, 15, 20, 30, 50, 100, 300, 1000]
    cases = [(n, p, g) for n in sizes for p, g in ((0.9, 0.95), (0.99, 0.95))]
    for _ in range(24):
        cases.append((int(10 ** random.uniform(0.31, 3)), float(random.uniform(0.55, 0.9999)), float(random.uniform(0.55, 0.9999))))
    return [dict(n=n, share=p, confidence=g, factor=factor(n, p, g)) for n, p, g in cases]


def anderson(values, frozen):
    x = np.sort(values)
    n = len(x)
    i = np.arange(1, n + 1)
    return -n - np.mean((2 * i - 1) * (frozen.logcdf(x) + frozen.logsf(x[::-1])))


def weibull_fit(x):
    y = np.log(x) - np.mean(np.log(x))
    f = lambda b: np.sum(np.exp(b * y) * y) / np.sum(np.exp(b * y)) - 1 / b
    shape = brentq(f, 1e-3, 700 / np.max(np.abs(y)), xtol=1e-14, rtol=1e-15)
    return shape, float(np.exp(np.mean(np.log(x)) + np.log(np.mean(np.exp(shape * y))) / shape))


def weibull_limit(x, share, confidence):
    """Conditional limit: the likelihood times 1/b, integrated over u and b."""
    y = np.log(x) - np.mean(np.log(x))
    n = len(y)
    w = math.log(-math.log(share))
    shape, _ = weibull_fit(x)
    b0 = 1 / shape
    u0 = b0 * math.log(np.mean(np.exp(y / b0)))
    lik = lambda u, b: -(n + 1) * math.log(b) + np.sum((y - u) / b) - np.sum(np.exp((y - u) / b))
    peak = lik(u0, b0)
    sd = b0 / math.sqrt(n)
    inner = lambda b, top: integral(
        lambda u: math.exp(lik(u, b) - peak), u0 - 14 * sd - 6 * abs(b - b0), top, epsabs=0, epsrel=1e-10, limit=400, points=None
    )[0]
    grid, weight = np.polynomial.legendre.leggauss(240)
    a, c = math.log(b0) - 9 / math.sqrt(n), math.log(b0) + max(11 / math.sqrt(n), 36 / (n - 1))
    bs = np.exp((a + c) / 2 + (c - a) / 2 * grid)
    # For large u the density falls as exp(−n u/b) only.
    high = lambda b: u0 + 14 * sd + b * (10 + 60 / n)
    full = sum(k * b * inner(b, high(b)) for k, b in zip(weight, bs))

    def below(q):
        total = 0.0
        for k, b in zip(weight, bs):
            top = q - b * w
            low = u0 - 14 * sd - 6 * abs(b - b0)
            if top > low:
                total += k * b * inner(b, min(top, high(b)))
        return total / full

    q = brentq(lambda q: below(q) - (1 - confidence), u0 + b0 * w - 14 * sd * 3, u0 + b0 * w + 3 * sd, xtol=1e-9)
    return float(np.exp(q + np.mean(np.log(x))))


def samples():
    cases = []
    for k in range(24):
        n = int(random.choice([5, 8, 12, 20, 30, 60, 200]))
        kind = k % 3
        if kind == 0:
            x = random.normal(60e9, 4e9, n)
        elif kind == 1:
            x = np.exp(random.normal(24, 0.15, n))
        else:
            x = 5e9 * random.weibull(random.uniform(3, 30), n)
        x = np.round(x, -6)
        mean, s = np.mean(x), np.std(x, ddof=1)
        ly = np.log(x)
        a = anderson(x, norm(mean, s))
        al = anderson(ly, norm(np.mean(ly), np.std(ly, ddof=1)))
        shape, scale = weibull_fit(x)
        aw = anderson(x, weibull_min(shape, scale=scale))
        tt = student.isf(0.05 / (2 * n), n - 2)
        case = dict(
            values=[float(v) for v in x],
            expected=dict(
                mean=float(mean), deviation=float(s), normal=float(a), lognormal=float(al), weibull=float(aw),
                shape=float(shape), scale=float(scale),
                critical=float((n - 1) / math.sqrt(n) * math.sqrt(tt**2 / (n - 2 + tt**2))),
            ),
        )
        if n <= 30 and k % 4 < 2:
            case["limit"] = weibull_limit(x, 0.9, 0.95)
        cases.append(case)
    return cases


def batches():
    cases = []
    for k in range(20):
        count = int(random.integers(2, 7))
        groups = [
            [float(v) for v in np.round(random.normal(100 + (k % 3) * random.normal(0, 2), 4, int(random.integers(4, 25))), 1 if k % 2 else 6)]
            for _ in range(count)
        ]
        found = anderson_ksamp(groups)
        cases.append(dict(batches=groups, statistic=float(found.statistic), critical=float(found.critical_values[3])))
    return cases


def ranks():
    cases = []
    for n in [5, 28, 29, 30, 45, 46, 100, 298, 299, 500, 3000]:
        for p, g in ((0.9, 0.95), (0.99, 0.95)):
            rank = 0
            while binom.sf(rank, n, 1 - p) >= g:
                rank += 1
            cases.append(dict(n=n, share=p, confidence=g, rank=rank))
    return cases


data = dict(factors=factors(), samples=samples(), batches=batches(), ranks=ranks())
(DATA / "materials.json").write_text(json.dumps(data, indent="\t") + "\n")
print({key: len(value) for key, value in data.items()}, sum("limit" in s for s in data["samples"]))
