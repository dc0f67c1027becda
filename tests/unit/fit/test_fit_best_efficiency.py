"""Best efficiency inside the points, at their ends, and its interval."""

import numpy as np
import pytest

from bidcheck.fit import fit_curve
from tests.build import points, sound_curve


def curve(flow, efficiency, half_digit=0.0005):
    return sound_curve(efficiency=points(flow, efficiency, half_digit=half_digit), power=None)


def test_maximum_of_a_parabola():
    flow = np.linspace(0, 560, 9)
    x = flow / 400
    fits = fit_curve(curve(flow, np.round(0.8 * (2 * x - x**2), 3)))
    assert fits.bep.flow * 3600 == pytest.approx(400, rel=0.003)
    assert fits.bep.efficiency == pytest.approx(0.8, abs=0.0005)
    assert fits.bep.head == pytest.approx(fits.head.at(fits.bep.flow))
    low, high = fits.bep.flow_interval
    assert low < 400 / 3600 < high
    assert high - low < 0.03 * fits.bep.flow
    assert fits.bep_beyond is None


@pytest.mark.parametrize(("last", "inside"), [(380, False), (400, False), (430, True)])
def test_efficiency_still_rising_at_the_last_point(last, inside):
    flow = np.linspace(0, last, 9)
    x = flow / 400
    fits = fit_curve(curve(flow, 0.8 * (2 * x - x**2), half_digit=1e-9))
    assert (fits.bep is not None) is inside or last == 400
    if last == 380:
        assert fits.bep_beyond == pytest.approx(last / 3600)


def test_efficiency_falling_from_the_first_point():
    flow = np.linspace(450, 600, 6)
    x = flow / 400
    fits = fit_curve(curve(flow, np.round(0.8 * (2 * x - x**2), 3)))
    assert fits.bep is None
    assert fits.bep_beyond is None


def test_no_efficiency_and_nothing_to_derive_it_from():
    fits = fit_curve(sound_curve(efficiency=None, power=None))
    assert fits.efficiency is None
    assert fits.bep is None
    assert fits.bep_beyond is None


def test_no_head_at_best_efficiency_outside_its_points():
    sound = sound_curve()
    short = points([0, 80, 160, 240], [74.0, 73.8, 72.7, 70.9])
    assert fit_curve(sound_curve(head=short)).bep.head is None
    assert fit_curve(sound).bep.head is not None


def test_flat_top_still_has_a_maximum():
    flow = np.linspace(0, 560, 11)
    x = flow / 400
    efficiency = np.round(np.minimum(0.8 * (2 * x - x**2), 0.79), 2)
    fits = fit_curve(curve(flow, efficiency, half_digit=0.005))
    assert 320 < fits.bep.flow * 3600 < 480
