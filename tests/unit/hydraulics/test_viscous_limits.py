"""Limits of the viscosity correction."""

import numpy as np
import pytest

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.viscous import viscous_factors, viscous_head_factor, viscous_parameter, viscous_points

M3H = 1 / 3600


def test_water_is_not_corrected_whatever_the_size():
    factors = viscous_factors(1.0e-6, 5000 * M3H, 20.0, 590)
    assert factors.parameter < 1
    assert (factors.flow, factors.efficiency) == (1.0, 1.0)


def test_factors_start_from_one_without_a_step():
    viscosity = 50e-6
    scale = viscous_parameter(viscosity, 100 * M3H, 40.0, 1450)
    just_above = viscosity / scale**2 * 1.001
    factors = viscous_factors(just_above, 100 * M3H, 40.0, 1450)
    assert factors.parameter > 1
    assert factors.flow == pytest.approx(1.0, abs=1e-4)
    assert factors.efficiency == pytest.approx(1.0, abs=1e-4)


@pytest.mark.parametrize(
    ("viscosity", "flow", "head", "speed", "words"),
    [
        (100e-6, 260.1, 60.0, 1480, "flow"),
        (100e-6, 2.9, 20.0, 1480, "flow"),
        (100e-6, 100.0, 130.2, 2950, "head"),
        (100e-6, 100.0, 5.9, 1450, "head"),
        (100e-6, 250.0, 10.0, 1480, "specific speed"),
        (3000e-6, 3.0, 20.0, 1450, "parameter B"),
        (3001e-6, 260.0, 20.0, 1450, "viscosity"),
    ],
)
def test_outside_the_method_is_refused(viscosity, flow, head, speed, words):
    with pytest.raises(OutOfRange, match=words):
        viscous_factors(viscosity, flow * M3H, head, speed)


def test_ends_of_the_range_are_served():
    assert viscous_factors(3000e-6, 260 * M3H, 20.0, 1450).parameter < 40
    assert viscous_factors(100e-6, 260 * M3H, 60.0, 1480).flow < 1
    assert viscous_factors(100e-6, 100 * M3H, 130.0, 2950).flow < 1


def test_head_is_kept_at_shutoff_and_falls_most_at_large_flow():
    factor = viscous_head_factor(0.9, np.array([0.0, 0.5, 1.0, 1.2]))
    assert factor[0] == 1.0
    assert factor[2] == pytest.approx(0.9)
    assert (np.diff(factor) < 0).all()


def points(**changes):
    fields = {
        "flow": np.array([50.0, 100.0]) * M3H,
        "head": np.array([90.0, 80.0]),
        "efficiency": np.array([0.5, 0.7]),
        "bep_flow": 100 * M3H,
        "bep_head": 80.0,
        "speed_rpm": 1450.0,
        "viscosity": 50e-6,
        "density": 900.0,
    }
    return viscous_points(**(fields | changes))


def test_stages_share_the_head():
    two = points(stages=2)
    one = points(head=np.array([45.0, 40.0]), bep_head=40.0)
    assert two.flow == pytest.approx(one.flow)
    assert two.head == pytest.approx(2 * one.head)
    assert two.power == pytest.approx(2 * one.power)


def test_power_balances_after_the_correction():
    result = points()
    assert result.power * result.efficiency == pytest.approx(900.0 * 9.80665 * result.flow * result.head)


def test_shutoff_is_to_be_left_out():
    with pytest.raises(OutOfRange, match="shutoff"):
        points(efficiency=np.array([0.0, 0.7]))


@pytest.mark.parametrize(
    ("viscosity", "flow", "head", "speed"),
    [
        (1.76e-6, 3.0, 20.0, 1450),
        (100e-6, 3.0, 20.0, 1450),
        (100e-6, 100.0, 6.0, 960),
        (100e-6, 100.0, 20.0, 59.99 / (100 / 3600) ** 0.5 * 20**0.75),
    ],
)
def test_just_inside_the_method(viscosity, flow, head, speed):
    assert viscous_factors(viscosity, flow * M3H, head, speed).flow < 1


@pytest.mark.parametrize(
    ("viscosity", "flow", "head", "speed", "words"),
    [
        (100e-6, 2.99, 20.0, 1450, "flow"),
        (100e-6, 100.0, 5.99, 960, "head"),
        (100e-6, 100.0, 20.0, 60.01 / (100 / 3600) ** 0.5 * 20**0.75, "specific speed"),
    ],
)
def test_just_outside_the_method(viscosity, flow, head, speed, words):
    with pytest.raises(OutOfRange, match=words):
        viscous_factors(viscosity, flow * M3H, head, speed)


def test_parameter_just_below_and_at_its_end():
    scale = viscous_parameter(1e-6, 3 * M3H, 20.0, 1450)
    assert viscous_factors(1e-6 * (39.99 / scale) ** 2, 3 * M3H, 20.0, 1450).parameter == pytest.approx(39.99)
    with pytest.raises(OutOfRange, match="parameter B"):
        viscous_factors(1e-6 * (40.01 / scale) ** 2, 3 * M3H, 20.0, 1450)


def test_head_factor_at_half_flow():
    assert viscous_head_factor(0.9378, np.array([0.5]))[0] == pytest.approx(1 - 0.0622 * 0.5946036, abs=1e-7)


@pytest.mark.parametrize("viscosity", [0.36e-6, 1.0e-6, 1.75e-6])
def test_water_in_a_small_pump_is_not_corrected_for_being_water(viscosity):
    factors = viscous_factors(viscosity, 3.0 * M3H, 20.0, 1450)
    assert factors.parameter > 1
    assert (factors.flow, factors.efficiency) == (1.0, 1.0)
