"""Conversion factors against printed ones."""

import pytest

from bidcheck.quantity import Kind
from bidcheck.units import from_si, to_si
from tests.published.printed import assert_as_printed


# source: Hydraulic Institute data library, conversion of units: 1 m³/h = 4.402868 US gpm; Ns (US) = 51.645 nq
# source: from memory: the foot of 1959 is 0.3048 m by definition; NIST SP 811 (2008), App. B.8:
# source: from memory: the same, horsepower (550 ft lbf/s) 745.6999 W,
# source: from memory: the same, horsepower (metric) 735.4988 W, imperial gallon 4.54609 L, psi 6894.757 Pa,
# source: from memory: the same, pound per cubic foot 16.01846 kg/m³
@pytest.mark.parametrize(
    ("kind", "unit", "target", "printed"),
    [
        (Kind.FLOW, "m3/h", "US gpm", "4.402868"),
        (Kind.SPECIFIC_SPEED, "metric", "US", "51.645"),
        (Kind.HEAD, "ft", "m", "0.3048"),
        (Kind.POWER, "hp", "W", "745.6999"),
        (Kind.POWER, "PS", "W", "735.4988"),
        (Kind.FLOW, "imp gpm", "l/min", "4.54609"),
        (Kind.PRESSURE, "psi", "Pa", "6894.757"),
        (Kind.DENSITY, "lb/ft3", "kg/m3", "16.01846"),
    ],
)
def test_factors(kind, unit, target, printed):
    assert_as_printed(from_si(to_si(1.0, unit, kind), target, kind), printed)


# source: from memory: NIST SP 811 (2008) App. B.8: barrel of 42 US gallons is 0.1589873 m³
def test_barrels():
    assert_as_printed(from_si(to_si(100000.0, "bbl/d", Kind.FLOW), "m3/d", Kind.FLOW), "15898.73")
