"""Seeded honest pump curves of many shapes, printed and read as bidders print and read them."""

from typing import NamedTuple

import numpy as np

from bidcheck.curve import Curve, Floats, Points

# source: shape figures of the estimates by specific speed: Hydraulic Institute sketch, read by pixel, "approximate"
SHARE = np.array([0.0, 0.25, 0.5, 0.75, 1.0, 1.1, 1.25, 1.45])
NQ20 = np.array([0.0, 0.41, 0.73, 0.93, 1.0, 0.99, 0.93, 0.80])
NQ60 = np.array([0.0, 0.36, 0.67, 0.90, 1.0, 0.98, 0.82, 0.55])


class Synthetic(NamedTuple):
    """A curve and where its best efficiency truly is."""

    curve: Curve
    best_flow: float
    shape: int
    """0: knee at best efficiency, 1: from the sketch by specific speed, 2: smooth cubic."""


def printed(values: Floats, digits: int) -> tuple[Floats, float]:
    """Values rounded to significant digits of the largest, and half of the last place."""
    step = 10.0 ** (np.floor(np.log10(np.abs(values).max())) - digits + 1)
    return np.round(values / step) * step, 0.5 * step


def flows_over_best(rng: np.random.Generator, n: int) -> Floats:
    """Even, jittered, or a wide first step."""
    top = rng.uniform(1.15, 1.4)
    kind = rng.integers(3)
    if kind == 0:
        return np.concatenate([[0.0], np.linspace(rng.uniform(0.2, 0.4), top, n - 1)])
    x = np.linspace(0.0, top, n)
    if kind == 1:
        x[1:-1] += rng.uniform(-0.35, 0.35, n - 2) * top / (n - 1)
    return x


def head_shape(rng: np.random.Generator, x: Floats, nq: float) -> Floats:
    """Head over that at best efficiency: power law, slight droop, falling off, bump near shutoff."""
    shutoff = 1.083 * np.exp(0.47 * nq / 100)
    fall = shutoff - 1.0
    kind = rng.integers(4)
    if kind == 0:
        return shutoff - fall * x ** rng.uniform(1.6, 3.0)
    if kind == 1:
        droop = rng.uniform(0.0, 0.25)
        return shutoff + droop * fall * x - fall * (1 + droop) * x**2
    if kind == 2:
        return shutoff - fall * (0.7 * x + 0.3 * x**4)
    return shutoff - fall * x**1.8 + rng.uniform(0.0, 0.03) * np.exp(-(((x - 0.1) / 0.15) ** 2))


def efficiency_shape(rng: np.random.Generator, x: Floats, nq: float, kind: int) -> Floats:
    """Efficiency over the best."""
    from scipy.interpolate import CubicSpline

    t = (nq - 20) / 40
    if kind == 0:
        return 1 - np.abs(1 - x) ** rng.uniform(1.9, 2.6) * np.where(x > 1, 1 + 0.6 * t, 1.0)
    if kind == 1:
        return CubicSpline(SHARE, np.clip(NQ20 + (NQ60 - NQ20) * t, 0.0, 1.0))(x)
    return x * (2 - x) - rng.uniform(0.1, 0.4) * x * (x - 1) ** 2 * (1.0 if nq > 40 else -0.3)


def honest_curve(rng: np.random.Generator, noise: float | None = None, n: int | None = None) -> Synthetic:
    """A curve of nq 12 to 80 with 7 to 14 points; `noise` is the relative scatter of reading, 0.3 to 0.5 % if None."""
    nq, best_flow, best_head = rng.uniform(12, 80), 10 ** rng.uniform(-2.3, 0.3), 10 ** rng.uniform(1.0, 2.2)
    n = n or int(rng.integers(7, 15))
    x = flows_over_best(rng, n)
    digits = int(rng.integers(3, 5))
    flow, flow_half = printed(x * best_flow, digits)
    if (np.diff(flow) <= 0).any():
        return honest_curve(rng, noise, n)
    shape = int(rng.integers(3))
    best = rng.uniform(0.6, 0.87)
    idle = rng.uniform(0.35, 0.75)
    best_power = 998.2 * 9.80665 * best_flow * best_head / best
    values = {
        "head": (head_shape(rng, x, nq) * best_head, digits, x >= 0),
        "efficiency": (efficiency_shape(rng, x, nq, shape) * best, 3, x >= (0.01 if rng.random() < 0.3 else 0)),
        "power": (
            best_power * (idle + (1 - idle) * x ** rng.uniform(0.8, 1.3) - (0.1 if nq > 40 else 0) * x * (x - 1)),
            digits,
            x >= 0,
        ),
        "npsh3": (2.0 + rng.uniform(1.0, 2.4) * x ** rng.uniform(1.8, 3.2) + 0.2 * np.exp(-6 * x), 2, x > 0.25),
    }
    scatter = rng.uniform(0.003, 0.005) if noise is None else noise
    columns = {}
    for name, (exact, places, given) in values.items():
        read, half = printed(exact * (1 + scatter * rng.standard_normal(n)), places)
        count = int(given.sum())
        lines = np.arange(2, n + 2)[given]
        columns[name] = Points(flow[given], read[given], np.full(count, flow_half), np.full(count, half), lines)
    curve = Curve("curve.csv", 0.3, 1480.0, 1, "water", 998.2, "shaft", **columns)
    return Synthetic(curve, best_flow, shape)


def mistyped(points: Points, index: int, factor: float) -> Points:
    """The points with one value multiplied."""
    value = points.value.copy()
    value[index] *= factor
    return Points(points.flow, value, points.flow_half_digit, points.value_half_digit, points.line)
