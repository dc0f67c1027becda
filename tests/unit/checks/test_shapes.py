"""efficiency-shape, curve-shape, npsh-form: the form of the curves."""

from dataclasses import replace

import pytest

from bidcheck.bid import Claims
from bidcheck.case import Case
from bidcheck.checks import curve_shape, efficiency_shape, npsh_form
from bidcheck.finding import Verdict
from bidcheck.second_opinion import ShapeEstimate, ShapeRatio
from tests.build import points, sound_curve
from tests.unit.checks.judge import judge, sound_case

NPSH_FLOWS = (160, 240, 320, 400, 440, 480, 520, 580)


def shaped(which: str, offered: float | None, arrangement: str = "end suction", doubt: bool = False) -> Case:
    """The sound case with one ratio of its shape replaced; without the doubt of the fit unless asked for."""
    case = sound_case({"arrangement": arrangement})
    assert case.estimates.shape is not None
    ratio: ShapeRatio = getattr(case.estimates.shape, which)
    shape: ShapeEstimate = replace(case.estimates.shape, **{which: replace(ratio, offered=offered)})
    case = replace(case, estimates=replace(case.estimates, shape=shape))
    if not doubt and case.max_fits is not None:
        case = replace(case, max_fits=replace(case.max_fits, efficiency=None))
    return case


def bounds(which: str) -> tuple[float, float]:
    shape = sound_case().estimates.shape
    assert shape is not None
    expected = getattr(shape, which).expected
    assert expected is not None
    return expected


@pytest.mark.parametrize(
    ("below", "verdict"),
    [
        (0.0, Verdict.PASS),
        (0.0599, Verdict.PASS),
        (0.061, Verdict.REMARK),
        (0.119, Verdict.REMARK),
        (0.121, Verdict.QUERY),
    ],
)
def test_a_peaked_curve(below, verdict):
    low, _ = bounds("part_load")
    finding = judge(efficiency_shape.CHECK, shaped("part_load", low - below))["part load"]
    assert finding.verdict is verdict
    if verdict is not Verdict.PASS:
        assert finding.evidence["form"].value == "more peaked"


def test_a_flat_curve():
    _, high = bounds("over_load")
    finding = judge(efficiency_shape.CHECK, shaped("over_load", high + 0.07))["over load"]
    assert finding.verdict is Verdict.REMARK
    assert finding.evidence["form"].value == "flatter"


def test_unlike_arrangements_get_a_remark_for_shape():
    low, _ = bounds("part_load")
    case = shaped("part_load", low - 0.2, "solids handling")
    assert judge(efficiency_shape.CHECK, case)["part load"].verdict is Verdict.REMARK


def test_the_doubt_of_the_fit_is_given():
    low, _ = bounds("part_load")
    case = shaped("part_load", low - 0.061, doubt=True)
    assert judge(efficiency_shape.CHECK, case)["part load"].verdict is Verdict.PASS


