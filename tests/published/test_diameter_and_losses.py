"""Head coefficient, diameter, disc friction, leakage, NPSH3 and window against figures from outside."""

import math

import pytest

from bidcheck.estimates.disc_friction import disc_friction_share, moment_coefficient
from bidcheck.estimates.head_coefficient import (
    cordier_ratio,
    cordier_specific_diameter,
    diameter_for_head,
    head_coefficient,
    optimum_head_coefficient,
    shutoff_head_coefficient,
    specific_diameter,
)
from bidcheck.estimates.loss_ceiling import leakage_share
from bidcheck.estimates.npsh3_expected import expected_npsh3
from bidcheck.estimates.window import specific_speed_window
from bidcheck.hydraulics.specific_speed import specific_speed, type_number
from tests.published.printed import assert_as_printed

M3H = 1 / 3600
GPM = 231 * 0.0254**3 / 60


# source: Gülich, Centrifugal Pumps, equation 3.26, worked by hand: m³/h per eye, m per stage, rpm, diameter in mm
@pytest.mark.parametrize(
    ("flow", "head", "speed", "printed"),
    [(130, 55, 2960, "214"), (1000, 60, 1480, "463"), (60, 50, 2950, "199"), (2500, 20, 590, "712")],
)
def test_diameter_of_the_optimum_head_coefficient(flow, head, speed, printed):
    coefficient = optimum_head_coefficient(specific_speed(speed, flow * M3H, head))
    diameter = diameter_for_head(head, speed, coefficient)
    assert_as_printed(1000 * diameter, printed)
    assert head_coefficient(head, speed, diameter) == pytest.approx(coefficient)


# source: from memory: Gülich, head coefficient at shutoff; over the optimum 1.083 e^(0.47 nq/100), which the Hydraulic
# source: Institute's sketch of curve shapes has at 1.15 for nq 20 and 1.41 for nq 60, "approximate", here to 4 %
def test_shutoff_head_over_best_efficiency_head():
    assert_as_printed(shutoff_head_coefficient(7) / optimum_head_coefficient(7) / math.exp(0.47 * 0.07), "1.083")
    assert_as_printed(shutoff_head_coefficient(60) / optimum_head_coefficient(60) / math.exp(0.47 * 0.60), "1.083")
    assert_as_printed(shutoff_head_coefficient(60), "1.094")
    for nq, sketch in ((20, 1.15), (60, 1.41)):
        assert shutoff_head_coefficient(nq) / optimum_head_coefficient(nq) == pytest.approx(sketch, rel=0.04)


# source: Cordier (1953), definition of the specific diameter and straight lines in logarithms between the readings,
# source: worked by hand: 214.4 mm, 55 m, 130 m³/h, 2960 rpm
def test_specific_diameter_and_its_ratio_to_the_line():
    assert_as_printed(specific_diameter(0.2144, 55.0, 130 * M3H), "5.437")
    assert_as_printed(cordier_ratio(0.2144, 55.0, 130 * M3H, 2960.0), "1.013")


# source: Cordier (1953), readings of the line as quoted in the literature: type number, specific diameter
@pytest.mark.parametrize(
    ("number", "printed"),
    [
        (0.3, "9.66"), (0.4, "6.98"), (0.5, "5.65"), (0.6, "4.70"), (0.7, "4.05"), (0.8, "3.57"),
        (0.9, "3.25"), (1.0, "3.01"), (2.0, "1.89"), (3.0, "1.57"), (4.0, "1.40"), (5.0, "1.26"),
    ],
)  # fmt: skip
def test_cordier_line(number, printed):
    assert_as_printed(cordier_specific_diameter(number), printed)


# source: Daily and Nece (1960), regime IV at gap 0.05 and Re 3 million, with ψ of Gülich equation 3.26, by hand
@pytest.mark.parametrize(("nq", "printed"), [(10, "0.228"), (20, "0.069"), (30, "0.037"), (40, "0.025"), (60, "0.017")])
def test_disc_friction_over_hydraulic_power(nq, printed):
    share = disc_friction_share(moment_coefficient(3e6), optimum_head_coefficient(nq), type_number(nq))
    assert_as_printed(share, printed)


# source: Daily and Nece (1960): at Re 3 million and a gap of 0.05 the boundary layers are turbulent and separate,
# source: regime IV; at Re 1000 and a gap of 0.02 laminar and merged, regime I
def test_regime_of_disc_friction():
    assert moment_coefficient(3e6) == pytest.approx(0.102 * 0.05**0.1 / 3e6**0.2)
    assert moment_coefficient(1e3, 0.02) == pytest.approx(2 * math.pi / (0.02 * 1e3))


# source: Daily and Nece (1960), formula of each regime worked by hand: gap over radius, Re, C_M; regimes I, I, II, II,
# source: III, III, IV, IV, where each is the largest of the four
@pytest.mark.parametrize(
    ("gap", "reynolds", "printed"),
    [
        (0.01, 1e3, "0.6283"),
        (0.02, 1e3, "0.3142"),
        (0.2, 1e4, "0.03150"),
        (0.1, 2e4, "0.02078"),
        (0.01, 1e6, "0.005450"),
        (0.01, 1e5, "0.009692"),
        (0.1, 1e7, "0.003226"),
        (0.05, 1e6, "0.004770"),
    ],
)
def test_moment_coefficient_of_every_regime(gap, reynolds, printed):
    assert_as_printed(moment_coefficient(reynolds, gap), printed)


# source: Gülich, Centrifugal Pumps, Table 3.5, by hand: 4.1/20^1.6 and 0.15/60^0.6
def test_leakage():
    assert_as_printed(leakage_share(20.0), "0.0340")
    assert_as_printed(leakage_share(60.0), "0.0129")
    assert leakage_share(20.0, seals=2) == 2 * leakage_share(20.0)


# source: common practice, no source: suction specific speed 9000 US, band 7000 to 11 000, worked by hand
def test_ordinary_npsh3():
    assert_as_printed(expected_npsh3(2950, 110 * M3H).ordinary, "4.25")
    band = expected_npsh3(1480, 600 * M3H)
    assert_as_printed(band.ordinary, "5.25")
    assert band.low == pytest.approx(band.ordinary * (9 / 11) ** (4 / 3))
    assert band.high == pytest.approx(band.ordinary * (9 / 7) ** (4 / 3))


# source: Hydraulic Institute, chart of attainable efficiency, low ends of its curves read by pixel: m³/h, nq
@pytest.mark.parametrize(
    ("flow", "printed"), [(18, "10"), (180, "11"), (360, "13"), (720, "13"), (1800, "19"), (18000, "29")]
)
def test_low_end_of_the_window(flow, printed):
    window = specific_speed_window(flow * M3H)
    assert_as_printed(window.low, printed)
    assert (window.high, window.held) == (90.0, False)


# source: common practice, no source: at 500 US gpm pumps of Ns 600 to 3000 US are on offer everywhere, of half the
# source: least of these nowhere
def test_window_at_five_hundred_gallons():
    window = specific_speed_window(500 * GPM)
    for ns in (600, 1000, 2000, 3000):
        assert window.low <= ns / 51.645 <= window.high
    assert not window.low <= 300 / 51.645 <= window.high
