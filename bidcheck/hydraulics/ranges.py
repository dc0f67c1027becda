"""Refusal of figures outside the range a formula is valid for."""

import math
from typing import TypeVar

import numpy as np
import numpy.typing as npt

from bidcheck.errors import OutOfRange

HAIR = 1e-9
"""Relative slack, so that a figure exactly at the end of a range passes in any unit."""

Numbers = TypeVar("Numbers", float, npt.NDArray[np.float64])
"""A float, or an array of floats of shape (n,); the result has the same form."""


def inside(value: float, low: float, high: float) -> bool:
    """Whether `value` lies in [low, high], the ends and a hair included.

    Examples
    --------
    >>> inside(1.0, 1.0, 2.0), inside(2.1, 1.0, 2.0)
    (True, False)
    """
    return low - HAIR * abs(low) <= value <= high + HAIR * abs(high)


def require_positive(**figures: float) -> None:
    """Refuse figures that are not positive and finite; the keyword names them in the message.

    Raises
    ------
    OutOfRange
        If any figure is zero, negative, infinite or not a number.

    Examples
    --------
    >>> require_positive(flow=0.1, head=20.0)
    """
    for name, value in figures.items():
        if not (value > 0 and math.isfinite(value)):
            raise OutOfRange(f"{name.replace('_', ' ')} must be positive, found {value:.6g}")


def require_inside(what: str, value: float, low: float, high: float, *, unit: str = "", factor: float = 1.0) -> None:
    """Refuse a figure outside [low, high]. All are stated in `unit`, `value` times `factor` being in it.

    Raises
    ------
    OutOfRange
        If `value` is outside, with the range in words.

    Examples
    --------
    >>> require_inside("flow", 0.1, 18, 18000, unit="m³/h", factor=3600)
    """
    if not inside(value * factor, low, high):
        unit = f" {unit}" if unit else ""
        raise OutOfRange(f"{what} {value * factor:.4g}{unit} is outside {low:g} to {high:g}{unit}")
