import subprocess
import sys

import pytest

from bidcheck.errors import UnitError
from bidcheck.quantity import KINDS, Kind, UnitSystem
from bidcheck.unit_table import TABLE
from bidcheck.units import from_si, knows, parse, parse_money, spellings, to_si


def refusal(text, kind, **options):
    with pytest.raises(UnitError) as caught:
        parse(text, kind, **options)
    return str(caught.value)


@pytest.mark.parametrize("kind", list(Kind))
def test_every_unit_of_print_and_json_is_known_and_goes_there_and_back(kind):
    for unit in {KINDS[kind].json_unit, *(kind.printed(system).unit for system in UnitSystem)}:
        assert from_si(to_si(3.7, unit, kind), unit, kind) == pytest.approx(3.7, rel=1e-12)


def test_every_spelling_of_the_table_converts():
    for kind, table in TABLE.items():
        for spelling in table:
            assert to_si(2.0, spelling, kind) != to_si(1.0, spelling, kind)


@pytest.mark.parametrize(
    ("text", "kind", "value", "half_digit"),
    [
        ("450 m3/h", Kind.FLOW, 0.125, 0.5 / 3600),
        ("450 m³/h", Kind.FLOW, 0.125, 0.5 / 3600),
        ("450 M3/H", Kind.FLOW, 0.125, 0.5 / 3600),
        ("125 L/s", Kind.FLOW, 0.125, 0.0005),
        ("7500 l/min", Kind.FLOW, 0.125, 0.5 / 60000),
        ("84 %", Kind.SHARE, 0.84, 0.005),
        ("0.84", Kind.SHARE, 0.84, 0.005),
        ("0.84 fraction", Kind.SHARE, 0.84, 0.005),
        ("4,5 m", Kind.HEAD, 4.5, 0.05),
        ("0,200 m", Kind.HEAD, 0.2, 0.0005),
        ("−3.0 m", Kind.LENGTH, -3.0, 0.05),
        ("1.2e3 m", Kind.HEAD, 1200.0, 50.0),
        ("1480 1/min", Kind.SPEED, 1480.0, 0.5),
        ("1480 min⁻¹", Kind.SPEED, 1480.0, 0.5),
        ("17.1 in", Kind.DIAMETER, 0.43434, 0.00127),
        ("68 °F", Kind.TEMPERATURE, 293.15, 0.5 / 1.8),
        ("0.9 SG", Kind.DENSITY, 900.0, 50.0),
        ("1.3 mPa·s", Kind.DYNAMIC_VISCOSITY, 0.0013, 0.00005),
        ("4000 h/year", Kind.TIME, 14.4e6, 1800.0),
        ("3 points", Kind.POINTS, 0.03, 0.005),
        ("213 metric", Kind.SUCTION_SPECIFIC_SPEED, 213.0, 0.5),
    ],
)
def test_figures_as_engineers_write_them(text, kind, value, half_digit):
    stated = parse(text, kind)
    assert (stated.value, stated.half_digit) == pytest.approx((value, half_digit), rel=1e-9)
    assert stated.text == text


@pytest.mark.parametrize(
    ("text", "kind", "message"),
    [
        ("62", Kind.HEAD, 'found "62", which has no unit; write "62 m"'),
        ("62 metres", Kind.HEAD, 'found "62 metres": unit "metres" is not known for head; known are m, ft'),
        ("450 m3/hrs", Kind.FLOW, 'found "450 m3/hrs": unit "m3/hrs" is not known for flow; nearest is "m3/hr"'),
        ("62 bar", Kind.HEAD, 'found "62 bar": unit "bar" belongs to pressure, not to head; known are m, ft'),
        ("abc", Kind.FLOW, 'found "abc", which does not start with a number; write it as "450 m3/h"'),
        ("1 200 m3/h", Kind.FLOW, 'found "1 200 m3/h", whose number has a thousands mark; write "1200 m3/h"'),
        ("1\u2009200 m3/h", Kind.FLOW, "has a thousands mark"),
        ("1,200 m", Kind.HEAD, 'number can be read in two ways; write "1200 m" or "1.200 m"'),
        ("84", Kind.SHARE, 'found "84", which may be per cent or a fraction; write "84 %" or "0.84"'),
        ("1", Kind.SHARE, 'write "1 %" or "100 %"'),
        ("110 mPa", Kind.PRESSURE, 'unit "mPa" is not known for pressure; nearest is "MPa"'),
        ("5 m", Kind.COUNT, 'count is written without a unit, found "m"'),
    ],
)
def test_refusals_name_what_was_found_and_the_cure(text, kind, message):
    assert message in refusal(text, kind)


