"""Power from efficiency and efficiency from power."""

import numpy as np
import pytest

from bidcheck.fit import derived_points, fit_curve
from tests.build import points, sound_curve


def test_derived_power_at_common_flows_above_zero():
    head = points([0, 100, 200, 300], [50, 48, 44, 38])
    efficiency = points([0, 100, 250, 300], [0, 60, 75, 70], 0.01)
    power = derived_points(head, efficiency, 1000.0)
    np.testing.assert_allclose(power.flow * 3600, [100, 300])
    assert power.value[0] == pytest.approx(1000 * 9.80665 * 100 / 3600 * 48 / 0.6)
    assert power.line.tolist() == [0, 0]
    share = np.sqrt((0.5 / 100) ** 2 + (0.05 / 48) ** 2 + (0.05 / 60) ** 2)
    assert power.value_half_digit[0] == pytest.approx(share * power.value[0])


def test_there_and_back():
    curve = sound_curve()
    power = derived_points(curve.head, curve.efficiency, 998.2)
    efficiency = derived_points(curve.head, power, 998.2)
    np.testing.assert_allclose(efficiency.value, curve.efficiency.value[1:])


def test_nothing_in_common():
    assert derived_points(points([0, 10], [5, 4]), points([5, 15], [0.5, 0.6]), 1000.0) is None


@pytest.mark.parametrize(("missing", "there"), [("power", "efficiency"), ("efficiency", "power")])
def test_only_the_missing_column_is_derived(missing, there):
    fits = fit_curve(sound_curve(**{missing: None}))
    assert fits.of(missing).derived
    assert not fits.of(there).derived
    assert fit_curve(sound_curve()).of(missing).derived is False


def test_density_is_that_of_the_curve():
    light = fit_curve(sound_curve(power=None, density=800.0)).power
    water = fit_curve(sound_curve(power=None)).power
    assert light.at(0.1) / water.at(0.1) == pytest.approx(800 / 998.2)


def test_motor_input_is_no_shaft_power():
    fits = fit_curve(sound_curve(efficiency=None, power_at="motor input"))
    assert fits.efficiency is None
    assert fits.power is not None


def test_best_efficiency_from_derived_efficiency():
    sound = fit_curve(sound_curve()).bep.flow
    assert fit_curve(sound_curve(efficiency=None)).bep.flow == pytest.approx(sound, rel=0.01)


def test_nothing_derived_without_head():
    fits = fit_curve(sound_curve(head=None, power=None))
    assert fits.power is None
    assert fits.head is None
    assert fits.bep.head is None
