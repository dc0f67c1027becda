import pytest

from bidcheck.quantity import KINDS, Kind, UnitSystem
from bidcheck.report.format import figure, number, plain
from bidcheck.units import from_si, to_si

SI, US = UnitSystem.SI, UnitSystem.US
M3H = 1 / 3600


@pytest.mark.parametrize(
    ("value", "kind", "system", "text"),
    [
        (450 * M3H, Kind.FLOW, SI, "450 m³/h"),
        (34.44 * M3H, Kind.FLOW, SI, "34.4 m³/h"),
        (5.2 * M3H, Kind.FLOW, SI, "5.20 m³/h"),
        (12345 * M3H, Kind.FLOW, SI, "12\u202f345 m³/h"),
        (450 * M3H, Kind.FLOW, US, "1981 US gpm"),
        (62.0, Kind.HEAD, SI, "62.0 m"),
        (502.92, Kind.HEAD, US, "1650 ft"),
        (-0.31, Kind.NPSH, SI, "−0.3 m"),
        (-0.01, Kind.NPSH, SI, "0.0 m"),
        (91_800.0, Kind.POWER, SI, "91.8 kW"),
        (9_520.0, Kind.POWER, SI, "9.52 kW"),
        (0.8264, Kind.SHARE, SI, "82.6 %"),
        (0.944, Kind.WHOLE_SHARE, US, "94 %"),
        (3601.2, Kind.SHARE, SI, "3601 times"),
        (0.089, Kind.POINTS, SI, "8.9 points"),
        (0.412, Kind.DIAMETER, SI, "412 mm"),
        (0.412, Kind.DIAMETER, US, "16.22 in"),
        (1480.0, Kind.SPEED, SI, "1480 1/min"),
        (26.1, Kind.SPECIFIC_SPEED, SI, "nq 26.1"),
        (26.1, Kind.SPECIFIC_SPEED, US, "Ns 1350"),
        (174.3, Kind.SUCTION_SPECIFIC_SPEED, SI, "174 (9000 US)"),
        (174.3, Kind.SUCTION_SPECIFIC_SPEED, US, "9000 US"),
        (1.6e6, Kind.PRESSURE, SI, "16.00 bar"),
        (2.0, Kind.COUNT, SI, "2"),
        (None, Kind.HEAD, SI, "–"),
        ("not declared", Kind.TEXT, SI, "not declared"),
    ],
)
def test_figures_as_an_engineer_prints_them(value, kind, system, text):
    assert figure(value, kind, system) == text


def test_every_kind_prints_in_both_systems():
    for kind in Kind:
        for system in UnitSystem:
            assert figure(1.0, kind, system)


def test_the_units_of_every_kind_are_known_and_go_both_ways():
    for kind, how in KINDS.items():
        for unit in (how.json_unit, how.si.unit, how.us.unit):
            if unit and kind not in (Kind.SHARE, Kind.WHOLE_SHARE, Kind.MONEY_PER_ENERGY, Kind.POINTS):
                assert to_si(from_si(3.7, unit, kind), unit, kind) == pytest.approx(3.7)


def test_numbers():
    assert number(1234567.0, 0) == "1\u202f234\u202f567"
    assert number(-1.5, 1) == "−1.5"


def test_control_characters_are_taken_out():
    assert plain("\x1b[31mred\x07\u202e") == "[31mred"
    assert figure("a\x1b]0;title\x07b", Kind.TEXT, SI) == "a]0;titleb"
