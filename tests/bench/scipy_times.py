#!/usr/bin/env python3
"""Times SciPy and NumPy on what the engine's benches measure, in one process, once warm.

    python3 tests/bench/scipy_times.py

prints JSON: for each case the median time of one run in seconds and the figures it came to, so that the
bench can see that both computed the same thing. Case D1: Earth, density 1300 kg/m³, design stress 50 GPa,
lift 20 t, top 100 000 km above the surface. Needs python3-scipy.
"""
import json
import statistics
import time

import numpy as np
from numpy.polynomial.legendre import Legendre, leggauss
from scipy.integrate import quad, solve_ivp
from scipy.linalg import eigh

GM, R, OMEGA = 3.986004418e14, 6378137.0, 7.292115e-5
RHO, STRESS, LIFT, TOP, E = 1300.0, 50e9, 20e3, 6378137.0 + 1e8, 1e12
RS = (GM / OMEGA**2) ** (1 / 3)
K = RHO / STRESS
HOURS = 3600.0


def g(r):
    return GM / r**2 - OMEGA**2 * r


def rise(r):
    """U(r) − U(R)."""
    return (r - R) * (GM / (R * r) - OMEGA**2 * (R + r) / 2)


A0 = LIFT * g(R) / STRESS


def area(r):
    return A0 * np.exp(K * rise(r))


def sizing():
    below = quad(lambda r: RHO * area(r), R, RS, epsabs=0, epsrel=1e-10)[0]
    above = quad(lambda r: RHO * area(r), RS, TOP, epsabs=0, epsrel=1e-10)[0]
    counterweight = STRESS * area(TOP) / -g(TOP)
    return {"mass": below + above, "counterweight": counterweight}


CLIMBERS = [(R + 1.2e6, 12e3), (R + 9.1e6, 12e3), (R + 2.4e7, 12e3)]
COUNTERWEIGHT = STRESS * area(TOP) / -g(TOP)


def as_built():
    """Tension downwards at 2 000 points, stopping at each climber for its step."""
    points = np.linspace(TOP, R, 2000)
    stops = [TOP] + [r for r, _ in reversed(CLIMBERS)] + [R]
    tension = -COUNTERWEIGHT * g(TOP)
    found = []
    for start, end in zip(stops, stops[1:]):
        inside = points[(points <= start) & (points >= end)]
        step = solve_ivp(
            lambda r, T: RHO * area(r) * g(r),
            (start, end),
            [tension],
            method="DOP853",
            t_eval=inside,
            rtol=1e-9,
            atol=1e-3,
        )
        found.append(step.y[0])
        tension = step.y[0][-1]
        if inside[-1] != end:
            tension = solve_ivp(
                lambda r, T: RHO * area(r) * g(r),
                (inside[-1], end),
                [tension],
                method="DOP853",
                rtol=1e-9,
                atol=1e-3,
            ).y[0][-1]
        for radius, mass in CLIMBERS:
            if radius == end:
                tension -= mass * g(radius)
    whole = np.concatenate(found) / area(np.concatenate([points]))[: sum(map(len, found))]
    return {"anchorTension": float(tension), "points": int(whole.size)}


def lobatto(order):
    """Nodes and weights of Gauss–Lobatto quadrature, and the differentiation matrix on them."""
    polynomial = Legendre.basis(order)
    nodes = np.concatenate(([-1.0], np.sort(polynomial.deriv().roots().real), [1.0]))
    values = polynomial(nodes)
    weights = 2 / (order * (order + 1) * values**2)
    with np.errstate(divide="ignore", invalid="ignore"):
        derivative = (values[:, None] / values[None, :]) / (nodes[:, None] - nodes[None, :])
    np.fill_diagonal(derivative, 0.0)
    np.fill_diagonal(derivative, -derivative.sum(axis=1))
    return nodes, weights, derivative


ORDER = 12
NODES, WEIGHTS, DERIVATIVE = lobatto(ORDER)
FINE, FINE_WEIGHTS = leggauss(2 * ORDER)
# Lagrange basis and its derivative at the finer Gauss points.
BARY = np.array([1 / np.prod(NODES[i] - np.delete(NODES, i)) for i in range(ORDER + 1)])
BASIS = BARY / (FINE[:, None] - NODES)
BASIS /= BASIS.sum(axis=1, keepdims=True)
BASIS_SLOPE = BASIS @ DERIVATIVE


def periods():
    """The two longest periods in plane, out of plane and along, hours, by high-order elements."""
    edges = np.concatenate((np.geomspace(R, RS, 4), [TOP]))
    count = (len(edges) - 1) * ORDER + 1
    tension = lambda r: STRESS * area(r)
    longest = {}
    for name, stretch, stiffness in (
        ("inPlane", tension, lambda r: g(r) / r),
        ("outOfPlane", tension, lambda r: GM / r**3),
        ("along", lambda r: E * area(r), lambda r: -2 * GM / r**3 - OMEGA**2),
    ):
        S, M = np.zeros((count, count)), np.zeros((count, count))
        for n, (a, b) in enumerate(zip(edges, edges[1:])):
            half = (b - a) / 2
            r = (a + b) / 2 + half * FINE
            w = FINE_WEIGHTS * half
            mu = RHO * area(r)
            here = slice(n * ORDER, n * ORDER + ORDER + 1)
            S[here, here] += (BASIS_SLOPE.T * (w * stretch(r) / half**2)) @ BASIS_SLOPE
            S[here, here] += (BASIS.T * (w * mu * stiffness(r))) @ BASIS
            M[here, here] += (BASIS.T * (w * mu)) @ BASIS
        S[-1, -1] += COUNTERWEIGHT * stiffness(TOP)
        M[-1, -1] += COUNTERWEIGHT
        values = eigh(S[1:, 1:], M[1:, 1:], eigvals_only=True, subset_by_index=[0, 1])
        longest[name] = [2 * np.pi / np.sqrt(v) / HOURS for v in values]
    return longest


def timed(run, rounds):
    figures = run()
    times = []
    for _ in range(rounds):
        start = time.perf_counter()
        run()
        times.append(time.perf_counter() - start)
    return {"seconds": statistics.median(times), "figures": figures}


print(
    json.dumps(
        {
            "sizing": timed(sizing, 200),
            "asBuilt": timed(as_built, 15),
            "periods": timed(periods, 50),
        }
    )
)
