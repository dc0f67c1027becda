"""Ranges of the single estimates: met, just inside, just outside."""

import pytest

from bidcheck.errors import OutOfRange
from bidcheck.estimates.attainable import chart_efficiency
from bidcheck.estimates.context import anderson_efficiency, corripio_efficiency
from bidcheck.estimates.disc_friction import disc_friction_power, disc_friction_share, moment_coefficient
from bidcheck.estimates.guelich import guelich_hydraulic, guelich_multistage, guelich_single_stage
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
from bidcheck.estimates.market_surface import (
    ESOB_1450,
    ESOB_2900,
    MSV_2900,
    market_efficiency,
    market_median,
    outside_eu_scope,
)
from bidcheck.estimates.us_rule import outside_us_scope, us_minimum_efficiency, us_nominal_speed
from bidcheck.estimates.window import specific_speed_window
from bidcheck.hydraulics.power_balance import hydraulic_power
from bidcheck.hydraulics.specific_speed import FOOT, specific_speed, type_number

M3H = 1 / 3600
GPM = 231 * 0.0254**3 / 60


def refused(function, *figures):
    with pytest.raises(OutOfRange):
        function(*figures)
    return True


@pytest.mark.parametrize("function", [guelich_single_stage, guelich_hydraulic, guelich_multistage])
def test_range_of_the_table(function):
    for nq, flow in ((7, 0.005), (100, 0.005), (30, 18 * M3H)):
        assert 0 < function(nq, flow) < 1
    for nq, flow in ((6.99, 0.1), (100.1, 0.1), (30, 0.00499)):
        assert refused(function, nq, flow)
    assert function(30, 1.0 - 1e-9) == pytest.approx(function(30, 1.0 + 1e-9), abs=1e-6)


def test_range_of_the_chart():
    for nq, flow in ((10, 18), (80, 18000)):
        assert 0 < chart_efficiency(nq, flow * M3H) < 1
    for nq, flow in ((9.99, 100), (80.1, 100), (30, 17.99), (30, 18001)):
        assert refused(chart_efficiency, nq, flow * M3H)


def test_range_of_the_survey():
    for nq, flow in ((8, 6), (80, 1000)):
        assert 0 < market_median(ESOB_1450, nq, flow * M3H) < 1
    for nq, flow in ((7.99, 100), (80.1, 100), (30, 5.99), (30, 1001)):
        assert refused(market_median, ESOB_1450, nq, flow * M3H)
    for share in (0.0, 1.0):
        assert refused(market_efficiency, ESOB_1450, share, 30, 100 * M3H)


def test_range_of_the_us_rule():
    assert us_minimum_efficiency("ESCC", 3600, 30, 25 * GPM) > 0
    assert us_minimum_efficiency("ESCC", 3600, 30, 1000 * M3H) > 0
    for nq, flow in ((30, 24.9 * GPM), (30, 1001 * M3H), (7.9, 0.01), (80.1, 0.01)):
        assert refused(us_minimum_efficiency, "ESCC", 3600, nq, flow)
    assert (us_nominal_speed(1450), us_nominal_speed(3550), us_nominal_speed(2500)) == (1800, 3600, 1800)
    assert (us_nominal_speed(2545), us_nominal_speed(2546)) == (1800, 3600)


def eu(market_class=ESOB_1450, **changes):
    figures = {"nq": 30.0, "flow": 100 * M3H, "head": 30.0, "power": 11e3}
    return outside_eu_scope(market_class, **(figures | changes))


def test_scope_of_the_eu_regulation():
    assert eu() == eu(head=90.0) == eu(power=150e3) == eu(nq=80.0) == eu(flow=6 * M3H) == ""
    assert eu(ESOB_2900, head=140.0) == eu(MSV_2900, head=300.0, flow=99 * M3H) == ""
    assert "head is above 90 m" in eu(head=90.1)
    assert "head is above 140 m" in eu(ESOB_2900, head=140.1)
    assert "power" in eu(power=150.1e3)
    assert "specific speed" in eu(nq=80.1)
    assert "specific speed" in eu(nq=5.95)
    assert eu(nq=6.0) == ""
    assert "below 6" in eu(flow=5.9 * M3H)
    assert "above 100" in eu(MSV_2900, flow=100.1 * M3H)
    assert ";" in eu(flow=5 * M3H, power=200e3)


