"""Choice of the degree by leave-one-out error, and the shapes a fit may not have."""

from functools import lru_cache

import numpy as np

from bidcheck.curve import Column, Floats
from bidcheck.fit.candidates import Candidates

GRID = np.linspace(-1.0, 1.0, 81)
"""Scaled flows at which the shape of a fit is looked at."""
GRID.flags.writeable = False


@lru_cache(maxsize=8)
def grid_powers(columns: int) -> Floats:
    """Powers of the grid, shape (81, columns)."""
    powers: Floats = GRID[:, None] ** np.arange(columns)
    powers.flags.writeable = False
    return powers


def turns(values: Floats, tolerance: float = 0.0) -> int:
    """Count reversals of direction larger than `tolerance`.

    Parameters
    ----------
    values : array, shape (n,)
        A sequence.
    tolerance : float
        A rise or fall no larger than this is not seen. In the unit of `values`.

    Returns
    -------
    int
        How often the sequence changes between rising and falling.

    Examples
    --------
    >>> turns(np.array([0.0, 1.0, 0.9, 2.0]))
    2
    >>> turns(np.array([0.0, 1.0, 0.9, 2.0]), tolerance=0.1)
    0
    """
    direction, count = 0, 0
    low = high = extreme = float(values[0])
    for value in values.tolist():
        if direction == 0:
            low, high = min(low, value), max(high, value)
            if value - low > tolerance:
                direction, extreme = 1, value
            elif high - value > tolerance:
                direction, extreme = -1, value
        elif (value - extreme) * direction >= 0:
            extreme = value
        elif (extreme - value) * direction > tolerance:
            direction, extreme, count = -direction, value, count + 1
    return count


SMALL_TURN = 0.003
"""Rise or fall over the largest value that counts as no turn. Source: common practice, no source."""


def turns_allowed(values: Floats, column: Column) -> int:
    """Turns the points show; one at least for efficiency, whose maximum may lie between two points."""
    return max(turns(values), 1 if column == "efficiency" else 0)


def shapes_allowed(fits: Candidates) -> list[bool]:
    """Tell per candidate whether it turns no more often than the points, rounding set apart.

    Parameters
    ----------
    fits : Candidates
        Of d degrees.

    Returns
    -------
    list of bool, length d

    Notes
    -----
    A rise or fall within a full digit is not seen, since two printed figures may differ by that much where the
    true ones are equal; nor is one within 0.3 % of the largest value, however many digits are printed, since honest
    readings scatter by that much. Source: common practice, no source.
    """
    allowed = turns_allowed(fits.value, fits.column)
    curves = grid_powers(fits.coefficients.shape[0]) @ fits.coefficients
    rises = np.diff(curves, axis=0) > 0.0
    bare = np.count_nonzero(rises[1:] != rises[:-1], axis=0).tolist()
    digit = max(2.0 * float(fits.value_half_digit.max()), SMALL_TURN * float(np.abs(fits.value).max()))
    return [count <= allowed or turns(curves[:, k], digit) <= allowed for k, count in enumerate(bare)]


def choose_degree(fits: Candidates) -> tuple[int, list[bool]]:
    """Choose the lowest degree whose leave-one-out error is within one standard error of the best.

    Parameters
    ----------
    fits : Candidates
        Of d degrees.

    Returns
    -------
    index : int
        Which candidate. The lowest degree where the shape of none is allowed; `guard` then looks at it.
    shapes : list of bool, length d
        Which candidates have an allowed shape.

    Notes
    -----
    The error is the mean of squared leave-one-out residuals over points with neighbours on both sides: leaving an end
    out asks for extrapolation, which is never done with a fit, and would decide alone. The standard error is that of
    this mean for the best degree, no smaller than the variance of rounding, so that no degree is spent on printed
    digits.
    Source: Allen (1974), Technometrics 16, 125-127 (the error); Breiman, Friedman, Olshen and Stone (1984),
    Classification and Regression Trees, 3.4.3 (one standard error).
    """
    shapes = shapes_allowed(fits)
    squares = fits.squared_errors
    means = squares.mean(axis=0).tolist()
    usable = [k for k, allowed in enumerate(shapes) if allowed]
    if not usable:
        return 0, shapes
    best = min(usable, key=means.__getitem__)
    spread = float(squares[:, best].std(ddof=1)) / len(squares) ** 0.5 if len(squares) > 1 else 0.0
    bar = means[best] + max(spread, fits.rounding_variance)
    return next(k for k in usable if means[k] <= bar), shapes
