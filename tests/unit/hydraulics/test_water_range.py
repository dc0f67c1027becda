"""Range of the properties of water."""

import pytest

from bidcheck.errors import OutOfRange
from bidcheck.hydraulics.water import water_density, water_vapour_pressure, water_viscosity


@pytest.mark.parametrize("function", [water_density, water_vapour_pressure, water_viscosity])
def test_ends_of_the_range_are_served(function):
    assert function(278.15) > 0
    assert function(423.15) > 0
    assert function(150 + 273.15) > 0


@pytest.mark.parametrize("function", [water_density, water_vapour_pressure, water_viscosity])
@pytest.mark.parametrize("temperature", [278.1, 423.2, float("nan")])
def test_outside_the_range_is_refused(function, temperature):
    with pytest.raises(OutOfRange, match="5 to 150 °C"):
        function(temperature)


def test_hotter_water_is_lighter_thinner_and_boils_sooner():
    cold, hot = 293.15, 353.15
    assert water_density(hot) < water_density(cold)
    assert water_viscosity(hot) < water_viscosity(cold)
    assert water_vapour_pressure(hot) > water_vapour_pressure(cold)
