"""Figures in evaluation.json: nine significant digits, in the unit of their key, null never NaN."""

import math

from bidcheck.quantity import Kind
from bidcheck.units import from_si

DIGITS = 9


def number(value: float) -> float | None:
    """Nine significant digits; what is not finite is null."""
    if not math.isfinite(value):
        return None
    return float(f"{value:.{DIGITS}g}") + 0.0


def in_unit(value: float | None, kind: Kind) -> float | None:
    """A figure in the unit of its key, null where there is none."""
    if value is None:
        return None
    return number(from_si(value, kind.json_unit, kind) if kind.json_unit else value)
