#!/usr/bin/env python3
"""Times NumPy and SciPy on the Monte Carlo study that the engine's bench measures, once warm.

    python3 tests/bench/monte_carlo.py

prints JSON: the median time of one run in seconds, the figures it came to and their standard errors, so that
the bench can see that both computed the same thing. Case D1: Earth, top 100 000 km above the surface; density
1300 ± 20 kg/m³ (normal), design stress 50 ± 3 GPa (lognormal), lift 19 to 21 t (uniform); 100 000 samples of
the taper, the mass of the line and the counterweight: mean, standard deviation, P5, P50 and P95 of each.
Vectorised over the samples; Gauss–Legendre with U at the nodes computed once, and as few nodes as reach 1e-9.
"""
import json
import statistics
import time

import numpy as np
from scipy.integrate import quad
from scipy.special import ndtri

GM, R, OMEGA = 3.986004418e14, 6378137.0, 7.292115e-5
TOP = R + 1e8
RS = (GM / OMEGA**2) ** (1 / 3)
SAMPLES = 100_000


def g(r):
    return GM / r**2 - OMEGA**2 * r


def depth(r):
    """U(r_s) − U(r)."""
    return (RS - r) * (GM / (RS * r) - OMEGA**2 * (RS + r) / 2)


def panel(a, b, count):
    nodes, weights = np.polynomial.legendre.leggauss(count)
    return depth((a + b) / 2 + (b - a) / 2 * nodes), (b - a) / 2 * weights


NODES = [panel(R, RS, 24), panel(RS, TOP, 12)]
DEPTH = np.concatenate([d for d, _ in NODES])
WEIGHTS = np.concatenate([w for _, w in NODES])


def size(density, stress, lift):
    k = density / stress
    base = lift * g(R) / stress
    taper = np.exp(k * depth(R))
    length = np.exp(-np.multiply.outer(k, DEPTH)) @ WEIGHTS
    mass = density * base * taper * length
    counterweight = stress * base * taper * np.exp(-k * depth(TOP)) / -g(TOP)
    return taper, mass, counterweight


def study(rng):
    density = 1300 + 20 * ndtri(rng.random(SAMPLES))
    sigma2 = np.log1p((3 / 50) ** 2)
    stress = np.exp(np.log(50e9) - sigma2 / 2 + np.sqrt(sigma2) * ndtri(rng.random(SAMPLES)))
    lift = 19e3 + 2e3 * rng.random(SAMPLES)
    figures = {}
    for name, values in zip(("taper", "mass", "counterweight"), size(density, stress, lift)):
        p5, p50, p95 = np.quantile(values, [0.05, 0.5, 0.95])
        u = values.std(ddof=1)
        figures[name] = {"mean": values.mean(), "u": u, "p5": p5, "p50": p50, "p95": p95}
    return figures


def check_quadrature():
    for density, stress in ((1300.0, 50e9), (1400.0, 38e9), (1200.0, 64e9)):
        k = density / stress
        exact = sum(
            quad(lambda r: np.exp(-k * depth(r)), a, b, epsabs=0, epsrel=1e-12)[0]
            for a, b in ((R, RS), (RS, TOP))
        )
        found = np.exp(-k * DEPTH) @ WEIGHTS
        assert abs(found / exact - 1) < 1e-9, found / exact - 1


check_quadrature()
rng = np.random.default_rng(1)
figures = study(rng)
times = []
for _ in range(9):
    start = time.perf_counter()
    study(rng)
    times.append(time.perf_counter() - start)
print(json.dumps({"seconds": statistics.median(times), "samples": SAMPLES, "figures": figures}))
