"""Polynomials of every degree that may be fitted through the points of one column.

Head 2 to 5, efficiency 2 to 5 and zero at zero flow, power 1 to 4, NPSH3 1 to 3, never above points - 2. With fewer
than 4 points of head or efficiency the lowest degree comes down to points - 2, that is 1; with fewer than 3 points
nothing is fitted. Ranges of degree: common practice, no source.
"""

from dataclasses import dataclass
from functools import lru_cache

import numpy as np

from bidcheck.curve import Column, Floats, Points
from bidcheck.fit.least_squares import Factors, factorise, nested_solutions

DEGREES: dict[Column, tuple[int, int]] = {"head": (2, 5), "efficiency": (2, 5), "power": (1, 4), "npsh3": (1, 3)}
"""Lowest and highest degree per column; common practice, no source."""
HIGHEST = max(highest for _, highest in DEGREES.values())
FEWEST_POINTS = 3
"""A line needs one point more than its two coefficients to leave a residual."""


@dataclass(frozen=True, eq=False, slots=True)
class Candidates:
    """Fits of degree lowest, lowest + 1, … in scaled flow u, one column each.

    Attributes
    ----------
    flow, value, value_half_digit : array, shape (n,)
        The points that carry the fit: those of the column, for efficiency without zero flow.
    lowest : int
        Degree of the first candidate.
    parameters : array of int, shape (d,)
        Free coefficients of each candidate.
    coefficients : array, shape (highest + 1, d)
        Ascending powers of u.
    residuals, left_out : array, shape (n, d)
        Value minus fit, and value minus the fit through all other points.
    leverage : array, shape (n, d)
    unit_covariance_root : array, shape (highest + 1, m)
        Its first `parameters` columns times their transpose are the covariance for unit variance.
    rounding_variance : float
        Mean variance that printing to the last digit leaves: half digit squared over 3 (uniform).
    """

    column: Column
    flow: Floats
    value: Floats
    value_half_digit: Floats
    domain: tuple[float, float]
    lowest: int
    parameters: tuple[int, ...]
    coefficients: Floats
    residuals: Floats
    left_out: Floats
    leverage: Floats
    unit_covariance_root: Floats
    rounding_variance: float

    @property
    def squared_errors(self) -> Floats:
        """Squared leave-one-out residuals of the points that have neighbours on both sides, shape (inner points, d).

        Leaving an end out asks for extrapolation, which is never done with a fit. Efficiency has its zero before
        the first point.
        """
        inner: Floats = self.left_out[0 if self.column == "efficiency" else 1 : -1] ** 2
        return inner

    def freedom(self, k: int) -> int:
        """Degrees of freedom candidate `k` leaves."""
        return len(self.flow) - self.parameters[k]

    def unit_covariance(self, k: int) -> Floats:
        """Covariance of the coefficients of candidate `k` for unit residual variance."""
        root = self.unit_covariance_root[: self.lowest + k + 1, : self.parameters[k]]
        return root @ root.T

    def variance(self, k: int) -> float:
        """Residual variance of candidate `k`, no smaller than the printed digits leave."""
        residual = self.residuals[:, k]
        return max(float(residual @ residual) / self.freedom(k), self.rounding_variance)


def scaled_flow(flow: Floats, domain: tuple[float, float]) -> Floats:
    """Flow [m³/s] brought to -1 … 1 on `domain`."""
    lo, hi = domain
    scaled: Floats = (2.0 * flow - lo - hi) / (hi - lo)
    return scaled


def without(points: Points, index: int) -> Points:
    """All points but one."""
    keep = np.arange(len(points)) != index
    return select(points, keep)


def select(points: Points, keep: "np.typing.NDArray[np.bool_]") -> Points:
    """Points where `keep` is true."""
    return Points(
        points.flow[keep],
        points.value[keep],
        points.flow_half_digit[keep],
        points.value_half_digit[keep],
        points.line[keep],
    )


def candidates(points: Points, column: Column) -> Candidates | None:
    """Fit every admissible degree at once; None with fewer than 3 points.

    Parameters
    ----------
    points : Points
        Of one column, n of them.
    column : str
        Which column: it sets the degrees and whether the fit is zero at zero flow.

    Returns
    -------
    Candidates or None

    Notes
    -----
    Valid for any flows that increase strictly.
    Leave-one-out residual e/(1 - h) with leverage h: Allen (1974), Technometrics 16, 125-127.

    Examples
    --------
    >>> q = np.array([0.0, 0.1, 0.2, 0.3, 0.4])
    >>> digit = np.full(5, 0.05)
    >>> points = Points(q, 50 - 80 * q**2, digit, digit, np.arange(5))
    >>> candidates(points, "head").coefficients[:3, 0]
    array([46.8, -6.4, -3.2])
    """
    n = len(points)
    if n < FEWEST_POINTS:
        return None
    domain = (float(points.flow[0]), float(points.flow[-1]))
    start = 1 if column == "efficiency" and domain[0] == 0.0 else 0
    flow, value, half = points.flow[start:], points.value[start:], points.value_half_digit[start:]
    factors, root = _factors(flow.tobytes(), domain, min(HIGHEST, n - 2), column == "efficiency")
    lowest, highest = (min(degree, n - 2, root.shape[0] - 1) for degree in DEGREES[column])
    shape = root.shape[1] - root.shape[0]  # 0, or -1 where the fit is held at zero
    first, last = lowest + shape, highest + 1 + shape
    coefficients, residuals = nested_solutions(factors, root, value)
    residuals, leverage = residuals[:, first:last], factors.leverage[:, first:last]
    left_out = residuals / np.maximum(1.0 - leverage, 1e-12)
    return Candidates(
        column=column,
        flow=flow,
        value=value,
        value_half_digit=half,
        domain=domain,
        lowest=lowest,
        parameters=tuple(range(first + 1, last + 1)),
        coefficients=coefficients[: highest + 1, first:last],
        residuals=residuals,
        left_out=left_out,
        leverage=leverage,
        unit_covariance_root=root,
        rounding_variance=float(half @ half) / (3.0 * len(half)),
    )


@lru_cache(maxsize=8)
def _factors(flow: bytes, domain: tuple[float, float], degree: int, through_zero: bool) -> tuple[Factors, Floats]:
    """Factorised design in u, and the matrix from qᵀy to coefficients in u, shape (degree + 1, columns).

    Kept for a few sets of flows, since the columns of one curve mostly share theirs.
    """
    u = scaled_flow(np.frombuffer(flow), domain)
    if not through_zero:
        factors = factorise(u[:, None] ** np.arange(degree + 1))
        return factors, factors.inverse
    lo, hi = domain
    zero = (hi + lo) / (hi - lo)  # u + zero vanishes at zero flow
    factors = factorise((u + zero)[:, None] * u[:, None] ** np.arange(degree))
    m = factors.inverse.shape[0]
    root = np.zeros((m + 1, m))
    root[:-1] = zero * factors.inverse
    root[1:] += factors.inverse
    return factors, root
