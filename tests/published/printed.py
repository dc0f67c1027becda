"""Comparison of a computed value with a figure as it was printed."""

from decimal import Decimal


def assert_as_printed(value: float, printed: str) -> None:
    """Assert that `value` lies within half a unit in the last place of the figure `printed`, and a hair."""
    figure = Decimal(printed)
    exponent = figure.as_tuple().exponent
    assert isinstance(exponent, int), f"{printed!r} is not a number"
    half_digit = 0.5 * 10.0**exponent
    difference = abs(float(value) - float(figure))
    assert difference <= half_digit * (1 + 1e-6) + 1e-12, f"{value!r} is not {printed} as printed"
