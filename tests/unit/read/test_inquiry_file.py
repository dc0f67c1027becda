import pytest

from bidcheck.errors import InputError
from bidcheck.quantity import UnitSystem
from bidcheck.read import read_inquiry
from tests.build_files import INQUIRY, write_inquiry

FULL = """\
tag = "P-1 A/B"
title = "transfer pumps"
units = "US"
[duty]
rated_flow = "450 m3/h"
rated_head = "62 m"
min_flow = "300 m3/h"
normal_flow = "420 m3/h"
max_flow = "520 m3/h"
pumps_running = 2
pumps_installed = 3
[liquid]
name = "glycol"
temperature = "20 degC"
density = "1050 kg/m3"
viscosity = "3.15 mPa.s"
vapour_pressure = "2.0 kPa(a)"
solids = "none"
[suction]
pressure = "1.013 bar(a)"
liquid_level = "-2.5 m"
friction_loss = "0.4 m"
max_pressure = "0.5 bar(g)"
[system]
static_head = "35 m"
[site]
frequency = "50 Hz"
altitude = "120 m"
ambient = "40 degC"
regulations = ["EU 547/2012"]
[[profile]]
flow = "450 m3/h"
hours = "4000 h/year"
[[profile]]
flow = "900 m3/h"
head = "70 m"
hours = "2000 h"
[economics]
energy_price = "0.36 EUR/kWh"
years = 20
discount_rate = "8 %"
energy_escalation = "2 %"
currency = "EUR"
[guarantee]
standard = "ISO 9906:2012"
grade = "2B"
witnessed = true
npsh_test = "witnessed"
[[density_cases]]
name = "start-up"
density = "1080 kg/m3"
[limits]
set = "process"
npsh_margin = { at_least = "1.5 m", origin = "spec 4.3", mandatory = true }
"""


def refused(tmp_path, inquiry):
    with pytest.raises(InputError) as caught:
        read_inquiry(write_inquiry(tmp_path, inquiry))
    return [str(problem) for problem in caught.value.problems]


def with_line(table, line, text=INQUIRY):
    """An inquiry with one line more beneath a table header."""
    return text.replace(f"[{table}]\n", f"[{table}]\n{line}\n")


def test_every_table_reaches_the_object(tmp_path):
    inquiry = read_inquiry(write_inquiry(tmp_path, FULL))
    assert (inquiry.tag, inquiry.title, inquiry.units) == ("P-1 A/B", "transfer pumps", UnitSystem.US)
    duty = inquiry.duty
    assert (duty.rated_flow, duty.rated_head, duty.pumps_running, duty.pumps_installed) == (0.125, 62.0, 2, 3)
    assert [duty.min_flow, duty.normal_flow, duty.max_flow] == pytest.approx([300 / 3600, 420 / 3600, 520 / 3600])
    liquid = inquiry.liquid
    assert (liquid.name, liquid.density, liquid.solids) == ("glycol", 1050.0, "none")
    assert (liquid.viscosity, liquid.vapour_pressure) == pytest.approx((3e-6, 2000.0))
    suction = inquiry.suction
    assert (suction.pressure, suction.max_pressure) == pytest.approx((101300.0, 50000.0))
    assert (suction.liquid_level, suction.friction_loss) == (-2.5, 0.4)
    assert inquiry.system.static_head == 35.0
    site = inquiry.site
    assert (site.frequency, site.altitude, site.ambient) == pytest.approx((50.0, 120.0, 313.15))
    assert site.regulations == ("EU 547/2012",)
    assert [(point.hours, point.head) for point in inquiry.profile] == [(pytest.approx(4000), None), (2000, 70.0)]
    economics = inquiry.economics
    assert economics.energy_price == pytest.approx(1e-7)
    assert (economics.years, economics.discount_rate, economics.energy_escalation) == (20.0, 0.08, 0.02)
    assert economics.currency == "EUR"
    assert inquiry.guarantee.witnessed is True
    assert inquiry.guarantee.npsh_test == "witnessed"
    assert [(case.name, case.density) for case in inquiry.density_cases] == [("start-up", 1080.0)]
    assert inquiry.limits.set_name == "process"
    assert inquiry.limits.npsh_margin.mark == "purchaser"
    assert inquiry.assumptions == ()


def test_defaults_are_assumptions(tmp_path):
    text = 'tag = "P"\n[duty]\nrated_flow = "1 l/s"\nrated_head = "9 m"\n[liquid]\nname = "oil"\ndensity = "0.87 SG"\n'
    inquiry = read_inquiry(write_inquiry(tmp_path, text))
    assert [(item.what, item.value) for item in inquiry.assumptions] == [
        ("units of the report", "SI"),
        ("pumps running", "1"),
        ("pumps installed", "1"),
        ("viscosity of the liquid", "1 cSt"),
        ("set of limits", "general-water"),
    ]
    assert inquiry.liquid.viscosity == 1e-6
    assert inquiry.limits.set_name == "general-water"
    assert inquiry.suction is inquiry.system is inquiry.economics is None


