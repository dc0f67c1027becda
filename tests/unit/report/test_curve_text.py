import io
from dataclasses import replace

import pytest
from rich.console import Console

from bidcheck.curve import Curve, Points
from bidcheck.fit import fit_curve
from bidcheck.quantity import UnitSystem
from bidcheck.report.curve_text import print_curve, specific_speed_lines
from tests.build import points, sound_curve


def printed(curve: Curve, system: UnitSystem = UnitSystem.SI) -> str:
    out = io.StringIO()
    print_curve(fit_curve(curve), curve, Console(file=out, width=120, highlight=False), system)
    return out.getvalue()


def raised(curve: Curve, column: str, factor: float) -> Curve:
    old = curve.points(column)  # type: ignore[arg-type]
    assert old is not None
    return replace(curve, **{column: replace(old, value=old.value * factor)})


def first(points_: Points, n: int) -> Points:
    return Points(
        points_.flow[:n].copy(),
        points_.value[:n].copy(),
        points_.flow_half_digit[:n].copy(),
        points_.value_half_digit[:n].copy(),
        points_.line[:n].copy(),
    )


def test_a_sound_curve():
    text = printed(sound_curve())
    assert "best efficiency 82." in text
    assert "agree within the printed digits" in text
    assert "odd point" not in text
    assert "off" not in text.split("printed digits allow")[1]


@pytest.mark.parametrize(
    ("factor", "words"), [(1.341, "hp under a kW heading"), (1.12, "no single mistake explains it")]
)
def test_a_power_that_does_not_balance(factor, words):
    text = printed(raised(sound_curve(), "power", factor))
    assert words in text
    assert "off" in text.split("printed digits allow")[1]


@pytest.mark.parametrize("column", ["head", "efficiency", "power"])
def test_a_balance_needs_all_four(column):
    assert "needs head, efficiency and power" in printed(sound_curve(**{column: None}))


def test_figures_at_different_flows_do_not_balance():
    apart = replace(sound_curve().power, line=sound_curve().power.line + 100)
    assert "needs head, efficiency and power" in printed(sound_curve(power=apart))


def test_missing_power_is_derived_and_says_so():
    assert "shaft power (derived)" in printed(sound_curve(power=None))


def test_where_best_efficiency_is():
    curve = sound_curve()
    short = replace(curve, efficiency=first(curve.efficiency, 6))
    assert "best efficiency lies beyond the last point, 400 m³/h" in printed(short)
    assert "cannot be told" in printed(sound_curve(efficiency=None, power=None))


def test_an_odd_point_is_shown_with_what_would_fit():
    flow = [0, 80, 160, 240, 320, 400, 440, 480, 520, 580]
    head = points(flow, [74.0, 73.8, 72.7, 60.9, 68.3, 64.9, 62.9, 60.7, 58.3, 54.3])
    text = printed(sound_curve(head=head))
    assert "odd point: head 60.9 m at 240 m³/h (curve.csv, line 5); 70." in text


def test_us_units():
    text = printed(sound_curve(), UnitSystem.US)
    assert "US gpm" in text
    assert "m³/h" not in text


def test_specific_speeds_need_a_best_efficiency_point():
    fits = fit_curve(sound_curve())
    lines = specific_speed_lines(fits, 1480.0, 1, UnitSystem.SI)
    assert lines[0].startswith("specific speed nq 2")
    assert "suction specific speed" in lines[1]
    assert specific_speed_lines(replace(fits, bep=None), 1480.0, 1, UnitSystem.SI) == []
    assert len(specific_speed_lines(replace(fits, npsh3=None), 1480.0, 1, UnitSystem.SI)) == 1