def test_absolute_and_gauge_pressure_are_never_guessed():
    assert parse("1.013 bar(a)", Kind.PRESSURE, absolute=True).value == pytest.approx(101300.0)
    assert parse("14.7 psia", Kind.PRESSURE, absolute=True).value == pytest.approx(101352.9, rel=1e-6)
    assert parse("16 bar", Kind.PRESSURE, absolute=False).value == pytest.approx(1.6e6)
    assert parse("16 barg", Kind.PRESSURE, absolute=False).value == pytest.approx(1.6e6)
    assert 'write bar(a), as in "2 bar(a)"' in refusal("2 bar", Kind.PRESSURE, absolute=True)
    assert "add air pressure and write psi(a)" in refusal("30 psig", Kind.PRESSURE, absolute=True)
    assert "take off air pressure and write kPa(g)" in refusal("300 kPa(a)", Kind.PRESSURE, absolute=False)
    assert 'write "2 bar(a)"' in refusal("2", Kind.PRESSURE, absolute=True)


@pytest.mark.parametrize("text", ["182000 EUR", "EUR 182000", "182000EUR", "1.82e5 EUR"])
def test_money_keeps_its_currency(text):
    stated, currency = parse_money(text)
    assert (stated.value, currency) == (182000.0, "EUR")


@pytest.mark.parametrize("text", ["0.36 EUR/kWh", "0,36 EUR per kWh", "360 EUR/MWh"])
def test_price_of_energy_is_per_joule(text):
    stated, currency = parse_money(text, Kind.MONEY_PER_ENERGY)
    assert stated.value == pytest.approx(1e-7)
    assert currency == "EUR"


@pytest.mark.parametrize(
    ("text", "kind", "cure"),
    [
        ("182000", Kind.MONEY, 'write it as "182000 EUR"'),
        ("€ 182000", Kind.MONEY, 'write it as "182000 EUR"'),
        ("182 000 EUR", Kind.MONEY, 'write "182000 EUR"'),
        ("182,000 EUR", Kind.MONEY, 'write "182000 EUR" or "182.000 EUR"'),
        ("182000 EUR/kWh", Kind.MONEY, 'write it as "182000 EUR"'),
        ("0.11 EUR", Kind.MONEY_PER_ENERGY, 'write it as "0.11 EUR/kWh"'),
        ("0.11", Kind.MONEY_PER_ENERGY, 'write it as "0.11 EUR/kWh"'),
    ],
)
def test_money_refused(text, kind, cure):
    with pytest.raises(UnitError) as caught:
        parse_money(text, kind)
    assert cure in str(caught.value)


def test_conversion_refuses_a_unit_of_another_kind():
    with pytest.raises(UnitError):
        to_si(1.0, "kW", Kind.FLOW)
    assert not knows("kW", Kind.FLOW)
    assert "US gpm" in spellings(Kind.FLOW)
    assert "" not in spellings(Kind.SHARE)


def test_importing_units_does_not_load_pint():
    code = "import bidcheck.units, sys; sys.exit('pint' in sys.modules)"
    assert subprocess.run([sys.executable, "-c", code], check=False).returncode == 0
