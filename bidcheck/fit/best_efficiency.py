"""Best efficiency point of a fitted efficiency curve, with the interval of its flow."""

from typing import NamedTuple

import numpy as np

from bidcheck.curve import BestEfficiency, Fit
from bidcheck.fit.candidates import Candidates
from bidcheck.fit.degree import GRID, grid_powers
from bidcheck.fit.student import student_quantile

CONTENDER = 4.0
"""Leave-one-out error over that of the best degree up to which a degree widens the interval; derived by simulation."""


class Peak(NamedTuple):
    """Scaled flow of the maximum, and whether it lies inside, at the first or at the last point."""

    u: float
    place: str


def find_peak(coefficients: list[float], k: int) -> Peak:
    """Refine the maximum near grid node `k` of the polynomial with ascending coefficients in u."""
    slope = [i * c for i, c in enumerate(coefficients)][1:]
    low = float(GRID[max(k - 1, 0)])
    high = float(GRID[min(k + 1, len(GRID) - 1)])
    if _value(slope, low) <= 0.0:
        return Peak(low, "first" if k == 0 else "inside")
    if _value(slope, high) >= 0.0:
        return Peak(high, "last" if k == len(GRID) - 1 else "inside")
    curvature = [i * c for i, c in enumerate(slope)][1:]
    u = 0.5 * (low + high)
    for _ in range(60):  # Newton on the slope, bisection where it would leave the bracket
        here, bend = _value(slope, u), _value(curvature, u)
        low, high = (u, high) if here > 0.0 else (low, u)
        step = u - here / bend if bend < 0.0 else low
        following = step if low < step < high else 0.5 * (low + high)
        if abs(following - u) < 1e-12:
            break
        u = following
    return Peak(u, "inside")


def _value(coefficients: list[float], u: float) -> float:
    """Horner's rule."""
    total = 0.0
    for coefficient in reversed(coefficients):
        total = total * u + coefficient
    return total


def best_efficiency(
    fits: Candidates, chosen: int, shapes: list[bool], head: Fit | None
) -> tuple[BestEfficiency | None, float | None]:
    """Locate the maximum of the fitted efficiency inside its points.

    Parameters
    ----------
    fits : Candidates
        Of efficiency.
    chosen : int
        Which candidate is the fit.
    shapes : list of bool
        Which candidates have an allowed shape.
    head : Fit or None
        For the head at best efficiency.

    Returns
    -------
    bep : BestEfficiency or None
        None where efficiency is largest at the first or the last point.
    beyond : float or None
        The last flow, where efficiency still rises there. [m³/s]

    Notes
    -----
    Valid inside the points. The 95 % interval of the flow is that of the root of the slope (delta method, covariance
    of the fit, Student's t), joined with that of every other degree of allowed shape whose leave-one-out error is no
    more than four times that of the best, because the misfit of a polynomial is not scatter (that widening: derived,
    simulated curves with 0.3 to 0.5 % of scatter have their best efficiency inside in nine cases of ten; in one of
    two without it). It is not cut at the last point: best efficiency may lie beyond it.
    Source: delta method, Seber and Wild, Nonlinear Regression, 5.1.

    Examples
    --------
    >>> from bidcheck.curve import Points
    >>> from bidcheck.fit.candidates import candidates
    >>> q = np.linspace(0.0, 0.12, 7)
    >>> digit = np.full(7, 0.0005)
    >>> fits = candidates(Points(q, np.round(16 * q - 80 * q**2, 3), digit, digit, np.arange(7)), "efficiency")
    >>> bep, beyond = best_efficiency(fits, 0, [True] * 4, None)
    >>> round(bep.flow, 3), round(bep.efficiency, 3)
    (0.1, 0.8)
    """
    curves = grid_powers(fits.coefficients.shape[0]) @ fits.coefficients
    nodes = curves.argmax(axis=0).tolist()
    coefficients = fits.coefficients.T.tolist()
    lo, hi = fits.domain
    peak = find_peak(coefficients[chosen], nodes[chosen])
    if peak.place != "inside":
        return None, hi if peak.place == "last" else None
    low, high = _delta_interval(fits, chosen, peak.u, coefficients[chosen])
    for k in _contenders(fits, shapes):
        if k == chosen:
            continue
        other = _delta_interval(fits, k, find_peak(coefficients[k], nodes[k]).u, coefficients[k])
        if np.isfinite(other[0]):
            low, high = min(low, other[0]), max(high, other[1])
    middle, half = 0.5 * (lo + hi), 0.5 * (hi - lo)
    flow = middle + half * peak.u
    interval = (max(middle + half * low, 0.0), middle + half * high) if np.isfinite(high - low) else None
    head_there = head.at(flow) if head is not None and head.covers(flow) else None
    return BestEfficiency(flow, head_there, _value(coefficients[chosen], peak.u), interval), None


def _contenders(fits: Candidates, shapes: list[bool]) -> list[int]:
    """Candidates that describe the points about as well as the best."""
    errors = np.sqrt(fits.squared_errors.mean(axis=0)).tolist()
    usable = [k for k, allowed in enumerate(shapes) if allowed]
    bar = CONTENDER * max(min((errors[k] for k in usable), default=0.0), fits.rounding_variance**0.5)
    return [k for k in usable if errors[k] <= bar]


def _delta_interval(fits: Candidates, k: int, u: float, coefficients: list[float]) -> tuple[float, float]:
    """95 % interval of the root of the slope near `u`."""
    degree = fits.lowest + k
    order = np.arange(degree + 1)
    gradient = order * u ** np.maximum(order - 1, 0)
    curvature = sum(i * (i - 1) * c * u ** max(i - 2, 0) for i, c in enumerate(coefficients))
    if curvature >= 0.0:
        return -np.inf, np.inf
    variance = fits.variance(k) * float(gradient @ fits.unit_covariance(k) @ gradient)
    half = student_quantile(0.95, fits.freedom(k)) * max(variance, 0.0) ** 0.5 / -curvature
    return u - half, u + half
