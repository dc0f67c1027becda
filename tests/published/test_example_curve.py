"""The published example of a pump curve: best efficiency point, part load, power."""

import numpy as np
import pytest

from bidcheck.curve import Curve, Points
from bidcheck.fit import fit_curve

# source: definition of the US gallon, 231 cubic inches; of the foot, 0.3048 m; of the horsepower, 550 ft lbf/s
GPM, FOOT, HORSEPOWER = 231 * 0.0254**3 / 60, 0.3048, 745.69987
# source: Hydraulic Institute data library, example curve: gpm, ft, per cent, hp
FLOW = np.arange(0.0, 1300.0, 100.0)
HEAD = [200, 199, 196, 192, 190, 186, 180, 175, 165, 155, 140, 125, 100]
EFFICIENCY = [0, 25, 40, 50, 58, 65, 71, 75, 77, 78, 76, 72, 65]
POWER = [20.1, 24.7, 29.1, 33.1, 36.1, 38.4, 41.2, 43.3, 45.2, 46.5, 48.2, 46.6]


def column(values, factor, half_digit):
    n = len(values)
    return Points(
        FLOW[-n:] * GPM,
        np.array(values) * factor,
        np.full(n, 0.5 * GPM),
        np.full(n, half_digit * factor),
        np.arange(15 - n, 15),
    )


@pytest.fixture(scope="module")
def fits():
    head, efficiency = column(HEAD, FOOT, 0.5), column(EFFICIENCY, 0.01, 0.5)
    power = column(POWER, HORSEPOWER, 0.05)
    return fit_curve(Curve("curve.csv", None, 1780.0, 1, "water", 998.2, "shaft", head, efficiency, power, None))


# source: Hydraulic Institute data library, example curve: best efficiency flow as tabulated, 900 gpm, within 5 per cent
def test_best_efficiency_flow(fits):
    assert fits.bep.flow / GPM == pytest.approx(900, rel=0.05)
    low, high = fits.bep.flow_interval
    assert low < 900 * GPM < high
    assert fits.odd_points == ()


# source: Hydraulic Institute data library, example curve: efficiency at 0.75 and 1.1 of best efficiency flow over best
@pytest.mark.parametrize(("share", "ratio"), [(0.75, 0.949), (1.10, 0.977)])
def test_part_and_over_load(fits, share, ratio):
    assert fits.efficiency.at(share * fits.bep.flow) / fits.bep.efficiency == pytest.approx(ratio, abs=0.02)


# source: Hydraulic Institute data library, example curve: power agrees with Q H/(3960 eta) within 0.5 % at most points
def test_power_closes_at_most_points():
    computed = FLOW[1:] * HEAD[1:] / (39.60 * np.array(EFFICIENCY[1:]))
    close = np.abs(computed / POWER - 1) <= 0.005
    assert close.sum() > len(POWER) / 2


# source: Hydraulic Institute data library, example curve: derived power against the power tabulated at 900 gpm
def test_derived_power_matches_the_tabulated_power(fits):
    head, efficiency = column(HEAD, FOOT, 0.5), column(EFFICIENCY, 0.01, 0.5)
    derived = fit_curve(Curve("curve.csv", None, 1780.0, 1, "water", 998.2, "shaft", head, efficiency, None, None))
    assert derived.power.derived
    assert derived.power.at(900 * GPM) / HORSEPOWER == pytest.approx(45.2, rel=0.02)
