"""Specific speed and suction specific speed against printed figures."""

import math

import fluids.core
import fluids.pump
import pytest

from bidcheck.hydraulics.specific_speed import (
    specific_speed,
    specific_speed_us,
    suction_specific_speed,
    type_number,
)
from tests.published.printed import assert_as_printed


# source: PyPI `fluids` 1.3.1, example in the documentation of `specific_speed`
def test_specific_speed_as_documented():
    assert_as_printed(specific_speed(3550, 0.0402, 100.0), "22.50823")


# source: PyPI `fluids`, `specific_speed` and `suction_specific_speed`, run
@pytest.mark.parametrize(("n", "Q", "H"), [(3550, 0.0402, 100.0), (1480, 0.2778, 60.0), (590, 1.39, 20.0)])
def test_specific_speed_of_another_program(n, Q, H):
    speed_rpm = getattr(fluids.pump, "specific_speed", None) or fluids.core.specific_speed
    assert specific_speed(n, Q, H) == pytest.approx(speed_rpm(Q, H, n), rel=1e-9)


# source: GB 19762-2007, Annex A, worked example: double suction, 800 m³/h, 12 m, 1470 1/min, n_s' = 3.65 n √(Q/2)/H^0.75
def test_specific_speed_worked_example():
    assert_as_printed(3.65 * specific_speed(1470, 800 / 3600 / 2, 12.0), "277.4")


# source: Hydraulic Institute data library, definition of suction specific speed; figures worked by hand from it
@pytest.mark.parametrize(
    ("n", "flow_per_eye", "npsh3", "metric", "us"),
    [
        (2950, 110 / 3600, 3.0, "226.2", "11683"),
        (1480, 1200 / 3600 / 2, 5.5, "168.2", "8688"),
    ],
)
def test_suction_specific_speed(n, flow_per_eye, npsh3, metric, us):
    nss = suction_specific_speed(n, flow_per_eye, npsh3)
    assert_as_printed(nss, metric)
    assert_as_printed(specific_speed_us(nss), us)


# source: Hydraulic Institute data library, definition in US units: 3550 1/min, 440 US gpm, 10 ft worked by hand
def test_suction_specific_speed_us():
    nss = suction_specific_speed(3550, 440 / 4.402868 / 3600, 10 * 0.3048)
    assert_as_printed(specific_speed_us(nss), "13242")
    assert_as_printed(3550 * math.sqrt(440) / 10**0.75, "13242")


# source: type number of ISO 9906, 2π/60 n √Q/(gH)^0.75, and US gallon of 231 in³, foot of 0.3048 m (NIST SP 811)
def test_constants_of_specific_speed():
    assert_as_printed(specific_speed_us(1.0), "51.645")
    gallon = 231 * 0.0254**3
    assert_as_printed(math.sqrt(60 / gallon) * 0.3048**0.75, "51.645")
    assert_as_printed(1 / type_number(1.0), "52.919")
    assert_as_printed(60 / (2 * math.pi) * 9.80665**0.75, "52.919")
