"""A second opinion on a fit in doubt: shape-preserving interpolation of the same points."""

from dataclasses import replace

import numpy as np

from bidcheck.curve import Fit, Points
from bidcheck.fit.degree import grid_powers, turns, turns_allowed

FEW_POINTS = 5
LARGE_RESIDUAL = 0.04
NOISE_FACTOR = 3.0
"""Points up to which a fit is in doubt, residual over range from which it is, and multiple of the scatter from which
a difference counts; common practice, no source."""


def in_doubt(points: Points, fit: Fit) -> bool:
    """Whether a fit rests on few points, misses one widely, or turns where its points do not.

    Parameters
    ----------
    points : Points
        The points fitted.
    fit : Fit
        Their fit.

    Returns
    -------
    bool

    Examples
    --------
    >>> from bidcheck.fit import fit_points
    >>> q, digit = np.array([0.0, 0.1, 0.2, 0.3]), np.full(4, 0.05)
    >>> points = Points(q, 50 - 80 * q**2, digit, digit, np.arange(4))
    >>> in_doubt(points, fit_points(points, "head"))
    True
    """
    if len(points) <= FEW_POINTS:
        return True
    if fit.largest_residual > LARGE_RESIDUAL * float(points.value.max() - points.value.min()):
        return True
    curve = grid_powers(fit.degree + 1) @ np.asarray(fit.polynomial.coef, dtype=np.float64)
    return turns(curve, 2.0 * float(points.value_half_digit.max())) > turns_allowed(points.value, fit.column)


def guard(points: Points, fit: Fit, flow: float) -> Fit:
    """Compare a fit in doubt with shape-preserving interpolation at one flow.

    Parameters
    ----------
    points : Points
        The points fitted, odd ones left out.
    fit : Fit
        Their fit.
    flow : float
        Where to compare. [m³/s]

    Returns
    -------
    Fit
        With `guard_flow` and `guard_difference` (interpolation less fit) filled where the fit is in doubt and the
        difference exceeds three times the scatter of the points, rounding included, or 4 % of their range where the
        scatter itself is larger; else the fit as it was.

    Notes
    -----
    Valid inside the points; outside them, and below three points, nothing is compared.
    Source: Fritsch and Butland (1984), SIAM J. Sci. Stat. Comput. 5, 300-304 (the interpolation); thresholds common
    practice, no source.

    Examples
    --------
    >>> from bidcheck.fit import fit_points
    >>> q, digit = np.linspace(0.0, 0.3, 7), np.full(7, 0.05)
    >>> points = Points(q, 50 - 80 * q**2, digit, digit, np.arange(7))
    >>> guard(points, fit_points(points, "head"), 0.2).guard_flow is None
    True
    """
    if not fit.covers(flow) or not in_doubt(points, fit):
        return fit
    from scipy.interpolate import PchipInterpolator

    inside = min(max(flow, fit.domain[0]), fit.domain[1])
    difference = float(PchipInterpolator(points.flow, points.value)(inside)) - float(fit.polynomial(inside))
    rounding = float((points.value_half_digit**2).mean() / 3.0) ** 0.5
    large = LARGE_RESIDUAL * float(points.value.max() - points.value.min())
    if abs(difference) <= max(NOISE_FACTOR * rounding, min(NOISE_FACTOR * fit.rms, large)):
        return fit
    return replace(fit, guard_flow=flow, guard_difference=difference)
