from dataclasses import replace

import numpy as np
import pytest

from bidcheck.bid import Claims, Driver
from bidcheck.case import Case
from bidcheck.checks import (
    curve_coverage,
    declared_bep,
    efficiency_ceiling,
    missing_data,
    odd_point,
    power_balance,
    rated_on_curve,
)
from bidcheck.curve import OddPoint
from bidcheck.finding import Verdict
from bidcheck.inquiry import Duty
from tests.build import M3H, points, sound_bid, sound_curve, stated
from tests.unit.checks.judge import judge, sound_case, with_bep


def scaled(column: str, factor: float) -> dict[str, object]:
    """Fields of a bid whose curve has one column multiplied."""
    curve = sound_curve()
    old = curve.points(column)  # type: ignore[arg-type]
    assert old is not None
    new = replace(old, value=old.value * factor, value_half_digit=old.value_half_digit * factor)
    return {"curves": (replace(curve, **{column: new}),)}


def test_sound_bid_passes_every_check_as_submitted():
    case = sound_case()
    for check in (curve_coverage.CHECK, odd_point.CHECK, power_balance.CHECK, rated_on_curve.CHECK, declared_bep.CHECK):
        verdicts = {finding.verdict for finding in judge(check, case).values()}
        assert verdicts <= {Verdict.PASS, Verdict.NOT_APPLICABLE}, check.name


@pytest.mark.parametrize(
    ("column", "factor", "verdict", "words"),
    [
        ("power", 1.341, Verdict.QUERY, "hp under a kW heading"),
        ("power", 1.36, Verdict.QUERY, "metric hp"),
        ("power", 1 / 0.95, Verdict.QUERY, "motor input"),
        ("power", 1.015, Verdict.REMARK, ""),
        ("power", 1.035, Verdict.QUERY, ""),
        ("power", 1.10, Verdict.FAIL, ""),
        ("efficiency", 1.10, Verdict.FAIL, ""),
        ("head", 3.281, Verdict.QUERY, "ft under an m heading"),
        ("power", 1.004, Verdict.PASS, ""),
    ],
)
def test_power_balance(column, factor, verdict, words):
    finding = judge(power_balance.CHECK, sound_case(scaled(column, factor)))["all points"]
    assert finding.verdict is verdict
    assert words in str(finding.evidence.get("mistakes", ""))


@pytest.mark.parametrize(("kept", "verdict"), [(0.94, Verdict.QUERY), (0.935, Verdict.QUERY), (0.90, Verdict.FAIL)])
def test_an_ordinary_motor_is_thought_of_where_the_bid_names_no_efficiency(kept, verdict):
    bid = scaled("power", 1 / kept) | {"driver": Driver(rating=110e3)}
    finding = judge(power_balance.CHECK, sound_case(bid))["all points"]
    assert finding.verdict is verdict
    assert ("ordinary motor" in str(finding.evidence.get("mistakes", ""))) is (verdict is Verdict.QUERY)


def test_a_motor_is_told_by_the_points_near_its_load():
    curve = sound_curve()
    assert curve.power is not None
    load = curve.power.value / 110e3
    losses = 0.07 * (-0.4508 * load**3 + 1.2399 * load**2 - 0.4301 * load + 0.6410)  # of a motor of 93 % at full load
    drawn = replace(curve.power, value=curve.power.value + 110e3 * losses)
    bid = {"curves": (replace(curve, power=drawn),), "driver": Driver(rating=110e3, efficiency=0.935)}
    finding = judge(power_balance.CHECK, sound_case(bid))["all points"]
    assert finding.verdict is Verdict.QUERY
    assert "motor input" in str(finding.evidence["mistakes"].value)


@pytest.mark.parametrize(
    ("efficiency", "power", "verdict", "words"),
    [
        (0.825, 92400.0, Verdict.PASS, ""),
        (0.90, 92400.0, Verdict.FAIL, ""),
        (0.825, 92400.0 / 0.95, Verdict.QUERY, "motor input"),
        (0.825, 92400.0 * 1.341, Verdict.QUERY, "hp under a kW heading"),
    ],
)
def test_claims_are_held_against_one_another_where_the_curve_gives_no_efficiency(efficiency, power, verdict, words):
    claims = Claims(
        head=stated(62.0, 0.05, "62.0 m"),
        efficiency=stated(efficiency, 0.0005, "82.5 %"),
        power=stated(power, 50.0, f"{power / 1000} kW"),
    )
    case = sound_case({"curves": (sound_curve(efficiency=None, power=None),), "claims": claims})
    finding = judge(power_balance.CHECK, case)["claims"]
    assert finding.verdict is verdict
    assert words in str(finding.evidence.get("mistakes", ""))


