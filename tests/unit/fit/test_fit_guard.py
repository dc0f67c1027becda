"""The second opinion where a fit is in doubt."""

import subprocess
import sys

import numpy as np
import pytest
from scipy.interpolate import PchipInterpolator

from bidcheck.fit import fit_curve, fit_points, guard
from bidcheck.fit.guard import in_doubt
from tests.build import points, sound_curve

STEP = points([0, 10, 20, 100, 110, 120], [60.0, 59.9, 59.8, 30.0, 29.9, 29.8], half_digit=0.005)


def test_no_doubt_no_comparison():
    curve = sound_curve()
    fit = fit_points(curve.head, "head")
    assert not in_doubt(curve.head, fit)
    assert guard(curve.head, fit, 0.1) is fit


@pytest.mark.parametrize(("n", "doubt"), [(5, True), (6, False)])
def test_few_points_are_in_doubt(n, doubt):
    flow = np.linspace(0, 140, n)
    few = points(flow, np.round(50 - 0.0008 * flow**2, 1))
    fit = fit_points(few, "head")
    assert in_doubt(few, fit) is doubt
    assert guard(few, fit, 100 / 3600).guard_flow is None


def test_a_fit_that_turns_alone_is_held_against_interpolation():
    fit = fit_points(STEP, "head")
    checked = guard(STEP, fit, 15 / 3600)
    assert in_doubt(STEP, fit)
    expected = float(PchipInterpolator(STEP.flow, STEP.value)(15 / 3600)) - fit.at(15 / 3600)
    if abs(expected) > 2 * fit.rms:
        assert checked.guard_difference == pytest.approx(expected)
    else:
        assert checked.guard_difference is None


def test_a_difference_beyond_the_scatter_is_told():
    flow = [0, 20, 100, 120]
    few = points(flow, [60.0, 59.9, 30.0, 29.9])
    fit = fit_points(few, "head")
    largest = max(np.linspace(1, 119, 60), key=lambda q: abs(guard(few, fit, q / 3600).guard_difference or 0.0))
    checked = guard(few, fit, largest / 3600)
    expected = float(PchipInterpolator(few.flow, few.value)(largest / 3600)) - fit.at(largest / 3600)
    assert checked.guard_flow == largest / 3600
    assert checked.guard_difference == pytest.approx(expected)


def test_outside_the_points_nothing_is_compared():
    fit = fit_points(STEP, "head")
    assert guard(STEP, fit, 130 / 3600) is fit


def test_the_curve_is_checked_at_the_flow_asked_for():
    few = points([0, 20, 100, 120], [60.0, 59.9, 30.0, 29.9])
    assert fit_curve(sound_curve(head=few)).head.guard_flow is None
    flows = [fit_curve(sound_curve(head=few), q / 3600).head.guard_flow for q in np.linspace(1, 119, 60)]
    assert any(flow is not None for flow in flows)


def test_a_sound_curve_needs_no_scipy():
    code = (
        "import sys; from tests.build import sound_curve; from bidcheck.fit import fit_curve; "
        "fit_curve(sound_curve(), 0.1); sys.exit('scipy' in sys.modules)"
    )
    assert subprocess.run([sys.executable, "-c", code], check=False).returncode == 0
