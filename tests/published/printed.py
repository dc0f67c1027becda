"""Comparison of a computed value with a figure as it was printed."""

from decimal import Decimal

HAIR = 1e-6
"""Share of half a digit that is forgiven beyond it, for rounding of the binary kind."""


def half_digit(printed: str) -> float:
    """Half a unit in the last place of a figure as printed; blanks between groups of digits are allowed."""
    exponent = Decimal(printed.replace(" ", "")).as_tuple().exponent
    assert isinstance(exponent, int), f"{printed!r} is not a finite figure"
    return 0.5 * 10.0**exponent


def assert_as_printed(value: float, printed: str) -> None:
    """Fail unless `value` rounds to the figure printed: "73.94" allows 0.005 either way."""
    expected, allowed = float(printed.replace(" ", "")), half_digit(printed)
    assert abs(value - expected) <= allowed * (1.0 + HAIR), f"{value:.8g} does not print as {printed}"
