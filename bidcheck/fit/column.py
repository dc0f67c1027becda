"""The fit of one column: degree chosen, uncertainty attached."""

import numpy as np
from numpy.polynomial import Polynomial

from bidcheck.curve import Column, Fit, Points
from bidcheck.fit.candidates import Candidates, candidates
from bidcheck.fit.degree import choose_degree
from bidcheck.fit.student import student_quantile


def fit_points(points: Points, column: Column, derived: bool = False) -> Fit | None:
    """Fit a polynomial through points, none left out; None with fewer than 3 points.

    Parameters
    ----------
    points : Points
        Of one column, n of them. [m³/s; m, fraction or W]
    column : str
        Which column: head 2 to 5, efficiency 2 to 5 and zero at zero flow, power 1 to 4, NPSH3 1 to 3.
    derived : bool
        Whether the points were computed from other columns.

    Returns
    -------
    Fit or None

    Notes
    -----
    Valid for any flows that increase strictly. The degree is never above points - 2, so that freedom is left; the
    residual variance never below that of the printed digits, so that points lying exactly on a polynomial still have
    an honest uncertainty. The covariance holds the scatter of the points, not the misfit of a polynomial as such.
    Source: see `choose_degree` for the degree; covariance s² (XᵀX)⁻¹, Draper and Smith, Applied Regression Analysis,
    3rd ed., 5.

    Examples
    --------
    >>> q = np.linspace(0.0, 0.16, 9)
    >>> digit = np.full(9, 0.05)
    >>> fit = fit_points(Points(q, np.round(50 - 800 * q**2, 1), digit, digit, np.arange(9)), "head")
    >>> fit.degree, round(fit.at(0.1), 1)
    (2, 42.0)
    """
    fits = candidates(points, column)
    return None if fits is None else as_fit(fits, choose_degree(fits)[0], derived)


def as_fit(fits: Candidates, k: int, derived: bool = False) -> Fit:
    """Turn candidate `k` into a Fit."""
    degree, freedom = fits.lowest + k, fits.freedom(k)
    residuals = fits.residuals[:, k]
    return Fit(
        column=fits.column,
        polynomial=Polynomial(fits.coefficients[: degree + 1, k], domain=fits.domain, window=(-1.0, 1.0)),
        degree=degree,
        domain=fits.domain,
        points=len(fits.flow),
        rms=float(np.sqrt(residuals @ residuals / freedom)),
        largest_residual=float(np.abs(residuals).max()),
        covariance=fits.variance(k) * fits.unit_covariance(k),
        t95=student_quantile(0.95, freedom),
        derived=derived,
    )