def test_one_misread_power_does_not_condemn_the_rest():
    curve = sound_curve()
    assert curve.power is not None
    value = curve.power.value.copy()
    value[5] *= 1.1
    case = sound_case({"curves": (replace(curve, power=replace(curve.power, value=value)),)})
    findings = judge(power_balance.CHECK, case)
    assert findings["all points"].verdict is Verdict.PASS
    assert Verdict.QUERY not in {finding.verdict for finding in findings.values()}
    assert Verdict.FAIL not in {finding.verdict for finding in findings.values()}


@pytest.mark.parametrize(
    ("left_out", "verdict"), [("power", Verdict.NOT_APPLICABLE), ("efficiency", Verdict.NOT_APPLICABLE)]
)
def test_balance_needs_two_statements(left_out, verdict):
    case = sound_case({"curves": (sound_curve(**{left_out: None}),)})
    assert judge(power_balance.CHECK, case)["all points"].verdict is verdict


def test_balance_without_either_is_no_data():
    case = sound_case({"curves": (sound_curve(power=None, efficiency=None),)})
    assert judge(power_balance.CHECK, case)["all points"].verdict is Verdict.NO_DATA


@pytest.mark.parametrize(
    ("deviation", "verdict"),
    [(0.012, Verdict.REMARK), (-0.03, Verdict.REMARK), (-0.0301, Verdict.QUERY), (0.0301, Verdict.QUERY)],
)
def test_odd_points_are_shown_with_what_would_fit(deviation, verdict):
    case = sound_case()
    assert case.fits is not None
    odd = OddPoint("head", 7, 400 * M3H, 60.0, 64.0, deviation)
    findings = judge(odd_point.CHECK, replace(case, fits=replace(case.fits, odd_points=(odd,))))
    finding = findings["curve.csv:7 head"]
    assert finding.verdict is verdict
    assert finding.evidence["would_fit"].value == 64.0
    assert "all curves" not in findings


def test_a_doubtful_fit_is_a_remark():
    case = sound_case()
    assert case.fits is not None
    assert case.fits.head is not None
    head = replace(case.fits.head, guard_flow=450 * M3H, guard_difference=0.8)
    findings = judge(odd_point.CHECK, replace(case, fits=replace(case.fits, head=head)))
    assert findings["head fit"].verdict is Verdict.REMARK


@pytest.mark.parametrize(
    ("claim", "verdict", "wording"),
    [
        (62.3, Verdict.PASS, "lies on"),
        (66.0, Verdict.QUERY, "better"),
        (58.0, Verdict.REMARK, "careful"),
        (62.3 * 3.281, Verdict.QUERY, "One mistake"),
    ],
)
def test_claimed_head_against_the_curve(claim, verdict, wording):
    case = sound_case({"claims": Claims(head=stated(claim, 0.05))})
    finding = judge(rated_on_curve.CHECK, case)["head at rated flow"]
    assert finding.verdict is verdict
    assert wording in finding.wording.message


@pytest.mark.parametrize(("npsh3", "verdict"), [(4.2, Verdict.PASS), (3.6, Verdict.QUERY), (5.0, Verdict.REMARK)])
def test_claimed_npsh3_is_better_when_smaller(npsh3, verdict):
    case = sound_case({"claims": Claims(npsh3=stated(npsh3, 0.05))})
    assert judge(rated_on_curve.CHECK, case)["npsh3 at rated flow"].verdict is verdict


def test_no_claim_is_not_a_pass():
    findings = judge(rated_on_curve.CHECK, sound_case({"claims": Claims()}))
    assert {finding.verdict for finding in findings.values()} == {Verdict.NOT_APPLICABLE}


@pytest.mark.parametrize(
    ("declared", "verdict"),
    [(460, Verdict.PASS), (483, Verdict.PASS), (484, Verdict.QUERY), (437, Verdict.PASS), (436, Verdict.QUERY)],
)
def test_declared_best_efficiency_flow(declared, verdict):
    case = with_bep(sound_case({"claims": Claims(bep_flow=stated(declared * M3H, 0.0))}), 460.0)
    assert judge(declared_bep.CHECK, case)["flow"].verdict is verdict


def test_declared_flow_inside_the_interval_passes():
    case = with_bep(sound_case({"claims": Claims(bep_flow=stated(500 * M3H, 0.0))}), 460.0, (430.0, 510.0))
    assert judge(declared_bep.CHECK, case)["flow"].verdict is Verdict.PASS


@pytest.mark.parametrize(
    ("declared", "verdict"), [(0.825, Verdict.PASS), (0.86, Verdict.QUERY), (0.79, Verdict.REMARK)]
)
def test_declared_best_efficiency(declared, verdict):
    case = with_bep(sound_case({"claims": Claims(bep_efficiency=stated(declared, 0.0005))}), 460.0)
    assert judge(declared_bep.CHECK, case)["efficiency"].verdict is verdict


