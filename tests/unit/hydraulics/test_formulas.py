"""Ranges and consistency of the plain formulas."""

import math

import numpy as np
import pytest

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.affinity import flow_at_speed, head_at_speed, npsh3_at_speed, power_at_speed
from bidcheck.hydraulics.driver import synchronous_speed
from bidcheck.hydraulics.power_balance import efficiency_from_power, printed_digits_tolerance, shaft_power
from bidcheck.hydraulics.ranges import inside, require_inside, require_positive
from bidcheck.hydraulics.specific_speed import specific_speed, suction_specific_speed
from bidcheck.hydraulics.suction import (
    air_pressure,
    friction_loss_at,
    npsh3_from_suction_specific_speed,
    npsh3_speed_exponent,
    npsh_available,
)


@pytest.mark.parametrize("bad", [0.0, -1.0, math.nan, math.inf])
def test_figures_that_must_be_positive(bad):
    with pytest.raises(OutOfRange, match="flow must be positive"):
        require_positive(flow=bad)
    with pytest.raises(OutOfRange):
        specific_speed(1480, 0.1, bad)
    with pytest.raises(OutOfRange):
        suction_specific_speed(1480, 0.1, bad)
    with pytest.raises(OutOfRange):
        npsh3_from_suction_specific_speed(1480, 0.1, bad)
    with pytest.raises(OutOfRange):
        shaft_power(1000.0, 0.1, 50.0, bad)
    with pytest.raises(OutOfRange):
        efficiency_from_power(1000.0, 0.1, 50.0, bad)
    with pytest.raises(OutOfRange):
        head_at_speed(10.0, 1480, bad)
    with pytest.raises(OutOfRange):
        synchronous_speed(bad, 4)


def test_ends_of_a_range_are_inside_in_any_unit():
    assert inside(18 / 3600 * 3600, 18, 18000)
    require_inside("flow", 18 / 3600, 18, 18000, unit="m³/h", factor=3600)
    with pytest.raises(OutOfRange, match=r"flow 17\.99 m³/h is outside 18 to 18000 m³/h"):
        require_inside("flow", 17.99 / 3600, 18, 18000, unit="m³/h", factor=3600)
    with pytest.raises(OutOfRange):
        require_inside("flow", math.nan, 18, 18000)


def test_affinity_keeps_arrays_and_comes_back():
    flow = np.array([0.0, 0.1, 0.2])
    there = flow_at_speed(flow, 1450, 1480)
    assert there.shape == flow.shape
    assert flow_at_speed(there, 1480, 1450) == pytest.approx(flow)
    assert power_at_speed(1.0, 1450, 1480) == pytest.approx(
        flow_at_speed(1.0, 1450, 1480) * head_at_speed(1.0, 1450, 1480)
    )


@pytest.mark.parametrize("exponent", [0.99, 2.01])
def test_npsh3_exponent_is_bounded(exponent):
    with pytest.raises(OutOfRange):
        npsh3_at_speed(3.0, 1480, 980, exponent)
    assert npsh3_at_speed(4.0, 1000, 500, 1.0) == pytest.approx(2.0)
    assert npsh3_at_speed(4.0, 1000, 500, 2.0) == pytest.approx(1.0)


def test_npsh3_speed_exponent_is_held_at_its_ends():
    assert npsh3_speed_exponent(0.2) == 1.0
    assert npsh3_speed_exponent(1.6) == 2.0
    assert npsh3_speed_exponent(0.75) == pytest.approx(1.25)
    assert npsh3_speed_exponent(1.15) == pytest.approx(1.75)


def test_power_and_efficiency_are_inverse():
    power = shaft_power(998.2, 0.125, 62.0, 0.825)
    assert efficiency_from_power(998.2, 0.125, 62.0, power) == pytest.approx(0.825)


def tolerance(**changes):
    figures = {"flow": (100.0, 0.5), "head": (50.0, 0.05), "power": (17.0, 0.05), "efficiency": (0.8, 0.0005)}
    return printed_digits_tolerance(**(figures | changes))


def test_coarser_digits_widen_the_tolerance():
    assert tolerance() < tolerance(power=(17.0, 0.5)) < tolerance(power=(17.0, 0.5), efficiency=(0.8, 0.005))
    exact = {"flow": (100.0, 0.0), "head": (50.0, 0.0), "power": (17.0, 0.0), "efficiency": (0.8, 0.0)}
    assert tolerance(**exact) == 0.0


def test_tolerance_covers_the_worst_rounding():
    ratio = (100.5 * 50.05) / (16.95 * 0.7995) / ((100 * 50) / (17.0 * 0.8))
    assert tolerance() == pytest.approx(ratio - 1)


def test_tolerance_without_significant_digits():
    assert tolerance(power=(0.4, 0.5)) == math.inf
    with pytest.raises(OutOfRange):
        tolerance(head=(0.0, 0.5))
    with pytest.raises(OutOfRange):
        tolerance(head=(10.0, -0.5))


def npsha(**changes):
    figures = {
        "pressure": 101325.0,
        "vapour_pressure": 2339.0,
        "density": 998.2,
        "liquid_level": 2.0,
        "friction_loss": 0.5,
    }
    return npsh_available(**(figures | changes))


def test_npsh_available_can_be_negative_and_refuses_nonsense():
    assert npsha(liquid_level=-12.0) < 0
    assert npsha(liquid_level=3.0) - npsha() == pytest.approx(1.0)
    for changes in ({"pressure": 0.0}, {"friction_loss": -0.1}, {"vapour_pressure": -1.0}, {"density": math.nan}):
        with pytest.raises(OutOfRange):
            npsha(**changes)


def test_friction_goes_with_the_square_of_flow():
    assert friction_loss_at(1.0, 0.1, 0.2) == pytest.approx(4.0)
    assert friction_loss_at(1.0, 0.1, 0.0) == 0.0
    with pytest.raises(OutOfRange):
        friction_loss_at(1.0, 0.0, 0.1)
    with pytest.raises(OutOfRange):
        friction_loss_at(1.0, 0.1, -0.1)


def test_air_pressure_range():
    assert air_pressure(-500.0) > 101325 > air_pressure(11000.0)
    for altitude in (-501.0, 11001.0):
        with pytest.raises(OutOfRange, match="altitude"):
            air_pressure(altitude)


@pytest.mark.parametrize("poles", [0, 1, 3, -2])
def test_poles_are_even(poles):
    with pytest.raises(OutOfRange, match="even number"):
        synchronous_speed(50.0, poles)
