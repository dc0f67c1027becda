"""head-coefficient, tip-speed, and the mistakes that would explain an impeller that does not fit."""

from dataclasses import replace
from typing import Any

import pytest

from bidcheck.bid import Claims
from bidcheck.case import Case
from bidcheck.checks import efficiency_ceiling, head_coefficient, tip_speed
from bidcheck.checks.impeller_causes import figures_of, likely_causes
from bidcheck.curve import Curve
from bidcheck.finding import Finding, Verdict
from tests.build import points, sound_curve
from tests.unit.checks.judge import judge, sound_case

FITTING = {"impeller_rated": 0.45, "impeller_max": 0.45}
"""A diameter that suits the sound curve; its own is a little small."""


def fitting_curve(**changes: Any) -> Curve:
    """The sound curve with the diameter that suits it."""
    return sound_curve(impeller=0.45, **changes)


def expected_diameter() -> float:
    """Diameter expected of the sound bid [m]."""
    impeller = sound_case().estimates.impeller
    assert impeller is not None
    assert impeller.expected_diameter is not None
    return impeller.expected_diameter


def with_ratio(ratio: float, arrangement: str = "end suction", **bid: object) -> Case:
    """The sound bid with a diameter that puts its head coefficient at so many times the expected one."""
    diameter = expected_diameter() / ratio**0.5
    curve = sound_curve(impeller=diameter)
    return sound_case(
        {"curves": (curve,), "impeller_rated": diameter, "impeller_max": diameter, "arrangement": arrangement, **bid}
    )


def coefficient(case: Case) -> Finding:
    return judge(head_coefficient.CHECK, case)["best efficiency"]


@pytest.mark.parametrize(
    ("ratio", "verdict"),
    [
        (1.0, Verdict.PASS),
        (0.801, Verdict.PASS),
        (1.199, Verdict.PASS),
        (0.79, Verdict.REMARK),
        (1.22, Verdict.REMARK),
        (0.655, Verdict.REMARK),
        (5.0, Verdict.QUERY),
    ],
)
def test_head_coefficient(ratio, verdict):
    assert coefficient(with_ratio(ratio)).verdict is verdict


def test_the_diameters_stand_beside_one_another():
    evidence = coefficient(with_ratio(1.1)).evidence
    assert float(evidence["expected_diameter"].value) == pytest.approx(expected_diameter(), rel=1e-6)
    assert float(evidence["cordier_diameter"].value) == pytest.approx(expected_diameter(), rel=0.05)
    assert float(evidence["offered"].value) == pytest.approx(1.1 * float(evidence["expected"].value), rel=1e-6)


@pytest.mark.parametrize("arrangement", ["solids handling", "vertical turbine", "submersible multistage", "sealless"])
def test_unlike_arrangements_get_a_remark_inside_what_impellers_show(arrangement):
    assert coefficient(with_ratio(0.70, arrangement)).verdict is Verdict.REMARK


@pytest.mark.parametrize(
    ("ratio", "verdict"), [(0.5, Verdict.REMARK), (1.9, Verdict.REMARK), (0.25, Verdict.QUERY), (645.0, Verdict.QUERY)]
)
def test_unlike_arrangements_are_asked_only_where_no_impeller_explains_it(ratio, verdict):
    assert coefficient(with_ratio(ratio, "solids handling")).verdict is verdict


def test_without_a_diameter_it_is_asked_for():
    bare = sound_case({"curves": (sound_curve(impeller=None),), "impeller_rated": None, "impeller_max": None})
    assert coefficient(bare).verdict is Verdict.NO_DATA
    assert judge(tip_speed.CHECK, bare)["impeller"].verdict is Verdict.NO_DATA


def test_without_a_best_efficiency_it_is_asked_for():
    assert (
        coefficient(sound_case({"curves": (sound_curve(efficiency=None, power=None),), "claims": Claims()})).verdict
        is Verdict.NO_DATA
    )


@pytest.mark.parametrize(
    ("factor", "words"),
    [(1 / 25.4, "inches under mm"), (25.4, "mm under inches"), (0.1, "cm under mm"), (10.0, "mm under cm")],
)
def test_units_of_the_diameter_are_named(factor, words):
    diameter = factor * expected_diameter()
    case = sound_case(
        {"curves": (sound_curve(impeller=diameter),), "impeller_rated": diameter, "impeller_max": diameter}
    )
    finding = coefficient(case)
    assert finding.verdict is Verdict.QUERY
    assert words in str(finding.evidence["causes"].value)


@pytest.mark.parametrize(("speed", "words"), [(2960.0, "about 1480 1/min"), (740.0, "about 1480 1/min")])
def test_a_curve_of_another_speed_is_named(speed, words):
    case = sound_case({"speed_rpm": speed, "curves": (fitting_curve(speed_rpm=speed),), **FITTING})
    finding = coefficient(case)
    assert finding.verdict is Verdict.QUERY
    assert words in str(finding.evidence["causes"].value)


def test_a_curve_brought_to_the_offered_speed_without_need_is_named():
    case = sound_case({"curves": (fitting_curve(speed_rpm=985.0),), **FITTING})
    assert "at the offered speed already" in str(coefficient(case).evidence["causes"].value)


