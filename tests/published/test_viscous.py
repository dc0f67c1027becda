"""Viscosity correction against the standard's example as recalled and hand calculation."""

import numpy as np
import pytest

from bidcheck.hydraulics.viscous import viscous_factors, viscous_points
from tests.published.printed import assert_as_printed


# source: ANSI/HI 9.6.7 formulas worked by hand: cSt, m, m³/h, rpm, B, C_Q, C_η
@pytest.mark.parametrize(
    ("viscosity", "point", "parameter", "flow_factor", "efficiency_factor"),
    [
        (120, (77, 110, 2950), "5.521", "0.9378", "0.7380"),
        (50, (40, 100, 1450), "4.234", "0.9629", "0.8076"),
        (500, (60, 50, 2950), "14.912", "0.7616", "0.3853"),
    ],
)
def test_factors(viscosity, point, parameter, flow_factor, efficiency_factor):
    head, flow, speed = point
    factors = viscous_factors(viscosity * 1e-6, flow / 3600, head, speed)
    assert_as_printed(factors.parameter, parameter)
    assert_as_printed(factors.flow, flow_factor)
    assert_as_printed(factors.efficiency, efficiency_factor)


# source: from memory: ANSI/HI 9.6.7, worked example, 120 cSt, 110 m³/h, 77 m, 2950 rpm
def test_example_of_the_standard():
    factors = viscous_factors(120e-6, 110 / 3600, 77.0, 2950)
    assert_as_printed(factors.parameter, "5.5")
    assert_as_printed(factors.flow, "0.938")
    assert_as_printed(factors.efficiency, "0.738")


# source: ANSI/HI 9.6.7 formulas worked by hand: water efficiency 0.68 and specific gravity 0.90 on the first row above
def test_corrected_point():
    points = viscous_points(
        np.array([110 / 3600]),
        np.array([77.0]),
        np.array([0.68]),
        bep_flow=110 / 3600,
        bep_head=77.0,
        speed_rpm=2950,
        viscosity=120e-6,
        density=900.0,
    )
    assert_as_printed(3600 * points.flow[0], "103.15")
    assert_as_printed(points.head[0], "72.21")
    assert_as_printed(points.efficiency[0], "0.5018")
    assert_as_printed(points.power[0] / 1000, "36.39")
