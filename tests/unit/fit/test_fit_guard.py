"""The second opinion where a fit is in doubt."""

import subprocess
import sys

import numpy as np
import pytest
from scipy.interpolate import PchipInterpolator

from bidcheck.fit import fit_curve, fit_points, guard
from bidcheck.fit.guard import in_doubt
from tests.build import points, sound_curve


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


def test_a_fit_that_turns_alone_is_in_doubt():
    steep = points(np.arange(7) * 20, [100.0, 10.0, 5.0, 3.0, 2.9, 2.8, 2.7])
    fit = fit_points(steep, "head")
    assert in_doubt(steep, fit)
    assert guard(steep, fit, 90 / 3600).guard_difference is not None


KNEE = points([0, 20, 40, 60, 80], [60.0, 60.0, 60.0, 59.0, 40.0])


def test_a_difference_beyond_the_scatter_is_told():
    fit = fit_points(KNEE, "head")
    checked = guard(KNEE, fit, 70 / 3600)
    difference = float(PchipInterpolator(KNEE.flow, KNEE.value)(70 / 3600)) - fit.at(70 / 3600)
    assert abs(difference) > 0.02 * 20.0
    assert checked.guard_flow == 70 / 3600
    assert checked.guard_difference == pytest.approx(difference)


def test_a_difference_within_the_scatter_is_not_told():
    fit = fit_points(KNEE, "head")
    assert guard(KNEE, fit, 5 / 3600).guard_difference is None


def test_outside_the_points_nothing_is_compared():
    fit = fit_points(KNEE, "head")
    assert guard(KNEE, fit, 90 / 3600) is fit


def test_the_curve_is_checked_at_the_flow_asked_for():
    assert fit_curve(sound_curve(head=KNEE)).head.guard_flow is None
    assert fit_curve(sound_curve(head=KNEE), 70 / 3600).head.guard_flow == 70 / 3600


def test_a_sound_curve_needs_no_scipy():
    code = (
        "import sys; from tests.build import sound_curve; from bidcheck.fit import fit_curve; "
        "fit_curve(sound_curve()); sys.exit('scipy' in sys.modules)"
    )
    assert subprocess.run([sys.executable, "-c", code], check=False).returncode == 0