def multistage(stated: int, true: int = 6) -> Case:
    """A pump of `true` stages whose bid states another number."""
    curve = fitting_curve()
    assert curve.head is not None
    head = replace(curve.head, value=curve.head.value * true)
    curve = replace(curve, head=head, power=None, stages=stated)
    return sound_case({"curves": (curve,), "stages": stated, "arrangement": "vertical multistage", **FITTING})


@pytest.mark.parametrize("stated", [1, 2, 3, 4, 9, 12])
def test_a_wrong_number_of_stages_is_named(stated):
    finding = coefficient(multistage(stated))
    assert finding.verdict is Verdict.QUERY
    assert f"not of {stated}" in str(finding.evidence["causes"].value)
    assert any(words in str(finding.evidence["causes"].value) for words in ("6 stages", "5 stages", "7 stages"))


@pytest.mark.parametrize("stated", [5, 6, 7])
def test_one_stage_more_or_less_among_six_is_not_seen(stated):
    assert coefficient(multistage(stated)).verdict is Verdict.PASS


def test_a_single_stage_pump_is_not_given_stages():
    assert not any("stage" in words for words in likely_causes(with_ratio(3.0)))


def test_units_of_head_are_named_only_where_the_curve_misses_the_duty():
    curve = fitting_curve()
    assert curve.head is not None
    feet = replace(curve, head=replace(curve.head, value=curve.head.value / 0.3048), power=None)
    case = sound_case({"curves": (feet,), **FITTING})
    assert "head is in ft under an m heading" in likely_causes(case)
    in_feet = replace(feet, head=replace(feet.head, value_unit=0.3048))
    in_feet_case = sound_case({"curves": (in_feet,), **FITTING})
    assert "head is in ft under an m heading, before it was converted" in likely_causes(in_feet_case)
    assert not any("head is in" in words for words in likely_causes(with_ratio(3.281)))


def test_causes_need_a_diameter():
    bare = sound_case({"curves": (sound_curve(impeller=None),), "impeller_rated": None, "impeller_max": None})
    assert figures_of(bare) is None
    assert likely_causes(bare) == ()


def test_a_claim_above_the_ceiling_that_a_mistake_explains_is_asked_not_failed():
    doubled = sound_case({"speed_rpm": 2960.0, "curves": (fitting_curve(speed_rpm=2960.0),), **FITTING})
    finding = judge(efficiency_ceiling.CHECK, doubled)["best efficiency"]
    assert finding.verdict is Verdict.QUERY
    assert "about 1480 1/min" in str(finding.evidence["causes"].value)


def test_a_sound_impeller_explains_no_claim_above_the_ceiling():
    case = multistage(6)
    assert likely_causes(case) == ()
    lifted = replace(case, estimates=replace(case.estimates, offered_efficiency=0.97, offered_interval=0.003))
    assert judge(efficiency_ceiling.CHECK, lifted)["best efficiency"].verdict is Verdict.FAIL


@pytest.mark.parametrize(
    ("diameter", "material", "verdict", "words"),
    [
        (0.516, "", Verdict.PASS, "Tip speed is"),  # 40.0 m/s
        (0.5162, "", Verdict.REMARK, "look at the material"),
        (0.60, "grey cast iron", Verdict.REMARK, "impeller of {material}: beyond"),
        (0.60, "EN-GJL-250 gray iron", Verdict.REMARK, "impeller of {material}: beyond"),
        (0.60, "ductile cast iron", Verdict.PASS, "impeller of {material}"),
        (0.60, "GG25", Verdict.REMARK, "impeller of {material}: beyond"),
        (0.60, "to be advised", Verdict.REMARK, "impeller of {material}: beyond"),
        (0.60, "high-chromium white iron", Verdict.PASS, "impeller of {material}"),
        (0.60, "13 % chrome steel", Verdict.PASS, "impeller of {material}"),
    ],
)
def test_tip_speed(diameter, material, verdict, words):
    curve = sound_curve(impeller=diameter)
    case = sound_case(
        {"curves": (curve,), "impeller_rated": diameter, "impeller_max": diameter, "impeller_material": material}
    )
    finding = judge(tip_speed.CHECK, case)["impeller"]
    assert finding.verdict is verdict
    assert words in finding.wording.message


def test_the_largest_diameter_named_counts_for_tip_speed():
    case = sound_case({"impeller_max": 0.55})
    assert float(judge(tip_speed.CHECK, case)["impeller"].evidence["diameter"].value) == 0.55


def test_a_pump_of_very_low_specific_speed_is_judged_only_far_out():
    narrow = sound_curve(
        head=points([0, 80, 160, 240, 320, 400, 440, 480, 520, 580], [740.0 - 0.03 * x for x in range(10)])
    )
    near = replace(narrow, power=None, impeller=1.38)
    finding = coefficient(sound_case({"curves": (near,), "impeller_rated": 1.38, "impeller_max": 1.38}))
    assert finding.verdict is Verdict.NOT_APPLICABLE
    far = replace(narrow, power=None, impeller=0.5)
    finding = coefficient(sound_case({"curves": (far,), "impeller_rated": 0.5, "impeller_max": 0.5}))
    assert finding.verdict is Verdict.QUERY