def test_efficiency_that_does_not_reach_is_asked_for():
    finding = judge(efficiency_shape.CHECK, shaped("over_load", None))["over load"]
    assert finding.verdict is Verdict.NO_DATA
    nothing = sound_case({"curves": (sound_curve(efficiency=None, power=None),), "claims": Claims()})
    assert judge(efficiency_shape.CHECK, nothing)["part load"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize(
    ("ratio", "verdict"),
    [(1.10, Verdict.PASS), (1.50, Verdict.PASS), (0.97, Verdict.PASS), (0.90, Verdict.REMARK), (1.60, Verdict.REMARK)],
)
def test_shutoff_head(ratio, verdict):
    assert judge(curve_shape.CHECK, shaped("shutoff_head", ratio))["shutoff head"].verdict is verdict


@pytest.mark.parametrize(
    ("ratio", "verdict"),
    [(0.14, Verdict.PASS), (1.06, Verdict.PASS), (0.12, Verdict.REMARK), (1.2, Verdict.REMARK)],
)
def test_shutoff_power(ratio, verdict):
    assert judge(curve_shape.CHECK, shaped("shutoff_power", ratio))["shutoff power"].verdict is verdict


def test_shutoff_that_is_not_given():
    assert judge(curve_shape.CHECK, shaped("shutoff_head", None))["shutoff head"].verdict is Verdict.NO_DATA
    finding = judge(curve_shape.CHECK, shaped("shutoff_power", None))["shutoff power"]
    assert finding.verdict is Verdict.NOT_APPLICABLE
    nothing = sound_case({"curves": (sound_curve(efficiency=None, power=None),), "claims": Claims()})
    assert judge(curve_shape.CHECK, nothing)["shutoff head"].verdict is Verdict.NO_DATA


def test_a_specific_speed_no_source_covers_is_held_against_the_ordinary_range():
    case = shaped("shutoff_head", 3.0)
    assert case.estimates.shape is not None
    none = tuple(replace(source, value=None) for source in case.estimates.shape.shutoff_head.sources)
    shape = replace(case.estimates.shape, shutoff_head=ShapeRatio(3.0, none))
    case = replace(case, estimates=replace(case.estimates, shape=shape))
    finding = judge(curve_shape.CHECK, case)["shutoff head"]
    assert finding.verdict is Verdict.REMARK
    assert "no published shape" in finding.wording.message


def npsh(values: list[float], **bid: object) -> Case:
    """The sound bid with these NPSH3 values from 160 to 580 m³/h."""
    return sound_case({"curves": (sound_curve(npsh3=points(NPSH_FLOWS[: len(values)], values)),), **bid})


RISING = [2.6, 2.9, 3.3, 3.8, 4.1, 4.5, 4.9, 5.6]


@pytest.mark.parametrize(
    ("changed", "verdict"),
    [
        ({}, Verdict.PASS),
        ({0: 3.4}, Verdict.PASS),  # below 60 % of best efficiency flow honest curves may fall
        ({7: 4.6}, Verdict.PASS),  # 6.1 % less 2.0 % of printed digits
        ({6: 4.5, 7: 4.15}, Verdict.QUERY),
    ],
)
def test_a_fall_of_npsh3(changed, verdict):
    values = [changed.get(k, value) for k, value in enumerate(RISING)]
    case = npsh(values)
    assert case.fits is not None
    case = replace(case, fits=replace(case.fits, odd_points=()))
    assert judge(npsh_form.CHECK, case)["fall"].verdict is verdict


def test_a_fall_of_a_borehole_pump_is_a_remark():
    case = npsh([2.6, 2.9, 3.3, 3.8, 4.1, 4.5, 4.4, 3.9], arrangement="submersible multistage")
    assert case.fits is not None
    case = replace(case, fits=replace(case.fits, odd_points=()))
    assert judge(npsh_form.CHECK, case)["fall"].verdict is Verdict.REMARK


def test_npsh3_that_stays_flat_is_remarked_on():
    assert judge(npsh_form.CHECK, npsh(RISING))["growth"].verdict is Verdict.PASS
    flat = judge(npsh_form.CHECK, npsh([4.0] * 8))["growth"]
    assert flat.verdict is Verdict.REMARK


def test_growth_needs_points_beyond_best_efficiency():
    assert judge(npsh_form.CHECK, npsh(RISING[:6]))["growth"].verdict is Verdict.NOT_APPLICABLE


def test_npsh3_that_is_not_given_is_asked_for():
    missing = sound_case({"curves": (sound_curve(npsh3=None),)})
    assert judge(npsh_form.CHECK, missing)["fall"].verdict is Verdict.NO_DATA
    assert judge(npsh_form.CHECK, npsh(RISING[:3]))["fall"].verdict is Verdict.NO_DATA
    no_peak = sound_case({"curves": (sound_curve(efficiency=None, power=None),), "claims": Claims()})
    assert judge(npsh_form.CHECK, no_peak)["fall"].verdict is Verdict.NO_DATA


def test_a_specific_speed_no_source_of_efficiency_covers_is_not_judged():
    case = shaped("part_load", 0.5)
    assert case.estimates.shape is not None
    none = tuple(replace(source, value=None, reason="outside") for source in case.estimates.shape.part_load.sources)
    shape = replace(case.estimates.shape, part_load=ShapeRatio(0.5, none))
    case = replace(case, estimates=replace(case.estimates, shape=shape))
    assert judge(efficiency_shape.CHECK, case)["part load"].verdict is Verdict.NOT_APPLICABLE
