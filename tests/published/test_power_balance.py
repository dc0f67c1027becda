"""Power balance against the hand formulas of the trade and a published curve."""

import pytest

from bidcheck.hydraulics.power_balance import efficiency_from_power, printed_digits_tolerance, shaft_power
from tests.published.printed import assert_as_printed

GPM = 231 * 0.0254**3 / 60
FOOT = 0.3048
HP = 745.700
METRIC_HP = 735.499


# source: hand formulas of the trade: P[kW] = Q[m³/h] H[m] SG / (367.098 η); hp = gpm ft SG / (3954.3 η)
def test_constants_of_the_hand_formulas():
    assert_as_printed(1000 / shaft_power(1000.0, 1 / 3600, 1.0, 1.0), "367.098")
    assert_as_printed(HP / shaft_power(1000.0, GPM, FOOT, 1.0), "3954.3")


# source: the trade's rounded constants 3960 and 366.6 imply 998.6 and 1001 kg/m³
def test_density_implied_by_the_rounded_constants():
    assert_as_printed(1000 * (HP / 3960) / shaft_power(1000.0, GPM, FOOT, 1.0), "998.6")
    assert_as_printed(1000 * (1000 / 366.6) / shaft_power(1000.0, 1 / 3600, 1.0, 1.0), "1001")


# source: definitions of the units: 1 m³/h in US gpm, US gpm in m³/h, imperial gallon, foot, hp, metric hp
def test_ratios_of_units_mistaken_for_one_another():
    assert_as_printed(1 / 3600 / GPM, "4.402868")
    assert_as_printed(4.54609e-3 / (60 * GPM), "1.20095")
    assert_as_printed(1 / FOOT, "3.281")
    assert_as_printed(1000 / HP, "1.341")
    assert_as_printed(1000 / METRIC_HP, "1.360")


# source: Hydraulic Institute data library, example curve: gpm, ft, per cent, hp; agrees within 0.5 % at most points
@pytest.mark.parametrize(
    ("gpm", "feet", "per_cent", "horsepower"),
    [
        (100, 199, 25, 20.1),
        (200, 196, 40, 24.7),
        (300, 192, 50, 29.1),
        (500, 186, 65, 36.1),
        (600, 180, 71, 38.4),
        (700, 175, 75, 41.2),
        (800, 165, 77, 43.3),
        (900, 155, 78, 45.2),
        (1000, 140, 76, 46.5),
        (1200, 100, 65, 46.6),
    ],
)
def test_published_curve_closes_within_its_digits(gpm, feet, per_cent, horsepower):
    efficiency = efficiency_from_power(998.6, gpm * GPM, feet * FOOT, horsepower * HP)
    half_width = printed_digits_tolerance(
        flow=(gpm, 0.0), head=(feet, 0.5), power=(horsepower, 0.05), efficiency=(per_cent, 0.5)
    )
    assert abs(100 * efficiency / per_cent - 1) <= half_width + 0.005


# source: definition of the synchronous speed as listed by every motor catalogue: 50 and 60 Hz, 2 to 8 poles
@pytest.mark.parametrize(
    ("frequency", "poles", "printed"),
    [(50, 2, "3000"), (50, 4, "1500"), (50, 6, "1000"), (60, 2, "3600"), (60, 4, "1800"), (60, 8, "900")],
)
def test_synchronous_speed(frequency, poles, printed):
    from bidcheck.hydraulics.driver import synchronous_speed

    assert_as_printed(synchronous_speed(frequency, poles), printed)