def test_scope_of_the_us_rule():
    inside = {"nq": 30.0, "flow": 100 * GPM, "head": 400 * FOOT}
    assert outside_us_scope("ESCC", **inside) == ""
    assert "459" in outside_us_scope("IL", **(inside | {"head": 460 * FOOT}))
    assert "5000" in outside_us_scope("ESFM", **(inside | {"nq": 97.0}))
    assert outside_us_scope("IL", **(inside | {"nq": 97.0})) == ""
    assert "25" in outside_us_scope("IL", **(inside | {"flow": 24 * GPM}))


def test_range_of_the_estimate_by_flow_alone():
    assert corripio_efficiency(50 * GPM) < corripio_efficiency(5000 * GPM)
    assert refused(corripio_efficiency, 49.9 * GPM)
    assert refused(corripio_efficiency, 5001 * GPM)
    assert refused(anderson_efficiency, 30.0, 0.0)


def test_range_of_the_head_coefficients():
    for function in (optimum_head_coefficient, shutoff_head_coefficient, leakage_share):
        assert function(7.0) > function(100.0) > 0
        assert refused(function, 6.9)
        assert refused(function, 100.1)
    assert refused(head_coefficient, 20.0, 1450.0, 0.0)
    assert refused(diameter_for_head, 20.0, 1450.0, 0.0)
    assert refused(specific_diameter, 0.3, 20.0, 0.0)


def test_cordier_line_between_and_outside_its_readings():
    assert 3.57 > cordier_specific_diameter(0.85) > 3.25
    assert refused(cordier_specific_diameter, 0.29)
    assert refused(cordier_specific_diameter, 5.01)
    assert cordier_ratio(0.214, 55.0, 130 * M3H, 2960.0) == pytest.approx(1.0, abs=0.05)


def test_disc_friction_in_both_forms():
    speed, flow, head, diameter = 2960.0, 130 * M3H, 55.0, 0.214
    power = disc_friction_power(998.2, speed, diameter, 1e-6)
    reynolds = speed * 3.14159265 / 30 * (diameter / 2) ** 2 / 1e-6
    number = type_number(specific_speed(speed, flow, head))
    share = disc_friction_share(moment_coefficient(reynolds), head_coefficient(head, speed, diameter), number)
    assert power / hydraulic_power(998.2, flow, head) == pytest.approx(share, rel=1e-6)
    assert refused(moment_coefficient, 0.0)


def test_leakage_has_no_visible_step():
    assert leakage_share(26.999) == pytest.approx(leakage_share(27.0), abs=0.0005)


def test_window_is_held_beyond_its_readings_and_says_so():
    below, above = specific_speed_window(10 * M3H), specific_speed_window(20000 * M3H)
    assert (below.low, below.held) == (10.0, True)
    assert (above.low, above.held) == (29.0, True)
    assert not specific_speed_window(18 * M3H).held
    assert 13 < specific_speed_window(1000 * M3H).low < 19
    assert refused(specific_speed_window, 0.0)


@pytest.mark.parametrize(("flow", "low"), [(18, 10), (180, 11), (360, 13), (720, 13), (1800, 19), (18000, 29)])
def test_window_passes_through_its_readings(flow, low):
    assert specific_speed_window(flow * M3H).low == pytest.approx(low, rel=1e-9)
    if 18 < flow < 18000:
        before, after = (specific_speed_window(share * flow * M3H).low for share in (0.999, 1.001))
        assert before <= low * (1 + 1e-9) <= after * (1 + 2e-9)
        assert after - before < 0.03
