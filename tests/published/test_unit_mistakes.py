"""Factors of the mistakes that explain a gap, as the program holds them, against printed conversion factors."""

import pytest

from bidcheck import explain
from tests.published.printed import assert_as_printed


# source: from memory: NIST SP 811 (2008), App. B.8: horsepower (550 ft lbf/s), metric horsepower, US gallon, imperial
# source: gallon, foot; the ratios printed in the trade's books
@pytest.mark.parametrize(
    ("factor", "printed"),
    [
        (explain.HORSEPOWER, "1.341"),
        (1 / explain.HORSEPOWER, "0.745700"),
        (explain.METRIC_HORSEPOWER, "1.360"),
        (1 / explain.METRIC_HORSEPOWER, "0.735499"),
        (explain.US_GALLONS, "4.402868"),
        (explain.IMPERIAL_OF_US, "1.20095"),
        (explain.FEET, "3.281"),
        (1 / explain.FEET, "0.3048"),
    ],
)
def test_factors_of_units(factor, printed):
    assert_as_printed(factor, printed)


# source: definitions of the units: US gallon of 231 cubic inches, imperial gallon of 4.54609 l, inch of 25.4 mm
def test_factors_by_definition():
    us_gallon, imperial_gallon = 231 * 0.0254**3, 4.54609e-3
    assert pytest.approx(1 / 60 / us_gallon, rel=5e-7) == explain.US_GALLONS
    assert pytest.approx(imperial_gallon / us_gallon, rel=5e-6) == explain.IMPERIAL_OF_US


def factors(mistakes, quantity):
    """Factors of one quantity, with the words."""
    return {mistake.words: mistake.factor for mistake in mistakes if mistake.quantity == quantity}


# source: affinity laws at 60 over 50 Hz: flow 1.2, head 1.44, power 1.728
def test_factors_of_frequency():
    mistakes = explain.frequency_mistakes()
    for quantity, printed in (("flow", "1.2"), ("head", "1.44"), ("power", "1.728")):
        forth, back = factors(mistakes, quantity).values()
        assert_as_printed(forth, printed)
        assert forth * back == pytest.approx(1.0)


# source: common practice, no source: ratio of density left out at a specific gravity of 0.75
def test_factor_of_density_left_out():
    left_out = factors(explain.density_mistakes(750.0, of_water=False), "power")["density is left out of power"]
    assert_as_printed(left_out, "1.333")


# source: common practice, no source: the ratios 1.341 and 1.333, and 1.201 and 1.200, lie too close to tell apart
@pytest.mark.parametrize(("gap", "least"), [(1.337, 2), (1.2005, 2)])
def test_neighbours_are_all_named(gap, least):
    density = explain.density_mistakes(750.0, of_water=True)
    mistakes = (*explain.UNIT_MISTAKES, *density, *explain.frequency_mistakes())
    named = explain.mistakes_that_close(gap, {"flow": 1, "head": 1, "power": -1}, mistakes)
    assert len(named) >= least