def test_missing_keys_come_with_an_example(tmp_path):
    assert refused(tmp_path, "[liquid]\n") == [
        'inquiry.toml: tag is missing; write tag = "P-2101 A/B"',
        'inquiry.toml: [duty] rated_flow is missing; write rated_flow = "450 m3/h"',
        'inquiry.toml: [duty] rated_head is missing; write rated_head = "62 m"',
        'inquiry.toml:1: [liquid] name is missing; write name = "water" with temperature = "20 degC", '
        'or give density = "870 kg/m3"',
    ]


@pytest.mark.parametrize(
    ("table", "line", "message"),
    [
        ("duty", 'npsha = "0 m"', '[duty] npsha: found "0 m", must be above zero'),
        ("duty", "npsha = 6.8", '[duty] npsha: found "6.8", which has no unit; write "6.8 m"'),
        ("duty", "npsha = true", "[duty] npsha: found true, a quantity in quotes with its unit is needed"),
        ("duty", 'ratd_flow = "1 m3/h"', '[duty] ratd_flow: is not known; nearest is "rated_flow"'),
        ("duty", 'min_flow = "500 m3/h"\nmax_flow = "460 m3/h"', 'found "500 m3/h", above max_flow "460 m3/h"'),
        ("duty", 'max_flow = "440 m3/h"', '[duty] rated_flow: found "450 m3/h", above max_flow "440 m3/h"'),
        ("duty", 'min_flow = "451 m3/h"', '[duty] min_flow: found "451 m3/h", above rated_flow "450 m3/h"'),
        ("liquid", 'temperature = "-300 degC"', "[liquid] temperature: found"),
        ("liquid", 'vapour_pressure = "2 kPa"', "where absolute pressure is needed; write kPa(a)"),
        ("liquid", "solids = 3", '[liquid] solids: found 3, text is needed; write solids = "..."'),
        ("liquid", 'solids = "a\\u001b[31mb"', 'found "a?[31mb", which holds control characters'),
        ("liquid", 'solids = " "', "[liquid] solids: is empty"),
        ("limits", 'npsh_margn = { at_least = "1 m", origin = "x" }', 'is not known; nearest is "npsh_margin"'),
    ],
)
def test_wrong_lines_are_named(tmp_path, table, line, message):
    found = refused(tmp_path, with_line(table, line))
    assert len(found) == 1
    assert message in found[0]
    assert found[0].split(":")[0] == "inquiry.toml"
    assert found[0].split(":")[1].isdigit()


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ('units = "SI"', 'units = "imperial"', 'units: found "imperial"; known are SI, US; write one of: SI, US'),
        ('tag = "P-101"', "tag = 101", 'tag: found 101, text is needed; write tag = "..."'),
        ('tag = "P-101"', 'tag = "P"\nsite = 3', "site: found 3, a table is needed; write [site] and its keys beneath"),
        ('tag = "P-101"', 'tag = "P"\nprofile = 3', "profile: found 3, tables are needed; write [[profile]]"),
        ('tag = "P-101"', 'tag = "P"\ncolour = 3', "colour: is not known; known are density_cases, duty"),
        ("pumps_running = 1", "pumps_running = 2", "2 pumps run but pumps_installed is 1"),
        ("pumps_running = 1", "pumps_running = 0", "found 0, must be 1 or more"),
        ("pumps_running = 1", "pumps_running = 1.0", "found 1.0, a whole number is needed; write pumps_running = 1"),
        ('rated_flow = "450 m3/h"', 'rated_flow = "-450 m3/h"', 'found "-450 m3/h", must be above zero'),
        ('density = "1050 kg/m3"', "", '[liquid] density is missing; write density = "870 kg/m3"; only water is known'),
        (
            'density = "1050 kg/m3"\nviscosity = "3 cSt"',
            'viscosity = "3 cP"',
            "a dynamic viscosity; give density as well",
        ),
        ('viscosity = "3 cSt"', 'viscosity = "3 kW"', 'unit "kW" belongs to power, not to kinematic viscosity'),
        ('set = "general-water"', 'set = "water"', "known are general-water, process"),
    ],
)
def test_wrong_values_are_named(tmp_path, old, new, message):
    assert any(message in problem for problem in refused(tmp_path, INQUIRY.replace(old, new)))


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ('max_flow = "520 m3/h"', 'npsha = "5 m"', "[duty] npsha: is given and [suction] as well"),
        ('vapour_pressure = "2.0 kPa(a)"\n', "", "[liquid] vapour_pressure is missing, [suction] needs it"),
        ('"1.013 bar(a)"', '"1.013 bar"', "where absolute pressure is needed"),
        ('"0.5 bar(g)"', '"1.5 bar(a)"', "where gauge pressure is needed"),
        ('friction_loss = "0.4 m"\n', "", '[suction] friction_loss is missing; write friction_loss = "0.4 m"'),
        ('friction_loss = "0.4 m"', 'friction_loss = "-0.4 m"', "must be zero or above"),
        ('static_head = "35 m"\n', "", "[system] static_head is missing"),
        ("EU 547/2012", "EU 574/2012", '"EU 574/2012" is not known; nearest is "EU 547/2012"'),
        ('["EU 547/2012"]', '"EU 547/2012"', "a list of texts is needed"),
        ('"4000 h/year"', '"7000 h/year"', "the states of the profile add up to 9000 h, a year has 8760"),
        ('"4000 h/year"', "4000", 'found "4000", which has no unit; write "4000 h"'),
        ('currency = "EUR"', 'currency = "USD"', 'found "USD", but energy_price is in EUR'),
        ("years = 20", "years = 0", "[economics] years: found 0, must be above zero"),
        ("years = 20\n", "", "[economics] years is missing; write years = 20"),
        ('"8 %"', "8", 'found "8", which may be per cent or a fraction; write "8 %" or "0.08"'),
        ("witnessed = true", 'witnessed = "yes"', "write witnessed = true or witnessed = false"),
        ('name = "start-up"\n', "", "[[density_cases]] name is missing"),
        ("[limits]", '[[density_cases]]\nname = "start-up"\ndensity = "1 SG"\n[limits]', '"start-up" is given twice'),
    ],
)
def test_wrong_values_in_the_other_tables(tmp_path, old, new, message):
    assert old in FULL
    assert any(message in problem for problem in refused(tmp_path, FULL.replace(old, new)))


