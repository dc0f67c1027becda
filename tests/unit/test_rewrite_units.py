"""The rewriting of examples in US units keeps every figure and touches nothing else."""

import math
import tomllib

import pytest

from tests.build import EXAMPLES
from tests.rewrite_units import _csv, _toml, rewrite_in_us_units

COOLING_WATER = EXAMPLES / "cooling_water"
BOILER_FEED = EXAMPLES / "boiler_feed"


def figures(text, separator, decimal="."):
    rows = [line.split(separator) for line in text.lstrip("\ufeff").splitlines() if line[:1].isdigit()]
    return [[float(cell.replace(decimal, ".")) if cell.strip() else math.nan for cell in row] for row in rows]


def test_inquiry_in_us_units(tmp_path):
    rewrite_in_us_units(COOLING_WATER, tmp_path / "us")
    inquiry = tomllib.loads((tmp_path / "us/inquiry.toml").read_text(encoding="utf-8"))
    assert inquiry["units"] == "US"
    assert inquiry["duty"]["rated_flow"] == "1981.29 US gpm"
    assert inquiry["duty"]["rated_head"] == "203.412 ft"
    assert inquiry["liquid"]["temperature"] == "57.2000 degF"
    assert inquiry["profile"][0]["hours"] == "2900 h"
    assert inquiry["economics"]["energy_price"] == "0.11 EUR/kWh"


def test_bid_in_us_units_leaves_other_figures_alone(tmp_path):
    rewrite_in_us_units(COOLING_WATER, tmp_path / "us")
    bid = tomllib.loads((tmp_path / "us/bids/alder/bid.toml").read_text(encoding="utf-8"))
    assert bid["claims"]["power"] == "125.251 hp"
    assert bid["claims"]["efficiency"] == "82.6 %"
    assert bid["impeller_rated"] == "17.5984 in"
    assert bid["casing"]["max_pressure"] == "232.060 psi"
    assert bid["speed"] == "1485 rpm"


# bidder: separator, decimal mark, factors of the columns
FORMS = {
    "alder": (",", ".", (4.402868, 3.280840, 1.0, 1.341022, 3.280840)),
    "birch": (";", ",", (4.402868, 3.280840, 1.0, 1.341022, 3.280840)),
    "cedar": ("\t", ".", (1.0, 1.0, 1.0, 1.0, 1.0)),
    "dogwood": (",", ".", (15.850323, 3.280840, 1.0, 1.341022, 3.280840)),
    "elm": (";", ".", (4.402868, 3.280840, 1.0, 1.341022, 3.280840)),
}


@pytest.mark.parametrize("bidder", FORMS)
def test_every_cell_of_a_curve(tmp_path, bidder):
    separator, decimal, factors = FORMS[bidder]
    rewrite_in_us_units(COOLING_WATER, tmp_path / "us")
    before, after = (
        figures((folder / f"bids/{bidder}/curve.csv").read_bytes().decode(), separator, decimal)
        for folder in (COOLING_WATER, tmp_path / "us")
    )
    assert len(before) == len(after) >= 12
    for old, new in zip(before, after, strict=True):
        scaled = [x * factor for x, factor in zip(old, factors, strict=True)]
        assert new == pytest.approx(scaled, rel=6e-6, nan_ok=True)


def test_header_unit_row_and_marks_stay_in_form(tmp_path):
    rewrite_in_us_units(COOLING_WATER, tmp_path / "us")
    birch, elm = ((tmp_path / f"us/bids/{name}/curve.csv").read_bytes().decode() for name in ("birch", "elm"))
    assert birch.startswith("\ufeffQ (US gpm);H (ft);η (%);P2 (hp);NPSHr (ft)\r\n0;245,407;0,0;")
    assert elm.startswith("Capacity, US gpm;TDH, ft;Efficiency, %;Shaft power, hp;NPSH3, ft\n")
    assert _csv("Q;H\nm3/h;m\n100;50\n", 6) == "Q;H\nUS gpm;ft\n440.287;164.042\n"


def test_what_is_in_us_units_stays(tmp_path):
    rewrite_in_us_units(BOILER_FEED, tmp_path / "us")
    for path in BOILER_FEED.rglob("*.*"):
        assert (tmp_path / "us" / path.relative_to(BOILER_FEED)).read_bytes() == path.read_bytes()


def test_printed_about_as_finely_as_before():
    assert (
        _csv("Q [m3/h], H [m], P [kW]\n450, 63.2, 93.6\n", None) == "Q [US gpm], H [ft], P [hp]\n1981, 207.3, 125.5\n"
    )
    assert _toml('head = "63.2 m"\nmin_continuous_flow = "44 l/s"', None) == (
        'head = "207.3 ft"\nmin_continuous_flow = "697 US gpm"'
    )


def test_limits_in_an_inline_table():
    text = 'npsh_margin = { at_least = "1.0 m", origin = "4.3, head = 1 m" }\nnpsh_ratio = { at_least = 1.2 }'
    assert _toml(text, 6) == text.replace('"1.0 m"', '"3.28084 ft"')


def test_unlisted_unit_is_refused():
    with pytest.raises(ValueError, match="furlong"):
        _toml('rated_head = "1 furlong"', 6)
