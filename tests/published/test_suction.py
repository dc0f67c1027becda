"""NPSH available and air pressure against figures worked outside the project."""

import pytest

from bidcheck.hydraulics.suction import air_pressure, npsh3_from_suction_specific_speed, npsh_available
from tests.published.printed import assert_as_printed

AIR = 101_325.0


# source: definition of NPSH worked by hand with IAPWS water: pressure, vapour pressure, density, level, loss, NPSHa
@pytest.mark.parametrize(
    ("liquid", "level", "loss", "printed"),
    [
        ((AIR, 2339.2, 998.16), 3.0, 1.0, "12.112"),
        ((AIR, 2339.2, 998.16), -3.0, 1.0, "6.112"),
        ((AIR, 47414.7, 971.78), 3.0, 1.0, "7.657"),
        ((AIR, AIR, 958.35), 6.0, 1.2, "4.800"),
    ],
)
def test_npsh_available(liquid, level, loss, printed):
    pressure, vapour_pressure, density = liquid
    value = npsh_available(
        pressure=pressure, vapour_pressure=vapour_pressure, density=density, liquid_level=level, friction_loss=loss
    )
    assert_as_printed(value, printed)


# source: ISO 2533:1975 formula 101 325 (1 - 2.25577e-5 h)^5.25588 worked by hand
@pytest.mark.parametrize(("altitude", "printed"), [(0, "101325"), (500, "95461"), (1000, "89875"), (2000, "79495")])
def test_air_pressure(altitude, printed):
    assert_as_printed(air_pressure(altitude), printed)


# source: common practice, no source: ordinary suction specific speed 9000 US, worked by hand
@pytest.mark.parametrize(("speed", "flow", "printed"), [(2950, 110 / 3600, "4.25"), (1480, 600 / 3600, "5.25")])
def test_npsh3_of_ordinary_suction_specific_speed(speed, flow, printed):
    assert_as_printed(npsh3_from_suction_specific_speed(speed, flow, 9000 / 51.645), printed)
