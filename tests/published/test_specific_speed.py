"""Specific speed and suction specific speed against published figures."""

import fluids
import pytest

from bidcheck.hydraulics.specific_speed import (
    specific_speed,
    specific_speed_us,
    suction_specific_speed,
    type_number,
)
from tests.published.printed import assert_as_printed

M3H = 1 / 3600
GPM = 231 * 0.0254**3 / 60


# source: PyPI `fluids` 1.3.1, specific_speed(0.0402, 100, 3550)
def test_specific_speed():
    assert_as_printed(specific_speed(3550, 0.0402, 100.0), "22.50823")


# source: PyPI `fluids` 1.3.1, specific_speed, evaluated side by side
@pytest.mark.parametrize(("speed", "flow", "head"), [(590, 1.389, 20.0), (2960, 0.0361, 55.0), (1480, 0.005, 12.0)])
def test_specific_speed_beside_an_independent_implementation(speed, flow, head):
    assert specific_speed(speed, flow, head) == pytest.approx(fluids.specific_speed(flow, head, n=speed), rel=1e-12)


# source: Hydraulic Institute data library: Ns in US units is 51.645 times nq; type number nq/52.919
def test_ratios_between_the_forms():
    assert_as_printed(specific_speed_us(1.0), "51.645")
    assert_as_printed(1 / type_number(1.0), "52.919")


# source: formula of the Hydraulic Institute data library in hand form: rpm, US gpm, ft
def test_us_form_from_us_figures():
    nq = specific_speed(1770, 500 * GPM, 100 * 0.3048)
    assert specific_speed_us(nq) == pytest.approx(1770 * 500**0.5 / 100**0.75, rel=1e-12)


# source: formula of the Hydraulic Institute data library worked by hand: speed, flow per eye, NPSH3, metric, US
@pytest.mark.parametrize(
    ("speed", "flow", "npsh3", "metric", "us"),
    [
        (2950, 110 * M3H, 3.0, "226.2", "11683"),
        (1480, 600 * M3H, 5.5, "168.2", "8688"),
        (3550, 440 * GPM, 10 * 0.3048, None, "13242"),
    ],
)
def test_suction_specific_speed(speed, flow, npsh3, metric, us):
    nss = suction_specific_speed(speed, flow, npsh3)
    if metric is not None:
        assert_as_printed(nss, metric)
    assert_as_printed(specific_speed_us(nss), us)


# source: GB 19762-2007, Annex A, worked example, double suction: n_s' = 3.65 n √(Q/2)/H^0.75, 800 m³/h, 12 m, 1470 rpm
def test_specific_speed_of_a_double_suction_pump():
    assert_as_printed(3.65 * specific_speed(1470, 800 * M3H / 2, 12.0), "277.4")
