"""Properties of water against IAPWS and an independent implementation of it."""

import warnings

import iapws
import pytest

from bidcheck.hydraulics.water import water_density, water_vapour_pressure, water_viscosity
from tests.published.printed import assert_as_printed


# source: PyPI `iapws` 1.5.5, IAPWS-IF97 saturated liquid: °C, kPa
@pytest.mark.parametrize(
    ("celsius", "kilopascal"),
    [
        (5, "0.8726"),
        (20, "2.3392"),
        (40, "7.3844"),
        (60, "19.9458"),
        (80, "47.4147"),
        (100, "101.418"),
        (120, "198.665"),
        (150, "476.101"),
    ],
)
def test_vapour_pressure_of_water(celsius, kilopascal):
    assert_as_printed(water_vapour_pressure(celsius + 273.15) / 1000, kilopascal)


# source: from memory: IAPWS-IF97 (2007), Table 35: saturation pressure at 300 K in MPa
def test_vapour_pressure_of_the_release():
    assert_as_printed(water_vapour_pressure(300.0) / 1e6, "0.00353658941")


# source: from memory: IAPWS SR1-86(1992), Table 1: saturated liquid at 373.1243 K
def test_density_of_the_release():
    assert_as_printed(water_density(373.1243), "958.365")


# source: PyPI `iapws` 1.5.5, IAPWS-IF97 saturated liquid: 999.918, 998.161, 992.183, 983.175, 971.779, 958.354,
# source: 943.106, 917.007 kg/m³, here to the digits both formulations share (they differ by up to 0.021)
@pytest.mark.parametrize(
    ("celsius", "density"),
    [
        (5, "999.9"),
        (20, "998.2"),
        (40, "992.2"),
        (60, "983.2"),
        (80, "971.8"),
        (100, "958.35"),
        (120, "943.1"),
        (150, "917.0"),
    ],
)
def test_density_of_water(celsius, density):
    assert_as_printed(water_density(celsius + 273.15), density)


# source: PyPI `iapws` 1.5.5, IAPWS-IF97 and the IAPWS viscosity formulation, evaluated side by side
@pytest.mark.parametrize("celsius", [5, 15, 20, 33, 60, 99, 120, 150])
def test_density_and_viscosity_beside_an_independent_implementation(celsius):
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        reference = iapws.IAPWS97(T=celsius + 273.15, x=0)
    assert water_density(celsius + 273.15) == pytest.approx(reference.rho, rel=3e-5)
    assert water_viscosity(celsius + 273.15) == pytest.approx(reference.nu, rel=3e-5)


# source: from memory: ISO/TR 3666:1998, viscosity of water at 20 °C, 1.0034 mm²/s
def test_viscosity_of_water_at_twenty_degrees():
    assert_as_printed(1e6 * water_viscosity(293.15), "1.003")
