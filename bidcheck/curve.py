"""Curve points as supplied, and what is fitted through them. Arrays are read-only, flows strictly increasing."""

from dataclasses import dataclass
from typing import TYPE_CHECKING, Literal

import numpy as np
import numpy.typing as npt

from bidcheck.errors import OutOfRange
from bidcheck.quantity import Kind

if TYPE_CHECKING:
    from numpy.polynomial import Polynomial

Floats = npt.NDArray[np.float64]
Ints = npt.NDArray[np.int64]
Column = Literal["head", "efficiency", "power", "npsh3"]
COLUMNS: tuple[Column, ...] = ("head", "efficiency", "power", "npsh3")
COLUMN_WORDS: dict[Column, str] = {
    "head": "head",
    "efficiency": "efficiency",
    "power": "shaft power",
    "npsh3": "NPSH3",
}
COLUMN_KINDS: dict[Column, Kind] = {
    "head": Kind.HEAD,
    "efficiency": Kind.SHARE,
    "power": Kind.POWER,
    "npsh3": Kind.NPSH,
}


@dataclass(frozen=True, eq=False, slots=True)
class Points:
    """One quantity of one curve at the flows where it was given.

    Attributes
    ----------
    flow, value : array, shape (n,)
        Flow strictly increasing [m³/s]; value in SI (m, fraction, W, m).
    flow_half_digit, value_half_digit : array, shape (n,)
        Half a unit in the last printed place of each figure, in the same units.
    line : array of int, shape (n,)
        Line of the file where the point stands; 0 where it has none (derived points).
    flow_unit, value_unit : float
        One unit of the heading in SI, as flow and value were written; 0 where not known.
    """

    flow: Floats
    value: Floats
    flow_half_digit: Floats
    value_half_digit: Floats
    line: Ints
    flow_unit: float = 0.0
    value_unit: float = 0.0

    def __post_init__(self) -> None:
        for array in (self.flow, self.value, self.flow_half_digit, self.value_half_digit, self.line):
            if array.shape != self.flow.shape or array.ndim != 1:
                raise ValueError("points of a curve need arrays of one common length")
            array.flags.writeable = False
        if not (np.isfinite(self.flow).all() and np.isfinite(self.value).all()):
            raise ValueError("points of a curve must be finite")
        if (np.diff(self.flow) <= 0).any():
            raise ValueError("flows of a curve must increase strictly")

    def __len__(self) -> int:
        return len(self.flow)


@dataclass(frozen=True, eq=False, slots=True)
class Curve:
    """One supplied curve: its points and the basis they are stated on.

    `impeller` [m] is None where the bid names no diameter; `stages` is the number of stages the head is given
    for; `density` [kg/m³] is that of the liquid the power is given for.
    """

    file: str
    """Path inside the inquiry folder, for messages."""
    impeller: float | None
    speed_rpm: float
    stages: int
    liquid: Literal["water", "as pumped"]
    density: float
    power_at: Literal["shaft", "motor input"]
    head: Points | None
    efficiency: Points | None
    power: Points | None
    npsh3: Points | None

    def points(self, column: Column) -> Points | None:
        """Points of one column, None where the curve has none."""
        points: Points | None = getattr(self, column)
        return points


@dataclass(frozen=True, eq=False, slots=True)
class OddPoint:
    """A point that lies off its own curve, likely misread.

    `would_fit` is the value the curve through the other points has there; `deviation` is value less `would_fit` as a
    share of the curve's largest value.
    """

    column: Column
    line: int
    flow: float
    value: float
    would_fit: float
    deviation: float


@dataclass(frozen=True, eq=False, slots=True)
class Fit:
    """A polynomial through the points of one column, in scaled flow u = (2Q - lo - hi)/(hi - lo).

    Attributes
    ----------
    polynomial : numpy Polynomial
        With `domain` (lo, hi) in m³/s: call it with flow in m³/s.
    domain : (float, float)
        First and last flow with points [m³/s]. Outside it the fit is not defined.
    points : int
    rms, largest_residual : float
        Root mean square with n - p degrees of freedom, and largest absolute residual, in SI of the column.
    half_width : callable or None
        Standard error s(Q) times Student's t at 95 %: half the width of the confidence interval of the curve.
    derived : bool
        True where the points were computed from other columns (power from efficiency or the other way round).
    guard_flow, guard_difference : float or None
        Filled where the fit is in doubt: the value of a shape-preserving interpolation minus the fit at
        `guard_flow`, when it exceeds the noise of the points.
    """

    column: Column
    polynomial: "Polynomial"
    degree: int
    domain: tuple[float, float]
    points: int
    rms: float
    largest_residual: float
    covariance: Floats
    """Covariance of the coefficients in u, shape (degree + 1, degree + 1); zeros where no freedom is left."""
    t95: float
    """Student's t for a two-sided 95 % interval with the freedom left; inf where none is left."""
    derived: bool = False
    guard_flow: float | None = None
    guard_difference: float | None = None

    def covers(self, flow: float) -> bool:
        """Whether `flow` [m³/s] lies inside the points (a relative hair of 1e-9 allowed)."""
        lo, hi = self.domain
        hair = 1e-9 * max(hi, 1e-12)
        return lo - hair <= flow <= hi + hair

    def at(self, flow: float) -> float:
        """Value at `flow` [m³/s].

        Raises
        ------
        OutOfRange
            If `flow` lies outside the points: nothing is extrapolated.
        """
        if not self.covers(flow):
            lo, hi = self.domain
            raise OutOfRange(f"{self.column} asked at {flow:.6g} m³/s, points reach from {lo:.6g} to {hi:.6g}")
        return float(self.polynomial(flow))

    def half_width(self, flow: float) -> float:
        """Half the width of the 95 % confidence interval of the curve at `flow` [m³/s]; inf if not estimable."""
        lo, hi = self.domain
        u = (2.0 * flow - lo - hi) / (hi - lo)
        powers = u ** np.arange(self.covariance.shape[0])
        variance = float(powers @ self.covariance @ powers)
        return self.t95 * float(np.sqrt(max(variance, 0.0))) if np.isfinite(self.t95) else float("inf")


@dataclass(frozen=True, slots=True)
class BestEfficiency:
    """Best efficiency point of a fitted curve. [m³/s, m, fraction]

    `flow_interval` is the 95 % interval of the flow, None where it cannot be estimated.
    """

    flow: float
    head: float | None
    efficiency: float
    flow_interval: tuple[float, float] | None


@dataclass(frozen=True, eq=False, slots=True)
class Fits:
    """What is fitted through one curve.

    `bep` is None where best efficiency is not inside the points; then `bep_beyond` is the last flow with points if
    efficiency still rises there, else None (no efficiency, or no maximum).
    """

    head: Fit | None
    efficiency: Fit | None
    power: Fit | None
    npsh3: Fit | None
    bep: BestEfficiency | None
    bep_beyond: float | None
    odd_points: tuple[OddPoint, ...]

    def of(self, column: Column) -> Fit | None:
        """Fit of one column, None where the curve has none."""
        fit: Fit | None = getattr(self, column)
        return fit