def test_years_with_a_unit(tmp_path):
    assert read_inquiry(write_inquiry(tmp_path, FULL.replace("years = 20", 'years = "15 years"'))).economics.years == 15


@pytest.mark.parametrize(
    ("text", "start"),
    [
        ('tag = "P"\nduty = = 3\n', "inquiry.toml:2:8: is not valid TOML here: invalid value"),
        ('tag = "P"\ntag = "Q"\n', "inquiry.toml:2:10: is not valid TOML here: cannot overwrite a value"),
        ('tag = "P', "inquiry.toml:1: is not valid TOML here: "),
        ("a = " + "[" * 3000, "inquiry.toml"),
    ],
)
def test_toml_syntax_has_line_and_column(tmp_path, text, start):
    (problem,) = refused(tmp_path, text)
    assert problem.startswith(start)


WATER = INQUIRY.replace('name = "glycol"\ndensity = "1050 kg/m3"\nviscosity = "3 cSt"', 'name = "Water"')


def test_water_at_its_temperature(tmp_path):
    pytest.importorskip("bidcheck.hydraulics.water")
    inquiry = read_inquiry(write_inquiry(tmp_path, with_line("liquid", 'temperature = "20 degC"', WATER)))
    liquid = inquiry.liquid
    assert liquid.density == pytest.approx(998.16, abs=0.1)
    assert liquid.vapour_pressure == pytest.approx(2339.2, rel=2e-3)
    assert liquid.viscosity == pytest.approx(1.003e-6, rel=1e-2)
    assert [item.what for item in inquiry.assumptions] == [
        "density of the liquid",
        "vapour pressure of the liquid",
        "viscosity of the liquid",
    ]
    assert inquiry.assumptions[0].value == "998.2 kg/m³"


def test_water_without_temperature_is_at_20_degrees(tmp_path):
    pytest.importorskip("bidcheck.hydraulics.water")
    inquiry = read_inquiry(write_inquiry(tmp_path, WATER))
    assert inquiry.liquid.temperature == 293.15
    assert inquiry.assumptions[0].what == "temperature of the water"
    given = with_line("liquid", 'density = "1001 kg/m3"', WATER)
    assert read_inquiry(write_inquiry(tmp_path, given)).liquid.density == 1001.0


def test_water_beyond_its_formulas(tmp_path):
    pytest.importorskip("bidcheck.hydraulics.water")
    hot = with_line("liquid", 'temperature = "160 degC"', WATER)
    (problem,) = refused(tmp_path, hot)
    assert "found 160 °C; water is known from 5 to 150 °C: give density, vapour_pressure, viscosity as well" in problem
    given = 'density = "907 kg/m3"\nvapour_pressure = "6.2 bar(a)"\nviscosity = "0.19 cSt"'
    assert read_inquiry(write_inquiry(tmp_path, with_line("liquid", given, hot))).liquid.density == 907.0
