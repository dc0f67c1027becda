"""Everything fitted through one curve."""

from dataclasses import dataclass

from bidcheck.curve import Column, Curve, Fit, Fits, OddPoint, Points
from bidcheck.fit.best_efficiency import best_efficiency
from bidcheck.fit.candidates import Candidates, candidates
from bidcheck.fit.column import as_fit
from bidcheck.fit.degree import choose_degree
from bidcheck.fit.derived_columns import derived_points
from bidcheck.fit.guard import guard
from bidcheck.fit.odd_points import set_apart


@dataclass(frozen=True, eq=False, slots=True)
class _Fitted:
    """One column fitted: points used, candidates, the one chosen."""

    points: Points
    fits: Candidates
    chosen: int
    shapes: list[bool]
    fit: Fit


def fit_curve(curve: Curve, check_flow: float | None = None) -> Fits:
    """Fit head, efficiency, power and NPSH3 of one curve and locate its best efficiency point.

    Parameters
    ----------
    curve : Curve
        As supplied.
    check_flow : float or None
        Flow at which fits in doubt are compared with shape-preserving interpolation, such as the duty. [m³/s]

    Returns
    -------
    Fits
        Odd points are left out of the fits and listed; a fit without its first or last point ends at the next. Power
        missing from a curve is derived from efficiency, and efficiency from power, where head is given and power is
        meant at the shaft; such fits are marked derived. A column with fewer than 3 points has no fit.

    Notes
    -----
    Valid for head and power stated for the same stages.
    Source: see `fit_points`, `odd_points`, `derived_points`, `best_efficiency`, `guard`.

    Examples
    --------
    >>> import numpy as np
    >>> q = np.linspace(0.0, 0.14, 8)
    >>> digit = np.full(8, 0.05)
    >>> head = Points(q, np.round(50 - 800 * q**2, 1), digit, digit, np.arange(2, 10))
    >>> efficiency = Points(q, np.round(16 * q - 80 * q**2, 3), digit, digit / 100, np.arange(2, 10))
    >>> fits = fit_curve(Curve("curve.csv", 0.3, 1480.0, 1, "water", 998.2, "shaft", head, efficiency, None, None))
    >>> round(fits.bep.flow, 3), round(fits.bep.head, 1), fits.power.derived
    (0.1, 42.0, True)
    """
    odd: list[OddPoint] = []
    head = _fit_stated(curve.head, "head", odd)
    efficiency = _fit_stated(curve.efficiency, "efficiency", odd)
    power = _fit_stated(curve.power, "power", odd)
    npsh3 = _fit_stated(curve.npsh3, "npsh3", odd)
    if head is not None and curve.power_at == "shaft":
        if power is None and efficiency is not None:
            power = _fit_derived(derived_points(head.points, efficiency.points, curve.density), "power")
        elif efficiency is None and power is not None:
            points = derived_points(head.points, power.points, curve.density)
            efficiency = _fit_derived(points, "efficiency")
    bep, beyond = None, None
    if efficiency is not None:
        bep, beyond = best_efficiency(
            efficiency.fits, efficiency.chosen, efficiency.shapes, None if head is None else head.fit
        )
    return Fits(
        head=_guarded(head, check_flow),
        efficiency=_guarded(efficiency, check_flow),
        power=_guarded(power, check_flow),
        npsh3=_guarded(npsh3, check_flow),
        bep=bep,
        bep_beyond=beyond,
        odd_points=tuple(odd),
    )


def _fit_stated(points: Points | None, column: Column, odd: list[OddPoint]) -> _Fitted | None:
    """Fit a column as supplied; odd points are appended to `odd` and left out."""
    if points is None:
        return None
    found, others, fits = set_apart(points, column)
    odd.extend(found)
    return None if fits is None else _fit(others, fits, derived=False)


def _fit_derived(points: Points | None, column: Column) -> _Fitted | None:
    """Fit a derived column; what is odd in it was found in the columns it comes from."""
    fits = None if points is None else candidates(points, column)
    return None if points is None or fits is None else _fit(points, fits, derived=True)


def _fit(points: Points, fits: Candidates, derived: bool) -> _Fitted:
    """Choose among the candidate fits of a column."""
    chosen, shapes = choose_degree(fits)
    return _Fitted(points, fits, chosen, shapes, as_fit(fits, chosen, derived))


def _guarded(fitted: _Fitted | None, flow: float | None) -> Fit | None:
    """The fit, compared at `flow` where one is given."""
    if fitted is None:
        return None
    return fitted.fit if flow is None else guard(fitted.points, fitted.fit, flow)