def test_curve_that_ends_before_the_largest_flow():
    duty = Duty(rated_flow=450 * M3H, rated_head=62.0, max_flow=600 * M3H, npsha=6.8)
    findings = judge(curve_coverage.CHECK, sound_case(duty=duty))
    assert findings["head reach"].verdict is Verdict.QUERY
    assert findings["npsh3 reach"].verdict is Verdict.QUERY
    exactly = Duty(rated_flow=450 * M3H, rated_head=62.0, max_flow=580 * M3H, npsha=6.8)
    assert judge(curve_coverage.CHECK, sound_case(duty=exactly))["head reach"].verdict is Verdict.PASS


def test_few_points_and_no_shutoff():
    head = points([300, 400, 500, 560], [68.9, 64.9, 59.5, 55.7])
    findings = judge(curve_coverage.CHECK, sound_case({"curves": (sound_curve(head=head),)}))
    assert findings["head points"].verdict is Verdict.QUERY
    assert findings["shutoff"].verdict is Verdict.REMARK


def test_no_curve_of_the_offered_diameter_is_no_data():
    case = sound_case({"impeller_rated": 0.390})
    two = (sound_curve(impeller=0.43), sound_curve(impeller=0.35))
    case = sound_case({"curves": two, "impeller_rated": 0.390})
    assert judge(curve_coverage.CHECK, case)["head"].verdict is Verdict.NO_DATA
    assert judge(power_balance.CHECK, case)["all points"].verdict is Verdict.NO_DATA


def test_missing_data_tells_what_is_decisive():
    bare = sound_case(
        {"claims": Claims(), "driver": Driver(), "curves": (sound_curve(npsh3=None, power=None, efficiency=None),)}
    )
    findings = judge(missing_data.CHECK, bare)
    missing = {subject for subject, finding in findings.items() if finding.verdict is Verdict.NO_DATA}
    decisive = {subject for subject in missing if findings[subject].decisive}
    assert decisive == {"efficiency or power", "NPSH3", "driver rating"}
    assert {"minimum flow", "guarantee", "casing rating"} <= missing
    assert all(findings[subject].wording.question for subject in missing)


def test_a_claim_stands_in_for_the_curve_at_rated_flow_only():
    bid = {"curves": (sound_curve(npsh3=None),)}
    case = sound_case(bid)
    assert case.at_duty.npsh3 == 4.2
    assert case.at_duty.from_claims == ("npsh3",)
    assert judge(missing_data.CHECK, case)["NPSH3"].verdict is Verdict.PASS
    assert dict(case.operating)["largest flow"].npsh3 is None


def test_every_finding_of_the_sound_bid_has_a_finite_evidence():
    case = sound_case()
    for check in (curve_coverage.CHECK, power_balance.CHECK, rated_on_curve.CHECK, declared_bep.CHECK):
        for finding in judge(check, case).values():
            for item in finding.evidence.values():
                assert isinstance(item.value, str) or np.isfinite(item.value)
    assert sound_bid().name == "alder a"


def power_only(factor: float) -> Case:
    """The sound bid with power alone, so many times what it is."""
    curve = sound_curve(efficiency=None)
    assert curve.power is not None
    assert curve.head is not None
    head = replace(curve.head, flow_unit=M3H, value_unit=1.0)
    power = replace(curve.power, value=curve.power.value * factor, flow_unit=M3H, value_unit=745.7)
    return sound_case({"curves": (replace(curve, head=head, power=power),)})


def test_efficiency_that_follows_cannot_exceed_all_there_is():
    assert judge(power_balance.CHECK, power_only(0.9))["all points"].verdict is Verdict.NOT_APPLICABLE
    explained = judge(power_balance.CHECK, power_only(0.7457))["all points"]  # hp written as kW would be 1.341
    assert explained.verdict is Verdict.QUERY
    assert "power is in kW under a hp heading" in str(explained.evidence["mistakes"].value)
    assert judge(power_balance.CHECK, power_only(0.5))["all points"].verdict is Verdict.FAIL


def test_an_efficiency_that_follows_and_exceeds_the_ceiling_is_asked_where_units_explain_it():
    finding = judge(efficiency_ceiling.CHECK, power_only(0.86))["best efficiency"]
    assert finding.verdict is Verdict.FAIL
    finding = judge(efficiency_ceiling.CHECK, power_only(0.7457))["best efficiency"]
    assert finding.verdict is Verdict.QUERY


@pytest.mark.parametrize(
    ("rated", "largest", "words"),
    [(0.4, None, "maximum and minimum"), (None, 0.45, "diameter offered"), (None, None, "rated, maximum and minimum")],
)
def test_only_the_diameter_that_is_missing_is_asked_for(rated, largest, words):
    finding = judge(missing_data.CHECK, sound_case({"impeller_rated": rated, "impeller_max": largest}))
    assert words in str(finding["impeller diameters"].evidence["request"].value)
